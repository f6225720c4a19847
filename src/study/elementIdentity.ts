import type { Element } from '../network/element';
import type { ElementKind, ElementResult } from './evaluation';

export type ElementIdentity = Pick<ElementResult, 'kind' | 'value' | 'unit' | 'fitted'>;

const units = { resistor: 'Ω', inductor: 'H', capacitor: 'F' } as const;

/** What an element is and its one value, where it has one: Ω, H, F, or metres; one part's for a pair. */
export function identityOf(element: Element): ElementIdentity {
  const unvalued = (kind: ElementKind, fitted: boolean): ElementIdentity => ({ kind, value: null, unit: null, fitted });
  switch (element.form) {
    case 'branch': {
      if (element.branch.form !== 'part') return unvalued('branch', true);
      const { kind, value } = element.branch.part;
      return { kind, value, unit: units[kind], fitted: true };
    }
    case 'bridge': return { kind: 'bridge', value: 0, unit: 'Ω', fitted: false };
    case 'not fitted': return unvalued(element.kind ?? 'branch', false);
    case 'line':
    case 'stub': return { kind: element.form, value: element.line.lengthM, unit: 'm', fitted: true };
    case 'transformer':
    case 'block': return unvalued(element.form, true);
    case 'unsolved': return unvalued(element.kind ?? 'branch', false);
    case 'faulty': return unvalued(element.orientation === 'through' ? 'block' : 'branch', false);
  }
}
