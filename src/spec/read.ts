/** Reads a spec's text: slices, names, channels and every fault, taking over from an earlier reading all that has not changed. */
import { findAcceptances } from './acceptances';
import { definedNames, definitionsOf, nameLists, namesIn, problemsOfTwins } from './names';
import { SpecReading, insideOf, nothingRead } from './inside';
import type { Inside, PlacedSlice } from './inside';
import { problemsOf } from './problems';
import type { ChannelEntry, Reading } from './reading';
import { Resolver } from './resolver';
import { readSlice } from './slice-reading';
import type { Known, SliceReading } from './slice-reading';
import { sliceAt } from './slices/slice-at';
import { scan } from './slices/scan';
import type { Slice } from './slices/slice';
import { largestSpec, tooLarge } from './too-large';
import { scalars } from './tree-walk';
import { vocabulary } from './vocabulary';

/**
 * Reads a text. Never throws and does no I/O; takes time linear in the text.
 * @param previous a reading of an earlier text of the same file: slices and channels on which nothing has changed are taken over
 */
export function read(text: string, previous?: Reading): Reading {
  if (text.length > largestSpec) return new SpecReading(tooLarge(text), nothingRead);
  const before = previous === undefined ? nothingRead : insideOf(previous);
  const { slices, faults } = scan(text, vocabulary);
  const cut = readSlices(slices, before);
  const names = namesIn(cut.placed);
  const lists = nameLists(names, before.lists);
  const resolver = new Resolver(definitionsOf(names, lists, cut.placed), before.resolved);
  for (const name of names.channels.keys()) resolver.resolve(name);
  const inside: Inside = { slices: cut.placed, byText: cut.byText, names, lists, resolved: resolver.resolved };
  const accepted = findAcceptances(text, (offset) => isInScalar(cut.placed, offset));
  const shown: Reading = {
    text,
    title: cut.placed.find(({ reading }) => reading.title !== null)?.reading.title ?? null,
    entries: [...names.channels.keys()].map((name) => entryOf(name, inside)),
    names: definedNames(inside),
    problems: problemsOf(text, inside, faults, [...accepted.problems, ...problemsOfTwins(cut.placed)]),
    acceptances: accepted.acceptances,
    counts: { slices: slices.length, slicesRead: cut.count, channelsResolved: resolver.count },
  };
  return new SpecReading(shown, inside);
}

interface CutText {
  readonly placed: readonly PlacedSlice[];
  readonly byText: ReadonlyMap<string, SliceReading>;
  /** How many slices had to be read anew. */
  readonly count: number;
}

function readSlices(slices: readonly Slice[], before: Inside): CutText {
  const known: Known = {
    clock: (name) => before.names.clocks.get(name)?.named,
    filter: (name) => before.names.filters.get(name)?.named,
    channel: (name) => before.names.channels.get(name)?.named,
  };
  const byText = new Map<string, SliceReading>();
  let count = 0;
  const placed = slices.map((slice) => {
    const key = `${slice.kind} ${String(slice.doubtful)} ${slice.lead}\0${slice.text}`;
    let reading = byText.get(key) ?? before.byText.get(key);
    if (reading === undefined) {
      reading = readSlice(slice, known);
      count += 1;
    }
    byText.set(key, reading);
    return { slice, reading };
  });
  return { placed, byText, count };
}

function entryOf(name: string, { names, resolved }: Inside): ChannelEntry {
  const resolution = resolved.get(name)?.resolution;
  const twice = names.channels.get(name)?.twice === true;
  return {
    name,
    direction: resolution?.direction ?? null,
    ref: resolution?.ref ?? null,
    channel: twice ? null : (resolution?.channel ?? null),
  };
}

/** Whether an offset lies inside a scalar, where a `#` begins no comment. */
function isInScalar(slices: readonly PlacedSlice[], offset: number): boolean {
  const placed = sliceAt(slices, offset);
  if (placed === null) return false;
  const within = offset - placed.slice.start;
  for (const pair of placed.reading.pairs) {
    for (const { node } of scalars(pair.value)) if (node.start < within && within < node.end) return true;
  }
  return false;
}
