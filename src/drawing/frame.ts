/** Where a plot's panes stand on the paper, in pixels; the page fills it from its live scales, the exports from a layout of their own. */
import type { Pane, Plot } from '../protocol/picture';
import type { AxisScale } from './axis-scale';
import type { Box } from './primitive';

/** A pane's place and its two scales. */
export interface PaneFrame {
  readonly id: string;
  readonly box: Box;
  readonly x: AxisScale;
  readonly y: AxisScale;
}

/** A whole plot's places. */
export interface Frame {
  readonly width: number;
  readonly height: number;
  readonly panes: readonly PaneFrame[];
}

/** Room around the panes, for texts. */
export const margins = { left: 54, right: 18, top: 24, bottom: 44 } as const;

/** Heights in pixels: of each pane, and of the space between two, which holds the upper axis and the ribbons. */
export const heights = { lone: 230, stacked: 186, between: 148 } as const;

/** The height that a plot asks for. */
export function plotHeight(plot: Plot): number {
  const count = plot.panes.length;
  const panes = count === 1 ? heights.lone : count * heights.stacked + (count - 1) * heights.between;
  return margins.top + panes + margins.bottom;
}

/** What of a pane is in view; null: all of it. */
export interface PaneView {
  readonly x: { readonly low: number; readonly high: number } | null;
  readonly y: { readonly low: number; readonly high: number } | null;
  readonly scale: 'log' | 'linear' | null;
}

/** The frame of a plot on paper of a given width. */
export function frameOf(plot: Plot, width: number, viewOf: (pane: string) => PaneView | null): Frame {
  const height = plotHeight(plot);
  const each = plot.panes.length === 1 ? heights.lone : heights.stacked;
  const panes = plot.panes.map((pane, index): PaneFrame => {
    const top = margins.top + index * (each + heights.between);
    return paneFrame(pane, { left: margins.left, right: width - margins.right, top, bottom: top + each }, viewOf(pane.id));
  });
  return { width, height, panes };
}

function paneFrame(pane: Pane, box: Box, view: PaneView | null): PaneFrame {
  const kind = view?.scale ?? pane.x.scale;
  const x = view?.x ?? fullX(pane, kind);
  const y = view?.y ?? pane.y;
  return {
    id: pane.id,
    box,
    x: { low: x.low, high: x.high, kind, from: box.left, to: box.right },
    y: { low: y.low, high: y.high, kind: 'linear', from: box.bottom, to: box.top },
  };
}

/** The whole of a frequency axis under either scale. */
export function fullX(pane: Pane, kind: 'log' | 'linear'): { readonly low: number; readonly high: number } {
  return { low: kind === 'log' ? pane.x.logLowHz : pane.x.lowHz, high: pane.x.highHz };
}
