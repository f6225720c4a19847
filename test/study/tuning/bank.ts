import { idealPart, type Part } from '../../../src/network/part';
import type { Goal } from '../../../src/study/goal';
import type { Problem, Tunable } from '../../../src/study/problem';
import { band, capacitor, evenly, goalOf, inductor, ohms, problemOf, series, shunt } from '../problems';

/** An invented whip with a switched bank, and problems made of it. */

export const bankOf = (name: string, element: string, picofarads: Iterable<number>, more: Partial<Part> = {}, firstCode = 0): Tunable => ({
  name, kind: 'capacitor', elements: [element],
  states: [...picofarads].map((value, at) => ({ code: firstCode + at, part: { ...idealPart('capacitor', value * 1e-12), ...more } })),
});

export const whip = { form: 'series', members: [ohms(9), inductor(5.5e-9), capacitor(2.6e-12)] } as const;
const wetWhip = { form: 'series', members: [ohms(14), inductor(5.5e-9), capacitor(2.9e-12)] } as const;

export const inMain = { form: 'band', band: 'main' } as const;

export function bankProblem(more: Partial<Problem> = {}): Problem {
  const skin: Partial<Part> = { loss: { law: 'skin effect', q: 60, atHz: 900e6 } };
  return problemOf({
    load: { dry: whip, wet: wetWhip },
    bands: [band('main', evenly(860e6, 930e6, 21))],
    channelsHz: evenly(860e6, 930e6, 8),
    ladder: [series('L1', inductor(8.2e-9, { loss: { law: 'skin effect', q: 40, atHz: 900e6 } })), shunt('C1', capacitor(1e-12)), series('C2', capacitor(1e-12))],
    tunables: [bankOf('across', 'C1', evenly(0.6, 8, 12), skin), bankOf('along', 'C2', [4, 6, 9, 14, 22], { loss: { law: 'resistance', resistanceOhm: 0.3 } })],
    sweepHz: evenly(800e6, 1000e6, 5),
    goals: [goalOf('return loss', '>=', 10, { place: inMain, unit: 'dB' }), goalOf('gain', '>=', -1.5, { place: inMain, unit: 'dB' })],
    ...more,
  });
}

/** The problem as it is at one frequency with one ladder, without codes: what a channel is judged by, made by hand. */
export function frozen(problem: Problem, frequencyHz: number, ladder: Problem['ladder'], goals: readonly Goal[] = problem.goals): Problem {
  const bands = problem.bands.map((each) => ({ ...each, frequencyHz: Float64Array.of(frequencyHz) }));
  return { ...problem, bands, ladder, goals, tunables: [], channelsHz: null, sweepHz: Float64Array.of(frequencyHz) };
}
