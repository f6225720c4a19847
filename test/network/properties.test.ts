import assert from 'node:assert/strict';
import fc from 'fast-check';
import { cascade, elementAbcd, removeFixture, throughElements, type Cascade } from '../../src/network/cascade';
import { add, divide, magnitude, multiply, polar, scale, subtract, type Complex, type ComplexArray } from '../../src/network/complex';
import type { Element } from '../../src/network/element';
import { efficiency, powerWaveReflection, transducerGain } from '../../src/network/figures';
import type { Impedance } from '../../src/network/impedance';
import { reflectionOf, sampleImpedance, type Immittance } from '../../src/network/immittance';
import { idealPart } from '../../src/network/part';
import { CENTRE_HZ, elementArbitrary, ladderArbitrary, terminationArbitrary } from './ladderArbitrary';

const frequencyHz = Float64Array.of(CENTRE_HZ * 0.6, CENTRE_HZ, CENTRE_HZ * 2.1);
const lossless = ladderArbitrary({ lossless: true });
const lossy = ladderArbitrary({ lossless: false });
const withBlocks = ladderArbitrary({ lossless: false, blockHz: frequencyHz });

/** Rounding of up to seven elements, some near resonance: cancellations lose a few digits of 16. */
const TOLERANCE = 1e-8;

const at = (x: ComplexArray, k: number): Complex => ({ re: x.re[k], im: x.im[k] });
const sampled = (impedance: Impedance) => sampleImpedance(impedance, frequencyHz);
const close = (a: Complex, b: Complex, limit = TOLERANCE) => assert.ok(magnitude(subtract(a, b)) <= limit, `${JSON.stringify(a)} is not ${JSON.stringify(b)}`);
const everyPoint = (check: (k: number) => void) => frequencyHz.forEach((_, k) => check(k));

/** AD − BC of the true matrix, and the size of its two products, to which its rounding is proportional. */
function determinant(network: Cascade, k: number): { value: Complex; size: number } {
  const squared = multiply(at(network.scale, k), at(network.scale, k));
  const ad = divide(multiply(at(network.a, k), at(network.d, k)), squared);
  const bc = divide(multiply(at(network.b, k), at(network.c, k)), squared);
  return { value: subtract(ad, bc), size: 1 + magnitude(ad) + magnitude(bc) };
}

describe('what holds for every ladder', () => {
  it('is reciprocal: AD − BC = 1', () => {
    fc.assert(fc.property(withBlocks, (ladder) => {
      const network = cascade(ladder, frequencyHz);
      everyPoint((k) => {
        const { value, size } = determinant(network, k);
        close(value, { re: 1, im: 0 }, TOLERANCE * size);
      });
    }), { numRuns: 200 });
  });

  it('without loss reflects what it does not pass on: 1 − |Γ|² = G', () => {
    fc.assert(fc.property(lossless, terminationArbitrary, terminationArbitrary, (ladder, load, source) => {
      const reflection = powerWaveReflection(throughElements(ladder, sampled(load), frequencyHz), sampled(source));
      const gain = transducerGain(cascade(ladder, frequencyHz), sampled(source), sampled(load));
      everyPoint((k) => assert.ok(Math.abs(1 - magnitude(at(reflection, k)) ** 2 - gain[k]) < TOLERANCE));
    }), { numRuns: 200 });
  });

  it('without loss has real A and D, imaginary B and C', () => {
    fc.assert(fc.property(lossless, (ladder) => {
      const network = cascade(ladder, frequencyHz);
      everyPoint((k) => {
        const of = (entry: ComplexArray) => divide(at(entry, k), at(network.scale, k));
        const [a, b, c, d] = [of(network.a), of(network.b), of(network.c), of(network.d)];
        const size = 1 + magnitude(a) + magnitude(d) + magnitude(b) / 50 + magnitude(c) * 50;
        assert.ok(Math.abs(a.im) + Math.abs(d.im) + Math.abs(b.re) / 50 + Math.abs(c.re) * 50 < TOLERANCE * size);
      });
    }), { numRuns: 200 });
  });

  it('without loss ends the power of a lossless load where it came from: |Γ| = 1, no gain, no efficiency', () => {
    // A reflection coefficient of magnitude 1 is lossless but for rounding.
    const onTheRim = fc.integer({ min: 0, max: 359 }).map((degrees): Impedance => ({ form: 'reflection', reflection: polar(1, degrees), referenceOhm: 50 }));
    const ends = fc.oneof(onTheRim, fc.constantFrom<Impedance>({ form: 'open' }, { form: 'short' }, { form: 'constant', impedanceOhm: { re: 0, im: -37 } }));
    fc.assert(fc.property(lossless, ends, (ladder, load) => {
      const input = throughElements(ladder, sampled(load), frequencyHz);
      const network = cascade(ladder, frequencyHz);
      const gain = transducerGain(network, sampled({ form: 'constant', impedanceOhm: { re: 50, im: 20 } }), sampled(load));
      const share = efficiency(network, sampled(load));
      everyPoint((k) => {
        assert.ok(Math.abs(magnitude(at(reflectionOf(input, 50), k)) - 1) < TOLERANCE);
        assert.ok(Math.abs(gain[k]) < 1e-12);
        assert.ok(Number.isNaN(share[k]), `efficiency ${share[k]}`);
      });
    }), { numRuns: 500 });
  });

  it('is passive: |Γ| ≤ 1, G ≤ 1 − |Γ|², and the efficiency is what is left of it', () => {
    fc.assert(fc.property(withBlocks, terminationArbitrary, terminationArbitrary, (ladder, load, source) => {
      const network = cascade(ladder, frequencyHz);
      const reflection = powerWaveReflection(throughElements(ladder, sampled(load), frequencyHz), sampled(source));
      const gain = transducerGain(network, sampled(source), sampled(load));
      const share = efficiency(network, sampled(load));
      everyPoint((k) => {
        const entering = 1 - magnitude(at(reflection, k)) ** 2;
        assert.ok(entering >= -TOLERANCE && gain[k] >= 0 && gain[k] <= entering + TOLERANCE, `${gain[k]} of ${entering}`);
        // Power balance: what enters times the share that arrives is what arrives.
        assert.ok(Math.abs(entering * share[k] - gain[k]) < TOLERANCE);
      });
    }), { numRuns: 200 });
  });

  it('gives what stood behind it back when it is removed', () => {
    fc.assert(fc.property(lossy, terminationArbitrary, (fixture, load) => {
      const before = reflectionOf(sampled(load), 50);
      const after = reflectionOf(removeFixture(throughElements(fixture, sampled(load), frequencyHz), fixture, frequencyHz), 50);
      const network = cascade(fixture, frequencyHz);
      everyPoint((k) => {
        // What the fixture loses both ways cannot be had back more exactly than it was kept.
        const { size } = determinant(network, k);
        close(at(after, k), at(before, k), 1e-11 * size ** 2 + 1e-10);
      });
    }), { numRuns: 200 });
  });

  it('is one matrix, whether seen through or multiplied', () => {
    fc.assert(fc.property(withBlocks, terminationArbitrary, (ladder, load) => {
      const network = cascade(ladder, frequencyHz);
      const z = sampled(load);
      const seen = reflectionOf(throughElements(ladder, z, frequencyHz), 50);
      const product = ladder.map((element) => elementAbcd(element, frequencyHz));
      everyPoint((k) => {
        let v = at(z.numerator, k);
        let i = at(z.denominator, k);
        for (const one of product) {
          [v, i] = [add(multiply(at(one.a, k), v), multiply(at(one.b, k), i)), add(multiply(at(one.c, k), v), multiply(at(one.d, k), i))];
        }
        close(divide(subtract(v, scale(i, 50)), add(v, scale(i, 50))), at(seen, k));
        const top = add(multiply(at(network.a, k), at(z.numerator, k)), multiply(at(network.b, k), at(z.denominator, k)));
        const bottom = add(multiply(at(network.c, k), at(z.numerator, k)), multiply(at(network.d, k), at(z.denominator, k)));
        close(divide(subtract(top, scale(bottom, 50)), add(top, scale(bottom, 50))), at(seen, k));
      });
    }), { numRuns: 100 });
  });

  it('turned round swaps A and D, for a reciprocal one', () => {
    const symmetric = ladderArbitrary({ lossless: false }).map((ladder) => ladder.filter(({ form }) => form !== 'transformer'));
    fc.assert(fc.property(symmetric, (ladder) => {
      const forward = cascade(ladder, frequencyHz);
      const backward = cascade([...ladder].reverse(), frequencyHz);
      everyPoint((k) => {
        const of = (network: Cascade, entry: ComplexArray) => divide(at(entry, k), at(network.scale, k));
        const size = 1 + magnitude(of(forward, forward.a)) + magnitude(of(forward, forward.d)) + magnitude(of(forward, forward.b)) / 50 + magnitude(of(forward, forward.c)) * 50;
        close(of(forward, forward.a), of(backward, backward.d), TOLERANCE * size);
        close(of(forward, forward.d), of(backward, backward.a), TOLERANCE * size);
        close(of(forward, forward.b), of(backward, backward.b), TOLERANCE * 50 * size);
        close(of(forward, forward.c), of(backward, backward.c), (TOLERANCE / 50) * size);
      });
    }), { numRuns: 200 });
  });

  it('has the same gain both ways: source and load may change places', () => {
    fc.assert(fc.property(ladderArbitrary({ lossless: false }).map((ladder) => ladder.filter(({ form }) => form !== 'transformer')), terminationArbitrary, terminationArbitrary, (ladder, load, source) => {
      const forward = transducerGain(cascade(ladder, frequencyHz), sampled(source), sampled(load));
      const backward = transducerGain(cascade([...ladder].reverse(), frequencyHz), sampled(load), sampled(source));
      everyPoint((k) => assert.ok(Math.abs(forward[k] - backward[k]) < TOLERANCE));
    }), { numRuns: 100 });
  });

  it('keeps its reflection when impedances go up by a factor, or sizes down and frequencies up', () => {
    const simple = fc.array(fc.tuple(fc.constantFrom('series' as const, 'shunt' as const), fc.constantFrom('inductor' as const, 'capacitor' as const, 'resistor' as const), fc.double({ min: 0.1, max: 8, noNaN: true })), { maxLength: 7 });
    const build = (rows: readonly (readonly ['series' | 'shunt', 'inductor' | 'capacitor' | 'resistor', number])[], ohms: number, hz: number): Element[] =>
      rows.map(([orientation, kind, g], i) => ({
        form: 'branch', name: `X${i}`, orientation, pair: false,
        branch: { form: 'part', part: idealPart(kind, kind === 'inductor' ? (g * ohms) / hz : kind === 'capacitor' ? g / ohms / hz : g * ohms) },
      }));
    fc.assert(fc.property(simple, fc.double({ min: 0.01, max: 1e4, noNaN: true }), fc.double({ min: 1e3, max: 1e10, noNaN: true }), (rows, ohms, hz) => {
      const normal = (ladder: Element[], r: number, f: number) => {
        const z = (value: number) => sampleImpedance({ form: 'constant', impedanceOhm: { re: value, im: 0.3 * value } }, Float64Array.of(f));
        return at(powerWaveReflection(throughElements(ladder, z(2 * r), Float64Array.of(f)), z(r)), 0);
      };
      close(normal(build(rows, 1, 1), 1, 0.2), normal(build(rows, ohms, hz), ohms, 0.2 * hz));
    }), { numRuns: 200 });
  });

  it('stays finite however long it grows', () => {
    fc.assert(fc.property(elementArbitrary({ lossless: false }), terminationArbitrary, (element, load) => {
      const ladder = Array.from({ length: 400 }, () => element);
      const network = cascade(ladder, frequencyHz);
      const seen: Immittance = throughElements(ladder, sampled(load), frequencyHz);
      const gain = transducerGain(network, sampled(load), sampled(load));
      everyPoint((k) => {
        const gamma = at(reflectionOf(seen, 50), k);
        assert.ok(magnitude(gamma) <= 1 + 1e-6, `|Γ| ${magnitude(gamma)}`);
        assert.ok(gain[k] >= 0 && gain[k] <= 1 + 1e-6, `gain ${gain[k]}`);
        for (const entry of [network.a, network.b, network.c, network.d, network.scale]) assert.ok(Number.isFinite(entry.re[k]) && Number.isFinite(entry.im[k]));
      });
    }), { numRuns: 60 });
  });
});
