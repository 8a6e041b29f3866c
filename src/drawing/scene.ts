/** What lies under the curves of a plot and the curves themselves, as primitives in the order in which they are painted. */
import type { Item, Plot, Shape } from '../protocol/picture';
import { toPixel } from './axis-scale';
import type { Frame, PaneFrame } from './frame';
import { areaFill, curvePen, edgePen, forbiddenFill, ribbonFill } from './look';
import type { Look } from './look';
import { areaSteps, beyondSteps, lineSteps, pixelOf } from './outlines';
import { boxSteps } from './primitive';
import type { Box, Outline, Pen, Step } from './primitive';
import { ribbonSteps } from './ribbon';

/** Fills, blocks, forbidden regions and ribbons: all that lies under the curves. */
export function fillsOf(plot: Plot, frame: Frame, look: Look): Outline[] {
  return eachShape(plot, frame, (item, shape, pane) => fillOf(item, shape, pane, frame, look));
}

/** The curves; the page leaves these to its chart. */
export function curvesOf(plot: Plot, frame: Frame, look: Look): Outline[] {
  return eachShape(plot, frame, (item, shape, pane) => {
    if (shape.kind !== 'curve') return [];
    return [stroked(lineSteps(shape.points, pane), curvePen(item, shape, look), pane.box)];
  });
}

/** Marks that stand over the curves. */
export function marksOf(plot: Plot, frame: Frame, look: Look): Outline[] {
  return eachShape(plot, frame, (item, shape, pane) => (shape.kind === 'mark' ? markOutlines(item, shape, pane, look) : []));
}

function eachShape(plot: Plot, frame: Frame, draw: (item: Item, shape: Shape, pane: PaneFrame) => Outline[]): Outline[] {
  return plot.items.flatMap((item) => {
    const pane = frame.panes.find((candidate) => candidate.id === item.pane);
    return pane === undefined ? [] : item.shapes.flatMap((shape) => draw(item, shape, pane));
  });
}

function fillOf(item: Item, shape: Shape, pane: PaneFrame, frame: Frame, look: Look): Outline[] {
  const clip = pane.box;
  switch (shape.kind) {
    case 'area': {
      return [
        {
          kind: 'outline',
          steps: areaSteps(shape.upper, shape.lower, pane),
          fill: areaFill(item, shape.tone, look),
          pen: null,
          clip,
        },
      ];
    }
    case 'block':
      return blockOutlines(item, shape, pane, look);
    case 'stem':
      return [stemOutline(item, shape, pane, look)];
    case 'rule':
      return [ruleOutline(item, shape, pane, look)];
    case 'forbidden':
      return [
        {
          kind: 'outline',
          steps: beyondSteps(shape.boundary, shape.side, pane),
          fill: forbiddenFill(item, look),
          pen: null,
          clip,
        },
        stroked(lineSteps(shape.boundary, pane), edgePen(item, 1.8, look), clip),
      ];
    case 'ribbon':
      return ribbonOutlines(item, shape, pane, frame, look);
    case 'curve':
    case 'mark':
      return [];
  }
}

function stemOutline(item: Item, shape: Shape & { readonly kind: 'stem' }, pane: PaneFrame, look: Look): Outline {
  const [x, y] = pixelOf(shape.frequencyHz, shape.top, pane);
  const pen = edgePen(item, shape.tone === 'pale' ? 1.5 : 3, look);
  return stroked(
    [
      ['M', x, pane.box.bottom],
      ['L', x, y],
    ],
    pen,
    pane.box,
  );
}

function ruleOutline(item: Item, shape: Shape & { readonly kind: 'rule' }, pane: PaneFrame, look: Look): Outline {
  const x = toPixel(pane.x, shape.frequencyHz);
  return stroked(
    [
      ['M', x, pane.box.bottom],
      ['L', x, pane.box.top],
    ],
    { ...edgePen(item, 1, look), dash: [1.5, 4] },
    pane.box,
  );
}

function blockOutlines(item: Item, shape: Shape & { readonly kind: 'block' }, pane: PaneFrame, look: Look): Outline[] {
  const [left, top] = pixelOf(shape.lowHz, shape.top, pane);
  const [right] = pixelOf(shape.highHz, shape.top, pane);
  const lacking = Math.max(0, 2 - (right - left)) / 2;
  const box: Box = { left: left - lacking, right: right + lacking, top, bottom: pane.box.bottom };
  const lid: Step[] = [
    ['M', box.left, top],
    ['L', box.right, top],
  ];
  const pen = edgePen(item, 2, look);
  return [
    { kind: 'outline', steps: boxSteps(box), fill: areaFill(item, shape.tone, look), pen: null, clip: pane.box },
    stroked(lid, shape.tone === 'pale' ? { ...pen, width: pen.width * 0.75, dash: [1.5, 3] } : pen, pane.box),
  ];
}

function ribbonOutlines(
  item: Item,
  shape: Shape & { readonly kind: 'ribbon' },
  pane: PaneFrame,
  frame: Frame,
  look: Look,
): Outline[] {
  const below = frame.panes.find((candidate) => candidate.id === shape.landsPane);
  if (below === undefined) return [];
  const clip: Box = { left: pane.box.left, right: pane.box.right, top: pane.box.bottom, bottom: below.box.top };
  const strong = item.role === 'harm' || look.emphasisOf(item) === 'lit' || look.theme.highContrast === 'yes';
  return [
    {
      kind: 'outline',
      steps: ribbonSteps(shape, pane, below),
      fill: ribbonFill(item, shape.strength, look),
      pen: strong ? edgePen(item, item.role === 'harm' ? 1 : 0.6, look) : null,
      clip,
    },
  ];
}

function markOutlines(item: Item, shape: Shape & { readonly kind: 'mark' }, pane: PaneFrame, look: Look): Outline[] {
  const [x, y] = pixelOf(shape.frequencyHz, shape.level, pane);
  const { left, right, top, bottom } = pane.box;
  if (x < left - 1 || x > right + 1 || y < top - 1 || y > bottom + 1) return [];
  const pen = edgePen(item, 1.6, look);
  const steps = shape.mark === 'over' ? triangleSteps(x, y) : diskSteps(x, y);
  const colour = shape.mark === 'over' ? pen.colour : look.theme.background;
  return [{ kind: 'outline', steps, fill: { colour, opacity: 1, hatch: null }, pen, clip: null }];
}

/** A triangle whose tip rests on the point from above: something stands too high here. */
function triangleSteps(x: number, y: number): Step[] {
  return [['M', x, y - 1], ['L', x - 6, y - 11], ['L', x + 6, y - 11], ['Z']];
}

/** A disk of radius 3.5 as four curves (0.5523: the usual circle by cubics). */
function diskSteps(x: number, y: number): Step[] {
  const r = 3.5;
  const k = r * 0.5523;
  return [
    ['M', x + r, y],
    ['C', x + r, y + k, x + k, y + r, x, y + r],
    ['C', x - k, y + r, x - r, y + k, x - r, y],
    ['C', x - r, y - k, x - k, y - r, x, y - r],
    ['C', x + k, y - r, x + r, y - k, x + r, y],
    ['Z'],
  ];
}

function stroked(steps: readonly Step[], pen: Pen, clip: Box): Outline {
  return { kind: 'outline', steps, fill: null, pen, clip };
}
