/** Everything of one source that leaves a relay channel in some ranges: the strongest of its tones, and all of them added as powers. */
import { constantResponse, product } from '../../signal/response-algebra';
import type { Response } from '../../signal/response';
import type { CopyExtreme } from '../../signal/search';
import { stretched } from '../../signal/stretched';
import type { Channel, Entrance } from '../../spec/channel';
import type { Levels } from '../alias';
import { arrivalDb } from '../arrivals';
import type { Arrival } from '../arrivals';
import { axisFactors } from '../axis';
import { gainWithCornersDb } from '../capture-view';
import type { ChannelPath } from '../channel-path';
import { powerDb, powerOf, toDb } from '../decibels';
import { frontOf, pathBefore, pathFrom } from '../entrance';
import type { WorstAt } from '../figures';
import { without } from '../intervals';
import { protectedAt } from '../landing-point';
import { wantedRanges } from '../source-range';
import { joinWorst } from '../tolerances';
import type { WorstPath } from '../worst-path';
import { strongestLeaving } from './copy-search';
import { inView, sideOf, staysIn } from './views';
import type { RelayView } from './views';
import { weightResponse } from './weights';

/** How landings are measured: as they leave, or against the wanted tone at `reference`. */
export type Measure = 'level' | 'relative';

/** One tone of a source where it leaves strongest in a protected range. */
export interface Landed {
  readonly view: RelayView;
  readonly arrival: Arrival;
  readonly extreme: CopyExtreme;
  readonly levels: Levels;
  readonly worstAt: WorstAt | null;
}

/** Everything of a source that leaves in a protected range under one view. */
export interface Landings {
  readonly strongest: Landed | null;
  readonly sum: Levels | null;
  readonly gapDb: number;
  readonly evaluations: number;
  /** The strongest as it is measured; −Infinity where nothing lands. */
  readonly measured: number;
}

/** The landings in the protected ranges under one view. */
export function relayLandings(view: RelayView, enters: Entrance, arrivals: readonly Arrival[], measure: Measure): Landings {
  const sides = sidesFor(view, enters, measure);
  const landed = allThatCount(view, sides, arrivals, measure);
  const key = (one: Landed): number => (measure === 'relative' ? one.levels.relativeDb : one.levels.levelDb);
  const [first, ...others] = landed;
  const strongest = first === undefined ? null : others.reduce((best, one) => (key(one) > key(best) ? one : best), first);
  const sumBy = (of: keyof Levels): number => powerDb(landed.reduce((sum, one) => sum + powerOf(one.levels[of]), 0));
  return {
    strongest,
    sum: strongest === null ? null : { levelDb: sumBy('levelDb'), relativeDb: sumBy('relativeDb') },
    gapDb: Math.max(0, ...landed.map((one) => one.extreme.gapDb)),
    evaluations: landed.reduce((sum, one) => sum + one.extreme.evaluations, 0),
    measured: strongest === null ? -Infinity : key(strongest),
  };
}

/** A tone is left out where all that are left together would add less than this to the strongest, in dB of power. */
const negligibleDb = 100;

/** The landings, strongest first as far as can be told without a search, so that the weakest of a thousand harmonics need none. */
function allThatCount(view: RelayView, sides: Sides, arrivals: readonly Arrival[], measure: Measure): readonly Landed[] {
  const [only] = arrivals;
  if (arrivals.length === 1 && only !== undefined) return [landedOf(view, sides, only, measure)].flatMap((one) => one ?? []);
  const passesDb = toDb(mostBehind(view, sides));
  const ranked = arrivals
    .map((arrival) => {
      const { low, high } = inView(view, arrival.range);
      return { arrival, mostDb: arrival.levelDb + toDb(sides.input.response.bounds(low, high).high) + passesDb };
    })
    .sort((a, b) => b.mostDb - a.mostDb);
  const reachDb = negligibleDb + powerDb(arrivals.length);
  const landed: Landed[] = [];
  let strongestDb = -Infinity;
  for (const { arrival, mostDb } of ranked) {
    if (mostDb < strongestDb - reachDb) break;
    const one = landedOf(view, sides, arrival, measure);
    if (one === null) continue;
    landed.push(one);
    strongestDb = Math.max(strongestDb, arrival.levelDb + toDb(one.extreme.logGain));
  }
  return landed;
}

/** What weight and output filter pass at most in the protected ranges, ln. */
function mostBehind(view: RelayView, { output, againstLog }: Sides): number {
  const { relay, channel } = view;
  const weights = weightResponse(relay.weights.most);
  const bounds = protectedAt(channel, relay.rateHz).map((range) => {
    const { low, high } = inView(view, range);
    return output.response.bounds(low, high).high + weights.bounds(low, high).high;
  });
  return Math.max(-Infinity, ...bounds) - againstLog;
}

/** The landings of the view in which the strongest is strongest, with the work of all. */
export function strongestLandings(all: readonly Landings[]): Landings {
  const best = all.reduce((most, one) => (one.measured > most.measured ? one : most));
  return { ...best, evaluations: all.reduce((sum, one) => sum + one.evaluations, 0) };
}

/** The gains before and behind the sampling for what one source sends. */
interface Sides {
  readonly input: WorstPath;
  readonly output: WorstPath;
  /** ln of what the weights are measured against. */
  readonly againstLog: number;
  /** What only the wanted tone passes at `reference`, dB. */
  readonly frontDb: number;
  /** The part of the input filter that the source passes. */
  readonly passes: ChannelPath;
}

function sidesFor(view: RelayView, enters: Entrance, measure: Measure): Sides {
  const { relay, channel } = view;
  const { referenceHz, levelsAt } = channel;
  const passes = pathFrom(relay.input, enters);
  const toneHz = measure === 'relative' || levelsAt === 'sampler' ? referenceHz : null;
  const front = frontOf(pathBefore(relay.input, enters), toneHz, view.parts);
  return {
    input: front.behind(sideOf(view, passes, 'largest', toneHz)),
    output: sideOf(view, relay.output, 'largest', measure === 'relative' ? referenceHz : null),
    againstLog: measure === 'relative' ? wantedWeightLog(view) : 0,
    frontDb: front.referenceDb,
    passes,
  };
}

function wantedWeightLog({ relay, channel }: RelayView): number {
  return weightResponse(relay.weights.copy(0)).logGain(channel.referenceHz);
}

/** The level of the weakest wanted band, dBFS. */
export function weakestWantedDb(channel: Channel): number {
  return Math.min(...channel.wanted.map((band) => band.levelDb));
}

function landedOf(view: RelayView, sides: Sides, arrival: Arrival, measure: Measure): Landed | null {
  const { channel, relay } = view;
  const envelope = envelopeIn(view, arrival);
  const leaves = protectedAt(channel, relay.rateHz);
  const arrives = without([arrival.range], wantedRanges(channel));
  const extreme = strongestLeaving({
    relay,
    leaves: leaves.map((range) => inView(view, range)),
    arrives: arrives.map((range) => inView(view, range)),
    stays: staysIn(view, arrives, leaves),
    input: envelope === null ? sides.input.response : product([sides.input.response, envelope]),
    output: product([sides.output.response, constantResponse(-sides.againstLog)]),
  });
  if (extreme === null) return null;
  const levels = levelsOf(view, sides, arrival, measure, extreme);
  return {
    view,
    arrival,
    extreme,
    levels,
    worstAt: joinWorst(sides.input.worstAt(extreme.farHz), sides.output.worstAt(extreme.nearHz)),
  };
}

function envelopeIn(view: RelayView, { envelope }: Arrival): Response | null {
  if (envelope === null || view.parts === 'nominal') return envelope;
  return stretched(envelope, axisFactors(view.channel).periods, 'largest');
}

/** As it leaves in dBFS and against the weakest wanted tone, with the same parts for both. */
function levelsOf(view: RelayView, sides: Sides, arrival: Arrival, measure: Measure, extreme: CopyExtreme): Levels {
  const { relay, channel } = view;
  const reachedDb = arrival.levelDb + toDb(extreme.logGain);
  const { referenceHz, levelsAt } = channel;
  const outputDb = gainWithCornersDb(relay.output, referenceHz, sides.output.cornersAt(extreme.nearHz));
  const inputDb =
    levelsAt === 'sampler'
      ? 0
      : gainWithCornersDb(sides.passes, referenceHz, sides.input.cornersAt(extreme.farHz)) + sides.frontDb;
  const wantedOutDb = weakestWantedDb(channel) + inputDb + toDb(wantedWeightLog(view)) + outputDb;
  if (measure === 'relative') {
    const relativeDb = reachedDb - weakestWantedDb(channel);
    // Parts that silence the wanted tone leave nothing to measure from; the copy itself still has its level.
    return {
      relativeDb,
      levelDb: wantedOutDb === -Infinity ? ownLevelDb(view, sides, arrival, extreme) : relativeDb + wantedOutDb,
    };
  }
  return { levelDb: reachedDb, relativeDb: reachedDb - wantedOutDb - toDb(sides.input.gainLog + sides.output.gainLog) };
}

function ownLevelDb({ relay }: RelayView, { passes, input, output }: Sides, arrival: Arrival, extreme: CopyExtreme): number {
  const { copy, nearHz, farHz } = extreme;
  return (
    arrivalDb(arrival, farHz) +
    gainWithCornersDb(passes, farHz, input.cornersAt(farHz)) +
    toDb(weightResponse(Number.isFinite(copy) ? relay.weights.copy(copy) : relay.weights.most).logGain(nearHz)) +
    gainWithCornersDb(relay.output, nearHz, output.cornersAt(nearHz))
  );
}
