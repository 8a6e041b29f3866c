/** Slips in a line that should begin with a key or a dash: no space behind a colon or a dash, no colon, stray text. */
import { vocabulary } from '../vocabulary';
import { contentEnd, cured, lineStart, passed, spaces } from './diagnosis';
import type { Diagnosis } from './diagnosis';

/** What is wrong with the content that begins at `start`, the first of its line. */
export function lineSlip(text: string, start: number): Diagnosis {
  const end = contentEnd(text, start);
  const content = text.slice(start, end);
  return (
    noSpaceBehindDash(content, start) ??
    noSpaceBehindColon(content, start) ??
    noColon(text, content, start) ??
    stray(start, end, content)
  );
}

/** `-foo`. */
export function noSpaceBehindDash(content: string, start: number): Diagnosis | null {
  const after = /^-(\u00a0*)(?=[^ \t\r\n-])/.exec(content);
  if (after === null) return null;
  const mends = [{ start: start + 1, end: start + after[0].length, newText: ' ' }];
  const message = 'A dash that begins a list item needs a space behind it.';
  return cured(start, start + content.length, message, { title: 'Put a space behind the dash', mends });
}

/** `tone:310 kHz`. */
export function noSpaceBehindColon(content: string, start: number): Diagnosis | null {
  const match = /^("(?:[^"\\]|\\.)*"|'[^']*'|[a-zA-Z][^\s:,[\]{}"']*):(\u00a0*)(?=[^ \t\r\n]|\u00a0)/.exec(content);
  const key = match?.[1];
  if (match === null || key === undefined) return null;
  const colon = start + key.length;
  const mends = [{ start: colon + 1, end: start + match[0].length, newText: ' ' }];
  const message = `A colon needs a space behind it: \`${key}: ${content.slice(match[0].length)}\`.`;
  return cured(start, start + content.length, message, { title: 'Put a space behind the colon', mends });
}

/** `rate 51.2 kHz`, or a name with lines below it that are indented further. */
function noColon(text: string, content: string, start: number): Diagnosis | null {
  const word = /^(?:- +)?([a-z][a-z-]*)(?=[ \t]|$)/.exec(content);
  const known = word?.[1] !== undefined && vocabulary.all.has(word[1]);
  if (!opensBlock(text, start) && !(known && word[0].length < content.length)) return null;
  const at = start + (opensBlock(text, start) ? content.length : (word?.[0].length ?? 0));
  const key = text.slice(start, at);
  const message = `The colon behind \`${key}\` is missing.`;
  const mends = [{ start: at, end: at, newText: ':' }];
  return cured(start, start + content.length, message, { title: 'Put a colon behind it', mends });
}

/** `wanted { band: 1 kHz .. 2 kHz }`, whose key YAML takes to be `wanted { band`. */
export function noColonBeforeBracket(text: string, start: number, end: number): Diagnosis | null {
  const key = /^[^\s"'{[:]+(?= *[{[])/.exec(text.slice(start, end))?.[0];
  if (key === undefined) return null;
  const at = start + key.length;
  const mends = [{ start: at, end: at, newText: text.charAt(at) === ' ' ? ':' : ': ' }];
  const message = `The colon behind \`${key}\` is missing.`;
  return cured(start, contentEnd(text, start), message, { title: 'Put a colon behind it', mends });
}

/** Whether the next line with content is indented further than the one that begins at `start`. */
function opensBlock(text: string, start: number): boolean {
  const indent = start - lineStart(text, start);
  const below = /\n(?:[ \t]*(?:#[^\n]*)?\r?\n)*( *)[^\s#]/g;
  below.lastIndex = start;
  const next = below.exec(text);
  return next !== null && text.indexOf('\n', start) === next.index && (next[1] ?? '').length > indent;
}

function stray(start: number, end: number, content: string): Diagnosis {
  const word = /^[a-z][a-z-]*$/.test(content) && vocabulary.all.has(content);
  const message = word
    ? `\`${content}\` is a key without a value: write \`${content}: value\`.`
    : 'This is neither `key: value` nor an item of a list. It is passed over.';
  return passed(start, end, message, [spaces(start, end)]);
}
