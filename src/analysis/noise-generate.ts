/** Noise of a generate channel in the wanted band as it leaves: quantisation shaped by hold and filter, and jitter of the hold's edges, which only the filter shapes. */
import { frequencyWeight } from '../signal/frequency-weight';
import { integratePower, quantisationSnrDb } from '../signal/noise';
import type { Response } from '../signal/response';
import { product } from '../signal/response-algebra';
import type { Channel } from '../spec/channel';
import { channelPath } from './channel-path';
import type { ChannelPath } from './channel-path';
import { atCorners, deviationsAt } from './corners';
import type { Corners } from './corners';
import { powerDb, powerOf } from './decibels';
import { edgePower } from './hold-edges';
import type { DirectionNoise } from './noise-parts';
import { jitterSeconds, noiseBands } from './test-tone';
import { deviation, joinWorst, partsVary, rateLabel, rateRange, varies } from './tolerances';
import { worstCorners } from './worst-corners';
import { worstPath } from './worst-path';

/** The noise of a generate channel. */
export function generateNoise(channel: Channel, path: ChannelPath): DirectionNoise {
  const nominal = powersOf(path);
  const tone = powerOf(channel.testTone.levelDb);
  const nominalShares = sharesOf(path, nominal);
  const worst = partsVary(channel) ? worstShares(channel, path) : { shares: nominalShares, worstAt: null };
  return {
    nominal: {
      quantisation: nominal.quantisation === null ? null : powerDb(nominal.quantisation),
      jitter: nominal.jitter === null ? null : powerDb(nominal.jitter * tone),
    },
    jitterUnwanted: null,
    nominalShares,
    worstShares: worst.shares,
    worstAt: worst.worstAt,
    evaluations: 0,
  };
}

/** Powers in the wanted band: of quantisation over a full-scale sine's, of jitter over the test tone's before the hold. */
interface Powers {
  readonly quantisation: number | null;
  readonly jitter: number | null;
}

function powersOf(path: ChannelPath): Powers {
  const { channel, rateHz } = path;
  const sigma = jitterSeconds(channel);
  const over = (response: Response): number =>
    noiseBands(channel).reduce((sum, band) => sum + integratePower(response, band.low, band.high).value, 0) / (rateHz / 2);
  return {
    quantisation: channel.bits === null ? null : over(path.total) / powerOf(quantisationSnrDb(channel.bits)),
    jitter: sigma === 0 ? null : jitterPower(path, sigma, over),
  };
}

/** The edges' noise passes the filter only, while the tone also has the hold's gain; a hold without edges moves as a whole. */
function jitterPower(
  { channel, rateHz, analogue, total }: ChannelPath,
  sigma: number,
  over: (response: Response) => number,
): number {
  const edges = edgePower(channel.pulse, rateHz, channel.testTone.frequencyHz);
  if (edges === null) return over(product([frequencyWeight(), total])) * (2 * Math.PI * sigma) ** 2;
  return over(analogue) * edges * (rateHz * sigma) ** 2;
}

/** Each power over the test tone's own as it leaves by the same path. */
function sharesOf(path: ChannelPath, powers: Powers): readonly number[] {
  const { frequencyHz, levelDb } = path.channel.testTone;
  const gain = Math.exp(2 * path.total.logGain(frequencyHz));
  const quantisation = powers.quantisation === null ? [] : [powers.quantisation / (gain * powerOf(levelDb))];
  return powers.jitter === null ? quantisation : [...quantisation, powers.jitter / gain];
}

/** Noise over the test tone at the worst corners, and at the worst end of the rate. */
function worstShares(
  channel: Channel,
  path: ChannelPath,
): Pick<DirectionNoise, 'worstAt'> & { readonly shares: readonly number[] } {
  if (channel.bits === null && jitterSeconds(channel) === 0) return { shares: [], worstAt: null };
  const { rate } = channel;
  const { low, high } = rateRange(rate);
  const question = { sense: 'smallest', referenceHz: null, axis: 'hertz' } as const;
  const weakest = worstPath(path, question).cornersAt(channel.testTone.frequencyHz);
  const found = [...new Set([rate.hz, low, high])].map((rateHz) => {
    const moved = channelPath(channel, rateHz);
    const sharesWith = (corners: Corners): readonly number[] => {
      const there = atCorners(moved, corners);
      return sharesOf(there, powersOf(there));
    };
    const corners = worstCorners(path, [weakest], (tried) => sum(sharesWith(tried)));
    return { rateHz, corners, shares: sharesWith(corners) };
  });
  const worst = found.reduce((best, one) => (sum(one.shares) > sum(best.shares) ? one : best));
  const clock = varies(rate.tolerance) ? { [rateLabel(rate)]: deviation(worst.rateHz / rate.hz, rate.tolerance) } : null;
  return { shares: worst.shares, worstAt: joinWorst(deviationsAt(path, worst.corners), clock) };
}

function sum(powers: readonly number[]): number {
  return powers.reduce((total, power) => total + power, 0);
}
