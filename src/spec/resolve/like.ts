/** Follows `like`: fills in what a channel does not give itself, and refuses circles. */
import type { ChannelModel } from '../declaration/channel';
import type { Lookup, Resolution } from './resolution';
import type { Report } from './report';

/** A channel's keys with those that `like` brings. */
export interface Merged {
  readonly model: ChannelModel;
  /** The keys that came from another channel. */
  readonly inherited: ReadonlySet<string>;
  /** The channel they came from, or null. */
  readonly from: string | null;
  /** Whether all that `like` leads to is known, so that what is missing is really missing. */
  readonly complete: boolean;
}

/** Longer chains than this are a slip, and would only be slow. */
const longestChain = 100;

/** Merges a channel with what its `like` names. */
export function mergeLike(name: string, own: ChannelModel, lookup: Lookup, report: Report): Merged {
  const alone = (complete: boolean): Merged => ({ model: own, inherited: new Set(), from: null, complete });
  if (!own.like) return alone(own.like === undefined);
  const from = own.like.refersTo;
  report.use('channels', from);
  if (lookup.channel(from) === undefined) {
    report.unknownName(['like'], { space: 'channels', name: from }, lookup);
    return alone(false);
  }
  const base = chainEnds(name, from, lookup, report) ? lookup.resolution(from) : undefined;
  if (base === undefined) {
    report.leansOnFault();
    return alone(false);
  }
  for (const { space, name: used } of base.uses) report.use(space, used);
  if (base.channel === null) report.leansOnFault();
  return mergedWith(base, own, from);
}

function mergedWith(base: Resolution, own: ChannelModel, from: string): Merged {
  const inherited = new Set(Object.keys(base.merged).filter((key) => !Object.hasOwn(own, key)));
  return { model: { ...base.merged, ...own }, inherited, from, complete: true };
}

/** Walks the chain of names; a circle is reported by every channel that lies on it. */
function chainEnds(name: string, from: string, lookup: Lookup, report: Report): boolean {
  const chain = [name];
  let next: string | undefined = from;
  while (next !== undefined && chain.length <= longestChain) {
    report.use('channels', next);
    if (next === name) {
      const circle = [...chain, name].map((step) => `\`${step}\``).join(' → ');
      report.fault(['like'], 'contradiction', `\`like\` goes round in a circle: ${circle}`);
      return false;
    }
    if (chain.includes(next)) return false;
    chain.push(next);
    next = lookup.channel(next)?.value?.like?.refersTo;
  }
  if (next !== undefined) report.fault(['like'], 'out-of-range', `\`like\` leads through more than ${longestChain} channels`);
  return next === undefined;
}
