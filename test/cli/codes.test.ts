import assert from 'node:assert/strict';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { inFolder, run } from './inFolder';

const description = 'gate-reader/gate.match.yaml';
const header = 'gate-reader/firmware/gate_codes.h';

describe('codes on the command line', () => {
  inFolder({ withSamples: true });

  const change = (from: string, to: string) => {
    const text = readFileSync(description, 'utf8');
    assert.ok(text.includes(from), `the sample has no ${from}`);
    writeFileSync(description, text.replace(from, to));
  };

  it('lists channels, codes and what they leave', async () => {
    const { code, out, error } = await run('codes', 'gate-reader');
    assert.equal(code, 0);
    assert.equal(error, '');
    assert.match(out, /^gate-reader\/gate\.match\.yaml: every goal holds at 50 channels; least margin [\d.]+ dB at 9\d\d\.\d+ MHz$/m);
    assert.match(out, /^ +902\.75 MHz +\d+ +[0-3] +[\d.]+ dB +[\d.]+ dB +−[\d.]+ dB/m);
    assert.match(out, /proved: every combination/);
  });

  it('gives JSON with the names that others depend on', async () => {
    const { out } = await run('codes', '--format', 'json', 'gate-reader', 'orchard');
    const parsed = JSON.parse(out);
    assert.deepEqual(Object.keys(parsed), ['version', 'files']);
    const [gate, orchard] = parsed.files;
    assert.deepEqual(Object.keys(gate), ['path', 'channels']);
    assert.equal(gate.channels.length, 50);
    assert.deepEqual(Object.keys(gate.channels[0]).slice(0, 5), ['frequency', 'codes', 'worstReflection', 'worstGain', 'margin']);
    assert.deepEqual(Object.keys(gate.channels[0].codes), ['antcap', 'bank']);
    assert.ok(gate.channels.every((channel: { margin: number; steps: Record<string, { lower: number | null }> }) => channel.margin > 0 && (channel.steps.antcap.lower ?? -1) < channel.margin));
    assert.deepEqual(orchard.channels, []);
    assert.match(orchard.reason, /nothing/);
  });

  it('agrees with check about the least margin, case by case', async () => {
    const checked = JSON.parse((await run('check', '--format', 'json', description)).out).files[0];
    const coded = JSON.parse((await run('codes', '--format', 'json', description)).out).files[0];
    const least = Math.min(...coded.channels.map(({ margin }: { margin: number }) => margin));
    const judged = Math.min(...checked.goals.map(({ margin }: { margin: number }) => margin));
    assert.ok(Math.abs(least - judged) < 1e-9, `${least} ${judged}`);
  });

  it('fails where a goal is missed, whatever the codes', async () => {
    change('gain >= -1.5 dB', 'gain >= -0.5 dB');
    const { code, out } = await run('codes', 'gate-reader');
    assert.equal(code, 1);
    assert.match(out, /goals hold at 0 of 50 channels/);
    assert.match(out, / ✗ /);
  });

  it('verifies the table: what changes no code is not noticed, what does is, and --write mends it', async () => {
    assert.deepEqual(await run('codes', '--verify', '.'), { code: 0, out: '', error: 'ohmward: the table agrees with its description\n' });
    change('title: Gate reader', '# a note\ntitle: Another gate reader');
    change('gain >= -1.5 dB', 'gain >= -1.6 dB');
    change('  - rejection >= 8 dB', '  - parts <= 3\n  - rejection >= 7.9 dB');
    assert.equal((await run('codes', '--verify', description)).code, 0);
    change('12 nH', '11 nH');
    const noticed = await run('codes', '--verify', description);
    assert.equal(noticed.code, 1);
    assert.match(noticed.error, /gate_codes\.h: the table is out of date/);
    const written = await run('codes', '--write', description);
    assert.match(written.error, /gate_codes\.h: written/);
    assert.equal((await run('codes', '--verify', description)).code, 0);
    assert.equal((await run('codes', '--write', description)).error, '', 'what is up to date is not written again');
    writeFileSync(header, readFileSync(header, 'utf8').replace(/\{ 902750000ul, \d+u/, '{ 902750000ul, 31u'));
    assert.equal((await run('codes', '--verify', description)).code, 1, 'an edit by hand');
  });

  it('writes what is missing, header and JSON, and nothing while verifying', async () => {
    change('  symbol: gate_codes', '  json: ../tables/gate.json\n  symbol: gate_codes');
    rmSync(header);
    const missing = await run('codes', '--verify', description);
    assert.equal(missing.code, 1);
    assert.match(missing.error, /gate_codes\.h: the table is missing[^]*gate\.json: the table is missing/);
    assert.equal(existsSync(header), false);
    assert.equal((await run('codes', '--write', description)).code, 0);
    assert.equal(JSON.parse(readFileSync('tables/gate.json', 'utf8')).channels.length, 50);
    assert.match(readFileSync(header, 'utf8'), /GATE_CODES_COUNT 50/);
    assert.equal((await run('codes', '--verify', description)).code, 0);
  });

  it('never writes over what it did not write', async () => {
    mkdirSync('gate-reader/firmware', { recursive: true });
    writeFileSync(header, '/* by hand */\n');
    const { code, error } = await run('codes', '--write', description);
    assert.equal(code, 1);
    assert.match(error, /was not written by ohmward/);
    assert.equal(readFileSync(header, 'utf8'), '/* by hand */\n');
  });

  it('writes no table of a description with mistakes, or where the load is not known', async () => {
    rmSync(header);
    change('channels: 902.75 MHz', 'channels: 840 MHz');
    const unknown = await run('codes', '--write', description);
    assert.equal(unknown.code, 1);
    assert.match(unknown.error, /not all is known: .*840|not all is known: /);
    change('  - series L1: 12 nH', '  - series L1: solve');
    assert.equal((await run('codes', '--write', description)).code, 1);
    change('bank: {', 'bank: {{');
    assert.equal((await run('codes', '--write', description)).code, 1);
    assert.equal(existsSync(header), false);
  });

  it('says where there is nothing to do', async () => {
    const none = await run('codes', 'orchard');
    assert.equal(none.code, 1);
    assert.match(none.error, /nothing is set by a code/);
    assert.equal((await run('codes', '--write', '--verify', description)).code, 2);
    change('firmware:\n  header: firmware/gate_codes.h\n  symbol: gate_codes\n', '');
    const nowhere = await run('codes', '--write', description);
    assert.equal(nowhere.code, 1);
    assert.match(nowhere.error, /no description here says where/);
  });
});
