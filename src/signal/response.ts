/** What every part of a signal path offers to the search for proved maxima: its logarithmic gain at a point, and bounds of it over an interval. */

/** An interval of real numbers, low ≤ high; either may be infinite. */
export interface Enclosure {
  readonly low: number;
  readonly high: number;
}

/** A real, non-negative gain over frequency, handled as its natural logarithm. Frequencies are in Hz, ≥ 0, Infinity allowed. */
export interface Response {
  /** ln |H(f)|; −Infinity at an exact null. */
  logGain(frequencyHz: number): number;
  /** An enclosure of ln |H| over [lowHz, highHz]; highHz may be Infinity. */
  bounds(lowHz: number, highHz: number): Enclosure;
  /** An enclosure of d ln|H| / df in 1/Hz over a finite interval, or null where none is known (a null lies inside). */
  slope(lowHz: number, highHz: number): Enclosure | null;
  /** Every frequency above 0 Hz where the gain turns between rising and falling, ascending, if all are known: it is monotone between them. */
  readonly turnsHz?: readonly number[];
}
