import { refuse } from './touchstoneResult';

const exclamation = 33;
const tab = 9;
const tilde = 126;

/**
 * Where the comment of a line begins, its end where it has none. The text before is plain ASCII afterwards; anything else there is
 * refused. `foreign` is called where the comment has other characters, which do no harm.
 */
export function contentEnd(bytes: Uint8Array, start: number, stop: number, foreign: (message: string) => void): number {
  for (let at = start; at < stop; at++) {
    const byte = bytes[at];
    if (byte === exclamation) {
      skipText(bytes, at, stop, 'the comment', foreign);
      return at;
    }
    if (byte > tilde || (byte < 32 && byte !== tab)) refuse(strangeByte(bytes, at, stop));
  }
  return stop;
}

/** Text that is not read: anything but a binary file's zeros. */
export function skipText(bytes: Uint8Array, start: number, stop: number, what: string, foreign: (message: string) => void): void {
  let other = false;
  for (let at = start; at < stop; at++) {
    if (bytes[at] === 0) refuse(notText);
    if (bytes[at] > tilde || (bytes[at] < 32 && bytes[at] !== tab)) other = true;
  }
  if (!other) return;
  foreign(decodes(bytes.subarray(start, stop)) ? `${what} has characters outside ASCII` : `${what} is not UTF-8 text`);
}

export const asciiText = (bytes: Uint8Array, start: number, end: number): string => new TextDecoder('latin1').decode(bytes.subarray(start, end));

const notText = 'the file is not plain text (it has a zero byte)';

/** How a byte outside ASCII looks to whoever opens the file. */
function strangeByte(bytes: Uint8Array, at: number, stop: number): string {
  const byte = bytes[at];
  if (byte === 0) return notText;
  if (byte < 32 || byte === 127) return `a control character (code ${byte}) stands among the data`;
  const length = byte >= 0xf0 ? 4 : byte >= 0xe0 ? 3 : 2;
  const piece = bytes.subarray(at, Math.min(at + length, stop));
  if ((byte === 0xff && bytes[at + 1] === 0xfe) || (byte === 0xfe && bytes[at + 1] === 0xff)) return 'the file is UTF-16; Touchstone files are plain ASCII';
  if (!decodes(piece)) return `the file is neither ASCII nor UTF-8 text (a byte of ${byte} stands among the data)`;
  // A byte order mark in the middle is a character like any other.
  const character = new TextDecoder('utf-8', { ignoreBOM: true }).decode(piece);
  const code = `U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}`;
  if (code === 'U+00A0') return 'a no-break space (U+00A0) stands among the data; a plain space is meant';
  if (code === 'U+2212') return 'a minus sign of the typesetter (U+2212) stands among the data; a hyphen is meant';
  return `a character outside ASCII stands among the data: ${/[\p{L}\p{N}\p{P}\p{S}]/u.test(character) ? `${character} (${code})` : code}`;
}

function decodes(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return true;
  } catch (error) {
    if (error instanceof TypeError) return false;
    throw error;
  }
}
