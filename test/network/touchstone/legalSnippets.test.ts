import assert from 'node:assert/strict';
import { assertPoint, legal, pointOf, polar } from './files';

// Small files that are right by the text of the format. The rule and where it is from stand beside each; all numbers are
// invented. «TF 1.1», «TF 2.0», «TF 2.1»: Touchstone File Format Specification of that version (IBIS Open Forum); clauses
// marked «from memory» were not looked up.
interface Snippet {
  readonly id: string;
  readonly rule: string;
  readonly name: string;
  readonly text: string;
  readonly hz: readonly number[];
  readonly ohm: readonly number[];
  /** S row by row, one list a frequency. */
  readonly s: readonly (readonly (readonly [number, number])[])[];
  readonly warnings?: readonly number[];
  readonly noisePoints?: number;
  /** Where the file itself rounds. */
  readonly tolerance?: number;
}

const twoPortHead = '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n';
const tee = [[0.1, 0], [0.7, 0.1], [0.7, 0.1], [0.2, 0]] as const;
const amplifier = [polar(0.1, 0), polar(0.01, 45), polar(0.9, -90), polar(0.2, 180)];

const snippets: readonly Snippet[] = [
  { id: 'T-L1', rule: 'defaults GHz S MA R 50 (TF 1.1)', name: 'a.s1p', text: '#\n1.0 0.5 -30\n', hz: [1e9], ohm: [50], s: [[polar(0.5, -30)]] },
  {
    id: 'T-L3', rule: 'comments anywhere, blank lines, indentation (TF 1.1); −6.0206 dB is one half to 5 digits', name: 'a.s1p',
    text: '! demo\n\n# MHz S DB R 50   ! option line\n 100  -6.0206  180  ! last point\n', hz: [1e8], ohm: [50], s: [[[-0.5, 0]]], tolerance: 1e-6,
  },
  { id: 'T-L5', rule: 'CR LF line ends, signs, exponents, bare points (TF 1.1)', name: 'a.s1p', text: '# HZ S RI\r\n+1.E+09 .5 -.25\r\n', hz: [1e9], ohm: [50], s: [[[0.5, -0.25]]] },
  { id: 'T-L6', rule: 'CR alone ends a line (TF 2.0)', name: 'a.s1p', text: '# GHz S MA R 50\r1 0.2 10\r2 0.3 20\r', hz: [1e9, 2e9], ohm: [50], s: [[polar(0.2, 10)], [polar(0.3, 20)]] },
  { id: 'T-L7', rule: 'two-ports stand as 11, 21, 12, 22 in version 1 (TF 1.1)', name: 'a.s2p', text: '# GHz S MA R 50\n1.0 0.1 0 0.9 -90 0.01 45 0.2 180\n', hz: [1e9], ohm: [50, 50], s: [amplifier] },
  { id: 'T-L9', rule: 'a first point at zero frequency (common practice)', name: 'a.s1p', text: '# GHz S RI R 50\n0 -1 0\n0.5 -0.9 0.3\n', hz: [0, 5e8], ohm: [50], s: [[[-1, 0]], [[-0.9, 0.3]]] },
  {
    // z = 0.8∠10°; Γ = (z − 1)/(z + 1) = (|z|² − 1 + j2 Im z)/|z + 1|².
    id: 'T-L10', rule: 'version 1 Z data are divided by R (from memory)', name: 'a.s1p', text: '# MHz Z MA R 75\n100 0.8 10\n', hz: [1e8], ohm: [75],
    s: [[[(0.64 - 1) / (1.64 + 1.6 * Math.cos(Math.PI / 18)), (1.6 * Math.sin(Math.PI / 18)) / (1.64 + 1.6 * Math.cos(Math.PI / 18))]]],
  },
  { id: 'T-L12', rule: 'one reference a port after R (IBIS TSIRD 5.1, 2023)', name: 'a.s2p', text: '# GHz S RI R 50 75\n1 0.1 0 0.8 0 0.8 0 0.1 0\n', hz: [1e9], ohm: [50, 75], s: [[[0.1, 0], [0.8, 0], [0.8, 0], [0.1, 0]]] },
  { id: 'T-L13', rule: 'any case; a resistance in exponent form (TF 2.0)', name: 'a.s1p', text: '# kHz s ma r 5.0E+1\n13560 0.3 -170\n', hz: [13.56e6], ohm: [50], s: [[polar(0.3, -170)]] },
  { id: 'T-L14', rule: '|Γ| a little above 1 is noise of the analyser (common practice): a warning', name: 'a.s1p', text: '# MHz S MA R 50\n100 1.0003 5\n', hz: [1e8], ohm: [50], s: [[polar(1.0003, 5)]], warnings: [2] },
  { id: 'T-L16', rule: 'tabs between the numbers (TF 2.0: discouraged)', name: 'a.s1p', text: '#\tGHz\tS\tRI\tR\t50\n1\t0.1\t0.2\n', hz: [1e9], ohm: [50], s: [[[0.1, 0.2]]] },
  { id: 'T-L17', rule: 'the smallest version 2 file (TF 2.0)', name: 'a.ts', text: '[Version] 2.0\n# MHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Network Data]\n100 0.1 0.2\n[End]\n', hz: [1e8], ohm: [50], s: [[[0.1, 0.2]]] },
  {
    id: 'T-L18', rule: 'order 12_21 (TF 2.0)', name: 'a.ts',
    text: '[Version] 2.0\n# GHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n[Network Data]\n1.0 0.1 0 0.01 45 0.9 -90 0.2 180\n[End]\n', hz: [1e9], ohm: [50, 50], s: [amplifier],
  },
  {
    id: 'T-L19', rule: '[Reference] over two lines, instead of R (TF 2.0)', name: 'a.ts',
    text: '[Version] 2.0\n# GHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Reference] 50\n75\n[Network Data]\n1.0 0.1 0 0.9 -90 0.01 45 0.2 180\n[End]\n', hz: [1e9], ohm: [50, 75], s: [amplifier],
  },
  { id: 'T-L21', rule: '[Matrix Format] Lower, data over two lines (TF 2.0)', name: 'a.ts', text: `${twoPortHead}[Number of Frequencies] 1\n[Matrix Format] Lower\n[Network Data]\n1.0 0.1 0\n0.7 0.1 0.2 0\n[End]\n`, hz: [1e9], ohm: [50, 50], s: [tee] },
  {
    id: 'T-L23', rule: 'an odd count starts a point, an even one goes on with it (IBIS mailing list, 2022-02-16)', name: 'a.ts',
    text: `${twoPortHead}[Number of Frequencies] 2\n[Network Data]\n1.0 0.1 0 0.7 0.1\n0.7 0.1\n0.2 0\n2.0\n0.1 0 0.7 0.1 0.7 0.1 0.2 0\n[End]\n`, hz: [1e9, 2e9], ohm: [50, 50], s: [tee, tee],
  },
  {
    id: 'T-L24', rule: '[Begin Information] to [End Information] is skipped (TF 2.0)', name: 'a.ts',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Begin Information]\n[Manufacturer] invented\n# not an option line\n1 2 3\n[End Information]\n[Network Data]\n1.0 0.1 0\n[End]\n', hz: [1e9], ohm: [50], s: [[[0.1, 0]]],
  },
  {
    id: 'T-L25', rule: 'keywords in any case, a comment after one, noise data skipped (TF 2.0)', name: 'a.ts',
    text: '[Version] 2.0\n# ghz s ri r 50\n[number of ports] 2 ! two\n[TWO-PORT DATA ORDER] 21_12\n[Number of Frequencies] 1\n[Number of Noise Frequencies] 1\n[Network Data]\n2.0 0.1 0 0.7 0.1 0.7 0.1 0.2 0\n[Noise Data]\n1.5 1.1 0.4 60 0.3\n[End]\n',
    hz: [2e9], ohm: [50, 50], s: [tee], noisePoints: 1,
  },
  // Cases of our own under the same rules.
  {
    id: 'noise in version 1', rule: 'noise begins where the frequency stops increasing; five columns (TF 1.1, from memory)', name: 'a.s2p',
    text: '# GHz S RI R 50\n1 0.1 0 0.7 0.1 0.7 0.1 0.2 0\n2 0.1 0 0.7 0.1 0.7 0.1 0.2 0\n! noise\n1 1.1 0.4 60 0.3\n2 1.2 0.4 70 0.3\n', hz: [1e9, 2e9], ohm: [50, 50], s: [tee, tee], noisePoints: 2,
  },
  { id: 'no line end', rule: 'the last line needs no end (common practice)', name: 'A.S1P', text: '# GHz S RI R 50\n1 0.1 0.2', hz: [1e9], ohm: [50], s: [[[0.1, 0.2]]] },
  { id: 'byte order mark', rule: 'written by some editors (common practice)', name: 'a.s1p', text: '\ufeff# GHz S RI R 50\n1 0.1 0.2\n', hz: [1e9], ohm: [50], s: [[[0.1, 0.2]]] },
  { id: 'second option line', rule: 'further option lines are ignored (TF 1.1): a warning', name: 'a.s1p', text: '# GHz S RI R 50\n# MHz S MA R 75\n1 0.1 0.2\n', hz: [1e9], ohm: [50], s: [[[0.1, 0.2]]], warnings: [2] },
  { id: 'options in another order', rule: 'any order, but the number follows R (TF 1.1)', name: 'a.s1p', text: '# R 75 RI S MHz\n1 0.1 0.2\n', hz: [1e6], ohm: [75], s: [[[0.1, 0.2]]] },
  { id: 'foreign letters in a comment', rule: 'ASCII up to 7E hexadecimal (TF 2.0): a warning in a comment', name: 'a.s1p', text: '! gemessen für Ω\n# GHz S RI R 50\n1 0.1 0.2 ! °\n', hz: [1e9], ohm: [50], s: [[[0.1, 0.2]]], warnings: [1] },
  {
    id: 'three ports', rule: 'from three ports on row by row, a row a line (TF 1.1)', name: 'a.s3p', text: '# GHz S RI R 50\n1 .11 0 .12 0 .13 0\n.21 0 .22 0 .23 0\n.31 0 .32 0 .33 0\n', hz: [1e9], ohm: [50, 50, 50],
    s: [[[0.11, 0], [0.12, 0], [0.13, 0], [0.21, 0], [0.22, 0], [0.23, 0], [0.31, 0], [0.32, 0], [0.33, 0]]],
  },
  {
    id: 'upper triangle of three', rule: '[Matrix Format] Upper (TF 2.0)', name: 'a.ts',
    text: '[Version] 2.1\n# GHz S RI R 50\n[Number of Ports] 3\n[Number of Frequencies] 1\n[Matrix Format] Upper\n[Network Data]\n1 .11 0 .12 0 .13 0\n.22 0 .23 0\n.33 0\n[End]\nanything after the end\n', hz: [1e9], ohm: [50, 50, 50], warnings: [11],
    s: [[[0.11, 0], [0.12, 0], [0.13, 0], [0.12, 0], [0.22, 0], [0.23, 0], [0.13, 0], [0.23, 0], [0.33, 0]]],
  },
  {
    id: 'lower triangle of three', rule: '[Matrix Format] Lower (TF 2.0)', name: 'a.s3p',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 3\n[Number of Frequencies] 1\n[Matrix Format] Lower\n[Network Data]\n1 .11 0\n.21 0 .22 0\n.31 0 .32 0 .33 0\n[End]\n', hz: [1e9], ohm: [50, 50, 50],
    s: [[[0.11, 0], [0.21, 0], [0.31, 0], [0.21, 0], [0.22, 0], [0.32, 0], [0.31, 0], [0.32, 0], [0.33, 0]]],
  },
];

describe('legal Touchstone snippets', () => {
  for (const { id, rule, name, text, hz, ohm, s, warnings = [], noisePoints = 0, tolerance } of snippets) {
    it(`${id}: ${rule}`, () => {
      const read = legal(name, text);
      assert.deepEqual([...read.data.frequencyHz], hz);
      assert.deepEqual([...read.data.referenceOhm], ohm);
      assert.equal(read.data.ports, ohm.length);
      s.forEach((point, k) => assertPoint(pointOf(read.data, k), point, tolerance));
      assert.deepEqual(read.warnings.map((warning) => warning.line), warnings);
      assert.equal(read.noisePoints, noisePoints);
    });
  }

  it('reads version 2 Z in ohms: 74.25∠−4° there is 0.99∠−4° with R 75 in version 1 (the well-known pair, from memory)', () => {
    const one = legal('a.s1p', '# MHz Z MA R 75\n100 0.99 -4\n');
    const two = legal('a.ts', '[Version] 2.0\n# MHz Z MA R 75\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Network Data]\n100 74.25 -4\n[End]\n');
    assertPoint(pointOf(two.data), pointOf(one.data));
  });
});
