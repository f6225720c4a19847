import type { Complex } from '../network/complex';
import { impedanceOf } from '../network/immittance';
import { firstMiddle } from '../study/place';
import type { Problem } from '../study/problem';
import { sampleLoad, sampleSource } from '../study/sampleCase';
import { describeForm, twoElementMatches } from './closedForms';
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
  return twoElementMatches(load, source, frequencyHz).forms.flatMap(({ form, reason }) => (reason === null ? [] : [{ form: describeForm(form), reason }]));
}
