/** Where the resolver looks names and tables up: in the file itself, then in the specs that it uses. */
import { tableOf } from './files/outside';
import type { Outside } from './files/outside';
import type { Shelf } from './files/shelf';
import type { Names, PlacedName, PlacedSlice } from './inside';
import type { DefinedSpace, NamedSpace } from './resolve/resolution';
import type { Definitions, NameLists } from './resolver';

const spaces: readonly NamedSpace[] = ['clocks', 'filters', 'sources', 'masks', 'channels'];

/** The names as lists, those of used specs behind the file's own; the earlier lists where none has come or gone. */
export function nameLists(names: Names, { specs }: Outside, before: NameLists): NameLists {
  const listed = (space: NamedSpace): readonly string[] => {
    const used = space === 'channels' ? [] : specs.flatMap((spec) => [...spec.names[space].keys()]);
    return [...new Set([...names[space].keys(), ...used])];
  };
  const lists: NameLists = {
    clocks: listed('clocks'),
    filters: listed('filters'),
    sources: listed('sources'),
    masks: listed('masks'),
    channels: listed('channels'),
  };
  const same = (a: readonly string[], b: readonly string[]): boolean =>
    a.length === b.length && a.every((name, at) => name === b[at]);
  return spaces.every((space) => same(lists[space], before[space])) ? before : lists;
}

/** What was lost to a fault in a section counts as faulty, not as missing; so does what a spec that was not read may hold. */
export function definitionsOf(
  names: Names,
  lists: NameLists,
  slices: readonly PlacedSlice[],
  outside: Outside,
  shelf: Shelf,
): Definitions {
  const lossy = (space: DefinedSpace) => outside.lossy || isLossy(slices, space);
  const lossyBySpace = { clocks: lossy('clocks'), filters: lossy('filters'), sources: lossy('sources'), masks: lossy('masks') };
  const placed = <S extends DefinedSpace>(
    space: S,
    name: string,
  ): Names[S] extends ReadonlyMap<string, infer P> ? P | undefined : never => {
    const found = names[space].get(name) ?? outside.specs.find((spec) => spec.names[space].has(name))?.names[space].get(name);
    return found as Names[S] extends ReadonlyMap<string, infer P> ? P | undefined : never;
  };
  return {
    channel: (name) => names.channels.get(name)?.named.decoded,
    clock: (name) => valueOf(placed('clocks', name), lossyBySpace.clocks),
    filter: (name) => valueOf(placed('filters', name), lossyBySpace.filters),
    source: (name) => valueOf(placed('sources', name), lossyBySpace.sources),
    mask: (name) => valueOf(placed('masks', name), lossyBySpace.masks),
    table: (use) => tableOf(use, shelf),
    fileOf: (space, name) => {
      if (names[space].has(name)) return null;
      return outside.specs.find((spec) => spec.names[space].has(name))?.path ?? null;
    },
    lists,
  };
}

function valueOf<T>(placed: PlacedName<T> | undefined, lossy: boolean): T | null | undefined {
  if (placed === undefined) return lossy ? null : undefined;
  return placed.twice || placed.named.decoded.problems.length > 0 ? null : placed.named.decoded.value;
}

function isLossy(slices: readonly PlacedSlice[], key: string): boolean {
  return slices.some(
    ({ slice, reading }) => slice.kind === 'top' && reading.lossy && reading.pairs.some((pair) => pair.key === key),
  );
}
