/** The outline of a fold ribbon: from a stretch of the input straight down, over, and straight down onto the place where it lands. */
import type { Ribbon } from '../protocol/picture';
import { toPixel } from './axis-scale';
import type { PaneFrame } from './frame';
import type { Step } from './primitive';

/** The narrowest that either end of a ribbon is drawn, so that none vanishes. */
const leastWidth = 2;

/** The outline; an inverted fold crosses its edges, so that the twist itself says "turned round". */
export function ribbonSteps(ribbon: Ribbon, above: PaneFrame, below: PaneFrame): Step[] {
  const [left, right] = widened(toPixel(above.x, ribbon.lowHz), toPixel(above.x, ribbon.highHz));
  const [landsLeft, landsRight] = widened(toPixel(below.x, ribbon.landsLowHz), toPixel(below.x, ribbon.landsHighHz));
  const [fromLeft, fromRight] = ribbon.inverted ? [landsRight, landsLeft] : [landsLeft, landsRight];
  const top = above.box.bottom;
  const bottom = below.box.top;
  const bend = (bottom - top) * 0.55;
  return [
    ['M', left, top],
    ['C', left, top + bend, fromLeft, bottom - bend, fromLeft, bottom],
    ['L', fromRight, bottom],
    ['C', fromRight, bottom - bend, right, top + bend, right, top],
    ['Z'],
  ];
}

function widened(low: number, high: number): readonly [number, number] {
  const lacking = Math.max(0, leastWidth - (high - low)) / 2;
  return [low - lacking, high + lacking];
}

/** Whether a point lies on a ribbon: between its two edges at that height. */
export function onRibbon(ribbon: Ribbon, above: PaneFrame, below: PaneFrame, x: number, y: number): boolean {
  const top = above.box.bottom;
  const bottom = below.box.top;
  if (y < top || y > bottom) return false;
  const over = eased((y - top) / (bottom - top));
  const [left, right] = widened(toPixel(above.x, ribbon.lowHz), toPixel(above.x, ribbon.highHz));
  const [landsLeft, landsRight] = widened(toPixel(below.x, ribbon.landsLowHz), toPixel(below.x, ribbon.landsHighHz));
  const [endOfLeft, endOfRight] = ribbon.inverted ? [landsRight, landsLeft] : [landsLeft, landsRight];
  const one = left + (endOfLeft - left) * over;
  const other = right + (endOfRight - right) * over;
  return x >= Math.min(one, other) - 1 && x <= Math.max(one, other) + 1;
}

/** How far across the curve of `ribbonSteps` is at a share of its height; its control points stand at 0.55 and 0.45 of it. */
function eased(height: number): number {
  let low = 0;
  let high = 1;
  for (let step = 0; step < 24; step += 1) {
    const t = (low + high) / 2;
    const y = 3 * (1 - t) ** 2 * t * 0.55 + 3 * (1 - t) * t ** 2 * 0.45 + t ** 3;
    if (y < height) low = t;
    else high = t;
  }
  return 3 * (1 - low) * low ** 2 + low ** 3;
}
