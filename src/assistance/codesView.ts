import type { ChannelView, CodesView, CoverageView, FirmwareView } from '../messages/panel';
import { returnLossDb } from '../network/figures';
import { printNumber } from '../quantity/printQuantity';
import type { Evaluation } from '../study/evaluation';
import type { Problem } from '../study/problem';
import { channelFigures, codeSteps, type ChannelFigures } from '../study/tuning/bestCodes';
import { usedTunables } from '../study/tuning/codeSpace';
import type { Coverage } from '../study/tuning/coverage';
import { tuneChannels } from '../study/tuning/tuneChannels';
import { channelText, codesVerdict, proofText } from './codesWords';

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

/** With as many decimals in every row, so that a column can be read down. */
const steadyText = (level: number | null): string =>
  (level === null ? 'not known' : Number.isFinite(level) ? `${level.toFixed(2).replace('-', '−')} dB` : `${level > 0 ? '' : '−'}∞ dB`);

const sentence = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);

function channelView({ frequencyHz, codes, marginDb, holds, worstReflection, worstGainDb }: ChannelFigures): ChannelView {
  return {
    frequencyHz, text: channelText(frequencyHz), codes: [...codes.values()], holds,
    margin: steadyText(marginDb), marginDb: marginDb !== null && Number.isFinite(marginDb) ? marginDb : null,
    returnLoss: steadyText(worstReflection === null ? null : returnLossDb(worstReflection)), gain: steadyText(worstGainDb),
  };
}

/** `A wrong code at 915.3 MHz leaves a margin of: antcap one lower 0.30 dB, one higher 1.20 dB; bank one higher −4.00 dB` */
function stepsText(frequencyHz: number, steps: ReturnType<typeof codeSteps>): string {
  const texts = steps.flatMap(({ tunable, lowerDb, higherDb }) => {
    const sides = [...(lowerDb === null ? [] : [`one lower ${steadyText(lowerDb)}`]), ...(higherDb === null ? [] : [`one higher ${steadyText(higherDb)}`])];
    return sides.length === 0 ? [] : [`${tunable} ${sides.join(', ')}`];
  });
  return texts.length === 0 ? '' : `A wrong code at ${channelText(frequencyHz)} leaves a margin of: ${texts.join('; ')}`;
}

function coverageView({ frequencyHz, across, marginDb, share, cases }: Coverage): CoverageView {
  return {
    text: `Some code brings ${printNumber(100 * share, 2)} % of the chart to the goals at ${channelText(frequencyHz)}`,
    across,
    marginDb: Array.from(marginDb, (margin) => (Number.isFinite(margin) ? margin : null)),
    cases: cases.map(({ caseName, reflection, marginDb: margin }) => ({
      caseName: caseName ?? 'load', reflection, holds: margin !== null && margin >= 0,
      text: margin === null ? 'not known here' : margin >= 0 ? `covered, ${steadyText(margin)} to spare` : `not covered, ${steadyText(-margin)} short`,
    })),
  };
}
