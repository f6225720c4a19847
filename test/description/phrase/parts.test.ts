import assert from 'node:assert/strict';
import type { PartKind } from '../../../src/network/part';
import { readElementPhrase } from '../../../src/description/phrase/readElementPhrase';
import { readPartPhrase } from '../../../src/description/phrase/readPart';
import { checkCarets, clean, mended, readPhrase, type Reader } from './support';

const part = (kind: PartKind | null): Reader<unknown> => (phrase, context) => readPartPhrase(phrase, kind, context);
const resistor = part('resistor');
const inductor = part('inductor');
const capacitor = part('capacitor');
const series = (name: string): Reader<unknown> => (phrase, context) => readElementPhrase('series', name, phrase, context);
const shunt = (name: string): Reader<unknown> => (phrase, context) => readElementPhrase('shunt', name, phrase, context);

const valueOf = (reader: Reader<unknown>, text: string) => (clean(reader, text) as { value: { value: number } }).value.value;
const figuresOf = (reader: Reader<unknown>, text: string) => (clean(reader, text) as { figures?: unknown }).figures;

describe('values of parts', () => {
  for (const [text, value] of [
    ['4.7 nH', 4.7e-9], ['4.7nH', 4.7e-9], ['4700 pH', 4.7e-9], ['4n7', 4.7e-9], ['5.6n', 5.6e-9], ['10p', 10e-12], ['n47', 0.47e-9], ['5.6 µH', 5.6e-6], ['5.6 μH', 5.6e-6], ['5.6 uH', 5.6e-6], ['1µ0', 1e-6], ['.5 nH', 0.5e-9], ['5. nH', 5e-9],
    ['1e-9 H', 1e-9], ['1.2e1 nH', 12e-9], ['4.7\u00a0nH', 4.7e-9], ['4.7   nH', 4.7e-9], ['4.7\u202fnH', 4.7e-9],
  ] as const) it(`an inductor of ${text}`, () => assert.equal(valueOf(inductor, text), value));

  // IEC 60062: the letter stands in the place of the point (rows E8 and E9 of the checks; table in a public encyclopedia).
  for (const [text, value] of [
    ['R47', 0.47], ['4R7', 4.7], ['470R', 470], ['4K7', 4700], ['47K', 47e3], ['47K3', 47.3e3], ['470K', 470e3], ['4M7', 4.7e6], ['1k5', 1500], ['5L0', 0.005], ['0R22', 0.22], ['50 Ω', 50], ['50 \u2126', 50], ['50 ohm', 50], ['1.2 kΩ', 1200], ['2 mΩ', 2e-3], ['2 MΩ', 2e6], ['1 kohm', 1000], ['=2*37 ohm', 74],
  ] as const) it(`a resistor of ${text}`, () => assert.equal(valueOf(resistor, text), value));
  for (const [text, value] of [['p33', 0.33e-12], ['4p7', 4.7e-12], ['2p2', 2.2e-12], ['10n', 10e-9], ['4n7', 4.7e-9], ['1u0', 1e-6], ['1m5', 1.5e-3], ['100 fF', 100e-15], ['22 pF', 22e-12], ['= pad + 1 pF', 1.3e-12]] as const) {
    it(`a capacitor of ${text}`, () => assert.equal(valueOf(capacitor, text), value));
  }

  it('come from an expression to its end, or in parentheses before figures', () => {
    const c = 1 / (2 * Math.PI * 866.5e6 * 37);
    assert.deepEqual(clean(capacitor, '=(1/(2*pi*f0*37 ohm)) Q 180'), { form: 'part', kind: 'capacitor', value: { form: 'known', value: c, unit: 'F' }, figures: { q: 180 } });
    assert.equal(valueOf(capacitor, '=1/(2*pi*f0*37 ohm)'), c);
    assert.equal(valueOf(capacitor, '=(1)/(2*pi*f0*37 ohm)'), c);
  });

  it('are refused as expressions in a workspace that is not trusted', () => {
    const { diagnostics } = readPhrase(capacitor, '=(pad) Q 180', { expressions: false });
    assert.deepEqual(diagnostics.map(({ code, span }) => [code, span]), [['expression-refused', { start: 0, end: 6 }]]);
  });

  it('take their kind from the unit under other names, and stand anywhere in a text', () => {
    assert.deepEqual(clean(part(null), '3.9 nH'), { form: 'part', kind: 'inductor', value: { form: 'known', value: 3.9e-9, unit: 'H' } });
    const { value } = readPhrase(inductor, ' 4.7 nH  Q 35', { offset: 100 });
    assert.deepEqual((value as { value: { span: unknown } }).value.span, { start: 101, end: 107 });
    assert.deepEqual((value as { span: unknown }).span, { start: 101, end: 113 });
  });
});

describe('values that are wrong', () => {
  it('are marked where they are', () => {
    checkCarets(capacitor, '10 pf', '   ^^ unit-unknown');
    checkCarets(inductor, '4.7 H ±5 % Q 35 @ 900 mHz', `${' '.repeat(22)}^^^ unit-case`);
    checkCarets(inductor, '6.8', '^^^ unit-missing');
    checkCarets(inductor, '6,8 nH', '^^^^^^ decimal-comma');
    checkCarets(inductor, '10 pF', '   ^^ unit-wrong');
    checkCarets(inductor, '-5 nH', '^^^^^ not-physical');
    checkCarets(inductor, '0 nH', '^^^^ not-physical');
    checkCarets(part(null), '3n9', '^^^ unit-missing');
    checkCarets(part(null), '6 mm', '  ^^ unit-wrong');
    checkCarets(inductor, '4.7 nH extra words', '       ^^^^^^^^^^^ unexpected-words');
    checkCarets(inductor, '', ' number-expected');
    checkCarets(inductor, '1e999 H', '^^^^^^^ number-too-large');
    checkCarets(inductor, '= 2 * f0', '^^^^^^^^ unit-wrong');
    checkCarets(resistor, '4n7', '^^^ unit-wrong');
    checkCarets(capacitor, '4R7', '^^^ unit-wrong');
  });

  for (const [reader, text, code, fixed] of [
    [capacitor, '10 pf', 'unit-unknown', '10 pF'], [capacitor, '10 PF', 'unit-unknown', '10 pF'], [inductor, '5.6 nh', 'unit-unknown', '5.6 nH'], [inductor, '5.6 n', 'unit-unknown', '5.6 nH'], [resistor, '4.7 KΩ', 'unit-unknown', '4.7 kΩ'], [resistor, '4.7 ohms', 'unit-unknown', '4.7 Ω'],
    [resistor, '47', 'unit-missing', '47 Ω'], [inductor, '6.8', 'unit-missing', '6.8 nH'], [capacitor, '5.6 ±5 %', 'unit-missing', '5.6 pF ±5 %'], [inductor, '6,8 nH', 'decimal-comma', '6.8 nH'], [resistor, '4,7', 'decimal-comma', null],
    [inductor, '4R7', 'unit-wrong', '4.7 µH'], [inductor, '1 .. 33 nH', 'solve-missing', 'solve 1 .. 33 nH'], [inductor, 'solve 33 .. 1 nH', 'range-upside-down', 'solve 1 nH .. 33 nH'], [inductor, 'solve 1 .. 33', 'unit-missing', 'solve 1 .. 33 nH'], [inductor, 'Solve from E24', 'word-unknown', 'solve from E24'],
    [inductor, '13 nH 5 %', 'tolerance-sign', '13 nH ±5 %'], [inductor, '13 nH + 10 % -5 %', 'tolerance-sign', '13 nH +10 % -5 %'], [inductor, '13 nH ±5', 'unit-missing', '13 nH ±5 %'], [inductor, '13 nH q 40', 'figure-word', '13 nH Q 40'], [capacitor, '10 pF esr 0.2 Ω', 'figure-word', '10 pF ESR 0.2 Ω'],
    [inductor, '13 nH Q 40 @ 900 KHz', 'unit-unknown', '13 nH Q 40 @ 900 kHz'], [inductor, '13 nH Q 40 @ 900', 'unit-missing', '13 nH Q 40 @ 900 MHz'], [capacitor, '10 pF rated 50', 'unit-missing', '10 pF rated 50 V'], [inductor, 'solve from E25', 'series-unknown', 'solve from E24'],
    [shunt('C1'), 'DNP', 'not-fitted-word', 'not fitted'], [shunt('C1'), 'open', 'not-fitted-word', 'not fitted'], [series('L1'), 'DNP', 'not-fitted-word', '0 Ω'], [shunt('C1'), '0 Ω', 'bridge-in-shunt', 'not fitted'],
    [shunt('trap'), '3.9 nH+1.2 pF', 'plus-without-blanks', '3.9 nH + 1.2 pF'], [shunt('trap'), '3.9 nH Q 40 +1.2 pF', 'plus-without-blanks', '3.9 nH Q 40 + 1.2 pF'],
  ] as const) {
    it(`«${text}» is mended`, () => {
      if (fixed === null) assert.equal(readPhrase(reader, text).diagnostics[0].code, code);
      else assert.deepEqual(mended(reader, text), { code, text: fixed });
    });
  }
});

describe('figures of parts', () => {
  for (const [text, figures] of [
    ['13 nH ±5 %', { tolerance: { form: 'relative', up: 0.05, down: 0.05 } }], ['13 nH +/-5%', { tolerance: { form: 'relative', up: 0.05, down: 0.05 } }], ['13 nH ± 0.3 nH', { tolerance: { form: 'absolute', up: 0.3e-9, down: 0.3e-9 } }], ['13 nH ±0.3n', { tolerance: { form: 'absolute', up: 0.3e-9, down: 0.3e-9 } }],
    ['13 nH +10 % -5 %', { tolerance: { form: 'relative', up: 0.1, down: 0.05 } }], ['13 nH −5 % +10 %', { tolerance: { form: 'relative', up: 0.1, down: 0.05 } }], ['13 nH Q 35 @ 900 MHz', { q: 35, qAtHz: 900e6 }], ['13 nH Q 200', { q: 200 }], ['13 nH SRF 7 GHz Q 32@900MHz ±5%', { tolerance: { form: 'relative', up: 0.05, down: 0.05 }, q: 32, qAtHz: 900e6, srfHz: 7e9 }],
    ['13 nH ESR 0.2 Ω rated 300 mA', { esrOhm: 0.2, ratedCurrentA: 0.3 }], ['13 nH ESR 0.2R', { esrOhm: 0.2 }], ['13 nH rated 50 V rated 0.1 W', { ratedVoltageV: 50, ratedPowerW: 0.1 }], ['13 nH rated 20 dBm', { ratedPowerW: 0.1 }],
  ] as const) it(text, () => assert.deepEqual(figuresOf(inductor, text), figures));

  it('of capacitors and resistors', () => {
    assert.deepEqual(figuresOf(capacitor, '10 pF ±0.1 pF Q 180 @ 1 GHz ESL 0.35 nH'), { tolerance: { form: 'absolute', up: 0.1e-12, down: 0.1e-12 }, q: 180, qAtHz: 1e9, eslH: 0.35e-9 });
    assert.deepEqual(figuresOf(capacitor, '10 pF SRF 3 GHz'), { srfHz: 3e9 });
    assert.deepEqual(figuresOf(resistor, '50 Ω ESL 0.5 nH ±1 %'), { tolerance: { form: 'relative', up: 0.01, down: 0.01 }, eslH: 0.5e-9 });
  });

  it('contradict each other', () => {
    checkCarets(inductor, '13 nH Q 40 ESR 0.2 Ω', '               ^^^^^ figures-conflict');
    checkCarets(capacitor, '13 pF SRF 3 GHz ESL 1 nH', '                    ^^^^ figures-conflict');
    checkCarets(resistor, '50 Ω Q 30', '       ^^ figure-foreign');
    checkCarets(inductor, '13 nH ESL 1 nH', '          ^^^^ figure-foreign');
    checkCarets(inductor, '13 nH ±5 % ±3 %', '           ^^^^ figure-twice');
    checkCarets(inductor, '13 nH Q 0', '        ^ not-physical');
    checkCarets(inductor, '13 nH from coils Q 40 ESR 0.1 Ω', '                          ^^^^^ figures-conflict');
    checkCarets(inductor, '13 nH ±100 %', '      ^^^^^^ not-physical');
  });

  it('name a family, a row of a drawer, and what stays fixed', () => {
    assert.deepEqual(clean(inductor, '13 nH from wire coils part LQ-3n9 fixed'), { form: 'part', kind: 'inductor', value: { form: 'known', value: 13e-9, unit: 'H' }, from: 'wire coils', label: 'LQ-3n9', fixed: true });
  });
});

describe('entries of the ladder', () => {
  it('are bridged in any series position', () => {
    for (const [name, text] of [['R1', '0 Ω'], ['L1', '0 Ω'], ['C1', '0R'], ['Z1', '0 ohm'], ['L1', '0.0 Ω']] as const) assert.deepEqual(clean(series(name), text), { form: 'bridge' });
    checkCarets(shunt('C1'), '0 Ω', '^^^ bridge-in-shunt');
  });

  it('are not fitted across the path only', () => {
    assert.deepEqual(clean(shunt('C1'), 'not fitted'), { form: 'not fitted' });
    checkCarets(series('L1'), 'not fitted', '^^^^^^^^^^ not-fitted-in-series');
  });

  const known = (kind: PartKind, value: number, unit: string, figures?: object) => ({ form: 'part', kind, value: { form: 'known', value, unit }, ...(figures && { figures }) });
  const trap = { form: 'series', members: [known('inductor', 3.9e-9, 'H', { q: 40 }), known('capacitor', 1.2e-12, 'F')] };

  it('join several parts by + and ||, whose kinds the units tell', () => {
    assert.deepEqual(clean(shunt('trap'), '3.9 nH Q 40 + 1.2 pF'), { form: 'branch', branch: trap });
    assert.deepEqual(clean(shunt('L2'), '3.9 nH Q 40 + 1.2 pF'), { form: 'branch', branch: trap });
    const tank = { form: 'parallel', members: [known('inductor', 3.9e-9, 'H'), known('capacitor', 1.2e-12, 'F', { tolerance: { form: 'relative', up: 0.05, down: 0.05 } })] };
    assert.deepEqual(clean(series('R1'), '3.9 nH||1.2 pF ±5 % + 2 Ω'), { form: 'branch', branch: { form: 'series', members: [tank, known('resistor', 2, 'Ω')] } });
    assert.deepEqual(clean(series('R1'), '2 Ω + (3.9 nH || 1.2 pF ±5 %)'), { form: 'branch', branch: { form: 'series', members: [known('resistor', 2, 'Ω'), tank] } });
  });

  it('are wrong in their own places', () => {
    checkCarets(shunt('trap'), '18 - j37 Ω', '^^^^^^^^^^ parts-only');
    checkCarets(shunt('trap'), '(3.9 nH', '^^^^^^^ parenthesis-missing');
    checkCarets(shunt('trap'), '3.9 nH)', '      ^ unexpected-words');
    checkCarets(shunt('trap'), '3.9 nH + 1.2 pf', '             ^^ unit-unknown');
    checkCarets(series('L1'), '', ' phrase-missing');
    checkCarets(shunt('trap'), `${'('.repeat(40)}1 nH`, `${' '.repeat(30)}${'^'.repeat(14)} nested-too-deeply`);
  });

  it('are pairs, tunables, windings and unknown', () => {
    assert.deepEqual(clean(series('L1'), 'pair 5.6 nH'), { form: 'branch', branch: known('inductor', 5.6e-9, 'H'), pair: true });
    assert.deepEqual(clean(shunt('C3'), 'tunable antcap'), { form: 'branch', branch: { form: 'part', kind: 'capacitor', value: { form: 'tunable', name: 'antcap' } } });
    assert.deepEqual(clean(series('L1'), 'coil 6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm ±5 %'), {
      form: 'branch', branch: { form: 'part', kind: 'inductor', value: { form: 'coil', coil: { turns: 6, diameterM: 0.005, lengthM: 0.007, wireM: 0.0008 } }, figures: { tolerance: { form: 'relative', up: 0.05, down: 0.05 } } },
    });
    const solve = (reader: Reader<unknown>, text: string) => (clean(reader, text) as { branch: { kind?: string; value: { solve?: unknown } } }).branch;
    assert.deepEqual(solve(series('L1'), 'solve 1 .. 33 nH from coils, caps or none').value, { form: 'solve', solve: { range: { min: 1e-9, max: 33e-9 }, families: ['coils', 'caps'], orNone: true } });
    assert.deepEqual(solve(series('L1'), 'solve from E24 ±5 %'), { form: 'part', kind: 'inductor', value: { form: 'solve', solve: { series: 'E24' } }, figures: { tolerance: { form: 'relative', up: 0.05, down: 0.05 } } });
    assert.deepEqual(solve(series('match'), 'solve 1 .. 33 nH').kind, 'inductor');
    assert.deepEqual(solve(series('match'), 'solve'), { form: 'part', value: { form: 'solve' } });
  });

  it('name what a winding lacks', () => {
    checkCarets(series('L1'), 'coil 6 turns, diameter 5 mm, length 7 mm', `${'^'.repeat(40)} coil`);
    checkCarets(series('L1'), 'coil 20 turns, diameter 5 mm, length 7 mm, wire 0.8 mm', `${'^'.repeat(54)} coil`);
    checkCarets(series('L1'), 'coil 6 turns, diameter 0.5 mm, length 7 mm, wire 0.8 mm', `${'^'.repeat(55)} coil`);
  });
});
