import type { Located, Span } from '../base/span';
import type { Complex } from '../network/complex';
import type { PartKind } from '../network/part';
import type { Comparison, GoalCondition, GoalQuantity } from '../study/goal';

/**
 * What the phrases of a description say, with places, before names and files are looked up. Reading never fails: what
 * could not be read is null (and has been reported), the rest is there. All numbers in SI units; spans are offsets into
 * the whole text.
 */

/** A number with the words that it was read from, so that an edit can keep its style. */
export interface Quantity {
  readonly value: number;
  readonly span: Span;
}

export type ToleranceSyntax = { readonly form: 'relative' | 'absolute'; readonly up: number; readonly down: number; readonly span: Span };

/** `±5 %`, `Q 35 @ 900 MHz`, `ESR`, `ESL`, `SRF`, `rated`; each at most once, null where not stated. */
export interface FiguresSyntax {
  readonly tolerance: ToleranceSyntax | null;
  readonly q: Quantity | null;
  /** Null with `q`: the same Q everywhere. */
  readonly qAtHz: Quantity | null;
  readonly esrOhm: Quantity | null;
  readonly eslH: Quantity | null;
  readonly srfHz: Quantity | null;
  readonly ratedVoltageV: Quantity | null;
  readonly ratedCurrentA: Quantity | null;
  readonly ratedPowerW: Quantity | null;
}

/** `1 .. 33 nH` and the like. */
export interface RangeSyntax {
  readonly min: Quantity;
  readonly max: Quantity;
  readonly step: Quantity | null;
  readonly points: Located<number> | null;
  readonly span: Span;
}

/** `solve`, with what restricts it. */
export interface SolveSyntax {
  readonly span: Span;
  readonly range: RangeSyntax | null;
  /** Name of a preferred series (E24) after `from`. */
  readonly series: Located<string> | null;
  /** Families after `from`; either may serve. */
  readonly families: readonly Located<string>[];
  readonly orNone: boolean;
}

export interface CoilSyntax {
  readonly span: Span;
  readonly turns: number;
  readonly diameterM: number;
  readonly lengthM: number;
  readonly wireM: number;
}

export type PartValueSyntax =
  | { readonly form: 'known'; readonly value: number; readonly unit: 'Ω' | 'H' | 'F'; readonly span: Span }
  | { readonly form: 'coil'; readonly coil: CoilSyntax; readonly span: Span }
  | { readonly form: 'solve'; readonly solve: SolveSyntax; readonly span: Span }
  | { readonly form: 'tunable'; readonly name: Located<string>; readonly span: Span }
  /** Reported; the figures after it may still be good. */
  | { readonly form: 'faulty'; readonly span: Span };

export interface PartSyntax {
  readonly form: 'part';
  readonly span: Span;
  /** From the unit, else from the designator, else null. */
  readonly kind: PartKind | null;
  readonly value: PartValueSyntax;
  readonly figures: FiguresSyntax;
  readonly from: Located<string> | null;
  /** `part NAME` of a drawer. */
  readonly label: Located<string> | null;
  readonly fixed: boolean;
}

/** A file as an impedance: one port of it, or two ports differentially. */
export interface FileSyntax {
  readonly form: 'file';
  readonly span: Span;
  /** As written, relative to the description. */
  readonly path: Located<string>;
  readonly port: number | 'differential' | null;
}

/** An impedance phrase, or the branch of a ladder entry. */
export type ImpedanceSyntax =
  | PartSyntax
  | FileSyntax
  /** `18 - j37 Ω`; with `atHz`: R in series with the L or C that has this reactance there. */
  | { readonly form: 'complex'; readonly value: Complex; readonly atHz: Quantity | null; readonly span: Span }
  | { readonly form: 'gamma'; readonly reflection: Complex; readonly span: Span }
  | { readonly form: 'open' | 'short'; readonly span: Span }
  | { readonly form: 'series' | 'parallel'; readonly members: readonly ImpedanceSyntax[]; readonly span: Span }
  /** A mapping of frequencies to impedances. */
  | { readonly form: 'table'; readonly rows: readonly { readonly frequencyHz: Quantity; readonly impedance: ImpedanceSyntax }[]; readonly span: Span }
  | { readonly form: 'faulty'; readonly span: Span };

export interface LineSyntax {
  readonly span: Span;
  readonly medium:
    | { readonly form: 'uniform'; readonly impedanceOhm: Quantity }
    | {
        readonly form: 'microstrip'; readonly widthM: Quantity; readonly heightM: Quantity; readonly permittivity: Quantity;
        readonly copperM: Quantity | null; readonly lossTangent: Quantity | null;
      };
  readonly length:
    | { readonly form: 'physical'; readonly lengthM: Quantity }
    /** In wavelengths at `atHz` (90° is 0.25). */
    | { readonly form: 'electrical'; readonly wavelengths: Quantity; readonly atHz: Quantity }
    | { readonly form: 'solve'; readonly range: RangeSyntax | null; readonly span: Span };
  readonly velocityFactor: Quantity | null;
  /** `0.4 dB/m @ 1 GHz` (per metre) or `0.1 dB @ 1 GHz` (the whole line). */
  readonly loss: { readonly per: 'metre' | 'whole'; readonly db: Quantity; readonly atHz: Quantity } | null;
}

export interface ElementSyntax {
  /** The whole entry, key and phrase. */
  readonly span: Span;
  readonly keyword: 'series' | 'shunt' | 'line' | 'stub open' | 'stub short' | 'transformer' | 'block';
  readonly name: Located<string>;
  /** Where the phrase stands. */
  readonly phrase: Span;
  readonly body:
    | { readonly form: 'branch'; readonly branch: ImpedanceSyntax; readonly pair: boolean }
    | { readonly form: 'not fitted' }
    | { readonly form: 'bridge' }
    | { readonly form: 'line'; readonly line: LineSyntax }
    | { readonly form: 'transformer'; readonly turnsSource: number; readonly turnsLoad: number; readonly windingH: Quantity | null; readonly coupling: Quantity | null }
    | { readonly form: 'block'; readonly path: Located<string>; readonly reversed: boolean }
    | { readonly form: 'faulty' };
}

/** Which load or whole ladder is asked for: `ladder: solve …`. */
export interface LadderSolveSyntax {
  readonly span: Span;
  readonly form: 'up to' | 'pi' | 'tee';
  readonly elements: number | null;
  readonly q: Quantity | null;
  readonly bandwidthHz: Quantity | null;
  readonly series: Located<string> | null;
  readonly families: readonly Located<string>[];
}

export interface FamilySyntax {
  readonly name: Located<string>;
  readonly span: Span;
  readonly source:
    | { readonly form: 'series'; readonly kind: PartKind; readonly series: Located<string>; readonly range: RangeSyntax | null }
    | { readonly form: 'list'; readonly kind: PartKind; readonly values: readonly Quantity[] }
    | { readonly form: 'files'; readonly kind: PartKind; readonly pattern: Located<string> }
    | { readonly form: 'csv'; readonly path: Located<string> }
    | { readonly form: 'faulty' };
  readonly figures: FiguresSyntax;
}

export interface TunableSyntax {
  readonly name: Located<string>;
  readonly span: Span;
  readonly kind: PartKind | null;
  readonly states:
    | { readonly form: 'linear'; readonly bits: number; readonly range: RangeSyntax }
    | { readonly form: 'table'; readonly rows: readonly { readonly code: Located<number>; readonly part: PartSyntax }[] }
    | { readonly form: 'faulty' };
  readonly figures: FiguresSyntax;
}

export type PlaceSyntax =
  | { readonly form: 'bands' }
  | { readonly form: 'band'; readonly band: Located<string> }
  | { readonly form: 'range'; readonly range: RangeSyntax }
  | { readonly form: 'frequency'; readonly frequencyHz: Quantity }
  | { readonly form: 'harmonic'; readonly order: number; readonly band: Located<string> };

export interface GoalSyntax {
  readonly span: Span;
  /** As written, trimmed. */
  readonly text: string;
  readonly quantity: GoalQuantity | GoalCondition;
  readonly comparison: Comparison | null;
  readonly limit: Quantity | null;
  readonly unit: string;
  readonly place: PlaceSyntax;
  readonly caseName: Located<string> | null;
  readonly into: ImpedanceSyntax | null;
  readonly against: Located<string> | null;
  readonly elementName: Located<string> | null;
  readonly bandwidthDropDb: number | null;
}

export interface BandSyntax {
  readonly name: Located<string>;
  readonly span: Span;
  readonly range: RangeSyntax | null;
  /** A single frequency: a band of one point. */
  readonly frequencyHz: Quantity | null;
  readonly watch: boolean;
}

export interface MeasuredSyntax {
  readonly span: Span;
  readonly upTo: Located<string> | null;
  readonly path: Located<string>;
  readonly caseName: Located<string> | null;
  readonly codes: readonly { readonly tunable: Located<string>; readonly code: Located<number> }[];
  readonly fixture: readonly ElementSyntax[] | null;
}

export interface CaseSyntax {
  /** Null for a single load. */
  readonly name: Located<string> | null;
  readonly span: Span;
  readonly impedance: ImpedanceSyntax;
  readonly fixture: readonly ElementSyntax[] | null;
}

export interface SourceSyntax {
  readonly impedance: ImpedanceSyntax;
  /** `wants`: the impedance is the load that the port should see; the source is its conjugate. */
  readonly wants: boolean;
  readonly band: Located<string> | null;
  readonly span: Span;
}

/** A whole description as read. Every list is empty and every value null where the text does not say. */
export interface DescriptionSyntax {
  readonly text: string;
  readonly title: Located<string> | null;
  readonly z0Ohm: Quantity | null;
  readonly powerW: Quantity | null;
  readonly sources: readonly SourceSyntax[];
  readonly bands: readonly BandSyntax[];
  readonly sweep: RangeSyntax | null;
  readonly load: { readonly span: Span; readonly cases: readonly CaseSyntax[] } | null;
  readonly fixture: readonly ElementSyntax[];
  readonly ladder: { readonly span: Span; readonly keySpan: Span; readonly elements: readonly ElementSyntax[]; readonly solve: LadderSolveSyntax | null } | null;
  readonly families: readonly FamilySyntax[];
  readonly lets: readonly { readonly name: Located<string>; readonly span: Span }[];
  readonly goals: readonly GoalSyntax[];
  readonly tunables: readonly TunableSyntax[];
  readonly channels: { readonly span: Span; readonly isEmpty: boolean; readonly band: Located<string> | null; readonly ranges: readonly RangeSyntax[]; readonly frequenciesHz: readonly Quantity[] } | null;
  readonly firmware: { readonly span: Span; readonly header: Located<string> | null; readonly json: Located<string> | null; readonly symbol: Located<string> | null } | null;
  readonly spread: Located<'uniform' | 'normal'> | null;
  readonly builds: Quantity | null;
  readonly seed: Quantity | null;
  readonly measured: readonly MeasuredSyntax[];
}
