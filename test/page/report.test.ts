import assert from 'node:assert/strict';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { reportHtml } from '../../src/report/reportHtml';
import { openBlank, startPages, stopPages } from './servedPage';
import { codesSample, spreadSample, unsolvedView, wholeLadderView } from './sampleView';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

describe('the report in a browser', function () {
  this.timeout(60_000);
  let folder = '';
  before(function () {
    this.timeout(600_000);
    folder = mkdtempSync(join(tmpdir(), 'ohmward-report-'));
    return startPages();
  });
  after(async () => {
    await stopPages();
    rmSync(folder, { recursive: true, force: true });
  });

  it('opens from the disk, asks for nothing else, and has nothing that axe finds serious', async () => {
    const views = [codesSample(), spreadSample(), unsolvedView().view, wholeLadderView()];
    const file = join(folder, 'report.html');
    writeFileSync(file, reportHtml([...views.map((view) => ({ path: view.fileName, view, messages: [] })), { path: 'broken.match.yaml', view: null, messages: ['an <invented> message'] }]));
    const page = await openBlank(900);
    const asked: string[] = [];
    const told: string[] = [];
    page.on('request', (request) => asked.push(request.url()));
    page.on('console', (message) => told.push(message.text()));
    await page.goto(pathToFileURL(file).href);
    assert.deepEqual(asked, [pathToFileURL(file).href]);
    assert.deepEqual(told, []);
    assert.equal(await page.locator('h1').count(), 5);
    assert.equal(await page.locator('script').count(), 0);
    assert.match(await page.locator('body').innerText(), /an <invented> message/);
    assert.ok(await page.evaluate(() => globalThis.document.documentElement.scrollWidth <= 900));
    await page.evaluate(axeSource);
    const found = await page.evaluate(() => (window as unknown as { axe: { run(): Promise<{ violations: { id: string; impact: string; nodes: { html: string }[] }[] }> } }).axe.run());
    assert.deepEqual(found.violations.filter(({ impact }) => impact === 'serious' || impact === 'critical').map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 120)).join(' | ')}`), []);
    await page.close();
  });
});
