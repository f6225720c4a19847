import { elementAbcd, throughElements } from '../network/cascade';
import type { Complex, ComplexArray } from '../network/complex';
import type { Element } from '../network/element';
import { impedanceOf, reflectionOf, type Immittance } from '../network/immittance';
import type { ImpedancePath, PathStep } from './evaluation';
import { immittanceArc } from './immittanceArc';
import { arcPoints, lineArcPointsAtMost, lineArcStepDeg } from './limits';
import { orientationOf } from './orientation';
import type { Problem } from './problem';
import { sampleLoad } from './sampleCase';
import { studiedLadder } from './studiedLadder';
import type { TunableCodes } from './tunableCodes';

const speedOfLight = 299_792_458;

/**
 * The way from the load through each element to the source at one frequency, in reflection against z0. What lies in series
 * or across grows from nothing to its value (without loss along a circle of constant resistance or conductance), a line
 * from no length to its own; a transformer and a block are one straight step. It ends before the first element that is not
 * known; where the load itself is not, `load` is null.
 */
export function impedancePath(problem: Problem, caseIndex: number, frequencyHz: number, codes?: TunableCodes): ImpedancePath {
  const point = Float64Array.of(frequencyHz);
  const loadCase = problem.cases[caseIndex];
  const load = sampleLoad(loadCase, point);
  const { z0Ohm } = problem;
  if (!load.known[0]) return { caseName: loadCase.name, frequencyHz, load: null, steps: [] };
  const steps: PathStep[] = [];
  let seen = load;
  for (const element of studiedLadder(problem, codes)) {
    const after = throughElements([element], seen, point);
    if (!after.known[0]) break;
    const reflectionAfter = first(reflectionOf(after, z0Ohm));
    steps.push({
      name: element.name,
      orientation: orientationOf(element),
      arc: arcOf(element, seen, first(reflectionOf(seen, z0Ohm)), reflectionAfter, point, z0Ohm),
      reflectionAfter,
      impedanceAfterOhm: first(impedanceOf(after)),
    });
    seen = after;
  }
  return { caseName: loadCase.name, frequencyHz, load: first(reflectionOf(load, z0Ohm)), steps };
}

/** From `from` to `to`, both ends included exactly. */
function arcOf(element: Element, seen: Immittance, from: Complex, to: Complex, point: Float64Array, z0Ohm: number): ComplexArray {
  const arc = rawArc(element, seen, point, z0Ohm) ?? { re: new Float64Array(2), im: new Float64Array(2) };
  const last = arc.re.length - 1;
  arc.re[0] = from.re;
  arc.im[0] = from.im;
  arc.re[last] = to.re;
  arc.im[last] = to.im;
  return arc;
}

function rawArc(element: Element, seen: Immittance, point: Float64Array, z0Ohm: number): ComplexArray | null {
  switch (element.form) {
    case 'branch':
    case 'stub': {
      const { a, b, c, d } = elementAbcd(element, point);
      const before = { numerator: first(seen.numerator), denominator: first(seen.denominator) };
      return orientationOf(element) === 'series'
        ? immittanceArc(before, { along: 'series', top: first(b), bottom: first(d) }, z0Ohm, arcPoints)
        : immittanceArc(before, { along: 'shunt', top: first(c), bottom: first(a) }, z0Ohm, arcPoints);
    }
    case 'line': return lineArc(element, seen, point, z0Ohm);
    default: return null;
  }
}

function lineArc(element: Extract<Element, { form: 'line' }>, seen: Immittance, point: Float64Array, z0Ohm: number): ComplexArray {
  const { line } = element;
  const turnDeg = (720 * point[0] * line.lengthM) / (line.velocityFactor * speedOfLight);
  const points = Math.max(arcPoints, Math.min(Math.ceil(turnDeg / lineArcStepDeg) + 1, lineArcPointsAtMost));
  const arc: ComplexArray = { re: new Float64Array(points), im: new Float64Array(points) };
  for (let k = 0; k < points; k++) {
    const share = k / (points - 1);
    const piece = {
      ...line, lengthM: line.lengthM * share, conductorLossDb: line.conductorLossDb * share, dielectricLossDb: line.dielectricLossDb * share,
    };
    const at = first(reflectionOf(throughElements([{ ...element, line: piece }], seen, point), z0Ohm));
    arc.re[k] = at.re;
    arc.im[k] = at.im;
  }
  return arc;
}

const first = (values: ComplexArray): Complex => ({ re: values.re[0], im: values.im[0] });
