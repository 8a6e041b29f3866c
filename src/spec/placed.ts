/** Slices and names at their places in a file. */
import type { ChannelModel } from './declaration/channel';
import type { ClockModel } from './declaration/clock';
import type { SegmentsModel } from './declaration/mask';
import type { SourceModel } from './declaration/source';
import type { StagesModel } from './declaration/stage';
import type { Named, SliceReading } from './slice-reading';
import type { Slice } from './slices/slice';

/** A slice at its place in the file. */
export interface PlacedSlice {
  readonly slice: Slice;
  readonly reading: SliceReading;
}

/** A clock, a filter or a channel at its place in the file. */
export interface PlacedName<T> {
  readonly named: Named<T>;
  /** Offset in the file that the offsets of its tree count from. */
  readonly base: number;
  /** A second one has the same name. */
  readonly twice: boolean;
}

/** The names of a file by space; of two alike the first. */
export interface Names {
  readonly clocks: ReadonlyMap<string, PlacedName<ClockModel>>;
  readonly filters: ReadonlyMap<string, PlacedName<StagesModel>>;
  readonly sources: ReadonlyMap<string, PlacedName<SourceModel>>;
  readonly masks: ReadonlyMap<string, PlacedName<SegmentsModel>>;
  readonly channels: ReadonlyMap<string, PlacedName<ChannelModel>>;
}
