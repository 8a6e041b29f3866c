/** Slips in a value: text that needs quotes, a space behind a minus, a comma left out. */
import { isFlow } from '../tree-walk';
import type { TreeNode } from '../tree';
import { vocabulary } from '../vocabulary';
import { contentEnd, cured, quotes } from './diagnosis';
import type { Diagnosis } from './diagnosis';

/** Where the value that begins at `start` ends: at the end of the line, or inside brackets at the next comma or bracket. */
function valueEnd(text: string, start: number, around: TreeNode | null): number {
  const end = contentEnd(text, start);
  if (around === null || !isFlow(text, around)) return end;
  const stop = text.slice(start, end).search(/[,\]}]/);
  return stop < 0 ? end : start + text.slice(start, start + stop).trimEnd().length;
}

/** `@home`, `> 3 dB`, `* foo`: a text that begins with a sign that means something else in YAML. */
export function reservedStart(text: string, start: number, around: TreeNode | null): Diagnosis {
  const sign = text.charAt(start);
  const end = Math.max(start + 1, valueEnd(text, start, around));
  const message = `A text cannot begin with \`${sign}\`, which means something else in YAML: put it in quotes.`;
  return cured(start, end, message, quotes(text, start, end));
}

/** `- 96 dBFS`: a minus, which a space makes into the dash of a list. */
export function spacedMinus(text: string, start: number, around: TreeNode | null): Diagnosis | null {
  const match = /^-[ \t\u00a0]+(?=[\d.])/.exec(text.slice(start, start + 40));
  if (match === null) return null;
  const end = valueEnd(text, start, around);
  const mends = [{ start: start + 1, end: start + match[0].length, newText: '' }];
  const value = `-${text.slice(start + match[0].length, end)}`;
  const message = `A minus with a space behind it begins a list: write \`${value}\`.`;
  return cured(start, end, message, { title: `Write \`${value}\``, mends });
}

/** `title: Gate 3: bearing`; or, inside brackets, a key whose comma is missing. */
export function colonInText(text: string, start: number, around: TreeNode | null): Diagnosis | null {
  const end = valueEnd(text, start, around);
  const value = text.slice(start, end);
  if (!/:(?:[ \t]|$)/.test(value)) return null;
  if (around !== null) {
    const missing = missingComma(text, start, end);
    if (missing !== null) return missing;
  }
  const message = 'A text with a colon and a space in it needs quotes.';
  return cured(start, end, message, quotes(text, start, end));
}

function missingComma(text: string, start: number, end: number): Diagnosis | null {
  const match = /[ \t]+([a-z][a-z-]*):(?:[ \t]|$)/.exec(text.slice(start, end));
  const key = match?.[1];
  if (match === null || key === undefined || !vocabulary.all.has(key)) return null;
  const at = start + match.index;
  const keyAt = at + match[0].indexOf(key);
  return commaBefore(at, keyAt, keyAt + key.length, key);
}

/** A comma is missing at `at`, in front of the text [start, end). */
export function commaBefore(at: number, start: number, end: number, called: string): Diagnosis {
  const mends = [{ start: at, end: at, newText: ',' }];
  return cured(start, end, `A comma is missing in front of \`${called}\`.`, { title: 'Put a comma in front of it', mends });
}
