import * as vscode from 'vscode';
import { registerCommands } from './commands';
import { publishDiagnostics } from './diagnostics';
import { createDocumentCoverages } from './coverages';
import { createDocumentStudies } from './documentStudies';
import { createFileStore } from './fileStore';
import { createFirmwareTables } from './firmwareTables';
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
import { createReports } from './reports';
import { registerSamples } from './samples';
import { createDocumentSpreads } from './spreads';
import { createDocumentSolver } from './solver';
import { createStatusItem } from './statusItem';
import { createTuner } from './tuner';
import { registerTasks } from './tasks';

/** Starts the extension; the same in both extension hosts, with Node and without. */
export function start(context: vscode.ExtensionContext): void {
  const log = createLog();
  const store = createFileStore(log);
  const tuner = createTuner(context.extensionUri, log);
  const studies = createDocumentStudies(store, tuner, log);
  const edits = createValueEdits(studies, log);
  const highlight = createElementHighlight();
  const solver = createDocumentSolver(context.extensionUri, studies, log);
  const spreads = createDocumentSpreads(context.extensionUri, studies, log);
  const coverages = createDocumentCoverages(studies, tuner, log);
  const firmware = createFirmwareTables(studies, store, log);
  const reports = createReports(studies, { solver, spreads, tuner, firmware });
  const panels = createPanelHost(context, { extensionUri: context.extensionUri, studies, solver, spreads, coverages, firmware, reports, edits, highlight, log });
  const assistance: Assistance = { studies, spreads, log };
  const register = [
    registerHover, registerInlayHints, registerLinks, registerOutline, registerNames, registerCompletion, registerFixes, registerFormatting,
  ];
  context.subscriptions.push(
    log, store, tuner, studies, solver, spreads, coverages, firmware, highlight, panels,
    publishDiagnostics(studies, spreads),
    createStatusItem(studies, spreads),
    registerCommands({ extensionUri: context.extensionUri, studies, solver, firmware, reports, panels, edits, log }),
    registerLenses(assistance, solver),
    registerSolutions(assistance, solver),
    registerTasks(context.extensionUri),
    registerSamples(context.extensionUri, log),
    ...register.map((feature) => feature(assistance)),
  );
}
