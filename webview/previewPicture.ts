import type { PanelView, TraceView } from '../src/messages/panel';
import { chartViewBox, smithChart } from '../src/picture/smithChart';
import { element, picture, setMarkup, setText } from './dom';

/** A small chart right beside the candidates: the large one is out of sight where the panel is narrow. And what its lines mean. */
export function previewPicture() {
  let view: PanelView | null = null;
  const chart = picture(chartViewBox, { class: 'small-chart', 'aria-hidden': 'true' });
  const solid = element('span');
  const dashed = element('span');
  const line = (name: string, text: HTMLElement) => {
    const sample = picture('0 0 26 8', { class: 'sample', 'aria-hidden': 'true' });
    setMarkup(sample, `<path class="${name}" d="M1 4L25 4"/>`);
    return element('li', {}, sample as unknown as HTMLElement, text);
  };
  const root = element('div', { class: 'preview-picture' }, chart as unknown as HTMLElement, element('ul', {}, line('trace plain', solid), line('preview', dashed)));
  const draw = (previews: readonly TraceView[], candidate: number | null) => {
    const candidates = view?.candidates?.candidates ?? [];
    root.hidden = !view?.notInserted;
    if (!view || root.hidden) return;
    setMarkup(chart, smithChart({ ...view, marker: null, limits: [], previews }));
    setText(solid, `best: ${candidates[0]?.values ?? ''}`);
    setText(dashed, candidate === null || previews.length === 0 ? 'Point at another one to see its trace.' : `pointed at: ${candidates[candidate]?.values ?? ''}`);
  };
  return {
    root,
    update(next: PanelView) {
      view = next;
      draw([], null);
    },
    show: draw,
  };
}
