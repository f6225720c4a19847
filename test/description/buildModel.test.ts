import assert from 'node:assert/strict';
import { buildModel } from '../../src/description/buildModel';
import { readDescription } from '../../src/description/readDescription';
import type { Element } from '../../src/network/element';
import { seedFiles, seeds } from '../hostile/descriptionSeeds';
import { evenly, files, marks, model, onePort, soundProblem, touchstone } from './support';

const bare = 'ohmward: 1\nload: 18 - j37 Ω\nladder: []\n';
const bands = 'bands: {up: 863 .. 870 MHz}\n';
const told = (text: string, loaded = seedFiles) => marks(text, model(text, loaded).diagnostics);
const flat = touchstone(onePort(evenly(800e6, 900e6, 11), () => ({ re: 20, im: -30 })));

const partOf = (element: Element | undefined) => (element?.form === 'branch' && element.branch.form === 'part' ? element.branch.part : null);
const near = (actual: number | undefined, expected: number) => assert.ok(actual !== undefined && Math.abs(actual - expected) <= 1e-12 * Math.abs(expected), `${actual} is not ${expected}`);

describe('the problem of a description', () => {
  it('takes the defaults of the language', () => {
    const problem = soundProblem(bare + bands);
    assert.equal(problem.title, null);
    assert.equal(problem.z0Ohm, 50);
    assert.equal(problem.availablePowerW, 1e-3);
    assert.deepEqual(problem.source.impedance, { form: 'constant', impedanceOhm: { re: 50, im: 0 } });
    assert.deepEqual(problem.spread, { distribution: 'uniform', builds: 10_000, seed: 1 });
    assert.equal(problem.channelsHz, null);
    assert.equal(problem.firmware, null);
    assert.deepEqual(problem.cases, [{ name: null, load: { form: 'constant', impedanceOhm: { re: 18, im: -37 } }, fixture: [] }]);
  });

  it('judges a band at 21 points with both ends, unless it says otherwise', () => {
    const problem = soundProblem(`${bare}bands:\n  up: 863 .. 870 MHz\n  fine: 863 .. 870 MHz, 31 points, watch\n  rx: 869.525 MHz\n  steps: 100 MHz .. 200 MHz step 25 MHz\n`);
    const [up, fine, rx, steps] = problem.bands;
    assert.equal(up.frequencyHz.length, 21);
    assert.deepEqual([up.frequencyHz[0], up.frequencyHz[10], up.frequencyHz[20]], [863e6, 866.5e6, 870e6]);
    assert.deepEqual([fine.frequencyHz.length, fine.watch, up.watch], [31, true, false]);
    assert.deepEqual([...rx.frequencyHz], [869.525e6]);
    assert.deepEqual([...steps.frequencyHz], [100e6, 125e6, 150e6, 175e6, 200e6]);
  });

  it('sweeps from the lowest edge × 0.8 to the highest × 1.25 in 201 points by default', () => {
    const { sweepHz } = soundProblem(`${bare}bands:\n  b: 1 .. 2 GHz\n  a: 400 .. 500 MHz\n`);
    assert.equal(sweepHz.length, 201);
    near(sweepHz[0], 320e6);
    near(sweepHz[200], 2.5e9);
    const stated = soundProblem(`${bare}${bands}sweep: 700 MHz .. 1.2 GHz, 401 points\n`);
    assert.deepEqual([stated.sweepHz.length, stated.sweepHz[0], stated.sweepHz[400]], [401, 700e6, 1.2e9]);
    assert.equal(soundProblem(`${bare}${bands}sweep: 700 MHz .. 1.2 GHz\n`).sweepHz.length, 201);
  });

  it('takes the common span of the load files where no band is stated', () => {
    const loaded = files({ 'a.s1p': flat, 'b.s1p': touchstone(onePort(evenly(850e6, 950e6, 11), () => ({ re: 20, im: 0 }))) });
    const problem = soundProblem('ohmward: 1\nload: {a: a.s1p, b: b.s1p + 2 Ω, c: 12 Ω}\nladder: []\n', loaded);
    assert.deepEqual(problem.bands.map(({ name, frequencyHz }) => [name, frequencyHz[0], frequencyHz[20], frequencyHz.length]), [['all', 850e6, 900e6, 21]]);
  });

  it('says so where no band can be had', () => {
    assert.deepEqual(told(bare), ['no-bands: 18 - j37 Ω']);
    assert.equal(model(bare).problem, null);
    const apart = files({ 'a.s1p': flat, 'b.s1p': touchstone(onePort(evenly(950e6, 990e6, 11), () => ({ re: 20, im: 0 }))) });
    const text = 'ohmward: 1\nload:\n  a: a.s1p\n  b: b.s1p\nladder: []\n';
    assert.deepEqual(told(text, apart), ['no-common-span: a: a.s1p']);
  });

  it('hides no error behind a crowd of warnings', () => {
    const doubtful = Array.from({ length: 150 }, (_, i) => `  - shunt L${i}: 4.7 GH\n`).join('');
    const { diagnostics } = model(`ohmward: 1\n${bands}load: 50 Ω\nladder:\n${doubtful}  - series C1: 1 pf\n`);
    assert.equal(diagnostics.length, 100);
    assert.deepEqual(diagnostics.filter(({ severity }) => severity === 'error').map(({ code }) => code), ['unit-unknown']);
  });

  it('tells a band that cannot be read once, and judges no goal over the span of the files instead', () => {
    const faulty = 'ohmward: 1\nbands: {up: 870 .. 863 MHz}\nload: a.s1p\nladder: []\n';
    assert.deepEqual(told(faulty.replace('a.s1p', '50 Ω')), ['range-upside-down: 870 .. 863 MHz']);
    const { problem } = model(faulty, files({ 'a.s1p': flat }));
    assert.deepEqual(problem?.bands.map(({ name, watch }) => [name, watch]), [['all', true]]);
  });

  it('waits in silence for files that have not been read', () => {
    const text = 'ohmward: 1\nload: a.s1p\nladder: []\n';
    assert.deepEqual(told(text, new Map()), []);
    assert.equal(model(text, new Map()).problem, null);
    const { problem } = model(text + bands, new Map());
    assert.deepEqual(problem?.cases[0].load, { form: 'unknown', reason: 'a.s1p has not been read yet' });
  });

  it('reports a file that is missing, refused or unreadable at its path, and goes on', () => {
    const text = `ohmward: 1\nload:\n  a: gone.s1p\n  b: far.s1p\n  c: odd.s1p\n  d: free.s1p\nladder:\n  - block B1: gone2.s2p\n${bands}`;
    const loaded = new Map([...seedFiles, ['odd.s1p', { form: 'unreadable', message: 'a number is missing', line: 7 } as const], ['gone2.s2p', { form: 'missing' } as const]]);
    const { problem, diagnostics } = model(text, loaded);
    assert.deepEqual(marks(text, diagnostics), ['file-missing: gone.s1p', 'file-refused: far.s1p', 'file-unreadable: odd.s1p', 'file-missing: gone2.s2p']);
    assert.match(diagnostics[2].message, /line 7/);
    assert.deepEqual(problem?.cases.map(({ load }) => load.form), ['unknown', 'unknown', 'unknown', 'file']);
    assert.deepEqual(problem?.ladder, [{ form: 'faulty', name: 'B1', orientation: 'through', reason: 'gone2.s2p is missing' }]);
  });

  it('removes a fixture from files only, and a case’s own instead of the common one', () => {
    const text = `ohmward: 1\nload:\n  a: free.s1p\n  b: {file: wet.s1p, fixture: [series R9: 1 Ω]}\n  c: 12 Ω\n  d: {file: wet.s1p, fixture: []}\nfixture:\n  - line F1: 50 Ω, 11 mm\nladder: []\n${bands}`;
    const problem = soundProblem(text, seedFiles);
    assert.deepEqual(problem.cases.map(({ fixture }) => fixture.map((element) => element.name)), [['F1'], ['R9'], [], []]);
  });

  it('warns of a load that reflects more than it receives, at its own frequencies', () => {
    const loaded = files({ 'a.s1p': touchstone(onePort(evenly(800e6, 900e6, 11), () => ({ re: 2, im: -30 }))) });
    const text = `ohmward: 1\nload: a.s1p\nfixture:\n  - line F1: 50 Ω, 11 mm, vf 0.66, 3 dB @ 1 GHz\nladder: []\n`;
    const { problem, diagnostics } = model(text, loaded);
    assert.deepEqual(marks(text, diagnostics), ['reflection-above-one: a.s1p']);
    assert.equal(diagnostics[0].severity, 'warning');
    assert.ok(problem);
    assert.deepEqual(told(text.replace('3 dB', '0.01 dB'), loaded), []);
  });

  it('keeps everything that can be computed beside a mistake', () => {
    const text = `ohmward: 1\nload:\n  good: 20 - j30 Ω\n  bad: 20 - k30 Ω\nladder:\n  - series L1: 3 nH\n  - shunt C1: 3 nF from nowhere\n  - series L2: 4.7 nF\n${bands}goals:\n  - return loss >= 10 dB\n  - return loss >= 10 dB in down\n`;
    const { problem } = model(text);
    assert.deepEqual(problem?.cases.map(({ load }) => load.form), ['constant', 'unknown']);
    assert.deepEqual(problem?.ladder.map(({ name, form }) => `${name} ${form}`), ['L1 branch', 'C1 branch', 'L2 faulty']);
    assert.deepEqual(problem?.goals.map(({ line }) => line), [11]);
  });

  it('knows nothing beyond the load without a ladder that can be read', () => {
    for (const ladder of ['', 'ladder:\n', 'ladder: slove up to 3 elements\n', 'ladder:\n  - L1\n', 'ladder:\n  - serise L1: 3 nH\n', `ladder:\n${'  - shunt C1: 1 pF\n'.repeat(201)}`]) {
      const { problem } = model(`ohmward: 1\nload: 18 - j37 Ω\n${ladder}${bands}`);
      assert.ok(problem?.ladder.some(({ form }) => form === 'faulty'), ladder);
    }
  });

  it('does not tell the uses of a band that cannot be read', () => {
    const text = `${bare}bands:\n  up: 863 .. 870 MHz\n  down: 902 to 928 MHz\nsource: {down: 50 Ω}\ngoals:\n  - gain >= -1 dB in down\n  - gain >= -1 dB in up\n`;
    const { problem, diagnostics } = model(text);
    assert.deepEqual(diagnostics.map(({ span }) => text.slice(0, span.start).split('\n').length), [6]);
    assert.deepEqual(problem?.goals.map(({ line }) => line), [10]);
  });

  it('can be posted to a worker', () => {
    for (const text of seeds) {
      const { problem } = model(text, seedFiles);
      assert.deepEqual(structuredClone(problem), problem);
    }
  });

  it('carries the diagnostics of the reading, in the order of the text, at most a hundred', () => {
    const text = `titel: x\n${bare}${bands}goals:\n${'  - gain >= -1 dB in down\n'.repeat(150)}`;
    const { diagnostics } = buildModel(readDescription(text, { expressions: true }), new Map());
    assert.equal(diagnostics.length, 100);
    assert.equal(diagnostics[0].code, 'unknown-key');
    assert.equal(diagnostics[99].code, 'unknown-band');
  });
});

describe('names in a description', () => {
  it('are reported where nothing has them, with the nearest that something has', () => {
    const text = `${bare.replace('[]', '\n  - series L1: 3 nH from coil\n  - shunt C1: tunable antcp')}bands: {uplink: 863 .. 870 MHz}
parts: {coils: inductor E24 1 nH .. 47 nH}
tunables: {antcap: capacitor 3 bits 1 pF .. 4 pF}
source: {uplnk: 50 Ω}
channels: upling
goals:
  - gain >= -1 dB in uplinc
  - gain >= -1 dB at 2 x uplick
  - voltage L2 <= 3 V
  - rejection >= 3 dB at 1 GHz against uplonk
  - gain >= -1 dB for dry
`;
    assert.deepEqual(told(text), [
      'unknown-family: coil', 'unknown-tunable: antcp', 'unknown-band: uplnk', 'unknown-band: upling', 'unknown-band: uplinc', 'unknown-band: uplick', 'unknown-element: L2', 'unknown-band: uplonk', 'unknown-case: dry',
    ]);
    const fixes = model(text).diagnostics.map((each) => each.fixes?.[0]?.edits[0].text);
    assert.deepEqual(fixes, ['coils', 'antcap', 'uplink', 'uplink', 'uplink', 'uplink', 'L1', 'uplink', undefined]);
  });

  it('are each given once', () => {
    const text = `ohmward: 1\nload: 5 Ω\nfixture:\n  - line X1: 50 Ω, 3 mm\nladder:\n  - series L1: 3 nH\n  - shunt L1: 4 nH\n  - series X1: 5 nH\n${bands}`;
    assert.deepEqual(told(text), ['duplicate-name: L1', 'duplicate-name: X1']);
    const own = `ohmward: 1\nload:\n  a: {file: free.s1p, fixture: [series L1: 1 nH]}\n  b: {file: free.s1p, fixture: [series F1: 1 nH]}\n  c: {file: free.s1p, fixture: [series F1: 1 nH]}\nladder:\n  - series L1: 3 nH\n${bands}`;
    assert.deepEqual(told(own), ['duplicate-name: L1'], 'the fixtures of two cases are never in place at once');
  });
});

describe('the source', () => {
  const source = (line: string) => soundProblem(`${bare}${bands}${line}\n`).source;

  it('is the port itself, or the conjugate of what the port wants to see', () => {
    assert.deepEqual(source('source: 18 + j22 Ω').impedance, { form: 'constant', impedanceOhm: { re: 18, im: 22 } });
    assert.deepEqual(source('source: wants 18 - j22 Ω').impedance, { form: 'constant', impedanceOhm: { re: 18, im: 22 } });
    const gamma = source('source: wants gamma 0.5 at 90°').impedance;
    assert.ok(gamma.form === 'reflection' && Math.abs(gamma.reflection.im + 0.5) < 1e-15);
  });

  it('follows z0', () => assert.deepEqual(source('z0: 75 Ω').impedance, { form: 'constant', impedanceOhm: { re: 75, im: 0 } }));

  it('may differ by band', () => {
    const { byBand, impedance } = source('source: {up: wants 18 - j22 Ω}');
    assert.deepEqual([...byBand], [['up', { form: 'constant', impedanceOhm: { re: 18, im: 22 } }]]);
    assert.deepEqual(impedance, { form: 'constant', impedanceOhm: { re: 50, im: 0 } });
  });

  it('has a positive real part', () => {
    for (const phrase of ['0 + j22 Ω', '3 nH', 'open', 'gamma 1 at 20°']) {
      const text = `${bare}${bands}source: ${phrase}\n`;
      const { problem, diagnostics } = model(text);
      assert.ok(diagnostics.some(({ severity }) => severity === 'error'), phrase);
      assert.equal(problem?.source.impedance.form, 'unknown', phrase);
    }
  });

  it('cannot want a network of coils and capacitors', () => {
    assert.deepEqual(told(`${bare}${bands}source: wants 12 Ω + 3 pF\n`), ['wants-network: 12 Ω + 3 pF']);
  });
});

describe('settings of a description', () => {
  it('are carried over', () => {
    const problem = soundProblem(seeds[1], seedFiles);
    assert.deepEqual(problem.spread, { distribution: 'normal', builds: 2000, seed: 7 });
    assert.deepEqual(problem.firmware, { header: '../firmware/include/antenna_codes.h', json: null, symbol: 'antenna_codes' });
    near(soundProblem(seeds[0], seedFiles).availablePowerW, 10 ** 1.4 / 1000);
  });

  it('matter only with tunable parts', () => {
    assert.deepEqual(told(`${bare}${bands}channels: up\nfirmware: {header: a.h}\n`).map((each) => each.split(':')[0]), ['channels-without-tunables', 'firmware-without-tunables']);
  });
});

describe('parts of the ladder', () => {
  const ladder = (line: string, rest = '') => soundProblem(`ohmward: 1\nload: 5 Ω\nladder:\n  - ${line}\n${bands}${rest}`, seedFiles).ladder[0];
  const coils = 'parts:\n  coils: inductor E24 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz SRF 7 GHz rated 300 mA\n  caps: capacitor [1 pF, 2.2 pF] ±0.1 pF SRF 6 GHz\n';

  it('take from their family each figure that they do not state', () => {
    assert.deepEqual(partOf(ladder('series L1: 13 nH from coils', coils)), {
      kind: 'inductor', value: 1.3e-8, loss: { law: 'skin effect', q: 32, atHz: 9e8 }, eslH: 0, srfHz: 7e9, tolerance: { form: 'relative', up: 0.05, down: 0.05 },
      rating: { peakVoltageV: null, rmsCurrentA: 0.3, dissipationW: null }, measured: null,
    });
    const own = partOf(ladder('series L1: 13 nH ESR 0.5 Ω +10 % -5 % rated 0.1 W from coils', coils));
    assert.deepEqual(own?.loss, { law: 'resistance', resistanceOhm: 0.5 }, 'the loss is one figure');
    assert.deepEqual(own?.tolerance, { form: 'relative', up: 0.1, down: 0.05 });
    assert.deepEqual(own?.rating, { peakVoltageV: null, rmsCurrentA: 0.3, dissipationW: 0.1 });
  });

  it('turn the SRF of a capacitor into its ESL', () => {
    const part = partOf(ladder('shunt C1: 2.2 pF from caps', coils));
    near(part?.eslH, 1 / ((2 * Math.PI * 6e9) ** 2 * 2.2e-12));
    assert.equal(part?.srfHz, null);
    near(partOf(ladder('shunt C1: 2.2 pF ESL 0.3 nH from caps', coils))?.eslH, 0.3e-9);
  });

  it('come from their family without a unit that tells the kind', () => {
    assert.equal(partOf(ladder('series X1: 13 nH from coils', coils))?.kind, 'inductor');
  });

  it('are doubted where the family has no such value, with the nearest as fixes', () => {
    const text = `ohmward: 1\nload: 5 Ω\nladder:\n  - series L1: 12.5 nH from coils\n  - shunt C1: 5 pF from caps\n${bands}${coils}`;
    const { diagnostics, problem } = model(text);
    assert.deepEqual(marks(text, diagnostics), ['value-not-in-family: 12.5 nH', 'value-not-in-family: 5 pF']);
    assert.deepEqual(diagnostics.map(({ severity, fixes }) => [severity, ...(fixes ?? []).map((fix) => fix.edits[0].text)]), [['warning', '12 nH', '13 nH'], ['warning', '2.2 pF']]);
    assert.equal(partOf(problem?.ladder[0])?.value, 1.25e-8);
    assert.deepEqual(partOf(problem?.ladder[0])?.loss, { law: 'skin effect', q: 32, atHz: 9e8 });
  });

  it('cannot be of another kind than their family', () => {
    const text = `ohmward: 1\nload: 5 Ω\nladder:\n  - series L1: 13 nH from caps\n  - shunt C1: solve from coils\n${bands}${coils}`;
    assert.deepEqual(told(text), ['kind-mismatch: caps', 'kind-mismatch: coils']);
  });

  it('state figures of a family’s kind only', () => {
    const text = `ohmward: 1\nload: 5 Ω\nladder: []\n${bands}parts:\n  rs: resistor E24 1 Ω .. 10 Ω Q 3\n`;
    assert.equal(model(text).diagnostics.length, 1);
  });

  it('are doubted far from any sense', () => {
    assert.deepEqual(told(`ohmward: 1\nload: 5 Ω\nladder:\n  - series L1: 4.7 H\n  - shunt C1: 10 mF\n  - series C2: 100 nF\n  - shunt L2: 10 µH\n${bands}`), ['doubtful-value: 4.7 H', 'doubtful-value: 10 mF']);
  });

  it('may be windings', () => {
    const part = partOf(ladder('series L2: "coil 6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm"'));
    // Wheeler 1928: L = d² n² / (18 d + 40 l) in µH and inches, good to 1 % for l > 0.4 d; from memory.
    const wheelerH = (((5 / 25.4) ** 2 * 36) / (18 * (5 / 25.4) + 40 * (7 / 25.4))) * 1e-6;
    assert.ok(part && Math.abs(part.value / wheelerH - 1) < 0.03, `${part?.value} against ${wheelerH}`);
    assert.ok(part.srfHz !== null && part.srfHz > 5e8 && part.loss.law === 'skin effect' && part.loss.q > 20);
  });

  it('may be branches, pairs, bridges and empty places', () => {
    const trap = ladder('shunt trap: 3.9 nH Q 40 + 1.2 pF');
    assert.ok(trap.form === 'branch' && trap.branch.form === 'series' && trap.branch.members.length === 2 && trap.orientation === 'shunt');
    const pair = ladder('series L1: pair 5.6 nH');
    assert.ok(pair.form === 'branch' && pair.pair && partOf(pair)?.value === 5.6e-9);
    assert.deepEqual(ladder('series R1: 0 Ω'), { form: 'bridge', name: 'R1', orientation: 'series' });
    assert.deepEqual(ladder('shunt C1: not fitted'), { form: 'not fitted', name: 'C1', orientation: 'shunt', kind: 'capacitor' });
  });

  it('cannot be solved or tuned inside a branch, a load or a fixture', () => {
    const text = `ohmward: 1\nload: 5 Ω + solve\nfixture:\n  - series L9: solve\nladder:\n  - series X1: 3 nH + solve\n${bands}`;
    const { diagnostics } = model(text);
    assert.deepEqual(diagnostics.filter(({ severity }) => severity === 'error').map(({ span }) => text.slice(0, span.start).split('\n').length), [2, 4, 6]);
  });
});

describe('lines, transformers and blocks', () => {
  const ladder = (line: string) => soundProblem(`ohmward: 1\nload: 5 Ω\nladder:\n  - ${line}\n${bands}`, seedFiles).ladder[0];
  const line = (text: string) => {
    const element = ladder(text);
    assert.ok(element.form === 'line' || element.form === 'stub');
    return element.line;
  };

  it('read lengths in metres and in wavelengths', () => {
    assert.deepEqual(line('line T1: 50 Ω, 6 mm, vf 0.55'), { impedanceOhm: 50, lengthM: 0.006, velocityFactor: 0.55, conductorLossDb: 0, dielectricLossDb: 0, lossAtHz: 1 });
    near(line('line T1: 50 Ω, 90° at 868 MHz').lengthM, 299_792_458 / 868e6 / 4);
    near(line('stub short S1: 50 Ω, 0.25 λ at 868 MHz, vf 0.6').lengthM, (0.6 * 299_792_458) / 868e6 / 4);
  });

  it('read loss a metre and of the whole', () => {
    const perMetre = line('line T1: 50 Ω, 6 mm, vf 0.55, 0.4 dB/m @ 1 GHz');
    near(perMetre.conductorLossDb, 0.4 * 0.006);
    assert.equal(perMetre.lossAtHz, 1e9);
    near(line('line T1: 50 Ω, 90° at 868 MHz, 0.1 dB @ 1 GHz').conductorLossDb, 0.1);
  });

  it('compute a microstrip', () => {
    const strip = line('line T1: microstrip width 0.35 mm, height 0.2 mm, permittivity 4.3, length 6 mm');
    // Common practice: on such a laminate w/h of 1.75 to 2 makes 50 Ω.
    assert.ok(strip.impedanceOhm > 45 && strip.impedanceOhm < 56, String(strip.impedanceOhm));
    assert.ok(strip.velocityFactor > 0.5 && strip.velocityFactor < 0.6);
    near(strip.lengthM, 0.006);
  });

  it('hang stubs and turn blocks', () => {
    assert.equal(ladder('stub open S1: 50 Ω, 6 mm').form, 'stub');
    const block = ladder('block B1: filter.s2p reversed');
    assert.ok(block.form === 'block' && block.reversed && block.data.ports === 2);
    assert.deepEqual(ladder('transformer T1: turns 1:2, winding 3 µH, coupling 0.98'), { form: 'transformer', name: 'T1', turnsSource: 1, turnsLoad: 2, windingH: 3e-6, coupling: 0.98 });
    assert.deepEqual(ladder('transformer T1: turns 2:1'), { form: 'transformer', name: 'T1', turnsSource: 2, turnsLoad: 1, windingH: null, coupling: 1 });
  });

  it('need sense', () => {
    const text = `ohmward: 1\nload: 5 Ω\nladder:\n  - line T1: 50 Ω, 6 mm, vf 1.2\n  - line T2: 50 Ω, 6 mm, vf 0\n${bands}`;
    const { diagnostics, problem } = model(text);
    assert.deepEqual(diagnostics.map(({ severity, span }) => `${severity} ${text.slice(0, span.start).split('\n').length}`), ['error 4', 'error 5']);
    assert.deepEqual(problem?.ladder.map(({ form }) => form), ['faulty', 'faulty']);
  });
});
