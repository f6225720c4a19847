import { cpSync, mkdtempSync, realpathSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { runCommandLine } from '../../src/cli/runCommandLine';

export interface Outcome {
  readonly code: number;
  readonly out: string;
  readonly error: string;
}

const samples = fileURLToPath(new URL('../../media/samples/', import.meta.url));

/** Each test of the suite around it works in a folder of its own, which it is called from: empty, or with a copy of the samples. */
export function inFolder({ withSamples = false }: { readonly withSamples?: boolean } = {}): { readonly folder: string } {
  const before = process.cwd();
  let folder = '';
  beforeEach(() => {
    folder = realpathSync(mkdtempSync(join(tmpdir(), 'ohmward-')));
    if (withSamples) cpSync(samples, folder, { recursive: true });
    process.chdir(folder);
  });
  afterEach(() => {
    process.chdir(before);
    rmSync(folder, { recursive: true, force: true });
  });
  return { get folder() { return folder; } };
}

/** The command line, as it would be called there, without colours and without a terminal. */
export async function run(...words: string[]): Promise<Outcome> {
  let out = '';
  let error = '';
  const code = await runCommandLine(words, { out: (text) => { out += text; }, error: (text) => { error += text; }, colour: false });
  return { code, out, error };
}
