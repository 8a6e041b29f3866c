/** How each kind of ink looks in a theme: pens for curves, fills for areas, and what lighting an item does to them. */
import type { Item, Role, Shape, Stroke, Tone } from '../protocol/picture';
import type { Fill, Hatch, Pen } from './primitive';
import { inkOf } from './theme';
import type { Theme } from './theme';

/** Whether an item is drawn as always, lit, or stands back because another is looked at. */
export type Emphasis = 'plain' | 'lit' | 'dim';

/** Everything that decides the look of an item. */
export interface Look {
  readonly theme: Theme;
  readonly emphasisOf: (item: Item) => Emphasis;
}

/** The pen of a curve. */
export function curvePen(item: Item, shape: Shape & { readonly kind: 'curve' }, look: Look): Pen {
  const emphasis = look.emphasisOf(item);
  const width =
    (shape.weight === 'bold' ? 2 : 1.3) + (emphasis === 'lit' ? 1.2 : 0) + (look.theme.highContrast === 'yes' ? 0.7 : 0);
  return { colour: inkOf(item.role, look.theme), opacity: emphasis === 'dim' ? 0.3 : 1, width, dash: dashes[shape.stroke] };
}

const dashes: Readonly<Record<Stroke, readonly number[]>> = {
  solid: [],
  dashed: [6, 4],
  dotted: [1.5, 3],
  'dash-dot': [8, 3, 1.5, 3],
  'long-dash': [12, 4],
};

/** The fill of an area or a block. */
export function areaFill(item: Item, tone: Tone, look: Look): Fill {
  const base = item.role === 'harm' ? 0.5 : tone === 'solid' ? 0.3 : item.role === 'source' ? 0.08 : 0.13;
  return fill(item, base, look, hatchOf(item.role, tone, look.theme));
}

/** The fill of a forbidden region; it is always hatched, as a keep-out is in a drawing. */
export function forbiddenFill(item: Item, look: Look): Fill {
  return fill(item, 0.07, look, 'rising');
}

/** The fill of a ribbon: the nearer it comes to harm, the stronger. */
export function ribbonFill(item: Item, strength: number, look: Look): Fill {
  const base = item.role === 'harm' ? 0.4 : 0.03 + 0.17 * strength ** 2;
  return fill(item, base, look, hatchOf(item.role, 'pale', look.theme));
}

/** A pen for edges that belong to a fill: the top of a block, the side of a harmful ribbon. */
export function edgePen(item: Item, width: number, look: Look): Pen {
  const emphasis = look.emphasisOf(item);
  const extra = emphasis === 'lit' ? 1 : 0;
  return { colour: inkOf(item.role, look.theme), opacity: emphasis === 'dim' ? 0.3 : 1, width: width + extra, dash: [] };
}

function fill(item: Item, base: number, look: Look, hatch: Hatch | null): Fill {
  const factor = { plain: 1, lit: 1.7, dim: 0.35 }[look.emphasisOf(item)];
  return { colour: inkOf(item.role, look.theme), opacity: Math.min(0.9, base * factor), hatch };
}

function hatchOf(role: Role, tone: Tone, theme: Theme): Hatch | null {
  if (role === 'harm') return 'falling';
  return theme.highContrast === 'yes' && tone === 'solid' && role !== 'wanted' ? 'rising' : null;
}
