/** One plot on one canvas: the chart draws the curves, a plugin of ours everything that lies under and over them. */
import { Chart, LineController, LineElement, LinearScale, LogarithmicScale, PointElement } from 'chart.js';
import type { Plugin, Point } from 'chart.js';
import { axesOf, gridOf } from '../drawing/axes';
import { frameOf } from '../drawing/frame';
import type { Frame } from '../drawing/frame';
import type { PlacedLabel } from '../drawing/label-placement';
import { labelWritings, placedLabels } from '../drawing/labels';
import type { Look } from '../drawing/look';
import { boxSteps } from '../drawing/primitive';
import type { Box, Outline } from '../drawing/primitive';
import { curvesOf, fillsOf, marksOf } from '../drawing/scene';
import type { Theme } from '../drawing/theme';
import type { Item, Plot } from '../protocol/picture';
import { fontOf, paint } from './canvas-painter';
import { configOf, datasetsOf, scalesOf } from './chart-config';
import type { CurveDataset } from './chart-config';
import { wholePane } from './zoom';
import type { PlotState } from './view-state';

Chart.register(LineController, LineElement, PointElement, LinearScale, LogarithmicScale);

/** Everything that decides what a canvas shows. */
export interface ChartInput {
  /** Without hidden series. */
  readonly plot: Plot;
  readonly state: PlotState;
  readonly theme: Theme;
}

/** What changes while the reader points at things; none of it needs the data to be laid out again. */
export interface Pointing {
  /** Items of the line that the cursor is in: drawn stronger. */
  readonly lit: ReadonlySet<string>;
  /** Items that are looked at: drawn stronger, all others stand back. */
  readonly hovered: ReadonlySet<string>;
  /** The point that is read out. */
  readonly cross: { readonly x: number; readonly y: number; readonly box: Box } | null;
  /** The stretch that is being dragged out. */
  readonly dragged: Box | null;
}

/** A canvas nobody points at. */
export const noPointing: Pointing = { lit: new Set(), hovered: new Set(), cross: null, dragged: null };

/** Whether two show the same, so that nothing need be drawn again. */
export function samePointing(one: Pointing, other: Pointing): boolean {
  const same = (a: ReadonlySet<string>, b: ReadonlySet<string>): boolean => a.size === b.size && [...a].every((id) => b.has(id));
  return (
    same(one.lit, other.lit) && same(one.hovered, other.hovered) && one.cross === other.cross && one.dragged === other.dragged
  );
}

/** A live chart. */
export class PlotChart {
  private readonly chart: Chart<'line', Point[]>;
  private pointing = noPointing;
  private labels: readonly PlacedLabel[] = [];

  /** Draws at once; the canvas must be on the page. */
  constructor(
    private readonly canvas: HTMLCanvasElement,
    private input: ChartInput,
  ) {
    const config = configOf(input.plot, this.frame(), input.theme);
    this.chart = new Chart(canvas, { ...config, plugins: [this.plugin()] });
  }

  /** Shows other data, another stretch or another theme in the same chart. */
  show(input: ChartInput): void {
    const kept = this.input.plot === input.plot && this.input.theme === input.theme;
    this.input = input;
    if (!kept) this.chart.data.datasets = datasetsOf(input.plot, input.theme);
    this.chart.options.scales = scalesOf(this.frame()) ?? {};
    this.chart.update('none');
  }

  /** Shows what is pointed at, without laying anything out. */
  point(pointing: Pointing): void {
    this.pointing = pointing;
    this.chart.draw();
  }

  /** Where the panes stand now. */
  frame(): Frame {
    const { plot, state } = this.input;
    const width = this.canvas.clientWidth > 0 ? this.canvas.clientWidth : 600;
    return frameOf(plot, width, (pane) => state.panes[pane] ?? wholePane);
  }

  /** Where the chart's own scales stand, to be held against `frame`. */
  scaleBoxes(): Readonly<Record<string, Box>> {
    const entries = Object.entries(this.chart.scales).map(
      ([id, { left, top, right, bottom }]) => [id, { left, top, right, bottom }] as const,
    );
    return Object.fromEntries(entries);
  }

  /** Where the labels stand. */
  labelBoxes(): readonly PlacedLabel[] {
    return this.labels;
  }

  /** The picture as PNG, base64 without a prefix. */
  png(): string {
    return this.chart.toBase64Image('image/png').replace(/^data:image\/png;base64,/, '');
  }

  /** Frees the canvas and its listeners. */
  destroy(): void {
    this.chart.destroy();
  }

  private look(): Look {
    const { lit, hovered } = this.pointing;
    return {
      theme: this.input.theme,
      emphasisOf: ({ id }: Item) => (hovered.has(id) || lit.has(id) ? 'lit' : hovered.size > 0 ? 'dim' : 'plain'),
    };
  }

  private plugin(): Plugin<'line'> {
    return {
      id: 'scene',
      afterUpdate: (chart) => {
        this.placeLabels(chart.ctx);
      },
      resize: (chart) => {
        this.placeLabels(chart.ctx);
      },
      beforeDatasetsDraw: (chart) => {
        this.paintUnder(chart.ctx);
      },
      beforeDatasetDraw: (chart, { index }) => {
        const { item } = chart.data.datasets[index] as CurveDataset;
        chart.ctx.globalAlpha = this.look().emphasisOf(item) === 'dim' ? 0.3 : 1;
      },
      afterDatasetDraw: (chart) => {
        chart.ctx.globalAlpha = 1;
      },
      afterDatasetsDraw: (chart) => {
        this.paintOver(chart.ctx);
      },
    };
  }

  private placeLabels(context: CanvasRenderingContext2D): void {
    this.labels = placedLabels(this.input.plot, this.frame(), this.input.theme, this.measure(context));
  }

  private measure(context: CanvasRenderingContext2D): (text: string) => number {
    context.font = fontOf(this.input.theme);
    return (text) => context.measureText(text).width;
  }

  private paintUnder(context: CanvasRenderingContext2D): void {
    const { plot, theme } = this.input;
    const frame = this.frame();
    const paper: Outline = {
      kind: 'outline',
      steps: boxSteps({ left: 0, top: 0, right: frame.width, bottom: frame.height }),
      fill: { colour: theme.background, opacity: 1, hatch: null },
      pen: null,
      clip: null,
    };
    paint(context, [paper, ...gridOf(frame, theme), ...fillsOf(plot, frame, this.look())], theme);
  }

  private paintOver(context: CanvasRenderingContext2D): void {
    const { plot, theme } = this.input;
    const frame = this.frame();
    const look = this.look();
    const lit = { ...plot, items: plot.items.filter((item) => look.emphasisOf(item) === 'lit') };
    paint(context, [...curvesOf(lit, frame, look), ...axesOf(plot, frame, theme, this.measure(context))], theme);
    paint(context, [...marksOf(plot, frame, look), ...labelWritings(this.labels, plot, theme)], theme);
    paint(context, this.pointer(), theme);
  }

  private pointer(): Outline[] {
    const { cross, dragged } = this.pointing;
    const { focus } = this.input.theme;
    const outlines: Outline[] = [];
    if (cross !== null) {
      const { x, y, box } = cross;
      const arms = [
        ['M', x, box.top] as const,
        ['L', x, box.bottom] as const,
        ['M', box.left, y] as const,
        ['L', box.right, y] as const,
      ];
      outlines.push({
        kind: 'outline',
        steps: arms,
        fill: null,
        pen: { colour: focus, opacity: 0.75, width: 1, dash: [3, 3] },
        clip: box,
      });
    }
    if (dragged !== null) {
      const fill = { colour: focus, opacity: 0.15, hatch: null };
      outlines.push({
        kind: 'outline',
        steps: boxSteps(dragged),
        fill,
        pen: { colour: focus, opacity: 1, width: 1, dash: [] },
        clip: null,
      });
    }
    return outlines;
  }
}
