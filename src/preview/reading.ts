/** What an item says at a frequency: for the line under the pointer, the keyboard's cursor and a screen reader. */
import { firstNotBelow, levelAt } from '../drawing/level-at';
import type { Item, Pane, Points } from '../protocol/picture';
import { formatDb, formatFrequency } from '../units/format';

/** A point of an item that can be read out. */
export interface Reading {
  readonly item: Item;
  readonly frequencyHz: number;
  readonly level: number;
}

/** The curve or the upper edge of an item; null where it has none. */
export function pointsOf(item: Item): Points | null {
  for (const shape of item.shapes) {
    if (shape.kind === 'curve') return shape.points;
    if (shape.kind === 'area') return shape.upper;
    if (shape.kind === 'forbidden') return shape.boundary;
  }
  return null;
}

/** The stretch of frequencies that an item covers; null where it has no shape. */
export function extentOf(item: Item): { readonly low: number; readonly high: number } | null {
  const points = pointsOf(item);
  const first = points?.x[0];
  const last = points?.x[points.x.length - 1];
  if (first !== undefined && last !== undefined) return { low: first, high: last };
  const [shape] = item.shapes;
  if (shape === undefined) return null;
  if (shape.kind === 'block' || shape.kind === 'ribbon') return { low: shape.lowHz, high: shape.highHz };
  return 'frequencyHz' in shape ? { low: shape.frequencyHz, high: shape.frequencyHz } : null;
}

/** Reads an item at the frequency nearest to the wanted one that it covers. */
export function readAt(item: Item, frequencyHz: number, pane: Pane): Reading | null {
  const extent = extentOf(item);
  if (extent === null) return null;
  const at = Math.min(extent.high, Math.max(extent.low, frequencyHz));
  return { item, frequencyHz: at, level: levelOf(item, at, pane) };
}

/** A reading in words: a curve gives the value there, anything else its own sentence. */
export function readingWords(reading: Reading, pane: Pane): string {
  const points = pointsOf(reading.item);
  const alone = points === null || reading.item.shapes.some((shape) => shape.kind === 'forbidden');
  if (alone) return reading.item.words;
  const decimals = pane.y.high - pane.y.low < 12 ? 3 : 1;
  const span = (points.x[points.x.length - 1] ?? 0) - (points.x[0] ?? 0);
  const value = `${formatDb(reading.level, pane.y.unit, decimals)} at ${formatFrequency(reading.frequencyHz, span / 2000)}`;
  const from = originAt(points, reading.frequencyHz);
  return `${reading.item.name}: ${value}${from === null ? '' : `, from ${formatFrequency(from)}`}`;
}

function levelOf(item: Item, frequencyHz: number, pane: Pane): number {
  const points = pointsOf(item);
  if (points !== null) return levelAt(points, frequencyHz);
  const [shape] = item.shapes;
  if (shape?.kind === 'block' || shape?.kind === 'stem') return shape.top;
  return shape?.kind === 'mark' ? shape.level : pane.y.low;
}

function originAt(points: Points, frequencyHz: number): number | null {
  if (points.from === undefined) return null;
  const after = firstNotBelow(points.x, frequencyHz);
  const before = Math.max(0, after - 1);
  const nearer = frequencyHz - (points.x[before] ?? 0) < (points.x[after] ?? 0) - frequencyHz ? before : after;
  return points.from[nearer] ?? null;
}
