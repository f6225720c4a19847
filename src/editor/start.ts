import * as vscode from 'vscode';
import { registerCommands } from './commands';
import { publishDiagnostics } from './diagnostics';
import { createDocumentStudies } from './documentStudies';
import { createFileStore } from './fileStore';
import type { Assistance } from './guarded';
import { createLog } from './log';
import { createElementHighlight } from './panel/elementHighlight';
import { createPanelHost } from './panel/panelHost';
import { createValueEdits } from './panel/valueEdits';
import { registerCompletion } from './providers/completion';
import { registerFixes } from './providers/fixes';
import { registerFormatting } from './providers/formatting';
import { registerHover } from './providers/hover';
import { registerInlayHints } from './providers/inlayHints';
import { registerLinks } from './providers/links';
import { registerNames } from './providers/names';
import { registerOutline } from './providers/outline';
import { registerLenses } from './providers/lenses';
import { registerSolutions } from './providers/solutions';
import { registerSamples } from './samples';
import { createDocumentSpreads } from './spreads';
import { createDocumentSolver } from './solver';
import { createStatusItem } from './statusItem';
import { registerTasks } from './tasks';

/** Starts the extension; the same in both extension hosts, with Node and without. */
export function start(context: vscode.ExtensionContext): void {
  const log = createLog();
  const store = createFileStore(log);
  const studies = createDocumentStudies(store, log);
  const edits = createValueEdits(studies, log);
  const highlight = createElementHighlight();
  const solver = createDocumentSolver(context.extensionUri, studies, log);
  const spreads = createDocumentSpreads(context.extensionUri, studies, log);
  const panels = createPanelHost(context, { extensionUri: context.extensionUri, studies, solver, spreads, edits, highlight, log });
  const assistance: Assistance = { studies, spreads, log };
  const register = [
    registerHover, registerInlayHints, registerLinks, registerOutline, registerNames, registerCompletion, registerFixes, registerFormatting,
  ];
  context.subscriptions.push(
    log, store, studies, solver, spreads, highlight, panels,
    publishDiagnostics(studies, spreads),
    createStatusItem(studies, spreads),
    registerCommands({ extensionUri: context.extensionUri, studies, solver, panels, edits, log }),
    registerLenses(assistance, solver),
    registerSolutions(assistance, solver),
    registerTasks(context.extensionUri),
    registerSamples(context.extensionUri, log),
    ...register.map((feature) => feature(assistance)),
  );
}
