/** One copy of a sampled band as an axis: responses seen along the baseband frequency x, at the output frequency that x leaves at. */
import type { PairRatio } from './pair-ratio';
import type { Enclosure, Response } from './response';

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
 * A part seen along two copies at once: x ↦ H(f)/H(r) at its largest, f along one copy and r along the other. So a copy is held against the
 * same tone's own output behind the very same part, whatever its tolerance makes of it.
 *
 * @param ratio the part at two frequencies.
 * @param copy where f is for each x.
 * @param wanted where r is for each x.
 * Source: interval branch and bound, common practice; slopes by the envelope theorem.
 * @example tiedAlong(new FactorRatio(filterResponse(realPole(1000)), { low: 1, high: 1 }), { offsetHz: 0, direction: 1 }, { offsetHz: 0, direction: 1 }).logGain(500) // 0
 */
export function tiedAlong<At extends { readonly logGain: number }>(
  ratio: PairRatio<At>,
  copy: CopyAxis,
  wanted: CopyAxis,
): Response & { at(x: number): At } {
  const at = (x: number): At => ratio.at(placeOf(copy, x), placeOf(wanted, x));
  return {
    at,
    logGain: (x) => at(x).logGain,
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
