import * as vscode from 'vscode';
import { documentLinks } from '../../assistance/documentLinks';
import { fileScope, resolveFile } from '../fileAccess';
import { guarded, type Assistance } from '../guarded';
import { DESCRIPTIONS, rangeOf } from '../ranges';

/** Links from file names to the files, where they may be read. */
export function registerLinks(assistance: Assistance): vscode.Disposable {
  return vscode.languages.registerDocumentLinkProvider(DESCRIPTIONS, {
    provideDocumentLinks: (document, token) =>
      guarded(assistance, 'document links', document, token, ({ assessment }) => {
        const scope = fileScope(document);
        return documentLinks(assessment.description).flatMap((found) => {
          const resolved = resolveFile(scope, found.path);
          return 'uri' in resolved ? [new vscode.DocumentLink(rangeOf(document, found.span), resolved.uri)] : [];
        });
      }),
  });
}
