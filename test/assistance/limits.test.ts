import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { hoverAt } from '../../src/assistance/hover';
import { limitLines, outOfReachNote } from '../../src/assistance/limitText';
import { panelView } from '../../src/assistance/panelView';
import { checkJson } from '../../src/report/checkJson';
import { reportHtml } from '../../src/report/reportHtml';
import { checkText } from '../../src/report/checkText';
import { bandLimits } from '../../src/solve/bandLimits';

const assessed = (text: string) => assess(`ohmward: 1\n${text}`, new Map(), { expressions: true });

function problemOf(text: string) {
  const { model: { problem }, diagnostics } = assessed(text);
  assert.deepEqual(diagnostics.filter(({ severity }) => severity === 'error'), []);
  assert.ok(problem);
  return problem;
}

// Bode 1945, Fano 1950 (Pozar, Microwave Engineering, Fig. 5.22): ln(1/|Γ|) is at most π/(R C Δω), or π R/(L Δω) in series.
// Both loads over 1–2 GHz; numbers derived: e^−2, and e^−1.25.
const rc = 'load: 50 Ω || 5 pF\nbands:\n  wide: 1 .. 2 GHz\n';
const rl = 'load: 50 Ω + 20 nH\nbands:\n  wide: 1 .. 2 GHz\n';
const ladder = 'ladder:\n  - series L1: 5 nH\n';
const asking = (goal: string) => `${rc}${ladder}goals:\n  - ${goal}\n`;

describe('how good a band could be', () => {
  it('is the published limit of canonical loads', () => {
    for (const [text, expected] of [[rc, 0.1353353], [rl, 0.2865048]] as const) {
      const [{ limit }] = bandLimits(problemOf(text + ladder));
      // Seven digits are printed.
      assert.ok(limit.reflection !== null && Math.abs(limit.reflection - expected) <= 1e-7, String(limit.reflection));
    }
  });

  it('goes with what equal ripple reaches, as published', () => {
    // Row B8 for Q·w = 1, after Fano 1950 and Matthaei, Young, Jones §4.09; numbers derived. ω0 C R w = Δω C R = 1.
    const [{ limit }] = bandLimits(problemOf(`load: 50 Ω || 3.183098862 pF\nbands:\n  wide: 1 .. 2 GHz\n${ladder}`));
    [0.4142136, 0.1715729, 0.1110106, 0.08615434].forEach((expected, i) => assert.ok(Math.abs(limit.byReactances[i] - expected) <= 1e-7, `${i + 1}`));
    assert.ok(limit.reflection !== null && Math.abs(limit.reflection - 0.04321392) <= 1e-8);
  });

  it('is not known of a ladder that is tuned anew at each channel', () => {
    const text = `${rc}tunables:\n  bank: capacitor 5 bits 1 pF .. 4 pF\nladder:\n  - shunt C1: tunable bank\ngoals:\n  - return loss >= 30 dB\n`;
    const problem = problemOf(text);
    assert.match(bandLimits(problem)[0].limit.reason ?? '', /tuned anew at each channel/);
    assert.equal(outOfReachNote(problem, { goal: problem.goals[0], ok: false }), '');
    assert.deepEqual(panelView(assessed(text), { fileName: 'a', pinned: false, markerHz: null })?.limits, []);
  });

  it('stands in the report, beside the goal and under the chart', () => {
    const html = reportHtml([{ path: 'a', view: panelView(assessed(asking('return loss >= 20 dB')), { fileName: 'a', pinned: false, markerHz: null }), messages: [] }]);
    assert.match(html, /<td class="left" colspan="5">out of reach without loss: /);
    assert.match(html, /<circle class="limit"/);
    assert.match(html, /dashed ring: Bode–Fano, wide: \|Γ\| 0\.14/);
  });

  it('is that of the case with the largest limit', () => {
    const [{ caseName }] = bandLimits(problemOf(`load:\n  light: 50 Ω || 1 pF\n  heavy: 50 Ω || 5 pF\nbands:\n  wide: 1 .. 2 GHz\n${ladder}`));
    assert.equal(caseName, 'heavy');
  });

  it('stands in what check gives to programs, with the model and its error', () => {
    const { files } = checkJson([{ path: 'a', assessment: assessed(rc + ladder) }]) as { files: { bands: { limit: unknown }[] }[] };
    const { reflection, model, fitError } = files[0].bands[0].limit as { reflection: number; model: string; fitError: number };
    assert.ok(Math.abs(reflection - 0.1353353) < 1e-7);
    assert.equal(model, 'parallel RC');
    assert.ok(fitError < 1e-9);
  });

  it('stands beside goals that no lossless ladder can meet, and only there', () => {
    const told: readonly (readonly [string, RegExp])[] = [
      ['return loss >= 20 dB', /out of reach without loss: over this band no lossless ladder gets below \|Γ\| 0\.14 \(17\.4 dB\)/],
      ['VSWR <= 1.2 in wide', /out of reach without loss/],
      ['gain >= -0.05 dB', /out of reach: over this band no ladder gets above −0\.0803 dB of gain/],
      ['insertion loss <= 0.05 dB', /out of reach: /],
      ['return loss >= 20 dB at 1 .. 2 GHz', /out of reach without loss: over these frequencies no/],
      ['return loss >= 17 dB', /^$/],
      ['return loss <= 3 dB', /^$/],
      ['gain >= -0.1 dB', /^$/],
      ['return loss >= 20 dB at 1.5 GHz', /^$/],
      ['return loss >= 20 dB into 50 Ω', /^$/],
    ];
    for (const [goal, expected] of told) {
      const assessment = assessed(asking(goal));
      const { evaluation, model: { problem } } = assessment;
      assert.ok(evaluation && problem);
      assert.match(outOfReachNote(problem, evaluation.goals[0]), expected, goal);
      const missed = assessment.diagnostics.find(({ code }) => code === 'goal-missed');
      if (missed) assert.equal(/out of reach/.test(missed.message), expected.source !== '^$', goal);
      assert.equal(/^ {6}out of reach/m.test(checkText({ path: 'a', assessment }, false)), expected.source !== '^$', goal);
    }
  });

  it('names the band where a goal goes over several', () => {
    const problem = problemOf(`${rc}  narrow: 1 .. 1.05 GHz\n${ladder}goals:\n  - return loss >= 20 dB\n  - return loss >= 20 dB in wide\n`);
    const notes = problem.goals.map((goal) => outOfReachNote(problem, { goal, ok: false }));
    assert.match(notes[0], /: over wide no lossless/);
    assert.match(notes[1], /: over this band no lossless/);
  });

  it('does not call out of reach what few points let through', () => {
    // Found by the search: at the two ends it is above 40 dB, where the range between has no more than 17.4 dB.
    const values = '  - shunt L1: 4.5438 nH\n  - series L2: 4.0976 nH\n  - shunt C1: 3.0317 pF\n  - series L3: 5.3955 nH\n';
    const asked = (points: number, parts = ladder) => `load: 50 Ω || 5 pF\nbands:\n  wide: 1 .. 2 GHz, ${points} points\n${parts}goals:\n  - return loss >= 40 dB\n`;
    assert.deepEqual([2, 5].map((points) => assessed(asked(points, `ladder:\n${values}`)).evaluation?.goals[0].ok), [true, false]);
    for (const points of [2, 4]) {
      const problem = problemOf(asked(points));
      assert.equal(outOfReachNote(problem, { goal: problem.goals[0], ok: false }), '', `${points}`);
      assert.ok(limitLines(problem, 'wide').includes(`Judged at ${points} points only: a ladder can be better at them and worse between.`));
    }
    const problem = problemOf(asked(5));
    assert.match(outOfReachNote(problem, { goal: problem.goals[0], ok: false }), /^out of reach without loss: /);
    assert.doesNotMatch(limitLines(problem, 'wide').join('\n'), /points only/);
  });

  it('says probably where only the error of the load’s model decides', () => {
    // Invented: R || C with a little resistance in series. |Γ| 0.1033 by the model, of which 0.0691 is certain.
    const text = (goal: string) => `load: (50 Ω || 5 pF) + 1 Ω\nbands:\n  wide: 1 .. 2 GHz\n${ladder}goals:\n  - ${goal}\n`;
    const noteOf = (goal: string) => {
      const problem = problemOf(text(goal));
      return outOfReachNote(problem, { goal: problem.goals[0], ok: false });
    };
    assert.match(noteOf('return loss >= 22 dB'), /^probably out of reach without loss: .* the load taken as 45\.9 Ω \|\| 4\.79 pF \(within \|Γ\| 0\.034\)$/);
    assert.match(noteOf('return loss >= 24 dB'), /^out of reach without loss: /);
    assert.match(noteOf('gain >= -0.04 dB'), /^probably out of reach: /);
    assert.match(noteOf('gain >= -0.01 dB'), /^out of reach: /);
  });

  it('is told on hover of a missed goal and of its band', () => {
    const text = `ohmward: 1\n${asking('return loss >= 20 dB')}`;
    const assessment = assess(text, new Map(), { expressions: true });
    const hover = (word: string) => (hoverAt(assessment, text.indexOf(word) + 1)?.markdown ?? '').replaceAll('\\', '');
    const few = 'Equal ripple reaches |Γ| 0.55 (5.21 dB) with 1, 0.3 (10.4 dB) with 2, 0.23 (12.8 dB) with 3, 0.2 (14.1 dB) with 4 reactances in all';
    for (const [word, first] of [['return loss', 'Out of reach without loss: over this band no lossless ladder gets below |Γ| 0.14 (17.4 dB).'], ['wide', 'No lossless ladder gets below |Γ| 0.14 (17.4 dB)']] as const) {
      for (const part of [first, 'The load is taken as 50 Ω || 5 pF', few]) assert.ok(hover(word).includes(part), `${part}\n${hover(word)}`);
    }
    const near = `ohmward: 1\n${asking('return loss >= 16 dB')}`;
    assert.match(hoverAt(assess(near, new Map(), { expressions: true }), near.indexOf('return loss'))?.markdown ?? '', /No lossless ladder gets below/);
  });

  it('is told of a band with its model and what a few reactances can do', () => {
    const lines = limitLines(problemOf(rc + ladder), 'wide').join('\n');
    assert.match(lines, /\|Γ\| 0\.14 \(17\.4 dB\)/);
    assert.match(lines, /The load is taken as 50 Ω \|\| 5 pF; between the two \|Γ\| is below 0\.005/);
    assert.deepEqual(limitLines(problemOf(`load: 50 Ω\nbands:\n  one: 1 GHz\n${ladder}`), 'one'), []);
    assert.match(limitLines(problemOf(`load: (200 Ω || 3 nH) + 5 Ω + 1 pF\nbands:\n  wide: 1 .. 4 GHz\n${ladder}`), 'wide')[0], /No limit is known: a .* is not much like this load/);
  });

  it('is a ring on the chart, moved where the source is not z0', () => {
    const view = (text: string) => panelView(assessed(text), { fileName: 'a', pinned: false, markerHz: null });
    const [ring] = view(rc + ladder)?.limits ?? [];
    assert.ok(ring && Math.hypot(ring.centreRe, ring.centreIm) < 1e-12 && Math.abs(ring.radius - 0.1353353) < 1e-7);
    assert.equal(ring.label, 'Bode–Fano, wide: |Γ| 0.14');
    const [moved] = view(`${rc}source: 20 + j10 Ω\n${ladder}`)?.limits ?? [];
    assert.ok(moved && Math.hypot(moved.centreRe, moved.centreIm) > 0.3);
    assert.deepEqual(view(`load: 50 Ω\nbands:\n  wide: 1 .. 2 GHz\n${ladder}`)?.limits, []);
  });
});
