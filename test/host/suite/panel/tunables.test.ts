import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample, replace } from '../descriptions';
import { page } from '../page';
import { closeAll, eventually } from '../waiting';

const GATE = 'gate-reader/gate.match.yaml';

describe('codes in the panel', () => {
  afterEach(closeAll);

  async function openGate(): Promise<vscode.TextEditor> {
    const editor = await openSample(GATE);
    await vscode.commands.executeCommand('ohmward.openPanel');
    await eventually('the coverage', async () => /Some code brings/.test((await page.text('.coverage-part')) ?? ''));
    return editor;
  }

  it('lists channels, and shows the trace of the one that is chosen', async () => {
    await openGate();
    assert.equal(await page.count('table.codes tbody tr'), 50);
    assert.match((await page.text('.summary-line')) ?? '', /^Every goal holds at 50 channels; least margin /);
    const trace = () => page.evaluate<string>('(root) => root.querySelector("svg.chart .trace.case-0").getAttribute("d")');
    const before = await trace();
    await page.click('table.codes tbody tr:nth-child(1) button');
    await eventually('the first channel', async () => /902\.75 MHz/.test((await page.text('table.codes tr.current')) ?? ''));
    await eventually('another trace', async () => (await trace()) !== before);
    await eventually('the coverage of that channel', async () => /at 902\.75 MHz/.test((await page.text('.coverage-part')) ?? ''));
    assert.match((await page.evaluate<string>('(root) => root.querySelector(".marker-line vscode-text-field").value')) ?? '', /902\.75 MHz/);
    await page.focus('svg.stairs-plot');
    await page.press('ArrowRight');
    await eventually('the next channel', async () => /903\.25 MHz/.test((await page.text('table.codes tr.current')) ?? ''));
    await page.evaluate('(root) => root.querySelector(".codes-section").scrollIntoView()');
    await page.picture('panel-codes');
  });

  it('says that the firmware’s table is out of date, and writes it', async () => {
    const editor = await openGate();
    await eventually('the state of the table', async () => /gate_codes\.h: up to date/.test((await page.text('.firmware')) ?? ''));
    await replace(editor, '12 nH ±2 %', '10 nH ±2 %');
    await eventually('that it is out of date', async () => /gate_codes\.h: out of date/.test((await page.text('.firmware')) ?? ''));
    await page.click('.firmware-line vscode-button');
    await eventually('that it is up to date', async () => /gate_codes\.h: up to date/.test((await page.text('.firmware')) ?? ''));
  });
});
