/** Finds the comments that accept a finding: `# bandkeep: accept CODE [down to X], reason`. */
import { readQuantity } from '../units/read-quantity';
import { errorAt } from './local-problem';
import type { LocalProblem } from './local-problem';
import type { Span } from './place';
import type { Acceptance } from './reading';

/** The acceptances of a text, and those that are not complete. */
export interface Acceptances {
  readonly acceptances: readonly Acceptance[];
  readonly problems: readonly LocalProblem[];
}

/** Finds them in a text; `inScalar` tells whether an offset lies inside a scalar, where nothing is a comment. */
export function findAcceptances(text: string, inScalar: (offset: number) => boolean): Acceptances {
  const found = { acceptances: [] as Acceptance[], problems: [] as LocalProblem[] };
  let line: Span = { start: 0, end: 0 };
  let from: number;
  for (let at = text.indexOf(mark); at >= 0; at = text.indexOf(mark, from)) {
    from = at + mark.length;
    const index = commentStart(text, at);
    if (index === null || inScalar(index)) continue;
    const { end } = lineOf(text, index);
    from = Math.max(from, end);
    const span = { start: index, end: index + text.slice(index, end).trimEnd().length };
    const read = acceptanceOf(text.slice(at + mark.length, span.end).trim());
    if ('message' in read) found.problems.push(errorAt(span, 'syntax', read.message));
    // Comments that are stacked speak for the same line; finding it once keeps this linear.
    if (index >= line.start) line = spokenFor(text, index);
    if (!('message' in read)) found.acceptances.push({ ...read, span, line });
  }
  return found;
}

const mark = 'bandkeep:';

/** Where the comment begins that the mark opens, or null. */
function commentStart(text: string, at: number): number | null {
  let hash = at - 1;
  while (text.charAt(hash) === ' ' || text.charAt(hash) === '\t') hash -= 1;
  const opens = text.charAt(hash) === '#' && (hash === 0 || /[\s\uFEFF]/.test(text.charAt(hash - 1)));
  return opens ? hash : null;
}

type Read = Pick<Acceptance, 'code' | 'reason' | 'downTo' | 'downToUnit'> | { readonly message: string };

const form = '`# bandkeep: accept CODE, reason`';

function acceptanceOf(said: string): Read {
  const words = /^accept(?:[ \t]+(?<code>[a-z][a-z-]*))?(?<rest>.*)$/.exec(said)?.groups;
  if (words === undefined) return { message: `A \`bandkeep:\` comment accepts a finding and has the form ${form}.` };
  const code = words['code'];
  if (code === undefined) return { message: `This accepts nothing: name the finding's code, as in ${form}.` };
  const rest = words['rest'] ?? '';
  // A bound may hold a decimal point, never a comma.
  const comma = rest.indexOf(',');
  const reason = comma < 0 ? '' : rest.slice(comma + 1).trim();
  const between = (comma < 0 ? rest : rest.slice(0, comma)).trim();
  const bound = boundOf(between);
  if ('message' in bound) return bound;
  if (reason === '')
    return { message: `An acceptance needs its reason: write \`# bandkeep: accept ${code}, \` and why it is acceptable.` };
  return { code, reason, ...bound };
}

function boundOf(between: string): Pick<Acceptance, 'downTo' | 'downToUnit'> | { readonly message: string } {
  if (between === '') return { downTo: null, downToUnit: null };
  const written = /^down[ \t]+to[ \t]+(.+)$/.exec(between)?.[1];
  if (written === undefined) return { message: `A comma is missing behind the code: the form is ${form}.` };
  const read = readQuantity(written, ['decibel', 'time']);
  return 'quantity' in read
    ? { downTo: read.quantity.value, downToUnit: read.quantity.unit === 's' ? 's' : 'dB' }
    : { message: `\`${written}\` is no margin: write \`down to −1.5 dB\`, in the unit of the finding.` };
}

function lineOf(text: string, offset: number): Span {
  const lineFeed = text.indexOf('\n', offset);
  const end = lineFeed < 0 ? text.length : lineFeed;
  return { start: text.lastIndexOf('\n', offset - 1) + 1, end: text.charAt(end - 1) === '\r' ? end - 1 : end };
}

/** The comment's own line where something stands in front of it, else the next line that is no comment of its own. */
function spokenFor(text: string, offset: number): Span {
  let line = lineOf(text, offset);
  while (/^[ \t\uFEFF]*#/.test(text.slice(line.start, line.end))) {
    const next = text.indexOf('\n', line.end) + 1;
    if (next === 0) return { start: text.length, end: text.length };
    line = lineOf(text, next);
  }
  return line;
}
