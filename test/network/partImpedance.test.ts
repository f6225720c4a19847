import assert from 'node:assert/strict';
import type { NetworkData } from '../../src/network/networkData';
import { idealPart, type Part } from '../../src/network/part';
import { partImpedance } from '../../src/network/partImpedance';
import { hz, near, nearComplex, pointOf } from './expect';

const at = (part: Part, frequencyHz: number) => pointOf(partImpedance(part, hz(frequencyHz)).impedance);

describe('the impedance of a part', () => {
  const F = 868e6;
  const W = 2 * Math.PI * F;
  const STATED = 2 * Math.PI * 900e6;
  const cases: readonly [string, Part, number, { re: number; im: number }][] = [
    ['a resistor is its value', idealPart('resistor', 12), F, { re: 12, im: 0 }],
    ['a resistor with ESL', { ...idealPart('resistor', 12), eslH: 1e-9 }, F, { re: 12, im: W * 1e-9 }],
    ['a resistor of nothing is a wire', idealPart('resistor', 0), F, { re: 0, im: 0 }],
    ['a coil is jωL', idealPart('inductor', 6.8e-9), F, { re: 0, im: W * 6.8e-9 }],
    ['a capacitor is 1/(jωC)', idealPart('capacitor', 3.3e-12), F, { re: 0, im: -1 / (W * 3.3e-12) }],
    ['the same Q everywhere', { ...idealPart('inductor', 6.8e-9), loss: { law: 'constant q', q: 40 } }, F, { re: (W * 6.8e-9) / 40, im: W * 6.8e-9 }],
    ['the same Q everywhere, capacitor', { ...idealPart('capacitor', 3.3e-12), loss: { law: 'constant q', q: 200 } }, F, { re: 1 / (W * 3.3e-12 * 200), im: -1 / (W * 3.3e-12) }],
    // Skin effect's law of the language: R = (|X|/35 at 900 MHz)·√(f/900 MHz).
    ['skin effect in a coil', { ...idealPart('inductor', 6.8e-9), loss: { law: 'skin effect', q: 35, atHz: 900e6 } }, 3600e6, { re: ((STATED * 6.8e-9) / 35) * 2, im: 4 * STATED * 6.8e-9 }],
    ['skin effect in a capacitor', { ...idealPart('capacitor', 2e-12), loss: { law: 'skin effect', q: 180, atHz: 900e6 } }, 225e6, { re: (1 / (STATED * 2e-12) / 180) * 0.5, im: -4 / (STATED * 2e-12) }],
    ['ESR', { ...idealPart('capacitor', 2e-12), loss: { law: 'resistance', resistanceOhm: 0.3 } }, 900e6, { re: 0.3, im: -1 / (STATED * 2e-12) }],
    ['ESR of a coil', { ...idealPart('inductor', 2e-9), loss: { law: 'resistance', resistanceOhm: 0.3 } }, 900e6, { re: 0.3, im: STATED * 2e-9 }],
    ['ESL beyond resonance', { ...idealPart('capacitor', 100e-12), eslH: 0.5e-9 }, 900e6, { re: 0, im: STATED * 0.5e-9 - 1 / (STATED * 100e-12) }],
  ];
  for (const [title, part, frequencyHz, expected] of cases) {
    it(title, () => nearComplex(at(part, frequencyHz), expected, 1e-9 * (1 + Math.abs(expected.im))));
  }

  it('keeps value and Q what they are without the self-resonance', () => {
    // Apparent L = L/(1 − (f/fr)²): a standard result; lossless.
    const part: Part = { ...idealPart('inductor', 10e-9), srfHz: 2e9 };
    for (const f of [0.3e9, 1e9, 1.9e9, 2.5e9]) near(at(part, f).im / (2 * Math.PI * f * 10e-9 / (1 - (f / 2e9) ** 2)), 1, 1e-12);
  });

  it('puts SRF capacitance across value and loss together', () => {
    const loss = { law: 'constant q', q: 30 } as const;
    const z = { re: (W * 10e-9) / 30, im: W * 10e-9 };
    const susceptance = W / ((2 * Math.PI * 3e9) ** 2 * 10e-9);
    const squared = z.re ** 2 + z.im ** 2;
    const y = { re: z.re / squared, im: -z.im / squared + susceptance };
    const size = y.re ** 2 + y.im ** 2;
    nearComplex(at({ ...idealPart('inductor', 10e-9), loss, srfHz: 3e9 }, F), { re: y.re / size, im: -y.im / size }, 1e-10);
  });

  it('does not fail at a lossless self-resonance', () => {
    // A frequency at which ω²LC is exactly 1 in this arithmetic: 2πf = 1, L = 1, C = 1.
    const { impedance, known } = partImpedance({ ...idealPart('inductor', 1), srfHz: 1 / (2 * Math.PI) }, hz(1 / (2 * Math.PI)));
    assert.equal(known[0], 1);
    assert.ok(impedance.re[0] === Infinity || Math.abs(impedance.im[0]) > 1e14);
    assert.ok(!Number.isNaN(impedance.im[0]));
    nearComplex(at({ ...idealPart('capacitor', 1), eslH: 1 }, 1 / (2 * Math.PI)), { re: 0, im: 0 }, 1e-15);
  });

  it('takes a capacitor of nothing, or at 0 Hz, for an open', () => {
    assert.equal(at(idealPart('capacitor', 0), 1e9).re, Infinity);
    assert.equal(at({ ...idealPart('capacitor', 1e-12), loss: { law: 'constant q', q: 100 } }, 0).re, Infinity);
    nearComplex(at({ ...idealPart('inductor', 1e-9), loss: { law: 'constant q', q: 100 } }, 0), { re: 0, im: 0 }, 0);
  });

  it('takes a measured part from the two-port measured in series, and only inside its file', () => {
    // Invented: Z = 3 + j40 Ω in series between 50 Ω ports: S11 = Z/(Z + 100), S21 = 100/(Z + 100).
    const z = { re: 3, im: 40 };
    const size = (z.re + 100) ** 2 + z.im ** 2;
    const s21 = { re: (100 * (z.re + 100)) / size, im: (-100 * z.im) / size };
    const point = [1 - s21.re, -s21.im, s21.re, s21.im, s21.re, s21.im, 1 - s21.re, -s21.im];
    const measured: NetworkData = {
      ports: 2, frequencyHz: hz(8e8, 9e8), referenceOhm: hz(50, 50),
      sRe: Float64Array.from([...point, ...point].filter((_, i) => i % 2 === 0)), sIm: Float64Array.from([...point, ...point].filter((_, i) => i % 2 === 1)),
    };
    // The printed value is not what counts.
    const part: Part = { ...idealPart('inductor', 1e-9), measured };
    const { impedance, known, reason } = partImpedance(part, hz(8e8, 9e8, 1e9));
    nearComplex(pointOf(impedance, 0), z, 1e-10);
    nearComplex(pointOf(impedance, 1), z, 1e-10);
    assert.deepEqual([...known], [1, 1, 0]);
    assert.ok(Number.isNaN(impedance.re[2]) && Number.isNaN(impedance.im[2]));
    assert.ok(reason !== null && reason.length > 0);
  });
});
