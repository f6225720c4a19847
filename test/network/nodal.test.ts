import assert from 'node:assert/strict';
import fc from 'fast-check';
import { cascade, throughElements } from '../../src/network/cascade';
import { powerWaveReflection, transducerGain } from '../../src/network/figures';
import type { Impedance } from '../../src/network/impedance';
import { sampleImpedance } from '../../src/network/immittance';
import { ladderKernel } from '../../src/network/ladderKernel';
import { CENTRE_HZ, ladderArbitrary, terminationArbitrary } from './ladderArbitrary';
import { solveNodally } from './nodalSolution';

/** Both ways round to about 1e-13 in well-conditioned ladders; random ones near resonance lose a few digits of that. */
const TOLERANCE = 1e-9;

const frequencyHz = Float64Array.of(CENTRE_HZ * 0.8, CENTRE_HZ, CENTRE_HZ * 1.7);

const constantOf = (impedance: Impedance) => (impedance.form === 'constant' ? impedance.impedanceOhm : assert.fail('not a constant'));

describe('ladders against a general nodal solution', () => {
  it('agree in reflection and transducer gain, whatever stands in them', () => {
    fc.assert(fc.property(ladderArbitrary({ lossless: false, blockHz: frequencyHz }), terminationArbitrary, terminationArbitrary, (ladder, load, source) => {
      const loadZ = sampleImpedance(load, frequencyHz);
      const sourceZ = sampleImpedance(source, frequencyHz);
      const reflection = powerWaveReflection(throughElements(ladder, loadZ, frequencyHz), sourceZ);
      const gain = transducerGain(cascade(ladder, frequencyHz), sourceZ, loadZ);
      const kernel = ladderKernel(ladder, frequencyHz, sourceZ, loadZ);
      kernel.evaluate();
      frequencyHz.forEach((f, k) => {
        const expected = solveNodally(ladder, constantOf(load), constantOf(source), f);
        assert.ok(Math.abs(reflection.re[k] - expected.reflection.re) < TOLERANCE, `Re Γ ${reflection.re[k]} ${expected.reflection.re}`);
        assert.ok(Math.abs(reflection.im[k] - expected.reflection.im) < TOLERANCE, `Im Γ ${reflection.im[k]} ${expected.reflection.im}`);
        assert.ok(Math.abs(gain[k] - expected.gain) < TOLERANCE, `gain ${gain[k]} ${expected.gain}`);
        assert.ok(Math.abs(kernel.reflectionMagnitude[k] - Math.hypot(expected.reflection.re, expected.reflection.im)) < TOLERANCE);
        assert.ok(Math.abs(kernel.gain[k] - expected.gain) < TOLERANCE);
      });
    }), { numRuns: 120 });
  });
});
