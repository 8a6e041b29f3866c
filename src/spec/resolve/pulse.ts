/** Resolves `aperture` and `hold` to a pulse. */
import type { Pulse } from '../channel';
import { pulseShares } from '../declaration/bounds';
import type { PulseModel } from '../declaration/pulse';
import type { Report } from './report';

const zeroOrder: Pulse = { shape: 'rectangle', width: { share: 1 } };

/** The pulse of a channel: of the sampler in capture, of the output in generate. */
export function resolvePulse(
  direction: 'capture' | 'generate',
  stated: PulseModel | undefined,
  rateHz: number | null,
  report: Report,
): Pulse | null {
  if (stated === undefined) return direction === 'capture' ? { shape: 'instant' } : zeroOrder;
  if (stated === 'instant') return { shape: 'instant' };
  if (stated === 'zero-order') return zeroOrder;
  if (stated.unit !== 's') return { shape: 'rectangle', width: { share: stated.value } };
  const widest = pulseShares['%']?.high ?? Infinity;
  if (direction === 'generate' && rateHz !== null && stated.value * rateHz > widest) {
    return report.fault(['hold'], 'out-of-range', `a hold lasts at most ${widest} periods of the rate`);
  }
  return { shape: 'rectangle', width: { seconds: stated.value } };
}
