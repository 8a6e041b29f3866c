/** What displaced sampling instants add to the output of a relay, over the power of the tone that is sampled. */
import { alongCopy } from '../../signal/copy-axis';
import { frequencyWeight } from '../../signal/frequency-weight';
import { integratePower } from '../../signal/noise';
import { rectangleResponse } from '../../signal/pulses/rectangle';
import { constantResponse, product } from '../../signal/response-algebra';
import type { Enclosure, Response } from '../../signal/response';
import type { Channel } from '../../spec/channel';
import { edgePower } from '../hold-edges';
import type { RelayPath } from './relay-path';
import { relayWeights, trackAndHoldOf, weightResponse } from './weights';

/** What is asked. */
export interface JitterQuestion {
  readonly relay: Pick<RelayPath, 'rateHz' | 'weights'>;
  readonly channel: Pick<Channel, 'pulse' | 'gate'>;
  /** The output filter. */
  readonly output: Response;
  /** Where the noise counts as it leaves. */
  readonly bands: readonly Enclosure[];
  readonly toneHz: number;
  readonly sigmaSeconds: number;
}

/**
 * Noise power in the bands over the power of the tone at the sampler.
 *
 * A pulsed gate's edges are each displaced on their own, by as much as the tone steps there; one without steps moves as a whole. Where a
 * value is held, it is taken at the wrong time, (2πfσ)², which the hold shapes; the edges between held values step by themselves, which
 * only the filter shapes.
 */
export function jitterPower(question: JitterQuestion): number {
  const { gate } = question.channel;
  if (gate === null) return heldPower(question) + holdEdges(question);
  if (gate.kind === 'track') return heldPower(question) + trackEdges(question);
  if (question.relay.weights.lastCopy === 0) return 0;
  const edges = edgePower(gate.pulse, question.relay.rateHz, 0);
  return edges === null ? movingGate(question) : edgesOf(question, edges);
}

/** ∫ |response|² over the bands, over half the rate. */
function over({ relay, bands }: JitterQuestion, response: Response): number {
  return bands.reduce((sum, band) => sum + integratePower(response, band.low, band.high).value, 0) / (relay.rateHz / 2);
}

function edgesOf(question: JitterQuestion, edges: number): number {
  return over(question, question.output) * edges * (question.relay.rateHz * question.sigmaSeconds) ** 2;
}

function heldPower(question: JitterQuestion): number {
  const { relay, channel, output, toneHz, sigmaSeconds } = question;
  const { gate } = channel;
  const held =
    gate?.kind === 'track'
      ? heldShare(1 - trackAndHoldOf(gate.track, relay.rateHz).trackShare, relay.rateHz)
      : weightResponse(relay.weights.copy(0));
  return held === null ? 0 : over(question, product([held, output])) * (2 * Math.PI * toneHz * sigmaSeconds) ** 2;
}

/** The hold of a track and hold; null where it never holds. */
function heldShare(share: number, rateHz: number): Response | null {
  return share <= 0 ? null : product([constantResponse(Math.log(share)), rectangleResponse(share / rateHz)]);
}

function holdEdges(question: JitterQuestion): number {
  const { relay, channel, output, toneHz, sigmaSeconds } = question;
  if (channel.pulse.shape === 'instant') return 0;
  const edges = edgePower(channel.pulse, relay.rateHz, toneHz);
  if (edges !== null) return edgesOf(question, edges);
  const moving = product([frequencyWeight(), weightResponse(relay.weights.copy(0)), output]);
  return over(question, moving) * (2 * Math.PI * sigmaSeconds) ** 2;
}

/** When tracking begins the output steps by how far the tone has moved on while it was held; when it ends nothing steps. */
function trackEdges(question: JitterQuestion): number {
  const { relay, channel, toneHz } = question;
  if (channel.gate?.kind !== 'track') return 0;
  const heldSeconds = (1 - trackAndHoldOf(channel.gate.track, relay.rateHz).trackShare) / relay.rateHz;
  return edgesOf(question, 4 * Math.sin(Math.PI * toneHz * heldSeconds) ** 2);
}

/** The derivative of the gate times the tone: the two lines of the tone each carry it to both sides, (2πu)²·|G(u)|², u = f ± tone. */
function movingGate(question: JitterQuestion): number {
  const { relay, output, bands, toneHz, sigmaSeconds } = question;
  const derivative = product([frequencyWeight(), gateSpectrum(question)]);
  const below = { offsetHz: toneHz, direction: -1 } as const;
  const beside = { offsetHz: -toneHz, direction: 1 } as const;
  const above = { offsetHz: toneHz, direction: 1 } as const;
  const powerOf = (low: number, high: number, axis: Parameters<typeof alongCopy>[1]): number =>
    low < high ? integratePower(product([alongCopy(derivative, axis), output]), low, high).value : 0;
  const sum = bands.reduce(
    (total, { low, high }) =>
      total +
      powerOf(low, Math.min(high, toneHz), below) +
      powerOf(Math.max(low, toneHz), high, beside) +
      powerOf(low, high, above),
    0,
  );
  return (sum * (2 * Math.PI * sigmaSeconds) ** 2) / relay.rateHz;
}

/** The gate's own spectrum over the period: c_k between its multiples of the rate. */
function gateSpectrum({ channel, relay }: JitterQuestion): Response {
  return channel.gate?.kind === 'pulse'
    ? weightResponse(relayWeights({ pulse: channel.gate.pulse, gate: null }, relay.rateHz).copy(0))
    : constantResponse(-Infinity);
}
