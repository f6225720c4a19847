import type { Cascade } from './cascade';
import { complexArray } from './complex';
import type { Element } from './element';
import { sampleImpedance, type Immittance } from './immittance';
import { lineAbcd, lineInput } from './linePropagation';
import { abcdOfNetwork } from './networkParameters';
import { unknownImmittance, writeRatio } from './ratio';

/** What an element is to the path: one impedance in series or across it, or a two-port of its own. */
export type ElementAction =
  | { readonly form: 'series' | 'shunt'; readonly z: Immittance }
  | { readonly form: 'through'; readonly network: Cascade };

/**
 * The ABCD matrix of one element at each of `frequencyHz` (Hz, ≥ 0). An element that is not solved, or could not be read,
 * is not known at any frequency. Pozar, Microwave Engineering, Table 4.1.
 */
export function elementAbcd(element: Element, frequencyHz: Float64Array): Cascade {
  const action = elementAction(element, frequencyHz);
  return action.form === 'through' ? action.network : branchAbcd(action.z, action.form, frequencyHz);
}

export function elementAction(element: Element, frequencyHz: Float64Array): ElementAction {
  switch (element.form) {
    case 'branch': {
      const z = sampleImpedance(element.branch, frequencyHz);
      return { form: element.orientation, z: element.pair ? twice(z) : z };
    }
    case 'bridge': return { form: 'series', z: sampleImpedance({ form: 'short' }, frequencyHz) };
    case 'not fitted': return { form: 'shunt', z: sampleImpedance({ form: 'open' }, frequencyHz) };
    case 'stub': return { form: 'shunt', z: lineInput(element.line, element.end, frequencyHz) };
    case 'line': return { form: 'through', network: lineAbcd(element.line, frequencyHz) };
    case 'transformer': return { form: 'through', network: transformerAbcd(element, frequencyHz) };
    case 'block': return { form: 'through', network: abcdOfNetwork(element.data, frequencyHz, element.reversed) };
    case 'unsolved': return { form: 'series', z: unknownImmittance(frequencyHz.length, `${element.name} is not solved yet`) };
    case 'faulty': return { form: 'series', z: unknownImmittance(frequencyHz.length, element.reason) };
  }
}

/** A matrix of zeros, known everywhere, to be filled. */
export function blankAbcd(frequencyHz: Float64Array): Cascade {
  const length = frequencyHz.length;
  return {
    frequencyHz, a: complexArray(length), b: complexArray(length), c: complexArray(length), d: complexArray(length),
    scale: complexArray(length), known: new Uint8Array(length).fill(1), reason: null,
  };
}

/** Series Z = n/d is [[d, n], [0, d]]/d; shunt is [[n, 0], [d, n]]/n. */
function branchAbcd(z: Immittance, orientation: 'series' | 'shunt', frequencyHz: Float64Array): Cascade {
  const { numerator: n, denominator: d, known, reason } = z;
  const straight = orientation === 'series' ? d : n;
  const nothing = complexArray(frequencyHz.length);
  for (let k = 0; k < known.length; k++) if (known[k] === 0) nothing.re[k] = nothing.im[k] = NaN;
  return {
    frequencyHz, a: straight, b: orientation === 'series' ? n : nothing, c: orientation === 'series' ? nothing : d, d: straight,
    scale: straight, known, reason,
  };
}

function twice(z: Immittance): Immittance {
  const result: Immittance = { ...z, numerator: complexArray(z.known.length), denominator: complexArray(z.known.length) };
  const { numerator: n, denominator: d } = z;
  for (let k = 0; k < z.known.length; k++) writeRatio(result, k, 2 * n.re[k], 2 * n.im[k], d.re[k], d.im[k]);
  return result;
}

/**
 * Ideal: [[n, 0], [0, 1/n]] with n = turns source : load. With a winding: two coupled inductances, L1 on the source side,
 * L2 = L1·(nL/nS)² and M = k√(L1 L2), from V1 = jωL1 I1 − jωM I2 and V2 = jωM I1 − jωL2 I2. All entries are multiplied by
 * jωM, so that no coupling at all, or 0 Hz, stays finite.
 */
function transformerAbcd(transformer: Extract<Element, { form: 'transformer' }>, frequencyHz: Float64Array): Cascade {
  const { turnsSource, turnsLoad, windingH, coupling } = transformer;
  const result = blankAbcd(frequencyHz);
  if (windingH === null) {
    result.a.re.fill(turnsSource / turnsLoad);
    result.d.re.fill(turnsLoad / turnsSource);
    result.scale.re.fill(1);
    return result;
  }
  const loadH = windingH * (turnsLoad / turnsSource) ** 2;
  const mutualH = coupling * Math.sqrt(windingH * loadH);
  const leakage = windingH * loadH * (1 - coupling * coupling);
  for (let k = 0; k < frequencyHz.length; k++) {
    const omega = 2 * Math.PI * frequencyHz[k];
    result.a.im[k] = omega * windingH;
    result.b.re[k] = -omega * omega * leakage;
    result.c.re[k] = 1;
    result.d.im[k] = omega * loadH;
    result.scale.im[k] = omega * mutualH;
  }
  return result;
}
