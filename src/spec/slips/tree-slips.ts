/** Slips that YAML reads as something legal, so that only the tree shows them: merge keys, glued keys, commas in values. */
import type { ListNode, MapNode, Pair, ScalarNode, TreeNode } from '../tree';
import { isFlow, visits } from '../tree-walk';
import { vocabulary } from '../vocabulary';
import { cured, passed, quotes } from './diagnosis';
import type { Diagnosis } from './diagnosis';
import { noColonBeforeBracket, noSpaceBehindColon, noSpaceBehindDash } from './line-slips';
import { spacedMinus } from './text-slips';

/** All of them in one tree. */
export function* treeSlips(text: string, tree: TreeNode | null): Generator<Diagnosis> {
  for (const { node, parent } of visits(tree)) {
    if (node.form === 'map') yield* mapSlips(text, node);
    if (node.form === 'list') yield* listSlips(text, node, parent);
  }
}

function* mapSlips(text: string, map: MapNode): Generator<Diagnosis> {
  const flow = isFlow(text, map);
  for (const [index, pair] of map.pairs.entries()) {
    if (pair.key === '<<') yield mergeKey(pair);
    const slip = flow ? flowPairSlip(text, map, index, pair) : blockPairSlip(text, pair);
    if (slip !== null) yield slip;
  }
}

function mergeKey(pair: Pair): Diagnosis {
  const message =
    '`<<` is no part of YAML 1.2, nor of a spec: write `like` and the name of a channel, or name a filter under `filters`.';
  return passed(pair.keyStart, pair.keyEnd, message, null);
}

/** `-bandwidth: 3 kHz`, or `rate:5 kHz` as a value of its own. */
function blockPairSlip(text: string, pair: Pair): Diagnosis | null {
  if (pair.value === null && !/^[ \t]*:/.test(text.slice(pair.keyEnd, pair.keyEnd + 80))) {
    return noSpaceBehindColon(text.slice(pair.keyStart, pair.keyEnd), pair.keyStart);
  }
  const opened = noColonBeforeBracket(text, pair.keyStart, pair.keyEnd);
  if (opened !== null) return opened;
  const { value } = pair;
  if (value?.form === 'scalar' && !value.quoted && text.slice(pair.keyEnd, value.start).includes('\n')) return gluedItem(value);
  return /^-[a-z]/.test(pair.key) && vocabulary.all.has(pair.key.slice(1)) ? noSpaceBehindDash(pair.key, pair.keyStart) : null;
}

/** A key inside brackets that no colon follows is the rest of something that a comma has cut in two. */
function flowPairSlip(text: string, map: MapNode, index: number, pair: Pair): Diagnosis | null {
  if (pair.value !== null || /^\s*:/.test(text.slice(pair.keyEnd, pair.keyEnd + 80))) return null;
  const glued = noSpaceBehindColon(text.slice(pair.keyStart, pair.keyEnd), pair.keyStart);
  if (glued !== null) return glued;
  const before = map.pairs[index - 1]?.value ?? null;
  const plain = before?.form === 'scalar' && !before.quoted ? before : null;
  const decimal = plain === null ? null : decimalComma(text, plain, pair.keyStart, pair.keyEnd);
  if (decimal !== null) return decimal;
  if (plain === null || vocabulary.all.has(pair.key)) {
    return passed(pair.keyStart, pair.keyEnd, `\`${pair.key}\` has no value: write \`${pair.key}: value\`.`, null);
  }
  const message = 'A text with a comma in it needs quotes inside brackets.';
  return cured(plain.start, pair.keyEnd, message, quotes(text, plain.start, pair.keyEnd));
}

/** `-3,5 dBFS` inside brackets: digits, a comma and digits, with nothing between. */
function decimalComma(text: string, before: ScalarNode, start: number, end: number): Diagnosis | null {
  if (text.slice(before.end, start) !== ',' || !/^[-+−]?\d+$/.test(before.text) || !/^\d/.test(text.slice(start, end)))
    return null;
  const value = `${before.text}.${text.slice(start, end)}`;
  const mends = [{ start: before.end, end: start, newText: '.' }];
  const message = `Decimals take a point, and a comma ends the value here: write \`${value}\`.`;
  return cured(before.start, end, message, { title: `Write \`${value}\``, mends });
}

function* listSlips(text: string, list: ListNode, parent: TreeNode | null): Generator<Diagnosis> {
  const flow = isFlow(text, list);
  const minus = parent?.form === 'list' && !flow && list.items.length === 1 ? spacedMinus(text, list.start, null) : null;
  if (minus !== null) yield minus;
  for (const [index, item] of list.items.entries()) {
    if (item?.form !== 'scalar' || item.quoted) continue;
    const slip = flow ? splitItem(text, item, list.items[index + 1] ?? null) : gluedItem(item);
    if (slip !== null) yield slip;
  }
}

/** `[51,2 kHz, 48 kHz]`: a number without its unit, and one that has it. */
function splitItem(text: string, item: ScalarNode, next: TreeNode | null): Diagnosis | null {
  if (next?.form !== 'scalar' || next.quoted || !/[^\d\s]/.test(next.text)) return null;
  return decimalComma(text, item, next.start, next.end);
}

/** `- tone:310 kHz`, or the same alone below its key. */
function gluedItem(item: ScalarNode): Diagnosis | null {
  const key = /^([a-z][a-z-]*):[^ \t]/.exec(item.text)?.[1];
  return key !== undefined && vocabulary.all.has(key) ? noSpaceBehindColon(item.text, item.start) : null;
}
