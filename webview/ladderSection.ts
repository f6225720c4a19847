import type { LadderRowView, PanelView } from '../src/messages/panel';
import { ladderSymbol, symbolSize } from '../src/picture/ladderSymbol';
import type { Actions } from './actions';
import type { Controls, TextField } from './controls';
import { element, picture, setMarkup, setText, syncList } from './dom';
import { notInsertedMark } from './notInsertedMark';

const columns = ['value', 'X or B', 'Z after, Ω', 'peak', 'current', 'heat', 'loss', 'dB per 1 %'] as const;

/** Which columns give way in a narrow panel: current first, then loss, heat, peak, and last what a per cent costs. */
const givesWay: Readonly<Partial<Record<(typeof columns)[number], string>>> = { current: 'current-only', loss: 'loss-only', heat: 'heat-only', peak: 'peak-only', 'dB per 1 %': 'sensitivity-only' };
const columnClass = (name: (typeof columns)[number]) => (givesWay[name] === undefined ? 'number' : `number ${givesWay[name]}`);

/** A hand's way for one step of a value. */
const dragStepPx = 12;

/** Element by element from the load down to the source. Values are typed over or stepped; a row leads to its line. */
export function ladderSection(controls: Controls, actions: Actions) {
  const fields = new WeakMap<HTMLElement, TextField>();
  let rows: readonly LadderRowView[] = [];
  /** A value that is being dragged: one step at a time, so that each rests on what the one before made of the text. */
  let dragged: { readonly id: string; atY: number; wantedSteps: number; isAsked: boolean } | null = null;
  const stepDragged = () => {
    if (!dragged || dragged.isAsked || dragged.wantedSteps === 0) return;
    const direction = dragged.wantedSteps > 0 ? 'up' : 'down';
    dragged.wantedSteps += direction === 'up' ? -1 : 1;
    dragged.isAsked = true;
    actions.stepValue(dragged.id, direction);
  };
  const mark = notInsertedMark();
  const body = element('tbody');
  const table = element('table', { class: 'ladder' },
    element('caption', { class: 'hidden-text', text: 'Ladder, from the load down to the source' }),
    element('thead', {}, element('tr', {}, element('th', { scope: 'col', class: 'symbol' }, element('span', { class: 'hidden-text', text: 'symbol' })), element('th', { scope: 'col' }, element('span', { class: 'hidden-text', text: 'element' })),
      ...columns.map((name) => element('th', { scope: 'col', class: columnClass(name), text: name })))), body);
  const root = element('section', { class: 'ladder-section', 'aria-label': 'Ladder' }, element('h2', { text: 'Ladder, from the load down to the source' }, mark.root), element('div', { class: 'table-frame', tabindex: '0', role: 'region', 'aria-label': 'Ladder table' }, table));

  const makeRow = () => {
    const row = element('tr');
    const id = () => row.dataset.element ?? '';
    const field = controls.textField({ label: 'Value', onSubmit: (text) => actions.setValue(id(), text), onArrow: (direction) => actions.stepValue(id(), direction) });
    fields.set(row, field);
    const reveal = element('button', { type: 'button', class: 'row-button name', click: () => {
      const line = rows.find((candidate) => candidate.id === id())?.line ?? null;
      if (line !== null) actions.revealLine(line);
    } }, element('span', { class: 'designator' }), element('span', { class: 'orientation' }));
    row.append(
      element('td', { class: 'symbol' }, picture(`0 0 ${symbolSize.width} ${symbolSize.height}`, { width: symbolSize.width, height: symbolSize.height, class: 'symbol', 'aria-hidden': 'true' }) as unknown as HTMLElement),
      element('th', { scope: 'row' }, reveal),
      element('td', { class: 'number value' }, element('span', { class: 'shown' }), field.root),
      ...columns.slice(1).map((name) => element('td', { class: columnClass(name) })));
    const handle = row.querySelector('td.symbol')!;
    handle.addEventListener('pointerdown', (event) => {
      if (!(event instanceof PointerEvent) || !row.classList.contains('editable')) return;
      event.preventDefault();
      handle.setPointerCapture(event.pointerId);
      dragged = { id: id(), atY: event.clientY, wantedSteps: 0, isAsked: false };
    });
    handle.addEventListener('pointermove', (event) => {
      if (!(event instanceof PointerEvent) || !dragged || !handle.hasPointerCapture(event.pointerId)) return;
      const steps = Math.trunc((dragged.atY - event.clientY) / dragStepPx);
      dragged.atY -= steps * dragStepPx;
      dragged.wantedSteps += steps;
      stepDragged();
    });
    for (const end of ['pointerup', 'pointercancel']) handle.addEventListener(end, () => { dragged = null; });
    const elementId = () => (row.classList.contains('end') ? null : id());
    row.addEventListener('pointerenter', () => actions.pointAt(elementId()));
    row.addEventListener('pointerleave', () => actions.pointAt(null));
    row.addEventListener('focusin', () => actions.pointAt(elementId()));
    row.addEventListener('focusout', () => actions.pointAt(null));
    return row;
  };
  const updateRow = (row: HTMLElement, data: LadderRowView) => {
    const field = fields.get(row)!;
    row.dataset.element = data.id;
    row.classList.toggle('end', data.orientation === 'end');
    row.classList.toggle('editable', data.editable);
    row.title = data.note;
    setMarkup(row.querySelector('svg')!, ladderSymbol(data));
    setText(row.querySelector('.designator')!, data.name);
    setText(row.querySelector('.orientation')!, data.orientation === 'end' || data.orientation === 'through' ? '' : data.orientation);
    const button = row.querySelector('button')!;
    button.disabled = data.line === null;
    field.root.hidden = !data.editable;
    field.root.setAttribute('aria-label', `Value of ${data.name}; arrow keys step it`);
    if (data.editable) field.setValue(data.value);
    setText(row.querySelector('.shown')!, data.editable ? '' : data.value);
    const cells = row.querySelectorAll(':scope > td.number');
    [data.reactance, data.impedanceAfter, data.voltage, data.current, data.heat, data.loss, data.sensitivity].forEach((text, i) => setText(cells[i + 1], text));
  };
  return {
    root,
    update(view: PanelView) {
      rows = view.ladder;
      if (dragged) dragged.isAsked = false;
      stepDragged();
      syncList(body, view.ladder, makeRow, updateRow);
      root.hidden = view.ladder.length === 0;
      mark.show(view.notInserted);
    },
    highlight(elementId: string | null) {
      for (const row of body.children) row.classList.toggle('current', elementId !== null && (row as HTMLElement).dataset.element === elementId);
    },
  };
}
