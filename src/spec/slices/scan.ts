/** Cuts a spec into slices by looking at the beginnings of its lines, so that a fault ends where its slice ends. */
import { nearest } from '../nearest';
import type { Fault } from '../slips/fault';
import { blanked } from '../mend';
import type { Vocabulary } from '../vocabulary';
import { cutChannels } from './channel-cuts';
import { contentLines } from './content-lines';
import { Cutting, goesOn } from './cuts';
import { marginFaults } from './margin-faults';
import { channelsLine } from './slice';
import type { Slice } from './slice';

/** A text in slices. */
export interface Scan {
  readonly slices: readonly Slice[];
  /** Faults that belong to no slice; offsets into the file. */
  readonly faults: readonly Fault[];
}

/** Scans a text in time linear in its length. */
export function scan(text: string, words: Vocabulary): Scan {
  const lines = contentLines(text);
  const margin = marginFaults(text, lines);
  const cutting = new Cutting(text, lines, margin.blankLines);
  cutAll(cutting, words);
  const slices = slicesOf(cutting, margin.end, [...margin.doubtful, ...cutting.doubtful]);
  return { slices, faults: [...margin.faults, ...cutting.faults].sort((a, b) => a.start - b.start) };
}

/** The section that lines belong to while the file is walked. */
interface Section {
  readonly name: string;
  readonly firstLine: number;
  /** Whether nothing stands behind the key's colon. */
  readonly open: boolean;
}

function cutAll(cutting: Cutting, words: Vocabulary): void {
  const count = cutting.lines.start.length;
  let section: Section = { name: '', firstLine: 0, open: false };
  for (let line = 0; line < count; line += 1) {
    if (cutting.blankLines.has(line)) continue;
    const next = sectionAt(cutting, line, section, words);
    if (next === null) continue;
    finish(cutting, section, line, words);
    section = next;
  }
  finish(cutting, section, count, words);
}

/** Cuts the channels of a section that has ended before `line`. */
function finish(cutting: Cutting, section: Section, line: number, words: Vocabulary): void {
  if (section.name === 'channels' && section.open) cutChannels(cutting, section.firstLine, line, words);
}

/** The section that the line begins, or null where it goes on with the one above. */
function sectionAt(cutting: Cutting, line: number, above: Section, words: Vocabulary): Section | null {
  const indent = cutting.indentOf(line);
  if (indent > 0 && !mayBeShifted(cutting, line)) return null;
  const key = cutting.keyOf(line);
  if (indent > 0) {
    if (key === null || !words.top.has(key.key) || !isShifted(cutting, line, above)) return null;
    cutting.note(line, `\`${key.key}\` belongs at the left edge, and is indented by ${indent}.`, [cutting.indented(line, 0)]);
  } else if (key === null) {
    if (!beginsWithoutColon(cutting, line, words)) {
      strayLine(cutting, line);
      return null;
    }
  } else if (above.name === 'channels' && above.open && isOutdented(cutting, line, words)) {
    return null;
  }
  cutting.cuts.push({ kind: 'top', start: cutting.startOf(line), lead: '' });
  return { name: key?.key ?? cutting.contentText(line).trimEnd(), firstLine: line + 1, open: key === null || key.rest === '' };
}

/** Only a line with little indentation can be a key of the file that has slipped to the right. */
function mayBeShifted(cutting: Cutting, line: number): boolean {
  return cutting.indentOf(line) < 4;
}

/** A key of the file, indented less than what stands above it, or below a value that cannot go on: no legal line. */
function isShifted(cutting: Cutting, line: number, above: Section): boolean {
  if (above.name === '') return false;
  const header = above.firstLine - 1;
  const rest = cutting.keyOf(header)?.rest ?? '';
  if (rest !== '') return line === above.firstLine && !/^["'[{|>&*!]/.test(rest);
  const first = cutting.after(header, line);
  if (first === null) return false;
  return cutting.keyOf(first) !== null && cutting.indentOf(line) < cutting.indentOf(first);
}

/** `clocks` alone, or `title:Foo`: begins a slice in which the slip is then found and put right. */
function beginsWithoutColon(cutting: Cutting, line: number, words: Vocabulary): boolean {
  const content = cutting.contentText(line);
  if (words.top.has(content.trimEnd())) return true;
  const glued = /^([a-z-]+):\S/.exec(content)?.[1];
  return glued !== undefined && words.top.has(glued);
}

function strayLine(cutting: Cutting, line: number): void {
  const content = cutting.contentText(line);
  if (goesOn(content) && cutting.cuts.length > 0) return;
  cutting.passOver(line, strayMessage(content));
}

function strayMessage(content: string): string {
  if (goesOn(content)) return 'A list or a bracket cannot stand before the first key.';
  if (/^[[{]/.test(content))
    return 'A spec begins with keys at the left edge, such as `bandkeep: 1`, and without a bracket around them.';
  if (/^\?(?:\s|$)/.test(content)) return 'A `?` begins an explicit key, which a spec does without: write `key: value`.';
  if (/^:(?:\s|$)/.test(content)) return 'A key is missing in front of this colon.';
  return 'This line at the left edge is neither `key: value` nor a comment. It is passed over.';
}

/**
 * A key in column 0 between the channels that is no key of a file: a line of a channel that has slipped to the left, or
 * a channel's name. It stays below `channels`, so that the channels behind it are not lost.
 */
function isOutdented(cutting: Cutting, line: number, words: Vocabulary): boolean {
  const key = cutting.keyOf(line);
  if (key === null || words.top.has(key.key)) return false;
  if (words.channel.has(key.key)) {
    cutting.passOver(
      line,
      `\`${key.key}\` belongs to a channel, and stands at the left edge: indent it like the other keys of its channel.`,
    );
    return true;
  }
  const next = cutting.after(line, cutting.lines.start.length);
  if (key.rest !== '' || next === null || nearest(key.key, [...words.top]) !== null) return false;
  const child = cutting.keyOf(next);
  const own = cutting.indentOf(next) > 0 && child !== null && words.channel.has(child.key);
  const grandchild = cutting.after(next, cutting.lines.start.length);
  const holdsChannel =
    child?.rest === '' &&
    grandchild !== null &&
    cutting.indentOf(grandchild) > cutting.indentOf(next) &&
    words.channel.has(cutting.keyOf(grandchild)?.key ?? '');
  if (holdsChannel && !own)
    cutting.passOver(line, `\`${key.key}\` stands at the left edge, and is no key of a spec. It is passed over.`);
  return own || holdsChannel;
}

function slicesOf(cutting: Cutting, textEnd: number, doubtful: readonly { start: number; end: number }[]): Slice[] {
  const blank = [...cutting.blankLines]
    .sort((a, b) => a - b)
    .map((line) => ({ start: cutting.startOf(line), end: cutting.endOf(line) }));
  const text = blank.length === 0 ? cutting.text : blanked(cutting.text, blank);
  // Channels are cut when their section ends, so that the cuts are not in order.
  const cuts = cutting.cuts.toSorted((a, b) => a.start - b.start);
  return cuts.map(({ kind, start, lead }, index) => {
    const end = cuts[index + 1]?.start ?? textEnd;
    return {
      kind,
      start,
      text: text.slice(start, end),
      lead: kind === 'channel' ? channelsLine + lead : '',
      doubtful: doubtful.some((stretch) => stretch.start < end && stretch.end > start),
    };
  });
}
