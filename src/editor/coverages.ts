import * as vscode from 'vscode';
import type { Problem } from '../study/problem';
import { codesObstacle } from '../study/tuning/bestCodes';
import { nearestChannel } from '../study/tuning/channelProblems';
import type { Coverage } from '../study/tuning/coverage';
import type { DocumentStudies } from './documentStudies';
import { COVERAGES_KEPT } from './limits';
import type { Log } from './log';
import type { Tuner } from './tuner';

/** The loads that codes can bring to the goals, for what somebody looks at. */
export interface DocumentCoverages extends vscode.Disposable {
  /** Of the channel nearest to a frequency; null while it is worked out, which this starts. A text where there is none. */
  at(document: vscode.TextDocument, problem: Problem, frequencyHz: number): Coverage | string | null;
  readonly onDidChange: vscode.Event<vscode.TextDocument>;
}

export function createDocumentCoverages(studies: DocumentStudies, tuner: Tuner, log: Log): DocumentCoverages {
  // A problem is made anew for each version of a text, so that nothing of an older one is taken for it.
  const known = new WeakMap<Problem, Map<number, Coverage | string>>();
  const asked = new WeakMap<Problem, Set<number>>();
  const changed = new vscode.EventEmitter<vscode.TextDocument>();

  const ask = async (document: vscode.TextDocument, problem: Problem, channel: number, frequencyHz: number) => {
    const found = await tuner.coverage(document, problem, frequencyHz);
    asked.get(problem)?.delete(channel);
    if (found === null) return;
    const kept = known.get(problem) ?? new Map<number, Coverage | string>();
    known.set(problem, kept);
    const oldest = kept.keys().next();
    if (kept.size >= COVERAGES_KEPT && !oldest.done) kept.delete(oldest.value);
    kept.set(channel, found);
    if (studies.latest(document)?.assessment.model.problem === problem) changed.fire(document);
  };

  return {
    at(document, problem, frequencyHz) {
      const obstacle = codesObstacle(problem);
      if (obstacle !== null || !problem.channelsHz) return obstacle;
      const channel = nearestChannel(frequencyHz, problem.channelsHz);
      const found = known.get(problem)?.get(channel);
      if (found !== undefined) return found;
      const waiting = asked.get(problem) ?? new Set<number>();
      asked.set(problem, waiting);
      if (!waiting.has(channel)) {
        waiting.add(channel);
        ask(document, problem, channel, problem.channelsHz[channel]).catch((error: unknown) => log.failure('coverage', error));
      }
      return null;
    },
    onDidChange: changed.event,
    dispose: () => changed.dispose(),
  };
}
