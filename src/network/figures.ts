import { at, sizeAt } from './abcdPoint';
import type { Cascade } from './cascade';
import { complexArray, type ComplexArray } from './complex';
import type { Immittance } from './immittance';
import { writeQuotient } from './ratio';
import { inputOf } from './throughElements';

/** Below this share of the products that it is summed from, the entering power cannot be told from rounding: there is none. */
const LEAST_POWER_SHARE = 1e-13;

/**
 * Γ = (Zin − Zs*)/(Zin + Zs) at each point: 1 − |Γ|² of the available power enters. With a real source it is the usual Γ.
 * Kurokawa, «Power waves and the scattering matrix», IEEE Trans. MTT-13, 1965, 194–202. NaN where either is not known;
 * infinite where Zin = −Zs, which no passive input reaches.
 */
export function powerWaveReflection(input: Immittance, source: Immittance): ComplexArray {
  const { numerator: n, denominator: d } = input;
  const { numerator: p, denominator: q } = source;
  const reflection = complexArray(input.known.length);
  for (let k = 0; k < input.known.length; k++) {
    // (n q* − p* d)/(n q + p d), times q/q*.
    const topRe = n.re[k] * q.re[k] + n.im[k] * q.im[k] - p.re[k] * d.re[k] - p.im[k] * d.im[k];
    const topIm = n.im[k] * q.re[k] - n.re[k] * q.im[k] - p.re[k] * d.im[k] + p.im[k] * d.re[k];
    const bottomRe = n.re[k] * q.re[k] - n.im[k] * q.im[k] + p.re[k] * d.re[k] - p.im[k] * d.im[k];
    const bottomIm = n.re[k] * q.im[k] + n.im[k] * q.re[k] + p.re[k] * d.im[k] + p.im[k] * d.re[k];
    writeQuotient(reflection, k, topRe, topIm, bottomRe, bottomIm);
    if (q.im[k] === 0 || reflection.re[k] === Infinity) continue;
    const qSquared = q.re[k] * q.re[k] + q.im[k] * q.im[k];
    const turnRe = (q.re[k] * q.re[k] - q.im[k] * q.im[k]) / qSquared;
    const turnIm = (2 * q.re[k] * q.im[k]) / qSquared;
    const re = reflection.re[k] * turnRe - reflection.im[k] * turnIm;
    reflection.im[k] = reflection.re[k] * turnIm + reflection.im[k] * turnRe;
    reflection.re[k] = re;
  }
  return reflection;
}

/**
 * Power in the load over the power available from the source, 4·Rs·RL/|A·ZL + B + C·Zs·ZL + D·Zs|², linear: 0 … 1 for a
 * passive ladder, 0 for a load that takes no power, such as an open or a short. NaN where anything is not known.
 * Pozar, Microwave Engineering, §12.1, written with ABCD.
 */
export function transducerGain(network: Cascade, source: Immittance, load: Immittance): Float64Array {
  const gain = new Float64Array(load.known.length);
  const { numerator: p, denominator: q } = source;
  for (let k = 0; k < gain.length; k++) {
    if (load.known[k] === 0 || network.known[k] === 0 || source.known[k] === 0) {
      gain[k] = NaN;
      continue;
    }
    const sRe = network.scale.re[k];
    const sIm = network.scale.im[k];
    const sourcePart = p.re[k] * q.re[k] + p.im[k] * q.im[k];
    const top = 4 * sourcePart * loadPower(load, k) * (sRe * sRe + sIm * sIm);
    if (top === 0) continue;
    const [voltage, current] = inputOf(network, load, k);
    const re = voltage.re * q.re[k] - voltage.im * q.im[k] + current.re * p.re[k] - current.im * p.im[k];
    const im = voltage.re * q.im[k] + voltage.im * q.re[k] + current.re * p.im[k] + current.im * p.re[k];
    gain[k] = top / (re * re + im * im);
  }
  return gain;
}

/**
 * Of the power that enters the network, the share that reaches the load: RL/Re[(A·ZL + B)(C·ZL + D)*], linear. NaN where
 * none enters, or anything is not known.
 */
export function efficiency(network: Cascade, load: Immittance): Float64Array {
  const share = new Float64Array(load.known.length).fill(NaN);
  for (let k = 0; k < share.length; k++) {
    if (load.known[k] === 0 || network.known[k] === 0) continue;
    const [voltage, current] = inputOf(network, load, k);
    const entering = voltage.re * current.re + voltage.im * current.im;
    if (!(entering > LEAST_POWER_SHARE * productsSize(network, load, k))) continue;
    const scale = at(network.scale, k);
    share[k] = (loadPower(load, k) * (scale.re * scale.re + scale.im * scale.im)) / entering;
  }
  return share;
}

/** (|A·n| + |B·d|)·(|C·n| + |D·d|): V·I* at the input without any cancellation. */
function productsSize({ a, b, c, d }: Cascade, load: Immittance, k: number): number {
  const loadVoltage = sizeAt(load.numerator, k);
  const loadCurrent = sizeAt(load.denominator, k);
  return (sizeAt(a, k) * loadVoltage + sizeAt(b, k) * loadCurrent) * (sizeAt(c, k) * loadVoltage + sizeAt(d, k) * loadCurrent);
}

/** Re(V·I*) for the load's own n as voltage and d as current. */
function loadPower(load: Immittance, k: number): number {
  return load.numerator.re[k] * load.denominator.re[k] + load.numerator.im[k] * load.denominator.im[k];
}

/** −20·log10|Γ|: 0 at total reflection, +∞ at none, negative above 1. Bird, IEEE Antennas Propag. Mag., 2009. */
export function returnLossDb(reflectionMagnitude: number): number {
  // Not −20·log10, which would print a return loss of −0 dB.
  return 20 * Math.log10(1 / reflectionMagnitude);
}

/** (1 + |Γ|)/(1 − |Γ|); infinite from |Γ| = 1 on, where there is no standing wave to speak of. Pozar, eq. 2.41. */
export function vswr(reflectionMagnitude: number): number {
  return reflectionMagnitude >= 1 ? Infinity : (1 + reflectionMagnitude) / (1 - reflectionMagnitude);
}

/** −10·log10(1 − |Γ|²): infinite from |Γ| = 1 on. */
export function mismatchLossDb(reflectionMagnitude: number): number {
  return reflectionMagnitude >= 1 ? Infinity : 10 * Math.log10(1 / ((1 - reflectionMagnitude) * (1 + reflectionMagnitude)));
}

/** 10·log10 of a ratio of powers; −∞ for none (or less than none). */
export function decibels(powerRatio: number): number {
  return powerRatio <= 0 ? -Infinity : 10 * Math.log10(powerRatio);
}
