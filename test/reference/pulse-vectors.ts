/** The stored expected values of pulses, gates and track and hold, typed. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { PulseShape } from '../../src/signal/pulses/pulse-shape';

/** f times the width, |P|, phase in rad and delay over the width; the last two are null at a null. */
type PulseRow = readonly [x: number, size: number, phase: number | null, delay: number | null];

/** One pulse of width 1; `extra` is its edge or time constant. */
export interface PulseVector {
  readonly shape: Exclude<PulseShape['shape'], 'linear'>;
  readonly extra: number | null;
  readonly area: number;
  readonly energy: number;
  readonly rows: readonly PulseRow[];
}

/** One tracked share: weights by copy and input frequency (period 1), and delays of the wanted path. */
interface TrackVector {
  readonly trackShare: number;
  readonly rows: readonly (readonly [copy: number, inputHz: number, re: number, im: number])[];
  readonly delays: readonly (readonly [frequencyHz: number, seconds: number])[];
}

/** What make-pulse-vectors.py writes. */
export interface PulseVectors {
  readonly versions: { readonly mpmath: string };
  readonly pulses: readonly PulseVector[];
  readonly trackAndHold: readonly TrackVector[];
}

/** One shape of the outside table: |P|/T over f/fs. */
export interface HoldTable {
  readonly shape: string;
  readonly duty?: number;
  readonly duty_each?: number;
  readonly fwhm?: number;
  readonly ramp?: number;
  readonly rolloff?: number;
  readonly table: readonly (readonly [x: number, size: number])[];
}

/** The outside table of holds: closed forms at 50 digits, each asserted against quadrature of its waveform. */
export interface HoldTables {
  readonly shapes: readonly HoldTable[];
  readonly trains: readonly { readonly duty: number; readonly c: readonly (readonly [k: number, re: number, im: number])[] }[];
  readonly spots: Readonly<Record<string, number>>;
}

/** The script that makes them. */
export const pulseVectorScript = join(import.meta.dirname, 'make-pulse-vectors.py');

/** Reads a file of vectors; the stored one unless another is named. */
export function readPulseVectors(path = join(import.meta.dirname, 'pulse-vectors.json')): PulseVectors {
  return read(path) as PulseVectors;
}

/** The outside table. */
export function readHolds(): HoldTables {
  return read(join(import.meta.dirname, 'holds.json')) as HoldTables;
}

function read(path: string): unknown {
  return JSON.parse(readFileSync(path, 'utf8'));
}

/** The shape that a vector is of, at a width. */
export function vectorShape({ shape, extra }: PulseVector, widthSeconds = 1): PulseShape {
  switch (shape) {
    case 'raised-cosine':
    case 'trapezoid':
      return { shape, widthSeconds, edgeSeconds: (extra ?? 0) * widthSeconds };
    case 'exponential':
      return { shape, widthSeconds, decaySeconds: (extra ?? 0) * widthSeconds };
    default:
      return { shape, widthSeconds };
  }
}
