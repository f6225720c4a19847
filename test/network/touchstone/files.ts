import assert from 'node:assert/strict';
import type { NetworkData } from '../../../src/network/networkData';
import { readTouchstone, type TouchstoneProblem } from '../../../src/network/touchstone/readTouchstone';

// Reading a file that must be right, or one that must not be.

export interface ReadFile {
  readonly data: NetworkData;
  readonly warnings: readonly TouchstoneProblem[];
  readonly noisePoints: number;
}

export function legal(name: string, content: string | Uint8Array): ReadFile {
  const result = readTouchstone(name, content);
  assert.ok(result.ok, result.ok ? '' : `line ${result.problem.line}: ${result.problem.message}`);
  return result;
}

export function refused(name: string, content: string | Uint8Array): TouchstoneProblem {
  const result = readTouchstone(name, content);
  assert.ok(!result.ok, 'the file was taken');
  return result.problem;
}

/** S of one point, row by row, as [re, im]. */
export function pointOf(data: NetworkData, k = 0): [number, number][] {
  const entries = data.ports ** 2;
  return Array.from({ length: entries }, (_, i) => [data.sRe[k * entries + i], data.sIm[k * entries + i]]);
}

export const polar = (magnitude: number, degrees: number): [number, number] => [magnitude * Math.cos((degrees * Math.PI) / 180), magnitude * Math.sin((degrees * Math.PI) / 180)];

/** Rounding of a sine and a product apart. */
export function assertPoint(actual: readonly (readonly [number, number])[], expected: readonly (readonly [number, number])[], tolerance = 1e-14): void {
  assert.equal(actual.length, expected.length);
  expected.forEach(([re, im], i) => {
    assert.ok(Math.hypot(actual[i][0] - re, actual[i][1] - im) <= tolerance, `entry ${i}: ${actual[i].join(', ')} and not ${re}, ${im}`);
  });
}
