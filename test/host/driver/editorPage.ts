import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { format } from 'node:util';
import { chromium } from 'playwright-core';
import { chromiumArguments, prepareChromium } from '../preparePrograms';
import { pageBridge, type PageBridge } from './pageBridge';
import { performAction } from './performAction';

/**
 * Keeps the page, once told so, from noticing that it is left. In a browser the editor's orderly end is a race between
 * parting from the extension host and writing the state, and a panel whose host is gone is not written; what the editor
 * wrote before counts. Put into the page before the editor, so that ours are the first listeners.
 */
const listenFirst = () => {
  for (const event of ['beforeunload', 'pagehide', 'unload']) {
    window.addEventListener(event, (told) => 'leaveUnnoticed' in window && told.stopImmediatePropagation(), { capture: true });
  }
};

/** What the editor itself says about its own start, of no use to whoever reads a test run. */
const isNoise = (line: string) =>
  /connection token|^Creating a socket|Service Worker|ChatSessionStore|builtin extensions|vsda|open-vsx|extensions gallery|\[lifecycle\]|^Creation of workbench contribution/i.test(line);

/** A headless browser for an editor that runs a suite. */
export interface EditorPage {
  readonly bridge: PageBridge;
  /** Loads the editor's page, again whenever the suite asks for it; gives the suite's exit code. */
  run(url: string): Promise<number>;
  close(): Promise<void>;
}

/** `quiet`: only what the suite says through the bridge is printed. Variables: `OHMWARD_PICTURES` (folder for pictures), `OHMWARD_TIMEOUT_MS` (of one load), `OHMWARD_VERBOSE` (everything that is said). */
export async function openEditorPage(options: { readonly quiet: boolean }): Promise<EditorPage> {
  const limitMs = Number(process.env.OHMWARD_TIMEOUT_MS ?? '240000');
  const verbose = Boolean(process.env.OHMWARD_VERBOSE);
  const executablePath = await prepareChromium();
  const profile = await mkdtemp(path.join(tmpdir(), 'ohmward-browser-'));
  // Where webviews are served from another origin, they need their service worker in a third-party frame.
  await mkdir(path.join(profile, 'Default'));
  await writeFile(path.join(profile, 'Default', 'Preferences'), JSON.stringify({ profile: { cookie_controls_mode: 0, block_third_party_cookies: false } }));
  const browser = await chromium.launchPersistentContext(profile, { executablePath, headless: true, args: chromiumArguments, viewport: { width: 1400, height: 900 } });
  const page = await browser.newPage();
  await page.addInitScript(listenFirst);
  const policyViolations: string[] = [];
  const picturesFolder = process.env.OHMWARD_PICTURES ?? path.join(tmpdir(), 'ohmward-pictures');
  let load = 1;
  let end: (code: number) => void = () => {};
  const loadAgain = async () => {
    load++;
    await page.evaluate(() => Object.assign(window, { leaveUnnoticed: true }));
    // After the answer: the suite that asks ends with the page.
    setTimeout(() => void page.reload().catch((error: unknown) => console.error(error)), 100);
  };
  const bridge = await pageBridge((action) =>
    action.do === 'load again' ? loadAgain() : performAction({ page, picturesFolder, load: () => load, policyViolations }, action));
  await page.exposeFunction('codeAutomationLog', (type: string, args: unknown[]) => {
    const line = format(...args);
    if ((options.quiet || isNoise(line)) && !verbose) return;
    if (type === 'error' || type === 'warn') console.error(line);
    else console.log(line);
  });
  await page.exposeFunction('codeAutomationExit', (code: number) => end(code));
  page.on('console', (message) => {
    if (/content.security.policy/i.test(message.text())) policyViolations.push(message.text());
    if (verbose) console.log(`[browser ${message.type()}] ${message.text()}`);
  });
  page.on('dialog', (dialog) => void dialog.accept().catch(() => undefined)); // it may be gone with its page already

  return {
    bridge,
    run: (url) =>
      new Promise<number>((resolve, reject) => {
        end = resolve;
        setTimeout(() => reject(new Error(`The suite did not end within ${limitMs} ms.`)), limitMs).unref();
        page.once('crash', () => reject(new Error('The browser page crashed.')));
        page.goto(url).catch(reject);
      }),
    async close() {
      await browser.close();
      bridge.close();
      await rm(profile, { recursive: true, force: true, maxRetries: 5 });
    },
  };
}

/** The value of `--name=value` on the command line. */
export function argument(name: string): string {
  const value = process.argv.find((arg) => arg.startsWith(`--${name}=`))?.slice(name.length + 3);
  if (value === undefined) throw new Error(`--${name}= is needed`);
  return value;
}

/** Ends the process with the code that `main` gives. */
export function runAsProgram(main: () => Promise<number>): void {
  main().then(
    (code) => process.exit(code),
    (error: unknown) => {
      console.error(error instanceof Error ? error.stack : error);
      process.exit(1);
    },
  );
}
