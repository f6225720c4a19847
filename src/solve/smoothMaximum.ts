/** Values of the functions at x, into `into`. Where `wanted` names some, only those are looked at afterwards. */
export type Functions = (x: Float64Array, into: Float64Array, wanted: Int32Array | null) => void;

/**
 * The smoothed maximum of functions f_j and its quadratic model, in variables y of which each goes from 0 to 1 over the box:
 *
 *     F(y) = (1/s)·ln Σ e^(s·f_j),  ∇F = Σ p_j g_j,  ∇²F = s·(Σ p_j g_j g_jᵀ − ∇F ∇Fᵀ) + Σ p_j ∇²f_j,  p_j = e^(s(f_j − F)).
 *
 * max f ≤ F ≤ max f + ln(count)/s. Slopes are central differences, and so is the curvature of Σ p_j f_j with p held.
 * NaN and Infinity count as Infinity; a function of −Infinity does not count.
 */
export interface SmoothMaximum {
  /** Not to be written to. */
  readonly current: Float64Array;
  readonly gradient: Float64Array;
  readonly hessian: Float64Array;
  /** The point of the box at y. */
  place(y: Float64Array): Float64Array;
  /** Evaluates the functions at y; returns max f. The current point stays. */
  tryAt(y: Float64Array): number;
  /** F at what was tried last. */
  triedValue(sharpness: number): number;
  /** The largest change of a function from the current point to what was tried last; 0 where that is infinite. */
  change(): number;
  /** What was tried last becomes the current point. */
  accept(): void;
  /** max f less the mean of the functions, at the current point. */
  spread(): number;
  /** max f at the current point. */
  worst(): number;
  /** F at the current point. */
  value(sharpness: number): number;
  /** max f − Σ p_j f_j at the current point: of convex functions an optimum of F lies no more than that above the least maximum. */
  gap(sharpness: number): number;
  /** Gradient and Hessian at the current point. */
  model(sharpness: number): void;
  evaluations(): number;
}

/** Step of the differences, as a share of the box: rounding (1e-16/h²) and the cut-off (h²) both stay near 1e-6 of the curvature. */
const differenceStep = 1e-5;

/** e to this is nothing beside 1, a thousand times over. */
const negligible = -45;

/** Functions of less weight change neither slope nor curvature in any digit that matters. */
const leastWeight = 1e-6;

export interface Box {
  /** Inside the bounds. */
  readonly start: Float64Array;
  readonly lower: Float64Array;
  readonly upper: Float64Array;
}

/** `box.start` is the current point at first, evaluated. */
export function smoothMaximum(functions: Functions, count: number, { start, lower, upper }: Box): SmoothMaximum {
  const n = lower.length;
  const origin = start.map((value, i) => (upper[i] > lower[i] ? (value - lower[i]) / (upper[i] - lower[i]) : 0));
  const x = new Float64Array(n);
  const shifted = new Float64Array(n);
  const current = origin.slice();
  const tried = new Float64Array(n);
  let f = new Float64Array(count);
  let candidate = new Float64Array(count);
  const forward = Array.from({ length: n }, () => new Float64Array(count));
  const backward = new Float64Array(count);
  const centre = new Float64Array(count);
  const corner = new Float64Array(count);
  const weights = new Float64Array(count);
  const active = new Int32Array(count);
  const slopes = new Float64Array(count * n);
  const weighted = new Float64Array(n);
  const gradient = new Float64Array(n);
  const hessian = new Float64Array(n * n);
  let activeCount = 0;
  let evaluations = 0;

  /** Start and bounds come out to the bit. */
  function put(y: Float64Array): void {
    for (let i = 0; i < n; i++) {
      const value = start[i] + (y[i] - origin[i]) * (upper[i] - lower[i]);
      x[i] = y[i] === origin[i] ? start[i] : y[i] <= 0 ? lower[i] : y[i] >= 1 ? upper[i] : Math.min(Math.max(value, lower[i]), upper[i]);
    }
  }

  function evaluate(y: Float64Array, into: Float64Array, wanted: Int32Array | null = null): void {
    put(y);
    functions(x, into, wanted);
    evaluations++;
    for (let j = 0; j < count; j++) if (Number.isNaN(into[j])) into[j] = Infinity;
  }

  function smoothed(values: Float64Array, sharpness: number): number {
    const worst = largest(values);
    if (!Number.isFinite(worst)) return worst;
    let sum = 0;
    for (let j = 0; j < count; j++) {
      const below = sharpness * (values[j] - worst);
      if (below > negligible) sum += Math.exp(below);
    }
    return worst + Math.log(sum) / sharpness;
  }

  /** Weights p of the current point; those that count are listed as active. */
  function weigh(sharpness: number): void {
    const top = smoothed(f, sharpness);
    activeCount = 0;
    let sum = 0;
    for (let j = 0; j < count; j++) {
      const below = sharpness * (f[j] - top);
      const weight = below > negligible ? Math.exp(below) : 0;
      if (!(weight > leastWeight)) continue;
      weights[activeCount] = weight;
      active[activeCount++] = j;
      sum += weight;
    }
    for (let a = 0; a < activeCount; a++) weights[a] /= sum;
  }

  /** Σ p_j (u_j − v_j); 0 where it cannot be told. */
  function weightedDifference(u: Float64Array, v: Float64Array): number {
    let sum = 0;
    for (let a = 0; a < activeCount; a++) sum += weights[a] * (u[active[a]] - v[active[a]]);
    return Number.isFinite(sum) ? sum : 0;
  }

  function differentiate(i: number, wanted: Int32Array): void {
    const h = differenceStep;
    const at = shifted[i];
    shifted[i] = at + h;
    evaluate(shifted, forward[i], wanted);
    shifted[i] = at - h;
    evaluate(shifted, backward, wanted);
    shifted[i] = at;
    for (let a = 0; a < activeCount; a++) {
      const j = active[a];
      const slope = (forward[i][j] - backward[j]) / (2 * h);
      slopes[a * n + i] = Number.isFinite(slope) ? slope : 0;
      gradient[i] += weights[a] * slopes[a * n + i];
    }
    weighted[i] = weightedDifference(forward[i], centre);
    hessian[i * n + i] = (weighted[i] + weightedDifference(backward, centre)) / (h * h);
  }

  function differentiateTwice(i: number, k: number, wanted: Int32Array): void {
    const h = differenceStep;
    const [atI, atK] = [shifted[i], shifted[k]];
    shifted[i] = atI + h;
    shifted[k] = atK + h;
    evaluate(shifted, corner, wanted);
    shifted[i] = atI;
    shifted[k] = atK;
    hessian[i * n + k] = (weightedDifference(corner, centre) - weighted[i] - weighted[k]) / (h * h);
  }

  evaluate(current, f);
  return {
    current, gradient, hessian,
    worst: () => largest(f),
    place(y) {
      put(y);
      return x.slice();
    },
    tryAt(y) {
      tried.set(y);
      evaluate(y, candidate);
      return largest(candidate);
    },
    triedValue: (sharpness) => smoothed(candidate, sharpness),
    change() {
      let most = 0;
      for (let j = 0; j < count; j++) {
        const by = Math.abs(candidate[j] - f[j]);
        if (by < Infinity && by > most) most = by;
      }
      return most;
    },
    accept() {
      [f, candidate] = [candidate, f];
      current.set(tried);
    },
    spread() {
      const finite = f.filter(Number.isFinite);
      return largest(finite) - finite.reduce((sum, value) => sum + value, 0) / finite.length;
    },
    value: (sharpness) => smoothed(f, sharpness),
    gap(sharpness) {
      weigh(sharpness);
      const worst = largest(f);
      let sum = 0;
      for (let a = 0; a < activeCount; a++) sum += weights[a] * (worst - f[active[a]]);
      return sum;
    },
    model(sharpness) {
      weigh(sharpness);
      const wanted = active.subarray(0, activeCount);
      // At a bound the differences are taken around a point one step inside.
      let moved = false;
      for (let i = 0; i < n; i++) {
        shifted[i] = upper[i] > lower[i] ? Math.min(Math.max(current[i], differenceStep), 1 - differenceStep) : current[i];
        moved ||= shifted[i] !== current[i];
      }
      if (moved) evaluate(shifted, centre, wanted);
      else centre.set(f);
      gradient.fill(0);
      hessian.fill(0);
      slopes.fill(0, 0, activeCount * n);
      for (let i = 0; i < n; i++) if (upper[i] > lower[i]) differentiate(i, wanted);
      for (let i = 0; i < n; i++) {
        for (let k = 0; k < i; k++) if (upper[i] > lower[i] && upper[k] > lower[k]) differentiateTwice(i, k, wanted);
      }
      for (let i = 0; i < n; i++) {
        for (let k = 0; k <= i; k++) {
          let spread = 0;
          for (let a = 0; a < activeCount; a++) spread += weights[a] * (slopes[a * n + i] - gradient[i]) * (slopes[a * n + k] - gradient[k]);
          hessian[i * n + k] += sharpness * spread;
          hessian[k * n + i] = hessian[i * n + k];
        }
      }
    },
    evaluations: () => evaluations,
  };
}

function largest(values: Float64Array): number {
  let worst = -Infinity;
  for (let j = 0; j < values.length; j++) if (values[j] > worst) worst = values[j];
  return worst;
}
