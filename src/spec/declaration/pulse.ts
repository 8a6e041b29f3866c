/** Declares `aperture` and `hold`: the pulse of the sampler and of the output. */
import { either, quantity, within, word } from '../shapes';
import type { Shape, TypeOf } from '../shape';
import { pulseShares } from './bounds';

const laterShapes = {
  linear: 'Straight lines from sample to sample.',
};

const firstOrder: Shape<never> = {
  scalar: {
    refusedWords: {
      'first-order':
        '`first-order` names two holds: one that extrapolates the last two samples, and one that draws straight lines from sample to sample, which is `linear`.',
    },
  },
};

const width = within(quantity('time', 'share'), pulseShares);

/** The pulse over which a converter averages its input; it acts at the input frequency. */
export const aperture = either(
  word(
    {
      instant: 'No width at all: the input at one instant.',
      'zero-order': 'The average over the whole period.',
    },
    laterShapes,
  ),
  width,
  firstOrder,
);

/** The pulse that each sample leaves as; it acts at the output frequency. */
export const hold = either(word({ 'zero-order': 'Held for the whole period.' }, laterShapes), width, firstOrder);

/** A pulse as it was written. */
export type PulseModel = TypeOf<typeof aperture> | TypeOf<typeof hold>;
