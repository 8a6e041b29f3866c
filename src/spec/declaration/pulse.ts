/** Declares `aperture`, `hold` and `gate`: the pulse of the sampler, of the output, and of what samples and rebuilds at once. */
import { either, fields, quantity, within, word } from '../shapes';
import type { Shape, TypeOf } from '../shape';
import { pulseShares } from './bounds';

const firstOrder: Shape<never> = {
  scalar: {
    refusedWords: {
      'first-order':
        '`first-order` names two holds: one that extrapolates the last two samples, and one that draws straight lines from sample to sample, which is `linear`.',
    },
  },
};

const width = within(quantity('time', 'share'), pulseShares);

const shapeKeys = {
  shape: {
    shape: word({
      rectangle: 'Flat over its width.',
      triangle: 'Rises for half its width and falls for the other half.',
      'half-sine': 'Half a period of a sine.',
      'raised-cosine': 'Rises and falls as half a cosine each; flat between its edges.',
      trapezoid: 'Flat with straight edges.',
      exponential: 'Decays from its start, cut off at its width.',
      split: 'Positive for its first half, negative for its second.',
    }),
    about: 'The form of the pulse.',
  },
  width: {
    shape: width,
    about: 'How long the pulse lasts, as a time or a share of the period.',
    required: true,
    with: ['shape'],
  },
  edge: {
    shape: width,
    about: 'The length of each edge, within the width; half the width for a raised cosine unless given.',
    with: ['trapezoid', 'raised-cosine'],
    requiredWith: ['trapezoid'],
  },
  decay: {
    shape: width,
    about: 'The time constant of the decay.',
    required: true,
    with: ['exponential'],
  },
} as const;

const shaped = fields('a pulse', { ...shapeKeys, shape: { ...shapeKeys.shape, required: true } });

const held = {
  'zero-order': 'Held for the whole period.',
  linear: 'Straight lines from sample to sample.',
};

/** The pulse over which a converter averages its input; it acts at the input frequency. */
export const aperture = either(
  word({ instant: 'No width at all: the input at one instant.', ...held, 'zero-order': 'The average over the whole period.' }),
  width,
  shaped,
  firstOrder,
);

/** The pulse that each sample leaves as; it acts at the output frequency. */
export const hold = either(word(held), width, shaped, firstOrder);

/** The pulse during which a relay channel passes its input on, or how long it tracks before it holds. */
export const gate = either(
  width,
  fields(
    'a gate',
    {
      ...shapeKeys,
      track: {
        shape: width,
        about: 'How long the output follows the input in each period; it holds its last value for the rest.',
      },
    },
    { decidedBy: ['shape', 'track'] },
  ),
);

/** A pulse as it was written. */
export type PulseModel = TypeOf<typeof aperture> | TypeOf<typeof hold>;

/** A gate as it was written. */
export type GateModel = TypeOf<typeof gate>;

/** A pulse that is given by its shape. */
export type ShapedModel = TypeOf<typeof shaped>;
