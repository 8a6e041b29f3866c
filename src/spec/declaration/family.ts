/** Declares the filter families: their kinds, orders, corners and ripples, and what of it goes together. */
import type { Quantity, QuantityRange } from '../../units/quantity';
import type { Clash } from '../shape';
import { quantity, range, whole, within, word } from '../shapes';
import { attenuations, gains, orders, ripples } from './bounds';

/** Half the power, in dB. */
const halfPowerDb = 10 * Math.log10(2);

const twoCorners = ['bandpass', 'bandstop'] as const;

/** The keys of a family stage. */
export const familyKeys = {
  family: {
    shape: word({
      butterworth: 'As flat as an order can be; half power at the corner.',
      chebyshev: 'Equal ripple in the pass band, steeper beyond it.',
      'inverse-chebyshev': 'Flat in the pass band, equal ripple in the stop band.',
      elliptic: 'Equal ripple in both bands, the steepest there is.',
      bessel: 'The flattest delay.',
      legendre: 'The steepest that still falls all the way.',
      gaussian: 'The step response without overshoot.',
    }),
    about: 'The family of the filter.',
  },
  kind: {
    shape: word({
      lowpass: 'Passes what is below the corner.',
      highpass: 'Passes what is above the corner.',
      bandpass: 'Passes what lies between its `corners`.',
      bandstop: 'Stops what lies between its `corners`.',
    }),
    about: 'What the filter lets through.',
    fallback: 'lowpass',
    with: ['family'],
  },
  order: {
    shape: whole(...orders),
    about: 'The order: the number of poles; a band-pass or band-stop has twice as many.',
    required: true,
    with: ['family'],
  },
  corner: {
    shape: quantity('frequency'),
    about: 'The half-power frequency, 3.01 dB below the maximum of the pass band, unless `corner-at` says otherwise.',
    required: true,
    with: ['family'],
    notWith: twoCorners,
  },
  corners: {
    shape: range('frequency'),
    about: 'Both corners of a band-pass or band-stop: `4.2 MHz .. 4.5 MHz`.',
    required: true,
    with: twoCorners,
  },
  ripple: {
    shape: within(quantity('decibel'), ripples),
    about: 'The ripple of the pass band, from peak to valley.',
    required: true,
    with: ['chebyshev', 'elliptic'],
  },
  attenuation: {
    shape: within(quantity('decibel'), attenuations),
    about: 'The least loss in the stop band.',
    required: true,
    with: ['inverse-chebyshev', 'elliptic'],
  },
  'corner-at': {
    shape: word({
      'half-power': 'The corner is the half-power frequency.',
      ripple: 'The corner is where the gain leaves the ripple for good.',
      stopband: 'The corner is where the stop band begins.',
      delay: 'The corner is 1/(2π·delay), with the delay at 0 Hz.',
    }),
    about: 'Which frequency `corner` states.',
    fallback: 'half-power',
    with: ['family'],
  },
  gain: {
    shape: within(quantity('ratio'), gains),
    about: 'The gain of the stage: of a family in its pass band, of poles and zeros at `gain-at`.',
    fallback: '0 dB',
    with: ['family', 'poles'],
  },
} as const;

/** The part of a stage that its check needs. */
export interface FamilyStage {
  readonly family?: string | null;
  readonly kind?: string | null;
  readonly corners?: QuantityRange | null;
  readonly 'corner-at'?: string | null;
  readonly ripple?: Quantity | null;
  readonly attenuation?: Quantity | null;
}

/** Where a family has its corner, other than at half power. */
const otherCorners: Readonly<Record<string, readonly string[]>> = {
  chebyshev: ['ripple'],
  'inverse-chebyshev': ['stopband'],
  elliptic: ['ripple', 'stopband'],
  bessel: ['delay'],
};

/** What does not go together in a family stage, or null. */
export function familyClash(stage: FamilyStage): Clash | null {
  if (!stage.family) return null;
  return cornerAtClash(stage, stage.family) ?? rippleClash(stage) ?? cornersClash(stage);
}

function cornerAtClash({ kind, 'corner-at': at }: FamilyStage, family: string): Clash | null {
  if (!at || at === 'half-power') return null;
  const known = Object.hasOwn(otherCorners, family) ? (otherCorners[family] ?? []) : [];
  if (!known.includes(at)) {
    const has = known.length === 0 ? '' : ` or ${known.map((word) => `\`${word}\``).join(' or ')}`;
    const why = at === 'ripple' ? ' has no ripple, so its corner' : ' has its corner';
    return { key: 'corner-at', message: `\`${family}\`${why}${at === 'ripple' ? ' is' : ''} at \`half-power\`${has}` };
  }
  if (at !== 'delay' || !kind || kind === 'lowpass') return null;
  return { key: 'corner-at', message: `only a low-pass has a delay at 0 Hz to take the corner from: this one is \`${kind}\`` };
}

function rippleClash({ 'corner-at': at, ripple, attenuation }: FamilyStage): Clash | null {
  if (ripple && attenuation && attenuation.value <= ripple.value) {
    return { key: 'attenuation', message: 'the stop band must lose more than the ripple of the pass band' };
  }
  if (at === null || (at !== undefined && at !== 'half-power')) return null;
  if (ripple && ripple.value > halfPowerDb) {
    const message = 'with more than 3.01 dB of ripple the half-power point lies inside the pass band: state `corner-at: ripple`';
    return { key: 'ripple', message };
  }
  if (!attenuation || attenuation.value > halfPowerDb) return null;
  return {
    key: 'attenuation',
    message: 'a stop band of no more than 3.01 dB has no half-power point: state `corner-at: stopband`',
  };
}

function cornersClash({ corners }: FamilyStage): Clash | null {
  if (!corners || (corners.low.value > 0 && corners.low.value < corners.high.value)) return null;
  return { key: 'corners', message: 'both corners are needed, the lower one above 0 Hz and below the upper one' };
}
