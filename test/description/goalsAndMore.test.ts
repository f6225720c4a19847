import assert from 'node:assert/strict';
import { seedFiles } from '../hostile/descriptionSeeds';
import { marks, model, soundProblem } from './support';

const head = 'ohmward: 1\nload: {dry: free.s1p, wet: wet.s1p}\nbands: {up: 863 .. 870 MHz, down: "902 .. 928 MHz, 5 points"}\n';

describe('goals of a problem', () => {
  const goal = (phrase: string) => soundProblem(`${head}ladder:\n  - series L1: 3 nH ±5 %\ngoals:\n  - ${phrase}\n`, seedFiles).goals[0];

  it('carry limit, unit, line and place', () => {
    assert.deepEqual(goal('return loss >= 12 dB in up'), {
      text: 'return loss >= 12 dB in up', line: 7, quantity: 'return loss', comparison: '>=', limit: 12, unit: 'dB', place: { form: 'band', band: 'up' }, caseName: null, into: null, against: null, elementName: null, bandwidthDropDb: null,
    });
    assert.deepEqual(goal('efficiency >= 80 %').limit, 80);
    assert.deepEqual([goal('current L1 <= 30 mA').limit, goal('current L1 <= 30 mA').unit], [0.03, 'A']);
    assert.deepEqual([goal('bandwidth >= 2 MHz at 3 dB in up').limit, goal('bandwidth >= 2 MHz at 3 dB in up').bandwidthDropDb], [2e6, 3]);
  });

  it('have places of every form', () => {
    assert.deepEqual(goal('gain >= -1 dB').place, { form: 'bands' });
    assert.deepEqual(goal('gain >= -1 dB at 900 MHz').place, { form: 'frequency', frequencyHz: 9e8 });
    assert.deepEqual(goal('rejection >= 10 dB at 2 x up against down').place, { form: 'harmonic', order: 2, band: 'up' });
    const range = goal('gain >= -1 dB in 860 .. 880 MHz').place;
    assert.ok(range.form === 'range' && range.frequencyHz.length === 21 && range.frequencyHz[0] === 860e6 && range.frequencyHz[20] === 880e6);
    const counted = goal('gain >= -1 dB in 860 .. 880 MHz, 3 points').place;
    assert.ok(counted.form === 'range' && counted.frequencyHz.length === 3);
  });

  it('name a case, a load of their own, and the load as an element', () => {
    assert.equal(goal('gain >= -1 dB for wet').caseName, 'wet');
    assert.equal(goal('gain >= -1 dB into 12 - j3 Ω').into?.form, 'constant');
    assert.equal(goal('dissipation load <= 10 mW').elementName, 'load');
  });

  it('cannot have both a case and a load of their own', () => {
    const text = `${head}ladder: []\ngoals:\n  - gain >= -1 dB for wet into 50 Ω\n`;
    const { diagnostics, problem } = model(text, seedFiles);
    assert.equal(diagnostics.filter(({ severity }) => severity === 'error').length, 1);
    assert.deepEqual(problem?.goals, []);
  });
});

describe('tunable parts of a problem', () => {
  const text = (tunables: string, rest = '') => `${head}ladder:\n  - shunt C3: tunable antcap\ntunables:\n  antcap: ${tunables}\n${rest}`;

  it('step evenly from the first value at code 0', () => {
    const { tunables, ladder } = soundProblem(text('capacitor 3 bits 1 pF .. 8 pF Q 60'), seedFiles);
    assert.deepEqual(tunables[0].elements, ['C3']);
    assert.deepEqual(tunables[0].states.map(({ code }) => code), [0, 1, 2, 3, 4, 5, 6, 7]);
    tunables[0].states.forEach(({ part }, i) => assert.ok(Math.abs(part.value - (i + 1) * 1e-12) < 1e-24));
    assert.deepEqual(tunables[0].states[5].part.loss, { law: 'constant q', q: 60 });
    assert.ok(ladder[0].form === 'branch' && ladder[0].branch.form === 'part' && ladder[0].branch.part.value === 1e-12);
  });

  it('have codes in decimal, hexadecimal and binary, sorted', () => {
    const { tunables } = soundProblem(text('{0b11: 4 pF, 0x1: 2 pF, 00: 1 pF, 2: 3 pF}'), seedFiles);
    assert.deepEqual(tunables[0].states.map(({ code, part }) => [code, part.value]), [[0, 1e-12], [1, 2e-12], [2, 3e-12], [3, 4e-12]]);
  });

  it('have each code once, and one kind', () => {
    const twice = text('{0b1: 4 pF, 0x1: 2 pF}');
    assert.deepEqual(marks(twice, model(twice, seedFiles).diagnostics), ['duplicate-code: 0x1']);
    const mixed = text('{0: 4 pF, 1: 2 nH}');
    assert.ok(model(mixed, seedFiles).diagnostics.length > 0);
  });

  it('are judged at the channels: stated, of a band, or of all bands', () => {
    const channels = (line: string) => [...(soundProblem(text('capacitor 1 bits 1 pF .. 8 pF', line), seedFiles).channelsHz ?? [])];
    assert.deepEqual(channels('channels: 863 MHz .. 864 MHz step 500 kHz\n'), [863e6, 863.5e6, 864e6]);
    assert.deepEqual(channels('channels: [870 MHz, 863 MHz, 869 .. 870 MHz step 1 MHz]\n'), [863e6, 869e6, 870e6]);
    assert.deepEqual(channels('channels: down\n'), [902e6, 908.5e6, 915e6, 921.5e6, 928e6]);
    assert.equal(channels('').length, 26);
  });

  it('fit the designator', () => {
    const wrong = `${head}ladder:\n  - shunt L3: tunable antcap\ntunables:\n  antcap: capacitor 3 bits 1 pF .. 8 pF\n`;
    assert.deepEqual(marks(wrong, model(wrong, seedFiles).diagnostics), ['kind-mismatch: antcap']);
  });
});

describe('measurements of a problem', () => {
  const text = (items: string, load = '{dry: free.s1p, wet: wet.s1p}') => `ohmward: 1\nload: ${load}\nbands: {up: 863 .. 870 MHz}\nladder:\n  - series L1: 3 nH\n  - shunt C3: tunable antcap\ntunables: {antcap: capacitor 3 bits 1 pF .. 8 pF}\nmeasured:\n${items}`;

  it('are of the finished ladder or of a step, in a case, with codes and a fixture', () => {
    const { measured } = soundProblem(text('  - free.s1p for dry with antcap = 3\n  - L1: wet.s1p for wet\n    fixture: [line F3: "50 Ω, 8 mm"]\n  - {file: free.s1p for wet, fixture: [series R9: 1 Ω]}\n'), seedFiles);
    assert.deepEqual(measured.map(({ upTo, caseName, codes, fixture }) => [upTo, caseName, [...codes], fixture.map(({ name }) => name)]), [
      [null, 'dry', [['antcap', 3]], []], ['L1', 'wet', [], ['F3']], [null, 'wet', [], ['R9']],
    ]);
    assert.ok(measured.every(({ data }) => data !== null));
  });

  it('say which case they are of, where there are several', () => {
    const several = text('  - free.s1p\n');
    assert.deepEqual(marks(several, model(several, seedFiles).diagnostics), ['case-required: free.s1p']);
    assert.equal(soundProblem(text('  - free.s1p\n', 'free.s1p'), seedFiles).measured[0].caseName, null);
    assert.equal(soundProblem(text('  - free.s1p\n', '{only: free.s1p}'), seedFiles).measured[0].caseName, 'only');
  });

  it('name what there is', () => {
    const bad = text('  - L9: free.s1p for dry\n  - free.s1p for drx\n  - free.s1p for dry with antcap = 9\n  - free.s1p for dry with cap = 1\n  - filter.s2p for dry\n');
    assert.deepEqual(marks(bad, model(bad, seedFiles).diagnostics), ['unknown-element: L9', 'unknown-case: drx', 'unknown-code: 9', 'unknown-tunable: cap', 'port: filter.s2p']);
  });
});

describe('impedances of a problem', () => {
  const load = (phrase: string) => soundProblem(`ohmward: 1\nload: ${phrase}\nbands: {up: 863 .. 870 MHz}\nladder: []\n`, seedFiles).cases[0].load;

  it('are constants, reflections against z0, and networks', () => {
    assert.deepEqual(load('18 - j37 Ω'), { form: 'constant', impedanceOhm: { re: 18, im: -37 } });
    const gamma = load('gamma 0.5 at -90°');
    assert.ok(gamma.form === 'reflection' && gamma.referenceOhm === 50 && Math.abs(gamma.reflection.im + 0.5) < 1e-15);
    assert.deepEqual([load('open').form, load('short').form], ['open', 'short']);
    const mixed = load('12 Ω + 1 kΩ || 2 pF');
    assert.ok(mixed.form === 'series' && mixed.members.length === 2 && mixed.members[1].form === 'parallel');
  });

  it('turn a reactance at one frequency into a coil or a capacitor', () => {
    const inductive = load('18 + j37 Ω at 868 MHz');
    assert.ok(inductive.form === 'series' && inductive.members[1].form === 'part' && inductive.members[1].part.kind === 'inductor');
    assert.ok(Math.abs(inductive.members[1].part.value * 2 * Math.PI * 868e6 - 37) < 1e-9);
    const capacitive = load('18 - j37 Ω at 868 MHz');
    assert.ok(capacitive.form === 'series' && capacitive.members[1].form === 'part' && capacitive.members[1].part.kind === 'capacitor');
    assert.ok(Math.abs(1 / (capacitive.members[1].part.value * 2 * Math.PI * 868e6) - 37) < 1e-9);
  });

  it('are tables in Γ, sorted by frequency', () => {
    const table = load('{870 MHz: 50 Ω, 863 MHz: 100 Ω, 866 MHz: open}');
    assert.ok(table.form === 'table');
    assert.deepEqual([...table.frequencyHz], [863e6, 866e6, 870e6]);
    assert.deepEqual([...table.reflectionRe].map((value) => Number(value.toFixed(12))), [0.333333333333, 1, 0]);
    const twice = 'ohmward: 1\nload: {870 MHz: 50 Ω, 0.87 GHz: 100 Ω}\nbands: {up: 863 .. 870 MHz}\nladder: []\n';
    assert.deepEqual(marks(twice, model(twice).diagnostics), ['duplicate-frequency: 0.87 GHz']);
  });

  it('are a port of a file, or two ports differentially', () => {
    const port = load('filter.s2p port 2');
    assert.ok(port.form === 'file' && port.port === 2);
    const pair = load('filter.s2p differential');
    assert.ok(pair.form === 'file' && pair.port === 'differential');
    for (const phrase of ['filter.s2p', 'filter.s2p port 3', 'free.s1p differential']) {
      const text = `ohmward: 1\nload: ${phrase}\nbands: {up: 863 .. 870 MHz}\nladder: []\n`;
      assert.deepEqual(marks(text, model(text, seedFiles).diagnostics), [`port: ${phrase}`]);
    }
    const fixes = model('ohmward: 1\nload: filter.s2p\nbands: {up: 863 .. 870 MHz}\nladder: []\n', seedFiles).diagnostics[0].fixes;
    assert.deepEqual(fixes?.map((fix) => fix.edits[0].text), [' port 1', ' port 2', ' differential']);
  });
});
