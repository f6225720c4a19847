import type { Complex } from '../../src/network/complex';
import { divide, magnitude, angleDeg, polar } from '../../src/network/complex';
import { removeFixture } from '../../src/network/fixture';
import { fromReflection, impedanceOf, reflectionOf } from '../../src/network/immittance';
import type { Line } from '../../src/network/line';
import { lineAbcd, lineInput } from '../../src/network/linePropagation';
import { throughNetwork } from '../../src/network/throughElements';
import { hz, lineOf, near, nearComplex, ohm, pointOf, sampled, through, toSevenDigits } from '../network/expect';

// Lines as the textbooks print them. Printed values are held to half a unit of their last digit, recomputed ones to seven
// digits.

const F = 1e9;
const inputOf = (line: Line, load: Complex, f = F) => throughNetwork(lineAbcd(line, hz(f)), sampled(ohm(load.re, load.im), f));

describe('published: lines', () => {
  it('Pozar, Microwave Engineering, 4th ed., Example 2.2: 40 + j70 Ω through 0.3 λ of 100 Ω', () => {
    const input = inputOf(lineOf(100, 108, F), { re: 40, im: 70 });
    const atInput = pointOf(reflectionOf(input, 100));
    toSevenDigits(magnitude(atInput), 0.5890151);
    near(angleDeg(atInput) + 360, 248, 0.5);
    toSevenDigits(angleDeg(atInput) + 360, 248.0362);
    nearComplex(pointOf(impedanceOf(input)), { re: 36.5, im: -61.1 }, 0.05);
    nearComplex(pointOf(impedanceOf(input)), { re: 36.53396, im: -61.11897 }, 1e-5);
  });

  it('Pozar, 4th ed., Example 2.4: from the minimum of SWR 1.5 back over 1.48 cm of 4 cm', () => {
    const load = removeFixture(sampled(ohm(50 / 1.5), F), [through(lineOf(50, (1.48 / 4) * 360, F))], hz(F));
    near(angleDeg(pointOf(reflectionOf(load, 50))), 86.4, 1e-9);
    nearComplex(pointOf(impedanceOf(load)), { re: 47.29606, im: 19.6678 }, 1e-5);
  });

  it('Pozar, 4th ed., Example 2.5: a quarter wave of 70.71 Ω from 100 to 50 Ω, at f0, 0.8 f0 and 0', () => {
    const quarter = lineOf(Math.sqrt(100 * 50), 90, F);
    near(quarter.impedanceOhm, 70.71, 0.005);
    const mismatch = (f: number) => magnitude(pointOf(reflectionOf(inputOf(quarter, { re: 100, im: 0 }, f), 50)));
    near(mismatch(F), 0, 1e-15);
    toSevenDigits(mismatch(0.8 * F), 0.1086077);
    near(mismatch(0), 0.33, 0.005);
    near(mismatch(0), 1 / 3, 1e-15);
  });

  it('de-embedding: 30 + j20 Ω seen through 20 mm of 50 Ω, velocity factor 0.7, at 1 GHz (derived: turned back by 2βl)', () => {
    const line: Line = { impedanceOhm: 50, lengthM: 0.02, velocityFactor: 0.7, conductorLossDb: 0, dielectricLossDb: 0, lossAtHz: 1 };
    const seen = sampled(ohm(30, 20), F);
    const load = removeFixture(seen, [through(line)], hz(F));
    nearComplex(pointOf(impedanceOf(load)), { re: 24.59083, im: -3.182643 }, 6e-6);
    const turn = angleDeg(divide(pointOf(reflectionOf(load, 50)), pointOf(reflectionOf(seen, 50))));
    toSevenDigits(turn, 68.6189);
  });

  it('Pozar, 4th ed., eqs. 2.45c and 2.46c: stubs of 0.1 λ, +j50 tan 36° and −j50 cot 36°', () => {
    const stubOf = (end: 'open' | 'short') => pointOf(impedanceOf(lineInput(lineOf(50, 36, F), end, hz(F))));
    nearComplex(stubOf('short'), { re: 0, im: 36.32713 }, 6e-6);
    nearComplex(stubOf('open'), { re: 0, im: -68.8191 }, 6e-6);
  });

  it('after The ARRL Antenna Book (from memory): 3 dB of matched loss and SWR 3 at the load lose 3.97 dB in all', () => {
    const line = lineOf(50, 77, F, 3);
    const load = fromReflection({ re: hz(0.5), im: hz(0) }, 50);
    const network = lineAbcd(line, hz(F));
    const input = throughNetwork(network, load);
    const rho = magnitude(pointOf(reflectionOf(input, 50)));
    near((1 + rho) / (1 - rho), 1.668779, 1e-6);
    // Power into the load over power into the line, from V and I at both ends: the load is 150 Ω.
    const [v, i] = [pointOf(network.a), pointOf(network.c)].map(({ re, im }, row) => {
      const other = pointOf(row === 0 ? network.b : network.d);
      return { re: 150 * re + other.re, im: 150 * im + other.im };
    });
    near(10 * Math.log10((v.re * i.re + v.im * i.im) / 150), 3.967723, 1e-6);
  });

  it('a quarter wave at 146 MHz with velocity factor 0.66 is 0.3388065 m (derived)', () => {
    const line: Line = { impedanceOhm: 50, lengthM: 0.3388065, velocityFactor: 0.66, conductorLossDb: 0, dielectricLossDb: 0, lossAtHz: 1 };
    const { a, b } = lineAbcd(line, hz(146e6));
    // Half a unit of the last digit of the length is 2.3e-7 of phase.
    near(a.re[0], 0, 2.4e-7);
    near(b.im[0], 50, 1e-9);
  });

  it('half a wave repeats its load, a quarter wave turns it over (Pozar, 4th ed., eqs. 2.47, 2.48)', () => {
    for (const load of [{ re: 12, im: -80 }, { re: 400, im: 7 }]) {
      nearComplex(pointOf(impedanceOf(inputOf(lineOf(75, 180, F), load))), load, 1e-10);
      nearComplex(pointOf(impedanceOf(inputOf(lineOf(75, 90, F), load))), divide({ re: 75 * 75, im: 0 }, load), 1e-10);
    }
  });

  it('loss in dB is one way: the reflection of a short sees it twice (Pozar, 4th ed., §2.7)', () => {
    const input = lineInput(lineOf(50, 40, F, 2), 'short', hz(F));
    const expected = polar(-(10 ** (-4 / 20)), -80);
    nearComplex(pointOf(reflectionOf(input, 50)), expected, 1e-14);
  });
});
