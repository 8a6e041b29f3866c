/** Where f·|H(f)|, the rate of change that jitter acts on, must be looked for its largest value when a source may stand up to infinity. */
import type { Enclosure } from '../signal/response';
import type { Root } from '../signal/sections';
import type { ChannelPath, StagePath } from './channel-path';
import { pulseSeconds } from './pulse';
import { widthSeconds } from './pulse-shape';
import { factorsOf } from './tolerances';

/** Past this many times its farthest pole or zero a filter is within 2e−4 dB of the power of f that it tends to. */
const settled = 1000;

/** The same to 1e−10 dB, which costs nothing where no pulse makes lobes. */
const wellSettled = 1e6;

/**
 * The part of a range in which f·|H(f)| is largest; its end stays infinite where that grows without limit.
 *
 * Without a pulse f·|H| is searched until it has come as near to its limit as double precision lets it. With one, f·|P(f)| comes back to no
 * more than the same height in every lobe: where |H| only falls, or holds, one whole period of lobes is enough.
 */
export function jitteredRange(range: Enclosure, path: ChannelPath): Enclosure {
  const exponent = path.stages.reduce((sum, stage) => sum + exponentOf(stage), 0);
  const width = pulseSeconds(path.channel.pulse, path.rateHz);
  if ((width > 0 ? 0 : 1) + exponent > 1e-12) return range;
  if (width > 0) return upTo(range, Math.max(range.low, pulseSettlesHz(path), ...path.stages.map(fallsFromHz)) + 2 / width);
  return upTo(range, wellSettled * Math.max(range.low, ...path.stages.map(farthestHz)));
}

function upTo(range: Enclosure, highHz: number): Enclosure {
  return { low: range.low, high: Math.min(range.high, highHz) };
}

/** The power of f that a stage's gain tends to. */
function exponentOf({ filter, table }: StagePath): number {
  if (filter !== null) return filter.zeros.length - filter.poles.length;
  return (table?.beyondDbPerDecade ?? 0) / 20;
}

/** A frequency above which a stage's gain only falls, or holds. */
function fallsFromHz(stage: StagePath): number {
  const { filter, response } = stage;
  if (filter === null) return farthestHz(stage);
  if (filter.turnsHz === null) return settled * farthestHz(stage);
  const last = filter.turnsHz.at(-1) ?? 0;
  const falls = response.logGain(last) >= response.logGain(Infinity);
  return falls ? last * factorsOf(stage.stage.cornerTolerance).high : settled * farthestHz(stage);
}

/** Its farthest pole or zero, or the end of its table, at the highest corner. */
function farthestHz({ stage, filter, table }: StagePath): number {
  const size = ({ re, im }: Root): number => Math.hypot(re, im);
  const farthest =
    filter === null ? (table?.frequenciesHz.at(-1) ?? 0) : Math.max(...filter.poles.map(size), ...filter.zeros.map(size));
  return farthest * factorsOf(stage.cornerTolerance).high;
}

/** An exponential pulse rises to its own limit; of all others f·|P(f)| has its largest lobe first. */
function pulseSettlesHz({ channel, rateHz }: ChannelPath): number {
  if (channel.pulse.shape !== 'exponential') return 0;
  return settled / (2 * Math.PI * widthSeconds(channel.pulse.decay, rateHz));
}
