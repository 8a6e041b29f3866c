/** The largest H(f)/H(r) of a series resistor and coil and a shunt capacitor over every value that the parts may have, exact, with proved bounds. */
import { dividedBy, negated } from './interval-arithmetic';
import type { RatioSlopes } from './factor-ratio';
import type { Enclosure } from './response';

/** The parts as factors on their nominal values. */
export interface PartFactors {
  readonly r: number;
  readonly l: number;
  readonly c: number;
}

/** The range of each factor, above 0. */
export type PartRanges = Readonly<Record<keyof PartFactors, Enclosure>>;

/** Bounds are widened by this, in place of directed rounding. */
const logSlack = 1e-9;

/** n₀ + n₁·x + n₂·x² over d₀ + d₁·x + d₂·x². */
type Quadratics = readonly [n0: number, n1: number, n2: number, d0: number, d1: number, d2: number];

/**
 * With u = (f/f₀)², 1/|H|² = D = (1 − u·l·c)² + (u/Q²)·(r·c)², l, c, r the parts over their nominal values.
 *
 * For one product l·c the ratio D(r)/D(f) is a fraction of two straight lines in (r·c)², so that its extremes stand on the edges of the
 * range of l and c with r at an end. On an edge it is a fraction of two quadratics in one factor, whose two turning points are the roots of
 * a third: so every point is exact. The reference 0 Hz, where |H| is 1 whatever the parts, gives the gain itself.
 */
export class ResonanceRatio {
  /** @param naturalHz f₀ = 1/(2π√(LC)), > 0. @param q √(L/C)/R, > 0. */
  constructor(
    private readonly naturalHz: number,
    private readonly q: number,
    private readonly ranges: PartRanges,
  ) {}

  /** The largest ratio at two frequencies, and the parts that make it. */
  at(frequencyHz: number, referenceHz: number): { readonly logGain: number; readonly parts: PartFactors } {
    if (frequencyHz === Infinity || referenceHz === Infinity) {
      const logGain = frequencyHz === referenceHz ? 0 : frequencyHz === Infinity ? -Infinity : Infinity;
      return { logGain, parts: this.nominal() };
    }
    const best = new Best(this.square(frequencyHz), this.square(referenceHz), this.q);
    const { r, l, c } = this.ranges;
    const nominal = this.nominal();
    best.look(nominal.r, nominal.l, nominal.c);
    for (const resistor of ends(r)) {
      for (const capacitor of ends(c)) best.lookAlongL(resistor, l, capacitor);
      for (const coil of ends(l)) best.lookAlongC(resistor, coil, c);
    }
    return { logGain: 0.5 * Math.log(best.ratio), parts: { r: best.r, l: best.l, c: best.c } };
  }

  /** A proved upper bound over boxes of both frequencies. */
  upper(frequencies: Enclosure, references: Enclosure): number {
    const crude = this.logRange(references, this.ranges).high - this.logRange(frequencies, this.ranges).low;
    const slopes = this.slopes(frequencies, references);
    if (slopes === null) return crude + logSlack;
    const reach = ({ low, high }: Enclosure, slope: Enclosure): number => 0.5 * (high - low) * Math.max(slope.high, -slope.low);
    const middle = this.at(middleOf(frequencies), middleOf(references)).logGain;
    return Math.min(crude, middle + reach(frequencies, slopes.frequency) + reach(references, slopes.reference)) + logSlack;
  }

  /** A lower bound over boxes: what the nominal parts give. */
  lower(frequencies: Enclosure, references: Enclosure): number {
    const { r, l, c } = this.nominal();
    const still: PartRanges = { r: { low: r, high: r }, l: { low: l, high: l }, c: { low: c, high: c } };
    return this.logRange(references, still).low - this.logRange(frequencies, still).high - logSlack;
  }

  /** Enclosures of the slopes in f and r over finite boxes that do not begin at 0 Hz, unless they are that alone; else null. */
  slopes(frequencies: Enclosure, references: Enclosure): RatioSlopes | null {
    const frequency = this.slope(frequencies);
    const reference = this.slope(references);
    return frequency === null || reference === null ? null : { frequency, reference: negated(reference) };
  }

  /** d ln|H|/df = (2U(1 − U) − E)/D/f with U = u·l·c and E = (u/Q²)·(r·c)², of which both have ranges. */
  private slope(frequencies: Enclosure): Enclosure | null {
    if (frequencies.high === 0) return { low: 0, high: 0 };
    if (frequencies.low === 0 || frequencies.high === Infinity) return null;
    const { product, damping } = this.terms(frequencies, this.ranges);
    const values = [damping.low, damping.high].flatMap((e) => {
      const root = Math.sqrt(e * e + 4 * e);
      const turns = [1 + 0.5 * (e - root), 1 + 0.5 * (e + root)].filter((u) => product.low < u && u < product.high);
      return [product.low, product.high, ...turns].map((u) => (2 * u * (1 - u) - e) / ((1 - u) ** 2 + e));
    });
    const slope = dividedBy({ low: Math.min(...values), high: Math.max(...values) }, frequencies);
    const slack = logSlack * (Math.abs(slope.low) + Math.abs(slope.high));
    return { low: slope.low - slack, high: slope.high + slack };
  }

  /** An enclosure of ln √D. */
  private logRange(frequencies: Enclosure, ranges: PartRanges): Enclosure {
    const { product, damping } = this.terms(frequencies, ranges);
    const [atLow, atHigh] = [(1 - product.low) ** 2, (1 - product.high) ** 2];
    const least = product.low < 1 && 1 < product.high ? 0 : Math.min(atLow, atHigh);
    return { low: 0.5 * Math.log(least + damping.low), high: 0.5 * Math.log(Math.max(atLow, atHigh) + damping.high) };
  }

  private terms(frequencies: Enclosure, { r, l, c }: PartRanges): { readonly product: Enclosure; readonly damping: Enclosure } {
    const [low, high] = [this.square(frequencies.low), this.square(frequencies.high)];
    return {
      product: { low: low * l.low * c.low, high: high * l.high * c.high },
      damping: { low: (low * (r.low * c.low) ** 2) / this.q ** 2, high: (high * (r.high * c.high) ** 2) / this.q ** 2 },
    };
  }

  private square(frequencyHz: number): number {
    return (frequencyHz / this.naturalHz) ** 2;
  }

  private nominal(): PartFactors {
    const nearest = ({ low, high }: Enclosure): number => Math.min(Math.max(1, low), high);
    return { r: nearest(this.ranges.r), l: nearest(this.ranges.l), c: nearest(this.ranges.c) };
  }
}

/** Both ends, or the one value there is. */
function ends({ low, high }: Enclosure): readonly number[] {
  return low === high ? [low] : [low, high];
}

/** The largest D(r)/D(f) of all parts that were looked at; in plain numbers, because a search asks for it some thousand times. */
class Best {
  ratio = -Infinity;
  r = 1;
  l = 1;
  c = 1;

  /** @param u (f/f₀)². @param v (r/f₀)². */
  constructor(
    private readonly u: number,
    private readonly v: number,
    private readonly q: number,
  ) {}

  look(r: number, l: number, c: number): void {
    const damping = ((r * c) / this.q) ** 2;
    const ratio = ((1 - this.v * l * c) ** 2 + this.v * damping) / ((1 - this.u * l * c) ** 2 + this.u * damping);
    if (ratio > this.ratio) [this.ratio, this.r, this.l, this.c] = [ratio, r, l, c];
  }

  /** The ends and turning points of an edge along the coil: D = 1 + w·(r·c/Q)² − 2w·c·l + (w·c)²·l². */
  lookAlongL(r: number, { low, high }: Enclosure, c: number): void {
    this.look(r, low, c);
    this.look(r, high, c);
    const { u, v } = this;
    const damping = ((r * c) / this.q) ** 2;
    const [n1, n2, d1, d2] = [-2 * v * c, (v * c) ** 2, -2 * u * c, (u * c) ** 2];
    this.turn(
      (l) => {
        this.look(r, l, c);
      },
      { low, high },
      [1 + v * damping, n1, n2, 1 + u * damping, d1, d2],
    );
  }

  /** The same along the capacitor: D = 1 − 2w·l·c + ((w·l)² + w·(r/Q)²)·c². */
  lookAlongC(r: number, l: number, { low, high }: Enclosure): void {
    this.look(r, l, low);
    this.look(r, l, high);
    const { u, v } = this;
    const damping = (r / this.q) ** 2;
    const [n1, n2, d1, d2] = [-2 * v * l, (v * l) ** 2 + v * damping, -2 * u * l, (u * l) ** 2 + u * damping];
    this.turn(
      (c) => {
        this.look(r, l, c);
      },
      { low, high },
      [1, n1, n2, 1, d1, d2],
    );
  }

  /** Looks where a fraction of two quadratics turns inside a range: at the roots of N′D − ND′. */
  private turn(look: (x: number) => void, { low, high }: Enclosure, [n0, n1, n2, d0, d1, d2]: Quadratics): void {
    if (low === high) return;
    const a = n2 * d1 - n1 * d2;
    const b = n2 * d0 - n0 * d2;
    const c = n1 * d0 - n0 * d1;
    const far = -(b + (b < 0 ? -1 : 1) * Math.sqrt(Math.max(0, b * b - a * c)));
    if (low < far / a && far / a < high) look(far / a);
    if (low < c / far && c / far < high) look(c / far);
  }
}

function middleOf({ low, high }: Enclosure): number {
  return low + 0.5 * (high - low);
}
