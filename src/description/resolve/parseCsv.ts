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
  const tell = (error: CsvError, line: number | null): void =>
    void mistakes.push({ message: csvMessages[error.code] ?? 'not a row as RFC 4180 describes it', line: line ?? ('lines' in error && typeof error.lines === 'number' ? error.lines : null) });
  // First with quotation marks wherever they stand, so that a wrong one takes no other row with it; then each row as it should be.
  const records = parse(text, { ...form, relax_quotes: true, raw: true, skip_records_with_error: true, on_skip: (error) => { if (error) tell(error, null); } }) as unknown as { raw: string; record: string[]; info: { lines: number } }[];
  const rows = records.flatMap(({ raw, record, info: { lines } }): CsvRow[] => {
    try {
      if (raw.includes('"')) parse(raw, form);
    } catch (error) {
      if (!(error instanceof CsvError)) throw error;
      tell(error, lines);
      return [];
    }
    return [{ line: lines, cells: record.map((cell) => cell.trim()) }];
  });
  return { ok: true, rows: rows.filter((row) => row.cells.some((cell) => cell !== '')), mistakes: mistakes.sort((a, b) => (a.line ?? 0) - (b.line ?? 0)) };
}

const form = { bom: true, relax_column_count: true, skip_empty_lines: true, info: true, record_delimiter: ['\r\n', '\n', '\r'] };

const csvMessages: Readonly<Partial<Record<string, string>>> = {
  CSV_QUOTE_NOT_CLOSED: 'a quotation mark is never closed',
  CSV_INVALID_CLOSING_QUOTE: 'after a closing quotation mark comes a comma or the end of the line; a mark inside is doubled',
  INVALID_OPENING_QUOTE: 'a quotation mark inside a field that does not begin with one',
  CSV_MAX_RECORD_SIZE: 'a line that is too long',
};
