import { nearestWord } from '../../base/nearestWord';
import type { ScalarNode } from '../tree/treeNode';
import { keyNames, type KeyPlace } from '../keys';
import { mistake, type SectionContext } from './sectionContext';

/** Reports a key that may not stand at a place, with the nearest one that may. */
export function reportUnknownKey(key: ScalarNode, place: KeyPlace, context: SectionContext): void {
  const { text } = key.phrase;
  const names = keyNames(place);
  const nearest = nearestWord(text, names);
  const hint = nearest ? `did you mean «${nearest}»?` : `known here: ${names.join(', ')}.`;
  context.report(mistake('unknown-key', `«${text}» is no key that is known here; ${hint}`, key.span, {
    fixes: nearest ? [{ title: `Change to «${nearest}»`, edits: [{ span: key.span, text: nearest }], preferred: true }] : undefined,
  }));
}
