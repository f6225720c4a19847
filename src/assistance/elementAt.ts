import { lineMap } from '../base/lineMap';
import { contains, type Span } from '../base/span';
import type { ElementSyntax, GoalSyntax } from '../description/syntax';
import type { Assessment } from './assess';
import { goalSyntaxOf } from './goalDiagnostics';

/** What the panel calls the things that a cursor can stand in: elements by name, goals by their number. */
export interface PointedAt {
  readonly elementId: string | null;
  readonly goalId: number | null;
}

/** The ladder's element and the goal at an offset: where the cursor stands in them, or anywhere else on their lines. */
export function elementAt(assessment: Assessment, offset: number): PointedAt {
  return { elementId: elementSyntaxAt(assessment, offset)?.name.value ?? null, goalId: goalIdAt(assessment, offset) };
}

export function elementSyntaxAt({ description: { syntax } }: Assessment, offset: number): ElementSyntax | null {
  return atOrOnLine(syntax.ladder?.elements ?? [], offset, syntax.text);
}

export function goalSyntaxAt({ description: { syntax } }: Assessment, offset: number): GoalSyntax | null {
  return atOrOnLine(syntax.goals, offset, syntax.text);
}

function goalIdAt(assessment: Assessment, offset: number): number | null {
  const syntax = goalSyntaxAt(assessment, offset);
  const id = syntax ? (assessment.evaluation?.goals ?? []).findIndex(({ goal }) => goalSyntaxOf(assessment.description, goal) === syntax) : -1;
  return id < 0 ? null : id;
}

/** The entry that holds the offset, else the last that has a part of its line to itself: a dash, a comment. */
function atOrOnLine<T extends { readonly span: Span }>(entries: readonly T[], offset: number, text: string): T | null {
  const exact = entries.find(({ span }) => contains(span, offset));
  if (exact) return exact;
  const lines = lineMap(text);
  const { line } = lines.positionAt(offset);
  const lineOf = (at: number) => lines.positionAt(at).line;
  return entries.findLast(({ span }) => lineOf(span.start) <= line && line <= lineOf(span.end)) ?? null;
}
