import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample, placeOf, replace, sampleUri, undo } from '../descriptions';
import { page } from '../page';
import { closeAll, eventually } from '../waiting';

const FROST = 'orchard/frost.match.yaml';

const rows = () => page.evaluate<string[]>(`() => [...document.querySelectorAll('table.ladder tbody tr')].map((row) => row.dataset.element)`);
/** `10 nH`, as the table shows it. */
const valueOf = (id: string) => page.evaluate<string | null>(`() => document.querySelector('tr[data-element="${id}"] .value > :last-child')?.value ?? null`);
const impedanceAfter = (id: string) => page.evaluate<string | null>(`() => document.querySelectorAll('tr[data-element="${id}"] td.number')[2]?.textContent ?? null`);
const freshness = () => page.text('.freshness');

async function openWithPanel(name = FROST): Promise<vscode.TextEditor> {
  const editor = await openSample(name);
  await vscode.commands.executeCommand('ohmward.openPanel');
  await eventually('the ladder in the panel', async () => (await rows()).length > 2 && (await freshness()) === 'up to date');
  return editor;
}

/**
 * Writes into a field of the page in the place of what stands there. Selected by the page and not by a chord: until the
 * editor has learnt that a webview holds the focus, it takes «select all» for itself and the focus along with it.
 */
async function typeOver(field: string, text: string): Promise<void> {
  const input = `document.querySelector('${field}')`;
  await page.click(field);
  await eventually('the focus', () => page.evaluate<boolean>(`() => document.hasFocus() && document.activeElement === ${input}`));
  await page.evaluate(`() => (${input}.shadowRoot?.querySelector('input') ?? ${input}).select()`);
  await page.type(text);
  await page.press('Enter');
}

describe('the panel', () => {
  afterEach(closeAll);

  it('opens beside the editor by its icon and shows everything', async () => {
    await openSample(FROST);
    await page.click('.editor-actions a.action-label[aria-label^="Open the panel beside the editor"]', 'window');
    await eventually('the title', async () => (await page.text('h1')) === 'Orchard frost sensor, antenna port');
    assert.deepEqual(await rows(), ['load', 'L1', 'C1', 'C2', 'source']);
    assert.equal(await page.count('.verdict li'), 5);
    assert.ok((await page.count('svg.chart path')) > 10, 'the chart is drawn');
    assert.equal(vscode.window.tabGroups.all.length, 2, 'in a group of its own');
    assert.equal(vscode.window.activeTextEditor?.document.fileName.endsWith('frost.match.yaml'), true, 'the editor keeps the focus');
    await page.picture('panel-first');
  });

  it('changes its numbers while one types, and comes back with undo', async () => {
    const editor = await openWithPanel();
    const before = await impedanceAfter('L1');
    const at = placeOf(editor.document, '10 nH').start.translate(0, 1);
    editor.selection = new vscode.Selection(at, at.translate(0, 1));
    await vscode.window.showTextDocument(editor.document, { viewColumn: vscode.ViewColumn.One, selection: editor.selection });
    await page.type('8');
    await eventually('18 nH in the table', async () => (await valueOf('L1')) === '18 nH');
    assert.notEqual(await impedanceAfter('L1'), before);
    await undo();
    await eventually('10 nH again', async () => (await valueOf('L1')) === '10 nH');
    assert.equal(await impedanceAfter('L1'), before);
  });

  it('keeps the last good picture through a mistake, says what is wrong, and recovers', async () => {
    const editor = await openWithPanel();
    const paths = await page.count('svg.chart path');
    await replace(editor, '\nload:', '\nlode:');
    await eventually('the mark of old numbers', async () => (await freshness())?.startsWith('old numbers'));
    assert.equal(await page.count('svg.chart path'), paths, 'the picture is still there');
    assert.ok((await page.count('.problems li.error')) > 0);
    await page.picture('panel-with-a-mistake');
    await undo();
    await eventually('fresh numbers', async () => (await freshness()) === 'up to date');
    assert.equal(await page.count('.problems li.error'), 0);
  });

  it('follows a Touchstone file that changes on disk', async () => {
    await openWithPanel();
    const before = await impedanceAfter('load');
    const file = sampleUri('orchard/frost-free-air.s1p');
    const content = await vscode.workspace.fs.readFile(file);
    const frequencies = [700, 800, 866, 900, 1000, 1100];
    await vscode.workspace.fs.writeFile(file, new TextEncoder().encode(`# MHz Z RI R 1\n${frequencies.map((frequency) => `${frequency} 30 5`).join('\n')}\n`));
    try {
      await eventually('other numbers', async () => (await impedanceAfter('load')) !== before);
    } finally {
      await vscode.workspace.fs.writeFile(file, content);
    }
    await eventually('the old numbers', async () => (await impedanceAfter('load')) === before);
  });

  it('shows the row of the line with the cursor, and marks the line of the row under the pointer', async () => {
    const editor = await openWithPanel();
    const at = placeOf(editor.document, 'shunt C1').start;
    editor.selection = new vscode.Selection(at, at);
    await eventually('the row of C1', async () => (await page.count('tr[data-element="C1"].current')) === 1);
    const goal = placeOf(editor.document, 'gain >= -1 dB').start;
    editor.selection = new vscode.Selection(goal, goal);
    await eventually('the goal', async () => (await page.text('.goals li.current .title'))?.startsWith('gain'));
    await page.hover('tr[data-element="L1"] .designator');
    await eventually('the line of L1 stands out', async () => (await page.count('.view-overlays [class*="ced-"]', 'window')) > 0);
    await page.picture('panel-points-at-a-line');
  });

  it('goes to the line of a goal and of a row', async () => {
    const editor = await openWithPanel();
    await page.click('.goals li:nth-child(2) button');
    await eventually('the line of the goal', () => vscode.window.activeTextEditor?.selection.active.line === placeOf(editor.document, 'gain >= -1 dB').start.line);
    await page.click('tr[data-element="C2"] button.name');
    await eventually('the line of C2', () => vscode.window.activeTextEditor?.selection.active.line === placeOf(editor.document, 'series C2').start.line);
  });

  it('steps and sets values as ordinary edits that can be undone, one by one', async () => {
    const editor = await openWithPanel();
    const before = editor.document.getText();
    await page.focus('tr[data-element="L1"] .value > :last-child');
    await page.press('ArrowUp');
    await page.press('ArrowUp');
    await eventually('two steps of E24', () => editor.document.getText() === before.replace('10 nH', '12 nH'));
    await eventually('the new value in the table', async () => (await valueOf('L1')) === '12 nH');
    await vscode.window.showTextDocument(editor.document, vscode.ViewColumn.One);
    await undo();
    assert.equal(editor.document.getText(), before.replace('10 nH', '11 nH'));
    await undo();
    assert.equal(editor.document.getText(), before);
    await eventually('the table follows', async () => (await valueOf('C1')) === '4.3 pF');
    await typeOver('tr[data-element="C1"] .value > :last-child', '5.1 pF');
    await eventually('the typed value', () => editor.document.getText() === before.replace('4.3 pF', '5.1 pF'));
    await vscode.window.showTextDocument(editor.document, vscode.ViewColumn.One);
    await undo();
    assert.equal(editor.document.getText(), before);
  });

  it('takes a typed marker and refuses one that is none', async () => {
    await openWithPanel();
    const marker = '.marker-line > :nth-child(2)';
    const write = (text: string) => typeOver(marker, text);
    await write('900 MHz');
    await eventually('the marker', () => page.evaluate<boolean>(`() => document.querySelector('${marker}').value.startsWith('900')`));
    await write('soon');
    await eventually('a refusal', async () => ((await page.text('.refusal')) ?? '') !== '');
  });

  it('follows the active description until it is pinned', async () => {
    await openWithPanel();
    await openSample('crate-reader/loop.match.yaml');
    await eventually('the other one', async () => (await page.text('.file')) === 'loop.match.yaml');
    await page.click('header .file-line > :last-child');
    await eventually('pinned', async () => (await page.text('header .file-line > :last-child')) === 'Unpin');
    await openSample(FROST);
    await new Promise((resolve) => setTimeout(resolve, 500));
    assert.equal(await page.text('.file'), 'loop.match.yaml');
    await page.click('header .file-line > :last-child');
    await eventually('it follows again', async () => (await page.text('.file')) === 'frost.match.yaml');
  });

  it('keeps the picture when the tab is used for another file', async () => {
    await vscode.commands.executeCommand('vscode.open', sampleUri(FROST), { preview: true });
    await vscode.commands.executeCommand('ohmward.openPanel');
    await eventually('the ladder', async () => (await rows()).length > 2);
    await vscode.commands.executeCommand('vscode.open', sampleUri('orchard/frost-free-air.s1p'), { preview: true, viewColumn: vscode.ViewColumn.One });
    await new Promise((resolve) => setTimeout(resolve, 800));
    assert.equal(await page.text('.file'), 'frost.match.yaml');
    const editor = await openSample(FROST);
    await replace(editor, '10 nH', '15 nH');
    await eventually('numbers of the text that is open again', async () => (await valueOf('L1')) === '15 nH');
  });

  it('opens by itself where the setting says so, and stays closed once it was closed by hand', async () => {
    const settings = vscode.workspace.getConfiguration('ohmward');
    const isOpen = () => vscode.window.tabGroups.all.some(({ tabs }) => tabs.some(({ label }) => label.startsWith('Ohmward')));
    await openSample(FROST);
    assert.equal(isOpen(), false, 'not without the setting');
    await closeAll();
    await settings.update('panel.openByItself', true, vscode.ConfigurationTarget.Global);
    try {
      await openSample(FROST);
      await eventually('the panel', isOpen);
      await closeAll();
      await openSample(FROST);
      await new Promise((resolve) => setTimeout(resolve, 500));
      assert.equal(isOpen(), false, 'closed by hand, it stays closed');
    } finally {
      await settings.update('panel.openByItself', undefined, vscode.ConfigurationTarget.Global);
    }
  });

  it('shows the worst margin in the status bar, which leads to its goal', async () => {
    const editor = await openSample(FROST);
    await replace(editor, 'return loss >= 14 dB', 'return loss >= 70 dB');
    await eventually('the missed goal in the status bar', async () => /return loss .*short/.test((await page.text('[id="ohmward.ohmward.ohmward.margin"]', 'window')) ?? ''));
    await page.click('[id="ohmward.ohmward.ohmward.margin"] a', 'window');
    await eventually('the line', () => vscode.window.activeTextEditor?.selection.active.line === placeOf(editor.document, 'return loss >= 70 dB').start.line);
  });
});
