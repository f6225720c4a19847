import { tunablesAtMost, tunableStatesAtMost } from '../limits';
import { checkPhraseName } from '../phrase/checkName';
import { readTunablePhrase, readTunableRow } from '../phrase/readTunable';
import type { FiguresSyntax, TunableSyntax } from '../syntax';
import type { PartKind } from '../../network/part';
import type { MappingNode, TreeEntry } from '../tree/treeNode';
import { atMost, expectMapping, expectScalar, located, mistake, reportShape, type SectionContext } from './sectionContext';

const noFigures: FiguresSyntax = {
  tolerance: null, q: null, qAtHz: null, esrOhm: null, eslH: null, srfHz: null, ratedVoltageV: null, ratedCurrentA: null, ratedPowerW: null,
};

/** `tunables`: for each name a phrase, or a table of codes. */
export function readTunables(entry: TreeEntry, context: SectionContext): TunableSyntax[] {
  const mapping = expectMapping(entry, 'name: kind, bits and range', context);
  return atMost(mapping?.entries ?? [], tunablesAtMost, 'tunables', context).flatMap((each): TunableSyntax[] => {
    const name = located(each.key);
    checkPhraseName(name, 'tunable', context);
    if (each.value?.form === 'scalar') return [readTunablePhrase(name, each.value.phrase, context)];
    if (each.value?.form === 'mapping') return [readTable(name, each.value, context)];
    reportShape(each, 'a phrase, or a table of codes and values', context);
    return [{ name, span: each.span, kind: null, states: { form: 'faulty' }, figures: noFigures }];
  });
}

function readTable(name: TunableSyntax['name'], node: MappingNode, context: SectionContext): TunableSyntax {
  let kind: PartKind | null = null;
  if (node.entries.length === 0) context.report(mistake('missing-value', `«${name.value}» has no codes: write a value for each, as in «{0: 1.1 pF, 1: 2.3 pF}».`, node.span));
  const rows = atMost(node.entries, tunableStatesAtMost, 'codes', context).flatMap((entry) => {
    const value = expectScalar(entry, context);
    const row = value && readTunableRow(entry.key.phrase, value.phrase, kind, context);
    kind ??= row?.part.kind ?? null;
    return row ? [row] : [];
  });
  return { name, span: node.span, kind, states: rows.length > 0 ? { form: 'table', rows } : { form: 'faulty' }, figures: noFigures };
}
