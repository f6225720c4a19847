import { lineMap } from '../base/lineMap';
import { keysAt, type KeyEntry, type KeyPlace } from '../description/keys';
import { elementKeywords } from '../description/phrase/readElementKey';
import { partKinds } from '../description/phrase/readFamily';
import type { DescriptionSyntax } from '../description/syntax';
import { seriesNames } from '../quantity/preferredSeries';
import type { Assessment } from './assess';
import { bandOffers, caseOffers, goalOffers } from './completeGoal';
import { figureOffers, partOffers } from './completePart';
import { unitOffers, type UnitKind } from './completeUnit';
import { completionsOf, nothingToOffer, offer, type Completion, type Offer, type Offers } from './completionItem';

/**
 * What may stand at the offset, by the section and the words before it: read from the lines themselves, so that it works on
 * any half-typed text. `paths` are files that could be named, relative to the description.
 */
export function completionsAt(assessment: Assessment, offset: number, paths: readonly string[] = []): Completion[] {
  const { text } = assessment.description.syntax;
  const lines = lineMap(text);
  const { start, end } = lines.lineSpan(lines.positionAt(offset).line);
  const before = text.slice(start, offset);
  if (/(?:^|\s)#/.test(before)) return [];
  const rest = text.slice(offset, end).replace(/\s#.*$/, '');
  const found = offersAt(assessment, { before, rest, above: text.slice(0, start), known: distinct([...paths, ...assessment.description.files.map(({ path }) => path)]) });
  // YAML wants a blank behind the colon of a key.
  const offers = before.endsWith(':') && found.before === 0 ? found.offers.map((each) => ({ ...each, insertText: ` ${each.insertText ?? each.label}` })) : found.offers;
  return completionsOf(offers, { start: offset - found.before, end: offset + (found.after ?? 0) });
}

interface Place {
  /** The line up to the cursor, and from it on without a comment. */
  readonly before: string;
  readonly rest: string;
  readonly above: string;
  readonly known: readonly string[];
}

const distinct = (words: readonly string[]) => [...new Set(words)];

function offersAt(assessment: Assessment, place: Place): Offers {
  const { before, above } = place;
  const { syntax } = assessment.description;
  if (/^\w*$/.test(before)) return keyOffers('description', before, place, (key) => !new RegExp(`^${key}[ \\t]*:`, 'm').test(above));
  const own = /^(\w+)\s*:\s*(.*)$/.exec(before);
  if (own) return valueOffers(assessment, own[1], own[2], place);
  const section = [...above.matchAll(/^(\w+)[ \t]*:/gm)].at(-1)?.[1] ?? null;
  const item = /^\s*-\s+(?:\{\s*)?(.*)$/.exec(before);
  if (item) return itemOffers(assessment, section, item[1], place);
  const line = /^\s+(?:(["']?)([^:"']*)\1:\s+)?(.*)$/.exec(before);
  if (!line || section === null) return nothingToOffer;
  const [, , key, phrase] = line;
  if (key === undefined) {
    const keyPlace = nestedKeys(section, before, above);
    return keyPlace && /^\w*$/.test(phrase) ? keyOffers(keyPlace, phrase, place) : section === 'source' ? { offers: bandOffers(syntax), before: phrase.length } : nothingToOffer;
  }
  return namedOffers(assessment, section, key.trim(), phrase, place);
}

/** Which keys may stand on a line of its own below a section's key. */
function nestedKeys(section: string, before: string, above: string): KeyPlace | null {
  if (section === 'firmware') return 'firmware';
  const indent = /^\s*/.exec(before)![0].length;
  const outer = above.split(/\r\n|\n|\r/).findLast((line) => line.trim() !== '' && line.search(/\S/) < indent);
  if (section === 'load' && outer !== undefined && /^\s/.test(outer)) return 'case';
  return section === 'measured' && outer !== undefined && /^\s*-/.test(outer) ? 'measured item' : null;
}

/** Keys with their snippets; of a key that has its colon already only the name. */
function keyOffers(keyPlace: KeyPlace, begun: string, { rest }: Place, wanted: (key: string) => boolean = () => true): Offers {
  const hasColon = /^\w*\s*:/.test(rest);
  const offers = keysAt(keyPlace).filter(({ name }) => wanted(name)).map((entry) => keyOffer(entry, hasColon));
  return { offers, before: begun.length, after: hasColon ? /^\w*/.exec(rest)![0].length : 0 };
}

function keyOffer({ name, text, snippet, example, required }: KeyEntry, nameOnly: boolean): Offer {
  return offer(name, required ? 'required' : '', {
    documentation: `${text}\n\n\`\`\`yaml\n${example}\n\`\`\``, insertText: nameOnly ? name : snippet, snippet: !nameOnly,
  });
}

/** Behind a dash. */
function itemOffers(assessment: Assessment, section: string | null, words: string, place: Place): Offers {
  const { syntax } = assessment.description;
  if (section === 'goals') return goalOffers(syntax, words.replace(/^["']/, ''));
  if (section === 'measured') return measuredOffers(syntax, words, place);
  if (section === 'channels') return unitOffers(words, ['frequency']);
  if (section !== 'ladder' && section !== 'fixture' && section !== 'load') return nothingToOffer;
  const entry = /^(series|shunt|line|stub open|stub short|transformer|block)\s+([\p{L}][\p{L}\d_.-]*)\s*:\s*["']?(.*)$/u.exec(words);
  if (entry) return elementOffers(assessment, entry[1], entry[2], entry[3], place);
  const keyword = elementKeywords.find((each) => words.startsWith(`${each} `));
  if (keyword) return { offers: nextNames(syntax, keyword), before: words.length - keyword.length - 1 };
  return /^[\p{L} ]*$/u.test(words) ? keyOffers('ladder entry', words, place) : nothingToOffer;
}

/** The next free designators. */
function nextNames(syntax: DescriptionSyntax, keyword: string): Offer[] {
  const taken = new Set([...(syntax.ladder?.elements ?? []), ...syntax.fixture].map(({ name }) => name.value));
  const letters = keyword === 'series' || keyword === 'shunt' ? ['L', 'C', 'R'] : keyword === 'line' ? ['TL'] : keyword === 'transformer' ? ['T'] : keyword === 'block' ? ['FL'] : ['S'];
  return letters.map((letter) => {
    let number = 1;
    while (taken.has(`${letter}${number}`)) number++;
    return offer(`${letter}${number}`, 'next free name', { insertText: `${letter}${number}: ` });
  });
}

function elementOffers(assessment: Assessment, keyword: string, name: string, phrase: string, place: Place): Offers {
  switch (keyword) {
    case 'series':
    case 'shunt': return partOffers(assessment, keyword, name, phrase, place.rest);
    case 'block': return pathOffers(phrase, place.known, /\.(?:s2p|ts)$/i, [offer('reversed', 'port 1 toward the load')]);
    case 'transformer': return /\s\S*$/.test(phrase) || phrase === '' ? words(phrase, [offer('turns 1:2', 'source side : load side'), offer('winding 3 µH', 'inductance of the source side'), offer('coupling 0.98', 'with «winding»')]) : nothingToOffer;
    default: {
      const units = unitOffers(phrase, /\b(?:at|@)\s+[^,]*$/.test(phrase) ? ['frequency'] : /^[^,]*$/.test(phrase) ? ['resistance'] : /vf\s+[^,]*$/.test(phrase) ? [] : ['length', 'angle']);
      return units.offers.length > 0 ? units : words(phrase, lineWords);
    }
  }
}

const lineWords: readonly Offer[] = [
  offer('50 Ω, 6 mm, vf 0.55', 'impedance and length'), offer('50 Ω, 90° at 868 MHz', 'electrical length'), offer('vf 0.55', 'velocity factor'),
  offer('0.4 dB/m @ 1 GHz', 'loss'), offer('solve 2 mm .. 40 mm', 'length to be found'), offer('microstrip width 0.35 mm, height 0.2 mm, permittivity 4.3, length 6 mm', 'by geometry'),
];

/** Words for the one that is being typed. */
const words = (phrase: string, offers: readonly Offer[]): Offers => ({ offers, before: /[^\s,]*$/.exec(phrase)![0].length });

function pathOffers(phrase: string, known: readonly string[], ending: RegExp, behind: readonly Offer[] = []): Offers {
  const done = /^\S+\.\w+\s+(\S*)$/.exec(phrase);
  if (done) return { offers: behind, before: done[1].length };
  return { offers: known.filter((path) => ending.test(path)).map((path) => offer(path, 'file')), before: phrase.length };
}

const touchstone = /\.(?:s\d+p|ts)$/i;

function measuredOffers(syntax: DescriptionSyntax, phrase: string, place: Place): Offers {
  const cased = /\sfor\s+([\p{L}\d _-]*)$/u.exec(phrase);
  if (cased && !/\swith\s/.test(cased[0])) return { offers: caseOffers(syntax), before: cased[1].length };
  const coded = /\swith\s+(?:.*,\s*)?([\p{L}\d _-]*)$/u.exec(phrase);
  if (coded) return { offers: syntax.tunables.map(({ name }) => offer(name.value, 'tunable', { insertText: `${name.value} = ` })), before: coded[1].length };
  const path = phrase.replace(/^[\p{L}][\p{L}\d_.-]*:\s+/u, '');
  const files = pathOffers(path, place.known, touchstone, [offer('for', 'the load case'), offer('with', 'the codes that were set')]);
  const steps = path === phrase && /^\w*$/.test(phrase) ? (syntax.ladder?.elements ?? []).map(({ name }) => offer(name.value, 'built up to here', { insertText: `${name.value}: ` })) : [];
  return { ...files, offers: [...steps, ...files.offers] };
}

const quantityKeys: Readonly<Record<string, readonly UnitKind[]>> = { z0: ['resistance'], power: ['power'], sweep: ['frequency'], channels: ['frequency'] };

/** Behind a key of the first level. */
function valueOffers({ description: { syntax } }: Assessment, key: string, phrase: string, place: Place): Offers {
  if (key in quantityKeys) {
    const units = unitOffers(phrase, quantityKeys[key]);
    return units.offers.length > 0 || key !== 'channels' ? units : { offers: bandOffers(syntax), before: phrase.length };
  }
  switch (key) {
    case 'ohmward': return { offers: [offer('1', 'version of the language')], before: phrase.length };
    case 'spread': return { offers: [offer('uniform', 'within the tolerance'), offer('normal', 'tolerance at three sigma')], before: phrase.length };
    case 'source': return impedanceOffers(phrase, place, [offer('wants …', 'the load that the port should see', { insertText: 'wants ' })]);
    case 'load': return impedanceOffers(phrase, place);
    case 'ladder': return ladderOffers(syntax, phrase);
    default: return nothingToOffer;
  }
}

function ladderOffers(syntax: DescriptionSyntax, phrase: string): Offers {
  const from = /\sfrom\s+(?:.*,\s*)?([\p{L}\d_-]*)$/u.exec(phrase);
  if (from) return { offers: [...syntax.families.map(({ name }) => offer(name.value, 'family')), ...seriesNames.map((name) => offer(name, 'preferred series'))], before: from[1].length };
  const forms = [offer('solve up to 4 elements', 'series and shunt by turns'), offer('solve pi Q 5', 'three elements'), offer('solve tee bandwidth 20 MHz', 'three elements')];
  return /^[\p{L} ]*$/u.test(phrase) && !/^solve (?:pi|tee)\s/.test(phrase) ? { offers: forms, before: phrase.length } : words(phrase, [offer('from', 'families or a preferred series')]);
}

function impedanceOffers(phrase: string, { known }: Place, first: readonly Offer[] = []): Offers {
  const units = unitOffers(phrase, /\sat\s+\S*\s?\S*$/.test(phrase) ? ['frequency'] : ['resistance', 'capacitance', 'inductance']);
  if (units.offers.length > 0) return units;
  const done = /\.(?:s\d+p|ts)\s+(\w*)$/i.exec(phrase);
  if (done) return { offers: [offer('port 1', 'one port of it'), offer('differential', 'two ports driven against each other')], before: done[1].length };
  if (!/^\S*$/.test(phrase)) return nothingToOffer;
  const forms = [offer('18 - j37 Ω at 868 MHz', 'impedance'), offer('gamma 0.62 at -38°', 'reflection coefficient'), offer('open', 'no load'), offer('short', 'no impedance')];
  return { offers: [...first, ...known.filter((path) => touchstone.test(path)).map((path) => offer(path, 'file')), ...forms], before: phrase.length };
}

/** Behind a name that the description gives, or a key below the first level. */
function namedOffers({ description: { syntax } }: Assessment, section: string, key: string, phrase: string, place: Place): Offers {
  switch (section) {
    case 'bands': {
      const units = unitOffers(phrase, ['frequency']);
      return units.offers.length > 0 && !/Hz$/.test(phrase) ? units : words(phrase, [offer(', watch', 'plotted only'), offer(', 41 points', 'where it is judged')].filter(() => /Hz\s*$/.test(phrase)));
    }
    case 'source':
    case 'load': return impedanceOffers(phrase, place);
    case 'measured': return key === 'file' ? measuredOffers(syntax, phrase, place) : nothingToOffer;
    case 'let': return unitOffers(phrase, ['frequency', 'resistance', 'inductance', 'capacitance', 'length']);
    case 'parts': return familyOffers(phrase, place);
    case 'tunables': return kindOffers(phrase, [offer('5 bits 1 pF .. 4 pF', 'code 0 is the first value')]);
    default: return nothingToOffer;
  }
}

function familyOffers(phrase: string, { known }: Place): Offers {
  const sources = [...seriesNames.map((name) => offer(name, 'preferred series')), offer('files …', 'measured in series', { insertText: 'files ' })];
  const found = kindOffers(phrase, sources);
  return /^\S*$/.test(phrase) ? { offers: [...found.offers, ...known.filter((path) => /\.csv$/i.test(path)).map((path) => offer(path, 'parts at hand'))], before: phrase.length } : found;
}

/** The kind of part, then what follows it, then figures. */
function kindOffers(phrase: string, next: readonly Offer[]): Offers {
  const kind = partKinds.find((each) => phrase.startsWith(`${each} `)) ?? null;
  if (!kind) return /^\S*$/.test(phrase) ? { offers: partKinds.map((each) => offer(each, 'kind of part')), before: phrase.length } : nothingToOffer;
  const rest = phrase.slice(kind.length + 1);
  if (/^\S*$/.test(rest)) return { offers: next, before: rest.length };
  const units = unitOffers(rest, [kind === 'resistor' ? 'resistance' : kind === 'inductor' ? 'inductance' : 'capacitance']);
  if (units.offers.length > 0 && !/[HFΩ]$/.test(rest)) return units;
  return words(rest, figureOffers(kind).filter(({ label }) => label !== 'fixed' && !label.startsWith('from')));
}
