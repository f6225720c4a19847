import { isMainThread, parentPort } from 'node:worker_threads';
import { answerJob, type AssessJob } from '../worker/assessJob';
import { runCommandLine } from './runCommandLine';

const words = process.argv.slice(2);
const around = {
  out: (text: string) => void process.stdout.write(text),
  error: (text: string) => void process.stderr.write(text),
  colour: process.stdout.isTTY === true && !process.env.NO_COLOR,
  progress: process.stderr.isTTY === true ? (line: string) => void process.stderr.write(`\r\u001b[K${line}`) : null,
};

process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error; // Whoever read our output has seen enough.
});
process.on('SIGINT', () => process.exit(130));

function run(): void {
  runCommandLine(words, around).then(
    // Set, not exit(): what was written to a pipe must still arrive.
    (code) => { process.exitCode = code; },
    (error) => {
      around.error(`ohmward: this should not have happened, please report it: ${(error as Error).stack ?? error}\n`);
      process.exitCode = 2;
    },
  );
}

// One file is the command line and its own workers.
if (isMainThread) run();
else parentPort!.on('message', (job: AssessJob) => parentPort!.postMessage(answerJob(job)));
