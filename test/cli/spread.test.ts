import assert from 'node:assert/strict';
import { writeFileSync } from 'node:fs';
import { inFolder, run } from './inFolder';

// Invented: a soil probe.
const text = `ohmward: 1
load: 12 Ω + 3.3 pF
bands:
  main: 862 .. 871 MHz
ladder:
  - series L1: 12 nH from coils
  - shunt C1: 4.3 pF ±2 %
parts:
  coils: inductor E24 1 nH .. 47 nH ±10 % Q 40
  fine: inductor E24 1 nH .. 47 nH ±2 % Q 40
goals:
  - return loss >= 6 dB
  - yield >= 95 %
builds: 2000
seed: 3
`;

describe('spread on the command line', () => {
  inFolder();

  async function check(description: string, ...words: string[]) {
    writeFileSync('probe.match.yaml', description);
    return run('check', 'probe.match.yaml', ...words);
  }

  it('judges a goal on yield, and says what would have to be tightened', async () => {
    const { code, out } = await check(text);
    assert.equal(code, 1);
    assert.match(out, /✗ yield ≥ 95 % +[\d.]+ % +[\d.]+ % short/);
    assert.match(out, /[\d.]+ % of 2000 builds hold every goal \(95 % interval: [\d.]+ to [\d.]+ %\)/);
    assert.match(out, /held by not every build: return loss ≥ 6 dB \(by [\d.]+ %\)/);
    assert.match(out, /worst corner −[\d.]+ dB: L1 1[\d.]+ nH, C1 4\.\d+ pF/);
    assert.match(out, /L1 at ±2 % would make it [\d.]+ %/);
    const tight = await check(text.replace('from coils', 'from fine'));
    assert.equal(tight.code, 0);
    assert.doesNotMatch(tight.out, /would make it/);
  });

  it('gives programs the names that are agreed on, and the same figures every time', async () => {
    const first = JSON.parse((await check(text, '--format', 'json')).out).files[0];
    assert.deepEqual(Object.keys(first.spread), ['yield', 'low', 'high', 'builds', 'seed', 'worstCorner']);
    assert.deepEqual(Object.keys(first.spread.worstCorner), ['values', 'margin', 'case']);
    assert.equal(first.spread.builds, 2000);
    assert.equal(first.spread.seed, 3);
    assert.ok(first.spread.low < first.spread.yield && first.spread.yield < first.spread.high);
    assert.deepEqual(Object.keys(first.spread.worstCorner.values), ['L1', 'C1']);
    const goal = first.goals.find(({ quantity }: { quantity: string }) => quantity === 'yield');
    assert.ok(Math.abs(goal.value - 100 * first.spread.yield) < 1e-9);
    assert.deepEqual(JSON.parse((await check(text, '--format', 'json')).out).files[0].spread, first.spread);
  });

  it('has none without tolerances, and a goal on yield then fails with that reason', async () => {
    const exact = text.replaceAll(/ ±\d+ %/g, '');
    const { code, out } = await check(exact);
    assert.equal(code, 1);
    assert.match(out, /✗ yield ≥ 95 % +not known +no part has a tolerance/);
    assert.equal(JSON.parse((await check(exact, '--format', 'json')).out).files[0].spread, null);
  });
});
