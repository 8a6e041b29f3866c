/** Declares `unwanted`: what arrives at the input and must not land where it counts. */
import {
  either,
  endlessRange,
  entries,
  fields,
  later,
  listOf,
  nameOf,
  path,
  quantity,
  text,
  tolerated,
  whole,
  within,
  word,
} from '../shapes';
import type { TypeOf } from '../shape';
import { frequencyOrZero, harmonicNumbers } from './bounds';

const anything = word({ anything: 'A full-scale tone that may stand anywhere outside the wanted band.' });

const harmonics = either(
  whole(...harmonicNumbers),
  fields('the harmonics', {
    to: { shape: whole(...harmonicNumbers), about: 'The highest harmonic that counts.', required: true },
    slope: { shape: quantity('slope'), about: 'How they fall with frequency.', fallback: '-20 dB/decade' },
    odd: {
      shape: word({ true: 'Only odd harmonics stand.', false: 'All harmonics stand.' }),
      about: 'Whether only odd harmonics stand.',
      fallback: 'false',
    },
  }),
);

const enters = either(
  word({ input: 'At the input of the path.', sampler: 'Behind the filter, as supply and reference ripple do.' }),
  text,
);

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
    spectrum: {
      shape: path,
      about: 'The path of a CSV table of frequency and level: an envelope under which a tone may stand anywhere.',
    },
    lines: {
      shape: word({ true: 'Each row is a tone.', false: 'The table is an envelope.' }),
      about: 'Whether each row of the table is a tone.',
      fallback: 'false',
      with: ['spectrum'],
    },
    harmonics: {
      shape: harmonics,
      about: 'The highest harmonic of the tone or band that counts, or { `to`, `slope`, `odd` }; they fall by 20 dB a decade.',
      with: ['tone', 'band'],
    },
    enters: {
      shape: enters,
      about: 'Where the source enters: at the `input`, in front of the stage of this name, or at the `sampler`.',
      fallback: 'input',
    },
    ref: { shape: text, about: "A requirement's own number, carried into findings and reports." },
    noise: later('The one-sided density of a noise, such as `40 nV/√Hz`.'),
    power: later('The total power of a band, spread evenly over it; it counts as noise.'),
  },
  { decidedBy: ['tone', 'band', 'anything', 'noise', 'spectrum'] },
);

const oneSource = either(anything, nameOf('sources'), source);

/** One source, or a list of them. */
export const unwanted = either(oneSource, listOf(oneSource));

/** All sources of a file by name. */
export const sources = entries('a source', source);

/** A source as it was written. */
export type SourceModel = TypeOf<typeof source>;
