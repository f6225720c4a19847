/** What a person can do in the page; each section is handed these and knows nothing of messages. */
export interface Actions {
  revealLine(line: number): void;
  pointAt(elementId: string | null): void;
  moveMarker(frequencyHz: number): void;
  typeMarker(text: string): void;
  stepValue(elementId: string, direction: 'up' | 'down'): void;
  setValue(elementId: string, text: string): void;
  /** Null: no candidate any more. */
  previewCandidate(candidate: number | null): void;
  insertCandidate(candidate: number): void;
  writeFirmware(): void;
  saveReport(): void;
  copy(what: 'chart svg' | 'ladder csv' | 'ladder markdown' | 'codes csv', text: string): void;
  save(what: 'chart svg' | 'chart png', base64: string): void;
  pin(pinned: boolean): void;
}
