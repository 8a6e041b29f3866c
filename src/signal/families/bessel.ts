/** Bessel low-pass filters: maximally flat group delay, poles from a stored table. */
import type { Filter } from '../filter';
import { besselPoles } from './bessel-poles';
import { checkFamily } from './low-pass';

/** What the corner frequency names: the half-power point, or 1/(2π·delay) of the delay at 0 Hz. */
export type BesselCorner = 'half-power' | 'delay';

/**
 * A Bessel low-pass filter: 1/θ(s), θ the reverse Bessel polynomial of the order.
 *
 * @param order whole, 1 … 20.
 * @param cornerHz > 0, in Hz.
 * @param cornerAt what `cornerHz` names; the two are the further apart, the higher the order.
 * @returns gain 1 at 0 Hz; falls everywhere.
 * Source: W. E. Thomson, "Delay networks having maximally flat frequency characteristics", Proc. IEE 96 (1949) 487–490; poles from
 * 90-digit arithmetic (scripts/make-bessel-poles.py).
 * @example groupDelay(bessel(4, 1 / (2 * Math.PI), 'delay'), 0) // 1
 */
export function bessel(order: number, cornerHz: number, cornerAt: BesselCorner): Filter {
  checkFamily(order, cornerHz);
  const entry = besselPoles[order - 1];
  if (entry === undefined) throw new RangeError(`Bessel filters are kept up to order ${besselPoles.length}, not ${order}.`);
  const scale = cornerAt === 'delay' ? cornerHz : cornerHz / entry.halfPower;
  const poles = entry.poles.flatMap(([re, im]) => {
    const pole = { re: re * scale, im: im * scale };
    return im === 0 ? [pole] : [pole, { re: pole.re, im: -pole.im }];
  });
  return { poles, zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] };
}
