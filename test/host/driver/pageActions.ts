/**
 * What a suite, which runs inside the extension host, asks of the browser that shows the editor. Sent as JSON to the bridge.
 * `panel` is the page inside the webview, `window` the editor around it.
 */
export type Place = 'window' | 'panel';

export type PageAction =
  /** Which load of the window this is, from 1. */
  | { readonly do: 'which load' }
  /** Loads the window again, as after a crash. The suite that asks is gone with it. */
  | { readonly do: 'load again' }
  /** Prints a line of the test run. */
  | { readonly do: 'say'; readonly text: string }
  /** How a suite ended whose host cannot write files. */
  | { readonly do: 'result'; readonly passes: number; readonly failures: number }
  | { readonly do: 'picture'; readonly name: string; readonly of: Place }
  /** A key or chord, as `Control+Shift+P`. */
  | { readonly do: 'press'; readonly key: string }
  | { readonly do: 'type'; readonly text: string }
  | { readonly do: 'click' | 'hover' | 'focus'; readonly in: Place; readonly selector: string }
  /** Drags from the middle of an element by so many pixels. */
  | { readonly do: 'drag'; readonly in: Place; readonly selector: string; readonly dx: number; readonly dy: number }
  /** The text of the first match; null where nothing matches. */
  | { readonly do: 'text'; readonly in: Place; readonly selector: string }
  | { readonly do: 'count'; readonly in: Place; readonly selector: string }
  /** `script` is the source of a function that gets the root element. */
  | { readonly do: 'evaluate'; readonly in: Place; readonly script: string }
  | { readonly do: 'viewport'; readonly width: number; readonly height: number }
  | { readonly do: 'media'; readonly reducedMotion: boolean }
  /** Violations that the accessibility checker finds in the panel. */
  | { readonly do: 'accessibility' }
  /** Messages of the browser's console that speak of a broken content security policy. */
  | { readonly do: 'policy violations' };

export interface AccessibilityViolation {
  readonly id: string;
  readonly impact: string;
  readonly help: string;
  readonly targets: readonly string[];
}
