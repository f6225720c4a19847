import { nearestWord } from '../../base/nearestWord';
import { readReference } from './options';
import { quoted, refuse } from './touchstoneResult';

/** What the keywords of a version 2 file have said so far. */
export interface KeywordState {
  version: '2.0' | '2.1' | null;
  ports: number | null;
  twoPortOrder: '12_21' | '21_12' | null;
  frequencies: number | null;
  noiseFrequencies: number | null;
  references: number[] | null;
  matrix: 'full' | 'lower' | 'upper';
  /** Which part of the file the next line belongs to. */
  section: 'header' | 'references' | 'information' | 'network' | 'noise' | 'end';
  /** Where each keyword stands, from 1, by its name in lower case. */
  readonly lines: Map<string, number>;
}

export const keywordState = (): KeywordState => ({
  version: null, ports: null, twoPortOrder: null, frequencies: null, noiseFrequencies: null, references: null, matrix: 'full', section: 'header', lines: new Map(),
});

const keywords = [
  'Version', 'Number of Ports', 'Two-Port Data Order', 'Number of Frequencies', 'Number of Noise Frequencies', 'Reference', 'Matrix Format',
  'Mixed-Mode Order', 'Begin Information', 'End Information', 'Network Data', 'Noise Data', 'End',
];

/** Takes one line that begins with `[`. `optionsSeen` says whether the option line came before. */
export function takeKeyword(state: KeywordState, text: string, line: number, optionsSeen: boolean): void {
  const found = /^\[([^\]]*)\](.*)$/.exec(text);
  if (!found) return refuse('a keyword ends in «]»');
  const [name, argument] = [found[1].trim(), found[2].trim()];
  const written = name.slice(0, 40);
  const keyword = name.toLowerCase().replace(/\s+/g, ' ').replace('two-port order', 'two-port data order');
  if (state.section === 'information') {
    if (keyword === 'end information') state.section = 'header';
    return;
  }
  if (state.version === null && keyword !== 'version') refuse(`[${written}] belongs to version 2 files, which begin with [Version]`);
  checkPlace(state, keyword, written, argument, line);
  state.lines.set(keyword, line);
  if (state.section === 'references') state.section = 'header';
  switch (keyword) {
    case 'version':
      if (optionsSeen) refuse('[Version] must come before the option line');
      if (argument !== '2.0' && argument !== '2.1') return refuse(`version ${quoted(argument)} is not known; there are 2.0 and 2.1, and version 1 files have no [Version]`);
      state.version = argument;
      return;
    case 'number of ports': state.ports = count(argument, written); return;
    case 'two-port data order':
      if (argument !== '12_21' && argument !== '21_12') return refuse(`[${written}] is 12_21 or 21_12, not ${quoted(argument)}`);
      state.twoPortOrder = argument;
      return;
    case 'number of frequencies': state.frequencies = count(argument, written); return;
    case 'number of noise frequencies': state.noiseFrequencies = count(argument, written); return;
    case 'reference':
      state.references = [];
      state.section = 'references';
      takeReferences(state, argument);
      return;
    case 'matrix format': {
      const format = argument.toLowerCase();
      if (format !== 'full' && format !== 'lower' && format !== 'upper') return refuse(`[Matrix Format] is Full, Lower or Upper, not ${quoted(argument)}`);
      state.matrix = format;
      return;
    }
    case 'mixed-mode order': return refuse('the file is in mixed modes ([Mixed-Mode Order]); only single-ended files are read');
    case 'begin information': state.section = 'information'; return;
    case 'end information': return refuse('[End Information] has no [Begin Information] before it');
    case 'network data': state.section = 'network'; return;
    case 'noise data': state.section = 'noise'; return;
    case 'end': state.section = 'end'; return;
    default: return refuse(unknownKeyword(written));
  }
}

const withoutArgument = ['begin information', 'end information', 'network data', 'noise data', 'end'];

/** Each keyword once, and none of the header's once the data have begun: they would change what the data mean. */
function checkPlace(state: KeywordState, keyword: string, written: string, argument: string, line: number): void {
  const before = state.lines.get(keyword);
  if (before !== undefined && keyword !== 'begin information') refuse(`[${written}] is stated twice, here and on line ${before}`, line);
  const inData = state.section === 'network' || state.section === 'noise';
  const follows = keyword === 'end' || (keyword === 'noise data' && state.section === 'network');
  if (inData && !follows) refuse(keywords.some((known) => known.toLowerCase() === keyword) ? `[${written}] must come before [Network Data]` : unknownKeyword(written));
  if (!inData && keyword === 'noise data') refuse('[Noise Data] comes after [Network Data]');
  if (withoutArgument.includes(keyword) && argument !== '') refuse(`nothing follows [${written}] on its line`);
}

/** Resistances of [Reference], on its own line or on the lines below. */
export function takeReferences(state: KeywordState, text: string): void {
  for (const word of text.split(/\s+/)) if (word !== '') state.references!.push(readReference(word));
}

function count(text: string, keyword: string): number {
  if (!/^\d{1,9}$/.test(text) || Number(text) < 1) refuse(`[${keyword}] needs a whole number of at least 1, not ${quoted(text)}`);
  return Number(text);
}

function unknownKeyword(written: string): string {
  const near = nearestWord(written, keywords);
  return `the keyword [${written}] is not known${near === null ? '' : `; [${near}] is near`}`;
}
