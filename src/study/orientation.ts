import type { Element, Orientation } from '../network/element';

/** Where an element lies: in the path, across it, or as a two-port. */
export function orientationOf(element: Element): Orientation {
  switch (element.form) {
    case 'line':
    case 'transformer':
    case 'block': return 'through';
    case 'stub': return 'shunt';
    default: return element.orientation;
  }
}
