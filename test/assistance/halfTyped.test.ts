import assert from 'node:assert/strict';
import fc from 'fast-check';
import { completionsAt } from '../../src/assistance/completion';
import { definitionAt, referencesAt } from '../../src/assistance/definition';
import { documentLinks } from '../../src/assistance/documentLinks';
import { elementAt } from '../../src/assistance/elementAt';
import { foldingSpans } from '../../src/assistance/folding';
import { hoverAt } from '../../src/assistance/hover';
import { inlayHints } from '../../src/assistance/inlayHints';
import { outline } from '../../src/assistance/outline';
import { renameEdits } from '../../src/assistance/rename';
import { setValue, steppedValue } from '../../src/assistance/steppedValue';
import { applyEdits } from '../../src/base/diagnostic';
import { seeds } from '../hostile/descriptionSeeds';
import { assessed, board } from './support';

/** Asks everything at one place; every span that comes back lies in the text and every edit can be made. */
function askAll(text: string, offset: number): void {
  const assessment = assessed(text);
  const { description } = assessment;
  const inside = (span: { start: number; end: number } | null) => assert.ok(span === null || (0 <= span.start && span.start <= span.end && span.end <= text.length));
  const hover = hoverAt(assessment, offset);
  inside(hover?.span ?? null);
  assert.ok(hover === null || (hover.markdown !== '' && !/NaN|undefined|Infinity/.test(hover.markdown)), hover?.markdown);
  for (const { offset: at, label } of inlayHints(assessment, { start: 0, end: text.length })) {
    inside({ start: at, end: at });
    assert.doesNotMatch(label, /NaN|undefined/);
  }
  documentLinks(description).forEach(({ span }) => inside(span));
  outline(description).forEach(({ span }) => inside(span));
  foldingSpans(description).forEach(inside);
  inside(definitionAt(description, offset));
  referencesAt(description, offset).forEach(inside);
  for (const { span, label } of completionsAt(assessment, offset)) {
    inside(span);
    assert.ok(span.start <= offset && offset <= span.end, label);
    assert.doesNotMatch(text.slice(span.start, span.end), /[\n\r]/);
    assert.doesNotMatch(label, /NaN|undefined|Infinity/);
  }
  const { elementId } = elementAt(assessment, offset);
  const made = [renameEdits(description, offset, 'other'), ...(elementId === null ? [] : [steppedValue(assessment, elementId, 'up'), steppedValue(assessment, elementId, 'down'), setValue(assessment, elementId, '3.3 pF')])];
  for (const each of made) {
    if ('refusal' in each) assert.ok(each.refusal.length > 5);
    else applyEdits(text, each);
  }
}

describe('what an editor asks of half-typed text', () => {
  it('is answered wherever the text ends', () => {
    for (const text of [board, seeds[0]]) {
      for (let end = 0; end <= text.length; end += 7) askAll(text.slice(0, end), end);
    }
  });

  it('is answered for text with a piece missing', () => {
    const holes = fc.record({ seed: fc.constantFrom(board, ...seeds), from: fc.double({ min: 0, max: 1, noNaN: true }), length: fc.integer({ min: 0, max: 30 }), at: fc.double({ min: 0, max: 1, noNaN: true }) });
    fc.assert(fc.property(holes, ({ seed, from, length, at }) => {
      const start = Math.floor(from * seed.length);
      const text = seed.slice(0, start) + seed.slice(start + length);
      askAll(text, Math.floor(at * text.length));
      askAll(text, Math.min(start, text.length));
    }), { numRuns: 60 });
  });
});
