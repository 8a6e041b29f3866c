/** Resolves the analogue path of a channel, before and behind its sampler. */
import type { Stage } from '../channel';
import type { ChannelModel } from '../declaration/channel';
import type { Direction } from '../shape';
import type { Lookup } from './resolution';
import type { Report } from './report';
import { resolveStages } from './stages';
import type { FilterKey } from './stages';

/** The stages before the sampler and behind it; null where a part of them is faulty. */
export interface Paths {
  readonly inputStages: readonly Stage[] | null;
  readonly outputStages: readonly Stage[] | null;
}

/** The path, from the keys that the direction has for it. */
export function resolvePaths(direction: Direction, model: ChannelModel, lookup: Lookup, report: Report): Paths {
  const stages = (key: FilterKey) => {
    const stated = model[key];
    if (stated === undefined) return [];
    return stated === null ? null : resolveStages(stated, key, lookup, report);
  };
  if (direction === 'capture') return { inputStages: stages('filter'), outputStages: [] };
  if (direction === 'generate') return { inputStages: [], outputStages: stages('filter') };
  return { inputStages: stages('input-filter'), outputStages: stages('output-filter') };
}
