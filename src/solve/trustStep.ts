import { symmetricEigen } from './symmetricEigen';

/** A quadratic model around a point, q(d) = g·d + ½ dᵀH d, and the box that d must stay in; H row by row. */
export interface BoxedModel {
  readonly gradient: Float64Array;
  readonly hessian: Float64Array;
  /** ≤ 0. */
  readonly low: Float64Array;
  /** ≥ 0. */
  readonly high: Float64Array;
}

/**
 * A step inside box and radius that lowers the model, into `step`; returns by how much (≥ 0). H may be indefinite. Without
 * a bound in the way it is the least of the model within the radius (Moré & Sorensen, SIAM J. Sci. Stat. Comput. 4, 1983).
 * A bound in the way holds its variable and the others are asked again, so then it is good, not best; it is never worse
 * than the best step straight down the projected gradient.
 */
export function trustStep({ gradient, hessian, low, high }: BoxedModel, radius: number, step: Float64Array): number {
  const n = gradient.length;
  const free: number[] = [];
  step.fill(0);
  for (let i = 0; i < n; i++) if (high[i] > low[i]) free.push(i);
  let left = radius * radius;
  while (free.length > 0 && left > 0) {
    const part = freeStep(free, gradient, hessian, step, Math.sqrt(left));
    const blocked = firstBlocked(free, part, low, high);
    if (blocked < 0) {
      free.forEach((i, a) => { step[i] = part[a]; });
      break;
    }
    const i = free[blocked];
    step[i] = part[blocked] < 0 ? low[i] : high[i];
    left -= step[i] * step[i];
    free.splice(blocked, 1);
  }
  const lowered = -modelAt(gradient, hessian, step);
  const straight = downhill(gradient, hessian, low, high, radius);
  const straightLowered = -modelAt(gradient, hessian, straight);
  if (lowered >= straightLowered) return Math.max(0, lowered);
  step.set(straight);
  return Math.max(0, straightLowered);
}

export function modelAt(gradient: Float64Array, hessian: Float64Array, step: Float64Array): number {
  const n = gradient.length;
  let value = 0;
  for (let i = 0; i < n; i++) {
    let row = 0;
    for (let k = 0; k < n; k++) row += hessian[i * n + k] * step[k];
    value += step[i] * (gradient[i] + 0.5 * row);
  }
  return value;
}

/** Which of the free variables meets its bound first on the way; −1 where none does. */
function firstBlocked(free: readonly number[], part: Float64Array, low: Float64Array, high: Float64Array): number {
  let first = -1;
  let least = 1;
  free.forEach((i, a) => {
    const room = part[a] < 0 ? low[i] / part[a] : part[a] > 0 ? high[i] / part[a] : Infinity;
    if (room < least) {
      least = room;
      first = a;
    }
  });
  return first;
}

/** Least of the model over the free variables, the others held where `held` has them. */
function freeStep(free: readonly number[], gradient: Float64Array, hessian: Float64Array, held: Float64Array, radius: number): Float64Array {
  const all = gradient.length;
  const n = free.length;
  const matrix = new Float64Array(n * n);
  const slope = new Float64Array(n);
  free.forEach((i, a) => {
    slope[a] = gradient[i];
    for (let k = 0; k < all; k++) slope[a] += hessian[i * all + k] * held[k];
    free.forEach((k, b) => { matrix[a * n + b] = hessian[i * all + k]; });
  });
  const values = new Float64Array(n);
  const vectors = new Float64Array(n * n);
  symmetricEigen(n, matrix, values, vectors);
  const along = values.map((_, k) => free.reduce((sum, _i, a) => sum + vectors[a * n + k] * slope[a], 0));
  const shift = shiftFor(values, along, radius);
  const sizes = values.map((value, k) => -divided(along[k], value + shift));
  const squared = sizes.reduce((sum, size) => sum + size * size, 0);
  // Nothing pulls along the lowest curvature: go there as far as the radius lets.
  const lowest = values.indexOf(Math.min(...values));
  if (values[lowest] < 0 && squared < radius * radius * (1 - 1e-6)) {
    const others = squared - sizes[lowest] ** 2;
    sizes[lowest] = (sizes[lowest] < 0 ? -1 : 1) * Math.sqrt(Math.max(0, radius * radius - others));
  }
  // The shift is found to a thousandth, or to its own rounding.
  const scale = Math.min(1, radius / Math.hypot(...sizes));
  return Float64Array.from(free, (_, a) => scale * sizes.reduce((sum, size, k) => sum + vectors[a * n + k] * size, 0));
}

const divided = (slope: number, curvature: number): number => (slope === 0 || curvature <= 0 ? 0 : slope / curvature);

/** The shift μ ≥ 0 of all curvatures that brings the step inside the radius. */
function shiftFor(values: Float64Array, along: Float64Array, radius: number): number {
  const lowest = Math.min(...values);
  const largest = Math.max(...values.map(Math.abs));
  const length = (shift: number): number => Math.sqrt(values.reduce((sum, value, k) => sum + divided(along[k], value + shift) ** 2, 0));
  // A curvature of 0 with a slope along it has no least: any shift makes it finite.
  const least = Math.max(0, -lowest) + (lowest <= 0 ? Number.EPSILON * (largest + Math.hypot(...along) / radius) : 0);
  if (length(least) <= radius) return least;
  let low = least;
  let high = Math.max(0, -lowest) + Math.hypot(...along) / radius;
  let shift = low;
  // Newton on 1/length, which is nearly straight in μ; bisection where that leaves the bracket.
  for (let round = 0; round < 60; round++) {
    const size = length(shift);
    if (size > radius) low = shift;
    else high = shift;
    if (Math.abs(size - radius) <= 1e-3 * radius) return shift;
    let slope = 0;
    values.forEach((value, k) => { if (along[k] !== 0) slope += along[k] ** 2 / (value + shift) ** 3; });
    const next = shift + ((size - radius) / radius) * ((size * size) / slope);
    shift = next > low && next < high ? next : (low + high) / 2;
  }
  return high;
}

/** Best step along the negative gradient, variables held by a bound left out. */
function downhill(gradient: Float64Array, hessian: Float64Array, low: Float64Array, high: Float64Array, radius: number): Float64Array {
  const pull = gradient.map((g, i) => ((g > 0 && low[i] >= 0) || (g < 0 && high[i] <= 0) ? 0 : -g));
  const slope = Math.hypot(...pull);
  if (slope === 0) return pull;
  const way = pull.map((each) => each / slope);
  let room = radius;
  way.forEach((w, i) => {
    if (w < 0) room = Math.min(room, low[i] / w);
    else if (w > 0) room = Math.min(room, high[i] / w);
  });
  const bend = 2 * (modelAt(gradient, hessian, way) + slope);
  const length = bend > 0 ? Math.min(room, slope / bend) : room;
  return way.map((w) => w * length);
}
