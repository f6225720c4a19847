import { isNameInC } from '../../base/cWords';
import { nearestWord } from '../../base/nearestWord';
import type { Located } from '../../base/span';
import { buildsAtMost } from '../limits';
import { readQuantityPhrase } from '../phrase/readQuantity';
import type { DescriptionSyntax, Quantity } from '../syntax';
import type { TreeEntry } from '../tree/treeNode';
import { expectMapping, expectScalar, located, mistake, type SectionContext } from './sectionContext';
import { reportUnknownKey } from './unknownKey';

/** `ohmward: 1`: the version of the language. */
export function readVersion(entry: TreeEntry, context: SectionContext): void {
  const node = expectScalar(entry, context);
  if (!node || node.phrase.text.trim() === '1') return;
  context.report(mistake('language-version', `Version «${node.phrase.text}» of the language is not known here; this reads version 1.`, node.span, {
    fixes: [{ title: 'Change to 1', edits: [{ span: node.span, text: '1' }] }],
  }));
}

export function readTitle(entry: TreeEntry, context: SectionContext): Located<string> | null {
  const node = expectScalar(entry, context);
  return node && located(node);
}

/** `z0`: real and positive. */
export function readZ0(entry: TreeEntry, context: SectionContext): Quantity | null {
  const node = expectScalar(entry, context);
  const z0 = node && readQuantityPhrase(node.phrase, 'resistance', context);
  if (z0 && !(z0.value > 0)) {
    context.report(mistake('not-positive', 'z0 is real and above zero.', z0.span));
    return null;
  }
  return z0;
}

export function readPower(entry: TreeEntry, context: SectionContext): Quantity | null {
  const node = expectScalar(entry, context);
  const power = node && readQuantityPhrase(node.phrase, 'power', context);
  if (power && !(power.value > 0)) {
    context.report(mistake('not-positive', 'The power available from the source is above zero watts.', power.span));
    return null;
  }
  return power;
}

export function readSpread(entry: TreeEntry, context: SectionContext): DescriptionSyntax['spread'] {
  const node = expectScalar(entry, context);
  if (!node) return null;
  const { value, span } = located(node);
  if (value === 'uniform' || value === 'normal') return { value, span };
  const nearest = nearestWord(value, ['uniform', 'normal']);
  context.report(mistake('unknown-word', `«${value}» is no spread; it is «uniform» or «normal»${nearest ? ` (did you mean «${nearest}»?)` : ''}.`, span, {
    fixes: nearest ? [{ title: `Change to «${nearest}»`, edits: [{ span, text: nearest }] }] : undefined,
  }));
  return null;
}

export function readBuilds(entry: TreeEntry, context: SectionContext): Quantity | null {
  return readWhole(entry, 1, buildsAtMost, context);
}

export function readSeed(entry: TreeEntry, context: SectionContext): Quantity | null {
  return readWhole(entry, 0, 0xffffffff, context);
}

function readWhole(entry: TreeEntry, min: number, max: number, context: SectionContext): Quantity | null {
  const node = expectScalar(entry, context);
  const number = node && readQuantityPhrase(node.phrase, 'integer', context);
  if (!number) return null;
  if (Number.isInteger(number.value) && number.value >= min && number.value <= max) return number;
  context.report(mistake('out-of-range', `«${entry.key.phrase.text}» is a whole number from ${min} to ${max}.`, number.span));
  return null;
}

/** `firmware`: where the table of codes goes. */
export function readFirmware(entry: TreeEntry, context: SectionContext): DescriptionSyntax['firmware'] {
  const mapping = expectMapping(entry, 'header: path', context);
  if (!mapping) return null;
  const found: { header: Located<string> | null; json: Located<string> | null; symbol: Located<string> | null } = { header: null, json: null, symbol: null };
  for (const each of mapping.entries) {
    const name = each.key.phrase.text;
    if (name !== 'header' && name !== 'json' && name !== 'symbol') {
      reportUnknownKey(each.key, 'firmware', context);
      continue;
    }
    const node = expectScalar(each, context);
    if (!node) continue;
    const value = located(node);
    if (name === 'symbol' && !isNameInC(value.value)) {
      context.report(mistake('bad-symbol', `«${value.value}» cannot name the table in C: letters, digits and _, a letter first, and no word of the language or of <stdint.h>.`, value.span));
      continue;
    }
    if (name !== 'symbol' && !/[^./\\\s]/.test(value.value.split(/[/\\]/).at(-1) ?? '')) {
      context.report(mistake('bad-path', `«${value.value}» names no file that a table could be written to.`, value.span));
      continue;
    }
    found[name] = value;
  }
  if (found.header && found.header.value === found.json?.value) context.report(mistake('duplicate-file', 'Header and JSON table cannot be one file.', found.json.span));
  if (!found.header && !found.json) context.report(mistake('missing-key', '«firmware» needs «header» or «json»: where the table goes.', entry.key.span));
  return { span: mapping.span, ...found };
}
