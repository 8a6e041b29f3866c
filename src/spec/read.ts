/** Reads a spec's text: slices, names, channels and every fault, taking over from an earlier reading all that has not changed. */
import { findAcceptances } from './acceptances';
import { definitionsOf, nameLists } from './definitions';
import type { FileSource } from './files/file-source';
import { outsideOf } from './files/outside';
import { Shelf } from './files/shelf';
import { definedNames, namesIn, problemsOfTwins } from './names';
import { SpecReading, insideOf, nothingRead } from './inside';
import type { Inside, PlacedSlice } from './inside';
import { problemsOf } from './problems';
import type { ChannelEntry, Reading } from './reading';
import type { Resolution } from './resolve/resolution';
import { withoutNotComputed } from './resolve/not-computed';
import { Resolver } from './resolver';
import type { Resolved } from './resolver';
import { readSlices } from './read-slices';
import { sliceAt } from './slices/slice-at';
import { scan } from './slices/scan';
import { largestSpec, tooLarge } from './too-large';
import { scalars } from './tree-walk';
import { vocabulary } from './vocabulary';

/**
 * Reads a text. Never throws and does no I/O; takes time linear in the text.
 * @param previous a reading of an earlier text of the same file: slices and channels on which nothing has changed are taken over
 * @param files contents of the files that the spec names; those that are missing are asked for in `Reading.paths`. The earlier reading's
 * unless they are given, so that a change of the text alone is tried on the same files
 */
export function read(text: string, previous?: Reading, files?: FileSource): Reading {
  return readAccepting(withoutNotComputed, text, previous, files);
}

/** Reads a text, handing out what of each channel is accepted; apart from `read` only to look at what is not computed yet. */
export function readAccepting(
  acceptedOf: (resolution: Resolution) => Resolution,
  text: string,
  previous?: Reading,
  files?: FileSource,
): Reading {
  if (text.length > largestSpec) return new SpecReading(tooLarge(text), nothingRead);
  const before = previous === undefined ? nothingRead : insideOf(previous);
  const { slices, faults } = scan(text, vocabulary);
  const { placed, count } = readSlices(slices, before);
  const names = namesIn(placed);
  const shelf = new Shelf(files ?? before.files, before.shelved);
  const outside = outsideOf(placed, names, shelf);
  const lists = nameLists(names, outside, before.lists);
  const resolver = new Resolver(definitionsOf(names, lists, placed, outside, shelf), before.resolved, acceptedOf);
  for (const name of names.channels.keys()) resolver.resolve(name);
  const inside: Inside = {
    slices: placed,
    names,
    lists,
    resolved: resolver.resolved,
    shelved: shelf.shelved,
    files: shelf.files,
  };
  const accepted = findAcceptances(text, (offset) => isInScalar(placed, offset));
  const problems = problemsOf(text, inside, faults, [
    ...accepted.problems,
    ...problemsOfTwins(placed, names),
    ...outside.problems,
  ]);
  // No channel is whole that has an error of any kind in its text.
  const faulty = new Set(
    problems.flatMap(({ severity, channel }) => (severity === 'error' && channel !== null ? [channel] : [])),
  );
  const shown: Reading = {
    text,
    title: placed.find(({ reading }) => reading.title !== null)?.reading.title ?? null,
    entries: [...names.channels.keys()].map((name) => entryOf(name, inside.resolved.get(name), faulty.has(name))),
    names: definedNames(inside),
    problems,
    acceptances: accepted.acceptances,
    paths: shelf.paths,
    counts: { slices: slices.length, slicesRead: count, channelsResolved: resolver.count },
  };
  return new SpecReading(shown, inside);
}

function entryOf(name: string, resolved: Resolved | undefined, isFaulty: boolean): ChannelEntry {
  const resolution = resolved?.resolution;
  return {
    name,
    direction: resolution?.direction ?? null,
    ref: resolution?.ref ?? null,
    channel: isFaulty ? null : (resolution?.channel ?? null),
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
