import * as vscode from 'vscode';
import type { Diagnostic, Severity } from '../base/diagnostic';
import type { Assessment } from '../assistance/assess';
import type { DocumentStudies } from './documentStudies';
import { rangeOf } from './ranges';
import type { DocumentSpreads } from './spreads';

const SEVERITIES: Readonly<Record<Severity, vscode.DiagnosticSeverity>> = {
  error: vscode.DiagnosticSeverity.Error,
  warning: vscode.DiagnosticSeverity.Warning,
  info: vscode.DiagnosticSeverity.Information,
};

/** As the editor shows it. */
export function markOf(document: vscode.TextDocument, diagnostic: Diagnostic): vscode.Diagnostic {
  const result = new vscode.Diagnostic(rangeOf(document, diagnostic.span), diagnostic.message, SEVERITIES[diagnostic.severity]);
  result.source = 'Ohmward';
  result.code = diagnostic.code;
  return result;
}

/** Shows what is wrong with each open description. */
export function publishDiagnostics(studies: DocumentStudies, spreads: DocumentSpreads): vscode.Disposable {
  const collection = vscode.languages.createDiagnosticCollection('ohmward');
  const publish = (document: vscode.TextDocument, { diagnostics }: Assessment) => collection.set(document.uri, diagnostics.map((diagnostic) => markOf(document, diagnostic)));
  return vscode.Disposable.from(
    collection,
    studies.onDidFinish(({ document, assessment }) => publish(document, assessment)),
    // What is said of the yield comes later, and not before all builds have been made.
    spreads.onDidChange((document) => {
      const study = spreads.latest(document)?.study;
      if (study?.version === document.version) publish(document, spreads.complete(study).assessment);
    }),
    studies.onDidClose((document) => collection.delete(document.uri)),
  );
}
