/** Noise of a capture channel in the wanted band: quantisation and jitter spread evenly over half the rate, and what unwanted sources add. */
import { frequencyWeight } from '../signal/frequency-weight';
import { jitterNoiseDb, quantisationSnrDb } from '../signal/noise';
import { product } from '../signal/response-algebra';
import type { Channel, Source } from '../spec/channel';
import { landingsAgainstTone } from './alias';
import { arrivalsOf, nominalArrivals } from './arrivals';
import type { Arrival } from './arrivals';
import { onAxis } from './axis';
import { captureViews, envelopeOn } from './capture-view';
import type { View } from './capture-view';
import type { ChannelPath } from './channel-path';
import { powerDb, powerOf, sumOfLevels, toDb } from './decibels';
import { widthOf } from './intervals';
import { jitteredRange } from './jittered-range';
import { largestIn } from './largest-in';
import type { DirectionNoise, NoiseParts } from './noise-parts';
import { shareGapDb } from './share-gap';
import { jitterSeconds, levelReference, noiseBands, testToneLevelDb } from './test-tone';
import { partsVary, rateRange } from './tolerances';
import { worstPath } from './worst-path';

/** The noise of a capture channel. */
export function captureNoise(channel: Channel, path: ChannelPath, withUnwanted: boolean): DirectionNoise {
  const toneDb = testToneLevelDb(channel, path);
  const nominal = partsAt(channel, channel.rate.hz, toneDb);
  const disturbed = unwantedJitter(channel, levelReference(channel), 'nominal');
  const shareDb = bandShareDb(channel, channel.rate.hz);
  const jitterUnwanted = disturbed.levelDb === null ? null : disturbed.levelDb + shareDb;
  const worst = worstTone(channel, path, toneDb);
  const slowest = rateRange(channel.rate).low;
  const extras = withUnwanted ? unwantedShares(channel) : none;
  return {
    nominal,
    jitterUnwanted,
    nominalShares: [...sharesAt(channel, channel.rate.hz, toneDb), ...extras.nominal],
    worstShares: [...sharesAt(channel, slowest, worst.levelDb), ...extras.worst],
    worstAt: worst.worstAt,
    evaluations: disturbed.evaluations + extras.evaluations,
  };
}

const none = { nominal: [], worst: [], evaluations: 0 } as const;

/** The share of half the rate that the test tone's band takes, as dB of power. */
function bandShareDb(channel: Channel, rateHz: number): number {
  return powerDb(Math.min(1, widthOf(noiseBands(channel)) / (rateHz / 2)));
}

function partsAt(channel: Channel, rateHz: number, toneDb: number): NoiseParts {
  const shareDb = bandShareDb(channel, rateHz);
  const sigma = jitterSeconds(channel);
  return {
    quantisation: channel.bits === null ? null : shareDb - quantisationSnrDb(channel.bits),
    jitter: sigma === 0 ? null : toneDb + jitterNoiseDb(channel.testTone.frequencyHz, sigma) + shareDb,
  };
}

/** The test tone where the path lets least of it through. */
function worstTone(
  channel: Channel,
  path: ChannelPath,
  nominalDb: number,
): { readonly levelDb: number; readonly worstAt: DirectionNoise['worstAt'] } {
  if (!partsVary(channel)) return { levelDb: nominalDb, worstAt: null };
  const least = worstPath(path, { sense: 'smallest', referenceHz: levelReference(channel), axis: 'hertz' });
  const { frequencyHz, levelDb } = channel.testTone;
  return { levelDb: levelDb + toDb(least.response.logGain(frequencyHz)), worstAt: least.worstAt(frequencyHz) };
}

/** Quantisation and jitter over the test tone; jitter grows with the tone, so its share is the same at any level. */
function sharesAt(channel: Channel, rateHz: number, toneDb: number): readonly number[] {
  const quantisation = partsAt(channel, rateHz, toneDb).quantisation;
  const jitter = partsAt(channel, rateHz, 0).jitter;
  return [...(quantisation === null ? [] : [powerOf(quantisation - toneDb)]), ...(jitter === null ? [] : [powerOf(jitter)])];
}

/**
 * Jitter on the unwanted sources before it is spread, dBFS, with their levels measured from a frequency or as they are. Nominally only
 * tones count, at their own frequency; at worst a tone moves within its tolerance, and the tone that a band or an envelope stands for is
 * where f·|H(f)| is largest. Every harmonic and every line counts. `anything` stands nowhere in particular.
 */
function unwantedJitter(
  channel: Channel,
  referenceHz: number | null,
  at: 'nominal' | 'worst',
): { readonly levelDb: number | null; readonly evaluations: number } {
  const sigma = jitterSeconds(channel);
  if (sigma === 0) return { levelDb: null, evaluations: 0 };
  const viewAt = captureViews(channel, referenceHz);
  const found = channel.unwanted.flatMap((source) => {
    const { path, nominal, worstOfBands } = viewAt(source.enters);
    const view = at === 'nominal' ? nominal : worstOfBands;
    const arrivals = jittered(source, at);
    let power = 0;
    return arrivals.map((arrival) => {
      const one = jitterOf({ channel, path, view }, arrival, (mostDb) => shareGapDb(power / powerOf(mostDb), arrivals.length));
      power += powerOf(one.levelDb);
      return one;
    });
  });
  return {
    // jitterNoiseDb(1 Hz) is the factor 2πσ that multiplies each frequency.
    levelDb: addedTo(jitterNoiseDb(1, sigma), sumOfLevels(found.map((one) => one.levelDb))),
    evaluations: found.reduce((sum, one) => sum + one.evaluations, 0),
  };
}

const addedTo = (byDb: number, levelDb: number | null): number | null => (levelDb === null ? null : levelDb + byDb);

/** The tones of a source that jitter acts on. */
function jittered(source: Source, at: 'nominal' | 'worst'): readonly Arrival[] {
  if (source.kind === 'anything') return [];
  return at === 'worst' ? arrivalsOf(source) : nominalArrivals(source).filter(({ stillHz }) => stillHz !== null);
}

/** A tone's level at the sampler times its frequency in Hz, where that is largest; `gapFor` says how finely, from the most it can be. */
function jitterOf(
  { channel, path, view }: { readonly channel: Channel; readonly path: ChannelPath; readonly view: View },
  arrival: Arrival,
  gapFor: (mostDb: number) => number,
): { readonly levelDb: number; readonly evaluations: number } {
  const { low, high } = arrival.range;
  const range = low === high ? arrival.range : jitteredRange(arrival.range, path);
  if (range.high === Infinity) return { levelDb: Infinity, evaluations: 0 };
  const envelope = envelopeOn(view, channel, arrival);
  const rising = product([frequencyWeight(), view.worst.response, ...(envelope === null ? [] : [envelope])]);
  const on = onAxis(channel, view.axis, range);
  const gapDb = on.low === on.high ? 0 : gapFor(arrival.levelDb + toDb(rising.bounds(on.low, on.high).high));
  const extreme = largestIn(rising, on, gapDb);
  return { levelDb: arrival.levelDb + toDb(extreme.logGain), evaluations: extreme.evaluations };
}

/** Landings and jitter of the unwanted sources over the test tone's own power, each at its own worst. */
function unwantedShares(channel: Channel): {
  readonly nominal: readonly number[];
  readonly worst: readonly number[];
  readonly evaluations: number;
} {
  const { frequencyHz, levelDb } = channel.testTone;
  let evaluations = 0;
  const sharesOf = (at: 'nominal' | 'worst'): readonly number[] => {
    const landings = channel.unwanted.flatMap((source) => {
      const landings = landingsAgainstTone(channel, source, frequencyHz, at);
      evaluations += landings.evaluations;
      return landings.sumDb === null ? [] : [powerOf(landings.sumDb - levelDb)];
    });
    const jitter = unwantedJitter(channel, frequencyHz, at);
    evaluations += jitter.evaluations;
    const rateHz = at === 'nominal' ? channel.rate.hz : rateRange(channel.rate).low;
    return jitter.levelDb === null ? landings : [...landings, powerOf(jitter.levelDb - levelDb + bandShareDb(channel, rateHz))];
  };
  return { nominal: sharesOf('nominal'), worst: sharesOf('worst'), evaluations };
}
