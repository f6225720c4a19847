import assert from 'node:assert/strict';
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { firmwareHeader } from '../../src/report/firmwareHeader';
import { firmwareJson } from '../../src/report/firmwareJson';
import { contentOf, firmwareRows, fnv1a, type FirmwareRows } from '../../src/report/firmwareRows';
import { firmwareState } from '../../src/report/firmwareState';
import { bestCodes } from '../../src/study/tuning/bestCodes';
import { bankProblem } from '../study/tuning/bank';

const table: FirmwareRows = {
  symbol: 'gate_codes', description: '0123456789abcdef', tunables: ['antcap', 'Bank 2', 'bank-2', 'default', '7th', 'frequency_hz', 'Größe'],
  rows: [{ frequencyHz: 863_100_000, codes: [0, 255, 256, 65_535, 65_536, 4_294_967_295, 3] }, { frequencyHz: 5_800_000_000, codes: [31, 0, 0, 0, 0, 0, 0] }],
};

/** Compiled and run: what the program prints. Without a compiler there is no telling, so that is a failure. */
function compiled(header: string, body: string, compiler: 'cc -std=c99' | 'c++ -std=c++17' = 'cc -std=c99'): string {
  const folder = mkdtempSync(join(tmpdir(), 'ohmward-c-'));
  const [program, standard] = compiler.split(' ');
  const source = join(folder, program === 'cc' ? 'main.c' : 'main.cpp');
  try {
    writeFileSync(join(folder, 'table.h'), header);
    // Twice, for the include guard.
    writeFileSync(source, `#include "table.h"\n#include "table.h"\n#include <stdio.h>\nint main(void) {\n${body}\nreturn 0;\n}\n`);
    const made = spawnSync(program, [standard, '-Wall', '-Wextra', '-Werror', '-pedantic', '-o', join(folder, 'main'), source], { encoding: 'utf8' });
    if (made.error) throw new Error(`this test needs the compiler «${program}» on the path: ${made.error.message}`);
    assert.equal(made.status, 0, made.stderr);
    return spawnSync(join(folder, 'main'), { encoding: 'utf8' }).stdout;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

describe('the firmware table', () => {
  it('is a header that a strict C99 compiler takes, and holds the codes', function () {
    this.timeout(30_000);
    const printed = compiled(firmwareHeader(table), `
      for (unsigned i = 0; i < GATE_CODES_COUNT; i++) {
        const struct gate_codes_row *row = &gate_codes[i];
        printf("%llu %u %u %u %u %lu %lu %u\\n", (unsigned long long)row->frequency_hz, row->antcap, row->bank_2, row->bank_2_2, row->default_,
               (unsigned long)row->t7th, (unsigned long)row->frequency_hz_2, row->gr__e);
      }`);
    assert.deepEqual(printed.trim().split('\n'), table.rows.map(({ frequencyHz, codes }) => [frequencyHz, ...codes].join(' ')));
  });

  it('may be included where it is not used, and by C++', function () {
    this.timeout(30_000);
    assert.equal(compiled(firmwareHeader(table), ''), '');
    assert.equal(compiled(firmwareHeader({ ...table, tunables: ['class', 'new', 'a', 'b', 'c', 'd', 'e'] }), 'printf("%u", gate_codes[1].class_);', 'c++ -std=c++17'), '31');
  });

  it('is JSON with the same codes, a channel a line', () => {
    const parsed = JSON.parse(firmwareJson(table)) as { symbol: string; channels: { frequency: number; codes: Record<string, number> }[] };
    assert.equal(parsed.symbol, 'gate_codes');
    assert.deepEqual(parsed.channels.map(({ frequency, codes }) => [frequency, ...Object.values(codes)]).map(String), table.rows.map(({ frequencyHz, codes }) => [frequencyHz, ...codes]).map(String));
  });

  it('depends on nothing but frequencies, codes and names', () => {
    const problem = bankProblem();
    const headerOf = (changed: typeof problem): string => firmwareHeader(firmwareRows('codes', bestCodes(changed)));
    const before = headerOf(problem);
    assert.equal(headerOf({ ...problem, title: 'another' }), before);
    // Half a decibel more asked of the return loss alone moves margins, not these codes.
    assert.equal(headerOf({ ...problem, goals: problem.goals.map((goal) => (goal.quantity === 'return loss' ? { ...goal, limit: 10.001 } : goal)) }), before);
    assert.notEqual(headerOf({ ...problem, channelsHz: problem.channelsHz!.map((each) => each + 2e6) }), before);
    assert.notEqual(headerOf({ ...problem, ladder: problem.ladder.slice(1) }), before);
  });

  it('knows its state by its marker, whatever the blanks', () => {
    for (const text of [firmwareHeader(table), firmwareJson(table)]) {
      assert.equal(firmwareState(text, null), 'missing');
      assert.equal(firmwareState(text, text), 'current');
      assert.equal(firmwareState(text, `\uFEFF${text.replace(/\n/g, '\r\n').replace(/ {4}/g, '\t')}`), 'current');
      assert.equal(firmwareState(text, text.replace('65535', '65534')), 'out of date');
      assert.equal(firmwareState(text, text.replace('0123456789abcdef', 'fedcba9876543210')), 'current');
      assert.equal(firmwareState(text, text.replace('0123456789abcdef', 'no content')), 'out of date');
      assert.equal(firmwareState(text, text.replace(/ohmward-table/g, 'table')), 'foreign');
      assert.equal(firmwareState(text, ''), 'foreign');
      assert.equal(firmwareState(text, `/* see the ohmward-table 1 ${contentOf(table)} */`), 'foreign');
    }
    assert.equal(firmwareState(firmwareHeader(table), firmwareHeader({ ...table, rows: table.rows.slice(1) })), 'out of date');
  });

  it('has a content that tells tables apart', () => {
    // Published test values of FNV-1a, 64 bits: of no text, and of «a» (Noll, test_fnv.c; from memory).
    assert.equal(fnv1a(''), 'cbf29ce484222325');
    assert.equal(fnv1a('a'), 'af63dc4c8601ec8c');
    const others = [{ ...table, symbol: 'other' }, { ...table, tunables: ['other', ...table.tunables.slice(1)] }, { ...table, rows: [...table.rows].reverse() }];
    assert.equal(new Set([table, ...others].map(contentOf)).size, 4);
  });
});
