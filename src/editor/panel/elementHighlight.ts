import * as vscode from 'vscode';
import type { Study } from '../documentStudies';
import { rangeOf } from '../ranges';

/** Makes the ladder line stand out that the page points at. */
export interface ElementHighlight extends vscode.Disposable {
  show(study: Study, elementId: string | null): void;
  clear(): void;
}

export function createElementHighlight(): ElementHighlight {
  const decoration = vscode.window.createTextEditorDecorationType({
    isWholeLine: true,
    backgroundColor: new vscode.ThemeColor('editor.rangeHighlightBackground'),
    outline: '1px solid',
    outlineColor: new vscode.ThemeColor('editorInfo.foreground'),
    overviewRulerColor: new vscode.ThemeColor('editorInfo.foreground'),
    overviewRulerLane: vscode.OverviewRulerLane.Full,
  });
  const clear = () => {
    for (const editor of vscode.window.visibleTextEditors) editor.setDecorations(decoration, []);
  };
  return {
    show({ document, version, assessment }, elementId) {
      const element = assessment.description.syntax.ladder?.elements.find((entry) => entry.name.value === elementId);
      if (!element || document.version !== version) {
        clear();
        return;
      }
      const range = rangeOf(document, element.span);
      for (const editor of vscode.window.visibleTextEditors) editor.setDecorations(decoration, editor.document === document ? [range] : []);
    },
    clear,
    dispose: () => decoration.dispose(),
  };
}
