import type { CoilSyntax } from '../syntax';
import { quantityAt } from './readQuantity';
import { complain, spanOf, take, takeWord, type Scanner } from './scanner';

/** After the word `coil`: `6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm`. Null (reported) where it cannot be wound. */
export function coilAt(s: Scanner, start: number): CoilSyntax | null {
  const turns = quantityAt(s, ['number']);
  if (!turns) return null;
  if (!takeWord(s, 'turns') && !takeWord(s, 'turn')) {
    complain(s, 'coil', 'A winding is «coil 6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm».', spanOf(s, start, s.at));
    return null;
  }
  const sizes = new Map<string, number>();
  while (take(s, /,(?=\s*(?:diameter|length|wire)(?![\p{L}]))/uy)) {
    const word = (['diameter', 'length', 'wire'] as const).find((name) => takeWord(s, name))!;
    const size = quantityAt(s, ['length']);
    if (!size) return null;
    if (sizes.has(word)) complain(s, 'figure-twice', `The ${word} is stated twice.`, size.span);
    sizes.set(word, size.value);
  }
  const span = spanOf(s, start, s.at);
  const missing = ['diameter', 'length', 'wire'].filter((word) => !sizes.has(word));
  const [diameterM = 0, lengthM = 0, wireM = 0] = ['diameter', 'length', 'wire'].map((word) => sizes.get(word));
  const wrong = missing.length > 0 ? `A winding needs its ${missing.join(', ')}: «coil 6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm».`
    : !(turns.value > 0 && diameterM > 0 && lengthM > 0 && wireM > 0) ? 'Turns and sizes of a winding are greater than zero.'
      : wireM >= diameterM ? 'The wire is thicker than the winding is wide.'
        : turns.value * wireM > lengthM * (1 + 1e-9) && turns.value > 1 ? 'So many turns of this wire do not fit into the length.' : null;
  if (wrong) {
    complain(s, 'coil', wrong, span);
    return null;
  }
  return { span, turns: turns.value, diameterM, lengthM, wireM };
}
