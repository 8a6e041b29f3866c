/** Resolves the channels of one reading, taking over from an earlier one every channel on which nothing has changed. */
import type { ChannelModel } from './declaration/channel';
import type { ClockModel } from './declaration/clock';
import type { StagesModel } from './declaration/stage';
import type { Decoded } from './decode';
import { resolveChannel } from './resolve/resolve-channel';
import type { Lookup, Resolution, Use } from './resolve/resolution';

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
export type NameLists = Readonly<Record<Use['space'], readonly string[]>>;

/** Where a reading looks names up. */
export interface Definitions {
  channel(name: string): Decoded<ChannelModel> | undefined;
  clock(name: string): ClockModel | null | undefined;
  filter(name: string): StagesModel | null | undefined;
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
  ) {
    this.lookup = {
      channel: (name) => definitions.channel(name),
      clock: (name) => definitions.clock(name),
      filter: (name) => definitions.filter(name),
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
    const resolution = resolveChannel(name, own, this.lookup);
    const answers = resolution.uses.map((use) => ({ ...use, answer: this.answer(use.space, use.name) }));
    const chose = resolution.problems.some(({ code }) => code === 'unknown-name');
    return { own, resolution, answers, choice: chose ? this.definitions.lists : null };
  }

  private answer(space: Use['space'], name: string): unknown {
    if (space === 'channels') return this.definitions.channel(name);
    return space === 'clocks' ? this.definitions.clock(name) : this.definitions.filter(name);
  }
}
