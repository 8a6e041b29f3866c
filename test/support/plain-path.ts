/** Gain and delay of stages by plain complex arithmetic on a grid, which shares nothing with the program but the poles that other tests hold to 50 digits. */
import type { Filter } from '../../src/signal/filter';

/** A gain over frequency, linear. */
export type Gain = (frequencyHz: number) => number;

/** H(jf) of poles and zeros as one complex number, up to its constant. */
function complexAt({ poles, zeros }: Filter, frequencyHz: number): { readonly re: number; readonly im: number } {
  let [re, im] = [1, 0];
  const multiply = (a: number, b: number): void => {
    [re, im] = [re * a - im * b, re * b + im * a];
  };
  for (const zero of zeros) multiply(-zero.re, frequencyHz - zero.im);
  for (const pole of poles) {
    const square = pole.re * pole.re + (frequencyHz - pole.im) ** 2;
    multiply(-pole.re / square, -(frequencyHz - pole.im) / square);
  }
  return { re, im };
}

/** |H(f)| of a filter. */
export function plainGain(filter: Filter): Gain {
  const { frequencyHz, gain } = filter.gainAt;
  // Far enough to be infinity for any filter of a test, and near enough for powers of it.
  const reference = complexAt(filter, frequencyHz === Infinity ? 1e12 : frequencyHz);
  const scale = gain / Math.hypot(reference.re, reference.im);
  return (f) => {
    const { re, im } = complexAt(filter, f);
    return scale * Math.hypot(re, im);
  };
}

/** Group delay in seconds as the phase's difference over a small step. */
export function plainDelay(filters: readonly Filter[]): (frequencyHz: number) => number {
  return (f) => {
    const step = 1e-4 * (f + 1);
    return filters.reduce((sum, filter) => {
      const from = complexAt(filter, f - step);
      const to = complexAt(filter, f + step);
      const turn = Math.atan2(to.im * from.re - to.re * from.im, to.re * from.re + to.im * from.im);
      return sum - turn / (4 * Math.PI * step);
    }, 0);
  };
}

/** Gains in series. */
export function inSeries(gains: readonly Gain[]): Gain {
  return (f) => gains.reduce((product, gain) => product * gain(f), 1);
}

/** Evenly spaced points, both ends included. */
export function spaced(low: number, high: number, count: number): readonly number[] {
  return Array.from({ length: count + 1 }, (_, index) => low + ((high - low) * index) / count);
}

/** The largest of a function over points. */
export function largest(points: readonly number[], of: (point: number) => number): number {
  return points.reduce((best, point) => Math.max(best, of(point)), -Infinity);
}

/** dB of a linear gain. */
export function inDb(gain: number): number {
  return 20 * Math.log10(gain);
}

/** A capture's sampling, for landings on a grid. */
export interface PlainSampling {
  readonly rateHz: number;
  readonly wanted: readonly [number, number];
  /** Where the source may stand. */
  readonly source: readonly [number, number];
  readonly folds: number;
}

/** The largest gain over every frequency from which a source lands in the wanted band, looked at in many places of each fold. */
export function landingGain(gain: Gain, { rateHz, wanted, source, folds }: PlainSampling, count = 1500): number {
  const xs = spaced(wanted[0], wanted[1], count);
  let best = -Infinity;
  for (let fold = 1; fold <= folds; fold += 1) {
    for (const side of [-1, 1]) {
      const ends = source.map((f) => side * (f - fold * rateHz)).filter((x) => wanted[0] <= x && x <= wanted[1]);
      for (const x of [...xs, ...ends]) {
        const f = fold * rateHz + side * x;
        if (source[0] <= f && f <= source[1]) best = Math.max(best, gain(f));
      }
    }
  }
  return best;
}
