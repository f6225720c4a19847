/**
 * What the extension host and the panel's page say to each other. Plain data only: it crosses a process. Every message to
 * the page carries the document and its version; the page drops what is older than what it shows. The page sends ids and
 * values, never commands or paths. Decoders for unknown data are in `decodePanel.ts`.
 */

/** Complex numbers as two lists; null where not known. */
export interface PointList {
  readonly re: readonly (number | null)[];
  readonly im: readonly (number | null)[];
}

export interface GoalView {
  /** Index in the description's goals. */
  readonly id: number;
  /** `return loss ≥ 12 dB` */
  readonly title: string;
  /** `uplink`, `2 × uplink into 50 Ω`; empty where the goal has no place. */
  readonly place: string;
  readonly ok: boolean;
  /** False where it cannot be told whether it holds. */
  readonly known: boolean;
  /** `20.7 dB`, `∞`, or `not known`. */
  readonly valueText: string;
  /** `worst: wet bark, 868.2 MHz`, or the reason why it is not known. */
  readonly detail: string;
  /** `8.7 dB to spare`, `2.6 dB short`. */
  readonly marginText: string;
  /** Why no lossless ladder can meet it; empty where one could. */
  readonly note: string;
  /** −1 … 1 for the bar, 0 at the limit; null where not known. */
  readonly bar: number | null;
  /** Line in the document, from 0. */
  readonly line: number;
}

export interface BandView {
  readonly name: string;
  readonly startHz: number;
  readonly stopHz: number;
  readonly watch: boolean;
}

export interface TraceView {
  /** `load` for a single case. */
  readonly caseName: string;
  readonly reflection: PointList;
  /** |Γ| against the source in dB (0 or below), and transducer gain; null where not known or −infinite. */
  readonly reflectionDb: readonly (number | null)[];
  readonly gainDb: readonly (number | null)[];
  readonly reason: string | null;
}

/** A circle of the chart's plane. */
export interface DiscView {
  readonly centreRe: number;
  readonly centreIm: number;
  readonly radius: number;
  readonly label: string;
}

/** A goal as a bar in one of the two plots: the trace must stay below (`at most`) or above it. */
export interface MaskView {
  readonly plot: 'reflection' | 'gain';
  readonly side: 'at most' | 'at least';
  readonly levelDb: number;
  readonly startHz: number;
  readonly stopHz: number;
  readonly ok: boolean;
  readonly goalId: number;
}

export interface PathStepView {
  readonly name: string;
  readonly arc: { readonly re: readonly number[]; readonly im: readonly number[] };
}

/** Everything at the marker, for one case. */
export interface MarkerCaseView {
  readonly caseName: string;
  /** `Γ 0.065 ∠ −168° · 44.0 − j1.2 Ω · 23.8 dB` */
  readonly text: string;
  readonly loadReflection: { readonly re: number; readonly im: number } | null;
  readonly steps: readonly PathStepView[];
  readonly inputReflection: { readonly re: number; readonly im: number } | null;
}

export interface MarkerView {
  readonly frequencyHz: number;
  /** `866.5 MHz` */
  readonly text: string;
  readonly cases: readonly MarkerCaseView[];
}

export type LadderSymbol =
  | 'load' | 'source' | 'resistor' | 'inductor' | 'capacitor' | 'branch' | 'line' | 'stub open' | 'stub short' | 'transformer' | 'block' | 'bridge' | 'open' | 'unsolved';

export interface LadderRowView {
  /** The element's name; `load` and `source` for the ends. */
  readonly id: string;
  readonly name: string;
  readonly orientation: 'series' | 'shunt' | 'through' | 'end';
  readonly symbol: LadderSymbol;
  readonly value: string;
  readonly reactance: string;
  readonly impedanceAfter: string;
  readonly voltage: string;
  readonly current: string;
  readonly heat: string;
  /** Heat as a share of the power available. */
  readonly loss: string;
  /** dB of worst margin for 1 % of its value. */
  readonly sensitivity: string;
  readonly note: string;
  /** Line in the document, from 0; null where it is in none. */
  readonly line: number | null;
  /** True where the value can be stepped or edited from the table. */
  readonly editable: boolean;
}

export interface ProblemView {
  readonly severity: 'error' | 'warning' | 'info';
  readonly message: string;
  readonly line: number;
}

/** One way to fill in what is unknown. */
export interface CandidateView {
  /** What the page sends back to mean it. */
  readonly id: number;
  /** `L1 6.8 nH, C1 3.3 pF` */
  readonly values: string;
  readonly holds: boolean;
  readonly margin: string;
  readonly returnLoss: string;
  readonly gain: string;
  readonly parts: string;
  /** `low-pass` */
  readonly response: string;
  /** `passes`, `blocked` */
  readonly directCurrent: string;
  readonly proof: string;
  readonly note: string;
}

export interface CandidatesView {
  /** True where the text has changed since. */
  readonly stale: boolean;
  /** Why there is none, or that it is being solved; empty otherwise. */
  readonly message: string;
  readonly notes: readonly string[];
  /** Forms that cannot make the match: why, and the loads that they do match where that can be drawn. */
  readonly outOfReach: readonly { readonly form: string; readonly text: string; readonly reach: CoverageView | null }[];
  readonly candidates: readonly CandidateView[];
}

/** What builds with tolerances do. */
export interface SpreadView {
  /** True where the text has changed since. */
  readonly stale: boolean;
  /** Of the builds, how many have been made: 1 when it is done. */
  readonly share: number;
  readonly yieldText: string;
  /** Which goals some builds miss; empty where none does. */
  readonly goalsText: string;
  readonly cornerText: string;
  /** What would have to be tightened; empty where nothing is to be said. */
  readonly remedyText: string;
  readonly cornerDb: number | null;
  readonly bars: readonly { readonly fromDb: number; readonly toDb: number; readonly count: number }[];
  /** Traces of some builds on the chart, first case. */
  readonly cloud: readonly PointList[];
}

/** One channel with its codes. */
export interface ChannelView {
  readonly frequencyHz: number;
  /** `902.75 MHz` */
  readonly text: string;
  /** By tunable. */
  readonly codes: readonly number[];
  readonly margin: string;
  /** Null where not known or infinite. */
  readonly marginDb: number | null;
  readonly holds: boolean;
  readonly returnLoss: string;
  readonly gain: string;
}

/** Where the firmware's table stands. */
export interface FirmwareView {
  /** As written in the description. */
  readonly path: string;
  /** `up to date` */
  readonly text: string;
  readonly ok: boolean;
  /** True where it can be written from here. */
  readonly writable: boolean;
}

/** The loads that some code brings to the goals at one channel, on a grid over the chart. */
export interface CoverageView {
  /** `some code brings 16 % of the chart to the goals at 915.3 MHz` */
  readonly text: string;
  /** Points across, −1 … 1 in both directions. */
  readonly across: number;
  /** By point, row by row from the lowest imaginary part; null outside of the chart and where no code helps. */
  readonly marginDb: readonly (number | null)[];
  readonly cases: readonly { readonly caseName: string; readonly text: string; readonly holds: boolean; readonly reflection: { readonly re: number; readonly im: number } | null }[];
}

/** Tunable parts and their codes. */
export interface CodesView {
  readonly summary: string;
  /** By tunable: least and largest code that it has. */
  readonly tunables: readonly { readonly name: string; readonly low: number; readonly high: number }[];
  /** Increasing in frequency. */
  readonly channels: readonly ChannelView[];
  /** Index of the channel whose codes traces and ladder have. */
  readonly shown: number;
  /** What one wrong code leaves there. */
  readonly stepsText: string;
  readonly proof: string;
  readonly firmware: readonly FirmwareView[];
  /** Null while it is not known; `coverageText` says why, or that it is being worked out. */
  readonly coverage: CoverageView | null;
  readonly coverageText: string;
}

/** One whole picture. Everything that a person reads is text made by the host, so panel, hover and report agree. */
export interface PanelView {
  readonly title: string;
  readonly fileName: string;
  readonly pinned: boolean;
  /** `3 of 4 hold`; empty where the description has no goals. */
  readonly verdict: string;
  readonly goals: readonly GoalView[];
  readonly problems: readonly ProblemView[];
  readonly cautions: readonly string[];
  readonly z0Ohm: number;
  readonly frequencyHz: readonly number[];
  readonly bands: readonly BandView[];
  readonly traces: readonly TraceView[];
  readonly discs: readonly DiscView[];
  /** What no lossless ladder gets inside of, by band. */
  readonly limits: readonly DiscView[];
  readonly masks: readonly MaskView[];
  readonly marker: MarkerView | null;
  readonly ladder: readonly LadderRowView[];
  /** True where traces and ladder are those of the best candidate, which is not in the text. */
  readonly notInserted: boolean;
  /** Null where nothing is left to solve. */
  readonly candidates: CandidatesView | null;
  /** Null where no part has a tolerance, or nothing is known yet. */
  readonly spread: SpreadView | null;
  /** Null where nothing is set by a code. */
  readonly codes: CodesView | null;
}

export type ToPage =
  | { readonly type: 'view'; readonly document: string; readonly version: number; readonly view: PanelView }
  /** The numbers shown are older than the text; `reason` where they cannot be renewed. */
  | { readonly type: 'stale'; readonly document: string; readonly version: number; readonly reason: string | null; readonly problems: readonly ProblemView[] }
  | { readonly type: 'marker'; readonly document: string; readonly version: number; readonly request: number; readonly marker: MarkerView | null; readonly refusal: string | null }
  /** What one candidate would look like; null where it is not known any more. */
  | { readonly type: 'preview'; readonly document: string; readonly version: number; readonly request: number; readonly traces: readonly TraceView[] | null }
  /** How far the solver is, where it takes long; ends with the next view. */
  | { readonly type: 'solving'; readonly document: string; readonly version: number; readonly share: number; readonly text: string }
  /** The cursor in the editor is on this element or goal. */
  | { readonly type: 'cursor'; readonly document: string; readonly version: number; readonly elementId: string | null; readonly goalId: number | null }
  | { readonly type: 'nothing'; readonly document: ''; readonly version: 0; readonly message: string };

export type ToHost =
  | { readonly type: 'ready' }
  | { readonly type: 'move marker'; readonly document: string; readonly request: number; readonly frequencyHz: number }
  /** As typed by the person: `868 MHz`. */
  | { readonly type: 'type marker'; readonly document: string; readonly request: number; readonly text: string }
  | { readonly type: 'reveal line'; readonly document: string; readonly line: number }
  | { readonly type: 'point at element'; readonly document: string; readonly elementId: string | null }
  | { readonly type: 'step value'; readonly document: string; readonly version: number; readonly elementId: string; readonly direction: 'up' | 'down' }
  | { readonly type: 'set value'; readonly document: string; readonly version: number; readonly elementId: string; readonly text: string }
  | { readonly type: 'preview candidate'; readonly document: string; readonly version: number; readonly request: number; readonly candidate: number }
  | { readonly type: 'insert candidate'; readonly document: string; readonly version: number; readonly candidate: number }
  | { readonly type: 'write firmware'; readonly document: string; readonly version: number }
  | { readonly type: 'save report'; readonly document: string }
  | { readonly type: 'copy'; readonly document: string; readonly what: 'chart svg' | 'ladder csv' | 'ladder markdown' | 'codes csv'; readonly text: string }
  | { readonly type: 'save'; readonly document: string; readonly what: 'chart svg' | 'chart png'; readonly base64: string }
  | { readonly type: 'pin'; readonly document: string; readonly pinned: boolean }
  | { readonly type: 'failure'; readonly message: string };
