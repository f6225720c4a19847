import type { Assessment } from '../assistance/assess';
import type { Diagnostic } from '../base/diagnostic';
import { lineMap, type LineMap } from '../base/lineMap';
import type { CheckedFile } from './checkJson';

/** Remarks that make a description fail although the editor only warns of them. */
const failing: ReadonlySet<string> = new Set(['goal-missed', 'goal-not-known', 'unsolved']);

/**
 * The result of `check` as SARIF 2.1.0 (OASIS Standard, Static Analysis Results Interchange Format): one run, one result a
 * remark. What makes the check fail is an `error`. Paths are relative to the working folder.
 */
export function checkSarif(files: readonly CheckedFile[], version: string): object {
  const codes = [...new Set(files.flatMap(({ assessment }) => assessment.diagnostics.map(({ code }) => code)))].sort();
  return {
    $schema: 'https://docs.oasis-open.org/sarif/sarif/v2.1.0/os/schemas/sarif-schema-2.1.0.json',
    version: '2.1.0',
    runs: [{
      tool: { driver: { name: 'Ohmward', version, rules: codes.map((id) => ({ id, shortDescription: { text: id.replaceAll('-', ' ') } })) } },
      columnKind: 'utf16CodeUnits',
      results: files.flatMap(({ path, assessment }) => resultsOf(path, assessment, codes)),
    }],
  };
}

function resultsOf(path: string, { description, diagnostics }: Assessment, codes: readonly string[]): object[] {
  const lines = lineMap(description.syntax.text);
  return diagnostics.map((diagnostic) => ({
    ruleId: diagnostic.code,
    ruleIndex: codes.indexOf(diagnostic.code),
    level: levelOf(diagnostic),
    message: { text: diagnostic.message },
    locations: [{ physicalLocation: { artifactLocation: { uri: path.split('/').map(encodeURIComponent).join('/') }, region: regionOf(diagnostic, lines) } }],
  }));
}

function levelOf({ code, severity }: Diagnostic): 'error' | 'warning' | 'note' {
  if (failing.has(code)) return 'error';
  return severity === 'info' ? 'note' : severity;
}

function regionOf({ span }: Diagnostic, lines: LineMap): object {
  const start = lines.positionAt(span.start);
  const end = lines.positionAt(span.end);
  return { startLine: start.line + 1, startColumn: start.character + 1, endLine: end.line + 1, endColumn: end.character + 1 };
}
