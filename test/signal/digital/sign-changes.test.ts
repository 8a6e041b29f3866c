/** Changes of sign of trigonometric sums, against sums that are made from their own roots and against a plain scan. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { signChanges } from '../../../src/signal/digital/sign-changes';
import { TrigonometricSum } from '../../../src/signal/digital/trigonometric-sum';
import { TurningRange } from '../../../src/signal/digital/turning-range';
import { assertWithin } from '../../support/tolerance';

const cosines = (...sizes: readonly number[]): TrigonometricSum =>
  new TrigonometricSum(sizes.map((cosine, order) => ({ order, cosine, sine: 0 })));

const sums = fc
  .array(fc.tuple(fc.integer({ min: -100, max: 100 }), fc.integer({ min: -100, max: 100 })), { minLength: 2, maxLength: 15 })
  .map((pairs) => new TrigonometricSum(pairs.map(([cosine, sine], order) => ({ order, cosine, sine }))));

/** Places on a grid off every simple fraction. */
const grid = Array.from({ length: 3000 }, (_, i) => (0.5 * (i + 0.3183)) / 3000);

describe('signChanges', () => {
  it('finds the roots of a cosine of high order, all of them and no others', () => {
    const found = signChanges(new TrigonometricSum([{ order: 40, cosine: 3, sine: 0 }]));
    assert.equal(found.length, 40);
    found.forEach((x, index) => {
      assertWithin(x, (2 * index + 1) / 160, 1e-14);
    });
  });

  it('tells two roots apart that lie close together, and passes over a double one', () => {
    // (cos 2πx − c)(cos 2πx − d) = 1/2 + c·d − (c + d)·cos 2πx + cos(4πx)/2.
    const made = (x: number, y: number): TrigonometricSum => {
      const [c, d] = [Math.cos(2 * Math.PI * x), Math.cos(2 * Math.PI * y)];
      return cosines(0.5 + c * d, -(c + d), 0.5);
    };
    const close = signChanges(made(0.2, 0.20001));
    assert.equal(close.length, 2);
    assertWithin(close[0]!, 0.2, 1e-10);
    assertWithin(close[1]!, 0.20001, 1e-10);
    // cos²(2πx): touches 0 at 1/4.
    assert.equal(signChanges(cosines(0.5, 0, 0.5)).length % 2, 0);
  });

  it('finds every change that a scan of random sums shows', () => {
    const property = fc.property(sums, (sum) => {
      const found = signChanges(sum);
      grid.slice(1).forEach((x, index) => {
        const before = grid[index]!;
        const [from, to] = [sum.at(before), sum.at(x)];
        if (Math.abs(from) < 1e-9 || Math.abs(to) < 1e-9) return;
        const inside = found.filter((place) => before < place && place < x).length;
        assert.equal(inside % 2, Math.sign(from) === Math.sign(to) ? 0 : 1, `between ${before} and ${x}`);
      });
    });
    fc.assert(property, { seed: 95, numRuns: 40 });
  });

  it('finds none in nothing, and none in a constant', () => {
    assert.deepEqual(signChanges(new TrigonometricSum([])), []);
    assert.deepEqual(signChanges(cosines(-2)), []);
  });
});

describe('TrigonometricSum', () => {
  it('has the derivative and the Taylor series that differences and values give', () => {
    const property = fc.property(sums, fc.double({ min: 0.01, max: 0.49, noNaN: true }), (sum, x) => {
      const step = 1e-6;
      const slope = (sum.at(x + step) - sum.at(x - step)) / (2 * step);
      assertWithin(sum.derivative().at(x), slope, 1e-4 * (1 + sum.size));
      const width = 1 / (2 * Math.PI * sum.highestOrder);
      const series = sum.taylor(x, width, 18);
      const value = series.reduce((total, coefficient, power) => total + coefficient * 0.7 ** power, 0);
      assertWithin(value, sum.at(x + 0.7 * width), 1e-12 * (1 + sum.size));
    });
    fc.assert(property, { seed: 96, numRuns: 60 });
  });
});

describe('TurningRange', () => {
  it('is the range that a scan shows, over random intervals', () => {
    const part = fc.double({ min: 0, max: 0.5, noNaN: true });
    const property = fc.property(sums, part, part, (sum, one, other) => {
      const [low, high] = [Math.min(one, other), Math.max(one, other)];
      const range = new TurningRange(sum).over(low, high);
      const values = Array.from({ length: 2001 }, (_, i) => sum.at(low + ((high - low) * i) / 2000));
      assert.ok(range.low <= Math.min(...values) && Math.max(...values) <= range.high);
      // Between places of the scan a sum can gain at most step²/8 times its curvature.
      const gain = (((high - low) / 2000) ** 2 / 8) * sum.size * (2 * Math.PI * sum.highestOrder) ** 2 + 1e-11 * sum.size;
      assertWithin(range.low, Math.min(...values), gain);
      assertWithin(range.high, Math.max(...values), gain);
    });
    fc.assert(property, { seed: 97, numRuns: 60 });
  });
});
