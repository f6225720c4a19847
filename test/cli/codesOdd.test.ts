import assert from 'node:assert/strict';
import { lstatSync, mkdirSync, readFileSync, symlinkSync, writeFileSync } from 'node:fs';
import { inFolder, run } from './inFolder';

// Cases that went wrong once. All data is invented.
describe('codes in odd cases', () => {
  inFolder();

  async function runOn(text: string | Record<string, string>, ...words: string[]) {
    for (const [name, content] of Object.entries(typeof text === 'string' ? { 'a.match.yaml': text } : text)) writeFileSync(name, content);
    return run(...words);
  }
  const json = async (text: string, ...words: string[]) => JSON.parse((await runOn(text, ...words, '--format', 'json', 'a.match.yaml')).out).files[0];

  it('a channel outside of every band has the source of the nearest one', async () => {
    const text = (source: string) => `ohmward: 1
bands: {b: 868 MHz}
source: ${source}
load: 50 Ω
tunables: {t: {0: 0.01 nH, 1: 15.9 nH}}
channels: [868 MHz, 869 MHz]
ladder:
  - series L1: tunable t
  - shunt C1: 1.59 pF
goals:
  - return loss >= 6 dB in b
  - return loss >= 6 dB at 869 MHz
`;
    const byBand = await json(text('{b: 200 Ω}'), 'codes');
    assert.deepEqual(byBand.channels, (await json(text('200 Ω'), 'codes')).channels);
    assert.deepEqual(byBand.channels.map(({ codes }: { codes: object }) => codes), [{ t: 1 }, { t: 1 }]);
  });

  describe('tolerances of a tunable', () => {
    const text = (first: string, second: string) => `ohmward: 1
bands: {b: 868 MHz}
load: 18 - j37 Ω
tunables:
  u: {0: ${first}, 1: ${second}}
ladder:
  - series L1: 12 nH
  - shunt C2: tunable u
goals:
  - return loss >= 6 dB in b
`;
    /** The corners of a fixed part of 6 pF with a tolerance: its largest fall of margin. */
    const fixed = async (figure: string) => (await json(text('1 pF', '6 pF').replace('tunable u', `6 pF ${figure}`), 'check')).spread.worstCorner;

    for (const [first, second, plain] of [['1 pF', '6 pF ±20 %', '±20 %'], ['1 pF +0 % -5 %', '6 pF ±20 %', '±20 %'], ['1 pF ±20 %', '6 pF ±1 %', '±1 %']]) {
      it(`are those of the code in use: ${first}, ${second}`, async () => {
        const { spread } = await json(text(first, second), 'check');
        const corner = await fixed(plain);
        assert.ok(Math.abs(spread.worstCorner.margin - corner.margin) < 1e-9);
        assert.deepEqual(Object.keys(spread.worstCorner.values), ['C2']);
        assert.ok(Math.abs(spread.worstCorner.values.C2 / corner.values.C2 - 1) < 1e-12);
      });
    }

    it('are none where only codes that are not in use have one', async () => {
      assert.equal((await json(text('1 pF ±20 %', '6 pF'), 'check')).spread, null);
    });
  });

  const small = (more: string) => `ohmward: 1
bands: {b: 868 MHz}
load: 18 - j37 Ω
tunables: {u: {0: 1 pF, 1: 6 pF}}
ladder:
  - series L1: 12 nH
  - shunt C2: tunable u
${more}`;

  for (const [what, code] of [
    ['channels: 0 Hz', 'not-physical'], ['channels: -1 MHz', 'not-physical'], ['channels: []', 'no-channels'], ['channels: [868 MHz, 0 Hz]', 'not-physical'], ['channels: -5 .. 869 MHz step 1 MHz', 'not-physical'],
    ['firmware: {header: "", symbol: a}', ''], ['firmware: {header: out/, symbol: a}', 'bad-path'], ['firmware: {header: a.h, json: a.h, symbol: a}', 'duplicate-file'],
    ...['_stdint', 'int8_t', 'uint_least16_t', 'INT8_MAX', '__LINE__', 'main', '_Generic'].map((symbol) => [`firmware: {header: a.h, symbol: ${symbol}}`, 'bad-symbol']),
  ]) {
    it(`is a mistake with its place: ${what}`, async () => {
      const { code: exit, error } = await runOn(small(`${what}\n`), 'check', 'a.match.yaml');
      assert.equal(exit, 1);
      assert.match(error, new RegExp(`a\\.match\\.yaml:8:\\d+: error: .*${code}`), error);
    });
  }

  for (const [rows, message] of [['{}', /has no codes/], ['{1: solve, 2: 2 pF}', /stands for one value/], ['{1: tunable u, 2: 2 pF}', /stands for one value/], ['{1: pair 1 pF}', /a\.match\.yaml:4:\d+: error/]] as const) {
    it(`is a mistake with its place: a tunable ${rows}`, async () => {
      const { code, error } = await runOn(small('').replace('{0: 1 pF, 1: 6 pF}', rows), 'check', 'a.match.yaml');
      assert.equal(code, 1);
      assert.match(error, message);
      assert.doesNotMatch(error, /«pair» is no value; pair/);
    });
  }

  it('a header that is a folder is told, and nothing is written', async () => {
    mkdirSync('isdir');
    for (const option of ['--write', '--verify']) {
      const { code, error } = await runOn(small('firmware: {header: isdir, symbol: a}\n'), 'codes', option, 'a.match.yaml');
      assert.equal(code, 1);
      assert.match(error, /^isdir: is a folder/m);
    }
  });

  it('two descriptions do not overwrite each other’s table, but may share one', async () => {
    const one = small('firmware: {header: t.h, symbol: a}\n');
    const clash = await runOn({ 'a.match.yaml': one, 'b.match.yaml': one.replace('symbol: a', 'symbol: b') }, 'codes', '--write', '.');
    assert.equal(clash.code, 1);
    assert.match(clash.error, /b\.match\.yaml: writes another table to t\.h than a\.match\.yaml does/);
    assert.match(readFileSync('t.h', 'utf8'), /struct a_row/);
    assert.equal((await runOn({ 'b.match.yaml': one }, 'codes', '--verify', '.')).code, 0);
  });

  it('a table is out of date where a blank tears a number or is missing between words, and not where it is laid out anew', async () => {
    const text = small('firmware: {header: t.h, symbol: a}\n');
    await runOn(text, 'codes', '--write', 'a.match.yaml');
    const table = readFileSync('t.h', 'utf8');
    for (const [from, to, code] of [['868000000', '8680 00000', 1], ['static const', 'staticconst', 1], ['#define A_COUNT 1\n\n', '#define A_COUNT 1 ', 1], ['#define A_COUNT 1\n', '#define A_COUNT\n1\n', 1], ['    { ', '{', 0], ['[A_COUNT] = {', '[ A_COUNT ]\n    = {', 0], ['\n', '\r\n', 0]] as const) {
      writeFileSync('t.h', table.replace(from, to));
      assert.notEqual(readFileSync('t.h', 'utf8'), table);
      assert.equal((await runOn(text, 'codes', '--verify', 'a.match.yaml')).code, code, `${from} → ${to}`);
    }
  });

  it('without codes it is told why there is no table', async () => {
    const { code, error } = await runOn(small('firmware: {header: t.h, symbol: a}\n').replace('12 nH', 'solve 1 .. 30 nH'), 'codes', '--write', 'a.match.yaml');
    assert.equal(code, 1);
    assert.match(error, /^a\.match\.yaml: there is no table: L1 is still to be solved$/m);
    assert.doesNotMatch(error, /no description here says/);
    const close = await runOn(small('channels: [868 MHz, 868.0000001 MHz]\nfirmware: {header: t.h, symbol: a}\n'), 'codes', '--write', 'a.match.yaml');
    assert.match(close.error, /there is no table: two channels are less than 1 Hz apart/);
  });

  it('a link stays a link, also where it leads to nothing yet', async () => {
    mkdirSync('real');
    symlinkSync('real/t.h', 't.h');
    const { code } = await runOn(small('firmware: {header: t.h, symbol: a}\n'), 'codes', '--write', 'a.match.yaml');
    assert.equal(code, 0);
    assert.ok(lstatSync('t.h').isSymbolicLink());
    assert.match(readFileSync('real/t.h', 'utf8'), /struct a_row/);
  });
});
