import { statSync } from 'node:fs';
import { basename, join } from 'node:path';
import { cascade } from '../network/cascade';
import { networkOfAbcd } from '../network/networkParameters';
import { writeTouchstone } from '../network/touchstone/writeTouchstone';
import { sweepText } from '../report/sweepText';
import { sweepCsv, sweepJson, traceNetwork } from '../report/sweepFormats';
import type { Evaluation } from '../study/evaluation';
import type { Problem } from '../study/problem';
import { studiedLadder } from '../study/studiedLadder';
import { assessFiles, type AssessedFile } from './assessFiles';
import { CallError } from './callError';
import { formatOf } from './formatOf';
import type { CallOptions, Surroundings } from './runCommandLine';
import { writeWhole } from './writeWhole';
import { writeDiagnostics } from './writeDiagnostics';

interface Swept {
  readonly file: AssessedFile;
  readonly problem: Problem;
  readonly evaluation: Evaluation;
}

/** The traces over the sweep, as text, JSON, CSV or Touchstone. */
export async function sweep(paths: readonly string[], options: CallOptions, around: Surroundings): Promise<number> {
  const format = formatOf(options.format, ['text', 'json', 'csv', 'touchstone']);
  if (options['two-port'] && format !== 'touchstone') throw new CallError('--two-port goes with --format touchstone');
  if (options['two-port'] && options.case !== undefined) throw new CallError('--two-port is the ladder alone, without any load case');
  const files = await assessFiles(paths, around);
  const swept: Swept[] = [];
  let failed = false;
  for (const file of files) {
    const { problem } = file.assessment.model;
    const { evaluation, diagnostics } = file.assessment;
    writeDiagnostics(file.shown, file.assessment, around);
    failed ||= diagnostics.some((diagnostic) => diagnostic.severity === 'error') || !evaluation;
    if (problem && evaluation) swept.push({ file, problem, evaluation: oneCase(evaluation, options.case, file.shown) });
  }
  const outputs = format === 'json' ? [{ name: 'sweep.json', text: `${JSON.stringify(sweepJson(swept.map(({ file, evaluation }) => ({ path: file.shown, evaluation }))))}\n` }]
    : swept.flatMap((one) => outputsOf(one, stemOf(one, swept), format, options['two-port'] === true));
  deliver(apart(outputs), options.output, around);
  return failed ? 1 : 0;
}

function oneCase(evaluation: Evaluation, name: string | undefined, shown: string): Evaluation {
  if (name === undefined) return evaluation;
  const traces = evaluation.traces.filter((trace) => trace.caseName === name);
  if (traces.length === 0) throw new CallError(`${shown} has no load case «${name}»`);
  return { ...evaluation, traces };
}

interface Output {
  readonly name: string;
  readonly text: string;
}

const withoutEnding = (path: string) => path.replace(/\.match\.ya?ml$/i, '');

/** The description's own name; with its folders where another one is called the same. */
function stemOf({ file }: Swept, all: readonly Swept[]): string {
  const stem = withoutEnding(basename(file.path));
  const alone = all.every((other) => other.file === file || withoutEnding(basename(other.file.path)).toLowerCase() !== stem.toLowerCase());
  return alone ? stem : withoutEnding(file.shown).replace(/^(\.\.\/)+/, '').replace(/[/:]+/g, '-');
}

/** No output may overwrite another one: names that are still alike (upper and lower case aside) are numbered. */
function apart(outputs: readonly Output[]): Output[] {
  const taken = new Set<string>();
  return outputs.map(({ name, text }) => {
    let free = name;
    for (let n = 2; taken.has(free.toLowerCase()); n++) free = name.replace(/(?=\.[^.]*$)/, `-${n}`);
    taken.add(free.toLowerCase());
    return { name: free, text };
  });
}

function outputsOf({ file, problem, evaluation }: Swept, stem: string, format: 'text' | 'csv' | 'touchstone', twoPort: boolean): Output[] {
  if (format === 'text') return [{ name: `${stem}.txt`, text: sweepText(file.shown, evaluation) }];
  if (format === 'csv') return [{ name: `${stem}.csv`, text: sweepCsv(evaluation) }];
  const title = problem.title ?? stem;
  if (twoPort) {
    const network = networkOfAbcd(cascade(studiedLadder(problem, evaluation.tuning?.codes[evaluation.tuning.shown]), problem.sweepHz), problem.z0Ohm, problem.z0Ohm);
    if (!network) throw new CallError(`${file.shown}: the ladder is not known at any point of the sweep`);
    return [{ name: `${stem}.s2p`, text: writeTouchstone(network, { comments: [title, 'The ladder: port 1 at the source, port 2 at the load'] }) }];
  }
  return evaluation.traces.map((trace) => {
    const network = traceNetwork(trace, evaluation.frequencyHz, problem.z0Ohm);
    const label = trace.caseName === null ? '' : `.${trace.caseName.replace(/[^\w-]+/g, '-')}`;
    if (!network) throw new CallError(`${file.shown}: nothing is known${trace.caseName === null ? '' : ` of case ${trace.caseName}`}: ${trace.reason ?? 'no points'}`);
    const comments = [title, ...(trace.caseName === null ? [] : [`Load case: ${trace.caseName}`]), 'Impedance that the source sees'];
    return { name: `${stem}${label}.s1p`, text: writeTouchstone(network, { comments }) };
  });
}

/** One output goes to standard output or the file named; several need a folder, since Touchstone holds one network a file. */
function deliver(outputs: readonly Output[], target: string | undefined, around: Surroundings): void {
  if (target === undefined) {
    const parted = outputs.some((output) => /\.(s\dp|csv)$/.test(output.name));
    if (outputs.length > 1 && parted) throw new CallError(`this makes ${outputs.length} files (${outputs.map((output) => output.name).join(', ')}): name a folder with --output, or one case with --case`);
    for (const output of outputs) around.out(output.text);
    return;
  }
  const isFolder = target.endsWith('/') || (() => {
    try {
      return statSync(target).isDirectory();
    } catch {
      return outputs.length > 1; // To be made.
    }
  })();
  if (!isFolder && outputs.length > 1) throw new CallError(`${target} is one file, and this makes ${outputs.length}`);
  for (const output of outputs) {
    const path = isFolder ? join(target, output.name) : target;
    writeWhole(path, output.text);
    around.out(`${path}\n`);
  }
}
