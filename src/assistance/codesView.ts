import type { ChannelView, CodesView, CoverageView, FirmwareView } from '../messages/panel';
import { returnLossDb } from '../network/figures';
import { printNumber } from '../quantity/printQuantity';
import type { Evaluation } from '../study/evaluation';
import type { Problem } from '../study/problem';
import { channelFigures, codeSteps, type ChannelFigures } from '../study/tuning/bestCodes';
import { usedTunables } from '../study/tuning/codeSpace';
import type { Coverage } from '../study/tuning/coverage';
import { tuneChannels } from '../study/tuning/tuneChannels';
import { channelText, codesVerdict, levelText, proofText } from './codesWords';

export interface CodesContext {
  /** Of the channel at the marker; a text where there is none, null while it is worked out. */
  readonly coverage: Coverage | string | null;
  readonly firmware: readonly FirmwareView[];
}

/** Codes by channel as the panel shows them; null where nothing is set by a code. */
export function codesView(problem: Problem, { tuning }: Evaluation, { coverage, firmware }: CodesContext): CodesView | null {
  if (!tuning) return null;
  const tuned = tuneChannels(problem);
  const figures = tuned.map(channelFigures);
  const current = coverage !== null && typeof coverage !== 'string' && coverage.frequencyHz !== tuned[tuning.shown].channel.frequencyHz ? null : coverage;
  return {
    summary: sentence(codesVerdict(figures)),
    tunables: usedTunables(problem).map(({ name, states }) => ({ name, low: states[0].code, high: states[states.length - 1].code })),
    channels: figures.map(channelView),
    shown: tuning.shown,
    stepsText: stepsText(tuned[tuning.shown].channel.frequencyHz, codeSteps(tuned[tuning.shown])),
    proof: sentence(proofText(figures)),
    firmware,
    coverage: current !== null && typeof current !== 'string' ? coverageView(current) : null,
    coverageText: typeof current === 'string' ? `No coverage: ${current}.` : current === null ? 'Coverage is being worked out …' : '',
  };
}

const sentence = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);

function channelView({ frequencyHz, codes, marginDb, holds, worstReflection, worstGainDb }: ChannelFigures): ChannelView {
  return {
    frequencyHz, text: channelText(frequencyHz), codes: [...codes.values()], holds,
    margin: levelText(marginDb), marginDb: marginDb !== null && Number.isFinite(marginDb) ? marginDb : null,
    returnLoss: levelText(worstReflection === null ? null : returnLossDb(worstReflection)), gain: levelText(worstGainDb),
  };
}

/** `One code off at 915.3 MHz leaves: antcap −1 0.3 dB, +1 1.2 dB; bank +1 −4 dB` */
function stepsText(frequencyHz: number, steps: ReturnType<typeof codeSteps>): string {
  const texts = steps.flatMap(({ tunable, lowerDb, higherDb }) => {
    const sides = [...(lowerDb === null ? [] : [`−1 ${levelText(lowerDb)}`]), ...(higherDb === null ? [] : [`+1 ${levelText(higherDb)}`])];
    return sides.length === 0 ? [] : [`${tunable} ${sides.join(', ')}`];
  });
  return texts.length === 0 ? '' : `One code off at ${channelText(frequencyHz)} leaves a margin of: ${texts.join('; ')}`;
}

function coverageView({ frequencyHz, across, marginDb, share, cases }: Coverage): CoverageView {
  return {
    text: `Some code brings ${printNumber(100 * share, 2)} % of the chart to the goals at ${channelText(frequencyHz)}`,
    across,
    marginDb: Array.from(marginDb, (margin) => (Number.isFinite(margin) ? margin : null)),
    cases: cases.map(({ caseName, reflection, marginDb: margin }) => ({
      caseName: caseName ?? 'load', reflection, holds: margin !== null && margin >= 0,
      text: margin === null ? 'not known here' : margin >= 0 ? `covered, ${levelText(margin)} to spare` : `not covered, ${levelText(-margin)} short`,
    })),
  };
}
