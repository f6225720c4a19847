import type { Immittance } from './immittance';
import { abcdOfNetwork } from './networkParameters';
import type { NetworkData } from './networkData';
import type { Part } from './part';
import { partModel, type PartModel } from './partModel';
import { forget, knownImmittance, writeRatio } from './ratio';

/**
 * A part's impedance as a ratio, so that a lossless coil exactly at its self-resonance is an open and a lossless
 * capacitor exactly at its own a short. Hz, ≥ 0: at 0 Hz a capacitor is an open.
 *
 * A measured part takes the impedance of the two-port measured in series: the B entry of its ABCD matrix.
 */
export function partImmittance(part: Part, frequencyHz: Float64Array): Immittance {
  if (part.measured !== null) return measuredInSeries(part.measured, frequencyHz);
  const result = knownImmittance(frequencyHz.length);
  const model = partModel(part);
  for (let k = 0; k < frequencyHz.length; k++) writePartRatio(result, k, model, frequencyHz[k]);
  return result;
}

/** Writes the law's impedance at one frequency as point k of `into`. */
export function writePartRatio(into: Immittance, k: number, model: PartModel, frequencyHz: number): void {
  const omega = 2 * Math.PI * frequencyHz;
  // With S/ω written as a ratio a capacitor at 0 Hz, or of 0 F, divides by nothing.
  const blocked = model.elastance !== 0 && (omega === 0 || model.elastance === Infinity);
  if (blocked) {
    writeRatio(into, k, 1, 0, 0, 0);
    return;
  }
  const falling = model.elastance === 0 ? 0 : 1 / omega;
  const re = model.constantOhm + model.skinOhm * Math.sqrt(frequencyHz) + model.risingOhm * omega + model.fallingOhm * falling;
  const im = omega * model.inductanceH - model.elastance * falling;
  // Z/(1 + jωCp·Z)
  const susceptance = omega * model.acrossF;
  writeRatio(into, k, re, im, 1 - susceptance * im, susceptance * re);
}

function measuredInSeries(data: NetworkData, frequencyHz: Float64Array): Immittance {
  const { b, scale, known, reason } = abcdOfNetwork(data, frequencyHz, false);
  let tellsNothing = false;
  const result = knownImmittance(frequencyHz.length);
  for (let k = 0; k < frequencyHz.length; k++) {
    if (known[k] === 1 && (b.re[k] !== 0 || b.im[k] !== 0 || scale.re[k] !== 0 || scale.im[k] !== 0)) {
      writeRatio(result, k, b.re[k], b.im[k], scale.re[k], scale.im[k]);
    } else {
      tellsNothing ||= known[k] === 1;
      forget(result, k);
    }
  }
  return { ...result, reason: reason ?? (tellsNothing ? 'the measured two-port lets nothing through' : null) };
}
