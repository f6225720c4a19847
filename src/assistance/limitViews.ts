import type { DiscView } from '../messages/panel';
import { impedanceOf } from '../network/immittance';
import { printNumber } from '../quantity/printQuantity';
import { bandLimits } from '../solve/bandLimits';
import { reflectionRegion } from '../study/discs';
import { judgedBands, middleOf } from '../study/place';
import type { Problem } from '../study/problem';
import { sampleSource } from '../study/sampleCase';
import { leastNamed } from './limitText';

/** The Bode–Fano limit of each judged band, as its image on the chart for the source in the middle of the band. */
export function limitViews(problem: Problem): DiscView[] {
  const bands = judgedBands(problem);
  return bandLimits({ ...problem, bands }).flatMap(({ limit: { reflection } }, at) => {
    if (reflection === null || reflection < leastNamed) return [];
    const band = bands[at];
    const source = sampleSource(problem.source, problem.bands, Float64Array.of(middleOf(band.frequencyHz)), band.name);
    if (!source.known[0]) return [];
    const { re, im } = impedanceOf(source);
    const region = reflectionRegion(reflection, { re: re[0], im: im[0] }, problem.z0Ohm);
    if (region.form !== 'inside') return [];
    return [{ centreRe: region.centre.re, centreIm: region.centre.im, radius: region.radius, label: `Bode–Fano, ${band.name}: |Γ| ${printNumber(reflection, 2)}` }];
  });
}
