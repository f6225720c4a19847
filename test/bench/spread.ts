import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { assess } from '../../src/assistance/assess';
import { startWorker } from '../../src/platform/startWorker';
import type { SpreadAnswer, SpreadJob } from '../../src/worker/spreadJob';
import { atMost, type BenchRow } from './benchRow';

// 10,000 builds × 6 elements × 101 points × 3 cases in the worker, and what evaluating a keystroke takes on the main thread meanwhile. Invented.

const text = (value: string) => `ohmward: 1
load:
  free: (14 Ω + 3 pF) + 8 nH
  hand: (19 Ω + 3.3 pF) + 8 nH
  metal: (9 Ω + 2.7 pF) + 8 nH
bands:
  main: 850 .. 900 MHz, 101 points
ladder:
  - series L1: ${value} nH ±5 % Q 40
  - shunt C1: 2.2 pF ±5 % Q 200
  - series L2: 5.6 nH ±5 % Q 40
  - shunt C2: 3.3 pF ±5 % Q 200
  - series L3: 4.7 nH ±5 % Q 40
  - series C3: 22 pF ±5 % Q 200
goals:
  - return loss >= 3 dB
  - gain >= -4 dB
`;

const frameMs = 1000 / 60;

const keystrokeMs = (number: number): number => {
  const start = performance.now();
  assess(text(number % 2 === 0 ? '8.2' : '8.3'), new Map(), { expressions: true });
  return performance.now() - start;
};

const p95 = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(0.95 * values.length)];

export async function bench(): Promise<BenchRow[]> {
  const { problem } = assess(text('8.2'), new Map(), { expressions: true }).model;
  if (!problem) throw new Error('the description has no problem');
  for (let warm = 0; warm < 60; warm++) keystrokeMs(warm);
  const idle = Array.from({ length: 100 }, (_, number) => keystrokeMs(number));
  const meanwhile: number[] = [];
  const script = readFileSync(fileURLToPath(new URL('../../dist/solver.js', import.meta.url)), 'utf8');
  await new Promise<void>((resolve, reject) => {
    let done = false;
    const worker = startWorker(script, {
      died: (reason) => reject(new Error(reason)),
      message(raw) {
        const answer = raw as SpreadAnswer;
        if (answer.type === 'failure') reject(new Error(answer.message));
        if (answer.type !== 'spread' || !answer.done) return;
        if (answer.spread.builds.builds !== 10_000) reject(new Error(`${answer.spread.builds.builds} builds`));
        done = true;
        worker.end();
        resolve();
      },
    });
    worker.post({ type: 'spread', id: 1, problem } satisfies SpreadJob);
    // As in the editor: between two keystrokes the thread is free for what the worker sends.
    const type = (): void => {
      if (done) return;
      meanwhile.push(keystrokeMs(meanwhile.length));
      setTimeout(type, 5);
    };
    type();
  });
  return [atMost(`10,000 builds in the worker: a keystroke meanwhile above its idle time, 95th percentile of ${meanwhile.length}`, Math.max(0, p95(meanwhile) - p95(idle)) / frameMs, 'of a frame', 1)];
}
