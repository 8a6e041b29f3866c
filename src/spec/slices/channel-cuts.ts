/** Cuts what stands below `channels:` before every line that begins with a channel's name, also where its indentation is off. */
import type { Vocabulary } from '../vocabulary';
import { goesOn } from './cuts';
import type { Cutting } from './cuts';

/** A line with a channel's name, or null; `indent` is what the names are indented by. */
interface Below {
  readonly from: number;
  readonly to: number;
  readonly indent: number;
  readonly words: Vocabulary;
}

/** Cuts the lines [from, to). Where the first child is no key (a flow map), nothing is cut. */
export function cutChannels(cutting: Cutting, from: number, to: number, words: Vocabulary): void {
  const first = cutting.after(from - 1, to);
  if (first === null || (cutting.keyOf(first) === null && !isName(cutting, first, to))) return;
  const below = { from, to, indent: nameIndent(cutting, first, to, words), words };
  // What the lines of the channel above are indented by; 0 where that is not known.
  let within = 0;
  for (let line = first; line < to; line += 1) {
    if (cutting.blankLines.has(line)) continue;
    if (cutAt(cutting, line, below, line === first, within)) within = indentWithin(cutting, line, to);
  }
}

/** Cuts before the line if it begins a channel. */
function cutAt(cutting: Cutting, line: number, below: Below, first: boolean, within: number): boolean {
  const indent = cutting.indentOf(line);
  if (indent === below.indent) return cutAtName(cutting, line, below);
  if (!first && !isMisplacedName(cutting, line, below, within)) return false;
  const lead = indent === 0 ? ' '.repeat(below.indent) : '';
  cutting.cuts.push({ kind: 'channel', start: cutting.startOf(line), lead });
  cutting.note(line, `This name is indented by ${indent}, the other channels by ${below.indent}.`, [
    cutting.indented(line, below.indent),
  ]);
  return true;
}

/** A line indented as the names are: a name, a list that goes on, or a slip. */
function cutAtName(cutting: Cutting, line: number, below: Below): boolean {
  const key = cutting.keyOf(line);
  const content = cutting.contentText(line);
  if (key === null && goesOn(content)) return false;
  if (key !== null && below.words.all.has(key.key) && key.rest !== '' && !key.rest.startsWith('{')) {
    const message = `\`${key.key}\` is indented like a channel's name: indent it like the other keys of its channel.`;
    cutting.passOver(line, message);
    return false;
  }
  if (key === null && !/^[^\s:]+:\{/.test(content) && !isName(cutting, line, below.to)) {
    cutting.passOver(line, strayChannelLine(content));
    return false;
  }
  cutting.cuts.push({ kind: 'channel', start: cutting.startOf(line), lead: '' });
  return true;
}

function strayChannelLine(content: string): string {
  if (/^\?(?:\s|$)/.test(content))
    return 'A `?` begins an explicit key, which a spec does without: write `name:` and its value below.';
  if (/^:(?:\s|$)/.test(content)) return 'A key is missing in front of this colon.';
  return 'This stands where a channel begins, but has no colon: a channel is `name:` with its keys below, indented further.';
}

/** Text without a colon that lines indented further follow: a name whose colon is missing. */
function isName(cutting: Cutting, line: number, to: number): boolean {
  const next = cutting.after(line, to);
  const plain = /^[^\s?:\-[\]{}&*!|>%@`#,'"][^:]*$/.test(cutting.contentText(line));
  return plain && next !== null && cutting.indentOf(next) > cutting.indentOf(line) && cutting.keyOf(next) !== null;
}

/** A name and nothing behind it, at an indentation where no legal line can stand. */
function isMisplacedName(cutting: Cutting, line: number, below: Below, within: number): boolean {
  const tabbed = cutting.text.charAt(cutting.startOf(line)) === '\t';
  const off = cutting.indentOf(line) < below.indent || cutting.indentOf(line) < within || tabbed;
  if (!off) return false;
  const key = cutting.keyOf(line);
  return key !== null && key.rest === '' && !below.words.all.has(key.key);
}

/** What the lines below a name are indented by; 0 where that is not known. */
function indentWithin(cutting: Cutting, name: number, to: number): number {
  const next = cutting.after(name, to);
  return next !== null && cutting.keyOf(name)?.rest === '' && cutting.keyOf(next) !== null ? cutting.indentOf(next) : 0;
}

/**
 * What the names are indented by: as the first child, as YAML has it. Where a line shows that the text is not legal,
 * the commonest indentation of what looks like a channel is the likeliest.
 */
function nameIndent(cutting: Cutting, first: number, to: number, words: Vocabulary): number {
  const indent = cutting.indentOf(first);
  if (indent > 0 && isLegalIndent(cutting, first, to, indent)) return indent;
  const votes = new Map<number, number>();
  for (let line = first; line < to; line += 1) {
    if (cutting.blankLines.has(line) || !looksLikeChannel(cutting, line, to, words)) continue;
    const own = cutting.indentOf(line);
    if (own > 0) votes.set(own, (votes.get(own) ?? 0) + 1);
  }
  const [best] = [...votes].reduce((most, vote) => (vote[1] > most[1] ? vote : most), [indent, 0]);
  return best > 0 ? best : usualIndent;
}

const usualIndent = 2;

/** Whether no line is indented less than the first name, nor between a name and what stands below it. */
function isLegalIndent(cutting: Cutting, first: number, to: number, indent: number): boolean {
  let within = 0;
  for (let line = first; line < to; line += 1) {
    if (cutting.blankLines.has(line)) continue;
    const own = cutting.indentOf(line);
    if (own < indent && own > 0) return false;
    if (own === indent && cutting.keyOf(line) !== null) within = indentWithin(cutting, line, to);
    else if (own > indent && own < within && cutting.keyOf(line) !== null) return false;
  }
  return true;
}

/** A name with nothing behind it, and below it a key of a channel. */
function looksLikeChannel(cutting: Cutting, line: number, to: number, words: Vocabulary): boolean {
  const key = cutting.keyOf(line);
  const next = cutting.after(line, to);
  if (key === null || key.rest !== '' || next === null || cutting.indentOf(next) <= cutting.indentOf(line)) return false;
  return !words.channel.has(key.key) && words.channel.has(cutting.keyOf(next)?.key ?? '');
}
