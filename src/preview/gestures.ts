/** Pointer and wheel over a canvas as a few plain events in canvas pixels. */
import type { Box } from '../drawing/primitive';

/** What gestures ask for. */
export interface GestureTarget {
  /** The pointer rests or moves at a point; null: it has left. */
  hover: (at: Spot | null) => void;
  /** A click without a drag. */
  pick: (at: Spot) => void;
  /** A stretch is being dragged out; null: the drag has ended or was given up. */
  dragging: (box: Box | null) => void;
  /** A stretch has been dragged out. */
  dragged: (box: Box) => void;
  /** Dragged with Shift: the paper moves by so many pixels since the last event. */
  moved: (at: Spot, byX: number) => void;
  /** The wheel asks for a zoom about a point. */
  wheeled: (at: Spot, factor: number) => void;
  /** A double click. */
  whole: (at: Spot) => void;
}

/** A point of the canvas in CSS pixels. */
export interface Spot {
  readonly x: number;
  readonly y: number;
}

/** A pointer that moves less than this has clicked, not dragged. */
const leastDrag = 6;

/** Listens on an element; the listeners go with the element. `ready` says whether a bare wheel may zoom. */
export function listenForGestures(area: HTMLElement, ready: () => boolean, target: GestureTarget): void {
  let start: Spot | null = null;
  let last: Spot | null = null;
  const spot = (event: MouseEvent): Spot => {
    const box = area.getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  };
  area.addEventListener('pointerdown', (event) => {
    if (event.button !== 0) return;
    start = last = spot(event);
    area.setPointerCapture(event.pointerId);
  });
  area.addEventListener('pointermove', (event) => {
    const at = spot(event);
    if (start === null) target.hover(at);
    else if (event.shiftKey) target.moved(at, at.x - (last?.x ?? at.x));
    else if (distance(start, at) >= leastDrag) target.dragging(boxOf(start, at));
    last = at;
  });
  area.addEventListener('pointerup', (event) => {
    const [from, at] = [start, spot(event)];
    start = null;
    target.dragging(null);
    if (from === null || event.shiftKey) return;
    if (distance(from, at) >= leastDrag) target.dragged(boxOf(from, at));
    else target.pick(at);
  });
  area.addEventListener('pointercancel', () => {
    start = null;
    target.dragging(null);
  });
  area.addEventListener('pointerleave', () => {
    target.hover(null);
  });
  area.addEventListener('dblclick', (event) => {
    target.whole(spot(event));
  });
  listenForWheel(area, ready, spot, target);
}

function listenForWheel(area: HTMLElement, ready: () => boolean, spot: (event: MouseEvent) => Spot, target: GestureTarget): void {
  area.addEventListener(
    'wheel',
    (event) => {
      // A bare wheel scrolls the page past a plot; it zooms a plot that has been clicked, or with Ctrl (a pinch arrives as that).
      if (!event.ctrlKey && !ready()) return;
      event.preventDefault();
      const lines = event.deltaMode === WheelEvent.DOM_DELTA_PIXEL ? event.deltaY / 100 : event.deltaY / 3;
      target.wheeled(spot(event), 1.3 ** -Math.max(-3, Math.min(3, lines * (event.ctrlKey ? 2 : 1))));
    },
    { passive: false },
  );
}

function boxOf(a: Spot, b: Spot): Box {
  return { left: Math.min(a.x, b.x), right: Math.max(a.x, b.x), top: Math.min(a.y, b.y), bottom: Math.max(a.y, b.y) };
}

function distance(a: Spot, b: Spot): number {
  return Math.hypot(a.x - b.x, a.y - b.y);
}
