// Builds everything under dist/: node esbuild.mjs [--watch] [--development]
import { existsSync } from 'node:fs';
import { chmod, mkdir, readdir, readFile, rm } from 'node:fs/promises';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import * as esbuild from 'esbuild';

const root = path.dirname(fileURLToPath(import.meta.url));
const { version } = JSON.parse(await readFile(path.join(root, 'package.json'), 'utf8'));
const watch = process.argv.includes('--watch');
const development = watch || process.argv.includes('--development');

const common = {
  absWorkingDir: root,
  bundle: true,
  minify: !development,
  sourcemap: development ? 'linked' : false,
  legalComments: 'none',
  logLevel: 'warning',
  charset: 'utf8',
  define: { 'process.env.NODE_ENV': development ? '"development"' : '"production"', OHMWARD_VERSION: JSON.stringify(version) },
};
const node = { ...common, platform: 'node', target: 'node20', format: 'cjs', mainFields: ['module', 'main'] };
const browser = { ...common, platform: 'browser', target: 'es2022' };

/** @type {{ entry: string; options: esbuild.BuildOptions; executable?: boolean }[]} */
const outputs = [
  // One bundle for both extension hosts, with Node and without. The worker host of editors that live in a browser takes an
  // entry for CommonJS only if its name ends in .cjs.
  { entry: 'src/editor/extension.ts', options: { ...browser, format: 'cjs', outfile: 'dist/extension.cjs', external: ['vscode'] } },
  // The solver's worker, for both hosts too; its text is handed to whatever starts it.
  { entry: 'src/worker/solverWorker.ts', options: { ...browser, format: 'iife', outfile: 'dist/solver.js' } },
  { entry: 'src/cli/main.ts', options: { ...node, outfile: 'dist/ohmward.cjs', banner: { js: '#!/usr/bin/env node' } }, executable: true },
  { entry: 'webview/main.ts', options: { ...browser, format: 'iife', outfile: 'dist/webview.js' } },
  { entry: 'webview/panel.css', options: { ...browser, outfile: 'dist/webview.css' } },
];

const dist = path.join(root, 'dist');
await mkdir(dist, { recursive: true });
const wanted = new Set(outputs.flatMap(({ options }) => [options.outfile, ...(development ? [`${options.outfile}.map`] : [])]));
for (const name of await readdir(dist)) {
  if (!wanted.has(`dist/${name}`)) await rm(path.join(dist, name), { recursive: true, force: true });
}
const present = outputs.filter(({ entry }) => {
  if (existsSync(path.join(root, entry))) return true;
  console.log(`left out: ${entry} is not there`);
  return false;
});

if (watch) {
  for (const { entry, options } of present) {
    const context = await esbuild.context({ ...options, entryPoints: [entry] });
    await context.watch();
    console.log(`watching ${entry}`);
  }
  console.log('watching for changes');
} else {
  const results = await Promise.allSettled(present.map(({ entry, options }) => esbuild.build({ ...options, entryPoints: [entry], metafile: true })));
  for (const [i, result] of results.entries()) {
    const { entry, options, executable } = present[i];
    if (result.status === 'rejected') {
      process.exitCode = 1; // esbuild has printed what is wrong
      continue;
    }
    const bytes = Object.values(result.value.metafile.outputs).reduce((sum, output) => sum + output.bytes, 0);
    if (executable) await chmod(path.join(root, options.outfile), 0o755);
    console.log(`${options.outfile.padEnd(28)} ${(bytes / 1024).toFixed(1).padStart(8)} kB  ${entry}`);
  }
}
