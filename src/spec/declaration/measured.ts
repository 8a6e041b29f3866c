/** Declares measured stages: the path of a table, and what holds outside it. */
import { either, path, quantity, within, word } from '../shapes';
import { unitBounds } from './bounds';

const resistance = within(quantity('resistance'), { Ω: { ...unitBounds['Ω'], zero: true } });

/** The keys of a measured stage. */
export const measuredKeys = {
  measured: {
    shape: path,
    about:
      'The path of a CSV table with frequency, gain and, if known, phase, or of a Touchstone file `.s2p`, of which S21 is taken.',
  },
  below: {
    shape: word({
      hold: 'The first value of the table holds down to 0 Hz.',
      refuse: 'Nothing may be asked below the table.',
    }),
    about: 'What holds below the table.',
    fallback: 'hold',
    with: ['measured'],
  },
  beyond: {
    shape: either(
      word({ refuse: 'Nothing may be asked beyond the table.', hold: 'The last value of the table holds.' }),
      quantity('slope'),
    ),
    about: 'What holds beyond the table: `refuse`, `hold`, or a slope such as `-40 dB/decade`.',
    fallback: 'refuse',
    with: ['measured'],
  },
  source: {
    shape: resistance,
    about: 'With a Touchstone file: the resistance that drives it. The gain is then load voltage over source voltage.',
    with: ['measured'],
    requiredWith: ['load'],
  },
  load: {
    shape: quantity('resistance'),
    about: 'With a Touchstone file: the resistance that loads it.',
    with: ['measured'],
    requiredWith: ['source'],
  },
} as const;
