import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { format } from 'node:util';
import { chromium } from 'playwright-core';
import { chromiumArguments, prepareChromium } from '../preparePrograms';
import { pageBridge, type PageBridge } from './pageBridge';
import { performAction } from './performAction';

/** The editor in a browser writes its state down every five seconds, and cannot while the page unloads. */
const STORED_AFTER_MS = 6_000;

/** What the editor itself says about its own start, of no use to whoever reads a test run. */
const isNoise = (line: string) =>
  /connection token|^Creating a socket|Service Worker|ChatSessionStore|builtin extensions|vsda|open-vsx|extensions gallery|\[lifecycle\]/i.test(line);

/** A headless browser for an editor that runs a suite. */
export interface EditorPage {
  readonly bridge: PageBridge;
  /** Loads the editor's page so many times, one after another; gives the suite's exit code, the first that is not 0. */
  run(url: string, loads: number): Promise<number>;
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
  const policyViolations: string[] = [];
  const picturesFolder = process.env.OHMWARD_PICTURES ?? path.join(tmpdir(), 'ohmward-pictures');
  let load = 0;
  let end: (code: number) => void = () => {};
  const bridge = await pageBridge((action) => performAction({ page, picturesFolder, phase: () => load, policyViolations }, action));
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

  const loadOnce = (url: string) =>
    new Promise<number>((resolve, reject) => {
      end = resolve;
      setTimeout(() => reject(new Error(`The suite did not end within ${limitMs} ms.`)), limitMs).unref();
      page.once('crash', () => reject(new Error('The browser page crashed.')));
      (load === 1 ? page.goto(url) : page.reload()).catch(reject);
    });
  return {
    bridge,
    async run(url, loads) {
      for (load = 1; load <= loads; load++) {
        if (load > 1) await new Promise((resolve) => setTimeout(resolve, STORED_AFTER_MS));
        const code = await loadOnce(url);
        if (code !== 0) return code;
      }
      return 0;
    },
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
