/** What the section "what leaves" needs to know of a generate channel, worked out once. */
import { gainDb } from '../analysis';
import type { Enclosure } from '../analysis';
import { copiesOf, leavesAt } from '../analysis/copies';
import type { Copy } from '../analysis/copies';
import type { FrequencyAxis, LevelAxis } from '../protocol/picture';
import type { WantedBand } from '../spec/channel';
import { levelAxis } from './axes';
import { limitFigure } from './subject';
import type { Subject } from './subject';

/** One copy of a wanted band, the wanted one included. */
export interface CopyView {
  readonly band: WantedBand;
  /** Index into `wanted`. */
  readonly index: number;
  readonly copy: Copy;
  /** Where it leaves. */
  readonly range: Enclosure;
  readonly wanted: boolean;
  /** The wanted frequency that leaves at an output frequency. */
  readonly wantedHz: (outputHz: number) => number;
}

/** The section's common ground. */
export interface LeavingView {
  readonly subject: Subject;
  readonly copies: readonly CopyView[];
  /** Copies up to this multiple of the rate are shown. */
  readonly lastFold: number;
  readonly output: FrequencyAxis;
  readonly levels: LevelAxis;
  /** The highest wanted level, at which the envelopes are drawn. */
  readonly topDb: number;
  readonly tolerance: number;
}

/** Copies that are always shown, and the most that ever are. */
const fewestFolds = 3;
const mostFolds = 12;

/** Works it out. */
export function leavingView(subject: Subject): LeavingView {
  const { channel, figures } = subject;
  const rateHz = channel.rate.hz;
  const highest = Math.max(...channel.wanted.map((band) => band.highHz));
  const worst = figures.image?.copy ?? 0;
  const lastFold = Math.min(
    Math.max(fewestFolds, worst, Math.ceil(highest / rateHz) + 2),
    Math.max(mostFolds, Math.ceil(highest / rateHz) + 2),
  );
  const copies = channel.wanted.flatMap((band, index) => copiesOfBand(band, index, rateHz, lastFold));
  const levels = channel.wanted.map((band) => band.levelDb);
  const limit = limitFigure(subject, 'image');
  const limitDb = limit === null ? null : limit.unit === 'dBc' ? limit.at + Math.min(...levels) : limit.at;
  const axis = levelAxis(Math.max(...levels), 18, [limitDb, figures.image?.level ?? null, figures.noise.total]);
  const low = Math.min(...channel.wanted.map((band) => band.lowHz).filter((f) => f > 0), rateHz / 20);
  return {
    subject,
    copies,
    lastFold,
    output: { title: 'Hz at the output', lowHz: 0, highHz: rateHz * (lastFold + 0.3), logLowHz: low / 2, scale: 'linear' },
    levels: axis,
    topDb: Math.max(...levels),
    tolerance: (axis.high - axis.low) / 3000,
  };
}

/** The image limit at an output frequency of a copy; a limit in dBc counts from the same tone's wanted output. */
export function imageLimitAt({ subject }: LeavingView, copy: CopyView, outputHz: number): number | null {
  const limit = limitFigure(subject, 'image');
  if (limit === null) return null;
  return limit.unit === 'dBc' ? limit.at + copy.band.levelDb + gainDb(subject.nominal, copy.wantedHz(outputHz)) : limit.at;
}

function copiesOfBand(band: WantedBand, index: number, rateHz: number, lastFold: number): CopyView[] {
  const { baseband, wanted } = copiesOf({ low: band.lowHz, high: band.highHz }, rateHz);
  const folds = Array.from({ length: lastFold + 1 }, (_, fold) => fold);
  const every = folds.flatMap((fold): Copy[] =>
    fold === 0
      ? [{ fold, side: 'upper' }]
      : [
          { fold, side: 'lower' },
          { fold, side: 'upper' },
        ],
  );
  return every.map((copy) => {
    const ends = [leavesAt(copy, rateHz, baseband.low), leavesAt(copy, rateHz, baseband.high)];
    const wantedHz = (outputHz: number): number => leavesAt(wanted, rateHz, Math.abs(outputHz - copy.fold * rateHz));
    const isWanted = copy.fold === wanted.fold && copy.side === wanted.side;
    return { band, index, copy, range: { low: Math.min(...ends), high: Math.max(...ends) }, wanted: isWanted, wantedHz };
  });
}
