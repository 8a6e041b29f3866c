/** What the section "what leaves" needs to know of a generate or relay channel, worked out once. */
import { gainDb } from '../analysis';
import type { FrequencyAxis, LevelAxis } from '../protocol/picture';
import { levelAxis } from './axes';
import { copiesUpTo } from './leaving-copies';
import type { CopyView } from './leaving-copies';
import { axisWith, boundsWithin, farthestOf, masksOf } from './mask-items';
import { limitFigure } from './subject';
import type { Subject } from './subject';

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
  const masks = masksOf(subject, 'output');
  const masked = Math.max(0, ...masks.map((mask) => Math.ceil(farthestOf(mask) / rateHz)));
  const lastFold = Math.min(
    Math.max(fewestFolds, worst, masked, Math.ceil(highest / rateHz) + 2),
    Math.max(mostFolds, Math.ceil(highest / rateHz) + 2),
  );
  const levels = channel.wanted.map((band) => band.levelDb);
  const limit = limitFigure(subject, 'image');
  const wantedDb = Math.min(...levels) + gainDb(subject.nominal, channel.referenceHz);
  const limitDb = limit === null ? null : limit.unit === 'dBc' ? limit.at + wantedDb : limit.at;
  const plain = levelAxis(Math.max(...levels), 18, [limitDb, figures.image?.level ?? null, figures.noise.total]);
  const low = Math.min(...channel.wanted.map((band) => band.lowHz).filter((f) => f > 0), rateHz / 20);
  const output = {
    title: 'Hz at the output',
    lowHz: 0,
    highHz: rateHz * (lastFold + 0.3),
    logLowHz: low / 2,
    scale: 'linear',
  } as const;
  const axis = masks.reduce((grown, mask) => axisWith(grown, [boundsWithin(mask, output)], 0), plain);
  return {
    subject,
    copies: copiesUpTo(subject, lastFold),
    lastFold,
    output,
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
