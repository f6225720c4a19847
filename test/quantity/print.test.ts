import assert from 'node:assert/strict';
import fc from 'fast-check';
import { literalAt, literalValue } from '../../src/quantity/literal';
import { printComplex, printPolar, printReactance } from '../../src/quantity/printComplex';
import { printNumber, printQuantity, writeQuantity } from '../../src/quantity/printQuantity';
import { dimensionOf } from '../../src/quantity/unit';

const readBack = (text: string, unit: string) => {
  const literal = literalAt(text, 0, [dimensionOf(unit)!]);
  assert.ok(literal && literal.end === text.length, text);
  return literalValue(literal);
};

describe('printing numbers', () => {
  for (const [value, unit, digits, text] of [
    [4.7e-9, 'H', 3, '4.7 nH'], [866.5e6, 'Hz', 4, '866.5 MHz'], [-31.2, 'Ω', 3, '−31.2 Ω'], [1e-12, 'F', 3, '1 pF'], [0.3e-12, 'F', 2, '0.3 pF'], [0.3e-12, 'H', 2, '0.3 pH'], [999.96, 'Hz', 4, '1 kHz'], [0, 'H', 3, '0 H'], [50, 'Ω', 2, '50 Ω'], [1200, 'Ω', 3, '1.2 kΩ'], [12.346, 'dB', 3, '12.3 dB'], [1234.6, 'dB', 3, '1230 dB'],
    [Infinity, 'Ω', 3, '∞ Ω'], [2e12, 'Hz', 3, '2000 GHz'], [5, '', 3, '5'], [-0.00012, 'A', 2, '−120 µA'],
  ] as const) it(`${value} ${unit} to ${digits} digits is «${text}»`, () => assert.equal(printQuantity(value, unit, { digits }), text));

  it('leaves out zeros that say nothing, and exponents', () => {
    assert.deepEqual([1.5, 100, 0.1, -2, 0.000123, 1e6, NaN, -Infinity].map((value) => printNumber(value, 4)), ['1.5', '100', '0.1', '−2', '0.000123', '1000000', 'not known', '−∞']);
    assert.equal(printNumber(12345, 2), '12000');
  });

  it('keeps within half a unit of the last digit', () => {
    fc.assert(fc.property(fc.double({ min: 1e-14, max: 1e13, noNaN: true }), fc.integer({ min: 1, max: 7 }), fc.constantFrom('H', 'F', 'Hz', 'Ω', 'V'), (value, digits, unit) => {
      const text = printQuantity(value, unit, { digits });
      assert.doesNotMatch(text, /e/i);
      assert.ok(Math.abs(readBack(text, unit) - value) <= 0.5000001 * 10 ** (Math.floor(Math.log10(value)) + 1 - digits), `${value} as ${text}`);
    }), { numRuns: 500 });
  });
});

describe('writing numbers into descriptions', () => {
  for (const [value, unit, text] of [[3.3e-12, 'F', '3.3 pF'], [4.7e-9, 'H', '4.7 nH'], [-31.25, 'Ω', '-31.25 Ω'], [0, 'F', '0 F'], [1e-15, 'F', '1 fF'], [868.3e6, 'Hz', '868.3 MHz'], [0.1, 'dB', '0.1 dB'], [1e21, 'Hz', '1000000000000 GHz'], [1.2345e-9, 'F', '1.2345 nF'], [1e-20, 'H', '0.00000001 pH']] as const) {
    it(`${value} ${unit} is «${text}»`, () => assert.equal(writeQuantity(value, unit), text));
  }

  it('reads back to the same double', () => {
    fc.assert(fc.property(fc.double({ noNaN: true, min: 1e-18, max: 1e15 }), fc.boolean(), fc.constantFrom('H', 'F', 'Hz', 'Ω', 'V', 'A', 's', 'dB', 'm'), (size, negative, unit) => {
      const value = negative ? -size : size;
      assert.equal(readBack(writeQuantity(value, unit), unit), value);
    }), { numRuns: 1000 });
  });
});

describe('printing complex numbers', () => {
  it('writes the imaginary unit first', () => {
    assert.equal(printComplex({ re: 18, im: -37.24 }, 'Ω'), '18.0 − j37.2 Ω');
    assert.equal(printComplex({ re: -0.04, im: 12 }, 'Ω'), '0.0 + j12.0 Ω');
    assert.equal(printComplex({ re: 0.1234, im: -0.0001 }, ''), '0.123 + j0.000');
    assert.equal(printComplex({ re: 1234.5, im: 2 }, 'Ω'), '1235 + j2 Ω');
    assert.equal(printComplex({ re: Infinity, im: 0 }, 'Ω'), 'open');
    assert.equal(printComplex({ re: NaN, im: NaN }, 'Ω'), 'not known');
  });
  it('writes magnitude and angle, and reactances with their sign', () => {
    assert.equal(printPolar({ re: 0.62 * Math.cos(-38 * Math.PI / 180), im: 0.62 * Math.sin(-38 * Math.PI / 180) }), '0.620 ∠ −38°');
    assert.equal(printPolar({ re: 1, im: -1e-9 }), '1.000 ∠ 0°');
    assert.equal(printReactance(70.81, 'Ω'), '+j70.8 Ω');
    assert.equal(printReactance(-0.051, 'S'), '−j51.0 mS');
    assert.equal(printReactance(-Infinity, 'Ω'), '∞');
    assert.equal(printReactance(-1234.56, 'Ω'), '−j1235 Ω');
  });
});
