/** The set of frequencies that land in a protected range, against folding every frequency by itself. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { landingSet, lands } from '../../src/analysis/landing-set';
import type { Sampling } from '../../src/analysis/landing-set';
import { foldFrequency } from '../../src/signal/folding';
import { appearance } from '../../src/analysis/wanted';
import type { Enclosure } from '../../src/signal/response';

const exact = (hz: number): Enclosure => ({ low: hz, high: hz });

/** Whether some rate of a dense set puts the frequency into a protected range, with a hair's breadth given or taken. */
function landsByFolding(sampling: Sampling, frequencyHz: number, breadth: number): boolean {
  const { low, high } = sampling.rateHz;
  const rates = low === high ? [low] : Array.from({ length: 401 }, (_, index) => low + ((high - low) * index) / 400);
  return rates.some((rateHz) => {
    const { landsHz } = foldFrequency(frequencyHz, rateHz);
    const ranges = sampling.protect ?? sampling.wanted.map((band) => appearance({ lowHz: band.low, highHz: band.high }, rateHz));
    return ranges.some((range) => range.low - breadth <= landsHz && landsHz <= range.high + breadth);
  });
}

function inWanted(sampling: Sampling, frequencyHz: number): boolean {
  return sampling.wanted.some((band) => band.low * (1 - 1e-6) <= frequencyHz && frequencyHz <= band.high * (1 + 1e-6));
}

describe('landing sets', () => {
  it('hold every copy of a band in zone 1 but the band itself', () => {
    const set = landingSet({ rateHz: exact(50), wanted: [{ low: 2, high: 10 }], protect: null });
    assert.deepEqual(
      [5, 40, 48, 44, 52, 60, 61, 92, 102].map((f) => lands(set, exact(50), f)),
      [false, true, true, true, true, true, false, true, true],
    );
  });

  it('count a range below the wanted band that is protected too', () => {
    const wide = landingSet({ rateHz: exact(50), wanted: [{ low: 2, high: 10 }], protect: [{ low: 0, high: 12 }] });
    assert.deepEqual(
      [1, 5, 11, 13, 38].map((f) => lands(wide, exact(50), f)),
      [true, false, true, false, true],
    );
  });

  it('count low frequencies that reach a band sampled in a higher zone', () => {
    const set = landingSet({ rateHz: exact(52), wanted: [{ low: 65, high: 75 }], protect: null });
    assert.deepEqual(
      [18, 34, 70, 86].map((f) => lands(set, exact(52), f)),
      [true, true, false, true],
    );
  });

  it('leave no sliver of a band that a stated range coincides with', () => {
    // 3 · 0.1 − 0.05 and 0.25 differ by a rounding.
    const set = landingSet({ rateHz: exact(0.1), wanted: [{ low: 0.26, high: 0.28 }], protect: [{ low: 0.02, high: 0.04 }] });
    for (const piece of set.pieces) assert.ok(piece.high - piece.low > 1e-6 || piece.high < 0.259 || piece.low > 0.281);
  });

  const sampling = fc
    .record({
      rate: fc.double({ min: 10, max: 100, noNaN: true }),
      zone: fc.integer({ min: 1, max: 30 }),
      from: fc.double({ min: 0.05, max: 0.45, noNaN: true }),
      share: fc.double({ min: 0.1, max: 0.9, noNaN: true }),
      tolerance: fc.constantFrom(0, 0, 1e-5, 1e-4, 1e-3),
      stated: fc.boolean(),
    })
    .map(({ rate, zone, from, share, tolerance, stated }): Sampling => {
      const low = ((zone - 1 + from) * rate) / 2;
      const high = low + (share * (0.95 - from) * rate) / 2;
      const rateHz = { low: rate * (1 - tolerance), high: rate * (1 + tolerance) };
      return { rateHz, wanted: [{ low, high }], protect: stated ? [{ low: 0.1 * rate, high: 0.3 * rate }] : null };
    });

  it('agree with folding each frequency, also where the rate moves', () => {
    fc.assert(
      fc.property(sampling, fc.double({ min: 0, max: 2500, noNaN: true }), (one, frequencyHz) => {
        fc.pre(!inWanted(one, frequencyHz));
        const found = lands(landingSet(one), one.rateHz, frequencyHz);
        const breadth = 1e-6 * one.rateHz.high + 0.01 * (one.rateHz.high - one.rateHz.low) * (frequencyHz / one.rateHz.low);
        if (landsByFolding(one, frequencyHz, -breadth)) assert.ok(found, 'misses a landing');
        // Far from the band its place may be taken a little wider: by what it moves over the rate's tolerance.
        const moves = ((one.rateHz.high - one.rateHz.low) * (one.wanted[0]?.high ?? 0)) / one.rateHz.low;
        if (!landsByFolding(one, frequencyHz, breadth + 2 * moves)) assert.ok(!found, 'sees a landing where there is none');
      }),
      { seed: 20241, numRuns: 400 },
    );
  });
});
