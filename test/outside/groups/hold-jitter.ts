/** The noise of a hold whose edges jitter, over one zone, against the tone's own copy there. */
import { figuresOf } from '../case-spec';
import type { OutsideGroup } from '../group';

const split = '{ shape: split, width: 100 % }';

// Hold, zone, output frequency over the rate, dB; edges jitter by 1e−3 of the period. Of the zero-order hold it is 2π·f·σ.
const rows = [
  ['zero-order', 1, 0.2, -58.0158],
  ['zero-order', 2, 0.8, -45.9746],
  ['zero-order', 3, 1.2, -42.45278],
  ['50 %', 1, 0.2, -50.82575],
  ['25 %', 1, 0.2, -44.91275],
  ['50 %', 2, 0.8, -48.54903],
  [split, 2, 0.7, -49.86147],
  ['{ shape: raised-cosine, width: 100 % }', 1, 0.2, -55.43749],
] as const;

/** The group. */
export const holdJitter: OutsideGroup = {
  title: 'Jitter of holds',
  source: 'sums over edges and quadrature of the moving pulse, plain numerics',
  define: (tally) => {
    for (const [hold, zone, share, expected] of rows) {
      it(`is ${expected} dB in zone ${zone} for a hold of ${hold}, the tone at ${share} of the rate`, () => {
        const { snr } = figuresOf([
          'direction: generate',
          `wanted: { band: ${50 * (zone - 1)} kHz .. ${50 * zone} kHz }`,
          'rate: 100 kHz',
          `hold: ${hold}`,
          'jitter: 10 ns',
          `test-tone: { frequency: ${100 * share} kHz, level: 0 dBFS }`,
        ]);
        tally.decibels(-(snr ?? NaN), expected, 1e-4, `${hold}, zone ${zone}`);
      });
    }
  },
};
