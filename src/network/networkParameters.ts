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
  if (data.ports !== 2) return { frequencyHz, a, b, c, d, scale, known: nothing, reason: `the file has ${data.ports === 1 ? 'one port' : `${data.ports} ports`}, and two are needed` };
  const { sRe, sIm, known, reason } = interpolateNetwork(data, frequencyHz);
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
  }
  return { frequencyHz, a, b, c, d, scale, known, reason };
}

/** The scattering parameters of a cascade against two real references; only the known points. Null where none is. */
export function networkOfAbcd(cascade: Cascade, sourceOhm: number, loadOhm: number): NetworkData | null {
  const kept = Array.from(cascade.frequencyHz, (_, k) => k).filter((k) => cascade.known[k]);
  if (kept.length === 0) return null;
  const sRe = new Float64Array(4 * kept.length);
  const sIm = new Float64Array(4 * kept.length);
  const root = 2 * Math.sqrt(sourceOhm * loadOhm);
  kept.forEach((k, row) => {
    const entry = (values: ComplexArray): Complex => ({ re: values.re[k], im: values.im[k] });
    const [a, b, c, d, scale] = [entry(cascade.a), entry(cascade.b), entry(cascade.c), entry(cascade.d), entry(cascade.scale)];
    const [aR, cR, dR] = [times(a, loadOhm), times(c, sourceOhm * loadOhm), times(d, sourceOhm)];
    const sum = add(add(aR, b), add(cR, dR));
    const determinant = subtract(multiply(a, d), multiply(b, c));
    const blocked = scale.re === 0 && scale.im === 0;
    const s = [
      divide(subtract(add(aR, b), add(cR, dR)), sum),
      blocked ? complex(0) : divide(times(determinant, root), multiply(scale, sum)),
      divide(times(scale, root), sum),
      divide(add(subtract(b, aR), subtract(dR, cR)), sum),
    ];
    s.forEach((value, i) => {
      sRe[4 * row + i] = value.re;
      sIm[4 * row + i] = value.im;
    });
  });
  return { ports: 2, frequencyHz: Float64Array.from(kept, (k) => cascade.frequencyHz[k]), referenceOhm: Float64Array.of(sourceOhm, loadOhm), sRe, sIm };
}

const onePlus = (s: Complex): Complex => ({ re: 1 + s.re, im: s.im });
const oneMinus = (s: Complex): Complex => ({ re: 1 - s.re, im: -s.im });

function put(values: ComplexArray, k: number, value: Complex): void {
  values.re[k] = value.re;
  values.im[k] = value.im;
}

function filled(length: number): ComplexArray {
  const values = complexArray(length);
  values.re.fill(NaN);
  values.im.fill(NaN);
  return values;
}
