import { at } from './abcdPoint';
import type { Cascade } from './cascade';
import { magnitude, multiply, subtract } from './complex';
import type { Element } from './element';
import { elementAbcd } from './elementAbcd';
import type { Immittance } from './immittance';
import { forget, knownImmittance, writeRatio } from './ratio';

/**
 * Below this share of its two products the determinant of a matrix is rounding: what lies behind it cannot be told. It is
 * that of 130 dB of loss, far past what any analyser measures.
 */
const LEAST_DETERMINANT = 1e-13;

/**
 * The load behind a fixture: the inverse ABCD matrix of `fixture` (from the load outwards) applied to what was `measured`
 * at its outer end. Lossy fixtures too; |Γ| of the result may exceed 1 where the stated loss is more than there was. Points
 * at which the fixture lets nothing through are not known.
 */
export function removeFixture(measured: Immittance, fixture: readonly Element[], frequencyHz: Float64Array): Immittance {
  let seen = measured;
  for (let i = fixture.length - 1; i >= 0; i--) seen = behindNetwork(elementAbcd(fixture[i], frequencyHz), seen, fixture[i].name);
  return seen;
}

/** ZL = (D·Zin − B)/(A − C·Zin). */
function behindNetwork(network: Cascade, input: Immittance, name: string): Immittance {
  let blocked = false;
  const result = knownImmittance(input.known.length);
  for (let k = 0; k < input.known.length; k++) {
    if (input.known[k] === 0 || network.known[k] === 0) {
      forget(result, k);
      continue;
    }
    const a = at(network.a, k);
    const b = at(network.b, k);
    const c = at(network.c, k);
    const d = at(network.d, k);
    const ad = multiply(a, d);
    const bc = multiply(b, c);
    if (!(magnitude(subtract(ad, bc)) > LEAST_DETERMINANT * (magnitude(ad) + magnitude(bc)))) {
      blocked = true;
      forget(result, k);
      continue;
    }
    const n = at(input.numerator, k);
    const i = at(input.denominator, k);
    const voltage = subtract(multiply(d, n), multiply(b, i));
    const current = subtract(multiply(a, i), multiply(c, n));
    writeRatio(result, k, voltage.re, voltage.im, current.re, current.im);
  }
  const reason = input.reason ?? network.reason ?? (blocked ? `${name} of the fixture lets nothing through` : null);
  return { ...result, reason };
}
