import { at, put } from './abcdPoint';
import type { Cascade } from './cascade';
import { add, complex, complexArray, divide, multiply, scale as times, subtract, type Complex, type ComplexArray } from './complex';
import { interpolateNetwork } from './interpolateNetwork';
import type { NetworkData } from './networkData';

/**
 * A two-port file as ABCD matrices with port 1 toward the source, port 2 where `reversed` (Frickey, IEEE Trans. MTT-42,
 * 1994, for real references that may differ). `scale` is 2·S21, so that a block which lets nothing through stays finite.
 * Not known outside the file, nor for other than two ports.
 */
export function abcdOfNetwork(data: NetworkData, frequencyHz: Float64Array, reversed: boolean): Cascade {
  const [a, b, c, d, scale] = Array.from({ length: 5 }, () => filled(frequencyHz.length));
  const nothing = new Uint8Array(frequencyHz.length);
  if (data.ports !== 2) {
    const reason = `the file has ${data.ports === 1 ? 'one port' : `${data.ports} ports`}, and two are needed`;
    return { frequencyHz, a, b, c, d, scale, known: nothing, reason };
  }
  const { sRe, sIm, known, reason: outside } = interpolateNetwork(data, frequencyHz);
  let reason = outside;
  const [source, load] = reversed ? [1, 0] : [0, 1];
  const [r1, r2] = [data.referenceOhm[source], data.referenceOhm[load]];
  const root = Math.sqrt(r1 * r2);
  for (let k = 0; k < frequencyHz.length; k++) {
    if (!known[k]) continue;
    const s = (row: number, column: number): Complex => ({ re: sRe[4 * k + 2 * row + column], im: sIm[4 * k + 2 * row + column] });
    const [s11, s12, s21, s22] = [s(source, source), s(source, load), s(load, source), s(load, load)];
    const through = multiply(s12, s21);
    const [plus1, minus1, plus2, minus2] = [onePlus(s11), oneMinus(s11), onePlus(s22), oneMinus(s22)];
    put(a, k, times(add(multiply(plus1, minus2), through), Math.sqrt(r1 / r2)));
    put(b, k, times(subtract(multiply(plus1, plus2), through), root));
    put(c, k, times(subtract(multiply(minus1, minus2), through), 1 / root));
    put(d, k, times(add(multiply(minus1, plus2), through), Math.sqrt(r2 / r1)));
    put(scale, k, times(s21, 2));
    if ([a, b, c, d, scale].every(({ re, im }) => Number.isFinite(re[k]) && Number.isFinite(im[k]))) continue;
    for (const entry of [a, b, c, d, scale]) entry.re[k] = entry.im[k] = NaN;
    known[k] = 0;
    reason ??= 'the file\'s values are too large to compute with';
  }
  return { frequencyHz, a, b, c, d, scale, known, reason };
}

/**
 * The scattering parameters of a cascade against two real references (Ω; Frickey, as above), at its known points. Of a
 * cascade that lets nothing through S12 is 0 too, which is so for every reciprocal one. Points of an active network without
 * finite parameters are left out. Null where no point is left.
 */
export function networkOfAbcd(cascade: Cascade, sourceOhm: number, loadOhm: number): NetworkData | null {
  const points = Array.from(cascade.frequencyHz, (hz, k) => ({ hz, s: cascade.known[k] ? scatteringAt(cascade, k, sourceOhm, loadOhm) : null }));
  const kept = points.filter((point) => point.s !== null);
  if (kept.length === 0) return null;
  return {
    ports: 2, frequencyHz: Float64Array.from(kept, ({ hz }) => hz), referenceOhm: Float64Array.of(sourceOhm, loadOhm),
    sRe: Float64Array.from(kept.flatMap(({ s }) => s!.map(({ re }) => re))), sIm: Float64Array.from(kept.flatMap(({ s }) => s!.map(({ im }) => im))),
  };
}

/** S11, S12, S21, S22 of point k; null where they are not finite. */
function scatteringAt(cascade: Cascade, k: number, sourceOhm: number, loadOhm: number): Complex[] | null {
  const [a, b, c, d, scale] = [at(cascade.a, k), at(cascade.b, k), at(cascade.c, k), at(cascade.d, k), at(cascade.scale, k)];
  const [aR, cR, dR] = [times(a, loadOhm), times(c, sourceOhm * loadOhm), times(d, sourceOhm)];
  const sum = add(add(aR, b), add(cR, dR));
  const root = 2 * Math.sqrt(sourceOhm * loadOhm);
  const determinant = subtract(multiply(a, d), multiply(b, c));
  const s = [
    divide(subtract(add(aR, b), add(cR, dR)), sum),
    scale.re === 0 && scale.im === 0 ? complex(0) : divide(times(determinant, root), multiply(scale, sum)),
    divide(times(scale, root), sum),
    divide(add(subtract(b, aR), subtract(dR, cR)), sum),
  ];
  return s.every(({ re, im }) => Number.isFinite(re) && Number.isFinite(im)) ? s : null;
}

const onePlus = (s: Complex): Complex => ({ re: 1 + s.re, im: s.im });
const oneMinus = (s: Complex): Complex => ({ re: 1 - s.re, im: -s.im });

function filled(length: number): ComplexArray {
  const values = complexArray(length);
  values.re.fill(NaN);
  values.im.fill(NaN);
  return values;
}
