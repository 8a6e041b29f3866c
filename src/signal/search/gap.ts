/** The gap between a proved bound and the best point, in dB outside and in nepers inside. */

/** One neper, the unit of a natural-log gain, in dB: 20/ln 10. */
const dbPerNeper = 20 / Math.LN10;

/**
 * The gap at which a search stops, in nepers; 0.001 dB unless given, less a hair for rounding.
 *
 * @example toNepers(20 / Math.LN10) // 1
 */
export function toNepers(gapDb = 0.001): number {
  return (gapDb * (1 - 1e-9)) / dbPerNeper;
}

/**
 * The gap between a bound and a point in dB; 0 where both are the same infinity.
 *
 * @example gapOf(-Infinity, -Infinity) // 0
 */
export function gapOf(upper: number, best: number): number {
  return upper === best ? 0 : (upper - best) * dbPerNeper;
}
