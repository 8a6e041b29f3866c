/** What a hover says: a short answer, a small table, the formula's name; written as Markdown or plain text. */

/** One row of the table. */
export type Row = readonly [label: string, value: string];

/** A hover's content before it is written out. */
export interface Answer {
  /** One line, printed bold. */
  readonly headline: string;
  readonly rows: readonly Row[];
  /** Which formula or model the numbers come from; null where there are none. */
  readonly formula: string | null;
}

/** The rows whose value is known. */
export function knownRows(...rows: readonly (readonly [label: string, value: string | null])[]): Row[] {
  return rows.flatMap(([label, value]) => (value === null ? [] : [[label, value] as const]));
}

/** An answer and, below it, what the declaration says of the key; either may be missing. */
export function writeHover(answer: Answer | null, prose: string | null, markdown: boolean): string {
  const parts = answer === null ? [] : markdown ? markdownParts(answer) : plainParts(answer);
  if (prose !== null) parts.push(prose);
  return parts.join('\n\n');
}

function markdownParts({ headline, rows, formula }: Answer): string[] {
  const parts = [`**${headline}**`];
  if (rows.length > 0)
    parts.push(['| | |', '|---|---|', ...rows.map(([label, value]) => `| ${cell(label)} | ${cell(value)} |`)].join('\n'));
  if (formula !== null) parts.push(`*${formula}*`);
  return parts;
}

/** A bar would end the cell. */
function cell(text: string): string {
  return text.replaceAll('|', '\\|');
}

function plainParts({ headline, rows, formula }: Answer): string[] {
  const width = Math.max(0, ...rows.map(([label]) => label.length));
  const table = rows.map(([label, value]) => `${label.padEnd(width)}  ${value}`).join('\n');
  return [headline, table, formula ?? ''].filter((part) => part !== '');
}
