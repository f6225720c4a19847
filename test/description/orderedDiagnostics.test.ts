import assert from 'node:assert/strict';
import type { Diagnostic } from '../../src/base/diagnostic';
import { assess } from '../../src/assistance/assess';
import { orderedDiagnostics } from '../../src/description/orderedDiagnostics';

const at = (start: number, code: string, severity: Diagnostic['severity'] = 'error'): Diagnostic => ({ code, severity, message: code, span: { start, end: start + 1 } });

describe('the order of diagnostics', () => {
  it('is that of the text, each once', () => {
    assert.deepEqual(orderedDiagnostics([at(5, 'b'), at(2, 'a'), at(5, 'b'), at(5, 'c', 'warning')]).map(({ code }) => code), ['a', 'b', 'c']);
  });

  it('says once what a second colon does to a phrase', () => {
    const { diagnostics } = assess('ohmward: 1\nload: 18 - j37 Ω\nbands: {b: 868 MHz}\nladder:\n  - series L1: 6.8 nH: x\n', new Map(), { expressions: true });
    assert.deepEqual(diagnostics.map(({ code }) => code), ['second-colon']);
    assert.deepEqual(orderedDiagnostics([at(4, 'second-colon'), at(9, 'unexpected-words')]).map(({ code }) => code), ['second-colon', 'unexpected-words']);
  });
});
