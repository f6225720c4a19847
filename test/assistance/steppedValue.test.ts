import assert from 'node:assert/strict';
import { setValue, steppedValue } from '../../src/assistance/steppedValue';
import type { LoadedFiles } from '../../src/description/files';
import { after, assessed, refusalOf } from './support';

const around = (entry: string, rest = '') => `ohmward: 1 # one
load: 18 - j37 Ω at 868 MHz
bands: # judged
  uplink: 863 .. 870 MHz
ladder:
  - ${entry}   # keep me
  - shunt C9: 1 pF
parts:
  coils: inductor E12 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz
  caps: capacitor [1 pF, 2.2 pF, 3.9 pF]
  stock: drawer.csv
tunables:
  bank: capacitor 3 bits 1 pF .. 4 pF
${rest}`;

/** An invented drawer. */
const files: LoadedFiles = new Map([['drawer.csv', {
  form: 'csv', text: 'kind,value,part\ninductor,3.3 nH,A-33\ninductor,5.6 nH,A-56\ninductor,5.6 nH,B-56\ncapacitor,4 pF,K-4\ninductor,8.2 nH,A-82\n',
}]]);

const nameOf = (entry: string) => /^(?:\{)?(?:series|shunt|line|stub open|transformer|block) (\w+)/.exec(entry)?.[1] ?? '';
const step = (entry: string, direction: 'up' | 'down') => steppedValue(assessed(around(entry), files), nameOf(entry), direction);
const set = (entry: string, text: string) => setValue(assessed(around(entry), files), nameOf(entry), text);

describe('stepping a value', () => {
  const cases: [entry: string, up: string | null, down: string | null][] = [
    ['series L1: 13 nH', 'series L1: 15 nH', 'series L1: 12 nH'],
    ['series L1: 13nH', 'series L1: 15 nH', 'series L1: 12 nH'],
    // Not a value of the family: the next ones on either side of it.
    ['series L1: 13 nH from coils', 'series L1: 15 nH from coils', 'series L1: 12 nH from coils'],
    ['series L1: 12 nH ±2 % Q 40 from coils fixed', 'series L1: 15 nH ±2 % Q 40 from coils fixed', 'series L1: 10 nH ±2 % Q 40 from coils fixed'],
    ['series L1: 47 nH from coils', null, 'series L1: 39 nH from coils'],
    ['series L1: 1 nH from coils', 'series L1: 1.2 nH from coils', null],
    ['shunt C1: 3p3', 'shunt C1: 3.6 pF', 'shunt C1: 3 pF'],
    ['shunt C1: 910 pF', 'shunt C1: 1 nF', 'shunt C1: 820 pF'],
    ['shunt C1: 2.2 pF from caps', 'shunt C1: 3.9 pF from caps', 'shunt C1: 1 pF from caps'],
    ['series L1: pair 5.6 nH', 'series L1: pair 6.2 nH', 'series L1: pair 5.1 nH'],
    ['"series L1": "13 nH Q 40"', null, null],
    ['series L1: "13 nH Q 40"', 'series L1: "15 nH Q 40"', 'series L1: "12 nH Q 40"'],
    ['series R1: 0.91 Ω', 'series R1: 1 Ω', 'series R1: 820 mΩ'],
    ['shunt trap: 3.9 nH', 'shunt trap: 4.3 nH', 'shunt trap: 3.6 nH'],
    ['series L1: 5.6 nH from stock', 'series L1: 8.2 nH from stock', 'series L1: 3.3 nH from stock'],
    ['series L1: 5.6 nH from stock part B-56', 'series L1: 8.2 nH from stock part A-82', 'series L1: 3.3 nH from stock part A-33'],
  ];
  for (const [entry, up, down] of cases) {
    for (const [direction, expected] of [['up', up], ['down', down]] as const) {
      it(`${entry}, ${direction}: ${expected ?? 'refused'}`, () => {
        const made = step(entry, direction);
        if (expected === null) assert.ok(refusalOf(made).length > 10);
        else assert.equal(after(around(entry), made), around(expected));
      });
    }
  }

  const refused: [entry: string, because: RegExp][] = [
    ['shunt C1: solve from caps', /no value yet/], ['shunt C1: tunable bank', /codes of «bank»/], ['shunt C1: not fitted', /not fitted/], ['series L1: 0 Ω', /bridge/],
    ['series L1: coil 6 turns', /read/], ['series L1: "coil 6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm"', /winding/], ['shunt T1: 3.9 nH + 1.2 pF', /several parts/],
    ['line T1: 50 Ω, 6 mm, vf 0.55', /length/], ['transformer T1: turns 1:2', /turns/], ['series L1: 13 nH from nowhere', /«nowhere»/], ['series L1:', /read/],
    ['series L1: 13 pF', /read/], ['series L1: =(10 nH + 3 nH)', /expression/], ['block B1: x.s2p', /file/],
  ];
  for (const [entry, because] of refused) it(`is refused for ${entry}`, () => assert.match(refusalOf(step(entry, 'up')), because));

  it('is refused for an element that is not there', () => assert.match(refusalOf(steppedValue(assessed(''), 'L1', 'up')), /L1/));

  it('goes up and down again to where it was', () => {
    for (const entry of ['series L1: 15 nH from coils', 'shunt C1: 3.3 pF', 'shunt C1: 2.2 pF from caps']) {
      const up = after(around(entry), step(entry, 'up'));
      assert.equal(after(up, steppedValue(assessed(up, files), nameOf(entry), 'down')), around(entry));
    }
  });

  it('works where nothing can be studied', () => {
    const text = 'ladder:\n  - series L1: 13 nH\n';
    assert.equal(after(text, steppedValue(assessed(text), 'L1', 'up')), text.replace('13', '15'));
  });
});

describe('setting a value', () => {
  const good: [entry: string, typed: string, expected: string][] = [
    ['shunt C1: 2.2 pF ±5 % from caps', '3.3 pF', 'shunt C1: 3.3 pF ±5 % from caps'],
    ['shunt C1: 2.2 pF ±5 % Q 200', '3p3', 'shunt C1: 3.3 pF ±5 % Q 200'],
    ['shunt C1: 2.2 pF', ' 4.7p ', 'shunt C1: 4.7 pF'],
    ['series L1: pair 13 nH', '5n6', 'series L1: pair 5.6 nH'],
    ['series L1: solve 1 .. 33 nH', '6.8 nH', 'series L1: 6.8 nH'],
    ['shunt C1: solve from caps or none', '2.2 pF', 'shunt C1: 2.2 pF from caps'],
    ['shunt X1: solve from coils, caps', '2.2 pF', 'shunt X1: 2.2 pF from caps'],
    ['shunt C1: not fitted', '2.2 pF', 'shunt C1: 2.2 pF'],
    ['series L1: 0 Ω', '3.9 nH', 'series L1: 3.9 nH'],
    ['series L1: 3.9 nH Q 30', '0 ohm', 'series L1: 0 Ω'],
    ['shunt C1: 3.9 pF', 'not fitted', 'shunt C1: not fitted'],
    ['series L1: 13 pF', '13 nH', 'series L1: 13 nH'],
    ['series L1: "13 nH Q 40"', '15 nH', 'series L1: "15 nH Q 40"'],
    ['line T1: 50 Ω, 6 mm, vf 0.55', '7.5 mm', 'line T1: 50 Ω, 7.5 mm, vf 0.55'],
    ['line T1: 50 Ω, solve 2 mm .. 40 mm, vf 0.55', '12 mm', 'line T1: 50 Ω, 12 mm, vf 0.55'],
    ['line T1: 50 Ω, 90° at 868 MHz', '45°', 'line T1: 50 Ω, 45° at 868 MHz'],
    ['series L1: 5.6 nH from stock part B-56', '3.3 nH', 'series L1: 3.3 nH from stock part A-33'],
    ['shunt trap: 3.9 nH', '4n7', 'shunt trap: 4.7 nH'],
    ['series L1: =(10 nH + 3 nH) Q 30', '13 nH', 'series L1: 13 nH Q 30'],
  ];
  for (const [entry, typed, expected] of good) {
    it(`«${typed}» in ${entry}`, () => {
      const text = after(around(entry), set(entry, typed));
      assert.equal(text, around(expected));
      assert.deepEqual(assessed(text, files).diagnostics.filter(({ severity }) => severity === 'error'), []);
    });
  }

  it('gives an entry without a value one', () => {
    const text = around('series L1:');
    assert.match(after(text, setValue(assessed(text), 'L1', '3 nH')), /^  - series L1: 3 nH\s+# keep me$/m);
  });

  const refused: [entry: string, typed: string, because: RegExp][] = [
    ['shunt C1: 2.2 pF', '3.3 nH', /capacitance/], ['shunt C1: 2.2 pF', '3.3', /unit/], ['shunt C1: 2.2 pF', '3,3 pF', /comma|point/], ['shunt C1: 2.2 pF', '', /missing/],
    ['shunt C1: 2.2 pF', '-1 pF', /negative/], ['shunt C1: 2.2 pF', '0 pF', /not fitted/], ['shunt C1: 2.2 pF', '3.3 pF Q 20', /Q 20/], ['shunt C1: 2.2 pF', '=2*1 pF', /expression/i],
    ['shunt C1: 2.2 pF', 'solve', /«solve»/], ['series L1: 3 nH', 'not fitted', /«not»/], ['shunt R1: 50 Ω', '0 Ω', /above zero/], ['shunt C1: tunable bank', '2 pF', /bank/],
    ['shunt T1: 3.9 nH + 1.2 pF', '2 pF', /several/], ['transformer T1: turns 1:2', '1:3', /text/], ['line T1: 50 Ω, 6 mm, vf 0.55', '3 nH', /length/], ['line T1: 50 Ω, 6 mm, vf 0.55', '0 mm', /above zero/],
    ['series L1: 3 nH', '3 nh', /nH/], ['series L1: 3 nH', '3 nH: # x', /does not belong|unit/],
  ];
  for (const [entry, typed, because] of refused) it(`«${typed}» is refused in ${entry}`, () => assert.match(refusalOf(set(entry, typed)), because));
});
