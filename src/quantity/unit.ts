/** What a number measures. */
export type Dimension =
  | 'resistance' | 'inductance' | 'capacitance' | 'conductance' | 'frequency' | 'time' | 'length' | 'power' | 'voltage' | 'current'
  | 'angle' | 'wavelengths' | 'decibels' | 'power level' | 'percent' | 'loss per length' | 'number';

export interface Unit {
  /** As it is printed. */
  readonly symbol: string;
  readonly dimension: Dimension;
  /** Power of ten from the unit with its prefix to SI. */
  readonly exponent: number;
}

interface BaseUnit {
  readonly symbol: string;
  readonly spellings: readonly string[];
  readonly dimension: Dimension;
  readonly prefixed: boolean;
}

const base: readonly BaseUnit[] = [
  { symbol: 'Ω', spellings: ['Ω', '\u2126', 'ohm'], dimension: 'resistance', prefixed: true },
  { symbol: 'Hz', spellings: ['Hz'], dimension: 'frequency', prefixed: true },
  { symbol: 'H', spellings: ['H'], dimension: 'inductance', prefixed: true },
  { symbol: 'F', spellings: ['F'], dimension: 'capacitance', prefixed: true },
  { symbol: 'S', spellings: ['S'], dimension: 'conductance', prefixed: true },
  { symbol: 'm', spellings: ['m'], dimension: 'length', prefixed: true },
  { symbol: 's', spellings: ['s'], dimension: 'time', prefixed: true },
  { symbol: 'W', spellings: ['W'], dimension: 'power', prefixed: true },
  { symbol: 'V', spellings: ['V'], dimension: 'voltage', prefixed: true },
  { symbol: 'A', spellings: ['A'], dimension: 'current', prefixed: true },
  { symbol: '°', spellings: ['°', 'deg'], dimension: 'angle', prefixed: false },
  { symbol: 'λ', spellings: ['λ', 'lambda'], dimension: 'wavelengths', prefixed: false },
  { symbol: 'dBm', spellings: ['dBm'], dimension: 'power level', prefixed: false },
  { symbol: 'dB/m', spellings: ['dB/m'], dimension: 'loss per length', prefixed: false },
  { symbol: 'dB', spellings: ['dB'], dimension: 'decibels', prefixed: false },
  { symbol: '%', spellings: ['%'], dimension: 'percent', prefixed: false },
];

/** Letters and their powers of ten; `f` goes with F and `c` with m only. */
export const prefixes: Readonly<Record<string, number>> = { f: -15, p: -12, n: -9, µ: -6, μ: -6, u: -6, m: -3, c: -2, k: 3, M: 6, G: 9 };

const general = ['p', 'n', 'µ', 'μ', 'u', 'm', 'k', 'M', 'G'];

export const printedPrefix = (letter: string): string => (letter === 'u' || letter === 'μ' ? 'µ' : letter);

function buildUnits(): Map<string, Unit> {
  const units = new Map<string, Unit>();
  for (const { symbol, spellings, dimension, prefixed } of base) {
    for (const spelling of spellings) {
      units.set(spelling, { symbol, dimension, exponent: 0 });
      if (!prefixed) continue;
      const letters = [...general, ...(symbol === 'F' ? ['f'] : []), ...(symbol === 'm' ? ['c'] : [])];
      for (const letter of letters) units.set(letter + spelling, { symbol: printedPrefix(letter) + symbol, dimension, exponent: prefixes[letter] });
    }
  }
  return units;
}

const units = buildUnits();

/** An inch is 25.4 mm exactly; whole numbers first, so that 250 mil is the double nearest to 6.35 mm. */
export const metresOf: Readonly<Record<string, (count: number) => number>> = { mil: (count) => (count * 254) / 1e7, in: (count) => (count * 254) / 1e4 };

/** The unit of that exact spelling; null where there is none. */
export const unitOf = (spelling: string): Unit | null => units.get(spelling) ?? null;

export const unitSpellings: readonly string[] = [...units.keys(), ...Object.keys(metresOf)];

/** The unit that a spelling with slips of case probably means: `pf` → `pF`, `KHz` → `kHz`, `ohms` → `Ω`. Null where none is near. */
export function meantUnit(spelling: string, dimension: Dimension | null): string | null {
  const known = unitSpellings.filter((name) => dimension === null || dimensionOf(name) === dimension || (dimension === 'power' && name === 'dBm'));
  const plain = spelling.replace(/[\u2126]/g, 'Ω');
  const words: Readonly<Record<string, string>> = {
    ohms: 'Ω', Ohm: 'Ω', Ohms: 'Ω', OHM: 'Ω', kohms: 'kΩ', farad: 'F', henry: 'H', hertz: 'Hz', Hertz: 'Hz', siemens: 'S', metre: 'm', meter: 'm', inch: 'in',
    watt: 'W', watts: 'W', volt: 'V', volts: 'V', amp: 'A', amps: 'A', degrees: '°', degree: '°', percent: '%', db: 'dB', dbm: 'dBm',
  };
  if (Object.hasOwn(words, plain)) return words[plain];
  const same = known.filter((name) => name.toLowerCase() === plain.toLowerCase());
  // `KHZ` is kHz and not a smaller thing: kilo, mega and giga are what one means with frequencies.
  const likely = same.find((name) => dimension !== 'frequency' || !/^[mpnµμu]Hz$/.test(name)) ?? same[0];
  return likely ? (unitOf(likely)?.symbol ?? likely) : null;
}

export const dimensionOf = (spelling: string): Dimension | null => unitOf(spelling)?.dimension ?? (Object.hasOwn(metresOf, spelling) ? 'length' : null);
