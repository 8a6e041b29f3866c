/** The proved maximum on twelve hard cases: few evaluations, a small gap, and never below a million plain samples. */
import assert from 'node:assert/strict';
import { assertWithin, provedGapDb, roundingDb } from '../../support/tolerance';
import { betweenPointsHz, twelveCases } from './twelve-cases';

const samples = 1_000_000;

describe('the proved maximum on twelve hard cases', () => {
  assert.equal(twelveCases.length, 12);

  for (const { name, prove, powerAt, powerThere } of twelveCases) {
    it(`takes at most 500 points and bounds to a gap of 0.001 dB: ${name}`, () => {
      const extreme = prove();
      assert.ok(extreme !== null);
      assert.ok(extreme.evaluations <= 500, `${extreme.evaluations} evaluations`);
      assert.ok(extreme.gapDb >= 0 && extreme.gapDb <= provedGapDb, `gap ${extreme.gapDb} dB`);
    });

    it(`is below none of a million samples, and reached where it says to within the gap: ${name}`, () => {
      let best = 0;
      for (let i = 0; i < samples; i += 1) {
        const power = powerAt((i + 0.5) / samples);
        if (power > best) best = power;
      }
      const extreme = prove()!;
      const provedDb = (extreme.logGain * 20) / Math.LN10;
      const bestDb = 10 * Math.log10(best);
      assert.ok(bestDb <= provedDb + roundingDb, `a sample of ${bestDb} dB above the proved ${provedDb} dB`);
      const lands = 'landsHz' in extreme ? Number(extreme.landsHz) : NaN;
      assertWithin(10 * Math.log10(powerThere(extreme.frequencyHz, lands)), provedDb, provedGapDb + roundingDb);
    });
  }

  it('finds the worst case that lies between the points of a 10,000-point grid', () => {
    const hidden = twelveCases.find(({ name }) => name.includes('10,000-point grid'))!;
    let grid = 0;
    for (let i = 0; i <= 10_000; i += 1) grid = Math.max(grid, hidden.powerAt(i / 10_000));
    const proved = hidden.prove()!;
    assert.ok(Math.abs(proved.frequencyHz - betweenPointsHz) < 1);
    assert.ok((proved.logGain * 20) / Math.LN10 > 10 * Math.log10(grid) + 30);
  });
});
