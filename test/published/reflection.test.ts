import { cascade, throughElements } from '../../src/network/cascade';
import { mismatchLossDb, returnLossDb, transducerGain, vswr } from '../../src/network/figures';
import { fromReflection, impedanceOf, reflectionOf } from '../../src/network/immittance';
import { capacitor, hz, lineOf, near, nearComplex, ohm, pointOf, resistor, sampled, series, shunt, through } from '../network/expect';

// Reflection, standing-wave ratio and decibels as the textbooks print them. A printed value is held to half a unit of its
// last digit, a recomputed one to seven digits.

const F = 1e9;
const polarOf = ({ re, im }: { re: number; im: number }) => ({ size: Math.hypot(re, im), degrees: (Math.atan2(im, re) * 180) / Math.PI });

describe('published: reflection', () => {
  it('Pozar, Microwave Engineering, 4th ed., Example 2.2: 40 + j70 Ω on 0.3 λ of 100 Ω', () => {
    const load = sampled(ohm(40, 70), F);
    const atLoad = polarOf(pointOf(reflectionOf(load, 100)));
    near(atLoad.size, 0.59, 0.005);
    near(atLoad.size, 0.5890151, 1e-7);
    near(atLoad.degrees, 104.0362, 1e-4);
    near(vswr(atLoad.size), 3.87, 0.005);
    near(vswr(atLoad.size), 3.866359, 1e-6);
    near(returnLossDb(atLoad.size), 4.6, 0.05);
    near(returnLossDb(atLoad.size), 4.597472, 1e-6);
    const input = throughElements([through(lineOf(100, 108, F))], load, hz(F));
    nearComplex(pointOf(impedanceOf(input)), { re: 36.5, im: -61.1 }, 0.05);
    nearComplex(pointOf(impedanceOf(input)), { re: 36.53396, im: -61.11897 }, 1e-5);
    near(polarOf(pointOf(reflectionOf(input, 100))).degrees + 360, 248.0362, 1e-4);
  });

  it('Pozar, 4th ed., Example 2.4: slotted line, SWR 1.5, first minimum 1.48 cm of 4 cm from the load', () => {
    // At a minimum the line shows 50/1.5 Ω; what stands 1.48 cm behind it is the load.
    const atMinimum = sampled(ohm(50 / 1.5), F);
    // Half a wave less 1.48 cm further on stands another copy of the load.
    const load = throughElements([through(lineOf(50, 180 - (1.48 / 4) * 360, F))], atMinimum, hz(F));
    nearComplex(pointOf(impedanceOf(load)), { re: 47.3, im: 19.7 }, 0.05);
    nearComplex(pointOf(impedanceOf(load)), { re: 47.29606, im: 19.6678 }, 1e-5);
    nearComplex(pointOf(reflectionOf(load, 50)), { re: 0.0126, im: 0.1996 }, 5e-5);
    near(polarOf(pointOf(reflectionOf(load, 50))).degrees, 86.4, 1e-9);
  });

  it('Ulaby, slotted-line example (from memory): SWR 3, minimum 12 cm of 60 cm from the load', () => {
    const load = throughElements([through(lineOf(50, 180 - (12 / 60) * 360, F))], sampled(ohm(50 / 3), F), hz(F));
    nearComplex(pointOf(impedanceOf(load)), { re: 85, im: -67 }, 0.5);
    nearComplex(pointOf(impedanceOf(load)), { re: 85.03729, im: -66.64489 }, 1e-5);
  });

  it('after Ulaby (from memory): 50 Ω and 10 pF in series at 100 MHz on a 100 Ω line', () => {
    const { size, degrees } = polarOf(pointOf(reflectionOf(sampled({ form: 'series', members: [resistor(50), capacitor(10e-12)] }, 100e6), 100)));
    near(size, 0.76, 0.005);
    near(degrees, -60.7, 0.05);
    near(size, 0.7627942, 1e-7);
    near(degrees, -60.7444, 1e-5);
  });

  it('after Pozar, 4th ed., Example 4.4 (from memory): a 3 dB pad of 8.56 and 141.8 Ω', () => {
    const pad = [series(resistor(8.56)), shunt(resistor(141.8)), series(resistor(8.56))];
    const load = sampled(ohm(50), F);
    near(pointOf(impedanceOf(throughElements(pad, load, hz(F)))).re, 50.00444, 1e-5);
    near(Math.sqrt(transducerGain(cascade(pad, hz(F)), load, load)[0]), 0.7076947, 1e-7);
  });

  it('Pozar, 4th ed., §2.3: a neper is 8.686 dB', () => {
    const line = [through(lineOf(50, 77, F, 8.68588963806504))];
    near(Math.sqrt(transducerGain(cascade(line, hz(F)), sampled(ohm(50), F), sampled(ohm(50), F))[0]), Math.exp(-1), 1e-12);
  });

  it('return loss to SWR and |Γ|, the usual table (from memory)', () => {
    const rows = [
      [1, 17.391, 0.891], [2, 8.724, 0.794], [3, 5.848, 0.708], [4, 4.419, 0.631], [5, 3.57, 0.562], [6, 3.01, 0.501], [7, 2.615, 0.447], [8, 2.323, 0.398],
      [9, 2.1, 0.355], [10, 1.925, 0.316], [11, 1.785, 0.282], [12, 1.671, 0.251], [13, 1.577, 0.224], [14, 1.499, 0.2], [15, 1.433, 0.178], [16, 1.377, 0.158],
    ];
    for (const [lossDb, standing, magnitude] of rows) {
      near(returnLossDb(magnitude), lossDb, 0.5e-3 / magnitude * 8.69 + 1e-9);
      near(vswr(10 ** (-lossDb / 20)), standing, 5.01e-4);
      near(10 ** (-lossDb / 20), magnitude, 5.01e-4);
    }
  });

  it('SWR to return loss and mismatch loss, as in trade tables such as The ARRL Handbook (from memory)', () => {
    const rows = [[1.2, 20.83, 0.036], [1.5, 13.98, 0.177], [2, 9.54, 0.512], [3, 6.02, 1.249], [5, 3.52, 2.553], [10, 1.74, 4.807]];
    for (const [standing, lossDb, mismatchDb] of rows) {
      // The load that has this standing wave on a 50 Ω line.
      const { size } = polarOf(pointOf(reflectionOf(sampled(ohm(50 * standing), F), 50)));
      near(vswr(size), standing, 1e-12);
      near(returnLossDb(size), lossDb, 0.00501);
      near(mismatchLossDb(size), mismatchDb, 5.01e-4);
    }
  });

  it('after The ARRL Antenna Book (from memory): the total loss of a mismatched line', () => {
    // 10·log10[(a² − ρ²)/(a(1 − ρ²))]: 3 dB matched, SWR 3 at the load.
    const load = fromReflection({ re: hz(0.3), im: hz(0.4) }, 50);
    const line = [through(lineOf(50, 123, F, 3))];
    const network = cascade(line, hz(F));
    const input = reflectionOf(throughElements(line, load, hz(F)), 50);
    const entering = 1 - polarOf(pointOf(input)).size ** 2;
    const total = -10 * Math.log10(transducerGain(network, sampled(ohm(50), F), load)[0] / entering);
    near(total, 3.967723, 1e-6);
    near(vswr(polarOf(pointOf(input)).size), 1.668779, 1e-6);
  });
});
