import type { CandidatesView, CodesView, LadderRowView, PanelView, SpreadView } from '../messages/panel';
import { codeStairs, stairsSize } from '../picture/codeStairs';
import { coverageChart } from '../picture/coverageChart';
import { barSize, goalBar } from '../picture/goalBar';
import { histogramPicture, histogramSize } from '../picture/histogram';
import { ladderSymbol, symbolSize } from '../picture/ladderSymbol';
import { chartViewBox } from '../picture/smithChart';
import { escapeText, tag } from '../picture/svg';

/** An SVG that stands for itself, with what a screen reader says of it. */
export const picture = (name: string, viewBox: string, content: string, label: string): string =>
  `<svg class="${name}" viewBox="${viewBox}" role="img" aria-label="${escapeText(label)}">${content}</svg>`;

const cell = (text: string, kind = ''): string => `<td${kind && ` class="${kind}"`}>${escapeText(text)}</td>`;

interface Column {
  readonly head: string;
  readonly left?: boolean;
}

/** Wide ones are scrolled within their frame, by keys too. */
const table = (label: string, columns: readonly Column[], rows: readonly string[]): string =>
  `<div class="frame" tabindex="0" role="region" aria-label="${label}"><table><thead><tr>${columns.map(({ head, left }) => `<th scope="col"${left ? ' class="left"' : ''}>${escapeText(head)}</th>`).join('')}</tr></thead><tbody>${rows.join('')}</tbody></table></div>`;

const paragraphs = (texts: readonly string[]): string => texts.filter((text) => text !== '').map((text) => `<p>${escapeText(text)}</p>`).join('');

export function goalsTable({ goals }: Pick<PanelView, 'goals'>): string {
  const rows = goals.map(({ ok, known, title, place, bar, valueText, marginText, detail, note }) =>
    `<tr><td><span class="${ok ? 'ok' : known ? 'no' : 'soft'}">${ok ? '✓' : known ? '✗' : '?'}</span> ${escapeText(title)}</td>${cell(place, 'left')}${cell(valueText)}<td>${bar === null ? '' : `<svg class="bar" viewBox="0 0 ${barSize.width} ${barSize.height}" aria-hidden="true">${goalBar(bar)}</svg>`}</td>${cell(marginText)}${cell(detail.replace(/^worst: /, ''), 'left wide')}</tr>${note && `<tr class="soft"><td></td><td class="left" colspan="5">${escapeText(note)}</td></tr>`}`);
  return goals.length === 0 ? '<p class="soft">The description states no goals.</p>' : table('Goals', [{ head: 'goal' }, { head: 'where', left: true }, { head: 'value' }, { head: '' }, { head: 'margin' }, { head: 'worst at', left: true }], rows);
}

export function legend({ traces, bands, discs, limits, marker, spread }: Pick<PanelView, 'traces' | 'bands' | 'discs' | 'limits' | 'marker' | 'spread'>): string {
  const lines = traces.map(({ caseName }, i) => `<span><svg class="sample" width="26" height="8" viewBox="0 0 26 8" aria-hidden="true">${tag('path', { class: `trace case-${i % 6}`, d: 'M1 4L25 4' })}</svg> ${escapeText(caseName)}</span>`);
  const readings = (marker?.cases ?? []).map(({ caseName, text }) => `${traces.length > 1 ? `${escapeText(caseName)}: ` : ''}${escapeText(text)}`);
  const shapes = [...(bands.length > 0 ? ['thick: in band'] : []), ...discs.map(({ label }) => `disc: ${label}`), ...limits.map(({ label }) => `dashed ring: ${label}`), ...((spread?.cloud.length ?? 0) > 0 ? [`thin lines: builds with tolerances${traces.length > 1 ? `, ${traces[0].caseName}` : ''}`] : []),
    ...(marker && marker.cases.length > 1 && marker.cases[0].steps.length > 0 ? [`arcs: ${marker.cases[0].caseName}`] : [])];
  return `<p class="soft">${[...lines, ...shapes.map((text) => `<span>${escapeText(text)}</span>`)].join(' · ')}</p>${marker === null ? '' : readings.length === 1 ? `<p>At ${escapeText(marker.text)}: ${readings[0]}</p>` : `<p>At ${escapeText(marker.text)}:</p><ul>${readings.map((reading) => `<li>${reading}</li>`).join('')}</ul>`}`;
}

export function ladderTable(rows: readonly LadderRowView[]): string {
  const body = rows.map((row) =>
    `<tr><td><svg width="${symbolSize.width}" height="${symbolSize.height}" viewBox="0 0 ${symbolSize.width} ${symbolSize.height}" aria-hidden="true">${ladderSymbol(row)}</svg></td>${cell(row.name, 'left')}${cell(row.orientation === 'end' ? '' : row.orientation, 'left')}${[row.value, row.reactance, row.impedanceAfter, row.voltage, row.current, row.heat, row.loss, row.sensitivity].map((text) => cell(text)).join('')}</tr>${row.note && `<tr class="soft"><td></td><td class="left" colspan="10">${escapeText(row.note)}</td></tr>`}`);
  return table('Ladder', [{ head: '' }, { head: 'element', left: true }, { head: '' }, ...['value', 'X or B', 'Z after, Ω', 'peak', 'current', 'heat', 'loss', 'dB per 1 %'].map((head) => ({ head }))], body);
}

export function candidatesTable({ message, notes, outOfReach, candidates }: CandidatesView, id: string): string {
  const rows = candidates.map(({ values, holds, margin, returnLoss, gain, parts, response, directCurrent, note, proof }) =>
    `<tr>${cell(values)}${cell(`${holds ? '✓' : '✗'} ${margin}`, holds ? 'ok' : 'no')}${[returnLoss, gain, parts, response, directCurrent].map((text) => cell(text)).join('')}${cell([note, proof].filter((text) => text !== '').join(' · '), 'left')}</tr>`);
  return `<h2>Candidates</h2>${paragraphs([message])}${rows.length === 0 ? '' : table('Candidates', [{ head: 'values' }, ...['margin', 'worst return loss', 'worst gain', 'parts', 'response', 'direct current'].map((head) => ({ head })), { head: 'remark', left: true }], rows)}${notes.length === 0 ? '' : `<ul class="soft">${notes.map((text) => `<li>${escapeText(text)}</li>`).join('')}</ul>`}${reachOf(outOfReach, id)}`;
}

function reachOf(forms: CandidatesView['outOfReach'], id: string): string {
  const items = forms.map(({ text, reach }, at) =>
    `<li>${reach ? picture('reach', chartViewBox, coverageChart(reach, `${id}-reach-${at}`, 18), `Smith chart. ${reach.text}, hatched; the load lies outside.`) : ''}<span>${escapeText(text)}</span></li>`);
  return items.length === 0 ? '' : `<h3>Forms out of reach; hatched are the loads that each does match</h3><ul class="reaches">${items.join('')}</ul>`;
}

export function codesSection(codes: CodesView, id: string): string {
  const { summary, tunables, channels, shown, stepsText, proof, firmware, coverage, coverageText } = codes;
  const size = stairsSize(codes);
  const rows = channels.map(({ text, codes: own, holds, margin, returnLoss, gain }, at) =>
    `<tr${at === shown ? ' class="chosen"' : ''}>${cell(text)}${own.map((code) => cell(String(code))).join('')}${cell(`${holds ? '✓' : '✗'} ${margin}`, holds ? 'ok' : 'no')}${cell(returnLoss)}${cell(gain)}</tr>`);
  const covered = coverage === null ? '' : `<div class="whole"><h3>Coverage</h3><p>${escapeText(coverage.text)} (hatched). A dot is a load case that is covered, a cross one that is not.</p>${picture('chart', chartViewBox, coverageChart(coverage, id), `Smith chart of the loads. ${coverage.text}.`)}<ul>${coverage.cases.map(({ caseName, text }) => `<li>${escapeText(caseName)}: ${escapeText(text)}</li>`).join('')}</ul></div>`;
  return [
    `<h2>Codes by channel</h2>${paragraphs([summary, proof, stepsText, ...firmware.map(({ path, text }) => `Table ${path}: ${text}`)])}`,
    picture('plot', `0 0 ${size.width} ${size.height}`, codeStairs(codes), `Codes of ${tunables.map(({ name }) => name).join(' and ')}, and the margin, over the channels`),
    table('Codes by channel', [{ head: 'channel' }, ...tunables.map(({ name }) => ({ head: name })), { head: 'margin' }, { head: 'return loss' }, { head: 'gain' }], rows),
    covered, coverage === null ? paragraphs([coverageText]) : '',
  ].join('\n');
}

export function spreadSection(spread: SpreadView): string {
  return [
    `<div class="whole"><h2>Spread of builds</h2>${paragraphs([spread.yieldText])}`,
    picture('plot', `0 0 ${histogramSize.width} ${histogramSize.height}`, histogramPicture(spread), 'Histogram of the worst margins of builds'),
    `${paragraphs([spread.goalsText, spread.cornerText, spread.remedyText])}</div>`,
  ].join('\n');
}
