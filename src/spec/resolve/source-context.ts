/** What sources are resolved against. */
import type { Stage } from '../channel';
import type { Scale } from './levels';
import type { Lookup } from './resolution';
import type { Report } from './report';

/** What sources are resolved against. */
export interface SourceContext {
  readonly scale: Scale;
  /** The stages before the sampler; null where they are faulty. */
  readonly inputStages: readonly Stage[] | null;
  /** The stages behind it, which no source can enter. */
  readonly outputStages: readonly Stage[] | null;
  readonly lookup: Lookup;
  readonly report: Report;
}
