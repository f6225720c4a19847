import assert from 'node:assert/strict';
import { hoverAt } from '../../src/assistance/hover';
import { worstMarginDb } from '../../src/assistance/worstMarginWith';
import type { LoadedFiles } from '../../src/description/files';
import { onePort, seriesTwoPort } from '../description/support';
import { assessed, board, cursorIn } from './support';

const at = (text: string, marked: string, files?: LoadedFiles) => hoverAt(assessed(text, files), cursorIn(text, marked))?.markdown ?? null;

/** Rows of the tables in a hover: first cell to the others. */
const rows = (markdown: string | null) => new Map((markdown ?? '').split('\n').filter((line) => line.startsWith('| ')).map((line) => {
  const [first, ...others] = line.split('|').slice(1, -1).map((cell) => cell.trim());
  return [first, others] as const;
}));

describe('hover', () => {
  const cases: [at: string, expected: RegExp | null][] = [
    ['12 dB in upl$0ink', /^\*\*uplink\*\*: 863 MHz to 870 MHz.*21 points[\s\S]*free air[\s\S]*wet bark/],
    ['rx$02: 869', /^\*\*rx2\*\*: 869\.525 MHz/],
    ['return lo$0ss >=', /return loss ≥ 12 dB.*missed[\s\S]*10\.5 dB.*1\.5 dB short.*free air, 870 MHz/],
    ['from co$0ils', /^\*\*coils\*\*: 21 inductors, 1 nH to 47 nH$/],
    ['capacitor [1$0 pF', /^\*\*caps\*\*: 3 capacitors, 1 pF to 3\.9 pF$/],
    ['18 - j$037', /free air\*\* at 866\.49 MHz: 18\.0 − j37\.1 Ω/],
    // Without `at` the impedance is the same everywhere, which real ones are not.
    ['24 - j$045', /24\.0 − j45\.0 Ω[\s\S]*every frequency/],
    ['wants 4$05', /load that the port should see, 45\.0 − j5\.0 Ω.*45\.0 \+ j5\.0 Ω/],
    ['pow$0er:', /^\*\*power\*\*: Power available from the source/],
    ['lad$0der:', /^\*\*ladder\*\*/],
    ['# and m$0e', null],
  ];
  for (const [place, expected] of cases) {
    it(`«${place}»`, () => (expected ? assert.match(at(board, place) ?? 'nothing', expected) : assert.equal(at(board, place), null)));
  }

  it('marks what it speaks of', () => {
    const found = hoverAt(assessed(board), cursorIn(board, '13 nH fr$0om'));
    assert.equal(found && board.slice(found.span.start, found.span.end), 'series L1: 13 nH from coils');
  });

  it('on an element tells reactance and what lies behind it', () => {
    const table = rows(at(board, 'series L$01'));
    // By hand: ω = 2π·√(863·870) MHz = 5.4443e9/s, so 13 nH is j70.78 Ω; Q 32 @ 900 MHz makes R = (73.51/32)·√(866.49/900) = 2.25 Ω,
    // and the load's −j37 Ω at 868 MHz is −j37.06 Ω here: 18 + 2.25 + j(70.78 − 37.06).
    assert.deepEqual(table.get('reactance at 866.49 MHz'), ['+j70.8 Ω']);
    assert.deepEqual(table.get('Z after it, toward the load'), ['20.3 + j33.7 Ω']);
    for (const row of ['peak voltage', 'rms current', 'heat', 'Γ after it']) assert.ok(table.has(row), row);
  });

  it('on an element tells what its neighbours do to the worst margin', () => {
    const table = rows(at(board, 'series L$01'));
    for (const [value, from] of [['12 nH', /E24.*coils/], ['15 nH', /E24.*coils/], ['13 nH', /now.*E24/]] as const) {
      assert.match(table.get(value)?.[0] ?? '', from);
      // The same as if it were written.
      const written = worstMarginDb(assessed(board.replace('13 nH', value)).evaluation?.goals ?? []);
      assert.ok(written !== null && table.get(value)?.[1] === `${String(Number(written.toPrecision(3))).replace('-', '−')} dB`, `${value}: ${table.get(value)?.[1]}, ${written}`);
    }
  });

  it('takes measured members of a family as they were measured', () => {
    const points = [800e6, 850e6, 900e6, 950e6];
    const coil = (inductanceH: number, resistanceOhm: number) => seriesTwoPort(points, (hz) => ({ re: resistanceOhm, im: 2 * Math.PI * hz * inductanceH }));
    const files: LoadedFiles = new Map([
      ['coils/*.s2p', { form: 'pattern', paths: ['coils/a.s2p', 'coils/b.s2p'] }],
      // Invented: the larger one is so lossy that the goal on gain shows it.
      ['coils/a.s2p', { form: 'touchstone', data: coil(5e-9, 1), warnings: [] }],
      ['coils/b.s2p', { form: 'touchstone', data: coil(6e-9, 30), warnings: [] }],
    ]);
    const text = 'ohmward: 1\nload: 50 - j30 Ω\nbands:\n  a: 860 .. 870 MHz\nladder:\n  - series L1: 5 nH from made\nparts:\n  made: inductor files coils/*.s2p\ngoals:\n  - gain >= -3 dB\n';
    // A measured value is read off the file, so it is told to a few digits only.
    const other = [...rows(at(text, 'series L$01', files)).entries()].find(([, [from]]) => from === 'made');
    assert.ok(other, 'the other member has a row');
    // Power divider of 50 Ω against 50 + 30 Ω: −10·log10(4·50·50/130²) = 2.28 dB at resonance, so less than 0.8 dB are left of 3.
    assert.ok(Number(other[1][1].replace(' dB', '').replace('−', '-')) < 0.8, other[1][1]);
  });

  it('on files tells their points, span and ports', () => {
    const files: LoadedFiles = new Map([
      ['a.s1p', { form: 'touchstone', data: onePort([800e6, 900e6, 1e9], () => ({ re: 20, im: -30 })), warnings: [] }],
      ['f.s2p', { form: 'touchstone', data: seriesTwoPort([800e6, 1e9], () => ({ re: 1, im: 0 })), warnings: [] }],
      ['stock.csv', { form: 'csv', text: 'kind,value\ninductor,3 nH\ncapacitor,2 pF\n' }],
    ]);
    const text = 'ohmward: 1\nload: a.s1p\nladder:\n  - block F1: f.s2p\n  - block F2: gone.s2p\nparts:\n  stock: stock.csv\nmeasured:\n  - F1: a.s1p\n';
    assert.match(at(text, 'load: a.s$01p', files) ?? '', /^`a\.s1p`: one port, 3 points from 800 MHz to 1 GHz, against 50 Ω\n\n\*\*load\*\*.*20\.0 − j30\.0 Ω/);
    assert.match(at(text, 'F1: f.s$02p', files) ?? '', /^`f\.s2p`: 2 ports, 2 points/);
    assert.match(at(text, 'F2: gon$0e.s2p', files) ?? '', /^`gone\.s2p`: not read$/);
    assert.match(at(text, 'stock: sto$0ck.csv', files) ?? '', /1 inductor, 3 nH; 1 capacitor, 2 pF/);
    assert.match(at(text, 'F1: a.s$01p', files) ?? '', /one port, 3 points/);
  });

  it('on an element without a value says why nothing is known', () => {
    const text = board.replace('13 nH from coils', 'solve from coils');
    assert.match(at(text, 'series L$01') ?? '', /^\*\*L1\*\*, series\n\nL1 is still to be solved$/);
  });

  it('explains keys below the first level', () => {
    const text = 'firmware:\n  symbol: x\nmeasured:\n  - file: a.s1p\n    fixture: []\n';
    assert.match(at(text, 'sym$0bol') ?? '', /table's name/);
    assert.match(at(text, 'fix$0ture') ?? '', /analyser/);
  });

  it('lets no name of the description become markup', () => {
    const text = board.replaceAll('L1', 'L_1_');
    assert.match(at(text, 'series L_$01_') ?? '', /^\*\*L\\_1\\_\*\*/);
  });
});
