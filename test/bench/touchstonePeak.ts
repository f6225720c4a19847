import { closeSync, openSync, readFileSync, readSync } from 'node:fs';
import { touchstoneReader } from '../../src/network/touchstone/readTouchstone';

/** The kernel's own high-water mark; Linux only. */
function peakBytes(): number {
  return Number(/^VmHWM:\s*(\d+) kB/m.exec(readFileSync('/proc/self/status', 'utf8'))![1]) * 1024;
}

/**
 * By how many bytes reading a file in pieces of a megabyte raises the peak of this process's memory.
 * Means something in a fresh process only.
 */
export function readingPeakBytes(path: string): number {
  const before = peakBytes();
  const reader = touchstoneReader(path);
  const handle = openSync(path, 'r');
  const buffer = new Uint8Array(1 << 20);
  for (;;) {
    const count = readSync(handle, buffer, 0, buffer.length, null);
    if (count === 0) break;
    reader.push(buffer.subarray(0, count));
  }
  closeSync(handle);
  const result = reader.finish();
  if (!result.ok) throw new Error(result.problem.message);
  return peakBytes() - before;
}
