/** How much of full scale is left when every peak falls together: at the sampler in capture, in the words to be converted in generate. */
import type { Enclosure, Response } from '../signal/response';
import { product } from '../signal/response-algebra';
import type { Channel } from '../spec/channel';
import { arrivalsOf, mayMove, nominalArrivals } from './arrivals';
import { bandAxis, onAxis } from './axis';
import { captureViews, envelopeOn } from './capture-view';
import { decibelsPerNeper, toDb } from './decibels';
import type { ChannelPath } from './channel-path';
import type { WorstAt } from './figures';
import { largestIn } from './largest-in';
import { shareGapDb } from './share-gap';
import { levelReference } from './test-tone';
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
  const referenceHz = levelReference(channel);
  const nominal = peaks(channel, nominalPath(path, referenceHz), 'nominal');
  const nominalDb = headroomDb(nominal.levelsDb);
  if (!partsVary(channel) && !channel.unwanted.some(mayMove)) return { ...nominal, valueDb: nominalDb, nominalDb };
  const worst = peaks(channel, worstPath(path, { sense: 'largest', referenceHz, axis: bandAxis(channel) }), 'worst');
  const valueDb = Math.min(headroomDb(worst.levelsDb), nominalDb);
  return { valueDb, nominalDb, worstAt: worst.worstAt, evaluations: nominal.evaluations + worst.evaluations };
}

interface Peaks {
  readonly levelsDb: readonly number[];
  /** Where the strongest of them has its worst. */
  readonly worstAt: WorstAt | null;
  readonly evaluations: number;
}

/** Something that arrives with what it passes. */
interface Arriving {
  readonly levelDb: number;
  /** On the axis of the path. */
  readonly range: Enclosure;
  readonly path: WorstPath;
  readonly envelope: Response | null;
}

/** The largest level at the sampler of each wanted band and of each tone of a source; `anything` is left out. */
function peaks(channel: Channel, path: WorstPath, at: 'nominal' | 'worst'): Peaks {
  const axis = at === 'nominal' ? 'hertz' : bandAxis(channel);
  const wanted = channel.wanted.map((band): Arriving => {
    const range = onAxis(channel, axis, { low: band.lowHz, high: band.highHz });
    return { levelDb: band.levelDb, range, path, envelope: null };
  });
  let evaluations = 0;
  let strongest: { readonly levelDb: number; readonly worstAt: () => WorstAt | null } = {
    levelDb: -Infinity,
    worstAt: () => null,
  };
  let sum = 0;
  const arriving = [...wanted, ...sourcesArriving(channel, at)];
  const levelsDb = arriving.map(({ levelDb, range, path: passed, envelope }) => {
    const response = envelope === null ? passed.response : product([passed.response, envelope]);
    const most = range.low === range.high ? 0 : levelDb + toDb(response.bounds(range.low, range.high).high);
    const extreme = largestIn(response, range, shareGapDb(sum / amplitudeOf(most), arriving.length));
    evaluations += extreme.evaluations;
    const arrives = levelDb + toDb(extreme.logGain);
    sum += amplitudeOf(arrives);
    if (arrives > strongest.levelDb) strongest = { levelDb: arrives, worstAt: () => passed.worstAt(extreme.frequencyHz) };
    return arrives;
  });
  return { levelsDb, worstAt: strongest.worstAt(), evaluations };
}

/** Every tone of every source: harmonics and lines each for themselves, a band and an envelope once at their worst frequency. */
function sourcesArriving(channel: Channel, at: 'nominal' | 'worst'): readonly Arriving[] {
  const viewAt = captureViews(channel, levelReference(channel));
  return channel.unwanted.flatMap((source) => {
    if (source.kind === 'anything') return [];
    const { nominal, worstOfBands } = viewAt(source.enters);
    const view = at === 'nominal' ? nominal : worstOfBands;
    const arrivals = at === 'nominal' ? nominalArrivals(source) : arrivalsOf(source);
    return arrivals.map((arrival) => ({
      levelDb: arrival.levelDb,
      range: onAxis(channel, view.axis, arrival.range),
      path: view.worst,
      envelope: envelopeOn(view, channel, arrival),
    }));
  });
}

/** Amplitudes add, since all peaks may fall together. */
function headroomDb(levelsDb: readonly number[]): number {
  return -decibelsPerNeper * Math.log(levelsDb.reduce((sum, level) => sum + amplitudeOf(level), 0));
}

function amplitudeOf(levelDb: number): number {
  return Math.exp(levelDb / decibelsPerNeper);
}
