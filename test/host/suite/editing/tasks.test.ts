import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { sampleUri } from '../descriptions';
import { closeAll, eventually } from '../waiting';

const write = (name: string, text: string) => vscode.workspace.fs.writeFile(sampleUri(name), new TextEncoder().encode(text));

const fetchTasks = () => vscode.tasks.fetchTasks({ type: 'ohmward' });

/** Runs a task to its end; gives the exit code. */
async function run(task: vscode.Task): Promise<number | undefined> {
  let ended: { readonly code: number | undefined } | null = null;
  const listening = vscode.tasks.onDidEndTaskProcess(({ execution, exitCode }) => {
    if (execution.task.name === task.name) ended = { code: exitCode };
  });
  try {
    await vscode.tasks.executeTask(task);
    return (await eventually(`the end of the task «${task.name}»`, () => ended, 40_000)).code;
  } finally {
    listening.dispose();
  }
}

const taskNamed = async (name: string): Promise<vscode.Task> => {
  const found = (await fetchTasks()).find((task) => task.name === name);
  assert.ok(found, `there is no task «${name}»`);
  return found;
};

describe('each task', () => {
  afterEach(async () => {
    await closeAll();
    for (const name of ['.vscode', 'tasks']) await vscode.workspace.fs.delete(sampleUri(name), { recursive: true }).then(undefined, () => undefined);
  });

  it('is offered for the folder', async () => {
    const tasks = await fetchTasks();
    assert.deepEqual(tasks.map(({ name, source }) => [name, source]), [['check every description', 'ohmward'], ["verify the firmware's tables", 'ohmward']]);
    assert.deepEqual(tasks.map(({ definition }) => definition.command), ['check', 'codes']);
    for (const { scope } of tasks) assert.equal((scope as vscode.WorkspaceFolder).uri.fsPath, vscode.workspace.workspaceFolders?.[0].uri.fsPath);
  });

  it('fails where a description has a mistake, which then stands among the problems', async () => {
    await write('tasks/pump.match.yaml', 'ohmward: 1\nload: 18 - j37 Ω\nladder:\n  - series L1: 3.9 nH\ngaols:\n  - parts <= 3\n');
    assert.equal(await run(await taskNamed('check every description')), 1);
    const marks = () => vscode.languages.getDiagnostics(sampleUri('tasks/pump.match.yaml'));
    const mark = await eventually('the mistake', () => marks().find(({ code }) => (typeof code === 'object' ? code.value : code) === 'unknown-key'));
    assert.equal(mark.severity, vscode.DiagnosticSeverity.Error);
    assert.deepEqual([mark.range.start.line, mark.range.start.character], [4, 0]);
  });

  it('of tasks.json is run as it is written there', async () => {
    const tasks = [
      { label: 'gate tables', type: 'ohmward', command: 'codes', arguments: ['--verify'], files: ['gate-reader'] },
      { label: 'no such command', type: 'ohmward', command: 'dig' },
    ];
    await write('.vscode/tasks.json', JSON.stringify({ version: '2.0.0', tasks }));
    const task = await eventually('the task', async () => (await fetchTasks()).find(({ name }) => name === 'gate tables'));
    assert.equal(await run(task), 0);
    assert.equal((await fetchTasks()).some(({ name, execution }) => name === 'no such command' && execution !== undefined), false);
  });
});
