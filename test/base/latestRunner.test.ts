import assert from 'node:assert/strict';
import { latestRunner } from '../../src/base/latestRunner';

const soon = (start: () => void) => void setImmediate(start);
const never = (error: unknown) => assert.fail(String(error));

/** A task whose runs end only when told to. */
function heldTask() {
  const runs: { superseded: () => boolean; end: () => void }[] = [];
  const task = (superseded: () => boolean) => new Promise<void>((end) => runs.push({ superseded, end }));
  return { runs, task };
}

const turn = () => new Promise<void>((resolve) => setImmediate(resolve));

describe('running the latest request only', () => {
  it('makes one run of a burst', async () => {
    let runs = 0;
    const runner = latestRunner(() => void runs++, never, soon);
    for (let i = 0; i < 10; i++) runner.request();
    assert.equal(runs, 0, 'the caller is not held up');
    await runner.whenIdle();
    assert.equal(runs, 1);
  });

  it('makes exactly one more run of all requests during a run, and tells that run', async () => {
    const { runs, task } = heldTask();
    const runner = latestRunner(task, never, soon);
    runner.request();
    await turn();
    assert.equal(runs[0].superseded(), false);
    runner.request();
    runner.request();
    assert.equal(runs[0].superseded(), true);
    await turn();
    assert.equal(runs.length, 1, 'never two at once');
    runs[0].end();
    await turn();
    await turn();
    assert.equal(runs.length, 2);
    assert.equal(runs[1].superseded(), false);
    runs[1].end();
    await runner.whenIdle();
    assert.equal(runs.length, 2);
  });

  it('goes on after a failure, which is told once', async () => {
    const failures: unknown[] = [];
    let fail = true;
    let succeeded = 0;
    const runner = latestRunner(
      () => {
        if (fail) throw new Error('no');
        succeeded++;
      },
      (error) => failures.push(error),
      soon,
    );
    runner.request();
    await runner.whenIdle();
    fail = false;
    runner.request();
    await runner.whenIdle();
    assert.deepEqual([failures.length, succeeded], [1, 1]);
  });

  it('starts nothing after it was disposed of, and leaves nobody waiting', async () => {
    let runs = 0;
    const runner = latestRunner(() => void runs++, never, soon);
    runner.request();
    const idle = runner.whenIdle();
    runner.dispose();
    runner.request();
    await idle;
    await turn();
    assert.equal(runs, 0);
  });

  it('tells a run that it was disposed of, and ends with it', async () => {
    const { runs, task } = heldTask();
    const runner = latestRunner(task, never, soon);
    runner.request();
    await turn();
    runner.request();
    runner.dispose();
    assert.equal(runs[0].superseded(), true);
    runs[0].end();
    await runner.whenIdle();
    await turn();
    assert.equal(runs.length, 1);
  });
});
