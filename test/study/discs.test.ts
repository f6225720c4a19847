import assert from 'node:assert/strict';
import fc from 'fast-check';
import { add, complex, conjugate, divide, magnitude, multiply, scale, subtract, type Complex } from '../../src/network/complex';
import { goalDiscs, reflectionLimit, reflectionRegion, type Region } from '../../src/study/discs';
import { band, goalOf, ohms, points, problemOf } from './problems';

/** By definition: w → Z → power-wave reflection. */
function reflectionAt(w: Complex, sourceOhm: Complex, z0Ohm: number): number {
  const z = scale(divide(add(complex(1), w), subtract(complex(1), w)), z0Ohm);
  return magnitude(divide(subtract(z, conjugate(sourceOhm)), add(z, sourceOhm)));
}

/** Positive inside of the region, in units of the chart. */
function depth(region: Region, w: Complex): number {
  if (region.form === 'half-plane') return region.offset - multiply(w, conjugate(region.normal)).re;
  const distance = magnitude(subtract(w, region.centre));
  return region.form === 'inside' ? region.radius - distance : distance - region.radius;
}

const component = fc.double({ min: -2, max: 2, noNaN: true });
const sources = fc.record({ re: fc.double({ min: 1, max: 500, noNaN: true }), im: fc.double({ min: -300, max: 300, noNaN: true }) });

describe('the disc of a reflection goal', () => {
  it('says the same as the definition at any point of the plane', () => {
    fc.assert(fc.property(component, component, sources, fc.double({ min: 10, max: 200, noNaN: true }), fc.double({ min: 0.01, max: 3, noNaN: true }), (re, im, source, z0, rho) => {
      const w = { re, im };
      const region = reflectionRegion(rho, source, z0);
      const inside = depth(region, w);
      // On the border itself rounding decides; a ten-millionth of the region's own size is beyond rounding.
      const size = region.form === 'half-plane' ? 1 : 1 + region.radius;
      fc.pre(Math.abs(inside) > 1e-7 * size && magnitude(subtract(w, complex(1))) > 1e-6);
      const at = reflectionAt(w, source, z0);
      fc.pre(Number.isFinite(at) && Math.abs(at - rho) > 1e-9);
      assert.equal(inside > 0, at <= rho);
    }), { numRuns: 1000, seed: 7 });
  });
  it('its border is where |Γ| is exactly the limit', () => {
    const source = complex(18, 22);
    const region = reflectionRegion(0.3, source, 50);
    if (region.form !== 'inside') assert.fail(region.form);
    for (let k = 0; k < 12; k++) {
      const w = add(region.centre, { re: region.radius * Math.cos(k / 2), im: region.radius * Math.sin(k / 2) });
      assert.ok(Math.abs(reflectionAt(w, source, 50) - 0.3) < 1e-12);
    }
  });
  it('is the plain circle where the source is z0', () => {
    assert.deepEqual(reflectionRegion(0.25, complex(50), 50), { form: 'inside', centre: { re: 0, im: 0 }, radius: 0.25 });
  });
  it('a limit of 0 is the point of the conjugate match', () => {
    const region = reflectionRegion(0, complex(20, 30), 50);
    const match = divide(complex(20 - 50, -30), complex(20 + 50, -30));
    assert.ok(region.form === 'inside' && region.radius === 0 && magnitude(subtract(region.centre, match)) < 1e-15);
  });
  it('a half-plane and an outside, which only limits above 1 give', () => {
    // z0 50, Zs 150: |C|/|D| is exactly 2.
    const half = reflectionRegion(2, complex(150), 50);
    assert.equal(half.form, 'half-plane');
    for (const [w, allowed] of [[complex(0), true], [complex(-3), true], [complex(3), false]] as const) {
      assert.equal(depth(half, w) > 0, allowed);
      assert.equal(reflectionAt(w, complex(150), 50) <= 2, allowed);
    }
    // 30 + j40 Ω: |C|² is 8000, |D|² 2000, so the ratio is 2 again, and the border lies askew.
    const askew = reflectionRegion(2, complex(30, 40), 50);
    assert.equal(askew.form, 'half-plane');
    for (const w of [complex(0), complex(3, 1), complex(-3, 2), complex(0.5, -4), complex(2, 3), complex(-1, -5)]) {
      assert.equal(depth(askew, w) > 0, reflectionAt(w, complex(30, 40), 50) <= 2, `${w.re} ${w.im}`);
    }
    if (askew.form === 'half-plane') assert.ok(Math.abs(magnitude(askew.normal) - 1) < 1e-15);
    assert.equal(reflectionRegion(2.5, complex(150), 50).form, 'outside');
    assert.equal(reflectionRegion(1, complex(150, 80), 50).form, 'inside');
  });
});

describe('discs of a problem\'s goals', () => {
  it('|Γ| at the limit of each quantity', () => {
    const limits: [Parameters<typeof reflectionLimit>[0], number | null][] = [
      [goalOf('return loss', '>=', 20), 0.1], [goalOf('VSWR', '<=', 3), 0.5], [goalOf('reflection', '<=', 0.2), 0.2],
      [goalOf('mismatch loss', '<=', -10 * Math.log10(0.75)), 0.5], [goalOf('gain', '>=', -1), null], [goalOf('VSWR', '<=', 0.5), null],
      [goalOf('mismatch loss', '<=', -1), null], [goalOf('mismatch loss', '<=', 0), 0], [goalOf('return loss', '>=', -Infinity), null], [goalOf('dc path'), null],
    ];
    for (const [goal, expected] of limits) {
      const actual = reflectionLimit(goal);
      assert.ok(expected === null ? actual === null : actual !== null && Math.abs(actual - expected) < 1e-15, `${goal.quantity}: ${actual}`);
    }
  });
  it('one for each goal that has one, at the middle of its own band and with that band\'s source', () => {
    const problem = {
      ...problemOf({
        bands: [band('low', points(1e9, 1.21e9)), band('high', points(2e9))],
        goals: [goalOf('gain', '>=', -1), goalOf('return loss', '>=', 10), goalOf('VSWR', '<=', 3, { place: { form: 'band', band: 'high' } }), goalOf('return loss', '<=', 3)],
      }),
      source: { impedance: ohms(50), byBand: new Map([['high', ohms(20, 30)]]) },
    };
    const discs = goalDiscs(problem);
    assert.deepEqual(discs.map(({ goalIndex, keepOut }) => [goalIndex, keepOut]), [[1, false], [2, false], [3, true]]);
    assert.ok(Math.abs(discs[0].frequencyHz - 1.1e9) < 1);
    assert.deepEqual(goalDiscs({ ...problem, goals: [goalOf('VSWR', '<=', 2, { place: { form: 'band', band: 'none' } })] }), []);
    assert.deepEqual(discs[1].region, reflectionRegion(0.5, complex(20, 30), 50));
  });
});
