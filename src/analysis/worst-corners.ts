/** The corners at which a figure that is no single gain, such as a noise sum over a tone, is worst: every end, and what lies between. */
import type { ChannelPath } from './channel-path';
import { cornerSets } from './corners';
import type { Corners } from './corners';
import { withFactor } from './stage-setting';
import { factorsOf, varies } from './tolerances';

/** How many points between the ends of a corner are looked at before the best is refined. */
const insidePoints = 7;

/** Steps of the refinement; each narrows the bracket to 0.618 of itself. */
const goldenSteps = 14;

const golden = (Math.sqrt(5) - 1) / 2;

/**
 * The corners with the largest measure among all ends, further sets and, stage by stage, what lies between the ends: a ripple, a notch or
 * the flank of a band-pass may be worst there. Parts and Qs are taken at their ends.
 */
export function worstCorners(path: ChannelPath, further: readonly Corners[], measure: (corners: Corners) => number): Corners {
  let worst: Corners = [];
  let most = -Infinity;
  const note = (corners: Corners): number => {
    const measured = measure(corners);
    if (measured > most || worst.length === 0) [worst, most] = [corners, measured];
    return measured;
  };
  for (const corners of [...cornerSets(path), ...further]) note(corners);
  path.stages.forEach(({ stage }, index) => {
    if (!varies(stage.cornerTolerance)) return;
    const { low, high } = factorsOf(stage.cornerTolerance);
    const others = worst;
    const at = (factor: number): number =>
      note(others.map((known, position) => (position === index ? withFactor(known, factor) : known)));
    refine(at, low, high);
  });
  return worst;
}

/** Evenly spaced points, then a golden section about the best of them. */
function refine(at: (factor: number) => number, low: number, high: number): void {
  const step = (high - low) / (insidePoints + 1);
  const points = Array.from({ length: insidePoints }, (_, index) => low + (index + 1) * step);
  const best = points.map((factor) => ({ factor, value: at(factor) })).reduce((a, b) => (b.value > a.value ? b : a));
  let [from, to] = [best.factor - step, best.factor + step];
  let [left, right] = [to - golden * (to - from), from + golden * (to - from)];
  let [atLeft, atRight] = [at(left), at(right)];
  for (let count = 0; count < goldenSteps; count++) {
    if (atLeft > atRight) {
      [to, right, atRight] = [right, left, atLeft];
      left = to - golden * (to - from);
      atLeft = at(left);
    } else {
      [from, left, atLeft] = [left, right, atRight];
      right = from + golden * (to - from);
      atRight = at(right);
    }
  }
}
