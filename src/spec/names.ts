/** Gathers the names of a file across its slices: what each stands for, who uses it, and which stand twice. */
import { errorAt } from './local-problem';
import type { LocalProblem } from './local-problem';
import type { Inside, Names, PlacedName, PlacedSlice } from './inside';
import type { DefinedName } from './reading';
import type { Named } from './slice-reading';
import type { Pair } from './tree';

/** All names; of two alike the first counts. Takes time linear in their number. */
export function namesIn(slices: readonly PlacedSlice[]): Names {
  return {
    clocks: gathered(slices, ({ reading }) => reading.clocks),
    filters: gathered(slices, ({ reading }) => reading.filters),
    sources: gathered(slices, ({ reading }) => reading.sources),
    masks: gathered(slices, ({ reading }) => reading.masks),
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

/** The names with the channels that use them, directly or through `like`. */
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
  const defined = (space: DefinedName['space']): DefinedName[] =>
    [...names[space].keys()].map((name) => ({
      space,
      name,
      users: users.get(`${space} ${name}`) ?? [],
      place: { channel: null, path: [space, name] },
    }));
  return definedSpaces.flatMap(defined);
}

/** The spaces of names that channels use, in the order they are listed. */
const definedSpaces: readonly DefinedName['space'][] = ['clocks', 'filters', 'sources', 'masks'];

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
  for (const space of ['clocks', 'filters', 'sources', 'masks', 'channels'] as const) {
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
