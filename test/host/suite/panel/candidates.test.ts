import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample, replace, undo } from '../descriptions';
import { page } from '../page';
import { closeAll, eventually } from '../waiting';

const FROST = 'orchard/frost.match.yaml';

describe('candidates in the panel', () => {
  afterEach(closeAll);

  async function openUnsolved(): Promise<vscode.TextEditor> {
    const editor = await openSample(FROST);
    await vscode.commands.executeCommand('ohmward.openPanel');
    await eventually('the panel', async () => (await page.text('.freshness')) === 'up to date');
    await replace(editor, '10 nH from coils', 'solve from coils');
    await replace(editor, '18 pF from caps', 'solve from caps or none');
    await eventually('candidates', async () => (await page.count('.candidates li')) > 3);
    return editor;
  }

  it('shows the best one, says that it is not inserted, and previews others', async () => {
    await openUnsolved();
    assert.match((await page.text('.verdict h2')) ?? '', /with the best candidate all 5 hold.*not inserted/);
    await page.hover('.candidates li:nth-child(3) .values');
    await eventually('the preview', async () => (await page.count('svg.chart .preview')) === 2);
    await page.picture('panel-candidates');
    await page.picture('panel-candidates-page', 'panel');
  });

  it('inserts the one that is clicked, as one undoable step', async () => {
    const { document } = await openUnsolved();
    const before = document.getText();
    const values = (await page.text('.candidates li:nth-child(2) .values')) ?? '';
    await page.click('.candidates li:nth-child(2) vscode-button');
    await eventually('the values in the text', () => !document.getText().includes('solve'));
    for (const value of values.matchAll(/[\d.]+ [np][HF]/g)) assert.ok(document.getText().includes(value[0]), `${value[0]} is in the text`);
    await eventually('no candidates any more', async () => (await page.count('.candidates-section:not([hidden])')) === 0);
    // The panel has the focus; undo is the editor's.
    await vscode.window.showTextDocument(document, vscode.ViewColumn.One);
    await undo();
    assert.equal(document.getText(), before);
  });
});
