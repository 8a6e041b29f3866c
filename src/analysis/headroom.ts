/** How much of full scale is left when every peak falls together: at the sampler in capture, in the words to be converted in generate. */
import { largestOverBands } from '../signal/search';
import type { Channel, Source } from '../spec/channel';
import type { Enclosure } from '../signal/response';
import { bandAxis, onAxis } from './axis';
import { decibelsPerNeper, toDb } from './decibels';
import type { ChannelPath } from './channel-path';
import type { WorstAt } from './figures';
import { sourceRange } from './source-range';
import { partsVary } from './tolerances';
import { nominalPath, worstPath } from './worst-path';
import type { WorstPath } from './worst-path';

/** Full scale over the sum of all peak amplitudes, dB; negative where they clip. */
export interface Headroom {
  readonly valueDb: number;
  readonly nominalDb: number;
  readonly worstAt: WorstAt | null;
  readonly evaluations: number;
}

/** The headroom of a channel; null where nothing is there to fill it. */
export function headroomOf(channel: Channel, path: ChannelPath): Headroom | null {
  if (channel.wanted.length === 0) return null;
  if (channel.direction === 'generate') {
    const valueDb = headroomDb(channel.wanted.map((band) => band.levelDb));
    return { valueDb, nominalDb: valueDb, worstAt: null, evaluations: 0 };
  }
  const referenceHz = channel.levelsAt === 'sampler' ? channel.referenceHz : null;
  const nominal = peaks(channel, nominalPath(path, referenceHz));
  const nominalDb = headroomDb(nominal.levelsDb);
  if (!partsVary(channel) && !tonesVary(channel)) return { ...nominal, valueDb: nominalDb, nominalDb };
  const worst = peaks(channel, worstPath(path, { sense: 'largest', referenceHz, axis: bandAxis(channel) }), 'anywhere');
  const valueDb = Math.min(headroomDb(worst.levelsDb), nominalDb);
  return { valueDb, nominalDb, worstAt: worst.worstAt, evaluations: nominal.evaluations + worst.evaluations };
}

interface Peaks {
  readonly levelsDb: readonly number[];
  /** Where the strongest of them has its worst. */
  readonly worstAt: WorstAt | null;
  readonly evaluations: number;
}

/** The largest level at the sampler of each wanted band and each source; `anything` is left out. */
function peaks(channel: Channel, path: WorstPath, tones: 'nominal' | 'anywhere' = 'nominal'): Peaks {
  const arrivals = [
    ...channel.wanted.map((band) => ({ levelDb: band.levelDb, range: { low: band.lowHz, high: band.highHz } })),
    ...channel.unwanted.flatMap((source) => arrivalOf(source, tones)),
  ];
  const axis = tones === 'nominal' ? 'hertz' : bandAxis(channel);
  let evaluations = 0;
  let strongest = { levelDb: -Infinity, frequencyHz: 0 };
  const levelsDb = arrivals.map(({ levelDb, range }) => {
    const extreme = largestOverBands(path.response, [onAxis(channel, axis, range)]);
    evaluations += extreme?.evaluations ?? 0;
    const arrives = levelDb + toDb(extreme?.logGain ?? -Infinity);
    if (arrives > strongest.levelDb) strongest = { levelDb: arrives, frequencyHz: extreme?.frequencyHz ?? 0 };
    return arrives;
  });
  return { levelsDb, worstAt: path.worstAt(strongest.frequencyHz), evaluations };
}

function arrivalOf(
  source: Source,
  tones: 'nominal' | 'anywhere',
): readonly { readonly levelDb: number; readonly range: Enclosure }[] {
  if (source.kind === 'anything') return [];
  const still = source.kind === 'tone' && tones === 'nominal';
  const range = still ? { low: source.frequencyHz, high: source.frequencyHz } : sourceRange(source);
  return [{ levelDb: source.levelDb, range }];
}

function tonesVary(channel: Channel): boolean {
  return channel.unwanted.some((source) => source.kind === 'tone' && (source.tolerance.low !== 0 || source.tolerance.high !== 0));
}

/** Amplitudes add, since all peaks may fall together. */
function headroomDb(levelsDb: readonly number[]): number {
  return -decibelsPerNeper * Math.log(levelsDb.reduce((sum, level) => sum + Math.exp(level / decibelsPerNeper), 0));
}
