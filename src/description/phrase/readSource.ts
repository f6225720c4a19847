import type { ImpedanceSyntax } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { impedanceAt } from './readImpedance';
import { expectEnd, scanner, takeWord } from './scanner';

/** `50 Ω`, `18 + j22 Ω`, `wants 18 - j22 Ω`. */
export function readSourcePhrase(phrase: Phrase, context: PhraseContext): { impedance: ImpedanceSyntax; wants: boolean } | null {
  const s = scanner(phrase, context);
  const wants = takeWord(s, 'wants');
  const impedance = impedanceAt(s, null, 'any');
  if (impedance.form !== 'faulty') expectEnd(s);
  return { impedance, wants };
}
