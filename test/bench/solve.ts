import { buildModel } from '../../src/description/buildModel';
import { readDescription } from '../../src/description/readDescription';
import { aimOf } from '../../src/solve/aim';
import { catalogueCandidates, type CatalogueTask } from '../../src/solve/catalogueCandidates';
import { conditionsOf } from '../../src/solve/conditions';
import { formsOf, isPosition } from '../../src/solve/forms';
import { choiceAt, shapeOf, slotOf, type LadderShape } from '../../src/solve/ladderShape';
import { searchNodes } from '../../src/solve/limits';
import { trialOf, type Trial } from '../../src/solve/trial';
import type { Problem } from '../../src/study/problem';
import { atLeast, atMost, type BenchRow } from './benchRow';
import { median } from './medianTime';

// Whole ladders of alternating parts, either first, E24 over three decades of reactance, 101 points. The load is invented.

const problemOf = (parts: number): Problem => {
  const text = `ohmward: 1
load: (14 Ω + 3 pF) + 8 nH
bands:
  main: 850 .. 900 MHz, 101 points
ladder: solve up to ${parts} elements from E24
goals:
  - return loss >= 20 dB
`;
  const { problem } = buildModel(readDescription(text, { expressions: true }), new Map());
  if (!problem) throw new Error('the description has no problem');
  return problem;
};

interface Run {
  readonly parts: number;
  readonly seconds: number;
  readonly excess: number;
  /** Of the tenth best: what an early exit may leave at. */
  readonly tenth: number;
  readonly nodes: number;
  readonly shapes: readonly LadderShape[];
  readonly trials: readonly Trial[];
  readonly ladders: number;
}

/** Ladders of exactly so many parts, tables and all. */
function search(parts: number, runs: number): Run {
  const problem = problemOf(parts);
  const { points } = aimOf(problem, true);
  const times: number[] = [];
  const work = () => {
    const forms = formsOf(problem).filter((form) => form.parts === parts);
    const task: CatalogueTask = { forms, points, conditions: conditionsOf(problem), size: 10, nodeLimit: searchNodes };
    const start = performance.now();
    const found = catalogueCandidates(task);
    times.push((performance.now() - start) / 1000);
    if (!found.every(({ proved }) => proved)) throw new Error(`${parts} parts: not proved`);
    return { forms, found };
  };
  if (runs > 1) for (let warm = 0; warm < 3; warm++) work();
  times.length = 0;
  let last = work();
  for (let run = 1; run < runs; run++) last = work();
  const shapes = last.forms.map((form) => shapeOf(form.steps.map((step) => (isPosition(step) ? slotOf(step.orientation, step.items.map(({ element }) => element), step.groups, points.frequencyHz) : step)), points));
  const order = Int32Array.from({ length: points.count }, (_, k) => k);
  return {
    parts, seconds: median(times), excess: last.found[0].excess, tenth: last.found[9].excess, nodes: last.found[0].nodes, shapes,
    trials: shapes.map((shape) => trialOf(shape, points, order)), ladders: shapes.reduce((sum, { size }) => sum + size, 0),
  };
}

/** Seconds that trying all ladders would take, from a sample spread over all of them. */
function tryingAll({ shapes, trials, ladders, tenth }: Run, early: boolean, sample: number): number {
  const most = early ? tenth : Infinity;
  const choices = shapes.map((shape) => Array.from({ length: Math.min(sample, shape.size) }, (_, i, step = shape.size / Math.min(sample, shape.size)) => choiceAt(shape, Math.floor((i + 0.382) * step))));
  let sum = 0;
  const work = () => choices.forEach((own, s) => own.forEach((choice) => { sum += Math.min(1e9, trials[s].excess(choice, most)); }));
  work();
  const start = performance.now();
  work();
  const seconds = (performance.now() - start) / 1000;
  if (!(sum > 0)) throw new Error('nothing was tried');
  return (seconds * ladders) / choices.reduce((count, own) => count + own.length, 0);
}

/** Reproducible, for the optimiser: a linear congruential sequence (Numerical Recipes, §7.1; constants from memory). */
function random(seed: number): () => number {
  let state = seed >>> 0;
  return () => (state = (Math.imul(state, 1664525) + 1013904223) >>> 0) / 2 ** 32;
}

/**
 * Differential evolution (Storn, Price, J. Global Optimization 11, 1997: rand/1/bin, F 0.7, CR 0.9, ten individuals a part) over
 * the continuous places in each catalogue, every form and kinds by themselves, snapped to the nearest value.
 */
function differentialEvolution({ shapes, trials, parts }: Run, seed: number): { seconds: number; excess: number } {
  const generations = 200;
  const size = 10 * parts;
  const next = random(seed);
  const start = performance.now();
  let best = Infinity;
  shapes.forEach((shape, s) => {
    const groups = shape.slots.map(({ group }) => [0, 1].map((kind) => [...group.keys()].filter((i) => group[i] === kind)));
    for (let kinds = 0; kinds < 2 ** parts; kinds++) {
      const items = groups.map((own, slot) => own[(kinds >> slot) & 1]);
      const choice = new Int32Array(parts);
      const cost = (x: Float64Array): number => {
        for (let slot = 0; slot < parts; slot++) choice[slot] = items[slot][Math.min(items[slot].length - 1, Math.max(0, Math.round(x[slot])))];
        return trials[s].excess(choice, Infinity);
      };
      const population = Array.from({ length: size }, () => Float64Array.from({ length: parts }, (_, slot) => next() * (items[slot].length - 1)));
      const costs = population.map(cost);
      for (let generation = 0; generation < generations; generation++) {
        for (let i = 0; i < size; i++) {
          const [a, b, c] = [0, 1, 2].map(() => population[Math.floor(next() * size)]);
          const forced = Math.floor(next() * parts);
          const tried = population[i].map((value, slot) => (slot === forced || next() < 0.9 ? a[slot] + 0.7 * (b[slot] - c[slot]) : value));
          const reached = cost(tried);
          if (reached <= costs[i]) {
            population[i] = tried;
            costs[i] = reached;
          }
        }
      }
      best = Math.min(best, ...costs);
    }
  });
  return { seconds: (performance.now() - start) / 1000, excess: best };
}

export function bench(): BenchRow[] {
  const rows: BenchRow[] = [];
  const tell = ({ parts, seconds, nodes, ladders }: Run) => process.stderr.write(`  ${parts} parts: ${(seconds * 1000).toFixed(1)} ms, ${nodes} nodes for ${ladders.toPrecision(3)} ladders\n`);
  const three = search(3, 11);
  tell(three);
  rows.push(atLeast('proved best of 3 parts, 16 forms', tryingAll(three, false, 20_000) / three.seconds, '× faster than trying all', 300));
  rows.push(atLeast('the same', tryingAll(three, true, 200_000) / three.seconds, '× faster than trying all, leaving early', 23));
  rows.push(atMost('the same', three.seconds / (1 / 60), '× a frame of 1/60 s', 1));
  const four = search(4, 7);
  tell(four);
  rows.push(atLeast('proved best of 4 parts, 32 forms', tryingAll(four, false, 20_000) / four.seconds, '× faster than trying all', 5000));
  rows.push(atLeast('the same', tryingAll(four, true, 200_000) / four.seconds, '× faster than trying all, leaving early', 300));
  const evolved = [1, 2, 3].map((seed) => differentialEvolution(four, seed));
  const found = Math.min(...evolved.map(({ excess }) => excess));
  rows.push(atLeast('the same', median(evolved.map(({ seconds }) => seconds)) / four.seconds, '× faster than differential evolution, snapped', 20));
  rows.push(atLeast('its |Γ|', Math.sqrt(found / four.excess), '× that of ours, the best of three seeds', 1 - 1e-9));
  const five = search(5, 3);
  tell(five);
  rows.push(atMost('proved best of 5 parts, 64 forms', five.seconds / 0.5, '× half a second', 1.5));
  const six = search(6, 1);
  tell(six);
  rows.push(atMost('proved best of 6 parts, 128 forms', six.seconds / 15, '× fifteen seconds', 1));
  return rows;
}
