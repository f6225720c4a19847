import { kindOfDesignator } from '../description/phrase/readElementPhrase';
import type { PartKind } from '../network/part';
import { literalAt, literalValue } from '../quantity/literal';
import { nextInSeries, seriesNames } from '../quantity/preferredSeries';
import { prefixes, unitOf } from '../quantity/unit';
import type { Assessment } from './assess';
import { nothingToOffer, offer, type Offer, type Offers } from './completionItem';
import { isSameValue, nextMember, writeValue } from './familyMembers';

const dimensions = { resistor: 'resistance', inductor: 'inductance', capacitor: 'capacitance' } as const;
/** What a bare number most likely means. */
const usualScale: Readonly<Record<PartKind, number>> = { resistor: 1, inductor: 1e-9, capacitor: 1e-12 };
const allKinds: readonly PartKind[] = ['inductor', 'capacitor', 'resistor'];
const smallKinds: readonly PartKind[] = ['capacitor', 'inductor', 'resistor'];

/** What may come next in the phrase of `series NAME` or `shunt NAME`; `rest` is what already stands behind the cursor. */
export function partOffers(assessment: Assessment, orientation: 'series' | 'shunt', name: string, phrase: string, rest: string): Offers {
  const kind = kindOfDesignator(name);
  const from = /(?:^|\s)from\s+(?:.*,\s*)?([\p{L}][\p{L}\d_-]*|)$/u.exec(phrase);
  if (from) return { offers: fromOffers(assessment, kind, /^solve\b/.test(phrase)), before: from[1].length };
  const tunable = /^tunable\s+([\p{L}\d _-]*)$/u.exec(phrase);
  if (tunable) return { offers: assessment.description.syntax.tunables.map((each) => offer(each.name.value, 'tunable')), before: tunable[1].length };
  if (/^solve\b.*\s\p{L}*$/su.test(phrase)) return { offers: solveWords, before: /\p{L}*$/u.exec(phrase)![0].length };
  if (/^[\p{L} ]*$/u.test(phrase) && !/^pair\s/.test(phrase)) return { offers: startOffers(orientation, kind), before: phrase.length };
  const values = valueOffers(assessment, kind, phrase, rest);
  if (values.offers.length > 0) return values;
  return /[\s)]\S*$/.test(phrase) ? { offers: figureOffers(kind), before: /\S*$/.exec(phrase)![0].length } : nothingToOffer;
}

const startOffers = (orientation: 'series' | 'shunt', kind: PartKind | null): Offer[] => [
  offer('solve', 'to be found'),
  offer('solve from …', 'to be found in a family', { insertText: 'solve from ' }),
  ...(kind === 'resistor' ? [] : [offer('tunable …', 'set by firmware', { insertText: 'tunable ' })]),
  offer('pair …', 'two equal parts, one in each leg', { insertText: 'pair ' }),
  ...(kind === null || kind === 'inductor'
    ? [offer('coil …', 'a winding', { insertText: '"coil ${1:6} turns, diameter ${2:5 mm}, length ${3:7 mm}, wire ${4:0.8 mm}"', snippet: true })]
    : []),
  orientation === 'shunt' ? offer('not fitted', 'empty pads') : offer('0 Ω', 'a bridge'),
];

const solveWords: readonly Offer[] = [offer('from', 'a preferred series or families'), offer('or none', 'may stay open, or bridged in series')];

/** Families that hold the kind first; those that are not known yet count as fitting. */
function fromOffers({ description, model }: Assessment, kind: PartKind | null, solving: boolean): Offer[] {
  const known = new Map(model.problem?.families.map((family) => [family.name, family.kind]));
  const fits = (name: string) => kind === null || [kind, 'mixed', undefined].includes(known.get(name));
  const families = description.syntax.families.filter(({ name }) => fits(name.value)).map(({ name }) => offer(name.value, 'family'));
  return solving ? [...families, ...seriesNames.map((name) => offer(name, 'preferred series'))] : families;
}

/** The number that is being typed with its unit, and the values around it: those of the family that follows, then E24. */
function valueOffers(assessment: Assessment, kind: PartKind | null, phrase: string, rest: string): Offers {
  const start = /^pair\s+/.exec(phrase)?.[0].length ?? 0;
  const whole = phrase + rest;
  // With p or f a capacitance is meant before anything else.
  const kinds = kind ? [kind] : /\d\s?[pf]/.test(whole) ? smallKinds : allKinds;
  const literal = literalAt(whole, start, kinds.map((each) => dimensions[each]));
  if (!literal || phrase.slice(literal.end).trim() !== '') return nothingToOffer;
  const unit = unitOf(literal.unit);
  const stated = literal.form === 'unit' ? kinds.find((each) => unit?.dimension === dimensions[each]) ?? null : null;
  // Behind a finished value come its figures.
  if (phrase.length > literal.end && (stated || literal.form === 'letters' || literal.form === 'prefix')) return nothingToOffer;
  const bare = literalValue({ ...literal, form: 'bare' });
  const valueAs = (each: PartKind): number =>
    stated ? literalValue(literal) : literal.prefixExponent !== 0 || literal.form === 'letters' || literal.form === 'prefix' ? bare
      : Object.hasOwn(prefixes, literal.unit) ? bare * 10 ** prefixes[literal.unit] : bare * usualScale[each];
  const offers = (stated ? [stated] : kinds).flatMap((each) => around(assessment, each, Number(valueAs(each).toPrecision(12)), whole));
  const end = Math.max(phrase.length, literal.end);
  return { offers, before: phrase.length - start, after: end - phrase.length };
}

function around({ model }: Assessment, kind: PartKind, value: number, phrase: string): Offer[] {
  if (!(value > 0) || !Number.isFinite(value)) return [];
  const name = /\sfrom\s+([\p{L}][\p{L}\d_-]*)/u.exec(phrase)?.[1];
  const family = model.problem?.families.find((candidate) => candidate.name === name);
  const found: { value: number; detail: string }[] = [{ value, detail: 'as typed' }];
  const add = (next: (from: number, direction: 'up' | 'down') => number | null, detail: string) => {
    for (const direction of ['down', 'up'] as const) {
      let at: number | null = value;
      for (let i = 0; i < 2 && at !== null; i++) {
        at = next(at, direction);
        if (at !== null && !found.some((other) => isSameValue(other.value, at!))) found.push({ value: at, detail });
      }
    }
  };
  if (family) add((at, direction) => nextMember(family, kind, at, direction)?.part.value ?? null, family.name);
  add((at, direction) => nextInSeries(at, 'E24', direction), 'E24');
  return found.map((each) => offer(writeValue(kind, each.value), each.detail));
}

/** Figures that parts of this kind may have. */
export function figureOffers(kind: PartKind | null): Offer[] {
  const reactive = kind !== 'resistor';
  return [
    offer('from …', 'a family that it is of', { insertText: 'from ' }),
    offer('±5 %', 'tolerance'),
    ...(reactive ? [offer('Q 35 @ 900 MHz', 'loss that grows with the root of frequency'), offer('Q 200', 'the same Q everywhere'), offer('ESR 0.1 Ω', 'resistance in series')] : []),
    ...(kind === 'inductor' ? [] : [offer('ESL 0.35 nH', 'inductance in series')]),
    ...(reactive ? [offer('SRF 7 GHz', 'self-resonance')] : []),
    offer('rated 50 V', 'peak voltage'), offer('rated 300 mA', 'rms current'), offer('rated 0.1 W', 'heat'),
    offer('fixed', 'solving again leaves it as it is'),
  ];
}
