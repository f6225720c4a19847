import { element, setText } from './dom';

/** Stands beside a heading while what is below it belongs to values that are not in the text. */
export function notInsertedMark() {
  const root = element('span', { class: 'not-inserted' });
  return {
    root,
    show(notInserted: boolean) {
      root.hidden = !notInserted;
      setText(root, notInserted ? 'not inserted' : '');
    },
  };
}
