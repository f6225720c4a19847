import * as vscode from 'vscode';
import { completionsAt } from '../../assistance/completion';
import { filesNearby } from '../filesNearby';
import { guarded, type Assistance } from '../guarded';
import { DESCRIPTIONS, rangeOf } from '../ranges';

export function registerCompletion(assistance: Assistance): vscode.Disposable {
  return vscode.languages.registerCompletionItemProvider(
    DESCRIPTIONS,
    {
      async provideCompletionItems(document, position, token) {
        const paths = await filesNearby(document);
        return guarded(assistance, 'completion', document, token, ({ assessment }) =>
          completionsAt(assessment, document.offsetAt(position), paths).map((found, i) => {
            const item = new vscode.CompletionItem(found.label);
            item.detail = found.detail;
            item.documentation = new vscode.MarkdownString(found.documentation);
            item.insertText = found.snippet ? new vscode.SnippetString(found.insertText) : found.insertText;
            item.range = rangeOf(document, found.span);
            item.filterText = document.getText(item.range) === '' ? found.label : undefined;
            item.sortText = String(i).padStart(5, '0');
            return item;
          }),
        );
      },
    },
    ' ', ':', '-',
  );
}
