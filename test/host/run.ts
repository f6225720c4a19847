import { chmod, cp, mkdir, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { runTests } from '@vscode/test-electron';
import * as esbuild from 'esbuild';
import { scenarios, type Scenario } from './scenarios';

const here = path.dirname(fileURLToPath(import.meta.url));
const root = path.resolve(here, '..', '..');
// A folder of this run's own, so that two runs at once do not take each other's programs away.
const out = path.join(root, 'out', `host-${process.pid}`);

/** The suite and the driver as programs: the extension host has no TypeScript. */
async function bundle(): Promise<void> {
  const all = (await readdir(path.join(here, 'suite'), { recursive: true })).filter((name) => name.endsWith('.test.ts')).map((name) => name.split(path.sep).join('/'));
  const web = all.filter((name) => name.startsWith('web/'));
  const files = all.filter((name) => !name.startsWith('web/'));
  const common = { bundle: true, platform: 'node', target: 'node20', logLevel: 'warning', sourcemap: 'inline' } as const;
  await Promise.all([
    esbuild.build({
      ...common, format: 'cjs', outdir: path.join(out, 'suite'), outbase: path.join(here, 'suite'), outExtension: { '.js': '.cjs' }, external: ['vscode', 'mocha'],
      entryPoints: files.map((name) => path.join(here, 'suite', name)),
    }),
    esbuild.build({ ...common, format: 'cjs', outfile: path.join(out, 'suite.cjs'), external: ['vscode', 'mocha'], entryPoints: [path.join(here, 'suite', 'index.ts')] }),
    esbuild.build({
      ...common, platform: 'browser', target: 'es2022', format: 'cjs', outfile: path.join(out, 'webSuite.cjs'), external: ['vscode'],
      define: { module: 'undefined' }, // or mocha would take itself for the whole module and put itself in the place of our exports
      stdin: { contents: [`import './webIndex';`, ...web.map((name) => `import './${name}';`), `export { run } from './webIndex';`].join('\n'), resolveDir: path.join(here, 'suite') },
    }),
    esbuild.build({
      ...common, format: 'esm', outdir: out, outExtension: { '.js': '.mjs' }, packages: 'external', banner: { js: '#!/usr/bin/env node' },
      entryPoints: ['servedEditor.ts', 'webEditor.ts'].map((name) => path.join(here, 'driver', name)),
    }),
  ]);
  for (const program of ['servedEditor.mjs', 'webEditor.mjs']) await chmod(path.join(out, program), 0o755);
}

/** A copy of the sample workspaces and of the fixtures, which the tests may change. Returns what the editor is to open. */
async function prepareWorkspace(folder: string, opens: Scenario['opens']): Promise<string | null> {
  const samples = path.join(folder, 'samples');
  await cp(path.join(root, 'media', 'samples'), samples, { recursive: true });
  await cp(path.join(here, 'workspace'), path.join(samples, 'fixtures'), { recursive: true });
  // Outside of what any scenario opens, for descriptions that try to reach it.
  await cp(path.join(here, 'workspace', 'board.s1p'), path.join(folder, 'outside.s1p'));
  if (opens === 'nothing') return null;
  if (opens === 'folder') return samples;
  const file = path.join(folder, 'boards.code-workspace');
  await writeFile(file, JSON.stringify({ folders: [{ path: 'samples/orchard' }, { path: 'samples/fixtures' }], settings: {} }));
  return file;
}

async function runScenario(scenario: Scenario, results: string): Promise<boolean> {
  const desktop = process.env.OHMWARD_EDITOR;
  const folder = await mkdtemp(path.join(tmpdir(), 'ohmward-host-'));
  try {
    const opened = await prepareWorkspace(folder, scenario.opens);
    console.log(`\n— ${scenario.suite}: ${scenario.what}`);
    await runTests({
      vscodeExecutablePath: scenario.web ? path.join(out, 'webEditor.mjs') : (desktop ?? path.join(out, 'servedEditor.mjs')),
      extensionDevelopmentPath: root,
      extensionTestsPath: path.join(out, 'suite.cjs'),
      launchArgs: opened === null ? [] : [opened],
      extensionTestsEnv: {
        OHMWARD_SUITE: scenario.suite, OHMWARD_WORKSPACE: path.join(folder, 'samples'), OHMWARD_RESULTS: results, OHMWARD_PICTURES: path.join(root, 'out', 'pictures'),
        OHMWARD_LOADS: String(scenario.loads), OHMWARD_TRUST: scenario.trusted ? 'all' : 'ask',
      },
    });
    return true;
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    return false;
  } finally {
    await rm(folder, { recursive: true, force: true, maxRetries: 5 });
  }
}

/** `tsx test/host/run.ts [SUITE …]` */
async function main(): Promise<void> {
  const asked = process.argv.slice(2);
  // A desktop editor's window is not ours to drive: there only what the editor's own interface can show is run.
  const possible = scenarios.filter((scenario) => process.env.OHMWARD_EDITOR === undefined || !scenario.needsPage);
  const chosen = asked.length === 0 ? possible.filter(({ onlyAsked }) => onlyAsked !== true) : possible.filter(({ suite }) => asked.includes(suite));
  if (chosen.length === 0) throw new Error(`No such suite. There are: ${possible.map(({ suite }) => suite).join(', ')}`);
  await bundle();
  await mkdir(out, { recursive: true });
  const results = path.join(out, 'results.jsonl');
  await writeFile(results, '');
  let broken = 0;
  for (const scenario of chosen) if (!(await runScenario(scenario, results))) broken++;
  const counts = (await readFile(results, 'utf8')).split('\n').filter((line) => line !== '').map((line) => JSON.parse(line) as { passes: number; failures: number });
  const passed = counts.reduce((sum, count) => sum + count.passes, 0);
  const failed = counts.reduce((sum, count) => sum + count.failures, 0);
  console.log(`\n${passed} passed, ${Math.max(failed, broken)} failed`);
  process.exitCode = broken > 0 || passed === 0 ? 1 : 0;
}

try {
  await main();
} finally {
  await rm(out, { recursive: true, force: true });
}
