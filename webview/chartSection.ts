import type { PanelView, TraceView } from '../src/messages/panel';
import { caseClass, chartBox, chartSummary, chartViewBox, nearestTracePoint, smithChart } from '../src/picture/smithChart';
import type { Actions } from './actions';
import type { Controls } from './controls';
import { element, picture, setMarkup, setText, syncList } from './dom';
import { notInsertedMark } from './notInsertedMark';
import { stepFrequency } from './stepFrequency';

/** How far from a trace, in the chart's units, a press still takes hold of it. */
const reach = 14;

/** The chart, what its lines mean, and the marker with its reading for every case. */
export function chartSection(controls: Controls, actions: Actions) {
  let view: PanelView | null = null;
  let previews: readonly TraceView[] = [];
  const chart = picture(chartViewBox, { class: 'chart', role: 'img', tabindex: '0' });
  const mark = notInsertedMark();
  const legend = element('ul', { class: 'legend' });
  const field = controls.textField({
    label: 'Marker frequency',
    onSubmit: (text) => actions.typeMarker(text),
    onArrow: (direction) => stepMarker(direction === 'up' ? 1 : -1),
  });
  const readings = element('ul', { class: 'readings' });
  const gaps = element('p', { class: 'gaps' });
  const refusal = element('p', { class: 'refusal', role: 'alert' });
  const root = element('section', { class: 'trace-section', 'aria-label': 'Reflection trace' },
    element('h2', { text: 'Reflection trace' }, mark.root), chart as unknown as HTMLElement, legend, gaps,
    element('div', { class: 'marker-line' }, element('span', { class: 'marker-label', text: 'marker' }), field.root, readings), refusal);

  const stepMarker = (points: number) => {
    const next = view?.marker ? stepFrequency(view.frequencyHz, view.marker.frequencyHz, points) : null;
    if (next !== null) actions.moveMarker(next);
  };

  const placeOf = (event: PointerEvent) => {
    const box = chart.getBoundingClientRect();
    return { x: chartBox.x + ((event.clientX - box.left) / box.width) * chartBox.width, y: chartBox.y + ((event.clientY - box.top) / box.height) * chartBox.height };
  };
  let dragging = false;
  const follow = (event: PointerEvent, within: number) => {
    if (!view) return false;
    const { x, y } = placeOf(event);
    const nearest = nearestTracePoint(view, x, y);
    if (!nearest || nearest.distance > within) return false;
    actions.moveMarker(view.frequencyHz[nearest.index]);
    return true;
  };
  chart.addEventListener('pointerdown', (event) => {
    dragging = follow(event, reach);
    if (dragging) chart.setPointerCapture(event.pointerId);
  });
  chart.addEventListener('pointermove', (event) => {
    if (dragging) follow(event, Infinity);
  });
  for (const end of ['pointerup', 'pointercancel'] as const) chart.addEventListener(end, () => { dragging = false; });
  chart.addEventListener('keydown', (event) => {
    const points = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1, PageUp: 10, PageDown: -10 }[event.key];
    if (points === undefined) return;
    event.preventDefault();
    stepMarker(points);
  });
  const elementOf = (event: Event) => (event.target as Element).closest('[data-element]')?.getAttribute('data-element') ?? null;
  chart.addEventListener('pointerover', (event) => actions.pointAt(elementOf(event)));
  chart.addEventListener('pointerleave', () => actions.pointAt(null));
  chart.addEventListener('click', (event) => {
    const id = elementOf(event);
    const line = view?.ladder.find((row) => row.id === id)?.line ?? null;
    if (line !== null) actions.revealLine(line);
  });

  return {
    root, chart,
    update(next: PanelView) {
      view = next;
      setMarkup(chart, smithChart({ ...next, previews, cloud: cloudOf(next) }));
      chart.setAttribute('aria-label', `${chartSummary(next)}${next.notInserted ? ' With the best candidate, not inserted.' : ''} Arrow keys move the marker.`);
      syncList(legend, legendOf(next), () => element('li', {}, picture('0 0 26 8', { class: 'sample', 'aria-hidden': 'true' }) as unknown as HTMLElement, element('span')), (item, { className, text }) => {
        const sample = item.firstElementChild as SVGElement;
        sample.toggleAttribute('hidden', className === '');
        setMarkup(sample, className === '' ? ' ' : `<path class="${className}" d="M1 4L25 4"/>`);
        setText(item.lastElementChild!, text);
      });
      mark.show(next.notInserted);
      const missing = missingOf(next);
      setText(gaps, missing === '' ? '' : `Not drawn everywhere: ${missing}.`);
      gaps.hidden = missing === '';
      field.setValue(next.marker?.text ?? '');
      setText(refusal, '');
      syncList(readings, next.marker?.cases ?? [], () => element('li', {}, element('span', { class: 'case-name' }), element('span')), (item, reading) => {
        setText(item.firstElementChild!, reading.caseName === 'load' && next.traces.length === 1 ? '' : `${reading.caseName}: `);
        setText(item.lastElementChild!, reading.text);
      });
    },
    preview(traces: readonly TraceView[] | null) {
      previews = traces ?? [];
      if (view) setMarkup(chart, smithChart({ ...view, previews, cloud: cloudOf(view) }));
    },
    refuse: (text: string) => setText(refusal, text),
    highlight(elementId: string | null) {
      for (const part of chart.querySelectorAll('[data-element]')) part.classList.toggle('current', elementId !== null && part.getAttribute('data-element') === elementId);
    },
  };
}

/** Why parts of traces are missing, each reason once and without the case that it is told of. */
export const missingOf = ({ traces }: Pick<PanelView, 'traces'>): string =>
  [...new Set(traces.flatMap(({ caseName, reason }) => (reason === null ? [] : [reason.replace(new RegExp(`^load(?: ${caseName.replace(/[^\w ]/g, '\\$&')})?: `), '')])))].join('; ');

/** Of another text's builds nothing is drawn. */
const cloudOf = ({ spread }: PanelView) => (spread && !spread.stale ? spread.cloud : []);

function legendOf({ traces, bands, discs, limits, marker, spread }: PanelView): { className: string; text: string }[] {
  return [
    ...traces.map(({ caseName }, i) => ({ className: `trace ${caseClass(i)}`, text: caseName })),
    ...(bands.length > 0 ? [{ className: '', text: 'thick: in band' }] : []),
    ...discs.map(({ label }) => ({ className: '', text: `disc: ${label}` })),
    ...limits.map(({ label }) => ({ className: '', text: `dashed ring: ${label}` })),
    ...(spread && !spread.stale && spread.cloud.length > 0 ? [{ className: '', text: `thin: builds${traces.length > 1 ? `, ${traces[0].caseName}` : ''}` }] : []),
    ...(marker && marker.cases.length > 1 && marker.cases[0].steps.length > 0 ? [{ className: '', text: `arcs: ${marker.cases[0].caseName}` }] : []),
  ];
}
