import type { Complex } from '../../network/complex';
import { fromReflection, reflectionOf, type Immittance } from '../../network/immittance';
import { codePointsAtMost } from '../limits';
import type { Problem } from '../problem';
import { sampleLoad, sampleSource } from '../sampleCase';
import { joined, lawOf } from '../spread/goalChecks';
import { codesObstacle } from './bestCodes';
import { channelProblems, nearestChannel, type ChannelProblem } from './channelProblems';
import { marginOfExcess } from './chooseCodes';
import { codeKernel } from './codeKernel';
import { codeSpace } from './codeSpace';

export interface CoverageOptions {
  /** The channel nearest to it is looked at. */
  readonly frequencyHz: number;
  /** Points of the grid across the chart, at least 2; 61 by default. */
  readonly across?: number;
  /** Goals for this case count too; by default only those for every case. */
  readonly caseName?: string | null;
}

/** Which loads the ladder can bring to the goals at one channel, each with its own best codes. */
export interface Coverage {
  /** The channel. */
  readonly frequencyHz: number;
  readonly across: number;
  /**
   * By grid point, row by row from the lowest imaginary part, each from the lowest real part of the load's reflection against z0,
   * both from −1 to 1: the best margin in dB with some code. NaN outside of the chart, −∞ where nothing can be brought about.
   */
  readonly marginDb: Float64Array;
  /** Share of the grid's points inside the chart that reach the goals, 0 … 1. */
  readonly share: number;
  readonly cases: readonly CoveredCase[];
}

/** Where a load case lies, and the margin with its own best codes. */
export interface CoveredCase {
  readonly caseName: string | null;
  /** Against z0; null where not known at the channel. */
  readonly reflection: Complex | null;
  readonly marginDb: number | null;
}

const defaultAcross = 61;
/** Points on the rim itself are in … */
const rim = 1 + 1e-12;
/** … but no rounding may make of them a load that gives power back. */
const inRim = 1 - 1e-15;

/**
 * The part of the chart that the ladder can bring to the goals with some combination of codes, all tried: goals on reflection
 * and gain at the channel itself, since a load on the chart says nothing of its harmonics. A text where there is no answer.
 */
export function coverage(problem: Problem, options: CoverageOptions): Coverage | string {
  const obstacle = codesObstacle(problem);
  if (obstacle !== null) return obstacle;
  const channels = channelProblems(problem);
  const channel = channels[nearestChannel(options.frequencyHz, Float64Array.from(channels, ({ frequencyHz }) => frequencyHz))];
  const laws = lawsAt(channel, options.caseName ?? null);
  if (laws.length === 0) return 'no goal on reflection or gain is judged at this channel';
  const across = options.across ?? defaultAcross;
  const grid = gridOf(across);
  const point = Float64Array.of(channel.frequencyHz);
  const space = codeSpace(problem);
  const count = grid.inside.length + problem.cases.length;
  if (space.count * count > codePointsAtMost) return 'there are too many combinations of codes';
  const band = channel.problem.bands.find((each) => each.frequencyHz.length === 1 && each.frequencyHz[0] === channel.frequencyHz)?.name ?? null;
  const source = sampleSource(problem.source, channel.problem.bands, point, band);
  const cases = problem.cases.map((each) => sampleLoad(each, point));
  const loads = joined([fromReflection({ re: grid.re, im: grid.im }, problem.z0Ohm), ...cases]);
  const kernel = codeKernel(problem, space, new Float64Array(count).fill(channel.frequencyHz), joined(new Array<Immittance>(count).fill(source)), loads);
  const least = new Float64Array(count).fill(Infinity);
  const states = new Int32Array(space.tunables.length);
  for (let combination = 0; combination < space.count; combination++) {
    space.statesOf(combination, states);
    kernel.evaluate(states);
    for (let k = 0; k < count; k++) {
      const excess = worstOf(laws, kernel.reflectionMagnitude[k] ** 2, kernel.gain[k]);
      if (excess < least[k]) least[k] = excess;
    }
  }
  const marginDb = new Float64Array(across * across).fill(NaN);
  grid.inside.forEach((at, k) => { marginDb[at] = marginOfExcess(least[k]); });
  return {
    frequencyHz: channel.frequencyHz, across, marginDb,
    share: least.subarray(0, grid.inside.length).filter((excess) => excess <= 1).length / grid.inside.length,
    cases: cases.map((load, i) => {
      const known = load.known[0] === 1;
      const { re, im } = reflectionOf(load, problem.z0Ohm);
      return { caseName: problem.cases[i].name, reflection: known ? { re: re[0], im: im[0] } : null, marginDb: known ? marginOfExcess(least[grid.inside.length + i]) : null };
    }),
  };
}

type Law = NonNullable<ReturnType<typeof lawOf>>;

function lawsAt({ problem, frequencyHz }: ChannelProblem, caseName: string | null): readonly Law[] {
  return problem.goals.flatMap((goal): Law[] => {
    const { place } = goal;
    const isHere = place.form === 'bands' ? problem.bands.some((band) => !band.watch && band.frequencyHz.includes(frequencyHz))
      : place.form === 'band' ? problem.bands.some((band) => band.name === place.band && band.frequencyHz.includes(frequencyHz))
        : place.form === 'range' ? place.frequencyHz.includes(frequencyHz) : place.form === 'frequency' && place.frequencyHz === frequencyHz;
    const law = isHere && !goal.into && (goal.caseName === null || goal.caseName === caseName) ? lawOf(goal) : null;
    return law && law.quantity !== 'rejection' ? [law] : [];
  });
}

/** As a ratio of powers, at most 1 where every law is kept; infinite where not known. */
function worstOf(laws: readonly Law[], reflectionSquare: number, gain: number): number {
  let worst = 0;
  for (const { quantity, side, limit } of laws) {
    const over = (quantity === 'reflection' ? reflectionSquare : gain) / limit;
    const excess = side === 'at most' ? over : 1 / over;
    if (!(excess <= worst)) worst = Number.isNaN(excess) ? Infinity : excess;
  }
  return worst;
}

/** The points of a square grid over −1 … 1 that lie in the chart, and which of the whole grid they are. */
function gridOf(across: number): { readonly re: Float64Array; readonly im: Float64Array; readonly inside: readonly number[] } {
  const coordinate = (i: number): number => -1 + (2 * i) / (across - 1);
  const inside = Array.from({ length: across * across }, (_, at) => at).filter((at) => Math.hypot(coordinate(at % across), coordinate(Math.floor(at / across))) <= rim);
  const re = Float64Array.from(inside, (at) => coordinate(at % across));
  const im = Float64Array.from(inside, (at) => coordinate(Math.floor(at / across)));
  for (let k = 0; k < inside.length; k++) {
    const size = Math.hypot(re[k], im[k]);
    if (size < inRim) continue;
    re[k] *= inRim / size;
    im[k] *= inRim / size;
  }
  return { inside, re, im };
}
