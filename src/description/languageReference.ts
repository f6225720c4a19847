import { keysAt, type KeyEntry, type KeyPlace } from './keys';
import { referenceExample, referenceSections } from './referenceProse';

/** The language reference for users, in Markdown: the table of keys with their examples, between prose. */
export function languageReference(): string {
  const parts = [
    '# The match description',
    referenceSections.opening,
    yamlBlock(referenceExample),
    '## Keys',
    ...keysAt('description').map((entry) => keySection(entry, entry.example)),
    '## Ladder entries',
    referenceSections.ladder,
    ...keysAt('ladder entry').map((entry) => keySection(entry, `ladder:\n${indented(entry.example, 2)}`)),
    '## Keys inside other keys',
    ...innerKeys('case', 'A case of the load', (lines) => `load:\n  wet bark:\n${indented(lines, 4)}`),
    ...innerKeys('measured item', 'An item of `measured`', (lines) => `measured:\n  - ${indented(lines, 4).trimStart()}`),
    ...innerKeys('firmware', '`firmware`', (lines) => `firmware:\n${indented(lines, 2)}`),
    ...referenceSections.chapters.flatMap(({ title, paragraphs }) => [`## ${title}`, ...paragraphs]),
  ];
  return `${parts.join('\n\n')}\n`;
}

function keySection({ name, text }: KeyEntry, example: string): string {
  return [`### \`${name}\``, text, yamlBlock(example)].join('\n\n');
}

/** The keys of one place together: a list of what they mean, and one example with all of them. */
function innerKeys(place: KeyPlace, title: string, wrap: (lines: string) => string): string[] {
  const entries = keysAt(place);
  const list = entries.map(({ name, text }) => `- \`${name}\`: ${text}`).join('\n');
  return [`### ${title}`, list, yamlBlock(wrap(entries.map((entry) => entry.example).join('\n')))];
}

const yamlBlock = (text: string) => `\`\`\`yaml\n${text}\n\`\`\``;

const indented = (text: string, columns: number) => text.split('\n').map((line) => ' '.repeat(columns) + line).join('\n');
