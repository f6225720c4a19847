import assert from 'node:assert/strict';
import type { Element } from '../../src/network/element';
import type { Goal } from '../../src/study/goal';
import { evaluate } from '../../src/study/evaluate';
import { unsolvedElements } from '../../src/study/obstacles';
import type { Problem } from '../../src/study/problem';
import {
  band, bridge, capacitor, evenly, fileOf, goalOf, inductor, judge, lineOf, near, notFitted, ohms, onePort, points, problemOf, resistor, series, shunt,
} from './problems';

const lossless = problemOf({ load: ohms(25, 10), ladder: [shunt('C1', capacitor(2e-12)), series('L1', inductor(10e-9))] });

describe('goals at their limit', () => {
  // A load of 150 Ω: VSWR is exactly 3, |Γ| exactly 0.5.
  const problem = problemOf({ load: ohms(150) });
  for (const [comparison, ok] of [['>=', true], ['<=', true], ['>', false], ['<', false]] as const) {
    it(`reflection ${comparison} 0.5 ${ok ? 'holds' : 'is missed'}`, () => {
      const result = judge(problem, goalOf('reflection', comparison, 0.5));
      assert.deepEqual([result.ok, result.value, result.margin, result.reason], [ok, 0.5, 0, null]);
    });
  }

  it('margins are in the goal\'s unit and positive where it holds', () => {
    near(judge(problem, goalOf('VSWR', '<=', 3.5)).margin, 0.5, 1e-12);
    near(judge(problem, goalOf('VSWR', '<=', 2.5)).margin, -0.5, 1e-12);
    near(judge(problem, goalOf('return loss', '>=', 5)).margin, 20 * Math.log10(2) - 5, 1e-12);
    near(judge(problem, goalOf('return loss', '<=', 7)).margin, 7 - 20 * Math.log10(2), 1e-12);
  });
});

describe('values without bound', () => {
  const infinite: [string, Problem, Goal, boolean][] = [
    ['return loss of a perfect match', problemOf({}), goalOf('return loss', '>=', 40), true],
    ['return loss of a perfect match, forbidden', problemOf({}), goalOf('return loss', '<=', 40), false],
    ['VSWR of an open', problemOf({ load: { form: 'open' } }), goalOf('VSWR', '<=', 3), false],
    ['VSWR of a short, wanted', problemOf({ load: { form: 'short' } }), goalOf('VSWR', '>=', 3), true],
    ['VSWR of a pure reactance', problemOf({ load: ohms(0, 37.3), ladder: [series('L1', inductor(3.3e-9))] }), goalOf('VSWR', '<=', 3), false],
    ['mismatch loss of an open', problemOf({ load: { form: 'open' } }), goalOf('mismatch loss', '<=', 3), false],
    ['gain into an open', problemOf({ load: { form: 'open' }, ladder: lossless.ladder }), goalOf('gain', '>=', -1), false],
    ['gain into a short, as a stop', problemOf({ load: { form: 'short' }, ladder: lossless.ladder }), goalOf('gain', '<=', -10), true],
    ['insertion loss of an open in series', problemOf({ ladder: [series('C1', { form: 'open' })] }), goalOf('insertion loss', '<=', 1), false],
    ['insertion loss of a short across', problemOf({ ladder: [shunt('C1', { form: 'short' })] }), goalOf('insertion loss', '>=', 1), true],
    ['input resistance of an open', problemOf({ load: { form: 'open' } }), goalOf('input resistance', '<=', 100), false],
    ['input reactance of an open, from above', problemOf({ load: { form: 'open' } }), goalOf('input reactance', '<=', 100), false],
    ['input reactance of an open, from below', problemOf({ load: { form: 'open' } }), goalOf('input reactance', '>=', -100), false],
  ];
  for (const [what, problem, goal, ok] of infinite) {
    it(what, () => {
      const result = judge(problem, goal);
      assert.deepEqual([result.ok, result.value, result.margin, result.reason], [ok, null, null, null]);
    });
  }

  it('return loss of an open is 0 dB', () => {
    assert.equal(judge(problemOf({ load: { form: 'open' } }), goalOf('return loss', '>=', 1)).value, 0);
  });

  it('the ladder takes no power: efficiency is not known, and says so', () => {
    const result = judge(problemOf({ load: { form: 'open' } }), goalOf('efficiency', '>=', 50, { unit: '%' }));
    assert.deepEqual([result.ok, result.value, result.margin], [false, null, null]);
    assert.match(result.reason!, /no power/);
  });

  it('more than total reflection has a negative return loss and no VSWR', () => {
    const active = problemOf({ load: { form: 'reflection', reflection: { re: 1.5, im: 0 }, referenceOhm: 50 } });
    near(judge(active, goalOf('return loss', '>=', 10)).value, -20 * Math.log10(1.5), 1e-12);
    assert.match(judge(active, goalOf('VSWR', '<=', 2)).reason!, /above 1/);
    assert.match(judge(active, goalOf('mismatch loss', '<=', 2)).reason!, /above 1/);
    const { cases } = evaluate(active).bands[0];
    assert.equal(cases[0].worstVswr, null);
    near(cases[0].worstReflection, 1.5, 1e-12);
  });
});

describe('a lossless resonance exactly at a point', () => {
  // 1/(2π√(LC)) with L = 1/(ω·1), C = 1/ω: X of the trap is 0 or infinite at ω to the last bit or nearly so.
  const omega = 2 * Math.PI * 1e9;
  const trap = (form: 'series' | 'parallel') => ({ form, members: [inductor(50 / omega), capacitor(1 / (50 * omega))] }) as const;
  it('a series trap across the path stops everything', () => {
    const result = judge(problemOf({ ladder: [shunt('trap', trap('series'))] }), goalOf('gain', '<=', -200));
    assert.equal(result.ok, true);
    assert.equal(result.reason, null);
  });
  it('a parallel trap across the path does nothing', () => {
    const value = judge(problemOf({ ladder: [shunt('trap', trap('parallel'))] }), goalOf('gain', '>=', -1e-12)).value;
    assert.ok(value !== null && Math.abs(value) < 1e-12);
  });
  it('a quarter-wave shorted stub does nothing, a quarter-wave open one stops everything', () => {
    const stub = (end: 'open' | 'short'): Element => ({ form: 'stub', name: 'S1', end, line: lineOf(50, 0.25, 1e9) });
    near(10 ** (judge(problemOf({ ladder: [stub('short')] }), goalOf('gain', '>=', -1)).value! / 10), 1, 1e-12);
    const stopped = judge(problemOf({ ladder: [stub('open')] }), goalOf('gain', '<=', -200));
    assert.equal(stopped.ok, true);
  });
});

describe('where goals are judged', () => {
  // R in series with a coil: |Γ| grows with frequency.
  const load = { form: 'series', members: [resistor(50), inductor(5e-9)] } as const;
  const reflectionAt = (f: number, l = 5e-9) => { const x = 2 * Math.PI * f * l; return x / Math.hypot(100, x); };
  const problem = problemOf({
    load, bands: [band('low', evenly(0.9e9, 1e9, 5)), band('high', evenly(1.5e9, 1.6e9, 5)), band('seen', evenly(3e9, 4e9, 5), true)],
  });
  const worst = (place: Goal['place']) => {
    const { value, frequencyHz } = judge(problem, goalOf('reflection', '<=', 1, { place }));
    near(value, reflectionAt(frequencyHz!), 1e-12);
    return frequencyHz;
  };
  it('without a place: all bands but watched ones', () => assert.equal(worst({ form: 'bands' }), 1.6e9));
  it('a band, a watched one too', () => {
    assert.equal(worst({ form: 'band', band: 'low' }), 1e9);
    assert.equal(worst({ form: 'band', band: 'seen' }), 4e9);
  });
  it('a frequency and a range', () => {
    assert.equal(worst({ form: 'frequency', frequencyHz: 2.2e9 }), 2.2e9);
    assert.equal(worst({ form: 'range', frequencyHz: evenly(2e9, 2.5e9, 3) }), 2.5e9);
  });
  it('a multiple of a band', () => assert.equal(worst({ form: 'harmonic', order: 3, band: 'low' }), 3e9));
  it('a lower limit is worst where the value is smallest', () => {
    assert.equal(judge(problem, goalOf('reflection', '>=', 0.01)).frequencyHz, 0.9e9);
  });
  it('a band that does not exist, and bands that are all watched', () => {
    assert.match(judge(problem, goalOf('gain', '>=', -1, { place: { form: 'band', band: 'none' } })).reason!, /no band called none/);
    const watched = problemOf({ bands: [band('seen', points(1e9), true)] });
    assert.match(judge(watched, goalOf('gain', '>=', -1)).reason!, /only watched/);
  });

  const twoCases = problemOf({ load: { dry: { form: 'series', members: [resistor(50), inductor(2e-9)] }, wet: load }, bands: [band('low', evenly(0.9e9, 1e9, 5))] });
  it('every case, or the one that is named', () => {
    const all = judge(twoCases, goalOf('reflection', '<=', 1));
    assert.deepEqual([all.caseName, all.frequencyHz], ['wet', 1e9]);
    const dry = judge(twoCases, goalOf('reflection', '<=', 1, { caseName: 'dry' }));
    assert.equal(dry.caseName, 'dry');
    near(dry.value, reflectionAt(1e9, 2e-9), 1e-12);
    assert.match(judge(twoCases, goalOf('reflection', '<=', 1, { caseName: 'iced' })).reason!, /no load case called iced/);
  });
  it('into another load: no case is named', () => {
    const result = judge(twoCases, goalOf('reflection', '<=', 1, { into: ohms(150) }));
    assert.deepEqual([result.value, result.caseName, result.frequencyHz], [0.5, null, 0.9e9]);
  });
  it('of equal ones the first frequency, then the first case', () => {
    const same = problemOf({ load: { one: ohms(100), two: ohms(100) }, bands: [band('later', points(2e9, 3e9)), band('sooner', points(1e9))] });
    const result = judge(same, goalOf('VSWR', '<=', 1.5));
    assert.deepEqual([result.frequencyHz, result.caseName], [1e9, 'one']);
  });
});

describe('what is not known', () => {
  const data = onePort(evenly(0.7e9, 1e9, 7), () => ({ re: 0.2, im: 0.1 }));
  const covered = band('inside', evenly(0.8e9, 0.9e9, 5));
  const beyond = band('beyond', evenly(0.95e9, 1.05e9, 5));
  const problem = problemOf({ load: { bench: ohms(50), field: fileOf(data) }, bands: [covered, beyond], sweepHz: evenly(0.6e9, 1.1e9, 11) });

  it('a band that the file does not cover: no value, the case and the file\'s reason', () => {
    const result = judge(problem, goalOf('return loss', '>=', 10, { place: { form: 'band', band: 'beyond' } }));
    assert.deepEqual([result.ok, result.value, result.margin, result.caseName, result.frequencyHz], [false, null, null, 'field', 1.025e9]);
    assert.match(result.reason!, /^load field: .*700 MHz.*1 GHz/);
  });
  it('the covered band, the other case, and a load of its own are known', () => {
    const inside: Partial<Goal> = { place: { form: 'band', band: 'inside' } };
    near(judge(problem, goalOf('reflection', '<=', 1, inside)).value, Math.hypot(0.2, 0.1), 1e-12);
    assert.equal(judge(problem, goalOf('return loss', '>=', 10, { caseName: 'bench', place: { form: 'band', band: 'beyond' } })).reason, null);
    assert.equal(judge(problem, goalOf('return loss', '>=', 10, { into: ohms(50), place: { form: 'harmonic', order: 2, band: 'beyond' } })).ok, true);
  });
  it('a harmonic outside of the file', () => {
    const result = judge(problem, goalOf('rejection', '>=', 10, { place: { form: 'harmonic', order: 2, band: 'inside' } }));
    assert.match(result.reason!, /^load field: /);
    assert.equal(result.ok, false);
  });
  it('bands and traces say it, point by point', () => {
    const { bands, traces } = evaluate(problem);
    assert.deepEqual(bands[1].cases[1], {
      caseName: 'field', worstReflection: null, worstReturnLossDb: null, worstVswr: null, worstGainDb: null, atHz: null, reason: bands[1].cases[1].reason,
    });
    assert.match(bands[1].cases[1].reason!, /^load field: /);
    assert.equal(bands[0].cases[1].reason, null);
    const trace = traces[1];
    assert.deepEqual([...trace.known], [0, 0, 1, 1, 1, 1, 1, 1, 1, 0, 0]);
    for (const list of [trace.reflection.re, trace.chartReflection.im, trace.impedanceOhm.re, trace.gainDb, trace.efficiency]) {
      assert.deepEqual(Array.from(list, (value) => (Number.isNaN(value) ? 0 : 1)), [...trace.known]);
    }
    assert.equal(traces[0].reason, null);
  });

  const unsolved: Element = { form: 'unsolved', name: 'C9', orientation: 'shunt', kind: 'capacitor' };
  const faulty: Element = { form: 'faulty', name: 'L9', orientation: 'series', reason: 'a negative inductance' };
  const everyGoal: Goal[] = [
    goalOf('return loss', '>=', 10), goalOf('rejection', '>=', 1), goalOf('bandwidth', '>=', 1), goalOf('parts', '<=', 3), goalOf('dc path'),
    goalOf('voltage', '<=', 3, { elementName: 'C1' }), goalOf('yield', '>=', 90, { unit: '%' }),
  ];
  for (const [what, ladder, reason] of [
    ['an unsolved element', [...lossless.ladder, unsolved], /^C9 is still to be solved$/],
    ['several unsolved elements', [unsolved, { ...unsolved, name: 'C10' }, { ...unsolved, name: 'C11' }], /^C9, C10 and C11 are still to be solved$/],
    ['two unsolved elements', [unsolved, { ...unsolved, name: 'C10' }], /^C9 and C10 are still to be solved$/],
    ['an element that could not be read', [faulty, ...lossless.ladder], /^L9: a negative inductance$/],
  ] as [string, Element[], RegExp][]) {
    it(`${what}: no goal has a value`, () => {
      const evaluation = evaluate({ ...lossless, ladder, goals: everyGoal });
      assert.equal(evaluation.ok, false);
      for (const goal of evaluation.goals) {
        assert.deepEqual([goal.ok, goal.value, goal.margin], [false, null, null]);
        assert.match(goal.reason!, reason);
      }
      assert.deepEqual([...evaluation.traces[0].known], [0, 0, 0]);
    });
  }
  it('an unsolved ladder is not ok, even without goals; the whole ladder counts as one', () => {
    assert.equal(evaluate({ ...lossless, ladder: [unsolved] }).ok, false);
    const task: Problem = { ...lossless, ladder: [], ladderTask: { form: 'up to', elements: 3, choices: [] }, goals: [goalOf('gain', '>=', -1)] };
    assert.deepEqual(unsolvedElements(task), ['ladder']);
    const evaluation = evaluate(task);
    assert.deepEqual([evaluation.ok, evaluation.goals[0].reason, evaluation.elements.length], [false, 'the ladder is still to be solved', 0]);
    assert.equal(evaluation.traces[0].known[0], 0);
    assert.deepEqual(unsolvedElements(lossless), []);
    assert.equal(evaluate(lossless).ok, true);
  });
  it('total reflection is not more than total by rounding', () => {
    for (let nanohenry = 1; nanohenry <= 60; nanohenry++) {
      const problem = problemOf({ load: { form: 'short' }, bands: [band('b', points(868e6))], ladder: [series('L1', inductor(nanohenry * 1e-9))] });
      assert.deepEqual([judge(problem, goalOf('reflection', '<=', 1)).ok, judge(problem, goalOf('return loss', '>=', 0)).ok], [true, true]);
      const [worst] = evaluate({ ...problem, goals: [] }).bands[0].cases;
      assert.ok(worst.worstReflection! <= 1 && worst.worstReturnLossDb! >= 0);
    }
  });
  it('a source that cannot be read', () => {
    const result = judge({ ...lossless, source: { impedance: { form: 'unknown', reason: 'radio.s1p is missing' }, byBand: new Map() } }, goalOf('gain', '>=', -1));
    assert.equal(result.reason, 'source: radio.s1p is missing');
  });
  it('an element of a goal that is not in the ladder', () => {
    assert.match(judge(lossless, goalOf('voltage', '<=', 3, { elementName: 'C7' })).reason!, /no element called C7/);
  });
});

describe('counting parts', () => {
  const count = (ladder: Element[]) => judge({ ...lossless, ladder }, goalOf('parts', '<=', 3)).value;
  it('an empty ladder has none', () => assert.equal(count([]), 0));
  it('each part of a branch, a pair twice, no bridges and empty pads', () => {
    assert.equal(count([bridge('L1'), notFitted('C1'), shunt('C2', capacitor(1e-12)), series('L2', inductor(1e-9), true)]), 3);
    const branch = { form: 'series', members: [inductor(1e-9), { form: 'parallel', members: [capacitor(1e-12), resistor(100)] }] } as const;
    assert.equal(count([shunt('trap', branch)]), 3);
    assert.equal(count([series('trap', branch, true)]), 6);
    assert.equal(count([series('X1', { form: 'short' }), shunt('X2', { form: 'open' })]), 0);
  });
  it('a transformer is a part; what is printed on the board is none', () => {
    assert.equal(count([
      { form: 'line', name: 'T1', line: lineOf(50, 0.1, 1e9) }, { form: 'stub', name: 'S1', end: 'open', line: lineOf(50, 0.1, 1e9) },
      { form: 'transformer', name: 'T2', turnsSource: 1, turnsLoad: 2, windingH: null, coupling: 1 },
    ]), 1);
  });
  it('one too many', () => {
    const result = judge(lossless, goalOf('parts', '<=', 1));
    assert.deepEqual([result.ok, result.value, result.margin, result.frequencyHz, result.caseName], [false, 2, -1, null, null]);
  });
});

describe('yield', () => {
  const goal = goalOf('yield', '>=', 95, { unit: '%' });
  it('needs the spread of builds', () => assert.match(judge(lossless, goal).reason!, /needs the spread of builds/));
  it('takes the share that was found, or the reason why there is none', () => {
    const result = judge(lossless, goal, { yield: 0.97 });
    assert.deepEqual([result.ok, result.value], [true, 97]);
    near(result.margin, 2, 1e-12);
    assert.equal(judge(lossless, goal, { yield: null, yieldReason: 'no part has a tolerance' }).reason, 'no part has a tolerance');
  });
});

describe('efficiency and input impedance', () => {
  // 10 Ω in series with 40 Ω: four fifths of what enters arrive.
  const problem = problemOf({ load: ohms(40), ladder: [series('R1', resistor(10))] });
  it('as a share, in % and in dB', () => {
    near(judge(problem, goalOf('efficiency', '>=', 50, { unit: '%' })).value, 80, 1e-12);
    near(judge(problem, goalOf('efficiency', '>=', -1, { unit: 'dB' })).value, 10 * Math.log10(0.8), 1e-12);
    near(judge(problem, goalOf('efficiency', '>=', 0.5)).value, 0.8, 1e-12);
  });
  it('input resistance and reactance', () => {
    const reactive = problemOf({ load: ohms(25, -10) });
    near(judge(reactive, goalOf('input resistance', '>=', 20)).value, 25, 1e-12);
    near(judge(reactive, goalOf('input reactance', '<=', 0)).value, -10, 1e-12);
  });
});
