type Child = Node | string | null;

export interface Properties {
  readonly class?: string;
  readonly text?: string;
  readonly [attribute: string]: string | number | boolean | undefined | ((event: never) => void);
}

/** An element with attributes; functions become listeners of the event that their key names. Text is never markup. */
export function element<K extends keyof HTMLElementTagNameMap>(name: K, properties: Properties = {}, ...children: Child[]): HTMLElementTagNameMap[K] {
  const made = document.createElement(name);
  apply(made, properties);
  for (const child of children) if (child !== null) made.append(child);
  return made;
}

function apply(made: Element, properties: Properties): void {
  for (const [key, value] of Object.entries(properties)) {
    if (value === undefined || value === false) continue;
    if (typeof value === 'function') made.addEventListener(key, value as EventListener);
    else if (key === 'text') made.textContent = String(value);
    else made.setAttribute(key, value === true ? '' : String(value));
  }
}

const svgNamespace = 'http://www.w3.org/2000/svg';

/** An SVG whose content is markup of our own pictures, in which every text is escaped. */
export function picture(viewBox: string, properties: Properties = {}): SVGSVGElement {
  const made = document.createElementNS(svgNamespace, 'svg');
  made.setAttribute('viewBox', viewBox);
  apply(made, properties);
  return made;
}

/** Writes only what differs, so that an untouched part costs nothing and keeps focus. */
export function setText(target: Element, text: string): void {
  if (target.textContent !== text) target.textContent = text;
}

const drawn = new WeakMap<Element, string>();

export function setMarkup(target: SVGElement, markup: string): void {
  if (drawn.get(target) === markup) return;
  drawn.set(target, markup);
  target.innerHTML = markup;
}

/** Keeps as many children as there are items, made once and updated after. */
export function syncList<T, E extends HTMLElement>(parent: HTMLElement, items: readonly T[], make: () => E, update: (child: E, item: T, index: number) => void): void {
  while (parent.children.length > items.length) parent.lastElementChild!.remove();
  while (parent.children.length < items.length) parent.append(make());
  items.forEach((item, index) => update(parent.children[index] as E, item, index));
}

/** No number is torn from its unit at the end of a line. */
export const unbroken = (text: string): string => text.replace(/(\d) (?=[%°λΩ]|[pnµmkMG]?(?:dB|dBm|Hz|Ω|H|F|S|m|W|V|A)\b)/g, '$1\u00a0');
