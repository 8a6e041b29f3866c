/** Takes the parser's first complaint about a slice apart: what was meant, in our words, at the place that is to blame. */
import { flowAround } from '../tree-walk';
import type { TreeNode } from '../tree';
import type { ParsedSlice, ParserError } from '../yaml-tree';
import { contentEnd, cured, lineStart, passed, spaces } from './diagnosis';
import type { Diagnosis } from './diagnosis';
import { betweenLevels, tooDeep } from './indent-slips';
import { lineSlip, noColonBeforeBracket, noSpaceBehindDash } from './line-slips';
import { closeQuote, unclosedBracket, unclosedQuote } from './open-slips';
import { colonInText, commaBefore, reservedStart, spacedMinus } from './text-slips';

/** The slip behind the parser's complaint. */
export function parserSlip(text: string, parsed: ParsedSlice & { readonly error: ParserError }): Diagnosis {
  const { error, tree } = parsed;
  return unclosed(text, tree, error) ?? inLine(text, tree, error) ?? inValue(text, tree, error) ?? unknown(text, error);
}

function unclosed(text: string, tree: TreeNode | null, error: ParserError): Diagnosis | null {
  const quote = unclosedQuote(text, tree, error.start);
  if (quote !== null) return quote;
  if (error.detail.startsWith('Missing closing')) {
    const opening = Math.max(text.lastIndexOf('"', error.start), text.lastIndexOf("'", error.start));
    return opening < 0 ? null : closeQuote(text, opening);
  }
  const open = error.detail.includes('sufficiently indented and end with') || error.detail.includes('Expected flow');
  return open ? unclosedBracket(text, tree, error.start) : null;
}

function inValue(text: string, tree: TreeNode | null, error: ParserError): Diagnosis | null {
  const at = error.start;
  const around = flowAround(text, tree, at);
  switch (error.code) {
    case 'BAD_SCALAR_START':
    case 'BAD_ALIAS':
      return reservedStart(text, at, around);
    case 'BAD_DQ_ESCAPE':
      return badEscape(text, error);
    case 'UNEXPECTED_TOKEN':
      return spacedMinus(text, at, around) ?? unexpected(text, error);
    case 'BLOCK_IN_FLOW':
    case 'BLOCK_AS_IMPLICIT_KEY':
      return spacedMinus(text, at, around) ?? gluedBracket(text, at) ?? colonInText(text, at, around) ?? tooDeep(text, at);
    case 'MULTILINE_IMPLICIT_KEY':
      return around === null ? null : spacedMinus(text, at, around);
    case 'MISSING_CHAR':
      return missing(text, error, around);
    default:
      return null;
  }
}

/** `-{ tone: 3 kHz }` or `wanted { band: 3 kHz }`, of which the parser makes one long key. */
function gluedBracket(text: string, at: number): Diagnosis | null {
  const line = lineStart(text, at);
  const content = line + (/^[ \t]*(?:- +)*/.exec(text.slice(line, at))?.[0].length ?? 0);
  if (!/^-[[{"']/.test(text.slice(content, content + 2))) return noColonBeforeBracket(text, content, at);
  return noSpaceBehindDash(text.slice(content, contentEnd(text, content)), content);
}

function badEscape(text: string, error: ParserError): Diagnosis {
  const escape = text.slice(error.start, error.start + 2);
  const mends = [{ start: error.start, end: error.start, newText: '\\' }];
  const message = `\`${escape}\` means nothing in double quotes: write \`\\${escape}\`, or use single quotes.`;
  return cured(error.start, error.start + 2, message, { title: `Write \`\\${escape}\``, mends });
}

function unexpected(text: string, error: ParserError): Diagnosis | null {
  const { start, detail } = error;
  if (detail.startsWith('Not a YAML token')) return blockHeader(text, start);
  if (detail.startsWith('Unexpected ,')) {
    return passed(start, start + 1, 'A value is missing in front of this comma.', [spaces(start, start + 1)]);
  }
  const end = Math.max(start + 1, contentEnd(text, start));
  if (/^[\]}]/.test(text.charAt(start))) {
    return passed(start, start + 1, `This \`${text.charAt(start)}\` closes nothing.`, [spaces(start, start + 1)]);
  }
  if (detail.includes('block-seq-ind')) {
    return passed(start, end, 'A list begins on the line below its key, or stands in `[ ]` behind it.', [spaces(start, end)]);
  }
  if (detail.includes('at node end')) {
    return passed(start, end, 'The value in front of this has ended already: a comma, a colon or quotes are missing.', [
      spaces(start, end),
    ]);
  }
  return null;
}

/** `> 3 dB` and `| x`, which look like the beginning of a text of several lines. */
function blockHeader(text: string, at: number): Diagnosis | null {
  const line = lineStart(text, at);
  const sign = /[>|][^>|]*$/.exec(text.slice(line, at));
  return sign === null ? null : reservedStart(text, line + sign.index, null);
}

function missing(text: string, error: ParserError, around: TreeNode | null): Diagnosis | null {
  const { start, detail } = error;
  if (detail.startsWith('Comments must')) {
    const mends = [{ start, end: start, newText: ' ' }];
    return cured(start, start + 1, 'A comment needs a space in front of it.', { title: 'Put a space in front of it', mends });
  }
  if (around === null || !detail.startsWith('Missing ,')) return null;
  const back = text.slice(0, start).trimEnd().length;
  const end = start + (/^[^\s,:\]}]*/.exec(text.slice(start))?.[0].length ?? 0);
  return (
    spacedMinus(text, start, around) ??
    commaBefore(back, start, Math.max(end, start + 1), text.slice(start, Math.max(end, start + 1)))
  );
}

// Complaints that mean, where a line begins, that the line is no `key: value`.
const lineCodes: ReadonlySet<string> = new Set(['MULTILINE_IMPLICIT_KEY', 'MISSING_CHAR', 'BLOCK_AS_IMPLICIT_KEY']);

/** Complaints about a line as a whole. */
function inLine(text: string, tree: TreeNode | null, error: ParserError): Diagnosis | null {
  const at = error.start;
  if (error.code === 'BAD_INDENT') {
    const content = contentFrom(text, at);
    return noSpaceBehindDash(text.slice(content, contentEnd(text, content)), content) ?? betweenLevels(text, content);
  }
  const leads = /^[ \t]*(?:- +)*$/.test(text.slice(lineStart(text, at), at)) && flowAround(text, tree, at) === null;
  return leads && lineCodes.has(error.code) ? lineSlip(text, at) : null;
}

/** The first content at or behind an offset. */
function contentFrom(text: string, at: number): number {
  const gap = /^\s*/.exec(text.slice(at, at + 2000))?.[0].length ?? 0;
  return at + gap;
}

function unknown(text: string, error: ParserError): Diagnosis {
  const start = Math.min(error.start, Math.max(0, text.length - 1));
  const end = Math.max(start + 1, contentEnd(text, start));
  return passed(start, end, 'YAML cannot read this here: a bracket, a quote, a comma, a colon or the indentation is off.', null);
}
