/** The printed table of outside values: group, number of values, worst deviation, what is allowed there, source. */
import type { OutsideGroup, TallyLine } from './group';

/** One line of the table. */
export interface TableLine extends TallyLine, Pick<OutsideGroup, 'title' | 'source'> {}

const units = { relative: '', dB: ' dB', absolute: ' abs.', exact: '' } as const;

/** The lines under a heading, in columns, with the sum of values last. */
export function tableText(lines: readonly TableLine[]): string {
  const total = lines.reduce((sum, { values }) => sum + values, 0);
  const rows = [
    ['group', 'values', 'worst deviation', 'allowed', 'source'],
    ...lines.map((line, index) => {
      const [title, source] = line.title === lines[index - 1]?.title ? ['', ''] : [line.title, line.source];
      return [title, String(line.values), size(line, line.deviation), size(line, line.allowed), source];
    }),
    ['all groups', String(total), '', '', ''],
  ];
  const widths = [0, 1, 2, 3].map((column) => Math.max(...rows.map((row) => row[column]?.length ?? 0)));
  return rows
    .map(
      (row) =>
        row
          .map((cell, column) => cell.padEnd(widths[column] ?? 0))
          .join('  ')
          .trimEnd() + '\n',
    )
    .join('');
}

function size({ measure }: TallyLine, value: number): string {
  return measure === 'exact' ? 'exact' : `${value === 0 ? '0' : value.toExponential(1)}${units[measure]}`;
}
