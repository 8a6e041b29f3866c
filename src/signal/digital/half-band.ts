/** Half-band filters: every second tap but the middle one is nothing, and pass and stop band mirror each other at a quarter of the rate. */
import { equiripple } from './equiripple';

/** A half-band filter, before its gain at 0 Hz is made 1. */
export interface HalfBand {
  /** Symmetric; the middle one is 1/2. */
  readonly taps: readonly number[];
  /** The end of its pass band as a share of the rate, below 0.25; the stop band begins as far above 0.25. */
  readonly passband: number;
  /** The largest departure from 1 and from 0. */
  readonly deviation: number;
}

/** ln of the deviation may miss what was asked for by this. */
const closeness = 1e-10;
const stepLimit = 100;

/**
 * The half-band filter of so many taps whose largest deviation is the smallest, for a given pass band.
 *
 * @param count 3, 7, 11, 15 …: with any other number the outermost taps would be nothing.
 * @param passband a share of the rate above 0 and below 0.25.
 * @throws RangeError for any other number of taps or pass band.
 * Source: P. P. Vaidyanathan, T. Q. Nguyen, A trick for the design of FIR half-band filters (1987).
 * @example halfBandByPassband(7, 0.125).deviation // 0.0111296874
 */
export function halfBandByPassband(count: number, passband: number): HalfBand {
  checkCount(count);
  if (!(passband > 0 && passband < 0.25))
    throw new RangeError(`A half-band filter's pass band ends above 0 and below 0.25 of its rate, not at ${passband}.`);
  // The taps beside the middle, on half the grid, are a filter with an even number of taps that is 1 up to twice the pass band.
  const band = { low: 0, high: 2 * passband, desired: () => 1, weight: () => 1 };
  const { taps: inner, deviation } = equiripple((count + 1) / 2, [band]);
  const centre = (count - 1) / 2;
  const taps = Array.from({ length: count }, (_, index) => {
    if (index === centre) return 0.5;
    return index % 2 === 0 ? (inner[index / 2] ?? 0) / 2 : 0;
  });
  return { taps, passband, deviation: deviation / 2 };
}

/**
 * The half-band filter of so many taps with the widest pass band at which its stop band still has a given attenuation.
 *
 * @param count as above.
 * @param attenuationDb of the stop band against a gain of 1, above 6.03 and up to 240 dB.
 * @throws RangeError for any other number of taps or attenuation.
 * Source: as above; the deviation rises with the pass band.
 * @example halfBandByAttenuation(7, 39.07034063).passband // 0.125
 */
export function halfBandByAttenuation(count: number, attenuationDb: number): HalfBand {
  checkCount(count);
  if (!(attenuationDb > 6.03 && attenuationDb <= 240))
    throw new RangeError(`A half-band filter's attenuation lies above 6.03 dB and up to 240 dB, not at ${attenuationDb} dB.`);
  const wanted = (-attenuationDb / 20) * Math.LN10;
  const excess = (passband: number): number => Math.log(Math.max(halfBandByPassband(count, passband).deviation, 1e-16)) - wanted;
  return halfBandByPassband(count, rootOf(excess, 1e-6, 0.25 - 1e-9));
}

/** Where a rising function passes 0: the false position by the Illinois rule. */
function rootOf(rising: (x: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  let [atLow, atHigh] = [rising(low), rising(high)];
  if (atLow > 0) throw new RangeError('No pass band is narrow enough for this attenuation with so few taps.');
  for (let step = 0; step < stepLimit; step += 1) {
    const x = (low * atHigh - high * atLow) / (atHigh - atLow);
    const value = rising(x);
    if (Math.abs(value) < closeness) return x;
    if (value > 0) [high, atHigh, atLow] = [x, value, atLow / 2];
    else [low, atLow, atHigh] = [x, value, atHigh / 2];
  }
  return low;
}

function checkCount(count: number): void {
  if (!(Number.isInteger(count) && count >= 3 && count % 4 === 3))
    throw new RangeError(`A half-band filter has 3, 7, 11, 15 … taps, not ${count}.`);
}
