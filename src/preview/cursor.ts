/** The keyboard's cursor: on one item of a plot at one frequency, moved along it and from item to item. */
import { toPixel, toValue } from '../drawing/axis-scale';
import type { Frame } from '../drawing/frame';
import type { Item, Plot } from '../protocol/picture';
import { extentOf, readAt } from './reading';
import type { Reading } from './reading';

/** Moves by so many pixels along the item in hand; starts in the middle of the first item where none is. */
export function stepped(plot: Plot, frame: Frame, reading: Reading | null, pixels: number): Reading | null {
  if (reading === null) return onItem(plot, frame, plot.items.find((item) => extentOf(item) !== null) ?? null, null);
  const scale = frame.panes.find((pane) => pane.id === reading.item.pane)?.x;
  if (scale === undefined) return null;
  const x = Math.min(scale.to, Math.max(scale.from, toPixel(scale, reading.frequencyHz) + pixels));
  return onItem(plot, frame, reading.item, toValue(scale, x));
}

/** The first or last point of the item in hand that is in view. */
export function atEnd(plot: Plot, frame: Frame, reading: Reading | null, which: 'first' | 'last'): Reading | null {
  const item = reading?.item ?? plot.items.find((candidate) => extentOf(candidate) !== null) ?? null;
  return onItem(plot, frame, item, which === 'first' ? -Infinity : Infinity);
}

/** The next or previous item, at the same frequency where it has one. */
export function onNextItem(plot: Plot, frame: Frame, reading: Reading | null, by: 1 | -1): Reading | null {
  const items = plot.items.filter((item) => extentOf(item) !== null);
  const index = items.findIndex((item) => item.id === reading?.item.id);
  const next = index === -1 ? (by === 1 ? 0 : items.length - 1) : (index + by + items.length) % items.length;
  const item = items[next] ?? null;
  return onItem(plot, frame, item, item?.pane === reading?.item.pane ? (reading?.frequencyHz ?? null) : null);
}

/** The same cursor after a redraw, where its item still stands. */
export function rereadIn(plot: Plot, frame: Frame, reading: Reading | null): Reading | null {
  const item = plot.items.find((candidate) => candidate.id === reading?.item.id) ?? null;
  return item === null ? null : onItem(plot, frame, item, reading?.frequencyHz ?? null);
}

function onItem(plot: Plot, frame: Frame, item: Item | null, frequencyHz: number | null): Reading | null {
  const pane = plot.panes.find((candidate) => candidate.id === item?.pane);
  const scale = frame.panes.find((candidate) => candidate.id === item?.pane)?.x;
  const extent = item === null ? null : extentOf(item);
  if (item === null || pane === undefined || scale === undefined || extent === null) return null;
  const low = Math.max(extent.low, scale.low);
  const high = Math.min(extent.high, scale.high);
  if (low > high) return readAt(item, extent.low, pane);
  const middle = toValue(scale, (toPixel(scale, low) + toPixel(scale, high)) / 2);
  return readAt(item, Math.min(high, Math.max(low, frequencyHz ?? middle)), pane);
}
