/** The sweep's point so many places further from the one nearest to `hz`, within its ends; null without points. */
export function stepFrequency(frequencyHz: readonly number[], hz: number, points: number): number | null {
  if (frequencyHz.length === 0) return null;
  let nearest = 0;
  frequencyHz.forEach((candidate, i) => {
    if (Math.abs(candidate - hz) < Math.abs(frequencyHz[nearest] - hz)) nearest = i;
  });
  return frequencyHz[Math.min(Math.max(nearest + points, 0), frequencyHz.length - 1)];
}
