import type { AccessibilityViolation, PageAction, Place } from '../driver/pageActions';

/** Where the suite is served to an extension host without Node, the driver writes the address in here. */
const written = '__BRIDGE__';

/** Null in a desktop editor, whose window no driver of ours holds. */
const bridgeUrl = written.startsWith('http') ? written : (process.env.OHMWARD_BRIDGE ?? null);

async function ask<T>(action: PageAction): Promise<T> {
  if (bridgeUrl === null) throw new Error('this editor has no page bridge');
  const response = await fetch(bridgeUrl, { method: 'POST', body: JSON.stringify(action) });
  const answer = (await response.json()) as { result?: T; error?: string };
  if (answer.error !== undefined) throw new Error(`${JSON.stringify(action)}: ${answer.error}`);
  return answer.result as T;
}

/** The browser that shows the editor, as the person in front of it would use it. */
export const page = {
  /** Which load of the window this is, from 1. */
  load: () => (bridgeUrl === null ? Promise.resolve(1) : ask<number>({ do: 'which load' })),
  loadAgain: () => ask<void>({ do: 'load again' }),
  say: (text: string) => ask<void>({ do: 'say', text }),
  result: (passes: number, failures: number) => ask<void>({ do: 'result', passes, failures }),
  picture: (name: string, of: Place = 'window') => ask<string>({ do: 'picture', name, of }),
  press: (key: string) => ask<void>({ do: 'press', key }),
  type: (text: string) => ask<void>({ do: 'type', text }),
  click: (selector: string, place: Place = 'panel') => ask<void>({ do: 'click', in: place, selector }),
  hover: (selector: string, place: Place = 'panel') => ask<void>({ do: 'hover', in: place, selector }),
  focus: (selector: string, place: Place = 'panel') => ask<void>({ do: 'focus', in: place, selector }),
  drag: (selector: string, dx: number, dy: number, place: Place = 'panel') => ask<void>({ do: 'drag', in: place, selector, dx, dy }),
  text: (selector: string, place: Place = 'panel') => ask<string | null>({ do: 'text', in: place, selector }),
  count: (selector: string, place: Place = 'panel') => ask<number>({ do: 'count', in: place, selector }),
  /** `script` is the source of a function that gets the root element. */
  evaluate: <T>(script: string, place: Place = 'panel') => ask<T>({ do: 'evaluate', in: place, script }),
  viewport: (width: number, height: number) => ask<void>({ do: 'viewport', width, height }),
  reducedMotion: (reducedMotion: boolean) => ask<void>({ do: 'media', reducedMotion }),
  accessibility: () => ask<readonly AccessibilityViolation[]>({ do: 'accessibility' }),
  policyViolations: () => ask<readonly string[]>({ do: 'policy violations' }),
};
