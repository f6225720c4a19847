import type { ChannelView, PanelView } from '../src/messages/panel';
import { channelAt, codeStairs, stairsSize } from '../src/picture/codeStairs';
import { coverageChart } from '../src/picture/coverageChart';
import { chartViewBox } from '../src/picture/smithChart';
import type { Actions } from './actions';
import type { Controls } from './controls';
import { element, picture, setMarkup, setText, syncList } from './dom';

/** Rows of the table at most, around the channel that is shown: the staircase has all of them. */
const rowsAtMost = 400;

/** Codes by channel as a staircase and a table, the firmware's table, and the loads that codes can bring to the goals. Choosing a channel shows its trace. */
export function codesSection(controls: Controls, actions: Actions) {
  let codes: PanelView['codes'] = null;
  let offset = 0;
  /** True where the arrow keys moved on: the row of the next view gets the focus. */
  let keepsFocus = false;
  const [summary, steps, proof] = ['summary-line', 'soft-line', 'soft-line'].map((name) => element('p', { class: name }));
  const stairs = picture('0 0 540 200', { class: 'plot stairs-plot', role: 'slider', tabindex: '0', 'aria-orientation': 'horizontal' });
  const head = element('tr');
  const body = element('tbody');
  const table = element('table', { class: 'codes' }, element('caption', { class: 'hidden-text', text: 'Codes by channel' }), element('thead', {}, head), body);
  const frame = element('div', { class: 'table-frame codes-frame', tabindex: '0', role: 'region', 'aria-label': 'Codes by channel' }, table);
  const cut = element('p', { class: 'soft-line' });
  const write = controls.button({ label: 'Write table', onPress: actions.writeFirmware });
  const tables = element('ul', { class: 'firmware' });
  const firmware = element('div', { class: 'firmware-line' }, tables, write);
  const chart = picture(chartViewBox, { class: 'coverage-chart', role: 'img' });
  const coverageText = element('p');
  const cases = element('ul', { class: 'covered-cases' });
  const coverage = element('div', { class: 'coverage-part' }, element('h3', { text: 'Coverage' }), coverageText, chart as unknown as HTMLElement, cases);
  const root = element('section', { class: 'codes-section', 'aria-label': 'Codes by channel' },
    element('h2', { text: 'Codes by channel' }), summary, stairs as unknown as HTMLElement, steps, frame, cut, proof, firmware, coverage);

  const choose = (at: number) => {
    const channel = codes?.channels[at];
    if (channel && at !== codes?.shown) actions.moveMarker(channel.frequencyHz);
  };
  const follow = (event: PointerEvent) => {
    if (!codes || codes.channels.length === 0) return;
    const box = stairs.getBoundingClientRect();
    choose(channelAt(codes, ((event.clientX - box.left) / box.width) * stairsSize(codes).width));
  };
  stairs.addEventListener('pointerdown', (event) => {
    stairs.setPointerCapture(event.pointerId);
    follow(event);
  });
  stairs.addEventListener('pointermove', (event) => {
    if (stairs.hasPointerCapture(event.pointerId)) follow(event);
  });
  stairs.addEventListener('keydown', (event) => {
    const by = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1, PageUp: 10, PageDown: -10, Home: -1e9, End: 1e9 }[event.key];
    if (by === undefined || !codes) return;
    event.preventDefault();
    choose(Math.min(Math.max(codes.shown + by, 0), codes.channels.length - 1));
  });

  // One stop for the Tab key; the arrow keys go from channel to channel.
  body.addEventListener('keydown', (event) => {
    const by = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (by === undefined || !codes) return;
    event.preventDefault();
    keepsFocus = true;
    choose(Math.min(Math.max(codes.shown + by, 0), codes.channels.length - 1));
  });

  const makeRow = () => {
    const row = element('tr');
    const button = element('button', { type: 'button', class: 'row-button', click: () => choose(Number(row.dataset.channel)) });
    row.append(element('th', { scope: 'row' }, button));
    return row;
  };
  const updateRow = (row: HTMLElement, { text, codes: own, holds, margin, returnLoss, gain }: ChannelView, at: number) => {
    const isShown = offset + at === codes?.shown;
    row.dataset.channel = String(offset + at);
    row.classList.toggle('current', isShown);
    row.classList.toggle('missed', !holds);
    const button = row.querySelector('button')!;
    setText(button, text);
    if (isShown) button.setAttribute('aria-current', 'true');
    else button.removeAttribute('aria-current');
    const cells = [...own.map(String), `${holds ? '✓' : '✗'} ${margin}`, returnLoss, gain];
    while (row.children.length > cells.length + 1) row.lastElementChild!.remove();
    while (row.children.length < cells.length + 1) row.append(element('td', { class: 'number' }));
    cells.forEach((content, i) => setText(row.children[i + 1], content));
    row.children[own.length + 1].className = 'number margin-cell';
    row.children[own.length + 2].className = 'number loss-cell';
    row.children[own.length + 3].className = 'number gain-cell';
    button.tabIndex = isShown ? 0 : -1;
  };
  /** The row of the channel that is shown is in sight, without moving the page around it. */
  const showRow = (row: Element | undefined) => {
    if (!(row instanceof HTMLElement)) return;
    const header = head.offsetHeight;
    const hidden = row.offsetTop - header < frame.scrollTop || row.offsetTop + row.offsetHeight > frame.scrollTop + frame.clientHeight;
    if (hidden) frame.scrollTop = row.offsetTop - (frame.clientHeight + header - row.offsetHeight) / 2;
  };

  return {
    root,
    update(view: PanelView) {
      const wasShown = codes?.shown;
      codes = view.codes;
      root.hidden = codes === null;
      if (codes === null) return;
      const { channels, shown, tunables } = codes;
      setText(summary, codes.summary);
      setText(steps, codes.stepsText);
      steps.hidden = codes.stepsText === '';
      setText(proof, codes.proof);
      const size = stairsSize(codes);
      stairs.setAttribute('viewBox', `0 0 ${size.width} ${size.height}`);
      setMarkup(stairs, codeStairs(codes));
      const chosen = channels[shown];
      const said = chosen ? `${chosen.text}: ${tunables.map(({ name }, t) => `${name} ${chosen.codes[t]}`).join(', ')}, margin ${chosen.margin}` : 'no channel';
      stairs.setAttribute('aria-label', 'Codes over the channels; channel');
      stairs.setAttribute('aria-valuemin', '1');
      stairs.setAttribute('aria-valuemax', String(Math.max(1, channels.length)));
      stairs.setAttribute('aria-valuenow', String(shown + 1));
      stairs.setAttribute('aria-valuetext', said);
      syncList(head, ['channel', ...tunables.map(({ name }) => name), 'margin', 'return loss', 'gain'], () => element('th', { scope: 'col' }), (cell, text, i) => {
        setText(cell, text);
        const own = i - 1 - tunables.length;
        cell.className = i === 0 ? '' : `number ${['margin-cell', 'loss-cell', 'gain-cell'][own] ?? ''}`;
      });
      offset = Math.min(Math.max(0, shown - rowsAtMost / 2), Math.max(0, channels.length - rowsAtMost));
      syncList(body, channels.slice(offset, offset + rowsAtMost), makeRow, updateRow);
      cut.hidden = channels.length <= rowsAtMost;
      setText(cut, `${rowsAtMost} of ${channels.length} channels, around the one that is shown.`);
      if (shown !== wasShown) {
        showRow(body.children[shown - offset]);
        if (keepsFocus) body.children[shown - offset]?.querySelector('button')?.focus({ preventScroll: true });
        keepsFocus = false;
      }
      syncList(tables, codes.firmware, () => element('li'), (item, { path, text, ok }) => {
        setText(item, `${path}: ${text}`);
        item.classList.toggle('out-of-date', !ok);
      });
      firmware.hidden = codes.firmware.length === 0;
      write.hidden = !codes.firmware.some(({ writable }) => writable);
      setText(coverageText, codes.coverage ? `${codes.coverage.text} (hatched).` : codes.coverageText);
      chart.style.display = codes.coverage ? '' : 'none';
      if (codes.coverage) {
        setMarkup(chart, coverageChart(codes.coverage, 'coverage'));
        chart.setAttribute('aria-label', `Smith chart of the loads. ${codes.coverage.text}. ${codes.coverage.cases.map(({ caseName, text }) => `${caseName}: ${text}`).join('; ')}.`);
      }
      syncList(cases, codes.coverage?.cases ?? [], () => element('li', {}, element('span', { class: 'mark' }), element('span')), (item, { caseName, text, holds }) => {
        item.className = holds ? 'held' : 'missed';
        setText(item.children[0], holds ? '✓' : '✗');
        setText(item.children[1], `${caseName}: ${text}`);
      });
    },
  };
}
