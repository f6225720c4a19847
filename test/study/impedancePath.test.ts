import assert from 'node:assert/strict';
import type { Complex } from '../../src/network/complex';
import type { Element } from '../../src/network/element';
import type { PathStep } from '../../src/study/evaluation';
import { evaluate } from '../../src/study/evaluate';
import { impedancePath } from '../../src/study/impedancePath';
import { bridge, capacitor, fileOf, inductor, lineOf, near, notFitted, ohms, onePort, points, problemOf, resistor, series, shunt } from './problems';

const impedanceAt = (step: PathStep, k: number): Complex => {
  const re = step.arc.re[k], im = step.arc.im[k];
  const size = (1 - re) ** 2 + im ** 2;
  return { re: (50 * (1 - re * re - im * im)) / size, im: (50 * 2 * im) / size };
};
const conductanceOf = ({ re, im }: Complex) => re / (re * re + im * im);
const longestStep = ({ arc }: PathStep) => Math.max(...Array.from(arc.re.subarray(1), (re, k) => Math.hypot(re - arc.re[k], arc.im[k + 1] - arc.im[k])));

const path = (ladder: Element[], load = ohms(25, 10), frequencyHz = 1e9) => impedancePath(problemOf({ load, ladder }), 0, frequencyHz);

describe('the path from the load to the source', () => {
  const ladder = [shunt('C1', capacitor(2e-12)), series('L1', inductor(10e-9)), series('C2', capacitor(3e-12)), shunt('L2', inductor(4e-9))];

  it('goes on where the element before ended, and ends at the input', () => {
    const { load, steps } = path(ladder);
    const input = evaluate(problemOf({ load: ohms(25, 10), ladder, sweepHz: points(1e9) })).traces[0].chartReflection;
    let before = load!;
    assert.deepEqual(steps.map(({ name, orientation }) => `${orientation} ${name}`), ['shunt C1', 'series L1', 'series C2', 'shunt L2']);
    for (const step of steps) {
      assert.deepEqual([step.arc.re[0], step.arc.im[0]], [before.re, before.im]);
      before = step.reflectionAfter;
      assert.deepEqual([step.arc.re.at(-1), step.arc.im.at(-1)], [before.re, before.im]);
    }
    near(before.re, input.re[0], 1e-12);
    near(before.im, input.im[0], 1e-12);
  });
  it('keeps to constant resistance in series and to constant conductance across, where nothing has loss', () => {
    for (const step of path(ladder).steps) {
      const constant = step.orientation === 'series' ? (z: Complex) => z.re : conductanceOf;
      for (let k = 0; k < step.arc.re.length; k++) near(constant(impedanceAt(step, k)), constant(impedanceAt(step, 0)), 1e-9, step.name);
    }
  });
  it('goes the way the element pushes: coils clockwise on the impedance chart in series, never round the other side', () => {
    const reactances = (step: PathStep) => Array.from(step.arc.re, (_, k) => impedanceAt(step, k).im);
    const [, l1, c2] = path(ladder).steps;
    const rising = (values: number[]) => values.every((value, k) => k === 0 || value > values[k - 1]);
    assert.ok(rising(reactances(l1)));
    assert.ok(rising(reactances(c2).reverse()));
  });
  it('has points close to each other, also for elements that go nearly all the way round', () => {
    for (const element of [series('C1', capacitor(1e-15)), shunt('L1', inductor(1e-13)), series('L1', inductor(1e-6)), shunt('C1', capacitor(1e-9))]) {
      assert.ok(longestStep(path([element]).steps[0]) < 0.25, element.name);
    }
  });
  it('a loss pulls the arc off its circle', () => {
    const [step] = path([series('L1', inductor(10e-9, { loss: { law: 'constant q', q: 10 } }))]).steps;
    assert.ok(impedanceAt(step, 16).re > 25.5);
  });
  it('an open and a short end at the rim', () => {
    const [open] = path([series('C1', { form: 'open' })]).steps;
    assert.deepEqual(open.reflectionAfter, { re: 1, im: 0 });
    assert.equal(open.impedanceAfterOhm.re, Infinity);
    const [short] = path([shunt('L1', { form: 'short' })]).steps;
    assert.ok(Math.hypot(short.reflectionAfter.re + 1, short.reflectionAfter.im) < 1e-12);
    for (const step of [open, short]) {
      assert.ok(step.arc.re.every(Number.isFinite) && step.arc.im.every(Number.isFinite));
      assert.ok(longestStep(step) < 0.25);
    }
  });
  it('an open and a short as loads', () => {
    for (const load of [{ form: 'open' }, { form: 'short' }] as const) {
      for (const step of path(ladder, load as never).steps) assert.ok(step.arc.re.every(Number.isFinite) && step.arc.im.every(Number.isFinite));
    }
  });
  it('a line turns clockwise at constant |Γ| against its own impedance, with a point for every few degrees', () => {
    const [step] = path([{ form: 'line', name: 'T1', line: lineOf(50, 0.3, 1e9) }]).steps;
    const size = Math.hypot(step.arc.re[0], step.arc.im[0]);
    for (let k = 0; k < step.arc.re.length; k++) near(Math.hypot(step.arc.re[k], step.arc.im[k]), size, 1e-9);
    const turn = Math.atan2(step.arc.im[1], step.arc.re[1]) - Math.atan2(step.arc.im[0], step.arc.re[0]);
    assert.ok(turn < 0 && turn > -0.13, `${turn}`);
    const longer = path([{ form: 'line', name: 'T1', line: lineOf(50, 100, 1e9) }]).steps[0];
    assert.equal(longer.arc.re.length, 361);
  });
  it('a transformer is one straight step; a bridge and empty pads stay where they are', () => {
    const { steps } = path([bridge('R1'), notFitted('C1'), { form: 'transformer', name: 'T1', turnsSource: 2, turnsLoad: 1, windingH: null, coupling: 1 }]);
    assert.deepEqual(steps.map(({ arc }) => arc.re.length), [2, 2, 2]);
    assert.deepEqual(steps[0].reflectionAfter, steps[1].reflectionAfter);
    near(steps[2].impedanceAfterOhm.re, 100, 1e-12);
  });
  it('stops before what is not known, and has no start without a load', () => {
    const unsolved: Element = { form: 'unsolved', name: 'C9', orientation: 'shunt', kind: 'capacitor' };
    assert.deepEqual(path([series('R1', resistor(5)), unsolved, series('R2', resistor(5))]).steps.map(({ name }) => name), ['R1']);
    const file = fileOf(onePort(points(0.8e9, 0.9e9), () => ({ re: 0.1, im: 0 })));
    assert.deepEqual(impedancePath(problemOf({ load: file, ladder }), 0, 1e9), { caseName: null, frequencyHz: 1e9, load: null, steps: [] });
  });
});
