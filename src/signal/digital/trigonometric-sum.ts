/** Sums of cosines and sines of the frequency: what the gain of a filter with finitely many taps is made of. */

/** One term: cosine·cos(2π·order·x) + sine·sin(2π·order·x). */
export interface TrigonometricTerm {
  /** ≥ 0, whole or half. */
  readonly order: number;
  readonly cosine: number;
  readonly sine: number;
}

/** Such a sum over x, a share of the rate. */
export class TrigonometricSum {
  /** The sum of the sizes of its terms: no value is larger. */
  readonly size: number;
  readonly highestOrder: number;

  /** @param terms in any sequence; none is the constant 0. */
  constructor(readonly terms: readonly TrigonometricTerm[]) {
    this.size = terms.reduce((sum, { cosine, sine }) => sum + Math.hypot(cosine, sine), 0);
    this.highestOrder = terms.reduce((most, { order }) => Math.max(most, order), 0);
  }

  /** How far a value may be off by rounding. */
  get rounding(): number {
    return 1e-15 * (4 + this.highestOrder) * this.size;
  }

  /** Its value. */
  at(x: number): number {
    let sum = 0;
    for (const { order, cosine, sine } of this.terms) {
      const angle = 2 * Math.PI * (order * x - Math.round(order * x));
      sum += cosine * Math.cos(angle);
      if (sine !== 0) sum += sine * Math.sin(angle);
    }
    return sum;
  }

  /** Its derivative by x. */
  derivative(): TrigonometricSum {
    return new TrigonometricSum(
      this.terms
        .filter(({ order }) => order > 0)
        .map(({ order, cosine, sine }) => ({ order, cosine: 2 * Math.PI * order * sine, sine: -2 * Math.PI * order * cosine })),
    );
  }

  /**
   * The coefficients of its Taylor series about x in powers of (step from x)/width, up to the given power. With a width of at most
   * 1/(2π·highestOrder) what is left out is below size/(power + 1)! on the first width.
   */
  taylor(x: number, width: number, power: number): Float64Array {
    const coefficients = new Float64Array(power + 1);
    for (const { order, cosine, sine } of this.terms) {
      const angle = 2 * Math.PI * (order * x - Math.round(order * x));
      let even = cosine * Math.cos(angle) + sine * Math.sin(angle);
      let odd = sine * Math.cos(angle) - cosine * Math.sin(angle);
      const step = 2 * Math.PI * order * width;
      // Derivatives by the angle run even, odd, −even, −odd; the power of the step over the factorial is carried along.
      for (let k = 0; k <= power; k += 1) {
        coefficients[k] = (coefficients[k] ?? 0) + even;
        const next = -even;
        even = (odd * step) / (k + 1);
        odd = (next * step) / (k + 1);
      }
    }
    return coefficients;
  }
}
