import { CsvError, parse } from 'csv-parse/browser/esm/sync';
import { csvTextAtMost } from '../limits';

export interface CsvRow {
  /** From 1. */
  readonly line: number;
  readonly cells: readonly string[];
}

/** A row that is left out. */
export interface CsvMistake {
  readonly message: string;
  readonly line: number | null;
}

export type CsvResult = { readonly ok: true; readonly rows: readonly CsvRow[]; readonly mistakes: readonly CsvMistake[] } | { readonly ok: false; readonly message: string; readonly line: number | null };

/** The rows of a CSV text (RFC 4180: commas, quotes doubled, quoted line ends; a byte order mark and any line end allowed), header included; what is not one is told and left out. */
export function parseCsv(text: string): CsvResult {
  if (text.length > csvTextAtMost) return { ok: false, message: `more than ${csvTextAtMost} characters`, line: null };
  const mistakes: CsvMistake[] = [];
  const mistake = (error: CsvError): CsvMistake =>
    ({ message: csvMessages[error.code] ?? 'not a row as RFC 4180 describes it', line: 'lines' in error && typeof error.lines === 'number' ? error.lines : null });
  // An open quotation mark is found twice: at the line where it stands, and at the end.
  const note = (found: CsvMistake): void => { if (mistakes.at(-1)?.line !== found.line) mistakes.push(found); };
  try {
    const records: unknown = parse(text, { bom: true, relax_column_count: true, skip_empty_lines: true, info: true, record_delimiter: ['\r\n', '\n', '\r'],
      skip_records_with_error: true, on_skip: (error) => void (error && note(mistake(error))),
    });
    const rows = (records as { record: string[]; info: { lines: number } }[]).map(({ record, info }) => ({ line: info.lines, cells: record.map((cell) => cell.trim()) }));
    return { ok: true, rows: rows.filter((row) => row.cells.some((cell) => cell !== '')), mistakes };
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    return { ok: false, ...mistake(error) };
  }
}

const csvMessages: Readonly<Partial<Record<string, string>>> = {
  CSV_QUOTE_NOT_CLOSED: 'a quotation mark is never closed',
  CSV_INVALID_CLOSING_QUOTE: 'after a closing quotation mark comes a comma or the end of the line; a mark inside is doubled',
  INVALID_OPENING_QUOTE: 'a quotation mark inside a field that does not begin with one',
  CSV_MAX_RECORD_SIZE: 'a line that is too long',
};
