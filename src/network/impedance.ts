import type { Complex } from './complex';
import type { NetworkData } from './networkData';
import type { Part } from './part';

/**
 * An impedance over frequency, as a tree. Loads, sources and the branches of a ladder are all of this form; a ladder's
 * branch holds parts only.
 */
export type Impedance =
  | { readonly form: 'constant'; readonly impedanceOhm: Complex }
  /** Reflection coefficient against `referenceOhm`, the same at every frequency. */
  | { readonly form: 'reflection'; readonly reflection: Complex; readonly referenceOhm: number }
  | { readonly form: 'open' }
  | { readonly form: 'short' }
  | { readonly form: 'part'; readonly part: Part }
  | { readonly form: 'series'; readonly members: readonly Impedance[] }
  | { readonly form: 'parallel'; readonly members: readonly Impedance[] }
  /** One port of a file with the others closed in their references (`port` from 1), or two ports driven differentially. */
  | { readonly form: 'file'; readonly data: NetworkData; readonly port: number | 'differential' }
  /** Linear in the reflection coefficient (against `referenceOhm`) between the points; not known outside them. */
  | { readonly form: 'table'; readonly frequencyHz: Float64Array; readonly reflectionRe: Float64Array; readonly reflectionIm: Float64Array; readonly referenceOhm: number }
  /** Something that could not be read: not known at any frequency, for the stated reason. */
  | { readonly form: 'unknown'; readonly reason: string };
