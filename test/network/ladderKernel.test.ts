import assert from 'node:assert/strict';
import fc from 'fast-check';
import { cascade, throughElements } from '../../src/network/cascade';
import type { Element } from '../../src/network/element';
import { powerWaveReflection, transducerGain } from '../../src/network/figures';
import type { Impedance } from '../../src/network/impedance';
import { sampleImpedance, type Immittance } from '../../src/network/immittance';
import { ladderKernel } from '../../src/network/ladderKernel';
import type { Part } from '../../src/network/part';
import { capacitor, coil, hz, lineOf, near, ohm, sampled, series, shunt, stub, through, transformer } from './expect';
import { CENTRE_HZ, ladderArbitrary, partArbitrary, terminationArbitrary } from './ladderArbitrary';

/** Odd and even numbers of points take different ways through the loop. */
const ODD = hz(CENTRE_HZ * 0.8, CENTRE_HZ, CENTRE_HZ * 1.7);
const EVEN = hz(CENTRE_HZ * 0.8, CENTRE_HZ, CENTRE_HZ * 1.7, CENTRE_HZ * 2.5);

interface Expected {
  readonly magnitude: number[];
  readonly gain: number[];
}

function plainly(ladder: readonly Element[], frequencyHz: Float64Array, source: Immittance, load: Immittance): Expected {
  const { re, im } = powerWaveReflection(throughElements(ladder, load, frequencyHz), source);
  return { magnitude: [...re].map((x, k) => Math.hypot(x, im[k])), gain: [...transducerGain(cascade(ladder, frequencyHz), source, load)] };
}

function same(kernel: { reflectionMagnitude: Float64Array; gain: Float64Array }, expected: Expected, tolerance = 1e-10): void {
  assert.equal(kernel.reflectionMagnitude.length, expected.magnitude.length);
  expected.magnitude.forEach((value, k) => {
    if (Number.isNaN(value)) assert.ok(Number.isNaN(kernel.reflectionMagnitude[k]) && Number.isNaN(kernel.gain[k]));
    else {
      near(kernel.reflectionMagnitude[k], value, tolerance, '|Γ|');
      near(kernel.gain[k], expected.gain[k], tolerance, 'gain');
    }
  });
}

describe('the compiled ladder', () => {
  it('gives the same as the plain way, whatever stands in it', () => {
    for (const frequencyHz of [ODD, EVEN]) {
      fc.assert(fc.property(ladderArbitrary({ lossless: false, blockHz: frequencyHz }, 9), terminationArbitrary, terminationArbitrary, (ladder, load, source) => {
        const [loadZ, sourceZ] = [sampleImpedance(load, frequencyHz), sampleImpedance(source, frequencyHz)];
        const kernel = ladderKernel(ladder, frequencyHz, sourceZ, loadZ);
        kernel.evaluate();
        same(kernel, plainly(ladder, frequencyHz, sourceZ, loadZ));
      }), { numRuns: 150 });
    }
  });

  it('follows its values, with losses, ESR, ESL and self-resonance as they were', () => {
    const element = fc.tuple(partArbitrary(false), fc.constantFrom('series' as const, 'shunt' as const), fc.boolean());
    fc.assert(fc.property(fc.array(element, { minLength: 1, maxLength: 6 }), fc.array(fc.double({ min: 0.3, max: 3, noNaN: true }), { minLength: 6, maxLength: 6 }), (rows, factors) => {
      const build = (factor: (i: number) => number) => rows.map(([part, orientation, pair], i): Element => ({
        form: 'branch', name: `X${i}`, orientation, pair, branch: { form: 'part', part: { ...part, value: part.value * factor(i) } },
      }));
      const [load, source] = [sampleImpedance(ohm(18, -37), ODD), sampleImpedance(ohm(40, 10), ODD)];
      const kernel = ladderKernel(build(() => 1), ODD, source, load);
      kernel.evaluate();
      rows.forEach(([part], i) => kernel.setValue(i, part.value * factors[i]));
      kernel.evaluate();
      same(kernel, plainly(build((i) => factors[i]), ODD, source, load));
    }), { numRuns: 200 });
  });

  it('takes other elements', () => {
    const [load, source] = [sampleImpedance(ohm(18, -37), ODD), sampleImpedance(ohm(50), ODD)];
    const first = [series(coil(5e-9)), shunt(capacitor(2e-12)), through(lineOf(50, 30, CENTRE_HZ))];
    const kernel = ladderKernel(first, ODD, source, load);
    kernel.setValue(0, 7e-9);
    const others: Element[] = [
      { form: 'not fitted', name: 'C9', orientation: 'shunt', kind: null }, transformer(2, 1, 20e-9, 0.9), stub('open', lineOf(60, 20, CENTRE_HZ)),
      series(capacitor(3e-12, { eslH: 4e-10 })), { form: 'unsolved', name: 'C8', orientation: 'shunt', kind: 'capacitor' }, shunt(coil(4e-9, { srfHz: 3e9 })),
    ];
    for (const element of others) {
      for (const index of [1, 2, 1]) {
        kernel.setElement(index, element);
        kernel.setElement(3 - index, shunt(ohm(0, -90)));
        kernel.evaluate();
        const ladder = [series(coil(7e-9)), ...(index === 1 ? [element, shunt(ohm(0, -90))] : [shunt(ohm(0, -90)), element])];
        same(kernel, plainly(ladder, ODD, source, load));
      }
    }
  });

  it('is right where the plain numbers run out: opens, shorts, resonances, very long ladders', () => {
    const one = hz(0.5 / (2 * Math.PI), 1 / (2 * Math.PI), 3 / (2 * Math.PI));
    const trap = shunt({ form: 'series', members: [coil(1), capacitor(1)] });
    const stop = series({ form: 'parallel', members: [coil(1), capacitor(1)] });
    const ladders: Element[][] = [
      [], [series({ form: 'open' })], [shunt({ form: 'short' }), series(ohm(20))], [trap, stop, trap], [stop, stop, series(ohm(0.5))],
      [series(coil(1, { srfHz: 1 / (2 * Math.PI) })), shunt(ohm(2))], [shunt(capacitor(1, { eslH: 1 })), series(ohm(2))], [shunt(coil(0)), series(capacitor(0))],
      Array.from({ length: 600 }, (_, i) => (i % 2 === 0 ? shunt(ohm(0.01, 0.001)) : series(ohm(100, 20)))),
      [transformer(1, 2, 1, 0), shunt(ohm(3))],
    ];
    for (const ladder of ladders) {
      for (const load of [ohm(1.5, 0.2), { form: 'open' }, { form: 'short' }] as Impedance[]) {
        const [loadZ, sourceZ] = [sampleImpedance(load, one), sampleImpedance(ohm(1, 0.3), one)];
        const kernel = ladderKernel(ladder, one, sourceZ, loadZ);
        kernel.evaluate();
        assert.ok([...kernel.reflectionMagnitude, ...kernel.gain].every(Number.isFinite));
        same(kernel, plainly(ladder, one, sourceZ, loadZ));
      }
    }
  });

  it('goes on from a value of nothing to a real one', () => {
    const kernel = ladderKernel([shunt(capacitor(0))], ODD, sampleImpedance(ohm(50), ODD), sampleImpedance(ohm(50), ODD));
    kernel.evaluate();
    kernel.reflectionMagnitude.forEach((value) => near(value, 0, 1e-15));
    kernel.setValue(0, 2e-12);
    kernel.evaluate();
    same(kernel, plainly([shunt(capacitor(2e-12))], ODD, sampleImpedance(ohm(50), ODD), sampleImpedance(ohm(50), ODD)));
  });

  it('knows only what its ends and elements know', () => {
    const table: Impedance = { form: 'table', frequencyHz: hz(ODD[0], ODD[1]), reflectionRe: hz(0.1, 0.2), reflectionIm: hz(0, 0), referenceOhm: 50 };
    const kernel = ladderKernel([series(coil(1e-9))], ODD, sampleImpedance(ohm(50), ODD), sampleImpedance(table, ODD));
    kernel.evaluate();
    assert.deepEqual([...kernel.gain].map(Number.isNaN), [false, false, true]);
    assert.deepEqual([...kernel.reflectionMagnitude].map(Number.isNaN), [false, false, true]);
  });

  it('refuses a value where there is none to set', () => {
    const kernel = ladderKernel([through(lineOf(50, 30, CENTRE_HZ))], ODD, sampleImpedance(ohm(50), ODD), sampleImpedance(ohm(50), ODD));
    assert.throws(() => kernel.setValue(0, 1), /has no value to set/);
  });

  it('of no points is nothing', () => {
    const kernel = ladderKernel([series(coil(1e-9))], hz(), sampled(ohm(50)), sampled(ohm(50)));
    kernel.evaluate();
    assert.equal(kernel.points, 0);
  });

  it('keeps the part of another law apart from a proportional one', () => {
    // A coil with ESR: doubling L must not double the ESR.
    const esr: Part['loss'] = { law: 'resistance', resistanceOhm: 2 };
    const kernel = ladderKernel([series(coil(5e-9, { loss: esr }))], ODD, sampleImpedance(ohm(50), ODD), sampleImpedance(ohm(50), ODD));
    kernel.setValue(0, 10e-9);
    kernel.evaluate();
    same(kernel, plainly([series(coil(10e-9, { loss: esr }))], ODD, sampleImpedance(ohm(50), ODD), sampleImpedance(ohm(50), ODD)));
  });
});
