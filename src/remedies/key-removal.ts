/** The edit that takes a key with its value out of a spec, with the comma or the line that belongs to it. */
import { spanOf, type Edit, type Place, type Reading } from '../spec';

/** The removal of a place's key and value; null for the first key of a list item, whose dash would be left alone. */
export function removalOf(reading: Reading, place: Place): Edit | null {
  const { text } = reading;
  const { start, end } = spanOf(reading, { ...place, part: 'pair' });
  const behind = /^\s*,[ \t]*/u.exec(text.slice(end));
  if (behind !== null) return { span: { start, end: end + behind[0].length }, newText: '' };
  const before = /,\s*$/u.exec(text.slice(0, start));
  if (before !== null) return { span: { start: before.index, end }, newText: '' };
  const lineStart = text.lastIndexOf('\n', start - 1) + 1;
  const lineEnd = text.indexOf('\n', end);
  if (text.slice(lineStart, start).trim() !== '') return null;
  return { span: { start: lineStart, end: lineEnd < 0 ? text.length : lineEnd + 1 }, newText: '' };
}
