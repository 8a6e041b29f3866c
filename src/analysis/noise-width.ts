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
  const response = product(stages.map((stage) => stage.response));
  const most = largestOverBands(response, [{ low: 0, high: Infinity }]);
  if (most === null) return { kind: 'unknown' };
  return { kind: 'finite', hz: found.value / Math.exp(2 * response.logGain(most.frequencyHz)) };
}
