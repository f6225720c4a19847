import assert from 'node:assert/strict';
import { readFileSync, writeFileSync } from 'node:fs';
import { inFolder, run } from './inFolder';

// Invented: a soil probe's antenna.
const text = `ohmward: 1
load: 18 - j37 Ω at 868 MHz
bands:
  main: 860 .. 876 MHz
ladder:
  - series L1: solve from coils      # a coil, please
  - shunt C1: solve from caps or none
parts:
  coils: inductor E12 1 nH .. 47 nH Q 40 @ 900 MHz
  caps: capacitor E12 0.47 pF .. 47 pF Q 200
goals:
  - return loss >= 10 dB
  - gain >= -1 dB
`;

describe('solve on the command line', () => {
  inFolder();
  beforeEach(() => {
    writeFileSync('probe.match.yaml', text);
  });

  it('lists the best solutions with the proof, for people', async () => {
    const { code, out, error } = await run('solve', 'probe.match.yaml');
    assert.equal(code, 0);
    assert.equal(error, '');
    assert.match(out, /^probe\.match\.yaml: every goal holds, [\d.]+ dB to spare$/m);
    assert.match(out, /^ {3}1 {2}L1 [\d.]+ nH from coils, C1 [\d.]+ pF from caps +[\d.]+ dB .* 2 +low-pass +passes$/m);
    assert.match(out, /proved: no ladder of 2 parts has more than [\d.]+ dB \(\d+ nodes\)/);
    assert.equal(readFileSync('probe.match.yaml', 'utf8'), text);
  });

  it('gives programs the names that are agreed on', async () => {
    const { code, out } = await run('solve', 'probe.match.yaml', '--format', 'json', '--top', '3');
    assert.equal(code, 0);
    const { version, files } = JSON.parse(out);
    assert.equal(version, 1);
    assert.equal(files[0].path, 'probe.match.yaml');
    assert.equal(files[0].solutions.length, 3);
    const [best] = files[0].solutions;
    for (const key of ['elements', 'worstReflection', 'worstReturnLoss', 'worstGain', 'margin', 'parts', 'form', 'dcPath', 'dcBlock', 'proved', 'bound', 'nodes']) assert.ok(key in best, key);
    assert.deepEqual(Object.keys(best.elements[0]), ['name', 'orientation', 'kind', 'value', 'unit']);
    assert.equal(best.proved, true);
    assert.equal(best.bound, best.margin);
    assert.ok(Math.abs(best.worstReturnLoss + 20 * Math.log10(best.worstReflection)) < 1e-9);
  });

  it('gives a place that stays open as open, a bridge as a bridge', async () => {
    writeFileSync('probe.match.yaml', text.replace('18 - j37 Ω at 868 MHz', '50 Ω').replace('series L1: solve from coils', 'series L1: solve from coils or none'));
    const { out } = await run('solve', 'probe.match.yaml', '--format', 'json');
    assert.deepEqual(JSON.parse(out).files[0].solutions[0].elements, [
      { name: 'L1', orientation: 'series', kind: 'bridge', value: 0, unit: 'Ω' },
      { name: 'C1', orientation: 'shunt', kind: 'open', value: null, unit: null },
    ]);
  });

  it('writes the best into the file, which then holds', async () => {
    const { code, error } = await run('solve', '--write', 'probe.match.yaml');
    assert.equal(code, 0);
    assert.match(error, /^probe\.match\.yaml: written$/m);
    const written = readFileSync('probe.match.yaml', 'utf8');
    assert.match(written, /series L1: [\d.]+ nH from coils {6}# a coil, please/);
    assert.equal((await run('check', 'probe.match.yaml')).code, 0);
    const again = await run('solve', '--again', '--write', 'probe.match.yaml');
    assert.equal(again.code, 0);
    assert.equal(readFileSync('probe.match.yaml', 'utf8'), written);
    const settled = await run('solve', 'probe.match.yaml');
    assert.equal(settled.code, 0);
    assert.match(settled.out, /nothing is left to solve/);
  });

  it('finds the same best again for values that say from', async () => {
    const first = JSON.parse((await run('solve', 'probe.match.yaml', '--format', 'json')).out).files[0].solutions[0];
    writeFileSync('probe.match.yaml', text.replace('solve from coils', '1 nH from coils').replace('solve from caps or none', '47 pF from caps'));
    const again = JSON.parse((await run('solve', '--again', 'probe.match.yaml', '--format', 'json')).out).files[0].solutions[0];
    assert.deepEqual(again.elements, first.elements);
  });

  it('fails where the best misses a goal, where there are errors, and where the call is wrong', async () => {
    writeFileSync('probe.match.yaml', text.replace('>= 10 dB', '>= 40 dB'));
    const missed = await run('solve', 'probe.match.yaml');
    assert.equal(missed.code, 1);
    assert.match(missed.out, /the best that there is misses a goal/);
    writeFileSync('probe.match.yaml', text.replace('18 - j37 Ω', '18-37j'));
    const faulty = await run('solve', '--write', 'probe.match.yaml');
    assert.equal(faulty.code, 1);
    assert.match(faulty.out, /no solution: the description has errors/);
    assert.equal((await run('solve', '--top', '0', 'probe.match.yaml')).code, 2);
    assert.equal((await run('check', '--top', '3', 'probe.match.yaml')).code, 2);
  });
});
