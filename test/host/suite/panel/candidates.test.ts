import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample, openText, replace, sampleUri, undo } from '../descriptions';
import { page } from '../page';
import { closeAll, eventually } from '../waiting';

const FROST = 'orchard/frost.match.yaml';

describe('candidates in the panel', () => {
  afterEach(closeAll);
  after(() => vscode.workspace.fs.delete(sampleUri('orchard/valve.match.yaml')));

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

  it('moves the marker along the best one', async () => {
    await openUnsolved();
    const readings = () => page.text('.readings');
    const before = await readings();
    await page.focus('svg.chart');
    await page.press('ArrowRight');
    await eventually('another reading', async () => (await readings()) !== before);
    assert.match((await readings()) ?? '', /free air: Γ\s0\.[^]*wet bark: Γ\s0\./);
    assert.equal(await page.count('svg.chart .arc'), 3);
  });

  it('keeps the last picture while a large search goes on, and says how far it is', async () => {
    // Invented: a valve's radio.
    const editor = await openText('orchard/valve.match.yaml', `ohmward: 1
load: 18 - j37 Ω at 868 MHz
bands:
  main: 820 .. 920 MHz
ladder:
  - series L1: 8.2 nH from coils
  - shunt C1: 4.7 pF from caps
parts:
  coils: inductor E24 1 nH .. 47 nH Q 40 @ 900 MHz
  caps: capacitor E24 0.47 pF .. 47 pF Q 200
goals:
  - return loss >= 20 dB
  - gain >= -1 dB
`);
    await vscode.commands.executeCommand('ohmward.openPanel');
    await eventually('the panel', async () => (await page.text('.freshness')) === 'up to date');
    await replace(editor, 'ladder:\n  - series L1: 8.2 nH from coils\n  - shunt C1: 4.7 pF from caps\n', 'ladder: solve up to 6 elements from coils, caps\n');
    await eventually('progress', async () => /^\d+ %/.test((await page.text('.candidates-section .progress:not([hidden]) span')) ?? ''));
    assert.match((await page.text('.freshness')) ?? '', /^old numbers: The values are being worked out/);
    assert.equal(await page.count('svg.chart .arc'), 2);
    await page.picture('panel-solving');
    await replace(editor, 'up to 6', 'up to 2');
    await eventually('candidates', async () => (await page.count('.candidates li')) > 3);
    assert.equal(await page.count('.candidates-section .progress:not([hidden])'), 0);
    assert.equal(await page.text('.freshness'), 'up to date');
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
