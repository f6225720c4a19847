import type { ScalarStyle } from './tree/treeNode';

/** True where a text can stand as it is, without quotes, as one scalar. */
export function isPlainSafe(text: string, flow: boolean): boolean {
  if (text === '' || text !== text.trim() || /[\u0000-\u001f\u007f]/.test(text)) return false;
  if (/^[-?:](\s|$)|^[,[\]{}#&*!|>'"%@`]/.test(text) || /:(\s|$)|\s#/.test(text) || /^(---|\.\.\.)/.test(text)) return false;
  return !flow || !/[,[\]{}]|:(?=["'])/.test(text);
}

/** A phrase as a scalar: plain where it can be, else in quotes. Line ends become spaces. */
export function writeScalar(text: string, flow: boolean): string {
  const line = text.replace(/\s*[\n\r]+\s*/g, ' ').trim();
  if (isPlainSafe(line, flow)) return line;
  return /["\\\u0000-\u001f\u007f]/.test(line) && !/[\u0000-\u001f\u007f]/.test(line) ? `'${line.replace(/'/g, "''")}'` : `"${escapeDouble(line)}"`;
}

/** A piece of text for the inside of a scalar of this style. */
export function escapeFor(text: string, style: ScalarStyle): string {
  if (style === 'double') return escapeDouble(text);
  return style === 'single' ? text.replace(/'/g, "''") : text;
}

const escapeDouble = (text: string) => text.replace(/["\\]/g, '\\$&').replace(/[\u0000-\u001f\u007f]/g, (char) => `\\x${char.charCodeAt(0).toString(16).padStart(2, '0')}`);
