import type { PanelView, TraceView } from '../src/messages/panel';
import { frequencyPlot, frequencyScale, frequencyUnit, plotSize, shownSpan } from '../src/picture/frequencyPlot';
import type { Actions } from './actions';
import { element, picture, setMarkup, setText } from './dom';
import { notInsertedMark } from './notInsertedMark';
import { stepFrequency } from './stepFrequency';

const plots = ['reflection', 'gain'] as const;

/** Reflection and gain over frequency; the marker is dragged over either and stepped with the arrow keys. */
export function plotsSection(actions: Actions) {
  let view: PanelView | null = null;
  let previews: readonly TraceView[] = [];
  const markupOf = (shown: PanelView, i: number) =>
    frequencyPlot({ plot: plots[i], frequencyHz: shown.frequencyHz, traces: shown.traces, previews, bands: shown.bands, masks: shown.masks, markerHz: shown.marker?.frequencyHz ?? null });
  const words = element('span');
  const mark = notInsertedMark();
  const pictures = plots.map(() => picture(`0 0 ${plotSize.width} ${plotSize.height}`, { class: 'plot', role: 'slider', tabindex: '0', 'aria-orientation': 'horizontal' }));
  const root = element('section', { class: 'plots-section', 'aria-label': 'Over frequency' }, element('h2', {}, words, mark.root), ...pictures.map((made) => made as unknown as HTMLElement));
  for (const made of pictures) {
    const follow = (event: PointerEvent) => {
      const x = view && frequencyScale(view.frequencyHz, shownSpan({ ...view, markerHz: view.marker?.frequencyHz ?? null }));
      if (!view || !x) return;
      const box = made.getBoundingClientRect();
      const [low, high] = x.domain();
      actions.moveMarker(Math.min(Math.max(x.invert(((event.clientX - box.left) / box.width) * plotSize.width), low), high));
    };
    made.addEventListener('pointerdown', (event) => {
      made.setPointerCapture(event.pointerId);
      follow(event);
    });
    made.addEventListener('pointermove', (event) => {
      if (made.hasPointerCapture(event.pointerId)) follow(event);
    });
    made.addEventListener('keydown', (event) => {
      const points = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1, PageUp: 10, PageDown: -10, Home: -1e9, End: 1e9 }[event.key];
      const next = points === undefined || !view?.marker ? null : stepFrequency(view.frequencyHz, view.marker.frequencyHz, points);
      if (next === null) return;
      event.preventDefault();
      actions.moveMarker(next);
    });
  }
  return {
    root,
    update(next: PanelView) {
      view = next;
      mark.show(next.notInserted);
      setText(words, `Over frequency, ${frequencyUnit(next.frequencyHz).unit}`);
      pictures.forEach((made, i) => {
        setMarkup(made, markupOf(next, i));
        made.setAttribute('aria-label', `${plots[i] === 'reflection' ? 'Reflection' : 'Gain'} over frequency; marker`);
        made.setAttribute('aria-valuemin', String(next.frequencyHz[0] ?? 0));
        made.setAttribute('aria-valuemax', String(next.frequencyHz[next.frequencyHz.length - 1] ?? 0));
        made.setAttribute('aria-valuenow', String(next.marker?.frequencyHz ?? next.frequencyHz[0] ?? 0));
        made.setAttribute('aria-valuetext', next.marker?.text ?? 'not set');
      });
    },
    preview(traces: readonly TraceView[] | null) {
      previews = traces ?? [];
      const shown = view;
      if (shown) pictures.forEach((made, i) => setMarkup(made, markupOf(shown, i)));
    },
  };
}
