import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { NetworkData } from '../../../src/network/networkData';
import { writeTouchstone } from '../../../src/network/touchstone/writeTouchstone';
import { legal } from './files';

const network: fc.Arbitrary<NetworkData> = fc.integer({ min: 1, max: 4 }).chain((ports) =>
  fc.uniqueArray(fc.double({ min: 1, max: 1e11, noNaN: true }), { minLength: 1, maxLength: 12, selector: (hz) => Math.round(1e3 * Math.log(hz)) }).chain((hz) =>
    fc.record({
      references: fc.array(fc.double({ min: 0.5, max: 1000, noNaN: true }), { minLength: ports, maxLength: ports }),
      same: fc.boolean(),
      values: fc.array(fc.double({ min: -1.2, max: 1.2, noNaN: true }), { minLength: 2 * hz.length * ports ** 2, maxLength: 2 * hz.length * ports ** 2 }),
    }).map(({ references, same, values }) => ({
      ports, frequencyHz: Float64Array.from(hz).sort(), referenceOhm: Float64Array.from(references, (reference) => (same ? references[0] : reference)),
      sRe: Float64Array.from(values.slice(0, values.length / 2)), sIm: Float64Array.from(values.slice(values.length / 2)),
    }))));

/** Twelve digits are written; a magnitude in dB loses some of them to its logarithm. */
const close = (actual: number, expected: number) => Math.abs(actual - expected) <= 1e-9 * Math.max(1, Math.abs(expected));

describe('writing Touchstone files', () => {
  it('gives back what was written, in every unit and format', () => {
    fc.assert(fc.property(network, fc.constantFrom('Hz', 'kHz', 'MHz', 'GHz'), fc.constantFrom('RI', 'MA', 'DB'), (data, unit, format) => {
      const { data: read, warnings } = legal(`a.s${data.ports}p`, writeTouchstone(data, { comments: ['an invented network'], unit, format }));
      assert.equal(read.ports, data.ports);
      assert.equal(read.frequencyHz.length, data.frequencyHz.length);
      assert.ok(read.frequencyHz.every((hz, k) => hz === data.frequencyHz[k]));
      assert.ok(read.referenceOhm.every((ohm, i) => close(ohm, data.referenceOhm[i])));
      assert.ok(read.sRe.every((value, i) => close(value, data.sRe[i])));
      assert.ok(read.sIm.every((value, i) => close(value, data.sIm[i])));
      assert.ok(warnings.every(({ message }) => /above 1/.test(message)));
    }), { numRuns: 200 });
  });

  it('writes an option line, comments in ASCII and one point a line', () => {
    const data: NetworkData = { ports: 1, frequencyHz: Float64Array.of(863e6, 870e6), referenceOhm: Float64Array.of(50), sRe: Float64Array.of(0.5, 0), sIm: Float64Array.of(-0.25, 1e-13) };
    assert.equal(writeTouchstone(data, { comments: ['load of 50 Ω', 'two\nlines'], unit: 'MHz' }), '! load of 50 ?\n! two?lines\n# MHz S RI R 50\n863 0.5 -0.25\n870 0 1e-13\n');
  });

  it('writes a zero in decibels as a very small number', () => {
    const data: NetworkData = { ports: 1, frequencyHz: Float64Array.of(1e9), referenceOhm: Float64Array.of(50), sRe: Float64Array.of(0), sIm: Float64Array.of(0) };
    const { data: read } = legal('a.s1p', writeTouchstone(data, { comments: [], format: 'DB' }));
    assert.ok(Math.hypot(read.sRe[0], read.sIm[0]) <= 1e-19);
  });

  it('writes the second port column by column, as version 1 has it', () => {
    const data: NetworkData = { ports: 2, frequencyHz: Float64Array.of(1), referenceOhm: Float64Array.of(50, 75), sRe: Float64Array.of(0.11, 0.12, 0.21, 0.22), sIm: new Float64Array(4) };
    assert.equal(writeTouchstone(data, { comments: [] }), '# Hz S RI R 50 75\n1 0.11 0 0.21 0 0.12 0 0.22 0\n');
  });

  it('leaves points out that are not known, and keeps neighbouring frequencies apart', () => {
    const data: NetworkData = { ports: 1, frequencyHz: Float64Array.of(1e9, 1e9 + 2 ** -23, 1.5e9, 2e9), referenceOhm: Float64Array.of(50), sRe: Float64Array.of(0.1, 0.2, NaN, 0.3), sIm: new Float64Array(4) };
    for (const unit of ['Hz', 'kHz', 'MHz', 'GHz'] as const) assert.deepEqual([...legal('a.s1p', writeTouchstone(data, { comments: [], unit })).data.frequencyHz], [1e9, 1e9 + 2 ** -23, 2e9]);
  });
});
