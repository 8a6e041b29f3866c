/** Any pulse as the magnitude of its spectrum: a product of at most two pulses whose spectra are known lobe by lobe. */
import { product } from '../response-algebra';
import type { Response } from '../response';
import { exponentialResponse } from './exponential';
import { halfSineResponse } from './half-sine';
import { checkedPulse, type PulseShape } from './pulse-shape';
import { rectangleResponse } from './rectangle';
import { splitResponse } from './split';

/** A pulse of which others are made by convolution. */
export type PulseFactor =
  | { readonly kind: 'rectangle' | 'half-sine' | 'split'; readonly widthSeconds: number }
  | { readonly kind: 'exponential'; readonly widthSeconds: number; readonly decaySeconds: number };

/**
 * The magnitude |P(f)| of a pulse's spectrum, normalised to unit area: 0 dB at 0 Hz; `split` to unit area of |p|, with nothing at 0 Hz.
 *
 * Exact at removable singularities and beside nulls (nulls themselves to the rounding of f·w); bounds and slopes over any interval,
 * infinite ones included, are the sum of those of the factors.
 *
 * @param shape lengths above 0 s.
 * @returns ln|P|.
 * Source: any Fourier-transform table.
 * @example Math.exp(pulseResponse({ shape: 'raised-cosine', widthSeconds: 1, edgeSeconds: 0.5 }).logGain(1)) // 0.5
 */
export function pulseResponse(shape: PulseShape): Response {
  return product(pulseFactors(shape).map(factorResponse));
}

/**
 * The pulses whose convolution a pulse is: their spectra multiply. A triangle is two rectangles, a trapezoid a rectangle smoothed by
 * another, a raised cosine a rectangle smoothed by a half sine.
 *
 * @param shape lengths above 0 s.
 * Source: the convolution theorem.
 * @example pulseFactors({ shape: 'linear', periodSeconds: 1 }).length // 2
 */
export function pulseFactors(shape: PulseShape): readonly PulseFactor[] {
  checkedPulse(shape);
  const of = (kind: 'rectangle' | 'half-sine' | 'split', widthSeconds: number): PulseFactor => ({ kind, widthSeconds });
  switch (shape.shape) {
    case 'rectangle':
    case 'half-sine':
    case 'split':
      return [of(shape.shape, shape.widthSeconds)];
    case 'triangle':
      return [of('rectangle', 0.5 * shape.widthSeconds), of('rectangle', 0.5 * shape.widthSeconds)];
    case 'linear':
      return [of('rectangle', shape.periodSeconds), of('rectangle', shape.periodSeconds)];
    case 'trapezoid':
      return [of('rectangle', shape.widthSeconds - shape.edgeSeconds), ...edgeOf('rectangle', shape.edgeSeconds)];
    case 'raised-cosine':
      return [of('rectangle', shape.widthSeconds - shape.edgeSeconds), ...edgeOf('half-sine', shape.edgeSeconds)];
    case 'exponential':
      return [{ kind: 'exponential', widthSeconds: shape.widthSeconds, decaySeconds: shape.decaySeconds }];
  }
}

/**
 * The magnitude of one factor's spectrum.
 *
 * @param factor lengths above 0 s.
 * Source: as for pulseResponse.
 * @example Math.exp(factorResponse({ kind: 'rectangle', widthSeconds: 1 }).logGain(0.5)) // 0.636619772
 */
export function factorResponse(factor: PulseFactor): Response {
  switch (factor.kind) {
    case 'rectangle':
      return rectangleResponse(factor.widthSeconds);
    case 'half-sine':
      return halfSineResponse(factor.widthSeconds);
    case 'split':
      return splitResponse(factor.widthSeconds);
    case 'exponential':
      return exponentialResponse(factor.widthSeconds, factor.decaySeconds);
  }
}

/** An edge of no length smooths nothing. */
function edgeOf(kind: 'rectangle' | 'half-sine', widthSeconds: number): readonly PulseFactor[] {
  return widthSeconds === 0 ? [] : [{ kind, widthSeconds }];
}
