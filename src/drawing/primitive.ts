/** The few primitives of which every plot consists, so that canvas and SVG draw the same picture from one list. */

/** A rectangle in pixels. */
export interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** A step of an outline in pixels: move, line, cubic curve, close. */
export type Step =
  | readonly ['M', number, number]
  | readonly ['L', number, number]
  | readonly ['C', number, number, number, number, number, number]
  | readonly ['Z'];

/** How an outline is filled; a hatch lies over the fill and tells it apart without colour. */
export interface Fill {
  readonly colour: string;
  readonly opacity: number;
  readonly hatch: Hatch | null;
}

/** The lean of a hatch's lines. */
export type Hatch = 'rising' | 'falling';

/** How an outline is stroked; `dash` empty: solid. */
export interface Pen {
  readonly colour: string;
  readonly opacity: number;
  readonly width: number;
  readonly dash: readonly number[];
}

/** An outline with its ink. */
export interface Outline {
  readonly kind: 'outline';
  readonly steps: readonly Step[];
  readonly fill: Fill | null;
  readonly pen: Pen | null;
  readonly clip: Box | null;
}

/** A line of text on its baseline; a halo in the background's colour keeps it legible over curves. */
export interface Writing {
  readonly kind: 'text';
  readonly text: string;
  readonly x: number;
  readonly y: number;
  readonly align: 'start' | 'middle' | 'end';
  readonly colour: string;
  readonly halo: string | null;
}

/** Anything that can be painted. */
export type Primitive = Outline | Writing;

/** The outline of a box. */
export function boxSteps({ left, top, right, bottom }: Box): Step[] {
  return [['M', left, top], ['L', right, top], ['L', right, bottom], ['L', left, bottom], ['Z']];
}

/** Whether two boxes share any area. */
export function overlap(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
}
