/** The step response of poles alone, by partial fractions, and its extremes and crossings. */
import { complexDifference, complexProduct, complexQuotient, type Complex } from '../../src/signal/complex';

/** What a step response is judged by; times in seconds for poles in rad/s. */
export interface StepFigures {
  readonly overshootPercent: number;
  /** First crossing of a share of the final value. */
  readonly reaches: (share: number) => number;
  /** Last time at which it is off its final value by more than a share of it. */
  readonly settles: (share: number) => number;
}

/** Of the all-pole filter with these distinct poles, over its final value. */
export function stepFigures(poles: readonly Complex[]): StepFigures {
  const errorAt = sumOfExponentials(poles, residuesOf(poles));
  const slopeAt = sumOfExponentials(
    poles,
    residuesOf(poles).map((residue, k) => complexProduct(residue, poles[k]!)),
  );
  const extremes = [0, ...zerosOf(slopeAt, horizonOf(poles)), horizonOf(poles)];
  return {
    overshootPercent: 100 * Math.max(0, ...extremes.slice(1, -1).map(errorAt)),
    reaches: (share) => {
      const end = extremes.findIndex((time) => errorAt(time) >= share - 1);
      return crossing((time) => errorAt(time) - (share - 1), extremes[end - 1]!, extremes[end]!);
    },
    settles: (share) => {
      const start = extremes.findLastIndex((time) => Math.abs(errorAt(time)) > share);
      return crossing((time) => Math.abs(errorAt(time)) - share, extremes[start]!, extremes[start + 1]!);
    },
  };
}

/** y(t)/y(∞) − 1 = Σ c·e^(p·t) with c = −Π p_i/(p_i − p) over the others. */
function residuesOf(poles: readonly Complex[]): readonly Complex[] {
  return poles.map((pole, k) =>
    poles.reduce<Complex>(
      (product, other, i) =>
        i === k ? product : complexProduct(product, complexQuotient(other, complexDifference(other, pole))),
      { re: -1, im: 0 },
    ),
  );
}

function sumOfExponentials(poles: readonly Complex[], weights: readonly Complex[]): (time: number) => number {
  return (time) =>
    poles.reduce((sum, { re, im }, k) => {
      const { re: c, im: d } = weights[k]!;
      return sum + Math.exp(re * time) * (c * Math.cos(im * time) - d * Math.sin(im * time));
    }, 0);
}

/** When the slowest pole has died away to 1e−9; the largest residue is below a hundred. */
function horizonOf(poles: readonly Complex[]): number {
  return Math.log(1e9) / Math.min(...poles.map(({ re }) => -re));
}

/** Of a function whose quickest swing takes many of the steps. */
function zerosOf(slope: (time: number) => number, end: number): readonly number[] {
  const count = 6000;
  const values = Array.from({ length: count }, (_, k) => slope((end * (k + 1)) / count));
  return values.slice(1).flatMap((value, k) => {
    if (Math.sign(value) === Math.sign(values[k]!)) return [];
    return [crossing(slope, (end * (k + 1)) / count, (end * (k + 2)) / count)];
  });
}

/** By bisection, to rounding. */
function crossing(value: (time: number) => number, from: number, to: number): number {
  const sign = Math.sign(value(from));
  let [low, high] = [from, to];
  for (let i = 0; i < 60; i += 1) {
    const middle = 0.5 * (low + high);
    if (Math.sign(value(middle)) === sign) low = middle;
    else high = middle;
  }
  return low;
}
