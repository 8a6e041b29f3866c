/** The gain of a filter that runs on a grid: known from 0 Hz to half the rate, mirrored there, and repeated with the rate. */
import type { Enclosure, Response } from '../response';

/** A gain over half a period, frequencies as shares of the rate, 0 … 0.5. */
export interface HalfPeriod {
  /** ln of the gain; `roundedFrom` ≥ share is the number whose rounding the share carries. */
  logGain(share: number, roundedFrom: number): number;
  bounds(low: number, high: number): Enclosure;
  /** An enclosure of d ln|H|/d share, or null where none is known. */
  slope(low: number, high: number): Enclosure | null;
}

/** A part of an interval that lies within one half period; direction −1 where the share falls as the frequency rises. */
interface Piece {
  readonly low: number;
  readonly high: number;
  readonly direction: 1 | -1;
}

/** Up and down again. */
const wholePeriod: readonly Piece[] = [
  { low: 0, high: 0.5, direction: 1 },
  { low: 0, high: 0.5, direction: -1 },
];

/** Shares that were reduced by whole periods are wrong by this much of the unreduced one, so their intervals are widened by it. */
const reductionSlack = 2 ** -51;

/**
 * A response that is even and repeats with the rate.
 *
 * @param half the gain over shares 0 … 0.5 of the rate.
 * @param rateHz above 0.
 * @returns at Infinity, where there is no limit, the largest gain, which is approached there again and again.
 * Source: the spectrum of anything on a grid repeats with its rate.
 * @example repeating({ logGain: (x) => -x, bounds: (a, b) => ({ low: -b, high: -a }), slope: () => ({ low: -1, high: -1 }) }, 100).logGain(180) // -0.2
 */
export function repeating(half: HalfPeriod, rateHz: number): Response {
  if (!(rateHz > 0 && rateHz < Infinity)) throw new RangeError(`A rate must be above 0 Hz, not ${rateHz}.`);
  return {
    logGain: (frequencyHz) => {
      if (frequencyHz === Infinity) return half.bounds(0, 0.5).high;
      const share = frequencyHz / rateHz;
      return half.logGain(Math.abs(share - Math.round(share)), share);
    },
    bounds: (lowHz, highHz) => hull(pieces(lowHz / rateHz, highHz / rateHz).map(({ low, high }) => half.bounds(low, high))),
    slope: (lowHz, highHz) => {
      if (highHz === Infinity) return null;
      const parts = pieces(lowHz / rateHz, highHz / rateHz);
      const slopes = parts.flatMap((piece) => slopeOf(half, piece, rateHz) ?? []);
      return slopes.length < parts.length ? null : hull(slopes);
    },
  };
}

/** The slope over one piece in 1/Hz; null where it is not known or infinities have cancelled. */
function slopeOf(half: HalfPeriod, { low, high, direction }: Piece, rateHz: number): Enclosure | null {
  const slope = half.slope(low, high);
  if (slope === null || Number.isNaN(slope.low) || Number.isNaN(slope.high)) return null;
  const one = { low: slope.low / rateHz, high: slope.high / rateHz };
  return direction === 1 ? one : { low: -one.high, high: -one.low };
}

/** An interval of shares cut at the multiples of one half and folded; one of a whole period or more is the whole half period. */
function pieces(low: number, high: number): readonly Piece[] {
  if (!(high - low < 1)) return wholePeriod;
  const found: Piece[] = [];
  for (let half = Math.floor(2 * low); half <= 2 * high; half += 1) {
    const from = Math.max(low, half / 2);
    const to = Math.min(high, (half + 1) / 2);
    if (from < to || (from === to && found.length === 0)) found.push(folded(from, to, half));
  }
  return found;
}

function folded(from: number, to: number, half: number): Piece {
  const slack = half === 0 ? 0 : reductionSlack * to;
  const whole = Math.floor((half + 1) / 2);
  const [low, high] = half % 2 === 0 ? [from - whole, to - whole] : [whole - to, whole - from];
  return { low: clamped(low - slack), high: clamped(high + slack), direction: half % 2 === 0 ? 1 : -1 };
}

function clamped(share: number): number {
  return Math.min(Math.max(share, 0), 0.5);
}

function hull(all: readonly Enclosure[]): Enclosure {
  return {
    low: all.reduce((least, { low }) => Math.min(least, low), Infinity),
    high: all.reduce((most, { high }) => Math.max(most, high), -Infinity),
  };
}
