import { lineMap } from '../base/lineMap';
import type { CandidatesView, GoalView, PanelView, ProblemView, SpreadView } from '../messages/panel';
import type { GoalResult } from '../study/goal';
import type { Problem } from '../study/problem';
import { showChannelAt } from '../study/tuning/evaluateTuned';
import type { Assessment } from './assess';
import { unsolvedElements } from '../study/obstacles';
import { candidatesView } from './candidates';
import { cautions } from './cautions';
import { codesView, type CodesContext } from './codesView';
import { goalBar, goalDetail, isKnownResult, goalMarginText, goalPlace, goalTitle, goalValueText, verdictText } from './goalText';
import { ladderRows } from './ladderRows';
import { defaultMarkerHz, markerView } from './markerView';
import { outOfReachNote } from './limitText';
import { limitViews } from './limitViews';
import { shownSolution, solvedAssessment, type SolvedUnknowns } from './solvedAssessment';
import { withSpread, type Spread } from './spreadAssessment';
import { spreadView } from './spreadView';
import { bandViews, discViews, maskViews, sweepList, traceView } from './traceViews';

export interface PanelContext {
  readonly fileName: string;
  readonly pinned: boolean;
  /** Null: the middle of the first band. */
  readonly markerHz: number | null;
  /** What the unknowns came out as; null where nothing is unknown or it is not known yet. */
  readonly solved?: SolvedUnknowns | null;
  /** True while they are being worked out. */
  readonly solving?: boolean;
  /** What builds do, where that is known beside the assessment; `stale` where the text has changed since. */
  readonly spread?: { readonly spread: Spread; readonly stale: boolean; readonly cloud: SpreadView['cloud'] } | null;
  /** What is known of codes beside the evaluation. */
  readonly codes?: CodesContext;
}

/** False where mistakes leave not one point of any trace: a last good picture then says more than an empty chart. */
export function isDrawable({ evaluation, diagnostics }: Assessment): boolean {
  if (!evaluation) return false;
  return !diagnostics.some(({ severity }) => severity === 'error') || evaluation.traces.some(({ known }) => known.includes(1));
}

/** Everything that the panel shows of one assessment, as plain data; null where there is nothing to study. */
export function panelView(bare: Assessment, context: PanelContext): PanelView | null {
  const studied = context.spread ?? (bare.spread ? { spread: bare.spread, stale: false, cloud: [] } : null);
  const given = studied && !studied.stale ? withSpread(bare, studied.spread) : bare;
  const unsolved = given.model.problem !== null && unsolvedElements(given.model.problem).length > 0;
  const best = shownSolution(given.model.problem, context.solved ?? null);
  const found = best ? solvedAssessment(given, best) : given;
  const { description, model: { problem } } = found;
  if (!problem || !found.evaluation) return null;
  const markerHz = context.markerHz ?? defaultMarkerHz(problem);
  const evaluation = markerHz === null ? found.evaluation : showChannelAt(problem, found.evaluation, markerHz);
  const assessment = { ...found, evaluation };
  return {
    title: problem.title ?? description.syntax.title?.value ?? context.fileName,
    fileName: context.fileName,
    pinned: context.pinned,
    verdict: verdictText(evaluation.goals),
    goals: evaluation.goals.map((result, id) => goalView(result, id, problem)),
    problems: problemViews(given).filter(({ code }) => !best || code !== 'unsolved').map(({ severity, message, line }) => ({ severity, message, line })),
    cautions: cautions(problem, evaluation),
    z0Ohm: problem.z0Ohm,
    frequencyHz: sweepList(evaluation),
    bands: bandViews(problem),
    traces: evaluation.traces.map(traceView),
    discs: discViews(problem),
    limits: limitViews(problem),
    masks: maskViews(problem, evaluation.goals),
    marker: markerHz === null ? null : markerView(problem, markerHz),
    ladder: ladderRows(assessment, problem),
    notInserted: best !== null,
    candidates: unsolved ? candidatesOf(given, context) : null,
    spread: studied && !unsolved ? spreadView(studied.spread, problem, studied) : null,
    codes: codesView(problem, evaluation, context.codes ?? { coverage: null, firmware: [] }),
  };
}

function candidatesOf({ diagnostics }: Assessment, { solved, solving }: PanelContext): CandidatesView {
  if (solved && !solved.stale) return candidatesView(solved.result, { stale: false });
  const message = solving ? 'The values are being worked out …'
    : diagnostics.some(({ severity }) => severity === 'error') ? 'The values are worked out as soon as the text has no errors.'
      : 'The solver stopped before it had an answer; the log says why.';
  return { ...(solved ? candidatesView(solved.result, { stale: true }) : { stale: true, notes: [], outOfReach: [], candidates: [] }), message };
}

function goalView(result: GoalResult, id: number, problem: Problem): GoalView {
  return {
    id,
    title: goalTitle(result.goal),
    place: goalPlace(result.goal),
    ok: result.ok,
    known: isKnownResult(result),
    valueText: goalValueText(result),
    detail: goalDetail(result),
    marginText: goalMarginText(result),
    note: outOfReachNote(problem, result),
    bar: goalBar(result),
    line: result.goal.line - 1,
  };
}

/** What is wrong with the text, without the goals that are merely missed: those stand in the verdict. */
export function problemViews({ description, diagnostics }: Assessment): (ProblemView & { readonly code: string })[] {
  const lines = lineMap(description.syntax.text);
  return diagnostics
    .filter(({ code }) => code !== 'goal-missed' && code !== 'goal-not-known')
    .map(({ code, severity, message, span }) => ({ code, severity, message, line: lines.positionAt(span.start).line }));
}
