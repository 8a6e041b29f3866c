/** Responses seen along a copy, and parts seen at a copy and at the wanted output at once. */
import assert from 'node:assert/strict';
import { alongCopy, tiedAlong, type CopyAxis } from '../../src/signal/copy-axis';
import { FactorRatio } from '../../src/signal/factor-ratio';
import { butterworth } from '../../src/signal/families/butterworth';
import { chebyshev } from '../../src/signal/families/chebyshev';
import { filterResponse } from '../../src/signal/filter';
import { rectangleResponse } from '../../src/signal/pulses/rectangle';
import { inverse, product } from '../../src/signal/response-algebra';
import { largestOverBands } from '../../src/signal/search';
import { assertBoundsEnclose, assertSlopeEncloses } from '../support/enclosing';
import { assertWithin, provedGapDb, roundingDb } from '../support/tolerance';

const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;
const baseband: CopyAxis = { offsetHz: 0, direction: 1 };
const lower: CopyAxis = { offsetHz: 5000, direction: -1 };
const upper: CopyAxis = { offsetHz: 5000, direction: 1 };
const stage = filterResponse(chebyshev(5, 2400, 1, 'ripple'));
const factors = { low: 0.9, high: 1.08 };

describe('alongCopy', () => {
  it('is the response where x leaves, mirrored below a multiple of the rate', () => {
    assert.equal(alongCopy(stage, lower).logGain(2000), stage.logGain(3000));
    assert.equal(alongCopy(stage, upper).logGain(2000), stage.logGain(7000));
    assert.equal(alongCopy(stage, baseband), stage);
    assert.deepEqual(alongCopy(stage, lower).bounds(1000, 2000), stage.bounds(3000, 4000));
  });

  it('encloses its slope on both sides, and has none across a null', () => {
    assertSlopeEncloses(alongCopy(stage, upper), 1000, 81);
    const mirrored = alongCopy(stage, lower);
    const slope = mirrored.slope(1000, 2000)!;
    const rise = (mirrored.logGain(1501) - mirrored.logGain(1500)) / 1;
    assert.ok(slope.low <= rise && rise <= slope.high && slope.low > 0);
    assert.equal(alongCopy(rectangleResponse(1 / 4000), lower).slope(900, 1100), null);
  });
});

describe('tiedAlong', () => {
  it('gives a part one corner for the copy and for the wanted output', () => {
    for (const copy of [lower, upper]) {
      const tied = tiedAlong(new FactorRatio(stage, factors), copy, baseband);
      for (const x of [0, 300, 1200, 1900, 2390]) {
        const f = copy.offsetHz + copy.direction * x;
        let best = -Infinity;
        for (let i = 0; i <= 18_000; i += 1) {
          const factor = 0.9 + i * 1e-5;
          best = Math.max(best, stage.logGain(f / factor) - stage.logGain(x / factor));
        }
        assertWithin(toDb(tied.logGain(x)), toDb(best), 2e-5, `x = ${x}`);
        const at = tied.at(x).factor;
        assertWithin(toDb(stage.logGain(f / at) - stage.logGain(x / at)), toDb(tied.logGain(x)), 1e-9);
      }
    }
  });

  it('encloses its gain and its slope', () => {
    assertBoundsEnclose(tiedAlong(new FactorRatio(stage, factors), upper, baseband), 1000, 82);
    assertSlopeEncloses(tiedAlong(new FactorRatio(stage, factors), upper, baseband), 1000, 83);
  });

  it('proves images behind a hold, one corner for both, against a plain scan', () => {
    for (const part of [filterResponse(butterworth(5, 26e3)), filterResponse(chebyshev(5, 24e3, 1, 'ripple'))]) {
      const hold = rectangleResponse(1 / 48e3);
      const copy: CopyAxis = { offsetHz: 48e3, direction: -1 };
      const path = product([alongCopy(hold, copy), inverse(hold), tiedAlong(new FactorRatio(part, factors), copy, baseband)]);
      const images = largestOverBands(path, [{ low: 1e3, high: 20e3 }])!;
      let best = -Infinity;
      for (let i = 0; i <= 90; i += 1) {
        const moved = (f: number): number => hold.logGain(f) + part.logGain(f / (0.9 + 0.002 * i));
        for (let x = 1e3; x <= 20e3; x += 100) best = Math.max(best, moved(48e3 - x) - moved(x));
      }
      assert.ok(toDb(best) <= toDb(images.logGain) + roundingDb);
      assertWithin(toDb(best), toDb(images.logGain), 0.01);
      assert.ok(images.gapDb <= provedGapDb && images.evaluations <= 100);
    }
  });
});
