/** 10^0 … 10^22, which are exact as doubles. */
export const exactPowers: readonly number[] = Array.from({ length: 23 }, (_, i) => Number(`1e${i}`));
const largestExact = exactPowers.length - 1;
const powersOfTen = Float64Array.from(exactPowers);

/** Veltkamp's splitting factor: 2^27 + 1. */
const splitter = 134_217_729;
/** Four operations of pairs of doubles are off by less than 2^-100 of the value; this leaves a margin. */
const relativeError = 2 ** -98;

/**
 * (high·10^lowDigits + low)·10^exponent, correctly rounded, or NaN where a pair of doubles cannot tell between
 * two neighbours and `Number` has to be asked (about one in 10^13). `high` and `low` are whole numbers below 10^15, lowDigits
 * 0 … 15, exponent −44 … 22. Pairs of doubles after T. J. Dekker, «A floating-point technique for extending the available
 * precision», Numerische Mathematik 18, 1971.
 */
export function roundDecimal(high: number, low: number, lowDigits: number, exponent: number): number {
  // high·10^lowDigits + low as a pair.
  let power = powersOfTen[lowDigits];
  let top = high * power;
  let rest = productError(high, power, top) + low;
  let sum = top + rest;
  rest -= sum - top;
  top = sum;
  if (exponent >= 0) {
    power = powersOfTen[exponent];
    const product = top * power;
    rest = productError(top, power, product) + rest * power;
    top = product;
  }
  for (let left = -exponent; left > 0; left -= largestExact) {
    power = powersOfTen[Math.min(left, largestExact)];
    const quotient = top / power;
    const product = quotient * power;
    // Both differences are exact: product and top are neighbours.
    rest = (top - product - productError(quotient, power, product) + rest) / power;
    sum = quotient + rest;
    rest -= sum - quotient;
    top = sum;
  }
  const doubt = top * relativeError;
  const rounded = top + (rest + doubt);
  return rounded === top + (rest - doubt) ? rounded : NaN;
}

/** a·b − product, exactly. */
function productError(a: number, b: number, product: number): number {
  const bigA = splitter * a;
  const aHigh = bigA - (bigA - a);
  const aLow = a - aHigh;
  const bigB = splitter * b;
  const bHigh = bigB - (bigB - b);
  const bLow = b - bHigh;
  return aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
}
