import * as vscode from 'vscode';
import type { Diagnostic, Severity } from '../base/diagnostic';
import type { DocumentStudies } from './documentStudies';
import { rangeOf } from './ranges';

const SEVERITIES: Readonly<Record<Severity, vscode.DiagnosticSeverity>> = {
  error: vscode.DiagnosticSeverity.Error,
  warning: vscode.DiagnosticSeverity.Warning,
  info: vscode.DiagnosticSeverity.Information,
};

function shown(document: vscode.TextDocument, diagnostic: Diagnostic): vscode.Diagnostic {
  const result = new vscode.Diagnostic(rangeOf(document, diagnostic.span), diagnostic.message, SEVERITIES[diagnostic.severity]);
  result.source = 'Ohmward';
  result.code = diagnostic.code;
  return result;
}

/** Shows what is wrong with each open description. */
export function publishDiagnostics(studies: DocumentStudies): vscode.Disposable {
  const collection = vscode.languages.createDiagnosticCollection('ohmward');
  return vscode.Disposable.from(
    collection,
    studies.onDidFinish(({ document, assessment }) => collection.set(document.uri, assessment.diagnostics.map((diagnostic) => shown(document, diagnostic)))),
    studies.onDidClose((document) => collection.delete(document.uri)),
  );
}
