/** What a pulsed gate makes of the copies before any filter acts: its own loss and the weight of each copy, at its own width and at others. */
import { relativeGateWeight } from '../signal/pulses/gate';
import { pulseArea } from '../signal/pulses/pulse-area';
import { pulseResponse } from '../signal/pulses/pulse-response';
import { constantResponse, product } from '../signal/response-algebra';
import type { Response } from '../signal/response';
import type { Pulse, PulseWidth } from '../spec/channel';
import { toDb } from './decibels';
import { pulseShape } from './pulse-shape';

/** A gate at one rate. */
export interface GateFigures {
  /** Its width over the period. */
  readonly share: number;
  /** 20·log10(c_0): what the wanted path loses to the gate itself; −Infinity for `split`, whose wanted path is nothing. */
  readonly ownDb: number;
  /** 20·log10(|c_k|/c_0) for k = 1 …; empty for `split`. */
  readonly copiesDb: readonly number[];
}

/** The gate's own loss and the weights of its first copies; null for `instant`, which is none. */
export function gateFigures(gate: Pulse, rateHz: number, copies: number): GateFigures | null {
  const shape = pulseShape(gate, rateHz);
  if (shape === null) return null;
  const orders = Array.from({ length: copies }, (_, index) => index + 1);
  const weights = orders.flatMap((copy) => relativeGateWeight(shape, rateHz, copy) ?? []);
  const c0 = shape.shape === 'split' ? 0 : pulseArea(shape) * rateHz;
  return {
    share: (shape.shape === 'linear' ? 2 * shape.periodSeconds : shape.widthSeconds) * rateHz,
    ownDb: toDb(Math.log(c0)),
    copiesDb: weights.map((weight) => toDb(Math.log(weight))),
  };
}

/** The gate's spectrum: its gain at k times the rate is |c_k|; null for `instant`. */
export function gateResponse(gate: Pulse, rateHz: number): Response | null {
  const shape = pulseShape(gate, rateHz);
  return shape === null ? null : product([constantResponse(Math.log(pulseArea(shape) * rateHz)), pulseResponse(shape)]);
}

/** The same gate with every length of it longer by a factor. */
export function stretchedGate(gate: Pulse, factor: number): Pulse {
  const longer = (width: PulseWidth): PulseWidth =>
    'seconds' in width ? { seconds: factor * width.seconds } : { share: factor * width.share };
  switch (gate.shape) {
    case 'instant':
    case 'linear':
      return gate;
    case 'rectangle':
    case 'triangle':
    case 'half-sine':
    case 'split':
      return { shape: gate.shape, width: longer(gate.width) };
    case 'raised-cosine':
    case 'trapezoid':
      return { shape: gate.shape, width: longer(gate.width), edge: longer(gate.edge) };
    case 'exponential':
      return { shape: gate.shape, width: longer(gate.width), decay: longer(gate.decay) };
  }
}
