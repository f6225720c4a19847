import fc from 'fast-check';
import type { Element } from '../../src/network/element';
import type { Impedance } from '../../src/network/impedance';
import type { Line } from '../../src/network/line';
import type { NetworkData } from '../../src/network/networkData';
import { idealPart, type Loss, type Part } from '../../src/network/part';

/** Random ladders near one frequency, with reactances of a few ohms to about a kilohm, so that rounding stays small. */
export const CENTRE_HZ = 868e6;
const OMEGA = 2 * Math.PI * CENTRE_HZ;

export interface LadderOptions {
  readonly lossless: boolean;
  /** Blocks hold invented data at exactly these frequencies. */
  readonly blockHz?: Float64Array;
}

const logarithmic = (min: number, max: number) =>
  fc.double({ min: Math.log(min), max: Math.log(max), noNaN: true }).map((x) => Math.exp(x));

export const reactanceArbitrary = logarithmic(3, 900);

const qArbitrary = logarithmic(8, 400);

function lossArbitrary(lossless: boolean): fc.Arbitrary<Loss> {
  if (lossless) return fc.constant<Loss>({ law: 'none' });
  return fc.oneof(
    fc.constant<Loss>({ law: 'none' }),
    qArbitrary.map((q): Loss => ({ law: 'constant q', q })),
    fc.tuple(qArbitrary, logarithmic(2e8, 3e9)).map(([q, atHz]): Loss => ({ law: 'skin effect', q, atHz })),
    logarithmic(0.05, 5).map((resistanceOhm): Loss => ({ law: 'resistance', resistanceOhm })),
  );
}

export function partArbitrary(lossless: boolean): fc.Arbitrary<Part> {
  const coil = fc.tuple(reactanceArbitrary, lossArbitrary(lossless), fc.option(logarithmic(1.5e9, 2e10)))
    .map(([x, loss, srfHz]): Part => ({ ...idealPart('inductor', x / OMEGA), loss, srfHz }));
  const capacitor = fc.tuple(reactanceArbitrary, lossArbitrary(lossless), fc.oneof(fc.constant(0), logarithmic(5e-11, 1e-9)))
    .map(([x, loss, eslH]): Part => ({ ...idealPart('capacitor', 1 / (OMEGA * x)), loss, eslH }));
  if (lossless) return fc.oneof(coil, capacitor);
  const resistor = fc.tuple(reactanceArbitrary, fc.oneof(fc.constant(0), logarithmic(5e-11, 1e-9)))
    .map(([value, eslH]): Part => ({ ...idealPart('resistor', value), eslH }));
  return fc.oneof(coil, capacitor, resistor);
}

export function branchArbitrary(lossless: boolean): fc.Arbitrary<Impedance> {
  const single = partArbitrary(lossless).map((part): Impedance => ({ form: 'part', part }));
  const several = fc.array(single, { minLength: 2, maxLength: 3 });
  return fc.oneof(
    { weight: 3, arbitrary: single },
    { weight: 1, arbitrary: several.map((members): Impedance => ({ form: 'series', members })) },
    { weight: 1, arbitrary: several.map((members): Impedance => ({ form: 'parallel', members })) },
  );
}

export function lineArbitrary(lossless: boolean): fc.Arbitrary<Line> {
  return fc.record({
    impedanceOhm: logarithmic(15, 150),
    lengthM: logarithmic(0.001, 0.08),
    velocityFactor: fc.double({ min: 0.4, max: 1, noNaN: true }),
    conductorLossDb: lossless ? fc.constant(0) : fc.double({ min: 0, max: 2, noNaN: true }),
    dielectricLossDb: lossless ? fc.constant(0) : fc.double({ min: 0, max: 1, noNaN: true }),
    lossAtHz: lossless ? fc.constant(1) : logarithmic(3e8, 3e9),
  });
}

/** A passive, reciprocal two-port with differing references: invented. */
export function blockDataArbitrary(frequencyHz: Float64Array): fc.Arbitrary<NetworkData> {
  const entry = fc.double({ min: -0.45, max: 0.45, noNaN: true });
  const point = fc.tuple(entry, entry, entry, entry, entry, entry);
  return fc.tuple(fc.array(point, { minLength: frequencyHz.length, maxLength: frequencyHz.length }), logarithmic(20, 120), logarithmic(20, 120))
    .map(([rows, first, second]): NetworkData => ({
      ports: 2,
      frequencyHz,
      referenceOhm: Float64Array.of(first, second),
      sRe: Float64Array.from(rows.flatMap(([a, , b, , c]) => [a, c + 0.05, c + 0.05, b])),
      sIm: Float64Array.from(rows.flatMap(([, a, , b, , c]) => [a, c, c, b])),
    }));
}

export function elementArbitrary({ lossless, blockHz }: LadderOptions): fc.Arbitrary<Element> {
  const name = 'X';
  const branch = fc.tuple(branchArbitrary(lossless), fc.constantFrom('series' as const, 'shunt' as const), fc.boolean())
    .map(([impedance, orientation, pair]): Element => ({ form: 'branch', name, orientation, branch: impedance, pair }));
  const line = lineArbitrary(lossless).map((value): Element => ({ form: 'line', name, line: value }));
  const stub = fc.tuple(lineArbitrary(lossless), fc.constantFrom('open' as const, 'short' as const))
    .map(([value, end]): Element => ({ form: 'stub', name, line: value, end }));
  const turns = fc.tuple(fc.integer({ min: 1, max: 3 }), fc.integer({ min: 1, max: 3 }));
  const ideal = turns.map(([turnsSource, turnsLoad]): Element => ({ form: 'transformer', name, turnsSource, turnsLoad, windingH: null, coupling: 1 }));
  const coupled = fc.tuple(turns, logarithmic(20, 2000), fc.oneof(fc.constant(1), fc.double({ min: 0.3, max: 0.999, noNaN: true })))
    .map(([[turnsSource, turnsLoad], x, coupling]): Element => ({ form: 'transformer', name, turnsSource, turnsLoad, windingH: x / OMEGA, coupling }));
  const nothing = fc.constantFrom<Element>({ form: 'bridge', name, orientation: 'series' }, { form: 'not fitted', name, orientation: 'shunt', kind: null });
  const all = [
    { weight: 6, arbitrary: branch }, { weight: 2, arbitrary: line }, { weight: 1, arbitrary: stub },
    { weight: 1, arbitrary: ideal }, { weight: 1, arbitrary: coupled }, { weight: 1, arbitrary: nothing },
  ];
  if (blockHz === undefined) return fc.oneof(...all);
  const block = fc.tuple(blockDataArbitrary(blockHz), fc.boolean()).map(([data, reversed]): Element => ({ form: 'block', name, data, reversed }));
  return fc.oneof(...all, { weight: 2, arbitrary: block });
}

export const ladderArbitrary = (options: LadderOptions, maxLength = 7): fc.Arbitrary<Element[]> =>
  fc.array(elementArbitrary(options), { maxLength }).map((ladder) => ladder.map((element, i) => ({ ...element, name: `X${i + 1}` })));

/** Positive resistance, either reactance. */
export const terminationArbitrary: fc.Arbitrary<Impedance> = fc.tuple(logarithmic(4, 400), fc.double({ min: -300, max: 300, noNaN: true }))
  .map(([re, im]): Impedance => ({ form: 'constant', impedanceOhm: { re, im } }));
