/** Paints primitives on a canvas, as the SVG writer turns them into elements. */
import { boxSteps } from '../drawing/primitive';
import type { Fill, Outline, Primitive, Step, Writing } from '../drawing/primitive';
import { hatchOpacity } from '../drawing/svg-elements';
import type { Theme } from '../drawing/theme';

/** Paints in order, the last on top. */
export function paint(context: CanvasRenderingContext2D, primitives: readonly Primitive[], theme: Theme): void {
  for (const primitive of primitives) {
    context.save();
    if (primitive.kind === 'text') paintText(context, primitive, theme);
    else paintOutline(context, primitive);
    context.restore();
  }
}

/** The font of every text on the canvas. */
export function fontOf(theme: Theme): string {
  return `${theme.fontPx}px ${theme.fontFamily}`;
}

function paintText(context: CanvasRenderingContext2D, writing: Writing, theme: Theme): void {
  context.font = fontOf(theme);
  context.textAlign = writing.align === 'middle' ? 'center' : writing.align;
  if (writing.halo !== null) {
    context.strokeStyle = writing.halo;
    context.lineWidth = 3;
    context.lineJoin = 'round';
    context.strokeText(writing.text, writing.x, writing.y);
  }
  context.fillStyle = writing.colour;
  context.fillText(writing.text, writing.x, writing.y);
}

function paintOutline(context: CanvasRenderingContext2D, outline: Outline): void {
  if (outline.clip !== null) context.clip(pathOf(boxSteps(outline.clip)));
  const path = pathOf(outline.steps);
  if (outline.fill !== null) paintFill(context, path, outline.fill);
  if (outline.pen === null) return;
  const { colour, opacity, width, dash } = outline.pen;
  context.globalAlpha = opacity;
  context.strokeStyle = colour;
  context.lineWidth = width;
  context.lineJoin = 'round';
  context.setLineDash([...dash]);
  context.stroke(path);
}

function paintFill(context: CanvasRenderingContext2D, path: Path2D, fill: Fill): void {
  context.globalAlpha = fill.opacity;
  context.fillStyle = fill.colour;
  context.fill(path);
  if (fill.hatch === null) return;
  context.save();
  context.clip(path);
  context.globalAlpha = hatchOpacity;
  context.strokeStyle = fill.colour;
  context.lineWidth = 1.2;
  context.stroke(hatchPath(context, fill.hatch === 'rising' ? -1 : 1));
  context.restore();
}

/** Distance between the lines of a hatch along the horizontal, in pixels: 7 across. */
const hatchStep = 7 * Math.SQRT2;

function hatchPath(context: CanvasRenderingContext2D, lean: 1 | -1): Path2D {
  const ratio = context.getTransform().a || 1;
  const [width, height] = [context.canvas.width / ratio, context.canvas.height / ratio];
  const path = new Path2D();
  for (let x = -height; x < width + height; x += hatchStep) {
    path.moveTo(x, 0);
    path.lineTo(x + lean * height, height);
  }
  return path;
}

function pathOf(steps: readonly Step[]): Path2D {
  const path = new Path2D();
  for (const step of steps) {
    if (step[0] === 'M') path.moveTo(step[1], step[2]);
    else if (step[0] === 'L') path.lineTo(step[1], step[2]);
    else if (step[0] === 'C') path.bezierCurveTo(step[1], step[2], step[3], step[4], step[5], step[6]);
    else path.closePath();
  }
  return path;
}
