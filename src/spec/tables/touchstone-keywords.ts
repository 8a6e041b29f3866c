/** Reads the keywords of a Touchstone file of version 2, and finds its network data. */
import type { TableFault } from './spec-table';

/** What the keywords say. */
export interface Keywords {
  /** Which parameter of a record is S11, S21, S12 and S22. */
  readonly order: readonly [number, number, number, number];
  readonly referenceOhm: number | null;
  /** How many points there are said to be; null where nothing is said. */
  readonly frequencies: number | null;
}

/** Version 1 has none: the order is S11 S21 S12 S22. */
export const noKeywords: Keywords = { order: [0, 1, 2, 3], referenceOhm: null, frequencies: null };

interface Line {
  readonly text: string;
  readonly line: number;
}

/** The keywords and the lines of network data. */
export interface Keyed {
  readonly keywords: Keywords;
  readonly data: readonly Line[];
}

/** Splits the lines by their keywords. */
export function keywordsOf(lines: readonly Line[]): Keyed | TableFault {
  const sections = new Map<string, Line[]>();
  let current = '';
  for (const { text, line } of lines) {
    const key = /^\[([^\]]*)\]\s*(.*)$/.exec(text);
    if (key !== null) current = (key[1] ?? '').toLowerCase().replace(/-/g, ' ').replace(/\s+/g, ' ').trim();
    const own = sections.get(current) ?? [];
    const rest = key === null ? text : (key[2] ?? '');
    if (rest !== '') own.push({ text: rest, line });
    sections.set(current, own);
    if (current === 'end') break;
  }
  return keyed(sections);
}

function keyed(sections: ReadonlyMap<string, readonly Line[]>): Keyed | TableFault {
  const said = (key: string) =>
    sections
      .get(key)
      ?.map(({ text }) => text)
      .join(' ')
      .trim()
      .toLowerCase() ?? null;
  const fault = (words: string, key: string): TableFault => ({ fault: words, line: sections.get(key)?.[0]?.line ?? null });
  const ports = said('number of ports');
  if (ports !== null && ports !== '2') return fault(`a stage has two ports, this file has ${ports}`, 'number of ports');
  if (sections.has('mixed mode order')) return fault('mixed-mode parameters are not those of one path', 'mixed mode order');
  const order = orderOf(said('two port data order'), said('matrix format') ?? 'full');
  if (typeof order === 'string') return fault(order, 'two port data order');
  const references = (said('reference') ?? '').split(/\s+/).filter(Boolean).map(Number);
  const [referenceOhm = null, second] = references;
  if (references.some((ohm) => !(ohm > 0))) return fault('[Reference] holds no resistance', 'reference');
  if (second !== undefined && second !== referenceOhm)
    return fault('the two ports have different reference resistances: one for both is needed', 'reference');
  const data = sections.get('network data');
  if (data === undefined) return fault('the file has no [Network Data]', 'network data');
  const count = said('number of frequencies');
  return { keywords: { order, referenceOhm, frequencies: count === null ? null : Number(count) }, data };
}

/** `21_12` is N11 N21 N12 N22, `12_21` is N11 N12 N21 N22; half a matrix is that of a reciprocal two-port. */
function orderOf(order: string | null, format: string): Keywords['order'] | string {
  if (format === 'lower' || format === 'upper') return [0, 1, 1, 2];
  if (format !== 'full') return `[Matrix Format] \`${format}\` is not known`;
  if (order === '21_12') return [0, 1, 2, 3];
  if (order === '12_21') return [0, 2, 1, 3];
  return order === null ? 'the file does not say its [Two-Port Data Order]' : `[Two-Port Data Order] \`${order}\` is not known`;
}
