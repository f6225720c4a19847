import assert from 'node:assert/strict';
import type { LoadedFiles } from '../../src/description/files';
import { pathBeside } from '../../src/description/resolve/pathBeside';
import { csv, evenly, files, marks, model, seriesTwoPort, soundProblem, touchstone } from './support';

const head = 'ohmward: 1\nload: 18 - j37 Ω\nbands: {up: 863 .. 870 MHz}\n';
const frequencies = evenly(100e6, 1000e6, 10);
const coil = (henry: number) => touchstone(seriesTwoPort(frequencies, (hz) => ({ re: 0.5, im: 2 * Math.PI * hz * henry })));
const drawer = (content: string, more: LoadedFiles = new Map()) => new Map([['stock.csv', csv(content)], ...more]);
const withDrawer = `${head}ladder: []\nparts:\n  drawer: stock.csv\n`;
const members = (content: string) => soundProblem(withDrawer, drawer(content)).families[0]?.members ?? [];
const toldOf = (content: string) => {
  const { diagnostics } = model(withDrawer, drawer(content));
  for (const { span } of diagnostics) assert.equal(withDrawer.slice(span.start, span.end), 'stock.csv');
  return diagnostics.map(({ message }) => message);
};

describe('families', () => {
  it('are series with both ends, and lists in order', () => {
    const { families } = soundProblem(`${head}ladder: []\nparts:\n  coils: inductor E12 1 nH .. 2.2 nH\n  caps: capacitor [4.7 pF, 1 pF, 4.7 pF]\n`);
    assert.deepEqual(families.map(({ name, kind, members: all }) => [name, kind, ...all.map(({ part }) => part.value)]), [
      ['coils', 'inductor', 1e-9, 1.2e-9, 1.5e-9, 1.8e-9, 2.2e-9], ['caps', 'capacitor', 1e-12, 4.7e-12],
    ]);
  });

  it('are measured files, with the value from the low-frequency end', () => {
    const text = `${head}ladder:\n  - series L1: 5.6 nH from coils\nparts:\n  coils: inductor files vendor/*.s2p ±2 %\n`;
    const loaded = files({ 'vendor/*.s2p': { form: 'pattern', paths: ['vendor/b.s2p', 'vendor/a.s2p'] }, 'vendor/a.s2p': coil(3.3e-9), 'vendor/b.s2p': coil(5.6e-9) });
    const { families, ladder } = soundProblem(text, loaded);
    assert.deepEqual(families[0].members.map(({ label }) => label), ['a', 'b'], 'by increasing value');
    families[0].members.forEach(({ part }, i) => assert.ok(Math.abs(part.value / [3.3e-9, 5.6e-9][i] - 1) < 1e-9));
    const [element] = ladder;
    assert.ok(element.form === 'branch' && element.branch.form === 'part' && element.branch.part.measured !== null, 'the entry has the measured impedance of its family');
    assert.deepEqual(element.branch.part.tolerance, { form: 'relative', up: 0.02, down: 0.02 });
  });

  it('name a measured part by digits that can be written', () => {
    const text = `${head}ladder:\n  - series L1: 5.6 nH from coils\nparts:\n  coils: inductor files vendor/*.s2p\n`;
    const loaded = files({ 'vendor/*.s2p': { form: 'pattern', paths: ['vendor/a.s2p'] }, 'vendor/a.s2p': coil(5.61283e-9) });
    const [{ message, fixes }] = model(text, loaded).diagnostics;
    assert.match(message, /the nearest are 5\.613 nH\.$/);
    const { ladder } = soundProblem(text.replace('5.6 nH', fixes?.[0].edits[0].text ?? ''), loaded);
    assert.ok(ladder[0].form === 'branch' && ladder[0].branch.form === 'part' && ladder[0].branch.part.measured !== null);
  });

  it('are what a part is picked from by name', () => {
    const { diagnostics } = model(`${head}ladder:\n  - series L1: 5.6 nH part IND-56\n`);
    assert.deepEqual(diagnostics.map(({ code }) => code), ['part-without-family']);
  });

  it('have every faulty row of a drawer told, up to a hundred', () => {
    const rows = (count: number) => `kind,value\n${'inductor,5.6 nh\n'.repeat(count)}`;
    assert.equal(toldOf(rows(12)).length, 12);
    assert.match(toldOf(rows(12))[11], /^stock\.csv, line 13: /);
    assert.equal(toldOf(rows(2000)).length, 100);
  });

  it('ask for the files behind a pattern', () => {
    const text = `${head}ladder: []\nparts:\n  coils: inductor files vendor/*.s2p\n`;
    const { missingFiles, diagnostics } = model(text, files({ 'vendor/*.s2p': { form: 'pattern', paths: ['vendor/a.s2p', 'vendor/b.s2p'] } }));
    assert.deepEqual(missingFiles.map(({ path, kind, within }) => [path, kind, within]), [['vendor/a.s2p', 'touchstone', null], ['vendor/b.s2p', 'touchstone', null]]);
    assert.deepEqual(diagnostics, []);
    assert.deepEqual(model(text, files({ 'vendor/*.s2p': { form: 'pattern', paths: [] } })).diagnostics.map(({ code }) => code), ['file-missing']);
  });

  it('leave files out that are no such part', () => {
    const text = `${head}ladder: []\nparts:\n  caps: capacitor files vendor/*.s2p\n`;
    const { diagnostics } = model(text, files({ 'vendor/*.s2p': { form: 'pattern', paths: ['vendor/a.s2p'] }, 'vendor/a.s2p': coil(3e-9) }));
    assert.deepEqual(diagnostics.map(({ code, severity }) => `${severity} ${code}`), ['warning file-not-this-part']);
  });
});

describe('a drawer', () => {
  it('is read with all its columns, in any order and spelling', () => {
    const all = members('\ufeffpart,kind,value,tolerance,q,q_at,esr,esl,srf,rated,count\r\nA1,Inductor,6.8 nH,5 %,35,900 MHz,,,6 GHz,300 mA,10\r\n"B ""2""",C,2p2,±0.1 pF,,,0.2 Ω,0.4 nH,,50 V,\r\n,r,22,1 %,,,,,,,3\r\n'.replace(',22,', ',22 Ω,'));
    assert.deepEqual(all.map(({ label, count, part }) => [label, count, part.kind, part.value]), [['A1', 10, 'inductor', 6.8e-9], ['B "2"', null, 'capacitor', 2.2e-12], [null, 3, 'resistor', 22]]);
    assert.deepEqual(all[0].part.loss, { law: 'skin effect', q: 35, atHz: 9e8 });
    assert.deepEqual([all[0].part.srfHz, all[0].part.rating?.rmsCurrentA], [6e9, 0.3]);
    assert.deepEqual(all[1].part.loss, { law: 'resistance', resistanceOhm: 0.2 });
    assert.deepEqual([all[1].part.eslH, all[1].part.tolerance, all[1].part.rating?.peakVoltageV], [4e-10, { form: 'absolute', up: 1e-13, down: 1e-13 }, 50]);
  });

  it('holds one kind or several', () => {
    assert.equal(soundProblem(withDrawer, drawer('kind,value\nL,1 nH\nL,2 nH\n')).families[0].kind, 'inductor');
    assert.equal(soundProblem(withDrawer, drawer('kind,value\nL,1 nH\nC,2 pF\n')).families[0].kind, 'mixed');
  });

  it('keeps line ends and commas inside quotes, and skips empty lines', () => {
    assert.deepEqual(members('kind,value,part\n\nL,1 nH,"a,\nb"\n\n,,\nL,2 nH,c\n').map(({ label }) => label), ['a,\nb', 'c']);
  });

  it('tells its mistakes with their lines, and keeps the other rows', () => {
    const content = 'kind,value,count\nL,1 nH,1\nX,2 nH,1\nL,2 pF,1\nL,-3 nH,1\nL,4 nH,some\nL,5 nH,1,9\nL,= 2*3 nH,1\n';
    const messages = toldOf(content);
    assert.deepEqual(messages.map((message) => /line (\d)/.exec(message)?.[1]), ['3', '4', '5', '6', '7', '8']);
    assert.deepEqual(model(withDrawer, drawer(content)).problem?.families[0].members.map(({ part }) => part.value), [1e-9]);
  });

  it('needs its header', () => {
    assert.match(toldOf('')[0], /empty/);
    assert.match(toldOf('kind,wert\nL,1 nH\n').join(), /«value» is missing/);
    assert.match(toldOf('L,1 nH\n').join(), /«kind» and «value» are missing/);
    assert.match(toldOf('kind,value,value\nL,1 nH,2 nH\n').join(), /twice/);
    assert.match(toldOf('kind,value,qu\nL,1 nH,3\n').join(), /did you mean «q»/);
  });

  it('says what is wrong with the quotes', () => {
    assert.match(toldOf('kind,value\n"L,1 nH\n').join(), /line \d+: a quotation mark is never closed/);
    assert.match(toldOf('kind,value\nL,"1" nH\n').join(), /quotation mark/);
  });

  it('keeps the rows around one whose quotes are wrong', () => {
    const content = 'kind,value\nL,1 nH\nL,"2" nH\nL,3 nH\nL,"4 nH\n';
    assert.deepEqual(toldOf(content).map((message) => /line (\d)/.exec(message)?.[1]), ['3', '5']);
    assert.deepEqual(model(withDrawer, drawer(content)).problem?.families[0].members.map(({ part }) => part.value), [1e-9, 3e-9]);
  });

  it('finds a part by its designation, of rows with one value the first', () => {
    const text = `${head}ladder:\n  - series L1: 3.3 nH from drawer\n  - series L2: 3.3 nH from drawer part B2\n  - series L3: 3.3 nH from drawer part B3\n  - series L4: 4.7 nH from drawer part B2\nparts:\n  drawer: stock.csv\n`;
    const { problem, diagnostics } = model(text, drawer('kind,value,q,part\nL,3.3 nH,40,B1\nL,3.3 nH,60,B2\n'));
    const qs = problem?.ladder.slice(0, 2).map((element) => (element.form === 'branch' && element.branch.form === 'part' && element.branch.part.loss.law === 'constant q' ? element.branch.part.loss.q : null));
    assert.deepEqual(qs, [40, 60]);
    assert.deepEqual(marks(text, diagnostics), ['unknown-part: B3', 'value-not-in-family: 4.7 nH']);
  });

  it('names files relative to itself', () => {
    const text = `${head}ladder: []\nparts:\n  drawer: stock/parts.csv\n`;
    const content = csv('kind,value,file\nL,,../vendor/a.s2p\nL,5 nH,b.s2p\n');
    const first = model(text, files({ 'stock/parts.csv': content }));
    assert.deepEqual(first.missingFiles.map(({ path, within }) => [path, within]), [['vendor/a.s2p', 'stock/parts.csv'], ['stock/b.s2p', 'stock/parts.csv']]);
    const { families } = soundProblem(text, files({ 'stock/parts.csv': content, 'vendor/a.s2p': coil(3.3e-9), 'stock/b.s2p': coil(4.9e-9) }));
    assert.deepEqual(families[0].members.map(({ part }) => [Number(part.value.toPrecision(6)), part.measured !== null]), [[3.3e-9, true], [5e-9, true]]);
  });

  it('is an error where it is not there', () => {
    const { diagnostics } = model(withDrawer, files({ 'stock.csv': { form: 'missing' } }));
    assert.deepEqual(marks(withDrawer, diagnostics), ['file-missing: stock.csv']);
    assert.deepEqual(model(withDrawer, new Map()).diagnostics, [], 'not read yet');
  });
});

describe('a path beside another', () => {
  const paths: [string, string, string][] = [
    ['stock.csv', 'a.s2p', 'a.s2p'], ['parts/stock.csv', 'a.s2p', 'parts/a.s2p'], ['parts/stock.csv', '../a.s2p', 'a.s2p'], ['stock.csv', '../a.s2p', '../a.s2p'],
    ['../parts/stock.csv', '../x/a.s2p', '../x/a.s2p'], ['parts/stock.csv', './b/../a.s2p', 'parts/a.s2p'], ['parts/stock.csv', '/a.s2p', '/a.s2p'], ['../../s.csv', '../a.s2p', '../../../a.s2p'],
  ];
  for (const [file, written, expected] of paths) it(`${written} in ${file}`, () => assert.equal(pathBeside(file, written), expected));
});
