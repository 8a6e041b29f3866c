/** Tests of the mapping between values and pixels. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { toPixel, toValue } from '../../src/drawing/axis-scale';

describe('axis scale', () => {
  it('puts the ends of an axis on its ends, either way round', () => {
    const level = { low: -140, high: 0, kind: 'linear', from: 300, to: 100 } as const;
    assert.equal(toPixel(level, -140), 300);
    assert.equal(toPixel(level, 0), 100);
    assert.equal(toPixel(level, -70), 200);
  });

  it('gives every decade the same width on a logarithmic axis', () => {
    const scale = { low: 10, high: 1e6, kind: 'log', from: 0, to: 500 } as const;
    assert.deepEqual(
      [10, 100, 1e3, 1e6].map((f) => Math.round(toPixel(scale, f))),
      [0, 100, 200, 500],
    );
  });

  it('puts 0 Hz far off the low end of a logarithmic axis, but not infinitely far', () => {
    const scale = { low: 10, high: 1e6, kind: 'log', from: 0, to: 500 } as const;
    assert.ok(toPixel(scale, 0) <= -500);
    assert.ok(Number.isFinite(toPixel(scale, 0)));
  });

  it('comes back to the value it started from', () => {
    const kinds = fc.constantFrom('log' as const, 'linear' as const);
    const property = fc.property(kinds, fc.double({ min: 0.01, max: 0.99, noNaN: true }), (kind, share) => {
      const scale = { low: 5, high: 3e6, kind, from: 54, to: 700 };
      const value = 5 + share * (3e6 - 5);
      return Math.abs(toValue(scale, toPixel(scale, value)) / value - 1) < 1e-9;
    });
    fc.assert(property, { seed: 51_200 });
  });
});
