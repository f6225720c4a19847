import * as vscode from 'vscode';
import { workerThreads } from '../platform/nodeModules';

/** The task type, as in package.json. */
const TASK_TYPE = 'ohmward';
const COMMANDS: readonly unknown[] = ['check', 'codes', 'tidy'];
const MATCHERS = ['$ohmward', '$ohmward-files'];

/** What stands in `tasks.json`. */
interface Definition extends vscode.TaskDefinition {
  readonly command: string;
  readonly files?: readonly string[];
  readonly arguments?: readonly string[];
}

interface Offer {
  readonly name: string;
  readonly detail: string;
  readonly definition: Definition;
}

const OFFERS: readonly Offer[] = [
  {
    name: 'check every description', detail: 'Fails where a goal is missed or a description has errors',
    definition: { type: TASK_TYPE, command: 'check' },
  },
  {
    name: "verify the firmware's tables", detail: 'Fails where a written table no longer agrees with its description',
    definition: { type: TASK_TYPE, command: 'codes', arguments: ['--verify'] },
  },
];

const areStrings = (value: unknown): boolean => value === undefined || (Array.isArray(value) && value.every((each) => typeof each === 'string'));

const isDefinition = (definition: vscode.TaskDefinition): definition is Definition =>
  COMMANDS.includes(definition.command) && areStrings(definition.files) && areStrings(definition.arguments);

/** The command line is a program for Node that reads a disk. */
const isPossible = (folder: vscode.WorkspaceFolder): boolean => vscode.workspace.isTrusted && folder.uri.scheme === 'file';

/** Runs the bundled command line with the very program that this host runs on. */
function execution(extensionUri: vscode.Uri, definition: Definition, folder: vscode.WorkspaceFolder): vscode.ProcessExecution {
  const program = vscode.Uri.joinPath(extensionUri, 'dist', 'ohmward.cjs').fsPath;
  const files = definition.files?.length ? definition.files : ['.'];
  const words = [definition.command, ...(definition.arguments ?? []), '--', ...files];
  return new vscode.ProcessExecution(process.execPath, [program, ...words], { cwd: folder.uri.fsPath, env: { ELECTRON_RUN_AS_NODE: '1' } });
}

/** What the name of a description ends in; one is enough to offer the tasks. */
async function hasDescription(folder: vscode.WorkspaceFolder, token: vscode.CancellationToken): Promise<boolean> {
  const found = await vscode.workspace.findFiles(new vscode.RelativePattern(folder, '**/*.match.{yaml,yml}'), '**/node_modules/**', 1, token);
  return found.length > 0;
}

/**
 * Tasks that run the command line: two that are offered for each folder with a description, and those of `tasks.json`. None where
 * the host has no Node, where a folder is not on a disk, or where the workspace is not trusted.
 */
export function registerTasks(extensionUri: vscode.Uri): vscode.Disposable {
  if (workerThreads() === null) return vscode.Disposable.from();

  const taskOf = (definition: Definition, folder: vscode.WorkspaceFolder, scope: vscode.Task['scope'], name: string): vscode.Task =>
    new vscode.Task(definition, scope ?? folder, name, TASK_TYPE, execution(extensionUri, definition, folder), MATCHERS);

  return vscode.tasks.registerTaskProvider(TASK_TYPE, {
    async provideTasks(token) {
      const folders = (vscode.workspace.workspaceFolders ?? []).filter(isPossible);
      const described = await Promise.all(folders.map(async (folder) => ((await hasDescription(folder, token)) ? [folder] : [])));
      return described.flat().flatMap((folder) => OFFERS.map(({ name, detail, definition }) => {
        const task = taskOf(definition, folder, folder, name);
        task.detail = detail;
        task.group = vscode.TaskGroup.Test;
        return task;
      }));
    },
    resolveTask({ definition, scope, name }) {
      const folder = typeof scope === 'object' ? scope : vscode.workspace.workspaceFolders?.[0];
      if (!folder || !isPossible(folder) || !isDefinition(definition)) return undefined;
      return taskOf(definition, folder, scope, name);
    },
  });
}
