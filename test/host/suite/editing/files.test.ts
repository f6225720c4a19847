import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openText, sampleUri } from '../descriptions';
import { closeAll, errors, marksThat } from '../waiting';

const write = (name: string, text: string) => vscode.workspace.fs.writeFile(sampleUri(name), new TextEncoder().encode(text));

const DESCRIPTION = [
  'ohmward: 1', 'bands:', '  up: 863 .. 870 MHz', 'load: probe.s1p', 'ladder:', '  - series R1: 1 Ω', 'goals:', '  - return loss >= 20 dB in up', '',
].join('\n');

/** Invented: a resistance at every frequency. */
const resistor = (ohm: number) => `# MHz Z RI R 1\n${[800, 850, 900, 950].map((frequency) => `${frequency} ${ohm} 0`).join('\n')}\n`;

describe('files that a description names', () => {
  afterEach(closeAll);

  it('come anew when they change, vanish or appear on disk, without a touch of the description', async () => {
    await write('files/probe.s1p', resistor(49));
    const { document } = await openText('files/probe.match.yaml', DESCRIPTION);
    await marksThat(document, 'none: 50 Ω is a match', (all) => all.length === 0);
    await write('files/probe.s1p', resistor(300));
    await marksThat(document, 'a missed goal', (all) => all.some(({ code }) => code === 'goal-missed'));
    await write('files/probe.s1p', '# MHz Z RI R 1\n800 no number\n');
    await marksThat(document, 'a file that cannot be read', () => errors(document).some(({ message }) => /line 2|2:/.test(message)));
    await vscode.workspace.fs.delete(sampleUri('files/probe.s1p'));
    await marksThat(document, 'a file that is not there', () => errors(document).some(({ message }) => /probe\.s1p/.test(message)));
    await write('files/probe.s1p', resistor(49));
    await marksThat(document, 'none again', (all) => all.length === 0);
  });

  it('are found by a pattern, and new ones join', async () => {
    const twoPort = (ohm: number) => `# MHz S RI R 50\n${[800, 900, 1000].map((frequency) => `${frequency} ${ohm / (100 + ohm)} 0 ${100 / (100 + ohm)} 0 ${100 / (100 + ohm)} 0 ${ohm / (100 + ohm)} 0`).join('\n')}\n`;
    await write('pattern/vendor/r10.s2p', twoPort(10));
    const text = [
      'ohmward: 1', 'bands:', '  up: 863 .. 870 MHz', 'load: 50 Ω', 'ladder:', '  - series R1: 22 Ω from measured', 'parts:', '  measured: resistor files vendor/*.s2p', '',
    ].join('\n');
    const { document } = await openText('pattern/r.match.yaml', text);
    await marksThat(document, 'a value that the family does not hold', (all) => all.some(({ range }) => document.getText(range).includes('22')));
    await write('pattern/vendor/r22.s2p', twoPort(22));
    await marksThat(document, 'none: now the family holds it', (all) => !all.some(({ range }) => document.getText(range).includes('22')));
    assert.deepEqual(errors(document).map(({ message }) => message), []);
  });

  it('outside the folder are read where the workspace is trusted', async () => {
    const text = DESCRIPTION.replace('probe.s1p', '../../outside.s1p');
    const { document } = await openText('files/outside.match.yaml', text);
    await marksThat(document, 'a missed goal, so the file was read', (all) => all.some(({ code }) => code === 'goal-missed'));
    assert.deepEqual(errors(document), []);
  });
});
