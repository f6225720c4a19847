import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { improves } from '../../src/assistance/improves';
import { candidatesView, listedSolutions, progressText } from '../../src/assistance/candidates';
import { ladderLenses } from '../../src/assistance/ladderLenses';
import { panelView } from '../../src/assistance/panelView';
import { solutionFixes } from '../../src/assistance/solutionFixes';
import { shownProblem, solvedAssessment } from '../../src/assistance/solvedAssessment';
import { applyEdits } from '../../src/base/diagnostic';
import { buildModel } from '../../src/description/buildModel';
import { solveProblem } from '../../src/solve/solveProblem';

// Invented: a valve's radio.
const text = `ohmward: 1
load: 18 - j37 Ω at 868 MHz
bands:
  main: 860 .. 876 MHz
ladder:
  - series L1: solve from coils
  - shunt C1: solve from caps or none
parts:
  coils: inductor E12 1 nH .. 47 nH Q 40 @ 900 MHz
  caps: capacitor E12 0.47 pF .. 47 pF Q 200
goals:
  - return loss >= 10 dB
  - gain >= -1 dB
`;

const assessed = (from: string) => assess(from, new Map(), { expressions: true });
const unsolved = assessed(text);
assert.ok(unsolved.model.problem);
const result = solveProblem(unsolved.model.problem);
const [best] = result.solutions;
const titles = (from: string, solved: typeof result | null, solving = true) => ladderLenses(assessed(from), solved, solving)?.lenses.map(({ title, action }) => [title, action]);

describe('solving in the editor', () => {
  it('says above the ladder what can be inserted, or why nothing can', () => {
    const [[title, action]] = titles(text, result) ?? [];
    assert.match(String(title), /^Insert solved values: L1 [\d.]+ nH, C1 [\d.]+ pF \(margin [\d.]+ dB\)$/);
    assert.equal(action, 'insert');
    assert.deepEqual(titles(text, null), [['solving …', null]]);
    assert.deepEqual(titles(text, null, false), [['the solver stopped', null]]);
    assert.deepEqual(titles(text, { ...result, solutions: [], reason: 'an invented reason' }), [['no solution: an invented reason', null]]);
    assert.match(String(titles(text, { ...result, solutions: [{ ...best, holds: false, marginDb: -2 }] })?.[0][0]), /\(misses a goal, margin −2 dB\)$/);
  });

  it('says above the ladder how it stands, and offers to solve again what says from', () => {
    const inserted = text.replace('solve from coils', '8.2 nH from coils').replace('solve from caps or none', '4.7 pF from caps');
    assert.match(String(titles(inserted, null)?.[0][0]), /hold/);
    assert.deepEqual(titles(inserted, null)?.[1], ['Solve again', 'solve again']);
    assert.equal(titles(inserted.replace('from coils\n', 'from coils fixed\n').replace('from caps\n', 'from caps fixed\n'), null)?.length, 1);
    assert.deepEqual(titles(text.replace('18 - j37', '18-37j'), null)?.[0], ['1 error', null]);
    assert.equal(ladderLenses(assessed('ohmward: 1\n'), null, false), null);
  });

  it('puts nothing worse in the place of values that are there', () => {
    const again = (l1: string, c1: string) => {
      const { problem } = buildModel(assessed(text.replace('solve from coils', `${l1} from coils`).replace('solve from caps or none', `${c1} from caps`)).description, new Map(), { reopen: true });
      assert.ok(problem);
      const [found] = solveProblem(problem).solutions;
      return { problem, found };
    };
    const poor = again('8.2 nH', '4.7 pF');
    assert.equal(improves(poor.problem, poor.found), true);
    // Between the values of E12 lies a better match than any of them gives.
    const between = again('11 nH', '4 pF');
    assert.equal(improves(between.problem, between.found), false);
    const same = again('12 nH', '3.9 pF');
    assert.equal(same.found.marginDb, best.marginDb);
    assert.equal(improves(same.problem, same.found), false);
    // A condition that is met counts for more than margin.
    assert.equal(improves(between.problem, { ...between.found, conditionsMissed: 1, marginDb: 99 }), false);
    assert.equal(improves({ ...between.problem, goals: between.problem.goals.map((goal) => ({ ...goal, quantity: 'yield' })) }, between.found), true);
    assert.ok(unsolved.model.problem);
    assert.equal(improves(unsolved.model.problem, { ...best, marginDb: -99 }), true);
  });

  it('puts the best and the next best on the light bulb of a solve', () => {
    const at = (word: string) => ({ start: text.indexOf(word), end: text.indexOf(word) });
    const fixes = solutionFixes(unsolved, result, at('solve from caps'));
    assert.match(fixes[0].title, /^Insert solved values \(margin [\d.]+ dB\)$/);
    assert.equal(fixes[0].preferred, true);
    assert.match(fixes[1].title, /^C1: [\d.]+ pF from caps \(best, margin [\d.]+ dB\)$/);
    assert.match(fixes[2].title, /^C1: .* \(next best, margin [\d.]+ dB\)$/);
    assert.equal(new Set(fixes.map(({ title }) => title)).size, fixes.length);
    const all = assessed(applyEdits(text, fixes[0].edits));
    assert.equal(all.evaluation?.ok, true);
    const alone = applyEdits(text, fixes[1].edits);
    assert.match(alone, /series L1: solve from coils\n {2}- shunt C1: [\d.]+ pF from caps\n/);
    assert.deepEqual(solutionFixes(unsolved, result, at('parts:')), []);
  });

  it('lists candidates with both reflection and gain, and the best of each number of parts', () => {
    const { candidates, message, notes } = candidatesView(result, { stale: false });
    assert.equal(message, '');
    assert.deepEqual(notes, []);
    assert.equal(candidates.length, listedSolutions(result).length);
    assert.deepEqual(candidates.map(({ id }) => id), candidates.map((_, i) => i));
    assert.match(candidates[0].proof, /^proved: none of 2 parts has more than [\d.]+ dB$/);
    assert.match(candidates[0].note, /best of 2 parts/);
    for (const { returnLoss, gain } of candidates) assert.ok(/dB$/.test(returnLoss) && /dB$/.test(gain));
    const one = candidates.find(({ parts }) => parts === '1');
    assert.match(String(one?.note), /best of 1 part/);
    const none = candidatesView({ ...result, solutions: [], byParts: [], reason: 'an invented reason', hints: ['An invented hint.'], outOfReach: [{ form: 'series C, shunt C', reason: 'an invented one' }] }, { stale: true });
    assert.equal(none.message, 'No solution: an invented reason.');
    assert.deepEqual(none.notes, ['An invented hint.']);
    assert.deepEqual(none.outOfReach, [{ form: 'series C, shunt C', text: 'series C, shunt C: out of reach, an invented one.', reach: null }]);
  });

  it('says how far it is', () => {
    assert.equal(progressText({ share: 0.428, bestMarginDb: 1.234 }), '42 %, best margin so far 1.23 dB');
    assert.equal(progressText({ share: 0, bestMarginDb: null }), '0 %');
    assert.equal(progressText({ share: 1, bestMarginDb: -Infinity }), '100 %');
  });

  it('reads the marker with the best candidate in place, unless it belongs to an older text', () => {
    const { problem } = unsolved.model;
    assert.deepEqual(shownProblem(problem, { result, stale: false })?.ladder, best.ladder);
    for (const solved of [null, { result, stale: true }, { result: { ...result, solutions: [] }, stale: false }]) assert.equal(shownProblem(problem, solved), problem);
    const { problem: settled } = solvedAssessment(unsolved, best).model;
    assert.equal(shownProblem(settled, { result, stale: false }), settled);
  });

  it('shows the best candidate in the panel, and says that it is not inserted', () => {
    const context = { fileName: 'valve.match.yaml', pinned: false, markerHz: null };
    const view = panelView(unsolved, { ...context, solved: { result, stale: false } });
    assert.equal(view?.notInserted, true);
    assert.equal(view?.verdict, 'all 2 hold');
    assert.deepEqual(view?.problems, []);
    assert.match(String(view?.ladder.find(({ id }) => id === 'L1')?.value), /nH$/);
    const waiting = panelView(unsolved, { ...context, solved: null, solving: true });
    assert.equal(waiting?.notInserted, false);
    assert.match(String(waiting?.candidates?.message), /being worked out/);
    assert.equal(panelView(unsolved, { ...context, solved: { result, stale: true }, solving: true })?.notInserted, false);
    assert.match(String(panelView(unsolved, { ...context, solved: null })?.candidates?.message), /solver stopped/);
    assert.match(String(panelView(assessed(text.replace('gain >=', 'gane >=')), context)?.candidates?.message), /no errors/);
    const settled = panelView(solvedAssessment(unsolved, best), context);
    assert.equal(settled?.candidates, null);
  });
});
