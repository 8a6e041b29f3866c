/** The rectangular pulse: an averaging aperture or a hold, as the magnitude of its spectrum. */
import type { Enclosure, Response } from '../response';

/** Bounds of ln|P| are widened by this, in place of directed rounding. */
const logSlack = 1e-9;

/** Three roundings stand between the two stated values and f·w: closer to a whole number than this, relatively, is a null. */
const nullSlack = 4e-16;

/** From here on, in f·w, lobes are not told apart any more: bounds are those of the envelope 1/(π·f·w). */
const farLobes = 1e9;

/**
 * The magnitude of a rectangle's spectrum, normalised to unit area: |P(f)| = |sinc(f·w)|, sinc(x) = sin(πx)/(πx).
 *
 * Bounds over an interval come from its ends and the side lobes' own peaks, where tan(πx) = πx and |sinc| = 1/√(1 + (πx)²); the
 * slope from π·w·(cot(πx) − 1/(πx)), which falls throughout each lobe.
 *
 * @param widthSeconds w ≥ 0 in s; 0 is an instant, gain 1 at every frequency.
 * @returns ln|P|: 0 at 0 Hz, −Infinity at every multiple of 1/w (to rounding) and at Infinity.
 * Source: any Fourier-transform table; the peaks' equation by differentiation.
 * @example 20 * Math.log10(Math.exp(rectangleResponse(1 / 48000).logGain(24000))) // -3.92239754
 */
export function rectangleResponse(widthSeconds: number): Response {
  if (!(widthSeconds >= 0) || !Number.isFinite(widthSeconds)) {
    throw new RangeError(`A pulse's width must be 0 s or more, not ${widthSeconds}.`);
  }
  return new RectangleResponse(widthSeconds);
}

class RectangleResponse implements Response {
  constructor(private readonly width: number) {}

  logGain(frequencyHz: number): number {
    return this.width === 0 ? 0 : logSinc(frequencyHz * this.width);
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    if (this.width === 0) return { low: 0, high: 0 };
    const low = lowHz * this.width;
    const high = highHz * this.width;
    const lobe = Math.floor(low);
    if (low > farLobes) return { low: -Infinity, high: -Math.log(Math.PI * low) + logSlack };
    const within = high <= lobe + 1;
    const most = within
      ? lobeMaximum(lobe, low, high)
      : Math.max(lobeMaximum(lobe, low, lobe + 1), lobeMaximum(lobe + 1, lobe + 1, high));
    const least = within ? Math.min(logSinc(low), logSinc(high)) : -Infinity;
    return { low: least - logSlack, high: most + logSlack };
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    if (this.width === 0) return { low: 0, high: 0 };
    const low = lowHz * this.width;
    const high = highHz * this.width;
    const lobe = Math.floor(low);
    if (high > lobe + 1 || low > farLobes) return null;
    const least = this.width * lobeSlope(high, lobe);
    const most = this.width * lobeSlope(low, lobe);
    return { low: least - logSlack * Math.abs(least), high: most + logSlack * Math.abs(most) };
  }
}

/** ln|sinc(x)|, by the distance to the nearest whole number, so that it is exact beside the nulls. */
function logSinc(x: number): number {
  if (x === Infinity) return -Infinity;
  if (x < 1e-3) {
    // ln sinc = −(πx)²/6 − (πx)⁴/180 − …; the next term is below 1e−19 here.
    const square = (Math.PI * x) ** 2;
    return -square * (1 / 6 + square * (1 / 180 + square / 2835));
  }
  const nearest = Math.round(x);
  const distance = Math.abs(x - nearest);
  if (nearest > 0 && distance <= nullSlack * x) return -Infinity;
  return Math.log(Math.sin(Math.PI * distance) / (Math.PI * x));
}

/** The largest ln|sinc| over [low, high], a part of lobe n, which reaches from n to n + 1. */
function lobeMaximum(lobe: number, low: number, high: number): number {
  if (lobe === 0) return logSinc(low);
  const peak = peakOf(lobe);
  if (peak <= low) return logSinc(low);
  if (peak >= high) return logSinc(high);
  return -0.5 * Math.log1p((Math.PI * peak) ** 2);
}

/** Where lobe n ≥ 1 peaks: tan(z) = z at z = q − 1/q − 2/(3q³) − …, q = π(n + ½), finished with one Newton step on z − tan z. */
function peakOf(lobe: number): number {
  const q = Math.PI * (lobe + 0.5);
  const z = q - 1 / q - 2 / (3 * q ** 3) - 13 / (15 * q ** 5) - 146 / (105 * q ** 7);
  const tangent = 1 / Math.tan(q - z);
  return (z + (tangent - z) / -(tangent * tangent)) / Math.PI;
}

/** d ln|sinc(x)|/dx = π·cot(πx) − 1/x inside lobe n; ±Infinity at its nulls. */
function lobeSlope(x: number, lobe: number): number {
  if (x < 1e-3) return -(Math.PI ** 2) * x * (1 / 3 + (Math.PI * x) ** 2 / 45);
  const inLobe = x - lobe;
  if (inLobe <= nullSlack * x && lobe > 0) return Infinity;
  if (1 - inLobe <= nullSlack * x) return -Infinity;
  return Math.PI / Math.tan(Math.PI * inLobe) - 1 / x;
}
