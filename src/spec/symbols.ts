/** The outline of a spec: its sections, the names in them, and what stands below each. */
import { insideOf } from './inside';
import type { PlacedSlice } from './inside';
import type { Span } from './place';
import type { Reading } from './reading';
import type { Pair, TreeNode } from './tree';

/** One entry of the outline. Its span holds its selection and the spans of its children. */
export interface SpecSymbol {
  readonly name: string;
  readonly kind: 'section' | 'clock' | 'filter' | 'mask' | 'channel' | 'stage' | 'source' | 'segment' | 'key';
  readonly span: Span;
  /** The key or item that the entry is named after. */
  readonly selection: Span;
  readonly children: readonly SpecSymbol[];
}

/** The outline of a reading, in the order of the text. */
export function symbolsOf(reading: Reading): readonly SpecSymbol[] {
  const symbols: SpecSymbol[] = [];
  for (const placed of insideOf(reading).slices) {
    const last = symbols.at(-1);
    if (placed.slice.kind === 'top') symbols.push(...sections(placed));
    else if (last !== undefined) symbols[symbols.length - 1] = withChildren(last, channels(placed));
  }
  return symbols;
}

const kinds: Readonly<Record<string, SpecSymbol['kind']>> = {
  clocks: 'clock',
  filters: 'filter',
  sources: 'source',
  masks: 'mask',
  channels: 'channel',
};

function sections({ slice, reading }: PlacedSlice): readonly SpecSymbol[] {
  return reading.pairs.map((pair) => {
    const kind = Object.hasOwn(kinds, pair.key) ? kinds[pair.key] : undefined;
    if (kind === undefined) return symbolOf(pair, 'section', slice.start, []);
    const entries = pair.value?.form === 'map' ? pair.value.pairs : [];
    return symbolOf(
      pair,
      'section',
      slice.start,
      entries.map((entry) => entryOf(entry, kind, slice.start)),
    );
  });
}

function channels({ slice, reading }: PlacedSlice): readonly SpecSymbol[] {
  return reading.channels.map(({ pair }) => entryOf(pair, 'channel', slice.start));
}

/** A section reaches to the end of its last child, in whatever slice that stands. */
function withChildren(symbol: SpecSymbol, children: readonly SpecSymbol[]): SpecSymbol {
  const end = Math.max(symbol.span.end, ...children.map(({ span }) => span.end));
  return { ...symbol, span: { start: symbol.span.start, end }, children: [...symbol.children, ...children] };
}

function entryOf(pair: Pair, kind: SpecSymbol['kind'], base: number): SpecSymbol {
  if (kind === 'filter') return symbolOf(pair, kind, base, items(pair.value, 'stage', base));
  if (kind === 'mask') return symbolOf(pair, kind, base, items(pair.value, 'segment', base));
  const keys = pair.value?.form === 'map' ? pair.value.pairs : [];
  return symbolOf(
    pair,
    kind,
    base,
    keys.map((key) => keySymbol(key, base)),
  );
}

function keySymbol(pair: Pair, base: number): SpecSymbol {
  const inside = pair.key === 'unwanted' ? 'source' : filterKeys.has(pair.key) ? 'stage' : null;
  return symbolOf(pair, 'key', base, inside === null ? [] : items(pair.value, inside, base));
}

const filterKeys: ReadonlySet<string> = new Set(['filter', 'input-filter', 'output-filter']);

/** The items of a list, or the one map that stands for a list. */
function items(node: TreeNode | null, kind: 'stage' | 'source' | 'segment', base: number): readonly SpecSymbol[] {
  const nodes = node?.form === 'list' ? node.items : node?.form === 'map' ? [node] : [];
  return nodes.flatMap((item) => (item === null ? [] : [itemSymbol(item, kind, base)]));
}

function itemSymbol(node: TreeNode, kind: 'stage' | 'source' | 'segment', base: number): SpecSymbol {
  const span = { start: base + node.start, end: base + node.end };
  return { name: nameOf(node), kind, span, selection: span, children: [] };
}

/** Its own name, or else what its first key says: `butterworth`, `310 kHz`. */
function nameOf(node: TreeNode): string {
  if (node.form === 'scalar') return node.text;
  if (node.form === 'list') return '';
  const named = node.pairs.find(({ key }) => key === 'name') ?? node.pairs[0];
  if (named === undefined) return '';
  return named.value?.form === 'scalar' ? named.value.text : named.key;
}

function symbolOf(pair: Pair, kind: SpecSymbol['kind'], base: number, children: readonly SpecSymbol[]): SpecSymbol {
  const start = base + pair.keyStart;
  const symbol: SpecSymbol = {
    name: pair.key,
    kind,
    span: { start, end: base + Math.max(pair.value?.end ?? 0, pair.keyEnd) },
    selection: { start, end: base + pair.keyEnd },
    children: [],
  };
  return withChildren(symbol, children);
}
