import { elementAbcd, throughElements, type Cascade } from '../network/cascade';
import type { Complex, ComplexArray } from '../network/complex';
import type { Element, Orientation } from '../network/element';
import { impedanceOf, reflectionOf, type Immittance } from '../network/immittance';
import { identityOf } from './elementIdentity';
import type { ElementResult } from './evaluation';
import { orientationOf } from './orientation';
import { firstMiddle } from './place';
import { stressedPlaces } from './stressedPlaces';
import { sampleLoad } from './sampleCase';
import type { Sampler } from './sampler';
import { uncoveredElement } from './uncoveredElement';
import { named } from './obstacles';
import { worstStress } from './worstStress';

/**
 * The ladder as a table, from the load to the source: what each element is, and what is seen just after it in the first
 * case at the middle of the first band; voltage, current and heat (`stress`) are the worst over all bands and cases.
 */
export function elementTable(sampler: Sampler, stress = worstStress(sampler, stressedPlaces(sampler))): readonly ElementResult[] {
  const { problem, ladder } = sampler;
  const frequencyHz = firstMiddle(problem);
  const point = Float64Array.of(frequencyHz);
  const firstCase = problem.cases[0];
  let seen: Immittance = sampleLoad(firstCase, point);
  let reason = seen.known[0] ? null : named(firstCase.name === null ? 'load' : `load ${firstCase.name}`, seen.reason ?? 'not known there');
  return ladder.map((element, at) => {
    seen = throughElements([element], seen, point);
    if (reason === null && !seen.known[0]) reason = uncoveredElement([element], frequencyHz) ?? seen.reason ?? 'not known there';
    const own = ownImmittance(element, point);
    const after = seen.known[0] === 1;
    return {
      name: element.name,
      orientation: orientationOf(element),
      ...identityOf(element),
      frequencyHz,
      ...own,
      impedanceAfterOhm: after ? first(impedanceOf(seen)) : null,
      reflectionAfter: after ? first(reflectionOf(seen, problem.z0Ohm)) : null,
      peakVoltageV: stress.elements?.[at].peakVoltageV ?? null,
      rmsCurrentA: stress.elements?.[at].rmsCurrentA ?? null,
      dissipationW: stress.elements?.[at].dissipationW ?? null,
      reason: reason ?? stress.reason,
    };
  });
}

/** Reactance and susceptance of what stands alone in series or across; infinite ones, and those of two-ports, are null. */
function ownImmittance(element: Element, point: Float64Array): { reactanceOhm: number | null; susceptanceS: number | null } {
  const orientation = orientationOf(element);
  if (orientation === 'through') return { reactanceOhm: null, susceptanceS: null };
  const abcd = elementAbcd(element, point);
  if (!abcd.known[0]) return { reactanceOhm: null, susceptanceS: null };
  const [numerator, denominator] = impedanceEntries(abcd, orientation);
  return { reactanceOhm: imaginaryOf(numerator, denominator), susceptanceS: imaginaryOf(denominator, numerator) };
}

/** Z = b/d of a series element, a/c of one across. */
const impedanceEntries = (abcd: Cascade, orientation: Orientation): readonly [Complex, Complex] =>
  orientation === 'series' ? [first(abcd.b), first(abcd.d)] : [first(abcd.a), first(abcd.c)];

function imaginaryOf(top: Complex, bottom: Complex): number | null {
  const size = bottom.re * bottom.re + bottom.im * bottom.im;
  const value = (top.im * bottom.re - top.re * bottom.im) / size;
  return Number.isFinite(value) ? value + 0 : null;
}

const first = (values: ComplexArray): Complex => ({ re: values.re[0], im: values.im[0] });
