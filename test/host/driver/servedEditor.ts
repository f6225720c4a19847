import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { prepareServedEditor } from '../prepareEditor';
import { argument, openEditorPage, runAsProgram } from './editorPage';
import { startEditorServer } from './editorServer';

const settings = {
  'workbench.startupEditor': 'none', 'workbench.tips.enabled': false, 'security.workspace.trust.startupPrompt': 'never', 'security.workspace.trust.banner': 'never',
  'security.workspace.trust.untrustedFiles': 'open', 'telemetry.telemetryLevel': 'off', 'extensions.ignoreRecommendations': true, 'files.autoSave': 'off',
  'editor.hover.delay': 100, 'git.enabled': false, 'update.mode': 'none', 'workbench.secondarySideBar.defaultVisibility': 'hidden',
};

/**
 * The editor as a program that the test runner can start: the served editor in a headless browser. Takes the desktop
 * editor's arguments that matter here, `--extensionDevelopmentPath=`, `--extensionTestsPath=` and a folder, workspace file or
 * nothing to open; prints what the suite prints; ends with the suite's exit code. Variables: `OHMWARD_TRUST=ask` (workspace
 * trust is on), and those of the page.
 */
async function main(): Promise<number> {
  const [extension, tests] = [argument('extensionDevelopmentPath'), argument('extensionTestsPath')];
  const opened = process.argv.slice(2).find((arg) => !arg.startsWith('-'));
  const entry = await prepareServedEditor();
  const dataFolder = await mkdtemp(path.join(tmpdir(), 'ohmward-editor-'));
  const editor = await openEditorPage({ quiet: false });
  const server = await startEditorServer({
    entry, dataFolder, settings, trustEverything: process.env.OHMWARD_TRUST !== 'ask',
    environment: { OHMWARD_BRIDGE: editor.bridge.url, EXTENSIONS_GALLERY: '{"serviceUrl":""}' },
  });
  try {
    const remote = (file: string) => `vscode-remote://127.0.0.1:${server.port}${path.resolve(file)}`;
    const query = new URLSearchParams({
      ...(opened === undefined ? { ew: 'true' } : { [opened.endsWith('.code-workspace') ? 'workspace' : 'folder']: path.resolve(opened) }),
      payload: JSON.stringify([['extensionDevelopmentPath', remote(extension)], ['extensionTestsPath', remote(tests)]]),
    });
    return await editor.run(`http://127.0.0.1:${server.port}/?${query}`);
  } finally {
    await editor.close();
    await server.stop();
    await rm(dataFolder, { recursive: true, force: true, maxRetries: 5 });
  }
}

runAsProgram(main);
