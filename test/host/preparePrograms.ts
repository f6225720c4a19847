import { existsSync } from 'node:fs';
import path from 'node:path';
import { runProgram } from './runProgram';

const NAMES = ['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable'];

export const chromiumArguments = [
  '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync',
];

function onPath(names: readonly string[]): string | null {
  const folders = (process.env.PATH ?? '').split(path.delimiter).filter((folder) => folder !== '');
  for (const name of names) {
    for (const folder of folders) {
      const candidate = path.join(folder, name);
      if (existsSync(candidate)) return candidate;
    }
  }
  return null;
}

/** Debian packages, where we may install them. */
export async function installPackages(packages: readonly string[]): Promise<void> {
  if (process.getuid?.() !== 0 || onPath(['apt-get']) === null) {
    throw new Error(`These packages are needed and can only be installed by an administrator: ${packages.join(' ')}`);
  }
  console.log(`Installing ${packages.join(', ')} …`);
  const env = { DEBIAN_FRONTEND: 'noninteractive' };
  await runProgram('apt-get', ['update', '-qq'], { env });
  await runProgram('apt-get', ['install', '-y', '-qq', ...packages], { env });
}

/** The browser's path: the variable `OHMWARD_CHROMIUM`, one that is installed, or Debian's, installed now. */
export async function prepareChromium(): Promise<string> {
  const given = process.env.OHMWARD_CHROMIUM;
  if (given !== undefined && given !== '') {
    if (!existsSync(given)) throw new Error(`OHMWARD_CHROMIUM names ${given}, which does not exist.`);
    return given;
  }
  const found = onPath(NAMES);
  if (found !== null) return found;
  await installPackages(['chromium', 'fonts-dejavu']);
  const installed = onPath(NAMES);
  if (installed === null) throw new Error('Chromium was installed but is not on the path.');
  return installed;
}

/** The program that the editor searches folders with; the editor's package would fetch its own from elsewhere. */
export async function prepareSearchProgram(): Promise<string> {
  const found = onPath(['rg']);
  if (found !== null) return found;
  await installPackages(['ripgrep']);
  return onPath(['rg']) ?? '/usr/bin/rg';
}

/** What building native modules takes. */
export async function prepareCompilers(): Promise<void> {
  const needed: string[] = [];
  if (onPath(['g++', 'c++']) === null || onPath(['make']) === null) needed.push('build-essential');
  if (onPath(['python3']) === null) needed.push('python3');
  if (needed.length > 0) await installPackages(needed);
}
