import type { Diagnostic } from '../base/diagnostic';
import type { DescriptionSyntax } from '../description/syntax';
import type { FirmwareState } from './firmwareState';

/** A table of the firmware, and how what lies there stands to the description. */
export interface FirmwareFile {
  /** As written in the description. */
  readonly path: string;
  /** What it should hold; null where that is not known. */
  readonly text: string | null;
  /** `unreadable`: it may not be read here, or cannot be. */
  readonly state: FirmwareState | 'unreadable';
  /** More about `unreadable`, or why the text is not known; else empty. */
  readonly reason: string;
}

/** Codes of the diagnostics that writing the tables would mend. */
export const mendedByWriting: ReadonlySet<string> = new Set(['firmware-missing', 'firmware-out-of-date']);

/** What is to be said of the firmware's tables, on the paths that the description names. Nothing of those that are up to date. */
export function firmwareDiagnostics({ firmware }: Pick<DescriptionSyntax, 'firmware'>, files: readonly FirmwareFile[]): Diagnostic[] {
  return files.flatMap(({ path, text, state, reason }): Diagnostic[] => {
    const span = [firmware?.header, firmware?.json].find((located) => located?.value === path)?.span;
    if (!span) return [];
    const warn = (code: string, message: string): Diagnostic[] => [{ code, severity: 'warning', message, span }];
    if (state === 'unreadable') return [{ code: 'firmware-not-read', severity: 'info', message: `Whether «${path}» is up to date is not known: ${reason}`, span }];
    if (state === 'foreign') return warn('firmware-foreign', `«${path}» was not written by Ohmward, so it is never overwritten. Name another file, or move this one away.`);
    if (text === null) return warn('firmware-not-known', `There is no table to write to «${path}»: ${reason}.`);
    if (state === 'missing') return warn('firmware-missing', `The firmware's table «${path}» has not been written yet.`);
    return state === 'current' ? [] : warn('firmware-out-of-date', `The firmware's table «${path}» no longer agrees with this description.`);
  });
}
