import assert from 'node:assert/strict';
import { readImpedancePhrase } from '../../../src/description/phrase/readImpedance';
import { readSourcePhrase } from '../../../src/description/phrase/readSource';
import { checkCarets, clean, mended, type Reader } from './support';

const impedance: Reader<unknown> = (phrase, context) => readImpedancePhrase(phrase, context, null);

const known = (kind: string, value: number, unit: string) => ({ form: 'part', kind, value: { form: 'known', value, unit } });
const complex = (re: number, im: number, atHz?: number) => ({ form: 'complex', value: { re, im }, ...(atHz !== undefined && { atHz }) });
const file = (path: string, port?: unknown) => ({ form: 'file', path, ...(port !== undefined && { port }) });
const gamma = (size: number, degrees: number) => ({ form: 'gamma', reflection: { re: size * Math.cos((degrees * Math.PI) / 180), im: size * Math.sin((degrees * Math.PI) / 180) } });

const cases: readonly (readonly [text: string, meaning: unknown])[] = [
  ['18 - j37 Ω', complex(18, -37)], ['18 − j37 Ω', complex(18, -37)], ['18-j37Ω', complex(18, -37)], ['18 + j22 ohm', complex(18, 22)], ['-j37 Ω', complex(0, -37)], ['j37 \u2126', complex(0, 37)], ['1.5 - j0.5 kΩ', complex(1500, -500)], ['18 Ω - j37 Ω', complex(18, -37)], ['1e2 - j2e1 Ω', complex(100, -20)],
  ['18 - j37 Ω at 868 MHz', complex(18, -37, 868e6)],
  ['gamma 0.62 at -38°', gamma(0.62, -38)], ['gamma 0.62 at −38 deg', gamma(0.62, -38)], ['gamma 0.5 at =(90 deg)', gamma(0.5, 90)], ['gamma 0 at 0°', { form: 'gamma', reflection: { re: 0, im: 0 } }],
  ['50 Ω', known('resistor', 50, 'Ω')], ['=25 ohm * 2', known('resistor', 50, 'Ω')],
  ['12 Ω + 3.3 pF', { form: 'series', members: [known('resistor', 12, 'Ω'), known('capacitor', 3.3e-12, 'F')] }],
  ['1.2 kΩ || 2 pF', { form: 'parallel', members: [known('resistor', 1200, 'Ω'), known('capacitor', 2e-12, 'F')] }],
  ['2 Ω + 1.2 kΩ || 2 pF', { form: 'series', members: [known('resistor', 2, 'Ω'), { form: 'parallel', members: [known('resistor', 1200, 'Ω'), known('capacitor', 2e-12, 'F')] }] }],
  ['(18 - j37 Ω) || 2 pF', { form: 'parallel', members: [complex(18, -37), known('capacitor', 2e-12, 'F')] }],
  ['(antenna.s1p) || 2 pF', { form: 'parallel', members: [file('antenna.s1p'), known('capacitor', 2e-12, 'F')] }],
  ['open', { form: 'open' }], ['short', { form: 'short' }], ['open || 2 pF', { form: 'parallel', members: [{ form: 'open' }, known('capacitor', 2e-12, 'F')] }],
  ['antenna.s1p', file('antenna.s1p')], ['wet bark.s1p', file('wet bark.s1p')], ['front-end.s3p port 2', file('front-end.s3p', 2)], ['antenna.s2p differential', file('antenna.s2p', 'differential')], ['./open.s1p', file('./open.s1p')], ['../lab/a b.S2P port 1', file('../lab/a b.S2P', 1)], ['model.ts', file('model.ts')],
  ['868 wet.s1p', file('868 wet.s1p')], ['2.4g.s1p', file('2.4g.s1p')], ['gamma.s1p', file('gamma.s1p')], ['solve.s1p', file('solve.s1p')], ['a+b.s1p', file('a+b.s1p')],
];

describe('impedances', () => {
  for (const [text, meaning] of cases) it(`«${text}»`, () => assert.deepEqual(rounded(clean(impedance, text)), rounded(meaning)));

  it('may be those of a source', () => {
    assert.deepEqual(clean(readSourcePhrase, '18 + j22 Ω'), { impedance: complex(18, 22) });
    assert.deepEqual(clean(readSourcePhrase, 'wants 18 - j22 Ω'), { impedance: complex(18, -22), wants: true });
  });

  it('that are wrong are marked where they are', () => {
    checkCarets(impedance, '18 - j37', '^^^^^^^^ unit-missing');
    checkCarets(impedance, '18 - 37j Ω at 868 MHz', '^^^^^^^^^^ j-behind');
    checkCarets(impedance, '18 - j37 nH', '^^^^^^^^^^^ unit-wrong');
    checkCarets(impedance, '18 kΩ - j37 Ω', '^^^^^^^^^^^^^ unit-wrong');
    checkCarets(impedance, '18 - j37 Ω at 0 Hz', '              ^^^^ frequency-not-positive');
    checkCarets(impedance, '-18 - j37 Ω', '^^^^^^^^^^^ not-passive');
    checkCarets(impedance, 'gamma 1.2 at 0°', '      ^^^ not-passive');
    checkCarets(impedance, 'gamma -0.2 at 0°', '      ^^^^ not-passive');
    checkCarets(impedance, 'gamma 0.62', '^^^^^^^^^^ gamma');
    checkCarets(impedance, 'gamma 0.62 at -38', '              ^^^ unit-missing');
    checkCarets(impedance, 'antenna', '^^^^^^^ impedance-expected');
    checkCarets(impedance, 'stock.csv', '^^^^^^^^^ file-kind');
    checkCarets(impedance, 'antenna.s1p port 0', '                 ^ port');
    checkCarets(impedance, 'antenna.s1p port two', '                 ^^^ number-expected');
    checkCarets(impedance, '/lab/a.s1p', '^^^^^^^^^^ absolute-path');
    checkCarets(impedance, 'http://example.org/a.s1p', `${'^'.repeat(24)} absolute-path`);
    checkCarets(impedance, '12 Ω + + 2 pF', '       ^ number-expected');
    checkCarets(impedance, '12 Ω || ', `${' '.repeat(8)} impedance-expected`);
    checkCarets(impedance, '', ' impedance-expected');
  });

  for (const [text, code, fixed] of [
    ['18-37j', 'j-behind', '18 - j37 Ω'], ['18 + 37i Ω', 'j-behind', '18 + j37 Ω'], ['18 - 37j Ω at 868 MHz', 'j-behind', '18 - j37 Ω at 868 MHz'], ['37j Ω', 'j-behind', 'j37 Ω'], ['18 - 37j kΩ', 'j-behind', '18 - j37 kΩ'], ['18 - j37', 'unit-missing', '18 - j37 Ω'], ['50', 'unit-missing', '50 Ω'],
    ['18,5 - j37 Ω', 'decimal-comma', '18.5 - j37 Ω'], ['18 - j37,5 Ω', 'decimal-comma', '18 - j37.5 Ω'], ['12 Ω+3.3 pF', 'plus-without-blanks', '12 Ω + 3.3 pF'], ['lab\\a.s1p', 'backslash-in-path', 'lab/a.s1p'], ['gamma 0.62 at -38', 'unit-missing', 'gamma 0.62 at -38 °'], ['18 - j37 Ω at 868', 'unit-missing', '18 - j37 Ω at 868 MHz'],
  ] as const) it(`«${text}» is mended`, () => assert.deepEqual(mended(impedance, text), { code, text: fixed }));
});

/** Sines and cosines may differ in their last bit. */
function rounded(value: unknown): unknown {
  if (typeof value === 'number') return Number(value.toPrecision(14)) + 0;
  if (Array.isArray(value)) return value.map(rounded);
  return typeof value === 'object' && value !== null ? Object.fromEntries(Object.entries(value).map(([key, entry]) => [key, key === 're' || key === 'im' ? Number((entry as number).toFixed(12)) + 0 : rounded(entry)])) : value;
}
