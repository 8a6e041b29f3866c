/** Reads the slices of a text, taking over from an earlier reading every one whose text is the same. */
import type { Inside, PlacedSlice } from './inside';
import { readSlice } from './slice-reading';
import type { Known, SliceReading } from './slice-reading';
import type { Slice } from './slices/slice';

/** The slices in order, and how many had to be read anew. */
export interface ReadSlices {
  readonly placed: readonly PlacedSlice[];
  readonly count: number;
}

/** Reads them. */
export function readSlices(slices: readonly Slice[], before: Pick<Inside, 'slices' | 'names'>): ReadSlices {
  const known: Known = {
    clock: (name) => before.names.clocks.get(name)?.named,
    filter: (name) => before.names.filters.get(name)?.named,
    source: (name) => before.names.sources.get(name)?.named,
    mask: (name) => before.names.masks.get(name)?.named,
    channel: (name) => before.names.channels.get(name)?.named,
  };
  const earlier = new EarlierSlices(before.slices, slices.length);
  let count = 0;
  const placed = slices.map((slice, index) => {
    const same = earlier.find(slice, index);
    if (same === null) count += 1;
    return { slice, reading: same ?? readSlice(slice, known) };
  });
  return { placed, count };
}

/** Looks slices up by their text: first where they stood, counted from either end; only if that fails among all. */
class EarlierSlices {
  private byText: Map<string, SliceReading> | null = null;

  constructor(
    private readonly placed: readonly PlacedSlice[],
    private readonly count: number,
  ) {}

  find(slice: Slice, index: number): SliceReading | null {
    const fromFront = this.placed[index]?.reading;
    if (fromFront !== undefined && readsAlike(fromFront.slice, slice)) return fromFront;
    const fromBack = this.placed[index + this.placed.length - this.count]?.reading;
    if (fromBack !== undefined && readsAlike(fromBack.slice, slice)) return fromBack;
    this.byText ??= new Map(this.placed.map(({ reading }) => [reading.slice.text, reading]));
    const anywhere = this.byText.get(slice.text);
    return anywhere !== undefined && readsAlike(anywhere.slice, slice) ? anywhere : null;
  }
}

function readsAlike(a: SliceReading['slice'], b: SliceReading['slice']): boolean {
  return a.kind === b.kind && a.doubtful === b.doubtful && a.lead === b.lead && a.text === b.text;
}
