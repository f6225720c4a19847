import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample, openText, placeOf, replace, sampleUri, undo } from '../descriptions';
import { closeAll, errors, eventually, marks, marksThat } from '../waiting';

describe('marks while one types', () => {
  afterEach(closeAll);

  it('takes both endings for descriptions, and plain YAML not', async () => {
    assert.equal((await openText('a.match.yml', 'ohmward: 1\n')).document.languageId, 'ohmward');
    const other = await vscode.workspace.openTextDocument({ language: 'yaml', content: 'ohmward: 1\n' });
    await new Promise((resolve) => setTimeout(resolve, 300));
    assert.deepEqual(marks(other), []);
  });

  for (const sample of ['orchard/frost.match.yaml', 'crate-reader/loop.match.yaml']) {
    it(`finds no mistake in the sample ${sample}`, async () => {
      const { document } = await openSample(sample);
      // Something must have been said or shown before silence counts: the hover comes from the same study.
      const at = placeOf(document, 'C1').start;
      await eventually('a hover', async () => (await vscode.commands.executeCommand<vscode.Hover[]>('vscode.executeHoverProvider', document.uri, at))[0]);
      assert.deepEqual(errors(document).map(({ message }) => message), []);
    });
  }

  it('marks a mistake where it stands, and takes the mark away when it is undone', async () => {
    const editor = await openSample('orchard/frost.match.yaml');
    await replace(editor, '10 nH', '10 nX');
    const found = await marksThat(editor.document, 'an error', (all) => all.some(({ severity }) => severity === vscode.DiagnosticSeverity.Error));
    const line = placeOf(editor.document, '10 nX').start.line;
    assert.ok(found.some(({ range, source, code }) => range.start.line === line && source === 'Ohmward' && typeof code === 'string'));
    await undo();
    await marksThat(editor.document, 'no error', () => errors(editor.document).length === 0);
  });

  it('warns of a missed goal on its own line', async () => {
    const editor = await openSample('orchard/frost.match.yaml');
    await replace(editor, 'return loss >= 14 dB', 'return loss >= 70 dB');
    const line = placeOf(editor.document, 'return loss >= 70 dB').start.line;
    const found = await marksThat(editor.document, 'a missed goal', (all) => all.some(({ code, range }) => code === 'goal-missed' && range.start.line === line));
    const goal = found.find(({ code, range }) => code === 'goal-missed' && range.start.line === line);
    assert.equal(goal?.severity, vscode.DiagnosticSeverity.Warning);
    assert.match(goal?.message ?? '', /dB.*MHz/, 'the value and the frequency stand in it');
  });

  it('offers the fix of a slip, which mends it in one step that can be undone', async () => {
    const editor = await openSample('orchard/frost.match.yaml');
    await replace(editor, 'goals:', 'gaols:');
    await marksThat(editor.document, 'an unknown key', (all) => all.length > 0 && errors(editor.document).length > 0);
    const range = placeOf(editor.document, 'gaols');
    const actions = await vscode.commands.executeCommand<vscode.CodeAction[]>('vscode.executeCodeActionProvider', editor.document.uri, range, vscode.CodeActionKind.QuickFix.value);
    const fix = actions.find(({ edit }) => edit?.get(editor.document.uri).some(({ newText }) => newText.startsWith('goals')));
    assert.ok(fix?.edit, `there are: ${actions.map(({ title }) => title).join(', ')}`);
    await vscode.workspace.applyEdit(fix.edit);
    assert.match(editor.document.getText(), /^goals:$/m);
    await marksThat(editor.document, 'no error', () => errors(editor.document).length === 0);
    await undo();
    assert.match(editor.document.getText(), /^gaols:$/m);
  });

  it('forgets the marks of a file that is closed', async () => {
    const uri = sampleUri('b.match.yaml');
    await vscode.workspace.fs.writeFile(uri, new TextEncoder().encode('ohmward: 1\nwhat: 3\n'));
    // A document that an extension opens lives on for minutes; one that the person opens ends with its tab.
    await vscode.commands.executeCommand('vscode.open', uri);
    await eventually('an error', () => vscode.languages.getDiagnostics(uri).length > 0);
    await closeAll();
    await eventually('no marks', () => vscode.languages.getDiagnostics(uri).length === 0);
  });

  it('stays alive through text that is no description at all', async () => {
    const editor = await openText('c.match.yaml', 'ohmward: 1\n');
    for (const text of ['\t\t- [', '%YAML 9.9\n---\n&a *a', '\u0000\uFFFF', '{'.repeat(3_000), 'ladder: '.repeat(500), '']) {
      const all = new vscode.Range(0, 0, editor.document.lineCount, 0);
      await editor.edit((edit) => edit.replace(all, text));
      await marksThat(editor.document, `an error for ${JSON.stringify(text.slice(0, 20))}`, (found) => found.length > 0 && found.length <= 101);
    }
  });
});
