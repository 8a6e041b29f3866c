/** What resolving a channel needs and gives: names looked up, defaults applied, faults by path. */
import type { Channel } from '../channel';
import type { ChannelModel } from '../declaration/channel';
import type { ClockModel } from '../declaration/clock';
import type { SegmentsModel } from '../declaration/mask';
import type { SourceModel } from '../declaration/source';
import type { StagesModel } from '../declaration/stage';
import type { Decoded } from '../decode';
import type { Path } from '../place';
import type { ProblemCode } from '../reading';
import type { SpecTable, TableUse } from '../tables/spec-table';

/** Where names are looked up. `undefined`: no such name; null: it exists but is faulty. */
export interface Lookup {
  channel(name: string): Decoded<ChannelModel> | undefined;
  clock(name: string): ClockModel | null | undefined;
  filter(name: string): StagesModel | null | undefined;
  source(name: string): SourceModel | null | undefined;
  mask(name: string): SegmentsModel | null | undefined;
  /** A table of a file; null where it could not be read, which is reported where its path stands. */
  table(use: TableUse): SpecTable | null;
  /** The file in which a name is defined, where that is not the channel's own. */
  fileOf(space: DefinedSpace, name: string): string | null;
  /** All names of a space, for suggestions. */
  names(space: NamedSpace): Iterable<string>;
  /**
   * The resolution of another channel of the same file, which `like` builds on. It is asked for only after the chain
   * of `like` has been found to end, so keeping each answer is enough to make it terminate quickly.
   */
  resolution(name: string): Resolution | undefined;
}

/** Spaces of names that may come from another file. */
export type DefinedSpace = 'clocks' | 'filters' | 'sources' | 'masks';

/** Spaces of names. */
export type NamedSpace = DefinedSpace | 'channels';

/** A name or a table (by its own mark) that a channel leans on, whether it was found or not. */
export interface Use {
  readonly space: NamedSpace | 'tables';
  readonly name: string;
}

/** A name that a channel leans on. */
export interface NameUse extends Use {
  readonly space: NamedSpace;
}

/** A fault that only shows once names and defaults are in; its place is a path of the channel. */
export interface ResolveProblem {
  readonly path: Path;
  readonly part: 'key' | 'value';
  readonly code: ProblemCode;
  readonly message: string;
  /** Texts that could stand in place of the value (or key). */
  readonly cures: readonly { readonly title: string; readonly newText: string }[];
}

/** What a channel resolves to. */
export interface Resolution {
  /** The whole channel, or null where a fault in it or in what it names keeps it from being whole. */
  readonly channel: Channel | null;
  readonly direction: 'capture' | 'generate' | 'relay' | null;
  readonly ref: string | null;
  readonly problems: readonly ResolveProblem[];
  /** Everything looked up, through `like` too; the same answers for these and the same own text give the same resolution. */
  readonly uses: readonly Use[];
  /** The channel's keys with those of `like` filled in. */
  readonly merged: ChannelModel;
}
