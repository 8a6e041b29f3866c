/** Noise bandwidths against residues at 100 digits, a published table, and closed forms. */
import assert from 'node:assert/strict';
import { designFilter, type FilterFamily } from '../../src/signal/families/design-filter';
import { realPole } from '../../src/signal/families/real-pole';
import { secondOrder } from '../../src/signal/families/second-order';
import type { Filter } from '../../src/signal/filter';
import { noiseBandwidth } from '../../src/signal/noise-bandwidth';
import { readFilterVectors } from '../reference/filter-vectors';
import { assertClose, assertWithin, filterRelative } from '../support/tolerance';

type Decibels = Partial<Record<'rippleDb' | 'attenuationDb', number>>;

function lowPass(
  family: FilterFamily,
  order: number,
  db: Decibels = {},
  cornerAt: 'half-power' | 'ripple' | 'stopband' = 'half-power',
): Filter {
  return designFilter({
    family,
    order,
    kind: 'lowpass',
    corners: 1,
    cornerAt,
    rippleDb: null,
    attenuationDb: null,
    gain: 1,
    ...db,
  });
}

function valueOf(filters: readonly Filter[]): number {
  const bandwidth = noiseBandwidth(filters);
  assert.ok(bandwidth.kind === 'finite');
  assert.ok(bandwidth.errorBound <= filterRelative * bandwidth.value);
  return bandwidth.value;
}

describe('noiseBandwidth', () => {
  it('is that of residues at 100 digits, up to order 20', () => {
    const { noiseBandwidths } = readFilterVectors();
    assert.equal(noiseBandwidths.length, 23);
    for (const { family, order, ripple, attenuation, bandwidth } of noiseBandwidths) {
      const db = {
        ...(ripple === undefined ? {} : { rippleDb: ripple }),
        ...(attenuation === undefined ? {} : { attenuationDb: attenuation }),
      };
      const cornerAt = family === 'inverse-chebyshev' ? 'stopband' : ripple === undefined ? 'half-power' : 'ripple';
      assertClose(valueOf([lowPass(family, order, db, cornerAt)]), bandwidth, filterRelative, `${family} ${order}`);
    }
  });

  it('is that of the published tables, relative to the half-power frequency', () => {
    // Source: checks of the trade, section 3.4: Butterworth and cascade columns from a public table of filter correction factors (all
    // rows identical to six digits); the Bessel entry of order 2 is printed as 1.56 and is 1.1536; the others from exact residues.
    const butterworth = [1.570796, 1.110721, 1.047198, 1.026172, 1.016641, 1.011515, 1.008442, 1.006455, 1.005095, 1.004124];
    const bessel = [1.570796, 1.153594, 1.073637, 1.046369, 1.038568, 1.038588, 1.041139, 1.044106, 1.046798, 1.049062];
    const legendre = [1.570796, 1.110721, 0.987389, 0.974435, 0.959441, 0.960825, 0.958317, 0.961044, 0.961252, 0.963769];
    const gaussian = [1.570796, 1.181575, 1.107819, 1.081989, 1.071821, 1.067648, 1.065878, 1.065106, 1.064761, 1.064604];
    for (const [family, column] of Object.entries({ butterworth, bessel, legendre, gaussian })) {
      column.forEach((expected, index) => {
        assertWithin(valueOf([lowPass(family as FilterFamily, index + 1)]), expected, 1e-6, `${family} ${index + 1}`);
      });
    }
  });

  it('of equal buffered resistors and capacitors is that of the published table', () => {
    // Source: the same table: over the corner of one stage, and half power over the corner of one stage.
    const overStage = [1.570796, 0.785398, 0.589049, 0.490874, 0.429515, 0.386563, 0.35435, 0.329039, 0.308474, 0.291337];
    const halfPower = [1, 0.643594, 0.509825, 0.434979, 0.385614, 0.349946, 0.322629, 0.300845, 0.282948, 0.267906];
    const overHalfPower = [1.570796, 1.220331, 1.155395, 1.128499, 1.113845, 1.104637, 1.098319, 1.093716, 1.090213, 1.087459];
    overStage.forEach((expected, index) => {
      const value = valueOf(Array.from({ length: index + 1 }, () => realPole(1)));
      assertWithin(value, expected, 1e-6);
      assertWithin(value / halfPower[index]!, overHalfPower[index]!, 5e-6);
    });
  });

  it('of rippled filters is relative to the 0 dB of their passband', () => {
    // Source: checks of the trade, section 3.4, over the end of the ripple; rows are orders 2 to 8.
    const columns: Readonly<Record<string, readonly number[]>> = {
      '0.01': [3.6672, 1.9642, 1.5039, 1.3114, 1.212, 1.1537, 1.1166],
      '0.1': [2.1444, 1.4418, 1.2326, 1.1417, 1.0937, 1.0653, 1.0471],
      '0.5': [1.4889, 1.1666, 1.0656, 1.0208, 0.997, 0.9828, 0.9736],
      '1': [1.2532, 1.0411, 0.9735, 0.9433, 0.9272, 0.9175, 0.9113],
      '3': [0.8642, 0.7737, 0.7442, 0.731, 0.7239, 0.7196, 0.7169],
    };
    for (const [ripple, column] of Object.entries(columns)) {
      column.forEach((expected, index) => {
        const filter = lowPass('chebyshev', index + 2, { rippleDb: Number(ripple) }, 'ripple');
        assertWithin(valueOf([filter]), expected, 6e-5, `${ripple} dB, order ${index + 2}`);
      });
    }
    const toHalfPower = [1.0292, 0.9509, 0.9245, 0.9124, 0.9059, 0.902, 0.8995];
    toHalfPower.forEach((expected, index) => {
      assertWithin(valueOf([lowPass('chebyshev', index + 2, { rippleDb: 1 })]), expected, 6e-5);
    });
    const toZeroHz = [1.6706, 1.1666, 1.1957, 1.0208, 1.1186, 0.9828, 1.0924];
    toZeroHz.forEach((expected, index) => {
      const filter = lowPass('chebyshev', index + 2, { rippleDb: 0.5 }, 'ripple');
      assertWithin(valueOf([filter]) / filter.gainAt.gain ** 2, expected, 6e-5);
    });
  });

  it('is endless for an even order of elliptic and inverse Chebyshev, and finite for an odd one', () => {
    // Source: checks of the trade, section 3.4: 1.035269, 1.027752 and 0.996881 times the half-power frequency.
    assertWithin(valueOf([lowPass('inverse-chebyshev', 3, { attenuationDb: 40 })]), 1.035269, 1e-6);
    assertWithin(valueOf([lowPass('elliptic', 3, { rippleDb: 0.1, attenuationDb: 40 })]), 1.027752, 1e-6);
    assertWithin(valueOf([lowPass('elliptic', 5, { rippleDb: 0.1, attenuationDb: 40 })]), 0.996881, 1e-6);
    const even = lowPass('elliptic', 4, { rippleDb: 0.1, attenuationDb: 40 });
    assert.equal(noiseBandwidth([even]).kind, 'endless');
    assert.equal(noiseBandwidth([lowPass('inverse-chebyshev', 2, { attenuationDb: 40 })]).kind, 'endless');
    assert.equal(noiseBandwidth([secondOrder('allpass', 1, 1)]).kind, 'endless');
    assert.equal(noiseBandwidth([]).kind, 'endless');
    assert.equal(noiseBandwidth([even, realPole(1000)]).kind, 'finite');
  });

  it('of a resonance is π/2·f₀/Q, however sharp, wherever it stands', () => {
    // Closed form of the band-pass section, π/2 times its half-power width.
    for (const q of [0.1, 0.5, 3, 1e5]) {
      for (const frequency of [1e-3, 1e9]) {
        assertClose(valueOf([secondOrder('bandpass', frequency, q)]), ((Math.PI / 2) * frequency) / q, filterRelative, `Q ${q}`);
      }
    }
  });
});
