import { bandsAtMost, channelsAtMost, familiesAtMost, goalsAtMost, letsAtMost } from '../limits';
import { checkPhraseName } from '../phrase/checkName';
import type { LetValue } from '../phrase/phrase';
import { readBandPhrase } from '../phrase/readBand';
import { readChannelsPhrase } from '../phrase/readChannels';
import { readFamilyPhrase } from '../phrase/readFamily';
import { readGoalPhrase } from '../phrase/readGoal';
import { readLetPhrase } from '../phrase/readLet';
import type { BandSyntax, DescriptionSyntax, FamilySyntax, GoalSyntax } from '../syntax';
import type { ScalarNode, TreeEntry } from '../tree/treeNode';
import { atMost, expectList, expectMapping, expectScalar, located, mistake, reportShape, shapeOf, type SectionContext } from './sectionContext';

/** `let`: each value may use those before it. */
export function readLets(entry: TreeEntry, context: SectionContext): { lets: DescriptionSyntax['lets']; values: ReadonlyMap<string, LetValue> } {
  const values = new Map<string, LetValue>();
  const mapping = expectMapping(entry, 'name: value', context);
  const lets = atMost(mapping?.entries ?? [], letsAtMost, 'names', context).map((each) => {
    const name = located(each.key);
    const phrase = expectScalar(each, context);
    const value = phrase && readLetPhrase(name, phrase.phrase, { ...context, lets: values });
    if (value) values.set(name.value, value);
    return { name, span: each.span };
  });
  return { lets, values };
}

export function readBands(entry: TreeEntry, context: SectionContext): BandSyntax[] {
  const mapping = expectMapping(entry, 'name: range', context);
  return atMost(mapping?.entries ?? [], bandsAtMost, 'bands', context).flatMap((each): BandSyntax[] => {
    const name = located(each.key);
    checkPhraseName(name, 'band', context);
    const phrase = expectScalar(each, context);
    const band = phrase && readBandPhrase(name, phrase.phrase, context);
    // One that cannot be read keeps its name, so that its uses are not told as mistakes too.
    return [band ?? { name, span: each.span, range: null, frequencyHz: null, watch: false }];
  });
}

export function readFamilies(entry: TreeEntry, context: SectionContext): FamilySyntax[] {
  const mapping = expectMapping(entry, 'name: family', context);
  return atMost(mapping?.entries ?? [], familiesAtMost, 'families', context).flatMap((each): FamilySyntax[] => {
    const name = located(each.key);
    checkPhraseName(name, 'family', context);
    const phrase = expectScalar(each, context);
    return phrase ? [readFamilyPhrase(name, phrase.phrase, context)] : [];
  });
}

export function readGoals(entry: TreeEntry, context: SectionContext): GoalSyntax[] {
  const list = expectList(entry, 'goal', context);
  return atMost(list?.items ?? [], goalsAtMost, 'goals', context).flatMap((item, i): GoalSyntax[] => {
    if (item?.form === 'scalar') {
      const goal = readGoalPhrase(item.phrase, context);
      return goal ? [goal] : [];
    }
    if (item) {
      const hint = item.form === 'mapping' ? '; a goal has no colon followed by a space' : '';
      context.report(mistake('wrong-shape', `A goal is one phrase, not ${shapeOf(item)}${hint}.`, item.span));
    } else {
      context.report(mistake('missing-value', 'A dash without a goal after it.', list?.itemSpans[i] ?? entry.key.span));
    }
    return [];
  });
}

/** `channels`: a range, a band's name, or a list of ranges and frequencies. */
export function readChannels(entry: TreeEntry, context: SectionContext): DescriptionSyntax['channels'] {
  const node = entry.value;
  if (!node || node.form === 'mapping') {
    reportShape(entry, "a range, a band's name, or a list of frequencies", context);
    return null;
  }
  const items = node.form === 'scalar' ? [node] : atMost(node.items, channelsAtMost, 'channels', context);
  const read = items.filter((item): item is ScalarNode => {
    if (item?.form !== 'scalar') context.report(mistake('wrong-shape', 'A channel is a frequency or a range.', item?.span ?? entry.key.span));
    return item?.form === 'scalar';
  }).map((item) => readChannelsPhrase(item.phrase, context));
  const bands = read.flatMap((channel) => channel?.band ?? []);
  if (node.form === 'list') {
    for (const band of bands) context.report(mistake('band-in-list', "A band's name stands alone after «channels»; a list holds frequencies and ranges.", band.span));
  }
  return {
    span: node.span,
    isEmpty: node.form === 'list' && node.items.length === 0,
    band: node.form === 'scalar' ? bands[0] ?? null : null,
    ranges: read.flatMap((channel) => channel?.range ?? []),
    frequenciesHz: read.flatMap((channel) => channel?.frequencyHz ?? []),
  };
}
