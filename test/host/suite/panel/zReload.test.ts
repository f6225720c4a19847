import * as vscode from 'vscode';
import { openSample } from '../descriptions';
import { page } from '../page';
import { eventually } from '../waiting';

// The last file of this suite: what it leaves open is what the window's next load finds.
describe('before the window is loaded again', () => {
  it('leaves a pinned panel whose description no editor shows', async () => {
    await openSample('crate-reader/loop.match.yaml');
    await vscode.commands.executeCommand('ohmward.openPanel');
    await eventually('the title', async () => (await page.text('.file')) === 'loop.match.yaml');
    await page.click('header .file-line > :last-child');
    await eventually('pinned', async () => (await page.text('header .file-line > :last-child')) === 'Unpin');
    await openSample('orchard/frost.match.yaml');
  });
});
