/** What of a plot is shown and how the reader's acts change that; plain data in, plain data out. */
import { toValue } from '../drawing/axis-scale';
import type { Frame, PaneFrame, PaneView } from '../drawing/frame';
import type { Box } from '../drawing/primitive';
import type { Pane, Plot } from '../protocol/picture';
import { paneAt } from './hit';
import type { PlotState } from './view-state';
import { isZoomed, refitted, wholePane } from './zoom';
import type { Range } from './zoom';

/** A stretch that was dragged out: of frequencies, and of levels where the drag was tall. */
export interface Selection {
  readonly pane: string;
  readonly x: Range;
  readonly y: Range | null;
  /** As it is drawn. */
  readonly box: Box;
}

/** The plot without the series that are hidden. */
export function shownPlot(plot: Plot, state: PlotState): Plot {
  if (state.hidden.length === 0) return plot;
  return { ...plot, items: plot.items.filter((item) => !state.hidden.includes(item.series)) };
}

/** The view of one pane. */
export function viewOf(state: PlotState, pane: string): PaneView {
  return state.panes[pane] ?? wholePane;
}

/** The state with one pane seen otherwise. */
export function withView(
  plot: Plot,
  state: PlotState,
  paneId: string,
  change: (pane: Pane, view: PaneView) => PaneView,
): PlotState {
  const pane = plot.panes.find((candidate) => candidate.id === paneId);
  if (pane === undefined) return state;
  return { ...state, panes: { ...state.panes, [paneId]: change(pane, viewOf(state, paneId)) } };
}

/** The state with everything in view; scales stay as chosen. */
export function withWholeView(plot: Plot, state: PlotState): PlotState {
  const panes = plot.panes.map((pane) => [pane.id, { ...wholePane, scale: viewOf(state, pane.id).scale }] as const);
  return { ...state, panes: Object.fromEntries(panes) };
}

/** The state fitted to a newer picture: what still shows something stays. */
export function fittedState(plot: Plot, state: PlotState): PlotState {
  const panes = plot.panes.map((pane) => [pane.id, refitted(pane, viewOf(state, pane.id))] as const);
  return { ...state, panes: Object.fromEntries(panes) };
}

/** The state with a series hidden, or shown again. */
export function withToggled(state: PlotState, series: string): PlotState {
  const hidden = state.hidden.includes(series) ? state.hidden.filter((other) => other !== series) : [...state.hidden, series];
  return { ...state, hidden };
}

/** Whether anything of the plot is out of view. */
export function isPartial(plot: Plot, state: PlotState): boolean {
  return plot.panes.some((pane) => isZoomed(viewOf(state, pane.id)));
}

/** A drag shorter than this across chooses no frequencies; one flatter than this chooses no levels. */
const leastAcross = 6;
const leastTall = 30;

/** What a dragged box selects, in the pane where it stands. */
export function selectionOf(frame: Frame, dragged: Box): Selection | null {
  const pane = paneAt(frame, dragged.top);
  if (pane === null) return null;
  const left = Math.max(pane.box.left, dragged.left);
  const right = Math.min(pane.box.right, dragged.right);
  if (right - left < leastAcross) return null;
  const x = { low: toValue(pane.x, left), high: toValue(pane.x, right) };
  const tall = dragged.bottom - dragged.top >= Math.max(leastTall, (dragged.right - dragged.left) / 4);
  const { top, bottom } = tall ? clampedHeight(dragged, pane) : pane.box;
  const y = tall ? { low: toValue(pane.y, bottom), high: toValue(pane.y, top) } : null;
  return { pane: pane.id, x, y, box: { left, right, top, bottom } };
}

function clampedHeight(dragged: Box, pane: PaneFrame): { readonly top: number; readonly bottom: number } {
  return { top: Math.max(pane.box.top, dragged.top), bottom: Math.min(pane.box.bottom, dragged.bottom) };
}
