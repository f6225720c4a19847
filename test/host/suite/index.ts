import { appendFile, readdir } from 'node:fs/promises';
import path from 'node:path';
import { page } from './page';

/**
 * Runs the test files of one folder of the suite inside the extension host. The folder is named by `OHMWARD_SUITE`; the
 * second load of the window runs the folder of that name with `AfterReload`. Files are found by pattern.
 */
export async function run(): Promise<void> {
  const suite = process.env.OHMWARD_SUITE;
  if (suite === undefined) throw new Error('OHMWARD_SUITE is not set');
  const folder = path.join(__dirname, 'suite', (await page.phase()) === 1 ? suite : `${suite}AfterReload`);
  const { default: Mocha } = await import('mocha');
  const mocha = new Mocha({ timeout: 60_000, color: false, grep: process.env.OHMWARD_GREP, forbidOnly: true, forbidPending: true });
  for (const name of (await readdir(folder)).sort()) if (name.endsWith('.test.cjs')) mocha.addFile(path.join(folder, name));
  if (mocha.files.length === 0) throw new Error(`${folder} has no tests`);
  const failures = await new Promise<number>((resolve) => {
    const runner = mocha.run(resolve);
    runner.on('end', () => {
      const { passes = 0, failures: failed = 0 } = runner.stats ?? {};
      const results = process.env.OHMWARD_RESULTS;
      if (results !== undefined) void appendFile(results, `${JSON.stringify({ passes, failures: failed })}\n`);
    });
  });
  if (failures > 0) throw new Error(`${failures} failed`);
}
