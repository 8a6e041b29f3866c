/** What low-pass families share: the check of their arguments, and poles laid out by evenly spaced angles. */
import type { Root } from '../sections';

/** Throws unless the order is a whole number from 1 and the corner a finite frequency above 0. */
export function checkFamily(order: number, cornerHz: number): void {
  if (!Number.isInteger(order) || order < 1) throw new RangeError(`An order must be a whole number from 1, not ${order}.`);
  if (!(cornerHz > 0) || !Number.isFinite(cornerHz))
    throw new RangeError(`A corner must be a frequency above 0 Hz, not ${cornerHz}.`);
}

/** Throws unless a ripple or an attenuation is a finite number of dB above 0. */
export function checkDb(what: string, db: number): void {
  if (!(db > 0) || !Number.isFinite(db)) throw new RangeError(`The ${what} must be above 0 dB, not ${db}.`);
}

/**
 * ε of a ripple or an attenuation: √(10^(dB/10) − 1).
 *
 * @param db > 0.
 * @example epsilonOf(40) // 99.9949999
 */
export function epsilonOf(db: number): number {
  return Math.sqrt(Math.expm1((db * Math.LN10) / 10));
}

/**
 * Poles at the angles π(2i + 1)/(2·order) from the imaginary axis: the upper half as `poleAt` places it, its mirror image, and the real one.
 *
 * @param order whole, ≥ 1.
 * @param poleAt the pole in Hz at an angle in radians, 0 … π/2.
 * @example mirrored(3, (angle) => ({ re: -Math.sin(angle), im: Math.cos(angle) })).length // 3
 */
export function mirrored(order: number, poleAt: (angle: number) => Root): readonly Root[] {
  const poles: Root[] = [];
  for (let i = 0; 2 * i + 1 < order; i += 1) {
    const pole = poleAt((Math.PI * (2 * i + 1)) / (2 * order));
    poles.push(pole, { re: pole.re, im: -pole.im });
  }
  if (order % 2 === 1) poles.push({ re: poleAt(Math.PI / 2).re, im: 0 });
  return poles;
}
