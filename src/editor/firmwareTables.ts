import * as vscode from 'vscode';
import type { FirmwareView } from '../messages/panel';
import { firmwareDiagnostics, mendedByWriting, type FirmwareFile } from '../report/firmwareDiagnostics';
import { firmwareState } from '../report/firmwareState';
import { firmwareOf } from '../report/firmwareTexts';
import { markOf } from './diagnostics';
import type { DocumentStudies, Study } from './documentStudies';
import { fileScope, resolveFile } from './fileAccess';
import type { FileStore } from './fileStore';
import type { Log } from './log';
import { DESCRIPTIONS } from './ranges';
import { writeWhole } from './writeWhole';

/** The firmware's tables of each open description: whether they are up to date, and how they become so. */
export interface FirmwareTables extends vscode.Disposable {
  /** How they stand, for the version that was last looked at. */
  view(document: vscode.TextDocument): readonly FirmwareView[];
  /** Writes those that are missing or out of date, for the text as it is now. Never in a workspace that is not trusted, never over a file without the marker line. */
  write(document: vscode.TextDocument): Promise<void>;
  readonly onDidChange: vscode.Event<vscode.TextDocument>;
}

const words: Readonly<Record<FirmwareFile['state'], string>> = {
  missing: 'not written yet', foreign: 'not written by Ohmward, never overwritten', 'out of date': 'out of date', current: 'up to date', unreadable: 'not known',
};

export function createFirmwareTables(studies: DocumentStudies, store: FileStore, log: Log): FirmwareTables {
  const collection = vscode.languages.createDiagnosticCollection('ohmward firmware');
  const looked = new Map<vscode.TextDocument, { readonly version: number; readonly files: readonly FirmwareFile[] }>();
  const changed = new vscode.EventEmitter<vscode.TextDocument>();

  const look = async ({ document, text: descriptionText, assessment }: Study): Promise<readonly FirmwareFile[]> => {
    const { problem } = assessment.model;
    if (!problem || assessment.diagnostics.some(({ severity, code }) => severity === 'error' && code !== 'unsolved')) return [];
    const scope = fileScope(document);
    return Promise.all(firmwareOf(problem, descriptionText).map(async ({ path, text, reason }): Promise<FirmwareFile> => {
      const present = await store.loadText(scope, path);
      if (present.form === 'missing') return { path, text, reason, state: text === null ? 'missing' : firmwareState(text, null) };
      if (present.form === 'csv') return { path, text, reason, state: firmwareState(text ?? '', present.text) };
      return { path, text, state: 'unreadable', reason: present.form === 'refused' ? present.reason : present.form === 'unreadable' ? present.message : 'it is no text.' };
    }));
  };
  const follow = async (study: Study) => {
    const { document, version, assessment } = study;
    const files = await look(study);
    if (document.isClosed || studies.latest(document) !== study) return;
    if (files.length === 0 && !looked.has(document)) return;
    looked.set(document, { version, files });
    collection.set(document.uri, firmwareDiagnostics(assessment.description.syntax, files).map((diagnostic) => markOf(document, diagnostic)));
    changed.fire(document);
  };
  const isMended = ({ code }: vscode.Diagnostic) => typeof code === 'string' && mendedByWriting.has(code);

  const write = async (document: vscode.TextDocument) => {
    if (!vscode.workspace.isTrusted) throw new Error('this workspace is not trusted, so no firmware file is written.');
    const study = await studies.current(document);
    if (study === null) throw new Error('the text changed meanwhile, so nothing was written.');
    await store.revalidate();
    const files = await look(study);
    const unknown = files.find(({ text }) => text === null);
    if (unknown) throw new Error(`there is no table: ${unknown.reason}.`);
    const written: string[] = [];
    for (const { path, text, state, reason } of files) {
      if (state === 'foreign') throw new Error(`«${path}» was not written by Ohmward, so it is left as it is.`);
      if (state === 'unreadable') throw new Error(`«${path}»: ${reason}`);
      if (state === 'current' || text === null) continue;
      const resolved = resolveFile(fileScope(document), path);
      if ('refused' in resolved) throw new Error(resolved.refused);
      const open = vscode.workspace.textDocuments.find(({ uri }) => uri.toString() === resolved.uri.toString());
      if (open?.isDirty) throw new Error(`«${path}» is open with changes that are not saved, so it is left as it is.`);
      await writeWhole(resolved.uri, text);
      written.push(path);
    }
    await store.revalidate();
    const message = files.length === 0 ? 'This description has no table of codes to write.' : written.length === 0 ? 'The firmware’s table is up to date.' : `Written: ${written.join(', ')}`;
    vscode.window.setStatusBarMessage(message, 6_000);
  };

  const subscriptions = vscode.Disposable.from(
    collection,
    changed,
    studies.onDidFinish((study) => void follow(study).catch((error: unknown) => log.failure('the firmware’s table', error))),
    studies.onDidClose((document) => {
      looked.delete(document);
      collection.delete(document.uri);
    }),
    vscode.languages.registerCodeActionsProvider(DESCRIPTIONS, {
      provideCodeActions(document, _range, context) {
        const mended = context.diagnostics.filter(isMended);
        if (mended.length === 0 || !vscode.workspace.isTrusted) return [];
        const action = new vscode.CodeAction('Write the firmware’s table', vscode.CodeActionKind.QuickFix);
        action.command = { command: 'ohmward.writeFirmware', title: action.title, arguments: [document.uri] };
        action.diagnostics = mended;
        action.isPreferred = true;
        return [action];
      },
    }, { providedCodeActionKinds: [vscode.CodeActionKind.QuickFix] }),
  );
  return {
    view: (document) => (looked.get(document)?.files ?? []).map(({ path, state, text, reason }) => ({
      path, text: text === null ? reason : words[state], ok: state === 'current' && text !== null,
      writable: vscode.workspace.isTrusted && text !== null && (state === 'missing' || state === 'out of date'),
    })),
    write,
    onDidChange: changed.event,
    dispose: () => subscriptions.dispose(),
  };
}
