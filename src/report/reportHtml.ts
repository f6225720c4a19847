import type { PanelView } from '../messages/panel';
import { chartSummary, chartViewBox, smithChart } from '../picture/smithChart';
import { frequencyPlot, frequencyUnit, plotSize } from '../picture/frequencyPlot';
import { standaloneStyle } from '../picture/standaloneStyle';
import { escapeText } from '../picture/svg';
import { candidatesTable, codesSection, goalsTable, ladderTable, legend, picture, spreadSection } from './reportSections';

const style = `${standaloneStyle('light')}
body{font:14px/1.45 sans-serif;color:#2b2b2b;background:#fff;max-width:60em;margin:2em auto;padding:0 1em}h1{font-size:1.4em}h2{font-size:1.05em;margin:1.8em 0 .4em;color:#555}h3{font-size:1em;margin:1.2em 0 .3em;color:#555;font-weight:400}
.frame{overflow-x:auto}table{border-collapse:collapse;width:100%;font-variant-numeric:tabular-nums}td,th{padding:.25em .5em;text-align:right;border-bottom:1px solid #ddd;font-weight:400}td:first-child,th:first-child,.left{text-align:left}thead th{color:#666}
.ok{color:#2d7d3f}.no{color:#c72e0f}.soft{color:#666}svg{display:block}svg.chart{width:min(100%,520px);margin:0 auto}svg.plot{width:100%;max-width:680px}svg.bar{width:110px;height:8px}svg.sample{display:inline-block;vertical-align:middle}svg.reach{flex:0 0 auto;width:90px;height:90px}svg.reach text{display:none}.reaches{list-style:none;padding:0;display:grid;grid-template-columns:repeat(auto-fill,minmax(240px,1fr));gap:.5em 1em}.reaches li{display:flex;gap:.7em;align-items:center;color:#666}tr.chosen td{background:#eef2f6;fill-opacity:1}
.wire{fill:none;stroke:#2b2b2b;stroke-width:1.6}.wire.filled{fill:#fff}.wire.dashed{stroke-dasharray:3 3}.node{fill:#2b2b2b}.bar-track{fill:#eee}
.cautions,.not-inserted{border:1px solid #b58900;padding:.5em 1em}td{white-space:nowrap}td.wide,tr.soft td{white-space:normal}@media print{body{margin:0;max-width:none}h2,h3{break-after:avoid}svg,tr,.whole{break-inside:avoid}p{orphans:3;widows:3}hr{break-after:page;border:0;margin:0}.frame{overflow:visible}td{padding:.2em .35em}}`;

/** What one description's part of a report is made of. */
export interface ReportedFile {
  readonly path: string;
  /** Null where nothing can be computed. */
  readonly view: PanelView | null;
  /** What is wrong with it then. */
  readonly messages: readonly string[];
}

/** One self-contained page, without script and without anything from elsewhere, for each description in turn. */
export function reportHtml(files: readonly ReportedFile[]): string {
  const bodies = files.map(({ path, view, messages }, at) =>
    (view ? viewHtml(view, `d${at}`) : `<h1>${escapeText(path)}</h1><p class="no">Nothing can be computed: ${messages.map(escapeText).join(' ')}</p>`));
  const title = files.length === 1 ? (files[0].view?.title ?? files[0].path) : 'Match descriptions';
  return `<!DOCTYPE html>\n<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escapeText(title)}</title><style>${style}</style></head>\n<body>\n${bodies.join('\n<hr>\n')}\n</body></html>\n`;
}

/** `id` is unlike that of any other description of the page. */
function viewHtml(view: PanelView, id: string): string {
  return [
    `<h1>${escapeText(view.title)}</h1><p class="soft">${escapeText(view.fileName)}</p>`,
    view.problems.length > 0 ? `<ul>${view.problems.map(({ severity, message, line }) => `<li class="${severity === 'error' ? 'no' : ''}">line ${line + 1}: ${escapeText(message)}</li>`).join('')}</ul>` : '',
    view.cautions.length > 0 ? `<div class="cautions">${view.cautions.map((text) => `<p>⚠ ${escapeText(text)}</p>`).join('')}</div>` : '',
    view.notInserted ? '<p class="not-inserted">Values are left to solve: traces, figures and ladder are those of the best candidate, which is not in the description.</p>' : '',
    `<h2>Verdict${view.verdict === '' ? '' : `: ${escapeText(view.verdict)}`}</h2>${goalsTable(view)}`,
    `<h2>Reflection trace</h2>${picture('chart', chartViewBox, smithChart({ ...view, cloud: view.spread?.cloud }), chartSummary(view))}${legend(view)}`,
    `<h2>Over frequency, ${frequencyUnit(view.frequencyHz).unit}</h2>`,
    ...(['reflection', 'gain'] as const).map((plot) => picture('plot', `0 0 ${plotSize.width} ${plotSize.height}`, frequencyPlot({ ...view, plot, markerHz: view.marker?.frequencyHz ?? null }), `${plot} over frequency`)),
    view.ladder.length > 0 ? `<h2>Ladder, from the load down to the source</h2>${ladderTable(view.ladder)}` : '',
    view.candidates ? candidatesTable(view.candidates, id) : '',
    view.codes ? codesSection(view.codes, id) : '',
    view.spread ? spreadSection(view.spread) : '',
  ].join('\n');
}
