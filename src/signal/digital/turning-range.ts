/** The exact range of a trigonometric sum over any interval, from the places where it turns. */
import { RangeExtremes } from '../range-extremes';
import type { Enclosure } from '../response';
import { signChanges } from './sign-changes';
import type { TrigonometricSum } from './trigonometric-sum';

/** A sum whose turning points have been found: between two of them it only rises or only falls. */
export class TurningRange {
  private readonly turns: readonly number[];
  private readonly atTurns: RangeExtremes;

  constructor(private readonly sum: TrigonometricSum) {
    this.turns = signChanges(sum.derivative());
    this.atTurns = new RangeExtremes(this.turns.map((x) => sum.at(x)));
  }

  /** Over shares low … high of the rate, 0 ≤ low ≤ high ≤ 0.5, widened by what rounding may add. */
  over(low: number, high: number): Enclosure {
    const inside = this.atTurns.between(this.countBelow(low), this.countBelow(high));
    const ends = [this.sum.at(low), this.sum.at(high)];
    const { rounding } = this.sum;
    return { low: Math.min(inside.low, ...ends) - rounding, high: Math.max(inside.high, ...ends) + rounding };
  }

  /** How many turns lie below a share. */
  private countBelow(share: number): number {
    let from = 0;
    let to = this.turns.length;
    while (from < to) {
      const middle = (from + to) >> 1;
      if ((this.turns[middle] ?? Infinity) < share) from = middle + 1;
      else to = middle;
    }
    return from;
  }
}
