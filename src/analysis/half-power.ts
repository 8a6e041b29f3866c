/** Where a response first falls to half the power of its largest value, found by bounds so that no dip before it is missed. */
import type { Response } from '../signal/response';
import { largestOverBands } from '../signal/search';

/** ln of the amplitude ratio at half power; a hair below it, so that a ripple which just touches half power does not count. */
export const halfPowerLog = -0.5 * Math.LN2 - 4e-9;

/** How often the search for a bracket may double before the response counts as never falling. */
const doublings = 120;

/** The lowest frequency in Hz from which on the first fall below half power begins; null where the response never falls so far. */
export function halfPowerHz(response: Response): number | null {
  const most = largestOverBands(response, [{ low: 0, high: Infinity }]);
  if (most === null || !Number.isFinite(most.logGain)) return null;
  const threshold = most.logGain + halfPowerLog;
  const startHz = most.frequencyHz;
  if (startHz === Infinity) return null;
  let high = Math.max(startHz, 1e-9);
  for (let count = 0; count < doublings && response.bounds(startHz, high).low > threshold; count++) high *= 2;
  return firstBelow(response, threshold, startHz, high);
}

/** The first point in [low, high] where the response is at or below the threshold, by halving and bounding. */
function firstBelow(response: Response, threshold: number, lowHz: number, highHz: number): number | null {
  if (response.bounds(lowHz, highHz).low > threshold) return null;
  if (response.logGain(lowHz) <= threshold) return lowHz;
  const middle = lowHz + (highHz - lowHz) / 2;
  if (highHz - lowHz <= 1e-12 * highHz || middle <= lowHz || middle >= highHz)
    return response.logGain(highHz) <= threshold ? highHz : null;
  return firstBelow(response, threshold, lowHz, middle) ?? firstBelow(response, threshold, middle, highHz);
}
