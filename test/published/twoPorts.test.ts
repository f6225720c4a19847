import { cascade, throughElements } from '../../src/network/cascade';
import { polar, type Complex } from '../../src/network/complex';
import type { Element } from '../../src/network/element';
import { efficiency, powerWaveReflection, transducerGain } from '../../src/network/figures';
import { fromReflection, impedanceOf, reflectionOf, type Immittance } from '../../src/network/immittance';
import { capacitor, coil, hz, lineOf, near, nearComplex, ohm, pointOf, sampled, series, shunt, stub, through, transformer } from '../network/expect';

const F = 1e9;

/** A transistor's S-parameters at one frequency as a block of a ladder. */
function block(s11: Complex, s12: Complex, s21: Complex, s22: Complex): Element {
  const s = [s11, s12, s21, s22];
  const data = { ports: 2, frequencyHz: hz(F), referenceOhm: hz(50, 50), sRe: Float64Array.from(s, ({ re }) => re), sIm: Float64Array.from(s, ({ im }) => im) };
  return { form: 'block', name: 'Q1', data, reversed: false };
}
const termination = ({ re, im }: Complex): Immittance => fromReflection({ re: hz(re), im: hz(im) }, 50);
const inputSize = (element: Element, load: Complex): number => {
  const { re, im } = pointOf(reflectionOf(throughElements([element], termination(load), hz(F)), 50));
  return Math.hypot(re, im);
};

describe('published: two-ports', () => {
  it('after Pozar, 4th ed., Example 12.3 (from memory): simultaneous conjugate match, 16.7 dB', () => {
    const transistor = block(polar(0.72, -116), polar(0.03, 57), polar(2.6, 76), polar(0.73, -54));
    const source = termination(polar(0.8717595, 123.4072));
    const load = termination(polar(0.8762908, 61.02614));
    const gain = transducerGain(cascade([transistor], hz(F)), source, load)[0];
    near(10 * Math.log10(gain), 16.7, 0.05);
    near(10 * Math.log10(gain), 16.7102, 1e-5);
    // Matched on both sides: no power wave comes back.
    const { re, im } = pointOf(powerWaveReflection(throughElements([transistor], load, hz(F)), source));
    near(Math.hypot(re, im), 0, 1e-5);
    // The values as printed.
    near(10 * Math.log10(transducerGain(cascade([transistor], hz(F)), termination(polar(0.872, 123)), termination(polar(0.876, 61)))[0]), 16.7, 0.05);
  });

  it('a reversed block has its ports exchanged', () => {
    const transistor = block(polar(0.72, -116), polar(0.03, 57), polar(2.6, 76), polar(0.73, -54));
    const matched = sampled(ohm(50), F);
    const turned: Element = { ...transistor, reversed: true } as Element;
    near(transducerGain(cascade([transistor], hz(F)), matched, matched)[0], 2.6 ** 2, 1e-12);
    near(transducerGain(cascade([turned], hz(F)), matched, matched)[0], 0.03 ** 2, 1e-14);
    near(inputSize(turned, { re: 0, im: 0 }), 0.73, 1e-12);
  });

  // After Pozar: on the load's stability circle |Γin| is 1. Centre and radius recomputed from the printed S-parameters; the
  // book prints them to two or three digits, too few where the input resonates.
  const circles: readonly [string, Element, number, number, number][] = [
    ['4th ed., Example 12.2 (from memory), 1.59∠132° and 0.915', block(polar(0.869, -159), polar(0.031, -9), polar(4.25, 61), polar(0.507, -117)), 1.592688, 132.3361, 0.9147366],
    ['3rd ed., Example 11.2 (from memory), 1.36∠47° and 0.50', block(polar(0.894, -60.6), polar(0.02, 62.4), polar(3.122, 123.6), polar(0.781, -27.6)), 1.362554, 46.68729, 0.4997386],
  ];
  for (const [title, element, size, degrees, radius] of circles) {
    it(`Pozar, ${title}: the load's stability circle`, () => {
      const centre = polar(size, degrees);
      for (let angle = 0; angle < 360; angle += 30) {
        const on = polar(radius, angle);
        near(inputSize(element, { re: centre.re + on.re, im: centre.im + on.im }), 1, 3e-5, `${angle}°`);
      }
      // Inside the circle, where the centre of the chart is not, it is larger.
      near(Math.sign(inputSize(element, polar(size - radius * 0.9, degrees)) - 1), 1, 0);
      near(Math.sign(inputSize(element, { re: 0, im: 0 }) - 1), -1, 0);
    });
  }

  it('Kurokawa 1965; numbers ours: a lossless ladder between complex ends', () => {
    // Rows are from the source: +j25 Ω, +j12 mS, 70 Ω 35°, −j4 mS; load first here.
    const ladder = [shunt(ohm(0, 250)), through(lineOf(70, 35, F)), shunt(ohm(0, -1000 / 12)), series(ohm(0, 25))];
    const [load, source] = [sampled(ohm(75, -40), F), sampled(ohm(20, 30), F)];
    const input = throughElements(ladder, load, hz(F));
    nearComplex(pointOf(impedanceOf(input)), { re: 29.15325, im: -10.34542 }, 1e-5);
    const { re, im } = pointOf(powerWaveReflection(input, source));
    near(Math.hypot(re, im), 0.4095692, 1e-7);
    const gain = transducerGain(cascade(ladder, hz(F)), source, load)[0];
    near(gain, 0.8322531, 1e-7);
    near(gain, 1 - re * re - im * im, 1e-12);
    near(efficiency(cascade(ladder, hz(F)), load)[0], 1, 1e-12);
  });
});

describe('elementary cases of our own, each computed in two ways', () => {
  it('25 + j10 Ω, shunt 2 pF, series 10 nH at 1 GHz', () => {
    const input = throughElements([shunt(capacitor(2e-12)), series(coil(10e-9))], sampled(ohm(25, 10), F), hz(F));
    nearComplex(pointOf(impedanceOf(input)), { re: 28.96334, im: 63.86223 }, 1e-5);
    nearComplex(pointOf(reflectionOf(input, 50)), { re: 0.2343761, im: 0.6192044 }, 1e-7);
  });

  it('shunt 3 pF, series 5 nH and 30° of line between 50 Ω', () => {
    const fromSource = [shunt(capacitor(3e-12)), series(coil(5e-9)), through(lineOf(50, 30, F))];
    const matched = sampled(ohm(50), F);
    const seen = (ladder: Element[]) => pointOf(reflectionOf(throughElements(ladder, matched, hz(F)), 50));
    nearComplex(seen([...fromSource].reverse()), polar(0.3177988, -76.07845), 2e-7);
    nearComplex(seen(fromSource), polar(0.3177988, 99.81492), 2e-7);
    near(Math.sqrt(transducerGain(cascade([...fromSource].reverse(), hz(F)), matched, matched)[0]), 0.9481582, 1e-7);
  });

  it('an ideal transformer 2:1 multiplies by four', () => {
    nearComplex(pointOf(impedanceOf(throughElements([transformer(2, 1)], sampled(ohm(12.5, 5), F), hz(F)))), { re: 50, im: 20 }, 1e-12);
  });

  it('100 nH with Q 80 and 10 pF with Q 500 at 100 MHz', () => {
    const alone = (impedance: Parameters<typeof series>[0]) => pointOf(impedanceOf(sampled(impedance, 100e6)));
    nearComplex(alone(coil(100e-9, { loss: { law: 'constant q', q: 80 } })), { re: 0.7853982, im: 62.83185 }, 5e-6);
    nearComplex(alone(capacitor(10e-12, { loss: { law: 'skin effect', q: 500, atHz: 100e6 } })), { re: 0.3183099, im: -159.1549 }, 5e-5);
  });

  it('shorted and open stubs of 0.1 λ across an open', () => {
    nearComplex(pointOf(impedanceOf(throughElements([stub('short', lineOf(50, 36, F))], sampled({ form: 'open' }, F), hz(F)))), { re: 0, im: 36.32713 }, 1e-5);
  });
});
