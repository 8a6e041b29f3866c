/** Noise of a capture channel in the wanted band: quantisation and jitter spread evenly over half the rate, and what unwanted sources add. */
import { frequencyWeight } from '../signal/frequency-weight';
import { jitterNoiseDb, quantisationSnrDb } from '../signal/noise';
import type { Enclosure, Response } from '../signal/response';
import { product } from '../signal/response-algebra';
import { largestOverBands } from '../signal/search';
import type { Channel, Source } from '../spec/channel';
import { landingAgainstTone } from './alias';
import type { ChannelPath } from './channel-path';
import { powerDb, powerOf, sumOfLevels, toDb } from './decibels';
import { widthOf } from './intervals';
import type { DirectionNoise, NoiseParts } from './noise-parts';
import { pulseSeconds } from './pulse';
import { sourceRange } from './source-range';
import { stageCornerHz } from './stage-filter';
import { jitterSeconds, levelReference, noiseBands, testToneLevelDb } from './test-tone';
import { partsVary, rateRange } from './tolerances';
import { bandAxis, nominalPath, onAxis, worstPath } from './worst-path';

/** The noise of a capture channel. */
export function captureNoise(channel: Channel, path: ChannelPath, withUnwanted: boolean): DirectionNoise {
  const toneDb = testToneLevelDb(channel, path);
  const nominal = partsAt(channel, channel.rate.hz, toneDb);
  const plain = nominalPath(path, levelReference(channel)).response;
  const disturbed = unwantedJitter(channel, path, plain, 'nominal');
  const shareDb = bandShareDb(channel, channel.rate.hz);
  const jitterUnwanted = disturbed.levelDb === null ? null : disturbed.levelDb + shareDb;
  const worst = worstTone(channel, path, toneDb);
  const slowest = rateRange(channel.rate).low;
  const extras = withUnwanted ? unwantedShares(channel, path) : none;
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
 * Jitter on the unwanted sources before it is spread, dBFS. Nominally only tones count, at their own frequency; at worst a tone moves
 * within its tolerance, and the tone that a band stands for is where f·|H(f)| is largest. `anything` stands nowhere in particular.
 */
function unwantedJitter(
  channel: Channel,
  path: ChannelPath,
  response: Response,
  at: 'nominal' | 'worst',
): { readonly levelDb: number | null; readonly evaluations: number } {
  const sigma = jitterSeconds(channel);
  if (sigma === 0) return { levelDb: null, evaluations: 0 };
  const rising = product([frequencyWeight(), response]);
  const found = channel.unwanted.flatMap((source) =>
    jitteredRanges(source, path, at).map((range) => {
      if (range.high === Infinity) return { levelDb: Infinity, evaluations: 0 };
      const extreme = largestOverBands(rising, [range]);
      // jitterNoiseDb(1 Hz) is the factor 2πσ that multiplies each frequency.
      const levelDb = source.levelDb + toDb(extreme?.logGain ?? -Infinity) + jitterNoiseDb(1, sigma);
      return { levelDb, evaluations: extreme?.evaluations ?? 0 };
    }),
  );
  return {
    levelDb: sumOfLevels(found.map((one) => one.levelDb)),
    evaluations: found.reduce((sum, one) => sum + one.evaluations, 0),
  };
}

function jitteredRanges(source: Source, path: ChannelPath, at: 'nominal' | 'worst'): readonly Enclosure[] {
  if (source.kind === 'anything') return [];
  if (at === 'worst') return [onAxis(path.channel, bandAxis(path.channel), jitteredRange(source, path))];
  return source.kind === 'tone' ? [{ low: source.frequencyHz, high: source.frequencyHz }] : [];
}

/**
 * The part of a source's range in which f·|H(f)| is largest. Above every corner |H| falls; there f·|sinc(f·w)| comes back to the
 * same height in every lobe, so one whole lobe is enough, and without an aperture f·|H| has come within 1e−12 of its limit.
 */
function jitteredRange(source: Source, path: ChannelPath): Enclosure {
  const range = sourceRange(source);
  const width = pulseSeconds(path.channel.pulse, path.rateHz);
  const top = Math.max(range.low, ...path.stages.map((stage) => stageCornerHz(stage.stage.form)));
  if (width > 0) return { low: range.low, high: Math.min(range.high, top + 2 / width) };
  return path.stages.length === 0 ? range : { low: range.low, high: Math.min(range.high, 1e6 * top) };
}

/** Landings and jitter of the unwanted sources over the test tone's own power, each at its own worst. */
function unwantedShares(
  channel: Channel,
  path: ChannelPath,
): { readonly nominal: readonly number[]; readonly worst: readonly number[]; readonly evaluations: number } {
  const { frequencyHz, levelDb } = channel.testTone;
  let evaluations = 0;
  const sharesOf = (at: 'nominal' | 'worst'): readonly number[] => {
    const landings = channel.unwanted.flatMap((source) => {
      const extreme = landingAgainstTone(channel, source, frequencyHz, at);
      evaluations += extreme?.evaluations ?? 0;
      return extreme === null ? [] : [powerOf(source.levelDb + toDb(extreme.logGain) - levelDb)];
    });
    const relative =
      at === 'nominal'
        ? nominalPath(path, frequencyHz)
        : worstPath(path, { sense: 'largest', referenceHz: frequencyHz, axis: bandAxis(channel) });
    const jitter = unwantedJitter(channel, path, relative.response, at);
    evaluations += jitter.evaluations;
    const rateHz = at === 'nominal' ? channel.rate.hz : rateRange(channel.rate).low;
    return jitter.levelDb === null ? landings : [...landings, powerOf(jitter.levelDb - levelDb + bandShareDb(channel, rateHz))];
  };
  return { nominal: sharesOf('nominal'), worst: sharesOf('worst'), evaluations };
}
