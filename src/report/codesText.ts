import { channelText, codesVerdict, levelText, proofText, stepText } from '../assistance/codesWords';
import { returnLossDb } from '../network/figures';
import type { CodedFile } from './codesJson';

/** The codes for people: a row a channel, what a wrong code would leave, and whether better ones may exist. */
export function codesText({ path, channels, reason }: CodedFile): string {
  const [first] = channels;
  if (first === undefined) return `${path}: no codes: ${reason ?? 'there is no channel'}\n`;
  const names = [...first.codes.keys()];
  const heads = ['channel', ...names, 'margin', 'return loss', 'gain', ...names.map((name) => `${name} ±1`)];
  const rows = channels.map((channel) => [
    channelText(channel.frequencyHz), ...[...channel.codes.values()].map(String),
    `${levelText(channel.marginDb)}${channel.holds ? '' : ' ✗'}`,
    levelText(channel.worstReflection === null ? null : returnLossDb(channel.worstReflection)), levelText(channel.worstGainDb), ...channel.steps.map(stepText),
  ]);
  const widths = heads.map((head, c) => Math.max(head.length, ...rows.map((row) => row[c].length)));
  const line = (cells: readonly string[]): string => `  ${cells.map((cell, c) => cell.padStart(widths[c])).join('  ')}`;
  const notes = [...new Set(channels.flatMap((channel) => channel.reason ?? []))].map((text) => `  ! ${text}`);
  return [`${path}: ${codesVerdict(channels)}`, line(heads), ...rows.map(line), `  ${proofText(channels)}`, ...notes, ''].join('\n');
}
