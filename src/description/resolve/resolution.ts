import type { Diagnostic, Report } from '../../base/diagnostic';
import type { Span } from '../../base/span';
import type { Family } from '../../study/problem';
import type { FileReference, LoadedFiles } from '../files';
import type { FamilySyntax, FiguresSyntax, TunableSyntax } from '../syntax';
import type { NetworkData } from '../../network/networkData';
import type { PartKind } from '../../network/part';
import type { Tunable } from '../../study/problem';

/** What turning a description into a problem shares: files, where to report, and what was resolved so far. */
export interface Resolution {
  readonly report: Report;
  readonly files: LoadedFiles;
  readonly z0Ohm: number;
  /** Middle of the first band (geometric mean of its ends); 1 GHz while no band is known. */
  readonly middleHz: number;
  /** True where `middleHz` comes from a band. */
  readonly hasBands: boolean;
  readonly families: ReadonlyMap<string, ResolvedFamily>;
  readonly tunables: ReadonlyMap<string, ResolvedTunable>;
  readonly missing: FileReference[];
}

export interface ResolvedFamily {
  readonly syntax: FamilySyntax;
  readonly family: Family;
  readonly members: readonly ResolvedMember[];
  /** False where its parts could not be had, which has been reported. */
  readonly usable: boolean;
}

export interface ResolvedMember {
  readonly kind: PartKind;
  readonly value: number;
  /** With those of the family where the member states none of its own. */
  readonly figures: FiguresSyntax;
  readonly label: string | null;
  readonly count: number | null;
  readonly data: NetworkData | null;
}

export interface ResolvedTunable {
  readonly syntax: TunableSyntax;
  readonly tunable: Tunable | null;
}

export const problemAt = (code: string, message: string, span: Span, more: Partial<Diagnostic> = {}): Diagnostic => ({ code, severity: 'error', message, span, ...more });
export const doubtAt = (code: string, message: string, span: Span, more: Partial<Diagnostic> = {}): Diagnostic => ({ code, severity: 'warning', message, span, ...more });
