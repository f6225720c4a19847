import type { Element } from '../network/element';
import type { Impedance } from '../network/impedance';
import type { GoalCondition } from './goal';
import { elementObstacle } from './obstacles';

/** What something is at zero frequency, by its structure alone. `resistive`: passes direct current but is no short. */
type AtDc = 'open' | 'resistive' | 'short' | { readonly unknown: string };

export interface DirectCurrentAnswer {
  /** Null where it cannot be told. */
  readonly met: boolean | null;
  readonly reason: string | null;
}

/**
 * The conditions on direct current, judged by structure: inductors, bridges and lines are shorts (their losses do not
 * count), capacitors and empty pads are opens, resistors pass direct current without being a short.
 *
 * `dc path`: every element in series between source and load passes direct current. `dc block`: one of them does not.
 * What hangs across the path has no say in these two. `dc short at load`: from the load, through shorts in series, one
 * comes to something across the path that is a short (a coil, a shorted stub, a transformer's winding). Windings are apart:
 * a transformer blocks the path, and shorts both of its sides. What a block does at zero frequency is not known.
 */
export function directCurrent(condition: GoalCondition, ladder: readonly Element[]): DirectCurrentAnswer {
  if (condition === 'dc short at load') return shortAtLoad(ladder);
  const path = dcPath(ladder);
  return condition === 'dc path' || path.met === null ? path : { met: !path.met, reason: null };
}

function dcPath(ladder: readonly Element[]): DirectCurrentAnswer {
  const inSeries = ladder.map(seriesAtDc);
  if (inSeries.includes('open')) return { met: false, reason: null };
  const reason = inSeries.map(unknownReason).find((each) => each !== null) ?? null;
  return reason === null ? { met: true, reason: null } : { met: null, reason };
}

function shortAtLoad(ladder: readonly Element[]): DirectCurrentAnswer {
  let doubtAlong: string | null = null;
  let doubtAcross: string | null = null;
  for (const element of ladder) {
    const across = shuntAtDc(element);
    if (across === 'short' && doubtAlong === null) return { met: true, reason: null };
    if (across === 'short') break;
    doubtAcross ??= unknownReason(across);
    const along = seriesAtDc(element);
    if (along === 'open' || along === 'resistive') return answer(doubtAcross);
    doubtAlong ??= unknownReason(along);
  }
  return answer(doubtAcross ?? doubtAlong);
}

/** No short was found; whether there is none depends on the doubt. */
const answer = (doubt: string | null): DirectCurrentAnswer => ({ met: doubt === null ? false : null, reason: doubt });

const unknownReason = (state: AtDc): string | null => (typeof state === 'object' ? state.unknown : null);

/** As it lies between the source's side and the load's. */
function seriesAtDc(element: Element): AtDc {
  switch (element.form) {
    case 'branch': return element.orientation === 'series' ? branchAtDc(element.branch, element.name) : 'short';
    case 'transformer': return 'open';
    case 'block': return { unknown: `what ${element.name} does to direct current is not in its file` };
    case 'unsolved':
    case 'faulty': return element.orientation === 'shunt' ? 'short' : { unknown: elementObstacle(element) ?? element.name };
    case 'bridge':
    case 'line':
    case 'stub':
    case 'not fitted': return 'short';
  }
}

/** As it hangs across the path, seen from the load's side. */
function shuntAtDc(element: Element): AtDc {
  switch (element.form) {
    case 'branch': return element.orientation === 'shunt' ? branchAtDc(element.branch, element.name) : 'open';
    case 'stub': return element.end === 'short' ? 'short' : 'open';
    case 'transformer': return 'short';
    case 'block': return { unknown: `what ${element.name} does to direct current is not in its file` };
    case 'unsolved':
    case 'faulty': return element.orientation === 'series' ? 'open' : { unknown: elementObstacle(element) ?? element.name };
    case 'bridge':
    case 'line':
    case 'not fitted': return 'open';
  }
}

function branchAtDc(impedance: Impedance, name: string): AtDc {
  switch (impedance.form) {
    case 'part':
      if (impedance.part.kind === 'capacitor') return 'open';
      return impedance.part.kind === 'inductor' || impedance.part.value === 0 ? 'short' : 'resistive';
    case 'open': return 'open';
    case 'short': return 'short';
    case 'series': return firstOf(['open', 'unknown', 'resistive', 'short'], impedance.members, name);
    case 'parallel': return firstOf(['short', 'unknown', 'resistive', 'open'], impedance.members, name);
    case 'unknown': return { unknown: `${name}: ${impedance.reason}` };
    default: return { unknown: `what ${name} does to direct current is not known` };
  }
}

/** The state that comes first in `order` among the members; with none, the last of `order`. */
function firstOf(order: readonly ('open' | 'unknown' | 'resistive' | 'short')[], members: readonly Impedance[], name: string): AtDc {
  const states = members.map((member) => branchAtDc(member, name));
  for (const wanted of order) {
    const found = states.find((state) => (typeof state === 'object' ? 'unknown' : state) === wanted);
    if (found !== undefined) return found;
  }
  return order[order.length - 1] as 'open' | 'short';
}
