/** The extremes of an error over bands: found on a grid, then finished between its points. */
import type { Enclosure } from '../response';
import type { ErrorPoint } from './alternation';
import { clusteredShare } from './clustered-shares';

/** Points of the first grid for each extreme that is expected. */
const density = 12;
/** Shares of the rate closer than this are one place: the error differs by its square. */
const closeEnough = 1e-10;
const stepLimit = 12;

/** A point of the error with the sign that makes it a top. */
interface Raised {
  readonly x: number;
  readonly height: number;
}

/**
 * Every local extreme of |error| over bands that a grid shows, each moved to its true place.
 *
 * @param error continuous in each band.
 * @param bands ascending, apart.
 * @param expected how many extremes there are at least.
 * @param known places that must not be passed over.
 * @returns ascending; ends of bands among them.
 * Source: successive parabolic interpolation, common practice.
 * @example errorExtremes((x) => x, [{ low: 0, high: 0.5 }], 2, []).at(-1).x // 0.5
 */
export function errorExtremes(
  error: (x: number) => number,
  bands: readonly Enclosure[],
  expected: number,
  known: readonly number[],
): readonly ErrorPoint[] {
  const total = bands.reduce((sum, { low, high }) => sum + high - low, 0);
  return bands.flatMap((band) => {
    const steps = density * (2 + Math.ceil((expected * (band.high - band.low)) / total));
    const inside = known.filter((x) => band.low < x && x < band.high);
    const regular = Array.from({ length: steps + 1 }, (_, step) => clusteredShare(band, step / steps));
    const grid = [...new Set([...regular, ...inside])].sort((a, b) => a - b);
    return peaksOf(
      grid.map((x) => ({ x, error: error(x) })),
      error,
    );
  });
}

function peaksOf(points: readonly ErrorPoint[], error: (x: number) => number): readonly ErrorPoint[] {
  return points.flatMap((point, index): readonly ErrorPoint[] => {
    const before = points[index - 1];
    const after = points[index + 1];
    const sign = Math.sign(point.error);
    const higher = (other: ErrorPoint | undefined): boolean => other !== undefined && sign * other.error > sign * point.error;
    if (sign === 0 || higher(before) || higher(after)) return [];
    return [finished(before ?? point, point, after ?? point, (x) => sign * error(x))];
  });
}

/** Successive parabolas through the highest point so far and its neighbours, kept between them; few steps, as the top is flat. */
function finished(before: ErrorPoint, top: ErrorPoint, after: ErrorPoint, height: (x: number) => number): ErrorPoint {
  const sign = Math.sign(top.error);
  const raised = ({ x, error }: ErrorPoint): Raised => ({ x, height: sign * error });
  let [low, best, high] = [raised(before), raised(top), raised(after)];
  for (let step = 0; step < stepLimit; step += 1) {
    const x = vertexOf(low, best, high);
    if (!(x > low.x && x < high.x) || Math.abs(x - best.x) < closeEnough) break;
    const tried = { x, height: height(x) };
    if (tried.height >= best.height) {
      if (x < best.x) high = best;
      else low = best;
      best = tried;
    } else if (x < best.x) low = tried;
    else high = tried;
  }
  return { x: best.x, error: sign * best.height };
}

/** Where the parabola through three points turns; NaN where they are not three. */
function vertexOf(low: Raised, best: Raised, high: Raised): number {
  const left = (best.x - low.x) * (best.height - high.height);
  const right = (best.x - high.x) * (best.height - low.height);
  return best.x - (0.5 * ((best.x - low.x) * left - (best.x - high.x) * right)) / (left - right);
}
