/** One start of the editor with one folder of the suite. */
export interface Scenario {
  readonly suite: string;
  readonly what: string;
  readonly opens: 'folder' | 'workspace' | 'nothing';
  readonly trusted: boolean;
  /** How often the window is loaded; the second load runs the suite `…AfterReload`. */
  readonly loads: number;
  /** True where the window itself must be driven or configured by us. */
  readonly needsPage: boolean;
}

export const scenarios: readonly Scenario[] = [
  { suite: 'editing', what: 'a folder, what one sees while typing', opens: 'folder', trusted: true, loads: 1, needsPage: false },
];
