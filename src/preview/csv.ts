/** A plot's data as comma-separated text: its table, then every point of every curve, in full precision. */
import type { Item, Plot, Points } from '../protocol/picture';
import { pointsOf } from './reading';

/** The text, with a header line for each of the two parts and CRLF line ends, as RFC 4180 has it. */
export function plotCsv(plot: Plot): string {
  const head = plot.table.columns.map((column) => (column.unit === null ? column.title : `${column.title} (${column.unit})`));
  const rows = plot.table.rows.map((row) => row.cells);
  const curves = plot.items.flatMap((item) => pointRows(item));
  const curveHead = ['curve', 'frequency (Hz)', `level (${plot.panes.map((pane) => pane.y.unit).at(0) ?? 'dB'})`, 'from (Hz)'];
  return [head, ...rows, [], curveHead, ...curves].map((cells) => cells.map(cellText).join(',')).join('\r\n') + '\r\n';
}

function pointRows(item: Item): (string | number | null)[][] {
  const points: Points | null = pointsOf(item);
  if (points === null) return [];
  return points.x.map((x, index) => [item.name, x, points.y[index] ?? null, points.from?.[index] ?? null]);
}

/** A cell; text that a spreadsheet would take for a formula is kept text by an apostrophe. */
function cellText(cell: string | number | null): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return String(cell);
  const harmless = /^[=+@\t\r-]/.test(cell) ? `'${cell}` : cell;
  return /[",\r\n]/.test(harmless) ? `"${harmless.replaceAll('"', '""')}"` : harmless;
}
