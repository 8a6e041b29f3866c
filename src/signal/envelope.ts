/** An envelope as a response: points joined by straight lines in dB over the logarithm of frequency, with exact bounds and slopes. */
import { RangeExtremes } from './range-extremes';
import type { Enclosure, Response } from './response';

/**
 * The response whose logarithmic gain is straight over ln f between points, and stays at its last value beyond either end.
 *
 * ln g(f) = ln g_i + s_i·ln(f/f_i) with s_i = ln(g_{i+1}/g_i)/ln(f_{i+1}/f_i); its slope in f is s_i/f.
 *
 * @param frequenciesHz above 0 and rising, at least one.
 * @param logGains ln of the gain at each of them, finite.
 * @throws RangeError for lists of different lengths, for none, or for frequencies that do not rise from above 0.
 * Source: elementary.
 * @example Math.exp(envelopeResponse([100, 10000], [0, Math.log(0.01)]).logGain(1000)) // 0.1
 */
export function envelopeResponse(frequenciesHz: readonly number[], logGains: readonly number[]): Response {
  if (frequenciesHz.length === 0 || frequenciesHz.length !== logGains.length)
    throw new RangeError(`An envelope needs as many gains as frequencies, not ${logGains.length} for ${frequenciesHz.length}.`);
  const fault = frequenciesHz.findIndex((hz, index) => !(hz > (frequenciesHz[index - 1] ?? 0)));
  if (fault >= 0)
    throw new RangeError(`The frequencies of an envelope must rise from above 0 Hz, not to ${frequenciesHz[fault]}.`);
  return new Envelope(frequenciesHz, logGains);
}

class Envelope implements Response {
  readonly turnsHz: readonly number[];
  private readonly slopes: readonly number[];
  private readonly gainExtremes: RangeExtremes;
  private readonly slopeExtremes: RangeExtremes;

  constructor(
    private readonly frequenciesHz: readonly number[],
    private readonly logGains: readonly number[],
  ) {
    this.slopes = logGains.slice(1).map((gain, index) => {
      const octaves = Math.log((frequenciesHz[index + 1] ?? 1) / (frequenciesHz[index] ?? 1));
      return (gain - (logGains[index] ?? 0)) / octaves;
    });
    this.gainExtremes = new RangeExtremes(logGains);
    this.slopeExtremes = new RangeExtremes(this.slopes);
    this.turnsHz = turnsOf(frequenciesHz, this.slopes);
  }

  logGain(frequencyHz: number): number {
    const last = this.frequenciesHz.length - 1;
    const index = Math.min(this.pointsUpTo(frequencyHz) - 1, last);
    if (index < 0) return this.logGains[0] ?? 0;
    const gain = this.logGains[index] ?? 0;
    return index === last ? gain : gain + (this.slopes[index] ?? 0) * Math.log(frequencyHz / (this.frequenciesHz[index] ?? 1));
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    const inside = this.gainExtremes.between(this.pointsUpTo(lowHz), this.pointsUpTo(highHz));
    const atLow = this.logGain(lowHz);
    const atHigh = this.logGain(highHz);
    return { low: Math.min(inside.low, atLow, atHigh), high: Math.max(inside.high, atLow, atHigh) };
  }

  slope(lowHz: number, highHz: number): Enclosure {
    const [first = 0] = this.frequenciesHz;
    const last = this.frequenciesHz.at(-1) ?? first;
    const within = this.slopeExtremes.between(this.pointsUpTo(lowHz) - 1, this.pointsUpTo(highHz));
    const flat = lowHz < first || highHz > last || within.low > within.high;
    const low = flat ? Math.min(0, within.low) : within.low;
    const high = flat ? Math.max(0, within.high) : within.high;
    const from = Math.max(lowHz, first);
    const to = Math.max(highHz, from);
    return { low: low < 0 ? low / from : low / to, high: high > 0 ? high / from : high / to };
  }

  /** How many points stand at a frequency or below. */
  private pointsUpTo(frequencyHz: number): number {
    let low = 0;
    let high = this.frequenciesHz.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((this.frequenciesHz[middle] ?? Infinity) <= frequencyHz) low = middle + 1;
      else high = middle;
    }
    return low;
  }
}

/** Every point at which the lines turn between rising and falling; beyond the ends they are flat, which is no turn. */
function turnsOf(frequenciesHz: readonly number[], slopes: readonly number[]): readonly number[] {
  const turns: number[] = [];
  let before = 0;
  slopes.forEach((slope, index) => {
    const sign = Math.sign(slope);
    if (sign === 0) return;
    if (before !== 0 && sign !== before) turns.push(frequenciesHz[index] ?? 0);
    before = sign;
  });
  return turns;
}
