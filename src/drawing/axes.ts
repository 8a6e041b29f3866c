/** Grid, frame and axis texts of every pane. */
import type { Pane, Plot } from '../protocol/picture';
import { toPixel } from './axis-scale';
import type { Frame, PaneFrame } from './frame';
import type { Outline, Pen, Primitive, Step, Writing } from './primitive';
import type { Theme } from './theme';
import { frequencyTicks, levelTicks, withoutCollisions } from './ticks';

/** The lines that lie under everything. */
export function gridOf(frame: Frame, theme: Theme): Outline[] {
  return frame.panes.map((pane) => gridOfPane(pane, theme));
}

/** The texts and the base lines that lie over ribbons and fills. */
export function axesOf(plot: Plot, frame: Frame, theme: Theme, widthOf: (text: string) => number): Primitive[] {
  return plot.panes.flatMap((pane, index) => {
    const place = frame.panes.find((candidate) => candidate.id === pane.id);
    if (place === undefined) return [];
    // A pane on the same scale of levels as the one above need not say so again.
    const titled = plot.panes[index - 1]?.y.title === pane.y.title ? [] : [levelTitle(pane, place, theme)];
    return [...frequencyAxis(pane, place, theme, widthOf), ...levelAxis(place, theme), ...titled];
  });
}

function gridOfPane(pane: PaneFrame, theme: Theme): Outline {
  const { left, right } = pane.box;
  const steps = levelTicks(pane.y).flatMap((tick): Step[] => {
    const y = crisp(toPixel(pane.y, tick.value));
    return [
      ['M', left, y],
      ['L', right, y],
    ];
  });
  return {
    kind: 'outline',
    steps,
    fill: null,
    pen: { ...thinPen(theme.grid), opacity: theme.highContrast === 'yes' ? 0.4 : 1 },
    clip: null,
  };
}

function frequencyAxis(pane: Pane, place: PaneFrame, theme: Theme, widthOf: (text: string) => number): Primitive[] {
  const { left, right, bottom } = place.box;
  const ticks = withoutCollisions(frequencyTicks(place.x), place.x, widthOf);
  const base: Step[] = [
    ['M', left, crisp(bottom)],
    ['L', right, crisp(bottom)],
  ];
  const steps = ticks.flatMap((tick): Step[] => {
    const x = crisp(toPixel(place.x, tick.value));
    return [
      ['M', x, bottom],
      ['L', x, bottom + (tick.text === '' ? 3 : 6)],
    ];
  });
  const texts = ticks
    .filter((tick) => tick.text !== '')
    .map((tick) => writing(tick.text, toPixel(place.x, tick.value), bottom + 19, 'middle', theme));
  const outline: Outline = { kind: 'outline', steps: [...base, ...steps], fill: null, pen: thinPen(theme.muted), clip: null };
  return [outline, ...texts, writing(pane.x.title, right, bottom + 36, 'end', theme)];
}

function levelAxis(place: PaneFrame, theme: Theme): Writing[] {
  return levelTicks(place.y).map((tick) =>
    writing(tick.text, place.box.left - 8, toPixel(place.y, tick.value) + 4, 'end', theme),
  );
}

function levelTitle(pane: Pane, { box }: PaneFrame, theme: Theme): Writing {
  return writing(pane.y.title, box.left, box.top - 10, 'start', theme);
}

function writing(text: string, x: number, y: number, align: Writing['align'], theme: Theme): Writing {
  return { kind: 'text', text, x, y, align, colour: theme.muted, halo: theme.background };
}

function thinPen(colour: string): Pen {
  return { colour, opacity: 1, width: 1, dash: [] };
}

function crisp(pixel: number): number {
  return Math.round(pixel - 0.5) + 0.5;
}
