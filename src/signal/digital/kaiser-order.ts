/** How many taps a filter of a given steepness will take, roughly: where a search starts. */

/**
 * Kaiser's estimate of the order N = (A − 7.95)/(2.285·Δω), of which N + 1, rounded up, is a number of taps.
 *
 * @param attenuationDb of the stop band, or the geometric mean of both bands' deviations as an attenuation.
 * @param width of the transition as a share of the rate, above 0.
 * Source: J. F. Kaiser, Nonrecursive digital filter design using the I0-sinh window function (1974).
 * @example kaiserOrder(60, 0.05) // 72.5077881
 */
export function kaiserOrder(attenuationDb: number, width: number): number {
  return (attenuationDb - 7.95) / (2.285 * 2 * Math.PI * width);
}
