/** One copy of a sampled band as an axis: responses seen along the baseband frequency x, at the output frequency that x leaves at. */
import { FactorRatio } from './factor-ratio';
import type { Enclosure, Response } from './response';
import type { StretchedResponse } from './stretched';

/** Where x leaves: at offset + direction·x, in Hz, which is not negative for any x asked for. */
export interface CopyAxis {
  readonly offsetHz: number;
  readonly direction: 1 | -1;
}

/**
 * A response along a copy: x ↦ H(offset ± x).
 *
 * @param response at output frequencies.
 * @param axis where x leaves.
 * Source: substitution.
 * @example Math.exp(alongCopy(rectangleResponse(1), { offsetHz: 1, direction: -1 }).logGain(0.5)) // 0.636619772
 */
export function alongCopy(response: Response, axis: CopyAxis): Response {
  if (axis.offsetHz === 0 && axis.direction === 1) return response;
  return {
    logGain: (x) => response.logGain(placeOf(axis, x)),
    bounds: (low, high) => {
      const at = intervalOf(axis, { low, high });
      return response.bounds(at.low, at.high);
    },
    slope: (low, high) => {
      const at = intervalOf(axis, { low, high });
      const slope = response.slope(at.low, at.high);
      return slope === null ? null : turned(slope, axis.direction);
    },
  };
}

/**
 * The largest H(f/c)/H(r/c) over every corner factor c, f along one copy and r along another: a copy against the same tone's own
 * output behind the very same part, whatever its tolerance makes of it.
 *
 * @param response the part at its nominal corner.
 * @param factors range of c, 0 < low ≤ high.
 * @param copy where f is for each x.
 * @param wanted where r is for each x.
 * Source: interval branch and bound, common practice; slopes by the envelope theorem.
 * @example Math.exp(tiedRatio(filterResponse(realPole(1000)), { low: 0.5, high: 2 }, { offsetHz: 3000, direction: -1 }, { offsetHz: 0, direction: 1 }).logGain(1000)) // 0.790569415
 */
export function tiedRatio(response: Response, factors: Enclosure, copy: CopyAxis, wanted: CopyAxis): StretchedResponse {
  const ratio = new FactorRatio(response, factors);
  return {
    logGain: (x) => ratio.at(placeOf(copy, x), placeOf(wanted, x)).logGain,
    factorAt: (x) => ratio.at(placeOf(copy, x), placeOf(wanted, x)).factor,
    bounds: (low, high) => {
      const boxes = [intervalOf(copy, { low, high }), intervalOf(wanted, { low, high })] as const;
      return { low: ratio.lower(...boxes), high: ratio.upper(...boxes) };
    },
    slope: (low, high) => {
      const slopes = ratio.slopes(intervalOf(copy, { low, high }), intervalOf(wanted, { low, high }));
      if (slopes === null) return null;
      const one = turned(slopes.frequency, copy.direction);
      const other = turned(slopes.reference, wanted.direction);
      return { low: one.low + other.low, high: one.high + other.high };
    },
  };
}

function placeOf(axis: CopyAxis, x: number): number {
  return Math.max(0, axis.offsetHz + axis.direction * x);
}

function intervalOf(axis: CopyAxis, { low, high }: Enclosure): Enclosure {
  return axis.direction === 1
    ? { low: placeOf(axis, low), high: placeOf(axis, high) }
    : { low: placeOf(axis, high), high: placeOf(axis, low) };
}

function turned(slope: Enclosure, direction: 1 | -1): Enclosure {
  return direction === 1 ? slope : { low: -slope.high, high: -slope.low };
}
