import type { Located } from '../../base/span';
import type { PartKind } from '../../network/part';
import { isSeriesName, seriesBetween } from '../../quantity/preferredSeries';
import type { Family } from '../../study/problem';
import { familyMembersAtMost } from '../limits';
import type { FamilySyntax } from '../syntax';
import { readDrawer } from './drawer';
import { reportTwice } from './findName';
import { checkFigures, makePart } from './makePart';
import { measuredValue } from './measuredValue';
import { doubtAt, problemAt, type Resolution, type ResolvedFamily, type ResolvedMember } from './resolution';
import { resolveFile } from './resolveFile';
import { reactanceRange } from './unknownChoices';

type Base = Omit<Resolution, 'families' | 'tunables'>;

/** Families with their members; one that cannot be had is there too, and not usable. */
export function resolveFamilies(syntaxes: readonly FamilySyntax[], base: Base): Map<string, ResolvedFamily> {
  reportTwice(syntaxes.map((family) => family.name), 'family', base.report);
  const families = new Map<string, ResolvedFamily>();
  for (const syntax of syntaxes) {
    if (!families.has(syntax.name.value)) families.set(syntax.name.value, resolveFamily(syntax, base));
  }
  return families;
}

function resolveFamily(stated: FamilySyntax, base: Base): ResolvedFamily {
  const { source } = stated;
  const kind = 'kind' in source ? source.kind : null;
  const syntax = { ...stated, figures: kind ? checkFigures(kind, stated.figures, base) : stated.figures };
  const members = membersOf(syntax, base) ?? [];
  const kinds = new Set(members.map((member) => member.kind));
  const family: Family = {
    name: syntax.name.value,
    kind: kind ?? (kinds.size === 1 ? members[0].kind : 'mixed'),
    members: members.map(({ kind: own, value, figures, data, label, count }) => ({ part: makePart(own, value, figures, data), label, count })),
  };
  return { syntax, family, members, usable: members.length > 0 };
}

function membersOf(syntax: FamilySyntax, base: Base): ResolvedMember[] | null {
  const { source, figures } = syntax;
  const plain = (kind: PartKind, value: number): ResolvedMember => ({ kind, value, figures, label: null, count: null, data: null });
  switch (source.form) {
    case 'series': {
      const range = source.range ? { min: source.range.min.value, max: source.range.max.value } : reactanceRange(source.kind, base);
      if (!isSeriesName(source.series.value)) return null;
      const values = seriesBetween(source.series.value, range.min, range.max);
      if (values.length === 0) base.report(problemAt('empty-family', `${source.series.value} has no value in this range.`, source.range?.span ?? source.series.span));
      return atMost(values, source.series, base).map((value) => plain(source.kind, value));
    }
    case 'list': {
      const good = source.values.filter(({ value, span }) => {
        const sound = value > 0 || (value === 0 && source.kind === 'resistor');
        if (!sound) base.report(problemAt('not-positive', 'The values of parts are above zero.', span));
        return sound;
      });
      return [...new Set(good.map(({ value }) => value))].sort((a, b) => a - b).map((value) => plain(source.kind, value));
    }
    case 'files':
      return fileMembers(source.kind, source.pattern, syntax, base);
    case 'csv': {
      const file = base.files.get(source.path.value);
      if (file?.form === 'csv') return readDrawer(source.path, file.text, figures, base);
      reportDrawer(source.path, base);
      return null;
    }
    case 'faulty':
      return null;
  }
}

function atMost(values: number[], place: Located<string>, { report }: Base): number[] {
  if (values.length > familyMembersAtMost) report(problemAt('too-many', `More than ${familyMembersAtMost} values; those above are left out. Is the range as meant?`, place.span));
  return values.slice(0, familyMembersAtMost);
}

function reportDrawer(path: Located<string>, { files, report }: Base): void {
  const file = files.get(path.value);
  if (!file) return;
  if (file.form === 'missing') report(problemAt('file-missing', `There is no file ${path.value}; the path is relative to this description.`, path.span));
  else if (file.form === 'refused') report(problemAt('file-refused', `${path.value} is not read: ${file.reason}`, path.span));
  else if (file.form === 'unreadable') report(problemAt('file-unreadable', `${path.value}: ${file.message}`, path.span));
  else report(problemAt('file-unreadable', `${path.value} is not a CSV file.`, path.span));
}

/** Parts measured in series, by increasing value. */
function fileMembers(kind: PartKind, pattern: Located<string>, syntax: FamilySyntax, base: Base): ResolvedMember[] {
  const listed = base.files.get(pattern.value);
  const isPattern = pattern.value.includes('*');
  if (isPattern && listed?.form !== 'pattern') {
    if (listed?.form === 'refused') base.report(problemAt('file-refused', `${pattern.value} is not read: ${listed.reason}`, pattern.span));
    else if (listed) base.report(problemAt('file-missing', `No file matches ${pattern.value}.`, pattern.span));
    return [];
  }
  const paths = listed?.form === 'pattern' ? listed.paths : [pattern.value];
  if (paths.length === 0) base.report(problemAt('file-missing', `No file matches ${pattern.value}.`, pattern.span));
  if (paths.length > familyMembersAtMost) base.report(problemAt('too-many', `${pattern.value} matches more than ${familyMembersAtMost} files; the others are left out.`, pattern.span));
  const members = paths.slice(0, familyMembersAtMost).flatMap((path): ResolvedMember[] => {
    if (!base.files.has(path)) {
      base.missing.push({ path, span: pattern.span, kind: 'touchstone', within: null });
      return [];
    }
    const { data } = resolveFile({ value: path, span: pattern.span }, base);
    if (!data) return [];
    const value = measuredValue(kind, data);
    if (value === null) {
      const reason = data.ports === 2 ? `its low-frequency end is not that of ${kind === 'inductor' ? 'an' : 'a'} ${kind}` : `it has ${data.ports} ports and not two`;
      base.report(doubtAt('file-not-this-part', `${path} is left out: ${reason}.`, pattern.span));
      return [];
    }
    return [{ kind, value, figures: syntax.figures, label: baseName(path), count: null, data }];
  });
  return members.sort((a, b) => a.value - b.value);
}

const baseName = (path: string) => path.slice(path.lastIndexOf('/') + 1).replace(/\.[^.]*$/, '');
