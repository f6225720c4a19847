import { returnLossDb } from '../network/figures';
import { printNumber, printQuantity } from '../quantity/printQuantity';
import type { ChannelCodes } from '../study/tuning/bestCodes';
import type { CodedFile } from './codesJson';

/** The codes for people: a row a channel, what a wrong code would leave, and whether better ones may exist. */
export function codesText({ path, channels, reason }: CodedFile): string {
  const [first] = channels;
  if (first === undefined) return `${path}: no codes: ${reason ?? 'there is no channel'}\n`;
  const names = [...first.codes.keys()];
  const heads = ['channel', ...names, 'margin', 'return loss', 'gain', ...names.map((name) => `${name} ±1`)];
  const rows = channels.map((channel) => [
    printQuantity(channel.frequencyHz, 'Hz', { digits: 7 }), ...[...channel.codes.values()].map(String),
    `${level(channel.marginDb)}${channel.holds ? '' : ' ✗'}`,
    level(channel.worstReflection === null ? null : returnLossDb(channel.worstReflection)), level(channel.worstGainDb), ...channel.steps.map(stepText),
  ]);
  const widths = heads.map((head, c) => Math.max(head.length, ...rows.map((row) => row[c].length)));
  const line = (cells: readonly string[]): string => `  ${cells.map((cell, c) => cell.padStart(widths[c])).join('  ')}`;
  const notes = [...new Set(channels.flatMap((channel) => channel.reason ?? []))].map((text) => `  ! ${text}`);
  return [`${path}: ${verdict(channels)}`, line(heads), ...rows.map(line), `  ${proofText(channels)}`, ...notes, ''].join('\n');
}

const level = (value: number | null): string => (value === null ? 'not known' : `${printNumber(value, 3)} dB`);

/** The lesser of the margins one code lower and higher. */
function stepText({ lowerDb, higherDb }: ChannelCodes['steps'][number]): string {
  const margins = [lowerDb, higherDb].filter((margin) => margin !== null);
  return margins.length === 0 ? '–' : level(Math.min(...margins));
}

function verdict(channels: readonly ChannelCodes[]): string {
  const held = channels.filter(({ holds }) => holds).length;
  const count = `${channels.length} channel${channels.length === 1 ? '' : 's'}`;
  const byGain = channels.every((channel) => channel.byGain);
  const known = channels.filter((channel) => channel.marginDb !== null && channel.byGain === byGain);
  const worst = known.reduce<ChannelCodes | null>((least, each) => (least === null || (each.marginDb ?? 0) < (least.marginDb ?? 0) ? each : least), null);
  const where = worst === null ? '' : `; least ${byGain ? 'gain' : 'margin'} ${level(worst.marginDb)} at ${printQuantity(worst.frequencyHz, 'Hz', { digits: 7 })}`;
  return `${held < channels.length ? `goals hold at ${held} of ${count}` : byGain ? count : `every goal holds at ${count}`}${where}`;
}

const proofText = (channels: readonly ChannelCodes[]): string =>
  channels.every(({ proved }) => proved) ? 'proved: every combination of codes was looked at' : 'the best that were found; it is not proved that there are no better ones';
