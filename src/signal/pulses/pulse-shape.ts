/** The shapes a pulse may have, with their lengths in seconds, and which lengths make sense. */

/** A pulse on [0, width] with height 1 at its highest; `linear` is the triangle of base 2·period that draws straight lines from sample to sample. */
export type PulseShape =
  | { readonly shape: 'rectangle' | 'triangle' | 'half-sine' | 'split'; readonly widthSeconds: number }
  /** `edgeSeconds`: the length of each of the two edges, within the width; at most half of it. */
  | { readonly shape: 'raised-cosine' | 'trapezoid'; readonly widthSeconds: number; readonly edgeSeconds: number }
  /** `decaySeconds`: the time constant; cut off at the width. */
  | { readonly shape: 'exponential'; readonly widthSeconds: number; readonly decaySeconds: number }
  | { readonly shape: 'linear'; readonly periodSeconds: number };

/** Two edges may exceed the width by this, relatively: lengths that come from decimal fractions. */
const edgeSlack = 1e-12;

/**
 * Hands a shape back if its lengths make sense: all above 0 s and finite; an edge may be 0 s and is at most half the width.
 *
 * @example checkedPulse({ shape: 'triangle', widthSeconds: 2 }).widthSeconds // 2
 */
export function checkedPulse<Shape extends PulseShape>(shape: Shape): Shape {
  for (const length of lengthsOf(shape)) {
    if (!(length > 0) || length === Infinity) throw new RangeError(`The lengths of a pulse must be above 0 s, not ${length}.`);
  }
  if ('edgeSeconds' in shape) {
    const { edgeSeconds, widthSeconds } = shape;
    if (!(edgeSeconds >= 0 && edgeSeconds <= 0.5 * widthSeconds * (1 + edgeSlack)))
      throw new RangeError(`Each edge of a pulse takes from 0 s to half its width, not ${edgeSeconds} of ${widthSeconds}.`);
  }
  return shape;
}

function lengthsOf(shape: PulseShape): readonly number[] {
  switch (shape.shape) {
    case 'linear':
      return [shape.periodSeconds];
    case 'exponential':
      return [shape.widthSeconds, shape.decaySeconds];
    default:
      return [shape.widthSeconds];
  }
}
