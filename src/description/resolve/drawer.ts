import { nearestWord } from '../../base/nearestWord';
import type { Diagnostic } from '../../base/diagnostic';
import type { Located } from '../../base/span';
import type { NetworkData } from '../../network/networkData';
import type { PartKind } from '../../network/part';
import { diagnosticsAtMost, familyMembersAtMost } from '../limits';
import { plainPhrase } from '../phrase/phrase';
import { readPartPhrase } from '../phrase/readPart';
import type { FiguresSyntax } from '../syntax';
import { checkFigures, mergeFigures } from './makePart';
import { measuredValue } from './measuredValue';
import { parseCsv, type CsvRow } from './parseCsv';
import { doubtAt, problemAt, type Resolution, type ResolvedMember } from './resolution';
import { pathBeside } from './pathBeside';
import { resolveFile } from './resolveFile';

const columns = ['kind', 'value', 'tolerance', 'q', 'q_at', 'esr', 'esl', 'srf', 'rated', 'count', 'part', 'file'] as const;
type Column = (typeof columns)[number];
type Cells = Readonly<Partial<Record<Column, string>>>;

const kindWords: Readonly<Record<string, PartKind>> = {
  resistor: 'resistor', r: 'resistor', inductor: 'inductor', l: 'inductor', capacitor: 'capacitor', c: 'capacitor',
};

/** Mistakes of one file that are told one by one. */
const mistakesAtMost = diagnosticsAtMost;

type Base = Pick<Resolution, 'files' | 'report' | 'missing'>;

/**
 * The parts of a CSV file, in the order of its rows. Mistakes are told at the file's path in the description, with the
 * line of the CSV; a row with one is left out. Null where the file as a whole cannot be used.
 */
export function readDrawer(path: Located<string>, text: string, familyFigures: FiguresSyntax, base: Base): ResolvedMember[] | null {
  let mistakes = 0;
  const tell = (line: number | null, message: string, severity: Diagnostic['severity'] = 'error'): void => {
    if (++mistakes > mistakesAtMost) return;
    const place = line === null ? path.value : `${path.value}, line ${line}`;
    base.report({ ...problemAt('csv', `${place}: ${message}`, path.span), severity });
  };
  const parsed = parseCsv(text);
  if (!parsed.ok) {
    tell(parsed.line, `${parsed.message}.`);
    return null;
  }
  for (const { line, message } of parsed.mistakes) tell(line, `${message}.`);
  const [header, ...rows] = parsed.rows;
  const order = header && readHeader(header, tell);
  if (!order) {
    if (!header) tell(null, 'the file is empty; its first line is «kind,value», optionally with further columns.');
    return null;
  }
  if (rows.length > familyMembersAtMost) tell(rows[familyMembersAtMost].line, `more than ${familyMembersAtMost} parts; the rows from here on are left out.`, 'warning');
  const members = rows.slice(0, familyMembersAtMost).flatMap((row): ResolvedMember[] => {
    const member = readRow(row, order, path, familyFigures, base, (message) => tell(row.line, message));
    return member ? [member] : [];
  });
  if (mistakes > mistakesAtMost) base.report(doubtAt('csv', `${path.value}: ${mistakes - mistakesAtMost} more mistakes like these.`, path.span));
  return members;
}

function readHeader({ line, cells }: CsvRow, tell: (line: number, message: string, severity?: Diagnostic['severity']) => void): (Column | null)[] | null {
  const order = cells.map((cell): Column | null => {
    const word = cell.toLowerCase();
    const column = columns.find((each) => each === word) ?? null;
    if (column === null) {
      const nearest = nearestWord(word, columns);
      tell(line, `the column «${cell}» is not known${nearest ? `; did you mean «${nearest}»?` : ` and is not read. Known: ${columns.join(', ')}.`}`, 'warning');
    }
    return column;
  });
  const twice = order.find((column, i) => column !== null && order.indexOf(column) !== i);
  if (twice) {
    tell(line, `the column «${twice}» stands here twice.`);
    return null;
  }
  const lacking = (['kind', 'value'] as const).filter((column) => !order.includes(column));
  if (lacking.length === 0) return order;
  tell(line, `the header row needs the columns «kind» and «value»; ${lacking.map((column) => `«${column}»`).join(' and ')} ${lacking.length > 1 ? 'are' : 'is'} missing.`);
  return null;
}

function readRow(
  row: CsvRow, order: readonly (Column | null)[], csv: Located<string>, familyFigures: FiguresSyntax, base: Base, tell: (message: string) => void,
): ResolvedMember | null {
  if (row.cells.slice(order.length).some((cell) => cell !== '')) {
    tell('more fields than the header has; a field with a comma in it stands in double quotes.');
    return null;
  }
  const cells: Cells = Object.fromEntries(order.flatMap((column, i) => (column && row.cells[i] ? [[column, row.cells[i]]] : [])));
  const kind = Object.hasOwn(kindWords, (cells.kind ?? '').toLowerCase()) ? kindWords[(cells.kind ?? '').toLowerCase()] : null;
  if (!kind) {
    tell(`the kind is «inductor», «capacitor» or «resistor», not «${cells.kind ?? ''}».`);
    return null;
  }
  const count = readCount(cells.count, tell);
  if (count === undefined) return null;
  const { data, waiting } = rowData(cells, csv, base);
  if (waiting) return null;
  const stated = cells.value ? readValue(kind, cells, tell) : null;
  if (cells.value && !stated) return null;
  const value = stated?.value ?? (data ? measuredValue(kind, data) : null);
  if (value === null) {
    tell('no value.');
    return null;
  }
  const figures = mergeFigures(stated?.figures ?? familyFigures, familyFigures);
  return { kind, value, figures, label: cells.part ?? null, count, data };
}

/** Undefined where it is wrong. */
function readCount(cell: string | undefined, tell: (message: string) => void): number | null | undefined {
  if (cell === undefined) return null;
  if (/^\d{1,9}$/.test(cell)) return Number(cell);
  tell(`the count is a whole number, not «${cell}».`);
  return undefined;
}

/** The file of a row; `waiting` where it has not been read yet or cannot be (then the row has no part). */
function rowData({ file }: Cells, csv: Located<string>, base: Base): { data: NetworkData | null; waiting: boolean } {
  if (!file) return { data: null, waiting: false };
  const path = pathBeside(csv.value, file);
  if (!base.files.has(path)) {
    base.missing.push({ path, span: csv.span, kind: 'touchstone', within: csv.value });
    return { data: null, waiting: true };
  }
  const { data } = resolveFile({ value: path, span: csv.span }, base);
  if (data && data.ports !== 2) {
    base.report(problemAt('port', `${path}: a part is measured in series between two ports; this file has ${data.ports}.`, csv.span));
    return { data: null, waiting: true };
  }
  return { data, waiting: data === null };
}

/** The cells as one phrase, so that they are read by the same rules as a part in the description. */
function readValue(kind: PartKind, cells: Cells, tell: (message: string) => void): { value: number; figures: FiguresSyntax } | null {
  if (Object.values(cells).some((cell) => cell.startsWith('='))) {
    tell('an expression has no place in a file of parts.');
    return null;
  }
  const figures = [
    cells.tolerance && (/^[\d.]/.test(cells.tolerance) ? `±${cells.tolerance}` : cells.tolerance),
    cells.q && `Q ${cells.q}${cells.q_at ? ` @ ${cells.q_at}` : ''}`,
    cells.esr && `ESR ${cells.esr}`, cells.esl && `ESL ${cells.esl}`, cells.srf && `SRF ${cells.srf}`,
    cells.rated && (/^rated\b/.test(cells.rated) ? cells.rated : `rated ${cells.rated}`),
  ];
  let good = true;
  const report = (diagnostic: Diagnostic): void => {
    tell(diagnostic.message);
    if (diagnostic.severity === 'error') good = false;
  };
  const phrase = plainPhrase([cells.value, ...figures].filter(Boolean).join(' '));
  const part = readPartPhrase(phrase, kind, { report, lets: new Map(), expressions: false });
  if (part.value.form !== 'known') {
    if (good) tell(`«${cells.value}» is not a value.`);
    return null;
  }
  if (part.kind !== null && part.kind !== kind) {
    tell(`«${cells.value}» is not the value of ${kind === 'inductor' ? 'an' : 'a'} ${kind}.`);
    return null;
  }
  const checked = checkFigures(kind, part.figures, { report });
  if (good && !(part.value.value > 0 || (kind === 'resistor' && part.value.value === 0))) {
    tell('the value is above zero.');
    return null;
  }
  return good ? { value: part.value.value, figures: checked } : null;
}
