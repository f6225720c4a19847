import { servePort } from '../platform/workerPort';
import { answerSolveJob, type SolveJob } from './solveJob';

// Entry of the solver's own bundle: the same for a thread of Node and for a worker of a browser.
servePort<SolveJob>(answerSolveJob);
