import type { GoalView, PanelView } from '../src/messages/panel';
import { barSize, goalBar } from '../src/picture/goalBar';
import type { Actions } from './actions';
import { element, picture, setMarkup, setText, syncList, unbroken } from './dom';
import { notInsertedMark } from './notInsertedMark';

/** Goal by goal: whether it holds, its margin as a bar, its worst value and where. Each leads to its line. */
export function verdictSection(actions: Actions) {
  const words = element('span');
  const mark = notInsertedMark();
  const heading = element('h2', {}, words, mark.root);
  const list = element('ul', { class: 'goals' });
  const root = element('section', { class: 'verdict', 'aria-label': 'Verdict' }, heading, list);
  const makeGoal = () => {
    const button = element('button', { type: 'button', class: 'row-button goal', click: () => actions.revealLine(Number(button.dataset.line)) },
      element('span', { class: 'mark' }, element('span', { class: 'sign', 'aria-hidden': 'true' }), element('span', { class: 'hidden-text' })),
      element('span', { class: 'what' }, element('span', { class: 'title' }), element('span', { class: 'place' })),
      element('span', { class: 'value' }, element('span', { class: 'number' }), element('span', { class: 'detail' })), element('span', { class: 'note' }));
    button.insertBefore(picture(`0 0 ${barSize.width} ${barSize.height}`, { class: 'bar', 'aria-hidden': 'true', preserveAspectRatio: 'none' }) as unknown as HTMLElement, button.querySelector('.value'));
    return element('li', {}, button);
  };
  const updateGoal = (item: HTMLElement, goal: GoalView) => {
    const button = item.firstElementChild as HTMLButtonElement;
    item.className = goal.ok ? 'held' : goal.known ? 'missed' : 'unknown';
    item.dataset.goal = String(goal.id);
    button.dataset.line = String(goal.line);
    const find = (name: string) => button.querySelector(`.${name}`)!;
    setText(find('sign'), goal.ok ? '✓' : goal.known ? '✗' : '?');
    setText(find('hidden-text'), goal.ok ? 'holds: ' : goal.known ? 'missed: ' : 'not known: ');
    setText(find('title'), unbroken(goal.title));
    setText(find('place'), unbroken(goal.place));
    setText(find('number'), unbroken(goal.valueText));
    setText(find('detail'), goal.detail);
    // A word joiner: a line may otherwise end within |Γ|.
    setText(find('note'), goal.note.replaceAll('|Γ|', '|\u2060Γ|'));
    const bar = find('bar') as SVGElement;
    bar.style.visibility = goal.bar === null ? 'hidden' : '';
    setMarkup(bar, goalBar(goal.bar));
    button.title = goal.marginText;
  };
  return {
    root,
    update({ verdict, goals, notInserted }: Pick<PanelView, 'verdict' | 'goals' | 'notInserted'>) {
      setText(words, `Verdict: ${verdict === '' ? 'no goals yet' : notInserted ? `with the best candidate ${verdict}` : verdict}`);
      mark.show(notInserted);
      syncList(list, goals, makeGoal, updateGoal);
    },
    highlight(goalId: number | null) {
      for (const item of list.children) item.classList.toggle('current', goalId !== null && (item as HTMLElement).dataset.goal === String(goalId));
    },
  };
}
