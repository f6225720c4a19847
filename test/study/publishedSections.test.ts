import assert from 'node:assert/strict';
import type { Element } from '../../src/network/element';
import { evaluate } from '../../src/study/evaluate';
import { band, capacitor, goalOf, inductor, judge, lineOf, near, ohms, points, problemOf, resistor, series, shunt } from './problems';

/**
 * Worked examples of the standard texts, from memory unless said otherwise, quoted as «after …». The printed parts are
 * rounded, so each row also has |Γ| of exactly these parts, computed independently to seven digits; 2e-6 covers the last.
 */
const sections: { what: string; load: ReturnType<typeof ohms>; sourceOhm: number; atHz: number; ladder: Element[]; reflection: number }[] = [
  {
    what: 'after Pozar, Microwave Engineering, 4th ed., Example 5.1, first solution', load: { form: 'series', members: [resistor(200), capacitor(3.1830989e-12)] }, sourceOhm: 100, atHz: 500e6,
    ladder: [shunt('C1', capacitor(0.92e-12)), series('L1', inductor(38.8e-9))], reflection: 0.003294972,
  },
  {
    what: 'after Pozar, Example 5.1, second solution', load: { form: 'series', members: [resistor(200), capacitor(3.1830989e-12)] }, sourceOhm: 100, atHz: 500e6,
    ladder: [shunt('L1', inductor(46.1e-9)), series('C1', capacitor(2.61e-12))], reflection: 0.00254098,
  },
  {
    what: 'after Bowick, RF Circuit Design, Example 4-1', load: ohms(1000), sourceOhm: 100, atHz: 100e6,
    ladder: [shunt('C1', capacitor(4.8e-12)), series('L1', inductor(477e-9))], reflection: 0.006845694,
  },
  {
    what: 'after Steer, Microwave and RF Design, vol. 3, two-element matching', load: ohms(1700), sourceOhm: 100, atHz: 900e6,
    ladder: [shunt('C1', capacitor(0.416e-12)), series('L1', inductor(70.7e-9))], reflection: 0.001407082,
  },
];

describe('published sections through the whole evaluation', () => {
  for (const { what, load, sourceOhm, atHz, ladder, reflection } of sections) {
    it(what, () => {
      const problem = problemOf({ load, z0Ohm: sourceOhm, bands: [band('spot', points(atHz))], sweepHz: points(atHz), ladder });
      const result = judge(problem, goalOf('reflection', '<=', 0.01));
      near(result.value, reflection, 2e-6);
      assert.equal(result.ok, true);
      near(judge(problem, goalOf('return loss', '>=', 40, { unit: 'dB' })).value, -20 * Math.log10(reflection), 1e-6);
      // Lossless: what is not reflected arrives.
      near(evaluate(problem).traces[0].gainDb[0], 10 * Math.log10(1 - reflection ** 2), 5e-6);
    });
  }

  it('after Razavi, RF Microelectronics, 2nd ed., §2.5.2: 50 Ω to 25 Ω at 5 GHz with exact values is a match', () => {
    const problem = problemOf({
      load: ohms(50), sourceOhm: ohms(25), bands: [band('spot', points(5e9))],
      ladder: [shunt('C1', capacitor(0.6366198e-12)), series('L1', inductor(0.7957747e-9))],
    });
    const value = judge(problem, goalOf('reflection', '<=', 0.001)).value;
    assert.ok(value !== null && value < 1e-7, `${value}`);
  });

  it('Pozar, Microwave Engineering, 4th ed., Example 2.2 (confirmed): 40 + j70 Ω through 0.3 λ of 100 Ω', () => {
    const problem = problemOf({
      z0Ohm: 100, load: ohms(40, 70), bands: [band('spot', points(1e9))], sweepHz: points(1e9),
      ladder: [{ form: 'line', name: 'T1', line: lineOf(100, 0.3, 1e9) }],
    });
    const { traces, elements } = evaluate(problem);
    near(traces[0].impedanceOhm.re[0], 36.53396, 5e-7);
    near(traces[0].impedanceOhm.im[0], -61.11897, 5e-7);
    near(judge(problem, goalOf('VSWR', '<=', 4)).value, 3.866359, 5e-7);
    near(judge(problem, goalOf('return loss', '>=', 4)).value, 4.597472, 5e-7);
    near(judge(problem, goalOf('reflection', '<=', 0.6)).value, 0.5890151, 5e-7);
    near(elements[0].impedanceAfterOhm!.re, 36.53396, 5e-7);
  });

  // Numbers from first principles; the definition is Kurokawa's (1965).
  it('a lossless ladder between complex ends: power-wave |Γ| and gain belong together', () => {
    const omega = 2 * Math.PI * 1e9;
    const problem = problemOf({
      load: ohms(75, -40), sourceOhm: ohms(20, 30), sweepHz: points(1e9),
      ladder: [
        shunt('L2', inductor(1 / (omega * 4e-3))), { form: 'line', name: 'T1', line: lineOf(70, 35 / 360, 1e9) },
        shunt('C1', capacitor(12e-3 / omega)), series('L1', inductor(25 / omega)),
      ],
    });
    const { traces, bands } = evaluate(problem);
    near(traces[0].impedanceOhm.re[0], 29.15325, 5e-7);
    near(traces[0].impedanceOhm.im[0], -10.34542, 5e-7);
    near(bands[0].cases[0].worstReflection, 0.4095692, 5e-7);
    near(10 ** (traces[0].gainDb[0] / 10), 0.8322531, 5e-7);
    near(1 - bands[0].cases[0].worstReflection! ** 2, 10 ** (traces[0].gainDb[0] / 10), 1e-12);
  });

  it('25 + j10 Ω, shunt 2 pF, series 10 nH at 1 GHz (numbers from first principles)', () => {
    const problem = problemOf({ load: ohms(25, 10), sweepHz: points(1e9), ladder: [shunt('C1', capacitor(2e-12)), series('L1', inductor(10e-9))] });
    const { traces } = evaluate(problem);
    near(traces[0].impedanceOhm.re[0], 28.96334, 5e-7);
    near(traces[0].impedanceOhm.im[0], 63.86223, 5e-7);
    near(traces[0].chartReflection.re[0], 0.2343761, 5e-7);
    near(traces[0].chartReflection.im[0], 0.6192044, 5e-7);
  });

  it('three-resistor 3 dB pad, after Pozar, Example 4.4: S21 is the gain between equal ends', () => {
    const problem = problemOf({ sweepHz: points(1e9), ladder: [series('R1', resistor(8.56)), shunt('R2', resistor(141.8)), series('R3', resistor(8.56))] });
    const { traces } = evaluate(problem);
    near(traces[0].impedanceOhm.re[0], 50.00444, 5e-7);
    near(10 ** (traces[0].gainDb[0] / 20), 0.7076947, 5e-7);
  });

  it('ideal transformer, 2:1 onto 12.5 + j5 Ω', () => {
    const problem = problemOf({
      load: ohms(12.5, 5), sweepHz: points(1e9), ladder: [{ form: 'transformer', name: 'T1', turnsSource: 2, turnsLoad: 1, windingH: null, coupling: 1 }],
    });
    const { traces } = evaluate(problem);
    near(traces[0].impedanceOhm.re[0], 50, 1e-12);
    near(traces[0].impedanceOhm.im[0], 20, 1e-12);
  });

  it('a mismatched lossy line: 3 dB matched, SWR 3 at the load (formula: The ARRL Antenna Book, from memory)', () => {
    const problem = problemOf({
      load: ohms(150), sweepHz: points(1e9), ladder: [{ form: 'line', name: 'T1', line: lineOf(50, 0.5, 1e9, 3) }],
    });
    near(judge(problem, goalOf('VSWR', '<=', 2)).value, 1.668779, 1e-6);
    // Total loss is between the power that enters the line and the load: the efficiency.
    near(judge(problem, goalOf('efficiency', '>=', -4, { unit: 'dB' })).value, -3.967723, 1e-6);
  });
});

describe('conversions of a return loss table', () => {
  // A public conversion table; every |Γ| and SWR printed with three decimals.
  const printed: [number, number, number][] = [[3, 5.848, 0.708], [6, 3.01, 0.501], [10, 1.925, 0.316], [14, 1.499, 0.2], [20, 1.222, 0.1], [30, 1.065, 0.032]];
  for (const [lossDb, swr, reflection] of printed) {
    it(`${lossDb} dB`, () => {
      const load: ReturnType<typeof ohms> = { form: 'reflection', reflection: { re: 0, im: 10 ** (-lossDb / 20) }, referenceOhm: 50 };
      const problem = problemOf({ load });
      near(judge(problem, goalOf('return loss', '>=', 1)).value, lossDb, 1e-12);
      assert.equal(judge(problem, goalOf('VSWR', '<=', 2)).value!.toFixed(3), swr.toFixed(3));
      assert.equal(judge(problem, goalOf('reflection', '<=', 1)).value!.toFixed(3), reflection.toFixed(3));
    });
  }

  // Trade tables, from memory: SWR 2 is a mismatch loss of 0.512 dB, SWR 3 of 1.249 dB.
  for (const [swr, loss] of [[1.5, 0.1772877], [2, 0.5115252], [3, 1.249387], [10, 4.807254]] as const) {
    it(`SWR ${swr}: mismatch loss`, () => near(judge(problemOf({ load: ohms(50 * swr) }), goalOf('mismatch loss', '<=', 5)).value, loss, 5e-7));
  }
});
