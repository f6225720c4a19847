import { spawn } from 'node:child_process';
import { mkdir, writeFile } from 'node:fs/promises';
import { createServer, type AddressInfo } from 'node:net';
import path from 'node:path';

const START_TIMEOUT_MS = 60_000;

export interface EditorServer {
  readonly port: number;
  stop(): Promise<void>;
}

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.on('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address() as AddressInfo;
      probe.close(() => resolve(port));
    });
  });
}

export interface EditorServerOptions {
  readonly entry: string;
  /** An empty folder of this run's own. */
  readonly dataFolder: string;
  readonly trustEverything: boolean;
  readonly settings: Readonly<Record<string, unknown>>;
  readonly environment: NodeJS.ProcessEnv;
}

/** Starts the served editor on a free port of the loopback and waits until it listens. */
export async function startEditorServer(options: EditorServerOptions): Promise<EditorServer> {
  const port = await freePort();
  const { dataFolder } = options;
  await mkdir(path.join(dataFolder, 'User'), { recursive: true });
  await writeFile(path.join(dataFolder, 'User', 'settings.json'), JSON.stringify(options.settings, null, 2));
  const args = [
    options.entry, '--auth', 'none', '--bind-addr', `127.0.0.1:${port}`, '--user-data-dir', dataFolder, '--extensions-dir', path.join(dataFolder, 'x'),
    '--disable-telemetry', '--disable-update-check', '--config', path.join(dataFolder, 'none.yaml'), ...(options.trustEverything ? ['--disable-workspace-trust'] : []),
  ];
  // Variables of an editor around this run would make the server believe that it is that editor's child.
  const environment = Object.fromEntries(Object.entries({ ...process.env, ...options.environment }).filter(([name]) => !/^(VSCODE_|ELECTRON_|CODE_SERVER)/.test(name)));
  const child = spawn(process.execPath, args, { env: environment, stdio: ['ignore', 'pipe', 'pipe'] });
  const closed = new Promise<void>((resolve) => child.once('close', () => resolve()));
  let output = '';
  await new Promise<void>((resolve, reject) => {
    const late = setTimeout(() => reject(new Error(`The served editor did not start in time:\n${output}`)), START_TIMEOUT_MS);
    const take = (chunk: Buffer) => {
      output = (output + chunk.toString()).slice(-20_000);
      if (/listening on http/i.test(output)) {
        clearTimeout(late);
        resolve();
      }
    };
    child.stdout.on('data', take);
    child.stderr.on('data', take);
    child.once('close', (code) => {
      clearTimeout(late);
      reject(new Error(`The served editor ended with ${code}:\n${output}`));
    });
  });
  return {
    port,
    async stop() {
      child.kill('SIGTERM');
      const force = setTimeout(() => child.kill('SIGKILL'), 5_000);
      await closed;
      clearTimeout(force);
    },
  };
}
