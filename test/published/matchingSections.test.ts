import { throughElements } from '../../src/network/cascade';
import type { Element } from '../../src/network/element';
import { powerWaveReflection } from '../../src/network/figures';
import type { Impedance } from '../../src/network/impedance';
import { impedanceOf } from '../../src/network/immittance';
import { capacitor, coil, hz, near, nearComplex, ohm, pointOf, sampled, series, shunt } from '../network/expect';

// Two-element, pi and tee matches of the textbooks, evaluated with the values that they print: load first.

const size = (ladder: readonly Element[], load: Impedance, sourceOhm: number, frequencyHz: number): number => {
  const { re, im } = powerWaveReflection(throughElements(ladder, sampled(load, frequencyHz), hz(frequencyHz)), sampled(ohm(sourceOhm), frequencyHz));
  return Math.hypot(re[0], im[0]);
};
const nH = 1e-9;
const pF = 1e-12;

describe('published: two-element matches', () => {
  // [title, ladder, load, source Ω, Hz, |Γ| recomputed from the printed parts]
  const cases: readonly [string, Element[], Impedance, number, number, number][] = [
    ['after Pozar, Microwave Engineering, 4th ed., Example 5.1, first solution (from memory)', [shunt(capacitor(0.92 * pF)), series(coil(38.8 * nH))], ohm(200, -100), 100, 500e6, 0.003294972],
    ['after Pozar, 4th ed., Example 5.1, second solution (from memory)', [shunt(coil(46.1 * nH)), series(capacitor(2.61 * pF))], ohm(200, -100), 100, 500e6, 0.00254098],
    ['after Bowick, RF Circuit Design, Example 4-1 (from memory)', [shunt(capacitor(4.8 * pF)), series(coil(477 * nH))], ohm(1000), 100, 100e6, 0.006845694],
    ['after Steer, Microwave and RF Design, vol. 3 (from memory)', [shunt(capacitor(0.416 * pF)), series(coil(70.7 * nH))], ohm(1700), 100, 900e6, 0.001407082],
  ];
  for (const [title, ladder, load, source, frequencyHz, expected] of cases) {
    it(title, () => near(size(ladder, load, source, frequencyHz), expected, 1e-7));
  }

  // The exact values behind the printed ones are a match to their seven digits.
  const exact: readonly [string, Element[], Impedance, number, number][] = [
    ['Pozar 5.1, first', [shunt(capacitor(0.9227738 * pF)), series(coil(38.98484 * nH))], ohm(200, -100), 100, 500e6],
    ['Pozar 5.1, second', [shunt(coil(46.13869 * nH)), series(capacitor(2.598989 * pF))], ohm(200, -100), 100, 500e6],
    ['Bowick 4-1', [shunt(capacitor(4.774648 * pF)), series(coil(477.4648 * nH))], ohm(1000), 100, 100e6],
    ['Steer', [shunt(capacitor(0.4160914 * pF)), series(coil(70.73553 * nH))], ohm(1700), 100, 900e6],
    ['after Razavi, RF Microelectronics, 2nd ed., §2.5.2 (from memory)', [shunt(capacitor(0.6366198 * pF)), series(coil(0.7957747 * nH))], ohm(50), 25, 5e9],
  ];
  for (const [title, ladder, load, source, frequencyHz] of exact) {
    it(`${title}, exact values`, () => near(size(ladder, load, source, frequencyHz), 0, 1e-6));
  }

  it('after Razavi (from memory), printed values', () => {
    const input = pointOf(impedanceOf(throughElements([shunt(capacitor(0.637 * pF)), series(coil(0.796 * nH))], sampled(ohm(50), 5e9), hz(5e9))));
    nearComplex(input, { re: 25, im: 0 }, 0.03);
  });

  it('the load of Pozar 5.1 as 200 Ω and 3.183 pF', () => {
    const load: Impedance = { form: 'series', members: [ohm(200), capacitor(3.183 * pF)] };
    near(size([shunt(capacitor(0.92 * pF)), series(coil(38.8 * nH))], load, 100, 500e6), 0.003294972, 2e-5);
  });
});

describe('published: pi, tee and cascaded sections', () => {
  const reactance = (x: number): Impedance => ohm(0, x);

  it('after Bowick, Example 4-4 (from memory): pi 100 Ω to 1000 Ω, Q 15 at the 1000 Ω end', () => {
    const virtual = throughElements([shunt(reactance(-66.66667)), series(reactance(66.37168))], sampled(ohm(1000), 1), hz(1));
    nearComplex(pointOf(impedanceOf(virtual)), { re: 4.424779, im: 0 }, 1e-5);
    near(pointOf(impedanceOf(virtual)).re, 4.42, 0.005);
    const pi = [shunt(reactance(-66.66667)), series(reactance(66.37168)), series(reactance(20.56451)), shunt(reactance(-21.51657))];
    near(size(pi, ohm(1000), 100, 1), 0, 1e-6);
    // With the digits that the book prints for the 1000 Ω end.
    const printed = [shunt(reactance(-66.7)), series(reactance(66.3)), series(reactance(20.56451)), shunt(reactance(-21.51657))];
    near(size(printed, ohm(1000), 100, 1), 0, 0.02);
  });

  it('after Bowick, Example 4-5 (from memory): tee 10 Ω to 50 Ω, Q 10 at the 10 Ω end', () => {
    const virtual = throughElements([series(reactance(100)), shunt(reactance(-101))], sampled(ohm(10), 1), hz(1));
    nearComplex(pointOf(impedanceOf(virtual)), { re: 1010, im: 0 }, 1e-9);
    const exact = [series(reactance(100)), shunt(reactance(-101)), shunt(reactance(-230.4999)), series(reactance(219.089))];
    near(size(exact, ohm(10), 50, 1), 0, 1e-6);
    // 230 and 220 come from a rounded Q of 4.4.
    near(size([series(reactance(100)), shunt(reactance(-101)), shunt(reactance(-230)), series(reactance(220))], ohm(10), 50, 1), 0, 0.02);
  });

  it('two sections by way of √(R1·R2) (formula: Bowick, ch. 4, from memory; numbers ours)', () => {
    const [middle, q] = [223.6068, 1.863367];
    const ladder = [shunt(reactance(-1000 / q)), series(reactance(q * middle)), shunt(reactance(-middle / q)), series(reactance(q * 50))];
    const after = throughElements(ladder.slice(0, 2), sampled(ohm(1000), 1), hz(1));
    nearComplex(pointOf(impedanceOf(after)), { re: middle, im: 0 }, 2e-4);
    near(size(ladder, ohm(1000), 50, 1), 0, 1e-6);
  });
});
