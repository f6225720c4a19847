import { cascade, throughElements } from '../../src/network/cascade';
import { transducerGain, vswr } from '../../src/network/figures';
import { reflectionOf } from '../../src/network/immittance';
import { hz, lineOf, near, ohm, pointOf, sampled, through } from '../network/expect';

// Quarter-wave transformers between 1 and R: their insertion-loss function, 1/G − 1, is A·cos^2N θ (binomial) or
// A·T_N²(cos θ/cos θm)/T_N²(1/cos θm) (Chebyshev), with A = (R − 1)²/4R (Collin 1955, Riblet 1957; Matthaei, Young, Jones,
// ch. 6, from memory). The printed impedances must give it through the cascade.

const F = 1e9;
/** Sections from the source (1) to the load (R), evaluated where each is `degrees` long. */
function insertionLoss(sections: readonly number[], r: number, degrees: number): number {
  const ladder = [...sections].reverse().map((z) => through(lineOf(z, 90, F)));
  const frequencyHz = (F * degrees) / 90;
  return 1 / transducerGain(cascade(ladder, hz(frequencyHz)), sampled(ohm(1), frequencyHz), sampled(ohm(r), frequencyHz))[0] - 1;
}
const THETAS = [5, 20, 45, 60, 75, 90, 110, 150];
const cos = (degrees: number) => Math.cos((degrees * Math.PI) / 180);

describe('published: quarter-wave transformers', () => {
  it('Pozar, 4th ed., Example 2.5: 100 Ω to 50 Ω by 70.71 Ω', () => {
    const magnitude = (frequencyHz: number) => {
      const { re, im } = pointOf(reflectionOf(throughElements([through(lineOf(70.71068, 90, F))], sampled(ohm(100), frequencyHz), hz(frequencyHz)), 50));
      return Math.hypot(re, im);
    };
    near(magnitude(F), 0, 1e-7);
    near(magnitude(1e-3), 0.33, 0.005);
    near(magnitude(0.8 * F), 0.1086077, 1e-6);
  });

  it('after Pozar, 4th ed., Example 5.5 (from memory): 10 Ω to 50 Ω, SWR 1.5 over 29 %', () => {
    const standing = (frequencyHz: number) => {
      const { re, im } = pointOf(reflectionOf(throughElements([through(lineOf(22.36068, 90, F))], sampled(ohm(10), frequencyHz), hz(frequencyHz)), 50));
      return vswr(Math.hypot(re, im));
    };
    for (const side of [-1, 1]) near(standing(F * (1 + (side * 0.2931592) / 2)), 1.5, 1e-5);
    near(standing(F * (1 + 0.29 / 2)), 1.5, 0.01);
  });

  // After Pozar, 4th ed., Table 5.1 (from memory), lower half; the upper half by Zk·Z(N+1−k) = R.
  const binomial: readonly [number, number[]][] = [
    [1.5, [1.1067]], [1.5, [1.052, 1.2247]], [1.5, [1.0257, 1.1351]], [2, [1.1892]], [2, [1.0907, 1.4142]], [2, [1.0444, 1.2421]],
    [3, [1.3161]], [3, [1.1479, 1.7321]], [3, [1.0718, 1.4105]], [4, [1.4142]], [4, [1.1907, 2]], [4, [1.0919, 1.5442]],
    [6, [1.5651]], [6, [1.2544, 2.4495]], [6, [1.1215, 1.7553]], [8, [1.6818]], [8, [1.3022, 2.8284]], [8, [1.1436, 1.9232]],
    [10, [1.7783]], [10, [1.3409, 3.1623]], [10, [1.1613, 2.0651]],
  ];
  const orders = [2, 3, 4];
  binomial.forEach(([r, lower], i) => {
    const order = orders[i % 3];
    it(`binomial, R = ${r}, ${order} sections`, () => {
      const sections = Array.from({ length: order }, (_, k) => lower[k] ?? r / lower[order - 1 - k]);
      const a = (r - 1) ** 2 / (4 * r);
      // Four decimals of Z make some 1e-4 of each small reflection, hence of the square root of the loss.
      for (const theta of THETAS) near(Math.sqrt(Math.max(0, insertionLoss(sections, r, theta))), Math.sqrt(a) * Math.abs(cos(theta)) ** order, 3e-4, `${theta}°`);
    });
  });

  // After Pozar, 4th ed., Table 5.2, N = 2 columns (from memory): Z1 for Γm = 0.05 and 0.20; Z2 = R/Z1.
  const equalRipple: readonly [number, number, number][] = [
    [1.5, 0.05, 1.1347], [1.5, 0.2, 1.2247], [2, 0.05, 1.2193], [2, 0.2, 1.3161], [3, 0.05, 1.3494], [3, 0.2, 1.4565], [4, 0.05, 1.45], [4, 0.2, 1.5651],
    [6, 0.05, 1.6047], [6, 0.2, 1.7321], [8, 0.05, 1.7244], [8, 0.2, 1.8612], [10, 0.05, 1.8233], [10, 0.2, 1.968],
  ];
  for (const [r, ripple, first] of equalRipple) {
    it(`Chebyshev, R = ${r}, Γm = ${ripple}, 2 sections`, () => {
      const magnitude = (degrees: number) => {
        const loss = Math.max(0, insertionLoss([first, r / first], r, degrees));
        return Math.sqrt(loss / (1 + loss));
      };
      // Middle of the band: T_2(0)² = 1, the ripple itself. At R = 1.5 the whole mismatch is no more than 0.2.
      near(magnitude(90), ripple <= (r - 1) / (r + 1) ? ripple : (r - 1) / (r + 1), 3e-4);
      // It falls to nothing between the middle and the edge, and stays below the ripple in there.
      const a = (r - 1) ** 2 / (4 * r);
      const k = ripple ** 2 / (1 - ripple ** 2);
      const edge = Math.acosh(Math.sqrt(Math.max(a / k, 1))) / 2;
      const thetaM = (Math.acos(1 / Math.cosh(edge)) * 180) / Math.PI;
      for (let theta = thetaM; theta <= 90; theta += 2) if (magnitude(theta) > ripple + 3e-4) throw new Error(`${magnitude(theta)} at ${theta}°`);
    });
  }

  // Young; Matthaei, Young, Jones, Table 6.04-1, row R = 2 (from memory): Z1 for the fractional bandwidth.
  const young: readonly [number, number][] = [[0, 1.18921], [0.2, 1.19181], [0.4, 1.19979], [0.6, 1.2136], [0.8, 1.23388], [1, 1.26122]];
  for (const [bandwidth, first] of young) {
    it(`two sections, R = 2, fractional bandwidth ${bandwidth}`, () => {
      const edge = 90 * (1 - bandwidth / 2);
      // The ripple is the same at the edges and in the middle; five decimals of Z1 move it by some 2e-6.
      for (const theta of [edge, 180 - edge]) near(insertionLoss([first, 2 / first], 2, theta), insertionLoss([first, 2 / first], 2, 90), 4e-6);
    });
  }
});
