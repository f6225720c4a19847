import type { Complex } from '../complex';
import type { NetworkData } from '../networkData';
import type { KeywordState } from './keywords';
import type { TouchstoneOptions } from './options';
import type { PointAssembly } from './pointAssembly';
import { toScattering } from './toScattering';
import { refuse } from './touchstoneResult';

/** The points in the order of the file as scattering matrices, row by row. */
export function networkFromPoints(points: PointAssembly, ports: number, options: TouchstoneOptions, state: KeywordState): NetworkData {
  const referenceOhm = referencesOf(ports, options, state);
  const frequencyHz = points.frequencyHz.trimmed();
  const entries = ports * ports;
  const sRe = new Float64Array(frequencyHz.length * entries);
  const sIm = new Float64Array(frequencyHz.length * entries);
  const places = placesOf(ports, state);
  for (let k = 0; k < frequencyHz.length; k++) {
    places.forEach((place, entry) => {
      const from = 2 * (k * points.pairs + place);
      sRe[k * entries + entry] = points.values.at(from);
      sIm[k * entries + entry] = points.values.at(from + 1);
    });
  }
  if (options.parameter !== 'S') {
    for (let k = 0; k < frequencyHz.length; k++) convert(sRe, sIm, k * entries, ports, options.parameter, referenceOhm, state.version === null);
  }
  return { ports, frequencyHz, referenceOhm: Float64Array.from(referenceOhm), sRe, sIm };
}

function referencesOf(ports: number, options: TouchstoneOptions, state: KeywordState): number[] {
  const stated = state.references ?? options.referenceOhm;
  if (stated.length === ports) return [...stated];
  if (stated.length === 1 && state.references === null) return Array.from({ length: ports }, () => stated[0]);
  return refuse(`${stated.length} references are stated for ${ports === 1 ? 'one port' : `${ports} ports`}`);
}

/** For each matrix entry, row by row, the index of its pair in the file. */
function placesOf(ports: number, state: KeywordState): number[] {
  const columnsFirst = ports === 2 && state.matrix === 'full' && (state.version === null || state.twoPortOrder === '21_12');
  return Array.from({ length: ports * ports }, (_, entry) => {
    const [row, column] = [Math.floor(entry / ports), entry % ports];
    if (state.matrix === 'full') return columnsFirst ? column * ports + row : entry;
    const [high, low] = [Math.max(row, column), Math.min(row, column)];
    // Lower: rows 1, 2, … entries long; upper: the rows shrink instead.
    return state.matrix === 'lower' ? (high * (high + 1)) / 2 + low : low * ports - (low * (low - 1)) / 2 + high - low;
  });
}

function convert(sRe: Float64Array, sIm: Float64Array, at: number, ports: number, parameter: 'Y' | 'Z' | 'G' | 'H', referenceOhm: readonly number[], normalised: boolean): void {
  const data: Complex[][] = Array.from({ length: ports }, (_, i) => Array.from({ length: ports }, (__, j) => ({ re: sRe[at + i * ports + j], im: sIm[at + i * ports + j] })));
  toScattering(parameter, data, referenceOhm, normalised).flat().forEach(({ re, im }, entry) => {
    if (!Number.isFinite(re) || !Number.isFinite(im)) refuse('a point has no finite scattering parameters');
    sRe[at + entry] = re;
    sIm[at + entry] = im;
  });
}
