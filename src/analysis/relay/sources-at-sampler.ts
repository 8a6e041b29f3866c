/** The unwanted tones as they reach a sampler, each where jitter makes most of it. */
import { frequencyWeight } from '../../signal/frequency-weight';
import { product } from '../../signal/response-algebra';
import type { Channel } from '../../spec/channel';
import { arrivalsOf, nominalArrivals } from '../arrivals';
import { onAxis } from '../axis';
import { captureViews, envelopeOn } from '../capture-view';
import { toDb } from '../decibels';
import { jitteredRange } from '../jittered-range';
import { largestIn } from '../largest-in';

/** A tone at the sampler. */
export interface SampledTone {
  readonly levelDb: number;
  readonly frequencyHz: number;
}

/**
 * Every tone of every source, with the places at which it may do most: where it arrives strongest, and where it changes fastest. Nominally only
 * tones count, where they stand; at worst also what may stand anywhere in a range. `anything` stands nowhere in particular.
 * @param channel what leads to the sampler, as a capture channel
 * @param referenceHz the frequency that gains are measured from; null where the gain itself counts
 */
export function sourcesAtSampler(
  channel: Channel,
  at: 'nominal' | 'worst',
  referenceHz: number | null,
): readonly (readonly SampledTone[])[] {
  const viewAt = captureViews(channel, referenceHz);
  return channel.unwanted.flatMap((source) => {
    if (source.kind === 'anything') return [];
    const { path, nominal, worstOfBands } = viewAt(source.enters);
    const view = at === 'nominal' ? nominal : worstOfBands;
    const arrivals = at === 'worst' ? arrivalsOf(source) : nominalArrivals(source).filter(({ stillHz }) => stillHz !== null);
    return arrivals.map((arrival) => {
      const envelope = envelopeOn(view, channel, arrival);
      const arrives = product([view.worst.response, ...(envelope === null ? [] : [envelope])]);
      const { low, high } = arrival.range;
      const range = low === high ? arrival.range : jitteredRange(arrival.range, path);
      if (range.high === Infinity) return [{ levelDb: Infinity, frequencyHz: range.low }];
      const places = [arrives, product([frequencyWeight(), arrives])].map(
        (response) => largestIn(response, onAxis(channel, view.axis, range)).frequencyHz,
      );
      return places.map((frequencyHz) => ({ levelDb: arrival.levelDb + toDb(arrives.logGain(frequencyHz)), frequencyHz }));
    });
  });
}
