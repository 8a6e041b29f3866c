/** Positive functions of frequency that are added, and ones that are known by value and range only, in the form that searches take. */
import type { Enclosure, Response } from './response';

/**
 * The sum of several gains at each frequency: ln Σ e^{g}.
 *
 * @param responses at least one.
 * @returns its slope is the mean of theirs, weighed by their shares; null where any has none.
 * Source: elementary; interval arithmetic.
 * @example Math.exp(sumOfGains([constantResponse(0), constantResponse(Math.log(2))]).logGain(100)) // 3
 */
export function sumOfGains(responses: readonly Response[]): Response {
  const [only] = responses;
  if (only !== undefined && responses.length === 1) return only;
  return {
    logGain: (frequencyHz) => logSum(responses.map((one) => one.logGain(frequencyHz))),
    bounds: (lowHz, highHz) => {
      const all = responses.map((one) => one.bounds(lowHz, highHz));
      return { low: logSum(all.map(({ low }) => low)), high: logSum(all.map(({ high }) => high)) };
    },
    slope: (lowHz, highHz) => {
      const all = responses.flatMap((one) => one.slope(lowHz, highHz) ?? []);
      // A mean lies between the least and the largest, whatever the weights are.
      return all.length < responses.length ? null : hull(all);
    },
  };
}

/**
 * A positive function that has values and ranges but no slope.
 *
 * @param at its value at a frequency; what is not above 0 counts as nothing.
 * @param range an enclosure of it over an interval that closes as the interval does.
 * Source: elementary.
 * @example fromRange((f) => 1 + f, (low, high) => ({ low: 1 + low, high: 1 + high })).bounds(0, 1).low // 0
 */
export function fromRange(at: (frequencyHz: number) => number, range: (lowHz: number, highHz: number) => Enclosure): Response {
  const log = (value: number): number => (value > 0 ? Math.log(value) : -Infinity);
  return {
    logGain: (frequencyHz) => log(at(frequencyHz)),
    bounds: (lowHz, highHz) => {
      const { low, high } = range(lowHz, highHz);
      return { low: log(low), high: log(high) };
    },
    slope: () => null,
  };
}

function logSum(logs: readonly number[]): number {
  const most = logs.reduce((a, b) => Math.max(a, b), -Infinity);
  if (!Number.isFinite(most)) return most;
  return most + Math.log(logs.reduce((sum, one) => sum + Math.exp(one - most), 0));
}

function hull(ranges: readonly Enclosure[]): Enclosure {
  return {
    low: ranges.reduce((least, { low }) => Math.min(least, low), Infinity),
    high: ranges.reduce((most, { high }) => Math.max(most, high), -Infinity),
  };
}
