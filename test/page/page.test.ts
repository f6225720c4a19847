import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { ToHost } from '../../src/messages/panel';
import { openPage, startPages, stopPages, type ServedPage } from './servedPage';
import { codesSample, sampleView, spreadSample, unsolvedView, viewMessage, wholeLadderView } from './sampleView';
import { bodyClass, type ThemeKind } from './themes';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
const document = 'file:///orchard/frost.match.yaml';

describe('the panel’s page', function () {
  this.timeout(60_000);
  // Chromium may have to be installed first.
  before(function () {
    this.timeout(600_000);
    return startPages();
  });
  after(stopPages);

  const last = async (served: ServedPage, type: ToHost['type']) => (await served.said()).filter((message) => message.type === type).at(-1);

  for (const controls of ['toolkit', 'plain'] as const) {
    describe(`with ${controls} controls`, () => {
      it('says that it is ready, and shows the view that it is sent', async () => {
        const served = await openPage('dark', 580, controls);
        assert.deepEqual((await served.said())[0], { type: 'ready' });
        await served.post(viewMessage(sampleView()));
        assert.equal(await served.page.textContent('h1'), 'Orchard frost sensor, antenna port');
        assert.equal(await served.page.textContent('.verdict h2'), 'Verdict: all 5 hold');
        assert.equal(await served.page.locator('table.ladder tbody tr').count(), 5);
        assert.equal(await served.page.locator('svg.chart .arc').count(), 3);
        assert.deepEqual(await served.violations(), []);
        await served.page.close();
      });

      it('lists candidates, previews the one that is pointed at or has the focus, and inserts it', async () => {
        const served = await openPage('dark', 580, controls);
        const { view, previews } = unsolvedView();
        await served.post(viewMessage(view, 3));
        assert.equal(await served.page.textContent('.verdict h2'), `Verdict: with the best candidate ${view.verdict}not inserted`);
        assert.equal(await served.page.locator('.candidates li').count(), view.candidates?.candidates.length);
        await served.page.locator('.candidates li').nth(1).hover();
        const asked = await last(served, 'preview candidate');
        assert.ok(asked?.type === 'preview candidate' && asked.candidate === 1 && asked.version === 3);
        await served.post({ type: 'preview', document, version: 3, request: asked.request, traces: previews });
        assert.equal(await served.page.locator('svg.chart .preview').count(), previews.length);
        assert.equal(await served.page.locator('svg.plot .preview').count(), 2 * previews.length);
        assert.equal(await served.page.locator('svg.small-chart .preview').count(), previews.length);
        assert.match(await served.page.locator('.preview-picture').innerText(), new RegExp(`pointed at: ${view.candidates?.candidates[1].values}`));
        // An answer to an older question changes nothing.
        await served.post({ type: 'preview', document, version: 3, request: asked.request - 1, traces: null });
        assert.equal(await served.page.locator('svg.chart .preview').count(), previews.length);
        await served.page.hover('h1');
        assert.equal(await served.page.locator('svg.chart .preview').count(), 0);
        const button = served.page.locator('.candidates li').nth(2).locator(controls === 'toolkit' ? 'vscode-button' : 'button');
        await button.focus();
        const focused = await last(served, 'preview candidate');
        assert.ok(focused?.type === 'preview candidate' && focused.candidate === 2);
        await served.page.keyboard.press('Enter');
        assert.deepEqual(await last(served, 'insert candidate'), { type: 'insert candidate', document, version: 3, candidate: 2 });
        assert.deepEqual(await served.violations(), []);
        await served.page.close();
      });

      it('sends a typed marker and a typed value, and steps with the arrow keys', async () => {
        const served = await openPage('light', 580, controls);
        await served.post(viewMessage(sampleView()));
        const field = served.page.locator('.marker-line').first().locator(controls === 'toolkit' ? 'vscode-text-field input' : 'input');
        await field.fill('868 MHz');
        await field.press('Enter');
        const typed = await last(served, 'type marker');
        assert.ok(typed?.type === 'type marker' && typed.text === '868 MHz');
        const value = served.page.locator('tr[data-element="C1"]').locator(controls === 'toolkit' ? 'vscode-text-field input' : 'input');
        await value.focus();
        await value.press('ArrowUp');
        assert.deepEqual(await last(served, 'step value'), { type: 'step value', document, version: 1, elementId: 'C1', direction: 'up' });
        await value.fill('5.1 pF');
        await value.press('Enter');
        assert.deepEqual(await last(served, 'set value'), { type: 'set value', document, version: 1, elementId: 'C1', text: '5.1 pF' });
        await served.page.close();
      });
    });
  }

  for (const width of [320, 900, 1100]) {
    it(`keeps a chart in sight beside the candidates at ${width} px`, async () => {
      const served = await openPage('light', width);
      await served.post(viewMessage(unsolvedView().view));
      await served.page.locator('.candidates li').last().scrollIntoViewIfNeeded();
      const inSight = await served.page.locator('svg.chart, svg.small-chart').evaluateAll((charts) => charts.filter((chart) => {
        const { top, bottom, height } = chart.getBoundingClientRect();
        return height > 100 && top >= 0 && bottom <= innerHeight;
      }).length);
      assert.equal(inSight, 1);
      await served.page.close();
    });
  }

  it('says which candidates belong to an older text, and inserts none of them', async () => {
    const served = await openPage('light', 580);
    await served.post(viewMessage(unsolvedView(true).view));
    assert.equal(await served.page.textContent('.candidates-section h2'), 'Candidates of an older text');
    assert.ok((await served.page.locator('.candidates li').count()) > 1);
    assert.equal(await served.page.locator('.candidates .insert:visible').count(), 0);
    await served.post(viewMessage(unsolvedView().view, 2));
    assert.equal(await served.page.locator('.candidates .insert:visible').count(), await served.page.locator('.candidates li').count());
    await served.page.close();
  });

  it('shows how far the solver is, until the next view', async () => {
    const served = await openPage('dark', 580);
    await served.post(viewMessage(sampleView()));
    assert.equal(await served.page.locator('.candidates-section').isVisible(), false);
    await served.post({ type: 'solving', document, version: 1, share: 0.42, text: '42 %, best margin so far 1.2 dB' });
    assert.equal(await served.page.locator('.candidates-section .progress').innerText(), '42 %, best margin so far 1.2 dB');
    assert.equal(await served.page.locator('.candidates-section progress').evaluate((bar) => (bar as HTMLProgressElement).value), 0.42);
    await served.post({ type: 'solving', document: 'file:///another', version: 1, share: 0.9, text: '90 %' });
    assert.match(await served.page.locator('.candidates-section .progress').innerText(), /^42 %/);
    await served.post(viewMessage(sampleView(), 2));
    assert.equal(await served.page.locator('.candidates-section').isVisible(), false);
    await served.page.close();
  });

  it('asks anew for the preview that is pointed at when a new view comes', async () => {
    const served = await openPage('dark', 580);
    const { view } = unsolvedView();
    await served.post(viewMessage(view, 3));
    await served.page.locator('.candidates li').nth(1).hover();
    await served.post(viewMessage(view, 4));
    const asked = await last(served, 'preview candidate');
    assert.ok(asked?.type === 'preview candidate' && asked.candidate === 1 && asked.version === 4);
    await served.page.close();
  });

  it('shows the spread of builds, its histogram and its cloud, and marks them as old', async () => {
    const served = await openPage('dark', 700);
    await served.post(viewMessage(spreadSample()));
    assert.match((await served.page.textContent('.yield-line')) ?? '', /% of 400 builds hold every goal/);
    assert.match((await served.page.textContent('.corner-line')) ?? '', /^worst corner/);
    assert.ok((await served.page.locator('svg.histogram .bar-held').count()) > 2);
    assert.equal(await served.page.locator('svg.histogram .corner-mark').count(), 1);
    assert.equal(await served.page.locator('svg.chart .cloud').count(), 24);
    await served.post(viewMessage(spreadSample(true), 2));
    assert.equal(await served.page.locator('svg.chart .cloud').count(), 0);
    assert.match((await served.page.textContent('.spread-section h2')) ?? '', /before the last change/);
    await served.post(viewMessage(sampleView(), 3));
    assert.ok(await served.page.locator('.spread-section').isHidden());
    await served.page.close();
  });

  it('lists codes by channel, moves the marker to the one that is chosen, and has the table written', async () => {
    const served = await openPage('dark', 580);
    const view = codesSample();
    await served.post(viewMessage(view, 2));
    const { channels, shown } = view.codes!;
    assert.equal(await served.page.locator('table.codes tbody tr').count(), channels.length);
    assert.match(await served.page.locator('table.codes tr.current').innerText(), new RegExp(channels[shown].text));
    assert.equal(await served.page.locator('table.codes [aria-current=true]').count(), 1);
    await served.page.locator('table.codes tbody button').nth(3).click();
    const moved = await last(served, 'move marker');
    assert.ok(moved?.type === 'move marker' && moved.frequencyHz === channels[3].frequencyHz);
    await served.page.locator('svg.stairs-plot').press('End');
    const ended = await last(served, 'move marker');
    assert.ok(ended?.type === 'move marker' && ended.frequencyHz === channels[channels.length - 1].frequencyHz);
    const box = (await served.page.locator('svg.stairs-plot').boundingBox())!;
    await served.page.mouse.click(box.x + box.width * 0.09, box.y + 60);
    const clicked = await last(served, 'move marker');
    assert.ok(clicked?.type === 'move marker' && clicked.frequencyHz === channels[0].frequencyHz);
    await served.page.getByText('Write table').click();
    assert.deepEqual(await last(served, 'write firmware'), { type: 'write firmware', document, version: 2 });
    await served.page.getByText('Save report').click();
    assert.deepEqual(await last(served, 'save report'), { type: 'save report', document });
    await served.page.getByText('Copy codes as CSV').click();
    const copied = await last(served, 'copy');
    assert.ok(copied?.type === 'copy' && copied.text.split('\r\n').length === channels.length + 2);
    assert.match(copied.text, /^frequency_hz,antcap,bank,margin_db\r\n902750000,/);
    assert.equal(await served.page.locator('svg.coverage-chart .covered').count(), 1);
    assert.equal(await served.page.locator('svg.coverage-chart .marker-dot').count(), 3);
    assert.deepEqual(await served.violations(), []);
    await served.post(viewMessage(sampleView(), 3));
    assert.ok(await served.page.locator('.codes-section').isHidden());
    await served.page.close();
  });

  it('leads from a goal and from a row to their lines', async () => {
    const served = await openPage('dark', 580);
    await served.post(viewMessage(sampleView()));
    await served.page.click('.goals li:nth-child(2) button');
    assert.deepEqual(await last(served, 'reveal line'), { type: 'reveal line', document, line: sampleView().goals[1].line });
    await served.page.click('tr[data-element="C1"] button.name');
    assert.deepEqual(await last(served, 'reveal line'), { type: 'reveal line', document, line: sampleView().ladder[2].line });
    await served.page.close();
  });

  it('draws what forms out of reach do match', async () => {
    const served = await openPage('light', 580);
    const view = wholeLadderView();
    await served.post(viewMessage(view));
    const forms = view.candidates!.outOfReach;
    assert.ok(forms.length > 0 && forms.length < 8);
    await served.page.locator('.reach summary').click();
    assert.equal(await served.page.locator('svg.reach-chart .covered').count(), forms.length);
    assert.equal(await served.page.locator('svg.reach-chart .case-cross').count(), forms.length);
    assert.deepEqual(await served.page.locator('.out-of-reach li span').allInnerTexts(), forms.map(({ text }) => text));
    assert.deepEqual(await served.violations(), []);
    await served.post(viewMessage(unsolvedView().view, 2));
    assert.ok(await served.page.locator('.reach').isHidden());
    await served.page.close();
  });

  it('steps a value by dragging its symbol, one step after each answer', async () => {
    const served = await openPage('dark', 580);
    await served.post(viewMessage(sampleView()));
    const steps = async () => (await served.said()).filter((message) => message.type === 'step value').map((message) => (message.type === 'step value' ? `${message.elementId} ${message.direction}` : ''));
    const symbol = served.page.locator('tr[data-element="C1"] td.symbol');
    await symbol.scrollIntoViewIfNeeded();
    const box = (await symbol.boundingBox())!;
    await served.page.mouse.move(box.x + 20, box.y + 20);
    await served.page.mouse.down();
    await served.page.mouse.move(box.x + 20, box.y - 10);
    assert.deepEqual(await steps(), ['C1 up']);
    await served.post(viewMessage(sampleView(), 2));
    assert.deepEqual(await steps(), ['C1 up', 'C1 up']);
    await served.post(viewMessage(sampleView(), 3));
    assert.equal((await steps()).length, 2);
    await served.page.mouse.move(box.x + 20, box.y + 12);
    assert.deepEqual((await steps()).at(-1), 'C1 down');
    await served.page.mouse.up();
    await served.page.mouse.move(box.x + 20, box.y + 90);
    await served.post(viewMessage(sampleView(), 4));
    assert.equal((await steps()).length, 3);
    await served.page.close();
  });

  it('lets row and arc stand out together, whichever is pointed at', async () => {
    const served = await openPage('dark', 580);
    await served.post(viewMessage(sampleView()));
    await served.page.hover('tr[data-element="C1"]');
    assert.ok(await served.page.locator('.arc[data-element="C1"].current').count());
    assert.deepEqual(await last(served, 'point at element'), { type: 'point at element', document, elementId: 'C1' });
    await served.post({ type: 'cursor', document, version: 1, elementId: 'L1', goalId: 0 });
    assert.ok(await served.page.locator('tr[data-element="L1"].current').count());
    assert.equal(await served.page.locator('tr[data-element="C1"].current').count(), 0);
    assert.ok(await served.page.locator('.goals li:first-child.current').count());
    await served.page.close();
  });

  it('moves the marker by dragging over a plot and by keys, and takes only the latest answer', async () => {
    const served = await openPage('dark', 580);
    const view = sampleView();
    await served.post(viewMessage(view));
    const plot = served.page.locator('svg.plot').first();
    await plot.scrollIntoViewIfNeeded();
    const box = (await plot.boundingBox())!;
    await served.page.mouse.move(box.x + box.width * 0.3, box.y + box.height / 2);
    await served.page.mouse.down();
    await served.page.mouse.move(box.x + box.width * 0.7, box.y + box.height / 2, { steps: 4 });
    await served.page.mouse.up();
    const moved = await last(served, 'move marker');
    assert.ok(moved?.type === 'move marker');
    const share = (0.7 * 540 - 44) / (540 - 44 - 24);
    assert.ok(Math.abs(moved.frequencyHz - (750e6 + share * 250e6)) < 2e6, `${moved.frequencyHz}`);
    const marker = { ...view.marker!, text: 'the latest' };
    await served.post({ type: 'marker', document, version: 1, request: moved.request - 1, marker: { ...marker, text: 'an old one' }, refusal: null });
    await served.post({ type: 'marker', document, version: 1, request: moved.request, marker, refusal: null });
    assert.equal(await plot.getAttribute('aria-valuetext'), 'the latest');
    await plot.focus();
    await plot.press('ArrowRight');
    const stepped = await last(served, 'move marker');
    assert.ok(stepped?.type === 'move marker' && stepped.frequencyHz === 867e6, JSON.stringify(stepped));
    await served.page.close();
  });

  it('keeps the last good picture through errors, marked as old, and says what is wrong where', async () => {
    const served = await openPage('dark', 580);
    await served.post(viewMessage(sampleView(), 3));
    await served.post({ type: 'stale', document, version: 4, reason: 'the text cannot be evaluated', problems: [{ severity: 'error', message: '«nF?» is not a unit here', line: 17 }] });
    assert.ok(await served.page.locator('.stale svg.chart .arc').count());
    assert.match((await served.page.textContent('.freshness'))!, /old numbers/);
    assert.match((await served.page.textContent('.problems'))!, /line 18: «nF\?» is not a unit here/);
    await served.post(viewMessage(sampleView(), 5));
    assert.equal(await served.page.locator('.stale').count(), 0);
    assert.equal(await served.page.textContent('.freshness'), 'up to date');
    await served.page.close();
  });

  it('names a description that cannot be shown yet, and not the one before it', async () => {
    const served = await openPage('dark', 580);
    await served.post(viewMessage(sampleView(), 3));
    await served.post({ type: 'stale', document: 'file:///b/other%20board.match.yaml', version: 4, reason: 'the text cannot be evaluated', problems: [] });
    assert.equal(await served.page.textContent('h1'), 'other board.match.yaml');
    assert.equal(await served.page.locator('svg.chart').isVisible(), false);
    await served.page.close();
  });

  it('drops messages that are older, foreign or no messages at all', async () => {
    const served = await openPage('dark', 580);
    await served.post(viewMessage(sampleView(), 7));
    const html = await served.page.innerHTML('main');
    for (const junk of [viewMessage({ ...sampleView(), title: 'older' }, 6), null, 5, 'view', {}, { type: 'view' }, { type: 'view', document, version: 8, view: { title: '<img src=x onerror=alert(1)>' } },
      { type: 'marker', document: 'another', version: 9, request: 0, marker: null, refusal: 'no' }, { type: 'constructor' }, { type: '__proto__' }]) {
      await served.post(junk as object);
    }
    assert.equal(await served.page.innerHTML('main'), html);
    await served.page.close();
  });

  it('shows text as text', async () => {
    const served = await openPage('dark', 580);
    const hostile = '<b id="hit">&amp;"\'</b>';
    await served.post(viewMessage(sampleView((text) => text.replace('free air:', 'free-air_<b>:').replace('Orchard frost sensor', hostile))));
    await served.post(viewMessage({ ...sampleView(), title: hostile, discs: [{ centreRe: 0, centreIm: 0, radius: 0.3, label: hostile }] }, 2));
    assert.equal(await served.page.locator('#hit').count(), 0);
    assert.equal(await served.page.textContent('h1'), hostile);
    assert.deepEqual(await served.violations(), []);
    await served.page.close();
  });

  it('copies the table and saves the chart as SVG and PNG', async () => {
    const served = await openPage('light', 580);
    await served.post(viewMessage(sampleView()));
    await served.page.click('text=Copy ladder as CSV');
    const csv = await last(served, 'copy');
    assert.ok(csv?.type === 'copy' && csv.text.includes('C1,shunt,4.3 pF'), JSON.stringify(csv));
    await served.page.click('text=Save chart as PNG');
    await served.page.waitForFunction(() => (window as unknown as { said: { type: string }[] }).said.some((message) => message.type === 'save'));
    const png = await last(served, 'save');
    assert.ok(png?.type === 'save' && Buffer.from(png.base64, 'base64').subarray(1, 4).toString() === 'PNG');
    await served.page.click('text=Save chart as SVG');
    const svg = await last(served, 'save');
    assert.ok(svg?.type === 'save' && Buffer.from(svg.base64, 'base64').toString().startsWith('<svg'));
    assert.deepEqual(await served.violations(), []);
    await served.page.close();
  });

  for (const [theme, what, view] of (Object.keys(bodyClass) as ThemeKind[]).flatMap((theme) => [
    [theme, 'a missed goal', sampleView((text) => text.replace('rejection >= 8 dB', 'rejection >= 12 dB'))] as const,
    [theme, 'candidates', unsolvedView().view] as const,
    [theme, 'a spread of builds', spreadSample()] as const,
    [theme, 'codes by channel', codesSample()] as const,
  ])) {
    it(`has nothing that axe finds serious in ${theme}, with ${what}`, async () => {
      const served = await openPage(theme, 580);
      await served.post(viewMessage(view));
      await served.page.evaluate(axeSource);
      const found = await served.page.evaluate(() => (window as unknown as { axe: { run(): Promise<{ violations: { id: string; impact: string; nodes: { html: string }[] }[] }> } }).axe.run());
      const serious = found.violations.filter(({ impact }) => impact === 'serious' || impact === 'critical').map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 120)).join(' | ')}`);
      assert.deepEqual(serious, []);
      await served.page.close();
    });
  }

  for (const width of [320, 580, 1000]) {
    it(`fits ${width} px without scrolling the page sideways`, async () => {
      const served = await openPage('dark', width);
      for (const [version, view] of [sampleView(), spreadSample(), unsolvedView().view, codesSample(), wholeLadderView()].entries()) {
        await served.post(viewMessage(view, version + 1));
        assert.ok((await served.page.evaluate(() => globalThis.document.documentElement.scrollWidth)) <= width);
      }
      await served.page.close();
    });
  }
});
