import { spawn } from 'node:child_process';

/** Runs a program to its end; an exit code other than 0 is an error that carries the last lines of its output. */
export function runProgram(program: string, args: readonly string[], options: { cwd?: string; env?: NodeJS.ProcessEnv } = {}): Promise<string> {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { cwd: options.cwd, env: { ...process.env, ...options.env }, stdio: ['ignore', 'pipe', 'pipe'] });
    let output = '';
    const take = (chunk: Buffer) => {
      output = (output + chunk.toString()).slice(-20_000);
    };
    child.stdout.on('data', take);
    child.stderr.on('data', take);
    child.on('error', reject);
    child.on('close', (code) => {
      if (code === 0) resolve(output);
      else reject(new Error(`${program} ${args.join(' ')} ended with ${code}:\n${output.split('\n').slice(-40).join('\n')}`));
    });
  });
}
