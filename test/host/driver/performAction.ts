import { appendFile, mkdir, readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import path from 'node:path';
import type { Locator, Page } from 'playwright-core';
import type { AccessibilityViolation, PageAction, Place } from './pageActions';

/** Long enough for a loaded machine; a wait ends as soon as the thing is there. */
const ACTION_TIMEOUT_MS = 15_000;

/** No hand is faster between a click and a key. */
const FOCUS_TOLD_MS = 200;

export interface Performer {
  readonly page: Page;
  readonly picturesFolder: string;
  readonly load: () => number;
  readonly policyViolations: readonly string[];
}

function locate(page: Page, place: Place, selector: string): Locator {
  if (place === 'window') return page.locator(selector).first();
  return page.frameLocator('iframe.webview >> nth=-1').frameLocator('#active-frame').locator(selector).first();
}

/** The function whose source a suite sent; it runs in the page, not here. */
const functionOf = (source: string) => (0, eval)(`(${source})`) as (root: Element) => unknown;

async function accessibility(page: Page): Promise<AccessibilityViolation[]> {
  const source = await readFile(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
  const root = locate(page, 'panel', ':root');
  await root.evaluate(functionOf(`() => { ${source}\n }`));
  const found = await root.evaluate(functionOf(`() => axe.run(document, { resultTypes: ['violations'] }).then((results) => results.violations.map((violation) => ({
    id: violation.id, impact: String(violation.impact), help: violation.help, targets: violation.nodes.map((node) => node.target.join(' ')),
  })))`));
  return found as AccessibilityViolation[];
}

/** Does in the browser what a suite asked for. */
export async function performAction({ page, picturesFolder, load, policyViolations }: Performer, action: Exclude<PageAction, { do: 'load again' }>): Promise<unknown> {
  const timeout = ACTION_TIMEOUT_MS;
  switch (action.do) {
    case 'which load':
      return load();
    case 'say':
      return console.log(action.text);
    case 'result':
      return appendFile(process.env.OHMWARD_RESULTS ?? '/dev/null', `${JSON.stringify({ passes: action.passes, failures: action.failures })}\n`);
    case 'picture': {
      await mkdir(picturesFolder, { recursive: true });
      const file = path.join(picturesFolder, `${action.name.replace(/[^\w-]+/g, '-')}.png`);
      if (action.of === 'window') await page.screenshot({ path: file, timeout });
      else await locate(page, 'panel', ':root').screenshot({ path: file, timeout });
      return file;
    }
    case 'press':
      return page.keyboard.press(action.key);
    case 'type':
      return page.keyboard.type(action.text);
    case 'hover':
      return locate(page, action.in, action.selector).hover({ timeout });
    case 'click':
    case 'focus': {
      const target = locate(page, action.in, action.selector);
      await (action.do === 'click' ? target.click({ timeout }) : target.focus({ timeout }));
      // The editor learns by a message that a webview has the focus; until then it takes chords such as select all for its own.
      return action.in === 'panel' ? page.waitForTimeout(FOCUS_TOLD_MS) : undefined;
    }
    case 'drag': {
      const box = await locate(page, action.in, action.selector).boundingBox({ timeout });
      if (!box) throw new Error(`${action.selector} has no place on the screen`);
      const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
      await page.mouse.move(x, y);
      await page.mouse.down();
      await page.mouse.move(x + action.dx, y + action.dy, { steps: 8 });
      return page.mouse.up();
    }
    case 'text': {
      const found = locate(page, action.in, action.selector);
      return (await found.count()) === 0 ? null : found.innerText({ timeout });
    }
    case 'count':
      return action.in === 'window'
        ? page.locator(action.selector).count()
        : page.frameLocator('iframe.webview >> nth=-1').frameLocator('#active-frame').locator(action.selector).count();
    case 'evaluate':
      return locate(page, action.in, ':root').evaluate(functionOf(action.script));
    case 'viewport':
      return page.setViewportSize({ width: action.width, height: action.height });
    case 'media':
      return page.emulateMedia({ reducedMotion: action.reducedMotion ? 'reduce' : 'no-preference' });
    case 'accessibility':
      return accessibility(page);
    case 'policy violations':
      return policyViolations;
  }
}
