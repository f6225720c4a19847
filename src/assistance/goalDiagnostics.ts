import type { Diagnostic } from '../base/diagnostic';
import { lineMap, type LineMap } from '../base/lineMap';
import type { Description, Model } from '../description/description';
import type { GoalSyntax } from '../description/syntax';
import type { Evaluation } from '../study/evaluation';
import type { Goal } from '../study/goal';
import { isPending } from '../study/judgeYield';
import { goalDetail, goalValueText } from './goalText';
import { outOfReachNote } from './limitText';

const known = new WeakMap<Description, LineMap>();

/** Goals are looked up one by one on every keystroke; the lines of one text are counted once. */
function linesOf(description: Description): LineMap {
  const lines = known.get(description) ?? lineMap(description.syntax.text);
  known.set(description, lines);
  return lines;
}

/** The place in the description that a goal of the model was read from. */
export function goalSyntaxOf(description: Description, goal: Goal): GoalSyntax | null {
  const lines = linesOf(description);
  return description.syntax.goals.find((syntax) => syntax.text === goal.text && lines.positionAt(syntax.span.start).line + 1 === goal.line) ?? null;
}

/** Remarks on the goals that do not hold, and on the elements that wait for a value. */
export function goalDiagnostics(description: Description, model: Model, evaluation: Evaluation | null): Diagnostic[] {
  const unsolved = unsolvedDiagnostics(description, model);
  if (unsolved.length > 0) return unsolved;
  const found: Diagnostic[] = [];
  for (const result of evaluation?.goals ?? []) {
    const syntax = goalSyntaxOf(description, result.goal);
    // Builds are studied apart from the typing; until their yield is known there is nothing to say.
    if (result.ok || !syntax || isPending(result)) continue;
    const detail = [goalDetail(result), model.problem ? outOfReachNote(model.problem, result) : ''].filter((text) => text !== '').join('; ');
    found.push({
      code: result.reason !== null && result.value === null ? 'goal-not-known' : 'goal-missed',
      severity: 'warning',
      message: `${syntax.text}: ${goalValueText(result)}${detail && `, ${detail}`}.`,
      span: syntax.span,
    });
  }
  return found;
}

function unsolvedDiagnostics(description: Description, model: Model): Diagnostic[] {
  const { ladder } = description.syntax;
  if (!model.problem || !ladder) return [];
  if (model.problem.ladderTask) {
    return [{ code: 'unsolved', severity: 'warning', message: 'The ladder is still to be solved, so no goal can be judged.', span: ladder.keySpan }];
  }
  return model.problem.unknowns.filter((unknown) => !unknown.reopened).flatMap((unknown) => {
    const element = ladder.elements.find((entry) => entry.name.value === unknown.name);
    return element ? [{ code: 'unsolved', severity: 'warning' as const, message: `${unknown.name} has no value yet, so no goal can be judged.`, span: element.span }] : [];
  });
}
