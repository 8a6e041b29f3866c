/** Turns the geometry of items from data units into outlines on the paper. */
import type { Points } from '../protocol/picture';
import { toPixel } from './axis-scale';
import type { PaneFrame } from './frame';
import type { Step } from './primitive';

/** How far outside its pane an outline may run before it is cut; far enough that no edge of it shows. */
const beyond = 4000;

/** An open line through the points. */
export function lineSteps(points: Points, pane: PaneFrame): Step[] {
  return points.x.map((x, index): Step => [index === 0 ? 'M' : 'L', ...pixelOf(x, points.y[index] ?? 0, pane)]);
}

/** What lies between a curve and another, or the bottom of the pane. */
export function areaSteps(upper: Points, lower: Points | null, pane: PaneFrame): Step[] {
  const there = lineSteps(upper, pane);
  const back = lower === null ? floorSteps(upper, pane) : lineSteps(lower, pane).reverse().map(onward);
  return there.length === 0 ? [] : [...there, ...back, ['Z']];
}

/** What lies beyond a boundary, up or down to the edge of the pane. */
export function beyondSteps(boundary: Points, side: 'above' | 'below', pane: PaneFrame): Step[] {
  const line = lineSteps(boundary, pane);
  const edge = side === 'above' ? pane.box.top : pane.box.bottom;
  return line.length === 0 ? [] : [...line, ...edgeSteps(boundary, pane, edge), ['Z']];
}

/** A pixel position, kept within a few screens of the pane. */
export function pixelOf(x: number, y: number, pane: PaneFrame): [number, number] {
  return [clamped(toPixel(pane.x, x), pane.box.left, pane.box.right), clamped(toPixel(pane.y, y), pane.box.top, pane.box.bottom)];
}

function floorSteps(upper: Points, pane: PaneFrame): Step[] {
  return edgeSteps(upper, pane, pane.box.bottom);
}

function edgeSteps(points: Points, pane: PaneFrame, edge: number): Step[] {
  const [first] = pixelOf(points.x[0] ?? 0, 0, pane);
  const [last] = pixelOf(points.x[points.x.length - 1] ?? 0, 0, pane);
  return [
    ['L', last, edge],
    ['L', first, edge],
  ];
}

function onward(step: Step): Step {
  return step[0] === 'M' ? ['L', step[1], step[2]] : step;
}

function clamped(pixel: number, low: number, high: number): number {
  return Math.min(high + beyond, Math.max(low - beyond, pixel));
}
