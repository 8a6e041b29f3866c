/** The outside values of ladders and step responses, typed; where they stem from stands in the file itself. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { OutsideDesign } from './outside-filters';

/** Elements of an LC ladder for 1 Ω and 1 rad/s; doubly terminated: from the source on, with its load if the first is a shunt capacitor. */
export interface StoredLadder extends OutsideDesign {
  readonly elements: readonly number[];
  readonly loadOhm: number;
}

/** A step response: percent over the final value, then times in seconds at 1 rad/s. */
export interface StoredStep extends OutsideDesign {
  readonly overshootPercent: number;
  /** From 10 % to 90 %. */
  readonly rise: number;
  /** To 50 %. */
  readonly middle: number;
  /** Last crossing of 1 %, 0.1 %, 2^−13 and 2^−17. */
  readonly settled: readonly [number, number, number, number];
}

/** Resistor, capacitor to ground, and so on, with or without a load across the last capacitor. */
export interface StoredRcLadder {
  readonly ohms: readonly number[];
  readonly farads: readonly number[];
  readonly loadOhm: number | null;
  readonly polesRad: readonly number[];
  readonly gainAtZero: number;
  readonly halfPowerHz: number;
  readonly bandwidthHz: number;
}

/** What the file holds. */
export interface Circuits {
  readonly doublyTerminated: readonly StoredLadder[];
  /** From the resistor's end on. */
  readonly singlyTerminated: readonly Omit<StoredLadder, 'loadOhm'>[];
  readonly steps: readonly StoredStep[];
  readonly rcLadders: readonly StoredRcLadder[];
  /** For 1 Ω and 1 F. */
  readonly equalRcLadders: readonly {
    readonly sections: number;
    readonly poles: readonly number[];
    readonly halfPower: number;
    readonly delay: number;
  }[];
}

/** Reads them. */
export function readCircuits(): Circuits {
  return JSON.parse(readFileSync(join(import.meta.dirname, 'circuits.json'), 'utf8')) as Circuits;
}
