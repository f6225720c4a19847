import { appendFile, readdir } from 'node:fs/promises';
import path from 'node:path';
import { page } from './page';

/** The editor in a browser writes its state down every five seconds. */
const STORED_AFTER_MS = 7_000;

/**
 * Runs the test files of one folder of the suite inside the extension host. The folder is named by `OHMWARD_SUITE`; the
 * second load of the window runs the folder of that name with `AfterReload`. Files are found by pattern.
 */
export async function run(): Promise<void> {
  const suite = process.env.OHMWARD_SUITE;
  if (suite === undefined) throw new Error('OHMWARD_SUITE is not set');
  const load = await page.load();
  const folder = path.join(__dirname, 'suite', load === 1 ? suite : `${suite}AfterReload`);
  const { default: Mocha } = await import('mocha');
  const mocha = new Mocha({ retries: 1, timeout: 60_000, color: false, grep: process.env.OHMWARD_GREP, forbidOnly: true, forbidPending: true });
  for (const name of (await readdir(folder)).sort()) if (name.endsWith('.test.cjs')) mocha.addFile(path.join(folder, name));
  if (mocha.files.length === 0) throw new Error(`${folder} has no tests`);
  const { passes, failures } = await new Promise<{ passes: number; failures: number }>((resolve) => {
    const runner = mocha.run((failed) => resolve({ passes: runner.stats?.passes ?? 0, failures: failed }));
  });
  const results = process.env.OHMWARD_RESULTS;
  if (results !== undefined) await appendFile(results, `${JSON.stringify({ passes, failures })}\n`);
  if (failures > 0) throw new Error(`${failures} failed`);
  if (load >= Number(process.env.OHMWARD_LOADS ?? '1')) return;
  // From within: when a suite ends, the editor stops the extension host first, and with it what would bring panels back.
  await new Promise((resolve) => setTimeout(resolve, STORED_AFTER_MS));
  await page.loadAgain();
  await new Promise(() => undefined);
}
