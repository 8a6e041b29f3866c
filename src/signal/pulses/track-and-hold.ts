/** Track and hold: the output follows the input for part of each period and holds its last value for the rest. */
import { complexProduct, complexQuotient, complexScaled, type Complex } from '../complex';
import type { Enclosure } from '../response';
import { holdSumAt, holdSumTurning, type HoldSum } from './hold-sum';
import { cosineOfTurns, logSinc, sineOfTurns } from './sinc';

/** Which part of the period is tracked. */
export interface TrackAndHold {
  /** d, 0 … 1; the rest, e = 1 − d, is held. */
  readonly trackShare: number;
  /** T in s. */
  readonly periodSeconds: number;
}

/** Ranges of the delay are widened by this, relative to the period, in place of directed rounding. */
const delaySlack = 1e-12;

/**
 * The weight of copy k at an output frequency: d·sinc(kd)·e^{−jπkd} + e·sinc(e·f_o·T)·e^{−jπe·f_o·T}·e^{−j2πkd}, f_o = f + k·fs.
 *
 * Near f = 0, where every copy but the wanted path vanishes, it is evaluated as (f/f_o)·e^{−jπkd}·(d·sinc(kd) +
 * e·sinc(e·f·T)·e^{j(πkd − πe·f·T)}), the same without the cancellation.
 *
 * @param copy k, any whole number.
 * @param outputHz f_o with its sign.
 * Source: a natural gate of d·T beside a sampler with a hold of e·T that begins at d·T; the other form by the addition theorem.
 * @example trackAndHoldWeight({ trackShare: 0.5, periodSeconds: 1 }, 0, 1).im // -0.318309886
 */
export function trackAndHoldWeight(gate: TrackAndHold, copy: number, outputHz: number): Complex {
  const { atOutput, atInput, back } = copySums(gate, copy);
  const output = outputHz * gate.periodSeconds;
  const input = output - copy;
  const turned =
    copy !== 0 && Math.abs(input) <= Math.abs(output)
      ? complexScaled(holdSumAt(atInput, input).value, input / output)
      : holdSumAt(atOutput, output).value;
  return complexProduct(turned, back);
}

/** The two forms of a copy's weight, both without the factor `back` = e^{−jπkd}. */
export interface CopySums {
  /** Over f_o·T. */
  readonly atOutput: HoldSum;
  /** Over f·T, to be multiplied by f/f_o. */
  readonly atInput: HoldSum;
  readonly back: Complex;
}

/**
 * A copy's weight as sums of a constant and a held stretch.
 *
 * @param copy k, any whole number.
 * Source: as for trackAndHoldWeight.
 * @example copySums({ trackShare: 0.25, periodSeconds: 1 }, 1).atInput.constant // 0.225079079
 */
export function copySums(gate: TrackAndHold, copy: number): CopySums {
  const { trackShare, periodSeconds } = gate;
  if (!(trackShare >= 0 && trackShare <= 1)) throw new RangeError(`The tracked share is 0 to 1, not ${trackShare}.`);
  if (!(periodSeconds > 0)) throw new RangeError(`A period must be above 0 s, not ${periodSeconds}.`);
  const turns = copy * trackShare;
  const vanishes = logSinc(turns) === -Infinity;
  const constant = copy === 0 ? trackShare : vanishes ? 0 : sineOfTurns(turns) / (Math.PI * copy);
  const back = { re: cosineOfTurns(turns), im: -sineOfTurns(turns) };
  const share = 1 - trackShare;
  return { atOutput: { constant, share, turn: back }, atInput: { constant, share, turn: { re: back.re, im: -back.im } }, back };
}

/**
 * The group delay of the wanted path, copy 0.
 *
 * @param frequencyHz any, finite.
 * @returns s; e²·T/2 at 0 Hz.
 * Source: the derivative of the weight's phase.
 * @example trackAndHoldDelay({ trackShare: 0.3, periodSeconds: 1 }, 0) // 0.245
 */
export function trackAndHoldDelay(gate: TrackAndHold, frequencyHz: number): number {
  const { periodSeconds } = gate;
  // Only where nothing is tracked are there nulls, and a hold delays by half its length right up to them.
  if (gate.trackShare === 0) return 0.5 * periodSeconds;
  const { value, derivative } = holdSumAt(copySums(gate, 0).atOutput, frequencyHz * periodSeconds);
  return (-periodSeconds / (2 * Math.PI)) * complexQuotient(derivative, value).im;
}

/**
 * An enclosure of the wanted path's group delay over an interval, which closes as the interval does.
 *
 * @param highHz finite.
 * @returns s; from −Infinity to Infinity where the interval is too wide to tell the weight from 0.
 * Source: as for trackAndHoldDelay, in discs.
 * @example trackAndHoldDelayRange({ trackShare: 0.9, periodSeconds: 1 }, 0, 0).high // 0.005
 */
export function trackAndHoldDelayRange(gate: TrackAndHold, lowHz: number, highHz: number): Enclosure {
  const { periodSeconds } = gate;
  if (gate.trackShare === 0) return { low: 0.5 * periodSeconds, high: 0.5 * periodSeconds };
  const disc = holdSumTurning(copySums(gate, 0).atOutput, lowHz * periodSeconds, highHz * periodSeconds);
  if (disc === null) return { low: -Infinity, high: Infinity };
  const scale = periodSeconds / (2 * Math.PI);
  const spread = scale * disc.radius + delaySlack * periodSeconds;
  return { low: -scale * disc.centre.im - spread, high: -scale * disc.centre.im + spread };
}
