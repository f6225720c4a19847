import assert from 'node:assert/strict';
import { cpSync, lstatSync, mkdirSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { readTouchstone } from '../../src/network/touchstone/readTouchstone';
import { inFolder, run } from './inFolder';


describe('command line', () => {
  const place = inFolder({ withSamples: true });

  const change = (from: string, to: string) => {
    const path = 'orchard/frost.match.yaml';
    const text = readFileSync(path, 'utf8');
    assert.ok(text.includes(from), `the sample has no ${from}`);
    writeFileSync(path, text.replace(from, to));
  };

  describe('check', () => {
    it('says of each goal whether it holds and by how much', async () => {
      const { code, out, error } = await run('check', 'orchard');
      assert.equal(code, 0);
      assert.equal(error, '');
      assert.match(out, /^orchard\/frost\.match\.yaml: all 5 hold$/m);
      assert.match(out, /✓ return loss ≥ 14 dB, uplink\s+16\.8 dB {2}2\.8 dB to spare; worst: wet bark, 870 MHz/);
    });

    it('fails where a goal is missed, and says where', async () => {
      change('series L1: 10 nH', 'series L1: 12 nH');
      const { code, out } = await run('check', 'orchard/frost.match.yaml');
      assert.equal(code, 1);
      assert.match(out, /: \d of 5 hold$/m);
      assert.match(out, /✗ return loss ≥ 14 dB, uplink .*short; worst: /);
    });

    it('gives JSON with the names that others depend on', async () => {
      const { code, out } = await run('check', '--format', 'json', 'orchard', 'crate-reader');
      assert.equal(code, 0);
      const parsed = JSON.parse(out);
      assert.deepEqual(Object.keys(parsed), ['version', 'ok', 'files']);
      assert.equal(parsed.version, 1);
      const [frost, loop] = parsed.files;
      assert.deepEqual(Object.keys(frost), ['path', 'title', 'ok', 'diagnostics', 'goals', 'elements', 'bands', 'spread']);
      assert.equal(frost.path, 'orchard/frost.match.yaml');
      assert.deepEqual(Object.keys(frost.goals[0]), ['text', 'line', 'ok', 'quantity', 'value', 'limit', 'margin', 'unit', 'frequency', 'case']);
      assert.deepEqual([frost.goals[0].quantity, frost.goals[0].limit, frost.goals[0].unit, frost.goals[0].case, frost.goals[0].frequency], ['return loss', 14, 'dB', 'wet bark', 870e6]);
      assert.ok(Math.abs(frost.goals[0].value - 14 - frost.goals[0].margin) < 1e-12);
      assert.deepEqual(Object.keys(frost.elements[0]), ['name', 'orientation', 'kind', 'value', 'unit', 'fitted', 'frequency', 'reactance', 'susceptance', 'impedanceAfter', 'reflectionAfter', 'peakVoltage', 'rmsCurrent', 'dissipation']);
      assert.deepEqual([frost.elements[0].name, frost.elements[0].orientation, frost.elements[0].kind, frost.elements[0].value, frost.elements[0].unit], ['L1', 'series', 'inductor', 10e-9, 'H']);
      assert.ok(Math.abs(frost.elements[0].frequency - Math.sqrt(863e6 * 870e6)) < 1);
      assert.deepEqual(Object.keys(frost.bands[0]), ['name', 'start', 'stop', 'cases', 'limit']);
      assert.deepEqual(Object.keys(frost.bands[0].cases[0]), ['case', 'worstReflection', 'worstReturnLoss', 'worstVswr', 'worstGain', 'at']);
      assert.equal(loop.goals[0].case, null);
    });

    it('never solves: what is unsolved has no value, and the file is not in order', async () => {
      change('shunt C1: 4.3 pF from caps', 'shunt C1: solve from caps');
      const { code, out } = await run('check', '--format', 'json', 'orchard');
      assert.equal(code, 1);
      const [file] = JSON.parse(out).files;
      assert.equal(file.ok, false);
      assert.deepEqual(file.diagnostics.map((found: { code: string; line: number }) => [found.code, found.line]), [['unsolved', 21]]);
      for (const goal of file.goals) {
        assert.equal(goal.value, null);
        assert.match(goal.reason, /C1/);
      }
    });

    it('names the place of a mistake as file:line:column, and computes what it can', async () => {
      change('series L1: 10 nH', 'series L1: 10 nh');
      const { code, error } = await run('check', 'orchard');
      assert.equal(code, 1);
      assert.match(error, /^orchard\/frost\.match\.yaml:20:19: error: .*nH.* \(unit-unknown\)$/m);
    });

    it('fails on a file that the description names and that is not there, with its place', async () => {
      rmSync('orchard/frost-wet-bark.s1p');
      const { code, error, out } = await run('check', 'orchard');
      assert.equal(code, 1);
      assert.match(error, /^orchard\/frost\.match\.yaml:15:13: error: .*frost-wet-bark\.s1p/m);
      assert.match(out, /not known/);
    });

    it('invents nothing outside of a file', async () => {
      change('uplink: 863 .. 870 MHz', 'uplink: 980 MHz .. 1.02 GHz');
      const { code, out } = await run('check', '--format', 'json', 'orchard');
      assert.equal(code, 1);
      const goal = JSON.parse(out).files[0].goals[0];
      assert.equal(goal.ok, false);
      assert.equal(goal.value, null);
      assert.match(goal.reason, /covers 700 MHz to 1 GHz/);
    });

    for (const [what, from, to, reason] of [
      ['no load', 'load: 60 Ω\n', '', /load: it could not be read/],
      ['no band that can be read', 'b: 868 MHz', 'b: 868 mHz', /nothing can be computed/],
    ] as const) {
      it(`loses no goal where there is ${what}`, async () => {
        const text = 'ohmward: 1\nbands:\n  b: 868 MHz\nload: 60 Ω\nladder:\n  - series L1: 1 nH\ngoals:\n  - return loss >= 10 dB\n';
        writeFileSync('small.match.yaml', text.replace(from, to));
        const { code, out } = await run('check', '--format', 'json', 'small.match.yaml');
        const [file] = JSON.parse(out).files;
        assert.deepEqual([code, file.diagnostics.filter((found: { severity: string }) => found.severity === 'error').length], [1, 1]);
        const [{ text: goal, ok, value, limit, margin, unit, reason: told }] = file.goals;
        assert.deepEqual([goal, ok, value, limit, margin, unit], ['return loss >= 10 dB', false, null, 10, null, 'dB']);
        assert.match(told, reason);
      });
    }

    it('lists only elements that are there, and an open as infinite', async () => {
      const text = 'ohmward: 1\nbands:\n  b: 868 MHz\nload: open\nladder:\n  - series L1: 1 nH\n';
      writeFileSync('open.match.yaml', text);
      writeFileSync('none.match.yaml', text.replace(/ladder[^]*/, ''));
      const { out } = await run('check', '--format', 'json', 'open.match.yaml', 'none.match.yaml');
      const [open, none] = JSON.parse(out).files;
      assert.deepEqual([open.elements[0].impedanceAfter, open.elements[0].reflectionAfter, open.elements[0].reason], [null, [1, 0], undefined]);
      assert.deepEqual(none.elements, []);
    });

    it('compares each goal with an earlier version', async () => {
      cpSync('orchard/frost.match.yaml', join(place.folder, 'earlier.yaml'));
      change('series L1: 10 nH', 'series L1: 11 nH');
      const { out } = await run('check', 'orchard', '--since', 'earlier.yaml');
      assert.match(out, /return loss ≥ 14 dB, uplink .*was 16\.8 dB/);
      const { out: json } = await run('check', 'orchard', '--since', 'earlier.yaml', '--format', 'json');
      assert.ok(JSON.parse(json).files[0].goals[0].before.ok);
    });

    it('takes folders, and leaves out what is ignored', async () => {
      writeFileSync('.gitignore', 'build/\n!kept.match.yaml\n');
      mkdirSync('.git');
      for (const place of ['build', 'node_modules/a', 'deep/er']) {
        mkdirSync(place, { recursive: true });
        cpSync('crate-reader/loop.match.yaml', `${place}/loop.match.yaml`);
        cpSync('crate-reader/loop.s1p', `${place}/loop.s1p`);
      }
      const { out } = await run('check', '--format', 'json', '.');
      assert.deepEqual(JSON.parse(out).files.map((file: { path: string }) => file.path), ['crate-reader/loop.match.yaml', 'deep/er/loop.match.yaml', 'gate-reader/gate.match.yaml', 'orchard/frost.match.yaml']);
    });
  });

  describe('files and folders', () => {
    const copyLoop = (path: string) => {
      mkdirSync(dirname(path), { recursive: true });
      cpSync('crate-reader/loop.match.yaml', path);
      cpSync('crate-reader/loop.s1p', join(dirname(path), 'loop.s1p'));
    };
    const pathsOf = (out: string) => JSON.parse(out).files.map((file: { path: string }) => file.path);

    it('counts a link to a file, follows none to a folder, and lists nothing twice', async () => {
      mkdirSync('deep');
      cpSync('crate-reader/loop.s1p', 'deep/loop.s1p');
      symlinkSync('../crate-reader/loop.match.yaml', 'deep/linked.match.yaml');
      symlinkSync('../deep', 'deep/round');
      symlinkSync('nowhere', 'deep/broken.match.yaml');
      const { code, out } = await run('check', '--format', 'json', 'deep', 'deep/linked.match.yaml');
      assert.equal(code, 0);
      assert.deepEqual(pathsOf(out), ['deep/linked.match.yaml']);
    });

    it('reports paths relative to the folder it is called from', async () => {
      process.chdir('orchard');
      const { out } = await run('check', '--format', 'json', '../crate-reader', '.');
      assert.deepEqual(pathsOf(out), ['../crate-reader/loop.match.yaml', 'frost.match.yaml']);
    });

    it('says so where a folder holds no description', async () => {
      mkdirSync('deep');
      const { out, error } = await run('check', '--format', 'json', 'deep');
      assert.deepEqual(pathsOf(out), []);
      assert.match(error, /no description/);
    });

    it('reads UTF-16 by its byte order mark, and lays out only UTF-8', async () => {
      const text = readFileSync('crate-reader/loop.match.yaml', 'utf8');
      const bytes = Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from(`# °\n${text.replace('  - ', '  -  ')}`, 'utf16le')]);
      writeFileSync('crate-reader/loop.match.yaml', bytes);
      const { code, error } = await run('check', 'crate-reader');
      assert.deepEqual([code, error], [0, '']);
      const tidied = await run('tidy', 'crate-reader');
      assert.equal(tidied.code, 1);
      assert.match(tidied.error, /is not UTF-8/);
      assert.deepEqual(readFileSync('crate-reader/loop.match.yaml'), bytes);
    });

    it('reports bytes that are no text at their place, and lays out nothing that it would lose', async () => {
      const text = readFileSync('crate-reader/loop.match.yaml', 'utf8');
      const bytes = Buffer.concat([Buffer.from('# 45 '), Buffer.from([0xb0]), Buffer.from(`\n${text.replace('  - ', '  -  ')}`)]);
      writeFileSync('crate-reader/loop.match.yaml', bytes);
      const { code, error } = await run('check', 'crate-reader');
      assert.equal(code, 1);
      assert.match(error, /^crate-reader\/loop\.match\.yaml:1:6: error: .*UTF-8.*\(not-utf8\)$/m);
      assert.equal((await run('tidy', 'crate-reader')).code, 1);
      assert.deepEqual(readFileSync('crate-reader/loop.match.yaml'), bytes);
    });

    it('lays out what a link leads to, and leaves the link', async () => {
      const text = readFileSync('crate-reader/loop.match.yaml', 'utf8');
      writeFileSync('crate-reader/loop.match.yaml', text.replace('  - ', '  -  '));
      symlinkSync('crate-reader/loop.match.yaml', 'linked.match.yaml');
      assert.equal((await run('tidy', 'linked.match.yaml')).code, 0);
      assert.ok(lstatSync('linked.match.yaml').isSymbolicLink());
      assert.equal(readFileSync('crate-reader/loop.match.yaml', 'utf8'), text);
    });

    it('gives every trace a file of its own where descriptions or cases are called alike', async () => {
      copyLoop('deep/one/loop.match.yaml');
      copyLoop('deep/two/loop.match.yaml');
      const { code, out } = await run('sweep', 'deep', '--format', 'touchstone', '-o', 'traces/');
      assert.equal(code, 0);
      assert.deepEqual(out.trim().split('\n'), ['traces/deep-one-loop.s1p', 'traces/deep-two-loop.s1p']);
      writeFileSync('cases.match.yaml', 'ohmward: 1\nbands:\n  b: 868 MHz\nload:\n  wet bark: 40 Ω\n  wet-bark: 60 Ω\nladder:\n  - series L1: 1 nH\n');
      assert.equal((await run('sweep', 'cases.match.yaml', '--format', 'touchstone', '-o', 'traces/')).code, 0);
      assert.notEqual(readFileSync('traces/cases.wet-bark.s1p', 'utf8'), readFileSync('traces/cases.wet-bark-2.s1p', 'utf8'));
    });

    it('the call is wrong where the output cannot be written', async () => {
      const { code, error } = await run('report', 'crate-reader', '-o', 'orchard');
      assert.equal(code, 2);
      assert.match(error, /^ohmward: orchard: cannot be written \(\w+\)$/m);
    });
  });

  describe('the call', () => {
    for (const [words, message] of [
      [['check'], /needs a description or a folder/],
      [['chek', 'orchard'], /no command «chek»/],
      [['check', 'nowhere'], /nowhere: there is no such file or folder/],
      [['check', 'orchard', '--format', 'xml'], /no format «xml»/],
      [['check', 'orchard', '--colour'], /Unknown option '--colour'/],
      [['check', 'orchard', '--verify'], /check takes no --verify/],
      [['check', 'orchard', '--since', 'nothing.yaml'], /nothing\.yaml: there is no such file/],
      [['sweep', 'orchard', '--format', 'touchstone'], /this makes 2 files/],
      [['sweep', 'orchard', '--case', 'on the moon'], /no load case «on the moon»/],
      [['report', 'orchard'], /report needs -o FILE/],
      [[], /ohmward COMMAND/],
    ] as const) {
      it(`is wrong: ${words.join(' ') || '(nothing)'}`, async () => {
        const { code, error } = await run(...words);
        assert.equal(code, 2);
        assert.match(error, message);
      });
    }
  });

  describe('sweep', () => {
    it('gives JSON: complex numbers in pairs, null where not known', async () => {
      change('sweep: 750 MHz .. 1 GHz, 251 points', 'sweep: 990 MHz .. 1.01 GHz, 3 points');
      const { code, out } = await run('sweep', 'orchard', '--format', 'json');
      assert.equal(code, 0);
      const [file] = JSON.parse(out).files;
      assert.deepEqual(file.frequency, [990e6, 1e9, 1.01e9]);
      assert.deepEqual(file.cases.map((each: { case: string }) => each.case), ['free air', 'wet bark']);
      const [first] = file.cases;
      assert.equal(first.reflection.length, 3);
      assert.equal(first.reflection[0].length, 2);
      assert.equal(first.reflection[2], null);
      assert.ok(first.gain[0] < 0 && first.efficiency[0] > 0 && first.efficiency[0] < 1);
      assert.match(first.reason, /covers/);
    });

    it('writes a Touchstone file a case, which reads back to the same input', async () => {
      const { code } = await run('sweep', 'orchard', '--format', 'touchstone', '-o', 'traces/');
      assert.equal(code, 0);
      const read = readTouchstone('a.s1p', readFileSync('traces/frost.free-air.s1p'));
      assert.ok(read.ok && read.data.frequencyHz.length === 251);
      const { out } = await run('sweep', 'orchard', '--format', 'json');
      const [re, im] = JSON.parse(out).files[0].cases[0].reflection[100];
      assert.ok(Math.hypot(read.data.sRe[100] - re, read.data.sIm[100] - im) < 1e-9);
    });

    it('writes the ladder itself as a two-port', async () => {
      const { out } = await run('sweep', 'crate-reader', '--format', 'touchstone', '--two-port');
      const read = readTouchstone('a.s2p', out);
      assert.ok(read.ok && read.data.ports === 2);
      const s = (k: number) => [read.data.sRe[k], read.data.sIm[k]];
      assert.deepEqual(s(1), s(2), 'a ladder of parts is reciprocal');
    });

    it('writes CSV as RFC 4180 has it', async () => {
      const { out } = await run('sweep', 'crate-reader', '--format', 'csv');
      const rows = out.split('\r\n');
      assert.equal(rows[0], 'case,frequency_hz,reflection_re,reflection_im,reflection_db,impedance_re_ohm,impedance_im_ohm,gain_db,efficiency');
      assert.equal(rows.length, 1 + 201 + 1);
    });
  });

  describe('tidy', () => {
    it('lays a file out in place, keeps its comments, and then has nothing to do', async () => {
      change('  - series C2: 18 pF from caps   # also keeps DC off the antenna', '  -   series C2:   18 pF from caps   # also keeps DC off the antenna');
      assert.equal((await run('tidy', '--verify', '.')).code, 1);
      assert.match(readFileSync('orchard/frost.match.yaml', 'utf8'), /- {3}series C2/);
      assert.equal((await run('tidy', '.')).code, 0);
      assert.match(readFileSync('orchard/frost.match.yaml', 'utf8'), /- series C2: 18 pF from caps\s+# also keeps DC off the antenna/);
      assert.equal((await run('tidy', '--verify', '.')).code, 0);
    });
  });

  it('fails where a file to be laid out has errors, whether it changes or not', async () => {
    change('series L1: 10 nH', 'series   L1:    10 nh');
    for (const what of ['changed', 'left as it is']) {
      const { code, error } = await run('tidy', 'orchard');
      assert.equal(code, 1, what);
      assert.match(error, /frost\.match\.yaml:20:\d+: error: .*nH/);
    }
  });

  it('writes a report that needs nothing from elsewhere', async () => {
    const { code } = await run('report', '.', '-o', 'deep/report.html');
    assert.equal(code, 0);
    const html = readFileSync('deep/report.html', 'utf8');
    assert.match(html, /Orchard frost sensor, antenna port/);
    assert.doesNotMatch(html, /<script|https?:\/\/|src=|@import|url\((?!#)/);
    // Everything that the panel shows of the three samples.
    for (const heading of ['Verdict: all 5 hold', 'Codes by channel', 'Coverage', 'Spread of builds']) assert.ok(html.includes(heading), heading);
    assert.match(html, /Table firmware\/gate_codes\.h: up to date/);
    assert.equal(html.match(/<path class="covered"/g)?.length, 1);
    assert.match(html, /<path class="cloud"/);
    // Names of patterns belong to one picture each.
    const ids = [...html.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    assert.equal(new Set(ids).size, ids.length);
  });

  it('reports the best candidate of what is left to solve, and that it is not in the text', async () => {
    change('10 nH from coils', 'solve from coils');
    const { code } = await run('report', 'orchard', '-o', 'report.html');
    assert.equal(code, 1);
    const html = readFileSync('report.html', 'utf8');
    assert.match(html, /<p class="not-inserted">/);
    assert.match(html, /<h2>Candidates<\/h2>.*<td>L1 [\d.]+ nH<\/td>/s);
    assert.match(html, /proved: none of/);
  });
});
