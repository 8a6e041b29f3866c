/** How much the power gain of filters in series can still go up and down above a frequency. */
import { filterResponse, type Filter } from '../filter';

/**
 * A bound of the total variation of |H|² over [from, ∞): of a product, the sum of each factor's variation times the largest of the others.
 *
 * A factor whose turning points are known varies by its steps between them. Of another no more is known than that |H|² turns at most once
 * for each of its roots, and that each turn costs at most twice its largest value.
 *
 * @param filters none vary by nothing.
 * @param fromHz ≥ 0.
 * Source: elementary.
 * @example remainingVariation([realPole(1000)], 3000) // 0.1
 */
export function remainingVariation(filters: readonly Filter[], fromHz: number): number {
  const factors = filters.map((filter) => factorOf(filter, fromHz));
  return factors.reduce(
    (sum, { variation }, index) =>
      sum + factors.reduce((term, { largest }, other) => (other === index ? term : term * largest), variation),
    0,
  );
}

function factorOf(filter: Filter, fromHz: number): { readonly variation: number; readonly largest: number } {
  const response = filterResponse(filter);
  const power = (frequencyHz: number): number => Math.exp(2 * response.logGain(frequencyHz));
  if (filter.turnsHz === null) {
    const largest = Math.exp(2 * response.bounds(fromHz, Infinity).high);
    return { largest, variation: 2 * largest * (filter.poles.length + filter.zeros.length) };
  }
  const values = [fromHz, ...filter.turnsHz.filter((turn) => turn > fromHz), Infinity].map(power);
  const variation = values.slice(1).reduce((sum, value, index) => sum + Math.abs(value - (values[index] ?? value)), 0);
  return { largest: Math.max(...values), variation };
}
