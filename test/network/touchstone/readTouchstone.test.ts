import assert from 'node:assert/strict';
import { add, complex, divide, multiply, scale, subtract, type Complex } from '../../../src/network/complex';
import type { NetworkData } from '../../../src/network/networkData';
import { readTouchstone, type TouchstoneResult } from '../../../src/network/touchstone/readTouchstone';
import { nearComplex } from '../expect';

function dataOf(result: TouchstoneResult): NetworkData {
  assert.ok(result.ok, result.ok ? '' : `line ${result.problem.line}: ${result.problem.message}`);
  return result.data;
}
const read = (name: string, text: string | Uint8Array) => dataOf(readTouchstone(name, text));
const entries = ({ sRe, sIm }: NetworkData): Complex[] => Array.from(sRe, (re, i) => ({ re, im: sIm[i] }));

/** The values of a file are exact up to the sine and cosine of its angles. */
const rounding = 1e-15;

function holds(data: NetworkData, expected: readonly Complex[], tolerance = rounding): void {
  assert.equal(data.sRe.length, expected.length);
  entries(data).forEach((value, i) => nearComplex(value, expected[i], tolerance, `entry ${i}`));
}

function refused(name: string, content: string | Uint8Array, line: number, message: RegExp): void {
  const result = readTouchstone(name, content);
  assert.ok(!result.ok, 'was read');
  assert.match(result.problem.message, message);
  assert.equal(result.problem.line, line, result.problem.message);
}

/** A version 2 file; `head` replaces or adds keywords, `body` stands after [Network Data]. */
const version2 = (ports: number, head: string, body: string, count = 1) =>
  `[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] ${ports}\n${ports === 2 && !/Two-Port/.test(head) ? '[Two-Port Data Order] 21_12\n' : ''}[Number of Frequencies] ${count}\n${head}[Network Data]\n${body}`;

describe('Touchstone files that differ in layout', () => {
  it('takes the options in any order and case', () => {
    for (const line of ['# R 75 ri s mhz', '#MHZ S RI R 75', '# s R 75 MHz RI', '  # Ri MhZ r 75']) {
      const data = read('a.S1P', `${line}\n100 0.1 0.2\n`);
      assert.deepEqual([data.frequencyHz[0], data.referenceOhm[0], data.sRe[0], data.sIm[0]], [100e6, 75, 0.1, 0.2]);
    }
  });

  it('does not read a second option line, and says so', () => {
    const result = readTouchstone('a.s1p', '# MHz S RI R 50\n100 0.1 0.2\n# GHz S MA R 75\n200 0.3 0.4\n');
    assert.deepEqual([...dataOf(result).frequencyHz], [100e6, 200e6]);
    assert.deepEqual(result.ok && result.warnings.map(({ line }) => line), [3]);
  });

  it('wraps the lines of three and four ports, row by row', () => {
    const three = read('a.s3p', '# GHz S RI R 50\n1 0.11 0 0.12 0 0.13 0\n  0.21 0 0.22 0 0.23 0 ! second row\n\n  0.31 0 0.32 0 0.33 0\n2 0.11 0 0.12 0 0.13 0\n0.21 0 0.22 0 0.23 0\n0.31 0 0.32 0 0.33 0\n');
    const rows = [0.11, 0.12, 0.13, 0.21, 0.22, 0.23, 0.31, 0.32, 0.33];
    assert.deepEqual([...three.sRe], [...rows, ...rows]);
    const all = Array.from({ length: 16 }, (_, i) => `0.${11 + i} ${i / 100}`);
    const four = Array.from({ length: 4 }, (_, i) => all.slice(4 * i, 4 * i + 4).join(' ')).join('\n');
    for (const text of [`1 ${four}`, `1 ${all.join(' ')}`, `1\n${all.join('\n')}`]) {
      assert.deepEqual([...read('a.s4p', `# GHz S RI R 50\n${text}\n`).sRe], all.map((pair) => Number(pair.split(' ')[0])));
    }
  });

  it('reads lower and upper triangles of three ports', () => {
    const expected = [0.11, 0.21, 0.31, 0.21, 0.22, 0.32, 0.31, 0.32, 0.33];
    assert.deepEqual([...read('a.ts', version2(3, '[Matrix Format] Lower\n', '1 0.11 0\n0.21 0 0.22 0\n0.31 0 0.32 0 0.33 0\n[End]\n')).sRe], expected);
    assert.deepEqual([...read('a.ts', version2(3, '[Matrix Format] upper\n', '1 0.11 0 0.21 0 0.31 0\n0.22 0 0.32 0\n0.33 0\n[End]\n')).sRe], expected);
    // The order of S12 and S21 means nothing in a triangle.
    for (const order of ['12_21', '21_12']) assert.deepEqual([...read('a.ts', version2(2, `[Two-Port Data Order] ${order}\n[Matrix Format] Upper\n`, '1 0.1 0 0.7 0 0.2 0\n[End]\n')).sRe], [0.1, 0.7, 0.7, 0.2]);
  });

  it('skips and counts noise data of version 1, where the frequency stops increasing', () => {
    const result = readTouchstone('a.s2p', '# GHz S RI R 50\n1 0.1 0 0.9 0 0.1 0 0.2 0\n2 0.1 0 0.9 0 0.1 0 0.2 0\n! noise\n2 0.6 0.4 60 0.3\n4 0.7 0.5 61 0.2\n');
    assert.deepEqual([...dataOf(result).frequencyHz], [1e9, 2e9]);
    assert.equal(result.ok && result.noisePoints, 2);
  });

  it('reads version 2.1, a .s2p of version 2, and references on the lines below the keyword', () => {
    const data = read('a.s2p', '[Version] 2.1\n# GHz S RI R 50\n[Number of Ports] 2\n[Reference]\n 25 ! port 1\n 5.0E+1\n[Two-Port Order] 12_21\n[Number of Frequencies] 1\n[Network Data]\n1 0.1 0 0.7 0 0.8 0 0.2 0\n[End]\n');
    assert.deepEqual([...data.referenceOhm, ...data.sRe], [25, 50, 0.1, 0.7, 0.8, 0.2]);
  });

  it('takes comments with anything in them, with one warning', () => {
    const result = readTouchstone('a.s1p', '! 25 °C, 50 Ω\n# GHz S RI R 50 ! größer\n1 0.1 0.2 ! «end»\n');
    dataOf(result);
    assert.deepEqual(result.ok && result.warnings, [{ message: 'the comment has characters outside ASCII', line: 1 }]);
    const latin = readTouchstone('a.s1p', Uint8Array.from([...Buffer.from('# GHz S RI R 50\n1 0.1 0.2 ! 25 '), 0xb0, ...Buffer.from('C\n')]));
    assert.deepEqual(latin.ok && latin.warnings, [{ message: 'the comment is not UTF-8 text', line: 2 }]);
  });

  it('takes a byte order mark, a last line without an end, and nothing but blanks between', () => {
    assert.equal(read('a.s1p', '\ufeff# GHz S RI R 50\n\t \n1 0.1 0.2').sRe[0], 0.1);
  });

  it('leaves what follows [End], with a warning', () => {
    const result = readTouchstone('a.ts', version2(1, '', '1 0.1 0\n[End]\n! bye\nÜber 7\n'));
    dataOf(result);
    assert.deepEqual(result.ok && result.warnings.map(({ message, line }) => `${line} ${message}`), ['9 what follows [End] has characters outside ASCII', '9 what follows [End] is not read']);
  });

  it('gives frequencies as they are written: no rounding by the unit', () => {
    // 0.8683 · 1e9 and 1.1 · 1e9 in floating point are neighbours of the whole number.
    const written = ['0.8683', '1.1', '2.4835', '5.805', '9.1234567'];
    const data = read('a.s1p', `# GHz S RI R 50\n${written.map((f) => `${f} 0 0`).join('\n')}\n`);
    assert.deepEqual([...data.frequencyHz], [868_300_000, 1_100_000_000, 2_483_500_000, 5_805_000_000, 9_123_456_700]);
  });
});

describe('Touchstone data of other parameters than S', () => {
  // A series impedance of 30 + j40 Ω between ports of 50 Ω: S11 = z/(z + 2·50), S21 = 1 − S11 (Pozar, Table 4.1 and 4.2).
  const z = complex(30, 40);
  const s11 = divide(z, add(z, complex(100)));
  const s21 = subtract(complex(1), s11);
  const expected = [s11, s21, s21, s11];
  const y = divide(complex(1), z);
  const text = (pairs: readonly Complex[]) => pairs.map(({ re, im }) => `${re} ${im}`).join(' ');
  const minus = (value: Complex) => scale(value, -1);
  // In the order 11, 21, 12, 22. h: h11 = z, h12 = 1, h21 = −1, h22 = 0; g: g11 = 0, g12 = −1, g21 = 1, g22 = z.
  const tables: [string, Complex[], (normalise: 1 | 50) => number[]][] = [
    ['Y', [y, minus(y), minus(y), y], (r) => [r, r, r, r]],
    ['H', [z, complex(-1), complex(1), complex(0)], (r) => [1 / r, 1, 1, r]],
    ['G', [complex(0), complex(1), complex(-1), z], (r) => [r, 1, 1, 1 / r]],
  ];
  for (const [letter, pairs, weights] of tables) {
    it(`${letter}, normalised in version 1 and in siemens and ohms in version 2`, () => {
      const one = pairs.map((value, i) => scale(value, weights(50)[i]));
      holds(read('a.s2p', `# GHz ${letter} RI R 50\n1 ${text(one)}\n`), expected, 1e-14);
      holds(read('a.ts', version2(2, '', `1 ${text(pairs)}\n[End]\n`).replace(' S ', ` ${letter} `)), expected, 1e-14);
    });
  }

  it('Z of a shunt 30 + j40 Ω: S11 = −50/(2z + 50)', () => {
    const s = divide(complex(-50), add(scale(z, 2), complex(50)));
    const shunt = [s, add(s, complex(1)), add(s, complex(1)), s];
    holds(read('a.s2p', `# GHz Z RI R 50\n1 ${text([z, z, z, z].map((value) => scale(value, 1 / 50)))}\n`), shunt, 1e-14);
    holds(read('a.ts', version2(2, '', `1 ${text([z, z, z, z])}\n[End]\n`).replace(' S ', ' Z ')), shunt, 1e-14);
  });

  it('is relative to each port\'s own reference', () => {
    // A series 30 + j40 Ω between 25 Ω and 100 Ω: S11 = (z + 100 − 25)/(z + 125), S22 = (z + 25 − 100)/(z + 125), S21 = 2·√(25·100)/(z + 125).
    const sum = add(z, complex(125));
    const own = [divide(add(z, complex(75)), sum), divide(complex(100), sum), divide(complex(100), sum), divide(subtract(z, complex(75)), sum)];
    for (const [letter, pairs] of tables) holds(read('a.ts', version2(2, '[Reference] 25 100\n', `1 ${text(pairs)}\n[End]\n`).replace(' S ', ` ${letter} `)), own, 1e-14);
  });

  it('Z of three ports: a star of three resistors', () => {
    // 10, 20, 30 Ω from each port to one node, and 40 Ω from there to ground; S from (Z − 50)(Z + 50)⁻¹ checked by multiplying back.
    const matrix = [[50, 40, 40], [40, 60, 40], [40, 40, 70]];
    const data = read('a.ts', version2(3, '', `1 ${matrix.map((row) => row.map((ohm) => `${ohm} 0`).join(' ')).join('\n')}\n[End]\n`).replace(' S ', ' Z '));
    for (let i = 0; i < 3; i++) {
      for (let j = 0; j < 3; j++) {
        let product = complex(0);
        for (let k = 0; k < 3; k++) product = add(product, multiply(entries(data)[3 * i + k], complex(matrix[k][j] + (k === j ? 50 : 0))));
        nearComplex(product, complex(matrix[i][j] - (i === j ? 50 : 0)), 1e-12);
      }
    }
  });

  it('refuses a point without scattering parameters, with its line', () => {
    refused('a.s1p', '# GHz Z RI R 50\n1 0.5 0\n2 -1 0\n', 3, /point of Z parameters has no finite scattering/);
    refused('a.s2p', '# GHz Y RI R 50\n1 -1 0 0 0 0 0 1 0\n', 2, /no finite scattering/);
    refused('a.s2p', '# GHz H RI R 50\n1 -1 0 0 0 0 0 1 0\n', 2, /no finite scattering/);
    refused('a.s1p', '# GHz Z RI R 50\n1 1e308 1e308\n', 2, /no finite scattering/);
  });
});

describe('Touchstone files with a mistake', () => {
  const one = '# GHz S RI R 50\n';
  const rows: [string, string, string, number, RegExp][] = [
    ['a format that is none', 'a.s1p', '# GHz S XY R 50\n1 0 0\n', 1, /«XY» is not a number format/],
    ['a resistance without R', 'a.s1p', '# GHz S RI 50\n1 0 0\n', 1, /«50» .* follows R/],
    ['R without a resistance', 'a.s1p', '# GHz S RI R\n1 0 0\n', 1, /after R .* resistance/],
    ['a negative reference', 'a.s1p', '# GHz S RI R -50\n1 0 0\n', 1, /greater than zero/],
    ['a reference with a decimal comma', 'a.s1p', '# GHz S RI R 50,0\n1 0 0\n', 1, /decimal comma/],
    ['an infinite reference', 'a.s1p', '# GHz S RI R 1e999\n1 0 0\n', 1, /greater than zero/],
    ['two parameters', 'a.s1p', '# GHz S Z RI R 50\n1 0 0\n', 1, /parameter twice/],
    ['two formats', 'a.s1p', '# GHz S MA RI R 50\n1 0 0\n', 1, /format twice/],
    ['the option line after the data', 'a.s1p', '1 0 0\n# GHz S RI R 50\n', 1, /option line .* missing/],
    ['equal frequencies', 'a.s1p', `${one}1 0 0\n1.0 0 0\n`, 3, /must increase/],
    ['a frequency that is too large', 'a.s1p', `${one}1e305 0 0\n`, 2, /too large/],
    ['a number that is too large', 'a.s1p', `${one}1 1e400 0\n`, 2, /«1e400» is too large/],
    ['1e9 dB', 'a.s1p', '# GHz S DB R 50\n1 -3 0\n2 1e9 0\n', 3, /1000000000 dB is too large/],
    ['a magnitude below zero', 'a.s1p', '# GHz S MA R 50\n1 -0.5 0\n', 2, /magnitude is negative/],
    ['infinity in words', 'a.s1p', `${one}1 inf 0\n`, 2, /«inf» is not a number/],
    ['a hexadecimal number', 'a.s1p', `${one}1 0x1 0\n`, 2, /«0x1» is not a number/],
    ['an exponent without digits', 'a.s1p', `${one}1 1e 0\n`, 2, /«1e» is not a number/],
    ['two points in a number', 'a.s1p', `${one}1 0.1.2 0\n`, 2, /«0.1.2» is not a number/],
    ['a lone sign', 'a.s1p', `${one}1 - 0\n`, 2, /«-» is not a number/],
    ['numbers set apart by commas', 'a.s1p', `${one}1.0,0.5,0\n`, 2, /set apart by blanks/],
    ['one number too few', 'a.s1p', `${one}1 0\n`, 2, /2 numbers .* one port make 3/],
    ['a frequency alone', 'a.s1p', `${one}1\n`, 2, /one number for .* one port make 3/],
    ['a one-port under the name of a two-port', 'a.s2p', `${one}1 0 0\n`, 2, /3 numbers .* one port under the name/],
    ['a three-port that ends early', 'a.s3p', `${one}1 0 0 0 0 0 0\n0 0 0 0 0 0\n`, 3, /not complete: 3 ports make 19 .* has 13/],
    ['a three-port with a row too few', 'a.s3p', `${one}1 0 0 0 0 0 0\n0 0 0 0 0 0\n2 0 0 0 0 0 0\n`, 4, /not complete/],
    ['a three-port with a pair too many', 'a.s3p', `${one}1 0 0 0 0 0 0\n0 0 0 0 0 0\n0 0 0 0 0 0 0 0\n`, 4, /21 numbers .* make 19/],
    ['more numbers than any point has', 'a.s4p', `${one}${'1 '.repeat(50)}\n`, 2, /more than 33 numbers/],
    ['five ports', 'a.s5p', `${one}1 0 0\n`, 2, /1 to 4 ports .* has 5/],
    ['no ports', 'a.s0p', `${one}1 0 0\n`, 2, /1 to 4 ports .* has 0/],
    ['no count of ports at all', 'a.ts', `${one}1 0 0\n`, 2, /comes from the file's name/],
    ['a keyword in version 1', 'a.s1p', `${one}[Reference] 50\n1 0 0\n`, 2, /belongs to version 2/],
    ['noise data that go back', 'a.s2p', `${one}1 0 0 1 0 1 0 0 0\n1 1 1 1 1\n1 1 1 1 1\n`, 4, /noise data must increase/],
    ['noise data of four columns', 'a.s2p', `${one}1 0 0 1 0 1 0 0 0\n1 1 1 1 1\n2 1 1 1\n`, 4, /5 numbers, not 4/],
    ['nothing at all', 'a.s1p', '', 1, /option line .* missing/],
    ['blanks only', 'a.s1p', '\n \n\t\n', 3, /option line .* missing/],
  ];
  for (const [what, name, text, line, message] of rows) it(what, () => refused(name, text, line, message));

  const second: [string, string, number, RegExp][] = [
    ['another version', '[Version] 3.0\n', 1, /version «3.0» is not known/],
    ['no [End]', version2(1, '', '1 0 0\n'), 6, /\[End\] is missing/],
    ['no [Number of Ports]', '[Version] 2.0\n# GHz S RI R 50\n[Number of Frequencies] 1\n[Network Data]\n1 0 0\n[End]\n', 4, /\[Number of Ports\] is missing/],
    ['no [Number of Frequencies]', '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Network Data]\n1 0 0\n[End]\n', 4, /\[Number of Frequencies\] is missing/],
    ['no [Network Data]', '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 1\n1 0 0\n[End]\n', 5, /after \[Network Data\]/],
    ['no option line', '[Version] 2.0\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Network Data]\n1 0 0\n[End]\n', 5, /option line .* missing/],
    ['a fraction of a port', version2(1, '', '1 0 0\n[End]\n').replace('Ports] 1', 'Ports] 1.5'), 3, /whole number/],
    ['five ports', version2(5, '', '1 0 0\n[End]\n'), 3, /has 5/],
    ['an order that is none', version2(2, '[Two-Port Data Order] 11_22\n', '1 0 0\n[End]\n'), 5, /12_21 or 21_12/],
    ['an order for one port', version2(1, '[Two-Port Data Order] 21_12\n', '1 0 0\n[End]\n'), 5, /belongs to files of two ports/],
    ['mixed modes', version2(2, '[Mixed-Mode Order] D1,2 C1,2\n', '1 0 0 1 0 1 0 0 0\n[End]\n'), 6, /mixed modes/],
    ['a keyword twice', version2(1, '[Number of Ports] 2\n', '1 0 0\n[End]\n'), 5, /stated twice, here and on line 3/],
    ['a keyword that would change the data half way', version2(2, '', '1 0 0 1 0 1 0 0 0\n[Matrix Format] Lower\n[End]\n'), 8, /must come before \[Network Data\]/],
    ['a misspelt keyword', version2(1, '[Matrix Fromat] Full\n', '1 0 0\n[End]\n'), 5, /not known; \[Matrix Format\] is near/],
    ['a keyword without its bracket', version2(1, '[Matrix Format Full\n', '1 0 0\n[End]\n'), 5, /ends in/],
    ['an information block without an end', '[Version] 2.0\n# GHz S RI R 50\n[Begin Information]\n1 2 3\n', 3, /\[End Information\] is missing/],
    ['a reference of zero', version2(1, '[Reference] 0\n', '1 0 0\n[End]\n'), 5, /greater than zero/],
    ['other noise data than announced', version2(2, '[Number of Noise Frequencies] 2\n', '1 0 0 1 0 1 0 0 0\n[Noise Data]\n1 1 1 1 1\n[End]\n'), 6, /says 2, and 1 were found/],
    ['noise data before the network\'s', version2(2, '[Noise Data]\n', '1 0 0 1 0 1 0 0 0\n[End]\n'), 6, /comes after \[Network Data\]/],
    ['ports that differ from the name\'s', version2(1, '', '1 0 0\n[End]\n'), 3, /name says 2 ports/],
  ];
  for (const [what, text, line, message] of second) it(`version 2: ${what}`, () => refused(/differ/.test(what) ? 'a.s2p' : 'a.ts', text, line, message));

  it('files that are no text', () => {
    const bytes = (...parts: (string | number)[]) => Uint8Array.from(parts.flatMap((part) => (typeof part === 'number' ? [part] : [...Buffer.from(part)])));
    refused('a.s1p', bytes(one, '1 0.1 ', 0xb5, ' 0\n'), 2, /neither ASCII nor UTF-8/);
    refused('a.s1p', bytes(one, '1 0.1 ', 0, ' 0\n'), 2, /not plain text/);
    refused('a.s1p', bytes('! ', 0, 0, 0, '\n'), 1, /not plain text/);
    refused('a.s1p', bytes(0x7f, 'ELF', 0, 1), 1, /control character \(code 127\)/);
    refused('a.s1p', bytes(0xff, 0xfe, '#', 0), 1, /UTF-16/);
    refused('a.s1p', bytes(0x89, 'PNG\r\n'), 1, /neither ASCII nor UTF-8/);
    refused('a.s1p', `${one}1 0.1 −0.2\n`, 2, /typesetter/);
    refused('a.s1p', `${one}1 0.1 50Ω\n`, 2, /Ω \(U\+03A9\)/);
    refused('a.s1p', 'x'.repeat(1e6), 1, /longer than/);
    refused('a.s1p', `${one}! ${'x'.repeat(1e5)}\n`, 2, /longer than/);
  });
});
