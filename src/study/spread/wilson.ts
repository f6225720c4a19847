/** 97.5 % point of the normal distribution. */
const z95 = 1.959963984540054;

/**
 * The 95 % interval of a share of which `hits` of `trials` were seen. E. B. Wilson, «Probable inference, the law of succession,
 * and statistical inference», J. American Statistical Association 22, 1927. With no trials it is 0 … 1.
 */
export function wilsonInterval(hits: number, trials: number): { readonly low: number; readonly high: number } {
  if (trials === 0) return { low: 0, high: 1 };
  const share = hits / trials;
  const square = z95 * z95;
  const middle = (share + square / (2 * trials)) / (1 + square / trials);
  const half = (z95 / (1 + square / trials)) * Math.sqrt((share * (1 - share)) / trials + square / (4 * trials * trials));
  return { low: hits === 0 ? 0 : Math.max(0, middle - half), high: hits === trials ? 1 : Math.min(1, middle + half) };
}
