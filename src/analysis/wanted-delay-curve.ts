/** The delay of what the wanted path passes where it is sampled, where that depends on frequency: of an exponential pulse, and of track and hold. */
import type { Enclosure } from '../signal/response';
import { fromRange } from '../signal/sum-of-gains';
import type { DelayCurve } from './delay-spread';
import { pulseMoves } from './pulse';
import { wantedDelayEnclosure, wantedDelaySeconds, type Sampled } from './wanted-pulse';

/** That delay over some bands, as searches take it; null where it is the same at every frequency. */
export function wantedDelayCurve(channel: Sampled, rateHz: number, bands: readonly Enclosure[]): DelayCurve | null {
  const varying = channel.gate === null ? channel.pulse.shape === 'exponential' : channel.gate.kind === 'track';
  if (!varying) return null;
  const least = Math.min(...bands.map((band) => wantedDelayEnclosure(channel, rateHz, band).low));
  // Where a band is too wide for a bound two periods are more than any wanted path can be ahead by.
  const offsetSeconds = Number.isFinite(least) ? Math.max(0, -least) : 2 / rateHz;
  return {
    response: fromRange(
      (frequencyHz) => wantedDelaySeconds(channel, rateHz, frequencyHz) + offsetSeconds,
      (lowHz, highHz) => {
        const { low, high } = wantedDelayEnclosure(channel, rateHz, { low: lowHz, high: highHz });
        return { low: low + offsetSeconds, high: high + offsetSeconds };
      },
    ),
    offsetSeconds,
  };
}

/** Whether that delay moves with the rate. */
export function wantedDelayMoves({ pulse, gate }: Sampled): boolean {
  if (gate !== null) return gate.kind === 'track';
  return pulseMoves(pulse) !== 'stays';
}
