/** What the sampling of a relay channel weighs each copy by: a gate by a constant, a hold by its spectrum, track and hold by both. */
import { logGateWeight } from '../../signal/pulses/gate';
import { pulseArea } from '../../signal/pulses/pulse-area';
import { pulseResponse } from '../../signal/pulses/pulse-response';
import type { PulseShape } from '../../signal/pulses/pulse-shape';
import type { TrackAndHold } from '../../signal/pulses/track-and-hold';
import { trackAndHoldCopy, trackAndHoldRemainder } from '../../signal/pulses/track-and-hold-copy';
import { rectangleResponse } from '../../signal/pulses/rectangle';
import { constantResponse, product } from '../../signal/response-algebra';
import type { Response } from '../../signal/response';
import type { Channel, Gate } from '../../spec/channel';
import { pulseShape, widthSeconds } from '../pulse-shape';

/** A weight: a constant times a response over the output frequency, null where that is flat. */
export interface Weight {
  readonly log: number;
  readonly atOutput: Response | null;
}

/** The weights of all copies of a channel. */
export interface RelayWeights {
  readonly kind: 'natural' | 'flat-top' | 'track-and-hold';
  /** Copy k over f_o ≥ 0, the input standing at f_o − k·rate. For f_o < 0 ask for copy −k at −f_o. */
  copy(k: number): Weight;
  /** What bounds every copy with |k| ≥ first. */
  boundFrom(first: number): Weight;
  /** What bounds every copy, the wanted path included. */
  readonly most: Weight;
  /** What the weights come to as k grows without end; null where they come to nothing. */
  readonly limit: Weight | null;
  /** 0 where the gate never closes, so that there are no copies; else Infinity. */
  readonly lastCopy: number;
}

/** The weights of a relay channel at a rate. */
export function relayWeights(channel: Pick<Channel, 'pulse' | 'gate'>, rateHz: number): RelayWeights {
  const { gate } = channel;
  if (gate === null) return flatTop(pulseShape(channel.pulse, rateHz), rateHz);
  if (gate.kind === 'track') {
    const track = trackAndHoldOf(gate.track, rateHz);
    return track.trackShare >= 1 ? open : trackAndHold(track);
  }
  const shape = pulseShape(gate.pulse, rateHz);
  return shape === null || neverCloses(shape, rateHz) ? open : natural(shape, rateHz);
}

/** A track and hold at a rate. */
export function trackAndHoldOf(track: Extract<Gate, { kind: 'track' }>['track'], rateHz: number): TrackAndHold {
  return { trackShare: Math.min(1, widthSeconds(track, rateHz) * rateHz), periodSeconds: 1 / rateHz };
}

/** Whether a gate is open all the time. */
function neverCloses(shape: PulseShape, rateHz: number): boolean {
  return shape.shape === 'rectangle' && Math.abs(shape.widthSeconds * rateHz - 1) <= 1e-12;
}

const nothing: Weight = { log: -Infinity, atOutput: null };

const unweakened: Weight = { log: 0, atOutput: null };

/** A gate that never closes passes everything as it is. */
const open: RelayWeights = {
  kind: 'natural',
  copy: (k) => (k === 0 ? unweakened : nothing),
  boundFrom: () => nothing,
  most: unweakened,
  limit: null,
  lastCopy: 0,
};

function natural(shape: PulseShape, rateHz: number): RelayWeights {
  const response = pulseResponse(shape);
  const wantedLog = Math.log(pulseArea(shape) * rateHz);
  return {
    kind: 'natural',
    copy: (k) => ({ log: logGateWeight(shape, rateHz, k), atOutput: null }),
    boundFrom: (first) => ({ log: wantedLog + response.bounds(first * rateHz, Infinity).high, atOutput: null }),
    // No pulse of one sign weighs anything by more than its area.
    most: { log: wantedLog, atOutput: null },
    limit: null,
    lastCopy: Infinity,
  };
}

function flatTop(shape: PulseShape | null, rateHz: number): RelayWeights {
  const weight: Weight =
    shape === null ? { log: 0, atOutput: null } : { log: Math.log(pulseArea(shape) * rateHz), atOutput: pulseResponse(shape) };
  return { kind: 'flat-top', copy: () => weight, boundFrom: () => weight, most: weight, limit: weight, lastCopy: Infinity };
}

function trackAndHold(gate: TrackAndHold): RelayWeights {
  const held = 1 - gate.trackShare;
  return {
    kind: 'track-and-hold',
    copy: (k) => ({ log: 0, atOutput: trackAndHoldCopy(gate, k) }),
    boundFrom: (first) => ({ log: 0, atOutput: trackAndHoldRemainder(gate, first) }),
    // What is tracked and what is held fill a period, each at most as high as the input.
    most: unweakened,
    limit: { log: Math.log(held), atOutput: rectangleResponse(held * gate.periodSeconds) },
    lastCopy: Infinity,
  };
}

/** A weight as one response over the output frequency. */
export function weightResponse({ log, atOutput }: Weight): Response {
  if (atOutput === null) return constantResponse(log);
  return log === 0 ? atOutput : product([constantResponse(log), atOutput]);
}
