/** One channel's figures: everything that is computed of it, worst case and nominal. */
import type { Channel } from '../spec/channel';
import { aliasesOf } from './alias';
import { channelPath } from './channel-path';
import { delayOf } from './delay';
import { effectiveBits } from './effective-bits';
import type { Figures, WantedFigure } from './figures';
import { droopOf, flatnessOf } from './flatness';
import { headroomOf } from './headroom';
import { imagesOf } from './image';
import { protectedAt } from './landing-point';
import { judgeLimits, limitOf } from './limits';
import { noiseOf } from './noise';
import { overlapsOf } from './source-range';
import { windowAround } from './rate-windows';
import { samplingFaults, wantedFigures } from './wanted';

/** Analyses a channel; pure, so the same channel always gives the same figures. */
export function analyse(channel: Channel): Figures {
  const path = channelPath(channel);
  const wanted = wantedFigures(channel);
  const aliases = aliasesOf(channel, limitOf(channel, 'alias'));
  const images = imagesOf(channel, path, limitOf(channel, 'image'));
  const flatness = flatnessOf(channel, path);
  const delay = delayOf(channel, path);
  const noise = noiseOf(channel, path, limitOf(channel, 'snr'));
  const headroom = headroomOf(channel, path);
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
    limits: judgeLimits(channel, { aliases, images, flatness, noise, headroom }),
    droop: droopOf(channel, path),
    delay: delay.atReference,
    delaySpread: delay.spread,
    aliases: aliases.figures,
    alias: aliases.strongest,
    aliasSum: aliases.sumDb,
    images: images.figures,
    image: images.strongest,
    noise: noise.figures,
    testTone: { frequency: channel.testTone.frequencyHz, level: channel.testTone.levelDb, atSampler: noise.toneDb },
    snr: noise.snrDb,
    // Distortion and interleave products do not exist yet, so nothing sets the two apart.
    sinad: noise.snrDb,
    enob: effectiveBits(noise.snrDb),
    enobFullScale: noise.snrDb === null ? null : effectiveBits(noise.snrDb - noise.toneDb),
    headroom: headroom?.valueDb ?? null,
    masks: [],
    crosstalk: null,
    copyWeights: null,
    faults: samplingFaults(channel),
    overlaps: channel.direction === 'capture' ? overlapsOf(channel) : [],
    evaluations: totalOf([aliases, images, flatness, delay, noise, headroom]),
  };
}

/** A band of the zone that all wanted bands share; null where they do not. */
function commonZone(wanted: readonly WantedFigure[]): WantedFigure | null {
  const [first] = wanted;
  return first !== undefined && wanted.every((band) => band.zone === first.zone) ? first : null;
}

function totalOf(parts: readonly ({ readonly evaluations: number } | null)[]): number {
  return parts.reduce((sum, part) => sum + (part?.evaluations ?? 0), 0);
}
