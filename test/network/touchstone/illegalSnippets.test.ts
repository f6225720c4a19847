import assert from 'node:assert/strict';
import { refused } from './files';

// Small files that are wrong by the text of the format; each is refused with its line and a message that names the matter.
// Sources as beside the legal ones; all numbers are invented.
const twoPort = '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 1\n';
const onePort = '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 1\n';

const snippets: readonly (readonly [id: string, why: string, name: string, text: string, line: number, message: RegExp])[] = [
  ['T-X1', 'no option line', 'a.s1p', '1.0 0.5 -30\n', 1, /option line/],
  ['T-X3', 'unknown unit', 'a.s1p', '# THz S RI R 50\n1 0.1 0.2\n', 1, /«THz»/],
  ['T-X4', 'unknown parameter', 'a.s1p', '# GHz T MA R 50\n1 0.1 0.2\n', 1, /«T»/],
  ['T-X6', 'reference of zero', 'a.s1p', '# GHz S MA R 0\n1 0.1 0.2\n', 1, /«0».*greater than zero/],
  ['T-X7', 'complex reference', 'a.s1p', '# GHz S MA R 50+j10\n1 0.1 0.2\n', 1, /«50\+j10».*not real/],
  ['T-X8', 'H in a one-port', 'a.s1p', '# GHz H RI R 50\n1 0.1 0.2\n', 1, /H parameters.*two-port/],
  ['T-X10', 'eight numbers for a two-port', 'a.s2p', '# GHz S RI R 50\n1 0.1 0 0.9 0 0.9 0 0.1\n', 2, /8 numbers.*9/],
  ['T-X11', 'two-port data under the name of a one-port', 'a.s1p', '# GHz S MA R 50\n1.0 0.1 0 0.9 -90 0.01 45 0.2 180\n', 2, /9 numbers.*2 ports/],
  ['T-X12', 'frequencies that fall', 'a.s1p', '# GHz S RI R 50\n2 0.1 0\n1 0.1 0\n', 3, /increase/],
  ['T-X14', 'not a number', 'a.s1p', '# GHz S RI R 50\n1 0.1 abc\n', 2, /«abc»/],
  ['T-X15', 'decimal commas', 'a.s1p', '# GHz S MA R 50\n1,0 0,5 -30\n', 2, /«1,0».*comma/],
  ['T-X16', 'NaN', 'a.s1p', '# GHz S RI R 50\n1 nan 0\n', 2, /«nan»/],
  ['T-X18', 'negative frequency', 'a.s1p', '# GHz S RI R 50\n-1 0.1 0\n', 2, /negative/],
  ['T-X19', 'one option twice, differently', 'a.s1p', '# MHz GHz S RI R 50\n1 0.1 0\n', 1, /twice.*MHZ.*GHZ/],
  ['T-X20', 'no data', 'a.s1p', '# GHz S RI R 50\n! nothing else\n', 2, /no data/],
  ['T-X22', 'order of S12 and S21 not stated', 'a.ts', '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 2\n[Number of Frequencies] 1\n[Network Data]\n1 0.1 0 0.7 0 0.7 0 0.1 0\n[End]\n', 5, /Two-Port Data Order/],
  ['T-X23', 'fewer points than announced', 'a.ts', '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 1\n[Number of Frequencies] 3\n[Network Data]\n1 0.1 0\n2 0.1 0\n[End]\n', 4, /3.*2 were found/],
  ['T-X24', 'one reference for two ports', 'a.ts', `${twoPort}[Reference] 50\n[Network Data]\n1 0.1 0 0.7 0 0.7 0 0.1 0\n[End]\n`, 6, /one resistance/],
  ['T-X25', '[Version] behind the option line', 'a.ts', '# GHz S RI R 50\n[Version] 2.0\n[Number of Ports] 1\n[Number of Frequencies] 1\n[Network Data]\n1 0.1 0\n[End]\n', 2, /\[Version\].*before/],
  ['T-X27', 'unknown matrix format', 'a.ts', `${onePort}[Matrix Format] Diagonal\n[Network Data]\n1 0.1 0\n[End]\n`, 5, /«Diagonal»/],
  ['T-X28', 'a pair torn apart by the line end', 'a.ts', `${twoPort}[Network Data]\n1.0 0.1 0 0.7\n0.1 0.7 0.1 0.2 0\n[End]\n`, 7, /odd count/],
  ['T-X29', 'three references for two ports', 'a.s2p', '# GHz S MA R 50 75 75\n1 0.1 0 0.9 0 0.9 0 0.1 0\n', 1, /3 resistances/],
  ['T-X30', 'a no-break space among the data', 'a.s1p', '# GHz S RI R 50\n1\u00a00.1 0\n', 2, /no-break space/],
  // Cases of our own under the same rules.
  ['infinity', 'a number beyond doubles', 'a.s1p', '# GHz S RI R 50\n1 1e999 0\n', 2, /«1e999»/],
  ['large DB', 'a ratio beyond doubles', 'a.s1p', '# GHz S DB R 50\n1 99999 0\n', 2, /too large/],
  ['equal frequencies', 'they must increase', 'a.s1p', '# GHz S RI R 50\n1 0.1 0\n1 0.1 0\n', 3, /increase/],
  ['end missing', '[End] is required in version 2 (IBIS TSIRD 4.1)', 'a.ts', `${onePort}[Network Data]\n1 0.1 0\n`, 6, /\[End\] is missing/],
  ['mixed modes', 'read by nobody here', 'a.ts', `${twoPort}[Mixed-Mode Order] D1,2 C1,2\n[Network Data]\n1 0.1 0 0.7 0 0.7 0 0.1 0\n[End]\n`, 6, /mixed mode/],
  ['keyword in version 1', 'keywords need [Version]', 'a.s1p', '# GHz S RI R 50\n[Network Data]\n1 0.1 0\n', 2, /version 2/],
  ['unknown keyword', 'a slip in a keyword is not passed over', 'a.ts', `${onePort}[Netwerk Data]\n1 0.1 0\n[End]\n`, 5, /\[Netwerk Data\]/],
  ['unknown version', '2.0 and 2.1 are known', 'a.ts', '[Version] 3.0\n# GHz S RI R 50\n', 1, /«3\.0»/],
  ['five ports', 'one to four are read', 'a.s5p', `# GHz S RI R 50\n1${' 0 0'.repeat(5)}\n`, 2, /1 to 4 ports/],
  ['no ports', 'one to four are read', 'a.s0p', '# GHz S RI R 50\n1\n', 2, /1 to 4 ports/],
  ['name and keyword disagree', 'not to be guessed', 'a.s2p', `${onePort}[Network Data]\n1 0.1 0\n[End]\n`, 3, /2 ports.*1/],
  ['another extension', 'nothing says how many ports', 'a.txt', '# GHz S RI R 50\n1 0.1 0\n', 2, /\.s1p/],
  ['point cut off', 'a file that ends within a point', 'a.s3p', '# GHz S RI R 50\n1 .1 0 .1 0 .1 0\n.1 0 .1 0 .1 0\n', 3, /19 numbers.*13/],
  ['zero byte', 'not plain text', 'a.s1p', '# GHz S RI R 50\n1 0.1\0 0\n', 2, /plain text/],
  ['a number without its exponent', 'half a number', 'a.s1p', '# GHz S RI R 50\n1 0.1e 0\n', 2, /«0\.1e»/],
  ['two points in a number', 'no number', 'a.s1p', '# GHz S RI R 50\n1 0.1.2 0\n', 2, /«0\.1\.2»/],
  ['hexadecimal', 'no number of the format', 'a.s1p', '# GHz S RI R 50\n1 0x10 0\n', 2, /«0x10»/],
  ['R without a number', 'the number follows R', 'a.s1p', '# GHz S RI R\n1 0.1 0\n', 1, /after R/],
  ['Z of −R', 'no scattering parameters: Γ = (z − 1)/(z + 1)', 'a.s1p', '# GHz Z RI R 50\n1 -1 0\n', 2, /scattering/],
  ['empty file', 'no option line', 'a.s1p', '', 1, /option line/],
  ['information without end', 'all the rest would be skipped', 'a.ts', `${onePort}[Begin Information]\n[Network Data]\n1 0.1 0\n[End]\n`, 5, /End Information/],
];

describe('illegal Touchstone snippets', () => {
  for (const [id, why, name, text, line, message] of snippets) {
    it(`${id}: ${why}`, () => {
      const problem = refused(name, text);
      assert.match(problem.message, message);
      assert.equal(problem.line, line, problem.message);
    });
  }
});
