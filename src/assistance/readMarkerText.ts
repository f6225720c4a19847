import { plainPhrase } from '../description/phrase/phrase';
import { readQuantityPhrase } from '../description/phrase/readQuantity';

/** A frequency as a person types it into the panel, in Hz; or why it is none. */
export function readMarkerText(text: string): number | { readonly refusal: string } {
  const complaints: string[] = [];
  const found = readQuantityPhrase(plainPhrase(text), 'frequency', { report: ({ message }) => complaints.push(message), lets: new Map(), expressions: false });
  if (found && complaints.length === 0 && found.value > 0) return found.value;
  return { refusal: complaints[0] ?? 'A frequency is greater than zero.' };
}
