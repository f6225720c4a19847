import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample, replace } from '../descriptions';
import { page } from '../page';
import { closeAll, eventually } from '../waiting';

describe('after the window is loaded again', () => {
  after(closeAll);

  it('the panel is there again, pinned to its description, and alive', async () => {
    await eventually('the title', async () => (await page.text('.file')) === 'loop.match.yaml');
    assert.equal(await page.text('header .file-line > :last-child'), 'Unpin');
    assert.equal(vscode.window.activeTextEditor?.document.fileName.endsWith('frost.match.yaml'), true);
    const before = await page.text('.verdict h2');
    const editor = await openSample('crate-reader/loop.match.yaml');
    await replace(editor, 'return loss >= 15 dB', 'return loss >= 75 dB');
    await eventually('another verdict', async () => (await page.text('.verdict h2')) !== before);
  });
});
