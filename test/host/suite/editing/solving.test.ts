import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openText, placeOf, replace, undo } from '../descriptions';
import { closeAll, eventually } from '../waiting';

// Invented: a valve's radio.
const text = `ohmward: 1
load: 18 - j37 Ω at 868 MHz
bands:
  main: 860 .. 876 MHz
ladder:                  # from the antenna on
  - series L1: solve from coils   # a coil
  - shunt C1: solve from caps or none
parts:
  coils: inductor E12 1 nH .. 47 nH Q 40 @ 900 MHz
  caps: capacitor E12 0.47 pF .. 47 pF Q 200
goals:
  - return loss >= 10 dB
  - gain >= -1 dB
`;

const lenses = async (document: vscode.TextDocument) =>
  ((await vscode.commands.executeCommand<vscode.CodeLens[] | undefined>('vscode.executeCodeLensProvider', document.uri, 20)) ?? []).map(({ command }) => command).filter((command) => command !== undefined);

const lensThat = (document: vscode.TextDocument, title: RegExp) =>
  eventually(`a lens like ${String(title)}`, async () => (await lenses(document)).find((command) => title.test(command.title)));

const run = ({ command, arguments: given }: vscode.Command) => vscode.commands.executeCommand(command, ...(given ?? []));

describe('solving in the editor', () => {
  afterEach(closeAll);

  it('inserts the solved values from above the ladder, and one undo takes them back', async () => {
    const { document } = await openText('orchard/valve.match.yaml', text);
    const insert = await lensThat(document, /^Insert solved values: L1 [\d.]+ nH, C1 [\d.]+ pF \(margin /);
    await run(insert);
    await eventually('the values', () => /- series L1: [\d.]+ nH from coils {3}# a coil\n {2}- shunt C1: [\d.]+ pF from caps\n/.test(document.getText()));
    await lensThat(document, /^all 2 hold$/);
    await undo();
    assert.equal(document.getText(), text);
  });

  it('offers the best and the next best values on the light bulb', async () => {
    const { document } = await openText('orchard/valve.match.yaml', text);
    await lensThat(document, /^Insert solved values/);
    const actions = await vscode.commands.executeCommand<vscode.CodeAction[]>('vscode.executeCodeActionProvider', document.uri, placeOf(document, 'solve from caps'));
    const titles = actions.map(({ title }) => title);
    assert.match(titles[0], /^Insert solved values \(margin /);
    assert.ok(titles.some((title) => /^C1: [\d.]+ pF from caps \(best, margin /.test(title)), titles.join(' | '));
    assert.ok(titles.some((title) => /\(next best, margin /.test(title)));
    const alone = actions.find(({ title }) => title.startsWith('C1:'));
    assert.ok(alone?.edit);
    assert.ok(await vscode.workspace.applyEdit(alone.edit));
    assert.match(document.getText(), /series L1: solve from coils {3}# a coil\n {2}- shunt C1: [\d.]+ pF from caps\n/);
  });

  it('follows the typing, and forgets what was left to solve', async () => {
    const editor = await openText('orchard/valve.match.yaml', text);
    await lensThat(editor.document, /^Insert solved values: L1 .* nH, C1 /);
    await replace(editor, 'return loss >= 10 dB', 'return loss >= 40 dB');
    await lensThat(editor.document, /misses a goal/);
    await replace(editor, 'solve from coils', '8.2 nH from coils fixed');
    await lensThat(editor.document, /^Insert solved values: C1 /);
    await replace(editor, 'solve from caps or none', '4.7 pF from caps');
    await lensThat(editor.document, /hold/);
  });

  it('solves again what says from and is not fixed', async () => {
    const { document } = await openText('orchard/valve.match.yaml', text.replace('solve from coils', '1 nH from coils').replace('solve from caps or none', '4.7 pF from caps fixed'));
    await run(await lensThat(document, /^Solve again$/));
    await eventually('another value', () => /series L1: (?!1 nH)[\d.]+ nH from coils/.test(document.getText()));
    assert.match(document.getText(), /shunt C1: 4\.7 pF from caps fixed/);
    await undo();
    assert.match(document.getText(), /series L1: 1 nH from coils/);
  });

  it('keeps what is there where solving again finds nothing better', async () => {
    // Between the values of E12, and better than any of them.
    const { document } = await openText('orchard/sluice.match.yaml', text.replace('solve from coils', '11 nH from coils').replace('solve from caps or none', '4 pF from caps'));
    const before = document.getText();
    assert.match(before, /series L1: 11 nH from coils/);
    await run(await lensThat(document, /^Solve again$/));
    assert.equal(document.getText(), before);
  });

  it('keeps up with somebody who types while a large search goes on', async () => {
    const editor = await openText('orchard/valve.match.yaml', text.replace(/ladder:[^]*?parts:/, 'ladder: solve up to 5 elements from coils, caps\nparts:').replaceAll('E12', 'E24'));
    const at = () => placeOf(editor.document, 'dB\n').end;
    for (let i = 0; i < 20; i++) {
      const before = performance.now();
      assert.ok(await editor.edit((edit) => edit.insert(at(), '# ')));
      // Far above what an edit takes, far below what the search takes.
      assert.ok(performance.now() - before < 2_000, 'the editor answers');
    }
    await lensThat(editor.document, /^Insert solved values/);
  });
});
