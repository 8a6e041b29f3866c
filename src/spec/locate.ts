/** Follows a place through the trees of a reading: through `like`, through the names of filters and clocks, and into single items that stand for lists. */
import type { Inside } from './inside';
import type { Place, Path, Span } from './place';
import type { MapNode, Pair, TreeNode } from './tree';

/** How far a place could be followed. */
export interface Located {
  /** Offset in the file that the tree's offsets count from. */
  readonly base: number;
  /** The pair whose value, or in whose value, the place is; null for the file as a whole. */
  readonly pair: Pair | null;
  /** The value there; null where nothing is written. */
  readonly node: TreeNode | null;
  /** Whether the last step went to an item of a list, so that the pair is not the place's own. */
  readonly item: boolean;
  /** What could not be followed; empty where the place exists. */
  readonly missing: Path;
}

/** Follows a place as far as it goes; null for a channel or a key of the file that does not exist. */
export function locate(inside: Inside, place: Place): Located | null {
  const { channel, path } = place;
  if (channel !== null) return inChannel(inside, channel, path);
  const [section, name, ...rest] = path;
  if (isSpace(section) && typeof name === 'string') {
    const entry = inside.names[section].get(name);
    if (entry !== undefined) return follow(inside, atPair(entry.base, entry.named.pair), rest);
  }
  for (const { slice, reading } of inside.slices) {
    const pair = slice.kind === 'top' ? reading.pairs.find(({ key }) => key === section) : undefined;
    if (pair !== undefined) return follow(inside, atPair(slice.start, pair), path.slice(1));
  }
  return null;
}

const isSpace = (section: unknown): section is keyof Inside['names'] => typeof section === 'string' && spaces.has(section);

const spaces: ReadonlySet<string> = new Set(['clocks', 'filters', 'sources', 'masks', 'channels']);

/** The span of what was found: of the value, of the key, or of the key with its value. */
export function spanOfLocated({ base, pair, node, item, missing }: Located, part: 'value' | 'key' | 'pair'): Span {
  const at = (start: number, end: number): Span => ({ start: base + start, end: base + end });
  if (item && node !== null) return missing.length === 0 ? at(node.start, node.end) : at(...headOf(node));
  if (pair === null) return at(0, 0);
  if (missing.length > 0 || part === 'key' || (node === null && part === 'value')) return at(pair.keyStart, pair.keyEnd);
  if (part === 'pair') return at(pair.keyStart, pair.value?.end ?? pair.keyEnd);
  return node === null ? at(pair.keyStart, pair.keyEnd) : at(node.start, node.end);
}

/** The first key of a map, so that a missing one is not marked over the whole of it. */
function headOf(node: TreeNode): [number, number] {
  const first = node.form === 'map' ? node.pairs[0] : undefined;
  return first === undefined ? [node.start, node.end] : [first.keyStart, first.keyEnd];
}

function atPair(base: number, pair: Pair): Located {
  return { base, pair, node: pair.value, item: false, missing: [] };
}

/** A key that the channel does not give is looked for in the channel that its `like` names, and so on. */
function inChannel(inside: Inside, name: string, path: Path): Located | null {
  const own = inside.names.channels.get(name);
  if (own === undefined) return null;
  const first = path[0];
  const seen = new Set<string>();
  for (let next: string | null = name; next !== null && !seen.has(next);) {
    seen.add(next);
    const entry = inside.names.channels.get(next);
    const map = entry?.named.pair.value;
    if (entry === undefined || map?.form !== 'map') break;
    if (typeof first === 'string' && pairOf(map, first) !== undefined)
      return follow(inside, atPair(entry.base, entry.named.pair), path);
    const like = pairOf(map, 'like')?.value;
    next = like?.form === 'scalar' ? like.text : null;
  }
  return follow(inside, atPair(own.base, own.named.pair), path);
}

function follow(inside: Inside, from: Located, path: Path): Located {
  let at = from;
  for (const [index, step] of path.entries()) {
    const next = stepInto(inside, at, step);
    if (next === null) return { ...at, missing: path.slice(index) };
    at = next;
  }
  return at;
}

function stepInto(inside: Inside, at: Located, step: string | number): Located | null {
  const from = throughName(inside, at);
  const { node } = from;
  if (typeof step === 'number') {
    if (node?.form !== 'list') return step === 0 && node !== null ? from : null;
    const item = node.items[step];
    return item === undefined ? null : { ...from, node: item, item: true };
  }
  if (node?.form === 'map') {
    const pair = pairOf(node, step);
    return pair === undefined ? null : atPair(from.base, pair);
  }
  // The short form of a limit is its `at`; where that is the name of a mask it is the name itself.
  return step === 'at' && (at.node?.form === 'scalar' || at.node?.form === 'list') ? at : null;
}

/** Where a value is the name of a filter, a clock, a source or a mask, what it names. */
function throughName(inside: Inside, at: Located): Located {
  if (at.node?.form !== 'scalar' || at.pair === null) return at;
  const space = Object.hasOwn(named, at.pair.key) ? named[at.pair.key] : undefined;
  const entry = space === undefined ? undefined : inside.names[space].get(at.node.text);
  return entry === undefined ? at : atPair(entry.base, entry.named.pair);
}

/** The keys whose values may be names, and where those are defined. */
const named: Readonly<Record<string, Exclude<keyof Inside['names'], 'channels'>>> = {
  filter: 'filters',
  'input-filter': 'filters',
  'output-filter': 'filters',
  clock: 'clocks',
  unwanted: 'sources',
  response: 'masks',
  through: 'masks',
  output: 'masks',
  at: 'masks',
};

function pairOf(map: MapNode, key: string): Pair | undefined {
  return map.pairs.find((pair) => pair.key === key);
}
