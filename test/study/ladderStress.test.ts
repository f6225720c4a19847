import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { Element } from '../../src/network/element';
import { idealPart, type Loss } from '../../src/network/part';
import { evaluate } from '../../src/study/evaluate';
import type { Stress } from '../../src/study/ladderStress';
import { placeOfBand } from '../../src/study/place';
import type { Problem } from '../../src/study/problem';
import { sampler } from '../../src/study/sampler';
import { worstStress } from '../../src/study/worstStress';
import {
  band, bridge, capacitor, evenly, goalOf, inductor, judge, lineOf, near, notFitted, ohms, onePort, fileOf, points, problemOf, resistor, series, shunt,
} from './problems';

const stressOf = (problem: Problem): readonly Stress[] => sampler(problem, problem.ladder).trace(placeOfBand(problem.bands[0]), 0).stress();
const at = (stress: Stress) => [stress.peakVoltageV[0], stress.rmsCurrentA[0], stress.dissipationW[0]];

function same(actual: readonly number[], expected: readonly number[], what = ''): void {
  actual.forEach((value, k) => assert.ok(Math.abs(value - expected[k]) <= 1e-12 * Math.max(1, Math.abs(expected[k])), `${what} [${k}]: ${value} is not ${expected[k]}`));
}

describe('stress by hand', () => {
  // 2 W from 50 Ω: E = √(4·50·2) = 20 V rms, 0.2 A into a match.
  const watts = 2;

  it('a matched load alone', () => {
    const problem = problemOf({ availablePowerW: watts });
    same(at(stressOf(problem)[0]), [Math.SQRT2 * 10, 0.2, 2]);
  });
  it('a resistor in series', () => {
    // 20 V over 50 + 30 + 20 Ω: 0.2 A.
    const problem = problemOf({ availablePowerW: watts, load: ohms(20), ladder: [series('R1', resistor(30))] });
    const [r1, load] = stressOf(problem);
    same(at(r1), [Math.SQRT2 * 6, 0.2, 1.2]);
    same(at(load), [Math.SQRT2 * 4, 0.2, 0.8]);
  });
  it('a resistor across', () => {
    // 100 Ω beside 100 Ω: a match, 10 V, 0.1 A each.
    const problem = problemOf({ availablePowerW: watts, load: ohms(100), ladder: [shunt('R1', resistor(100))] });
    const [r1, load] = stressOf(problem);
    same(at(r1), [Math.SQRT2 * 10, 0.1, 1]);
    same(at(load), [Math.SQRT2 * 10, 0.1, 1]);
  });
  it('an L section that transforms 50 Ω to 1000 Ω carries √(P·R)', () => {
    const omega = 2 * Math.PI * 1e9;
    const q = Math.sqrt(1000 / 50 - 1);
    const problem = problemOf({
      availablePowerW: watts, load: ohms(1000), ladder: [shunt('C1', capacitor(q / 1000 / omega)), series('L1', inductor((q * 50) / omega))],
    });
    const [c1, l1, load] = stressOf(problem);
    const volts = Math.sqrt(watts * 1000);
    same(at(c1), [Math.SQRT2 * volts, (volts * q) / 1000, 0], 'C1');
    same(at(l1), [Math.SQRT2 * 0.2 * q * 50, 0.2, 0], 'L1');
    same(at(load), [Math.SQRT2 * volts, volts / 1000, watts], 'load');
  });
  it('a pair is stressed as two: half the voltage and heat each, the same current', () => {
    const single = stressOf(problemOf({ availablePowerW: watts, ladder: [series('R1', resistor(30))] }))[0];
    const pair = stressOf(problemOf({ availablePowerW: watts, ladder: [series('R1', resistor(15), true)] }))[0];
    same(at(pair), [at(single)[0] / 2, at(single)[1], at(single)[2] / 2]);
    const across = stressOf(problemOf({ availablePowerW: watts, ladder: [shunt('R1', resistor(60))] }))[0];
    const legs = stressOf(problemOf({ availablePowerW: watts, ladder: [shunt('R1', resistor(30), true)] }))[0];
    same(at(legs), [at(across)[0] / 2, at(across)[1], at(across)[2] / 2]);
  });
  it('a bridge has no voltage, empty pads no current', () => {
    const [pads, wire] = stressOf(problemOf({ availablePowerW: watts, ladder: [notFitted('C1'), bridge('R1')] }));
    same(at(pads), [Math.SQRT2 * 10, 0, 0]);
    same(at(wire), [0, 0.2, 0]);
  });
  it('a transformer shows the larger of both sides', () => {
    const problem = problemOf({
      availablePowerW: watts, load: ohms(200), ladder: [{ form: 'transformer', name: 'T1', turnsSource: 1, turnsLoad: 2, windingH: null, coupling: 1 }],
    });
    same(at(stressOf(problem)[0]), [Math.SQRT2 * 20, 0.2, 0]);
  });
});

describe('stress of a block', () => {
  // A matched pad of 3 dB from a file; invented, the same at both points.
  const half = Math.SQRT1_2;
  const pad = { ports: 2, frequencyHz: points(0.9e9, 1.1e9), referenceOhm: points(50, 50), sRe: points(0, half, half, 0, 0, half, half, 0), sIm: new Float64Array(8) };
  const block: Element = { form: 'block', name: 'F1', data: pad, reversed: false };
  it('half of the power stays in it; voltage and current are those of the source\'s side', () => {
    const [f1, load] = stressOf(problemOf({ availablePowerW: 2, ladder: [block] }));
    [Math.SQRT2 * 10, 0.2, 1].forEach((expected, k) => near(at(f1)[k], expected, 1e-9));
    near(at(load)[2], 1, 1e-9);
  });
  it('one that lets nothing through still has a voltage at its input', () => {
    const wall: Element = { ...block, data: { ...pad, sRe: points(1, 0, 0, 1, 1, 0, 0, 1) } };
    const [f1, load] = stressOf(problemOf({ availablePowerW: 2, ladder: [wall] }));
    near(at(f1)[0], Math.SQRT2 * 20, 1e-9);
    assert.deepEqual(at(load), [0, 0, 0]);
  });
});

describe('stress of opens, shorts and resonances', () => {
  // E = 20 V rms from 50 Ω.
  const stressed = (load: Problem['cases'][number]['load'], ladder: Element[]) => stressOf(problemOf({ availablePowerW: 2, load, ladder }));
  it('an open load has all the voltage and no current', () => same(at(stressed({ form: 'open' }, [])[0]), [Math.SQRT2 * 20, 0, 0]));
  it('a shorted load has all the current', () => same(at(stressed({ form: 'short' }, [])[0]), [0, 0.4, 0]));
  it('an open in series keeps everything from the load', () => {
    const [c1, load] = stressed(ohms(50), [series('C1', { form: 'open' })]);
    same(at(c1), [Math.SQRT2 * 20, 0, 0]);
    same(at(load), [0, 0, 0]);
  });
  it('a short across keeps everything from the load', () => {
    const [l1, load] = stressed(ohms(50), [shunt('L1', { form: 'short' })]);
    same(at(l1), [0, 0.4, 0]);
    same(at(load), [0, 0, 0]);
  });
  it('an open behind an open', () => {
    const [c1, l1] = stressed({ form: 'open' }, [series('C1', { form: 'open' }), series('L1', resistor(10))]);
    assert.equal(at(c1)[1], 0);
    same(at(l1), [0, 0, 0]);
  });
  it('a quarter-wave open stub is a short at its root', () => {
    const [stub, load] = stressed(ohms(50), [{ form: 'stub', name: 'S1', end: 'open', line: lineOf(50, 0.25, 1e9) }]);
    assert.ok(at(stub)[0] < 1e-12);
    near(at(stub)[1], 0.4, 1e-12);
    assert.ok(at(load)[2] < 1e-25);
  });
});

describe('stress along a line', () => {
  // 150 Ω on 50 Ω: SWR 3. 2 W available, 1.5 W delivered: |V+| = 10 V, so 15 V and 5 V rms, 0.3 A and 0.1 A.
  const onLine = (turns: number) => at(stressOf(problemOf({ availablePowerW: 2, load: ohms(150), ladder: [{ form: 'line', name: 'T1', line: lineOf(50, turns, 1e9) }] }))[0]);
  it('half a wave meets both peaks', () => same(onLine(0.5), [Math.SQRT2 * 15, 0.3, 0]));
  it('a little line has the voltage peak at the load and no current peak', () => {
    const [voltage, current] = onLine(0.05);
    near(voltage, Math.SQRT2 * 15, 1e-12);
    assert.ok(current > 0.1 && current < 0.2, `${current}`);
  });
  it('three eighths of a wave, load capacitive: the peaks lie inside, between both ends', () => {
    // Γ = −j0.5 first points to the voltage minimum (90° of turn), then to the maximum (270°): both inside 0.4 λ (288°).
    const load = { form: 'reflection', reflection: { re: 0, im: -0.5 }, referenceOhm: 50 } as const;
    const stress = at(stressOf(problemOf({ availablePowerW: 2, load, ladder: [{ form: 'line', name: 'T1', line: lineOf(50, 0.4, 1e9) }] }))[0]);
    same(stress, [Math.SQRT2 * 15, 0.3, 0]);
  });
  it('is what one finds by cutting the line into many pieces, with loss too', () => {
    for (const lossDb of [0, 0.5, 3]) {
      const pieces = 400;
      const whole = lineOf(35, 1.1, 1e9, lossDb);
      const piece = { ...whole, lengthM: whole.lengthM / pieces, conductorLossDb: lossDb / pieces };
      const load = ohms(12, 40);
      const cut = stressOf(problemOf({ load, ladder: Array.from({ length: pieces }, (): Element => ({ form: 'line', name: 'T1', line: piece })) })).slice(0, -1);
      const [voltage, current] = at(stressOf(problemOf({ load, ladder: [{ form: 'line', name: 'T1', line: whole }] }))[0]);
      near(voltage, Math.max(...cut.map((stress) => at(stress)[0])), 1e-3);
      near(current, Math.max(...cut.map((stress) => at(stress)[1])), 1e-3);
    }
  });
  it('a lossy line heats by what it loses', () => {
    const [, , heat] = at(stressOf(problemOf({ availablePowerW: 2, ladder: [{ form: 'line', name: 'T1', line: lineOf(50, 0.4, 1e9, 3) }] }))[0]);
    near(heat, 2 * (1 - 10 ** -0.3), 1e-12);
  });
});

describe('power balance', () => {
  const losses: Loss[] = [{ law: 'none' }, { law: 'constant q', q: 30 }, { law: 'skin effect', q: 50, atHz: 900e6 }, { law: 'resistance', resistanceOhm: 2 }];
  const lossArbitrary = fc.constantFrom(...losses);
  const branchArbitrary = fc.oneof(
    fc.tuple(fc.double({ min: 0.5e-9, max: 50e-9, noNaN: true }), lossArbitrary).map(([value, loss]) => ({ form: 'part' as const, part: { ...idealPart('inductor', value), loss, srfHz: 6e9 } })),
    fc.tuple(fc.double({ min: 0.3e-12, max: 50e-12, noNaN: true }), lossArbitrary).map(([value, loss]) => ({ form: 'part' as const, part: { ...idealPart('capacitor', value), loss, eslH: 0.3e-9 } })),
    fc.double({ min: 1, max: 300, noNaN: true }).map((value) => resistor(value)),
  );
  const elementArbitrary: fc.Arbitrary<Element> = fc.oneof(
    { weight: 4, arbitrary: fc.tuple(branchArbitrary, fc.boolean(), fc.boolean()).map(([branch, across, pair]) => (across ? shunt('X1', branch, pair) : series('X1', branch, pair))) },
    fc.tuple(fc.double({ min: 20, max: 120, noNaN: true }), fc.double({ min: 0, max: 0.6, noNaN: true }), fc.constantFrom(0, 0.5, 2))
      .map(([ohm, turns, lossDb]): Element => ({ form: 'line', name: 'T1', line: lineOf(ohm, turns, 1e9, lossDb) })),
    fc.boolean().map((open): Element => ({ form: 'stub', name: 'S1', end: open ? 'open' : 'short', line: lineOf(60, 0.11, 1e9) })),
    fc.double({ min: 0.5, max: 2, noNaN: true }).map((turns): Element => ({ form: 'transformer', name: 'T2', turnsSource: 1, turnsLoad: turns, windingH: 20e-9, coupling: 0.8 })),
  );
  it('available = reflected + all dissipations + load', () => {
    fc.assert(fc.property(
      fc.array(elementArbitrary, { maxLength: 7 }), fc.double({ min: 1, max: 200, noNaN: true }), fc.double({ min: -200, max: 200, noNaN: true }),
      fc.double({ min: 5, max: 100, noNaN: true }), fc.double({ min: -60, max: 60, noNaN: true }),
      (ladder, rl, xl, rs, xs) => {
        const problem = problemOf({ availablePowerW: 3, load: ohms(rl, xl), sourceOhm: ohms(rs, xs), ladder, bands: [band('main', evenly(0.8e9, 1.2e9, 3))] });
        const trace = sampler(problem, ladder).trace(placeOfBand(problem.bands[0]), 0);
        const stress = trace.stress();
        const { re, im } = trace.reflection();
        for (let k = 0; k < 3; k++) {
          const dissipated = stress.slice(0, -1).map(({ dissipationW }, n) => dissipationW[k] * (ladder[n].form === 'branch' && ladder[n].pair ? 2 : 1));
          const sum = 3 * (re[k] ** 2 + im[k] ** 2) + dissipated.reduce((a, b) => a + b, 0) + stress[ladder.length].dissipationW[k];
          assert.ok(Math.abs(sum - 3) < 3e-9, `${sum}`);
          near(stress[ladder.length].dissipationW[k], 3 * trace.gain()[k], 1e-9);
          for (const watts of dissipated) assert.ok(watts > -1e-9);
        }
      },
    ), { numRuns: 300, seed: 11 });
  });
});

describe('stress in goals and in the table', () => {
  const ladder = [shunt('C1', capacitor(3e-12)), series('L1', inductor(5e-9))];
  const problem = problemOf({
    availablePowerW: 1, load: { one: ohms(80), two: ohms(20, 30) }, ladder,
    bands: [band('low', points(0.8e9)), band('high', points(1.1e9)), band('seen', points(2e9), true)],
  });
  it('a goal takes the worst over its bands and cases, and the table is the same', () => {
    const element = evaluate(problem).elements[0];
    const voltage = judge(problem, goalOf('voltage', '<=', 10, { elementName: 'C1', unit: 'V' }));
    const byHand = [0.8e9, 1.1e9].flatMap((frequencyHz) => [0, 1].map((which) => {
      const spot = sampler(problem, ladder).trace({ key: null, frequencyHz: points(frequencyHz), band: null }, which);
      return { value: spot.stress()[0].peakVoltageV[0], frequencyHz, caseName: ['one', 'two'][which] };
    })).sort((a, b) => b.value - a.value)[0];
    assert.deepEqual([voltage.value, voltage.frequencyHz, voltage.caseName], [byHand.value, byHand.frequencyHz, byHand.caseName]);
    assert.equal(element.peakVoltageV, byHand.value);
  });
  it('`load` counts as a name', () => {
    const result = judge(problem, goalOf('dissipation', '<=', 1, { elementName: 'load', caseName: 'one', place: { form: 'frequency', frequencyHz: 1e9 }, unit: 'W' }));
    const gain = judge(problem, goalOf('gain', '<=', 0, { caseName: 'one', place: { form: 'frequency', frequencyHz: 1e9 } })).value!;
    near(result.value, 10 ** (gain / 10), 1e-12);
  });
  it('the worst of all elements at once, and of the load', () => {
    const found = worstStress(sampler(problem, ladder), problem.bands.slice(0, 2).map(placeOfBand));
    const loadVoltage = judge(problem, goalOf('voltage', '<=', 10, { elementName: 'load' })).value;
    assert.deepEqual([found.elements?.length, found.load?.peakVoltageV, found.reason], [2, loadVoltage, null]);
    const heat = judge(problem, goalOf('dissipation', '<=', 10, { elementName: 'load' })).value;
    assert.equal(found.load?.dissipationW, heat);
  });
  it('is the worst of all bands, watched ones too', () => {
    const inBand = (band: string) => judge(problem, goalOf('current', '<=', 1, { elementName: 'L1', place: { form: 'band', band } })).value!;
    const worst = Math.max(...problem.bands.map(({ name }) => inBand(name)));
    assert.equal(worst, inBand('seen'));
    assert.ok(problem.bands[2].watch);
    assert.equal(evaluate(problem).elements[1].rmsCurrentA, worst);
  });
  it('leaves out a watched band that is not known', () => {
    const seen = { ...problem, bands: [...problem.bands.slice(0, 2), { ...problem.bands[2], frequencyHz: Float64Array.of(5e9) }] };
    const file = fileOf(onePort(evenly(0.5e9, 2e9, 16), () => ({ re: 0.1, im: 0 })));
    const partly = problemOf({ load: { one: file }, ladder, bands: seen.bands });
    assert.equal(evaluate(partly).elements[1].rmsCurrentA, evaluate({ ...partly, bands: seen.bands.slice(0, 2) }).elements[1].rmsCurrentA);
    assert.notEqual(evaluate(partly).elements[1].rmsCurrentA, null);
  });
  it('where a case is not known in a band there is no worst, with the reason', () => {
    const partly = problemOf({ load: { one: ohms(80), two: fileOf(onePort(evenly(0.7e9, 0.9e9, 5), () => ({ re: 0.1, im: 0 }))) }, ladder, bands: problem.bands });
    const [c1] = evaluate(partly).elements;
    assert.deepEqual([c1.peakVoltageV, c1.rmsCurrentA, c1.dissipationW], [null, null, null]);
    assert.match(c1.reason!, /^load two: /);
  });
});
