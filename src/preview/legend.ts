/** The list under a plot: each series with a swatch that hides or shows it and a name that leads to its line. */
import { inkOf } from '../drawing/theme';
import type { Theme } from '../drawing/theme';
import type { Item, Plot, Series, Stroke } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';
import { button, element, keepingFocus } from './dom';

/** What the legend asks for. */
export interface LegendTarget {
  toggle: (series: string) => void;
  reveal: (place: PlaceName) => void;
  /** The pointer or the focus is on a series; null: it has left. */
  point: (series: string | null) => void;
}

/** Fills the list; called anew when the series change. */
export function fillLegend(list: HTMLElement, plot: Plot, hidden: readonly string[], theme: Theme, target: LegendTarget): void {
  const entries = plot.series.map((series) =>
    entryOf(series, plot, hidden.includes(series.id) ? 'hidden' : 'shown', theme, target),
  );
  keepingFocus(list, () => {
    list.replaceChildren(...entries);
  });
}

function entryOf(series: Series, plot: Plot, state: 'hidden' | 'shown', theme: Theme, target: LegendTarget): HTMLLIElement {
  const swatch = button('', `${state === 'hidden' ? 'Show' : 'Hide'} ${series.name}`, () => {
    target.toggle(series.id);
  });
  swatch.className = 'swatch';
  swatch.dataset['key'] = `swatch ${series.id}`;
  swatch.setAttribute('aria-label', series.name);
  swatch.setAttribute('aria-pressed', String(state === 'shown'));
  swatch.append(sampleOf(series, plot, theme));
  const entry = element('li', { class: state === 'hidden' ? 'off' : '' }, swatch, nameOf(series, target));
  const point = (id: string | null) => (): void => {
    target.point(id);
  };
  entry.addEventListener('pointerenter', point(series.id));
  entry.addEventListener('pointerleave', point(null));
  return entry;
}

function nameOf(series: Series, target: LegendTarget): HTMLElement {
  const { place } = series;
  if (place === null) return element('span', { class: 'name', text: series.name });
  const link = button(series.name, `Go to the line of ${series.name}`, () => {
    target.reveal(place);
  });
  link.className = 'name link';
  link.dataset['key'] = `name ${series.id}`;
  return link;
}

/** A small drawing of how the series looks: a filled box or a dashed line. */
function sampleOf(series: Series, plot: Plot, theme: Theme): SVGElement {
  const items = plot.items.filter((item) => item.series === series.id);
  const colour = inkOf(series.role, theme);
  const filled = items.some((item) =>
    item.shapes.some((shape) => shape.kind === 'block' || shape.kind === 'area' || shape.kind === 'stem'),
  );
  const sample = svg('svg', { width: '18', height: '12', viewBox: '0 0 18 12', 'aria-hidden': 'true' });
  if (filled) sample.append(svg('rect', { x: '1', y: '2', width: '16', height: '9', fill: colour, 'fill-opacity': '0.3' }));
  const y = filled ? '2' : '6';
  sample.append(
    svg('line', { x1: '1', x2: '17', y1: y, y2: y, stroke: colour, 'stroke-width': '2', 'stroke-dasharray': dashOf(items) }),
  );
  return sample;
}

function dashOf(items: readonly Item[]): string {
  const curve = items.flatMap((item) => item.shapes).find((shape) => shape.kind === 'curve');
  const dashes: Readonly<Record<Stroke, string>> = {
    solid: '',
    dashed: '5 2.5',
    dotted: '1.5 2',
    'dash-dot': '6 2 1.5 2',
    'long-dash': '7 2',
  };
  if (curve?.kind === 'curve') return dashes[curve.stroke];
  return items.some((item) => item.role === 'rule') ? dashes.dotted : '';
}

function svg(name: string, attributes: Readonly<Record<string, string>>): SVGElement {
  const made = document.createElementNS('http://www.w3.org/2000/svg', name);
  for (const [key, value] of Object.entries(attributes)) made.setAttribute(key, value);
  return made;
}
