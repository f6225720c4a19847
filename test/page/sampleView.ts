import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { assessDescription, type Assessment } from '../../src/assistance/assess';
import { defaultMarkerHz } from '../../src/assistance/markerView';
import { panelView } from '../../src/assistance/panelView';
import { solvedAssessment } from '../../src/assistance/solvedAssessment';
import { wholeSpread } from '../../src/assistance/spreadAssessment';
import { coverage } from '../../src/study/tuning/coverage';
import { toleranceCloud } from '../../src/study/spread/toleranceCloud';
import { traceView } from '../../src/assistance/traceViews';
import { loadFiles } from '../../src/cli/loadFiles';
import { readDescription } from '../../src/description/readDescription';
import type { PanelView, ToPage, TraceView } from '../../src/messages/panel';
import { solveProblem } from '../../src/solve/solveProblem';

const folder = fileURLToPath(new URL('../../media/samples/orchard/', import.meta.url));

/** The orchard sample as it is shown, or with its text changed. */
export function sampleAssessment(change: (text: string) => string = (text) => text): Assessment {
  const description = readDescription(change(readFileSync(`${folder}frost.match.yaml`, 'utf8')), { expressions: true });
  return assessDescription(description, loadFiles(description, [folder]));
}

export const sampleView = (change?: (text: string) => string): PanelView =>
  panelView(sampleAssessment(change), { fileName: 'frost.match.yaml', pinned: false, markerHz: null })!;

/** The sample with two values left to solve, and what they came out as. */
export function unsolvedView(stale = false): { readonly view: PanelView; readonly previews: readonly TraceView[] } {
  const assessment = sampleAssessment((text) => text.replace('10 nH from coils', 'solve from coils').replace('18 pF from caps', 'solve from caps or none'));
  const result = solveProblem(assessment.model.problem!, { top: 4 });
  const view = panelView(assessment, { fileName: 'frost.match.yaml', pinned: false, markerHz: null, solved: { result, stale } })!;
  return { view, previews: solvedAssessment(assessment, result.solutions[1]).evaluation!.traces.map(traceView) };
}

/** A whole ladder of two elements, and the forms that cannot make it. */
export function wholeLadderView(): PanelView {
  const assessment = sampleAssessment((text) => text.replace(/ladder:\n(?: {2}-.*\n)+/, 'ladder: solve up to 2 elements from coils, caps\n'));
  const result = solveProblem(assessment.model.problem!, { top: 3 });
  return panelView(assessment, { fileName: 'frost.match.yaml', pinned: false, markerHz: null, solved: { result, stale: false } })!;
}

/** The sample with what its builds do. */
export function spreadSample(stale = false): PanelView {
  const assessment = sampleAssessment((text) => text.replace('  - dc block', '  - dc block\n  - yield >= 95 %'));
  const { problem } = assessment.model;
  const spread = wholeSpread({ ...problem!, spread: { ...problem!.spread, builds: 400 } })!;
  return panelView(assessment, { fileName: 'frost.match.yaml', pinned: false, markerHz: null, spread: { spread, stale, cloud: toleranceCloud(problem!) } })!;
}

const gateFolder = fileURLToPath(new URL('../../media/samples/gate-reader/', import.meta.url));

/** The sample with tunable parts, at the marker or at a channel, with coverage and with a table that is out of date. */
export function codesSample(markerHz: number | null = null): PanelView {
  const description = readDescription(readFileSync(`${gateFolder}gate.match.yaml`, 'utf8'), { expressions: true });
  const assessment = assessDescription(description, loadFiles(description, [gateFolder]));
  const problem = assessment.model.problem!;
  return panelView(assessment, {
    fileName: 'gate.match.yaml', pinned: false, markerHz,
    codes: {
      coverage: coverage(problem, { frequencyHz: markerHz ?? defaultMarkerHz(problem)! }),
      firmware: [{ path: 'firmware/gate_codes.h', text: 'out of date', ok: false, writable: true }],
    },
  })!;
}

export const viewMessage = (view: PanelView, version = 1): ToPage => ({ type: 'view', document: 'file:///orchard/frost.match.yaml', version, view });
