import * as vscode from 'vscode';
import { page } from '../page';
import { closeAll, errors, eventually, marksThat } from '../waiting';
import { memoryFiles } from './memoryFiles';

/** Invented: a resistance at every frequency. */
const resistor = (ohm: number) => `# MHz Z RI R 1\n${[800, 850, 900, 950].map((frequency) => `${frequency} ${ohm} 0`).join('\n')}\n`;

const DESCRIPTION = [
  'ohmward: 1', 'title: Port in a browser, invented', 'bands:', '  up: 863 .. 870 MHz', 'load: probe.s1p', 'let:', '  r: 0.5 Ω', 'ladder:', '  - series R1: = r * 2',
  'goals:', '  - return loss >= 20 dB in up', '',
].join('\n');

describe('the extension in a browser, on a virtual file system', () => {
  const files = memoryFiles(new Map([['/boards/port.match.yaml', DESCRIPTION], ['/boards/probe.s1p', resistor(49)]]));
  const uri = vscode.Uri.parse('memory:/boards/port.match.yaml');
  let registration: vscode.Disposable;

  before(() => {
    registration = vscode.workspace.registerFileSystemProvider('memory', files, { isCaseSensitive: true });
  });
  after(async () => {
    await closeAll();
    registration.dispose();
  });

  it('runs where there is no Node', () => {
    if (vscode.env.uiKind !== vscode.UIKind.Web || typeof process !== 'undefined' && process.versions?.node) throw new Error('this is not the web worker host');
  });

  it('reads, evaluates and judges, and follows a changed file', async () => {
    const document = await vscode.workspace.openTextDocument(uri);
    await vscode.window.showTextDocument(document);
    await eventually('the extension', () => vscode.extensions.getExtension('ohmward.ohmward')?.isActive);
    files.write('/boards/probe.s1p', resistor(300));
    await marksThat(document, 'a missed goal', (all) => all.some(({ code }) => code === 'goal-missed'));
    if (errors(document).length > 0) throw new Error(errors(document).map(({ message }) => message).join('\n'));
    files.write('/boards/probe.s1p', resistor(49));
    await marksThat(document, 'none', (all) => all.length === 0);
  });

  it('solves, in a worker of the browser', async () => {
    const solving = DESCRIPTION.replace('  - series R1: = r * 2', '  - series L1: solve from E24\n  - shunt C1: solve from E24').replace('title: Port', 'title: Open port');
    files.write('/boards/open.match.yaml', solving);
    const document = await vscode.workspace.openTextDocument(vscode.Uri.parse('memory:/boards/open.match.yaml'));
    await vscode.window.showTextDocument(document);
    await eventually('a solution', async () => {
      const lenses = await vscode.commands.executeCommand<vscode.CodeLens[]>('vscode.executeCodeLensProvider', document.uri, 20);
      return lenses.some(({ command }) => command?.title.startsWith('Insert solved values'));
    });
    await vscode.commands.executeCommand('ohmward.insertSolution');
    await eventually('the values in the text', () => !document.getText().includes('solve from'));
    await vscode.window.showTextDocument(await vscode.workspace.openTextDocument(uri));
  });

  it('shows the panel', async () => {
    await vscode.commands.executeCommand('ohmward.openPanel');
    await eventually('the title in the panel', async () => (await page.text('body'))?.includes('Port in a browser, invented'));
    await page.picture('web-build');
  });
});
