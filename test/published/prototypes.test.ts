import { cascade } from '../../src/network/cascade';
import type { Element } from '../../src/network/element';
import { transducerGain } from '../../src/network/figures';
import { capacitor, coil, hz, lineOf, near, ohm, sampled, series, shunt, stub, through } from '../network/expect';

// Low-pass prototypes through the cascade: element 1 is a shunt capacitor at the 1 Ω source, the last one stands at the
// load; ω = 1 is the edge. Butterworth loses 1 + ω^2N, Chebyshev 1 + ε²·T_N²(ω) (Matthaei, Young, Jones, §4.03).

function lossDb(g: readonly number[], loadOhm: number, omega: number): number {
  const frequencyHz = omega / (2 * Math.PI);
  const ladder = g.map((value, i): Element => (i % 2 === 0 ? shunt(capacitor(value)) : series(coil(value)))).reverse();
  return -10 * Math.log10(transducerGain(cascade(ladder, hz(frequencyHz)), sampled(ohm(1), frequencyHz), sampled(ohm(loadOhm), frequencyHz))[0]);
}

const chebyshev = (order: number, x: number): number => (Math.abs(x) <= 1 ? Math.cos(order * Math.acos(x)) : Math.cosh(order * Math.acosh(x)));
const OMEGAS = [0.05, 0.3, 0.6, 0.8, 0.95, 1, 1.1, 1.5, 2, 4];

describe('published: Butterworth prototypes (Pozar, Table 8.3; confirmed in a public table)', () => {
  const rows: readonly number[][] = [
    [2], [1.41421, 1.41421], [1, 2, 1], [0.76537, 1.84776, 1.84776, 0.76537], [0.61803, 1.61803, 2, 1.61803, 0.61803],
    [0.51764, 1.41421, 1.93185, 1.93185, 1.41421, 0.51764], [0.44504, 1.24698, 1.80194, 2, 1.80194, 1.24698, 0.44504],
  ];
  for (const g of rows) {
    it(`${g.length} elements`, () => {
      const order = g.length;
      // Half a unit in the fifth decimal of each element.
      for (const omega of OMEGAS) near(lossDb(g, 1, omega), 10 * Math.log10(1 + omega ** (2 * order)), 4e-4, `ω = ${omega}`);
      near(lossDb(g, 1, 1), 3.0103, 2e-4);
    });
  }
  it('5 elements lose 17.68379 dB at ω = 1.5', () => near(lossDb([0.618034, 1.618034, 2, 1.618034, 0.618034], 1, 1.5), 17.68379, 1e-5));
});

describe('published: Chebyshev prototypes', () => {
  // 0.01 to 0.2 dB: confirmed in a public table, the same as Matthaei, Young, Jones, Table 4.05-2; 0.5 and 3 dB: from memory.
  // Where the tables are known to be misprinted or off by their 17.37 for 40/ln 10, the exact values stand instead.
  const tables: readonly [number, number[][]][] = [
    [0.01, [[0.4489, 0.4078], [0.6292, 0.9703, 0.6292], [0.7129, 1.2004, 1.3213, 0.6476]]],
    [0.1, [[0.8431, 0.622], [1.0316, 1.1474, 1.0316], [1.1088, 1.3062, 1.7704, 0.8181], [1.1468, 1.3712, 1.975, 1.3712, 1.1468], [1.1681, 1.404, 2.0562, 1.5171, 1.9029, 0.8618], [1.1812, 1.4228, 2.0967, 1.573401, 2.0967, 1.4228, 1.1812]]],
    [0.2, [[1.2276, 1.1525, 1.2276], [1.3029, 1.2844, 1.9762, 0.8468], [1.3395, 1.337, 2.1661, 1.337, 1.3395], [1.3598, 1.3632, 2.2395, 1.4556, 2.0974, 0.8838], [1.3723, 1.3782, 2.2757, 1.5002, 2.2757, 1.3782, 1.3723]]],
    [0.5, [[0.6986], [1.4029, 0.7071], [1.5963, 1.0967, 1.5963], [1.6703, 1.1926, 2.3661, 0.8419], [1.7058, 1.2296, 2.5408, 1.2296, 1.7058], [1.7254, 1.2479, 2.6064, 1.3137, 2.4758, 0.8696], [1.737291, 1.258236, 2.638292, 1.344334, 2.638292, 1.258236, 1.737291]]],
    [3, [[1.9953], [3.1013, 0.5339], [3.3487, 0.7117, 3.3487], [3.4389, 0.7483, 4.347045, 0.592], [3.481288, 0.7619192, 4.537546, 0.7619192, 3.481288], [3.5045, 0.7685, 4.6061, 0.7929, 4.4641, 0.6033], [3.518524, 0.7722001, 4.638979, 0.8038096, 4.638979, 0.7722001, 3.518524]]],
  ];
  for (const [rippleDb, rows] of tables) {
    for (const g of rows) {
      it(`${rippleDb} dB, ${g.length} elements`, () => {
        const order = g.length;
        const epsilon = Math.sqrt(10 ** (rippleDb / 10) - 1);
        // Even orders end in a series coil and start from the ripple at 0 Hz, hence R = 1/g(N+1) with |Γ|² = 1 − 1/(1 + ε²).
        const mismatch = Math.sqrt(1 - 1 / (1 + epsilon ** 2));
        const loadOhm = order % 2 === 1 ? 1 : (1 - mismatch) / (1 + mismatch);
        for (const omega of OMEGAS) {
          const expected = 10 * Math.log10(1 + (epsilon * chebyshev(order, omega)) ** 2);
          // Four decimals of each element: up to 1e-4 of every reactance, which outside the band is as much of the loss, and
          // in it grows with the ripple and the order.
          near(lossDb(g, loadOhm, omega), expected, 1e-3 * (1 + (rippleDb * order) / 2 + expected / 10), `ω = ${omega}`);
        }
      });
    }
  }

  it('has exactly its ripple in the band, with the exact values', () => {
    const exact: readonly [number, number[], number][] = [
      [0.1, [0.8430437, 0.6220066], 0.7378122], [0.5, [1.402894, 0.7070839], 1 / 1.984056], [0.5, [1.59628, 1.096692, 1.59628], 1],
      [3, [3.101258, 0.5338804], 1 / 5.8089], [3, [3.348735, 0.7117003, 3.348735], 1], [0.1, [1.146813, 1.371213, 1.975003, 1.371213, 1.146813], 1],
    ];
    for (const [rippleDb, g, loadOhm] of exact) {
      let largest = 0;
      for (let omega = 0.001; omega <= 1.0000001; omega += 0.001) largest = Math.max(largest, lossDb(g, loadOhm, omega));
      near(largest, rippleDb, 2e-5, `${rippleDb} dB, ${g.length}`);
    }
    near(lossDb([1.59628, 1.096692, 1.59628], 1, 2), 19.21606, 1e-5);
  });

  it('after Pozar, 4th ed., Example 8.5 (from memory): three poles of 3 dB as open stubs λ/8 long and lines between', () => {
    const edgeHz = 4e9;
    const at = (z: number) => lineOf(z, 45, edgeHz);
    const evaluate = (outer: number, between: number, middle: number, x: number): number => {
      // Richards: tan βl is the prototype's frequency.
      const frequencyHz = (edgeHz * Math.atan(x)) / (Math.PI / 4);
      const ladder = [stub('open', at(outer)), through(at(between)), stub('open', at(middle)), through(at(between)), stub('open', at(outer))];
      return -10 * Math.log10(transducerGain(cascade(ladder, hz(frequencyHz)), sampled(ohm(50), frequencyHz), sampled(ohm(50), frequencyHz))[0]);
    };
    const epsilonSquared = 10 ** 0.3 - 1;
    for (const x of [0.2, 0.5, 0.8, 1, 1.3, 2]) {
      const expected = 10 * Math.log10(1 + epsilonSquared * chebyshev(3, x) ** 2);
      // These follow from the prototype's values to four decimals.
      near(evaluate(64.93117, 217.435, 70.25432, x), expected, 1e-3);
      near(evaluate(64.9, 217.5, 70.3, x), expected, 0.02);
    }
  });
});
