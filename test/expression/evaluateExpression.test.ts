import assert from 'node:assert/strict';
import fc from 'fast-check';
import { evaluateExpression, type Measured } from '../../src/expression/evaluateExpression';
import { dimensionText, type DimensionVector } from '../../src/expression/dimensionVector';
import { expressionLimits } from '../../src/expression/limits';

const names: ReadonlyMap<string, Measured> = new Map([
  ['f0', { value: 866.5e6, dimension: [0, 0, -1, 0] as DimensionVector }], ['k', { value: 3, dimension: [0, 0, 0, 0] as DimensionVector }], ['Q', { value: 40, dimension: [0, 0, 0, 0] as DimensionVector }],
]);
const evaluate = (text: string) => evaluateExpression(text, names);

/** Value and unit of an expression that must be right. */
function worth(text: string): [number, string] {
  const outcome = evaluate(text);
  assert.ok(outcome.ok, outcome.ok ? '' : `${text}: ${outcome.message}`);
  return [outcome.result.value, dimensionText(outcome.result.dimension)];
}

function refusal(text: string): string {
  const outcome = evaluate(text);
  assert.ok(!outcome.ok, `«${text}» was worked out`);
  return outcome.message;
}

describe('expressions', () => {
  for (const [text, value, unit] of [
    ['1/(2*pi*f0*37 ohm)', 1 / (2 * Math.PI * 866.5e6 * 37), 'F'], ['37 Ω / (2 π f0)', 37 / (2 * Math.PI * 866.5e6), 'H'], ['4.7 nH', 4.7e-9, 'H'], ['0.3 pF + 1 pF', 1.3e-12, 'F'], ['2 * 37 \u2126', 74, 'Ω'], ['1/50 ohm', 0.02, 'Ω'],
    ['k * 2', 6, 'a plain number'], ['-k^2', -9, 'a plain number'], ['2^-1', 0.5, 'a plain number'], ['2^3^2', 512, 'a plain number'], ['1e3 + .5', 1000.5, 'a plain number'], ['sqrt(4 nH / 1 pF)', 63.24555320336759, 'Ω'], ['1/(2*pi*sqrt(10 nH * 4 pF))', 1 / (2 * Math.PI * Math.sqrt(4e-20)), 'Hz'], ['10 V / 2 ohm', 5, 'A'], ['10 V * 2 A', 20, 'W'],
    ['1/(50 ohm)', 0.02, 'S'], ['sin(30°)', 0.5, 'a plain number'], ['cos(60 deg)', 0.5, 'a plain number'], ['min(3 nH, 2 nH, 7 nH)', 2e-9, 'H'], ['max(k, Q)', 40, 'a plain number'], ['abs(-3 pF)', 3e-12, 'F'], ['round(2.6)', 3, 'a plain number'], ['atan2(1, 1)', Math.PI / 4, 'a plain number'], ['log10(1000)', 3, 'a plain number'], ['e', Math.E, 'a plain number'],
    ['5 × 2', 10, 'a plain number'], ['5·2 − 1', 9, 'a plain number'], ['300e6 m / s / f0', 300e6 / 866.5e6, 'm'], ['10 mil', 0.000254, 'm'], ['5 µH + 1 uH', 6e-6, 'H'], ['50%', 0.5, 'a plain number'], ['((((k))))', 3, 'a plain number'],
  ] as const) {
    it(`«${text}»`, () => {
      const [actual, actualUnit] = worth(text);
      assert.equal(actualUnit, unit);
      // A few roundings.
      assert.ok(Math.abs(actual - value) <= 4e-16 * Math.abs(value) + 1e-300, `${actual} and not ${value}`);
    });
  }

  it('read a number with its unit to the last bit', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 10 ** 6 }), fc.integer({ min: 0, max: 5 }), (digits, decimals) => {
      const text = (digits / 10 ** decimals).toFixed(decimals);
      assert.equal(worth(`${text} nH`)[0], Number(`${text}e-9`));
    }), { numRuns: 200 });
  });

  for (const [text, message] of [
    ['f0 + 1', /Hz and a plain number cannot be added/], ['1 nH - 1 pF', /H and F cannot be subtracted/], ['sin(1 nH)', /sin takes a plain number, not H/], ['2^(1 nH)', /exponent/], ['round(2.6 nH)', /round takes a plain number, not H/], ['min(1 nH, 1 pF)', /values of one unit, not H and F/], ['1/0', /divides by zero/], ['0/0', /divides by zero/], ['1e999', /no finite value/], ['10^400', /no finite value/], ['sqrt(-1)', /no finite value/], ['log(0)', /no finite value/],
    ['k(2)', /k is a value and not a function/], ['nobody', /«nobody»/], ['zeros(3)', /no function «zeros»/], ['1 dB', /«dB»/], ['1 dBm', /«dBm»/], ['sqrt(1, 2)', /one value/], ['min()', /at least one/], ['atan2(1)', /2 values/], ['', /follows «=»/], ['undefined', /«undefined»/], ['2 +', /cannot be read/], ['(2', /cannot be read/], ['1,5', /cannot be read/],
    ['5!', /may not stand/], ['7 % 3', /may not stand/], ['1 == 1', /may not stand/], ['1 < 2', /only|may not/], ['true', /«true»/], ['"a"', /is not a number/], ['[1, 2]', /only numbers/], ['{a: 1}', /only numbers/], ['a = 1', /only numbers/], ['f(x) = x', /only numbers/], ['1 ? 2 : 3', /only numbers/], ['1:5', /only numbers/], ['k.constructor', /only numbers/], ['k[1]', /only numbers/], ['1; 2', /one line/], ['1\n2', /one line/],
    ['constructor', /«constructor»/], ['__proto__', /«__proto__»/], ['toString()', /«toString»/], ['import("x")', /no function «import»/], ['eval("1")', /no function «eval»/], ['k.map(x)', /only numbers/],
  ] as const) {
    it(`«${text}» is refused`, () => assert.match(refusal(text), message));
  }

  it('are bounded in length, nesting and terms', () => {
    assert.match(refusal('1+'.repeat(300) + '1'), new RegExp(`longer than ${expressionLimits.characters}`));
    assert.match(refusal(`${'('.repeat(60)}1${')'.repeat(60)}`), /nested/);
    assert.match(refusal(`${'['.repeat(60)}1${']'.repeat(60)}`), /nested/);
    assert.match(refusal('1+'.repeat(180) + '1'), /too many terms/);
    assert.equal(worth(`${'('.repeat(40)}1${')'.repeat(40)}`)[0], 1);
  });

  it('neither hang nor allocate, whatever is asked', () => {
    const hostile = [
      'zeros(1e9)', '1:1e9', '[1:1e9]', 'range(0, 1e9)', '(1e9)!', '1e9!', '9^9^9^9^9^9', 'random(1e9)', 'ones(1e5, 1e5)', 'map(1:1e9, f)', 'f(x) = f(x); f(1)', 'repeat("a", 1e9)', 'factorial(170000)', 'bignumber(2)^1e9', '2 ^ (2 ^ (2 ^ (2 ^ 20)))', 'concat("a", "b")',
      '-'.repeat(399) + '1', '+'.repeat(399) + '1', `${'2^'.repeat(190)}2`, `${'sin('.repeat(38)}1${')'.repeat(38)}`, '1 '.repeat(190), 'k '.repeat(190), '~'.repeat(399), 'not '.repeat(90) + '1', "k" + "'".repeat(390), '.'.repeat(399), '1' + '0'.repeat(390), '"' + 'a'.repeat(390), '\\'.repeat(399), '\u0000', '\ud800', '𝕏', '\u202e1', '#'.repeat(100),
    ];
    for (const text of hostile) {
      const start = performance.now();
      const outcome = evaluate(text);
      assert.ok(performance.now() - start < 1000, text.slice(0, 40));
      if (outcome.ok) assert.ok(Number.isFinite(outcome.result.value), text.slice(0, 40));
      else assert.ok(outcome.message !== '', text.slice(0, 40));
    }
  });

  it('put together at random give a finite value or a message', () => {
    const piece = fc.constantFrom('1', '2.5', 'k', 'f0', 'pi', 'nH', 'ohm', 'Ω', '+', '-', '*', '/', '^', '(', ')', ',', 'sqrt(', 'min(', ' ', '!', '[', ']', '{', '}', '=', ':', '?', '.', "'", '"', ';', '%', '&', 'x', 'to', 'in', 'mod', '1e5', 'e', '__proto__', '\\', '#');
    fc.assert(fc.property(fc.array(piece, { maxLength: 25 }), (pieces) => {
      const outcome = evaluate(pieces.join(''));
      assert.ok(outcome.ok ? Number.isFinite(outcome.result.value) && outcome.result.dimension.every(Number.isFinite) : outcome.message !== '');
    }), { numRuns: 2000 });
  });
});
