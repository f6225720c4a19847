const colours = {
  dark: { paper: '#1f1f1f', ink: '#d4d4d4', faint: '#4a4a4a', soft: '#9a9a9a', good: '#73c991', bad: '#f48771', cases: ['#4daafc', '#d7a24a', '#73c991', '#c586c0', '#f48771', '#9a9a9a'], elements: ['#d7ba7d', '#4ec9b0', '#c586c0', '#4daafc', '#ce9178', '#9cdcfe', '#b5cea8'] },
  light: { paper: '#ffffff', ink: '#3b3b3b', faint: '#d0d0d0', soft: '#6a6a6a', good: '#2d7d3f', bad: '#c72e0f', cases: ['#0062b8', '#965d00', '#2d7d3f', '#8a2a8f', '#c72e0f', '#6a6a6a'], elements: ['#856404', '#007a6c', '#872a8b', '#0062b8', '#a1460b', '#24678d', '#4a7028'] },
} as const;

/** Line styles of the cases, so that none is told by its colour alone. */
export const caseDashes = ['none', '7 4', '2 3', '10 3 2 3', '12 5', '4 2 1 2'] as const;

/** Style for a picture that stands alone, in a file or on paper, without an editor's theme around it. */
export function standaloneStyle(theme: 'dark' | 'light'): string {
  const { paper, ink, faint, soft, good, bad, cases, elements } = colours[theme];
  return [
    `.paper{fill:${paper}}`,
    `text{font:11px sans-serif;fill:${soft}}.designator{fill:${ink};paint-order:stroke;stroke:${paper};stroke-width:3px}`,
    `.grid{fill:none;stroke:${faint};stroke-width:.8}.rim{fill:none;stroke:${soft};stroke-width:1.2}`,
    `.guide{fill:none;stroke:${soft};stroke-width:.8;stroke-dasharray:1 4}`,
    `.limit{fill:none;stroke:${ink};stroke-width:1.2;stroke-dasharray:4 2.5}`,
    `.disc{fill:${good};fill-opacity:.12;stroke:${good};stroke-width:1}`,
    '.trace{fill:none;stroke-width:1.4}.in-band{stroke-width:4}.in-band.watched{stroke-width:2.6}',
    ...cases.map((colour, i) => `.case-${i}{stroke:${colour};stroke-dasharray:${caseDashes[i]}}.in-band.case-${i}{stroke-dasharray:none}.marker-dot.case-${i}{fill:${colour};stroke:${paper};stroke-dasharray:none}`),
    '.arc{fill:none;stroke-width:2.4}',
    ...elements.map((colour, i) => `.element-${i}{stroke:${colour}}`),
    `.joint{fill:${paper};stroke:${ink};stroke-width:1.3}`,
    `.cloud{fill:none;stroke:${cases[0]};stroke-width:.8;stroke-opacity:.35}.hatch{stroke:${good};stroke-width:1.6}.covered{stroke:${good};stroke-width:1.4}.case-cross{fill:none;stroke-width:2.4}`,
    `.stairs{fill:none;stroke-width:2}.chosen{fill:${ink};fill-opacity:.12;stroke:${ink};stroke-width:.8}`,
    `.bar-held{fill:${good}}.bar-missed{fill:${bad}}.bar-limit{stroke:${ink};stroke-width:1.5}.corner-mark{fill:${ink}}`,
    `.band{fill:${cases[0]};fill-opacity:.14}.marker-line{stroke:${ink};stroke-dasharray:2 3}.mask{fill:none;stroke-width:3}.mask.held{stroke:${good}}.mask.missed{stroke:${bad}}.mask-sign{fill:${bad}}`,
  ].join('');
}
