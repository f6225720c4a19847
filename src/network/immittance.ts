import { complexArray, type ComplexArray } from './complex';
import { fileReflection } from './fileReflection';
import type { Impedance } from './impedance';
import { partImmittance } from './partImmittance';
import { forget, knownImmittance, unknownImmittance, writeQuotient, writeRatio } from './ratio';

/**
 * An impedance at n frequencies as a ratio Z = numerator / denominator (Ω over a plain number), so that an open
 * (denominator 0), a short (numerator 0) and a lossless resonance are ordinary numbers. Never both 0 at one point.
 */
export interface Immittance {
  readonly numerator: ComplexArray;
  readonly denominator: ComplexArray;
  /** 1 where known; other points hold NaN. */
  readonly known: Uint8Array;
  /** Why points are not known, in one short sentence; null where all are. */
  readonly reason: string | null;
}

/** The impedance at each of `frequencyHz` (Hz, ≥ 0). Points that cannot be told are not known, with the reason. */
export function sampleImpedance(impedance: Impedance, frequencyHz: Float64Array): Immittance {
  const length = frequencyHz.length;
  switch (impedance.form) {
    case 'constant': return constantRatio(length, impedance.impedanceOhm.re, impedance.impedanceOhm.im, 1, 0);
    case 'reflection': {
      const { reflection, referenceOhm } = impedance;
      return constantRatio(length, referenceOhm * (1 + reflection.re), referenceOhm * reflection.im, 1 - reflection.re, -reflection.im);
    }
    case 'open': return constantRatio(length, 1, 0, 0, 0);
    case 'short': return constantRatio(length, 0, 0, 1, 0);
    case 'part': return partImmittance(impedance.part, frequencyHz);
    case 'series': return combine(impedance.members, frequencyHz, 'series');
    case 'parallel': return combine(impedance.members, frequencyHz, 'parallel');
    case 'file': {
      const { reflection, referenceOhm, known, reason } = fileReflection(impedance.data, impedance.port, frequencyHz);
      return fromReflection(reflection, referenceOhm, known, reason);
    }
    case 'table': return sampleTable(impedance, frequencyHz);
    case 'unknown': return unknownImmittance(length, impedance.reason);
  }
}

/** Reflection coefficient (Z − z0)/(Z + z0) against a real reference; an open is 1. At Z = −z0 exactly it is infinite. */
export function reflectionOf(z: Immittance, referenceOhm: number): ComplexArray {
  const { numerator: n, denominator: d } = z;
  const reflection = complexArray(n.re.length);
  for (let k = 0; k < n.re.length; k++) {
    const topRe = n.re[k] - referenceOhm * d.re[k];
    const topIm = n.im[k] - referenceOhm * d.im[k];
    const bottomRe = n.re[k] + referenceOhm * d.re[k];
    const bottomIm = n.im[k] + referenceOhm * d.im[k];
    writeQuotient(reflection, k, topRe, topIm, bottomRe, bottomIm);
  }
  return reflection;
}

/** The impedance z0(1 + Γ)/(1 − Γ) as a ratio. Points that are not finite, or not `known`, are not known. */
export function fromReflection(reflection: ComplexArray, referenceOhm: number, known?: Uint8Array, reason: string | null = null): Immittance {
  const length = reflection.re.length;
  const result = knownImmittance(length, reason);
  let madeUnknown = false;
  for (let k = 0; k < length; k++) {
    const re = reflection.re[k];
    const im = reflection.im[k];
    if (known !== undefined && known[k] === 0) {
      forget(result, k);
    } else if (Number.isFinite(re) && Number.isFinite(im)) {
      writeRatio(result, k, referenceOhm * (1 + re), referenceOhm * im, 1 - re, -im);
    } else {
      forget(result, k);
      madeUnknown = true;
    }
  }
  return madeUnknown && reason === null ? { ...result, reason: 'a reflection coefficient is not a finite number' } : result;
}

/** Z in Ω; an open is +∞ + j0. */
export function impedanceOf(z: Immittance): ComplexArray {
  const impedance = complexArray(z.known.length);
  for (let k = 0; k < z.known.length; k++) {
    writeQuotient(impedance, k, z.numerator.re[k], z.numerator.im[k], z.denominator.re[k], z.denominator.im[k]);
  }
  return impedance;
}

function constantRatio(length: number, nRe: number, nIm: number, dRe: number, dIm: number): Immittance {
  const result = knownImmittance(length);
  for (let k = 0; k < length; k++) writeRatio(result, k, nRe, nIm, dRe, dIm);
  return result;
}

/** No member in series is a wire, none in parallel is nothing at all. */
function combine(members: readonly Impedance[], frequencyHz: Float64Array, how: 'series' | 'parallel'): Immittance {
  if (members.length === 0) return sampleImpedance({ form: how === 'series' ? 'short' : 'open' }, frequencyHz);
  return members.map((member) => sampleImpedance(member, frequencyHz)).reduce((first, second) => joinImmittances(first, second, how));
}

/** Two impedances one after the other, (n1 d2 + n2 d1)/(d1 d2), or side by side, n1 n2/(n1 d2 + n2 d1). */
export function joinImmittances(first: Immittance, second: Immittance, how: 'series' | 'parallel'): Immittance {
  const result = knownImmittance(first.known.length, first.reason ?? second.reason);
  const { numerator: n1, denominator: d1 } = first;
  const { numerator: n2, denominator: d2 } = second;
  for (let k = 0; k < first.known.length; k++) {
    if (first.known[k] === 0 || second.known[k] === 0) {
      forget(result, k);
      continue;
    }
    const sumRe = n1.re[k] * d2.re[k] - n1.im[k] * d2.im[k] + n2.re[k] * d1.re[k] - n2.im[k] * d1.im[k];
    const sumIm = n1.re[k] * d2.im[k] + n1.im[k] * d2.re[k] + n2.re[k] * d1.im[k] + n2.im[k] * d1.re[k];
    if (how === 'series') {
      const dRe = d1.re[k] * d2.re[k] - d1.im[k] * d2.im[k];
      const dIm = d1.re[k] * d2.im[k] + d1.im[k] * d2.re[k];
      // Two opens in series make 0/0, and are an open.
      if (dRe === 0 && dIm === 0) writeRatio(result, k, 1, 0, 0, 0);
      else writeRatio(result, k, sumRe, sumIm, dRe, dIm);
    } else {
      const nRe = n1.re[k] * n2.re[k] - n1.im[k] * n2.im[k];
      const nIm = n1.re[k] * n2.im[k] + n1.im[k] * n2.re[k];
      // Two shorts side by side make 0/0, and are a short.
      if (nRe === 0 && nIm === 0) writeRatio(result, k, 0, 0, 1, 0);
      else writeRatio(result, k, nRe, nIm, sumRe, sumIm);
    }
  }
  return result;
}

function sampleTable(table: Extract<Impedance, { form: 'table' }>, frequencyHz: Float64Array): Immittance {
  const { frequencyHz: at, reflectionRe, reflectionIm } = table;
  const reflection = complexArray(frequencyHz.length);
  const known = new Uint8Array(frequencyHz.length);
  const last = at.length - 1;
  for (let k = 0; k < frequencyHz.length; k++) {
    const f = frequencyHz[k];
    if (!(last >= 0 && f >= at[0] && f <= at[last])) continue;
    let i = 0;
    while (i < last - 1 && f > at[i + 1]) i++;
    const next = Math.min(i + 1, last);
    const t = next === i ? 0 : (f - at[i]) / (at[next] - at[i]);
    reflection.re[k] = (1 - t) * reflectionRe[i] + t * reflectionRe[next];
    reflection.im[k] = (1 - t) * reflectionIm[i] + t * reflectionIm[next];
    known[k] = 1;
  }
  const reason = known.every((point) => point === 1) ? null : 'the table does not reach that frequency';
  return fromReflection(reflection, table.referenceOhm, known, reason);
}
