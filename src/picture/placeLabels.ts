export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

export interface PlacedLabel {
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly text: string;
}

export interface LabelledPoint {
  readonly x: number;
  readonly y: number;
  readonly text: string;
}

const height = 13;
const letterWidth = 7;
const distance = 9;
/** Directions in the order in which an eye likes them. */
const directions: readonly (readonly [number, number])[] = [[1, -0.5], [-1, -0.5], [1, 1], [-1, 1], [0, -1], [0, 1.3], [1.6, -1.4], [-1.6, -1.4], [1.6, 1.8], [-1.6, 1.8]];

/** Labels beside their points, each where it covers least of other labels, of the points, and of what lies beyond `bounds`. */
export function placeLabels(points: readonly LabelledPoint[], bounds: Box, obstacles: readonly { readonly x: number; readonly y: number }[]): PlacedLabel[] {
  const taken: Box[] = points.map(({ x, y }) => ({ x: x - 5, y: y - 5, width: 10, height: 10 }));
  return points.map(({ x, y, text }) => {
    const width = text.length * letterWidth;
    const options = directions.map(([dx, dy]) => {
      const anchor = dx > 0.1 ? ('start' as const) : dx < -0.1 ? ('end' as const) : ('middle' as const);
      const left = x + dx * distance - (anchor === 'end' ? width : anchor === 'middle' ? width / 2 : 0);
      const baseline = y + dy * distance + 4;
      return { anchor, x: x + dx * distance, y: baseline, box: { x: left, y: baseline - height + 3, width, height } };
    });
    const cost = (box: Box) => {
      const overlaps = taken.reduce((sum, other) => sum + overlap(box, other), 0);
      const covered = obstacles.filter((point) => point.x >= box.x && point.x <= box.x + box.width && point.y >= box.y && point.y <= box.y + box.height).length;
      const outside = box.x < bounds.x || box.y < bounds.y || box.x + box.width > bounds.x + bounds.width || box.y + box.height > bounds.y + bounds.height;
      return overlaps * 3 + covered * 12 + (outside ? 10_000 : 0);
    };
    const best = options.reduce((found, option) => (cost(option.box) < cost(found.box) - 1e-9 ? option : found));
    taken.push(best.box);
    return { x: best.x, y: best.y, anchor: best.anchor, text };
  });
}

function overlap(a: Box, b: Box): number {
  const width = Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x);
  const tall = Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y);
  return width > 0 && tall > 0 ? width * tall : 0;
}
