/** The labels of a plot, placed for what is in view. */
import type { Item, Label, Plot, Shape } from '../protocol/picture';
import { toPixel, toValue } from './axis-scale';
import type { Frame, PaneFrame } from './frame';
import { placeLabels } from './label-placement';
import type { LabelRequest, PlacedLabel } from './label-placement';
import { levelAt } from './level-at';
import { lineSteps, pixelOf } from './outlines';
import { createOccupancy } from './occupancy';
import type { Box, Writing } from './primitive';
import { ribbonSteps } from './ribbon';
import { inkOf } from './theme';
import type { Theme } from './theme';

/** Places every label whose item is in view. */
export function placedLabels(plot: Plot, frame: Frame, theme: Theme, widthOf: (text: string) => number): PlacedLabel[] {
  const requests = plot.items.flatMap((item) => requestsOf(item, frame));
  const occupancy = createOccupancy();
  for (const item of plot.items) addInk(item, frame, occupancy.add);
  const lineHeight = Math.ceil(theme.fontPx * 1.35);
  return placeLabels(requests, {
    widthOf,
    lineHeight,
    inkUnder: occupancy.under,
    taken: [...markBoxes(plot, frame), ...titleBoxes(plot, frame, widthOf)],
  });
}

/** The labels as texts; those of harm and limits take their colour, the rest the theme's text. */
export function labelWritings(placed: readonly PlacedLabel[], plot: Plot, theme: Theme): Writing[] {
  const roleOf = new Map(plot.items.map((item) => [item.id, item.role]));
  return placed.map(({ key, text, box }) => {
    const role = roleOf.get(key);
    const colour =
      role === 'harm' ? inkOf(role, theme) : role === 'rule' || role === 'path' || role === 'stage' ? theme.muted : theme.text;
    const baseline = (box.top + box.bottom) / 2 + theme.fontPx * 0.35;
    return { kind: 'text', text, x: box.left + 2, y: baseline, align: 'start', colour, halo: theme.background };
  });
}

function requestsOf(item: Item, frame: Frame): LabelRequest[] {
  const pane = frame.panes.find((candidate) => candidate.id === item.pane);
  if (item.label === null || pane === undefined) return [];
  const request = { key: item.id, text: item.label.text, priority: item.label.priority };
  if (item.label.prefer === 'ribbon')
    return ribbonRequest(item, item.label, pane, frame).map((place) => ({ ...request, ...place }));
  const anchor = anchorInView(item, item.label, pane);
  if (anchor === null) return [];
  const [x, y] = pixelOf(anchor.x, anchor.y, pane);
  return [{ ...request, x, y: within(y, pane.box.top, pane.box.bottom), prefer: item.label.prefer, bounds: shrunk(pane.box) }];
}

/** The label's own point, or the nearest point of its item that is in view. */
function anchorInView(item: Item, label: Label, pane: PaneFrame): { x: number; y: number } | null {
  const extent = extentOf(item.shapes, label);
  const low = Math.max(extent.low, Math.min(toValue(pane.x, pane.box.left), pane.x.low));
  const high = Math.min(extent.high, pane.x.high);
  if (low > high) return null;
  const x = within(label.frequencyHz, low, high);
  const curve = item.shapes.find((shape) => shape.kind === 'curve');
  return { x, y: curve?.kind === 'curve' && x !== label.frequencyHz ? levelAt(curve.points, x) : label.level };
}

function extentOf(shapes: readonly Shape[], label: Label): { low: number; high: number } {
  let [low, high] = [label.frequencyHz, label.frequencyHz];
  for (const shape of shapes) {
    const ends = endsOf(shape);
    if (ends !== null) [low, high] = [Math.min(low, ends[0]), Math.max(high, ends[1])];
  }
  return { low, high };
}

function endsOf(shape: Shape): readonly [number, number] | null {
  if (shape.kind === 'block') return [shape.lowHz, shape.highHz];
  const points =
    shape.kind === 'curve'
      ? shape.points
      : shape.kind === 'area'
        ? shape.upper
        : shape.kind === 'forbidden'
          ? shape.boundary
          : null;
  const first = points?.x[0];
  const last = points?.x[points.x.length - 1];
  return first === undefined || last === undefined ? null : [first, last];
}

function ribbonRequest(
  item: Item,
  label: Label,
  pane: PaneFrame,
  frame: Frame,
): Pick<LabelRequest, 'x' | 'y' | 'prefer' | 'bounds'>[] {
  const ribbon = item.shapes.find((shape) => shape.kind === 'ribbon');
  const below = ribbon?.kind === 'ribbon' ? frame.panes.find((candidate) => candidate.id === ribbon.landsPane) : undefined;
  if (below === undefined) return [];
  const x = toPixel(pane.x, label.frequencyHz);
  if (x < pane.box.left || x > pane.box.right) return [];
  const bounds = { left: pane.box.left, right: pane.box.right, top: pane.box.bottom + 26, bottom: below.box.top - 26 };
  return [{ x, y: pane.box.bottom + 44, prefer: x > (pane.box.left + pane.box.right) / 2 ? 'left' : 'right', bounds }];
}

function addInk(item: Item, frame: Frame, add: (steps: ReturnType<typeof lineSteps>) => void): void {
  const pane = frame.panes.find((candidate) => candidate.id === item.pane);
  if (pane === undefined) return;
  for (const shape of item.shapes) {
    if (shape.kind === 'curve') add(lineSteps(shape.points, pane));
    else if (shape.kind === 'forbidden') add(lineSteps(shape.boundary, pane));
    else if (shape.kind === 'area') add(lineSteps(shape.upper, pane));
    else if (shape.kind === 'block') add(lidSteps(shape, pane));
    else if (shape.kind === 'ribbon' && item.role === 'harm') {
      const below = frame.panes.find((candidate) => candidate.id === shape.landsPane);
      if (below !== undefined)
        add(ribbonSteps(shape, pane, below).map((step) => (step[0] === 'C' ? ['L', step[5], step[6]] : step)));
    }
  }
}

function lidSteps(shape: Shape & { readonly kind: 'block' }, pane: PaneFrame): ReturnType<typeof lineSteps> {
  return lineSteps({ x: [shape.lowHz, shape.highHz], y: [shape.top, shape.top] }, pane);
}

function markBoxes(plot: Plot, frame: Frame): Box[] {
  return plot.items.flatMap((item) => {
    const pane = frame.panes.find((candidate) => candidate.id === item.pane);
    return item.shapes.flatMap((shape) => {
      if (shape.kind !== 'mark' || pane === undefined) return [];
      const [x, y] = pixelOf(shape.frequencyHz, shape.level, pane);
      return [{ left: x - 6, right: x + 6, top: y - (shape.mark === 'over' ? 12 : 5), bottom: y + 5 }];
    });
  });
}

/** Where the titles of the frequency axes stand, between panes. */
function titleBoxes(plot: Plot, frame: Frame, widthOf: (text: string) => number): Box[] {
  return plot.panes.flatMap((pane) => {
    const box = frame.panes.find(({ id }) => id === pane.id)?.box;
    if (box === undefined) return [];
    return [{ left: box.right - widthOf(pane.x.title) - 4, right: box.right, top: box.bottom + 25, bottom: box.bottom + 40 }];
  });
}

function shrunk({ left, right, top, bottom }: Box): Box {
  return { left: left + 3, right: right - 3, top: top + 2, bottom: bottom - 2 };
}

function within(value: number, low: number, high: number): number {
  return Math.min(high, Math.max(low, value));
}
