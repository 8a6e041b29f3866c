/** Checks that something of the wanted band passes the pulse where gains are measured from. */
import type { Channel, Pulse } from '../channel';
import type { ChannelModel } from '../declaration/channel';
import type { Report } from './report';

/** Faults a `split` pulse whose reference stands at 0 Hz, where it passes nothing: no gain could be measured from there. */
export function checkReference(
  referenceHz: number,
  pulse: Pulse,
  direction: Channel['direction'],
  model: ChannelModel,
  report: Report,
): void {
  if (pulse.shape !== 'split' || referenceHz > 0) return;
  const path = model.reference ? ['reference'] : [direction === 'capture' ? 'aperture' : 'hold'];
  report.fault(
    path,
    'contradiction',
    'a `split` pulse passes nothing at 0 Hz, and gains are measured from there: give a `reference` above 0 Hz in the wanted band',
  );
}
