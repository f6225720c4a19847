import assert from 'node:assert/strict';
import { cpSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { inFolder, run } from '../cli/inFolder';

const top = fileURLToPath(new URL('../../', import.meta.url));

interface Pattern {
  readonly regexp: string;
  readonly [part: string]: string | number;
}
const { problemMatchers } = (JSON.parse(readFileSync(join(top, 'package.json'), 'utf8')) as { contributes: { problemMatchers: { name: string; pattern: Pattern }[] } }).contributes;

/** What a matcher of package.json takes from lines, as the editor does; null for a line that it passes over. */
function matched(name: string, text: string): (Record<string, string> | null)[] {
  const { pattern } = problemMatchers.find((matcher) => matcher.name === name)!;
  const { regexp, kind: _kind, ...parts } = pattern;
  return text.split('\n').filter((line) => line !== '').map((line) => {
    const found = new RegExp(regexp).exec(line);
    return found && Object.fromEntries(Object.entries(parts).map(([part, group]) => [part, found[group as number]]));
  });
}

describe('the problem matchers', () => {
  const place = inFolder();

  const faulty = 'ohmward: 1\nload: 18 - j37 Ω\nladder:\n  - series L1: 3.9 nX\ngaols:\n  - parts <= 3\n';

  for (const [what, ...words] of [['check', 'check', '.'], ['codes', 'codes', '--verify', '.'], ['tidy', 'tidy', '--verify', '.']]) {
    it(`find each mistake that ${what} tells, also in a folder with a blank and a colon in its name`, async () => {
      mkdirSync('old: 2 boards');
      writeFileSync('old: 2 boards/valve.match.yaml', faulty);
      const { code, error } = await run(...words);
      assert.equal(code, 1);
      const found = matched('ohmward', error.split('\n').filter((line) => /\.yaml:\d/.test(line)).join('\n'));
      assert.ok(found.length > 0);
      assert.ok(found.every((mistake) => mistake !== null && mistake.file === 'old: 2 boards/valve.match.yaml' && mistake.severity === 'error'), error);
    });
  }

  it('find a missed goal on its own line', async () => {
    writeFileSync('valve.match.yaml', 'ohmward: 1\nload: 18 - j37 Ω\nbands:\n  main: 863 .. 870 MHz\nladder:\n  - series L1: 3.9 nH\ngoals:\n  - parts <= 3\n  - return loss >= 20 dB in main\n');
    const { code, error } = await run('check', '.');
    assert.equal(code, 1);
    const [missed, ...others] = matched('ohmward', error).filter((mistake) => mistake?.severity === 'error');
    assert.equal(others.length, 0);
    assert.deepEqual({ ...missed, message: '' }, { file: 'valve.match.yaml', line: '9', column: '5', severity: 'error', message: '', code: 'goal-missed' });
    assert.match(missed?.message ?? '', /^return loss >= 20 dB in main: [\d.]+ dB/);
  });

  it('take file, place, severity, message and code', async () => {
    writeFileSync('valve.match.yaml', faulty);
    const { error } = await run('check', 'valve.match.yaml');
    const found = matched('ohmward', error);
    const key = found.find((mistake) => mistake?.code === 'unknown-key');
    assert.deepEqual({ ...key, message: '' }, { file: 'valve.match.yaml', line: '5', column: '1', severity: 'error', message: '', code: 'unknown-key' });
    assert.match(key?.message ?? '', /goals/);
    assert.doesNotMatch(key?.message ?? '', /unknown-key/);
    assert.ok(found.some((mistake) => mistake?.line === '4'));
  });

  it('find a table that is missing, foreign or out of date, and a description that is not laid out', async () => {
    cpSync(join(top, 'media', 'samples', 'gate-reader'), place.folder, { recursive: true });
    const header = 'firmware/gate_codes.h';
    const table = readFileSync(header, 'utf8');
    const state = async (expected: RegExp) => {
      const { error } = await run('codes', '--verify', '.');
      const found = matched('ohmward-files', error);
      assert.equal(found.length, 1, error);
      assert.equal(found[0]?.file, header);
      assert.match(found[0]?.message ?? '', expected);
    };
    writeFileSync(header, table.replace(/\{ 902750000ul, \d+u/, '{ 902750000ul, 31u'));
    await state(/^the table is out of date/);
    writeFileSync(header, '/* by hand */\n');
    await state(/^was not written by ohmward/);
    rmSync(header);
    await state(/^the table is missing/);
    writeFileSync('gate.match.yaml', readFileSync('gate.match.yaml', 'utf8').replace('load:', 'load:   '));
    const { error } = await run('tidy', '--verify', '.');
    assert.deepEqual(matched('ohmward-files', error), [{ file: 'gate.match.yaml', message: 'would be laid out differently' }]);
  });

  it('pass over the verdict and what is told of the call', async () => {
    cpSync(join(top, 'media', 'samples'), place.folder, { recursive: true });
    const { out } = await run('check', '.');
    const { error } = await run('check', 'nowhere');
    const { error: nothing } = await run('codes', '--verify', 'orchard');
    assert.ok(out !== '' && error !== '' && nothing !== '');
    for (const name of ['ohmward', 'ohmward-files']) {
      assert.deepEqual(matched(name, out + error + nothing).filter((found) => found !== null), []);
    }
  });
});
