import { parseArgs } from 'node:util';
import { CallError } from './callError';
import { check } from './check';
import { codes } from './codes';
import { report } from './report';
import { solve } from './solve';
import { sweep } from './sweep';
import { tidyFiles } from './tidyFiles';
import { toolVersion } from './toolVersion';
import { usage } from './usage';

/** What a command may use of the world; a test hands in its own. */
export interface Surroundings {
  readonly out: (text: string) => void;
  readonly error: (text: string) => void;
  /** Colours only on a terminal. */
  readonly colour: boolean;
  /** Writes a line over the one before it, on a terminal; an empty one takes it away. Null where nobody looks. */
  readonly progress?: ((line: string) => void) | null;
}

const options = {
  format: { type: 'string' }, since: { type: 'string' }, output: { type: 'string', short: 'o' }, case: { type: 'string' },
  verify: { type: 'boolean' }, top: { type: 'string' }, again: { type: 'boolean' }, write: { type: 'boolean' }, 'two-port': { type: 'boolean' }, help: { type: 'boolean', short: 'h' }, version: { type: 'boolean' },
} as const;

export type CallOptions = { readonly [K in keyof typeof options]?: (typeof options)[K]['type'] extends 'string' ? string : boolean };

interface Command {
  readonly options: readonly (keyof typeof options)[];
  readonly run: (paths: readonly string[], options: CallOptions, around: Surroundings) => number | Promise<number>;
}

const commands: Readonly<Record<string, Command>> = {
  check: { options: ['format', 'since'], run: check },
  solve: { options: ['format', 'top', 'again', 'write'], run: solve },
  sweep: { options: ['format', 'output', 'case', 'two-port'], run: sweep },
  codes: { options: ['format', 'write', 'verify'], run: codes },
  report: { options: ['output'], run: report },
  tidy: { options: ['verify'], run: tidyFiles },
};

/** The exit code: 0 all holds, 1 something does not, 2 the call is wrong or a description named in it cannot be read. */
export async function runCommandLine(words: readonly string[], around: Surroundings): Promise<number> {
  try {
    const { values, positionals } = parseWords(words);
    if (values.version) {
      around.out(`${toolVersion()}\n`);
      return 0;
    }
    const [name, ...paths] = positionals;
    if (values.help || name === undefined) {
      (values.help ? around.out : around.error)(usage);
      return values.help ? 0 : 2;
    }
    const command = Object.hasOwn(commands, name) ? commands[name] : null;
    if (!command) throw new CallError(`there is no command «${name}»; the commands are ${Object.keys(commands).join(', ')}`);
    const foreign = Object.keys(values).find((key) => !command.options.includes(key as keyof typeof options));
    if (foreign) throw new CallError(`${name} takes no --${foreign}`);
    if (paths.length === 0) throw new CallError(`${name} needs a description or a folder`);
    return await command.run(paths, values, around);
  } catch (error) {
    if (!(error instanceof CallError)) throw error;
    around.error(`ohmward: ${error.message}\n`);
    return 2;
  }
}

function parseWords(words: readonly string[]): { values: CallOptions; positionals: string[] } {
  try {
    return parseArgs({ args: [...words], options, allowPositionals: true, strict: true });
  } catch (error) {
    // Node words these for programmers («To specify a positional argument starting with…»); the first sentence will do.
    throw new CallError((error as Error).message.split('. ')[0]);
  }
}
