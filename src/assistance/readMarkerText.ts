import type { Diagnostic } from '../base/diagnostic';
import { plainPhrase } from '../description/phrase/phrase';
import { readQuantityPhrase } from '../description/phrase/readQuantity';

const bareNumber = /^\d+(?:\.\d*)?$|^\.\d+$/;

/**
 * The frequency (Hz) that a person typed for the marker: `868.3 MHz`, or a bare number, which counts as MHz as this is a
 * field for nothing else. Else one sentence that says what would be right.
 */
export function readMarkerText(text: string): number | { refusal: string } {
  const typed = text.trim();
  if (typed === '') return { refusal: 'Type a frequency, such as 868.3 MHz.' };
  const found: Diagnostic[] = [];
  const phrase = plainPhrase(bareNumber.test(typed) ? `${typed} MHz` : typed);
  const frequency = readQuantityPhrase(phrase, 'frequency', { report: (diagnostic) => found.push(diagnostic), lets: new Map(), expressions: false });
  if (found.length > 0 || frequency === null) return { refusal: found[0]?.message ?? 'Type a frequency, such as 868.3 MHz.' };
  return frequency.value > 0 ? frequency.value : { refusal: 'A frequency is above 0 Hz.' };
}
