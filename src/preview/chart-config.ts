/** A plot as a chart's configuration: one line a curve, one pair of scales a pane, the panes stacked with room for ribbons between them. */
import type { ChartConfiguration, ChartDataset, Point, ScaleOptionsByType } from 'chart.js';
import { heights, margins } from '../drawing/frame';
import type { Frame } from '../drawing/frame';
import { curvePen } from '../drawing/look';
import type { Look } from '../drawing/look';
import type { Theme } from '../drawing/theme';
import type { Item, Plot, Points, Shape } from '../protocol/picture';

/** A chart of lines. */
export type PlotConfig = ChartConfiguration<'line', Point[]>;

/** A line of a chart, with the item that it belongs to. */
export interface CurveDataset extends ChartDataset<'line', Point[]> {
  readonly item: Item;
}

/** One dataset for each curve, as nobody points at it: emphasis comes and goes between updates, so it is painted over the chart. */
export function datasetsOf(plot: Plot, theme: Theme): CurveDataset[] {
  const look: Look = { theme, emphasisOf: () => 'plain' };
  return plot.items.flatMap((item) =>
    item.shapes.flatMap((shape) => (shape.kind === 'curve' ? [datasetOf(item, shape, look)] : [])),
  );
}

/** The scales for what a frame shows; they draw nothing themselves. */
export function scalesOf(frame: Frame): NonNullable<PlotConfig['options']>['scales'] {
  const scales: Record<string, unknown> = {};
  frame.panes.forEach((pane, index) => {
    scales[`x-${pane.id}`] = {
      ...silent,
      axis: 'x',
      type: pane.x.kind === 'log' ? 'logarithmic' : 'linear',
      min: pane.x.low,
      max: pane.x.high,
    };
    // Stacks fill from below, so the last pane comes first.
    const weight = { stack: 'panes', stackWeight: frame.panes.length === 1 ? heights.lone : heights.stacked, weight: -2 * index };
    scales[`y-${pane.id}`] = {
      ...silent,
      ...weight,
      axis: 'y',
      type: 'linear',
      position: 'left',
      min: pane.y.low,
      max: pane.y.high,
    };
    if (index > 0) scales[`between-${pane.id}`] = spacer(index);
  });
  return scales as NonNullable<PlotConfig['options']>['scales'];
}

/** The configuration of a chart that neither animates nor listens: the page does what is left to do. */
export function configOf(plot: Plot, frame: Frame, theme: Theme): PlotConfig {
  return {
    type: 'line',
    data: { datasets: datasetsOf(plot, theme) },
    options: {
      animation: false,
      responsive: true,
      maintainAspectRatio: false,
      parsing: false,
      normalized: true,
      events: [],
      layout: { padding: { ...margins } },
      scales: scalesOf(frame) ?? {},
    },
  };
}

const silent: Partial<ScaleOptionsByType<'linear'>> = {
  display: false,
  bounds: 'data',
  // The page draws its own ticks; the scale need not make any.
  afterBuildTicks: (scale) => {
    scale.ticks = [];
  },
};

function spacer(index: number): unknown {
  const place = { stack: 'panes', stackWeight: heights.between, weight: 1 - 2 * index, position: 'left' };
  return { ...silent, ...place, axis: 'y', type: 'linear', min: 0, max: 1 };
}

function datasetOf(item: Item, shape: Shape & { readonly kind: 'curve' }, look: Look): CurveDataset {
  const pen = curvePen(item, shape, look);
  return {
    item,
    label: item.name,
    data: pointsOf(shape.points),
    xAxisID: `x-${item.pane}`,
    yAxisID: `y-${item.pane}`,
    borderColor: pen.colour,
    borderWidth: pen.width,
    borderDash: [...pen.dash],
    borderJoinStyle: 'round',
    pointRadius: 0,
    pointHitRadius: 0,
    fill: false,
  };
}

function pointsOf(points: Points): Point[] {
  return points.x.map((x, index) => ({ x, y: points.y[index] ?? 0 }));
}
