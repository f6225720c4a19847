import type { Assessment } from '../assistance/assess';
import { isOk } from '../assistance/assess';
import { lineMap } from '../base/lineMap';
import type { Complex } from '../network/complex';
import type { Spread } from '../assistance/spreadAssessment';
import { bandLimits, type BandLimit } from '../solve/bandLimits';
import type { BandResult, ElementResult } from '../study/evaluation';
import type { GoalResult } from '../study/goal';

/**
 * The result of `check` for programs: version 1. SI units, angles in degrees, complex numbers as `[re, im]`; `null` with a
 * `reason` beside it is not known, `null` without is infinite. Lines and columns count from 1 in UTF-16 units.
 */
export interface CheckedFile {
  /** Relative to the working folder, with `/`. */
  readonly path: string;
  readonly assessment: Assessment;
  /** The same goals in an earlier version of the description, where one was given. */
  readonly earlier?: Assessment | null;
}

export function checkJson(files: readonly CheckedFile[]): object {
  return { version: 1, ok: files.every((file) => isOk(file.assessment)), files: files.map(fileJson) };
}

function fileJson({ path, assessment, earlier }: CheckedFile): object {
  const { description, evaluation } = assessment;
  const lines = lineMap(description.syntax.text);
  const limits = assessment.model.problem ? bandLimits(assessment.model.problem) : [];
  return {
    path,
    title: description.syntax.title?.value ?? null,
    ok: isOk(assessment),
    diagnostics: assessment.diagnostics.map(({ code, severity, message, span }) => {
      const start = lines.positionAt(span.start);
      const end = lines.positionAt(span.end);
      return { code, severity, message, line: start.line + 1, column: start.character + 1, endLine: end.line + 1, endColumn: end.character + 1 };
    }),
    goals: evaluation === null ? unjudged(assessment) : evaluation.goals.map((result) => ({ ...goalJson(result), ...(earlier !== undefined && { before: beforeJson(result, earlier) }) })),
    elements: (description.syntax.ladder ? evaluation?.elements ?? [] : []).map(elementJson),
    bands: (evaluation?.bands ?? []).map((band, at) => bandJson(band, limits[at] ?? null)),
    spread: spreadJson(assessment.spread ?? null),
  };
}

function spreadJson(spread: Spread | null): object | null {
  if (!spread) return null;
  const { builds, corner } = spread;
  return {
    yield: builds.yield, low: builds.low, high: builds.high, builds: builds.builds, seed: builds.seed,
    worstCorner: {
      values: Object.fromEntries(corner.values.map(({ name, value }) => [name, value])), margin: finite(corner.marginDb), case: corner.caseName,
      ...(corner.proved ? {} : { proved: false }),
    },
  };
}

/** An open has no impedance that could be written as two numbers: it is infinite as a whole. */
const pair = (value: Complex | null) => value && Number.isFinite(value.re) && Number.isFinite(value.im) ? [value.re, value.im] : null;
/** The goals of a description of which nothing can be computed, so that none is lost. */
function unjudged({ description: { syntax } }: Assessment): object[] {
  const lines = lineMap(syntax.text);
  const reason = 'nothing can be computed before the errors of the description are mended';
  return syntax.goals.map(({ text, span, quantity, limit, unit }) => ({
    text, line: lines.positionAt(span.start).line + 1, ok: false, quantity, value: null, limit: limit?.value ?? null, margin: null,
    unit, frequency: null, case: null, reason,
  }));
}

const finite = (value: number | null) => (value !== null && Number.isFinite(value) ? value : null);
const because = (reason: string | null) => (reason === null ? {} : { reason });

function goalJson({ goal, ok, value, margin, frequencyHz, caseName, reason }: GoalResult): object {
  return {
    text: goal.text, line: goal.line, ok, quantity: goal.quantity, value: finite(value), limit: goal.limit, margin: finite(margin),
    unit: goal.unit, frequency: finite(frequencyHz), case: caseName, ...because(reason),
  };
}

/** The goal of the earlier version that asks for the same, whatever its limit; null where there was none. */
export function goalBefore(result: GoalResult, earlier: Assessment | null): GoalResult | null {
  const same = (other: GoalResult) => other.goal.text === result.goal.text;
  const alike = (other: GoalResult) => sameQuestion(other.goal.text) === sameQuestion(result.goal.text);
  const candidates = earlier?.evaluation?.goals ?? [];
  return candidates.find(same) ?? candidates.find(alike) ?? null;
}

/** A goal's text without its limit: what is asked, of what and where. */
const sameQuestion = (text: string) => text.replace(/(>=|<=|>|<|≥|≤)\s*[-−+]?[\d.]+\s*\S*/, '').replace(/\s+/g, ' ').trim();

function beforeJson(result: GoalResult, earlier: Assessment | null): object | null {
  const before = goalBefore(result, earlier);
  return before && { ok: before.ok, value: finite(before.value), limit: before.goal.limit, margin: finite(before.margin), ...because(before.reason) };
}

function elementJson(element: ElementResult): object {
  return {
    name: element.name, orientation: element.orientation, kind: element.kind, value: finite(element.value), unit: element.unit, fitted: element.fitted,
    frequency: finite(element.frequencyHz), reactance: finite(element.reactanceOhm), susceptance: finite(element.susceptanceS),
    impedanceAfter: pair(element.impedanceAfterOhm), reflectionAfter: pair(element.reflectionAfter),
    peakVoltage: finite(element.peakVoltageV), rmsCurrent: finite(element.rmsCurrentA), dissipation: finite(element.dissipationW),
    ...because(element.reason),
  };
}

function bandJson(band: BandResult, found: BandLimit | null): object {
  return {
    name: band.name, start: band.startHz, stop: band.stopHz,
    cases: band.cases.map((result) => ({
      case: result.caseName, worstReflection: finite(result.worstReflection), worstReturnLoss: finite(result.worstReturnLossDb),
      worstVswr: finite(result.worstVswr), worstGain: finite(result.worstGainDb), at: finite(result.atHz), ...because(result.reason),
    })),
    limit: found && { reflection: found.limit.reflection, model: found.limit.model?.form ?? null, fitError: found.limit.model?.fitError ?? null, ...because(found.limit.reason) },
  };
}
