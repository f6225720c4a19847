import type { Line } from '../../network/line';
import type { PartKind } from '../../network/part';
import { isSeriesName, seriesBetween } from '../../quantity/preferredSeries';
import type { Choice, ValueRange } from '../../study/unknown';
import { reactanceReach } from '../limits';
import { isPartName } from '../phrase/readPart';
import type { FiguresSyntax, RangeSyntax, SolveSyntax } from '../syntax';
import { findName } from './findName';
import { makePart, mergeFigures, noFigures } from './makePart';
import { problemAt, type Resolution, type ResolvedFamily, type ResolvedMember } from './resolution';

/** What may be put where it says `solve`: `kind` null where an inductor and a capacitor are both possible. */
export function partChoices(
  solve: Pick<SolveSyntax, 'range' | 'series' | 'families' | 'span'>, kind: PartKind | null, figures: FiguresSyntax, resolution: Resolution,
): Choice[] {
  const range: ValueRange | null = solve.range && { min: solve.range.min.value, max: solve.range.max.value };
  if (range && !(range.min > 0)) {
    resolution.report(problemAt('not-positive', 'The values to try are above zero.', solve.range?.min.span ?? solve.span));
    return [];
  }
  const kinds: readonly PartKind[] = kind ? [kind] : ['inductor', 'capacitor'];
  if (solve.families.length > 0) {
    const choices = solve.families.flatMap((name) => {
      const family = findName(name, [...resolution.families.keys()], 'family', resolution.report) ? resolution.families.get(name.value) : undefined;
      if (!family || !family.usable) return [];
      const made = (kind ? kinds : (['inductor', 'capacitor', 'resistor'] as const)).flatMap((each) => familyChoices(family, each, range, figures));
      if (made.length === 0) reportNothing(name, kind, family, range, resolution);
      return made;
    });
    return choices;
  }
  return kinds.flatMap((each): Choice[] => {
    const reach = range ?? reactanceRange(each, resolution);
    if (solve.series) {
      const values = isSeriesName(solve.series.value) ? seriesBetween(solve.series.value, reach.min, reach.max) : [];
      const parts = values.map((value) => makePart(each, value, figures));
      return parts.length > 0 ? [{ form: 'catalogue', kind: each, family: null, parts, labels: parts.map(() => null), counts: parts.map(() => null) }] : [];
    }
    return [{ form: 'continuous', kind: each, range: reach, template: makePart(each, Math.sqrt(reach.min * reach.max), figures) }];
  });
}

/**
 * The members of one kind, inside a range where one is stated, as long as there are any left. A value means the first part of
 * that value; the others are to be had by their label, and without one that can be written and is theirs alone, not at all.
 */
export function familyChoices(family: ResolvedFamily, kind: PartKind, range: ValueRange | null, own: FiguresSyntax = noFigures): Choice[] {
  const slack = 1e-9;
  const ofKind = family.members.filter((member) => member.kind === kind);
  const firstOfValue = firsts(ofKind, ({ value }) => value);
  const firstOfLabel = firsts(ofKind, ({ label }) => label);
  const members = ofKind
    .map((member) => ({ member, first: firstOfValue.has(member) }))
    .filter(({ member, first }) => member.count !== 0 && (first || (member.label !== null && isPartName(member.label) && firstOfLabel.has(member))))
    .filter(({ member }) => !range || (member.value >= range.min * (1 - slack) && member.value <= range.max * (1 + slack)));
  if (members.length === 0) return [];
  return [{
    form: 'catalogue', kind, family: family.family.name,
    parts: members.map(({ member }) => makePart(kind, member.value, mergeFigures(own, member.figures), member.data)),
    labels: members.map(({ member, first }) => (first ? null : member.label)),
    counts: members.map(({ member }) => member.count),
  }];
}

/** Of members with the same key, each time the first. */
function firsts(members: readonly ResolvedMember[], key: (member: ResolvedMember) => unknown): ReadonlySet<ResolvedMember> {
  const found = new Map<unknown, ResolvedMember>();
  for (const member of members) if (!found.has(key(member))) found.set(key(member), member);
  return new Set(found.values());
}

function reportNothing(name: { value: string; span: { start: number; end: number } }, kind: PartKind | null, family: ResolvedFamily, range: ValueRange | null, { report }: Resolution): void {
  const ofKind = kind === null || family.members.some((member) => member.kind === kind);
  const message = !ofKind ? `«${name.value}» has no ${kind}s.` : range ? `«${name.value}» has no value in this range.` : `«${name.value}» has no parts.`;
  report(problemAt(ofKind ? 'empty-choice' : 'kind-mismatch', message, name.span));
}

/** Values whose reactance in the middle of the first band is between z0/30 and 30·z0; for resistors, whose resistance is. */
export function reactanceRange(kind: PartKind, { middleHz, z0Ohm }: Pick<Resolution, 'middleHz' | 'z0Ohm'>): ValueRange {
  const omega = 2 * Math.PI * middleHz;
  const low = z0Ohm / reactanceReach;
  const high = z0Ohm * reactanceReach;
  if (kind === 'resistor') return { min: low, max: high };
  return kind === 'inductor' ? { min: low / omega, max: high / omega } : { min: 1 / (omega * high), max: 1 / (omega * low) };
}

/** Lengths of a line: as stated, else from a hundredth to half a wavelength in the middle of the first band. */
export function lineChoices(kind: 'line' | 'stub', stated: RangeSyntax | null, template: Line, { middleHz, report }: Resolution): Choice[] {
  const wavelengthM = (299_792_458 * template.velocityFactor) / middleHz;
  const range = stated ? { min: stated.min.value, max: stated.max.value } : { min: wavelengthM / 100, max: wavelengthM / 2 };
  if (range.min >= 0 && range.max > 0) return [{ form: 'continuous', kind, range, template }];
  report(problemAt('not-positive', 'The lengths to try are above zero.', stated?.span ?? { start: 0, end: 0 }));
  return [];
}
