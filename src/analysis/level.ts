/** The level of the wanted output over its whole band: its proved largest and smallest value, nominally and at the worst of the tolerances. */
import { inverse } from '../signal/response-algebra';
import { largestOverBands } from '../signal/search';
import type { Channel } from '../spec/channel';
import type { ChannelPath } from './channel-path';
import { toDb } from './decibels';
import type { WorstAt } from './figures';
import { fromSampler } from './relay/wanted-output';
import { levelReference } from './test-tone';
import { partsVary } from './tolerances';
import { nominalPath, worstPath } from './worst-path';
import type { WorstPath } from './worst-path';

/** One end of what the level reaches, dBFS. */
export interface LevelEnd {
  readonly valueDb: number;
  readonly nominalDb: number;
  readonly frequencyHz: number;
  readonly gapDb: number;
  readonly worstAt: WorstAt | null;
}

/** Both ends. */
export interface LevelRange {
  readonly highest: LevelEnd;
  readonly lowest: LevelEnd;
  readonly evaluations: number;
}

/** The range of a channel's wanted output; null without a limit that asks for it, and without a wanted band. */
export function levelRangeOf(channel: Channel, path: ChannelPath): LevelRange | null {
  if (channel.levelLimit === null || channel.wanted.length === 0) return null;
  const highest = endOf(channel, path, 'largest');
  const lowest = endOf(channel, path, 'smallest');
  return { highest, lowest, evaluations: highest.evaluations + lowest.evaluations };
}

type Sense = 'largest' | 'smallest';

function endOf(channel: Channel, path: ChannelPath, sense: Sense): LevelEnd & { readonly evaluations: number } {
  const nominal = extreme(channel, outputOf(channel, path, null), sense);
  if (!partsVary(channel)) return { ...nominal, nominalDb: nominal.valueDb };
  const worst = extreme(channel, outputOf(channel, path, sense), sense);
  // The proved bounds of nominal and worst may cross by the gap.
  const nominalDb = sense === 'largest' ? Math.min(nominal.valueDb, worst.valueDb) : Math.max(nominal.valueDb, worst.valueDb);
  return { ...worst, nominalDb, evaluations: nominal.evaluations + worst.evaluations };
}

/** From the stated level to the output: nominally without a sense. */
function outputOf(channel: Channel, path: ChannelPath, sense: Sense | null): WorstPath {
  if (channel.direction === 'relay' && channel.levelsAt === 'sampler') return fromSampler(channel, sense);
  const referenceHz = levelReference(channel);
  return sense === null ? nominalPath(path, referenceHz) : worstPath(path, { sense, referenceHz, axis: 'hertz' });
}

/** The furthest that any wanted band goes in one direction, each with its own level. */
function extreme(
  channel: Channel,
  worst: WorstPath,
  sense: Sense,
): Omit<LevelEnd, 'nominalDb'> & { readonly evaluations: number } {
  const sign = sense === 'largest' ? 1 : -1;
  const searched = sense === 'largest' ? worst.response : inverse(worst.response);
  let evaluations = 0;
  const ends = channel.wanted.map((band) => {
    const found = largestOverBands(searched, [{ low: band.lowHz, high: band.highHz }]);
    evaluations += found?.evaluations ?? 0;
    return { found, valueDb: band.levelDb + sign * toDb(found?.logGain ?? -Infinity) };
  });
  const furthest = ends.reduce((best, one) => (sign * one.valueDb > sign * best.valueDb ? one : best));
  const frequencyHz = furthest.found?.frequencyHz ?? channel.referenceHz;
  return {
    valueDb: furthest.valueDb,
    frequencyHz,
    gapDb: furthest.found?.gapDb ?? 0,
    worstAt: worst.worstAt(frequencyHz),
    evaluations,
  };
}
