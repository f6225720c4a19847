import type { Impedance } from './impedance';
import type { Line } from './line';
import type { NetworkData } from './networkData';
import type { PartKind } from './part';

export type Orientation = 'series' | 'shunt' | 'through';

/**
 * One entry of a ladder. In a ladder the first entry is at the load and the last at the source.
 */
export type Element =
  /** `pair`: two equal parts, one in each leg of a balanced path; together twice `branch`. */
  | { readonly form: 'branch'; readonly name: string; readonly orientation: 'series' | 'shunt'; readonly branch: Impedance; readonly pair: boolean }
  /** 0 Ω in series: an ideal wire, no part. */
  | { readonly form: 'bridge'; readonly name: string; readonly orientation: 'series' }
  /** Empty pads across the path. `kind` is what the designator stands for. */
  | { readonly form: 'not fitted'; readonly name: string; readonly orientation: 'shunt'; readonly kind: PartKind | null }
  | { readonly form: 'line'; readonly name: string; readonly line: Line }
  | { readonly form: 'stub'; readonly name: string; readonly end: 'open' | 'short'; readonly line: Line }
  /** turns source side : load side. Without a winding inductance it is ideal. */
  | { readonly form: 'transformer'; readonly name: string; readonly turnsSource: number; readonly turnsLoad: number; readonly windingH: number | null; readonly coupling: number }
  /** A two-port; port 1 toward the source unless reversed. */
  | { readonly form: 'block'; readonly name: string; readonly data: NetworkData; readonly reversed: boolean }
  /** Not yet chosen. Analysis cannot go past it; `study/unknown.ts` says what may be put here. */
  | {
      readonly form: 'unsolved'; readonly name: string; readonly orientation: Orientation; readonly kind: PartKind | 'line' | 'stub' | null;
      /** True where two equal parts are asked for, one in each leg; what is chosen then makes a branch with `pair`. */
      readonly pair?: boolean;
      /** Of a stub whose length is asked for. */
      readonly end?: 'open' | 'short';
    }
  /** Could not be read; reported elsewhere. Everything beyond it is not known, for this reason. */
  | { readonly form: 'faulty'; readonly name: string; readonly orientation: Orientation; readonly reason: string };
