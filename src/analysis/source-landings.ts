/** Everything of one source that lands in a protected range: the strongest of its tones, and all that land added as powers. */
import { product } from '../signal/response-algebra';
import type { Enclosure } from '../signal/response';
import type { Extreme } from '../signal/search';
import type { Channel } from '../spec/channel';
import type { Arrival } from './arrivals';
import { onAxis } from './axis';
import { arrivesWithin, envelopeOn } from './capture-view';
import type { View } from './capture-view';
import { contains } from './intervals';
import { lands } from './landing-set';
import { wantedRanges } from './source-range';
import { powerOf, sumOfLevels, toDb } from './decibels';
import { shareGapDb } from './share-gap';
import { strongestLanding } from './strongest-landing';

/** One tone of a source where it lands strongest. */
export interface Landed {
  readonly arrival: Arrival;
  /** Its gain, the source's envelope included. */
  readonly extreme: Extreme;
  /** Where it was looked for. */
  readonly within: readonly Enclosure[];
  /** The level of the arrival with that gain, dB. */
  readonly levelDb: number;
}

/** What of a source lands. */
export interface SourceLandings {
  /** Null where nothing lands. */
  readonly strongest: Landed | null;
  /** All harmonics and lines that land added as powers, each at its own worst; of a band and of an envelope the one strongest tone. */
  readonly sumDb: number | null;
  /** The gap between the proved bounds of that sum, dB. */
  readonly gapDb: number;
  readonly evaluations: number;
}

/** A tone is left out of the sum where all that are left together would add less than this to it, in dB of power. */
const negligibleDb = 80;

/** The landings of a source's tones in a view. */
export function sourceLandings(view: View, channel: Channel, arrivals: readonly Arrival[]): SourceLandings {
  const still = view.axis === 'hertz' ? arrivals.filter(({ range }) => range.low === range.high) : [];
  const found = stillLandings(view, channel, still);
  let strongest = found.reduce<Landed | null>((best, one) => (best === null || one.levelDb > best.levelDb ? one : best), null);
  const wide = still.length === 0 ? arrivals : arrivals.filter(({ range }) => range.low < range.high);
  const reachDb = negligibleDb + 10 * Math.log10(Math.max(1, arrivals.length));
  for (const { arrival, mostDb } of strongestFirst(view, channel, wide)) {
    // All that follow lie lower still.
    if (strongest !== null && mostDb < strongest.levelDb - reachDb) break;
    const soFar = strongest === null ? 0 : powerOf(strongest.levelDb - mostDb);
    const landed = landedOf(view, channel, arrival, shareGapDb(soFar, arrivals.length));
    if (landed === null) continue;
    found.push(landed);
    if (strongest === null || landed.levelDb > strongest.levelDb) strongest = landed;
  }
  const sumDb = sumOfLevels(found.map((landed) => landed.levelDb));
  const leastDb = sumOfLevels(found.map(({ levelDb, extreme }) => levelDb - extreme.gapDb));
  return {
    strongest,
    sumDb,
    gapDb: sumDb === null || leastDb === null || sumDb === leastDb ? 0 : sumDb - leastDb,
    evaluations: found.reduce((sum, { extreme }) => sum + extreme.evaluations, 0),
  };
}

/** What stands still needs no search: a table may have a million lines. */
function stillLandings(view: View, channel: Channel, still: readonly Arrival[]): Landed[] {
  const wanted = wantedRanges(channel);
  return still.flatMap((arrival) => {
    const frequencyHz = arrival.range.low;
    if (contains(wanted, frequencyHz) || !lands(view.set, view.rateHz, frequencyHz)) return [];
    const logGain = view.worst.response.logGain(frequencyHz);
    const extreme = { logGain, frequencyHz, gapDb: 0, evaluations: 1 };
    return [{ arrival, extreme, within: [arrival.range], levelDb: arrival.levelDb + toDb(logGain) }];
  });
}

/** With what no tone of it can pass, so that the weakest of a thousand harmonics need not be searched. */
interface Ranked {
  readonly arrival: Arrival;
  readonly mostDb: number;
}

function strongestFirst(view: View, channel: Channel, arrivals: readonly Arrival[]): readonly Ranked[] {
  const [only] = arrivals;
  if (arrivals.length === 1 && only !== undefined) return [{ arrival: only, mostDb: Infinity }];
  const { response } = view.worst;
  const ranked = arrivals.map((arrival): Ranked => {
    const { low, high } = onAxis(channel, view.axis, arrival.range);
    const most = low === high ? response.logGain(low) : response.bounds(low, high).high;
    return { arrival, mostDb: arrival.levelDb + toDb(most) };
  });
  return ranked.sort((a, b) => b.mostDb - a.mostDb);
}

function landedOf(view: View, channel: Channel, arrival: Arrival, gapDb: number): Landed | null {
  const within = arrivesWithin(view, channel, arrival);
  const envelope = envelopeOn(view, channel, arrival);
  const { set, rateHz, split } = view;
  const whole = view.worst.response;
  const extreme = strongestLanding({
    set,
    rateHz,
    within,
    gapDb,
    response: envelope === null ? whole : product([whole, envelope]),
    split: split === null || envelope === null ? split : { ...split, outer: product([split.outer, envelope]) },
  });
  return extreme === null ? null : { arrival, extreme, within, levelDb: arrival.levelDb + toDb(extreme.logGain) };
}
