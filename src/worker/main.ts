import { parentPort } from 'node:worker_threads';
import { answerJob, type AssessJob } from './assessJob';

parentPort!.on('message', (job: AssessJob) => parentPort!.postMessage(answerJob(job)));
