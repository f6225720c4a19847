import { solvedValue } from '../assistance/insertSolution';
import { decibels, returnLossDb } from '../network/figures';
import { printNumber } from '../quantity/printQuantity';
import type { Solution } from '../solve/solution';
import type { SolvedFile } from './solveJson';

/** The solutions for people: a table, best first, then the best for each number of parts, the proof, and what must be heeded. */
export function solveText({ path, result }: SolvedFile): string {
  const { solutions, byParts, reason, hints, outOfReach } = result;
  const lines = [`${path}: ${reason === null ? verdict(solutions[0]) : `no solution: ${reason}`}`];
  const others = byParts.filter((each) => !solutions.includes(each));
  const rows = [...solutions, ...others].map(columns);
  const widths = heads.map((head, c) => Math.max(head.length, ...rows.map((row) => row[c].length)));
  const line = (cells: readonly string[]): string => cells.map((cell, c) => (c === 0 ? cell.padEnd(widths[c]) : cell.padStart(widths[c]))).join('  ').trimEnd();
  if (rows.length > 0) {
    lines.push(`      ${line(heads)}`);
    rows.forEach((row, i) => {
      if (i === solutions.length) lines.push('  the best of other numbers of parts');
      lines.push(`  ${i < solutions.length ? String(i + 1).padStart(2) : '  '}  ${line(row)}`);
    });
    lines.push(`  ${proofText(solutions[0])}`);
  }
  lines.push(...hints.map((hint) => `  ! ${hint}`), ...outOfReach.map(({ form, reason: why }) => `  ${form}: out of reach, ${why}`), '');
  return lines.join('\n');
}

const heads = ['values', 'margin', 'return loss', 'gain', 'yield', 'parts', 'response', 'direct current'];

const dB = (value: number): string => `${printNumber(value, 3)} dB`;

function columns(solution: Solution): string[] {
  const current = solution.dcPath === null ? 'not known' : solution.dcPath ? 'passes' : 'blocked';
  return [
    solution.solved.map((each) => `${each.name} ${solvedValue(each)}`).join(', '),
    `${dB(solution.marginDb)}${solution.holds ? '' : ' ✗'}`, dB(returnLossDb(solution.worstReflection)), dB(decibels(solution.worstGain)),
    solution.yield === null ? '–' : `${printNumber(100 * solution.yield, 3)} %`, String(solution.parts),
    solution.form, current,
  ];
}

const verdict = (best: Solution): string => (best.holds ? `every goal holds, ${dB(best.marginDb)} to spare` : 'the best that there is misses a goal');

/** What is known about ladders that are not listed. */
export function proofText({ proved, boundDb, nodes, parts }: Solution): string {
  if (!proved) return `the best that was found (${nodes} nodes); it is not proved that nothing is better`;
  if (boundDb === Infinity) return 'an exact match: nothing can be better';
  return `proved: no ladder of ${parts} part${parts === 1 ? '' : 's'} has more than ${dB(boundDb ?? 0)} (${nodes} nodes)`;
}
