import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openText } from '../descriptions';
import { page } from '../page';
import { closeAll, eventually } from '../waiting';

// Invented: three situations of one antenna, six parts, 401 points.
const text = (value: string) => `ohmward: 1
load:
  free: (14 Ω + 3 pF) + 8 nH
  hand: (19 Ω + 3.3 pF) + 8 nH
  metal: (9 Ω + 2.7 pF) + 8 nH
bands:
  main: 850 .. 900 MHz
sweep: 700 MHz .. 1.1 GHz, 401 points
ladder:
  - series L1: ${value} nH Q 40
  - shunt C1: 2.2 pF Q 200
  - series L2: 5.6 nH Q 40
  - shunt C2: 3.3 pF Q 200
  - series L3: 4.7 nH Q 40
  - series C3: 22 pF Q 200
goals:
  - return loss >= 3 dB
  - gain >= -4 dB
`;

const KEYSTROKES = 120;
const WARM_UP = 20;

/** Times of this machine's one clock, in ms, as pages have it too. */
const now = () => performance.timeOrigin + performance.now();
const sorted = (values: readonly number[]) => [...values].sort((a, b) => a - b);
const percentile = (values: readonly number[], share: number) => sorted(values)[Math.min(values.length - 1, Math.floor(share * values.length))];

/** A panel that computes nothing: it writes a number into itself at the next frame, and tells when it did. */
const emptyPage = `<!DOCTYPE html><html><body><p id="p"></p><script>
  const api = acquireVsCodeApi();
  window.addEventListener('message', ({ data }) => requestAnimationFrame(() => {
    document.getElementById('p').textContent = String(data);
    api.postMessage({ number: data, at: performance.timeOrigin + performance.now() });
  }));
  api.postMessage({ number: -1, at: 0 });
</script></body></html>`;

describe('how long it takes', () => {
  afterEach(closeAll);

  it('from nothing to an extension that is ready', async () => {
    const extension = vscode.extensions.getExtension('ohmward.ohmward');
    assert.ok(extension && !extension.isActive);
    const began = now();
    await extension.activate();
    // The editor's own start ends where suites begin, which its page knows as the time since it was asked for.
    const editorMs = await page.evaluate<number>('() => performance.now()', 'window');
    await page.say(`TIMING ${JSON.stringify({ activationMs: now() - began, editorMs })}`);
  });

  it('from a keystroke to a new picture', async () => {
    // Each in a group of its own, so that all are in sight.
    await vscode.commands.executeCommand('vscode.setEditorLayout', { orientation: 0, groups: [{}, {}, {}] });
    const empty = vscode.window.createWebviewPanel('empty', 'Empty', { viewColumn: vscode.ViewColumn.Three, preserveFocus: true }, { enableScripts: true });
    const arrivals = new Map<number, number>();
    empty.webview.onDidReceiveMessage(({ number, at }: { number: number; at: number }) => arrivals.set(number, at));
    empty.webview.html = emptyPage;
    await eventually('the empty panel', () => arrivals.has(-1));
    const editor = await openText('timing/three.match.yaml', text('8.2'));
    await vscode.commands.executeCommand('ohmward.openPanel');
    await eventually('the panel', async () => (await page.text('.freshness')) === 'up to date');
    // When the ladder's first value was drawn anew.
    await page.evaluate(`() => {
      window.drawn = [];
      const trace = document.querySelector('svg.chart');
      new MutationObserver(() => window.drawn.push(performance.timeOrigin + performance.now())).observe(trace, { childList: true });
    }`);
    const { document } = editor;
    const line = document.getText().split('\n').findIndex((each) => each.includes('series L1'));
    let shown = '8.2';
    let keystroke = 0;
    // What a panel that computes nothing would do: answer the change of the text at once.
    const listening = vscode.workspace.onDidChangeTextDocument((change) => {
      if (change.document === document) void empty.webview.postMessage(keystroke);
    });
    const began: number[] = [];
    for (let number = 0; number < WARM_UP + KEYSTROKES; number++) {
      const next = number % 2 === 0 ? '8.3' : '8.2';
      const at = document.lineAt(line).text.indexOf(shown);
      const drawnBefore = await page.evaluate<number>('() => window.drawn.length');
      const start = now();
      began.push(start);
      keystroke = number;
      const edited = editor.edit((edit) => edit.replace(new vscode.Range(line, at, line, at + shown.length), next));
      await edited;
      shown = next;
      await eventually('a new picture', async () => (await page.evaluate<number>('() => window.drawn.length')) > drawnBefore);
      await eventually('the empty panel', () => arrivals.has(number));
    }
    const drawn = await page.evaluate<number[]>('() => window.drawn');
    // Of each keystroke the first picture that came after it.
    const pictures = began.map((start) => (drawn.find((at) => at >= start) ?? NaN) - start);
    const round = began.map((start, number) => (arrivals.get(number) ?? NaN) - start);
    const [panelMs, emptyMs] = [pictures, round].map((each) => each.slice(WARM_UP));
    assert.ok([...panelMs, ...emptyMs].every((each) => each >= 0));
    await page.say(`TIMING ${JSON.stringify({ panelP50Ms: percentile(panelMs, 0.5), panelP95Ms: percentile(panelMs, 0.95), emptyP50Ms: percentile(emptyMs, 0.5), emptyP95Ms: percentile(emptyMs, 0.95) })}`);
    listening.dispose();
    empty.dispose();
  }).timeout(240_000);
});
