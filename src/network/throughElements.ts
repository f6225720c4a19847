import { at, largerColumn } from './abcdPoint';
import type { Cascade } from './cascade';
import { add, multiply } from './complex';
import type { Element } from './element';
import { elementAction } from './elementAbcd';
import { joinImmittances, type Immittance } from './immittance';
import { forget, knownImmittance, writeRatio } from './ratio';

/** Zin looking into the source side of `elements` (load first) closed in `load`; frequencies in Hz, as many as `load` has points. */
export function throughElements(elements: readonly Element[], load: Immittance, frequencyHz: Float64Array): Immittance {
  let seen = load;
  for (const element of elements) {
    const action = elementAction(element, frequencyHz);
    if (action.form === 'through') seen = throughNetwork(action.network, seen);
    else seen = joinImmittances(seen, action.z, action.form === 'series' ? 'series' : 'parallel');
  }
  return seen;
}

/** Zin = (A·ZL + B)/(C·ZL + D). Where the network lets nothing through, what it shows by itself. */
export function throughNetwork(network: Cascade, load: Immittance): Immittance {
  const result = knownImmittance(load.known.length, load.reason ?? network.reason);
  for (let k = 0; k < load.known.length; k++) {
    if (load.known[k] === 0 || network.known[k] === 0) {
      forget(result, k);
      continue;
    }
    const [voltage, current] = inputOf(network, load, k);
    writeRatio(result, k, voltage.re, voltage.im, current.re, current.im);
  }
  return result;
}

/** Voltage and current at the source's side, up to a factor, for the load's own n as voltage and d as current. */
export function inputOf(network: Cascade, load: Immittance, k: number): ReturnType<typeof largerColumn> {
  const n = at(load.numerator, k);
  const d = at(load.denominator, k);
  const voltage = add(multiply(at(network.a, k), n), multiply(at(network.b, k), d));
  const current = add(multiply(at(network.c, k), n), multiply(at(network.d, k), d));
  const lost = voltage.re === 0 && voltage.im === 0 && current.re === 0 && current.im === 0;
  return lost ? largerColumn(network, k) : [voltage, current];
}
