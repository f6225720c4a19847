import { lineMap } from '../../base/lineMap';
import type { Located } from '../../base/span';
import type { Goal, GoalPlace } from '../../study/goal';
import type { Band, LoadCase } from '../../study/problem';
import { bandPoints } from '../limits';
import type { DescriptionSyntax, GoalSyntax, PlaceSyntax } from '../syntax';
import { findName } from './findName';
import { rangePoints } from './rangePoints';
import { problemAt, type Resolution } from './resolution';
import { resolveImpedance } from './resolveImpedance';

interface Names {
  readonly bands: readonly Band[];
  /** Bands that are stated and could not be read. */
  readonly faultyBands: readonly string[];
  readonly cases: readonly LoadCase[];
  /** Null while the ladder itself is to be found. */
  readonly elements: readonly string[] | null;
}

/** Goals with their names looked up; one that names something unknown is reported and left out. */
export function resolveGoals(syntax: DescriptionSyntax, names: Names, resolution: Resolution): Goal[] {
  const lines = lineMap(syntax.text);
  return syntax.goals.flatMap((goal): Goal[] => {
    if (!checkNames(goal, names, resolution)) return [];
    const place = resolvePlace(goal.place, resolution);
    if (!place) return [];
    return [{
      text: goal.text,
      line: lines.positionAt(goal.span.start).line + 1,
      quantity: goal.quantity, comparison: goal.comparison, limit: goal.limit?.value ?? null, unit: goal.unit,
      place,
      caseName: goal.caseName?.value ?? null,
      into: goal.into && resolveImpedance(goal.into, resolution),
      against: goal.against?.value ?? null,
      elementName: goal.elementName?.value ?? null,
      bandwidthDropDb: goal.bandwidthDropDb,
    }];
  });
}

function checkNames(goal: GoalSyntax, { bands, faultyBands, cases, elements }: Names, { report }: Resolution): boolean {
  const bandNames = [...bands.map((band) => band.name), ...faultyBands];
  const caseNames = cases.flatMap((each) => each.name ?? []);
  let good = true;
  const check = (sound: boolean) => { good = good && sound; };
  const checkBand = (band: Located<string>) => check(findName(band, bandNames, 'band', report) && !faultyBands.includes(band.value));
  if (goal.place.form === 'band' || goal.place.form === 'harmonic') checkBand(goal.place.band);
  if (goal.against) checkBand(goal.against);
  if (goal.caseName) check(findName(goal.caseName, caseNames, 'case', report));
  if (goal.elementName && elements) check(findName(goal.elementName, [...elements, 'load'], 'element', report));
  if (goal.into && goal.caseName) {
    report(problemAt('into-with-for', '«into» replaces the load and «for» picks one; only one of them can stand in a goal.', goal.into.span));
    check(false);
  }
  if (goal.against && goal.quantity !== 'rejection') {
    report(problemAt('against-without-rejection', '«against» names the reference band of a rejection and belongs to no other goal.', goal.against.span));
    check(false);
  }
  return good;
}

function resolvePlace(place: PlaceSyntax, { report }: Resolution): GoalPlace | null {
  switch (place.form) {
    case 'bands':
      return { form: 'bands' };
    case 'band':
      return { form: 'band', band: place.band.value };
    case 'harmonic':
      return { form: 'harmonic', order: place.order, band: place.band.value };
    case 'range': {
      const frequencyHz = rangePoints(place.range, bandPoints);
      if (frequencyHz[0] > 0) return { form: 'range', frequencyHz };
      report(problemAt('not-positive', 'Frequencies are above zero.', place.range.span));
      return null;
    }
    case 'frequency':
      if (place.frequencyHz.value > 0) return { form: 'frequency', frequencyHz: place.frequencyHz.value };
      report(problemAt('not-positive', 'A frequency is above zero.', place.frequencyHz.span));
      return null;
  }
}
