/** Pulses whose spectrum has nothing but real nulls: ln|P| is concave between any two of them, so ends and peaks say everything. */
import type { Enclosure, Response } from '../response';

/** The spectrum of such a pulse over x = f·scale. */
export interface Lobes {
  /** ln|P|; −Infinity at the nulls and at Infinity. */
  logGain(x: number): number;
  /** Which lobe holds x ≥ 0; a null belongs to the lobe that it begins. */
  lobeAt(x: number): number;
  /** The null where a lobe ends and the next begins. */
  endOf(lobe: number): number;
  /** Where a lobe is highest; peaks fall from lobe to lobe. */
  peakOf(lobe: number): number;
  /** d ln|P|/dx inside a lobe; it falls throughout, from Infinity at a null to −Infinity at the next. */
  slopeIn(lobe: number, x: number): number;
  /** A bound of ln|P| that only falls, for x far above the first nulls. */
  envelope(x: number): number;
}

/** Bounds of ln|P| are widened by this, in place of directed rounding. */
const logSlack = 1e-9;

/** From here on lobes are not told apart any more: bounds are those of the envelope. */
const farLobes = 1e9;

/**
 * Such a pulse as a response. Over an interval the largest value is at an end or a peak, the least at an end or a null, and the slope
 * runs from its value at the upper end to that at the lower.
 *
 * @param lobes over x.
 * @param scaleSeconds x = f·scale; 0 is a gain of 1 everywhere.
 * Source: an even entire function of order one with real zeros only is c·x^m·Π(1 − x²/x_k²) (Hadamard), and every factor is log-concave between zeros.
 * @example Math.exp(lobedResponse({ logGain: (x) => -x, lobeAt: () => 0, endOf: () => 1, peakOf: () => 0, slopeIn: () => -1, envelope: (x) => -x }, 2).logGain(1)) // 0.135335283
 */
export function lobedResponse(lobes: Lobes, scaleSeconds: number): Response {
  return new LobedResponse(lobes, scaleSeconds);
}

class LobedResponse implements Response {
  constructor(
    private readonly lobes: Lobes,
    private readonly scale: number,
  ) {}

  logGain(frequencyHz: number): number {
    return this.scale === 0 ? 0 : this.lobes.logGain(frequencyHz * this.scale);
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    if (this.scale === 0) return { low: 0, high: 0 };
    const { lobes } = this;
    const low = lowHz * this.scale;
    const high = highHz * this.scale;
    if (low > farLobes) return { low: -Infinity, high: lobes.envelope(low) + logSlack };
    const lobe = lobes.lobeAt(low);
    const end = lobes.endOf(lobe);
    if (high <= end) {
      const least = Math.min(lobes.logGain(low), lobes.logGain(high));
      return { low: least - logSlack, high: this.highest(lobe, low, high) + logSlack };
    }
    const most = Math.max(this.highest(lobe, low, end), this.highest(lobe + 1, end, high));
    return { low: -Infinity, high: most + logSlack };
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    if (this.scale === 0) return { low: 0, high: 0 };
    const low = lowHz * this.scale;
    const high = highHz * this.scale;
    if (low > farLobes) return null;
    const lobe = this.lobes.lobeAt(low);
    if (high > this.lobes.endOf(lobe)) return null;
    const least = this.scale * this.lobes.slopeIn(lobe, high);
    const most = this.scale * this.lobes.slopeIn(lobe, low);
    return { low: least - logSlack * Math.abs(least), high: most + logSlack * Math.abs(most) };
  }

  /** The largest value over a part of one lobe. */
  private highest(lobe: number, low: number, high: number): number {
    return this.lobes.logGain(Math.min(Math.max(this.lobes.peakOf(lobe), low), high));
  }
}
