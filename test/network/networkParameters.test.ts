import assert from 'node:assert/strict';
import fc from 'fast-check';
import { cascade, throughElements } from '../../src/network/cascade';
import { add, complex, divide, multiply, scale, subtract, type Complex } from '../../src/network/complex';
import { transducerGain } from '../../src/network/figures';
import { impedanceOf, reflectionOf } from '../../src/network/immittance';
import { abcdOfNetwork, networkOfAbcd } from '../../src/network/networkParameters';
import { renormalise } from '../../src/network/renormalise';
import { CENTRE_HZ, ladderArbitrary, terminationArbitrary } from './ladderArbitrary';
import { capacitor, coil, hz, lineOf, near, nearComplex, ohm, pointOf, resistor, sampled, series, shunt, through } from './expect';
import { networkData } from './inventedNetwork';

const frequencyHz = hz(CENTRE_HZ * 0.7, CENTRE_HZ, CENTRE_HZ * 1.9);
const reference = fc.double({ min: 5, max: 300, noNaN: true });
const part = fc.double({ min: -0.9, max: 0.9, noNaN: true });
const entry = fc.record({ re: part, im: part });

describe('two-port files and ABCD matrices', () => {
  it('are the same network: a ladder written as S and read back acts alike, with any references, either way round', () => {
    fc.assert(fc.property(ladderArbitrary({ lossless: false }), reference, reference, terminationArbitrary, fc.boolean(), (ladder, r1, r2, load, reversed) => {
      const forward = cascade(ladder, frequencyHz);
      const data = networkOfAbcd(forward, r1, r2);
      fc.pre(data !== null && data.frequencyHz.length === frequencyHz.length);
      // Where next to nothing passes, S21 has no digits left to divide by.
      fc.pre(data.sRe.every((_, i) => i % 4 !== 2 || Math.hypot(data.sRe[i], data.sIm[i]) > 1e-4));
      const turned = reversed ? { ...data, referenceOhm: data.referenceOhm.slice().reverse(), sRe: data.sRe.slice(), sIm: data.sIm.slice() } : data;
      if (reversed) {
        for (const values of [turned.sRe, turned.sIm]) for (let k = 0; k < values.length; k += 4) values.subarray(k, k + 4).reverse();
      }
      const block = { form: 'block' as const, name: 'X1', data: turned, reversed };
      const z = sampled(load, ...frequencyHz);
      const expected = reflectionOf(throughElements(ladder, z, frequencyHz), 50);
      const actual = reflectionOf(throughElements([block], z, frequencyHz), 50);
      frequencyHz.forEach((_, k) => nearComplex(pointOf(actual, k), pointOf(expected, k), 1e-7));
      const source = sampled(ohm(35, 10), ...frequencyHz);
      const gain = transducerGain(cascade([block], frequencyHz), source, z);
      transducerGain(forward, source, z).forEach((value, k) => near(gain[k], value, 1e-7));
    }), { numRuns: 200 });
  });

  it('agree with known ones: a series 30 + j40 Ω and a quarter wave', () => {
    // S11 = Z/(Z + 100), S21 = 100/(Z + 100) (Pozar, Microwave Engineering, Tables 4.1 and 4.2).
    const z = complex(30, 40);
    const data = networkOfAbcd(cascade([series(ohm(30, 40))], hz(1e9)), 50, 50)!;
    const expected = [divide(z, add(z, complex(100))), divide(complex(100), add(z, complex(100)))];
    [0, 1, 1, 0].forEach((which, i) => nearComplex({ re: data.sRe[i], im: data.sIm[i] }, expected[which], 1e-15));
    const line = networkOfAbcd(cascade([through(lineOf(50, 90, 1e9))], hz(1e9)), 50, 50)!;
    [complex(0), complex(0, -1), complex(0, -1), complex(0)].forEach((value, i) => nearComplex({ re: line.sRe[i], im: line.sIm[i] }, value, 1e-15));
  });

  it('a ladder of three has S as derived: 3 pF across, 5 nH in series, 30° of 50 Ω at 1 GHz (own recomputation)', () => {
    const data = networkOfAbcd(cascade([through(lineOf(50, 30, 1e9)), series(coil(5e-9)), shunt(capacitor(3e-12))], hz(1e9)), 50, 50)!;
    const magnitudes = [0, 2, 3].map((i) => Math.hypot(data.sRe[i], data.sIm[i]));
    const angles = [0, 2, 3].map((i) => (Math.atan2(data.sIm[i], data.sRe[i]) * 180) / Math.PI);
    [0.3177988, 0.9481582, 0.3177988].forEach((value, i) => near(magnitudes[i], value, 6e-8));
    [-76.07845, -78.13177, 99.81492].forEach((value, i) => near(angles[i], value, 6e-6));
  });

  it('stay finite where nothing passes: each side sees its own end', () => {
    const blocking = networkData(2, [1e9], () => [complex(0.5), complex(0), complex(0), complex(-0.25)], [50, 75]);
    const network = abcdOfNetwork(blocking, hz(1e9), false);
    assert.deepEqual([network.known[0], network.reason, pointOf(network.scale)], [1, null, complex(0)]);
    const block = { form: 'block' as const, name: 'X1', data: blocking, reversed: false };
    for (const load of [ohm(50), ohm(0.001), { form: 'open' } as const]) {
      nearComplex(pointOf(impedanceOf(throughElements([block], sampled(load, 1e9), hz(1e9)))), complex(150), 1e-10);
      nearComplex(pointOf(impedanceOf(throughElements([{ ...block, reversed: true }], sampled(load, 1e9), hz(1e9)))), complex(45), 1e-10);
    }
    near(transducerGain(network, sampled(ohm(50), 1e9), sampled(ohm(50), 1e9))[0], 0, 0);
    const back = networkOfAbcd(network, 50, 75)!;
    [0.5, 0, 0, -0.25].forEach((value, i) => near(back.sRe[i], value, 1e-15));
  });

  it('hold an amplifier too: S12 = 0, |S21| > 1', () => {
    const data = networkData(2, [1e9], () => [complex(0.2, 0.1), complex(0), complex(-3, 2), complex(0.1, -0.4)]);
    const network = abcdOfNetwork(data, hz(1e9), false);
    // |S21|² is the gain between the references.
    near(transducerGain(network, sampled(ohm(50), 1e9), sampled(ohm(50), 1e9))[0], 13, 1e-13);
  });

  it('are not known outside of the file, for other counts of ports, and where they would not be finite', () => {
    const data = networkData(2, [1e9, 2e9], () => [complex(0), complex(1), complex(1), complex(0)]);
    const network = abcdOfNetwork(data, hz(1e9, 3e9), false);
    assert.deepEqual([[...network.known], network.reason], [[1, 0], 'the file covers 1 GHz to 2 GHz']);
    assert.ok(Number.isNaN(network.a.re[1]) && Number.isNaN(network.scale.im[1]));
    for (const ports of [1, 3]) {
      const other = abcdOfNetwork(networkData(ports, [1e9], () => Array.from({ length: ports ** 2 }, () => complex(0))), hz(1e9), false);
      assert.equal(other.known[0], 0);
      assert.match(other.reason!, /two are needed/);
    }
    const large = abcdOfNetwork(networkData(2, [1e9], () => [complex(1e200), complex(1e200), complex(1e200), complex(1e200)]), hz(1e9), false);
    assert.deepEqual([large.known[0], Number.isNaN(large.b.re[0])], [0, true]);
    assert.match(large.reason!, /too large/);
    assert.equal(networkOfAbcd(large, 50, 50), null);
  });
});

describe('other references', () => {
  const three = fc.tuple(...Array.from({ length: 9 }, () => entry));
  const references = fc.tuple(reference, reference, reference);
  const matrix = (values: readonly Complex[]) => [values.slice(0, 3), values.slice(3, 6), values.slice(6, 9)].map((row) => row.map((value) => scale(value, 0.3)));

  it('there and back is where one was', () => {
    fc.assert(fc.property(three, references, references, (values, from, to) => {
      const s = matrix(values);
      const there = renormalise(s, from, to);
      assert.ok(there);
      const back = renormalise(there, to, from)!;
      // Far references lose a few digits.
      s.forEach((row, i) => row.forEach((value, j) => nearComplex(back[i][j], value, 1e-9)));
    }), { numRuns: 200 });
  });

  it('of one port are Γ of the same impedance', () => {
    const [[moved]] = renormalise([[complex(0.2, 0.3)]], [50], [75])!;
    const z = scale(divide(complex(1.2, 0.3), complex(0.8, -0.3)), 50);
    nearComplex(moved, divide(subtract(z, complex(75)), add(z, complex(75))), 1e-15);
  });

  it('of two ports are those of the ABCD matrix', () => {
    const ladder = cascade([series(coil(5e-9)), shunt(resistor(80)), through(lineOf(30, 50, 1e9))], hz(1e9));
    const of = (r1: number, r2: number) => {
      const { sRe, sIm } = networkOfAbcd(ladder, r1, r2)!;
      return [0, 1].map((row) => [0, 1].map((column) => ({ re: sRe[2 * row + column], im: sIm[2 * row + column] })));
    };
    const moved = renormalise(of(50, 50), [50, 50], [20, 120])!;
    of(20, 120).forEach((row, i) => row.forEach((value, j) => nearComplex(moved[i][j], value, 1e-14)));
  });

  it('do not exist for a port that shows minus the new reference', () => {
    // Γ = −3 against 50 Ω is −25 Ω.
    assert.equal(renormalise([[complex(-3)]], [50], [25]), null);
    nearComplex(multiply(renormalise([[complex(-3)]], [50], [75])![0][0], complex(1)), complex(-2), 1e-14);
  });
});
