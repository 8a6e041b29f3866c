/** Noise bandwidths as public tables print them. */
import assert from 'node:assert/strict';
import type { FilterFamily } from '../../../src/signal/families/design-filter';
import { realPole } from '../../../src/signal/families/real-pole';
import type { Filter } from '../../../src/signal/filter';
import { noiseBandwidth } from '../../../src/signal/noise-bandwidth';
import type { OutsideGroup } from '../group';
import { filterOf } from '../outside-design';

function valueOf(filters: readonly Filter[]): number {
  const bandwidth = noiseBandwidth(filters);
  assert.ok(bandwidth.kind === 'finite');
  return bandwidth.value;
}

/** The group. */
export const printedBandwidths: OutsideGroup = {
  title: 'Printed noise bandwidths',
  source: 'public tables of correction factors (Butterworth, RC, Chebyshev); Bessel, Legendre, Gaussian from exact residues',
  define: (tally) => {
    it('is that of the published tables, relative to the half-power frequency', () => {
      // The Bessel entry of order 2 is printed as 1.56 elsewhere, and is 1.1536.
      const butterworth = [1.570796, 1.110721, 1.047198, 1.026172, 1.016641, 1.011515, 1.008442, 1.006455, 1.005095, 1.004124];
      const bessel = [1.570796, 1.153594, 1.073637, 1.046369, 1.038568, 1.038588, 1.041139, 1.044106, 1.046798, 1.049062];
      const legendre = [1.570796, 1.110721, 0.987389, 0.974435, 0.959441, 0.960825, 0.958317, 0.961044, 0.961252, 0.963769];
      const gaussian = [1.570796, 1.181575, 1.107819, 1.081989, 1.071821, 1.067648, 1.065878, 1.065106, 1.064761, 1.064604];
      for (const [family, column] of Object.entries({ butterworth, bessel, legendre, gaussian })) {
        column.forEach((expected, index) => {
          tally.absolute(
            valueOf([filterOf({ family: family as FilterFamily, order: index + 1 })]),
            expected,
            1e-6,
            `${family} ${index + 1}`,
          );
        });
      }
    });

    it('is not 1.56 of the half-power frequency for Bessel of order 2, as one table has it', () => {
      assert.ok(Math.abs(valueOf([filterOf({ family: 'bessel', order: 2 })]) - 1.56) > 0.4);
    });

    it('is finite for odd orders of the families with zeros, over the half-power frequency', () => {
      for (const [design, expected] of [
        [{ family: 'inverse-chebyshev', order: 3, attenuation: 40 }, 1.035269],
        [{ family: 'elliptic', order: 3, ripple: 0.1, attenuation: 40 }, 1.027752],
        [{ family: 'elliptic', order: 5, ripple: 0.1, attenuation: 40 }, 0.996881],
      ] as const) {
        tally.absolute(
          valueOf([filterOf(design, { cornerAt: 'half-power' })]),
          expected,
          5.001e-7,
          `${design.family} ${design.order}`,
        );
      }
    });

    it('of equal buffered resistors and capacitors is that of the published table', () => {
      // Over the corner of one stage, and half power over the corner of one stage.
      const overStage = [1.570796, 0.785398, 0.589049, 0.490874, 0.429515, 0.386563, 0.35435, 0.329039, 0.308474, 0.291337];
      const halfPower = [1, 0.643594, 0.509825, 0.434979, 0.385614, 0.349946, 0.322629, 0.300845, 0.282948, 0.267906];
      const overHalfPower = [1.570796, 1.220331, 1.155395, 1.128499, 1.113845, 1.104637, 1.098319, 1.093716, 1.090213, 1.087459];
      overStage.forEach((expected, index) => {
        const value = valueOf(Array.from({ length: index + 1 }, () => realPole(1)));
        tally.absolute(value, expected, 1e-6, `${index + 1} sections`);
        tally.absolute(value / halfPower[index]!, overHalfPower[index]!, 5e-6, `${index + 1} sections`);
      });
    });

    it('of rippled filters is relative to the 0 dB of their passband', () => {
      // Over the end of the ripple; rows are orders 2 to 8.
      const columns: Readonly<Record<string, readonly number[]>> = {
        '0.01': [3.6672, 1.9642, 1.5039, 1.3114, 1.212, 1.1537, 1.1166],
        '0.1': [2.1444, 1.4418, 1.2326, 1.1417, 1.0937, 1.0653, 1.0471],
        '0.5': [1.4889, 1.1666, 1.0656, 1.0208, 0.997, 0.9828, 0.9736],
        '1': [1.2532, 1.0411, 0.9735, 0.9433, 0.9272, 0.9175, 0.9113],
        '3': [0.8642, 0.7737, 0.7442, 0.731, 0.7239, 0.7196, 0.7169],
      };
      for (const [ripple, column] of Object.entries(columns)) {
        column.forEach((expected, index) => {
          const filter = filterOf({ family: 'chebyshev', order: index + 2, ripple: Number(ripple) });
          tally.absolute(valueOf([filter]), expected, 6e-5, `${ripple} dB, order ${index + 2}`);
        });
      }
      const toHalfPower = [1.0292, 0.9509, 0.9245, 0.9124, 0.9059, 0.902, 0.8995];
      toHalfPower.forEach((expected, index) => {
        tally.absolute(
          valueOf([filterOf({ family: 'chebyshev', order: index + 2, ripple: 1 }, { cornerAt: 'half-power' })]),
          expected,
          6e-5,
          `order ${index + 2} to half power`,
        );
      });
      const toZeroHz = [1.6706, 1.1666, 1.1957, 1.0208, 1.1186, 0.9828, 1.0924];
      toZeroHz.forEach((expected, index) => {
        const filter = filterOf({ family: 'chebyshev', order: index + 2, ripple: 0.5 });
        tally.absolute(valueOf([filter]) / filter.gainAt.gain ** 2, expected, 6e-5, `order ${index + 2} to 0 Hz`);
      });
    });
  },
};
