import type { Assessment } from '../assistance/assess';
import { lineMap } from '../base/lineMap';
import type { Surroundings } from './runCommandLine';

/** Mistakes and warnings as `file:line:column: severity: message`, on standard error. Missed goals have a place of their own. */
export function writeDiagnostics(shown: string, assessment: Pick<Assessment, 'description' | 'diagnostics'>, around: Surroundings): void {
  const lines = lineMap(assessment.description.syntax.text);
  for (const { code, severity, message, span } of assessment.diagnostics) {
    if (code === 'goal-missed' || code === 'goal-not-known') continue;
    const { line, character } = lines.positionAt(span.start);
    around.error(`${shown}:${line + 1}:${character + 1}: ${severity}: ${message} (${code})\n`);
  }
}
