import assert from 'node:assert/strict';
import { completionsAt } from '../../src/assistance/completion';
import { readDescription } from '../../src/description/readDescription';
import { assessed, atCursor } from './support';

const around = (lines: string) => `ohmward: 1
load:
  free air: 18 - j37 Ω
  wet: 20 Ω
bands:
  up link: 863 .. 870 MHz
  rx2: 869.525 MHz
parts:
  coils: inductor [1 nH, 5.6 nH, 12 nH]
  caps: capacitor E12 1 pF .. 20 pF
tunables:
  bank: capacitor 3 bits 1 pF .. 4 pF
ladder:
  - series L9: 1 nH
${lines}
`;

function complete(lines: string, paths: readonly string[] = []) {
  const { text, offset } = atCursor(around(lines));
  const found = completionsAt(assessed(text), offset, paths);
  const accept = (label: string) => {
    const item = found.find((each) => each.label === label);
    assert.ok(item, `${label} is offered, among ${found.map((each) => each.label).join(', ')}`);
    return text.slice(0, item.span.start) + item.insertText + text.slice(item.span.end);
  };
  return { found, labels: found.map(({ label }) => label), accept };
}

describe('completion', () => {
  const offered: [lines: string, some: string[], none?: string[]][] = [
    ['$0', ['goals', 'let', 'title'], ['ohmward', 'load', 'ladder']],
    ['go$0', ['goals']],
    ['  - $0', ['series', 'shunt', 'line', 'stub open', 'stub short', 'transformer', 'block']],
    ['  - stub o$0', ['stub open']],
    ['  - series $0', ['L1', 'C1'], ['L9']],
    ['  - shunt C1: $0', ['solve', 'not fitted', 'tunable …'], ['0 Ω']],
    ['  - series L1: $0', ['solve', '0 Ω', 'coil …'], ['not fitted']],
    ['  - series L1: solve from $0', ['coils', 'E24', 'E96'], ['caps']],
    ['  - series L1: solve from coils, $0', ['coils', 'E24']],
    ['  - series L1: 5.6 nH from $0', ['coils'], ['caps', 'E24']],
    ['  - shunt X1: 5.6 nH from $0', ['coils', 'caps']],
    ['  - series L1: solve $0', ['from', 'or none']],
    ['  - shunt C1: tunable $0', ['bank']],
    ['  - shunt C1: 3.3$0', ['3.3 pF', '3 pF', '3.6 pF', '2.7 pF', '3.9 pF'], ['3.3 nH']],
    ['  - shunt C1: 3.3 p$0', ['3.3 pF', '3.6 pF']],
    ['  - shunt C1: 4p7$0', ['4.7 pF', '5.1 pF', '4.3 pF']],
    ['  - series L1: pair 5$0', ['5 nH', '5.1 nH', '4.7 nH']],
    ['  - series L1: 5$0 nH from coils', ['5.6 nH', '1 nH', '5.1 nH']],
    ['  - shunt trap: 2 p$0', ['2 pF']],
    ['  - shunt C1: 3.3 pF $0', ['±5 %', 'Q 35 @ 900 MHz', 'ESL 0.35 nH', 'from …']],
    ['  - series R1: 50 Ω $0', ['±5 %', 'ESL 0.35 nH'], ['Q 200', 'SRF 7 GHz']],
    ['  - series L1: 3 nH $0', ['Q 200'], ['ESL 0.35 nH']],
    ['  - line T1: 50 Ω, 6$0', ['6 mm', '6 °']],
    ['  - transformer T1: $0', ['turns 1:2']],
    ['goals:\n  - $0', ['return loss', 'VSWR', 'dc block', 'yield']],
    ['goals:\n  - return l$0', ['return loss']],
    ['goals:\n  - return loss $0', ['>=']],
    ['goals:\n  - VSWR $0', ['<=']],
    ['goals:\n  - return loss >= 12$0', ['12 dB'], ['12 %']],
    ['goals:\n  - efficiency >= 80 $0', ['80 %', '80 dB']],
    ['goals:\n  - return loss >= 12 dB $0', ['in', 'at', 'for', 'into'], ['against']],
    ['goals:\n  - rejection >= 12 dB at 2 x $0', ['up link', 'rx2']],
    ['goals:\n  - gain >= -1 dB in up l$0', ['up link']],
    ['goals:\n  - gain >= -1 dB for free a$0', ['free air', 'wet']],
    ['goals:\n  - voltage $0', ['L9', 'load']],
    ['measured:\n  - a.s1p for $0', ['free air', 'wet']],
    ['measured:\n  - a.s1p for wet with $0', ['bank']],
    ['measured:\n  - $0', ['L9']],
    ['firmware:\n  $0', ['header', 'json', 'symbol']],
    ['spread: $0', ['uniform', 'normal']],
    ['source: $0', ['wants …']],
    ['channels: $0', ['up link', 'rx2']],
    ['power: 14$0', ['14 dBm', '14 W']],
    ['bands:\n  x: 868$0', ['868 MHz', '868 GHz']],
    ['bands:\n  x: 863 .. 870 MHz$0', [', watch']],
    ['parts:\n  more: $0', ['inductor', 'capacitor', 'resistor']],
    ['parts:\n  more: inductor $0', ['E24', 'E96', 'files …']],
    ['parts:\n  more: inductor E24 1 nH .. 47$0', ['47 nH']],
    ['parts:\n  more: inductor E24 1 nH .. 47 nH $0', ['±5 %', 'Q 200'], ['fixed']],
    ['tunables:\n  cap: $0', ['capacitor']],
    ['load:\n  bench:\n    $0', ['file', 'fixture']],
    ['# $0', []],
    ['  - series L1: 3 nH # $0', []],
  ];
  for (const [lines, some, none = []] of offered) {
    it(`at ${JSON.stringify(lines)}: ${some.join(', ') || 'nothing'}`, () => {
      const { labels } = complete(lines);
      if (some.length === 0) assert.deepEqual(labels, []);
      for (const label of some) assert.ok(labels.includes(label), `${label}, among ${labels.join(', ')}`);
      for (const label of none) assert.ok(!labels.includes(label), label);
    });
  }

  const accepted: [lines: string, label: string, expected: string][] = [
    ['  - shunt C1: 3.$0', '3 pF', '  - shunt C1: 3 pF'],
    ['  - shunt C1:$0', 'not fitted', '  - shunt C1: not fitted'],
    ['  - series L1: 5$0 nH from coils', '5.6 nH', '  - series L1: 5.6 nH from coils'],
    ['  - series L1: sol$0', 'solve', '  - series L1: solve'],
    ['  - series L1: solve f$0', 'from', '  - series L1: solve from'],
    ['goals:\n  - gain >= -1 dB in up l$0', 'up link', 'goals:\n  - gain >= -1 dB in up link'],
    ['goals:\n  - gain >= -1 dB for f$0 in rx2', 'free air', 'goals:\n  - gain >= -1 dB for free air in rx2'],
    ['goals:\n  - return loss >= 12$0', '12 dB', 'goals:\n  - return loss >= 12 dB'],
    ['  - shunt C1: tun$0', 'tunable …', '  - shunt C1: tunable '],
  ];
  for (const [lines, label, expected] of accepted) {
    it(`of ${JSON.stringify(lines)} by «${label}»`, () => assert.equal(complete(lines).accept(label), around(expected)));
  }

  it('offers goals that read without a mistake', () => {
    const { found } = complete('goals:\n  - $0');
    for (const { insertText, label } of found) {
      const text = around(`  - shunt C1: 1 pF\n  - series L1: 1 nH\ngoals:\n  - ${insertText}`);
      assert.deepEqual(assessed(text).diagnostics.filter(({ severity }) => severity === 'error').map(({ message }) => `${label}: ${message}`), []);
    }
  });

  it('offers figures and values that read without a mistake', () => {
    for (const start of ['  - shunt C1: 3.3 pF $0', '  - series L1: 3$0', '  - shunt C1: 3.3$0', '  - series R1: 50 Ω $0', '  - series L1: $0']) {
      const { found, accept } = complete(start);
      for (const { label, snippet } of found.filter((each) => !each.label.endsWith('…') && !each.snippet)) {
        assert.equal(snippet, false);
        const errors = readDescription(accept(label), { expressions: true }).diagnostics.filter(({ severity }) => severity === 'error');
        // A bridge in the place of a coil is the reader's affair.
        if (label !== '0 Ω') assert.deepEqual(errors.map(({ message }) => `${label}: ${message}`), []);
      }
    }
  });

  it('offers files that could be named, by what may stand there', () => {
    const paths = ['a.s1p', 'f.s2p', 'stock.csv'];
    assert.deepEqual(complete('  - block F1: $0', paths).labels, ['f.s2p']);
    assert.ok(complete('source: $0', paths).labels.includes('a.s1p'));
    assert.ok(complete('parts:\n  more: $0', paths).labels.includes('stock.csv'));
    assert.ok(complete('measured:\n  - $0', paths).labels.includes('a.s1p'));
  });

  it('writes only the name of a key that has its colon', () => {
    const { text, offset } = atCursor('tit$0: Board\n');
    const found = completionsAt(assessed(text), offset).find(({ label }) => label === 'title');
    assert.deepEqual(found && [found.insertText, found.snippet], ['title', false]);
  });
});
