/** Places over a band that lie as the extremes of a best approximation by cosines do: finest beside an edge inside 0 … 0.5. */
import type { Enclosure } from '../response';

/**
 * The place at a part of the way through a band, Chebyshev's places where the parts are evenly spread.
 *
 * @param band within shares 0 … 0.5 of the rate.
 * @param part 0 … 1: 0 is its lower end.
 * Source: the roots of Chebyshev's polynomials in cos 2πx.
 * @example clusteredShare({ low: 0, high: 0.5 }, 0.5) // 0.25
 */
export function clusteredShare({ low, high }: Enclosure, part: number): number {
  if (part === 0) return low;
  if (part === 1) return high;
  // sin²πx = (1 − cos 2πx)/2 runs over its range as a cosine does.
  const least = Math.sin(Math.PI * low) ** 2;
  const most = Math.sin(Math.PI * high) ** 2;
  const square = least + (most - least) * Math.sin((Math.PI / 2) * part) ** 2;
  return Math.min(Math.max(Math.asin(Math.sqrt(square)) / Math.PI, low), high);
}
