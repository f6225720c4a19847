import assert from 'node:assert/strict';
import type { Choice } from '../../src/study/unknown';
import { csv, files, marks, model, soundProblem } from './support';

const rest = `bands: {up: 863 .. 870 MHz, high: 2.4 .. 2.5 GHz}
parts:
  coils: inductor E24 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz
  caps: capacitor [1 pF, 2.2 pF, 4.7 pF] ±0.1 pF
  drawer: stock.csv
`;
const stock = files({ 'stock.csv': csv('kind,value,q\nL,3.3 nH,40\nC,1.5 pF,\nR,22 Ω,\nL,3.3 nH,99\n') });
const text = (entries: readonly string[]) => `ohmward: 1\nload: 18 - j37 Ω\nladder:\n${entries.map((entry) => `  - ${entry}\n`).join('')}${rest}`;
const problemOf = (...entries: string[]) => soundProblem(text(entries), stock);
const choicesOf = (entry: string) => problemOf(entry).unknowns[0].choices;
const valuesOf = (choice: Choice | undefined) => (choice?.form === 'catalogue' ? choice.parts.map((part) => part.value) : []);
const near = (actual: number, expected: number) => assert.ok(Math.abs(actual / expected - 1) < 1e-9, `${actual} is not ${expected}`);

/** Middle of the first band: its geometric mean. */
const omega = 2 * Math.PI * Math.sqrt(863e6 * 870e6);

describe('unknown values', () => {
  it('stand in the ladder as unsolved, with what may be put there', () => {
    const { ladder, unknowns } = problemOf('series L1: 3 nH', 'shunt C1: solve', 'series C2: solve from caps or none');
    assert.deepEqual(ladder.slice(1), [{ form: 'unsolved', name: 'C1', orientation: 'shunt', kind: 'capacitor' }, { form: 'unsolved', name: 'C2', orientation: 'series', kind: 'capacitor' }]);
    assert.deepEqual(unknowns.map(({ name, elementIndex, mayOmit, reopened }) => [name, elementIndex, mayOmit, reopened]), [['C1', 1, false, false], ['C2', 2, true, false]]);
  });

  it('reach from z0/30 to 30·z0 of reactance without a range', () => {
    const [coil] = choicesOf('series L1: solve');
    assert.ok(coil.form === 'continuous' && coil.kind === 'inductor');
    near(coil.range.min * omega, 50 / 30);
    near(coil.range.max * omega, 50 * 30);
    const [cap] = choicesOf('shunt C1: solve');
    assert.ok(cap.form === 'continuous');
    near(1 / (omega * cap.range.max), 50 / 30);
    near(1 / (omega * cap.range.min), 50 * 30);
  });

  it('take a range, a series, or both, with their figures', () => {
    const [range] = choicesOf('series L1: solve 1 .. 33 nH Q 30');
    assert.ok(range.form === 'continuous' && 'kind' in range.template);
    assert.deepEqual(range.range, { min: 1e-9, max: 3.3e-8 });
    assert.deepEqual(range.template.loss, { law: 'constant q', q: 30 });
    const [series] = choicesOf('shunt C1: solve from E6 ±2 %');
    assert.ok(series.form === 'catalogue' && series.family === null);
    const reactances = series.parts.map((part) => 1 / (omega * part.value));
    assert.ok(Math.max(...reactances) <= 1500 && Math.min(...reactances) >= 50 / 30 && series.parts.length > 15);
    assert.deepEqual(series.parts[0].tolerance, { form: 'relative', up: 0.02, down: 0.02 });
    assert.deepEqual(valuesOf(choicesOf('shunt C1: solve 1 .. 3 pF from E6')[0]), [1e-12, 1.5e-12, 2.2e-12]);
  });

  it('take the parts of families, in a range where one is stated', () => {
    const [caps] = choicesOf('shunt C1: solve from caps');
    assert.ok(caps.form === 'catalogue' && caps.family === 'caps');
    assert.deepEqual(valuesOf(caps), [1e-12, 2.2e-12, 4.7e-12]);
    assert.deepEqual(caps.parts[0].tolerance, { form: 'absolute', up: 1e-13, down: 1e-13 });
    assert.deepEqual(valuesOf(choicesOf('shunt C1: solve 2 .. 5 pF from caps')[0]), [2.2e-12, 4.7e-12]);
  });

  it('may be either kind under a name that tells none', () => {
    const choices = choicesOf('shunt X1: solve from coils, caps');
    assert.deepEqual(choices.map(({ kind }) => kind), ['inductor', 'capacitor']);
    assert.equal(problemOf('shunt X1: solve from coils, caps').ladder[0].form, 'unsolved');
    assert.deepEqual(choicesOf('shunt X1: solve').map(({ kind }) => kind), ['inductor', 'capacitor']);
    assert.deepEqual(choicesOf('shunt X1: solve 1 .. 33 nH').map(({ kind }) => kind), ['inductor']);
  });

  it('take of a drawer the rows of their kind, of rows with one value the first', () => {
    const [drawer] = choicesOf('series L1: solve from drawer');
    assert.ok(drawer.form === 'catalogue');
    assert.deepEqual(drawer.parts.map(({ value, loss }) => [value, loss]), [[3.3e-9, { law: 'constant q', q: 40 }]]);
  });

  it('take of a drawer no row that a description could not name: another of its value, or of its designation, comes first', () => {
    const rows = 'kind,value,q,part\nC,3.3 pF,10,A1\nC,3.3 pF,20,B2\nC,3.3 pF,30,two words\nC,3.3 pF,40,\nC,3.3 pF,50,A1\nC,4.7 pF,60,B2\nC,4.7 pF,70,B2\nC,6.8 pF,80,"a, b"\n';
    const entry = (phrase: string) => text([`shunt C1: ${phrase}`]);
    const loaded = files({ 'stock.csv': csv(rows) });
    const [choice] = soundProblem(entry('solve from drawer'), loaded).unknowns[0].choices;
    assert.ok(choice.form === 'catalogue');
    const q = ({ loss }: (typeof choice.parts)[number]) => (loss.law === 'constant q' ? loss.q : null);
    assert.deepEqual(choice.parts.map((part, i) => [q(part), choice.labels[i]]), [[10, null], [20, 'B2'], [60, null], [80, null]]);
    const { parts, labels } = choice;
    for (const [i, part] of parts.entries()) {
      const label = labels[i];
      const [named] = soundProblem(entry(`${part.value * 1e12} pF from drawer${label === null ? '' : ` part ${label}`}`), loaded).ladder;
      assert.ok(named.form === 'branch' && named.branch.form === 'part');
      assert.equal(q(named.branch.part), q(part));
    }
  });

  it('may be the length of a line', () => {
    const { ladder, unknowns } = problemOf('line T1: 50 Ω, solve 2 mm .. 40 mm, vf 0.55', 'stub open S1: 70 Ω, solve');
    assert.deepEqual(ladder, [{ form: 'unsolved', name: 'T1', orientation: 'through', kind: 'line' }, { form: 'unsolved', name: 'S1', orientation: 'shunt', kind: 'stub', end: 'open' }]);
    const [line] = unknowns[0].choices;
    assert.ok(line.form === 'continuous' && line.kind === 'line' && 'impedanceOhm' in line.template);
    assert.deepEqual(line.range, { min: 0.002, max: 0.04 });
    assert.deepEqual([line.template.impedanceOhm, line.template.velocityFactor], [50, 0.55]);
  });

  it('may be a pair', () => {
    assert.deepEqual(problemOf('series L1: pair solve from coils').ladder[0], { form: 'unsolved', name: 'L1', orientation: 'series', kind: 'inductor', pair: true });
  });

  it('are reported where nothing can be put there', () => {
    const bad = text(['shunt C1: solve 7 .. 8 pF from caps', 'series L1: solve from nowhere']);
    const { diagnostics, problem } = model(bad, stock);
    assert.deepEqual(marks(bad, diagnostics), ['empty-choice: caps', 'unknown-family: nowhere']);
    assert.deepEqual(problem?.ladder.map(({ form }) => form), ['faulty', 'faulty']);
  });
});

describe('solving again', () => {
  it('reopens values with a family that are not fixed, and nothing else', () => {
    const entries = ['series L1: 13 nH from coils', 'shunt C1: 2.2 pF from caps fixed', 'series C2: 3 pF', 'shunt L2: solve'];
    const { unknowns, ladder } = soundProblem(text(entries), stock, { reopen: true });
    assert.deepEqual(unknowns.map(({ name, reopened, elementIndex }) => [name, reopened, elementIndex]), [['L1', true, 0], ['L2', false, 3]]);
    assert.equal(ladder[0].form, 'branch', 'the value stays until another is chosen');
    assert.equal(unknowns[0].choices[0].form, 'catalogue');
    assert.equal(problemOf(...entries).unknowns.length, 1);
  });
});

describe('a whole ladder to be found', () => {
  const task = (phrase: string) => soundProblem(`ohmward: 1\nload: 18 - j37 Ω\nladder: ${phrase}\n${rest}goals:\n  - voltage L1 <= 3 V\n`, stock);

  it('takes so many elements from families', () => {
    const { ladder, ladderTask, unknowns } = task('solve up to 4 elements from coils, caps');
    assert.deepEqual([ladder, unknowns], [[], []]);
    assert.ok(ladderTask?.form === 'up to' && ladderTask.elements === 4);
    assert.deepEqual(ladderTask.choices.map((choice) => [choice.kind, choice.form === 'catalogue' && choice.family]), [['inductor', 'coils'], ['capacitor', 'caps']]);
  });

  it('may be a pi or a tee with a Q or a bandwidth, of any values', () => {
    const pi = task('solve pi Q 5').ladderTask;
    assert.ok(pi?.form === 'pi' && pi.q === 5 && pi.bandwidthHz === null);
    assert.deepEqual(pi.choices.map(({ form, kind }) => `${form} ${kind}`), ['continuous inductor', 'continuous capacitor']);
    const tee = task('solve tee bandwidth 20 MHz').ladderTask;
    assert.ok(tee?.form === 'tee' && tee.bandwidthHz === 20e6);
  });

  it('names families that there are', () => {
    const bad = `ohmward: 1\nload: 18 - j37 Ω\nladder: solve up to 2 elements from coil\n${rest}`;
    assert.deepEqual(marks(bad, model(bad, stock).diagnostics), ['unknown-family: coil']);
  });
});
