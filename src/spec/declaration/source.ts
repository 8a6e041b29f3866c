/** Declares `unwanted`: what arrives at the input and must not land where it counts. */
import { either, endlessRange, fields, later, listOf, quantity, text, tolerated, within, word } from '../shapes';
import type { TypeOf } from '../shape';
import { frequencyOrZero } from './bounds';

const anything = word({ anything: 'A full-scale tone that may stand anywhere outside the wanted band.' });

/** One source, in full. */
export const source = fields(
  'an unwanted source',
  {
    name: { shape: text, about: 'What messages and plots call the source.', fallback: 'made up from its frequency' },
    tone: {
      shape: within(tolerated('frequency'), frequencyOrZero),
      about: 'The frequency of a tone; with a tolerance it may stand anywhere there: `310 kHz ± 10 %`.',
    },
    band: {
      shape: within(endlessRange('frequency'), frequencyOrZero),
      about: 'A band in which one tone of the given level may stand anywhere: `40 kHz .. 3 MHz`, or `40 kHz ..`.',
    },
    anything: { shape: quantity('level'), about: 'The level of a tone that may stand anywhere outside the wanted band.' },
    level: {
      shape: quantity('level'),
      about: 'The level at the input of the path; for a band, of one tone that may stand anywhere in it.',
      required: true,
      with: ['tone', 'band'],
    },
    ref: { shape: text, about: "A requirement's own number, carried into findings and reports." },
    noise: later('The one-sided density of a noise, such as `40 nV/√Hz`.'),
    spectrum: later('The path of a table of frequency and level.'),
    lines: later('With `spectrum`: each row of the table is a tone.'),
    power: later('The total power of a band, spread evenly over it; it counts as noise.'),
    harmonics: later('The highest harmonic of the tone that counts.'),
    enters: later('Where the source enters: `input`, in front of a named stage, or at the `sampler`.'),
  },
  { decidedBy: ['tone', 'band', 'anything', 'noise', 'spectrum'] },
);

const oneSource = either(anything, source);

/** One source, or a list of them. */
export const unwanted = either(oneSource, listOf(oneSource));

/** A source as it was written. */
export type SourceModel = TypeOf<typeof source>;
