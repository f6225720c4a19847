import * as vscode from 'vscode';
import { foldingSpans } from '../../assistance/folding';
import { outline, type OutlineItem } from '../../assistance/outline';
import { guarded, type Assistance } from '../guarded';
import { DESCRIPTIONS, rangeOf } from '../ranges';

const KINDS: Readonly<Record<string, vscode.SymbolKind>> = {
  section: vscode.SymbolKind.Namespace,
  band: vscode.SymbolKind.Constant,
  case: vscode.SymbolKind.Event,
  load: vscode.SymbolKind.Event,
  element: vscode.SymbolKind.Object,
  goal: vscode.SymbolKind.Boolean,
  family: vscode.SymbolKind.Array,
  tunable: vscode.SymbolKind.Variable,
  let: vscode.SymbolKind.Variable,
  value: vscode.SymbolKind.Property,
};

function symbolOf(document: vscode.TextDocument, item: OutlineItem): vscode.DocumentSymbol {
  const range = rangeOf(document, item.span);
  const selection = rangeOf(document, item.selectionSpan);
  // The editor throws a symbol away whose selection leaves its range or whose name is empty.
  const symbol = new vscode.DocumentSymbol(item.name || '…', item.detail, KINDS[item.kind] ?? vscode.SymbolKind.Property, range.union(selection), selection);
  symbol.children = item.children.map((child) => symbolOf(document, child));
  return symbol;
}

export function registerOutline(assistance: Assistance): vscode.Disposable {
  return vscode.Disposable.from(
    vscode.languages.registerDocumentSymbolProvider(
      DESCRIPTIONS,
      {
        provideDocumentSymbols: (document, token) =>
          guarded(assistance, 'outline', document, token, ({ assessment }) => outline(assessment.description).map((item) => symbolOf(document, item))),
      },
      { label: 'Ohmward' },
    ),
    vscode.languages.registerFoldingRangeProvider(DESCRIPTIONS, {
      provideFoldingRanges: (document, _context, token) =>
        guarded(assistance, 'folding', document, token, ({ assessment }) =>
          foldingSpans(assessment.description).map((span) => {
            const range = rangeOf(document, span);
            return new vscode.FoldingRange(range.start.line, range.end.line);
          }),
        ),
    }),
  );
}
