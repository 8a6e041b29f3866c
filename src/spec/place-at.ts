/** Finds the place that an offset of the text lies in, and what the declaration says of it. */
import { channel } from './declaration/channel';
import { declaration } from './declaration/top-level';
import { keyOf } from './decode-fields';
import { insideOf } from './inside';
import type { Path, Place, Span } from './place';
import type { Reading } from './reading';
import type { Key, Shape } from './shape';
import { sliceAt } from './slices/slice-at';
import type { Pair, TreeNode } from './tree';

/** A place in the text. */
export interface PlaceAt {
  /** As its channel owns it; with `channel: null` for all that stands outside a channel, named filters and clocks included. */
  readonly place: Place;
  readonly part: 'key' | 'value';
  readonly span: Span;
  /** The key that the declaration has for it; null for names, items of lists and unknown keys. */
  readonly about: Key | null;
}

/** The innermost place at an offset; behind a channel's last value the channel, with an empty span; null outside everything. */
export function placeAt(reading: Reading, offset: number): PlaceAt | null {
  const placed = sliceAt(insideOf(reading).slices, offset);
  if (placed === null) return null;
  const base = placed.slice.start;
  const own = placed.reading.channels.find(({ pair }) => pair.keyStart <= offset - base && offset - base <= endOf(pair));
  const named = own ?? (placed.slice.kind === 'channel' ? placed.reading.channels[0] : undefined);
  if (named !== undefined) {
    const from: Step = { channel: named.name, path: [], shape: channel, about: null };
    return inPair(from, named.pair, offset - base, base) ?? found(from, 'value', offset, offset, 0);
  }
  const root: Step = { channel: null, path: [], shape: declaration, about: null };
  for (const pair of placed.reading.pairs) {
    const found = inPair(into(root, pair.key), pair, offset - base, base);
    if (found !== null) return found;
  }
  return null;
}

/** Where the walk has come to. */
interface Step {
  readonly channel: string | null;
  readonly path: Path;
  /** The declared shape there; null below an unknown key. */
  readonly shape: Shape<unknown> | null;
  readonly about: Key | null;
}

function endOf(pair: Pair): number {
  return pair.value?.end ?? pair.keyEnd;
}

function inPair(step: Step, pair: Pair, offset: number, base: number): PlaceAt | null {
  if (offset < pair.keyStart || offset > endOf(pair)) return null;
  if (offset <= pair.keyEnd || pair.value === null) return found(step, 'key', pair.keyStart, pair.keyEnd, base);
  return inNode(step, pair.value, offset, base);
}

function inNode(step: Step, node: TreeNode, offset: number, base: number): PlaceAt {
  // A single map where a list may stand is item 0 of that list.
  const item = node.form === 'map' && step.shape?.list !== undefined ? { ...step, path: [...step.path, 0] } : step;
  const below =
    node.form === 'list'
      ? inList(step, node.items, offset, base)
      : node.form === 'map'
        ? inMap(item, node.pairs, offset, base)
        : null;
  return below ?? found(step, 'value', node.start, node.end, base);
}

function inMap(step: Step, pairs: readonly Pair[], offset: number, base: number): PlaceAt | null {
  for (const pair of pairs) {
    const place = inPair(into(step, pair.key), pair, offset, base);
    if (place !== null) return place;
  }
  return null;
}

function inList(step: Step, items: readonly (TreeNode | null)[], offset: number, base: number): PlaceAt | null {
  const index = items.findIndex((item) => item !== null && item.start <= offset && offset <= item.end);
  const item = items[index];
  if (item === undefined || item === null) return null;
  const shape = step.shape?.list?.each ?? null;
  // The item's own shape has no list, so that a map in it gets no second index.
  return inNode({ ...step, path: [...step.path, index], shape }, item, offset, base);
}

function into(step: Step, key: string): Step {
  const map = step.shape?.map;
  const path = [...step.path, key];
  if (map === undefined) return { ...step, path, shape: null, about: null };
  if ('each' in map) return { ...step, path, shape: map.each, about: null };
  const about = keyOf(map, key);
  return { ...step, path, shape: about?.shape ?? null, about };
}

function found({ channel: owner, path, about }: Step, part: 'key' | 'value', start: number, end: number, base: number): PlaceAt {
  return { place: { channel: owner, path }, part, span: { start: base + start, end: base + end }, about };
}
