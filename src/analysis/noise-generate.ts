/** Noise of a generate channel in the wanted band as it leaves: quantisation shaped by hold and filter, and jitter of the hold's edges, which only the filter shapes. */
import { foldFrequency } from '../signal/folding';
import { integratePower, quantisationSnrDb } from '../signal/noise';
import type { Response } from '../signal/response';
import type { Channel } from '../spec/channel';
import { channelPath, relativeTo } from './channel-path';
import type { ChannelPath } from './channel-path';
import { powerDb, powerOf } from './decibels';
import type { WorstAt } from './figures';
import type { DirectionNoise } from './noise-parts';
import { pulseSeconds } from './pulse';
import { jitterSeconds, noiseBands } from './test-tone';
import { joinWorst, partsVary, rateLabel, rateRange, varies } from './tolerances';
import { worstPath } from './worst-path';

/** The noise of a generate channel. */
export function generateNoise(channel: Channel): DirectionNoise {
  const path = channelPath(channel);
  const tone = powerOf(channel.testTone.levelDb);
  const nominal = powersOf(path, path.total, path.analogue, 1);
  const worst = worstShares(channel, path);
  return {
    nominal: {
      quantisation: nominal.quantisation === null ? null : powerDb(nominal.quantisation),
      jitter: nominal.jitter === null ? null : powerDb(nominal.jitter * tone),
    },
    jitterUnwanted: null,
    worstShares: worst.shares,
    nominalExtras: [],
    worstAt: worst.worstAt,
    evaluations: 0,
  };
}

/** Powers in the wanted band: of quantisation over a full-scale sine's, of jitter over the test tone's before the hold. */
interface Powers {
  readonly quantisation: number | null;
  readonly jitter: number | null;
}

function powersOf(path: ChannelPath, total: Response, analogue: Response, toneGain: number): Powers {
  const { channel } = path;
  const half = path.rateHz / 2;
  const sigma = jitterSeconds(channel);
  const over = (response: Response): number =>
    noiseBands(channel).reduce((sum, band) => sum + integratePower(response, band.low, band.high).value, 0) / half;
  return {
    quantisation: channel.bits === null ? null : over(total) / powerOf(quantisationSnrDb(channel.bits)),
    jitter: sigma === 0 ? null : (over(analogue) * edgePower(path) * (path.rateHz * sigma) ** 2) / toneGain,
  };
}

/**
 * Σ⟨s²⟩ over the edges of one period, over the tone's power before the hold: each edge steps by a sample (two a period), but where
 * the pulse lasts m whole periods an edge ends one pulse and begins another: 4·sin²(πmf/fs).
 */
function edgePower(path: ChannelPath): number {
  const { channel, rateHz } = path;
  const periods = pulseSeconds(channel.pulse, rateHz) * rateHz;
  const whole = Math.round(periods);
  if (whole < 1 || Math.abs(periods - whole) > 1e-9 * whole) return 2;
  const { landsHz } = foldFrequency(channel.testTone.frequencyHz, rateHz);
  return 4 * Math.sin((Math.PI * whole * landsHz) / rateHz) ** 2;
}

/** Noise over the test tone as it leaves, at the worst corners and at the worse end of the rate. */
function worstShares(
  channel: Channel,
  path: ChannelPath,
): { readonly shares: readonly number[]; readonly worstAt: WorstAt | null } {
  const rates = rateRange(channel.rate);
  const candidates = rates.low === rates.high ? [channel.rate.hz] : [channel.rate.hz, rates.low, rates.high];
  const found = candidates.map((rateHz) => ({ rateHz, shares: sharesAt(channel, rateHz) }));
  const worst = found.reduce((best, one) => (sum(one.shares) > sum(best.shares) ? one : best));
  if (!partsVary(channel)) return { shares: worst.shares, worstAt: null };
  const tone = channel.testTone.frequencyHz;
  const question = { sense: 'smallest', referenceHz: null, axis: 'hertz' } as const;
  const clock = varies(channel.rate.tolerance) ? { [rateLabel(channel.rate)]: worst.rateHz / channel.rate.hz - 1 } : null;
  return { shares: worst.shares, worstAt: joinWorst(worstPath(path, question).worstAt(tone), clock) };
}

function sharesAt(channel: Channel, rateHz: number): readonly number[] {
  const still: Channel = { ...channel, rate: { ...channel.rate, hz: rateHz, tolerance: { low: 0, high: 0 } } };
  const path = channelPath(still);
  const tone = channel.testTone;
  const question = { sense: 'largest', referenceHz: tone.frequencyHz, axis: 'hertz' } as const;
  const total = worstPath(path, question).response;
  // The edges' noise passes the filter only, while the tone also has the hold's gain.
  const bare: ChannelPath = {
    ...path,
    pulse: path.pulse,
    total: path.analogue,
    channel: { ...still, pulse: { shape: 'instant' } },
  };
  const analogue = partsVary(still) ? worstPath(bare, question).response : relativeTo(path.analogue, tone.frequencyHz);
  const toneGain = Math.exp(2 * path.pulse.logGain(tone.frequencyHz));
  const powers = powersOf(path, total, analogue, toneGain);
  const quantisation = powers.quantisation === null ? [] : [powers.quantisation / powerOf(tone.levelDb)];
  return powers.jitter === null ? quantisation : [...quantisation, powers.jitter];
}

function sum(powers: readonly number[]): number {
  return powers.reduce((total, power) => total + power, 0);
}
