/** Finds the cursor in a slice's tree: the slice is read once more with a mark where something is being typed. */
import type { Slice } from '../slices/slice';
import { sliceTree } from '../slips/slice-tree';
import type { MapNode, TreeNode } from '../tree';
import type { CursorText } from './cursor-text';

/** Where in the file the cursor is. */
export interface CursorPlace {
  /** From the top of the file to the map (for a key) or to the value. */
  readonly path: readonly (string | number)[];
  readonly as: 'key' | 'value';
  /** The map in which a key is typed, or null. */
  readonly map: MapNode | null;
  /** The channel's own map, or null outside channels. */
  readonly channel: MapNode | null;
}

/** Stands for what is being typed; no spec holds it. */
const mark = '\uE000';

/** All places the mark can be read as: behind a dash both a key and a value. */
export function cursorPlaces(slice: Slice, cursor: CursorText): readonly CursorPlace[] {
  const forms = cursor.stands === 'behind-colon' ? [`${cursor.gap}${mark}`] : [cursor.hasColon ? mark : `${mark}: `, mark];
  const places = forms.map((form) => {
    const text = slice.text.slice(0, cursor.span.start - slice.start) + form + slice.text.slice(cursor.span.end - slice.start);
    const { tree } = sliceTree(slice.lead, text);
    return tree === null ? null : find(tree, [], null);
  });
  const [first, second] = places;
  // As a bare word the mark counts only where it is an item of a list, or stands alone below its key.
  return [first, second?.as === 'value' ? second : null].flatMap((place) => place ?? []);
}

function find(node: TreeNode, path: CursorPlace['path'], channel: MapNode | null): CursorPlace | null {
  if (node.form === 'scalar') return node.text === mark ? { path, as: 'value', map: null, channel } : null;
  if (node.form === 'list')
    return firstOf(node.items, (item, index) => (item === null ? null : find(item, [...path, index], channel)));
  const own = path.length === 2 && path[0] === 'channels' ? node : channel;
  return firstOf(node.pairs, ({ key, value }) => {
    if (key === mark) return { path, as: 'key' as const, map: node, channel: own };
    return value === null ? null : find(value, [...path, key], own);
  });
}

function firstOf<T, R>(items: readonly T[], find: (item: T, index: number) => R | null): R | null {
  for (const [index, item] of items.entries()) {
    const found = find(item, index);
    if (found !== null) return found;
  }
  return null;
}

/** The keys of a map but the one being typed. */
export const otherKeys = (map: MapNode): readonly string[] => map.pairs.map(({ key }) => key).filter((key) => key !== mark);
