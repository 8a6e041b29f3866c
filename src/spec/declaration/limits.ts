/** Declares `limits`: what a channel is judged by. */
import type { Kind } from '../../units/quantity';
import { either, endlessRange, fields, later, quantity, text, within, word } from '../shapes';
import type { Direction, TypeOf, UnitBounds } from '../shape';
import { distances, margins, timeOrZero } from './bounds';
import { mask } from './mask';

const long = {
  ref: { shape: text, about: "The requirement's own number." },
  margin: {
    shape: within(quantity('decibel'), margins),
    about: 'What the limit must be passed by without a warning.',
    fallback: '1 dB, or a tenth of the limit',
  },
} as const;

function limit(bounds: UnitBounds, ...kinds: readonly Kind[]) {
  const value = within(quantity(...kinds), bounds);
  return either(value, fields('a limit', { at: { shape: value, about: 'The limit itself.', required: true }, ...long }));
}

const aliasValue = quantity('full-scale-level', 'relative-level');
const alias = either(
  aliasValue,
  fields(
    'a limit',
    {
      at: { shape: aliasValue, about: 'The limit itself.' },
      ...long,
      sum: { shape: aliasValue, about: 'The limit of all landings of all sources together, as powers.' },
    },
    { decidedBy: ['at', 'sum'] },
  ),
);

const snrValue = quantity('decibel');
const snr = either(
  snrValue,
  fields('a limit', {
    at: { shape: snrValue, about: 'The limit itself.', required: true },
    ...long,
    with: {
      shape: word({ unwanted: 'The jitter of unwanted sources and their landings count as noise too.' }),
      about: 'What else counts as noise.',
    },
  }),
);

const timeLong = {
  ...long,
  margin: { ...long.margin, shape: within(quantity('time'), timeOrZero), fallback: 'a tenth of the limit' },
} as const;

const time = either(
  quantity('time'),
  fields('a limit', { at: { shape: quantity('time'), about: 'The limit itself.', required: true }, ...timeLong }),
);

const levelRange = endlessRange('level');
const level = either(
  levelRange,
  fields('a limit', { at: { shape: levelRange, about: 'The range itself.', required: true }, ...long }),
);

const masked = either(mask, fields('a limit', { at: { shape: mask, about: 'The mask itself.', required: true }, ...long }));

const capture: readonly Direction[] = ['capture', 'relay'];
const output: readonly Direction[] = ['generate', 'relay'];
const converted: readonly Direction[] = ['capture', 'generate'];

/** All limits of a channel. */
export const limits = fields('the limits', {
  alias: {
    shape: alias,
    about: 'At most: the strongest landing in the protected ranges, in dBFS, or in dBc against the wanted tone.',
    only: capture,
  },
  image: {
    shape: limit({}, 'relative-level', 'full-scale-level'),
    about: 'At most: the strongest copy of the wanted band, in dBc against the same tone where it is wanted, or in dBFS.',
    only: output,
  },
  flatness: {
    shape: limit(distances, 'decibel'),
    about: 'At most: the largest departure of the gain in the wanted band from its value at `reference`, either way.',
  },
  snr: { shape: snr, about: 'At least: the signal-to-noise ratio of the test tone in the wanted band.' },
  headroom: {
    shape: limit({}, 'decibel'),
    about: 'At least: full scale over the sum of all peaks at the sampler, or of the words to be converted.',
  },
  delay: { shape: time, about: 'At most: the group delay at `reference`.' },
  'delay-spread': { shape: time, about: 'At most: the largest minus the smallest group delay in the wanted band.' },
  level: { shape: level, about: 'The range that the wanted output must stay in over its whole band: `-3 .. -1 dBFS`.' },
  response: {
    shape: masked,
    about: 'A mask for the analogue path, relative to its gain at `reference`: a list of segments, or the name of a mask.',
  },
  through: { shape: masked, about: 'A mask for the end-to-end gain, relative to its value at `reference`.' },
  output: { shape: masked, about: 'A mask in dBFS for everything that leaves outside the wanted band.', only: output },
  sinad: later('At least: signal over noise and distortion.', converted),
  enob: later('At least: the effective number of bits.', converted),
  noise: later('At most: all noise in the wanted band.'),
  spur: later('At most: distortion and interleave products in the protected ranges.', converted),
  settling: later('At most: what is left when the acquisition ends.', ['capture']),
  crosstalk: {
    shape: limit({}, 'decibel'),
    about: 'At most: what one time slot leaves in the next, such as `-60 dB`.',
    only: ['relay'],
  },
});

/** Limits as they were written. */
export type LimitsModel = TypeOf<typeof limits>;
