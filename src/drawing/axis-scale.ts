/** The mapping between an axis' values and pixels, linear or logarithmic. */

/** An axis on the screen. */
export interface AxisScale {
  readonly low: number;
  readonly high: number;
  readonly kind: 'log' | 'linear';
  /** The pixel of `low`. */
  readonly from: number;
  /** The pixel of `high`. */
  readonly to: number;
}

/** The pixel of a value; on a logarithmic axis values of zero and below lie far off its low end. */
export function toPixel(scale: AxisScale, value: number): number {
  return scale.from + shareOf(scale, value) * (scale.to - scale.from);
}

/** The value at a pixel. */
export function toValue(scale: AxisScale, pixel: number): number {
  const share = (pixel - scale.from) / (scale.to - scale.from);
  if (scale.kind === 'linear') return scale.low + share * (scale.high - scale.low);
  return scale.low * (scale.high / scale.low) ** share;
}

/** How far off the low end a value that a logarithmic axis cannot show is put, as a share of its length. */
const farOff = -4;

function shareOf({ low, high, kind }: AxisScale, value: number): number {
  if (kind === 'linear') return (value - low) / (high - low);
  return value > 0 ? Math.max(farOff, Math.log(value / low) / Math.log(high / low)) : farOff;
}
