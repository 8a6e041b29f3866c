/** Turns filters as the outside tables name them into ours, in Hz with 1 rad/s = 1 Hz unless a corner is given. */
import { designFilter, type CornerAt, type FilterKind } from '../../src/signal/families/design-filter';
import { filterResponse, type Filter } from '../../src/signal/filter';
import type { Enclosure } from '../../src/signal/response';
import type { OutsideDesign } from '../reference/outside-filters';

const unitCorner = {
  butterworth: 'half-power',
  chebyshev: 'ripple',
  'inverse-chebyshev': 'stopband',
  elliptic: 'ripple',
  bessel: 'half-power',
  legendre: 'half-power',
  gaussian: 'half-power',
} as const satisfies Record<OutsideDesign['family'], CornerAt>;

/** What the tables' unit frequency is in a family. */
export function cornerOf({ family, norm }: OutsideDesign): CornerAt {
  return norm === 'delay' ? 'delay' : unitCorner[family];
}

/** A filter of a table's design; the low-pass with its unit frequency at 1 Hz unless said otherwise. */
export function filterOf(
  design: OutsideDesign,
  changes: { readonly kind?: FilterKind; readonly corners?: number | Enclosure; readonly cornerAt?: CornerAt } = {},
): Filter {
  const { family, order, ripple = null, attenuation = null } = design;
  const rest = { kind: 'lowpass', corners: 1, cornerAt: cornerOf(design), gain: 1 } as const;
  return designFilter({ family, order, rippleDb: ripple, attenuationDb: attenuation, ...rest, ...changes });
}

/** What a table's design is called in messages. */
export function nameOf({ family, order, ripple, attenuation, norm }: OutsideDesign): string {
  return [
    family,
    order,
    ripple === undefined ? [] : `${ripple} dB`,
    attenuation === undefined ? [] : `${attenuation} dB`,
    norm ?? [],
  ]
    .flat()
    .join(' ');
}

/** 20·log10|H|. */
export function gainDbOf(filter: Filter, frequencyHz: number): number {
  return (20 / Math.LN10) * filterResponse(filter).logGain(frequencyHz);
}
