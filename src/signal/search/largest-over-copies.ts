/** The proved largest gain over every copy of a sampled signal, of both signs and to infinity, where each copy may have its own weight. */
import type { Enclosure, Response } from '../response';
import { copyPieces, type CopyPiece } from './copy-places';
import type { Extreme, SearchOptions } from './extreme';
import { Frontier, type Node } from './frontier';
import { gapOf, toNepers } from './gap';
import { curveOf, openInterval, type Curve } from './interval';
import { largestOverBands } from './largest-over-bands';

/** What bounds copies: a constant, a gain at x and a gain at F. */
export interface CopyBound {
  readonly logWeight: number;
  readonly near: Response;
  readonly far: Response;
}

/** The largest gain over every x in the bands and every F = |x + j·rate| in the allowed intervals. */
export interface CopyQuestion {
  readonly rateHz: number;
  /** Ranges of x; high may be Infinity. */
  readonly bands: readonly Enclosure[];
  /** Ranges of F; high may be Infinity. */
  readonly within: readonly Enclosure[];
  /** j runs over every whole number with firstCopy ≤ |j| ≤ lastCopy, of both signs or of one. */
  readonly signs: 'both' | 'positive' | 'negative';
  readonly firstCopy: number;
  /** Infinity allowed. */
  readonly lastCopy: number;
  /** The gain of copy j over x, on one branch. */
  gainOf(copy: number, piece: CopyPiece): Response;
  /** What bounds every copy with |j| ≥ first from above; `near` the same object wherever it is the same. */
  boundFrom(first: number): CopyBound;
  /** What the copies' gain comes to as j grows without end; null where it comes to nothing. */
  readonly limit: CopyBound | null;
}

/** A proved maximum over copies. */
export interface CopyExtreme extends Extreme {
  /** The x; `frequencyHz` is the same. */
  readonly nearHz: number;
  /** F; Infinity where the largest gain is only approached. */
  readonly farHz: number;
  /** j; Infinity where the largest gain is only approached. */
  readonly copy: number;
}

/** So many copies are looked at one by one. */
const fewCopies = 3;

/** A bound over a band is found this closely, in dB, so that a run of equal copies is settled by its first. */
const nearGapDb = 2e-4;

/**
 * The largest gain over every copy, proved: the copies one by one while they can win, all further ones by one bound.
 *
 * @param question rate > 0 in Hz.
 * @returns null where no copy of a band stands in an allowed interval.
 * Source: interval branch and bound, common practice.
 * @example largestOverCopies({ rateHz: 10, bands: [{ low: 0, high: 3 }], within: [{ low: 0, high: Infinity }], signs: 'both', firstCopy: 1, lastCopy: Infinity, gainOf: (copy, { axis }) => alongCopy(rectangleResponse(0.05), axis), boundFrom: () => ({ logWeight: 0, near: constantResponse(0), far: rectangleResponse(0.05) }), limit: null }).farHz // 7
 */
export function largestOverCopies(question: CopyQuestion, options: SearchOptions = {}): CopyExtreme | null {
  if (!(question.rateHz > 0 && question.rateHz < Infinity))
    throw new RangeError(`A rate must be above 0 Hz, not ${question.rateHz}.`);
  const search = new CopySearch(question, new Frontier(toNepers(options.gapDb), options.evaluationLimit));
  return search.run();
}

/** One copy's curve over x. */
interface Opened {
  readonly copy: number;
  farOf(x: number): number;
}

class CopySearch {
  private readonly opened: Opened[] = [];
  private readonly nearBounds = new Map<Response, readonly (Extreme | null)[]>();
  /** Where the near gain was last found to be largest, band by band. */
  private probes: readonly number[] = [];

  constructor(
    private readonly question: CopyQuestion,
    readonly frontier: Frontier,
  ) {}

  run(): CopyExtreme | null {
    const { bands, within, firstCopy, lastCopy, rateHz } = this.question;
    if (bands.length === 0 || within.length === 0) return null;
    const lowest = Math.min(...within.map((one) => one.low)) - Math.max(...bands.map((band) => band.high));
    const highest = Math.max(...within.map((one) => one.high)) + Math.max(...bands.map((band) => band.high));
    const first = Math.max(firstCopy, Number.isFinite(lowest) ? Math.floor(lowest / rateHz) : 0);
    const last = Math.min(lastCopy, Math.ceil(highest / rateHz));
    // The few copies that a tone at one frequency can have need no bound together.
    if (last - first <= fewCopies) for (let copy = first; copy <= last; copy += 1) this.openBoth(copy);
    else this.openRun(first, last, 1);
    const logGain = this.frontier.prove();
    const { best, bestHz, bestTag, evaluations } = this.frontier;
    const found = this.opened[bestTag];
    if (found === undefined) return null;
    return {
      logGain,
      frequencyHz: bestHz,
      nearHz: bestHz,
      farHz: found.farOf(bestHz),
      copy: found.copy,
      gapDb: gapOf(logGain, best),
      evaluations,
    };
  }

  /** Opens the copies with first ≤ |j| ≤ last, bounded together; `length` is how many to split off first. */
  openRun(first: number, last: number, length: number): void {
    if (first > last) return;
    if (first === last || first === 0) {
      this.openBoth(first);
      this.openRun(first + 1, last, length);
      return;
    }
    const upper = this.upper(first, last);
    if (this.frontier.mayWin(upper)) this.frontier.open(new RunNode(this, first, last, length, upper));
  }

  /** Notes what is approached at infinity. */
  noteInfinity(): void {
    const { limit, bands } = this.question;
    if (limit === null) return;
    const atInfinity = limit.logWeight + limit.far.logGain(Infinity);
    for (const extreme of this.nearMaxima(limit.near, bands)) {
      if (extreme === null || this.question.within.every((one) => one.high < Infinity)) continue;
      this.frontier.evaluations += 1;
      const value = atInfinity + limit.near.logGain(extreme.frequencyHz);
      if (value > this.frontier.best)
        this.frontier.note(
          value,
          extreme.frequencyHz,
          this.tag(Infinity, () => Infinity),
        );
    }
  }

  /** Opens copy j of both signs, as far as they are asked for; copy 0 has one. */
  private openBoth(copy: number): void {
    const { signs } = this.question;
    if (signs !== 'negative') this.openCopy(copy);
    if (signs !== 'positive' && copy !== 0) this.openCopy(-copy);
  }

  private openCopy(copy: number): void {
    for (const band of this.question.bands) {
      for (const within of this.question.within) {
        for (const piece of copyPieces(copy, this.question.rateHz, band, within)) {
          const { offsetHz, direction } = piece.axis;
          const tag = this.tag(copy, (x) => Math.max(0, offsetHz + direction * x));
          this.openPiece(curveOf(this.question.gainOf(copy, piece), tag), piece.range);
        }
      }
    }
  }

  /** A piece that cannot win is left after one bound, and one that may is first looked at where its near gain is largest. */
  private openPiece(curve: Curve, range: Enclosure): void {
    const { frontier } = this;
    if (range.low < range.high && frontier.best > -Infinity) {
      frontier.evaluations += 1;
      if (!frontier.mayWin(curve.upper(range.low, range.high))) return;
    }
    for (const x of this.probes) {
      if (!(range.low <= x && x <= range.high)) continue;
      frontier.evaluations += 1;
      frontier.note(curve.logGain(x), x, curve.tag);
    }
    openInterval(frontier, curve, range.low, range.high);
  }

  /** An upper bound over every copy with first ≤ |j| ≤ last: x and F together reach j·rate, so one of them is far out. */
  private upper(first: number, last: number): number {
    const { bands, within, rateHz } = this.question;
    const { logWeight, near, far } = this.question.boundFrom(first);
    const maxima = this.nearMaxima(near, bands);
    const reach = first * rateHz;
    const bounds = bands.flatMap((band, index) =>
      within.map((allowed) => {
        this.frontier.evaluations += 1;
        const most = maxima[index]?.logGain ?? -Infinity;
        const farHigh = Math.min(allowed.high, last * rateHz + band.high);
        const farFrom = (low: number): number => (low > farHigh ? -Infinity : far.bounds(low, farHigh).high);
        const beside = band.high === Infinity ? Infinity : most + farFrom(Math.max(allowed.low, reach - band.high));
        const half = Math.max(band.low, 0.5 * reach);
        const besides = Math.max(
          most + farFrom(Math.max(allowed.low, 0.5 * reach)),
          half > band.high ? -Infinity : near.bounds(half, band.high).high + farFrom(allowed.low),
        );
        return Math.min(beside, besides);
      }),
    );
    return logWeight + Math.max(-Infinity, ...bounds);
  }

  private nearMaxima(near: Response, bands: readonly Enclosure[]): readonly (Extreme | null)[] {
    const known = this.nearBounds.get(near);
    if (known !== undefined) return known;
    const found = bands.map((band) => largestOverBands(near, [band], { gapDb: nearGapDb }));
    for (const extreme of found) this.frontier.evaluations += extreme?.evaluations ?? 0;
    this.nearBounds.set(near, found);
    this.probes = found.flatMap((extreme) => extreme?.frequencyHz ?? []);
    return found;
  }

  private tag(copy: number, farOf: (x: number) => number): number {
    return this.opened.push({ copy, farOf }) - 1;
  }
}

class RunNode implements Node {
  constructor(
    private readonly search: CopySearch,
    private readonly first: number,
    private readonly last: number,
    private readonly length: number,
    readonly upper: number,
  ) {}

  split(): void {
    if (this.last === Infinity) this.search.noteInfinity();
    // Short runs first, since paths fall; doubling, since some do not.
    const count = Math.min(this.length, Math.ceil((this.last - this.first) / 2));
    const cut = this.first + count - 1;
    this.search.openRun(this.first, cut, Math.ceil(count / 2));
    this.search.openRun(cut + 1, this.last, this.length * 2);
  }
}
