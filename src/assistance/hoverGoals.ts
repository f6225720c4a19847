import type { Span } from '../base/span';
import type { GoalSyntax } from '../description/syntax';
import { printNumber, printQuantity } from '../quantity/printQuantity';
import type { Assessment } from './assess';
import { goalSyntaxOf } from './goalDiagnostics';
import { goalDetail, goalMarginText, goalPlace, goalTitle, goalValueText } from './goalText';
import type { Hover } from './hover';
import { goalLimitLines, limitLines } from './limitText';
import { plainText, rowsTable } from './markdown';

export function goalHover({ description, model, evaluation }: Assessment, syntax: GoalSyntax): Hover {
  const result = evaluation?.goals.find((candidate) => goalSyntaxOf(description, candidate.goal) === syntax);
  if (!result) return { span: syntax.span, markdown: 'Nothing is known of this goal yet.' };
  const place = goalPlace(result.goal);
  const lines = [
    `**${plainText(goalTitle(result.goal))}**${place && `, ${plainText(place)}`}: ${result.ok ? 'holds' : 'missed'}`,
    '',
    [`worst value ${goalValueText(result)}`, goalMarginText(result), plainText(goalDetail(result))].filter((text) => text !== '').join(', '),
  ];
  if (model.problem) lines.push(...goalLimitLines(model.problem, result).flatMap((line) => ['', plainText(line)]));
  return { span: syntax.span, markdown: lines.join('\n') };
}

export function bandHover({ model: { problem }, evaluation }: Assessment, name: string, span: Span): Hover | null {
  const band = problem?.bands.find((candidate) => candidate.name === name);
  if (!band) return null;
  const points = band.frequencyHz;
  const [start, stop] = [points[0], points[points.length - 1]];
  const extent = start === stop ? printQuantity(start, 'Hz', { digits: 7 })
    : `${printQuantity(start, 'Hz', { digits: 7 })} to ${printQuantity(stop, 'Hz', { digits: 7 })}, ${printQuantity(stop - start, 'Hz', { digits: 4 })} or ${printNumber(((stop - start) / Math.sqrt(start * stop)) * 100, 3)} % wide, judged at ${points.length} points`;
  const rows = (evaluation?.bands.find((candidate) => candidate.name === name)?.cases ?? []).map((result): [string, string] => [
    plainText(result.caseName ?? 'load'),
    result.worstReturnLossDb === null && result.reason !== null ? plainText(result.reason)
      : `worst return loss ${result.worstReturnLossDb === null ? '∞' : `${printNumber(result.worstReturnLossDb, 3)} dB`}, worst gain ${result.worstGainDb === null ? '−∞' : `${printNumber(result.worstGainDb, 3)} dB`}`,
  ]);
  return { span, markdown: [`**${plainText(name)}**: ${extent}${band.watch ? '; watched only' : ''}`, '', rowsTable(rows), ...(problem ? limitLines(problem, name) : []).flatMap((line) => ['', plainText(line)])].join('\n') };
}
