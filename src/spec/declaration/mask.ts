/** Declares mask segments, and `masks`, where lists of them get a name. */
import { either, endlessRange, entries, fields, listOf, nameOf, quantity, range, within, word } from '../shapes';
import type { Clash, TypeOf } from '../shape';
import type { QuantityRange } from '../../units/quantity';
import { frequencyOrZero, unitBounds } from './bounds';

const bound = quantity('decibel', 'full-scale-level');

/** One segment of a mask. */
export const maskSegment = fields(
  'a mask segment',
  {
    band: {
      shape: within(endlessRange('frequency'), frequencyOrZero),
      about: 'Where the segment holds: `0 Hz .. 5.5 MHz`, or `8 MHz ..`.',
      required: true,
    },
    within: {
      shape: within(range('decibel'), { dB: unitBounds.dB }),
      about: 'The gain stays in this range of its value at `reference`: `± 0.1 dB`, or `-0.5 dB .. 0.9 dB`.',
    },
    below: { shape: bound, about: 'The gain stays at or below this, in dB; in `output` the level, in dBFS.' },
    above: { shape: bound, about: 'The gain stays at or above this.' },
    to: {
      shape: bound,
      about: 'The bound at the upper end of the band, where the segment slopes.',
      with: ['below', 'above'],
    },
    along: {
      shape: word({ log: 'Straight over the logarithm of the frequency.', linear: 'Straight over frequency.' }),
      about: 'What a slope is straight over.',
      fallback: 'linear',
      with: ['to'],
    },
  },
  { decidedBy: ['within', 'below', 'above'], check: slopeClash },
);

function slopeClash(segment: {
  readonly band?: QuantityRange | null;
  readonly along?: string | null;
  readonly to?: object | null;
}): Clash | null {
  if (!segment.band || !segment.to) return null;
  if (segment.band.high.value === Infinity) return { key: 'to', message: 'a segment that slopes needs an upper end of its band' };
  if (segment.along !== 'log' || segment.band.low.value > 0) return null;
  return { key: 'along', message: 'a slope over log frequency cannot begin at 0 Hz' };
}

/** The segments of one mask. */
export const maskSegments = listOf(maskSegment, 1);

/** What a limit takes: segments, or the name of a mask. */
export const mask = either(nameOf('masks'), maskSegments);

/** All masks of a file by name. */
export const masks = entries('a mask', maskSegments);

/** A segment as it was written. */
export type MaskSegmentModel = TypeOf<typeof maskSegment>;

/** Segments as they were written. */
export type SegmentsModel = TypeOf<typeof maskSegments>;

/** A mask as it was written, or a name. */
export type MaskModel = TypeOf<typeof mask>;
