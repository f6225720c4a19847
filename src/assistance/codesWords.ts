import { printNumber, printQuantity } from '../quantity/printQuantity';
import type { ChannelFigures, CodeStep } from '../study/tuning/bestCodes';

export const channelText = (frequencyHz: number): string => printQuantity(frequencyHz, 'Hz', { digits: 7 });

export const levelText = (value: number | null): string => (value === null ? 'not known' : `${printNumber(value, 3)} dB`);

/** The lesser of the margins one code lower and higher. */
export function stepText({ lowerDb, higherDb }: CodeStep): string {
  const margins = [lowerDb, higherDb].filter((margin) => margin !== null);
  return margins.length === 0 ? '–' : levelText(Math.min(...margins));
}

/** `every goal holds at 50 channels; least margin 1.2 dB at 927.3 MHz` */
export function codesVerdict(channels: readonly ChannelFigures[]): string {
  const held = channels.filter(({ holds }) => holds).length;
  const count = `${channels.length} channel${channels.length === 1 ? '' : 's'}`;
  const byGain = channels.every((channel) => channel.byGain);
  const known = channels.filter((channel) => channel.marginDb !== null && channel.byGain === byGain);
  const worst = known.reduce<ChannelFigures | null>((least, each) => (least === null || (each.marginDb ?? 0) < (least.marginDb ?? 0) ? each : least), null);
  const where = worst === null ? '' : `; least ${byGain ? 'gain' : 'margin'} ${levelText(worst.marginDb)} at ${channelText(worst.frequencyHz)}`;
  return `${held < channels.length ? `goals hold at ${held} of ${count}` : byGain ? count : `every goal holds at ${count}`}${where}`;
}

export const proofText = (channels: readonly ChannelFigures[]): string =>
  channels.every(({ proved }) => proved) ? 'proved: every combination of codes was looked at' : 'the best that were found; it is not proved that there are no better ones';
