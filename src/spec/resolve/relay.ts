/** Resolves what only relay channels have: a gate or a hold, and time slots. */
import type { Gate, Pulse, PulseWidth, Slots } from '../channel';
import type { ChannelModel } from '../declaration/channel';
import { formatTime } from '../../units/format';
import { resolveGate, resolvePulse, secondsOf, zeroOrder } from './pulse';
import type { Report } from './report';

/** The pulse of a channel, and the gate that takes its place in natural sampling. */
export interface Sampling {
  readonly pulse: Pulse;
  readonly gate: Gate | null;
}

/** How the channel samples and rebuilds, or null where it is faulty. */
export function resolveSampling(
  direction: 'capture' | 'generate' | 'relay',
  { aperture, hold, gate }: ChannelModel,
  rateHz: number | null,
  report: Report,
): Sampling | null {
  if (direction === 'relay' && gate !== undefined) {
    if (hold !== undefined) {
      const message = 'a channel samples either with a `gate` (natural) or with a `hold` (flat-top): take one of them out';
      return report.keyFault(['hold'], 'contradiction', message);
    }
    const found = gate === null ? null : resolveGate(gate, { key: 'gate', rateHz, report });
    return found === null ? null : { pulse: { shape: 'instant' }, gate: found };
  }
  const key = direction === 'capture' ? 'aperture' : 'hold';
  const stated = direction === 'capture' ? aperture : hold;
  if (stated === null) return null;
  const usual: Pulse = direction === 'capture' ? { shape: 'instant' } : zeroOrder;
  const pulse = stated === undefined ? usual : resolvePulse(stated, { key, rateHz, report });
  return pulse === null ? null : { pulse, gate: null };
}

/** The time slots, or null where they are faulty or do not fit. */
export function resolveSlots(
  stated: NonNullable<ChannelModel['slots']>,
  sampling: Sampling | null,
  rateHz: number | null,
  report: Report,
): Slots | null {
  const { count, guard, link } = stated;
  if (!count || guard === null || !link || sampling === null || rateHz === null) return null;
  const slotS = 1 / (rateHz * count);
  const pulseS = pulseSeconds(sampling, 1 / rateHz);
  const room = slotS - pulseS;
  const said = `a slot lasts ${formatTime(slotS)} (one period by ${count}), the pulse ${formatTime(pulseS)}`;
  if (room < -1e-12 * slotS)
    return report.fault(['slots', 'count'], 'contradiction', `${said}: the pulse does not fit into its slot`);
  const guardSeconds = guard?.value ?? Math.max(0, room);
  if (guardSeconds > room + 1e-12 * slotS) {
    const message = `${said}: a guard of ${formatTime(guardSeconds)} does not fit, at most ${formatTime(Math.max(0, room))} is left`;
    return report.fault(['slots', 'guard'], 'contradiction', message);
  }
  return { count, guardSeconds, linkHz: link.value };
}

/** How long the output of one slot lasts in each period; a track and hold lasts it all. */
function pulseSeconds({ pulse, gate }: Sampling, periodS: number): number {
  const used = gate === null ? pulse : gate.kind === 'pulse' ? gate.pulse : zeroOrder;
  const width: PulseWidth = used.shape === 'instant' ? { share: 0 } : used.shape === 'linear' ? { share: 2 } : used.width;
  return secondsOf(width, periodS) ?? 0;
}
