/** Declares a channel: one sampled path with what it carries, what it meets and what it is judged by. */
import { either, endlessRange, fields, later, listOf, nameOf, quantity, range, text, whole, within, word } from '../shapes';
import type { Direction, TypeOf } from '../shape';
import { frequencyOrZero, fullScales, slotCounts, timeOrZero, wordLengths } from './bounds';
import { limits } from './limits';
import { aperture, gate, hold } from './pulse';
import { rate, rateChoices } from './rate';
import { unwanted } from './source';
import { filter } from './stage';
import { wanted } from './wanted';

const capture: readonly Direction[] = ['capture'];
const generate: readonly Direction[] = ['generate'];
const relay: readonly Direction[] = ['relay'];
const arriving: readonly Direction[] = ['capture', 'relay'];
const leaving: readonly Direction[] = ['generate', 'relay'];
const converting: readonly Direction[] = ['capture', 'generate'];

const protectedRange = within(endlessRange('frequency'), frequencyOrZero);

const testTone = fields('a test tone', {
  frequency: {
    shape: within(quantity('frequency'), frequencyOrZero),
    about: 'Its frequency, inside a wanted band.',
    fallback: 'the highest wanted frequency',
  },
  level: { shape: quantity('level'), about: 'Its level.', fallback: 'the wanted level' },
});

const slots = fields('the time slots', {
  count: { shape: whole(...slotCounts), about: 'How many slots share one period.', required: true },
  guard: {
    shape: within(quantity('time'), timeOrZero),
    about: 'From the end of one pulse to the start of the next.',
    fallback: 'the rest of the slot',
  },
  link: { shape: quantity('frequency'), about: 'The corner of the first-order link that the slots share.', required: true },
});

const signalKeys = {
  direction: {
    shape: word({
      capture: 'Analogue to digital.',
      generate: 'Digital to analogue.',
      relay: 'Sampled and rebuilt, never digitised.',
    }),
    about: 'Which way the signal goes.',
    required: true,
  },
  like: { shape: nameOf('channels'), about: "Another channel's name: every key that is not given here is taken from it." },
  wanted: { shape: wanted, about: 'The band that must come through, or a list of bands.', required: true },
  guard: {
    shape: within(quantity('frequency'), frequencyOrZero),
    about: 'A frequency kept free on both sides of every wanted band when rates are judged.',
    fallback: '0 Hz',
  },
  'levels-at': {
    shape: word({
      input: 'Stated levels hold at the input of the path.',
      sampler: "Stated levels hold at the sampler: what they are behind the path's gain at `reference`.",
    }),
    about: 'Where stated levels hold.',
    fallback: 'input',
    only: arriving,
  },
  reference: {
    shape: within(quantity('frequency'), frequencyOrZero),
    about: 'The frequency in the wanted band that flatness and dBc are measured from.',
    fallback: '0 Hz if the band starts there, else its geometric middle',
  },
  unwanted: {
    shape: unwanted,
    about: 'What arrives and must not land in the protected ranges: one source or a list.',
    only: arriving,
  },
  protect: {
    shape: either(protectedRange, listOf(protectedRange, 1)),
    about: 'The ranges, as frequencies after sampling, in which a landing counts.',
    fallback: 'the wanted band, as it appears there',
  },
} as const;

const samplingKeys = {
  'full-scale': {
    shape: within(either(quantity('voltage'), range('voltage')), fullScales),
    about:
      'The peak-to-peak span of the converter: `4 V`, `± 10 V` or `0 V .. 5 V`. Volts can be used for levels only where it stands.',
  },
  impedance: { shape: quantity('resistance'), about: 'The resistance that dBm is reckoned in.' },
  rate: { shape: rate, about: 'The sampling rate: a frequency, or { `clock`, `multiply`, `divide` }.', required: true },
  'rate-choices': {
    shape: rateChoices,
    about: 'What a quick fix may pick a rate from: a list, a range, { `range`, `step` } or { `clock`, `multiply`, `divide` }.',
    fallback: 'any rate',
  },
  aperture: {
    shape: aperture,
    about: 'The pulse over which the converter averages its input.',
    fallback: 'instant',
    only: capture,
  },
  hold: {
    shape: hold,
    about: 'The pulse that each sample leaves as.',
    fallback: 'zero-order; in relay only where there is no `gate`',
    only: leaving,
  },
  gate: {
    shape: gate,
    about: 'Natural sampling: the pulse during which the input passes, which scales each copy as a whole; or { `track` }.',
    only: relay,
  },
  'input-filter': { shape: filter, about: 'The analogue path before the sampler.', only: relay },
  'output-filter': { shape: filter, about: 'The analogue path behind the sampler.', only: relay },
  slots: { shape: slots, about: 'Time slots that share a link: { `count`, `guard`, `link` }.', only: relay },
  filter: { shape: filter, about: 'The analogue path: a name from `filters`, a stage, or a list of stages.', only: converting },
  'test-tone': {
    shape: testTone,
    about: 'The tone whose signal-to-noise ratio is judged.',
    fallback: 'the highest wanted frequency at the wanted level',
  },
  jitter: {
    shape: within(quantity('time'), timeOrZero),
    about: "The sampler's own rms jitter; it adds as squares to that of the clock.",
    fallback: '0 s',
  },
  bits: {
    shape: whole(...wordLengths),
    about: 'The word length of the converter; without it there is no quantisation noise.',
    only: converting,
  },
  limits: { shape: limits, about: 'What the channel is judged by.' },
  ref: { shape: text, about: "A requirement's own number, carried into findings and reports." },
} as const;

const laterKeys = {
  converter: later("The converter's own noise, distortion and interleaving.", converting),
  acquire: later('The network that the sampling capacitor is charged through.', capture),
  differential: later('Two sampling capacitors, so twice kT/C.', capture),
  decimate: later('Digital filters behind the converter that lower the rate.', capture),
  interpolate: later('Digital filters before the converter that raise the rate.', generate),
  correct: later("A digital filter against the hold's droop.", generate),
  temperature: later('The temperature or range of temperatures.'),
  'worst-case': later('How tolerances are combined.'),
} as const;

/** One channel. */
export const channel = fields('a channel', { ...signalKeys, ...samplingKeys, ...laterKeys }, { completedBy: 'like' });

/** A channel as it was written. */
export type ChannelModel = TypeOf<typeof channel>;
