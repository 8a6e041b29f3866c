/** The worst of a series resistor and coil and a shunt capacitor over their tolerances, against plain grids of parts. */
import assert from 'node:assert/strict';
import { measuredFrom } from '../../src/signal/pair-ratio';
import { ResonanceRatio, type PartFactors, type PartRanges } from '../../src/signal/resonance-ratio';
import { assertBoundsEnclose, assertSlopeEncloses } from '../support/enclosing';
import { assertWithin } from '../support/tolerance';

const [ohm, henry, farad] = [40, 1e-3, 100e-9];
const naturalHz = 1 / (2 * Math.PI * Math.sqrt(henry * farad));
const ranges: PartRanges = { r: { low: 0.9, high: 1.1 }, l: { low: 0.85, high: 1.12 }, c: { low: 0.8, high: 1.5 } };
const ratio = new ResonanceRatio(naturalHz, Math.sqrt(henry / farad) / ohm, ranges);

/** ln |H| by complex division of impedances. */
function logGain(frequencyHz: number, { r, l, c }: PartFactors): number {
  const w = 2 * Math.PI * frequencyHz;
  // 1/(jωC) over R + jωL + 1/(jωC), multiplied by jωC.
  return -Math.log(Math.hypot(1 - w * w * henry * l * farad * c, w * farad * c * ohm * r));
}

function onGrid(frequencyHz: number, referenceHz: number): number {
  let best = -Infinity;
  const steps = 60;
  const at = ({ low, high }: { low: number; high: number }, i: number): number => low + ((high - low) * i) / steps;
  for (let i = 0; i <= steps; i += 1) {
    for (let j = 0; j <= steps; j += 1) {
      for (const k of [0, steps / 2, steps]) {
        const parts = { r: at(ranges.r, k), l: at(ranges.l, i), c: at(ranges.c, j) };
        best = Math.max(best, logGain(frequencyHz, parts) - logGain(referenceHz, parts));
      }
    }
  }
  return best;
}

describe('a resonance over its parts', () => {
  for (const [f, r] of [
    [15e3, 0],
    [16e3, 0],
    [18e3, 0],
    [3e3, 12e3],
    [17e3, 14e3],
    [14e3, 17e3],
    [40e3, 10e3],
    [0, 16e3],
  ] as const) {
    it(`is as large at ${f} Hz against ${r} Hz as on a grid of parts, which it never falls below`, () => {
      const found = ratio.at(f, r);
      const grid = onGrid(f, r);
      assert.ok(found.logGain >= grid - 1e-12, `${found.logGain} below the grid's ${grid}`);
      // What 61 values of each part may miss of a smooth peak of this Q.
      assertWithin(found.logGain, grid, 4e-3);
      assertWithin(logGain(f, found.parts) - logGain(r, found.parts), found.logGain, 1e-9);
    });
  }

  it('encloses its values and its slopes, largest and smallest, from 0 Hz and from elsewhere', () => {
    for (const referenceHz of [0, 12e3]) {
      for (const sense of ['largest', 'smallest'] as const) {
        const response = measuredFrom(ratio, referenceHz, sense);
        assertBoundsEnclose(response, naturalHz, 91);
        assertSlopeEncloses(response, naturalHz, 92);
      }
    }
  });

  it('falls to nothing at infinity', () => {
    assert.equal(ratio.at(Infinity, 0).logGain, -Infinity);
    assert.equal(measuredFrom(ratio, 1e3, 'smallest').logGain(Infinity), -Infinity);
  });

  it('is the plain section where nothing deviates', () => {
    const one = { low: 1, high: 1 };
    const still = new ResonanceRatio(naturalHz, Math.sqrt(henry / farad) / ohm, { r: one, l: one, c: one });
    for (const f of [0, 1e3, 15e3, 50e3]) assertWithin(still.at(f, 0).logGain, logGain(f, { r: 1, l: 1, c: 1 }), 1e-12);
  });
});
