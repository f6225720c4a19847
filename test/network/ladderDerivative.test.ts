import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { Element } from '../../src/network/element';
import { sampleImpedance } from '../../src/network/immittance';
import { ladderDerivatives } from '../../src/network/ladderDerivative';
import { ladderKernel } from '../../src/network/ladderKernel';
import type { Loss, Part, PartKind } from '../../src/network/part';

const frequencyHz = Float64Array.of(700e6, 868e6, 1.1e9);
const omega = 2 * Math.PI * 868e6;

const loss = fc.oneof<fc.Arbitrary<Loss>[]>(fc.constant({ law: 'none' }), fc.integer({ min: 5, max: 200 }).map((q): Loss => ({ law: 'constant q', q })),
  fc.integer({ min: 5, max: 200 }).map((q): Loss => ({ law: 'skin effect', q, atHz: 900e6 })), fc.integer({ min: 1, max: 50 }).map((tenths): Loss => ({ law: 'resistance', resistanceOhm: tenths / 10 })));

const element = fc.record({
  kind: fc.constantFrom<PartKind>('inductor', 'capacitor', 'resistor'), orientation: fc.constantFrom<'series' | 'shunt'>('series', 'shunt'),
  reactance: fc.integer({ min: 8, max: 400 }), loss, pair: fc.boolean(), resonates: fc.boolean(), esl: fc.boolean(),
}).map(({ kind, orientation, reactance, loss: law, pair, resonates, esl }, ): Element => {
  const value = kind === 'inductor' ? reactance / omega : kind === 'capacitor' ? 1 / (omega * reactance) : reactance;
  const part: Part = {
    kind, value, loss: kind === 'resistor' ? { law: 'none' } : law, eslH: kind !== 'inductor' && esl ? 0.4e-9 : 0, srfHz: kind === 'inductor' && resonates ? 5e9 : null,
    tolerance: null, rating: null, measured: null,
  };
  return { form: 'branch', name: 'X', orientation, branch: { form: 'part', part }, pair };
});
const line: Element = { form: 'line', name: 'T', line: { impedanceOhm: 70, lengthM: 0.03, velocityFactor: 0.6, conductorLossDb: 0.2, dielectricLossDb: 0, lossAtHz: 1e9 } };

describe('derivatives of a ladder', () => {
  it('are the differences of the cascade, for every kind of part, loss and place', () => {
    const load = sampleImpedance({ form: 'constant', impedanceOhm: { re: 18, im: -37 } }, frequencyHz);
    const source = sampleImpedance({ form: 'constant', impedanceOhm: { re: 40, im: 12 } }, frequencyHz);
    fc.assert(fc.property(fc.array(element, { minLength: 1, maxLength: 4 }), fc.nat(4), (parts, place) => {
      const ladder = [...parts.slice(0, place), line, ...parts.slice(place)];
      const derivatives = ladderDerivatives(ladder, frequencyHz, source, load);
      const kernel = ladderKernel(ladder, frequencyHz, source, load);
      ladder.forEach((each, at) => {
        const derivative = derivatives[at];
        if (each.form !== 'branch' || each.branch.form !== 'part') {
          assert.equal(derivative, null);
          return;
        }
        // Central differences of 1e-4: their own error is about 1e-8 of the third derivative, and rounding about 1e-12.
        const step = 1e-4;
        const { value } = each.branch.part;
        const seen = [1, -1].map((sign) => {
          kernel.setValue(at, value * Math.exp(sign * step));
          kernel.evaluate();
          return { gamma2: kernel.reflectionMagnitude.map((m) => m * m), logGain: kernel.gain.map((g) => Math.log(g)) };
        });
        kernel.setValue(at, value);
        for (let k = 0; k < frequencyHz.length; k++) {
          const gamma2 = (seen[0].gamma2[k] - seen[1].gamma2[k]) / (2 * step);
          const logGain = (seen[0].logGain[k] - seen[1].logGain[k]) / (2 * step);
          assert.ok(Math.abs((derivative?.reflectionSquare[k] ?? NaN) - gamma2) <= 1e-5 * (1 + Math.abs(gamma2)), `|Γ|²: ${derivative?.reflectionSquare[k]} and ${gamma2}`);
          assert.ok(Math.abs((derivative?.logGain[k] ?? NaN) - logGain) <= 1e-5 * (1 + Math.abs(logGain)), `gain: ${derivative?.logGain[k]} and ${logGain}`);
        }
      });
    }), { seed: 20261204, numRuns: 200 });
  });
});
