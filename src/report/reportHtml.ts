import { panelView } from '../assistance/panelView';
import type { Assessment } from '../assistance/assess';
import type { LadderRowView, PanelView } from '../messages/panel';
import { frequencyPlot, frequencyUnit, plotSize } from '../picture/frequencyPlot';
import { barSize, goalBar } from '../picture/goalBar';
import { ladderSymbol, symbolSize } from '../picture/ladderSymbol';
import { chartSummary, chartViewBox, smithChart } from '../picture/smithChart';
import { standaloneStyle } from '../picture/standaloneStyle';
import { escapeText, tag } from '../picture/svg';

const style = `${standaloneStyle('light')}
body{font:14px/1.45 sans-serif;color:#2b2b2b;background:#fff;max-width:60em;margin:2em auto;padding:0 1em}h1{font-size:1.4em}h2{font-size:1.05em;margin:1.8em 0 .4em;color:#555}
table{border-collapse:collapse;width:100%}td,th{padding:.25em .5em;text-align:right;border-bottom:1px solid #ddd;font-weight:400}td:first-child,th:first-child,.left{text-align:left}thead th{color:#666}
.ok{color:#2d7d3f}.no{color:#c72e0f}.soft{color:#666}svg{display:block}svg.chart{width:min(100%,520px);margin:0 auto}svg.plot{width:100%;max-width:680px}svg.sample{display:inline-block;vertical-align:middle}
.wire{fill:none;stroke:#2b2b2b;stroke-width:1.6}.wire.filled{fill:#fff}.wire.dashed{stroke-dasharray:3 3}.node{fill:#2b2b2b}.bar-track{fill:#eee}.bar-held{fill:#2d7d3f}.bar-missed{fill:#c72e0f}.bar-limit{stroke:#2b2b2b}
.cautions{border:1px solid #b58900;padding:.5em 1em}@media print{body{margin:0;max-width:none}h2{break-after:avoid}svg,table{break-inside:avoid}}`;

const svg = (name: string, viewBox: string, content: string, label: string) =>
  `<svg class="${name}" viewBox="${viewBox}" role="img" aria-label="${escapeText(label)}">${content}</svg>`;

/** One self-contained page, without script and without anything from elsewhere, for each description in turn. */
export function reportHtml(files: readonly { readonly path: string; readonly assessment: Assessment }[]): string {
  const bodies = files.map(({ path, assessment }) => {
    const view = panelView(assessment, { fileName: path, pinned: false, markerHz: null });
    return view ? viewHtml(view) : `<h1>${escapeText(path)}</h1><p class="no">Nothing can be computed: ${assessment.diagnostics.map(({ message }) => escapeText(message)).join(' ')}</p>`;
  });
  const title = files.length === 1 ? (files[0].assessment.description.syntax.title?.value ?? files[0].path) : 'Match descriptions';
  return `<!DOCTYPE html>\n<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escapeText(title)}</title><style>${style}</style></head>\n<body>\n${bodies.join('\n<hr>\n')}\n</body></html>\n`;
}

function viewHtml(view: PanelView): string {
  return [
    `<h1>${escapeText(view.title)}</h1><p class="soft">${escapeText(view.fileName)}</p>`,
    view.problems.length > 0 ? `<ul>${view.problems.map(({ severity, message, line }) => `<li class="${severity === 'error' ? 'no' : ''}">line ${line + 1}: ${escapeText(message)}</li>`).join('')}</ul>` : '',
    view.cautions.length > 0 ? `<div class="cautions">${view.cautions.map((text) => `<p>⚠ ${escapeText(text)}</p>`).join('')}</div>` : '',
    `<h2>Verdict${view.verdict === '' ? '' : `: ${escapeText(view.verdict)}`}</h2>${goalsTable(view)}`,
    `<h2>Reflection trace</h2>${svg('chart', chartViewBox, smithChart(view), chartSummary(view))}${legend(view)}`,
    `<h2>Over frequency, ${frequencyUnit(view.frequencyHz).unit}</h2>`,
    ...(['reflection', 'gain'] as const).map((plot) => svg('plot', `0 0 ${plotSize.width} ${plotSize.height}`, frequencyPlot({ ...view, plot, markerHz: view.marker?.frequencyHz ?? null }), `${plot} over frequency`)),
    view.ladder.length > 0 ? `<h2>Ladder, from the load down to the source</h2>${ladderTable(view.ladder)}` : '',
  ].join('\n');
}

const cell = (text: string, kind = '') => `<td${kind && ` class="${kind}"`}>${escapeText(text)}</td>`;

function goalsTable({ goals }: PanelView): string {
  const rows = goals.map(({ ok, title, place, bar, valueText, marginText, detail, note }) =>
    `<tr>${cell(`${ok ? '✓' : '✗'} ${title}`, ok ? 'ok' : 'no')}${cell(place, 'left')}<td>${svg('bar', `0 0 ${barSize.width} ${barSize.height}`, goalBar(bar), marginText)}</td>${cell(valueText)}${cell(marginText)}${cell(detail)}</tr>${note && `<tr class="soft"><td></td><td class="left" colspan="5">${escapeText(note)}</td></tr>`}`);
  return `<table><thead><tr><th>goal</th><th class="left">where</th><th>margin</th><th>value</th><th></th><th></th></tr></thead><tbody>${rows.join('')}</tbody></table>`;
}

function legend({ traces, discs, limits, marker }: PanelView): string {
  const lines = traces.map(({ caseName }, i) => `<span>${svg('sample', '0 0 26 8', tag('path', { class: `trace case-${i % 6}`, d: 'M1 4L25 4' }), '')} ${escapeText(caseName)}</span>`);
  const readings = (marker?.cases ?? []).map(({ caseName, text }) => `<li>${escapeText(caseName)}: ${escapeText(text)}</li>`);
  const shapes = [...discs.map(({ label }) => `disc: ${label}`), ...limits.map(({ label }) => `dashed ring: ${label}`)].map((text) => `<span>${escapeText(text)}</span>`);
  return `<p class="soft">${[...lines, ...shapes].join(' · ').replace(/<svg class="sample"/g, '<svg class="sample" width="26" height="8"')}</p>${marker ? `<p>At ${escapeText(marker.text)}:</p><ul>${readings.join('')}</ul>` : ''}`;
}

function ladderTable(rows: readonly LadderRowView[]): string {
  const body = rows.map((row) =>
    `<tr><td><svg width="${symbolSize.width}" height="${symbolSize.height}" viewBox="0 0 ${symbolSize.width} ${symbolSize.height}" aria-hidden="true">${ladderSymbol(row)}</svg></td>${cell(row.name, 'left')}${cell(row.orientation === 'end' ? '' : row.orientation, 'left')}${[row.value, row.reactance, row.impedanceAfter, row.voltage, row.current, row.heat].map((text) => cell(text)).join('')}</tr>`);
  return `<table><thead><tr><th></th><th class="left">element</th><th></th><th>value</th><th>X or B</th><th>Z after, Ω</th><th>peak</th><th>current</th><th>heat</th></tr></thead><tbody>${body.join('')}</tbody></table>`;
}
