/** Resolves the channels of one reading, taking over from an earlier one every channel on which nothing has changed. */
import type { ChannelModel } from './declaration/channel';
import type { ClockModel } from './declaration/clock';
import type { SegmentsModel } from './declaration/mask';
import type { SourceModel } from './declaration/source';
import type { StagesModel } from './declaration/stage';
import type { Decoded } from './decode';
import { resolveChannel } from './resolve/resolve-channel';
import type { DefinedSpace, Lookup, NamedSpace, Resolution, Use } from './resolve/resolution';
import { useOf } from './tables/spec-table';
import type { SpecTable, TableUse } from './tables/spec-table';

/** A resolved channel with all that the resolution rests on. */
export interface Resolved {
  readonly own: Decoded<ChannelModel>;
  readonly resolution: Resolution;
  /** What each name that was looked up stood for. */
  readonly answers: readonly (Use & { readonly answer: unknown })[];
  /** The names it was told to choose from, where it found one missing. */
  readonly choice: NameLists | null;
}

/** The names of a file; the same object as long as none has come or gone. */
export type NameLists = Readonly<Record<NamedSpace, readonly string[]>>;

/** Where a reading looks names up. */
export interface Definitions {
  channel(name: string): Decoded<ChannelModel> | undefined;
  clock(name: string): ClockModel | null | undefined;
  filter(name: string): StagesModel | null | undefined;
  source(name: string): SourceModel | null | undefined;
  mask(name: string): SegmentsModel | null | undefined;
  table(use: TableUse): SpecTable | null;
  fileOf(space: DefinedSpace, name: string): string | null;
  readonly lists: NameLists;
}

/** The resolutions of one reading. */
export class Resolver {
  readonly resolved = new Map<string, Resolved>();
  /** How many had to be worked out anew. */
  count = 0;
  private readonly lookup: Lookup;

  constructor(
    private readonly definitions: Definitions,
    private readonly earlier: ReadonlyMap<string, Resolved>,
    /** Refuses what resolves but must not be handed out. */
    private readonly accepted: (resolution: Resolution) => Resolution,
  ) {
    this.lookup = {
      channel: (name) => definitions.channel(name),
      clock: (name) => definitions.clock(name),
      filter: (name) => definitions.filter(name),
      source: (name) => definitions.source(name),
      mask: (name) => definitions.mask(name),
      table: (use) => definitions.table(use),
      fileOf: (space, name) => definitions.fileOf(space, name),
      names: (space) => definitions.lists[space],
      resolution: (name) => this.resolve(name),
    };
  }

  /** The resolution of a channel; undefined where there is none of that name. */
  resolve(name: string): Resolution | undefined {
    const known = this.resolved.get(name);
    if (known !== undefined) return known.resolution;
    const own = this.definitions.channel(name);
    if (own === undefined) return undefined;
    const earlier = this.earlier.get(name);
    const resolved = earlier !== undefined && this.holds(earlier, own) ? earlier : this.anew(name, own);
    this.resolved.set(name, resolved);
    return resolved.resolution;
  }

  private holds(earlier: Resolved, own: Decoded<ChannelModel>): boolean {
    if (earlier.own !== own || (earlier.choice !== null && earlier.choice !== this.definitions.lists)) return false;
    return earlier.answers.every(({ space, name, answer }) => this.answer(space, name) === answer);
  }

  private anew(name: string, own: Decoded<ChannelModel>): Resolved {
    this.count += 1;
    const resolution = this.accepted(resolveChannel(name, own, this.lookup));
    const answers = resolution.uses.map((use) => ({ ...use, answer: this.answer(use.space, use.name) }));
    const chose = resolution.problems.some(({ code }) => code === 'unknown-name');
    return { own, resolution, answers, choice: chose ? this.definitions.lists : null };
  }

  private answer(space: Use['space'], name: string): unknown {
    switch (space) {
      case 'channels':
        return this.definitions.channel(name);
      case 'clocks':
        return this.definitions.clock(name);
      case 'filters':
        return this.definitions.filter(name);
      case 'sources':
        return this.definitions.source(name);
      case 'masks':
        return this.definitions.mask(name);
      case 'tables':
        return this.definitions.table(useOf(name));
    }
  }
}
