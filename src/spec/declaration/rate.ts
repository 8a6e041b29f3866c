/** Declares `rate` and `rate-choices`: how fast the sampler runs, and what else the clock tree could give. */
import { either, endlessRange, fields, listOf, nameOf, quantity, range, tolerated, whole, wholeRange } from '../shapes';
import type { TypeOf } from '../shape';
import { dividers } from './bounds';

const ofClock = {
  clock: { shape: nameOf('clocks'), about: 'The name of the clock that the rate is derived from.' },
  multiply: { shape: whole(...dividers), about: 'What the clock is multiplied by.', fallback: '1', with: ['clock'] },
} as const;

/** A frequency, or a share of a clock. */
export const rate = either(
  tolerated('sample-rate'),
  fields('a rate', {
    ...ofClock,
    clock: { ...ofClock.clock, required: true },
    divide: { shape: whole(...dividers), about: 'What the clock is divided by.', fallback: '1' },
  }),
);

const choiceMap = fields(
  'a choice of rates',
  {
    range: { shape: range('sample-rate'), about: 'The range that a rate may be picked from.' },
    step: {
      shape: quantity('sample-rate'),
      about: 'The distance between two rates, counted from the lower end.',
      required: true,
      with: ['range'],
    },
    ...ofClock,
    divide: {
      shape: either(whole(...dividers), wholeRange(...dividers), listOf(whole(...dividers), 1)),
      about: 'What the clock can be divided by: a list, or `120 .. 480`.',
      required: true,
      with: ['clock'],
    },
  },
  { decidedBy: ['range', 'clock'] },
);

/** A list of rates, a range, a range with a step, or the dividers of a clock. */
export const rateChoices = either(endlessRange('sample-rate'), listOf(quantity('sample-rate'), 1), choiceMap);

/** A rate as it was written. */
export type RateModel = TypeOf<typeof rate>;

/** Choices of rates as they were written. */
export type RateChoicesModel = TypeOf<typeof rateChoices>;
