import { readReference } from './options';
import { refuse } from './touchstoneResult';

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
}

export const keywordState = (): KeywordState => ({
  version: null, ports: null, twoPortOrder: null, frequencies: null, noiseFrequencies: null, references: null, matrix: 'full', section: 'header',
});

const count = (text: string, keyword: string, least: number): number => {
  if (!/^\d{1,9}$/.test(text) || Number(text) < least) refuse(`[${keyword}] needs a whole number of at least ${least}, not «${text}»`);
  return Number(text);
};

/** Takes one line that begins with `[`. `optionsSeen` says whether the option line came before. */
export function takeKeyword(state: KeywordState, line: string, optionsSeen: boolean): void {
  const found = /^\[\s*([^\]]*?)\s*\]\s*(.*)$/.exec(line);
  if (!found) return refuse('a keyword ends in «]»');
  const [, written, argument] = found;
  const keyword = written.toLowerCase().replace(/\s+/g, ' ');
  if (state.section === 'information') {
    if (keyword === 'end information') state.section = 'header';
    return;
  }
  if (keyword !== 'version' && state.version === null) refuse(`[${written}] belongs to version 2 files, which begin with [Version]`);
  if (state.section === 'references') state.section = 'header';
  switch (keyword) {
    case 'version':
      if (optionsSeen) refuse('[Version] comes before the option line');
      if (state.version !== null) refuse('[Version] is stated twice');
      if (argument !== '2.0' && argument !== '2.1') return refuse(`version «${argument}» is not known; there are 2.0 and 2.1, and version 1 files have no [Version]`);
      state.version = argument;
      return;
    case 'number of ports': state.ports = count(argument, written, 1); return;
    case 'two-port data order':
    case 'two-port order': {
      if (argument !== '12_21' && argument !== '21_12') return refuse(`[${written}] is 12_21 or 21_12, not «${argument}»`);
      state.twoPortOrder = argument;
      return;
    }
    case 'number of frequencies': state.frequencies = count(argument, written, 1); return;
    case 'number of noise frequencies': state.noiseFrequencies = count(argument, written, 1); return;
    case 'reference':
      state.references = [];
      state.section = 'references';
      takeReferences(state, argument);
      return;
    case 'matrix format': {
      const format = argument.toLowerCase();
      if (format !== 'full' && format !== 'lower' && format !== 'upper') return refuse(`[Matrix Format] is Full, Lower or Upper, not «${argument}»`);
      state.matrix = format;
      return;
    }
    case 'mixed-mode order': return refuse('the file is in mixed modes ([Mixed-Mode Order]); only single-ended files are read');
    case 'begin information': state.section = 'information'; return;
    case 'network data': state.section = 'network'; return;
    case 'noise data':
      if (state.section !== 'network') refuse('[Noise Data] comes after [Network Data]');
      state.section = 'noise';
      return;
    case 'end': state.section = 'end'; return;
    default: return refuse(`the keyword [${written}] is not known`);
  }
}

/** Resistances of [Reference], on its own line or on the lines below. */
export function takeReferences(state: KeywordState, text: string): void {
  for (const word of text.split(/\s+/).filter((part) => part !== '')) state.references!.push(readReference(word));
}
