/** The proved strongest landing of one source: the largest gain over every frequency at which it may stand and from which it lands. */
import type { Enclosure, Response } from '../signal/response';
import { largestOverBands, largestOverFolds } from '../signal/search';
import type { Extreme } from '../signal/search';
import { intersection } from './intervals';
import { lands } from './landing-set';
import type { FoldRun, LandingSet } from './landing-set';

/** What is searched. */
export interface LandingQuestion {
  readonly set: LandingSet;
  /** Low = high for an exact rate. */
  readonly rateHz: Enclosure;
  /** Where the source may stand, outside the wanted bands. */
  readonly within: readonly Enclosure[];
  readonly response: Response;
  /** The same gain in two parts for k ≥ 1, where there is such a form. */
  readonly split: { readonly outer: Response; readonly inner: Response } | null;
  /** How finely it is proved. */
  readonly gapDb: number;
}

/** The strongest landing; null where the source lands in no protected range. */
export function strongestLanding(question: LandingQuestion): Extreme | null {
  const points = question.within.filter((piece) => piece.low === piece.high);
  const wide = question.within.filter((piece) => piece.low < piece.high);
  return largestOf([...points.map((point) => landingOfPoint(question, point.low)), ...landingsOfBands(question, wide)]);
}

/** The larger of several maxima, with the work of all. */
function largestOf(extremes: readonly (Extreme | null)[]): Extreme | null {
  const found = extremes.filter((extreme) => extreme !== null);
  const [first, ...others] = found;
  if (first === undefined) return null;
  const best = others.reduce((largest, one) => (one.logGain > largest.logGain ? one : largest), first);
  if (found.length === 1) return best;
  const { logGain, frequencyHz, gapDb } = best;
  return { logGain, frequencyHz, gapDb, evaluations: found.reduce((sum, one) => sum + one.evaluations, 0) };
}

/** A tone that stands still needs no search. */
function landingOfPoint(question: LandingQuestion, frequencyHz: number): Extreme | null {
  if (!lands(question.set, question.rateHz, frequencyHz)) return null;
  return { logGain: question.response.logGain(frequencyHz), frequencyHz, gapDb: 0, evaluations: 1 };
}

function landingsOfBands(question: LandingQuestion, within: readonly Enclosure[]): readonly (Extreme | null)[] {
  if (within.length === 0) return [];
  const pieces = intersection(question.set.pieces, within);
  return [
    ...(pieces.length > 0 ? [largestOverBands(question.response, pieces, { gapDb: question.gapDb })] : []),
    ...question.set.runs.map((run) => landingOfRun(question, run, within)),
  ];
}

function landingOfRun(question: LandingQuestion, run: FoldRun, within: readonly Enclosure[]): Extreme | null {
  const { rateHz, response, split, gapDb } = question;
  const low = Math.min(...within.map((piece) => piece.low));
  const high = Math.max(...within.map((piece) => piece.high));
  const firstFold = Math.max(run.firstFold, Math.floor(low / rateHz.high) - 1);
  const lastFold = Math.min(run.lastFold, Math.ceil(high / rateHz.low) + 1);
  const over = (
    first: number,
    last: number,
    gain: { readonly outer: Response; readonly inner: Response | null },
  ): Extreme | null => {
    if (first > last) return null;
    const { outer, inner } = gain;
    const asked = { rateHz, outer, inner, bands: run.bands, within, firstFold: first, lastFold: last };
    return largestOverFolds({ ...asked, sides: 'both' }, { gapDb });
  };
  const plain = { outer: response, inner: null };
  if (split === null) return over(firstFold, lastFold, plain);
  return largestOf([over(firstFold, Math.min(0, lastFold), plain), over(Math.max(1, firstFold), lastFold, split)]);
}
