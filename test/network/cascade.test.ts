import assert from 'node:assert/strict';
import { cascade, elementAbcd, throughElements } from '../../src/network/cascade';
import { divide, type ComplexArray } from '../../src/network/complex';
import type { Element } from '../../src/network/element';
import { efficiency, powerWaveReflection, transducerGain } from '../../src/network/figures';
import type { Impedance } from '../../src/network/impedance';
import { impedanceOf, reflectionOf } from '../../src/network/immittance';
import { capacitor, coil, hz, lineOf, nearComplex, near, ohm, pointOf, resistor, sampled, series, shunt, stub, through, transformer } from './expect';

const F = 868e6;
const W = 2 * Math.PI * F;
const open: Impedance = { form: 'open' };
const short: Impedance = { form: 'short' };
/** ω = 1, so that coils and capacitors of 1 resonate exactly. */
const ONE = 1 / (2 * Math.PI);

const input = (ladder: readonly Element[], load: Impedance, frequencyHz = F) => throughElements(ladder, sampled(load, frequencyHz), hz(frequencyHz));
const zin = (ladder: readonly Element[], load: Impedance, frequencyHz = F) => pointOf(impedanceOf(input(ladder, load, frequencyHz)));
const gamma = (ladder: readonly Element[], load: Impedance, frequencyHz = F) => pointOf(reflectionOf(input(ladder, load, frequencyHz), 50));
const gainOf = (ladder: readonly Element[], load: Impedance, frequencyHz = F) =>
  transducerGain(cascade(ladder, hz(frequencyHz)), sampled(ohm(50), frequencyHz), sampled(load, frequencyHz))[0];
const efficiencyOf = (ladder: readonly Element[], load: Impedance, frequencyHz = F) => efficiency(cascade(ladder, hz(frequencyHz)), sampled(load, frequencyHz))[0];

describe('one element', () => {
  const matrix = (element: Element, frequencyHz = F) => {
    const one = elementAbcd(element, hz(frequencyHz));
    const of = (entry: ComplexArray) => divide(pointOf(entry), pointOf(one.scale));
    return [of(one.a), of(one.b), of(one.c), of(one.d)];
  };
  const z = (re: number, im = 0) => ({ re, im });
  // Pozar, Microwave Engineering, Table 4.1 (from memory).
  const cases: readonly [string, Element, { re: number; im: number }[]][] = [
    ['in series', series(ohm(3, 40)), [z(1), z(3, 40), z(0), z(1)]],
    ['in shunt', shunt(ohm(0, 40)), [z(1), z(0), z(0, -1 / 40), z(1)]],
    ['a pair in series is twice the impedance', series(ohm(3, 40), true), [z(1), z(6, 80), z(0), z(1)]],
    ['a pair in shunt is twice the impedance', shunt(ohm(0, 40), true), [z(1), z(0), z(0, -1 / 80), z(1)]],
    ['a bridge', { form: 'bridge', name: 'L1', orientation: 'series' }, [z(1), z(0), z(0), z(1)]],
    ['empty pads', { form: 'not fitted', name: 'C1', orientation: 'shunt', kind: 'capacitor' }, [z(1), z(0), z(0), z(1)]],
    ['a quarter wave', through(lineOf(70, 90, F)), [z(0), z(0, 70), z(0, 1 / 70), z(0)]],
    ['an ideal transformer 1:2', transformer(1, 2), [z(0.5), z(0), z(0), z(2)]],
    ['an open stub of λ/8 is −jZ0', stub('open', lineOf(70, 45, F)), [z(1), z(0), z(0, 1 / 70), z(1)]],
    ['a shorted stub of λ/8 is +jZ0', stub('short', lineOf(70, 45, F)), [z(1), z(0), z(0, -1 / 70), z(1)]],
    ['two windings fully coupled', transformer(1, 2, 50 / W, 1), [z(0.5), z(0), z(0, -1 / 100), z(2)]],
  ];
  for (const [title, element, expected] of cases) {
    it(title, () => matrix(element).forEach((entry, i) => nearComplex(entry, expected[i], 1e-12, 'ABCD'[i])));
  }

  it('two windings are two inductances and what they share', () => {
    // L1 = 3 µH, L2 = 12 µH, M = 0.9·6 µH: open, the source sees L1; shorted, L1(1 − k²).
    const element = transformer(1, 2, 3e-6, 0.9);
    nearComplex(zin([element], open), { re: 0, im: W * 3e-6 }, 1e-7);
    nearComplex(zin([element], short), { re: 0, im: W * 3e-6 * (1 - 0.81) }, 1e-7);
    near(zin([{ ...element, coupling: 0 } as Element], ohm(50)).im, W * 3e-6, 1e-7);
    assert.equal(gainOf([{ ...element, coupling: 0 } as Element], ohm(50)), 0);
  });

  it('says why it is not known', () => {
    const unsolved = elementAbcd({ form: 'unsolved', name: 'C7', orientation: 'shunt', kind: 'capacitor' }, hz(F));
    assert.deepEqual([[...unsolved.known], unsolved.reason], [[0], 'C7 is not solved yet']);
    const faulty = cascade([series(coil(1e-9)), { form: 'faulty', name: 'L1', orientation: 'series', reason: 'L1 has no value' }, shunt(coil(1e-9))], hz(F, 2 * F));
    assert.deepEqual([[...faulty.known], faulty.reason], [[0, 0], 'L1 has no value']);
    for (const entry of [faulty.a, faulty.b, faulty.c, faulty.d, faulty.scale]) assert.ok(Number.isNaN(entry.re[0]) && Number.isNaN(entry.im[1]));
  });
});

describe('limits of a ladder', () => {
  it('nothing at all passes everything', () => {
    nearComplex(zin([], ohm(18, -37)), { re: 18, im: -37 }, 0);
    near(gainOf([], ohm(50)), 1, 1e-15);
    near(efficiencyOf([], ohm(18, -37)), 1, 1e-15);
  });

  // What lets nothing through: the source sees what stands before it, exactly.
  const blocks: readonly [string, Element, number, Impedance][] = [
    ['a series open', series(open), F, open],
    ['a shunt short', shunt(short), F, short],
    ['a lossless series LC across the path, at resonance', shunt({ form: 'series', members: [coil(1), capacitor(1)] }), ONE, short],
    ['a lossless parallel LC in the path, at resonance', series({ form: 'parallel', members: [coil(1), capacitor(1)] }), ONE, open],
    ['a coil in the path exactly at its self-resonance', series(coil(1, { srfHz: ONE })), ONE, open],
    ['a capacitor across the path exactly at its self-resonance', shunt(capacitor(1, { eslH: 1 })), ONE, short],
    ['an open stub of exactly 90°', stub('open', lineOf(50, 90, F)), F, short],
  ];
  for (const [title, element, frequencyHz, seen] of blocks) {
    it(`${title}: ${seen.form} whatever the load, no gain, finite everywhere`, () => {
      for (const load of [ohm(50), ohm(18, -37), open, short, ohm(0, -12)]) {
        nearComplex(gamma([element], load, frequencyHz), { re: seen.form === 'open' ? 1 : -1, im: 0 }, 1e-9, JSON.stringify(load));
        near(gainOf([element], load, frequencyHz), 0, 1e-25);
        // More before it, and more of the same, changes nothing that is NaN.
        for (const more of [[series(ohm(20, 5))], [shunt(ohm(20, 5))], [element, element], [through(lineOf(50, 90, frequencyHz)), element], [transformer(1, 2)]]) {
          const reflection = gamma([element, ...more], load, frequencyHz);
          assert.ok(Math.hypot(reflection.re, reflection.im) <= 1 + 1e-9, `${reflection.re} ${reflection.im}`);
          near(gainOf([element, ...more], load, frequencyHz), 0, 1e-25);
        }
      }
    });
  }

  it('a quarter wave turns an open into a short and back', () => {
    const quarter = through(lineOf(50, 90, F));
    nearComplex(gamma([quarter], open), { re: -1, im: 0 }, 1e-12);
    nearComplex(gamma([quarter], short), { re: 1, im: 0 }, 1e-12);
    nearComplex(zin([quarter], ohm(100)), { re: 25, im: 0 }, 1e-12);
  });

  it('two opens one behind the other: each end sees its own', () => {
    const network = cascade([series(ohm(5)), series(open), shunt(ohm(30)), series(open), shunt(ohm(20)), series(ohm(7))], hz(F));
    nearComplex(zin([series(ohm(5)), series(open), shunt(ohm(30)), series(open), shunt(ohm(20)), series(ohm(7))], ohm(50)), { re: 27, im: 0 }, 1e-12);
    assert.deepEqual(pointOf(network.scale), { re: 0, im: 0 });
    // From the load no current ever flows: its own side is 5 Ω and an open, so only the second column is not 0.
    nearComplex(divide(pointOf(network.b), pointOf(network.d)), { re: 27, im: 0 }, 1e-12);
    assert.ok(network.a.re[0] === 0 && network.c.re[0] === 0);
    // All the power that enters ends in the 20 Ω.
    assert.equal(efficiencyOf([series(open), shunt(ohm(20))], ohm(50)), 0);
  });

  it('a block that nothing gets through shows its own reflection', () => {
    // Invented: S11 = 0.5, S22 = −0.2, nothing between.
    const data = { ports: 2, frequencyHz: hz(F), referenceOhm: hz(50, 50), sRe: hz(0.5, 0, 0, -0.2), sIm: hz(0, 0, 0, 0) };
    const wall: Element = { form: 'block', name: 'B1', data, reversed: false };
    nearComplex(gamma([wall], ohm(75)), { re: 0.5, im: 0 }, 1e-12);
    nearComplex(gamma([{ ...wall, reversed: true }], ohm(75)), { re: -0.2, im: 0 }, 1e-12);
    nearComplex(gamma([wall, wall], ohm(75)), { re: 0.5, im: 0 }, 1e-12);
    near(gainOf([wall, wall], ohm(75)), 0, 0);
    nearComplex(zin([wall, series(ohm(10))], open), { re: 160, im: 0 }, 1e-9);
  });

  it('walls that are blind to one another keep what each end sees', () => {
    // Two opens back to back: each matrix annuls the other, and an open load annuls either.
    const openWall: Element = { form: 'block', name: 'B1', reversed: false, data: { ports: 2, frequencyHz: hz(F), referenceOhm: hz(50, 50), sRe: hz(1, 0, 0, 1), sIm: hz(0, 0, 0, 0) } };
    nearComplex(gamma([openWall], open), { re: 1, im: 0 }, 0);
    nearComplex(gamma([openWall, openWall, shunt(ohm(50))], open), { re: 0, im: 0 }, 1e-15);
    const opens = cascade([openWall, openWall], hz(F));
    assert.ok(Math.hypot(opens.b.re[0], opens.b.im[0]) > 0);
    assert.deepEqual([opens.a, opens.c, opens.d, opens.scale].map((entry) => pointOf(entry)).flatMap(({ re, im }) => [Math.abs(re), Math.abs(im)]), Array(8).fill(0));
    // At 0 Hz windings are shorts: one across the other.
    const shorts = cascade([shunt(short), transformer(1, 1, 1e-6, 0.9), transformer(1, 1, 1e-6, 0.9)], hz(0));
    assert.ok(Math.hypot(shorts.c.re[0], shorts.c.im[0]) > 0 && shorts.b.re[0] === 0 && shorts.scale.im[0] === 0);
    nearComplex(gamma([shunt(short), transformer(1, 1, 1e-6, 0.9), series(ohm(50))], short, 0), { re: 0, im: 0 }, 1e-15);
  });

  it('has no efficiency where no power enters, and none left where all is lost', () => {
    assert.ok(Number.isNaN(efficiencyOf([series(coil(1e-9)), shunt(capacitor(1e-12))], open)));
    assert.ok(Number.isNaN(efficiencyOf([], short)));
    assert.ok(Number.isNaN(efficiencyOf([series(open)], ohm(50))));
    // 1 µΩ that a reactance of 1 kΩ all but hides is still there.
    near(efficiencyOf([series(ohm(1e-6, -1000))], ohm(1e-6, 1000)), 0.5, 1e-6);
    assert.equal(efficiencyOf([shunt(resistor(50))], open), 0);
    near(efficiencyOf([series(resistor(10))], ohm(40)), 0.8, 1e-15);
    near(efficiencyOf([shunt(resistor(100)), series(coil(5e-9))], ohm(50)), 2 / 3, 1e-14);
  });

  it('keeps a ladder of a thousand resonances finite', () => {
    const trap = shunt({ form: 'series', members: [coil(1), capacitor(1)] });
    const stop = series({ form: 'parallel', members: [coil(1), capacitor(1)] });
    const ladder = Array.from({ length: 1000 }, (_, i) => (i % 2 === 0 ? trap : stop));
    const network = cascade(ladder, hz(ONE, 1.5 * ONE));
    for (const entry of [network.a, network.b, network.c, network.d, network.scale]) assert.ok(entry.re.every(Number.isFinite) && entry.im.every(Number.isFinite));
    nearComplex(gamma(ladder, ohm(50), ONE), { re: 1, im: 0 }, 1e-12);
    assert.ok(powerWaveReflection(input(ladder, ohm(50), 1.5 * ONE), sampled(ohm(50), 1.5 * ONE)).re.every(Number.isFinite));
  });

  it('only unknown points of a load are unknown behind a ladder', () => {
    const table: Impedance = { form: 'table', frequencyHz: hz(1e9, 2e9), reflectionRe: hz(0.1, 0.2), reflectionIm: hz(0, 0), referenceOhm: 50 };
    const load = sampled(table, 0.5e9, 1e9, 3e9);
    const seen = throughElements([series(coil(1e-9)), through(lineOf(50, 30, 1e9)), shunt(coil(4e-9))], load, hz(0.5e9, 1e9, 3e9));
    assert.deepEqual([...seen.known], [0, 1, 0]);
    assert.equal(seen.reason, 'the table does not reach that frequency');
    assert.deepEqual([...transducerGain(cascade([], hz(0.5e9, 1e9, 3e9)), sampled(ohm(50), 1, 1, 1), load)].map(Number.isNaN), [true, false, true]);
  });
});
