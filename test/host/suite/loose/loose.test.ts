import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample, sampleUri } from '../descriptions';
import { closeAll, errors, eventually, marksThat } from '../waiting';

describe('a single file without a folder', () => {
  afterEach(closeAll);

  before(() => assert.equal(vscode.workspace.workspaceFolders, undefined));

  it('finds the files beside it', async () => {
    const { document } = await openSample('orchard/frost.match.yaml');
    const links = await eventually('links', async () => {
      const found = await vscode.commands.executeCommand<vscode.DocumentLink[]>('vscode.executeLinkProvider', document.uri);
      return found.length > 0 ? found : null;
    });
    assert.equal(links[0].target?.toString(), sampleUri('orchard/frost-free-air.s1p').toString());
    assert.deepEqual(errors(document), []);
  });

  it('learns of their changes', async () => {
    const { document } = await openSample('orchard/frost.match.yaml');
    const file = sampleUri('orchard/frost-wet-bark.s1p');
    const content = await vscode.workspace.fs.readFile(file);
    await vscode.workspace.fs.writeFile(file, new TextEncoder().encode('# MHz S RI R 50\nnothing\n'));
    await marksThat(document, 'a file that cannot be read', () => errors(document).length > 0);
    await vscode.workspace.fs.writeFile(file, content);
    await marksThat(document, 'none', () => errors(document).length === 0);
  });

  it('is studied before it was ever saved', async () => {
    const content = 'ohmward: 1\nbands:\n  up: 863 .. 870 MHz\nload: 18 - j37 Ω\nladder:\n  - series L1: 6.8 nH\ngoals:\n  - return loss >= 60 dB\n';
    const document = await vscode.workspace.openTextDocument({ language: 'ohmward', content });
    await vscode.window.showTextDocument(document);
    await marksThat(document, 'a missed goal', (all) => all.some(({ code }) => code === 'goal-missed'));
    assert.deepEqual(errors(document), []);
    const editor = await vscode.window.showTextDocument(document);
    await editor.edit((edit) => edit.replace(document.lineAt(3).range, 'load: antenna.s1p'));
    await marksThat(document, 'a path without a folder', () => errors(document).some(({ message }) => /[Ss]ave/.test(message)));
  });
});
