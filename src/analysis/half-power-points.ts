/** Every frequency at which a response crosses half the power of its largest value: one of a low-pass, two of a band-pass or a band-stop. */
import type { Response } from '../signal/response';
import { largestOverBands } from '../signal/search';

/** ln of the amplitude ratio at half power; a hair below it, so that a ripple which just touches half power does not count. */
const halfPowerLog = -0.5 * Math.LN2 - 4e-9;

/** How often the end of the search may double before all beyond counts as one. */
const doublings = 200;

/** Where the search for its end begins, in Hz. */
const smallestHz = 1e-6;

/** A stretch narrower than this, relatively, is one point. */
const narrowest = 1e-12;

/** The crossings in Hz, ascending; none where the response never falls so far. */
export function halfPowerPoints(response: Response): readonly number[] {
  const most = largestOverBands(response, [{ low: 0, high: Infinity }]);
  if (most === null || !Number.isFinite(most.logGain)) return [];
  const threshold = most.logGain + halfPowerLog;
  let high = smallestHz;
  for (let count = 0; count < doublings && sideOf(response, threshold, high, Infinity) === null; count += 1) high *= 2;
  return crossings(response, threshold, 0, high);
}

/** On which side of the threshold all of a stretch lies; null where that is not known. */
function sideOf(response: Response, threshold: number, lowHz: number, highHz: number): 'above' | 'below' | null {
  const { low, high } = response.bounds(lowHz, highHz);
  if (low > threshold) return 'above';
  return high < threshold ? 'below' : null;
}

function crossings(response: Response, threshold: number, lowHz: number, highHz: number): readonly number[] {
  if (sideOf(response, threshold, lowHz, highHz) !== null) return [];
  const differ = response.logGain(lowHz) > threshold !== response.logGain(highHz) > threshold;
  const middle = middleOf(lowHz, highHz);
  const isPoint = highHz - lowHz <= narrowest * highHz || middle <= lowHz || middle >= highHz;
  if (isPoint) return differ ? [highHz] : [];
  const slope = response.slope(lowHz, highHz);
  if (slope !== null && (slope.low >= 0 || slope.high <= 0)) return differ ? [crossing(response, threshold, lowHz, highHz)] : [];
  return [...crossings(response, threshold, lowHz, middle), ...crossings(response, threshold, middle, highHz)];
}

/** Between ends that lie far apart the geometric middle, which finds the scale in few steps. */
function middleOf(lowHz: number, highHz: number): number {
  if (lowHz > 0 && highHz / lowHz > 4) return Math.sqrt(lowHz * highHz);
  return lowHz + (highHz - lowHz) / 2;
}

/** The one crossing of a stretch over which the response only rises or only falls. */
function crossing(response: Response, threshold: number, lowHz: number, highHz: number): number {
  const rises = response.logGain(highHz) > threshold;
  let [low, high] = [lowHz, highHz];
  while (high - low > narrowest * high) {
    const middle = low + (high - low) / 2;
    if (middle <= low || middle >= high) break;
    if (response.logGain(middle) > threshold === rises) high = middle;
    else low = middle;
  }
  return high;
}
