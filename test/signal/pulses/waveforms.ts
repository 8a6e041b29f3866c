/** Every pulse as a function of time, transformed numerically: what its spectrum is held to, without any closed form of it. */
import fc from 'fast-check';
import type { PulseShape } from '../../../src/signal/pulses/pulse-shape';

const lengths = fc.double({ min: -2, max: 1, noNaN: true }).map((x) => 10 ** x);
const shares = fc.double({ min: 0.01, max: 0.5, noNaN: true });

/** Any pulse of 10 ms to 10 s. */
export const everyShape: fc.Arbitrary<PulseShape> = fc.oneof(
  fc.record({ shape: fc.constantFrom('rectangle', 'triangle', 'half-sine', 'split'), widthSeconds: lengths }),
  fc
    .tuple(fc.constantFrom('raised-cosine', 'trapezoid'), lengths, shares)
    .map(([shape, widthSeconds, share]): PulseShape => ({ shape, widthSeconds, edgeSeconds: share * widthSeconds })),
  fc.tuple(lengths, fc.double({ min: -1, max: 3, noNaN: true })).map(([widthSeconds, decade]): PulseShape => ({
    shape: 'exponential',
    widthSeconds,
    decaySeconds: 10 ** decade * widthSeconds,
  })),
  fc.record({ shape: fc.constant('linear'), periodSeconds: lengths }),
);

/** How long a pulse lasts. */
export function widthOf(shape: PulseShape): number {
  return shape.shape === 'linear' ? 2 * shape.periodSeconds : shape.widthSeconds;
}

/** p(t) at height 1, inside its width. */
export function waveform(shape: PulseShape, t: number): number {
  const width = widthOf(shape);
  const fromEdge = Math.min(t, width - t);
  switch (shape.shape) {
    case 'rectangle':
      return 1;
    case 'triangle':
    case 'linear':
      return (2 * fromEdge) / width;
    case 'half-sine':
      return Math.sin((Math.PI * t) / width);
    case 'split':
      return t < 0.5 * width ? 1 : -1;
    case 'trapezoid':
      return Math.min(1, fromEdge / shape.edgeSeconds);
    case 'raised-cosine':
      return fromEdge < shape.edgeSeconds ? 0.5 - 0.5 * Math.cos((Math.PI * fromEdge) / shape.edgeSeconds) : 1;
    case 'exponential':
      return Math.exp(-t / shape.decaySeconds);
  }
}

/** Total variation at height 1, the steps at both ends included. */
export function variation(shape: PulseShape): number {
  return shape.shape === 'split' ? 4 : 2;
}

/** ∫ p(t)·e^(−j2πft) dt: 5-point Gauss on 64 slices of each smooth piece. */
export function transform(shape: PulseShape, frequencyHz: number): { readonly re: number; readonly im: number } {
  let re = 0;
  let im = 0;
  const cuts = cutsOf(shape);
  cuts.slice(1).forEach((end, index) => {
    const start = cuts[index] ?? 0;
    const half = (end - start) / (2 * slices);
    for (let slice = 0; slice < slices; slice += 1) {
      for (const [node, weight] of gauss5) {
        const t = start + half * (2 * slice + 1 + node);
        const value = half * weight * waveform(shape, t);
        re += value * Math.cos(2 * Math.PI * frequencyHz * t);
        im -= value * Math.sin(2 * Math.PI * frequencyHz * t);
      }
    }
  });
  return { re, im };
}

const slices = 64;

/** Abramowitz and Stegun, table 25.4. */
const gauss5 = [
  [0, 128 / 225],
  [Math.sqrt(5 - 2 * Math.sqrt(10 / 7)) / 3, (322 + 13 * Math.sqrt(70)) / 900],
  [-Math.sqrt(5 - 2 * Math.sqrt(10 / 7)) / 3, (322 + 13 * Math.sqrt(70)) / 900],
  [Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3, (322 - 13 * Math.sqrt(70)) / 900],
  [-Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3, (322 - 13 * Math.sqrt(70)) / 900],
] as const;

/** Where a waveform is not smooth. */
function cutsOf(shape: PulseShape): readonly number[] {
  const width = widthOf(shape);
  if ('edgeSeconds' in shape) return [0, shape.edgeSeconds, width - shape.edgeSeconds, width];
  return [0, 0.5 * width, width];
}
