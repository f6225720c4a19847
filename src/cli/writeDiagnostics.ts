import type { Assessment } from '../assistance/assess';
import { lineMap } from '../base/lineMap';
import type { Surroundings } from './runCommandLine';

/**
 * Mistakes and warnings as `file:line:column: severity: message`, on standard error. Missed goals are left out unless they are asked
 * for: then they are errors, since it is for them that the call fails.
 */
export function writeDiagnostics(shown: string, assessment: Pick<Assessment, 'description' | 'diagnostics'>, around: Surroundings, { goals }: { readonly goals: boolean } = { goals: false }): void {
  const lines = lineMap(assessment.description.syntax.text);
  for (const { code, severity, message, span } of assessment.diagnostics) {
    const ofGoal = code === 'goal-missed' || code === 'goal-not-known';
    if (ofGoal && !goals) continue;
    const { line, character } = lines.positionAt(span.start);
    around.error(`${shown}:${line + 1}:${character + 1}: ${ofGoal ? 'error' : severity}: ${message} (${code})\n`);
  }
}
