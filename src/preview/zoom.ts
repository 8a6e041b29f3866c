/** Zoom and pan of one pane as plain arithmetic on data ranges, so that neither a redraw nor a resize moves what the reader looks at. */
import { fullX } from '../drawing/frame';
import type { PaneView } from '../drawing/frame';
import type { Pane } from '../protocol/picture';

/** A stretch of an axis. */
export interface Range {
  readonly low: number;
  readonly high: number;
}

/** A pane of which everything is in view, on its own scale. */
export const wholePane: PaneView = { x: null, y: null, scale: null };

/** The smallest part of an axis that a zoom may show, as a share of the whole (of its logarithm on a log axis). */
const smallestShare = 1e-4;

/** The scale that a pane is drawn on. */
export function scaleOf(pane: Pane, view: PaneView): 'log' | 'linear' {
  return view.scale ?? pane.x.scale;
}

/** What of the frequency axis is in view. */
export function rangeInView(pane: Pane, view: PaneView): Range {
  return view.x ?? fullX(pane, scaleOf(pane, view));
}

/** Zooms the frequency axis about a value, which keeps its place; a factor above 1 comes nearer. */
export function zoomed(pane: Pane, view: PaneView, factor: number, aboutHz: number): PaneView {
  const { to, from } = axisFor(scaleOf(pane, view));
  const range = rangeInView(pane, view);
  const about = to(Math.min(range.high, Math.max(range.low, aboutHz)));
  const low = about - (about - to(range.low)) / factor;
  const high = about + (to(range.high) - about) / factor;
  return withX(pane, view, { low: from(low), high: from(high) });
}

/** Moves along the frequency axis by a share of what is in view; positive towards higher frequencies. */
export function panned(pane: Pane, view: PaneView, share: number): PaneView {
  const kind = scaleOf(pane, view);
  const { to, from } = axisFor(kind);
  const range = rangeInView(pane, view);
  const full = fullX(pane, kind);
  const wanted = share * (to(range.high) - to(range.low));
  const step = Math.min(to(full.high) - to(range.high), Math.max(to(full.low) - to(range.low), wanted));
  return withX(pane, view, { low: from(to(range.low) + step), high: from(to(range.high) + step) });
}

/** Shows just a stretch of frequencies and, if given, of levels. */
export function framed(pane: Pane, view: PaneView, x: Range, y: Range | null): PaneView {
  const framedX = withX(pane, view, x);
  return y === null ? framedX : { ...framedX, y: within(y, pane.y) };
}

/** The same stretch on the other scale. */
export function rescaled(pane: Pane, view: PaneView, scale: 'log' | 'linear'): PaneView {
  const kept = { ...view, scale: scale === pane.x.scale ? null : scale };
  return view.x === null ? kept : withX(pane, kept, view.x);
}

/** A remembered view fitted to a pane whose data have changed: kept where it still shows something, else dropped. */
export function refitted(pane: Pane, view: PaneView): PaneView {
  const full = fullX(pane, scaleOf(pane, view));
  const x = view.x !== null && view.x.low < full.high && view.x.high > full.low ? view.x : null;
  const y = view.y !== null && view.y.low < pane.y.high && view.y.high > pane.y.low ? view.y : null;
  return x === null ? { ...view, x, y } : { ...withX(pane, view, x), y };
}

/** Whether anything of a pane is out of view. */
export function isZoomed(view: PaneView): boolean {
  return view.x !== null || view.y !== null;
}

function withX(pane: Pane, view: PaneView, x: Range): PaneView {
  const kind = scaleOf(pane, view);
  const full = fullX(pane, kind);
  const range = widened(within(x, full), full, kind);
  const whole = range.low <= full.low && range.high >= full.high;
  return { ...view, x: whole ? null : range };
}

function within(range: Range, full: Range): Range {
  return { low: Math.max(full.low, Math.min(range.low, full.high)), high: Math.min(full.high, Math.max(range.high, full.low)) };
}

function widened(range: Range, full: Range, kind: 'log' | 'linear'): Range {
  const { to, from } = axisFor(kind);
  const least = (to(full.high) - to(full.low)) * smallestShare;
  if (to(range.high) - to(range.low) >= least) return range;
  const middle = (to(range.low) + to(range.high)) / 2;
  return within({ low: from(middle - least / 2), high: from(middle + least / 2) }, full);
}

/** The measure in which an axis is even: the value itself, or its logarithm. */
function axisFor(kind: 'log' | 'linear'): { readonly to: (value: number) => number; readonly from: (even: number) => number } {
  return kind === 'log' ? { to: Math.log, from: Math.exp } : { to: (value) => value, from: (even) => even };
}
