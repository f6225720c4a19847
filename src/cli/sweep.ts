import { mkdirSync, statSync } from 'node:fs';
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
  const files = await assessFiles(paths);
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
    : swept.flatMap((one) => outputsOf(one, format, options['two-port'] === true));
  deliver(outputs, options.output, around);
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

const stem = (path: string) => basename(path).replace(/\.match\.ya?ml$/i, '');

function outputsOf({ file, problem, evaluation }: Swept, format: 'text' | 'csv' | 'touchstone', twoPort: boolean): Output[] {
  if (format === 'text') return [{ name: `${stem(file.path)}.txt`, text: sweepText(file.shown, evaluation) }];
  if (format === 'csv') return [{ name: `${stem(file.path)}.csv`, text: sweepCsv(evaluation) }];
  const title = problem.title ?? stem(file.path);
  if (twoPort) {
    const network = networkOfAbcd(cascade(studiedLadder(problem), problem.sweepHz), problem.z0Ohm, problem.z0Ohm);
    if (!network) throw new CallError(`${file.shown}: the ladder is not known at any point of the sweep`);
    return [{ name: `${stem(file.path)}.s2p`, text: writeTouchstone(network, { comments: [title, 'The ladder: port 1 at the source, port 2 at the load'] }) }];
  }
  return evaluation.traces.map((trace) => {
    const network = traceNetwork(trace, evaluation.frequencyHz, problem.z0Ohm);
    const label = trace.caseName === null ? '' : `.${trace.caseName.replace(/[^\w-]+/g, '-')}`;
    if (!network) throw new CallError(`${file.shown}: nothing is known${trace.caseName === null ? '' : ` of case ${trace.caseName}`}: ${trace.reason ?? 'no points'}`);
    const comments = [title, ...(trace.caseName === null ? [] : [`Load case: ${trace.caseName}`]), 'Impedance that the source sees'];
    return { name: `${stem(file.path)}${label}.s1p`, text: writeTouchstone(network, { comments }) };
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
  if (isFolder) mkdirSync(target, { recursive: true });
  for (const output of outputs) {
    const path = isFolder ? join(target, output.name) : target;
    writeWhole(path, output.text);
    around.out(`${path}\n`);
  }
}
