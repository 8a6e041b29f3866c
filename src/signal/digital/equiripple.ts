/** The exchange algorithm: symmetric taps whose weighted error over bands is as small as can be. */
import { alternating, type ErrorPoint } from './alternation';
import { cosinePolynomial, cosineWeights } from './barycentric';
import { errorExtremes } from './error-extremes';
import { firstNodes, stretchedNodes } from './first-nodes';
import { tapsFromAmplitude } from './taps-from-amplitude';

/** A band, in shares of the rate, with what is wanted there. */
export interface WantedBand {
  readonly low: number;
  readonly high: number;
  /** The amplitude that is wanted at a share. */
  readonly desired: (share: number) => number;
  /** What its error is multiplied by, above 0. */
  readonly weight: (share: number) => number;
}

/** Taps, the largest weighted error over all bands, and where that is reached with alternating signs. */
export interface Equiripple {
  readonly taps: readonly number[];
  readonly deviation: number;
  readonly extremes: readonly ErrorPoint[];
}

/** The largest error may exceed the alternating one by this, relatively: the exact answer lies between the two. */
const agreement = 1e-11;
/** An error of this size, relative to the gain, is rounding. */
const nothing = 1e-14;
/** Up to here a design starts from places that are known beforehand, and settles. */
const startSize = 16;
/** How closely a shorter design settles that only serves as a start. */
const roughly = 0.01;
const roundLimit = 100;

/**
 * Even-symmetric taps with the smallest possible largest error |weight·(desired − amplitude)| over bands.
 *
 * The amplitude is held by its values in barycentric form; the extremes of the error are found on a grid and moved to their true places,
 * so that the answer does not depend on the grid. It is the exact minimax to rounding.
 *
 * @param count how many taps, from 1; an even number has no gain at half the rate.
 * @param bands ascending and apart within 0 … 0.5, at least one; each of some width.
 * @returns deviation 0 where the taps can do it exactly.
 * @throws RangeError for bands or a number of taps that do not make sense, or where rounding swamps the error.
 * Source: T. W. Parks, J. H. McClellan, Chebyshev approximation for nonrecursive digital filters with linear phase (1972); E. Remez (1934).
 * @example equiripple(3, [{ low: 0, high: 0.1, desired: () => 1, weight: () => 1 }, { low: 0.4, high: 0.5, desired: () => 0, weight: () => 1 }]).taps[1] // 0.5
 */
export function equiripple(count: number, bands: readonly WantedBand[]): Equiripple {
  checkDesign(count, bands);
  const { fit, deviation, extremes } = settled(count, bands, agreement);
  return { taps: fit.taps(), deviation, extremes };
}

interface Settled {
  readonly fit: Fit;
  readonly deviation: number;
  readonly extremes: readonly ErrorPoint[];
}

/** Exchanges extremes for nodes until the largest error is the alternating one to a share of it. */
function settled(count: number, bands: readonly WantedBand[], closeness: number): Settled {
  const size = Math.ceil(count / 2);
  let nodes = size > startSize ? nodesFromShorter(count, bands) : firstNodes(bands, size + 1);
  for (let round = 0; round < roundLimit; round += 1) {
    const fit = new Fit(nodes, count, bands);
    const found = errorExtremes((x) => fit.error(x), bands, size + 1, nodes);
    const largest = found.reduce((most, { error }) => Math.max(most, Math.abs(error)), 0);
    const extremes = alternating(found, size + 1);
    if (largest <= nothing * fit.scale) return { fit, deviation: 0, extremes: [] };
    if (Math.abs(largest - fit.level) <= closeness * fit.level + nothing * fit.scale)
      return { fit, deviation: largest, extremes };
    if (!Number.isFinite(largest)) break;
    nodes = extremes.length > size ? extremes.map(({ x }) => x) : withPlace(nodes, found);
  }
  throw new RangeError(`The design with ${count} taps did not settle: its error is lost in rounding.`);
}

/** Nodes at which there is no error at all say nothing: the worst place takes the place of its nearest node. */
function withPlace(nodes: readonly number[], found: readonly ErrorPoint[]): readonly number[] {
  const worst = found.reduce((one, other) => (Math.abs(other.error) > Math.abs(one.error) ? other : one));
  const distances = nodes.map((x) => Math.abs(x - worst.x));
  const nearest = distances.indexOf(Math.min(...distances));
  return nodes.map((x, index) => (index === nearest ? worst.x : x));
}

/** Extremes of a best approximation are spread alike at every length: those of half the length, with places put in between. */
function nodesFromShorter(count: number, bands: readonly WantedBand[]): readonly number[] {
  const wanted = Math.ceil(count / 2) + 1;
  const { extremes } = settled(2 * Math.floor(count / 4) + (count % 2), bands, roughly);
  if (extremes.length === 0) return firstNodes(bands, wanted);
  return stretchedNodes(
    bands.map(({ low, high }) => extremes.map(({ x }) => x).filter((x) => low <= x && x <= high)),
    wanted,
  );
}

/** The amplitude whose weighted error alternates with one size over the nodes. */
class Fit {
  /** That size. */
  readonly level: number;
  /** The largest weighted amplitude that is wanted at a node, which rounding is measured by. */
  readonly scale: number;
  private readonly weights: readonly number[];
  private readonly values: readonly number[];

  constructor(
    private readonly nodes: readonly number[],
    private readonly count: number,
    private readonly bands: readonly WantedBand[],
  ) {
    this.weights = cosineWeights(nodes);
    const wanted = nodes.map((x) => this.wantedAt(x));
    const factors = nodes.map((x) => factor(count, x));
    let above = 0;
    let below = 0;
    wanted.forEach(({ desired, weight }, index) => {
      const share = this.weights[index] ?? 0;
      const q = factors[index] ?? 1;
      above += (share * desired) / q;
      below += (share * alternate(index)) / (weight * q);
    });
    const level = above / below;
    this.level = Math.abs(level);
    this.scale = wanted.reduce((most, { desired, weight }) => Math.max(most, Math.abs(desired * weight)), 0);
    this.values = wanted.map(
      ({ desired, weight }, index) => (desired - (alternate(index) * level) / weight) / (factors[index] ?? 1),
    );
  }

  error(x: number): number {
    const { desired, weight } = this.wantedAt(x);
    return weight * (desired - this.amplitude(x));
  }

  taps(): readonly number[] {
    return tapsFromAmplitude((x) => this.amplitude(x), this.count);
  }

  private amplitude(x: number): number {
    return factor(this.count, x) * cosinePolynomial(this.nodes, this.weights, this.values, x);
  }

  private wantedAt(x: number): { readonly desired: number; readonly weight: number } {
    const band = this.bands.find(({ low, high }) => low <= x && x <= high);
    return { desired: band?.desired(x) ?? 0, weight: band?.weight(x) ?? 0 };
  }
}

/** What every amplitude has in common: nothing with an odd number of taps, cos πx with an even one. */
function factor(count: number, x: number): number {
  return count % 2 === 1 ? 1 : Math.cos(Math.PI * x);
}

function alternate(index: number): number {
  return index % 2 === 0 ? 1 : -1;
}

function checkDesign(count: number, bands: readonly WantedBand[]): void {
  if (!(Number.isInteger(count) && count >= 1))
    throw new RangeError(`The number of taps must be a whole number from 1, not ${count}.`);
  if (bands.length === 0) throw new RangeError('A design needs at least one band.');
  let end = -1;
  for (const { low, high, desired, weight } of bands) {
    if (!(low >= 0 && low > end && high > low && high <= 0.5))
      throw new RangeError(`Bands must ascend within 0 … 0.5 of the rate and lie apart; ${low} … ${high} does not.`);
    end = high;
    const ends = [low, (low + high) / 2, high];
    if (!ends.every((x) => Number.isFinite(desired(x)) && weight(x) > 0 && weight(x) < Infinity))
      throw new RangeError(`What is wanted over ${low} … ${high} must be finite, and its weight above 0.`);
    if (count % 2 === 0 && high === 0.5 && desired(0.5) !== 0)
      throw new RangeError('An even number of taps has no gain at half the rate: take an odd number.');
  }
}
