/** Turns unknown data into T, or undefined where it does not fit. */
export type Decoder<T> = (data: unknown) => T | undefined;

const itemsAtMost = 200_000;
const textAtMost = 8_000_000;

export const text: Decoder<string> = (data) => (typeof data === 'string' && data.length <= textAtMost ? data : undefined);
export const number: Decoder<number> = (data) => (typeof data === 'number' && Number.isFinite(data) ? data : undefined);
export const whole: Decoder<number> = (data) => (typeof data === 'number' && Number.isSafeInteger(data) && data >= 0 ? data : undefined);
export const flag: Decoder<boolean> = (data) => (typeof data === 'boolean' ? data : undefined);

export const oneOf = <T extends string>(...words: readonly T[]): Decoder<T> => (data) => words.find((word) => word === data);

export const orNull = <T>(inner: Decoder<T>): Decoder<T | null> => (data) => (data === null ? null : inner(data));

export const listOf = <T>(inner: Decoder<T>): Decoder<readonly T[]> => (data) => {
  if (!Array.isArray(data) || data.length > itemsAtMost) return undefined;
  const items: T[] = [];
  for (const entry of data) {
    const item = inner(entry);
    if (item === undefined) return undefined;
    items.push(item);
  }
  return items;
};

/** An object with exactly these fields; others are dropped. */
export const shape = <T extends object>(fields: { readonly [K in keyof T]-?: Decoder<T[K]> }): Decoder<T> => (data) => {
  if (typeof data !== 'object' || data === null || Array.isArray(data)) return undefined;
  const result: Partial<T> = {};
  for (const key of Object.keys(fields) as (keyof T)[]) {
    const value = Object.hasOwn(data, key) ? fields[key]((data as T)[key]) : undefined;
    if (value === undefined) return undefined;
    result[key] = value;
  }
  return result as T;
};

/** The decoder that the message's `type` names. */
export const byType = <T extends { readonly type: string }>(decoders: { readonly [K in T['type']]: Decoder<Extract<T, { type: K }>> }): Decoder<T> => (data) => {
  const type = typeof data === 'object' && data !== null && Object.hasOwn(data, 'type') ? (data as { type: unknown }).type : undefined;
  if (typeof type !== 'string' || !Object.hasOwn(decoders, type)) return undefined;
  return (decoders[type as T['type']] as Decoder<T>)(data);
};
