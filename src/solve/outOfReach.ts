import type { Complex } from '../network/complex';
import { impedanceOf } from '../network/immittance';
import { firstMiddle } from '../study/place';
import type { Problem } from '../study/problem';
import { sampleLoad, sampleSource } from '../study/sampleCase';
import { describeForm, twoElementMatches } from './closedForms';
import { formReach } from './formReach';
import type { OutOfReach } from './solution';

/** Load of the first case and source at the middle of the first band, in Ω; not finite where one is open or not known. */
export function endsAtMiddle(problem: Problem): { readonly load: Complex; readonly source: Complex; readonly frequencyHz: number } {
  const frequencyHz = firstMiddle(problem);
  const here = Float64Array.of(frequencyHz);
  const at = (z: ReturnType<typeof sampleLoad>): Complex => {
    const { re, im } = impedanceOf(z);
    return { re: re[0], im: im[0] };
  };
  const [band] = problem.bands;
  return { load: at(sampleLoad(problem.cases[0], here)), source: at(sampleSource(problem.source, problem.bands, here, band?.name ?? null)), frequencyHz };
}

/** Which of the eight two-element forms cannot match the first case at the middle of the first band, and why. */
export function twoElementFormsOutOfReach(problem: Problem): OutOfReach[] {
  const { load, source, frequencyHz } = endsAtMiddle(problem);
  const { forms } = twoElementMatches(load, source, frequencyHz);
  const seen = reflectionAgainst(load, problem.z0Ohm);
  return forms.flatMap(({ form, reason }) => (reason === null ? [] : [{
    form: describeForm(form), reason,
    ...(source.re > 0 && Number.isFinite(seen.re) ? { reach: { region: formReach(form, source, problem.z0Ohm), load: seen } } : {}),
  }]));
}

/** (Z − z0)/(Z + z0) of a finite impedance. */
function reflectionAgainst({ re, im }: Complex, z0Ohm: number): Complex {
  const below = (re + z0Ohm) ** 2 + im * im;
  return { re: (re * re - z0Ohm * z0Ohm + im * im) / below, im: (2 * im * z0Ohm) / below };
}
