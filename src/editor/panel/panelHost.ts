import * as vscode from 'vscode';
import { LANGUAGE_ID, isDescription } from '../ranges';
import { createPanelSession, type PanelServices, type PanelSession, type PanelState } from './panelSession';

const VIEW_TYPE = 'ohmward.panel';
const STATE_KEY = 'panels';
const MAX_SAVED = 8;

/** The panels of this window: one that follows the active description, and any that are pinned to one. */
export interface PanelHost extends vscode.Disposable {
  /** Shows the panel that follows, beside the editor, with this description. */
  open(document: vscode.TextDocument | null): void;
  /** Pins or lets go the panel that is in front of the person, else the one that shows the active description. */
  setPinned(pinned: boolean): void;
}

interface SavedPanels {
  readonly panels: readonly PanelState[];
}

function savedState(value: unknown): PanelState {
  const { document, pinned, markerHz } = (typeof value === 'object' && value !== null ? value : {}) as Partial<Record<keyof PanelState, unknown>>;
  return {
    document: typeof document === 'string' ? document : null,
    pinned: pinned === true,
    markerHz: typeof markerHz === 'number' && markerHz > 0 && Number.isFinite(markerHz) ? markerHz : null,
  };
}

/** The saved description at an address, opened without showing it; null where there is none. */
async function documentAt(address: string | null): Promise<vscode.TextDocument | null> {
  if (address === null) return null;
  try {
    const uri = vscode.Uri.parse(address, true);
    if (uri.scheme === 'untitled') return null; // it would be created anew, empty
    const document = await vscode.workspace.openTextDocument(uri);
    return isDescription(document) ? document : null;
  } catch {
    return null; // the file is gone since the window was closed: the panel follows the editor again
  }
}

export function createPanelHost(context: vscode.ExtensionContext, services: PanelServices): PanelHost {
  const sessions = new Set<PanelSession>();
  let lastActive: vscode.TextDocument | null = null;
  let openedByItself = false;

  // The editor brings panels back one by one, and those in the background only when they are looked at.
  const saved = (context.workspaceState.get<SavedPanels>(STATE_KEY)?.panels ?? []).map(savedState);
  const save = () => void context.workspaceState.update(STATE_KEY, { panels: [...[...sessions].map(({ state }) => ({ ...state })), ...saved].slice(0, MAX_SAVED) } satisfies SavedPanels);
  const following = () => [...sessions].find(({ state }) => !state.pinned);
  const tellPinned = () => {
    const front = [...sessions].find(({ panel }) => panel.active);
    void vscode.commands.executeCommand('setContext', 'ohmward.panelPinned', front?.state.pinned === true);
  };

  const adopt = (panel: vscode.WebviewPanel, state: PanelState): PanelSession => {
    const session = createPanelSession(panel, services, state);
    sessions.add(session);
    session.onDidChangeState(() => {
      save();
      tellPinned();
      if (!session.state.pinned && lastActive !== null) session.show(lastActive);
    });
    panel.onDidChangeViewState(tellPinned);
    panel.onDidDispose(() => {
      sessions.delete(session);
      save();
    });
    save();
    return session;
  };

  const open = (document: vscode.TextDocument | null) => {
    const present = following();
    if (present) {
      present.show(document ?? lastActive);
      present.panel.reveal(undefined, true);
      return;
    }
    const panel = vscode.window.createWebviewPanel(VIEW_TYPE, 'Ohmward', { viewColumn: vscode.ViewColumn.Beside, preserveFocus: true }, { enableFindWidget: true });
    adopt(panel, { document: null, pinned: false, markerHz: null }).show(document ?? lastActive);
  };

  const follow = (editor: vscode.TextEditor | undefined) => {
    if (!isDescription(editor?.document)) return;
    const { document } = editor;
    lastActive = document;
    following()?.show(document);
    const byItself = vscode.workspace.getConfiguration('ohmward', document).get('panel.openByItself', false);
    if (byItself && !openedByItself && sessions.size === 0) open(document);
    if (byItself) openedByItself = true; // closed by hand, it stays closed in this window
    tellCursor(editor);
  };
  const tellCursor = (editor: vscode.TextEditor) => {
    const offset = editor.document.offsetAt(editor.selection.active);
    for (const session of sessions) session.cursorAt(editor.document, offset);
  };

  const subscriptions = vscode.Disposable.from(
    vscode.window.onDidChangeActiveTextEditor(follow),
    vscode.window.onDidChangeTextEditorSelection(({ textEditor }) => {
      if (textEditor.document.languageId === LANGUAGE_ID) tellCursor(textEditor);
    }),
    services.studies.onDidFinish(({ document }) => {
      const editor = vscode.window.activeTextEditor;
      if (editor?.document === document) tellCursor(editor);
    }),
    services.studies.onDidClose((document) => {
      if (lastActive === document) lastActive = null;
      // The picture stays while the file does: the editor closes a document when its preview tab is used for another file.
      for (const session of sessions) {
        if (session.state.document === document.uri.toString()) void documentAt(session.state.document).then((again) => session.show(again));
      }
    }),
    vscode.window.registerWebviewPanelSerializer(VIEW_TYPE, {
      async deserializeWebviewPanel(panel, pageState: unknown) {
        const { document } = savedState(pageState);
        const index = Math.max(0, saved.findIndex((state) => state.document === document));
        const session = adopt(panel, saved.splice(index, 1)[0] ?? { document: null, pinned: false, markerHz: null });
        session.show((await documentAt(session.state.document)) ?? lastActive);
      },
    }),
  );
  follow(vscode.window.activeTextEditor);

  return {
    open,
    setPinned(pinned) {
      const front = [...sessions].find(({ panel }) => panel.active) ?? [...sessions].find(({ state }) => state.document === lastActive?.uri.toString());
      front?.setPinned(pinned);
    },
    dispose: () => subscriptions.dispose(),
  };
}
