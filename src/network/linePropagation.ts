import type { Cascade } from './cascade';
import { complexArray, type ComplexArray } from './complex';
import type { Immittance } from './immittance';
import type { Line } from './line';

const speedOfLight = 299_792_458;
const nepersPerDb = Math.LN10 / 20;
/** A line of more is as good as this one, 2,600 dB, and its hyperbolic functions still are numbers. */
const attenuationAtMost = 300;

/**
 * γl = αl + jβl of the whole line at one frequency: β·l = 2πf·l/(vf·c), the conductor's loss with √f, the dielectric's
 * with f. The characteristic impedance stays real, the usual low-loss approximation (Pozar, Microwave Engineering, §2.7).
 */
function propagation(line: Line, frequencyHz: number): { attenuation: number; phase: number } {
  const ratio = frequencyHz / line.lossAtHz;
  const lossDb = line.conductorLossDb * Math.sqrt(ratio) + line.dielectricLossDb * ratio;
  return { attenuation: Math.min(lossDb * nepersPerDb, attenuationAtMost), phase: (2 * Math.PI * frequencyHz * line.lengthM) / (line.velocityFactor * speedOfLight) };
}

/** cosh γl and sinh γl by sines and cosines, so that a quarter wave is an ordinary length. */
function hyperbolics(line: Line, frequencyHz: Float64Array): { cosh: ComplexArray; sinh: ComplexArray } {
  const cosh = complexArray(frequencyHz.length);
  const sinh = complexArray(frequencyHz.length);
  frequencyHz.forEach((f, k) => {
    const { attenuation, phase } = propagation(line, f);
    const [cosine, sine] = [Math.cos(phase), Math.sin(phase)];
    cosh.re[k] = Math.cosh(attenuation) * cosine;
    cosh.im[k] = Math.sinh(attenuation) * sine;
    sinh.re[k] = Math.sinh(attenuation) * cosine;
    sinh.im[k] = Math.cosh(attenuation) * sine;
  });
  return { cosh, sinh };
}

const scaled = ({ re, im }: ComplexArray, by: number): ComplexArray => ({ re: re.map((x) => x * by), im: im.map((x) => x * by) });

const allKnown = (count: number) => new Uint8Array(count).fill(1);

/** [[cosh γl, Z0 sinh γl], [sinh γl / Z0, cosh γl]] (Pozar, Table 4.1) at each frequency (Hz, ≥ 0). */
export function lineAbcd(line: Line, frequencyHz: Float64Array): Cascade {
  const { cosh, sinh } = hyperbolics(line, frequencyHz);
  const scale = complexArray(frequencyHz.length);
  scale.re.fill(1);
  return {
    frequencyHz, a: cosh, b: scaled(sinh, line.impedanceOhm), c: scaled(sinh, 1 / line.impedanceOhm), d: scaled(cosh, 1), scale,
    known: allKnown(frequencyHz.length), reason: null,
  };
}

/** What a stub shows: Z0 coth γl with its far end open, Z0 tanh γl with it shorted (Pozar, eqs. 2.45, 2.46). */
export function lineInput(line: Line, end: 'open' | 'short', frequencyHz: Float64Array): Immittance {
  const { cosh, sinh } = hyperbolics(line, frequencyHz);
  const [numerator, denominator] = end === 'open' ? [cosh, sinh] : [sinh, cosh];
  return { numerator: scaled(numerator, line.impedanceOhm), denominator, known: allKnown(frequencyHz.length), reason: null };
}
