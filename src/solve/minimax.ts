import { smoothMaximum, type Functions } from './smoothMaximum';
import { trustStep } from './trustStep';

export interface MinimaxProblem {
  readonly start: Float64Array;
  readonly lower: Float64Array;
  readonly upper: Float64Array;
  readonly functionCount: number;
  /** In units of the functions: when to stop. Default: 1e-8 of how far they are apart at the start. */
  readonly accuracy?: number;
  /** Bounds the work; a few more where it is less than one model needs. */
  readonly maxEvaluations?: number;
}

export interface MinimaxResult {
  readonly x: Float64Array;
  /** max f_j(x). */
  readonly worst: number;
  /** How often all functions were evaluated. */
  readonly evaluations: number;
}

/** Each level is so much sharper than the one before. */
const sharpening = 4;
const levelsAtMost = 40;
const stepsPerLevel = 100;
/** The first level tells functions apart that differ by this share of their spread at the start. */
const firstLevel = 0.1;
const firstRadius = 0.1;
const largestRadius = 0.5;
/** A level is left when its model promises less than this, over its sharpness. */
const levelDone = 0.1;
const defaultEvaluations = 20_000;

/**
 * A local least of max f_j(x) inside a box, from `start`: smooth functions, some eight variables, any number active. Where
 * they are convex it is the least. The same input gives the same output; the result is never worse than `start`.
 *
 * The maximum is smoothed, and sharpened step by step (Polak, Royset, Womersley, «Algorithms with adaptive smoothing for
 * finite minimax problems», J. Optim. Theory Appl. 119, 2003): Newton's method inside a radius on each level, the next
 * level's start foretold from the last two. Real curvature goes into it, so fewer active functions than variables are an
 * ordinary case.
 */
export function minimax(functions: Functions, problem: MinimaxProblem): MinimaxResult {
  const { lower, upper, functionCount, maxEvaluations = defaultEvaluations } = problem;
  const n = lower.length;
  const start = problem.start.map((value, i) => Math.min(Math.max(value, lower[i]), upper[i]));
  const smooth = smoothMaximum(functions, functionCount, { start, lower, upper });
  const y = smooth.current;
  const best = { x: start, worst: smooth.worst() };
  const low = new Float64Array(n);
  const high = new Float64Array(n);
  const step = new Float64Array(n);
  const next = new Float64Array(n);
  const perModel = 2 + 2 * n + (n * (n - 1)) / 2;
  let radius = firstRadius;

  const spent = (): boolean => smooth.evaluations() + perModel > maxEvaluations;

  /** Evaluates the functions at `next`; remembers it where nothing was better. */
  function look(): void {
    const worst = smooth.tryAt(next);
    if (worst < best.worst) Object.assign(best, { x: smooth.place(next), worst });
  }

  /** By how much the functions differ: between themselves, and over a step of the first radius. */
  function scaleAtStart(): number {
    let scale = smooth.spread();
    for (let i = 0; i < n; i++) {
      next.set(y);
      next[i] += y[i] > 0.5 ? -firstRadius : firstRadius;
      look();
      scale = Math.max(scale, smooth.change());
    }
    return scale;
  }

  /** Optima of growing sharpness s approach their limit as 1/s: the next stands a quarter of the last way ahead. */
  function foretell(before: Float64Array, sharpness: number): void {
    for (let i = 0; i < n; i++) next[i] = inUnit(y[i] + (y[i] - before[i]) / sharpening);
    const here = smooth.value(sharpness);
    look();
    if (smooth.triedValue(sharpness) < here) smooth.accept();
  }

  /** Newton's method on one level; returns what the last model still promised. */
  function descend(sharpness: number, accuracy: number): number {
    let promised = Infinity;
    for (let round = 0; round < stepsPerLevel && !spent(); round++) {
      smooth.model(sharpness);
      for (let i = 0; i < n; i++) {
        low[i] = upper[i] > lower[i] ? -y[i] : 0;
        high[i] = upper[i] > lower[i] ? 1 - y[i] : 0;
      }
      const here = smooth.value(sharpness);
      let inside = false;
      for (;;) {
        promised = trustStep({ gradient: smooth.gradient, hessian: smooth.hessian, low, high }, radius, step);
        if (promised <= Math.max(1e-3 * accuracy, 4 * Number.EPSILON * Math.abs(here))) return promised;
        if (spent()) return promised;
        for (let i = 0; i < n; i++) next[i] = inUnit(y[i] + step[i]);
        look();
        const kept = (here - smooth.triedValue(sharpness)) / promised;
        const length = Math.hypot(...step);
        inside = length < 0.9 * radius;
        if (!(kept > 0.25)) radius = 0.25 * length;
        else if (kept > 0.75) radius = Math.min(largestRadius, Math.max(radius, 2.5 * length));
        if (kept > 1e-4) break;
      }
      smooth.accept();
      // Where the radius holds the step back, a small promise says nothing.
      if (inside && promised < levelDone / sharpness) return promised;
    }
    return promised;
  }

  if (Number.isFinite(best.worst)) {
    const scale = scaleAtStart();
    const accuracy = problem.accuracy ?? scale * 1e-8;
    const before = y.slice();
    let sharpness = 1 / (firstLevel * scale);
    for (let level = 0; level < levelsAtMost && scale > 0 && !spent(); level++, sharpness *= sharpening) {
      const reached = y.slice();
      if (level > 1) foretell(before, sharpness);
      before.set(reached);
      const promised = descend(sharpness, accuracy);
      if (promised <= accuracy && smooth.gap(sharpness) <= accuracy) break;
    }
  }
  return { ...best, evaluations: smooth.evaluations() };
}

const inUnit = (share: number): number => Math.min(1, Math.max(0, share));
