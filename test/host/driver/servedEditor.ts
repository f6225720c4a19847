import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { format } from 'node:util';
import { chromium } from 'playwright-core';
import { chromiumArguments, prepareChromium } from '../preparePrograms';
import { prepareServedEditor } from '../prepareEditor';
import { startEditorServer } from './editorServer';
import { pageBridge } from './pageBridge';
import { performAction } from './performAction';

/** The editor in a browser writes its state down every five seconds, and cannot while the page unloads. */
const STORED_AFTER_MS = 6_000;

/** What the editor itself says about its own start, of no use to whoever reads a test run. */
const isNoise = (line: string) => /connection token|^Creating a socket|Service Worker|ChatSessionStore|builtin extensions|vsda|open-vsx|extensions gallery|\[lifecycle\]/i.test(line);

/**
 * The editor as a program that the test runner can start: the served editor in a headless browser. Takes the desktop
 * editor's arguments that matter here, `--extensionDevelopmentPath=`, `--extensionTestsPath=` and a folder, workspace file or
 * nothing to open; prints what the suite prints; ends with the suite's exit code. Variables: `OHMWARD_PICTURES` (folder),
 * `OHMWARD_TRUST=ask` (workspace trust is on), `OHMWARD_PHASES` (how often the window is loaded; the suite learns which
 * load it is in), `OHMWARD_TIMEOUT_MS`.
 */
async function main(): Promise<number> {
  const valueOf = (name: string) => process.argv.find((arg) => arg.startsWith(`--${name}=`))?.slice(name.length + 3);
  const extension = valueOf('extensionDevelopmentPath');
  const tests = valueOf('extensionTestsPath');
  if (extension === undefined || tests === undefined) throw new Error('--extensionDevelopmentPath= and --extensionTestsPath= are needed');
  const opened = process.argv.slice(2).find((arg) => !arg.startsWith('-'));
  const phases = Number(process.env.OHMWARD_PHASES ?? '1');
  const limitMs = Number(process.env.OHMWARD_TIMEOUT_MS ?? '240000');

  const [entry, executablePath] = [await prepareServedEditor(), await prepareChromium()];
  const dataFolder = await mkdtemp(path.join(tmpdir(), 'ohmward-editor-'));
  const browser = await chromium.launch({ executablePath, headless: true, args: chromiumArguments });
  const page = await browser.newPage({ viewport: { width: 1400, height: 900 } });
  const policyViolations: string[] = [];
  let phase = 1;
  const picturesFolder = process.env.OHMWARD_PICTURES ?? path.join(tmpdir(), 'ohmward-pictures');
  const bridge = await pageBridge((action) => performAction({ page, picturesFolder, phase: () => phase, policyViolations }, action));
  const server = await startEditorServer({
    entry, dataFolder, trustEverything: process.env.OHMWARD_TRUST !== 'ask', environment: { OHMWARD_BRIDGE: bridge.url, EXTENSIONS_GALLERY: '{"serviceUrl":""}' },
    settings: {
      'workbench.startupEditor': 'none', 'workbench.tips.enabled': false, 'security.workspace.trust.startupPrompt': 'never', 'security.workspace.trust.banner': 'never',
      'security.workspace.trust.untrustedFiles': 'open', 'telemetry.telemetryLevel': 'off', 'extensions.ignoreRecommendations': true, 'files.autoSave': 'off',
      'editor.hover.delay': 100, 'git.enabled': false, 'update.mode': 'none', 'workbench.secondarySideBar.defaultVisibility': 'hidden',
    },
  });
  try {
    let end: (code: number) => void = () => {};
    await page.exposeFunction('codeAutomationLog', (type: string, args: unknown[]) => {
      const line = format(...args);
      if (isNoise(line) && !process.env.OHMWARD_VERBOSE) return;
      if (type === 'error' || type === 'warn') console.error(line);
      else console.log(line);
    });
    await page.exposeFunction('codeAutomationExit', (code: number) => end(code));
    page.on('console', (message) => {
      if (/content.security.policy/i.test(message.text())) policyViolations.push(message.text());
      if (process.env.OHMWARD_VERBOSE) console.log(`[browser ${message.type()}] ${message.text()}`);
    });
    page.on('dialog', (dialog) => void dialog.accept());
    const remote = (file: string) => `vscode-remote://127.0.0.1:${server.port}${path.resolve(file)}`;
    const query = new URLSearchParams({
      ...(opened === undefined ? { ew: 'true' } : { [opened.endsWith('.code-workspace') ? 'workspace' : 'folder']: path.resolve(opened) }),
      payload: JSON.stringify([['extensionDevelopmentPath', remote(extension)], ['extensionTestsPath', remote(tests)]]),
    });
    for (; phase <= phases; phase++) {
      if (phase > 1) await new Promise((resolve) => setTimeout(resolve, STORED_AFTER_MS));
      const code = await new Promise<number>((resolve, reject) => {
        end = resolve;
        setTimeout(() => reject(new Error(`The suite did not end within ${limitMs} ms.`)), limitMs).unref();
        page.on('crash', () => reject(new Error('The browser page crashed.')));
        const loading = phase === 1 ? page.goto(`http://127.0.0.1:${server.port}/?${query}`) : page.reload();
        loading.catch(reject);
      });
      if (code !== 0) return code;
    }
    return 0;
  } finally {
    await browser.close();
    bridge.close();
    await server.stop();
    await rm(dataFolder, { recursive: true, force: true, maxRetries: 5 });
  }
}

main().then(
  (code) => process.exit(code),
  (error: unknown) => {
    console.error(error instanceof Error ? error.stack : error);
    process.exit(1);
  },
);
