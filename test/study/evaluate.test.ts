import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { Element } from '../../src/network/element';
import type { Impedance } from '../../src/network/impedance';
import { evaluate } from '../../src/study/evaluate';
import type { Goal } from '../../src/study/goal';
import { marginDb } from '../../src/study/marginDb';
import { band, capacitor, evenly, fileOf, goalOf, inductor, lineOf, near, ohms, onePort, points, problemOf, resistor, series, shunt } from './problems';

const sweepHz = evenly(0.8e9, 1.2e9, 9);

const goals: Goal[] = [
  goalOf('return loss', '>=', 10), goalOf('VSWR', '<', 2), goalOf('reflection', '>', 0.3), goalOf('mismatch loss', '<=', 1), goalOf('gain', '>=', -1),
  goalOf('insertion loss', '>=', 3, { into: ohms(20, 5) }), goalOf('efficiency', '>=', 50, { unit: '%' }),
  goalOf('rejection', '>=', 10, { place: { form: 'harmonic', order: 2, band: 'main' }, into: ohms(50) }), goalOf('input resistance', '>=', 10),
  goalOf('input reactance', '<=', 10), goalOf('bandwidth', '>=', 1e6), goalOf('bandwidth', '<=', 1e6, { bandwidthDropDb: 3 }), goalOf('voltage', '<=', 3, { elementName: 'load' }),
  goalOf('current', '<=', 0.1, { elementName: 'load' }), goalOf('dissipation', '>=', 1e-4, { elementName: 'load' }), goalOf('parts', '<=', 2),
  goalOf('yield', '>=', 90, { unit: '%' }), goalOf('dc path'), goalOf('dc block'), goalOf('dc short at load'),
];

const branches: fc.Arbitrary<Impedance> = fc.oneof(
  fc.double({ min: 1e-12, max: 1e-6, noNaN: true }).map((value) => inductor(value, { srfHz: 3e9 })),
  fc.double({ min: 1e-15, max: 1e-9, noNaN: true }).map((value) => capacitor(value, { eslH: 1e-10 })),
  fc.oneof(fc.constant(0), fc.double({ min: 1e-6, max: 1e6, noNaN: true })).map(resistor),
  fc.constantFrom<Impedance>({ form: 'open' }, { form: 'short' }, { form: 'unknown', reason: 'it could not be read' }),
);
const elements: fc.Arbitrary<Element> = fc.oneof(
  { weight: 5, arbitrary: fc.tuple(branches, fc.boolean(), fc.boolean()).map(([branch, across, pair]) => (across ? shunt('X1', branch, pair) : series('X2', branch, pair))) },
  fc.constantFrom<Element>(
    { form: 'line', name: 'T1', line: lineOf(75, 0.25, 1e9) }, { form: 'stub', name: 'S1', end: 'open', line: lineOf(50, 0.25, 1e9) },
    { form: 'stub', name: 'S2', end: 'short', line: lineOf(50, 0.5, 1e9) }, { form: 'bridge', name: 'R1', orientation: 'series' },
    { form: 'transformer', name: 'T2', turnsSource: 1, turnsLoad: 3, windingH: null, coupling: 1 },
  ),
);
const loads: fc.Arbitrary<Impedance> = fc.oneof(
  fc.tuple(fc.integer({ min: 0, max: 10_000 }), fc.integer({ min: -10_000, max: 10_000 })).map(([re, im]) => ohms(re / 10, im / 10)),
  fc.constantFrom<Impedance>({ form: 'open' }, { form: 'short' }, fileOf(onePort(evenly(0.9e9, 1.1e9, 5), (f) => ({ re: f / 2e9, im: 0.1 })))),
);

describe('evaluation', () => {
  it('of any ladder is made of numbers, infinities told by null, or reasons', () => {
    fc.assert(fc.property(fc.array(elements, { maxLength: 6 }), loads, loads, (ladder, one, two) => {
      const problem = problemOf({ load: { one, two }, ladder, goals, sweepHz, bands: [band('main', evenly(0.95e9, 1.05e9, 3)), band('rim', points(1.15e9))] });
      const evaluation = evaluate(problem);
      evaluation.goals.forEach(({ goal, ok, value, margin, frequencyHz, reason }) => {
        for (const number of [value, margin, frequencyHz]) assert.ok(number === null || Number.isFinite(number), `${goal.text}: ${number}`);
        if (value === null && reason !== null) assert.equal(ok, false);
        if (margin !== null && reason === null) assert.equal(ok, goal.comparison === '>' || goal.comparison === '<' || goal.comparison === null ? margin > 0 : margin >= 0, goal.text);
      });
      for (const trace of evaluation.traces) {
        trace.known.forEach((known, k) => {
          for (const list of [trace.reflection.re, trace.reflection.im, trace.chartReflection.re, trace.chartReflection.im]) assert.equal(Number.isFinite(list[k]), known === 1);
          assert.equal(Number.isNaN(trace.gainDb[k]), known === 0);
          // No passive ladder gains, and none reflects more than it is sent.
          if (known) assert.ok(trace.gainDb[k] <= 1e-9 && Math.hypot(trace.reflection.re[k], trace.reflection.im[k]) <= 1 + 1e-9);
        });
        assert.equal(trace.reason === null, trace.known.every((known) => known === 1));
      }
      for (const element of evaluation.elements) {
        for (const number of [element.peakVoltageV, element.rmsCurrentA, element.dissipationW]) assert.ok(number === null || Number.isFinite(number));
      }
    }), { numRuns: 150, seed: 3 });
  });

  it('goals and traces agree, and dB margins have the sign of the outcome', () => {
    const ladder = [shunt('C1', capacitor(3e-12)), series('L1', inductor(6e-9, { loss: { law: 'constant q', q: 30 } }))];
    const problem = problemOf({ load: { one: ohms(80, 20), two: ohms(30, -15) }, ladder, sweepHz });
    const place = { form: 'range', frequencyHz: sweepHz } as const;
    const evaluation = evaluate({ ...problem, goals: goals.map((goal) => (goal.into || goal.quantity === 'bandwidth' ? goal : { ...goal, place })) });
    const [returnLoss, , , , gain] = evaluation.goals;
    const worst = (values: (trace: (typeof evaluation.traces)[number], k: number) => number) =>
      Math.min(...evaluation.traces.flatMap((trace) => Array.from(sweepHz, (_, k) => values(trace, k))));
    near(gain.value, worst((trace, k) => trace.gainDb[k]), 1e-12);
    near(returnLoss.value, worst(({ reflection }, k) => -20 * Math.log10(Math.hypot(reflection.re[k], reflection.im[k]))), 1e-12);
    for (const result of evaluation.goals) {
      const inDb = marginDb(result);
      if (inDb !== null) assert.equal(inDb >= 0, result.ok, result.goal.text);
    }
  });

  it('of an empty ladder is the load itself', () => {
    const { traces, elements: rows, bands, ok } = evaluate(problemOf({ load: ohms(150), sweepHz }));
    assert.deepEqual([...traces[0].impedanceOhm.re], Array(9).fill(150));
    assert.deepEqual([...traces[0].chartReflection.re], Array(9).fill(0.5));
    assert.deepEqual([...traces[0].efficiency], Array(9).fill(1));
    assert.deepEqual([rows.length, ok], [0, true]);
    const [{ worstReflection, worstReturnLossDb, worstVswr, worstGainDb, atHz }] = bands[0].cases;
    assert.deepEqual([worstReflection, atHz], [0.5, 1e9]);
    near(worstVswr, 3, 1e-12);
    near(worstReturnLossDb, 20 * Math.log10(2), 1e-12);
    near(worstGainDb, 10 * Math.log10(0.75), 1e-12);
  });

  it('tells each band by its ends, watched ones too', () => {
    const { bands } = evaluate(problemOf({ bands: [band('wide', points(1e9, 2e9, 4e9)), band('spot', points(3e9), true)] }));
    assert.deepEqual(bands.map(({ name, startHz, stopHz }) => [name, startHz, stopHz]), [['wide', 1e9, 4e9], ['spot', 3e9, 3e9]]);
  });

  it('of an open and a short has finite reflections and no gain', () => {
    for (const [form, reflection] of [['open', 1], ['short', -1]] as const) {
      const { traces, bands } = evaluate(problemOf({ load: { form }, sweepHz }));
      assert.deepEqual([...traces[0].chartReflection.re], Array(9).fill(reflection));
      assert.deepEqual([...traces[0].gainDb], Array(9).fill(-Infinity));
      const { worstVswr, worstGainDb, worstReturnLossDb, reason } = bands[0].cases[0];
      assert.deepEqual([worstVswr, worstGainDb, worstReturnLossDb, reason], [null, null, 0, null]);
    }
  });

  it('gives the same twice, and leaves the problem alone', () => {
    const problem = problemOf({ load: ohms(80, 20), ladder: [series('L1', inductor(6e-9))], goals, sweepHz });
    const before = structuredClone(problem);
    assert.deepEqual(evaluate(problem), evaluate(problem));
    assert.deepEqual(problem, before);
  });

  it('of a problem that was posted to a worker is the same', () => {
    const problem = problemOf({ load: fileOf(onePort(sweepHz, (f) => ({ re: f / 3e9, im: 0.2 }))), ladder: [series('L1', inductor(6e-9))], goals, sweepHz });
    assert.deepEqual(evaluate(structuredClone(problem)), evaluate(problem));
  });
});
