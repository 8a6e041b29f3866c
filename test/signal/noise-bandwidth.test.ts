/** Noise bandwidths against residues at 100 digits, and closed forms. */
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

  it('is endless for an even order of elliptic and inverse Chebyshev, and finite for an odd one', () => {
    // From exact residues: 1.035269, 1.027752 and 0.996881 times the half-power frequency.
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
