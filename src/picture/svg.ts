/** Text that is safe inside markup and attributes. */
export const escapeText = (text: string): string => text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);

export type Attributes = Readonly<Record<string, string | number | undefined>>;

/** Two decimals are below a tenth of a pixel at any size that is drawn. */
export const round = (value: number): number => Math.round(value * 100) / 100 + 0;

/** One element as markup; numbers rounded, text attributes escaped, undefined ones left out. */
export function tag(name: string, attributes: Attributes, content = ''): string {
  const written = Object.entries(attributes)
    .filter(([, value]) => value !== undefined)
    .map(([key, value]) => ` ${key}="${typeof value === 'number' ? round(value) : escapeText(value as string)}"`)
    .join('');
  return content === '' ? `<${name}${written}/>` : `<${name}${written}>${content}</${name}>`;
}

export const textTag = (attributes: Attributes, text: string): string => tag('text', attributes, escapeText(text) || ' ');

/** Path data through points, broken where one of them is null. */
export function polyline(xs: readonly (number | null)[], ys: readonly (number | null)[]): string {
  let data = '';
  let pen = false;
  for (let i = 0; i < xs.length; i++) {
    const [x, y] = [xs[i], ys[i]];
    if (x === null || y === null) {
      pen = false;
      continue;
    }
    data += `${pen ? 'L' : 'M'}${round(x)} ${round(y)}`;
    pen = true;
  }
  return data;
}
