import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openText, placeOf, replace, sampleUri } from '../descriptions';
import { closeAll, eventually, marks, marksThat } from '../waiting';

// Invented: a lamp post's radio.
const text = (header: string) => `ohmward: 1
load: 18 - j37 Ω at 868 MHz
bands:
  main: 863 .. 870 MHz
tunables:
  bank: capacitor 3 bits 1 pF .. 8 pF
ladder:
  - series L1: 9.1 nH
  - shunt C1: tunable bank
channels: 863 MHz .. 870 MHz step 1 MHz
firmware:
  header: ${header}
  symbol: lamp_codes
goals:
  - return loss >= 3 dB
`;

const read = async (name: string) => new TextDecoder().decode(await vscode.workspace.fs.readFile(sampleUri(name)));
const write = (name: string, content: string) => vscode.workspace.fs.writeFile(sampleUri(name), new TextEncoder().encode(content));
const has = (code: string) => (found: vscode.Diagnostic[]) => found.some((mark) => mark.code === code);
const hasNone = (found: vscode.Diagnostic[]) => !found.some(({ code }) => String(code).startsWith('firmware'));

const fixesAt = (document: vscode.TextDocument, piece: string) =>
  vscode.commands.executeCommand<vscode.CodeAction[]>('vscode.executeCodeActionProvider', document.uri, placeOf(document, piece), vscode.CodeActionKind.QuickFix.value);

describe('the firmware’s table in the editor', () => {
  afterEach(closeAll);

  it('is written by a quick fix, is out of date when a code changes, and only then', async () => {
    const editor = await openText('lamp/lamp.match.yaml', text('include/lamp_codes.h'));
    const { document } = editor;
    const [mark] = (await marksThat(document, 'that there is none yet', has('firmware-missing'))).filter(({ code }) => code === 'firmware-missing');
    assert.equal(document.getText(mark.range), 'include/lamp_codes.h');
    const mend = async () => {
      const fix = await eventually('the fix', async () => (await fixesAt(document, 'include/lamp')).find(({ title }) => title === 'Write the firmware’s table'));
      assert.ok(fix.command);
      await vscode.commands.executeCommand(fix.command.command, ...(fix.command.arguments ?? []));
    };
    await mend();
    await marksThat(document, 'none of the table', hasNone);
    const first = await read('lamp/include/lamp_codes.h');
    assert.match(first, /struct lamp_codes_row/);
    assert.equal(document.isDirty, false);
    assert.deepEqual((await vscode.workspace.fs.readDirectory(sampleUri('lamp/include'))).map(([name]) => name), ['lamp_codes.h']);

    await replace(editor, 'load: 18', 'title: Lamp post\nload: 18');
    await replace(editor, 'return loss >= 3 dB', 'return loss >= 3.1 dB');
    await eventually('an evaluation', async () => (await vscode.commands.executeCommand<vscode.DocumentSymbol[]>('vscode.executeDocumentSymbolProvider', document.uri)).length > 0);
    await new Promise((resolve) => setTimeout(resolve, 500));
    assert.ok(hasNone(marks(document)));
    await replace(editor, '9.1 nH', '6.8 nH');
    await marksThat(document, 'that it is out of date', has('firmware-out-of-date'));
    await mend();
    await marksThat(document, 'none of the table', hasNone);
    assert.notEqual(await read('lamp/include/lamp_codes.h'), first);

    await write('lamp/include/lamp_codes.h', first);
    await marksThat(document, 'that it is out of date, when it changes on disk', has('firmware-out-of-date'));
  });

  it('is never written over a file without its marker line', async () => {
    await write('lamp/other.h', '#define MINE 1\n');
    const { document } = await openText('lamp/foreign.match.yaml', text('other.h'));
    await marksThat(document, 'that it is not ours', has('firmware-foreign'));
    assert.ok(!(await fixesAt(document, 'other.h')).some(({ title }) => /table/.test(title)));
    await vscode.commands.executeCommand('ohmward.writeFirmware', document.uri);
    assert.equal(await read('lamp/other.h'), '#define MINE 1\n');
  });
});

describe('many codes', () => {
  afterEach(closeAll);

  it('are sought without keeping the typing waiting', async () => {
    const many = text('include/many.h').replace('capacitor 3 bits', 'capacitor 8 bits').replace('9.1 nH', '9.1 nH\n  - series C2: tunable wide').replace('ladder:', '  wide: capacitor 8 bits 1 pF .. 30 pF\nladder:').replace('step 1 MHz', 'step 100 kHz');
    const editor = await openText('lamp/many.match.yaml', many);
    const { document } = editor;
    await replace(editor, '9.1 nH', '8.2 nH');
    const began = Date.now();
    await replace(editor, '8.2 nH', '7.5 nH');
    assert.ok(Date.now() - began < 1_000);
    const hints = await eventually('hints', async () => {
      const found = await vscode.commands.executeCommand<vscode.InlayHint[]>('vscode.executeInlayHintProvider', document.uri, new vscode.Range(0, 0, document.lineCount, 0));
      return found.length > 0 ? found : null;
    });
    assert.ok(hints.length > 0);
    await marksThat(document, 'the table of the last text', has('firmware-missing'));
  });
});

describe('the report from the editor', () => {
  afterEach(closeAll);

  it('is one page with everything, and nothing from elsewhere', async () => {
    const { document } = await openText('lamp/lamp.match.yaml', text('include/lamp_codes.h').replace('9.1 nH', '9.1 nH ±5 %'));
    await vscode.commands.executeCommand('ohmward.saveReport', document.uri, sampleUri('lamp/lamp.html'));
    const page = await eventually('the page', () => read('lamp/lamp.html'));
    for (const heading of ['Verdict: ', 'Reflection trace', 'Over frequency, MHz', 'Ladder, from the load down to the source', 'Codes by channel', 'Coverage', 'Spread of builds']) assert.ok(page.includes(heading), heading);
    assert.doesNotMatch(page, /https?:(?!\/\/www\.w3\.org\/)|<script|<link|src=/);
  });
});
