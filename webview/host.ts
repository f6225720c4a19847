import type { ToHost } from '../src/messages/panel';

interface EditorApi {
  postMessage(message: ToHost): void;
  setState(state: unknown): void;
}

declare function acquireVsCodeApi(): EditorApi;

/** The line to the extension host. */
export interface Host {
  send(message: ToHost): void;
  /** Kept by the editor over a reload of its window. */
  remember(state: { document: string }): void;
}

export function connectHost(): Host {
  const api = acquireVsCodeApi();
  return { send: (message) => api.postMessage(message), remember: (state) => api.setState(state) };
}
