import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { uniformInt } from 'pure-rand/distribution/uniformInt';

/** Whole numbers from 0 to below `n`, the same for the same seed. */
export type Dice = (n: number) => number;

export function dice(seed: number): Dice {
  const generator = xoroshiro128plus(seed);
  return (n) => uniformInt(generator, 0, Math.max(n - 1, 0));
}

const pieces = [
  ':', ': ', ' ', '\n', '\t', '-', '- ', '#', ' #', '"', "'", '[', ']', '{', '}', ',', '|', '||', '>', '&a ', '*a', '!t ', '<<', '?', '? ', '%', '@', '`', '\\', '---\n', '...\n', '\u0000', '\ufeff', '\u2028',
  '\ud800', '𝕏', 'Ω', 'µ', '−', '×', '≥', '°', '..', ' .. ', '=', '= (', '(', ')', '+', '+ ', '±', '@ ', '0', '1e999', '-1', '0x', '0b2', '9'.repeat(400), '1e-400', 'NaN', 'Infinity', 'null', 'solve', 'solve up to 9 elements',
  'from', 'pair', 'or none', 'into', 'for', 'at', 'in', 'wants', 'gamma', 'open', 'short', 'differential', 'port 0', 'port 99', 'step 0 Hz', ', 0 points', ', 99999999 points', 'watch', 'tunable', 'coil 0 turns', 'Q 0', 'Q -1', 'ESR', 'SRF', 'rated',
  'fixture:', 'ladder:', 'bands:', 'load:', 'goals:', 'constructor', '__proto__', 'toString', 'hasOwnProperty',
];

/** A text with a few changes: characters and lines taken out, doubled, moved, and pieces of the language put in. */
export function mutateText(text: string, roll: Dice): string {
  let result = text;
  for (let count = 1 + roll(6); count > 0; count--) result = mutateOnce(result, roll);
  return result;
}

function mutateOnce(text: string, roll: Dice): string {
  const at = roll(text.length + 1);
  const lines = text.split('\n');
  const line = roll(lines.length);
  switch (roll(9)) {
    case 0: return text.slice(0, at) + text.slice(at + 1 + roll(4));
    case 1: return text.slice(0, at) + pieces[roll(pieces.length)] + text.slice(at);
    case 2: return text.slice(0, at) + pieces[roll(pieces.length)] + text.slice(at + 1 + roll(8));
    case 3: return lines.filter((_, i) => i !== line).join('\n');
    case 4: return [...lines.slice(0, line), lines[roll(lines.length)], ...lines.slice(line)].join('\n');
    case 5: return [...lines.slice(0, line), `${' '.repeat(roll(7))}${lines[line].trimStart()}`, ...lines.slice(line + 1)].join('\n');
    case 6: return text.slice(0, at);
    case 7: return text.slice(0, at) + String.fromCharCode(roll(0x10000)) + text.slice(at);
    default: return text.replace(/\d+/g, (digits) => (roll(12) === 0 ? ['0', '-1', '1e308', '1e-300', `${digits}${digits}`][roll(5)] : digits));
  }
}
