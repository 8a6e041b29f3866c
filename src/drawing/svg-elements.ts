/** Primitives as SVG elements, with the hatches and clips they name. */
import type { Box, Fill, Outline, Primitive, Step, Writing } from './primitive';

/** The element, or elements, of one primitive; `prefix` keeps a drawing's names apart from those of others on a page. */
export function element(primitive: Primitive, prefix: string, fontPx: number): string {
  return primitive.kind === 'text' ? textElement(primitive, fontPx) : outlineElements(primitive, prefix);
}

/** The definitions that the elements of these primitives name. */
export function definitions(primitives: readonly Primitive[], prefix: string): string {
  return hatchDefinitions(primitives, prefix) + clipDefinitions(primitives, prefix);
}

function outlineElements(outline: Outline, prefix: string): string {
  const path = `d="${pathData(outline.steps)}"`;
  const clip = outline.clip === null ? '' : ` clip-path="url(#${clipId(outline.clip, prefix)})"`;
  const { fill, pen } = outline;
  const parts: string[] = [];
  if (fill !== null) parts.push(`<path ${path}${clip} fill="${escaped(fill.colour)}" fill-opacity="${short(fill.opacity)}"/>`);
  if (fill !== null && fill.hatch !== null) parts.push(`<path ${path}${clip} fill="url(#${hatchId(fill, prefix)})"/>`);
  if (pen !== null) {
    const dash = pen.dash.length === 0 ? '' : ` stroke-dasharray="${pen.dash.join(' ')}"`;
    const opacity = pen.opacity === 1 ? '' : ` stroke-opacity="${short(pen.opacity)}"`;
    parts.push(
      `<path ${path}${clip} fill="none" stroke="${escaped(pen.colour)}" stroke-width="${short(pen.width)}" stroke-linejoin="round"${dash}${opacity}/>`,
    );
  }
  return parts.join('');
}

function textElement(writing: Writing, fontPx: number): string {
  const halo =
    writing.halo === null
      ? ''
      : ` stroke="${escaped(writing.halo)}" stroke-width="3" stroke-linejoin="round" paint-order="stroke"`;
  const anchor = writing.align === 'start' ? '' : ` text-anchor="${writing.align}"`;
  const place = `x="${short(writing.x)}" y="${short(writing.y)}"`;
  return `<text ${place}${anchor} fill="${escaped(writing.colour)}"${halo} font-size="${fontPx}">${escaped(writing.text)}</text>`;
}

function hatchDefinitions(primitives: readonly Primitive[], prefix: string): string {
  const patterns = new Map<string, string>();
  for (const primitive of primitives) {
    if (primitive.kind !== 'outline' || primitive.fill === null || primitive.fill.hatch === null) continue;
    const { fill } = primitive;
    const angle = fill.hatch === 'rising' ? 45 : -45;
    const line = `<line x1="0" y1="0" x2="0" y2="7" stroke="${escaped(fill.colour)}" stroke-width="1.2" stroke-opacity="${hatchOpacity}"/>`;
    const attributes = `width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(${angle})"`;
    patterns.set(hatchId(fill, prefix), `<pattern id="${hatchId(fill, prefix)}" ${attributes}>${line}</pattern>`);
  }
  return [...patterns.values()].join('');
}

/** How strong the lines of a hatch are; the canvas painter uses the same. */
export const hatchOpacity = 0.45;

function clipDefinitions(primitives: readonly Primitive[], prefix: string): string {
  const clips = new Map<string, string>();
  for (const primitive of primitives) {
    if (primitive.kind !== 'outline' || primitive.clip === null) continue;
    const { left, top, right, bottom } = primitive.clip;
    const rectangle = `<rect x="${short(left)}" y="${short(top)}" width="${short(right - left)}" height="${short(bottom - top)}"/>`;
    clips.set(clipId(primitive.clip, prefix), `<clipPath id="${clipId(primitive.clip, prefix)}">${rectangle}</clipPath>`);
  }
  return [...clips.values()].join('');
}

function clipId(box: Box, prefix: string): string {
  return `${prefix}-clip-${[box.left, box.top, box.right, box.bottom].map((side) => Math.round(side)).join('-')}`;
}

function hatchId(fill: Fill, prefix: string): string {
  return `${prefix}-hatch-${fill.hatch ?? 'none'}-${idOf(fill.colour)}`;
}

/** Letters and digits of a text, for use in an identifier. */
export function idOf(text: string): string {
  return text.replaceAll(/[^a-zA-Z0-9]/g, '');
}

function pathData(steps: readonly Step[]): string {
  return steps.map(([command, ...numbers]) => `${command}${numbers.map(short).join(' ')}`).join('');
}

function short(value: number): string {
  return String(Number(value.toFixed(2)));
}

/** Text that cannot end an element or an attribute; control characters, which XML forbids, become spaces. */
export function escaped(text: string): string {
  return text
    .replaceAll(forbidden, ' ')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');
}

// Built from its parts, since a control character may not stand in a pattern as it is.
const forbidden = new RegExp(
  `[${String.fromCharCode(0)}-${String.fromCharCode(8)}${String.fromCharCode(11, 12)}${String.fromCharCode(14)}-${String.fromCharCode(31)}\\ufffe\\uffff]`,
  'g',
);
