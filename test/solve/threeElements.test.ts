import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { Complex } from '../../src/network/complex';
import { leastQ, threeElementMatches } from '../../src/solve/threeElements';
import { mismatch } from './mismatch';

const real = (re: number): Complex => ({ re, im: 0 });

function near(actual: number, expected: number): void {
  assert.ok(Math.abs(actual - expected) <= 2e-7 * Math.abs(expected), `${actual} is not ${expected}`);
}

describe('pi and tee matches with a chosen Q', () => {
  // After Bowick, RF Circuit Design, ch. 4, Example 4-4, from memory (L5).
  it('designs the pi from 100 to 1000 Ω with Q = 15', () => {
    const matches = threeElementMatches('pi', real(1000), real(100), 1e8, 15);
    assert.equal(matches.length, 4);
    for (const { parts, sideQ } of matches) {
      near(Math.abs(parts[0].reactanceOhm), 66.66667);
      near(Math.abs(parts[2].reactanceOhm), 21.51657);
      near(sideQ[0], 15);
      near(sideQ[1], 4.647580);
    }
    const lowPass = matches.find((match) => match.response === 'low-pass');
    near(lowPass?.parts[1].reactanceOhm ?? NaN, 66.37168 + 20.56451);
  });

  // After Bowick, Example 4-5, from memory (L6).
  it('designs the tee from 10 to 50 Ω with Q = 10', () => {
    const highPass = threeElementMatches('tee', real(10), real(50), 1e8, 10).find((match) => match.response === 'high-pass');
    assert.ok(highPass);
    near(highPass.parts[0].reactanceOhm, -100);
    near(highPass.parts[2].reactanceOhm, -219.0890);
    near(highPass.sideQ[1], 4.381780);
    // Both shunt reactances of the halves, side by side.
    near(highPass.parts[1].reactanceOhm, 1 / (1 / 101 + 1 / 230.4999));
  });

  // L12, derived: two L sections by way of √(R1 R2).
  it('knows the least Q', () => {
    near(leastQ('pi', real(1000), real(50)), 4.358899);
    near(leastQ('tee', real(50), real(223.6068)), 1.863367);
    assert.equal(threeElementMatches('pi', real(1000), real(50), 1e8, 4.3).length, 0);
    assert.equal(threeElementMatches('pi', real(0), real(50), 1e8, 4.3).length, 0);
    // At the least Q itself one side needs nothing: a two-element match.
    const least = threeElementMatches('pi', real(1000), real(50), 1e8, leastQ('pi', real(1000), real(50)));
    assert.ok(least.length > 0);
    for (const { parts } of least) assert.ok(mismatch(parts, real(1000), real(50), 1e8) < 1e-7);
  });

  it('matches any ends to |Γ| < 1e-9', () => {
    const end = fc.tuple(fc.double({ min: 1, max: 2000, noNaN: true }), fc.double({ min: -300, max: 300, noNaN: true })).map(([re, im]) => ({ re, im }));
    fc.assert(fc.property(fc.constantFrom('pi' as const, 'tee' as const), end, end, fc.double({ min: 1.01, max: 20, noNaN: true }), (form, load, source, factor) => {
      const q = Math.max(leastQ(form, load, source), 0.2) * factor;
      const matches = threeElementMatches(form, load, source, 1e9, q);
      assert.ok(matches.length >= 2);
      for (const { parts, sideQ } of matches) {
        assert.ok(Math.abs(Math.max(...sideQ) - q) < 1e-9 * q);
        assert.ok(mismatch(parts, load, source, 1e9) < 1e-9);
      }
    }), { numRuns: 1500 });
  });
});
