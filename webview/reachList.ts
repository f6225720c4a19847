import type { CandidatesView } from '../src/messages/panel';
import { coverageChart } from '../src/picture/coverageChart';
import { chartViewBox } from '../src/picture/smithChart';
import { element, picture, setMarkup, setText, syncList } from './dom';

/** Forms that cannot make the match: why, and a small chart with the loads that they do match and the one that is there. */
export function reachList() {
  const list = element('ul', { class: 'out-of-reach' });
  const root = element('details', { class: 'reach' }, element('summary', { text: 'Forms out of reach' }), list);
  const makeItem = () => element('li', {}, picture(chartViewBox, { class: 'reach-chart', role: 'img' }) as unknown as HTMLElement, element('span'));
  return {
    root,
    update(forms: CandidatesView['outOfReach']) {
      root.hidden = forms.length === 0;
      syncList(list, forms, makeItem, (item, { text, reach }, at) => {
        const chart = item.querySelector('svg')!;
        chart.style.display = reach ? '' : 'none';
        if (reach) {
          setMarkup(chart, coverageChart(reach, `reach-${at}`, 18));
          chart.setAttribute('aria-label', `Smith chart. ${reach.text}, hatched; the load lies outside.`);
        }
        setText(item.querySelector('span')!, text);
      });
    },
  };
}
