import { printComplex } from '../quantity/printComplex';
import { printNumber, printQuantity } from '../quantity/printQuantity';
import type { Evaluation } from '../study/evaluation';

/** More rows than this are for programs; people see every so-manieth. */
const rowsAtMost = 41;

/** The traces as a table for people, thinned to some forty rows a case. */
export function sweepText(path: string, evaluation: Evaluation): string {
  const step = Math.max(1, Math.ceil(evaluation.frequencyHz.length / rowsAtMost));
  const blocks = evaluation.traces.map((trace) => {
    const head = `${path}${trace.caseName === null ? '' : `, ${trace.caseName}`}${step > 1 ? ` (one point in ${step})` : ''}`;
    const rows = [['frequency', 'reflection', 'impedance', 'gain']];
    for (let k = 0; k < evaluation.frequencyHz.length; k += step) {
      const frequency = printQuantity(evaluation.frequencyHz[k], 'Hz', { digits: 6 });
      if (!trace.known[k]) rows.push([frequency, 'not known', '', '']);
      else {
        const { re, im } = trace.reflection;
        rows.push([
          frequency,
          `${printNumber(20 * Math.log10(Math.hypot(re[k], im[k])), 4)} dB`,
          printComplex({ re: trace.impedanceOhm.re[k], im: trace.impedanceOhm.im[k] }, 'Ω'),
          `${printNumber(trace.gainDb[k], 3)} dB`,
        ]);
      }
    }
    const widths = rows[0].map((_, column) => Math.max(...rows.map((row) => row[column].length)));
    return [head, ...rows.map((row) => `  ${row.map((cell, column) => cell.padStart(widths[column])).join('  ')}`), ...(trace.reason === null ? [] : [`  ${trace.reason}`])].join('\n');
  });
  return `${blocks.join('\n\n')}\n`;
}
