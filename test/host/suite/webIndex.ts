import { said } from './webConsole';
import 'mocha/mocha.js';

// The browser's mocha needs no document as long as no reporter of its own draws into one.
mocha.setup({ ui: 'bdd', reporter: 'spec', timeout: 60_000, color: false, forbidOnly: true, forbidPending: true } as unknown as Mocha.MochaOptions & { ui: 'bdd' });

/** Runs the suite `web` inside an extension host that is a worker without Node. */
export async function run(): Promise<void> {
  const result = await new Promise<{ passes: number; failures: number }>((resolve) => {
    const runner = mocha.run((failures) => resolve({ passes: runner.stats?.passes ?? 0, failures }));
  });
  await said();
  if (result.failures > 0 || result.passes === 0) throw new Error(`${result.failures} failed`);
}
