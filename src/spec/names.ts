/** Gathers the names of a file across its slices: what each stands for, who uses it, and which stand twice. */
import { errorAt } from './local-problem';
import type { LocalProblem } from './local-problem';
import type { Inside, Names, PlacedName, PlacedSlice } from './inside';
import type { DefinedName } from './reading';
import type { Definitions, NameLists } from './resolver';
import type { Named } from './slice-reading';
import type { Pair } from './tree';

/** All names; of two alike the first counts. Takes time linear in their number. */
export function namesIn(slices: readonly PlacedSlice[]): Names {
  return {
    clocks: gathered(slices, ({ reading }) => reading.clocks),
    filters: gathered(slices, ({ reading }) => reading.filters),
    channels: gathered(slices, ({ reading }) => reading.channels),
  };
}

function gathered<T>(
  slices: readonly PlacedSlice[],
  of: (placed: PlacedSlice) => readonly Named<T>[],
): ReadonlyMap<string, PlacedName<T>> {
  const names = new Map<string, PlacedName<T>>();
  for (const placed of slices) {
    for (const named of of(placed)) {
      const first = names.get(named.name);
      names.set(named.name, first === undefined ? { named, base: placed.slice.start, twice: false } : { ...first, twice: true });
    }
  }
  return names;
}

/** The names as lists; the earlier lists where none has come or gone. */
export function nameLists(names: Names, before: NameLists): NameLists {
  const lists = {
    clocks: [...names.clocks.keys()],
    filters: [...names.filters.keys()],
    channels: [...names.channels.keys()],
  };
  const same = (a: readonly string[], b: readonly string[]): boolean =>
    a.length === b.length && a.every((name, at) => name === b[at]);
  const unchanged =
    same(lists.clocks, before.clocks) && same(lists.filters, before.filters) && same(lists.channels, before.channels);
  return unchanged ? before : lists;
}

/** Where the resolver looks names up. What was lost to a fault in `clocks` or `filters` counts as faulty, not as missing. */
export function definitionsOf(names: Names, lists: NameLists, slices: readonly PlacedSlice[]): Definitions {
  const valueOf = <T>(map: ReadonlyMap<string, PlacedName<T>>, name: string, lossy: boolean): T | null | undefined => {
    const placed = map.get(name);
    if (placed === undefined) return lossy ? null : undefined;
    return placed.twice || placed.named.decoded.problems.length > 0 ? null : placed.named.decoded.value;
  };
  const lossyClocks = isLossy(slices, 'clocks');
  const lossyFilters = isLossy(slices, 'filters');
  return {
    channel: (name) => names.channels.get(name)?.named.decoded,
    clock: (name) => valueOf(names.clocks, name, lossyClocks),
    filter: (name) => valueOf(names.filters, name, lossyFilters),
    lists,
  };
}

function isLossy(slices: readonly PlacedSlice[], key: string): boolean {
  return slices.some(
    ({ slice, reading }) => slice.kind === 'top' && reading.lossy && reading.pairs.some((pair) => pair.key === key),
  );
}

/** The clocks and filters with the channels that use them, directly or through `like`. */
export function definedNames({ names, resolved }: Inside): DefinedName[] {
  const users = new Map<string, string[]>();
  for (const [channel, { resolution }] of resolved) {
    for (const { space, name } of resolution.uses) {
      const mark = `${space} ${name}`;
      const known = users.get(mark);
      if (known === undefined) users.set(mark, [channel]);
      else known.push(channel);
    }
  }
  const defined = (space: 'clocks' | 'filters'): DefinedName[] =>
    [...names[space].keys()].map((name) => ({
      space,
      name,
      users: users.get(`${space} ${name}`) ?? [],
      place: { channel: null, path: [space, name] },
    }));
  return [...defined('clocks'), ...defined('filters')];
}

/** Keys of the file, and names of clocks, filters and channels, that stand a second time; offsets into the file. */
export function problemsOfTwins(slices: readonly PlacedSlice[], names: Names): LocalProblem[] {
  const problems: LocalProblem[] = [];
  const keys = new Set<string>();
  const anyTwice = (map: ReadonlyMap<string, PlacedName<unknown>>): boolean => {
    for (const { twice } of map.values()) if (twice) return true;
    return false;
  };
  for (const { slice, reading } of slices) {
    if (slice.kind === 'channel') continue;
    for (const pair of reading.pairs) {
      if (keys.has(pair.key)) problems.push(twin('', pair, slice.start));
      keys.add(pair.key);
    }
  }
  for (const space of ['clocks', 'filters', 'channels'] as const) {
    if (anyTwice(names[space])) problems.push(...twinsOf(space, slices));
  }
  return problems;
}

function twinsOf(space: keyof Names, slices: readonly PlacedSlice[]): LocalProblem[] {
  const problems: LocalProblem[] = [];
  const seen = new Set<string>();
  for (const { slice, reading } of slices) {
    for (const { name, pair } of reading[space]) {
      if (seen.has(name)) problems.push(twin(space, pair, slice.start));
      seen.add(name);
    }
  }
  return problems;
}

function twin(space: string, pair: Pair, base: number): LocalProblem {
  const message =
    space === ''
      ? `\`${pair.key}\` stands twice in the file: put both together under one.`
      : `The name \`${pair.key}\` stands twice in \`${space}\`: give one of them another name.`;
  return errorAt({ start: base + pair.keyStart, end: base + pair.keyEnd }, 'duplicate-name', message);
}
