import { at, isZeroAt, largerColumn, largerRow, put, sizeAt } from './abcdPoint';
import { multiply, type ComplexArray } from './complex';
import { blankAbcd, elementAction } from './elementAbcd';
import type { Element } from './element';
import type { Immittance } from './immittance';

// The door to everything that is done with a row of elements.
export { elementAbcd } from './elementAbcd';
export { removeFixture } from './fixture';
export { throughElements } from './throughElements';

/**
 * ABCD matrices of a two-port at n frequencies, from the source's side (port 1) to the load's (port 2), with I2 leaving
 * port 2 (Pozar, Microwave Engineering, Table 4.1). The true matrix is (a, b, c, d) / scale, so that a series open or a
 * shunt short, whose own entries are infinite, is `scale` 0 with finite entries that are never all 0: then
 * (a, c) or (b, d) is the impedance seen from the source and (a, b) or (c, d) what the load sees. Where `known` is 0 all
 * hold NaN.
 */
export interface Cascade {
  readonly frequencyHz: Float64Array;
  readonly a: ComplexArray;
  /** Ω. */
  readonly b: ComplexArray;
  /** S. */
  readonly c: ComplexArray;
  readonly d: ComplexArray;
  readonly scale: ComplexArray;
  readonly known: Uint8Array;
  /** Why points are not known, in one short sentence; null where all are. */
  readonly reason: string | null;
}

/** Matrices whose largest entry leaves 1/ENTRY_LIMIT … ENTRY_LIMIT are rescaled, so that a long ladder stays finite. */
const ENTRY_LIMIT = 1e30;

/**
 * The ladder as one two-port. `elements` stand load first, as in a description; none at all is a straight connection.
 * Series and shunt elements update two of the four entries, all others multiply.
 */
export function cascade(elements: readonly Element[], frequencyHz: Float64Array): Cascade {
  const product = blankAbcd(frequencyHz);
  product.a.re.fill(1);
  product.d.re.fill(1);
  product.scale.re.fill(1);
  let reason: string | null = null;
  for (const element of elements) {
    const action = elementAction(element, frequencyHz);
    if (action.form === 'through') putNetworkBefore(product, action.network);
    else putBranchBefore(product, action.z, action.form);
    const from = action.form === 'through' ? action.network : action.z;
    for (let k = 0; k < frequencyHz.length; k++) {
      if (from.known[k] === 0) product.known[k] = 0;
      rescale(product, k);
    }
    reason ??= from.reason;
  }
  return { ...product, reason };
}

/**
 * [[s, t], [0, s]] or [[s, 0], [t, s]] times the product, where t/s is the branch's Z in series and its Y across. The row
 * (x1, x2) changes, the row (y1, y2) feeds it.
 */
function putBranchBefore(product: Cascade, z: Immittance, orientation: 'series' | 'shunt'): void {
  const { a, b, c, d, scale } = product;
  const [x1, x2, y1, y2] = orientation === 'series' ? [a, b, c, d] : [c, d, a, b];
  const [straight, cross] = orientation === 'series' ? [z.denominator, z.numerator] : [z.numerator, z.denominator];
  for (let k = 0; k < z.known.length; k++) {
    const sRe = straight.re[k];
    const sIm = straight.im[k];
    const blocks = sRe === 0 && sIm === 0;
    if (blocks && y1.re[k] === 0 && y1.im[k] === 0 && y2.re[k] === 0 && y2.im[k] === 0) {
      // An open in series with an open, or a short across a short: the product would be all 0. Nothing new is blocked.
      continue;
    }
    multiplyAdd(x1, y1, k, sRe, sIm, cross.re[k], cross.im[k]);
    multiplyAdd(x2, y2, k, sRe, sIm, cross.re[k], cross.im[k]);
    multiplyAt(y1, k, sRe, sIm);
    multiplyAt(y2, k, sRe, sIm);
    multiplyAt(scale, k, sRe, sIm);
  }
}

/** x[k] = s·x[k] + t·y[k]. */
function multiplyAdd(x: ComplexArray, y: ComplexArray, k: number, sRe: number, sIm: number, tRe: number, tIm: number): void {
  const re = sRe * x.re[k] - sIm * x.im[k] + tRe * y.re[k] - tIm * y.im[k];
  x.im[k] = sRe * x.im[k] + sIm * x.re[k] + tRe * y.im[k] + tIm * y.re[k];
  x.re[k] = re;
}

function multiplyAt(x: ComplexArray, k: number, sRe: number, sIm: number): void {
  const re = sRe * x.re[k] - sIm * x.im[k];
  x.im[k] = sRe * x.im[k] + sIm * x.re[k];
  x.re[k] = re;
}

/** The network times the product. */
function putNetworkBefore(product: Cascade, network: Cascade): void {
  const { a, b, c, d, scale } = product;
  for (let k = 0; k < product.known.length; k++) {
    const seenFromLoad = largerRow(product, k);
    applyTo(network, k, a, c);
    applyTo(network, k, b, d);
    multiplyAt(scale, k, network.scale.re[k], network.scale.im[k]);
    if (isZeroAt(a, k) && isZeroAt(b, k) && isZeroAt(c, k) && isZeroAt(d, k)) {
      // Two that let nothing through, one after the other: each side still sees what it saw.
      const [top, bottom] = largerColumn(network, k);
      const [left, right] = seenFromLoad;
      put(a, k, multiply(top, left));
      put(b, k, multiply(top, right));
      put(c, k, multiply(bottom, left));
      put(d, k, multiply(bottom, right));
    }
  }
}

/** Replaces the column (top, bottom) by the network times it. */
function applyTo(network: Cascade, k: number, top: ComplexArray, bottom: ComplexArray): void {
  const oldTop = at(top, k);
  multiplyAdd(top, bottom, k, network.a.re[k], network.a.im[k], network.b.re[k], network.b.im[k]);
  const { re, im } = network.c;
  multiplyAt(bottom, k, network.d.re[k], network.d.im[k]);
  bottom.re[k] += re[k] * oldTop.re - im[k] * oldTop.im;
  bottom.im[k] += re[k] * oldTop.im + im[k] * oldTop.re;
}

function rescale(product: Cascade, k: number): void {
  const { a, b, c, d, scale } = product;
  const largest = Math.max(sizeAt(a, k), sizeAt(b, k), sizeAt(c, k), sizeAt(d, k));
  if (largest <= ENTRY_LIMIT && largest >= 1 / ENTRY_LIMIT) return;
  for (const entry of [a, b, c, d, scale]) multiplyAt(entry, k, 1 / largest, 0);
}
