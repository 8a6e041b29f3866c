/** One channel's figures: everything that is computed of it, worst case and nominal. */
import type { Channel } from '../spec/channel';
import { aliasesOf } from './alias';
import { beyondDataOf, withheld } from './beyond-data';
import { channelPath } from './channel-path';
import type { ChannelPath } from './channel-path';
import { delayOf } from './delay';
import { effectiveBits } from './effective-bits';
import type { Figures, WantedFigure } from './figures';
import { droopOf, flatnessOf } from './flatness';
import { headroomOf } from './headroom';
import { imagesOf } from './image';
import { protectedAt } from './landing-point';
import { levelRangeOf } from './level';
import { judgeLimits, limitOf } from './limits';
import type { Judged } from './limits';
import { masksOf } from './masks';
import { noiseOf } from './noise';
import { outputMasksOf } from './output-mask';
import { relayAliases } from './relay/aliases';
import { copyWeights } from './relay/copy-weights';
import { crosstalkOf } from './relay/crosstalk';
import { relayImages } from './relay/images';
import { relayPath } from './relay/relay-path';
import { overlapsOf } from './source-range';
import { windowAround } from './rate-windows';
import { testToneLevelDb } from './test-tone';
import { samplingFaults, wantedFigures } from './wanted';

/** Analyses a channel; pure, so the same channel always gives the same figures. What a table does not hold is left out. */
export function analyse(channel: Channel): Figures {
  return withheld(figuresOf(channel), beyondDataOf(channel));
}

function figuresOf(channel: Channel): Figures {
  const path = channelPath(channel);
  const wanted = wantedFigures(channel);
  const { aliases, images, noise, ...others } = searchesOf(channel, path);
  const relayed = channel.direction === 'relay';
  const rate = channel.rate.hz;
  const shared = commonZone(wanted);
  // Written out: spreading objects here took longer than the searches.
  return {
    name: channel.name,
    direction: channel.direction,
    ref: channel.ref,
    rate,
    outputRate: rate,
    halfRate: rate / 2,
    zone: shared?.zone ?? null,
    inverted: shared?.inverted ?? null,
    reference: channel.referenceHz,
    rateWindow: windowAround(channel),
    wanted,
    protected: protectedAt(channel, rate),
    limits: judgeLimits(channel, { aliases, images, noise, ...others }),
    droop: droopOf(channel, path),
    delay: others.delay.atReference,
    get delaySpread() {
      return others.delay.spread;
    },
    aliases: aliases.figures,
    alias: aliases.strongest,
    aliasSum: aliases.sumDb,
    images: images.figures,
    image: images.strongest,
    noise: noise.figures,
    testTone: {
      frequency: channel.testTone.frequencyHz,
      level: channel.testTone.levelDb,
      atSampler: relayed ? sampledToneDb(channel) : noise.toneDb,
    },
    snr: noise.snrDb,
    // Distortion and interleave products do not exist yet, so nothing sets the two apart.
    sinad: relayed ? null : noise.snrDb,
    // A relay has no words, so it has no bits.
    enob: relayed ? null : effectiveBits(noise.snrDb),
    enobFullScale:
      relayed || noise.snrDb === null || noise.toneDb === -Infinity ? null : effectiveBits(noise.snrDb - noise.toneDb),
    headroom: others.headroom?.valueDb ?? null,
    masks: others.masks,
    crosstalk: crosstalkOf(channel)?.valueDb ?? null,
    copyWeights: copyWeights(channel),
    beyondData: [],
    faults: samplingFaults(channel),
    overlaps: channel.direction === 'generate' ? [] : overlapsOf(channel),
    evaluations: others.evaluations,
  };
}

/** Everything that limits are judged on, and what it took. */
function searchesOf(channel: Channel, path: ChannelPath): Judged & { readonly evaluations: number } {
  const relayed = channel.direction === 'relay';
  const aliasLimit = limitOf(channel, 'alias');
  const imageLimit = limitOf(channel, 'image');
  const aliases = relayed ? relayAliases(channel, aliasLimit) : aliasesOf(channel, aliasLimit);
  const images = relayed ? relayImages(channel, imageLimit) : imagesOf(channel, path, imageLimit);
  const sampled = relayed ? relayPath(channel).input : path;
  const flatness = flatnessOf(channel, path);
  const delay = delayOf(channel, path, { delay: limitOf(channel, 'delay'), spread: limitOf(channel, 'delay-spread') });
  const noise = noiseOf(channel, path, limitOf(channel, 'snr'));
  const headroom = headroomOf(sampled.channel, sampled);
  const level = levelRangeOf(channel, path);
  const gains = masksOf(channel, path);
  const outputs = outputMasksOf(channel, path);
  const evaluations = totalOf([aliases, images, flatness, delay, noise, headroom, level, gains, outputs]);
  return { aliases, images, flatness, delay, noise, headroom, level, masks: [...gains.figures, ...outputs.figures], evaluations };
}

/** The test tone as a relay samples it: behind the input filter alone. */
function sampledToneDb(channel: Channel): number {
  const { input } = relayPath(channel);
  return testToneLevelDb(input.channel, input);
}

/** A band of the zone that all wanted bands share; null where they do not. */
function commonZone(wanted: readonly WantedFigure[]): WantedFigure | null {
  const [first] = wanted;
  return first !== undefined && wanted.every((band) => band.zone === first.zone) ? first : null;
}

function totalOf(parts: readonly ({ readonly evaluations: number } | null)[]): number {
  return parts.reduce((sum, part) => sum + (part?.evaluations ?? 0), 0);
}
