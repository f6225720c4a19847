import type { Span } from '../base/span';
import { printQuantity } from '../quantity/printQuantity';
import type { Problem, Tunable } from '../study/problem';
import { channelFigures } from '../study/tuning/bestCodes';
import { tuneChannels } from '../study/tuning/tuneChannels';
import type { Assessment } from './assess';
import { channelText, codesVerdict, proofText } from './codesWords';
import type { Hover } from './hover';
import { plainText } from './markdown';

const units = { resistor: 'Ω', inductor: 'H', capacitor: 'F' } as const;

const valueText = ({ kind }: Tunable, value: number): string => printQuantity(value, units[kind], { digits: 4 });

/** A tunable: what its codes reach from and to, what it sets, and which codes the channels take. */
export function tunableHover(assessment: Assessment, name: string, span: Span): Hover | null {
  const tunable = assessment.model.problem?.tunables.find((each) => each.name === name);
  if (!tunable || tunable.states.length === 0) return null;
  const values = tunable.states.map(({ part }) => part.value);
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const count = `${tunable.states.length} code${tunable.states.length === 1 ? '' : 's'}`;
  const sets = tunable.elements.length === 0 ? 'It sets no element of the ladder.' : `It sets ${tunable.elements.map(plainText).join(' and ')}.`;
  return { span, markdown: [`**${plainText(name)}**, a tunable ${tunable.kind}: ${count}, ${valueText(tunable, low)} to ${valueText(tunable, high)}. ${sets}`, ...codesInUse(assessment, tunable)].join('\n\n') };
}

/** Which codes stand where; nothing where the element is not set by one. */
export function codesOfElement(assessment: Assessment, elementName: string): readonly string[] {
  const tunable = assessment.model.problem?.tunables.find(({ elements }) => elements.includes(elementName));
  return tunable ? [`Set by ${plainText(tunable.name)}.`, ...codesInUse(assessment, tunable)] : [];
}

function codesInUse({ evaluation }: Assessment, tunable: Tunable): string[] {
  const tuning = evaluation?.tuning;
  if (!tuning) return [];
  const codes = tuning.codes.flatMap((each) => each.get(tunable.name) ?? []);
  const shown = tuning.codes[tuning.shown].get(tunable.name);
  const state = tunable.states.find(({ code }) => code === shown);
  if (codes.length === 0 || !state) return [];
  const [least, most] = [Math.min(...codes), Math.max(...codes)];
  const range = least === most ? `code ${least}` : `codes ${least} to ${most}`;
  return [`${codes.length} channel${codes.length === 1 ? ' takes' : 's take'} ${range}; at ${channelText(tuning.channelsHz[tuning.shown])} code ${state.code}, ${valueText(tunable, state.part.value)}.`];
}

/** Channels: how many hold, the least margin, and whether the codes are proved. */
export function channelsHover({ evaluation, model: { problem } }: Assessment, span: Span): Hover | null {
  return problem && evaluation?.tuning ? { span, markdown: `**channels**: ${channelsText(problem)}` } : null;
}

function channelsText(problem: Problem): string {
  const figures = tuneChannels(problem).map(channelFigures);
  return `${plainText(codesVerdict(figures))}\n\n${plainText(proofText(figures))}`;
}
