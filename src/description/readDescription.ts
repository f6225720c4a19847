import type { Diagnostic, Report } from '../base/diagnostic';
import type { Description, ReadOptions } from './description';
import { fileReferences } from './fileReferences';
import { keysAt } from './keys';
import { orderedDiagnostics } from './orderedDiagnostics';
import type { LetValue } from './phrase/phrase';
import { readRangePhrase } from './phrase/readRange';
import { readElements } from './sections/readElements';
import { readLadder } from './sections/readLadder';
import { readLoad } from './sections/readLoad';
import { readMeasured } from './sections/readMeasured';
import { readBands, readChannels, readFamilies, readGoals, readLets } from './sections/readNamed';
import { readBuilds, readFirmware, readPower, readSeed, readSpread, readTitle, readVersion, readZ0 } from './sections/readSettings';
import { readSources } from './sections/readSources';
import { readTunables } from './sections/readTunables';
import { expectScalar, mistake, reportShape, shapeOf, type SectionContext } from './sections/sectionContext';
import { reportUnknownKey } from './sections/unknownKey';
import type { DescriptionSyntax, ElementSyntax } from './syntax';
import type { MappingNode, TreeEntry } from './tree/treeNode';
import { yamlTree } from './tree/yamlTree';

type Draft = { -readonly [K in keyof DescriptionSyntax]: DescriptionSyntax[K] };

/**
 * Reads any text as a match description. Never throws: what cannot be read is reported with its place and left null in
 * the tree, everything else is there. At most the first 100 mistakes.
 */
export function readDescription(text: string, options: ReadOptions): Description {
  const diagnostics: Diagnostic[] = [];
  const report: Report = (diagnostic) => void diagnostics.push(diagnostic);
  const tree = yamlTree(text);
  const syntax = emptySyntax(text);
  if (tree.root?.form === 'mapping') {
    readSections(tree.root, syntax, { report, lets: new Map(), expressions: options.expressions, text }, tree.unexplained.length > 0);
  } else if (tree.root) {
    report(mistake('wrong-shape', `A match description is a mapping of keys, such as «ohmward: 1», not ${shapeOf(tree.root)}.`, firstLine(text)));
  } else if (tree.diagnostics.length === 0) {
    report(mistake('empty-description', 'Nothing is described yet; a description starts with «ohmward: 1», then «load» and «ladder».', { start: 0, end: 0 }));
  }
  const kept = diagnostics.filter((diagnostic) => !isEcho(diagnostic, tree.unexplained, text));
  return { syntax, diagnostics: orderedDiagnostics([...tree.diagnostics, ...kept]), files: fileReferences(syntax) };
}

const shapeCodes: ReadonlySet<string> = new Set(['unknown-key', 'missing-value', 'wrong-shape', 'missing-key', 'element-without-phrase']);

/** Where YAML itself cannot make sense of a line, what we find missing there is only its echo. */
function isEcho(diagnostic: Diagnostic, unexplained: readonly number[], text: string): boolean {
  if (!shapeCodes.has(diagnostic.code)) return false;
  return unexplained.some((line) => line <= diagnostic.span.start && !/[\n\r]/.test(text.slice(line, diagnostic.span.start)));
}

export function emptySyntax(text: string): Draft {
  return {
    text, title: null, z0Ohm: null, powerW: null, sources: [], bands: [], sweep: null, load: null, fixture: [], ladder: null, families: [], lets: [],
    goals: [], tunables: [], channels: null, firmware: null, spread: null, builds: null, seed: null, measured: [],
  };
}

function readSections(root: MappingNode, syntax: Draft, context: SectionContext, broken: boolean): void {
  // Names of `let` serve the whole text, wherever they stand in it.
  const letEntry = root.entries.find(({ key }) => key.phrase.text === 'let');
  const { lets, values } = letEntry ? readLets(letEntry, context) : { lets: [], values: new Map<string, LetValue>() };
  syntax.lets = lets;
  const inner: SectionContext = { ...context, lets: values };
  for (const entry of root.entries) {
    const read = sectionReaders[entry.key.phrase.text];
    if (Object.hasOwn(sectionReaders, entry.key.phrase.text)) read(entry, syntax, inner);
    else reportUnknownKey(entry.key, 'description', inner);
  }
  for (const { name } of keysAt('description').filter((entry) => entry.required)) {
    // A key on a line that YAML cannot read is there all the same.
    if (root.entries.some(({ key }) => key.phrase.text === name) || (broken && new RegExp(`^[ \\t]*${name}[ \\t]*:`, 'm').test(context.text))) continue;
    const fixes = name === 'ohmward' ? [{ title: 'Insert «ohmward: 1»', edits: [{ span: { start: root.span.start, end: root.span.start }, text: 'ohmward: 1\n' }], preferred: true }] : undefined;
    inner.report(mistake('missing-key', `«${name}» is missing; a description needs «ohmward», «load» and «ladder».`, firstLine(context.text), { fixes }));
  }
}

const sectionReaders: Readonly<Record<string, (entry: TreeEntry, syntax: Draft, context: SectionContext) => void>> = {
  ohmward: (entry, _syntax, context) => readVersion(entry, context),
  title: (entry, syntax, context) => { syntax.title = readTitle(entry, context); },
  z0: (entry, syntax, context) => { syntax.z0Ohm = readZ0(entry, context); },
  source: (entry, syntax, context) => { syntax.sources = readSources(entry, context); },
  power: (entry, syntax, context) => { syntax.powerW = readPower(entry, context); },
  bands: (entry, syntax, context) => { syntax.bands = readBands(entry, context); },
  sweep: (entry, syntax, context) => {
    const node = expectScalar(entry, context);
    syntax.sweep = node && readRangePhrase(node.phrase, 'frequency', context);
  },
  load: (entry, syntax, context) => { syntax.load = readLoad(entry, context); },
  fixture: (entry, syntax, context) => { syntax.fixture = readFixture(entry, context); },
  ladder: (entry, syntax, context) => { syntax.ladder = readLadder(entry, context); },
  parts: (entry, syntax, context) => { syntax.families = readFamilies(entry, context); },
  let: () => undefined,
  goals: (entry, syntax, context) => { syntax.goals = readGoals(entry, context); },
  tunables: (entry, syntax, context) => { syntax.tunables = readTunables(entry, context); },
  channels: (entry, syntax, context) => { syntax.channels = readChannels(entry, context); },
  firmware: (entry, syntax, context) => { syntax.firmware = readFirmware(entry, context); },
  spread: (entry, syntax, context) => { syntax.spread = readSpread(entry, context); },
  builds: (entry, syntax, context) => { syntax.builds = readBuilds(entry, context); },
  seed: (entry, syntax, context) => { syntax.seed = readSeed(entry, context); },
  measured: (entry, syntax, context) => { syntax.measured = readMeasured(entry, context); },
};

function readFixture(entry: TreeEntry, context: SectionContext): readonly ElementSyntax[] {
  if (entry.value?.form === 'list' || entry.value?.form === 'mapping') return readElements(entry.value, context);
  reportShape(entry, 'a list of elements, from the load outwards', context);
  return [];
}

function firstLine(text: string): { start: number; end: number } {
  const end = text.search(/[\n\r]/);
  return { start: 0, end: end < 0 ? text.length : end };
}
