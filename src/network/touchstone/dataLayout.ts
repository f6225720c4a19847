import type { KeywordState } from './keywords';
import { portsAtMost } from './limits';
import type { TouchstoneOptions } from './options';
import { refuse } from './touchstoneResult';

/** What the head of a file says about its data, checked. */
export interface DataLayout {
  readonly ports: number;
  readonly options: TouchstoneOptions;
  readonly versioned: boolean;
  /** Ω, one a port. */
  readonly referenceOhm: readonly number[];
  /** For each entry of the matrix, row by row, which of the point's pairs it is in the file. */
  readonly places: readonly number[];
  /** Pairs of numbers a point in the file. */
  readonly pairs: number;
}

/** Called at the first line of data (number `line`): refuses a head that is not complete, with the line that is to blame. */
export function dataLayout(fileName: string, options: TouchstoneOptions | null, state: KeywordState, line: number): DataLayout {
  if (options === null) return refuse('the option line (# …) is missing before the data');
  const versioned = state.version !== null;
  const at = (keyword: string) => state.lines.get(keyword) ?? line;
  if (versioned && state.section !== 'network') refuse('the data must come after [Network Data]');
  const ports = portsOf(fileName, state);
  if (versioned) {
    if (ports === 2 && state.twoPortOrder === null) {
      refuse('[Two-Port Data Order] is missing, and the order of S12 and S21 is not to be guessed', at('network data'));
    }
    if (ports !== 2 && state.twoPortOrder !== null) refuse('[Two-Port Data Order] belongs to files of two ports', at('two-port data order'));
    if (state.frequencies === null) refuse('[Number of Frequencies] is missing', at('network data'));
  }
  if (ports !== 2 && (options.parameter === 'H' || options.parameter === 'G')) {
    refuse(`${options.parameter} parameters are those of two-ports, and this file has ${portsText(ports)}`, options.line);
  }
  const { matrix } = state;
  return {
    ports, options, versioned,
    referenceOhm: referencesOf(ports, options, state),
    places: placesOf(ports, matrix, !versioned || state.twoPortOrder === '21_12'),
    pairs: matrix === 'full' ? ports * ports : (ports * (ports + 1)) / 2,
  };
}

export const portsText = (ports: number): string => (ports === 1 ? 'one port' : `${ports} ports`);

function portsOf(fileName: string, state: KeywordState): number {
  const named = /\.s(\d{1,9})p$/i.exec(fileName);
  const stated = named ? Number(named[1]) : null;
  if (state.version !== null && state.ports === null) return refuse('[Number of Ports] is missing', state.lines.get('network data'));
  if (stated !== null && state.ports !== null && stated !== state.ports) {
    refuse(`the file's name says ${portsText(stated)} and [Number of Ports] says ${state.ports}`, state.lines.get('number of ports'));
  }
  const count = state.ports ?? stated;
  if (count === null) return refuse('without [Version] the number of ports comes from the file\'s name, .s1p to .s4p');
  if (count < 1 || count > portsAtMost) refuse(`files of 1 to ${portsAtMost} ports are read, and this one has ${count}`, state.lines.get('number of ports'));
  return count;
}

function referencesOf(ports: number, options: TouchstoneOptions, state: KeywordState): number[] {
  const fromKeyword = state.references !== null;
  const stated = state.references ?? options.referenceOhm;
  if (stated.length === ports) return [...stated];
  if (stated.length === 1 && !fromKeyword) return Array.from({ length: ports }, () => stated[0]);
  const where = fromKeyword ? '[Reference]' : 'the option line';
  const count = stated.length === 1 ? 'one resistance' : `${stated.length} resistances`;
  return refuse(`${where} states ${count}, and the file has ${portsText(ports)}`, fromKeyword ? state.lines.get('reference') : options.line);
}

/** Two ports stand column by column where `columnsFirst`: in version 1, and in version 2 where it says 21_12. */
function placesOf(ports: number, matrix: KeywordState['matrix'], columnsFirst: boolean): number[] {
  return Array.from({ length: ports * ports }, (_, entry) => {
    const [row, column] = [Math.floor(entry / ports), entry % ports];
    if (matrix === 'full') return ports === 2 && columnsFirst ? column * ports + row : entry;
    const [high, low] = [Math.max(row, column), Math.min(row, column)];
    // The lower triangle has rows of 1, 2, … pairs, the upper one rows of n, n − 1, …
    return matrix === 'lower' ? (high * (high + 1)) / 2 + low : low * ports - (low * (low - 1)) / 2 + high - low;
  });
}
