import { goalDetail, goalMarginText, goalPlace, goalTitle, goalValueText } from '../assistance/goalText';
import { lineMap } from '../base/lineMap';
import type { GoalResult } from '../study/goal';
import type { CheckedFile } from './checkJson';

interface TestCase {
  readonly name: string;
  /** Null where it passes. */
  readonly problem: { readonly element: 'failure' | 'error'; readonly message: string; readonly text: string } | null;
}

/**
 * The result of `check` as JUnit XML, in the form that the common build servers read (there is no standard of it): a suite a
 * description, a test case a goal, and one for the description itself.
 */
export function checkJunit(files: readonly CheckedFile[]): string {
  const suites = files.map((file) => ({ path: file.path, cases: casesOf(file) }));
  const count = (element: 'failure' | 'error', cases: readonly TestCase[]): number => cases.filter(({ problem }) => problem?.element === element).length;
  const counts = (cases: readonly TestCase[]): string => `tests="${cases.length}" failures="${count('failure', cases)}" errors="${count('error', cases)}"`;
  const body = suites.map(({ path, cases }) =>
    [`  <testsuite name="${escaped(path)}" ${counts(cases)}>`, ...cases.map((each) => caseXml(path, each)), '  </testsuite>'].join('\n'));
  return [`<?xml version="1.0" encoding="UTF-8"?>`, `<testsuites name="ohmward check" ${counts(suites.flatMap(({ cases }) => cases))}>`, ...body, '</testsuites>', ''].join('\n');
}

function casesOf({ assessment: { description, diagnostics, evaluation } }: CheckedFile): TestCase[] {
  const lines = lineMap(description.syntax.text);
  const faults = diagnostics.filter(({ severity, code }) => severity === 'error' || code === 'unsolved')
    .map(({ message, span }) => `line ${lines.positionAt(span.start).line + 1}: ${message}`);
  const whole: TestCase = { name: 'the description', problem: faults.length === 0 ? null : { element: 'error', message: faults[0], text: faults.join('\n') } };
  return [whole, ...(evaluation?.goals ?? []).map(goalCase)];
}

function goalCase(result: GoalResult): TestCase {
  const place = goalPlace(result.goal);
  const message = [goalValueText(result), goalMarginText(result)].filter((text) => text !== '').join(', ');
  return {
    name: `${goalTitle(result.goal)}${place && `, ${place}`}`,
    problem: result.ok ? null : { element: 'failure', message, text: [`line ${result.goal.line}: ${result.goal.text}`, message, goalDetail(result)].filter((text) => text !== '').join('\n') },
  };
}

function caseXml(path: string, { name, problem }: TestCase): string {
  const open = `    <testcase classname="${escaped(path)}" name="${escaped(name)}"`;
  if (!problem) return `${open}/>`;
  return `${open}>\n      <${problem.element} message="${escaped(problem.message)}">${escaped(problem.text)}</${problem.element}>\n    </testcase>`;
}

/** Characters that XML 1.0 has no place for become U+FFFD. */
function escaped(text: string): string {
  return text.replace(/[^\t\n\r\u0020-\uD7FF\uE000-\uFFFD\u{10000}-\u{10FFFF}]/gu, '\uFFFD')
    .replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');
}
