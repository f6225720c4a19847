import assert from 'node:assert/strict';
import fc from 'fast-check';
import { interpolateNetwork } from '../../src/network/interpolateNetwork';
import { hz, near } from './expect';
import { networkData } from './inventedNetwork';

const uneven = [1e8, 1.3e8, 1.45e8, 2e8, 2.1e8, 3e8];
const cubic = (x: number) => 0.3 - 0.2 * x + 0.1 * x * x - 0.03 * x ** 3;

describe('values between the points of a file', () => {
  it('are those of the file at its points, to the last bit', () => {
    const data = networkData(2, uneven, (f) => [0, 1, 2, 3].map((i) => ({ re: Math.sin(f / 1e7 + i), im: Math.cos(f / 3e7 - i) })));
    const { sRe, sIm, known, reason } = interpolateNetwork(data, data.frequencyHz);
    assert.deepEqual([sRe, sIm, reason], [data.sRe, data.sIm, null]);
    assert.ok(known.every((point) => point === 1));
  });

  it('are exact for a cubic in frequency, on any grid', () => {
    const data = networkData(1, uneven, (f) => [{ re: cubic(f / 1e8), im: -2 * cubic(f / 1e8) }]);
    fc.assert(fc.property(fc.double({ min: 1e8, max: 3e8, noNaN: true }), (f) => {
      const { sRe, sIm } = interpolateNetwork(data, hz(f));
      near(sRe[0], cubic(f / 1e8), 1e-13);
      near(sIm[0], -2 * cubic(f / 1e8), 1e-13);
    }), { numRuns: 200 });
  });

  it('take the two points on either side, at the ends the first or last four', () => {
    // One point sticks out: it counts where it is one of the four, and nowhere else.
    const frequencies = [1, 2, 3, 4, 5, 6, 7, 8];
    const countsAt = (peak: number, f: number) => interpolateNetwork(networkData(1, frequencies, (x) => [{ re: x === peak ? 1 : 0, im: 0 }]), hz(f)).sRe[0] !== 0;
    const used = (f: number) => frequencies.filter((peak) => countsAt(peak, f));
    assert.deepEqual([used(4.5), used(3.1), used(1.5), used(2.5), used(7.9)], [[3, 4, 5, 6], [2, 3, 4, 5], [1, 2, 3, 4], [1, 2, 3, 4], [5, 6, 7, 8]]);
  });

  it('are within what a cubic leaves of a smooth trace: h⁴·|S⁗|·3/128 in the middle, 1/24 at the ends', () => {
    // One turn of a line, 36 points: |S⁗|·h⁴ = (2π/36)⁴ = 9.3e-4.
    const frequencies = Array.from({ length: 37 }, (_, k) => 1e9 + k * 1e7);
    const turn = (f: number) => (2 * Math.PI * (f - 1e9)) / 3.6e8;
    const data = networkData(1, frequencies, (f) => [{ re: Math.cos(turn(f)), im: Math.sin(turn(f)) }]);
    for (let f = 1e9; f <= 1.36e9; f += 0.7e6) {
      const { sRe, sIm } = interpolateNetwork(data, hz(f));
      const inside = f > 1.01e9 && f < 1.35e9;
      assert.ok(Math.hypot(sRe[0] - Math.cos(turn(f)), sIm[0] - Math.sin(turn(f))) < (2 * Math.PI / 36) ** 4 * (inside ? 3 / 128 : 1 / 24) * 1.05);
    }
  });

  it('are linear with two or three points, and one point is known at itself only', () => {
    const at = (frequencies: readonly number[], f: number) => interpolateNetwork(networkData(1, frequencies, (x) => [{ re: x * x, im: 0 }]), hz(f));
    near(at([1, 3], 1.5).sRe[0], 3, 1e-14);
    near(at([1, 3, 4], 3.5).sRe[0], 12.5, 1e-14);
    near(at([1, 3, 4], 2).sRe[0], 5, 1e-14);
    assert.equal(at([2], 2).sRe[0], 4);
    const beside = at([2], 2.001);
    assert.deepEqual([beside.known[0], beside.reason], [0, 'the file covers only 2 Hz']);
  });

  it('are never made up outside of the file', () => {
    const data = networkData(2, [7e8, 8e8, 9e8, 1e9], () => [0, 1, 2, 3].map((i) => ({ re: i / 10, im: 0 })));
    const { sRe, sIm, known, reason } = interpolateNetwork(data, hz(6.99e8, 7e8, 1e9, 1.001e9, NaN));
    assert.deepEqual([...known], [0, 1, 1, 0, 0]);
    assert.equal(reason, 'the file covers 700 MHz to 1 GHz');
    for (const values of [sRe, sIm]) assert.deepEqual([...values].map(Number.isNaN), known.reduce<boolean[]>((all, point) => [...all, ...Array<boolean>(4).fill(point === 0)], []));
    near(sRe[7], 0.3, 1e-15);
    // A rounding beside the end is the end.
    assert.equal(interpolateNetwork(data, hz(1e9 * (1 + 3e-16))).known[0], 1);
  });

  it('are not known where they would not be finite', () => {
    const data = networkData(1, [1, 2, 3, 4], (f) => [{ re: f === 3 ? -1.7e308 : 1.7e308, im: 0 }]);
    const { known, sRe, sIm, reason } = interpolateNetwork(data, hz(1, 1.5));
    assert.deepEqual([...known], [1, 0]);
    assert.ok(Number.isNaN(sRe[1]) && Number.isNaN(sIm[1]));
    assert.match(reason!, /too large/);
  });
});
