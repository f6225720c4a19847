/** How a written table stands to what the description asks for now. */
export type FirmwareState = 'missing' | 'foreign' | 'out of date' | 'current';

/** Which text of the description it was made from: a text that moves no code leaves the table as it is. */
const madeFrom = /^\s*(?:\* ohmward-description [0-9a-f]{16}|"ohmward-description": "[0-9a-f]{16}",)\s*$/;

/** The line by which a table is known as written by this tool; only a file with it may be overwritten. */
const marker = /^\s*(?:\* ohmward-table 1 [0-9a-f]{16}|"ohmward-table": "1 [0-9a-f]{16}",)\s*$/m;

/**
 * `presentText` is null where there is no such file. Blanks between words and beside punctuation do not count, nor do line ends
 * but for those of the preprocessor, as formatters and version control change them; anything else does.
 */
export function firmwareState(expectedText: string, presentText: string | null): FirmwareState {
  if (presentText === null) return 'missing';
  if (!marker.test(presentText)) return 'foreign';
  return inEssence(presentText) === inEssence(expectedText) ? 'current' : 'out of date';
}

const inEssence = (text: string): string => text.replace(/^\uFEFF/, '').split(/\r\n?|\n/)
  .map((line) => line.trim()).filter((line) => !madeFrom.test(line)).map((line) => (line.startsWith('#') ? `\n${line}\n` : ` ${line} `)).join('')
  .replace(/[^\S\n]+/g, ' ').replace(/ ?([{}()[\],;:=]) ?/g, '$1').replace(/ ?\n+ ?/g, '\n').trim();
