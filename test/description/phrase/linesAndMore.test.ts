import assert from 'node:assert/strict';
import { readDescription } from '../../../src/description/readDescription';
import { readBandPhrase } from '../../../src/description/phrase/readBand';
import { readChannelsPhrase } from '../../../src/description/phrase/readChannels';
import { readElementKey } from '../../../src/description/phrase/readElementKey';
import { readElementPhrase } from '../../../src/description/phrase/readElementPhrase';
import { readFamilyPhrase } from '../../../src/description/phrase/readFamily';
import { readLadderSolvePhrase } from '../../../src/description/phrase/readLadderSolve';
import { readLetPhrase } from '../../../src/description/phrase/readLet';
import { readMeasuredPhrase } from '../../../src/description/phrase/readMeasured';
import { readCode, readTunablePhrase } from '../../../src/description/phrase/readTunable';
import { checkCarets, clean, mended, nameOf, readPhrase, type Reader } from './support';

const line: Reader<unknown> = (phrase, context) => readElementPhrase('line', 'F1', phrase, context);
const transformer: Reader<unknown> = (phrase, context) => readElementPhrase('transformer', 'T1', phrase, context);
const block: Reader<unknown> = (phrase, context) => readElementPhrase('block', 'B1', phrase, context);
const band: Reader<unknown> = (phrase, context) => readBandPhrase(nameOf('b'), phrase, context);
const family: Reader<unknown> = (phrase, context) => readFamilyPhrase(nameOf('f'), phrase, context);
const tunable: Reader<unknown> = (phrase, context) => readTunablePhrase(nameOf('t'), phrase, context);
const measured: Reader<unknown> = (phrase, context) => readMeasuredPhrase(null, phrase, context);

describe('lines', () => {
  const uniform = (length: object, rest: object = {}) => ({ form: 'line', line: { medium: { form: 'uniform', impedanceOhm: 50 }, length, ...rest } });
  const mm = (lengthM: number) => ({ form: 'physical', lengthM });
  for (const [text, meaning] of [
    ['50 Ω, 6 mm, vf 0.55', uniform(mm(0.006), { velocityFactor: 0.55 })],
    ['50 Ω,6mm,vf 0.55,0.4 dB/m @ 1 GHz', uniform(mm(0.006), { velocityFactor: 0.55, loss: { per: 'metre', db: 0.4, atHz: 1e9 } })],
    ['50 Ω, 90° at 868 MHz', uniform({ form: 'electrical', wavelengths: 0.25, atHz: 868e6 })],
    ['50 Ω, 90 deg at 868 MHz', uniform({ form: 'electrical', wavelengths: 0.25, atHz: 868e6 })],
    ['50 Ω, 0.25 λ at 868 MHz, 0.1 dB @ 1 GHz', uniform({ form: 'electrical', wavelengths: 0.25, atHz: 868e6 }, { loss: { per: 'whole', db: 0.1, atHz: 1e9 } })],
    ['50 Ω, 0.25 lambda at 868 MHz', uniform({ form: 'electrical', wavelengths: 0.25, atHz: 868e6 })],
    ['50 Ω, solve 2 mm .. 40 mm, vf 0.55', uniform({ form: 'solve', range: { min: 0.002, max: 0.04 } }, { velocityFactor: 0.55 })],
    ['50 Ω, solve 2 .. 40 mm', uniform({ form: 'solve', range: { min: 0.002, max: 0.04 } })],
    ['50 Ω, solve', uniform({ form: 'solve' })],
    ['50 Ω, 250 mil', uniform(mm(0.00635))], ['50 Ω, 0.25 in, vf 0.66', uniform(mm(0.00635), { velocityFactor: 0.66 })], ['50 Ω, 1.1 cm', uniform(mm(0.011))],
    ['microstrip width 0.35 mm, height 0.2 mm, permittivity 4.3, copper 35 µm, loss tangent 0.02, length 6 mm', {
      form: 'line', line: { medium: { form: 'microstrip', widthM: 0.35e-3, heightM: 0.2e-3, permittivity: 4.3, copperM: 35e-6, lossTangent: 0.02 }, length: mm(0.006) },
    }],
    ['microstrip width 14 mil, height 8 mil, permittivity 4.3, length 6 mm', { form: 'line', line: { medium: { form: 'microstrip', widthM: 14 * 25.4e-6, heightM: 8 * 25.4e-6, permittivity: 4.3 }, length: mm(0.006) } }],
  ] as const) {
    it(`«${text}»`, () => assert.equal(JSON.stringify(clean(line, text), shortNumbers), JSON.stringify(meaning, shortNumbers)));
  }

  it('that are wrong are marked where they are', () => {
    checkCarets(line, '50 Ω', '^^^^ line-length');
    checkCarets(line, '50 Ω, 90°', '      ^^^ line-length');
    checkCarets(line, '50 Ω, 6 mm, vf 1.2', '               ^^^ not-physical');
    checkCarets(line, '0 Ω, 6 mm', '^^^ not-physical');
    checkCarets(line, '50 Ω, -6 mm', '      ^^^^^ not-physical');
    checkCarets(line, '50 Ω, 6 mm, 0.4 dB/m', '            ^^^^^^^^ line-loss');
    checkCarets(line, '50 Ω, 6 mm, 7 mm', '            ^^^^ figure-twice');
    checkCarets(line, '50 Ω, 6 mm, speed 0.5', '            ^^^^^ unexpected-words');
    checkCarets(line, 'microstrip width 0.35 mm, height 0.2 mm, length 6 mm', `${'^'.repeat(52)} microstrip`);
    checkCarets(line, 'microstrip width 1 mm, height 1 mm, permittivity 0.5, length 6 mm', `${' '.repeat(49)}^^^ not-physical`);
    checkCarets(line, 'microstrip width 1 mm, height 1 mm, permittivity 4, length 6 mm, vf 0.5', `${' '.repeat(68)}^^^ figure-foreign`);
  });

  for (const [text, code, fixed] of [['50, 6 mm', 'unit-missing', '50 Ω, 6 mm'], ['50 Ω, 6', 'unit-missing', '50 Ω, 6 mm'], ['50 Ω 6 mm', 'comma-missing', '50 Ω, 6 mm'], ['50 Ω, 6 mm vf 0.55', 'comma-missing', '50 Ω, 6 mm, vf 0.55'], ['50 Ω, 6 MM', 'unit-unknown', '50 Ω, 6 mm']] as const) {
    it(`«${text}» is mended`, () => assert.deepEqual(mended(line, text), { code, text: fixed }));
  }
});

/** Sizes in mil are reckoned in another order here; their last digits do not matter. */
const shortNumbers = (_: string, value: unknown) => (typeof value === 'number' ? Number(value.toPrecision(14)) : value);

describe('transformers and blocks', () => {
  it('read', () => {
    assert.deepEqual(clean(transformer, 'turns 1:2'), { form: 'transformer', turnsSource: 1, turnsLoad: 2 });
    assert.deepEqual(clean(transformer, 'turns 1.5:2 winding 3 µH with coupling 0.98'), { form: 'transformer', turnsSource: 1.5, turnsLoad: 2, windingH: 3e-6, coupling: 0.98 });
    assert.deepEqual(clean(transformer, 'turns 1:2, winding 3 µH, coupling 0.98'), { form: 'transformer', turnsSource: 1, turnsLoad: 2, windingH: 3e-6, coupling: 0.98 });
    assert.deepEqual(clean(block, 'my filter.s2p reversed'), { form: 'block', path: 'my filter.s2p', reversed: true });
    assert.deepEqual(clean(block, 'filter.s2p'), { form: 'block', path: 'filter.s2p' });
  });

  it('that are wrong are marked where they are', () => {
    checkCarets(transformer, 'turns 1:0', '^^^^^^^^^ transformer');
    checkCarets(transformer, 'turns 1:2 winding 3 µH coupling 1.2', '                                ^^^ not-physical');
    checkCarets(transformer, 'turns 1:2 coupling 0.9', '                   ^^^ coupling-without-winding');
    checkCarets(block, 'filter.s1p', '^^^^^^^^^^ block');
    assert.deepEqual(mended(transformer, 'turns 1 : 2'), { code: 'transformer', text: 'turns 1:2' });
    assert.deepEqual(mended(transformer, '1:2'), { code: 'transformer', text: 'turns 1:2' });
  });
});

describe('keys of the ladder', () => {
  it('read', () => {
    for (const keyword of ['series', 'shunt', 'line', 'stub open', 'stub short', 'transformer', 'block']) assert.deepEqual(clean(readElementKey, `${keyword}  X1`), { keyword, name: 'X1' });
  });
  it('that are wrong are marked where they are', () => {
    checkCarets(readElementKey, 'series', '^^^^^^ element-name');
    checkCarets(readElementKey, 'series L 1', '       ^^^ name');
    checkCarets(readElementKey, 'shunt load', '      ^^^^ name');
    // Words that every object has are words like others.
    for (const text of ['__proto__ L1', 'constructor L1', 'toString']) assert.doesNotMatch(readDescription(`ladder:\n  - ${text}: 3 nH\n`, { expressions: true }).diagnostics.map(({ message }) => message).join(), /object Object|native code|probably meant/);
    for (const [text, fixed] of [['seriess L1', 'series L1'], ['Series L1', 'series L1'], ['parallel C1', 'shunt C1'], ['open stub S1', 'stub open S1'], ['stub S1', 'stub open S1']] as const) assert.deepEqual(mended(readElementKey, text), { code: 'element-keyword', text: fixed });
  });
});

describe('bands and channels', () => {
  const range = (min: number, max: number, more: object = {}) => ({ name: 'b', range: { min, max, ...more } });
  for (const [text, meaning] of [
    ['863 .. 870 MHz', range(863e6, 870e6)], ['863..870MHz', range(863e6, 870e6)], ['863 MHz .. 0.87 GHz', range(863e6, 870e6)], ['863 .. 870 MHz step 1 MHz', range(863e6, 870e6, { step: 1e6 })], ['863 .. 870 MHz step 1', range(863e6, 870e6, { step: 1e6 })], ['863 .. 870 MHz, 31 points', range(863e6, 870e6, { points: 31 })],
    ['863 .. 870 MHz, 31 points, watch', { ...range(863e6, 870e6, { points: 31 }), watch: true }], ['863 .. 870 MHz, watch', { ...range(863e6, 870e6), watch: true }], ['869.525 MHz', { name: 'b', frequencyHz: 869.525e6 }], ['869.525 MHz, watch', { name: 'b', frequencyHz: 869.525e6, watch: true }],
    ['=(f0) .. 870 MHz', range(866.5e6, 870e6)], ['= 2*f0', { name: 'b', frequencyHz: 1733e6 }], ['1e3 .. 1e4 MHz', range(1e9, 1e10)],
  ] as const) it(`«${text}»`, () => assert.deepEqual(clean(band, text), meaning));

  it('that are wrong are marked where they are', () => {
    checkCarets(band, '863 .. 870 MHz step 2 MHz', '                    ^^^^^ step-misses-end');
    checkCarets(band, '863 .. 870 MHz step 0 MHz', '                    ^^^^^ step-not-positive');
    checkCarets(band, '863 .. 870 MHz step 1 Hz', '                    ^^^^ too-many-points');
    checkCarets(band, '863 .. 870 MHz, 1 point', '                ^ too-few-points');
    checkCarets(band, '863 .. 870 MHz step 1 MHz, 8 points', `${'^'.repeat(35)} range-step-and-points`);
    checkCarets(band, '863 .. 870 MHz, 0 points', '                ^ points-not-positive');
    checkCarets(band, '863 .. 870 MHz, 1.5 points', '                ^^^ integer-expected');
    checkCarets(band, '863 .. 870 MHz, 200000 points', '                ^^^^^^ too-many-points');
    checkCarets(band, '0 .. 870 MHz', '^ frequency-not-positive');
    checkCarets(band, '863 .. 870 MHz watch', '               ^^^^^ unexpected-words');
    checkCarets(band, '', ' number-expected');
  });

  for (const [text, code, fixed] of [
    ['870 .. 863 MHz', 'range-upside-down', '863 MHz .. 870 MHz'], ['863 .. 870', 'unit-missing', '863 .. 870 MHz'], ['863 .. 870 mHz', 'unit-case', '863 .. 870 MHz'], ['863 .. 870 Mhz', 'unit-unknown', '863 .. 870 MHz'], ['868 KHz', 'unit-unknown', '868 kHz'], ['863-870 MHz', 'range-dots', '863 .. 870 MHz'], ['863 – 870 MHz', 'range-dots', '863 .. 870 MHz'], ['863 to 870 MHz', 'range-dots', '863 .. 870 MHz'], ['863,5 .. 870 MHz', 'decimal-comma', '863.5 .. 870 MHz'],
  ] as const) it(`«${text}» is mended`, () => assert.deepEqual(mended(band, text), { code, text: fixed }));

  it('of a tunable ladder are a range, a frequency or a band', () => {
    assert.deepEqual(clean(readChannelsPhrase, '863.1 MHz .. 869.9 MHz step 200 kHz'), { range: { min: 863.1e6, max: 869.9e6, step: 200e3 } });
    assert.deepEqual(clean(readChannelsPhrase, '868.3 MHz'), { frequencyHz: 868.3e6 });
    assert.deepEqual(clean(readChannelsPhrase, 'wet band'), { band: 'wet band' });
  });
});

describe('families and tunables', () => {
  it('read', () => {
    assert.deepEqual(clean(family, 'inductor E24 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz SRF 7 GHz'), { name: 'f', source: { form: 'series', kind: 'inductor', series: 'E24', range: { min: 1e-9, max: 47e-9 } }, figures: { tolerance: { form: 'relative', up: 0.05, down: 0.05 }, q: 32, qAtHz: 900e6, srfHz: 7e9 } });
    assert.deepEqual(clean(family, 'capacitor [1p, 2p2, 3.3 pF] Q 180'), { name: 'f', source: { form: 'list', kind: 'capacitor', values: [1e-12, 2.2e-12, 3.3e-12] }, figures: { q: 180 } });
    assert.deepEqual(clean(family, 'resistor E96 1 Ω .. 1 MΩ ±1 %'), { name: 'f', source: { form: 'series', kind: 'resistor', series: 'E96', range: { min: 1, max: 1e6 } }, figures: { tolerance: { form: 'relative', up: 0.01, down: 0.01 } } });
    assert.deepEqual(clean(family, 'inductor files vendor/*.s2p ±5 %'), { name: 'f', source: { form: 'files', kind: 'inductor', pattern: 'vendor/*.s2p' }, figures: { tolerance: { form: 'relative', up: 0.05, down: 0.05 } } });
    assert.deepEqual(clean(family, 'my stock.csv'), { name: 'f', source: { form: 'csv', path: 'my stock.csv' } });
    assert.deepEqual(clean(tunable, 'capacitor 5 bits 0.9 pF .. 4.6 pF Q 60 @ 900 MHz'), { name: 't', kind: 'capacitor', states: { form: 'linear', bits: 5, range: { min: 0.9e-12, max: 4.6e-12 } }, figures: { q: 60, qAtHz: 900e6 } });
    assert.deepEqual(clean(tunable, 'capacitor 1 bit 0.9 .. 4.6 pF'), { name: 't', kind: 'capacitor', states: { form: 'linear', bits: 1, range: { min: 0.9e-12, max: 4.6e-12 } } });
  });

  it('that are wrong are marked where they are', () => {
    checkCarets(family, 'coil E24', '^^^^ part-kind');
    checkCarets(family, 'inductor E24 1 pF .. 2 pF', '               ^^ unit-wrong');
    checkCarets(family, 'inductor E24 -1 nH .. 2 nH', '             ^^^^^ not-physical');
    checkCarets(family, 'capacitor []', '          ^^ family');
    checkCarets(family, 'capacitor [1 pF 2 pF]', '                ^^^^^ family');
    checkCarets(family, 'inductor E24 1 .. 47 nH, Q 5', '                       ^^^^^ unexpected-words');
    checkCarets(tunable, 'capacitor 0 bits 1 .. 2 pF', '          ^ tunable');
    checkCarets(tunable, 'capacitor 32 bits 1 .. 2 pF', '          ^^ tunable');
    checkCarets(tunable, 'capacitor 2.5 bits 1 .. 2 pF', '          ^^^ integer-expected');
    for (const [text, fixed] of [['inductor e24 1 .. 2 nH', 'inductor E24 1 .. 2 nH'], ['inductor E25 1 .. 2 nH', 'inductor E24 1 .. 2 nH'], ['coil E24 1 .. 2 nH', 'inductor E24 1 .. 2 nH'], ['cap E24 1 .. 2 pF', 'capacitor E24 1 .. 2 pF']] as const) assert.equal(mended(family, text).text, fixed);
  });

  it('have codes that are decimal, 0x or 0b', () => {
    for (const [text, value] of [['17', 17], ['0x1F', 31], ['0b10001', 17], ['0', 0], ['4294967295', 4294967295]] as const) assert.equal(readPhrase(readCode, text).value?.value, value);
    for (const text of ['-1', '1.5', '0b2', '0x', '4294967296', '1e3', '']) assert.equal(readPhrase(readCode, text).diagnostics[0].code, 'code', text);
  });
});

describe('whole ladders, named values and measurements', () => {
  it('read', () => {
    assert.deepEqual(clean(readLadderSolvePhrase, 'solve up to 4 elements from coils, caps'), { form: 'up to', elements: 4, families: ['coils', 'caps'] });
    assert.deepEqual(clean(readLadderSolvePhrase, 'solve pi Q 5 from coils, caps'), { form: 'pi', q: 5, families: ['coils', 'caps'] });
    assert.deepEqual(clean(readLadderSolvePhrase, 'solve tee bandwidth 20 MHz'), { form: 'tee', bandwidthHz: 20e6 });
    assert.deepEqual(clean(measured, 'bench 2.s1p for wet bark with antcap = 0x1f, bank = 1'), { path: 'bench 2.s1p', caseName: 'wet bark', codes: [{ tunable: 'antcap', code: 31 }, { tunable: 'bank', code: 1 }] });
  });

  const named = (name: string): Reader<unknown> => (phrase, context) => readLetPhrase(nameOf(name), phrase, context);
  it('give names to quantities and expressions', () => {
    for (const [text, value, dimension] of [
      ['866.5 MHz', 866.5e6, [0, 0, -1, 0]], ['= f0 + 1 MHz', 867.5e6, [0, 0, -1, 0]], ['0.3 pF', 0.3e-12, [-2, -1, 4, 2]], ['45°', Math.PI / 4, [0, 0, 0, 0]], ['50 %', 0.5, [0, 0, 0, 0]], ['3', 3, [0, 0, 0, 0]], ['10 dBm', 0.01, [2, 1, -3, 0]], ['0.5 in', 0.0127, [1, 0, 0, 0]],
    ] as const) assert.deepEqual(clean(named('k'), text), { value, dimension }, text);
  });
  it('may not take the names of units, constants and functions', () => {
    for (const name of ['nH', 'm', 'MHz', 'pi', 'e', 'sqrt', 'min', 'mil', 'in', 'ohm', 'dB', 'λ', 'mod', 'to', 'not', 'x y', '1a', 'Ω1', 'µ1']) assert.equal(readPhrase(named(name), '1 nH').diagnostics[0]?.code, 'let-name', name);
    for (const name of ['f0', '_a', 'i', 'Q', 'R', 'k', 'length', 'größe']) assert.deepEqual(readPhrase(named(name), '1 nH').diagnostics, [], name);
  });

  it('that are wrong are marked where they are', () => {
    checkCarets(readLadderSolvePhrase, 'solve', '^^^^^ ladder-solve');
    checkCarets(readLadderSolvePhrase, 'solve up to 9 elements', '            ^ ladder-solve');
    checkCarets(readLadderSolvePhrase, 'solve pi Q 0', '           ^ not-physical');
    checkCarets(measured, 'a.csv', '^^^^^ measured');
    checkCarets(measured, 'a.s1p with antcap', `${' '.repeat(17)} measured`);
    checkCarets(measured, 'a.s1p with antcap = x', '                    ^ code');
    checkCarets(named('k'), '= f0 + 1', '^^^^^^^^ expression');
    checkCarets(named('k'), '866.5 MHz * 2', '          ^^^ unexpected-words');
    checkCarets(named('k'), '3 dB', '  ^^ unit-wrong');
  });
});
