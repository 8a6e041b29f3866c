/** The copies of a track-and-hold output as responses: one copy exactly, and everything from some copy on by a bound. */
import { constantResponse, product } from '../response-algebra';
import type { Enclosure, Response } from '../response';
import { holdSumSize, holdSumTurning } from './hold-sum';
import { rectangleResponse } from './rectangle';
import { copySums, trackAndHoldWeight, type CopySums, type TrackAndHold } from './track-and-hold';

/** Bounds of ln|W| are widened by this, in place of directed rounding. */
const logSlack = 1e-9;

/**
 * |weight| of copy k over the output frequency f_o ≥ 0, the input standing at f = f_o − k·fs (negative below k·fs: the mirrored half). For
 * f_o < 0 ask for copy −k at −f_o.
 *
 * @param copy k, any whole number.
 * @returns ln|W|: −Infinity at k·fs, k ≠ 0, which is where a constant input would leave; ln|c_k| at Infinity.
 * Source: trackAndHoldWeight; bounds from discs about the middle of an interval.
 * @example Math.exp(trackAndHoldCopy({ trackShare: 0.5, periodSeconds: 1 }, 2).logGain(1)) // 0.318309886
 */
export function trackAndHoldCopy(gate: TrackAndHold, copy: number): Response {
  const sums = copySums(gate, copy);
  const { constant, share } = sums.atOutput;
  if (constant !== 0) return new CopyResponse(gate, copy, sums);
  return product([constantResponse(Math.log(share)), rectangleResponse(share * gate.periodSeconds)]);
}

/**
 * A bound of |weight| over f_o ≥ 0 that holds for every copy k with |k| ≥ first: min(d, 1/(π·first)) + min(e, 1/(π·f_o·T)). A search over
 * all copies ends with it.
 *
 * @param first ≥ 1.
 * @returns its logarithm; it only falls.
 * Source: the triangle inequality; |sinc(x)| ≤ min(1, 1/(πx)).
 * @example Math.exp(trackAndHoldRemainder({ trackShare: 0.5, periodSeconds: 1 }, 1).logGain(2)) // 0.477464829
 */
export function trackAndHoldRemainder(gate: TrackAndHold, first: number): Response {
  const { constant, share } = copySums(gate, 0).atOutput;
  return new RemainderResponse(Math.min(constant, 1 / (Math.PI * first)), share, gate.periodSeconds);
}

class CopyResponse implements Response {
  constructor(
    private readonly gate: TrackAndHold,
    private readonly copy: number,
    private readonly sums: CopySums,
  ) {}

  logGain(frequencyHz: number): number {
    if (frequencyHz === Infinity) return Math.log(Math.abs(this.sums.atOutput.constant));
    const { re, im } = trackAndHoldWeight(this.gate, this.copy, frequencyHz);
    return Math.log(Math.hypot(re, im));
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    const output = this.outputRange(lowHz, highHz);
    const direct = holdSumSize(this.sums.atOutput, output.low, output.high);
    const through = this.sizeThroughInput(output);
    const low = Math.max(direct.low, through.low);
    const high = Math.min(direct.high, through.high);
    return { low: Math.log(low) - logSlack, high: Math.log(high) + logSlack };
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    const { copy, sums } = this;
    const output = this.outputRange(lowHz, highHz);
    const throughInput = copy > 0 && output.low >= 0.5 * copy;
    const shift = throughInput ? copy : 0;
    const low = output.low - shift;
    const high = output.high - shift;
    if (throughInput && low <= 0 && high >= 0) return null;
    const disc = holdSumTurning(throughInput ? sums.atInput : sums.atOutput, low, high);
    if (disc === null) return null;
    // d ln|f/f_o| = k/(f·f_o): it only falls on either side of f = 0, once f_o is past its half.
    const ratio = (input: number): number => (throughInput ? copy / (input * (input + copy)) : 0);
    const rounding = 1e-9 * (Math.hypot(disc.centre.re, disc.centre.im) + Math.abs(ratio(low)) + Math.abs(ratio(high)));
    const spread = disc.radius + rounding;
    const scale = this.gate.periodSeconds;
    return { low: scale * (disc.centre.re + ratio(high) - spread), high: scale * (disc.centre.re + ratio(low) + spread) };
  }

  /** f_o·T. */
  private outputRange(lowHz: number, highHz: number): Enclosure {
    return { low: lowHz * this.gate.periodSeconds, high: highHz * this.gate.periodSeconds };
  }

  /** By |f/f_o| = |1 − k/(f_o·T)|, which is monotone but for its null, and the sum over f. */
  private sizeThroughInput({ low, high }: Enclosure): Enclosure {
    const { copy } = this;
    if (copy === 0 || low === 0) return { low: 0, high: Infinity };
    const sum = holdSumSize(this.sums.atInput, low - copy, high - copy);
    const ends = [Math.abs(1 - copy / low), Math.abs(1 - copy / high)];
    const least = low <= copy && copy <= high ? 0 : Math.min(...ends);
    return { low: least * sum.low, high: Math.max(...ends) * sum.high };
  }
}

class RemainderResponse implements Response {
  readonly turnsHz: readonly number[] = [];

  constructor(
    private readonly natural: number,
    private readonly held: number,
    private readonly period: number,
  ) {}

  logGain(frequencyHz: number): number {
    return Math.log(this.natural + Math.min(this.held, 1 / (Math.PI * frequencyHz * this.period)));
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    return { low: this.logGain(highHz) - logSlack, high: this.logGain(lowHz) + logSlack };
  }

  /** 0 up to the corner, then rising towards 0 again. */
  slope(lowHz: number, highHz: number): Enclosure {
    const corner = 1 / (Math.PI * this.held * this.period);
    if (highHz <= corner) return { low: 0, high: 0 };
    const falling = (f: number): number => -1 / (f * (1 + this.natural * Math.PI * f * this.period));
    return {
      low: falling(Math.max(lowHz, corner)) * (1 + logSlack),
      high: lowHz < corner ? 0 : falling(highHz) * (1 - logSlack),
    };
  }
}
