/** What frequencies are measured in while the rate may deviate. */
import type { Enclosure } from '../signal/response';
import type { Channel } from '../spec/channel';
import { followsRate } from './pulse';
import { rateRange, varies } from './tolerances';

/**
 * `hertz`: as they are; a pulse that follows the rate is then stretched. `periods`: as multiples of the rate, written in Hz at the nominal
 * rate; the stages are then stretched. It is only for pulses that follow the rate.
 */
export type Axis = 'hertz' | 'periods';

/** The factors by which the rate's tolerance moves a response that the axis does not follow. */
export function axisFactors(channel: Channel): Record<Axis, Enclosure> {
  const { low, high } = rateRange(channel.rate);
  const nominal = channel.rate.hz;
  return { hertz: { low: low / nominal, high: high / nominal }, periods: { low: nominal / high, high: nominal / low } };
}

/** The axis on which what may stand anywhere in a band is searched: that of the pulse, where the pulse follows a rate that varies. */
export function bandAxis(channel: Channel): Axis {
  return varies(channel.rate.tolerance) && followsRate(channel.pulse) ? 'periods' : 'hertz';
}

/** A range of frequencies on an axis, at every rate that is allowed. */
export function onAxis(channel: Channel, axis: Axis, range: Enclosure): Enclosure {
  if (axis === 'hertz') return range;
  const { low, high } = axisFactors(channel).periods;
  return { low: range.low * low, high: range.high * high };
}
