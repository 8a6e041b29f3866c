/** How much white noise filters in series let through, with an error bound, or that it is without limit. */
import { filterResponse, type Filter } from './filter';
import { integrate, type Integral } from './quadrature';
import { product } from './response-algebra';

/** ∫ |H|² df in Hz with a bound on its error; or endless, because the gain does not fall to nothing at infinity. */
export type NoiseBandwidth = ({ readonly kind: 'finite' } & Integral) | { readonly kind: 'endless' };

/** Where the adaptive quadrature stops, against the value. */
const relative = 1e-11;

/**
 * The noise bandwidth of filters in series: ∫ |H(f)|² df from 0 Hz to infinity, so that density times it is power. Divide by the square of
 * a gain to refer it to that gain.
 *
 * The axis is cut at the poles and each piece integrated adaptively; the last one runs to infinity over 1/f, on which |H|² is smooth.
 *
 * @param filters none let everything through.
 * @returns endless where there are as many zeros as poles, as in a high-pass and in an elliptic or inverse Chebyshev filter of even order.
 * Source: R. Piessens et al., QUADPACK (1983); the substitution is elementary.
 * @example noiseBandwidth([realPole(1000)]).value // 1570.79633
 */
export function noiseBandwidth(filters: readonly Filter[]): NoiseBandwidth {
  return powerFrom(filters, 0);
}

/**
 * The part of the noise bandwidth above a frequency: ∫ |H(f)|² df from there to infinity.
 *
 * @param filters none let everything through.
 * @param fromHz ≥ 0, finite.
 * @returns as `noiseBandwidth`.
 * Source: as `noiseBandwidth`.
 * @example powerFrom([realPole(1000)], 1000).value // 785.398163
 */
export function powerFrom(filters: readonly Filter[], fromHz: number): NoiseBandwidth {
  const excess = filters.reduce((sum, { poles, zeros }) => sum + poles.length - zeros.length, 0);
  if (excess === 0) return { kind: 'endless' };
  const response = product(filters.map(filterResponse));
  const power = (frequencyHz: number): number => Math.exp(2 * response.logGain(frequencyHz));
  const cuts = [fromHz, ...powerCuts(filters).filter((cut) => cut > fromHz)];
  const pieces = cuts.slice(1).map((cut, index) => integrate(power, cuts[index] ?? fromHz, cut, relative));
  const last = cuts.at(-1) ?? fromHz;
  const tail = integrate((inverse) => power(1 / inverse) / (inverse * inverse), 0, 1 / last, relative);
  return [...pieces, tail].reduce<{ kind: 'finite' } & Integral>(
    (sum, piece) => ({ kind: 'finite', value: sum.value + piece.value, errorBound: sum.errorBound + piece.errorBound }),
    { kind: 'finite', value: 0, errorBound: 0 },
  );
}

/**
 * Where |H|² may turn sharply and an integral is better cut: around each resonance, and at the size of each real pole.
 *
 * @param filters none give no cuts.
 * @returns Hz, above 0, ascending, each once.
 * Source: common practice.
 * @example powerCuts([realPole(1000), realPole(10), realPole(10)]).join(' ') // '10 1000'
 */
export function powerCuts(filters: readonly Filter[]): readonly number[] {
  return [...new Set(filters.flatMap(({ poles }) => poles.flatMap(cutsAround)))].filter((cut) => cut > 0).sort((a, b) => a - b);
}

/** Around a resonance, its middle and its two flanks; beside a real pole, its size. */
function cutsAround({ re, im }: { readonly re: number; readonly im: number }): readonly number[] {
  const middle = Math.hypot(re, im);
  return im === 0 ? [middle] : [middle + re, middle, middle - re];
}
