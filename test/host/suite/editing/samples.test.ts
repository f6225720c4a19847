import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { sampleUri } from '../descriptions';
import { closeAll, errors, eventually } from '../waiting';

const here = sampleUri('own');
const copied = (name: string) => vscode.Uri.joinPath(here, 'ohmward-samples', ...name.split('/'));
const text = async (uri: vscode.Uri) => new TextDecoder().decode(await vscode.workspace.fs.readFile(uri));

describe('a copy of the samples', () => {
  afterEach(async () => {
    await closeAll();
    await vscode.workspace.fs.delete(here, { recursive: true });
  });

  it('is made in the folder that is picked, and its first description opened', async () => {
    await vscode.commands.executeCommand('ohmward.openSamples', here);
    const document = vscode.window.activeTextEditor?.document;
    assert.equal(document?.uri.toString(), copied('orchard/frost.match.yaml').toString());
    await eventually('links, so it was studied', async () => (await vscode.commands.executeCommand<unknown[]>('vscode.executeLinkProvider', document.uri)).length === 2);
    assert.deepEqual(errors(document).map(({ message }) => message), []);
    assert.match(await text(copied('gate-reader/firmware/gate_codes.h')), /GATE_CODES_COUNT/);
  });

  it('leaves what is there already, and brings what is missing', async () => {
    await vscode.workspace.fs.writeFile(copied('orchard/frost.match.yaml'), new TextEncoder().encode('ohmward: 1\ntitle: mine\n'));
    await vscode.commands.executeCommand('ohmward.openSamples', here);
    assert.equal(vscode.window.activeTextEditor?.document.getText(), 'ohmward: 1\ntitle: mine\n');
    assert.match(await text(copied('orchard/frost-free-air.s1p')), /^[!#]/);
  });
});
