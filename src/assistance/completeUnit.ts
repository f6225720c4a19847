import { nothingToOffer, offer, type Offers } from './completionItem';

/** Units of a place in the language, the likeliest first. */
export const unitsOf = {
  frequency: ['MHz', 'GHz', 'kHz'], resistance: ['Ω', 'kΩ', 'mΩ'], inductance: ['nH', 'µH', 'pH'], capacitance: ['pF', 'nF', 'fF'], length: ['mm', 'mil', 'cm', 'µm'],
  power: ['dBm', 'W', 'mW'], voltage: ['V'], current: ['mA', 'A'], decibels: ['dB'], ratio: ['%'], angle: ['°', 'λ'], number: [], integer: [],
} as const satisfies Record<string, readonly string[]>;

export type UnitKind = keyof typeof unitsOf;

const numberAtEnd = /(?:^|[^\p{L}\d.])([-−+]?(?:\d+(?:\.\d*)?|\.\d+))([ \u00a0]?)([\p{L}\u2126°%]{0,4})$/u;

/** Units for the number that is being typed at the end of a phrase. */
export function unitOffers(phrase: string, kinds: readonly UnitKind[]): Offers {
  const found = numberAtEnd.exec(phrase);
  if (!found) return nothingToOffer;
  const [, number, blank, begun] = found;
  const units = kinds.flatMap((kind): readonly string[] => unitsOf[kind]);
  return { offers: units.map((unit) => offer(`${number} ${unit}`, 'unit')), before: number.length + blank.length + begun.length };
}
