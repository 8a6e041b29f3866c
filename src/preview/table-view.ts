/** A plot's data as a real table, and every curve's points behind a fold that is filled when it is opened. */
import type { Column, Item, Plot, Row } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';
import { formatDb, formatFrequency } from '../units/format';
import { button, element, keepingFocus } from './dom';
import { pointsOf } from './reading';

/** Fills a region with the table and the curves; folds that were open stay open. */
export function fillTable(region: HTMLElement, plot: Plot, reveal: (place: PlaceName) => void): void {
  const open = new Set(Array.from(region.querySelectorAll<HTMLElement>('details[open]'), (details) => details.dataset['item']));
  keepingFocus(region, () => {
    region.replaceChildren(itemTable(plot, reveal), ...curvesOf(plot));
  });
  for (const details of region.querySelectorAll('details')) details.open = open.has(details.dataset['item']);
}

function itemTable(plot: Plot, reveal: (place: PlaceName) => void): HTMLTableElement {
  const head = element(
    'tr',
    {},
    ...plot.table.columns.map((column) => element('th', { text: column.title, attributes: { scope: 'col' } })),
  );
  const rows = plot.table.rows.map((row) => rowOf(row, plot, reveal));
  const caption = element('caption', { text: plot.table.caption });
  return element('table', {}, caption, element('thead', {}, head), element('tbody', {}, ...rows));
}

function curvesOf(plot: Plot): HTMLDetailsElement[] {
  return plot.items.filter((item) => (pointsOf(item)?.x.length ?? 0) > 2).map((item) => curveOf(item, plot));
}

function rowOf(row: Row, plot: Plot, reveal: (place: PlaceName) => void): HTMLTableRowElement {
  const item = plot.items.find((candidate) => candidate.id === row.item);
  const place = item?.place ?? null;
  const cells = row.cells.map((cell, index) => {
    const text = cellText(cell, plot.table.columns[index]);
    if (index > 0) return element('td', { text, class: typeof cell === 'number' ? 'number' : '' });
    return element(
      'th',
      { attributes: { scope: 'row' } },
      place === null ? document.createTextNode(text) : link(text, place, reveal),
    );
  });
  const made = element('tr', {}, ...cells);
  if (item !== undefined) made.dataset['item'] = item.id;
  return made;
}

function link(text: string, place: PlaceName, reveal: (place: PlaceName) => void): HTMLButtonElement {
  const made = button(text, `Go to the line of ${text}`, () => {
    reveal(place);
  });
  made.className = 'link';
  made.dataset['key'] = text;
  return made;
}

/** A number with its unit, at the digits that matter; text as it stands; a dash for nothing. */
export function cellText(cell: string | number | null, column: Column | undefined): string {
  if (cell === null) return '–';
  if (typeof cell === 'string') return cell;
  if (column?.unit === 'Hz') return formatFrequency(cell);
  return column === undefined || column.unit === null ? String(cell) : formatDb(cell, column.unit, 2);
}

function curveOf(item: Item, plot: Plot): HTMLDetailsElement {
  const points = pointsOf(item);
  const count = points?.x.length ?? 0;
  const details = element('details', {}, element('summary', { text: `${item.name}: all ${count} points` }));
  details.dataset['item'] = item.id;
  const unit = plot.panes.find((pane) => pane.id === item.pane)?.y.unit ?? 'dB';
  details.addEventListener('toggle', () => {
    if (details.open && details.childElementCount === 1 && points !== null) details.append(pointTable(points.x, points.y, unit));
  });
  return details;
}

function pointTable(x: readonly number[], y: readonly number[], unit: string): HTMLTableElement {
  const body = x.map((frequency, index) =>
    element(
      'tr',
      {},
      element('td', { text: formatFrequency(frequency), class: 'number' }),
      element('td', { text: formatDb(y[index] ?? 0, unit, 3), class: 'number' }),
    ),
  );
  const titles = ['frequency', 'level'].map((text) => element('th', { text, attributes: { scope: 'col' } }));
  return element('table', { class: 'points' }, element('thead', {}, element('tr', {}, ...titles)), element('tbody', {}, ...body));
}
