import type { Complex } from '../network/complex';
import { inverse, reactivePart, type ReactivePart } from './closedForms';
import { responseOf, type Response } from './response';

/** A pi (shunt, series, shunt) or tee (series, shunt, series), from the load on. */
export interface ThreeElementMatch {
  readonly form: 'pi' | 'tee';
  /** Three, or fewer where the load's or the source's own reactance already is what a part would be. */
  readonly parts: readonly ReactivePart[];
  /** At the load's and at the source's side; the larger is the one asked for. */
  readonly sideQ: readonly [number, number];
  readonly response: Response;
}

/** The least Q that a pi or tee between these ends can have: that of the two-element match. */
export function leastQ(form: 'pi' | 'tee', load: Complex, source: Complex): number {
  const [a, b] = form === 'pi' ? [inverse(load).re, inverse(source).re] : [load.re, source.re];
  return Math.sqrt(Math.max(a, b) / Math.min(a, b) - 1);
}

/**
 * The pi or tee matches in which the larger of both sides' Q is `q`; none where `q` is below `leastQ`.
 *
 * Pi: both ends are brought to a virtual resistance RV = Rhigh/(Q² + 1) by the parts across them, and the series part makes
 * up the reactance of both; either sign at either end. The ends' own susceptances are absorbed. The tee is the same with
 * admittances. After Bowick, RF Circuit Design, ch. 4. Ends in Ω with a positive real part.
 */
export function threeElementMatches(form: 'pi' | 'tee', load: Complex, source: Complex, frequencyHz: number, q: number): readonly ThreeElementMatch[] {
  if (!(load.re > 0 && source.re > 0) || !(q >= leastQ(form, load, source) * (1 - 1e-12)) || !(q > 0)) return [];
  const [near, far] = form === 'pi' ? [inverse(load), inverse(source)] : [load, source];
  const virtual = 1 / (Math.min(near.re, far.re) * (q * q + 1));
  const nearQ = Math.sqrt(Math.max(0, 1 / (near.re * virtual) - 1));
  const farQ = Math.sqrt(Math.max(0, 1 / (far.re * virtual) - 1));
  const matches: ThreeElementMatch[] = [];
  for (const nearSign of nearQ > 0 ? [1, -1] : [1]) {
    for (const farSign of farQ > 0 ? [1, -1] : [1]) {
      const middle = virtual * (nearSign * nearQ + farSign * farQ);
      if (Math.abs(middle) <= 1e-9 * virtual * q) continue;
      const [outer, inner] = form === 'pi' ? (['shunt', 'series'] as const) : (['series', 'shunt'] as const);
      const parts = [
        ...partFrom(outer, nearSign * nearQ * near.re - near.im, near.re, frequencyHz),
        ...partFrom(inner, middle, 0, frequencyHz),
        ...partFrom(outer, farSign * farQ * far.re - far.im, far.re, frequencyHz),
      ];
      matches.push({ form, parts, sideQ: [nearQ, farQ], response: responseOf(parts) });
    }
  }
  return matches;
}

function partFrom(orientation: 'series' | 'shunt', immittance: number, scale: number, frequencyHz: number): ReactivePart[] {
  if (Math.abs(immittance) <= 1e-11 * scale) return [];
  return [reactivePart(orientation, orientation === 'series' ? immittance : -1 / immittance, frequencyHz)];
}
