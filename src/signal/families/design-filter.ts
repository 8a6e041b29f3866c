/** The one entry to the filter families: family, order and kind in, poles and zeros out. */
import type { Filter } from '../filter';
import type { Enclosure } from '../response';
import { bessel } from './bessel';
import { butterworth } from './butterworth';
import { chebyshev } from './chebyshev';
import { elliptic } from './elliptic';
import { gaussian } from './gaussian';
import { inverseChebyshev } from './inverse-chebyshev';
import { bandPass, bandStop, highPass } from './kinds';
import { legendre } from './legendre';

/** The families. */
export type FilterFamily = 'butterworth' | 'chebyshev' | 'inverse-chebyshev' | 'elliptic' | 'bessel' | 'legendre' | 'gaussian';

/** What the filter lets pass. */
export type FilterKind = 'lowpass' | 'highpass' | 'bandpass' | 'bandstop';

/** What a corner names: half power in every family; the others where the family has them. */
export type CornerAt = 'half-power' | 'ripple' | 'stopband' | 'delay';

/** A filter as it is asked for. */
export interface FilterDesign {
  readonly family: FilterFamily;
  /** Of the low-pass, 1 … 20; a band-pass or band-stop has twice as many poles. */
  readonly order: number;
  readonly kind: FilterKind;
  /** In Hz: one for lowpass and highpass, low and high edge for bandpass and bandstop. */
  readonly corners: number | Enclosure;
  readonly cornerAt: CornerAt;
  /** chebyshev and elliptic; null for the others. */
  readonly rippleDb: number | null;
  /** inverse-chebyshev and elliptic; null for the others. */
  readonly attenuationDb: number | null;
  /** Linear, of the passband's maximum. */
  readonly gain: number;
}

/** What each family's corner may name; anything else is refused. */
export const cornersOf = {
  butterworth: ['half-power'],
  chebyshev: ['half-power', 'ripple'],
  'inverse-chebyshev': ['half-power', 'stopband'],
  elliptic: ['half-power', 'ripple', 'stopband'],
  bessel: ['half-power', 'delay'],
  legendre: ['half-power'],
  gaussian: ['half-power'],
} as const satisfies Readonly<Record<FilterFamily, readonly CornerAt[]>>;

/** The highest order of every family. */
export const highestOrder = 20;

/**
 * Designs a filter. Its passband's maximum is `gain`; the frequency that `cornerAt` names falls on the corner, or on both edges.
 *
 * @param design orders 1 … 20 are exact to 1e−9 against 50-digit arithmetic.
 * @returns all turning points are known, whatever the kind. A high-pass states its gain at Infinity, a band-pass at √(low·high).
 * Source: the frequency transformations s → corner/s, (s² + ω₀²)/(B·s) and its inverse, common practice.
 * @example designFilter({ family: 'bessel', order: 4, kind: 'highpass', corners: 10, cornerAt: 'half-power', rippleDb: null, attenuationDb: null, gain: 2 }).gainAt.gain // 2
 */
export function designFilter(design: FilterDesign): Filter {
  if (design.order > highestOrder) throw new RangeError(`Orders end at ${highestOrder}, not ${design.order}.`);
  const { poles, zeros, gainAt, turnsHz } = ofKind(design);
  return { poles, zeros, gainAt: { frequencyHz: gainAt.frequencyHz, gain: gainAt.gain * design.gain }, turnsHz };
}

function ofKind(design: FilterDesign): Filter {
  switch (design.kind) {
    case 'lowpass':
      return lowPass(design, oneCorner(design));
    case 'highpass':
      return highPass(lowPass(design, 1), oneCorner(design));
    case 'bandpass':
      return bandPass(lowPass(design, 1), twoCorners(design));
    case 'bandstop':
      return bandStop(lowPass(design, 1), twoCorners(design));
  }
}

function lowPass(design: FilterDesign, cornerHz: number): Filter {
  const { family, order } = design;
  switch (family) {
    case 'butterworth':
      named(design, cornersOf.butterworth);
      return butterworth(order, cornerHz);
    case 'chebyshev':
      return chebyshev(order, cornerHz, given(design, 'rippleDb'), named(design, cornersOf.chebyshev));
    case 'inverse-chebyshev':
      return inverseChebyshev(order, cornerHz, given(design, 'attenuationDb'), named(design, cornersOf['inverse-chebyshev']));
    case 'elliptic': {
      const cornerAt = named(design, cornersOf.elliptic);
      return elliptic(order, cornerHz, given(design, 'rippleDb'), given(design, 'attenuationDb'), cornerAt);
    }
    case 'bessel':
      return bessel(order, cornerHz, named(design, cornersOf.bessel));
    case 'legendre':
      named(design, cornersOf.legendre);
      return legendre(order, cornerHz);
    case 'gaussian':
      named(design, cornersOf.gaussian);
      return gaussian(order, cornerHz);
  }
}

function oneCorner({ kind, corners }: FilterDesign): number {
  if (typeof corners === 'number' && corners > 0 && corners < Infinity) return corners;
  throw new RangeError(`A ${kind} has one corner above 0 Hz.`);
}

function twoCorners({ kind, corners }: FilterDesign): Enclosure {
  if (typeof corners !== 'number') return corners;
  throw new RangeError(`A ${kind} has two edges.`);
}

function given({ family, ...design }: FilterDesign, what: 'rippleDb' | 'attenuationDb'): number {
  const db = design[what];
  if (db === null)
    throw new RangeError(`A filter of family ${family} needs ${what === 'rippleDb' ? 'a ripple' : 'an attenuation'}.`);
  return db;
}

function named<T extends CornerAt>({ family, cornerAt }: FilterDesign, allowed: readonly T[]): T {
  const found = allowed.find((one) => one === cornerAt);
  if (found === undefined) throw new RangeError(`A corner of family ${family} cannot be at ${cornerAt}.`);
  return found;
}
