import type { ProblemView } from '../src/messages/panel';
import type { Actions } from './actions';
import { element, setText, syncList } from './dom';

const marks = { error: '✗', warning: '!', info: 'i' } as const;
const shownAtMost = 8;

/** What is wrong with the description, each leading to its line; and the cautions. */
export function problemsSection(actions: Actions) {
  const list = element('ul', { class: 'problems', 'aria-label': 'Remarks on the description' });
  const more = element('p', { class: 'more' });
  const cautions = element('ul', { class: 'cautions', 'aria-label': 'Cautions' });
  const root = element('section', { class: 'remarks', 'aria-label': 'Remarks' }, list, more, cautions);
  const makeProblem = () => {
    const mark = element('span', { class: 'mark', 'aria-hidden': 'true' });
    const text = element('span', { class: 'message' });
    const button = element('button', { type: 'button', class: 'row-button', click: () => actions.revealLine(Number(button.dataset.line)) }, mark, text);
    return element('li', {}, button);
  };
  return {
    root,
    update(problems: readonly ProblemView[], cautionTexts: readonly string[]) {
      const order = { error: 0, warning: 1, info: 2 } as const;
      const sorted = [...problems].sort((a, b) => order[a.severity] - order[b.severity] || a.line - b.line);
      syncList(list, sorted.slice(0, shownAtMost), makeProblem, (item, problem) => {
        const button = item.firstElementChild as HTMLButtonElement;
        item.className = problem.severity;
        button.dataset.line = String(problem.line);
        setText(button.children[0], marks[problem.severity]);
        setText(button.children[1], `line ${problem.line + 1}: ${problem.message}`);
      });
      setText(more, sorted.length > shownAtMost ? `and ${sorted.length - shownAtMost} more` : '');
      syncList(cautions, cautionTexts, () => element('li'), (item, text) => setText(item, text));
      root.hidden = problems.length === 0 && cautionTexts.length === 0;
      more.hidden = sorted.length <= shownAtMost;
      cautions.hidden = cautionTexts.length === 0;
      list.hidden = problems.length === 0;
    },
  };
}
