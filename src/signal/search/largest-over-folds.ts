/** The proved largest gain over every fold, to infinity. */
import type { Enclosure } from '../response';
import type { FoldExtreme, FoldQuestion, SearchOptions } from './extreme';
import { Frontier } from './frontier';
import { gapOf, toNepers } from './gap';
import { curveOf, type Curve } from './interval';
import { foldOf, isLower, Ladder } from './ladder';
import { openRun, type LadderCurves } from './run';
import { innerAxis, Sight, SightCurve } from './sight';

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
  const frontier = new Frontier(toNepers(options.gapDb), options.evaluationLimit);
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
  private readonly sight: Sight | null;

  constructor(
    private readonly question: FoldQuestion,
    readonly ladder: Ladder,
    private readonly rungs: Rung[],
  ) {
    const { inner, outer } = question;
    this.sight = inner === null ? null : new Sight(outer, inner);
  }

  upper(hull: Enclosure): number {
    return this.sight === null ? this.question.outer.bounds(hull.low, hull.high).high : this.sight.upper(hull, this.ladder.band);
  }

  curve(rung: number): Curve {
    const { outer, rateHz } = this.question;
    const tag = this.tag(rung);
    return this.sight === null
      ? curveOf(outer, tag)
      : new SightCurve(tag, this.sight, innerAxis(rung, rateHz.low), this.ladder.band);
  }

  noteInfinity(frontier: Frontier): void {
    const { outer } = this.question;
    const { low, high } = this.ladder.band;
    frontier.evaluations += 1;
    const gain = (x: number): number => this.sight?.logGain(Infinity, x) ?? outer.logGain(Infinity);
    const logGain = Math.max(gain(low), gain(high));
    if (logGain > frontier.best) frontier.note(logGain, Infinity, this.tag(Infinity));
  }

  private tag(rung: number): number {
    return this.rungs.push({ ladder: this.ladder, rung }) - 1;
  }
}
