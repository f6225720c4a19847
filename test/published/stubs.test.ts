import { throughElements } from '../../src/network/cascade';
import type { Element } from '../../src/network/element';
import type { Impedance } from '../../src/network/impedance';
import { impedanceOf, reflectionOf } from '../../src/network/immittance';
import { capacitor, hz, lineOf, near, ohm, pointOf, resistor, sampled, stub, through } from '../network/expect';

// Stub matches of the textbooks, with lengths in wavelengths, evaluated as ladders of a line and a stub.

const F = 2e9;
const reflection = (ladder: readonly Element[], load: Impedance, frequencyHz = F): number => {
  const { re, im } = pointOf(reflectionOf(throughElements(ladder, sampled(load, frequencyHz), hz(frequencyHz)), 50));
  return Math.hypot(re, im);
};
const singleStub = (distance: number, length: number): Element[] => [through(lineOf(50, 360 * distance, F)), stub('short', lineOf(50, 360 * length, F))];

describe('published: stubs', () => {
  // [title, load, [distance, stub] in λ as printed, recomputed, b at the stub]
  const cases: readonly [string, Impedance, [number, number], [number, number], number][] = [
    ['after Pozar, 4th ed., Example 5.2 (from memory), first', ohm(60, -80), [0.11, 0.095], [0.1104232, 0.09497462], 1.47196],
    ['after Pozar, 4th ed., Example 5.2 (from memory), second', ohm(60, -80), [0.26, 0.405], [0.2594445, 0.4050254], -1.47196],
    ['after Ulaby, single-stub example (from memory), first', ohm(25, -50), [0.063, 0.09], [0.06313033, 0.08975426], 1.581139],
    ['after Ulaby, single-stub example (from memory), second', ohm(25, -50), [0.207, 0.41], [0.2066614, 0.4102457], -1.581139],
  ];
  for (const [title, load, printed, exact, susceptance] of cases) {
    it(title, () => {
      near(reflection(singleStub(...exact), load), 0, 1e-5);
      // Half a thousandth of a wave is 0.2° of line: twice that in Γ, times a slope of some units.
      near(reflection(singleStub(...printed), load), 0, 0.02);
      const z = pointOf(impedanceOf(throughElements(singleStub(...exact).slice(0, 1), sampled(load, F), hz(F))));
      const squared = z.re * z.re + z.im * z.im;
      near((50 * z.re) / squared, 1, 1e-5);
      near((-50 * z.im) / squared, susceptance, 1e-5);
    });
  }

  it('the load of Pozar 5.2 as 60 Ω and 0.995 pF', () => {
    near(reflection(singleStub(0.1104232, 0.09497462), { form: 'series', members: [resistor(60), capacitor(0.9947184e-12)] }), 0, 1e-5);
  });

  it('Pozar, eqs. 2.45c and 2.46c: stubs of 0.1 λ', () => {
    const alone = (end: 'open' | 'short') => pointOf(impedanceOf(throughElements([stub(end, lineOf(50, 36, F))], sampled({ form: 'open' }, F), hz(F)))).im;
    near(alone('short'), 36.32713, 1e-5);
    near(alone('open'), -68.8191, 1e-4);
  });

  it('Pozar, §5.3 (from memory): two stubs λ/8 apart reach no conductance above Y0/sin²(βd)', () => {
    // Whatever the susceptances of the stubs: a load just above the limit is never matched, one just below is.
    const best = (conductance: number): number => {
      let least = 1;
      for (let b1 = -6; b1 <= 6; b1 += 0.01) {
        const z = throughElements([{ form: 'branch', name: 'S1', orientation: 'shunt', pair: false, branch: ohm(0, -50 / b1) }, through(lineOf(50, 45, F))], sampled(ohm(50 / conductance), F), hz(F));
        // The second stub takes any susceptance away: what is left is the conductance.
        const { re, im } = pointOf(impedanceOf(z));
        const g = (50 * re) / (re * re + im * im);
        least = Math.min(least, Math.abs((1 - g) / (1 + g)));
      }
      return least;
    };
    near(best(1.99), 0, 5e-3);
    near(best(2), 0, 1e-3);
    if (!(best(2.2) > 0.02)) throw new Error('a load past the limit was matched');
  });
});
