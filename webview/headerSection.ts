import type { PanelView } from '../src/messages/panel';
import type { Actions } from './actions';
import type { Controls } from './controls';
import { element, setText } from './dom';

/** Title, file, and how fresh the numbers are. */
export function headerSection(controls: Controls, actions: Actions) {
  let pinned = false;
  const title = element('h1');
  const file = element('span', { class: 'file' });
  const freshness = element('span', { class: 'freshness', role: 'status' });
  const pin = controls.button({ label: 'Pin', description: 'Pin: keep showing this description', onPress: () => actions.pin(!pinned) });
  const root = element('header', {}, title, element('div', { class: 'file-line' }, file, freshness, pin));
  return {
    root,
    update(view: PanelView) {
      pinned = view.pinned;
      setText(title, view.title);
      setText(file, view.fileName === view.title ? '' : view.fileName);
      setText(pin, pinned ? 'Unpin' : 'Pin');
      pin.setAttribute('aria-label', pinned ? 'Unpin: follow the active description' : 'Pin: keep showing this description');
    },
    /** Of a description that could not be shown yet, only its name is known. */
    updateName(fileName: string) {
      setText(title, fileName);
      setText(file, '');
    },
    setFreshness(text: string, old: boolean) {
      setText(freshness, text);
      root.classList.toggle('old', old);
    },
  };
}
