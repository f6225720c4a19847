import { byType, flag, listOf, number, oneOf, orNull, shape, text, whole, type Decoder } from './decode';
import type { BandView, CandidateView, CandidatesView, ChannelView, CodesView, CoverageView, DiscView, FirmwareView, GoalView, LadderRowView, MarkerCaseView, MarkerView, MaskView, PanelView, PathStepView, PointList, ProblemView, SpreadView, ToHost, ToPage, TraceView } from './panel';

const maybeNumbers = listOf(orNull(number));
const point = shape<{ re: number; im: number }>({ re: number, im: number });
const points: Decoder<PointList> = shape<PointList>({ re: maybeNumbers, im: maybeNumbers });

const goal = shape<GoalView>({ id: whole, title: text, place: text, ok: flag, known: flag, valueText: text, detail: text, marginText: text, note: text, bar: orNull(number), line: whole });
const problem = shape<ProblemView>({ severity: oneOf('error', 'warning', 'info'), message: text, line: whole });
const band = shape<BandView>({ name: text, startHz: number, stopHz: number, watch: flag });
const trace = shape<TraceView>({ caseName: text, reflection: points, reflectionDb: maybeNumbers, gainDb: maybeNumbers, reason: orNull(text) });
const disc = shape<DiscView>({ centreRe: number, centreIm: number, radius: number, label: text });
const mask = shape<MaskView>({ plot: oneOf('reflection', 'gain'), side: oneOf('at most', 'at least'), levelDb: number, startHz: number, stopHz: number, ok: flag, goalId: whole });
const arc = shape<PathStepView['arc']>({ re: listOf(number), im: listOf(number) });
const step = shape<PathStepView>({ name: text, arc });
const markerCase = shape<MarkerCaseView>({ caseName: text, text, loadReflection: orNull(point), steps: listOf(step), inputReflection: orNull(point) });
const marker = shape<MarkerView>({ frequencyHz: number, text, cases: listOf(markerCase) });
const row = shape<LadderRowView>({
  id: text, name: text, orientation: oneOf('series', 'shunt', 'through', 'end'),
  symbol: oneOf('load', 'source', 'resistor', 'inductor', 'capacitor', 'branch', 'line', 'stub open', 'stub short', 'transformer', 'block', 'bridge', 'open', 'unsolved'),
  value: text, reactance: text, impedanceAfter: text, voltage: text, current: text, heat: text, loss: text, sensitivity: text, note: text, line: orNull(whole), editable: flag,
});
const candidate = shape<CandidateView>({
  id: whole, values: text, holds: flag, margin: text, returnLoss: text, gain: text, parts: text, response: text, directCurrent: text, proof: text, note: text,
});
const coverage = shape<CoverageView>({
  text, across: whole, marginDb: maybeNumbers, cases: listOf(shape<CoverageView['cases'][number]>({ caseName: text, text, holds: flag, reflection: orNull(point) })),
});
const candidates = shape<CandidatesView>({
  stale: flag, message: text, notes: listOf(text), outOfReach: listOf(shape<CandidatesView['outOfReach'][number]>({ form: text, text, reach: orNull(coverage) })), candidates: listOf(candidate),
});
const spread = shape<SpreadView>({
  stale: flag, share: number, yieldText: text, goalsText: text, cornerText: text, remedyText: text, cornerDb: orNull(number),
  bars: listOf(shape<SpreadView['bars'][number]>({ fromDb: number, toDb: number, count: whole })), cloud: listOf(points),
});
const channel = shape<ChannelView>({ frequencyHz: number, text, codes: listOf(whole), margin: text, marginDb: orNull(number), holds: flag, returnLoss: text, gain: text });
const codes = shape<CodesView>({
  summary: text, tunables: listOf(shape<CodesView['tunables'][number]>({ name: text, low: whole, high: whole })), channels: listOf(channel), shown: whole, stepsText: text, proof: text,
  firmware: listOf(shape<FirmwareView>({ path: text, text, ok: flag, writable: flag })), coverage: orNull(coverage), coverageText: text,
});
const view = shape<PanelView>({
  title: text, fileName: text, pinned: flag, verdict: text, goals: listOf(goal), problems: listOf(problem), cautions: listOf(text), z0Ohm: number,
  frequencyHz: listOf(number), bands: listOf(band), traces: listOf(trace), discs: listOf(disc), limits: listOf(disc), masks: listOf(mask), marker: orNull(marker), ladder: listOf(row), notInserted: flag, candidates: orNull(candidates), spread: orNull(spread), codes: orNull(codes),
});

/** A message from the host; null where it is none. */
export const decodeToPage = (data: unknown): ToPage | null => toPage(data) ?? null;

const toPage: Decoder<ToPage> = byType<ToPage>({
  view: shape({ type: oneOf('view'), document: text, version: whole, view }),
  stale: shape({ type: oneOf('stale'), document: text, version: whole, reason: orNull(text), problems: listOf(problem) }),
  marker: shape({ type: oneOf('marker'), document: text, version: whole, request: whole, marker: orNull(marker), refusal: orNull(text) }),
  preview: shape({ type: oneOf('preview'), document: text, version: whole, request: whole, traces: orNull(listOf(trace)) }),
  solving: shape({ type: oneOf('solving'), document: text, version: whole, share: number, text }),
  cursor: shape({ type: oneOf('cursor'), document: text, version: whole, elementId: orNull(text), goalId: orNull(whole) }),
  nothing: shape({ type: oneOf('nothing'), document: (data) => (data === '' ? '' : undefined), version: (data) => (data === 0 ? 0 : undefined), message: text }),
});

/** A message from the page; null where it is none. */
export const decodeToHost = (data: unknown): ToHost | null => toHost(data) ?? null;

const toHost: Decoder<ToHost> = byType<ToHost>({
  ready: shape({ type: oneOf('ready') }),
  'move marker': shape({ type: oneOf('move marker'), document: text, request: whole, frequencyHz: number }),
  'type marker': shape({ type: oneOf('type marker'), document: text, request: whole, text }),
  'reveal line': shape({ type: oneOf('reveal line'), document: text, line: whole }),
  'point at element': shape({ type: oneOf('point at element'), document: text, elementId: orNull(text) }),
  'step value': shape({ type: oneOf('step value'), document: text, version: whole, elementId: text, direction: oneOf('up', 'down') }),
  'set value': shape({ type: oneOf('set value'), document: text, version: whole, elementId: text, text }),
  'preview candidate': shape({ type: oneOf('preview candidate'), document: text, version: whole, request: whole, candidate: whole }),
  'insert candidate': shape({ type: oneOf('insert candidate'), document: text, version: whole, candidate: whole }),
  'write firmware': shape({ type: oneOf('write firmware'), document: text, version: whole }),
  'save report': shape({ type: oneOf('save report'), document: text }),
  copy: shape({ type: oneOf('copy'), document: text, what: oneOf('chart svg', 'ladder csv', 'ladder markdown', 'codes csv'), text }),
  save: shape({ type: oneOf('save'), document: text, what: oneOf('chart svg', 'chart png'), base64: text }),
  pin: shape({ type: oneOf('pin'), document: text, pinned: flag }),
  failure: shape({ type: oneOf('failure'), message: text }),
});
