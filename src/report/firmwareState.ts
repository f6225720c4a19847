/** How a written table stands to what the description asks for now. */
export type FirmwareState = 'missing' | 'foreign' | 'out of date' | 'current';

/** The line by which a table is known as written by this tool; only a file with it may be overwritten. */
const marker = /^\s*(?:\* ohmward-table 1 [0-9a-f]{16}|"ohmward-table": "1 [0-9a-f]{16}",)\s*$/m;

/**
 * `presentText` is null where there is no such file. Blanks and line ends do not count, as formatters and version control
 * change them; anything else does.
 */
export function firmwareState(expectedText: string, presentText: string | null): FirmwareState {
  if (presentText === null) return 'missing';
  if (!marker.test(presentText)) return 'foreign';
  return withoutBlanks(presentText) === withoutBlanks(expectedText) ? 'current' : 'out of date';
}

const withoutBlanks = (text: string): string => text.replace(/^\uFEFF|\s+/g, '');
