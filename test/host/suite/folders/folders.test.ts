import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample, sampleUri } from '../descriptions';
import { closeAll, errors, eventually } from '../waiting';

describe('several folders', () => {
  afterEach(closeAll);

  before(() => assert.equal(vscode.workspace.workspaceFolders?.length, 2));

  for (const sample of ['orchard/frost.match.yaml', 'fixtures/board.match.yaml']) {
    it(`finds the files of ${sample}`, async () => {
      const { document } = await openSample(sample);
      const links = await eventually('links', async () => {
        const found = await vscode.commands.executeCommand<vscode.DocumentLink[]>('vscode.executeLinkProvider', document.uri);
        return found.length > 0 ? found : null;
      });
      assert.ok(links.every(({ target }) => target?.toString().startsWith(vscode.Uri.joinPath(sampleUri(sample), '..').toString())));
      assert.deepEqual(errors(document), []);
    });
  }
});
