import * as vscode from 'vscode';
import { openText, replace } from '../descriptions';
import { page } from '../page';
import { closeAll, eventually, marksThat } from '../waiting';

// Invented: a soil probe.
const text = `ohmward: 1
load: 12 Ω + 3.3 pF
bands:
  main: 862 .. 871 MHz
ladder:
  - series L1: 12 nH ±10 % Q 40
  - shunt C1: 4.3 pF ±2 %
goals:
  - return loss >= 6 dB
  - yield >= 99 %
`;

describe('builds with tolerances in the editor', () => {
  afterEach(closeAll);

  it('judges a goal on yield when the builds are made, and again after a change', async () => {
    const editor = await openText('orchard/soil.match.yaml', text);
    await marksThat(editor.document, 'a missed yield', (all) => all.some(({ code, message }) => code === 'goal-missed' && message.startsWith('yield')));
    await vscode.commands.executeCommand('ohmward.openPanel');
    await eventually('the histogram', async () => (await page.count('svg.histogram .corner-mark')) === 1);
    await eventually('the cloud', async () => (await page.count('svg.chart .cloud')) > 10);
    await page.picture('panel-spread', 'panel');
    await replace(editor, '±10 %', '±0.5 %');
    await replace(editor, '±2 %', '±0.5 %');
    await marksThat(editor.document, 'none', (all) => all.length === 0);
  });
});
