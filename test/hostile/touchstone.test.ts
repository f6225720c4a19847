import assert from 'node:assert/strict';
import { readTouchstone, touchstoneReader } from '../../src/network/touchstone/readTouchstone';
import { dice, type Dice } from './mutateText';

const long = process.env.OHMWARD_LONG === '1';
const runs = long ? 100_000 : 2_000;
/** One file here is read in well under a millisecond; this is far beyond what any pause of the machine explains. */
const millisecondsAtMost = 2_000;

const twoPort = '[Version] 2.0\n# GHz S RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 21_12\n[Number of Frequencies] 2\n';
/** Invented files of every kind. */
const seeds: readonly (readonly [string, string])[] = [
  ['a.s1p', '! demo\n# MHz S DB R 50 ! options\n100 -6.0206 180\n200 -7 170 ! last\n300 -8 150\n'],
  ['a.s1p', '# GHz Z MA R 75\r\n1 0.8 10\r\n2 1.2 -20\r\n'],
  ['a.s2p', '# GHz S MA R 50 75\n1 0.1 0 0.9 -90 0.01 45 0.2 180\n2 0.1 0 0.8 -95 0.01 40 0.2 170\n1 1.1 0.4 60 0.3\n2 1.2 0.4 70 0.3\n'],
  ['a.s2p', '# kHz H RI R 50\n1 1 0 0.5 0 -0.5 0 2 0\n2 1 .1 .5 0 -.5 0 2 0\n'],
  ['a.s3p', '# GHz Y RI R 50\n1 .11 0 .12 0 .13 0\n.21 0 .22 0 .23 0\n.31 0 .32 0 .33 0\n'],
  ['a.s4p', `# GHz S RI R 50\n1${' .1 -.2 .3 0'.repeat(2)}${'\n.1 -.2 .3 0 .1 0 .2 0'.repeat(3)}\n`],
  ['a.ts', `${twoPort}[Reference] 50\n75\n[Matrix Format] Lower\n[Network Data]\n1.0 0.1 0\n0.7 0.1 0.2 0\n2 0.1 0 0.7 0.1 0.2 0\n[End]\n`],
  ['a.ts', `${twoPort}[Number of Noise Frequencies] 1\n[Begin Information]\n[x] y\n[End Information]\n[Network Data]\n1 0.1 0 0.7 0.1 0.7 0.1 0.2 0\n2 0.1 0 0.7 0.1 0.7 0.1 0.2 0\n[Noise Data]\n1.5 1.1 0.4 60 0.3\n[End]\n`],
];

const pieces = [
  '#', '# ', '!', '[', ']', '[End]', '[Version] 2.0\n', '[Network Data]\n', '[Noise Data]\n', '[Reference]', '[Number of Ports] 999999999\n', '[Number of Frequencies] 999999999\n', '[Begin Information]\n', '[Mixed-Mode Order] D1,2\n', 'R', ' R ',
  ' nan ', ' inf ', ' 1e999 ', ' -1e999 ', ' 1e-999 ', ' 1e308 ', ' -1 ', ' 0 ', ' -0 ', ' 1,5 ', ' 1.2.3 ', ' e5 ', ' 5e ', '+', '-', '.', '\r', '\n', '\r\n', '\t', '\0', '\u00a0', '\u2212', '\ufeff', 'THz', 'DB', 'Z', 'H', '9'.repeat(500), ' 1'.repeat(80), '1 '.repeat(40_000),
  ' 0'.repeat(8), '\n1 -1 0\n', '__proto__', '[constructor]', '50+j10',
];

function mutate(text: string, roll: Dice): string {
  let result = text;
  for (let count = 1 + roll(5); count > 0; count--) {
    const at = roll(result.length + 1);
    const lines = result.split('\n');
    const line = roll(lines.length);
    switch (roll(7)) {
      case 0: result = result.slice(0, at) + result.slice(at + 1 + roll(5)); break;
      case 1: result = result.slice(0, at) + pieces[roll(pieces.length)] + result.slice(at); break;
      case 2: result = result.slice(0, at) + pieces[roll(pieces.length)] + result.slice(at + 1 + roll(6)); break;
      case 3: result = lines.filter((_, i) => i !== line).join('\n'); break;
      case 4: result = [...lines.slice(0, line), lines[roll(lines.length)], ...lines.slice(line)].join('\n'); break;
      case 5: result = result.slice(0, at); break;
      default: result = result.replace(/\d+/g, (digits) => (roll(10) === 0 ? ['0', '-1', '1e308', '1e-300', '1e200', `${digits}${digits}`][roll(6)] : digits));
    }
  }
  return result;
}

const names = ['a.s1p', 'a.s2p', 'a.s3p', 'a.s4p', 'a.ts', 'a.s0p', 'a.s99p', 'a.txt', ''];

/** What is wrong with the outcome, or null. */
function faultOf(name: string, bytes: Uint8Array): string | null {
  const result = readTouchstone(name, bytes);
  if (!result.ok) {
    const { message, line } = result.problem;
    const lineCount = new TextDecoder('latin1').decode(bytes).split(/\r\n|\r|\n/).length;
    if (message === '' || message.length > 400 || /undefined|NaN|\[object/.test(message.replace(/«[^»]*»/g, ''))) return `message: ${message}`;
    return Number.isInteger(line) && line >= 1 && line <= lineCount ? null : `line ${line} of ${lineCount}: ${message}`;
  }
  const { ports, frequencyHz, referenceOhm, sRe, sIm } = result.data;
  if (!(ports >= 1 && ports <= 4) || referenceOhm.length !== ports || frequencyHz.length === 0) return `${ports} ports, ${referenceOhm.length} references, ${frequencyHz.length} points`;
  if (sRe.length !== frequencyHz.length * ports ** 2 || sIm.length !== sRe.length) return `${sRe.length} and ${sIm.length} values`;
  if (!referenceOhm.every((ohm) => ohm > 0 && Number.isFinite(ohm))) return `references ${referenceOhm.join()}`;
  if (!frequencyHz.every((hz, k) => Number.isFinite(hz) && hz >= 0 && (k === 0 || hz > frequencyHz[k - 1]))) return `frequencies ${frequencyHz.slice(0, 5).join()}`;
  return sRe.every(Number.isFinite) && sIm.every(Number.isFinite) ? null : 'values that are not finite';
}

describe('Touchstone files with random changes', function () {
  this.timeout(long ? 3_600_000 : 240_000);

  const judge = (seed: number, name: string, bytes: Uint8Array) => {
    const start = performance.now();
    let fault: string | null;
    try {
      fault = faultOf(name, bytes);
    } catch (error) {
      return assert.fail(`seed ${seed}: ${error instanceof Error ? error.stack : String(error)}`);
    }
    assert.equal(fault, null, `seed ${seed}, ${name}: ${fault}\n${new TextDecoder('latin1').decode(bytes.slice(0, 2000))}`);
    assert.ok(performance.now() - start < millisecondsAtMost, `seed ${seed} took ${(performance.now() - start).toFixed(0)} ms`);
  };

  it(`are read or refused, ${runs} of them`, () => {
    for (let seed = 1; seed <= runs; seed++) {
      const roll = dice(seed);
      const [name, text] = seeds[roll(seeds.length)];
      const bytes = new TextEncoder().encode(mutate(text, roll));
      judge(seed, roll(8) === 0 ? names[roll(names.length)] : name, bytes);
      if (seed % 10 > 0) continue;
      const reader = touchstoneReader(name);
      for (let at = 0; at < bytes.length; ) {
        const end = at + 1 + roll(bytes.length);
        reader.push(bytes.slice(at, end));
        at = end;
      }
      assert.deepEqual(reader.finish(), readTouchstone(name, bytes), `seed ${seed}: pieces differ from the whole`);
    }
  });

  it(`may be any bytes, ${runs / 10} of them`, () => {
    for (let seed = 1; seed <= runs / 10; seed++) {
      const roll = dice(seed);
      judge(seed, names[roll(names.length)], Uint8Array.from({ length: roll(400) }, () => roll(256)));
    }
  });

  it('come from files that are right', () => {
    for (const [name, text] of seeds) assert.ok(readTouchstone(name, text).ok, name);
  });
});
