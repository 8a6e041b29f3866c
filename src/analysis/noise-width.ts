/** The noise bandwidth of stages in series, or why there is none. */
import type { Filter } from '../signal/filter';
import { noiseBandwidth } from '../signal/noise-bandwidth';
import { product } from '../signal/response-algebra';
import { largestOverBands } from '../signal/search';
import type { StagePath } from './channel-path';

/** In Hz against the largest gain; `endless` where the gain does not fall to nothing, `unknown` where a measured table is among them. */
export type NoiseWidth =
  { readonly kind: 'finite'; readonly hz: number } | { readonly kind: 'endless' } | { readonly kind: 'unknown' };

/** The noise bandwidth of stages in series. */
export function noiseWidth(stages: readonly StagePath[]): NoiseWidth {
  const filters = stages.map(({ filter }): Filter | null => filter);
  const known = filters.flatMap((filter) => filter ?? []);
  if (known.length < filters.length) return { kind: 'unknown' };
  const found = noiseBandwidth(known);
  if (found.kind === 'endless') return found;
  const most = largestOverBands(product(stages.map(({ response }) => response)), [{ low: 0, high: Infinity }]);
  return most === null ? { kind: 'unknown' } : { kind: 'finite', hz: found.value / Math.exp(2 * most.logGain) };
}
