/** The cures that a fault of the text brings along, and those of a comment that accepts nothing. */
import type { Finding } from '../findings';
import type { Problem, Reading, Span } from '../spec';

/** Titles and edits, best first; empty for every finding that follows from figures. */
export function textCuresOf(reading: Reading, finding: Finding): Problem['cures'] {
  if (!('span' in finding.at)) return [];
  const { span } = finding.at;
  if (finding.code === 'stale-acceptance') {
    return [{ title: 'Remove this acceptance', edits: [{ span: wholeComment(reading.text, span), newText: '' }] }];
  }
  const fault = reading.problems.find(
    (problem) => problem.code === finding.code && problem.span.start === span.start && problem.span.end === span.end,
  );
  return fault?.cures ?? [];
}

/** A comment with the spaces before it, and with its line where nothing else stands on it. */
function wholeComment(text: string, comment: Span): Span {
  let start = comment.start;
  while (start > 0 && (text[start - 1] === ' ' || text[start - 1] === '\t')) start -= 1;
  const alone = start === 0 || text[start - 1] === '\n';
  const newline = text.indexOf('\n', comment.end);
  return { start, end: alone && newline >= 0 ? newline + 1 : comment.end };
}
