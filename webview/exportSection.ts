import type { CodesView, LadderRowView, PanelView } from '../src/messages/panel';
import { chartBox, chartViewBox, smithChart } from '../src/picture/smithChart';
import { standaloneStyle } from '../src/picture/standaloneStyle';
import type { Actions } from './actions';
import type { Controls } from './controls';
import { element } from './dom';

const pixelsPerUnit = 3;

/** Copies and files of what the panel shows. */
export function exportSection(controls: Controls, actions: Actions) {
  let view: PanelView | null = null;
  const withView = (work: (shown: PanelView) => void) => () => { if (view) work(view); };
  const codesButton = controls.button({ label: 'Copy codes as CSV', onPress: withView((shown) => { if (shown.codes) actions.copy('codes csv', codesCsv(shown.codes)); }) });
  const buttons = [
    controls.button({ label: 'Save report', primary: true, onPress: actions.saveReport }),
    controls.button({ label: 'Copy chart as SVG', onPress: withView((shown) => actions.copy('chart svg', chartSvg(shown))) }),
    controls.button({ label: 'Save chart as SVG', onPress: withView((shown) => actions.save('chart svg', toBase64(new TextEncoder().encode(chartSvg(shown))))) }),
    controls.button({ label: 'Save chart as PNG', onPress: withView((shown) => void chartPng(shown).then((base64) => actions.save('chart png', base64))) }),
    controls.button({ label: 'Copy ladder as CSV', onPress: withView((shown) => actions.copy('ladder csv', ladderCsv(shown.ladder, shown.notInserted))) }),
    controls.button({ label: 'Copy ladder as Markdown', onPress: withView((shown) => actions.copy('ladder markdown', ladderMarkdown(shown.ladder, shown.notInserted))) }),
    codesButton,
  ];
  return {
    root: element('section', { class: 'exports', 'aria-label': 'Copy or save' }, ...buttons),
    update(next: PanelView) {
      view = next;
      codesButton.hidden = next.codes === null;
    },
  };
}

const isDark = () => document.body.classList.contains('vscode-dark') || (document.body.classList.contains('vscode-high-contrast') && !document.body.classList.contains('vscode-high-contrast-light'));

function chartSvg(view: PanelView): string {
  const size = `width="${2 * chartBox.width}" height="${2 * chartBox.height}"`;
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="${chartViewBox}" ${size}><style>${standaloneStyle(isDark() ? 'dark' : 'light')}</style><rect class="paper" x="${chartBox.x}" y="${chartBox.y}" width="${chartBox.width}" height="${chartBox.height}"/>${smithChart(view)}</svg>`;
}

async function chartPng(view: PanelView): Promise<string> {
  const address = URL.createObjectURL(new Blob([chartSvg(view)], { type: 'image/svg+xml' }));
  try {
    const image = new Image();
    image.src = address;
    await image.decode();
    const canvas = element('canvas', { width: chartBox.width * pixelsPerUnit, height: chartBox.height * pixelsPerUnit });
    canvas.getContext('2d')!.drawImage(image, 0, 0, canvas.width, canvas.height);
    return canvas.toDataURL('image/png').split(',')[1];
  } finally {
    URL.revokeObjectURL(address);
  }
}

function toBase64(bytes: Uint8Array): string {
  let binary = '';
  for (const byte of bytes) binary += String.fromCharCode(byte);
  return btoa(binary);
}

const head = ['element', 'orientation', 'value', 'X or B', 'Z after', 'peak', 'current', 'heat', 'loss', 'dB per 1 %'];
const cellsOf = (row: LadderRowView) => [row.name, row.orientation === 'end' ? '' : row.orientation, row.value, row.reactance, row.impedanceAfter, row.voltage, row.current, row.heat, row.loss, row.sensitivity];

/** What is said where the values come from the best candidate. */
const notInserted = 'best candidate, not inserted';

const quoted = (text: string) => (/[",\n]/.test(text) ? `"${text.replace(/"/g, '""')}"` : text);
const csv = (rows: readonly (readonly string[])[]) => rows.map((cells) => cells.map(quoted).join(',')).join('\r\n') + '\r\n';

const ladderCsv = (rows: readonly LadderRowView[], isCandidate: boolean) =>
  csv([isCandidate ? [...head, 'remark'] : head, ...rows.map((row) => (isCandidate ? [...cellsOf(row), notInserted] : cellsOf(row)))]);

/** Frequencies in Hz, codes as numbers: for programs more than for people. */
const codesCsv = ({ tunables, channels }: CodesView) =>
  csv([['frequency_hz', ...tunables.map(({ name }) => name), 'margin_db'], ...channels.map(({ frequencyHz, codes, marginDb }) => [String(frequencyHz), ...codes.map(String), marginDb === null ? '' : String(marginDb)])]);

function ladderMarkdown(rows: readonly LadderRowView[], isCandidate: boolean): string {
  const line = (cells: readonly string[]) => `| ${cells.map((cell) => cell.replace(/\|/g, '\\|')).join(' | ')} |`;
  return [line(head), line(head.map(() => '---')), ...rows.map((row) => line(cellsOf(row))), ...(isCandidate ? ['', `(${notInserted})`] : [])].join('\n') + '\n';
}
