import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import type { LoadedFile } from '../../src/description/files';
import { readTouchstone } from '../../src/network/touchstone/readTouchstone';
import { evaluate } from '../../src/study/evaluate';
import { read, soundProblem } from './support';

/** The example with which the language is introduced, every key of the first rank in it. Its files are invented. */
const text = `ohmward: 1                                   # language version; required, with load and ladder
title: Orchard frost sensor, antenna port
z0: 50 Ω                                     # reference for the chart and VSWR; real, positive; default 50 Ω
source: 50 Ω                                 # the radio's own port; default z0
power: 14 dBm                                # available from the source, for voltage, current, heat; default 0 dBm
bands:
  uplink: 863 .. 870 MHz
  rx2: 869.525 MHz                           # a single frequency is a band of one point
sweep: 700 MHz .. 1.2 GHz, 401 points        # what is plotted; default: lowest edge × 0.8 .. highest × 1.25, 201 points
load:
  free air: frost-free-air.s1p
  wet bark: frost-wet-bark.s1p
fixture:                                     # from the load outwards: what lay between it and the analyser
  - line F1: 50 Ω, 11 mm, vf 0.66
ladder:                                      # first line at the load, last line at the source
  - series L1: 13 nH from coils
  - shunt C1: solve from caps
  - series C2: solve from caps or none
parts:
  coils: inductor E24 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz SRF 7 GHz
  caps: capacitor E24 0.5 pF .. 47 pF ±0.1 pF Q 180 @ 1 GHz ESL 0.35 nH
  drawer: stock.csv
let:
  f0: 866.5 MHz
goals:
  - return loss >= 12 dB in uplink
  - gain >= -1.5 dB in uplink
  - rejection >= 18 dB at 2 x uplink into 50 Ω
  - yield >= 95 %
`;

const fixture = (path: string) => readFileSync(new URL(`../fixtures/${path}`, import.meta.url));

function load(path: string, kind: string): LoadedFile {
  if (kind === 'csv') return { form: 'csv', text: fixture(path).toString('utf8') };
  const result = readTouchstone(path, fixture(path));
  assert.ok(result.ok);
  return { form: 'touchstone', data: result.data, warnings: [] };
}

describe('the main example of the language', () => {
  const files = new Map(read(text).files.map(({ path, kind }) => [path, load(path, kind)]));

  it('reads and resolves without a mistake', () => {
    const problem = soundProblem(text, files);
    assert.deepEqual(problem.bands.map(({ name, frequencyHz }) => `${name} ${frequencyHz.length}`), ['uplink 21', 'rx2 1']);
    assert.equal(problem.sweepHz.length, 401);
    assert.deepEqual(problem.cases.map(({ name, load: { form }, fixture: removed }) => [name, form, removed.length]), [['free air', 'file', 1], ['wet bark', 'file', 1]]);
    assert.deepEqual(problem.ladder.map(({ name, form }) => `${name} ${form}`), ['L1 branch', 'C1 unsolved', 'C2 unsolved']);
    assert.deepEqual(problem.unknowns.map(({ name, mayOmit }) => [name, mayOmit]), [['C1', false], ['C2', true]]);
    assert.deepEqual(problem.families.map(({ name, kind }) => `${name} ${kind}`), ['coils inductor', 'caps capacitor', 'drawer mixed']);
    assert.deepEqual(problem.goals.map(({ line }) => line), [26, 27, 28, 29]);
  });

  it('can be evaluated once its values are there', () => {
    const solved = text.replace('solve from caps or none', '18 pF from caps').replace('solve from caps', '4.3 pF from caps');
    const evaluation = evaluate(soundProblem(solved, files));
    assert.equal(evaluation.bands.length, 2);
    for (const result of evaluation.goals.slice(0, 2)) assert.ok(result.value !== null && Number.isFinite(result.value), result.reason ?? '');
  });
});
