import assert from 'node:assert/strict';
import fc from 'fast-check';
import { roundDecimal } from '../../../src/network/touchstone/roundDecimal';
import { scanNumber } from '../../../src/network/touchstone/scanNumber';

function scan(text: string, shift = 0): { value: number; shifted: number; end: number } {
  const into = { value: 0, shifted: 0, end: 0 };
  const bytes = new TextEncoder().encode(text);
  scanNumber(bytes, 0, bytes.length, shift, into);
  return into;
}

/** The engine's own reading is the measure: ECMAScript asks for correct rounding up to 20 digits, V8 gives it for all. */
const agrees = (text: string) => assert.ok(Object.is(scan(text).value, Number(text)), `${text}: ${scan(text).value}`);

const digits = (least: number, most: number) => fc.array(fc.integer({ min: 0, max: 9 }), { minLength: least, maxLength: most }).map((all) => all.join(''));
const decimals = (wholeAtMost: number, fractionAtMost: number, exponents: number) =>
  fc.tuple(fc.constantFrom('', '-', '+'), digits(1, wholeAtMost), digits(0, fractionAtMost), fc.option(fc.integer({ min: -exponents, max: exponents })))
    .map(([sign, whole, fraction, exponent]) => `${sign}${whole}.${fraction}${exponent === null ? '' : `e${exponent}`}`);

describe('numbers of a Touchstone file', () => {
  it('are correctly rounded, short ones', () => fc.assert(fc.property(decimals(3, 12, 12), agrees), { numRuns: 3000 }));
  it('are correctly rounded, of 16 to 30 digits', () => fc.assert(fc.property(decimals(2, 28, 20), agrees), { numRuns: 3000 }));
  it('are correctly rounded, very long, large and small ones', () => fc.assert(fc.property(decimals(30, 60, 340), agrees), { numRuns: 1000 }));
  it('are correctly rounded, written by programs', () => {
    const any = fc.double({ noNaN: true, noDefaultInfinity: true });
    fc.assert(fc.property(any, fc.integer({ min: 0, max: 25 }), (x, places) => {
      agrees(String(x));
      agrees(x.toExponential(places));
    }), { numRuns: 3000 });
  });

  it('are correctly rounded half way between two doubles, where pairs of doubles cannot tell', () => {
    // 2^53 + 1 is a tie; a digit far behind decides it.
    for (const text of ['9007199254740993', '9007199254740993.0000000000001', '9007199254740992.9999999999999', '900719925474099300000e-5', '1.00000000000000011102230246251565', '1.000000000000000111022302462515654', '0.1', '123456789012345678']) agrees(text);
    assert.ok(Number.isNaN(roundDecimal(900719925474099, 3, 1, 0)), 'a tie is decided without knowing');
    assert.equal(roundDecimal(900719925474099, 31, 2, -1), Number('9007199254740993.1'));
  });

  it('end at a blank, and take no part of a word', () => {
    assert.deepEqual([scan('1.5 2').value, scan('1.5 2').end], [1.5, 3]);
    for (const word of ['', '+', '.', 'e5', '1e', '1e+', '1.2.3', '1,5', '0x10', '1_000', '1d3', 'inf', 'Infinity', 'nan', '--1', '1-', '1e5.5']) assert.ok(Number.isNaN(scan(word).value), word);
    assert.equal(scan('1,5 2').end, 3);
    assert.ok(Number.isNaN(scan('1'.repeat(500)).value));
    assert.equal(scan('1e999').value, Infinity);
    assert.equal(scan('-1e-999').value, -0);
  });

  it('shifted by a power of ten are rounded once', () => {
    fc.assert(fc.property(decimals(3, 20, 10), fc.constantFrom(3, 6, 9), (text, shift) => {
      const [mantissa, exponent = '0'] = text.split('e');
      assert.ok(Object.is(scan(text, shift).shifted, Number(`${mantissa}e${Number(exponent) + shift}`)), text);
    }), { numRuns: 2000 });
  });
});
