/** The edges of a hold, where its wave steps: what jitter displaces each on its own. */
import { foldFrequency } from '../signal/folding';
import type { PulseShape } from '../signal/pulses/pulse-shape';
import type { Pulse } from '../spec/channel';
import { pulseShape } from './pulse-shape';

/** Edges this near each other, in periods, are one edge of the clock. */
const together = 1e-9;

/** A step of the pulse, in shares of its height, and when, in periods from its start. */
interface Step {
  readonly size: number;
  readonly at: number;
}

/**
 * Σ⟨s²⟩ over the edges of one period, over the power of a tone before the hold; null for a hold that does not step, which moves as a whole.
 *
 * Where the end of one pulse and the start of another are the same edge of the clock their steps add before they are squared: a zero-order
 * hold has 4·sin²(πf/fs), a narrower rectangle 2, a full-width `split` 4·(1 + cos²(πf/fs)), a narrower one 6. The decay of an `exponential`
 * is left out, which overstates its noise: it moves along with the edge that starts it.
 */
export function edgePower(pulse: Pulse, rateHz: number, toneHz: number): number | null {
  const shape = pulseShape(pulse, rateHz);
  const steps = shape === null ? [] : stepsOf(shape, rateHz);
  if (steps.length === 0) return null;
  const turn = (2 * Math.PI * foldFrequency(toneHz, rateHz).landsHz) / rateHz;
  return edgesOf(steps).reduce((sum, edge) => sum + powerOf(edge, turn), 0);
}

function stepsOf(shape: PulseShape, rateHz: number): readonly Step[] {
  if (shape.shape === 'linear') return [];
  const end = shape.widthSeconds * rateHz;
  switch (shape.shape) {
    case 'rectangle':
      return [
        { size: 1, at: 0 },
        { size: -1, at: end },
      ];
    case 'split':
      return [
        { size: 1, at: 0 },
        { size: -2, at: end / 2 },
        { size: 1, at: end },
      ];
    case 'exponential':
      return [
        { size: 1, at: 0 },
        { size: -Math.exp(-shape.widthSeconds / shape.decaySeconds), at: end },
      ];
    case 'trapezoid':
    case 'raised-cosine':
      return shape.edgeSeconds === 0 ? stepsOf({ shape: 'rectangle', widthSeconds: shape.widthSeconds }, rateHz) : [];
    case 'triangle':
    case 'half-sine':
      return [];
  }
}

/** Steps of neighbouring pulses that happen whole periods apart are on one edge. */
function edgesOf(steps: readonly Step[]): readonly (readonly Step[])[] {
  const edges: Step[][] = [];
  for (const step of steps) {
    const shared = edges.find(([first]) => first !== undefined && isWhole(step.at - first.at));
    if (shared === undefined) edges.push([step]);
    else shared.push(step);
  }
  return edges;
}

function isWhole(periods: number): boolean {
  return Math.abs(periods - Math.round(periods)) <= together;
}

/** |Σ size·e^{−jθ·periods}|². */
function powerOf(edge: readonly Step[], turn: number): number {
  const re = edge.reduce((sum, { size, at }) => sum + size * Math.cos(turn * at), 0);
  const im = edge.reduce((sum, { size, at }) => sum + size * Math.sin(turn * at), 0);
  return re * re + im * im;
}
