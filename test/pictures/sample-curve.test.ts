/** Tests of sampling a curve: few points, and none of them missing where it matters. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { levelAt } from '../../src/drawing/level-at';
import { mostPoints, sampleCurve } from '../../src/pictures/sample-curve';

const common = { lowHz: 0, highHz: 1e6, through: [], floor: -140, tolerance: 0.05 };

/** Magnitude of an ideal hold at 100 kHz, in dB: sin(πx)/(πx), nulls at every multiple. */
function hold(f: number): number {
  const x = (Math.PI * f) / 100e3;
  return x === 0 ? 0 : 20 * Math.log10(Math.abs(Math.sin(x) / x));
}

describe('sampling a curve', () => {
  it('gives a rising list of points from end to end', () => {
    const { x } = sampleCurve(hold, common);
    assert.deepEqual([x[0], x[x.length - 1]], [0, 1e6]);
    assert.ok(x.every((value, index) => index === 0 || value > (x[index - 1] ?? 0)));
  });

  it('stays near the curve between its points, above the floor', () => {
    const through = Array.from({ length: 10 }, (_, index) => (index + 1) * 100e3);
    const points = sampleCurve(hold, { ...common, through });
    const property = fc.property(fc.double({ min: 1, max: 1e6, noNaN: true }), (f) => {
      const exact = hold(f);
      return exact < -60 || Math.abs(levelAt(points, f) - exact) < 0.5;
    });
    fc.assert(property, { seed: 100, numRuns: 2000 });
  });

  it('draws a low-pass to a few hundredths of a dB on both kinds of axis', () => {
    const lowpass = (f: number): number => -10 * Math.log10(1 + (f / 14e3) ** 8);
    const points = sampleCurve(lowpass, common);
    for (let f = 1; f < 4e5; f *= 1.01) assert.ok(Math.abs(levelAt(points, f) - lowpass(f)) < 0.11, `${f}`);
  });

  it('goes exactly through the points it is told to', () => {
    const { x, y } = sampleCurve(hold, { ...common, through: [41_234.5, 2e6] });
    assert.equal(y[x.indexOf(41_234.5)], hold(41_234.5));
    assert.ok(!x.includes(2e6));
  });

  it('never has more points than allowed, however wild the curve', () => {
    const wild = (f: number): number => 100 * Math.sin(f * f);
    assert.ok(sampleCurve(wild, { ...common, tolerance: 1e-9 }).x.length <= mostPoints);
  });

  it('spends few points on a straight line', () => {
    assert.ok(sampleCurve(() => -3, common).x.length < 60);
  });

  it('writes a null as a finite number, since JSON has no infinity', () => {
    const { y } = sampleCurve((f) => (f === 5e5 ? -Infinity : NaN), { ...common, through: [5e5] });
    assert.ok(y.every((value) => Number.isFinite(value)));
  });

  it('gives one point for a stretch without width', () => {
    assert.deepEqual(
      sampleCurve(() => 1, { ...common, lowHz: 5, highHz: 5 }),
      { x: [5], y: [1] },
    );
  });
});
