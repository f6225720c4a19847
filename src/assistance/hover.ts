import { contains, type Span } from '../base/span';
import { keys, type KeyPlace } from '../description/keys';
import { lineMap } from '../base/lineMap';
import type { Assessment } from './assess';
import { nameAtOffset } from './definition';
import { goalHover, bandHover } from './hoverGoals';
import { elementHover } from './hoverElement';
import { channelsHover, tunableHover } from './hoverTunables';
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
  const loaded = syntax.load?.cases.find(({ impedance }) => impedance.form === 'file' && contains(impedance.span, offset));
  if (file) {
    const own = fileHover(assessment, file);
    const amounts = loaded ? loadHover(assessment, loaded) : null;
    return amounts ? { span: own.span, markdown: `${own.markdown}\n\n${amounts.markdown}` } : own;
  }
  const goal = syntax.goals.find(({ span }) => contains(span, offset));
  const named = nameAtOffset(assessment.description, offset);
  if (named?.kind === 'band') return bandHover(assessment, named.name, spanAt(named, offset));
  if (named?.kind === 'family') return familyHover(assessment, named.name, spanAt(named, offset));
  if (named?.kind === 'tunable') return tunableHover(assessment, named.name, spanAt(named, offset));
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
  if (family) return familyHover(assessment, family.name.value, family.span);
  const tunable = syntax.tunables.find(({ span }) => contains(span, offset));
  if (tunable) return tunableHover(assessment, tunable.name.value, tunable.span);
  return (syntax.channels && contains(syntax.channels.span, offset) ? channelsHover(assessment, syntax.channels.span) : null) ?? keyHover(syntax.text, offset);
}

const spanAt = ({ definition, references }: { readonly definition: Span | null; readonly references: readonly Span[] }, offset: number): Span =>
  [...(definition ? [definition] : []), ...references].find((span) => contains(span, offset))!;

/** A key, explained: of the first level, or of firmware, a load case or a measurement. */
function keyHover(text: string, offset: number): Hover | null {
  const lines = lineMap(text);
  const { start, end } = lines.lineSpan(lines.positionAt(offset).line);
  const written = /^(\s*(?:-\s+)?)(\w+)\s*:/.exec(text.slice(start, end));
  if (!written) return null;
  const [, indent, word] = written;
  const span = { start: start + indent.length, end: start + indent.length + word.length };
  const section = indent === '' ? 'description' : [...text.slice(0, start).matchAll(/^(\w+)[ \t]*:/gm)].at(-1)?.[1] ?? '';
  const entry = keys.find(({ name, place }) => name === word && place === (keyPlaces[section] ?? null));
  return entry && contains(span, offset) ? { span, markdown: `**${entry.name}**: ${entry.text}\n\n\`\`\`yaml\n${entry.example}\n\`\`\`` } : null;
}

const keyPlaces: Readonly<Record<string, KeyPlace>> = { description: 'description', firmware: 'firmware', load: 'case', measured: 'measured item' };
