/** The middle of a window of rates, in as few figures as leave it well inside. */

/** From three figures on; a window that needs more than these is hit by no rate that anybody would write. */
const figures: readonly number[] = [3, 4, 5, 6, 7, 8, 9];

/** How far from the middle, over half the width, a rounded rate may lie. */
const farthest = 0.75;

/** A rate near the middle of a window; null where the window has no end, or is a single rate. */
export function roundedMiddle({ low, high }: { readonly low: number; readonly high: number }): number | null {
  const half = (high - low) / 2;
  if (!(half > 0 && half < Infinity)) return null;
  const middle = low + half;
  const rounded = figures.map((digits) => Number(middle.toPrecision(digits)));
  return rounded.find((hz) => Math.abs(hz - middle) <= farthest * half) ?? null;
}
