import { printNumber } from '../quantity/printQuantity';
import type { Surroundings } from './runCommandLine';

const silentMs = 1000;
const betweenMs = 100;

/** For a solver's `onProgress`: one line on a terminal that is written over, once the work has taken longer than a second. */
export function progressLine(shown: string, around: Surroundings): (share: number, bestMarginDb: number | null) => void {
  const start = performance.now();
  let last = -Infinity;
  return (share, bestMarginDb) => {
    const now = performance.now();
    if (!around.progress || now - start < silentMs || now - last < betweenMs) return;
    last = now;
    around.progress(`${shown}: ${Math.floor(100 * share)} %${bestMarginDb === null ? '' : `, best margin so far ${printNumber(bestMarginDb, 3)} dB`}`);
  };
}
