import type { Element } from '../network/element';
import type { Impedance } from '../network/impedance';
import type { NetworkData } from '../network/networkData';
import type { Part, PartKind } from '../network/part';
import type { Goal } from './goal';
import type { LadderTask, Unknown } from './unknown';

/**
 * Everything that a study needs, with files read and units gone. Made from a description; knows nothing of text, so that
 * the same study runs in the editor, in a worker and on the command line. Plain data: it can be posted to a worker.
 */
export interface Problem {
  readonly title: string | null;
  /** Reference of the chart, real and positive. */
  readonly z0Ohm: number;
  readonly source: SourcePort;
  /** Available from the source. */
  readonly availablePowerW: number;
  readonly bands: readonly Band[];
  /** What is plotted; increasing. */
  readonly sweepHz: Float64Array;
  /** At least one; a single load is one case whose name is null. */
  readonly cases: readonly LoadCase[];
  /** First at the load, last at the source. */
  readonly ladder: readonly Element[];
  readonly goals: readonly Goal[];
  readonly unknowns: readonly Unknown[];
  /** `ladder: solve …`: the ladder above is then empty. */
  readonly ladderTask: LadderTask | null;
  readonly families: readonly Family[];
  readonly tunables: readonly Tunable[];
  /** Increasing; null where the description has no tunables. */
  readonly channelsHz: Float64Array | null;
  readonly firmware: FirmwareTable | null;
  readonly spread: SpreadSettings;
  readonly measured: readonly MeasuredTrace[];
}

export interface SourcePort {
  /** The port's own impedance (never the conjugate that a data sheet's «wants» states) where no band says otherwise. */
  readonly impedance: Impedance;
  /** By band name; a frequency in no band takes the band nearest to it on a logarithmic scale. */
  readonly byBand: ReadonlyMap<string, Impedance>;
  /** The bands among which the nearest is sought, where those of the problem are cut to a channel; absent, the problem's own. */
  readonly nearestAmong?: readonly Band[];
}

export interface Band {
  readonly name: string;
  /** The points at which it is judged: increasing, both ends included, at least one. */
  readonly frequencyHz: Float64Array;
  /** Plotted, but left out of goals without a place and of the default aim. */
  readonly watch: boolean;
}

export interface LoadCase {
  readonly name: string | null;
  readonly load: Impedance;
  /** Removed from the load where the load is a file; from the load outwards. */
  readonly fixture: readonly Element[];
}

/** Parts that exist. */
export interface Family {
  readonly name: string;
  readonly kind: PartKind | 'mixed';
  readonly members: readonly FamilyMember[];
}

export interface FamilyMember {
  readonly part: Part;
  /** The maker's or the drawer's designation; null for a series or a list. */
  readonly label: string | null;
  /** How many are at hand; null where that is not limited. */
  readonly count: number | null;
}

export interface Tunable {
  readonly name: string;
  readonly kind: PartKind;
  /** Increasing in code. */
  readonly states: readonly { readonly code: number; readonly part: Part }[];
  /** Names of the elements that are set by it. */
  readonly elements: readonly string[];
}

export interface FirmwareTable {
  readonly header: string | null;
  readonly json: string | null;
  readonly symbol: string;
}

export interface SpreadSettings {
  readonly distribution: 'uniform' | 'normal';
  readonly builds: number;
  readonly seed: number;
}

export interface MeasuredTrace {
  /** The step of building that ends with this element; null for the finished ladder. */
  readonly upTo: string | null;
  readonly data: NetworkData | null;
  readonly caseName: string | null;
  readonly codes: ReadonlyMap<string, number>;
  readonly fixture: readonly Element[];
}
