/** Where the copies of a sampled signal stand: for copy j everything at x also stands at F = |x + j·rate|, which has two branches. */
import type { CopyAxis } from '../copy-axis';
import type { Enclosure } from '../response';

/** A stretch of x on one branch of a copy. */
export interface CopyPiece {
  readonly range: Enclosure;
  /** Where x stands in the copy. */
  readonly axis: CopyAxis;
  /** Whether x + j·rate is below 0 Hz, so that the copy runs backwards. */
  readonly mirrored: boolean;
}

/** Edges that rounding has parted by this, relative to their frequency, meet. */
const meetSlack = 1e-12;

/**
 * The stretches of a band whose copy j stands in an allowed interval.
 *
 * Copy 0 of a band that only touches an interval shares nothing with it: a source may begin where the wanted band ends.
 *
 * @param copy j, any whole number.
 * @param rateHz > 0.
 * @param band of x, 0 ≤ low ≤ high ≤ Infinity.
 * @param within of F, likewise.
 * @returns up to two stretches.
 * Source: elementary.
 * @example copyPieces(-1, 10, { low: 0, high: 3 }, { low: 8, high: 20 })[0].range.high // 2
 */
export function copyPieces(copy: number, rateHz: number, band: Enclosure, within: Enclosure): readonly CopyPiece[] {
  const shift = copy * rateHz;
  const onward = copy === 0 ? band : meet(band, { low: Math.max(0, -shift), high: Infinity }, 0);
  const turned = copy < 0 ? meet(band, { low: 0, high: -shift }, 0) : null;
  const edges = [shift, band.low, band.high, within.low, within.high].filter(Number.isFinite);
  const slackHz = meetSlack * Math.max(...edges.map(Math.abs));
  const upright = onward && meet(onward, { low: within.low - shift, high: within.high - shift }, slackHz);
  const mirrored = turned && meet(turned, { low: -shift - within.high, high: -shift - within.low }, slackHz);
  const pieces: readonly (CopyPiece | null)[] = [
    upright && { range: upright, axis: { offsetHz: shift, direction: 1 }, mirrored: false },
    mirrored && { range: mirrored, axis: { offsetHz: -shift, direction: -1 }, mirrored: true },
  ];
  const wide = band.low < band.high && within.low < within.high;
  return pieces.filter((piece) => piece !== null).filter(({ range }) => copy !== 0 || !wide || range.high - range.low > slackHz);
}

/** What two intervals share, edges that rounding has parted included; null for nothing. */
function meet(band: Enclosure, other: Enclosure, slackHz: number): Enclosure | null {
  const low = Math.max(band.low, other.low);
  const high = Math.min(band.high, other.high);
  if (low <= high) return { low, high };
  if (low - high > slackHz) return null;
  const at = Math.min(Math.max(low, band.low), band.high);
  return { low: at, high: at };
}
