/** Reads a curve between its points. */
import type { Points } from '../protocol/picture';

/** The level of a curve at a frequency, straight between its points and level beyond its ends; 0 for a curve without points. */
export function levelAt(points: Points, frequencyHz: number): number {
  const after = firstNotBelow(points.x, frequencyHz);
  const last = points.x.length - 1;
  const [x1, y1] = [points.x[Math.min(after, last)] ?? 0, points.y[Math.min(after, last)] ?? 0];
  if (after === 0 || after > last) return y1;
  const [x0, y0] = [points.x[after - 1] ?? x1, points.y[after - 1] ?? y1];
  return x1 === x0 ? y1 : y0 + ((y1 - y0) * (frequencyHz - x0)) / (x1 - x0);
}

/** The index of the first value that is not below the wanted one; the length where all are. */
export function firstNotBelow(rising: readonly number[], wanted: number): number {
  let [low, high] = [0, rising.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((rising[middle] ?? Infinity) < wanted) low = middle + 1;
    else high = middle;
  }
  return low;
}
