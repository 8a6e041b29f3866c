/** The noise in the wanted band as it comes out, part by part, and the signal-to-noise ratio of the test tone over it. */
import type { Channel, Limit } from '../spec/channel';
import type { ChannelPath } from './channel-path';
import { powerDb, sumOfParts } from './decibels';
import type { NoiseFigures, WorstAt } from './figures';
import { captureNoise } from './noise-capture';
import { generateNoise } from './noise-generate';
import type { DirectionNoise } from './noise-parts';
import { relayNoise } from './relay/noise';
import { testToneLevelDb } from './test-tone';

/** Noise and what follows from it. */
export interface Noise {
  readonly figures: NoiseFigures;
  readonly toneDb: number;
  /** Without unwanted sources, nominal. */
  readonly snrDb: number | null;
  /** As the snr limit counts it; null where there is nothing to count. */
  readonly judged: { readonly valueDb: number; readonly nominalDb: number; readonly worstAt: WorstAt | null } | null;
  readonly evaluations: number;
}

/** The noise of a channel; `limit` is its snr limit, which says whether unwanted sources count. */
export function noiseOf(channel: Channel, path: ChannelPath, limit: Limit | null): Noise {
  const noise = noiseIn(channel, path, limit?.withUnwanted === true);
  const toneDb = testToneLevelDb(channel, path);
  const total = sumOfParts([noise.nominal.quantisation, noise.nominal.jitter]);
  return {
    figures: {
      quantisation: noise.nominal.quantisation,
      jitter: noise.nominal.jitter,
      jitterUnwanted: noise.jitterUnwanted,
      sources: null,
      stages: null,
      thermal: null,
      converter: null,
      total,
      volts: total === null || channel.fullScaleVpp === null ? null : rmsVolts(total, channel.fullScaleVpp),
    },
    toneDb,
    // A tone that a null silences has no ratio, even where the noise goes with it.
    snrDb: total === null ? null : toneDb === -Infinity ? -Infinity : toneDb - total,
    judged: judged(noise),
    evaluations: noise.evaluations,
  };
}

function noiseIn(channel: Channel, path: ChannelPath, withUnwanted: boolean): DirectionNoise {
  switch (channel.direction) {
    case 'capture':
      return captureNoise(channel, path, withUnwanted);
    case 'generate':
      return generateNoise(channel, path);
    case 'relay':
      return relayNoise(channel, withUnwanted);
  }
}

function judged({ nominalShares, worstShares, worstAt }: DirectionNoise): Noise['judged'] {
  if (worstShares.length === 0 && nominalShares.length === 0) return null;
  const nominalDb = snrOf(nominalShares);
  // Parts are each taken at their own worst, which is a bound that nominal cannot pass but by rounding.
  return { valueDb: Math.min(snrOf(worstShares), nominalDb), nominalDb, worstAt };
}

function snrOf(shares: readonly number[]): number {
  return -powerDb(shares.reduce((total, share) => total + share, 0));
}

/** 0 dBFS is the sine whose peaks reach full scale. */
function rmsVolts(levelDb: number, fullScaleVpp: number): number {
  return (10 ** (levelDb / 20) * fullScaleVpp) / (2 * Math.SQRT2);
}
