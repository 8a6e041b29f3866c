/** Reads one slice as far as it can be read alone: its tree, the values in it, and its faults, all counted from its start. */
import type { ChannelModel } from './declaration/channel';
import { channel } from './declaration/channel';
import type { ClockModel } from './declaration/clock';
import { clock } from './declaration/clock';
import type { StagesModel } from './declaration/stage';
import { stages } from './declaration/stage';
import type { SegmentsModel } from './declaration/mask';
import { maskSegments } from './declaration/mask';
import type { SourceModel } from './declaration/source';
import { source } from './declaration/source';
import { declaration } from './declaration/top-level';
import { decode } from './decode';
import type { Decoded } from './decode';
import { pathUses } from './files/path-uses';
import type { PathUse } from './files/path-uses';
import { errorAt } from './local-problem';
import type { LocalProblem } from './local-problem';
import type { Shape } from './shape';
import { ownText } from './slices/own-text';
import type { Slice } from './slices/slice';
import { problemOf } from './slips/fault';
import { sliceTree } from './slips/slice-tree';
import type { SliceTree } from './slips/slice-tree';
import type { MapNode, Pair } from './tree';
import { withoutEchoes } from './without-echoes';

/** Something with a name of its own: a clock, a filter or a channel. */
export interface Named<T> {
  readonly name: string;
  readonly pair: Pair;
  /** The text from the name to the end of its value. */
  readonly text: string;
  /** Its value; its problems are errors of its own text, those of the slice's syntax included. */
  readonly decoded: Decoded<T>;
}

/** What one slice holds. */
export interface SliceReading {
  /** The slice that was read; its text is a copy of its own. */
  readonly slice: Pick<Slice, 'kind' | 'text' | 'lead' | 'doubtful'>;
  readonly pairs: readonly Pair[];
  readonly title: string | null;
  readonly clocks: readonly Named<ClockModel>[];
  readonly filters: readonly Named<StagesModel>[];
  readonly sources: readonly Named<SourceModel>[];
  readonly masks: readonly Named<SegmentsModel>[];
  readonly channels: readonly Named<ChannelModel>[];
  readonly problems: readonly OwnedProblem[];
  /** The paths of other files that stand in it. */
  readonly paths: readonly PathUse[];
  /** Whether names that seem to be missing may stand in what was passed over. */
  readonly lossy: boolean;
}

/** A problem and the channel whose text it stands in. */
export interface OwnedProblem {
  readonly problem: LocalProblem;
  readonly channel: string | null;
}

/** What an earlier reading knows of a name, so that an unchanged one keeps its value's identity. */
export interface Known {
  clock(name: string): Named<ClockModel> | undefined;
  filter(name: string): Named<StagesModel> | undefined;
  source(name: string): Named<SourceModel> | undefined;
  mask(name: string): Named<SegmentsModel> | undefined;
  channel(name: string): Named<ChannelModel> | undefined;
}

/** Reads a slice; never throws. */
export function readSlice(slice: Slice, known: Known): SliceReading {
  return new SliceReader(ownText(slice.text), slice, known).read();
}

class SliceReader {
  private readonly parsed: SliceTree;
  private readonly faults: readonly LocalProblem[];
  private readonly sections: LocalProblem[] = [];
  private title: string | null = null;
  private readonly clocks: Named<ClockModel>[] = [];
  private readonly filters: Named<StagesModel>[] = [];
  private readonly sources: Named<SourceModel>[] = [];
  private readonly masks: Named<SegmentsModel>[] = [];
  private readonly channels: Named<ChannelModel>[] = [];

  constructor(
    private readonly text: string,
    private readonly slice: Slice,
    private readonly known: Known,
  ) {
    this.parsed = sliceTree(slice.lead, text);
    this.faults = this.parsed.faults.map(problemOf);
  }

  read(): SliceReading {
    const { tree, lossy } = this.parsed;
    const pairs = tree?.form === 'map' ? tree.pairs : [];
    for (const pair of pairs) this.section(pair);
    const { kind, lead, doubtful } = this.slice;
    return {
      slice: { kind, lead, doubtful, text: this.text },
      pairs,
      title: this.title,
      clocks: this.clocks,
      filters: this.filters,
      sources: this.sources,
      masks: this.masks,
      channels: this.channels,
      problems: this.owned(),
      paths: pathUses(this.text, pairs),
      lossy: lossy || doubtful,
    };
  }

  /** All problems, each with its channel: in a channel's slice that one, else the one whose value holds it. */
  private owned(): OwnedProblem[] {
    const channels = new Map<LocalProblem, string>();
    for (const { name, decoded } of this.channels) for (const problem of decoded.problems) channels.set(problem, name);
    const owner = this.slice.kind === 'channel' ? (this.channels[0]?.name ?? null) : null;
    const named = [...this.clocks, ...this.filters, ...this.sources, ...this.masks, ...this.channels].flatMap(
      ({ decoded }) => decoded.problems,
    );
    // A fault inside an entry stands in the list of both.
    const problems = [...new Set([...this.faults, ...this.sections, ...named])].filter((problem) => problem !== doubt);
    return problems.map((problem) => ({ problem, channel: channels.get(problem) ?? owner }));
  }

  /** One key of the file with its value. */
  private section(pair: Pair): void {
    const { key, value } = pair;
    if (value?.form === 'map') {
      if (key === 'clocks') this.entries(value, clock, (name) => this.known.clock(name), this.clocks);
      if (key === 'filters') this.entries(value, stages, (name) => this.known.filter(name), this.filters);
      if (key === 'sources') this.entries(value, source, (name) => this.known.source(name), this.sources);
      if (key === 'masks') this.entries(value, maskSegments, (name) => this.known.mask(name), this.masks);
      if (key === 'channels') this.entries(value, channel, (name) => this.known.channel(name), this.channels);
      if (sectionsOfNames.has(key)) return;
    }
    // The channels themselves may stand in slices of their own.
    if (key === 'channels' && value === null) return;
    const node: MapNode = { form: 'map', start: pair.keyStart, end: value?.end ?? pair.keyEnd, pairs: [pair] };
    const decoded = decode(aloneSection, node, { span: node, called: 'the spec' });
    this.title ??= decoded.value?.title ?? null;
    this.sections.push(...withoutEchoes(decoded.problems, this.parsed));
  }

  private entries<T>(map: MapNode, shape: Shape<T>, known: (name: string) => Named<T> | undefined, into: Named<T>[]): void {
    for (const pair of map.pairs) into.push(this.entry(pair, shape, known(pair.key)));
  }

  private entry<T>(pair: Pair, shape: Shape<T>, known: Named<T> | undefined): Named<T> {
    const end = pair.value?.end ?? pair.keyEnd;
    const text = this.text.slice(pair.keyStart, end);
    const syntax = this.syntaxIn(pair.keyStart, end);
    const unchanged = syntax.length === 0 && known?.text === text && known.decoded.problems.length === 0;
    if (unchanged) return { name: pair.key, pair, text, decoded: known.decoded };
    const home = { span: { start: pair.keyStart, end: pair.keyEnd }, called: `\`${pair.key}\`` };
    const { value, problems } = decode(shape, pair.value, home);
    return { name: pair.key, pair, text, decoded: { value, problems: [...syntax, ...withoutEchoes(problems, this.parsed)] } };
  }

  /** The syntax errors in a stretch; in a channel's slice all of them, wherever they stand. */
  private syntaxIn(start: number, end: number): LocalProblem[] {
    const own = this.slice.kind === 'channel';
    const faults = this.faults.filter(
      ({ severity, span }) => severity === 'error' && (own || (span.start < end && span.end > start)),
    );
    return own && this.slice.doubtful ? [doubt, ...faults] : faults;
  }
}

const sectionsOfNames: ReadonlySet<string> = new Set(['clocks', 'filters', 'sources', 'masks', 'channels']);

/** Stands for a fault that was found while the file was cut, and is reported there. */
const doubt = errorAt({ start: 0, end: 0 }, 'syntax', '');

/** The file's shape for one of its keys at a time: no other is missing then. */
const aloneSection = withoutRequired(declaration);

function withoutRequired<T>(shape: Shape<T>): Shape<T> {
  if (shape.map === undefined || !('fields' in shape.map)) return shape;
  const fields = Object.entries(shape.map.fields).map(([name, { required: _required, ...key }]) => [name, key] as const);
  return { ...shape, map: { ...shape.map, fields: Object.fromEntries(fields) } };
}
