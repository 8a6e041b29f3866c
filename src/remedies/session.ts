/** One search for fixes of one finding: tries changes, never the same twice, within a budget, and remembers the nearest miss. */
import type { Figures } from '../analysis';
import { thinBelow, type Finding, type Judgement, type Store } from '../findings';
import { applyEdits, type Channel, type Reading } from '../spec';
import { changesWords, type Change } from './change';
import type { Blocked } from './fix';
import { trying, works, type Trial } from './trial';

/** How many analyses one finding may cost. */
export const analysesAllowed = 400;

/** How many evaluations they may take together, so that a channel that is slow to analyse does not keep a check waiting for minutes. */
const evaluationsAllowed = 500_000;

/** A search in progress. */
export interface Session {
  readonly judgement: Judgement;
  readonly reading: Reading;
  readonly finding: Finding;
  /** The finding's channel and its figures before any change. */
  readonly channel: Channel;
  readonly figures: Figures;
  /** The trial of these changes; null where the budget is spent or the changes cannot be made. */
  attempt(changes: readonly (Change | null)[]): Generator<void, Trial | null>;
  readonly analyses: number;
  /** What stood in the way of the candidate that came nearest. */
  readonly nearest: Blocked | null;
}

/** Begins a search; null where the finding's channel is not whole, so that nothing can be tried. */
export function beginSession(judgement: Judgement, finding: Finding, store: Store): Session | null {
  const judged = judgement.channels.find(({ entry }) => entry.name === finding.channel);
  const channel = judged?.entry.channel ?? null;
  const figures = judged?.figures ?? null;
  return channel === null || figures === null ? null : sessionOf({ judgement, finding, channel, figures }, store);
}

type Start = Pick<Session, 'judgement' | 'finding' | 'channel' | 'figures'>;

function sessionOf(start: Start, store: Store): Session {
  const { judgement, finding } = start;
  const { reading } = judgement;
  const tried = new Map<string, Trial>();
  const before = store.analysed;
  let nearest: Nearest | null = null;
  let evaluations = 0;
  return {
    ...start,
    reading,
    get analyses() {
      return store.analysed - before;
    },
    get nearest() {
      return nearest === null ? null : { limit: nearest.limit, misses: nearest.misses, candidate: nearest.candidate };
    },
    *attempt(changes) {
      const made = changes.filter((change) => change !== null);
      if (made.length < changes.length) return null;
      const edits = made.flatMap((change) => change.edits);
      const text = applyEdits(reading.text, edits);
      const known = tried.get(text);
      if (known !== undefined) return known;
      if (store.analysed - before >= analysesAllowed || evaluations >= evaluationsAllowed) return null;
      const trial = yield* trying(judgement, finding, { changes: made, text }, store);
      evaluations += trial.figures?.evaluations ?? 0;
      tried.set(text, trial);
      nearest = nearer(nearest, trial, start.channel);
      yield;
      return trial;
    },
  };
}

/** The margin of the finding's own limit, or the headroom where it is about clipping; null where there is none. */
export function ownMargin(finding: Finding, figures: Figures | null): number | null {
  if (finding.code === 'overdriven') return figures?.headroom ?? null;
  return figures?.limits.find((figure) => figure.limit === finding.limit)?.margin ?? null;
}

/** What stood in the way, with its size as `sizeOf` has it. */
interface Nearest extends Blocked {
  readonly size: number;
}

/** Keeps whichever misses by less: the miss known so far or that of this trial. */
function nearer(known: Nearest | null, trial: Trial, channel: Channel): Nearest | null {
  if (works(trial) || trial.figures === null) return known;
  const misses = [...trial.remaining, ...trial.newErrors].map((finding) => missOf(finding, trial.figures, channel));
  const worst = misses.reduce<Miss | null>((most, miss) => (most !== null && most.size >= miss.size ? most : miss), null);
  if (worst === null || !Number.isFinite(worst.size)) return known;
  if (known !== null && known.size <= worst.size) return known;
  return { limit: worst.limit, misses: worst.by, size: worst.size, candidate: changesWords(trial.changes) };
}

interface Miss {
  readonly limit: string;
  /** In the limit's unit. */
  readonly by: number;
  /** In dB, so that times and levels compare. */
  readonly size: number;
}

/** By how much a finding of a trial misses being none; infinite where it has no number. */
function missOf(finding: Finding, figures: Figures | null, channel: Channel): Miss {
  const margin = finding.figures?.margin ?? null;
  const figure = figures?.limits.find(({ limit }) => limit === finding.limit);
  const needed = finding.code === 'thin-margin' && figure !== undefined ? thinBelow(channel, figure) : 0;
  const by = margin === null ? Infinity : needed - margin;
  const size = figure?.unit === 's' ? 20 * Math.log10(1 + Math.max(0, by) / Math.max(figure.at, Number.MIN_VALUE)) : by;
  return { limit: finding.limit ?? finding.code, by, size };
}
