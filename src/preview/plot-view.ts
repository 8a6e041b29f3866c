/** One plot on the page: it keeps what the reader has set while pictures come and go, and redraws in the same chart. */
import { toValue } from '../drawing/axis-scale';
import { plotHeight } from '../drawing/frame';
import type { PaneView } from '../drawing/frame';
import { plotSvg } from '../drawing/plot-svg';
import type { Theme } from '../drawing/theme';
import type { SaveKind } from '../protocol/panel-messages';
import type { Pane, Plot } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';
import { plotCsv } from './csv';
import { button, keepingFocus, setText } from './dom';
import { listenForGestures } from './gestures';
import type { GestureTarget, Spot } from './gestures';
import { paneAt } from './hit';
import { actionOf } from './keys';
import type { PlotAction } from './keys';
import { fillLegend } from './legend';
import { itemsAt } from './places';
import { noPointing, PlotChart, samePointing } from './plot-chart';
import type { Pointing } from './plot-chart';
import { fittedState, isPartial, selectionOf, shownPlot, viewOf, withToggled, withView, withWholeView } from './plot-model';
import { plotParts } from './plot-parts';
import type { PlotParts } from './plot-parts';
import { PlotReader } from './plot-reader';
import { fillTable } from './table-view';
import type { PlotState } from './view-state';
import { framed, panned, rangeInView, rescaled, scaleOf, wholePane, zoomed } from './zoom';

/** What a plot asks of the page. */
export interface PlotTarget {
  remember: (state: PlotState) => void;
  reveal: (place: PlaceName) => void;
  announce: (words: string) => void;
  save: (format: SaveKind, plot: Plot, data: string) => void;
}

/** One plot. */
export class PlotView {
  private readonly parts: PlotParts;
  private readonly reader: PlotReader;
  private chart: PlotChart | null = null;
  private pointing: Pointing = noPointing;
  private place: PlaceName | null = null;
  /** The plot that the table holds. */
  private tabled: Plot | null = null;

  constructor(
    private plot: Plot,
    private state: PlotState,
    private theme: Theme,
    private readonly target: PlotTarget,
  ) {
    this.parts = plotParts(`plot-${plot.id}`, {
      open: () => {
        this.change({ ...this.state, opened: this.state.opened === 'opened' ? 'closed' : 'opened' });
      },
      table: () => {
        this.toggleTable();
      },
      whole: () => {
        this.change(withWholeView(this.plot, this.state));
      },
      save: (format) => {
        this.save(format);
      },
    });
    this.reader = new PlotReader({
      tip: this.parts.tip,
      point: (change) => {
        this.point({ ...this.pointing, ...change });
      },
      announce: target.announce,
    });
    this.state = fittedState(plot, state);
    this.listen();
    this.fill();
  }

  /** The plot's element. */
  get element(): HTMLElement {
    return this.parts.root;
  }

  /** The live chart; null until it has first been drawn. */
  get drawn(): PlotChart | null {
    return this.chart;
  }

  /** Draws; called when the plot is in sight and after anything has changed. */
  draw(): void {
    if (this.closed()) return;
    const input = { plot: this.shown(), state: this.state, theme: this.theme };
    if (this.chart === null) {
      this.chart = new PlotChart(this.parts.canvas, input);
      if (this.pointing !== noPointing) this.chart.point(this.pointing);
    } else this.chart.show(input);
    this.reader.refresh(input.plot, this.chart.frame());
  }

  /** Takes a newer picture of the same plot; zoom, hidden series, cursor and table stay. */
  show(plot: Plot, state: PlotState, theme: Theme): void {
    this.plot = plot;
    this.theme = theme;
    this.state = fittedState(plot, state);
    this.fill();
    this.redraw();
    this.light(this.place);
  }

  /** Lights the items of the line that the editor's cursor is in. */
  light(place: PlaceName | null): void {
    this.place = place;
    this.point({ ...this.pointing, lit: new Set(itemsAt(this.plot.items, place)) });
  }

  /** Shows or hides the table. */
  toggleTable(): void {
    this.change({ ...this.state, table: this.state.table === 'shown' ? 'hidden' : 'shown' });
    this.target.announce(this.state.table === 'shown' ? `Table of ${this.plot.title} shown.` : 'Table hidden.');
  }

  /** Frees the chart. */
  destroy(): void {
    this.chart?.destroy();
    this.chart = null;
    this.parts.root.remove();
  }

  private listen(): void {
    const { stage } = this.parts;
    listenForGestures(stage, () => document.activeElement === stage, this.gestures());
    stage.addEventListener('keydown', (event) => {
      const action = actionOf(event);
      if (action === null) return;
      event.preventDefault();
      event.stopPropagation();
      this.act(action);
    });
    stage.addEventListener('blur', () => {
      if (this.chart !== null) this.reader.leave(this.shown(), this.chart.frame());
    });
  }

  private gestures(): GestureTarget {
    return {
      hover: (at) => {
        if (this.chart !== null) this.reader.hover(this.shown(), this.chart.frame(), at);
      },
      pick: (at) => {
        if (this.chart !== null) this.reader.put(this.reader.hover(this.shown(), this.chart.frame(), at));
        this.parts.stage.focus({ preventScroll: true });
      },
      dragging: (box) => {
        const frame = this.chart?.frame();
        const selection = box === null || frame === undefined ? null : selectionOf(frame, box);
        this.point({ ...this.pointing, dragged: selection?.box ?? null });
      },
      dragged: (box) => {
        const frame = this.chart?.frame();
        const selection = frame === undefined ? null : selectionOf(frame, box);
        if (selection !== null) this.see(selection.pane, (pane, view) => framed(pane, view, selection.x, selection.y));
      },
      moved: (at, byX) => {
        this.seeAt(at, (pane, view, { width }) => panned(pane, view, -byX / width));
      },
      wheeled: (at, factor) => {
        this.seeAt(at, (pane, view, { frequencyHz }) => zoomed(pane, view, factor, frequencyHz));
      },
      whole: (at) => {
        this.seeAt(at, (_, view) => ({ ...wholePane, scale: view.scale }));
      },
    };
  }

  private act(action: PlotAction): void {
    const frame = this.chart?.frame();
    const pane = this.plot.panes.find((candidate) => candidate.id === this.reader.pane) ?? this.plot.panes[0];
    if (frame === undefined || pane === undefined) return;
    switch (action.kind) {
      case 'zoom':
        this.see(pane.id, (data, view) => zoomed(data, view, action.factor, this.reader.frequencyHz ?? middleOf(data, view)));
        return;
      case 'pan':
        this.see(pane.id, (data, view) => panned(data, view, action.share));
        return;
      case 'whole':
        this.change(withWholeView(this.plot, this.state));
        return;
      case 'step':
      case 'end':
      case 'item':
        this.reader.move(this.shown(), frame, action);
        return;
      case 'follow':
        if (this.reader.place !== null) this.target.reveal(this.reader.place);
        return;
      case 'leave':
        this.reader.leave(this.shown(), frame);
        return;
      case 'table':
        this.toggleTable();
        return;
      case 'scale':
        this.switchScale(pane);
    }
  }

  private seeAt(at: Spot, change: (pane: Pane, view: PaneView, spot: { frequencyHz: number; width: number }) => PaneView): void {
    const frame = this.chart?.frame();
    const place = frame === undefined ? null : paneAt(frame, at.y);
    if (place === null) return;
    const spot = { frequencyHz: toValue(place.x, at.x), width: place.box.right - place.box.left };
    this.see(place.id, (pane, view) => change(pane, view, spot));
  }

  private see(pane: string, change: (pane: Pane, view: PaneView) => PaneView): void {
    this.change(withView(this.plot, this.state, pane, change));
  }

  private switchScale(pane: Pane): void {
    this.see(pane.id, (data, view) => rescaled(data, view, scaleOf(data, view) === 'log' ? 'linear' : 'log'));
  }

  private change(state: PlotState): void {
    this.state = state;
    this.target.remember(state);
    this.fill();
    this.redraw();
  }

  /** Draws again what has been drawn, and what has just been opened. */
  private redraw(): void {
    const inSight = this.parts.root.offsetParent !== null;
    if (this.chart !== null || inSight) this.draw();
  }

  private closed(): boolean {
    return this.plot.shown === 'on demand' && this.state.opened === 'closed';
  }

  private shown(): Plot {
    return shownPlot(this.plot, this.state);
  }

  private point(pointing: Pointing): void {
    if (samePointing(this.pointing, pointing)) return;
    this.pointing = pointing;
    this.chart?.point(pointing);
  }

  private fill(): void {
    const { parts, plot, state } = this;
    parts.opener.hidden = plot.shown === 'always';
    parts.opener.setAttribute('aria-expanded', String(!this.closed()));
    setText(parts.openerTitle, plot.words);
    parts.content.hidden = this.closed();
    parts.stage.setAttribute('aria-label', plot.title);
    parts.stage.style.height = `${plotHeight(plot)}px`;
    setText(parts.words, plot.words);
    parts.whole.hidden = !isPartial(plot, state);
    parts.tableButton.setAttribute('aria-pressed', String(state.table === 'shown'));
    this.fillLegend();
    this.fillScales();
    parts.table.hidden = state.table === 'hidden';
    parts.table.setAttribute('aria-label', plot.table.caption);
    if (state.table === 'hidden' || this.tabled === plot) return;
    fillTable(parts.table, plot, this.target.reveal);
    this.tabled = plot;
  }

  private fillLegend(): void {
    fillLegend(this.parts.legend, this.plot, this.state.hidden, this.theme, {
      toggle: (series) => {
        this.change(withToggled(this.state, series));
      },
      reveal: this.target.reveal,
      point: (series) => {
        this.reader.hoverSeries(this.shown(), series);
      },
    });
  }

  private fillScales(): void {
    const buttons = this.plot.panes.map((pane) => {
      const scale = scaleOf(pane, viewOf(this.state, pane.id));
      const name = pane.x.title.replace(/^Hz ?/, '').replace(/,.*$/, '') || 'frequency';
      const made = button(`${name}: ${scale}`, 'Change the frequency scale (L)', () => {
        this.switchScale(pane);
      });
      made.dataset['key'] = pane.id;
      return made;
    });
    keepingFocus(this.parts.scales, () => {
      this.parts.scales.replaceChildren(...buttons);
    });
  }

  private save(format: SaveKind): void {
    const data = { png: () => this.chart?.png() ?? '', svg: () => this.svg(), csv: () => plotCsv(this.plot) }[format]();
    if (data !== '') this.target.save(format, this.plot, data);
  }

  private svg(): string {
    const width = this.chart?.frame().width ?? 800;
    return plotSvg(this.shown(), { width, theme: this.theme, viewOf: (pane) => viewOf(this.state, pane) });
  }
}

function middleOf(pane: Pane, view: PaneView): number {
  const { low, high } = rangeInView(pane, view);
  return scaleOf(pane, view) === 'log' ? Math.sqrt(low * high) : (low + high) / 2;
}
