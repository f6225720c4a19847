import { decodeToPage } from '../src/messages/decodePanel';
import type { PanelView, TraceView } from '../src/messages/panel';
import type { Actions } from './actions';
import { candidatesSection } from './candidatesSection';
import { chartSection } from './chartSection';
import { codesSection } from './codesSection';
import { plainControls, toolkitControls } from './controls';
import { element, setText } from './dom';
import { exportSection } from './exportSection';
import { headerSection } from './headerSection';
import { connectHost } from './host';
import { ladderSection } from './ladderSection';
import { plotsSection } from './plotsSection';
import { problemsSection } from './problemsSection';
import { spreadSection } from './spreadSection';
import { verdictSection } from './verdictSection';

const host = connectHost();
let shown: { document: string; version: number; view: PanelView | null } | null = null;
let request = 0;
let pointed: string | null = null;
let previewed: number | null = null;
let previewRequest = 0;
/** Version of the view that is drawn: what a candidate's id counts in. */
let viewVersion = 0;

const send = {
  document: () => shown?.document ?? '',
  version: () => shown?.version ?? 0,
};
const actions: Actions = {
  revealLine: (line) => host.send({ type: 'reveal line', document: send.document(), line }),
  pointAt(elementId) {
    if (elementId === pointed) return;
    pointed = elementId;
    highlight(elementId);
    host.send({ type: 'point at element', document: send.document(), elementId });
  },
  moveMarker: (frequencyHz) => host.send({ type: 'move marker', document: send.document(), request: ++request, frequencyHz }),
  typeMarker: (text) => host.send({ type: 'type marker', document: send.document(), request: ++request, text }),
  stepValue: (elementId, direction) => host.send({ type: 'step value', document: send.document(), version: send.version(), elementId, direction }),
  setValue: (elementId, text) => host.send({ type: 'set value', document: send.document(), version: send.version(), elementId, text }),
  previewCandidate(candidate) {
    previewed = candidate;
    if (candidate === null) showPreview(null);
    else host.send({ type: 'preview candidate', document: send.document(), version: viewVersion, request: ++previewRequest, candidate });
  },
  insertCandidate: (candidate) => host.send({ type: 'insert candidate', document: send.document(), version: viewVersion, candidate }),
  writeFirmware: () => host.send({ type: 'write firmware', document: send.document(), version: viewVersion }),
  saveReport: () => host.send({ type: 'save report', document: send.document() }),
  copy: (what, text) => host.send({ type: 'copy', document: send.document(), what, text }),
  save: (what, base64) => host.send({ type: 'save', document: send.document(), what, base64 }),
  pin: (pinned) => host.send({ type: 'pin', document: send.document(), pinned }),
};

// `data-controls="plain"` on the page's main element asks for ordinary HTML controls instead of the toolkit's.
const main = document.getElementById('panel')!;
const controls = main.dataset.controls === 'plain' ? plainControls() : toolkitControls();
const header = headerSection(controls, actions);
const problems = problemsSection(actions);
const verdict = verdictSection(actions);
const chart = chartSection(controls, actions);
const plots = plotsSection(actions);
const ladder = ladderSection(controls, actions);
const candidates = candidatesSection(controls, actions);
const codes = codesSection(controls, actions);
const spread = spreadSection();
const exports = exportSection(controls, actions);
const nothing = element('p', { class: 'nothing' });
const content = element('div', { class: 'content' },
  header.root, problems.root,
  element('div', { class: 'columns' }, element('div', { class: 'column' }, verdict.root, chart.root), element('div', { class: 'column' }, plots.root, ladder.root, candidates.root, codes.root, spread.root, exports.root)));
const pictures = content.querySelector<HTMLElement>('.columns')!;
content.hidden = true;
setText(nothing, 'Waiting for the first picture …');
main.append(nothing, content);

/** The trace of a candidate, beside those that stand there. */
function showPreview(traces: readonly TraceView[] | null): void {
  chart.preview(traces);
  plots.preview(traces);
  candidates.preview(traces, previewed);
}

function highlight(elementId: string | null): void {
  chart.highlight(elementId);
  ladder.highlight(elementId);
}

/** Latest wins: however many views arrive before the next frame, one is drawn. */
let waiting = false;
function draw(): void {
  if (waiting) return;
  waiting = true;
  requestAnimationFrame(() => {
    waiting = false;
    const view = shown?.view;
    if (!view) return;
    nothing.hidden = true;
    content.hidden = false;
    pictures.hidden = false;
    header.update(view);
    verdict.update(view);
    chart.update(view);
    plots.update(view);
    candidates.update(view);
    codes.update(view);
    spread.update(view);
    ladder.update(view);
    exports.update(view);
    highlight(pointed);
  });
}

window.addEventListener('message', (event: MessageEvent<unknown>) => {
  const message = decodeToPage(event.data);
  if (!message) return;
  const isOlder = shown !== null && message.document === shown.document && message.version < shown.version;
  if (isOlder) return;
  switch (message.type) {
    case 'view':
      shown = { document: message.document, version: message.version, view: message.view };
      viewVersion = message.version;
      candidates.progress(null);
      showPreview(null);
      // What is pointed at is asked for anew: the same row may mean another candidate now.
      if (previewed !== null) actions.previewCandidate(previewed < (message.view.candidates?.candidates.length ?? 0) ? previewed : null);
      host.remember({ document: message.document });
      problems.update(message.view.problems, message.view.cautions);
      header.setFreshness('up to date', false);
      content.classList.remove('stale');
      draw();
      break;
    case 'stale': {
      const kept = shown?.document === message.document ? shown.view : null;
      if (kept === null) header.updateName(decodeURIComponent(message.document.split('/').at(-1) ?? ''));
      shown = { document: message.document, version: message.version, view: kept };
      host.remember({ document: message.document });
      if (message.problems.length > 0 || message.reason !== null) problems.update(message.problems, kept?.cautions ?? []);
      header.setFreshness(message.reason === null ? 'being worked out anew' : `${kept === null ? 'nothing to show' : 'old numbers'}: ${message.reason}`, true);
      content.classList.add('stale');
      nothing.hidden = true;
      content.hidden = false;
      pictures.hidden = kept === null;
      break;
    }
    case 'marker':
      if (message.document !== shown?.document || message.request !== request || !shown.view) break;
      if (message.marker) {
        shown.view = { ...shown.view, marker: message.marker };
        draw();
      } else {
        chart.refuse(message.refusal ?? '');
      }
      break;
    case 'preview':
      if (message.document === shown?.document && message.request === previewRequest && previewed !== null) showPreview(message.traces);
      break;
    case 'solving':
      if (message.document === shown?.document) candidates.progress(message);
      break;
    case 'cursor':
      if (message.document !== shown?.document) break;
      pointed = message.elementId;
      highlight(message.elementId);
      verdict.highlight(message.goalId);
      break;
    case 'nothing':
      shown = null;
      content.hidden = true;
      nothing.hidden = false;
      setText(nothing, message.message);
      break;
  }
});

window.addEventListener('error', (event) => host.send({ type: 'failure', message: String(event.message) }));
window.addEventListener('unhandledrejection', (event) => host.send({ type: 'failure', message: String(event.reason) }));
host.send({ type: 'ready' });
