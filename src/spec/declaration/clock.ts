/** Declares `clocks`: what rates are derived from. */
import { entries, fields, quantity, tolerated, within } from '../shapes';
import type { TypeOf } from '../shape';
import { timeOrZero } from './bounds';

/** One clock. */
export const clock = fields('a clock', {
  frequency: {
    shape: tolerated('sample-rate'),
    about: 'The frequency of the clock, with its tolerance: `24.576 MHz ± 25 ppm`.',
    required: true,
  },
  jitter: {
    shape: within(quantity('time'), timeOrZero),
    about: 'Its rms jitter, taken as white; it adds as squares to the jitter of the sampler.',
    fallback: '0 s',
  },
});

/** All clocks of a file by name. */
export const clocks = entries('a clock', clock);

/** A clock as it was written. */
export type ClockModel = TypeOf<typeof clock>;
