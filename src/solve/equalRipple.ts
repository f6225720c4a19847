/** Largest |Γ| in the band, and the least of the ripple below it. */
export interface EqualRipple {
  readonly largest: number;
  readonly least: number;
  /** Levy's element values g1 … g(n+1): load 1 ∥ g1, then series g2, shunt g3 … */
  readonly g: readonly number[];
}

/**
 * The equal-ripple match of a load of one reactance by a lossless ladder with `n` reactances (resonators, in a band-pass) in
 * all, the load's own counted. `qw` is Q times the fractional bandwidth: g1.
 *
 * With δ = 1/(Q·w): x = sinh a, y = sinh b, x − y = 2δ sin(π/2n), tanh(na)/cosh a = tanh(nb)/cosh b, |Γ| = cosh(nb)/cosh(na).
 * Fano, «Theoretical limitations on the broadband matching of arbitrary impedances», 1950; Matthaei, Young, Jones, §4.09;
 * elements by Levy, IRE Trans. CT-11, 1964. Optimal for n = 1 and 2; from three on the true least maximum lies 1–2 % lower.
 */
export function equalRipple(n: number, qw: number): EqualRipple {
  const spread = (2 / qw) * Math.sin(Math.PI / (2 * n));
  const y = smallerRoot(n, spread);
  const x = y + spread;
  return { largest: ratioOfCosh(n * Math.asinh(y), n * Math.asinh(x)), least: ratioOfSinh(n * Math.asinh(y), n * Math.asinh(x)), g: elementValues(n, x, y) };
}

/** e^(−π/(Q·w)): what no lossless ladder can get below, however many reactances it has. Bode 1945, Fano 1950. */
export const bodeFanoReflection = (qw: number): number => Math.exp(-Math.PI / qw);

/** tanh(n·asinh t)/√(1 + t²) rises and then falls; y lies on the rise and x = y + spread on the fall, at the same height. */
function smallerRoot(n: number, spread: number): number {
  if (n === 1) return 1 / (spread / 2 + Math.hypot(spread / 2, 1));
  const height = (t: number): number => Math.tanh(n * Math.asinh(t)) / Math.hypot(1, t);
  let low = 0;
  let high = 1;
  while (height(high + spread) > height(high)) high *= 2;
  for (let step = 0; step < 200; step++) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (height(middle + spread) > height(middle)) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

function elementValues(n: number, x: number, y: number): number[] {
  const sine = (k: number): number => Math.sin((k * Math.PI) / (2 * n));
  const g = [(2 * sine(1)) / (x - y)];
  for (let r = 1; r < n; r++) {
    const bottom = x * x + y * y + Math.sin((r * Math.PI) / n) ** 2 - 2 * x * y * Math.cos((r * Math.PI) / n);
    g.push((4 * sine(2 * r - 1) * sine(2 * r + 1)) / (bottom * g[r - 1]));
  }
  g.push((2 * sine(1)) / ((x + y) * g[n - 1]));
  return g;
}

// Of large arguments the exponential alone counts, and does not overflow.
const ratioOfCosh = (b: number, a: number): number => Math.exp(b - a) * ((1 + Math.exp(-2 * b)) / (1 + Math.exp(-2 * a)));
const ratioOfSinh = (b: number, a: number): number => Math.exp(b - a) * (Math.expm1(-2 * b) / Math.expm1(-2 * a));
