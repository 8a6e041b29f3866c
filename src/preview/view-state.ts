/** What the page remembers across redraws and reloads: zoom, scale, hidden series, tables, folds, pin, scroll; as plain data in data units. */
import type { PaneView } from '../drawing/frame';
import { isFiniteNumber, isRecord, isText } from '../protocol/guards';

/** What is remembered of one plot. */
export interface PlotState {
  readonly panes: Readonly<Record<string, PaneView>>;
  /** Series that the reader has hidden. */
  readonly hidden: readonly string[];
  readonly table: 'shown' | 'hidden';
  /** Of a plot that is drawn on demand. */
  readonly opened: 'opened' | 'closed';
}

/** What is remembered of the whole page. */
export interface PanelState {
  /** The spec that the panel follows, by which the workbench finds it again after a reload. */
  readonly uri: string | null;
  readonly channel: string | null;
  readonly pinned: boolean;
  readonly folded: readonly string[];
  /** By channel and plot, the latest last. */
  readonly plots: Readonly<Record<string, PlotState>>;
  readonly scroll: number;
}

/** A plot that nobody has touched. */
export const freshPlot: PlotState = { panes: {}, hidden: [], table: 'hidden', opened: 'closed' };

/** A page that has just been opened. */
export const freshPanel: PanelState = { uri: null, channel: null, pinned: false, folded: [], plots: {}, scroll: 0 };

/** How many plots are remembered; the oldest are forgotten first. */
export const mostPlots = 64;

/** The key under which a channel's plot is remembered. */
export function plotKey(channel: string, plotId: string): string {
  return `${channel}\n${plotId}`;
}

/** The state with one plot's replaced, and made the latest. */
export function withPlot(state: PanelState, key: string, plot: PlotState): PanelState {
  const others = Object.entries(state.plots).filter(([other]) => other !== key);
  return { ...state, plots: Object.fromEntries([...others.slice(-(mostPlots - 1)), [key, plot]]) };
}

/** Whatever the workbench kept, as far as it can be understood; the rest is fresh. */
export function readPanelState(value: unknown): PanelState {
  if (!isRecord(value)) return freshPanel;
  const plots = isRecord(value['plots']) ? Object.entries(value['plots']) : [];
  return {
    uri: isText(value['uri']) ? value['uri'] : null,
    channel: isText(value['channel']) ? value['channel'] : null,
    pinned: value['pinned'] === true,
    folded: textsOf(value['folded']),
    plots: Object.fromEntries(plots.slice(-mostPlots).map(([key, plot]) => [key, readPlot(plot)])),
    scroll: isFiniteNumber(value['scroll']) ? value['scroll'] : 0,
  };
}

function readPlot(value: unknown): PlotState {
  if (!isRecord(value)) return freshPlot;
  const panes = isRecord(value['panes']) ? Object.entries(value['panes']) : [];
  return {
    panes: Object.fromEntries(panes.map(([id, pane]) => [id, readPane(pane)])),
    hidden: textsOf(value['hidden']),
    table: value['table'] === 'shown' ? 'shown' : 'hidden',
    opened: value['opened'] === 'opened' ? 'opened' : 'closed',
  };
}

function readPane(value: unknown): PaneView {
  if (!isRecord(value)) return { x: null, y: null, scale: null };
  const scale = value['scale'];
  return { x: readRange(value['x']), y: readRange(value['y']), scale: scale === 'log' || scale === 'linear' ? scale : null };
}

function readRange(value: unknown): PaneView['x'] {
  if (!isRecord(value) || !isFiniteNumber(value['low']) || !isFiniteNumber(value['high'])) return null;
  return value['low'] < value['high'] ? { low: value['low'], high: value['high'] } : null;
}

function textsOf(value: unknown): readonly string[] {
  return Array.isArray(value) ? value.filter(isText) : [];
}
