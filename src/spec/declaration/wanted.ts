/** Declares `wanted`: the band or bands that a channel exists to carry. */
import { either, fields, listOf, quantity, range, text, within } from '../shapes';
import type { TypeOf } from '../shape';
import { frequencyOrZero } from './bounds';

const wantedBand = fields('a wanted band', {
  name: { shape: text, about: 'What messages and plots call the band.' },
  band: {
    shape: within(range('frequency'), frequencyOrZero),
    about: 'From the lowest to the highest frequency that must come through: `5 Hz .. 10 kHz`, or `70 MHz ± 5 MHz`.',
    required: true,
  },
  level: { shape: quantity('level'), about: 'The level of a tone anywhere in the band.', fallback: '0 dBFS' },
});

/** One wanted band, or a list of them. */
export const wanted = either(wantedBand, listOf(wantedBand, 1));

/** A wanted band as it was written. */
export type WantedModel = TypeOf<typeof wantedBand>;
