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
  /** In the editor's web build, whose extension host has no Node. */
  readonly web?: boolean;
  /** Runs only where it is asked for by name. */
  readonly onlyAsked?: boolean;
}

export const scenarios: readonly Scenario[] = [
  { suite: 'editing', what: 'a folder, what one sees while typing', opens: 'folder', trusted: true, loads: 1, needsPage: false },
  { suite: 'panel', what: 'the panel, and the panel after a reload of the window', opens: 'folder', trusted: true, loads: 2, needsPage: true },
  { suite: 'folders', what: 'several folders', opens: 'workspace', trusted: true, loads: 1, needsPage: false },
  { suite: 'loose', what: 'a single file without a folder', opens: 'nothing', trusted: true, loads: 1, needsPage: false },
  { suite: 'untrusted', what: 'a folder that is not trusted', opens: 'folder', trusted: false, loads: 1, needsPage: true },
  { suite: 'web', what: 'the web build, without Node, on a virtual file system', opens: 'nothing', trusted: true, loads: 1, needsPage: true, web: true },
  { suite: 'timing', what: 'times for the bench', opens: 'folder', trusted: true, loads: 1, needsPage: true, onlyAsked: true },
];
