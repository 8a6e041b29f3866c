/** Every place where a trigonometric sum changes its sign, with the proof that there is no other. */
import type { TrigonometricSum } from './trigonometric-sum';

/** The power at which the Taylor series on a cell is cut: what is left out is below 1/19!, less than rounding. */
const power = 18;

/** A cell is halved this often at most; two changes closer than that are one place to every figure that is made of them. */
const deepest = 30;

/**
 * The shares of the rate, above 0 and below 0.5, where a sum changes its sign, ascending.
 *
 * The range is cut into cells so short that a Taylor polynomial is the sum to rounding. In Bernstein form no change of sign among its
 * coefficients proves that there is none of the polynomial, a single one that there is exactly one; else the cell is halved.
 *
 * @returns where values are as small as rounding there may be places too many, never one too few that counts.
 * Source: Descartes' rule in Bernstein form with de Casteljau's subdivision, common practice.
 * @example signChanges(new TrigonometricSum([{ order: 1, cosine: 1, sine: 0 }])).join() // '0.25'
 */
export function signChanges(sum: TrigonometricSum): readonly number[] {
  const cells = Math.max(1, Math.ceil(Math.PI * sum.highestOrder));
  const width = 0.5 / cells;
  const walk = new Walk(1e-16 * sum.size);
  for (let cell = 0; cell < cells; cell += 1) {
    walk.through(bernstein(sum.taylor(cell * width, width, power)), cell * width, width, 0);
  }
  return walk.places;
}

/** From left to right over cells; the last sign is kept, so that a change exactly between two cells is not lost. */
class Walk {
  readonly places: number[] = [];
  private sign = 0;

  constructor(private readonly nothing: number) {}

  through(coefficients: Float64Array, start: number, width: number, depth: number): void {
    const signs = this.signsOf(coefficients);
    const [first] = signs;
    const last = signs.at(-1);
    if (first === undefined || last === undefined) return;
    const changes = signs.filter((sign, index) => index > 0 && sign !== signs[index - 1]).length;
    if (changes > 1 && depth < deepest) {
      const [left, right] = halves(coefficients);
      this.through(left, start, width / 2, depth + 1);
      this.through(right, start + width / 2, width / 2, depth + 1);
      return;
    }
    if (this.sign !== 0 && first !== this.sign) this.places.push(start);
    if (changes > 0) this.places.push(start + width * placeIn(coefficients, first));
    this.sign = last;
  }

  private signsOf(coefficients: Float64Array): readonly number[] {
    return [...coefficients].filter((value) => Math.abs(value) > this.nothing).map(Math.sign);
  }
}

/** Bernstein coefficients on [0, 1] of a polynomial given by its powers: b_j = Σ_i C(j, i)/C(n, i)·a_i, by repeated sums. */
function bernstein(powers: Float64Array): Float64Array {
  const n = powers.length - 1;
  const out = new Float64Array(n + 1);
  for (let j = 0; j <= n; j += 1) {
    let ratio = 1;
    let sum = 0;
    for (let i = 0; i <= j; i += 1) {
      sum += ratio * (powers[i] ?? 0);
      ratio *= (j - i) / (n - i);
    }
    out[j] = sum;
  }
  return out;
}

/** Both halves by de Casteljau's scheme. */
function halves(coefficients: Float64Array): readonly [Float64Array, Float64Array] {
  const right = Float64Array.from(coefficients);
  const left = new Float64Array(coefficients.length);
  for (let level = 0; level < coefficients.length; level += 1) {
    left[level] = right[0] ?? 0;
    for (let i = 0; i + 1 < coefficients.length - level; i += 1) right[i] = ((right[i] ?? 0) + (right[i + 1] ?? 0)) / 2;
  }
  return [left, right];
}

/** The single change of sign on [0, 1], by halving. */
function placeIn(coefficients: Float64Array, firstSign: number): number {
  let low = 0;
  let high = 1;
  for (let halving = 0; halving < 53; halving += 1) {
    const middle = low + 0.5 * (high - low);
    if (Math.sign(valueAt(coefficients, middle)) === firstSign) low = middle;
    else high = middle;
  }
  return low + 0.5 * (high - low);
}

/** A polynomial in Bernstein form, by the scheme that multiplies as it goes. */
function valueAt(coefficients: Float64Array, t: number): number {
  const n = coefficients.length - 1;
  let binomial = 1;
  let rise = 1;
  let value = (coefficients[0] ?? 0) * (1 - t);
  for (let i = 1; i < n; i += 1) {
    rise *= t;
    binomial *= (n - i + 1) / i;
    value = (value + rise * binomial * (coefficients[i] ?? 0)) * (1 - t);
  }
  return value + rise * t * (coefficients[n] ?? 0);
}
