/** Finds a place for each label near its point: inside its bounds, never over another label, off the curves where it can be. */
import { overlap } from './primitive';
import type { Box } from './primitive';

/** A label that wants a place. */
export interface LabelRequest {
  readonly key: string;
  readonly text: string;
  readonly x: number;
  readonly y: number;
  readonly prefer: Direction;
  readonly priority: number;
  readonly bounds: Box;
}

/** On which side of its point a label stands. */
export type Direction = 'above' | 'below' | 'left' | 'right';

/** A label with its place; `box` is what no other label touches. */
export interface PlacedLabel {
  readonly key: string;
  readonly text: string;
  readonly box: Box;
}

/** What is known of the paper. */
export interface Paper {
  readonly widthOf: (text: string) => number;
  readonly lineHeight: number;
  /** How much ink a box would cover. */
  readonly inkUnder: (box: Box) => number;
  /** Boxes that are taken already. */
  readonly taken: readonly Box[];
}

/** Places labels, the most important first; one that finds no free place is left out. */
export function placeLabels(requests: readonly LabelRequest[], paper: Paper): PlacedLabel[] {
  const ordered = [...requests].sort((a, b) => b.priority - a.priority);
  const placed: PlacedLabel[] = [];
  const taken = [...paper.taken];
  for (const request of ordered) {
    const box = bestBox(request, paper, taken);
    if (box === null) continue;
    placed.push({ key: request.key, text: request.text, box });
    taken.push(box);
  }
  return placed;
}

/** Distances from the point that are tried, in pixels. */
const distances = [7, 14, 24, 38, 56, 78];

/** How a label may shift along the side it stands on, as a share of its own length. */
const shifts = [0, -0.5, 0.5, -1, 1];

function bestBox(request: LabelRequest, paper: Paper, taken: readonly Box[]): Box | null {
  let best: Box | null = null;
  let leastCost = Infinity;
  for (const [rank, direction] of directionsFrom(request.prefer).entries()) {
    for (const distance of distances) {
      for (const shift of shifts) {
        const cost = distance * 0.12 + rank * 1.6 + Math.abs(shift) * 1.2;
        if (cost >= leastCost) continue;
        const box = fitted(boxAt(request, direction, distance, shift, paper), request.bounds);
        if (box === null || taken.some((other) => overlap(other, box)) || covers(box, request)) continue;
        const whole = cost + paper.inkUnder(box) * 0.9;
        if (whole < leastCost) [best, leastCost] = [box, whole];
      }
    }
  }
  return best;
}

function directionsFrom(prefer: Direction): Direction[] {
  const rest: Record<Direction, Direction[]> = {
    above: ['above', 'right', 'left', 'below'],
    below: ['below', 'right', 'left', 'above'],
    left: ['left', 'above', 'below', 'right'],
    right: ['right', 'above', 'below', 'left'],
  };
  return rest[prefer];
}

function boxAt(request: LabelRequest, direction: Direction, distance: number, shift: number, paper: Paper): Box {
  const width = paper.widthOf(request.text) + 4;
  const height = paper.lineHeight;
  const upright = direction === 'above' || direction === 'below';
  const x = upright ? request.x + shift * width : request.x + (direction === 'left' ? -1 : 1) * (distance + width / 2);
  const y = upright ? request.y + (direction === 'above' ? -1 : 1) * (distance + height / 2) : request.y + shift * 2 * height;
  return { left: x - width / 2, right: x + width / 2, top: y - height / 2, bottom: y + height / 2 };
}

/** The box moved into its bounds, or null where it does not fit there. */
function fitted(box: Box, bounds: Box): Box | null {
  if (box.right - box.left > bounds.right - bounds.left || box.bottom - box.top > bounds.bottom - bounds.top) return null;
  const dx = Math.max(0, bounds.left - box.left) - Math.max(0, box.right - bounds.right);
  const dy = Math.max(0, bounds.top - box.top) - Math.max(0, box.bottom - bounds.bottom);
  return { left: box.left + dx, right: box.right + dx, top: box.top + dy, bottom: box.bottom + dy };
}

function covers(box: Box, request: LabelRequest): boolean {
  return box.left < request.x + 3 && box.right > request.x - 3 && box.top < request.y + 3 && box.bottom > request.y - 3;
}
