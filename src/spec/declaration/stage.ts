/** Declares the stages of an analogue path, and `filters`, where stages get a name. */
import { either, entries, fields, later, listOf, nameOf, quantity, text, tolerated, whole, within, word } from '../shapes';
import type { Quantity } from '../../units/quantity';
import type { Clash, TypeOf } from '../shape';
import { cornerShares, orders, ripples } from './bounds';

/** Half the power, in dB. */
const halfPowerDb = 10 * Math.log10(2);

const family = word(
  {
    butterworth: 'As flat as an order can be; half power at the corner.',
    chebyshev: 'Equal ripple in the pass band, steeper beyond it.',
  },
  {
    'inverse-chebyshev': 'Flat in the pass band, equal ripple in the stop band.',
    elliptic: 'Equal ripple in both bands, the steepest there is.',
    bessel: 'The flattest delay.',
    legendre: 'The steepest that still falls all the way.',
    gaussian: 'The step response without overshoot.',
  },
);

const rc = fields('an rc section', {
  r: { shape: tolerated('resistance'), about: 'The series resistor, with its tolerance: `4k7 ± 1 %`.', required: true },
  c: { shape: tolerated('capacitance'), about: 'The shunt capacitor, with its tolerance: `2n2 ± 5 %`.', required: true },
});

const tolerance = fields('a tolerance', {
  corner: {
    shape: within(quantity('share'), cornerShares),
    about: 'How far the corner may be off, either way; the whole stage moves as one.',
  },
  q: later('How far the Q of each section may be off.'),
  gain: later('How far the gain may be off.'),
});

const familyKeys = {
  family: { shape: family, about: 'The family of the filter.' },
  order: { shape: whole(...orders), about: 'The order: the number of poles.', required: true, with: ['family'] },
  corner: {
    shape: quantity('frequency'),
    about: 'The half-power frequency, 3.01 dB below the maximum of the pass band, unless `corner-at` says otherwise.',
    required: true,
    with: ['family'],
  },
  ripple: {
    shape: within(quantity('decibel'), ripples),
    about: 'The ripple of the pass band, from peak to valley.',
    required: true,
    with: ['chebyshev'],
  },
  'corner-at': {
    shape: word(
      {
        'half-power': 'The corner is the half-power frequency.',
        ripple: 'The corner is where the gain leaves the ripple for good.',
      },
      { stopband: 'The corner is the edge of the stop band.', delay: 'The corner is 1/(2π·delay).' },
    ),
    about: 'Which frequency `corner` states.',
    fallback: 'half-power',
    with: ['family'],
  },
} as const;

const laterKeys = {
  'second-order': later('One section by its natural frequency and Q.'),
  cr: later('Series capacitor, shunt resistor.'),
  rlc: later('Series resistor and coil, shunt capacitor.'),
  'sallen-key': later('A Sallen-Key section by its parts.'),
  'multiple-feedback': later('A multiple-feedback section by its parts.'),
  ladder: later('A passive ladder, loaded as it stands.'),
  poles: later('Poles as frequencies.'),
  zeros: later('Zeros as frequencies.'),
  measured: later('The path of a measured table.'),
  kind: later('`lowpass`, `highpass`, `bandpass` or `bandstop`.'),
  corners: later('Both corners of a band-pass or band-stop.'),
  attenuation: later('The least loss in the stop band.'),
  gain: later('The gain of the stage.'),
  'gain-at': later('The frequency at which `gain` holds.'),
  source: later('The resistance that drives the stage.'),
  load: later('The resistance that loads the stage.'),
  below: later('What holds below a measured table.'),
  beyond: later('What holds beyond a measured table.'),
  amplifier: later('The amplifier of an active section.'),
  noise: later("The noise density at the stage's own input."),
  flicker: later('The 1/f corner of that noise.'),
  build: later('The parts that the stage is made of.'),
} as const;

/** The part of a stage that its check needs. */
interface FamilyStage {
  readonly family?: string | null;
  readonly 'corner-at'?: string | null;
  readonly ripple?: Quantity | null;
}

function familyClash(stage: FamilyStage): Clash | null {
  if (stage['corner-at'] === 'ripple' && stage.family === 'butterworth') {
    return { key: 'corner-at', message: '`butterworth` has no ripple, so its corner is at `half-power`' };
  }
  const { ripple } = stage;
  if (stage['corner-at'] === 'ripple' || stage['corner-at'] === null || !ripple || ripple.value <= halfPowerDb) return null;
  const message = 'with more than 3.01 dB of ripple the half-power point lies inside the pass band: state `corner-at: ripple`';
  return { key: 'ripple', message };
}

/** One stage. */
export const stage = fields(
  'a stage',
  {
    name: { shape: text, about: 'What messages and plots call the stage.' },
    ...familyKeys,
    rc: { shape: rc, about: 'Series resistor and shunt capacitor, driven from 0 Ω and unloaded.' },
    bandwidth: { shape: quantity('frequency'), about: 'One real pole: an amplifier, a sensor, a track-and-hold.' },
    tolerance: { shape: tolerance, about: 'How far the stage may be off; parts carry their own.', with: ['family', 'bandwidth'] },
    ...laterKeys,
  },
  {
    decidedBy: [
      'family',
      'rc',
      'bandwidth',
      'second-order',
      'cr',
      'rlc',
      'sallen-key',
      'multiple-feedback',
      'ladder',
      'poles',
      'measured',
    ],
    check: familyClash,
  },
);

/** A stage, or a list of stages in series. */
export const stages = either(stage, listOf(stage));

/** What a channel's `filter` takes: the same, or a name. */
export const filter = either(nameOf('filters'), stage, listOf(stage));

/** All filters of a file by name. */
export const filters = entries('a filter', stages);

/** A stage as it was written. */
export type StageModel = TypeOf<typeof stage>;

/** Stages as they were written. */
export type StagesModel = TypeOf<typeof stages>;
