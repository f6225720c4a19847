import { add, complex, divide, polar, type Complex } from '../../../src/network/complex';

// Legal and illegal Touchstone files. The rules are those of the «Touchstone File Format Specification» 1.1, 2.0 and 2.1 of the
// IBIS Open Forum, as far as public copies and the Forum's issue documents (TSIRD 4.1, 5.1) show them; all numbers are invented.

export interface LegalSnippet {
  readonly id: string;
  readonly what: string;
  readonly name: string;
  readonly text: string;
  readonly hz: readonly number[];
  /** Row by row, point by point. */
  readonly s: readonly Complex[];
  readonly referenceOhm?: readonly number[];
  readonly warning?: RegExp;
  readonly noisePoints?: number;
}

export interface IllegalSnippet {
  readonly id: string;
  readonly what: string;
  readonly name: string;
  readonly text: string;
  readonly line: number;
  readonly message: RegExp;
}

export const legalSnippets: readonly LegalSnippet[] = [
  {
    id: 'T-L1', what: 'all defaults: GHz, S, MA, 50 Ω', name: 'x.s1p',
    text: '#\n1.0 0.5 -30\n',
    hz: [1e9], s: [polar(0.5, -30)],
  },
  {
    id: 'T-L3', what: 'comments on own line and after data, blank lines, indentation', name: 'x.s1p',
    text: '! demo\n\n# MHz S DB R 50   ! option line\n 100  -6.0206  180  ! last point\n',
    hz: [100e6], s: [polar(10 ** (-6.0206 / 20), 180)],
  },
  {
    id: 'T-L5', what: 'CR LF ends, signs, exponent, bare decimal points', name: 'x.s1p',
    text: '# HZ S RI\r\n+1.E+09 .5 -.25\r\n',
    hz: [1e9], s: [complex(0.5, -0.25)],
  },
  {
    id: 'T-L6', what: 'CR alone as line end', name: 'x.s1p',
    text: '# GHz S MA R 50\r1 0.2 10\r2 0.3 20\r',
    hz: [1e9, 2e9], s: [polar(0.2, 10), polar(0.3, 20)],
  },
  {
    id: 'T-L7', what: 'two-port column order is 11, 21, 12, 22: S21 = 0.9∠−90°, S12 = 0.01∠45°', name: 'x.s2p',
    text: '# GHz S MA R 50\n1.0 0.1 0 0.9 -90 0.01 45 0.2 180\n',
    hz: [1e9], s: [polar(0.1, 0), polar(0.01, 45), polar(0.9, -90), polar(0.2, 180)],
  },
  {
    id: 'T-L9', what: 'a first point at zero frequency', name: 'x.s1p',
    text: '# GHz S RI R 50\n0 -1 0\n0.5 -0.9 0.3\n',
    hz: [0, 0.5e9], s: [complex(-1), complex(-0.9, 0.3)],
  },
  {
    id: 'T-L10', what: 'version 1 Z data are normalised: |Z| = 0.8 × 75 = 60 Ω', name: 'x.s1p',
    text: '# MHz Z MA R 75\n100 0.8 10\n',
    hz: [100e6], s: [divide(add(polar(60, 10), complex(-75)), add(polar(60, 10), complex(75)))], referenceOhm: [75],
  },
  {
    id: 'T-L12', what: 'two resistances after R: per-port references, allowed since the 2023/2024 revision', name: 'x.s2p',
    text: '# GHz S RI R 50 75\n1 0.1 0 0.8 0 0.8 0 0.1 0\n',
    hz: [1e9], s: [complex(0.1), complex(0.8), complex(0.8), complex(0.1)], referenceOhm: [50, 75],
  },
  {
    id: 'T-L13', what: 'kHz, and a resistance in exponent form', name: 'x.s1p',
    text: '# kHz s ma r 5.0E+1\n13560 0.3 -170\n',
    hz: [13.56e6], s: [polar(0.3, -170)],
  },
  {
    id: 'T-L14', what: '|Γ| slightly above 1: legal data', name: 'x.s1p',
    text: '# MHz S MA R 50\n100 1.0003 5\n',
    hz: [100e6], s: [polar(1.0003, 5)], warning: /above 1/,
  },
  {
    id: 'T-L16', what: 'tabs as separators', name: 'x.s1p',
    text: '#\tGHz\tS\tRI\tR\t50\n1\t0.1\t0.2\n',
    hz: [1e9], s: [complex(0.1, 0.2)],
  },
  {
    id: 'T-L17', what: 'smallest version 2 one-port', name: 'x.ts',
    text: '[Version] 2.0\n# MHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Network Data]\n100 0.1 0.2\n[End]\n',
    hz: [100e6], s: [complex(0.1, 0.2)],
  },
  {
    id: 'T-L18', what: 'version 2 with 12_21: the second pair is S12', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n[Network Data]\n1.0 0.1 0 0.01 45 0.9 -90 0.2 180\n[End]\n',
    hz: [1e9], s: [polar(0.1, 0), polar(0.01, 45), polar(0.9, -90), polar(0.2, 180)],
  },
  {
    id: 'T-L19', what: '[Reference] over two lines replaces the option-line R: 50 Ω and 75 Ω', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Reference] 50\n75\n[Network Data]\n1.0 0.1 0 0.9 -90 0.01 45 0.2 180\n[End]\n',
    hz: [1e9], s: [polar(0.1, 0), polar(0.01, 45), polar(0.9, -90), polar(0.2, 180)], referenceOhm: [50, 75],
  },
  {
    id: 'T-L21', what: 'lower triangle, data over two lines: S12 = S21 = 0.7 + j0.1', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Matrix Format] Lower\n[Network Data]\n1.0 0.1 0\n0.7 0.1 0.2 0\n[End]\n',
    hz: [1e9], s: [complex(0.1), complex(0.7, 0.1), complex(0.7, 0.1), complex(0.2)],
  },
  {
    id: 'T-L23', what: 'one point over several lines: a line with an odd count of numbers starts a point, lines with an even count continue it', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 2\n[Network Data]\n1.0 0.1 0 0.7 0.1\n0.7 0.1\n0.2 0\n2.0\n0.1 0 0.7 0.1 0.7 0.1 0.2 0\n[End]\n',
    hz: [1e9, 2e9], s: [0, 1].flatMap(() => [complex(0.1), complex(0.7, 0.1), complex(0.7, 0.1), complex(0.2)]),
  },
  {
    id: 'T-L24', what: 'everything between the information keywords is skipped', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Begin Information]\n[Manufacturer] invented\n# not an option line\n1 2 3\n[End Information]\n[Network Data]\n1.0 0.1 0\n[End]\n',
    hz: [1e9], s: [complex(0.1)],
  },
  {
    id: 'T-L25', what: 'keywords in any case, comment after a keyword, noise data announced by its own keyword', name: 'x.ts',
    text: '[Version] 2.0\n# ghz s ri r 50\n[number of ports] 2 ! two\n[TWO-PORT DATA ORDER] 21_12\n[Number of Frequencies] 1\n[Number of Noise Frequencies] 1\n[Network Data]\n2.0 0.1 0 0.7 0.1 0.7 0.1 0.2 0\n[Noise Data]\n1.5 1.1 0.4 60 0.3\n[End]\n',
    hz: [2e9], s: [complex(0.1), complex(0.7, 0.1), complex(0.7, 0.1), complex(0.2)], noisePoints: 1,
  },
];

export const illegalSnippets: readonly IllegalSnippet[] = [
  {
    id: 'T-X1', what: 'no option line at all', name: 'x.s1p',
    text: '1.0 0.5 -30\n',
    line: 1, message: /option line .* missing/,
  },
  {
    id: 'T-X3', what: 'unknown frequency unit', name: 'x.s1p',
    text: '# THz S RI R 50\n1 0.1 0.2\n',
    line: 1, message: /«THz» is not a frequency unit/,
  },
  {
    id: 'T-X4', what: 'unknown parameter letter', name: 'x.s1p',
    text: '# GHz T MA R 50\n1 0.1 0.2\n',
    line: 1, message: /«T» is not a parameter/,
  },
  {
    id: 'T-X6', what: 'reference resistance must be positive', name: 'x.s1p',
    text: '# GHz S MA R 0\n1 0.1 0.2\n',
    line: 1, message: /«0» is not a resistance greater than zero/,
  },
  {
    id: 'T-X7', what: 'reference must be a real number', name: 'x.s1p',
    text: '# GHz S MA R 50+j10\n1 0.1 0.2\n',
    line: 1, message: /«50\+j10» is not real/,
  },
  {
    id: 'T-X8', what: 'H or G parameters in a one-port file', name: 'x.s1p',
    text: '# GHz H RI R 50\n1 0.1 0.2\n',
    line: 1, message: /H parameters are those of two-ports/,
  },
  {
    id: 'T-X10', what: 'eight numbers for a two-port', name: 'x.s2p',
    text: '# GHz S RI R 50\n1 0.1 0 0.9 0 0.9 0 0.1\n',
    line: 2, message: /8 numbers .* 2 ports make 9/,
  },
  {
    id: 'T-X11', what: 'nine numbers in a file named .s1p: two-port data under the wrong name. Say so, do not take the first pair', name: 'x.s1p',
    text: '# GHz S MA R 50\n1.0 0.1 0 0.9 -90 0.01 45 0.2 180\n',
    line: 2, message: /9 numbers .* one port make 3 .* look like the data of 2 ports/,
  },
  {
    id: 'T-X12', what: 'frequencies must increase', name: 'x.s1p',
    text: '# GHz S RI R 50\n2 0.1 0\n1 0.1 0\n',
    line: 3, message: /frequencies must increase/,
  },
  {
    id: 'T-X14', what: 'not a number', name: 'x.s1p',
    text: '# GHz S RI R 50\n1 0.1 abc\n',
    line: 2, message: /«abc» is not a number/,
  },
  {
    id: 'T-X15', what: 'decimal comma: refuse with a message that names it', name: 'x.s1p',
    text: '# GHz S MA R 50\n1,0 0,5 -30\n',
    line: 2, message: /«1,0» has a decimal comma/,
  },
  {
    id: 'T-X16', what: 'NaN or infinity', name: 'x.s1p',
    text: '# GHz S RI R 50\n1 nan 0\n',
    line: 2, message: /«nan» is not a number/,
  },
  {
    id: 'T-X18', what: 'negative frequency', name: 'x.s1p',
    text: '# GHz S RI R 50\n-1 0.1 0\n',
    line: 2, message: /frequency is negative/,
  },
  {
    id: 'T-X19', what: 'the same option given twice with different values', name: 'x.s1p',
    text: '# MHz GHz S RI R 50\n1 0.1 0\n',
    line: 1, message: /frequency unit twice: MHZ and GHZ/,
  },
  {
    id: 'T-X20', what: 'no data', name: 'x.s1p',
    text: '# GHz S RI R 50\n! nothing else\n',
    line: 2, message: /no data/,
  },
  {
    id: 'T-X22', what: 'two ports without [Two-Port Data Order]: do not guess', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 2\n[Number of Frequencies] 1\n[Network Data]\n1 0.1 0 0.7 0 0.7 0 0.1 0\n[End]\n',
    line: 5, message: /\[Two-Port Data Order\] is missing/,
  },
  {
    id: 'T-X23', what: 'announced and found number of frequencies differ', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 3\n[Network Data]\n1 0.1 0\n2 0.1 0\n[End]\n',
    line: 4, message: /says 3, and 2 were found/,
  },
  {
    id: 'T-X24', what: '[Reference] must hold one value per port', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Reference] 50\n[Network Data]\n1 0.1 0 0.7 0 0.7 0 0.1 0\n[End]\n',
    line: 6, message: /\[Reference\] states one resistance, and the file has 2 ports/,
  },
  {
    id: 'T-X25', what: '[Version] must come before the option line', name: 'x.ts',
    text: '# GHz S RI R 50\n[Version] 2.0\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Network Data]\n1 0.1 0\n[End]\n',
    line: 2, message: /\[Version\] must come before/,
  },
  {
    id: 'T-X27', what: 'unknown [Matrix Format] argument', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Matrix Format] Diagonal\n[Network Data]\n1 0.1 0\n[End]\n',
    line: 5, message: /Full, Lower or Upper, not «Diagonal»/,
  },
  {
    id: 'T-X28', what: 'a complex pair torn apart by the line end', name: 'x.ts',
    text: '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n[Network Data]\n1.0 0.1 0 0.7\n0.1 0.7 0.1 0.2 0\n[End]\n',
    line: 7, message: /a pair is torn/,
  },
  {
    id: 'T-X29', what: 'three resistances for two ports', name: 'x.s2p',
    text: '# GHz S MA R 50 75 75\n1 0.1 0 0.9 0 0.9 0 0.1 0\n',
    line: 1, message: /3 resistances, and the file has 2 ports/,
  },
  {
    id: 'T-X30', what: 'a character above hexadecimal 7E', name: 'x.s1p',
    text: '# GHz S RI R 50\n1\u00a00.1 0\n',
    line: 2, message: /no-break space/,
  },
];
