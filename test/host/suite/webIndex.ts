import 'mocha/mocha.js';
import { page } from './page';
import { said, say } from './webConsole';

// The browser's mocha needs no document as long as no reporter of its own draws into one.
mocha.setup({ ui: 'bdd', reporter: 'spec', timeout: 60_000, color: false, forbidOnly: true, forbidPending: true } as unknown as Mocha.MochaOptions & { ui: 'bdd' });

(Mocha.reporters.Base as unknown as { consoleLog: typeof say }).consoleLog = say;

/** Runs the suite `web` inside an extension host that is a worker without Node. */
export async function run(): Promise<void> {
  const { passes, failures } = await new Promise<{ passes: number; failures: number }>((resolve) => {
    const runner = mocha.run((failed) => resolve({ passes: runner.stats?.passes ?? 0, failures: failed }));
  });
  await said();
  await page.result(passes, failures);
  if (failures > 0 || passes === 0) throw new Error(`${failures} failed`);
}
