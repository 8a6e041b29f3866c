/** Lines in column 0 that are no part of any spec: git conflict markers, document markers, directives. */
import { fault } from '../slips/fault';
import type { Fault } from '../slips/fault';
import { lineEndAt } from './content-lines';
import type { ContentLines } from './content-lines';

/** The faults, and the content lines (by index) that are to be read as blank. */
export interface MarginFaults {
  readonly faults: readonly Fault[];
  readonly blankLines: ReadonlySet<number>;
  /** Stretches of the text that a fault leaves in doubt: a channel that reaches into one is not whole. */
  readonly doubtful: readonly { readonly start: number; readonly end: number }[];
  /** Where the document ends: in front of a closing `...`, else with the text. */
  readonly end: number;
}

interface Found {
  end: number;
  readonly faults: Fault[];
  readonly blankLines: Set<number>;
  readonly doubtful: { start: number; end: number }[];
}

/** Finds them; the upper side of a conflict is read, the lower one is not. */
export function marginFaults(text: string, lines: ContentLines): MarginFaults {
  const found: Found = { faults: [], blankLines: new Set(), doubtful: [], end: text.length };
  const margin: number[] = [];
  for (let line = 0; line < lines.start.length; line += 1) if (lines.start[line] === lines.content[line]) margin.push(line);
  conflicts(text, lines, margin, found);
  documents(text, lines, margin, found);
  return found;
}

const conflictLine = /^(?:<{7}|\|{7}|={7}|>{7})(?:\s|$)/;

function conflicts(text: string, lines: ContentLines, margin: readonly number[], found: Found): void {
  const markers = margin.filter((line) => conflictLine.test(text.slice(lines.start[line], (lines.start[line] ?? 0) + 8)));
  const sign = (line: number | undefined): string => text.charAt(lines.start[line ?? -1] ?? text.length);
  for (let at = 0; at < markers.length;) {
    const block = [markers[at] ?? 0];
    at += 1;
    if (sign(block[0]) === '<') {
      while (at < markers.length && sign(markers[at]) !== '<' && sign(block.at(-1)) !== '>') {
        block.push(markers[at] ?? 0);
        at += 1;
      }
    }
    conflict(text, lines, block, found);
  }
}

/** One conflict: its markers are blank, and everything from the second marker to the last. */
function conflict(text: string, lines: ContentLines, markers: readonly number[], found: Found): void {
  const first = markers[0] ?? 0;
  const last = markers.at(-1) ?? first;
  const ours = markers[1] ?? last;
  found.blankLines.add(first);
  for (let line = ours; line <= last; line += 1) found.blankLines.add(line);
  const start = lines.start[first] ?? 0;
  const end = lineEnd(text, lines, first);
  found.doubtful.push({ start, end: lineEnd(text, lines, last) });
  const whole = text.charAt(start) === '<' && text.charAt(lines.start[last] ?? 0) === '>';
  const divide = markers.at(-2) ?? first;
  const dropLines = (from: number, to: number) => ({
    start: lines.start[from] ?? 0,
    end: nextLine(text, lineEnd(text, lines, to)),
    newText: '',
  });
  const cures = [
    { title: 'Keep the upper side', mends: [dropLines(first, first), dropLines(ours, last)] },
    { title: 'Keep the lower side', mends: [dropLines(first, divide), dropLines(last, last)] },
  ];
  const message = whole
    ? 'An unresolved merge conflict: keep one side of it and delete the marker lines. Only the upper side is read.'
    : 'A marker of a merge conflict without its counterpart: delete the line.';
  const lone = [{ title: 'Delete the marker', mends: [dropLines(first, first)] }];
  found.faults.push(fault(start, end, message, whole && markers.length >= 3 ? cures : markers.length === 1 ? lone : []));
}

function lineEnd(text: string, lines: ContentLines, line: number): number {
  return lineEndAt(text, lines.start[line] ?? text.length);
}

function nextLine(text: string, lineEnd: number): number {
  const lineFeed = text.indexOf('\n', lineEnd);
  return lineFeed < 0 ? text.length : lineFeed + 1;
}

/** `---` may open the file and `...` may close it; anything else of the kind is a fault. */
function documents(text: string, lines: ContentLines, margin: readonly number[], found: Found): void {
  let seenContent = false;
  for (const line of margin) {
    if (found.blankLines.has(line)) continue;
    const start = lines.start[line] ?? 0;
    const end = lineEnd(text, lines, line);
    const sign = /^(?:---|\.\.\.)(?=[ \t\r\n]|$)/.exec(text.slice(start, Math.min(end, start + 4)))?.[0];
    const message =
      sign !== undefined
        ? documentFault(text, lines, line, sign, seenContent)
        : text.charAt(start) === '%'
          ? directiveMessage
          : null;
    if (sign === undefined && message === null) {
      seenContent = true;
      continue;
    }
    found.blankLines.add(line);
    if (sign === '...' && message === null) found.end = start;
    if (message === null) continue;
    const mends = [{ start, end: nextLine(text, end), newText: '' }];
    found.faults.push(fault(start, end, message, [{ title: 'Delete the line', mends }]));
    found.doubtful.push({ start, end });
  }
}

const directiveMessage = 'A line that begins with `%` is a YAML directive, which a spec does without: delete the line.';

function documentFault(text: string, lines: ContentLines, line: number, sign: string, seenContent: boolean): string | null {
  const start = lines.start[line] ?? 0;
  const bare = /^\s*(?:#|$)/.test(text.slice(start + 3, lineEnd(text, lines, line)));
  const opens = sign === '---' && !seenContent;
  const closes = sign === '...' && line === lines.start.length - 1;
  if (bare && (opens || closes)) return null;
  if (!bare) return `What stands behind \`${sign}\` is not read: a spec is one document, and its keys begin at the left edge.`;
  return `\`${sign}\` ends a document in YAML, and a spec is one document: delete the line, or move what follows into a file of its own.`;
}
