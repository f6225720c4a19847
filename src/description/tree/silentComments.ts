import type { CST } from 'yaml';
import type { Diagnostic } from '../../base/diagnostic';
import { diagnosticsAtMost } from '../limits';
import { lineAt } from './lineAt';
import type { RepairedText } from './repairedText';
import { visitTokens } from './visitTokens';

/**
 * Warnings for comments that look like part of the phrase before them: `title: Board #4`. A comment after a phrase is
 * taken as meant where its `#` has a space (or nothing, or another `#`) after it or more than one space before it.
 */
export function silentComments(tokens: readonly CST.Token[], { text, toOriginal }: RepairedText): Diagnostic[] {
  const found: Diagnostic[] = [];
  visitTokens(tokens, (token) => {
    if (token.type !== 'comment' || found.length >= diagnosticsAtMost) return;
    const at = token.offset;
    if (!/^#[^\s#]/.test(token.source) || text[at - 1] !== ' ' || /\s/.test(text[at - 2] ?? ' ')) return;
    const before = text.slice(lineAt(text, at).start, at).trim();
    if (before === '' || before === '-') return;
    const span = { start: toOriginal(at), end: toOriginal(at + token.source.length) };
    found.push({
      code: 'silent-comment', severity: 'warning', span,
      message: '« #» starts a comment in YAML, so that the phrase ends before it. Put the phrase in quotes, or a space after the # where a comment is meant.',
      fixes: [{ title: 'Write it as a comment', edits: [{ span: { start: span.start + 1, end: span.start + 1 }, text: ' ' }] }],
    });
  });
  return found;
}
