import assert from 'node:assert/strict';
import { listedSolutions } from '../../src/assistance/candidates';
import { insertSolution } from '../../src/assistance/insertSolution';
import { applyEdits } from '../../src/base/diagnostic';
import { buildModel } from '../../src/description/buildModel';
import { readDescription } from '../../src/description/readDescription';
import type { Element } from '../../src/network/element';
import { solveProblem } from '../../src/solve/solveProblem';
import { csv, files } from '../description/support';

// Invented parts and an invented antenna.
const head = `ohmward: 1
load: 18 - j37 Ω at 868 MHz
bands:
  main: 860 .. 876 MHz
parts:
  coils: inductor E12 1 nH .. 47 nH Q 40 @ 900 MHz
  few caps: capacitor [1 pF, 2.2 pF, 4.7 pF, 1.5 nF] Q 150 ±0.1 pF
  drawer: stock.csv
goals:
  - gain >= -3 dB
`;
const stock = files({ 'stock.csv': csv('kind,value,q,count,part\nC,3.3 pF,200,3,TP-33\nC,3.3 pF,300,3,TP-33/A\nC,3.3 pF,400,3,TP 33\nC,4.7 pF,200,1,47p\nL,8.2 nH,30,3,"K, 82"\nL,10 nH,30,3,K: 100\n') });

const ladders: readonly string[] = [
  'ladder:\n- series L1: solve from drawer # a coil\n- shunt C1: solve from drawer, few caps\n',
  'ladder: [{series L1: solve from coils}, {shunt C1: "solve from drawer, few caps"}]\n',
  "ladder:\n  - series X1: 'solve from coils, few caps or none'\n  - shunt X2: solve from drawer or none\n",
  'ladder:\n  - series L1: pair solve from coils or none Q 22\n  - shunt C1: solve 0.5 .. 10 pF ESL 0.3 nH rated 50 V\n',
  'ladder:\n  - stub open T1: 50 Ω, solve 2 mm .. 40 mm, vf 0.55\n  - line T2: 50 Ω, solve 2 mm .. 40 mm, vf 0.55, 0.4 dB/m @ 1 GHz\n',
  'ladder: solve up to 3 elements from drawer   # whatever is there\n',
  'ladder: "solve up to 2 elements from few caps, coils"\n',
  'ladder: solve up to 2 elements\n',
];

function modelOf(text: string) {
  const { problem, diagnostics } = buildModel(readDescription(text, { expressions: true }), stock);
  assert.deepEqual(diagnostics.map(({ message }) => message), [], text);
  assert.ok(problem);
  return problem;
}

/** Values of no catalogue are written with four digits: 0.05 % at most, and the loss of a line goes with its length. */
function assertSame(read: unknown, found: unknown, text: string): void {
  if (typeof read === 'number' && typeof found === 'number') {
    assert.ok(Math.abs(read - found) <= 5.1e-4 * Math.abs(found), `${read} is not ${found} in\n${text}`);
  } else if (typeof read === 'object' && read !== null && typeof found === 'object' && found !== null) {
    assert.deepEqual(Object.keys(read).sort(), Object.keys(found).sort(), text);
    for (const [key, value] of Object.entries(read)) assertSame(value, (found as Record<string, unknown>)[key], text);
  } else {
    assert.equal(read, found, text);
  }
}

describe('inserted solutions, read again', () => {
  it('put another part of the same value in the place of one that is reconsidered', () => {
    const text = `${head}ladder:\n  - series L1: 10 nH from coils fixed\n  - shunt C1: 3.3 pF from drawer   # from a bag\n`;
    const { syntax } = readDescription(text, { expressions: true });
    const { problem } = buildModel(readDescription(text, { expressions: true }), stock, { reopen: true });
    assert.ok(problem);
    const purer = listedSolutions(solveProblem(problem)).find(({ solved: [{ label }] }) => label === 'TP-33/A');
    assert.ok(purer);
    const after = applyEdits(text, insertSolution(syntax, purer));
    assert.match(after, /shunt C1: 3\.3 pF from drawer part TP-33\/A {3}# from a bag/);
    assertSame(modelOf(after).ladder, purer.ladder, after);
  });

  for (const ladder of ladders) {
    for (const lineEnd of ['\n', '\r\n']) {
      it(`are the ladder that was found: ${JSON.stringify(ladder.replaceAll('\n', lineEnd))}`, () => {
        const text = (head + ladder).replaceAll('\n', lineEnd);
        const solutions = listedSolutions(solveProblem(modelOf(text), { top: 6 }));
        assert.ok(solutions.length > 0);
        for (const solution of solutions) {
          const after = applyEdits(text, insertSolution(readDescription(text, { expressions: true }).syntax, solution));
          const { ladder: read, unknowns, ladderTask } = modelOf(after);
          assert.deepEqual([unknowns, ladderTask], [[], null]);
          assertSame(read, solution.ladder satisfies readonly Element[], after);
          assert.equal(after.split(lineEnd).join('').match(/[\r\n]/), null, 'one kind of line end');
        }
      });
    }
  }
});
