import * as vscode from 'vscode';
import { definitionAt, referencesAt } from '../../assistance/definition';
import { renameEdits } from '../../assistance/rename';
import { guarded, type Assistance } from '../guarded';
import { DESCRIPTIONS, rangeOf, textEditsOf } from '../ranges';

/** Go to definition, references, highlights and rename of bands, cases, families, elements and other names. */
export function registerNames(assistance: Assistance): vscode.Disposable {
  return vscode.Disposable.from(
    vscode.languages.registerDefinitionProvider(DESCRIPTIONS, {
      provideDefinition: (document, position, token) =>
        guarded(assistance, 'definition', document, token, ({ assessment }) => {
          const found = definitionAt(assessment.description, document.offsetAt(position));
          return found && new vscode.Location(document.uri, rangeOf(document, found));
        }),
    }),
    vscode.languages.registerReferenceProvider(DESCRIPTIONS, {
      provideReferences: (document, position, context, token) =>
        guarded(assistance, 'references', document, token, ({ assessment }) => {
          const offset = document.offsetAt(position);
          const definition = definitionAt(assessment.description, offset);
          return referencesAt(assessment.description, offset)
            .filter((span) => context.includeDeclaration || span.start !== definition?.start)
            .map((span) => new vscode.Location(document.uri, rangeOf(document, span)));
        }),
    }),
    vscode.languages.registerDocumentHighlightProvider(DESCRIPTIONS, {
      provideDocumentHighlights: (document, position, token) =>
        guarded(assistance, 'highlights', document, token, ({ assessment }) =>
          referencesAt(assessment.description, document.offsetAt(position)).map((span) => new vscode.DocumentHighlight(rangeOf(document, span))),
        ),
    }),
    vscode.languages.registerRenameProvider(DESCRIPTIONS, {
      async prepareRename(document, position, token) {
        const found = await guarded(assistance, 'rename', document, token, ({ assessment }) => {
          const offset = document.offsetAt(position);
          return referencesAt(assessment.description, offset).find((span) => span.start <= offset && offset <= span.end) ?? null;
        });
        if (found === null) throw new Error('There is no name here that could be changed.');
        return rangeOf(document, found);
      },
      async provideRenameEdits(document, position, newName, token) {
        const found = await guarded(assistance, 'rename', document, token, ({ assessment }) => renameEdits(assessment.description, document.offsetAt(position), newName));
        if (found === null) return null;
        if ('refusal' in found) throw new Error(found.refusal);
        const edit = new vscode.WorkspaceEdit();
        edit.set(document.uri, textEditsOf(document, found));
        return edit;
      },
    }),
  );
}
