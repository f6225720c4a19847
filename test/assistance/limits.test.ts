import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { limitLines, outOfReachNote } from '../../src/assistance/limitText';
import { panelView } from '../../src/assistance/panelView';
import { checkJson } from '../../src/report/checkJson';
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
      assert.equal(/out of reach/.test(checkText({ path: 'a', assessment }, false)), expected.source !== '^$', goal);
    }
  });

  it('is told of a band with its model and what a few reactances can do', () => {
    const lines = limitLines(problemOf(rc + ladder), 'wide').join('\n');
    assert.match(lines, /\|Γ\| 0\.14 \(17\.4 dB\).*The load is taken as 50 Ω \|\| 5 pF/);
    assert.match(lines, /1: [\d.]+ dB, 2: [\d.]+ dB, 3: [\d.]+ dB, 4: [\d.]+ dB/);
    assert.deepEqual(limitLines(problemOf(`load: 50 Ω\nbands:\n  one: 1 GHz\n${ladder}`), 'one'), []);
    assert.match(limitLines(problemOf(`load: (200 Ω || 3 nH) + 5 Ω + 1 pF\nbands:\n  wide: 1 .. 4 GHz\n${ladder}`), 'wide')[0], /is not known: a .* is not much like this load/);
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
