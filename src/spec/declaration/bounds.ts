/** The range of sense for every unit: what lies outside is an error in the text, never a long wait. */
import type { Bounds, UnitBounds } from '../shape';
import type { Unit } from '../../units/quantity';

const frequency: Bounds = { low: 1e-9, high: 1e15 };
const voltage: Bounds = { low: 1e-12, high: 1e6 };
const decibels: Bounds = { low: -400, high: 400 };

/** The usual bounds, in base units; a key may have narrower ones. Temperatures, angles and decibels may be negative, nothing else. */
export const unitBounds: Readonly<Record<Unit, Bounds>> = {
  Hz: frequency,
  'S/s': frequency,
  s: { low: 1e-15, high: 1e9 },
  V: voltage,
  Vrms: voltage,
  Vpk: voltage,
  Vpp: voltage,
  dBFS: decibels,
  dBc: decibels,
  dBV: decibels,
  dBu: decibels,
  dBm: decibels,
  dB: decibels,
  'V/V': { low: 1e-12, high: 1e12 },
  '%': { low: 0, high: 10 },
  ppm: { low: 0, high: 10 },
  'V/√Hz': { low: 1e-18, high: 1e3 },
  'dBFS/√Hz': decibels,
  'dBm/Hz': decibels,
  'dB/decade': { low: -1000, high: 1000 },
  LSB: { low: 1e-6, high: 1e9 },
  Ω: { low: 1e-6, high: 1e12 },
  F: { low: 1e-18, high: 1e3 },
  H: { low: 1e-15, high: 1e6 },
  deg: { low: -1e4, high: 1e4 },
  '°C': { low: -273.15, high: 1e4 },
};

/** Frequencies where 0 Hz makes sense too. */
export const frequencyOrZero: UnitBounds = { Hz: { ...frequency, zero: true } };

/** Times where none at all makes sense too. */
export const timeOrZero: UnitBounds = { s: { ...unitBounds.s, zero: true } };

/** How far a tolerance may reach: a value cannot shrink to nothing. */
export const toleranceBounds = { low: -0.99, high: 10, perKelvin: 0.01 };

/** Orders of a filter; up to this one poles are proved exact. */
export const orders: readonly [number, number] = [1, 20];

/** Word lengths of a converter. */
export const wordLengths: readonly [number, number] = [1, 32];

/** What a clock may be divided or multiplied by. */
export const dividers: readonly [number, number] = [1, 1_000_000_000];

/** The ripple of a filter family in dB. */
export const ripples: UnitBounds = { dB: { low: 1e-4, high: 20 } };

/** The least loss of a stop band in dB. */
export const attenuations: UnitBounds = { dB: { low: 0.1, high: 300 } };

/** The Q of a section. */
export const qualities: readonly [number, number] = [1e-3, 1e6];

/** The gain of a stage. */
export const gains: UnitBounds = { '%': { low: 1e-6, high: 10 }, ppm: { low: 1e-6, high: 10 } };

/** Roots of a filter that is given by them: real and imaginary part. */
export const rootHz: readonly [number, number] = [1e-9, 1e15];

/** The most roots that one stage may list, conjugates counted. */
export const mostRoots = 40;

/** The highest harmonic of a source. */
export const harmonicNumbers: readonly [number, number] = [2, 1000];

/** Time slots on one link. */
export const slotCounts: readonly [number, number] = [1, 10_000];

/** The share by which a corner may be off. */
export const cornerShares: UnitBounds = { '%': { low: 0, high: 0.9 }, ppm: { low: 0, high: 0.9 } };

/** The width of a pulse as a share of the period; a hold may overlap the next. */
export const pulseShares: UnitBounds = { '%': { low: 1e-6, high: 2 }, ppm: { low: 1e-6, high: 2 } };

/** Limits in dB that are distances, so never below zero. */
export const distances: UnitBounds = { dB: { low: 1e-6, high: 200 } };

/** Margins in dB: zero is one. */
export const margins: UnitBounds = { dB: { low: 0, high: 200 } };

/** Full scale as a range may start below zero volts. */
export const fullScales: UnitBounds = { V: { low: -1e6, high: 1e6 }, Vpp: voltage };
