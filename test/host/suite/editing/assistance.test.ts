import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample, openText, placeOf, replace, sampleUri, undo } from '../descriptions';
import { closeAll, errors, eventually, marksThat } from '../waiting';

const FROST = 'orchard/frost.match.yaml';

const textOf = (hover: vscode.Hover | undefined) =>
  (hover?.contents ?? []).map((content) => (typeof content === 'string' ? content : content.value)).join('\n');

function ask<T>(command: string, ...args: unknown[]): Promise<T> {
  return Promise.resolve(vscode.commands.executeCommand<T>(command, ...args));
}

const hintsOf = (document: vscode.TextDocument) =>
  ask<vscode.InlayHint[]>('vscode.executeInlayHintProvider', document.uri, new vscode.Range(0, 0, document.lineCount, 0));

const labelOf = ({ label }: vscode.InlayHint) => (typeof label === 'string' ? label : label.map(({ value }) => value).join(''));

describe('what an editor tells about a description', () => {
  afterEach(closeAll);

  const hovered: [what: string, piece: string, expected: RegExp][] = [
    ['an element', 'L1', /Ω/],
    ['a band', 'uplink', /MHz/],
    ['a file', 'frost-wet-bark.s1p', /MHz|points/],
    ['a goal', 'gain >= -1 dB', /dB/],
    ['a family', 'coils: inductor', /nH/],
  ];
  for (const [what, piece, expected] of hovered) {
    it(`hovers over ${what}`, async () => {
      const { document } = await openSample(FROST);
      const hover = await eventually('a hover', async () => (await ask<vscode.Hover[]>('vscode.executeHoverProvider', document.uri, placeOf(document, piece).start.translate(0, 1)))[0]);
      assert.match(textOf(hover), expected);
    });
  }

  it('hints at reactances and margins at the ends of the lines, follows the typing, and can be switched off', async () => {
    const editor = await openSample(FROST);
    const { document } = editor;
    const hintOn = (hints: vscode.InlayHint[], piece: string) => hints.find(({ position }) => position.line === placeOf(document, piece).start.line);
    const before = await eventually('hints', async () => {
      const hints = await hintsOf(document);
      return hints.length > 0 ? hints : null;
    });
    const element = hintOn(before, 'series L1');
    assert.match(element ? labelOf(element) : 'none', /Ω/);
    assert.ok(hintOn(before, 'return loss >= 14 dB'), 'a goal has its margin');
    await replace(editor, '10 nH', '22 nH');
    await eventually('another reactance', async () => {
      const now = hintOn(await hintsOf(document), 'series L1');
      return now && element && labelOf(now) !== labelOf(element);
    });
    const settings = vscode.workspace.getConfiguration('ohmward');
    await settings.update('inlayHints.enabled', false, vscode.ConfigurationTarget.Global);
    try {
      assert.deepEqual(await hintsOf(document), []);
    } finally {
      await settings.update('inlayHints.enabled', undefined, vscode.ConfigurationTarget.Global);
    }
  });

  it('links file names to the files', async () => {
    const { document } = await openSample(FROST);
    const links = await eventually('links', async () => {
      const found = await ask<vscode.DocumentLink[]>('vscode.executeLinkProvider', document.uri);
      return found.length > 0 ? found : null;
    });
    const targets = links.map(({ range, target }) => [document.getText(range), target?.toString()]);
    assert.deepEqual(targets, ['frost-free-air.s1p', 'frost-wet-bark.s1p'].map((name) => [name, sampleUri(`orchard/${name}`).toString()]));
  });

  it('outlines it, also half-typed', async () => {
    const editor = await openSample(FROST);
    const names = async () => {
      const flat = (symbols: vscode.DocumentSymbol[]): string[] => symbols.flatMap(({ name, children }) => [name, ...flat(children)]);
      return flat((await ask<vscode.DocumentSymbol[] | undefined>('vscode.executeDocumentSymbolProvider', editor.document.uri)) ?? []);
    };
    const found = await eventually('an outline', async () => {
      const all = await names();
      return all.length > 0 ? all : null;
    });
    for (const expected of ['L1', 'C1', 'C2', 'uplink', 'wet bark', 'coils']) assert.ok(found.some((name) => name.includes(expected)), `${expected} in ${found.join(', ')}`);
    await replace(editor, 'goals:\n', 'goals:\n  - return lo\n');
    await eventually('the outline of the half-typed text', async () => (await names()).some((name) => name.includes('L1')));
  });

  it('folds its sections', async () => {
    const { document } = await openSample(FROST);
    const start = placeOf(document, 'ladder:').start.line;
    await eventually('a fold at the ladder', async () =>
      (await ask<vscode.FoldingRange[]>('vscode.executeFoldingRangeProvider', document.uri)).some((fold) => fold.start === start && fold.end >= start + 3));
  });

  it('goes from a name to its definition, finds its uses, and renames all of them in one step', async () => {
    const editor = await openSample(FROST);
    const { document } = editor;
    const use = placeOf(document, 'from coils').end.translate(0, -1);
    const definition = await eventually('a definition', async () => (await ask<vscode.Location[]>('vscode.executeDefinitionProvider', document.uri, use))[0]);
    assert.equal(definition.range.start.line, placeOf(document, 'coils: inductor').start.line);
    assert.equal((await ask<vscode.Location[]>('vscode.executeReferenceProvider', document.uri, use)).length, 2);
    const edit = await ask<vscode.WorkspaceEdit>('vscode.executeDocumentRenameProvider', document.uri, use, 'wound');
    const before = document.getText();
    await vscode.workspace.applyEdit(edit);
    assert.equal(document.getText(), before.replaceAll('coils', 'wound'));
    await marksThat(document, 'no error', () => errors(document).length === 0);
    await undo();
    assert.equal(document.getText(), before);
  });

  it('refuses a name that cannot be one', async () => {
    const { document } = await openSample(FROST);
    const use = placeOf(document, 'from coils').end.translate(0, -1);
    await assert.rejects(ask('vscode.executeDocumentRenameProvider', document.uri, use, '9 lives of'));
  });

  it('tidies the layout in one step', async () => {
    const editor = await openText('orchard/loose.match.yaml', 'ohmward:   1\nload: 18 - j37 Ω   \n\n\n\nbands:\n    up:  863 .. 870 MHz\nladder:\n- series L1:   3.9 nH   # wound\n');
    const edits = await ask<vscode.TextEdit[]>('vscode.executeFormatDocumentProvider', editor.document.uri, { tabSize: 2, insertSpaces: true });
    const change = new vscode.WorkspaceEdit();
    change.set(editor.document.uri, edits);
    await vscode.workspace.applyEdit(change);
    assert.equal(editor.document.getText(), 'ohmward: 1\nload: 18 - j37 Ω\n\nbands:\n  up: 863 .. 870 MHz\nladder:\n  - series L1: 3.9 nH   # wound\n');
  });

  it('steps the value under the cursor through its series, in steps that can be undone', async () => {
    const editor = await openSample(FROST);
    const { document } = editor;
    const at = placeOf(document, '4.3 pF').start;
    editor.selection = new vscode.Selection(at, at);
    await vscode.commands.executeCommand('ohmward.stepUp');
    await eventually('the next of E24', () => document.getText().includes('shunt C1: 4.7 pF from caps'));
    await vscode.commands.executeCommand('ohmward.stepDown');
    await vscode.commands.executeCommand('ohmward.stepDown');
    await eventually('the one before', () => document.getText().includes('shunt C1: 3.9 pF from caps'));
    for (const expected of ['4.3 pF', '4.7 pF', '4.3 pF']) {
      await undo();
      assert.ok(document.getText().includes(`shunt C1: ${expected}`), expected);
    }
  });

  it('completes the names of files in the folder', async () => {
    const editor = await openText('orchard/names.match.yaml', 'ohmward: 1\nbands:\n  up: 863 .. 870 MHz\nload: $0\nladder:\n  - series L1: 3.9 nH\n');
    await eventually('the files', async () => {
      const { items } = await ask<vscode.CompletionList>('vscode.executeCompletionItemProvider', editor.document.uri, editor.selection.active);
      return ['frost-free-air.s1p', 'frost-wet-bark.s1p'].every((name) => items.some(({ label }) => (typeof label === 'string' ? label : label.label) === name));
    });
  });

  it('completes what may stand at a place', async () => {
    const editor = await openText('orchard/half.match.yaml', 'ohmward: 1\nload: 18 - j37 Ω\nbands:\n  up: 863 .. 870 MHz\nladder:\n  - series L1: 3.9 nH\ngo$0\n');
    // The editor adds words of the text by itself; only ours come with an explanation.
    await eventually('the key with its explanation', async () => {
      const { items } = await ask<vscode.CompletionList>('vscode.executeCompletionItemProvider', editor.document.uri, editor.selection.active);
      return items.some(({ label, documentation }) => (typeof label === 'string' ? label : label.label).startsWith('goals') && documentation);
    });
  });
});
