/** The copies that a sampled band leaves at: which one is wanted, which are images, and where each of them runs. */
import type { CopyAxis } from '../signal/copy-axis';
import { foldFrequency } from '../signal/folding';
import type { Enclosure } from '../signal/response';
import { appearance } from './wanted';

/** One copy: k·rate + x (upper), k·rate − x (lower), or x itself (k = 0, upper). */
export interface Copy {
  readonly fold: number;
  readonly side: 'upper' | 'lower';
}

/** Folds without a gap, for a search that need not tell them apart. */
export interface CopyRun {
  readonly firstFold: number;
  readonly lastFold: number;
}

/** A wanted band of a generate channel as its words see it. */
export interface WantedCopy {
  /** The band between 0 and half the rate. */
  readonly baseband: Enclosure;
  readonly wanted: Copy;
  /** Images that are looked at one by one: those that are reported, and those beside the wanted copy. */
  readonly single: readonly Copy[];
  /** All others, to infinity. */
  readonly runs: readonly CopyRun[];
}

/** Copies up to this one are reported. */
export const reportedFolds = 8;

/** The copies of a band that is wanted where it leaves. */
export function copiesOf(wanted: Enclosure, rateHz: number): WantedCopy {
  const middle = foldFrequency((wanted.low + wanted.high) / 2, rateHz);
  const own: Copy = { fold: middle.fold, side: middle.inverted ? 'lower' : 'upper' };
  const near = [own.fold - 1, own.fold, own.fold + 1].filter((fold) => fold > reportedFolds);
  const folds = [...Array.from({ length: reportedFolds + 1 }, (_, fold) => fold), ...near];
  const single = folds.flatMap(sidesOf).filter((copy) => copy.fold !== own.fold || copy.side !== own.side);
  const runs = folds.flatMap((fold, index): readonly CopyRun[] => {
    const next = folds[index + 1] ?? Infinity;
    return next > fold + 1 ? [{ firstFold: fold + 1, lastFold: next - 1 }] : [];
  });
  return { baseband: appearance({ lowHz: wanted.low, highHz: wanted.high }, rateHz), wanted: own, single, runs };
}

/** Where the baseband frequency x leaves in a copy. */
export function axisOf(copy: Copy, rateHz: number): CopyAxis {
  return { offsetHz: copy.fold * rateHz, direction: copy.side === 'upper' ? 1 : -1 };
}

/** The output frequency of x in a copy. */
export function leavesAt(copy: Copy, rateHz: number, x: number): number {
  return copy.fold * rateHz + (copy.side === 'upper' ? x : -x);
}

function sidesOf(fold: number): readonly Copy[] {
  const upper: Copy = { fold, side: 'upper' };
  return fold === 0 ? [upper] : [{ fold, side: 'lower' }, upper];
}
