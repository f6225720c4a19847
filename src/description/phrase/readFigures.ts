import type { FiguresSyntax, Quantity, ToleranceSyntax } from '../syntax';
import type { PartKind } from '../../network/part';
import { quantityAt, usualUnit, type QuantityKind } from './readQuantity';
import { complain, peek, replaceBy, spanOf, skipBlanks, take, takeWord, type Scanner } from './scanner';

export const noFigures: FiguresSyntax = {
  tolerance: null, q: null, qAtHz: null, esrOhm: null, eslH: null, srfHz: null, ratedVoltageV: null, ratedCurrentA: null, ratedPowerW: null,
};

const valueKind: Readonly<Record<PartKind, QuantityKind>> = { resistor: 'resistance', inductor: 'inductance', capacitor: 'capacitance' };

export const kindOfQuantity = (kind: QuantityKind): PartKind | null =>
  kind === 'resistance' ? 'resistor' : kind === 'inductance' ? 'inductor' : kind === 'capacitance' ? 'capacitor' : null;

export const quantityOfKind = (kind: PartKind): QuantityKind => valueKind[kind];

type Draft = { -readonly [K in keyof FiguresSyntax]: FiguresSyntax[K] };

/** Figures in any order, as long as they go on. Each at most once; the first of two counts and the second is reported. */
export function figuresAt(s: Scanner, kind: PartKind | null): FiguresSyntax {
  const figures: Draft = { ...noFigures };
  const once = <K extends keyof FiguresSyntax>(key: K, what: string, found: FiguresSyntax[K], start: number) => {
    if (figures[key] !== null) complain(s, 'figure-twice', `${what} is stated twice.`, spanOf(s, start, s.at));
    else figures[key] = found;
  };
  const positive = (quantity: Quantity | null, what: string, allowZero: boolean): Quantity | null => {
    if (!quantity) return null;
    if (quantity.value > 0 || (allowZero && quantity.value === 0)) return { value: quantity.value, span: quantity.span };
    complain(s, 'not-physical', `${what} is ${allowZero ? 'not negative' : 'greater than zero'}.`, quantity.span);
    return null;
  };
  for (;;) {
    skipBlanks(s);
    const start = s.at;
    if (toleranceFollows(s)) {
      const tolerance = toleranceAt(s, kind);
      if (tolerance) once('tolerance', 'The tolerance', tolerance, start);
    } else if (takeWord(s, 'Q')) {
      const q = positive(quantityAt(s, ['number']), 'Q', false);
      const at = take(s, /@/y) || takeWord(s, 'at') ? positive(quantityAt(s, ['frequency']), 'A frequency', false) : null;
      if (q) {
        once('q', 'Q', q, start);
        if (at && figures.q === q) figures.qAtHz = at;
      }
    } else if (takeWord(s, 'ESR')) {
      const found = positive(quantityAt(s, ['resistance']), 'An ESR', true);
      if (found) once('esrOhm', 'ESR', found, start);
    } else if (takeWord(s, 'ESL')) {
      const found = positive(quantityAt(s, ['inductance']), 'An ESL', true);
      if (found) once('eslH', 'ESL', found, start);
    } else if (takeWord(s, 'SRF')) {
      const found = positive(quantityAt(s, ['frequency']), 'A self-resonance', false);
      if (found) once('srfHz', 'SRF', found, start);
    } else if (takeWord(s, 'rated')) {
      const found = quantityAt(s, ['voltage', 'current', 'power']);
      const key = found && ({ voltage: 'ratedVoltageV', current: 'ratedCurrentA', power: 'ratedPowerW' } as const)[found.kind as 'voltage' | 'current' | 'power'];
      const rated = positive(found, 'A rating', false);
      if (key && rated) once(key, 'That rating', rated, start);
    } else {
      return checked(s, figures, kind);
    }
  }
}

function checked(s: Scanner, figures: Draft, kind: PartKind | null): FiguresSyntax {
  if (figures.q && figures.esrOhm) {
    complain(s, 'figures-conflict', 'Q and ESR both state the loss; keep one of them.', figures.esrOhm.span);
    figures.esrOhm = null;
  }
  if (figures.srfHz && figures.eslH) {
    complain(s, 'figures-conflict', 'SRF and ESL both state the same inductance; keep one of them.', figures.eslH.span);
    figures.eslH = null;
  }
  if (kind === 'resistor') {
    for (const [key, word] of [['q', 'Q'], ['srfHz', 'SRF'], ['esrOhm', 'ESR']] as const) {
      const figure = figures[key];
      if (!figure) continue;
      complain(s, 'figure-foreign', `A resistor has no ${word}; of the figures of loss and resonance it takes ESL only.`, figure.span);
      figures[key] = null;
      if (key === 'q') figures.qAtHz = null;
    }
  }
  if (kind === 'inductor' && figures.eslH) {
    complain(s, 'figure-foreign', 'An inductor has no ESL; state its self-resonance as SRF.', figures.eslH.span);
    figures.eslH = null;
  }
  return figures;
}

const signed = /±|\+\/-|\+-/y;

const toleranceFollows = (s: Scanner): boolean => peek(s, /(?:±|\+\/-|\+-)|[+\-−]\d[\d.]*\s*%/y);

function toleranceAt(s: Scanner, kind: PartKind | null): ToleranceSyntax | null {
  skipBlanks(s);
  const start = s.at;
  if (take(s, signed)) {
    const kinds: QuantityKind[] = ['ratio', ...(kind ? [valueKind[kind]] : (['resistance', 'inductance', 'capacitance'] as const))];
    const found = quantityAt(s, kinds);
    if (!found) return null;
    const span = spanOf(s, start, s.at);
    if (found.kind === 'ratio' && found.literal?.form === 'bare') {
      const own = kind ? [replaceBy(found.span, `${found.literal.digits} ${usualUnit[valueKind[kind]]}`, false)] : [];
      complain(s, 'unit-missing', 'A tolerance is in % or in the unit of the part.', found.span, [replaceBy(found.span, `${found.literal.digits} %`, false), ...own]);
      return null;
    }
    return bounded(s, { form: found.kind === 'ratio' ? 'relative' : 'absolute', up: found.value, down: found.value, span });
  }
  let up = 0;
  let down = 0;
  for (let pattern; (pattern = take(s, /([+\-−])(\d[\d.]*)\s*%/y)); ) {
    const share = Number(`${pattern[2]}e-2`);
    if (pattern[1] === '+') up = share;
    else down = share;
  }
  return bounded(s, { form: 'relative', up, down, span: spanOf(s, start, s.at) });
}

function bounded(s: Scanner, tolerance: ToleranceSyntax): ToleranceSyntax | null {
  const wrong = !(tolerance.up >= 0) || !(tolerance.down >= 0) ? 'A tolerance is not negative.' : tolerance.form === 'relative' && tolerance.down >= 1 ? 'A tolerance of 100 % or more downwards would let the part vanish.' : null;
  if (wrong) complain(s, 'not-physical', wrong, tolerance.span);
  return wrong ? null : tolerance;
}
