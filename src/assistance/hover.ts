import { contains, type Span } from '../base/span';
import { keys } from '../description/keys';
import { lineMap } from '../base/lineMap';
import type { Assessment } from './assess';
import { nameAtOffset } from './definition';
import { goalHover, bandHover } from './hoverGoals';
import { elementHover } from './hoverElement';
import { familyHover, fileHover, loadHover, sourceHover } from './hoverPorts';

export interface Hover {
  readonly span: Span;
  /** Markdown without HTML and without links. */
  readonly markdown: string;
}

/** What stands at the offset amounts to; null where there is nothing to say. */
export function hoverAt(assessment: Assessment, offset: number): Hover | null {
  const { syntax, files } = assessment.description;
  const file = files.find(({ span, within }) => within === null && contains(span, offset));
  if (file) return fileHover(assessment, file);
  const goal = syntax.goals.find(({ span }) => contains(span, offset));
  const named = nameAtOffset(assessment.description, offset);
  if (named?.kind === 'band') return bandHover(assessment, named.name, spanAt(named, offset));
  if (named?.kind === 'family') return familyHover(assessment, named.name, spanAt(named, offset));
  if (goal) return goalHover(assessment, goal);
  const element = syntax.ladder?.elements.find(({ span }) => contains(span, offset));
  if (element) return elementHover(assessment, element);
  const source = syntax.sources.find(({ span }) => contains(span, offset));
  if (source) return sourceHover(assessment, source);
  const loadCase = syntax.load?.cases.find(({ span, name }) => contains(span, offset) || (name !== null && contains(name.span, offset)));
  if (loadCase) return loadHover(assessment, loadCase);
  const band = syntax.bands.find(({ span }) => contains(span, offset));
  if (band) return bandHover(assessment, band.name.value, band.span);
  const family = syntax.families.find(({ span }) => contains(span, offset));
  return family ? familyHover(assessment, family.name.value, family.span) : keyHover(syntax.text, offset);
}

const spanAt = ({ definition, references }: { readonly definition: Span | null; readonly references: readonly Span[] }, offset: number): Span =>
  [...(definition ? [definition] : []), ...references].find((span) => contains(span, offset))!;

/** A key of the first level, explained. */
function keyHover(text: string, offset: number): Hover | null {
  const { line } = lineMap(text).positionAt(offset);
  const { start, end } = lineMap(text).lineSpan(line);
  const written = /^([\w]+)\s*:/.exec(text.slice(start, end));
  const entry = written && offset <= start + written[1].length ? keys.find(({ name, place }) => name === written[1] && place === 'description') : undefined;
  return entry && written ? { span: { start, end: start + written[1].length }, markdown: `**${entry.name}**: ${entry.text}\n\n\`\`\`yaml\n${entry.example}\n\`\`\`` } : null;
}
