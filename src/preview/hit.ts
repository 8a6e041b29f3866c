/** Which item lies under a point of the paper: marks first, then curves, then fills from the smallest to the largest. */
import { toPixel, toValue } from '../drawing/axis-scale';
import type { Frame, PaneFrame } from '../drawing/frame';
import { levelAt } from '../drawing/level-at';
import { onRibbon } from '../drawing/ribbon';
import type { Item, Pane, Plot, Points, Shape } from '../protocol/picture';
import { readAt } from './reading';
import type { Reading } from './reading';

/** How near a pointer must come to a line, in pixels. */
const reach = 8;

/** The reading under a point, or null where nothing lies. */
export function hitAt(plot: Plot, frame: Frame, x: number, y: number): Reading | null {
  let best: { readonly item: Item; readonly pane: Pane; readonly rank: number } | null = null;
  for (const item of plot.items) {
    const pane = plot.panes.find((candidate) => candidate.id === item.pane);
    const place = frame.panes.find((candidate) => candidate.id === item.pane);
    if (pane === undefined || place === undefined) continue;
    const rank = Math.min(...item.shapes.map((shape) => rankOf(item, shape, place, frame, x, y)));
    if (rank < (best?.rank ?? Infinity)) best = { item, pane, rank };
  }
  const place = frame.panes.find((candidate) => candidate.id === best?.pane.id);
  return best === null || place === undefined ? null : readAt(best.item, toValue(place.x, x), best.pane);
}

/** The pane whose box holds a point, or the nearest one above it. */
export function paneAt(frame: Frame, y: number): PaneFrame | null {
  return frame.panes.filter((pane) => y >= pane.box.top - 20).at(-1) ?? frame.panes[0] ?? null;
}

/** How well a shape answers to a point; lower is better, Infinity not at all. */
function rankOf(item: Item, shape: Shape, pane: PaneFrame, frame: Frame, x: number, y: number): number {
  if (shape.kind === 'ribbon') {
    const below = frame.panes.find((candidate) => candidate.id === shape.landsPane);
    const on = below !== undefined && onRibbon(shape, pane, below, x, y);
    return on ? 100 + (item.role === 'harm' ? 0 : 2 - shape.strength) : Infinity;
  }
  const { left, right, top, bottom } = pane.box;
  if (x < left || x > right || y < top || y > bottom) return Infinity;
  switch (shape.kind) {
    case 'mark':
      return near(Math.hypot(toPixel(pane.x, shape.frequencyHz) - x, toPixel(pane.y, shape.level) - y), 0, reach + 4);
    case 'curve':
      return near(verticalDistance(shape.points, pane, x, y), 10, reach);
    case 'forbidden':
      return near(verticalDistance(shape.boundary, pane, x, y), 20, reach - 2);
    case 'stem':
    case 'rule':
      return near(Math.abs(toPixel(pane.x, shape.frequencyHz) - x), shape.kind === 'stem' ? 40 : 50, reach - 3);
    case 'block':
      return inBlock(shape, pane, x, y) ? 1000 + toPixel(pane.x, shape.highHz) - toPixel(pane.x, shape.lowHz) : Infinity;
    case 'area':
      return inArea(shape, pane, x, y) ? 900 + (shape.tone === 'pale' ? 50 : 0) : Infinity;
  }
}

function near(distance: number, rank: number, most: number): number {
  return distance <= most ? rank + distance / most : Infinity;
}

/** How far a point lies from a curve, looking up and down within a few pixels to either side. */
function verticalDistance(points: Points, pane: PaneFrame, x: number, y: number): number {
  const first = points.x[0];
  const last = points.x[points.x.length - 1];
  if (first === undefined || last === undefined) return Infinity;
  if (x < toPixel(pane.x, first) - 2 || x > toPixel(pane.x, last) + 2) return Infinity;
  const levels = [-3, 0, 3].map((aside) => toPixel(pane.y, levelAt(points, toValue(pane.x, x + aside))));
  const [low, high] = [Math.min(...levels), Math.max(...levels)];
  return Math.max(0, low - y, y - high);
}

function inBlock(shape: Shape & { readonly kind: 'block' }, pane: PaneFrame, x: number, y: number): boolean {
  const [left, right] = [toPixel(pane.x, shape.lowHz), toPixel(pane.x, shape.highHz)];
  return x >= left - 3 && x <= right + 3 && y >= toPixel(pane.y, shape.top) - 3;
}

function inArea(shape: Shape & { readonly kind: 'area' }, pane: PaneFrame, x: number, y: number): boolean {
  const frequencyHz = toValue(pane.x, x);
  const first = shape.upper.x[0] ?? Infinity;
  const last = shape.upper.x[shape.upper.x.length - 1] ?? -Infinity;
  if (frequencyHz < first || frequencyHz > last || y < toPixel(pane.y, levelAt(shape.upper, frequencyHz)) - 2) return false;
  return shape.lower === null || y <= toPixel(pane.y, levelAt(shape.lower, frequencyHz)) + 2;
}
