import assert from 'node:assert/strict';
import { readFileSync, writeFileSync } from 'node:fs';
import { chartBox, chartSummary, nearestTracePoint, smithChart } from '../../src/picture/smithChart';
import { chartRadius, conductanceCircle, reflectionOfNormalised, resistanceCircle } from '../../src/picture/chartGrid';
import { frequencyPlot, frequencyScale, frequencyUnit, plotSize } from '../../src/picture/frequencyPlot';
import { codeStairs, channelAt, stairsSize } from '../../src/picture/codeStairs';
import { coverageChart } from '../../src/picture/coverageChart';
import { goalBar } from '../../src/picture/goalBar';
import { ladderSymbol } from '../../src/picture/ladderSymbol';
import { placeLabels } from '../../src/picture/placeLabels';
import { standaloneStyle } from '../../src/picture/standaloneStyle';
import { escapeText, polyline, tag } from '../../src/picture/svg';
import type { LadderSymbol } from '../../src/messages/panel';
import { codesSample, sampleView } from '../page/sampleView';

const rewrite = process.env.UPDATE_EXPECTED === '1' && !process.env.CI;

/** Pictures live in files that one can open; numbers are rounded to two decimals by the drawing itself. */
function expectFile(name: string, markup: string): void {
  const path = new URL(`expected/${name}`, import.meta.url);
  if (rewrite) writeFileSync(path, markup);
  assert.equal(markup, readFileSync(path, 'utf8'), `${name} differs; look at it, then UPDATE_EXPECTED=1`);
}

const numbersOf = (d: string) => [...d.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)].map(([, x, y]) => [Number(x), Number(y)] as const);

describe('pictures', () => {
  const view = sampleView();
  const chart = smithChart(view);

  it('the chart of the sample', () => {
    const { x, y, width, height } = chartBox;
    expectFile('chart.svg', `<svg xmlns="http://www.w3.org/2000/svg" viewBox="${x} ${y} ${width} ${height}"><style>${standaloneStyle('light')}</style><rect class="paper" x="${x}" y="${y}" width="${width}" height="${height}"/>${chart}</svg>\n`);
  });

  it('what no lossless ladder gets inside of is a ring, beside the goals’ discs', () => {
    const ring = { centreRe: 0.2, centreIm: -0.1, radius: 0.3, label: 'Bode–Fano, an invented band: |Γ| 0.3' };
    const [, cx, cy, r, title] = /<circle class="limit" cx="([^"]+)" cy="([^"]+)" r="([^"]+)"><title>([^<]+)</.exec(smithChart({ ...view, limits: [ring] })) ?? [];
    assert.deepEqual([Number(cx), Number(cy), Number(r)], [0.2 * chartRadius, 0.1 * chartRadius, 0.3 * chartRadius]);
    assert.equal(title, ring.label);
    assert.ok(!smithChart({ ...view, limits: [] }).includes('class="limit"'));
  });

  it('the plots of the sample', () => {
    for (const plot of ['reflection', 'gain'] as const) {
      expectFile(`${plot}.svg`, `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${plotSize.width} ${plotSize.height}"><style>${standaloneStyle('dark')}</style><rect class="paper" width="${plotSize.width}" height="${plotSize.height}"/>${frequencyPlot({ ...view, plot, markerHz: view.marker!.frequencyHz })}</svg>\n`);
    }
  });

  describe('of codes', () => {
    const codes = codesSample().codes!;

    it('the staircase of the sample', () => {
      const { width, height } = stairsSize(codes);
      expectFile('stairs.svg', `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}"><style>${standaloneStyle('light')}</style><rect class="paper" width="${width}" height="${height}"/>${codeStairs(codes)}</svg>\n`);
    });

    it('the coverage of the sample', () => {
      const { x, y, width, height } = chartBox;
      expectFile('coverage.svg', `<svg xmlns="http://www.w3.org/2000/svg" viewBox="${x} ${y} ${width} ${height}"><style>${standaloneStyle('dark')}</style><rect class="paper" x="${x}" y="${y}" width="${width}" height="${height}"/>${coverageChart(codes.coverage!, 'a')}</svg>\n`);
    });

    it('stand at the level of each channel’s code, and a place on them is that channel', () => {
      const [, ...lanes] = codeStairs(codes).split('class="stairs');
      assert.equal(lanes.length, 2);
      const points = numbersOf(/d="([^"]+)"/.exec(lanes[0])![1]);
      assert.equal(points.length, 2 * codes.channels.length);
      codes.channels.forEach(({ codes: [first] }, at) => {
        const [[from, level], [to, same]] = points.slice(2 * at, 2 * at + 2);
        assert.equal(level, same);
        assert.ok(Math.abs(level - points[0][1] - ((codes.channels[0].codes[0] - first) / 31) * 64) < 0.02);
        assert.equal(channelAt(codes, (from + to) / 2), at);
      });
      assert.equal(channelAt(codes, -100), 0);
      assert.equal(channelAt(codes, 1e4), codes.channels.length - 1);
    });

    it('need no more than one channel, one code and no margin', () => {
      const alone = { tunables: [{ name: 'bank', low: 3, high: 3 }], channels: [{ ...codes.channels[0], codes: [3], marginDb: null }], shown: 0 };
      assert.doesNotMatch(codeStairs(alone), /NaN|Infinity|undefined/);
      assert.equal(channelAt(alone, 300), 0);
      assert.equal(codeStairs({ ...alone, channels: [] }), ' ');
    });

    it('hatch what is covered, and nothing else', () => {
      // A disc of radius 0.5 around 0.2 + 0.1j, as margins that fall off evenly from its middle.
      const across = 41;
      const marginDb = Array.from({ length: across * across }, (_, at) => {
        const [re, im] = [-1 + (2 * (at % across)) / (across - 1), -1 + (2 * Math.floor(at / across)) / (across - 1)];
        return Math.hypot(re, im) > 1 ? null : 10 * (0.5 - Math.hypot(re - 0.2, im - 0.1));
      });
      const drawn = coverageChart({ text: '', across, marginDb, cases: [] }, 'a');
      const rim = numbersOf(/class="covered" d="([^"]+)"/.exec(drawn)![1]);
      assert.ok(rim.length > 40);
      for (const [x, y] of rim) assert.ok(Math.abs(Math.hypot(x / chartRadius - 0.2, -y / chartRadius - 0.1) - 0.5) < 0.02, `${x} ${y}`);
      assert.ok(!coverageChart({ text: '', across: 3, marginDb: new Array<null>(9).fill(null), cases: [] }, 'a').includes('class="covered"'));
    });

    it('mark a load that is covered otherwise than one that is not', () => {
      const reflection = { re: 0.1, im: 0.2 };
      const drawn = coverageChart({ text: '', across: 2, marginDb: [null, null, null, null], cases: [{ caseName: 'a', text: '', holds: true, reflection }, { caseName: 'b', text: '', holds: false, reflection }, { caseName: 'c', text: '', holds: false, reflection: null }] }, 'a');
      assert.equal(drawn.match(/marker-dot case-0/g)?.length, 1);
      assert.equal(drawn.match(/case-cross case-1/g)?.length, 1);
      assert.ok(!drawn.includes('case-2'));
    });
  });

  it('arcs lead from the load through each element to the input', () => {
    const arcs = [...chart.matchAll(/class="arc[^"]*" data-element="(\w+)" d="([^"]+)"/g)].map(([, name, d]) => ({ name, points: numbersOf(d) }));
    assert.deepEqual(arcs.map(({ name }) => name), ['L1', 'C1', 'C2']);
    const reading = view.marker!.cases[0];
    const near = (point: readonly [number, number], at: { re: number; im: number }) => assert.ok(Math.hypot(point[0] - at.re * chartRadius, point[1] + at.im * chartRadius) < 0.02);
    near(arcs[0].points[0], reading.loadReflection!);
    arcs.slice(1).forEach(({ points }, i) => assert.deepEqual(points[0], arcs[i].points.at(-1)));
    near(arcs[2].points.at(-1)!, reading.inputReflection!);
  });

  it('traces stand where their numbers say, and are thick in the bands', () => {
    const [trace] = [...chart.matchAll(/class="trace case-0" d="([^"]+)"/g)].map(([, d]) => numbersOf(d));
    assert.equal(trace.length, view.frequencyHz.length);
    assert.ok(Math.abs(trace[10][0] - view.traces[0].reflection.re[10]! * chartRadius) < 0.01);
    assert.ok(Math.abs(trace[10][1] + view.traces[0].reflection.im[10]! * chartRadius) < 0.01);
    const [inBand] = [...chart.matchAll(/class="trace in-band case-0" d="([^"]+)"/g)].map(([, d]) => numbersOf(d));
    assert.equal(inBand.length, view.frequencyHz.filter((f) => f >= 863e6 && f <= 870e6).length);
  });

  it('points that are not known are gaps', () => {
    assert.equal(polyline([0, 1, null, 3, 4], [0, 1, 2, 3, 4]), 'M0 0L1 1M3 3L4 4');
  });

  it('text is escaped wherever it comes from', () => {
    const hostile = '<script>&"\'';
    assert.equal(escapeText(hostile), '&#60;script&#62;&#38;&#34;&#39;');
    assert.equal(tag('g', { id: hostile }), '<g id="&#60;script&#62;&#38;&#34;&#39;"/>');
    const drawn = smithChart({ ...view, discs: [{ centreRe: 0, centreIm: 0, radius: 0.1, label: hostile }], traces: view.traces.map((trace) => ({ ...trace, caseName: hostile })) });
    assert.doesNotMatch(drawn, /<script/);
  });

  it('has no style attribute, which the page’s policy forbids', () => {
    for (const markup of [chart, frequencyPlot({ ...view, plot: 'gain', markerHz: null }), goalBar(0.4)]) assert.doesNotMatch(markup, /style=/);
  });

  it('guide circles pass through the point that they belong to (standard geometry of the chart)', () => {
    for (const [r, x] of [[0.2, 0.7], [1, -1], [3, 2]] as const) {
      const reflection = reflectionOfNormalised(r, x);
      const point = { x: reflection.re * chartRadius, y: -reflection.im * chartRadius };
      for (const circle of [resistanceCircle(reflection)!, conductanceCircle(reflection)!]) {
        assert.ok(Math.abs(Math.hypot(point.x - circle.cx, point.y - circle.cy) - circle.r) < 1e-6);
      }
      assert.ok(Math.abs(resistanceCircle(reflection)!.r - chartRadius / (1 + r)) < 1e-6);
    }
    assert.equal(resistanceCircle({ re: 1, im: 0 }), null);
  });

  it('labels keep off each other', () => {
    const points = [{ x: 0, y: 0, text: 'C1' }, { x: 4, y: 3, text: 'C2' }, { x: -3, y: 5, text: 'load' }];
    const placed = placeLabels(points, chartBox, []);
    for (let i = 0; i < placed.length; i++) for (let j = 0; j < i; j++) assert.ok(Math.hypot(placed[i].x - placed[j].x, placed[i].y - placed[j].y) > 9);
  });

  it('the nearest point of a trace is found', () => {
    const at = 40;
    const x = view.traces[0].reflection.re[at]! * chartRadius;
    const y = -view.traces[0].reflection.im[at]! * chartRadius;
    assert.deepEqual(nearestTracePoint(view, x, y), { index: at, distance: 0 });
    assert.equal(nearestTracePoint({ traces: [] }, 0, 0), null);
  });

  it('says in words what it shows', () => {
    assert.match(chartSummary(view), /^Smith chart with the reflection trace of free air, wet bark\. At 866\.493 MHz, free air: Γ\u00a0/);
  });

  it('a mask has its feet on the side on which the trace may not be, and a cross beside it where missed', () => {
    const draw = (side: 'at most' | 'at least', ok: boolean) => frequencyPlot({
      plot: 'reflection', frequencyHz: [1e9, 2e9], traces: [], bands: [], markerHz: null,
      masks: [{ plot: 'reflection', side, levelDb: -10, startHz: 1.2e9, stopHz: 1.4e9, ok, goalId: 0 }],
    });
    const feet = (markup: string) => { const points = numbersOf(/class="mask[^"]*"[^>]* d="([^"]+)"/.exec(markup)![1]); return points[0][1] - points[1][1]; };
    assert.ok(feet(draw('at most', true)) < 0, 'above the bar');
    assert.ok(feet(draw('at least', true)) > 0, 'below the bar');
    assert.match(draw('at most', false), /class="mask missed"/);
  });

  it('frequency scales: units, a single point, none', () => {
    assert.deepEqual(frequencyUnit([700e6, 1e9]), { unit: 'MHz', hz: 1e6 });
    assert.deepEqual(frequencyUnit([2e9, 6e9]), { unit: 'GHz', hz: 1e9 });
    assert.deepEqual(frequencyUnit([100e3, 900e3]), { unit: 'kHz', hz: 1e3 });
    assert.equal(frequencyScale([]), null);
    assert.ok(Number.isFinite(frequencyScale([868e6])!(868e6)));
  });

  it('bars point to the right where a goal holds, to the left where not', () => {
    assert.match(goalBar(0.5), /class="bar-held" x="66"/);
    assert.match(goalBar(-0.5), /class="bar-missed" x="35"/);
    assert.doesNotMatch(goalBar(null), /bar-held|bar-missed/);
  });

  const symbols: readonly LadderSymbol[] = ['load', 'source', 'resistor', 'inductor', 'capacitor', 'branch', 'line', 'stub open', 'stub short', 'transformer', 'block', 'bridge', 'open', 'unsolved'];
  it('every symbol is drawn, in series and across, and no two of one place alike', () => {
    const across = symbols.filter((symbol) => !['load', 'source', 'line', 'transformer', 'bridge', 'block'].includes(symbol)).map((symbol) => ladderSymbol({ symbol, orientation: 'shunt' }));
    const along = symbols.filter((symbol) => !['stub open', 'stub short', 'open', 'block'].includes(symbol)).map((symbol) => ladderSymbol({ symbol, orientation: 'series' }));
    assert.equal(new Set(across).size, across.length);
    assert.equal(new Set(along).size, along.length);
  });
});
