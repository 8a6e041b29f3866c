/** What is read out of a plot: under the pointer or at the keyboard's cursor, shown beside the point, lit with all it is joined to, and told. */
import { toPixel } from '../drawing/axis-scale';
import type { Frame } from '../drawing/frame';
import type { Plot } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';
import { atEnd, onNextItem, rereadIn, stepped } from './cursor';
import { setText } from './dom';
import type { Spot } from './gestures';
import { hitAt } from './hit';
import type { PlotAction } from './keys';
import type { Pointing } from './plot-chart';
import { readingWords } from './reading';
import type { Reading } from './reading';

/** What the reader of a plot shows its readings with. */
export interface ReaderTarget {
  readonly tip: HTMLElement;
  point: (change: Pick<Pointing, 'hovered' | 'cross'>) => void;
  announce: (words: string) => void;
}

/** The acts that move the cursor. */
export type CursorAction = Extract<PlotAction, { readonly kind: 'step' | 'end' | 'item' }>;

/** Follows the pointer and the keyboard's cursor in one plot. */
export class PlotReader {
  private cursor: Reading | null = null;

  constructor(private readonly target: ReaderTarget) {}

  /** The pane of the cursor; null without one. */
  get pane(): string | null {
    return this.cursor?.item.pane ?? null;
  }

  /** The frequency of the cursor; null without one. */
  get frequencyHz(): number | null {
    return this.cursor?.frequencyHz ?? null;
  }

  /** The line of what the cursor is on. */
  get place(): PlaceName | null {
    return this.cursor?.item.place ?? null;
  }

  /** Reads what lies under the pointer; nothing, or the cursor again, where nothing does. */
  hover(plot: Plot, frame: Frame, at: Spot | null): Reading | null {
    const found = at === null ? null : hitAt(plot, frame, at.x, at.y);
    this.showReading(plot, frame, found ?? this.cursor, found === null ? null : at);
    return found;
  }

  /** Lights the items of one series, as the pointer on its name asks. */
  hoverSeries(plot: Plot, series: string | null): void {
    const items = plot.items.filter((item) => item.series === series);
    this.target.point({ hovered: new Set(items.flatMap((item) => [item.id, ...item.joins])), cross: null });
  }

  /** Moves the cursor and tells what it is on. */
  move(plot: Plot, frame: Frame, action: CursorAction): void {
    this.cursor = this.moved(plot, frame, action);
    this.showReading(plot, frame, this.cursor);
    const words = this.cursor === null ? 'Nothing to read here.' : wordsOf(this.cursor, plot);
    this.target.announce(words);
  }

  /** Puts the cursor where the pointer reads. */
  put(reading: Reading | null): void {
    this.cursor = reading;
  }

  /** Reads again after a redraw. */
  refresh(plot: Plot, frame: Frame): void {
    this.cursor = rereadIn(plot, frame, this.cursor);
    this.showReading(plot, frame, this.cursor);
  }

  /** Lets go of the cursor. */
  leave(plot: Plot, frame: Frame): void {
    this.cursor = null;
    this.showReading(plot, frame, null);
  }

  private moved(plot: Plot, frame: Frame, action: CursorAction): Reading | null {
    switch (action.kind) {
      case 'step':
        return stepped(plot, frame, this.cursor, action.by);
      case 'end':
        return atEnd(plot, frame, this.cursor, action.which);
      case 'item':
        return onNextItem(plot, frame, this.cursor, action.by);
    }
  }

  private showReading(plot: Plot, frame: Frame, reading: Reading | null, beside: Spot | null = null): void {
    const { tip } = this.target;
    const place = frame.panes.find((candidate) => candidate.id === reading?.item.pane);
    if (reading === null || place === undefined) {
      tip.hidden = true;
      this.target.point({ hovered: new Set(), cross: null });
      return;
    }
    const x = toPixel(place.x, reading.frequencyHz);
    const y = toPixel(place.y, reading.level);
    setText(tip, wordsOf(reading, plot));
    tip.hidden = false;
    placeTip(tip, beside ?? { x, y: Math.min(place.box.bottom, Math.max(place.box.top, y)) }, frame);
    this.target.point({ hovered: new Set([reading.item.id, ...reading.item.joins]), cross: { x, y, box: place.box } });
  }
}

function wordsOf(reading: Reading, plot: Plot): string {
  const pane = plot.panes.find((candidate) => candidate.id === reading.item.pane);
  return pane === undefined ? reading.item.words : readingWords(reading, pane);
}

/** Beside the point, on the side where there is room. */
function placeTip(tip: HTMLElement, at: Spot, frame: Frame): void {
  const width = tip.offsetWidth;
  const left = at.x + 14 + width > frame.width ? at.x - 14 - width : at.x + 14;
  tip.style.left = `${Math.max(2, left)}px`;
  const above = at.y - tip.offsetHeight - 12;
  tip.style.top = `${above < 2 ? at.y + 14 : above}px`;
}
