/** The width of an ideal band that lets as much white noise through as a response does. */
import { integratePower } from '../signal/noise';
import { largestOverBands } from '../signal/search';
import type { Response } from '../signal/response';
import { relativeTo } from './channel-path';
import { halfPowerHz } from './half-power';

/** How many decades above half power are integrated: one pole leaves a share of 1e-9 beyond them. */
const decades = 9;

/** ∫ |H|² df over the largest |H|², in Hz; null where the response never falls to half power. */
export function noiseBandwidthHz(response: Response): number | null {
  const halfPower = halfPowerHz(response);
  const most = largestOverBands(response, [{ low: 0, high: Infinity }]);
  if (halfPower === null || most === null || halfPower === 0) return null;
  const relative = relativeTo(response, most.frequencyHz);
  const edges = Array.from({ length: decades + 1 }, (_, decade) => halfPower * 10 ** decade);
  return edges.reduce((sum, edge, index) => sum + integratePower(relative, edges[index - 1] ?? 0, edge).value, 0);
}
