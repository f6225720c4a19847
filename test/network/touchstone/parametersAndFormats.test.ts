import assert from 'node:assert/strict';
import fc from 'fast-check';
import { add, complex, divide, multiply, subtract, type Complex } from '../../../src/network/complex';
import { assertPoint, legal, pointOf } from './files';

// Y, Z, H and G of a two-port worked out here from its ABCD matrix (D. A. Frickey, IEEE Trans. MTT-42, 1994, tables I and
// II), written to a file and read back: the scattering parameters must be those of the ABCD matrix.

interface Abcd { readonly a: Complex; readonly b: Complex; readonly c: Complex; readonly d: Complex }

const over = (x: Complex, y: Complex) => divide(x, y);
const minus = (x: Complex) => subtract(complex(0), x);
const one = complex(1);

function matrixOf(parameter: string, { a, b, c, d }: Abcd): Complex[] {
  const det = subtract(multiply(a, d), multiply(b, c));
  switch (parameter) {
    case 'Z': return [over(a, c), over(det, c), over(one, c), over(d, c)];
    case 'Y': return [over(d, b), minus(over(det, b)), minus(over(one, b)), over(a, b)];
    case 'H': return [over(b, d), over(det, d), minus(over(one, d)), over(c, d)];
    case 'G': return [over(c, a), minus(over(det, a)), over(one, a), over(b, a)];
    default: throw new RangeError(parameter);
  }
}

function scatteringOf({ a, b, c, d }: Abcd, r1: number, r2: number): [number, number][] {
  const of = (x: Complex, by: number): Complex => ({ re: x.re * by, im: x.im * by });
  const [aR, cR, dR] = [of(a, r2), of(c, r1 * r2), of(d, r1)];
  const sum = add(add(aR, b), add(cR, dR));
  const root = complex(2 * Math.sqrt(r1 * r2));
  const det = subtract(multiply(a, d), multiply(b, c));
  return [over(subtract(add(aR, b), add(cR, dR)), sum), over(multiply(root, det), sum), over(root, sum), over(subtract(add(b, dR), add(aR, cR)), sum)].map(({ re, im }) => [re, im]);
}

/** How version 1 states each entry: divided or multiplied by R (from memory). */
const normalised: Readonly<Record<string, (R: number) => number[]>> = {
  Z: (R) => [1 / R, 1 / R, 1 / R, 1 / R], Y: (R) => [R, R, R, R], H: (R) => [1 / R, 1, 1, R], G: (R) => [R, 1, 1, 1 / R],
};

function written({ re, im }: Complex, format: string): string {
  if (format === 'RI') return `${re} ${im}`;
  // Zero has no decibels; −6000 dB is as good.
  const size = Math.max(Math.hypot(re, im), 1e-300);
  return `${format === 'MA' ? size : 20 * Math.log10(size)} ${(Math.atan2(im, re) * 180) / Math.PI}`;
}

const part = fc.double({ min: -3, max: 3, noNaN: true }).filter((x) => Math.abs(x) > 0.05);
const value = fc.record({ re: part, im: part });
/** An invented two-port, active or not: the relations hold for all. */
const twoPort = fc.record({ a: value, b: value.map(({ re, im }) => ({ re: 40 * re, im: 40 * im })), c: value.map(({ re, im }) => ({ re: re / 40, im: im / 40 })), d: value });

function fits(abcd: Abcd, r1: number, r2: number): boolean {
  return scatteringOf(abcd, r1, r2).every(([re, im]) => Math.hypot(re, im) < 20);
}

describe('parameters and formats of Touchstone files', () => {
  for (const parameter of ['Z', 'Y', 'H', 'G']) {
    for (const format of ['RI', 'MA', 'DB']) {
      it(`${parameter} in ${format}, version 1, is normalised`, () => {
        fc.assert(fc.property(twoPort, fc.constantFrom(50, 75, 12.5), (abcd, R) => {
          fc.pre(fits(abcd, R, R));
          const scale = normalised[parameter](R);
          const [m11, m12, m21, m22] = matrixOf(parameter, abcd).map(({ re, im }, i) => written({ re: re * scale[i], im: im * scale[i] }, format));
          const { data } = legal('a.s2p', `# MHz ${parameter} ${format} R ${R}\n868 ${m11} ${m21} ${m12} ${m22}\n`);
          // Rounding, magnified by a difference of matrices near singular.
          assertPoint(pointOf(data), scatteringOf(abcd, R, R), 1e-9);
        }), { numRuns: 60 });
      });
    }

    it(`${parameter}, version 2, is in ohms and siemens, with any two references`, () => {
      fc.assert(fc.property(twoPort, fc.double({ min: 5, max: 300, noNaN: true }), fc.double({ min: 5, max: 300, noNaN: true }), (abcd, r1, r2) => {
        fc.pre(fits(abcd, r1, r2));
        const pairs = matrixOf(parameter, abcd).map((entry) => written(entry, 'RI')).join(' ');
        const { data } = legal('a.ts', `[Version] 2.0\n# MHz ${parameter} RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n[Reference] ${r1} ${r2}\n[Network Data]\n868 ${pairs}\n[End]\n`);
        assertPoint(pointOf(data), scatteringOf(abcd, r1, r2), 1e-9);
      }), { numRuns: 60 });
    });
  }

  it('reads Y of a one-port: 0.02 S in version 2 and 1 in version 1 with R 50 are a match', () => {
    assertPoint(pointOf(legal('a.s1p', '# MHz Y RI R 50\n868 1 0\n').data), [[0, 0]]);
    assertPoint(pointOf(legal('a.ts', '[Version] 2.0\n# MHz Y RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Network Data]\n868 0.02 0\n[End]\n').data), [[0, 0]]);
  });

  it('reads Z of three ports: ports that see 50 Ω each and not each other are a match', () => {
    assertPoint(pointOf(legal('a.s3p', '# MHz Z RI R 50\n868 1 0 0 0 0 0\n0 0 1 0 0 0\n0 0 0 0 1 0\n').data), Array.from({ length: 9 }, () => [0, 0] as const));
  });

  it('turns every unit into hertz without an error of rounding', () => {
    for (const [unit, factor] of [['Hz', 1], ['kHz', 1e3], ['MHz', 1e6], ['GHz', 1e9]] as const) {
      for (const figure of [0.8685, 1, 13.56, 868.3, 902.75]) assert.equal(legal('a.s1p', `# ${unit} S RI R 50\n${figure} 0 0\n`).data.frequencyHz[0], figure * factor, `${figure} ${unit}`);
    }
  });

  it('reads numbers as JavaScript does, to the last bit', () => {
    fc.assert(fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e300, max: 1e300 }), fc.constantFrom(String, (x: number) => x.toExponential(), (x: number) => x.toExponential(20), (x: number) => x.toPrecision(17)), (number, print) => {
      const text = print(number);
      assert.ok(Object.is(legal('a.s1p', `# Hz S RI R 50\n1 ${text} 0\n`).data.sRe[0], Number(text)), text);
    }), { numRuns: 500 });
    for (const text of ['.5', '5.', '+.5e-3', '-5.E+2', '00012.50', '1234567890123456789', '0.1e-320', '1e22', '1e23', '9007199254740993', '-0']) {
      assert.ok(Object.is(legal('a.s1p', `# Hz S RI R 50\n1 ${text} 0\n`).data.sRe[0], Number(text)), text);
    }
  });
});
