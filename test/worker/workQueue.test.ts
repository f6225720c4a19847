import assert from 'node:assert/strict';
import { mock } from 'node:test';
import type { WorkerListeners } from '../../src/platform/startWorker';
import type { SolveResult } from '../../src/solve/solution';
import type { Problem } from '../../src/study/problem';
import type { SolveJob } from '../../src/worker/solveJob';
import { createWorkQueue } from '../../src/worker/workQueue';

const problem = {} as Problem; // the queue does not look into it
const result: SolveResult = { solutions: [], byParts: [], reason: 'an invented reason', hints: [], outOfReach: [] };

interface FakeWorker extends WorkerListeners {
  readonly jobs: SolveJob[];
  ended: boolean;
}

/** A queue over workers that answer when the test says so, and a record of what happened. */
function queueOf({ graceMs = 10_000, hangingMs = 10_000, cannotStart = () => false }: { graceMs?: number; hangingMs?: number; cannotStart?: () => boolean } = {}) {
  const workers: FakeWorker[] = [];
  const events: string[] = [];
  const queue = createWorkQueue<string, Omit<SolveJob, 'id'>, SolveResult>({
    async start(listeners) {
      if (cannotStart()) throw new Error('no workers here');
      const worker: FakeWorker = { ...listeners, jobs: [], ended: false };
      workers.push(worker);
      return { post: (job) => void worker.jobs.push(job as SolveJob), end: () => { worker.ended = true; } };
    },
    failed: (reason) => void events.push(`failed: ${reason}`),
    graceMs, hangingMs,
  });
  const ask = (key: string, name: string) => queue.ask(key, {
    job: { problem, top: 3 },
    started: () => void events.push(`${name} started`),
    progress: (share) => void events.push(`${name} ${share}`),
    done: (answer) => void events.push(`${name} ${answer === result ? 'solved' : String(answer)}`),
    dropped: () => void events.push(`${name} dropped`),
  });
  const answer = (worker: FakeWorker, job: SolveJob) => worker.message({ id: job.id, type: 'result', result });
  return { queue, workers, events, ask, answer };
}

/** Long enough for promises that are settled already; the clock of the test stands still meanwhile. */
const soon = () => new Promise<void>((resolve) => { setImmediate(resolve); });

describe('a queue of jobs for a worker', () => {
  beforeEach(() => mock.timers.enable({ apis: ['setTimeout'] }));
  afterEach(() => mock.timers.reset());

  it('solves one after another with one worker', async () => {
    const { queue, workers, events, ask, answer } = queueOf();
    ask('a', 'first');
    ask('b', 'second');
    await soon();
    assert.deepEqual(workers[0].jobs.map(({ top }) => top), [3]);
    assert.ok(queue.isBusy('a') && queue.isBusy('b') && !queue.isBusy('c'));
    workers[0].message({ id: workers[0].jobs[0].id, type: 'progress', share: 0.5, bestMarginDb: null });
    answer(workers[0], workers[0].jobs[0]);
    await soon();
    answer(workers[0], workers[0].jobs[1]);
    assert.deepEqual(events, ['first started', 'first 0.5', 'first solved', 'second started', 'second solved']);
    assert.equal(workers.length, 1);
    assert.ok(!queue.isBusy('a') && !queue.isBusy('b'));
    queue.dispose();
  });

  it('drops what waits for an older text, and leaves others alone', async () => {
    const { queue, events, ask } = queueOf();
    ask('a', 'running');
    ask('b', 'old');
    ask('c', 'other');
    await soon();
    assert.equal(queue.supersede('b'), true);
    assert.equal(queue.supersede('b'), false);
    assert.deepEqual(events, ['running started', 'old dropped']);
    assert.ok(queue.isBusy('c') && !queue.isBusy('b'));
    queue.dispose();
  });

  it('lets what runs for an older text finish within a moment', async () => {
    const { queue, workers, events, ask, answer } = queueOf();
    ask('a', 'old');
    await soon();
    queue.supersede('a');
    ask('a', 'new');
    answer(workers[0], workers[0].jobs[0]);
    await soon();
    assert.deepEqual(events, ['old started', 'old solved', 'new started']);
    assert.equal(workers[0].ended, false);
    queue.dispose();
  });

  it('ends it after that moment, however fast one types', async () => {
    const { queue, workers, events, ask } = queueOf({ graceMs: 40 });
    ask('a', 'old');
    await soon();
    // Ten times the moment, with never a pause as long as it.
    for (let i = 0; i < 40 && !events.includes('old null'); i++) {
      queue.supersede('a');
      ask('a', `text ${i}`);
      mock.timers.tick(10);
      await soon();
    }
    assert.ok(events.includes('old null'), events.join(', '));
    assert.equal(workers[0].ended, true);
    assert.equal(workers.length, 2);
    workers[0].message({ id: workers[0].jobs[0].id, type: 'result', result });
    assert.ok(!events.some((event) => event.endsWith('solved')), 'what it says later is nobody’s answer');
    queue.dispose();
  });

  for (const [how, hurt] of [
    ['dies', (worker: FakeWorker) => worker.died('it ran out of memory')],
    ['fails', (worker: FakeWorker) => worker.message({ id: worker.jobs[0].id, type: 'failure', message: 'it ran out of memory' })],
  ] as const) {
    it(`gives the next one a new worker where one ${how}`, async () => {
      const { queue, workers, events, ask, answer } = queueOf();
      ask('a', 'first');
      ask('b', 'second');
      await soon();
      hurt(workers[0]);
      await soon();
      answer(workers[1], workers[1].jobs[0]);
      assert.deepEqual(events, ['first started', 'failed: it ran out of memory', 'first null', 'second started', 'second solved']);
      assert.equal(workers[0].ended, true);
      queue.dispose();
    });
  }

  it('takes a worker that gives no sign for dead, but not one that says how far it is', async () => {
    const { queue, workers, events, ask } = queueOf({ hangingMs: 100 });
    ask('a', 'slow');
    await soon();
    for (let i = 0; i < 12; i++) {
      mock.timers.tick(20);
      workers[0].message({ id: workers[0].jobs[0].id, type: 'progress', share: i / 12, bestMarginDb: null });
    }
    assert.ok(!events.includes('slow null'), 'it lives, after more than twice the time');
    mock.timers.tick(100);
    assert.deepEqual(events.slice(-2), ['failed: it gave no sign for a long time', 'slow null']);
    assert.equal(workers[0].ended, true);
    queue.dispose();
  });

  it('takes one for dead that never gives a sign', async () => {
    const { queue, events, ask } = queueOf({ hangingMs: 100 });
    ask('a', 'mute');
    await soon();
    mock.timers.tick(99);
    assert.deepEqual(events, ['mute started']);
    mock.timers.tick(1);
    assert.deepEqual(events.slice(1), ['failed: it gave no sign for a long time', 'mute null']);
    queue.dispose();
  });

  it('says where no worker can be started, and tries again with the next one', async () => {
    let broken = true;
    const { queue, workers, events, ask, answer } = queueOf({ cannotStart: () => broken });
    ask('a', 'first');
    await soon();
    assert.deepEqual(events, ['failed: no workers here', 'first null']);
    broken = false;
    ask('a', 'second');
    await soon();
    answer(workers[0], workers[0].jobs[0]);
    assert.deepEqual(events.slice(2), ['second started', 'second solved']);
    queue.dispose();
  });

  it('leaves nobody waiting when it is disposed of, and no worker running', async () => {
    const { queue, workers, events, ask } = queueOf();
    ask('a', 'first');
    ask('a', 'second');
    await soon();
    queue.dispose();
    await soon();
    assert.deepEqual(events, ['first started', 'first null', 'second dropped']);
    assert.deepEqual(workers.map(({ ended }) => ended), [true]);
  });
});
