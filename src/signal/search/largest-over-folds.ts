/** The proved largest gain over every fold, to infinity. */
import type { Enclosure, Response } from '../response';
import type { FoldExtreme, FoldQuestion, SearchOptions } from './extreme';
import { Frontier } from './frontier';
import { gapOf, toNepers } from './gap';
import type { Curve } from './interval';
import { foldOf, isLower, Ladder } from './ladder';
import { innerAxis, openRun, type LadderCurves } from './run';

/**
 * The largest of |outer(F)|·|inner(x)| over every F = k·rate ± x with x in the bands and F in the allowed intervals, proved to infinity.
 *
 * Runs of folds are bounded as one interval first and split only while they can still win; a single fold is settled by the sign of
 * its slope or two lines through its ends. Never a grid.
 *
 * @param question rates > 0 in Hz; 0 ≤ x ≤ rate/2; `inner` needs an exact rate.
 * @returns null where no frequency qualifies. A supremum that is only approached has `frequencyHz` and `fold` Infinity.
 * Source: interval branch and bound, common practice.
 * @example largestOverFolds({ rateHz: { low: 51200, high: 51200 }, outer: filterResponse(butterworth(4, 14000)), inner: null, bands: [{ low: 5, high: 10000 }], within: [{ low: 40000, high: 3e6 }], firstFold: 0, lastFold: Infinity, sides: 'both' }).frequencyHz // 41200
 */
export function largestOverFolds(question: FoldQuestion, options: SearchOptions = {}): FoldExtreme | null {
  checkQuestion(question);
  const frontier = new Frontier(toNepers(options.gapDb));
  const rungs: Rung[] = [];
  for (const band of question.bands) {
    for (const within of question.within ?? [everywhere]) {
      const ladder = new Ladder(question, band, within);
      openRun(frontier, new Curves(question, ladder, rungs), ladder.first, ladder.last);
    }
  }
  const logGain = frontier.prove();
  const found = rungs[frontier.bestTag];
  if (found === undefined) return null;
  const finite = found.rung < Infinity;
  return {
    logGain,
    frequencyHz: frontier.bestHz,
    gapDb: gapOf(logGain, frontier.best),
    evaluations: frontier.evaluations,
    fold: foldOf(found.rung),
    side: finite && isLower(found.rung) ? 'lower' : 'upper',
    landsHz: finite ? found.ladder.landing(found.rung, frontier.bestHz) : found.ladder.band.high,
  };
}

const everywhere: Enclosure = { low: 0, high: Infinity };

/** What a tag of the frontier stands for. */
interface Rung {
  readonly ladder: Ladder;
  readonly rung: number;
}

function checkQuestion(question: FoldQuestion): void {
  const { low, high } = question.rateHz;
  if (!(low > 0 && low <= high && high < Infinity)) throw new RangeError(`A rate must be above 0 Hz, not ${low} .. ${high}.`);
  if (question.inner !== null && low !== high) throw new RangeError('A gain at x needs an exact rate.');
}

class Curves implements LadderCurves {
  readonly outer: Response;
  readonly innerUpper: number;

  constructor(
    private readonly question: FoldQuestion,
    readonly ladder: Ladder,
    private readonly rungs: Rung[],
  ) {
    this.outer = question.outer;
    this.innerUpper = question.inner === null ? 0 : question.inner.bounds(ladder.band.low, ladder.band.high).high;
  }

  curve(rung: number): Curve {
    const { inner, outer, rateHz } = this.question;
    const tag = this.tag(rung);
    return inner === null
      ? plainCurve(outer, tag)
      : new PairedCurve(tag, outer, inner, innerAxis(rung, rateHz.low), this.ladder.band);
  }

  noteInfinity(frontier: Frontier): void {
    const { inner, outer } = this.question;
    const { low, high } = this.ladder.band;
    frontier.evaluations += 1;
    const atEnds = inner === null ? 0 : Math.max(inner.logGain(low), inner.logGain(high));
    const logGain = outer.logGain(Infinity) + atEnds;
    if (logGain > frontier.best) frontier.note(logGain, Infinity, this.tag(Infinity));
  }

  private tag(rung: number): number {
    return this.rungs.push({ ladder: this.ladder, rung }) - 1;
  }
}

function plainCurve(outer: Response, tag: number): Curve {
  return {
    tag,
    logGain: (frequencyHz) => outer.logGain(frequencyHz),
    upper: (lowHz, highHz) => outer.bounds(lowHz, highHz).high,
    slope: (lowHz, highHz) => outer.slope(lowHz, highHz),
  };
}

/** outer(F)·inner(x) along one rung, where x = offset + direction·F. */
class PairedCurve implements Curve {
  constructor(
    readonly tag: number,
    private readonly outer: Response,
    private readonly inner: Response,
    private readonly axis: { readonly offset: number; readonly direction: 1 | -1 },
    private readonly band: Enclosure,
  ) {}

  logGain(frequencyHz: number): number {
    const sum = this.outer.logGain(frequencyHz) + this.inner.logGain(this.innerHz(frequencyHz));
    return Number.isNaN(sum) ? -Infinity : sum;
  }

  upper(lowHz: number, highHz: number): number {
    const inner = this.inner.bounds(...this.innerInterval(lowHz, highHz));
    const sum = this.outer.bounds(lowHz, highHz).high + inner.high;
    return Number.isNaN(sum) ? Infinity : sum;
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    const outer = this.outer.slope(lowHz, highHz);
    const inner = outer === null ? null : this.inner.slope(...this.innerInterval(lowHz, highHz));
    if (outer === null || inner === null) return null;
    const turned = this.axis.direction === 1 ? inner : { low: -inner.high, high: -inner.low };
    const low = outer.low + turned.low;
    const high = outer.high + turned.high;
    return Number.isNaN(low) || Number.isNaN(high) ? null : { low, high };
  }

  /** Held inside the band against rounding. */
  private innerHz(frequencyHz: number): number {
    return Math.min(Math.max(this.axis.offset + this.axis.direction * frequencyHz, this.band.low), this.band.high);
  }

  private innerInterval(lowHz: number, highHz: number): [number, number] {
    const atLow = this.innerHz(lowHz);
    const atHigh = this.innerHz(highHz);
    return this.axis.direction === 1 ? [atLow, atHigh] : [atHigh, atLow];
  }
}
