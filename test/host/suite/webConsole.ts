import { page } from './page';

/** As much of printf as the reporter uses. */
function printed([format, ...values]: unknown[]): string {
  const rest = [...values];
  return [String(format ?? '').replace(/%[sdifj]/g, (mark) => (rest.length > 0 ? String(rest.shift()) : mark)), ...rest.map(String)].join(' ');
}

/** The reporter's lines, in their order, out of the worker. */
let last: Promise<unknown> = Promise.resolve();

/** What the reporter calls for each line. */
export const say = (...words: unknown[]): void => {
  last = last.then(() => page.say(printed(words)));
};

/** Resolves when every line has arrived. */
export const said = (): Promise<unknown> => last;
