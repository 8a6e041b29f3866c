/** Turns a written tolerance into the plain relative deviations that the analysis takes. */
import type { Tolerance } from '../../units/quantity';

/** No deviation at all. */
export const exact: Tolerance = { low: 0, high: 0 };

/** Parts are stated at 25 °C and stand at 27 °C unless the channel says otherwise. */
const degreesFromStated = 2;

/** A tolerance widened by its temperature coefficient. */
export function settledTolerance(tolerance: Tolerance | undefined): Tolerance {
  if (tolerance === undefined) return exact;
  const drift = (tolerance.perKelvin ?? 0) * degreesFromStated;
  return { low: tolerance.low - drift, high: tolerance.high + drift };
}

/** The tolerance of 1/(RC) from those of R and C. */
export function cornerToleranceOfRc(r: Tolerance, c: Tolerance): Tolerance {
  return { low: 1 / ((1 + r.high) * (1 + c.high)) - 1, high: 1 / ((1 + r.low) * (1 + c.low)) - 1 };
}
