import type { Span } from '../base/span';

export interface Completion {
  readonly label: string;
  readonly detail: string;
  /** Markdown. */
  readonly documentation: string;
  readonly insertText: string;
  readonly snippet: boolean;
  /** What is replaced. */
  readonly span: Span;
}

/** What is offered, before it is known what it replaces. */
export interface Offer {
  readonly label: string;
  readonly detail: string;
  readonly documentation?: string;
  /** Where it is not the label. */
  readonly insertText?: string;
  readonly snippet?: boolean;
}

export const offer = (label: string, detail: string, more: Partial<Offer> = {}): Offer => ({ label, detail, ...more });

export const completionsOf = (offers: readonly Offer[], span: Span): Completion[] => offers.map(({ label, detail, documentation, insertText, snippet }) => ({
  label, detail, documentation: documentation ?? '', insertText: insertText ?? label, snippet: snippet ?? false, span,
}));

/** Offers for the last so many characters before the cursor, and perhaps some behind it; none where nothing fits. */
export interface Offers {
  readonly offers: readonly Offer[];
  readonly before: number;
  readonly after?: number;
}

export const nothingToOffer: Offers = { offers: [], before: 0 };
