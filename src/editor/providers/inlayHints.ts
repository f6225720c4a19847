import * as vscode from 'vscode';
import { inlayHints } from '../../assistance/inlayHints';
import { guarded, type Assistance } from '../guarded';
import { DESCRIPTIONS } from '../ranges';

const isWanted = (document: vscode.TextDocument) => vscode.workspace.getConfiguration('ohmward', document).get('inlayHints.enabled', true);

/** Reactances and margins at the ends of lines; shown anew after each study, since a file may have changed under the same text. */
export function registerInlayHints(assistance: Assistance): vscode.Disposable {
  const changed = new vscode.EventEmitter<void>();
  return vscode.Disposable.from(
    changed,
    assistance.studies.onDidFinish(() => changed.fire()),
    assistance.spreads.onDidChange((document) => {
      if (assistance.spreads.latest(document)?.done) changed.fire();
    }),
    vscode.workspace.onDidChangeConfiguration((event) => {
      if (event.affectsConfiguration('ohmward.inlayHints')) changed.fire();
    }),
    vscode.languages.registerInlayHintsProvider(DESCRIPTIONS, {
      onDidChangeInlayHints: changed.event,
      provideInlayHints: (document, range, token) =>
        isWanted(document)
          ? guarded(assistance, 'inlay hints', document, token, ({ assessment }) =>
              inlayHints(assessment, { start: document.offsetAt(range.start), end: document.offsetAt(range.end) }).map((found) => {
                const hint = new vscode.InlayHint(document.positionAt(found.offset), found.label);
                hint.tooltip = found.tooltip;
                hint.paddingLeft = true;
                return hint;
              }),
            )
          : [],
    }),
  );
}
