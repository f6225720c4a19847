import assert from 'node:assert/strict';
import { symlink } from 'node:fs/promises';
import * as vscode from 'vscode';
import { openSample, openText, placeOf, sampleUri } from '../descriptions';
import { page } from '../page';
import { closeAll, errors, eventually, marksThat } from '../waiting';

const description = (load: string) =>
  ['ohmward: 1', 'bands:', '  up: 863 .. 870 MHz', `load: ${load}`, 'ladder:', '  - series R1: 1 Ω', ''].join('\n');

const expression = ['ohmward: 1', 'bands:', '  up: 863 .. 870 MHz', 'load: 50 Ω', 'let:', '  r: 3 Ω', 'ladder:', '  - series R1: = r * 2', ''].join('\n');

describe('a workspace that is not trusted', () => {
  afterEach(closeAll);

  before(() => assert.equal(vscode.workspace.isTrusted, false));

  it('reads what is in its folder', async () => {
    const { document } = await openSample('orchard/frost.match.yaml');
    await eventually('links, so it was studied', async () => (await vscode.commands.executeCommand<unknown[]>('vscode.executeLinkProvider', document.uri)).length === 2);
    assert.deepEqual(errors(document).map(({ message }) => message), []);
  });

  for (const path of ['../../outside.s1p', '../../samples-old/x.s1p', '/etc/hosts.s1p', '..\\\\..\\\\outside.s1p']) {
    it(`reads nothing outside of it: ${path}`, async () => {
      const { document } = await openText('fixtures/outside.match.yaml', description(path));
      await marksThat(document, 'a refusal', () => errors(document).some(({ message }) => /not trusted|trust/.test(message)));
      assert.deepEqual(await vscode.commands.executeCommand('vscode.executeLinkProvider', document.uri), []);
    });
  }

  it('follows no link out of it', async () => {
    await symlink(vscode.Uri.joinPath(sampleUri('x'), '..', '..', 'outside.s1p').fsPath, sampleUri('fixtures/inside.s1p').fsPath);
    const { document } = await openText('fixtures/linked.match.yaml', description('inside.s1p'));
    await marksThat(document, 'a refusal', () => errors(document).some(({ message }) => /not trusted|trust/.test(message)));
  });

  it('writes no firmware’s table', async () => {
    const { document } = await openText('gate-reader/gate.match.yaml', new TextDecoder().decode(await vscode.workspace.fs.readFile(sampleUri('gate-reader/gate.match.yaml'))).replace('firmware/gate_codes.h', 'firmware/other.h'));
    await marksThat(document, 'that there is none yet', (all) => all.some(({ code }) => code === 'firmware-missing'));
    const fixes = await vscode.commands.executeCommand<vscode.CodeAction[]>('vscode.executeCodeActionProvider', document.uri, placeOf(document, 'firmware/other.h'), vscode.CodeActionKind.QuickFix.value);
    assert.ok(!fixes.some(({ title }) => /table/.test(title)));
    await vscode.commands.executeCommand('ohmward.writeFirmware', document.uri);
    await assert.rejects(async () => vscode.workspace.fs.stat(sampleUri('gate-reader/firmware/other.h')));
  });

  it('evaluates no expression', async () => {
    const { document } = await openText('fixtures/expression.match.yaml', expression);
    await marksThat(document, 'a refusal', () => errors(document).some(({ message, range }) => /trust/.test(message) && range.start.line === 7));
  });

  it('does all of that as soon as it is trusted, by itself', async () => {
    const { document } = await openText('fixtures/outside.match.yaml', description('../../outside.s1p'));
    await marksThat(document, 'a refusal', () => errors(document).length > 0);
    await vscode.commands.executeCommand('workbench.trust.manage');
    await page.click('.workspace-trust-editor .monaco-button:has-text("Trust")', 'window');
    await eventually('trust', () => vscode.workspace.isTrusted);
    await vscode.window.showTextDocument(document);
    await marksThat(document, 'none', () => errors(document).length === 0);
  });
});
