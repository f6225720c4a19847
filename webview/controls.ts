import { provideVSCodeDesignSystem, vsCodeButton, vsCodeTextField } from '@vscode/webview-ui-toolkit';
import { element } from './dom';

/**
 * The only place that knows the toolkit: everything else asks for a control and gets an element. `plain` makes the same
 * controls of ordinary HTML; the page's tests run with both.
 */
export interface Controls {
  button(options: { label: string; description?: string; primary?: boolean; onPress: () => void }): HTMLElement;
  textField(options: { label: string; onSubmit: (text: string) => void; onArrow?: (direction: 'up' | 'down') => void }): TextField;
}

export interface TextField {
  readonly root: HTMLElement;
  setValue(text: string): void;
  /** True while a person is writing into it, so that nothing is pulled away from under them. */
  isBusy(): boolean;
}

interface ValueElement extends HTMLElement {
  value: string;
}

export function toolkitControls(): Controls {
  provideVSCodeDesignSystem().register(vsCodeButton(), vsCodeTextField());
  return {
    button({ label, description, primary, onPress }) {
      const made = document.createElement('vscode-button');
      made.setAttribute('appearance', primary ? 'primary' : 'secondary');
      made.textContent = label;
      if (description !== undefined) made.setAttribute('aria-label', description);
      made.addEventListener('click', onPress);
      return made;
    },
    textField: ({ label, onSubmit, onArrow }) => field(document.createElement('vscode-text-field') as unknown as ValueElement, label, onSubmit, onArrow),
  };
}

export function plainControls(): Controls {
  return {
    button: ({ label, description, primary, onPress }) =>
      element('button', { type: 'button', class: primary ? 'control primary' : 'control', 'aria-label': description, text: label, click: onPress }),
    textField: ({ label, onSubmit, onArrow }) => field(element('input', { type: 'text', class: 'control' }), label, onSubmit, onArrow),
  };
}

function field(input: ValueElement, label: string, onSubmit: (text: string) => void, onArrow?: (direction: 'up' | 'down') => void): TextField {
  let shown = '';
  let busy = false;
  input.setAttribute('aria-label', label);
  // The toolkit puts a name of its own over it when the field comes into the page.
  new MutationObserver(() => {
    if (input.getAttribute('aria-label') === 'Text field') input.setAttribute('aria-label', label);
  }).observe(input, { attributes: true, attributeFilter: ['aria-label'] });
  input.setAttribute('spellcheck', 'false');
  const leave = () => {
    busy = false;
    input.value = shown;
  };
  input.addEventListener('input', () => { busy = true; });
  input.addEventListener('keydown', (event) => {
    if (event.key === 'Enter') {
      busy = false;
      onSubmit(input.value);
    } else if (event.key === 'Escape') {
      leave();
    } else if (onArrow && (event.key === 'ArrowUp' || event.key === 'ArrowDown')) {
      event.preventDefault();
      busy = false;
      onArrow(event.key === 'ArrowUp' ? 'up' : 'down');
    }
  });
  input.addEventListener('focusout', () => {
    if (busy && input.value !== shown) onSubmit(input.value);
    busy = false;
  });
  return {
    root: input,
    setValue(text) {
      shown = text;
      if (!busy && input.value !== text) input.value = text;
    },
    isBusy: () => busy,
  };
}
