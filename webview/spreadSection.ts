import type { PanelView } from '../src/messages/panel';
import { histogramPicture, histogramSize } from '../src/picture/histogram';
import { element, picture, setMarkup, setText } from './dom';

/** How many boards of a hundred hold: yield, the worst margins of the builds, the worst corner, and what would help. */
export function spreadSection() {
  const heading = element('h2');
  const chart = picture(`0 0 ${histogramSize.width} ${histogramSize.height}`, { class: 'plot histogram', role: 'img' });
  const lines = ['yield-line', 'goals-line', 'corner-line', 'remedy-line'].map((name) => element('p', { class: name }));
  const root = element('section', { class: 'spread-section', 'aria-label': 'Spread of builds' }, heading, lines[0], chart as unknown as HTMLElement, ...lines.slice(1));
  return {
    root,
    update({ spread }: Pick<PanelView, 'spread'>) {
      root.hidden = spread === null;
      if (spread === null) return;
      root.classList.toggle('old', spread.stale);
      setText(heading, spread.stale ? 'Spread of builds (before the last change)' : spread.share < 1 ? 'Spread of builds, more being made' : 'Spread of builds');
      [spread.yieldText, spread.goalsText, spread.cornerText, spread.remedyText].forEach((text, i) => {
        setText(lines[i], text);
        lines[i].hidden = text === '';
      });
      setMarkup(chart, histogramPicture(spread));
      chart.setAttribute('aria-label', `Histogram of the worst margins of builds. ${spread.yieldText}. ${spread.cornerText}.`);
    },
  };
}
