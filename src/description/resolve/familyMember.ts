import type { Fix } from '../../base/diagnostic';
import type { PartKind } from '../../network/part';
import { formatValue } from './formatValue';
import { sameValue } from '../limits';
import type { PartSyntax } from '../syntax';
import { findName } from './findName';
import { doubtAt, type Resolution, type ResolvedFamily, type ResolvedMember } from './resolution';

/** The member of a family that a value means: the first with that value, or the one of that designation. Null (with a warning) where there is none. */
export function familyMember(syntax: PartSyntax, kind: PartKind, value: number, family: ResolvedFamily, { report }: Resolution): ResolvedMember | null {
  const members = family.members.filter((member) => member.kind === kind);
  if (syntax.label) {
    const labels = members.flatMap((member) => member.label ?? []);
    if (!findName(syntax.label, labels, 'part', report)) return null;
    const named = members.find((member) => member.label === syntax.label?.value) ?? null;
    if (named && !same(named.value, value)) {
      report(doubtAt('value-not-in-family', `${syntax.label.value} is ${formatValue(kind, named.value)} in «${family.syntax.name.value}».`, syntax.value.span, {
        fixes: [replace(syntax, formatValue(kind, named.value))],
      }));
    }
    return named;
  }
  const found = members.find((member) => same(member.value, value));
  if (found) return found;
  const below = Math.max(...members.filter((member) => member.value < value).map((member) => member.value));
  const above = Math.min(...members.filter((member) => member.value > value).map((member) => member.value));
  const nearest = [below, above].filter(Number.isFinite).map((each) => formatValue(kind, each));
  const hint = nearest.length > 0 ? `; the nearest are ${nearest.join(' and ')}` : '';
  report(doubtAt('value-not-in-family', `«${family.syntax.name.value}» has no ${formatValue(kind, value)}${hint}.`, syntax.value.span, {
    fixes: nearest.map((text) => replace(syntax, text)),
  }));
  return null;
}

const replace = (syntax: PartSyntax, text: string): Fix => ({ title: `Change to ${text}`, edits: [{ span: syntax.value.span, text }] });

export const same = (a: number, b: number): boolean => Math.abs(a - b) <= sameValue * Math.max(Math.abs(a), Math.abs(b));
