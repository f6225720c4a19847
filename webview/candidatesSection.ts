import type { CandidateView, PanelView, TraceView } from '../src/messages/panel';
import type { Actions } from './actions';
import type { Controls } from './controls';
import { element, setText, syncList, unbroken } from './dom';
import { previewPicture } from './previewPicture';
import { reachList } from './reachList';

/** What could be put in the place of the unknown values, best first. A row that is pointed at or has the focus shows its trace. */
export function candidatesSection(controls: Controls, actions: Actions) {
  const heading = element('h2', { text: 'Candidates' });
  const message = element('p', { class: 'candidates-message', role: 'status' });
  const bar = element('progress', { max: 1, 'aria-label': 'How far the solver is' });
  const progressText = element('span');
  const progress = element('div', { class: 'progress' }, bar, progressText);
  progress.hidden = true;
  let known = false;
  const picture = previewPicture();
  const list = element('ol', { class: 'candidates' });
  const notes = element('ul', { class: 'candidate-notes', 'aria-label': 'Remarks on the solutions' });
  const reach = reachList();
  const root = element('section', { class: 'candidates-section', 'aria-label': 'Candidates' }, heading, message, progress, picture.root, list, notes, reach.root);
  const makeRow = () => {
    const id = () => Number(row.dataset.candidate);
    const insert = controls.button({ label: 'Insert', primary: list.children.length === 0, onPress: () => actions.insertCandidate(id()) });
    insert.classList.add('insert');
    const row = element('li', {},
      element('div', { class: 'candidate' },
        element('span', { class: 'values' }),
        element('span', { class: 'figures' }, element('span', { class: 'margin' }), element('span', { class: 'more-figures' })),
        element('span', { class: 'remark' })),
      insert);
    row.addEventListener('pointerenter', () => actions.previewCandidate(id()));
    row.addEventListener('pointerleave', () => actions.previewCandidate(null));
    row.addEventListener('focusin', () => actions.previewCandidate(id()));
    row.addEventListener('focusout', () => actions.previewCandidate(null));
    return row;
  };
  const updateRow = (row: HTMLElement, candidate: CandidateView) => {
    const find = (name: string) => row.querySelector(`.${name}`)!;
    row.dataset.candidate = String(candidate.id);
    row.className = candidate.holds ? 'held' : 'missed';
    setText(find('values'), unbroken(candidate.values));
    setText(find('margin'), unbroken(`${candidate.holds ? '✓' : '✗'} margin ${candidate.margin}`));
    setText(find('more-figures'), unbroken(`worst return loss ${candidate.returnLoss}, worst gain ${candidate.gain}`));
    setText(find('remark'), [candidate.note, candidate.proof, candidate.response, `direct current ${candidate.directCurrent}`].filter((text) => text !== '').join(' · '));
    find('insert').setAttribute('aria-label', `Insert ${candidate.values}, margin ${candidate.margin}`);
  };
  return {
    root,
    update(view: PanelView) {
      const { candidates } = view;
      known = candidates !== null;
      root.hidden = !known && progress.hidden;
      if (candidates === null) return;
      root.classList.toggle('old', candidates.stale);
      setText(heading, candidates.stale && candidates.candidates.length > 0 ? 'Candidates of an older text' : 'Candidates');
      setText(message, candidates.message);
      message.hidden = candidates.message === '';
      picture.update(view);
      syncList(list, candidates.candidates, makeRow, (row, candidate) => {
        updateRow(row, candidate);
        // What belongs to an older text cannot go into this one.
        row.querySelector<HTMLElement>('.insert')!.hidden = candidates.stale;
      });
      list.hidden = candidates.candidates.length === 0;
      syncList(notes, candidates.notes, () => element('li'), (item, text) => setText(item, text));
      notes.hidden = candidates.notes.length === 0;
      reach.update(candidates.outOfReach);
    },
    /** Which candidate's traces are shown beside those of the best. */
    preview: (traces: readonly TraceView[] | null, candidate: number | null) => picture.show(traces ?? [], candidate),
    /** Null: nothing is being solved. */
    progress(state: { readonly share: number; readonly text: string } | null) {
      progress.hidden = state === null;
      root.hidden = !known && progress.hidden;
      if (state === null) return;
      bar.value = state.share;
      setText(progressText, state.text);
    },
  };
}
