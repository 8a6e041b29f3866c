/** The proved maximum over copies of both signs: against plain samples of every copy, with weights that differ from copy to copy. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { alongCopy } from '../../../src/signal/copy-axis';
import { butterworth } from '../../../src/signal/families/butterworth';
import { chebyshev } from '../../../src/signal/families/chebyshev';
import { realPole } from '../../../src/signal/families/real-pole';
import { filterResponse } from '../../../src/signal/filter';
import { rectangleResponse } from '../../../src/signal/pulses/rectangle';
import type { Enclosure, Response } from '../../../src/signal/response';
import { constantResponse, product } from '../../../src/signal/response-algebra';
import { copyPieces } from '../../../src/signal/search/copy-places';
import { largestOverCopies, type CopyQuestion } from '../../../src/signal/search';
import { assertWithin, provedGapDb } from '../../support/tolerance';

const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;
const flat = constantResponse(0);

/** A gate of a share of the period at rate 1: ln of the share times |sinc(k·share)|, written out. */
function gateLog(share: number, copy: number): number {
  const turns = Math.PI * share * copy;
  return Math.log(copy === 0 ? share : Math.abs(Math.sin(turns) / turns) * share);
}

interface Case {
  readonly near: Response;
  readonly far: Response;
  readonly share: number;
  readonly bands: readonly Enclosure[];
  readonly within: readonly Enclosure[];
  readonly firstCopy: number;
}

function questionOf({ near, far, share, bands, within, firstCopy }: Case): CopyQuestion {
  return {
    rateHz: 1,
    bands,
    within,
    signs: 'both',
    firstCopy,
    lastCopy: Infinity,
    gainOf: (copy, { axis }) => product([constantResponse(gateLog(share, copy)), near, alongCopy(far, axis)]),
    boundFrom: (first) => ({ logWeight: Math.log(1 / (Math.PI * first)), near, far }),
    limit: null,
  };
}

/** The largest over an even grid of x and every copy up to one, with the rules of the question written out plainly. */
function sampled({ near, far, share, bands, within, firstCopy }: Case, lastCopy: number, points: number): number {
  let best = -Infinity;
  for (const band of bands) {
    for (let i = 0; i <= points; i += 1) {
      const x = band.low + ((band.high - band.low) * i) / points;
      for (let copy = -lastCopy; copy <= lastCopy; copy += 1) {
        if (Math.abs(copy) < firstCopy) continue;
        const f = Math.abs(x + copy);
        if (!within.some((range) => range.low <= f && f <= range.high)) continue;
        best = Math.max(best, gateLog(share, copy) + near.logGain(x) + far.logGain(f));
      }
    }
  }
  return best;
}

const everywhere: readonly Enclosure[] = [{ low: 0, high: Infinity }];

describe('the largest gain over copies', () => {
  it('finds the same as a dense grid over both signs, copy by copy', () => {
    const filters: readonly Response[] = [
      flat,
      filterResponse(realPole(0.2)),
      filterResponse(butterworth(3, 0.3)),
      filterResponse(chebyshev(5, 2.4, 1, 'ripple')),
      rectangleResponse(0.37),
    ];
    const filter = fc.constantFrom(...filters);
    const range = (low: number, high: number): fc.Arbitrary<Enclosure> =>
      fc
        .tuple(fc.double({ min: low, max: high, noNaN: true }), fc.double({ min: 0.01, max: 1, noNaN: true }))
        .map(([from, width]) => ({ low: from, high: from + width }));
    const cases = fc.record({
      near: filter,
      far: filter,
      share: fc.double({ min: 0.05, max: 0.95, noNaN: true }),
      bands: fc.array(range(0, 3), { minLength: 1, maxLength: 2 }),
      within: fc.oneof(fc.constant(everywhere), fc.array(range(0, 6), { minLength: 1, maxLength: 2 })),
      firstCopy: fc.constantFrom(0, 1, 2),
    });
    fc.assert(
      fc.property(cases, (one) => {
        const found = largestOverCopies(questionOf(one));
        const grid = sampled(one, 30, 400);
        if (found === null) {
          assert.equal(grid, -Infinity);
          return;
        }
        assert.ok(found.gapDb <= provedGapDb, `gap ${found.gapDb}`);
        assert.ok(toDb(found.logGain) >= toDb(grid) - 1e-9, `${toDb(found.logGain)} below the grid's ${toDb(grid)}`);
        // The point that is handed back really gives what was claimed.
        const real = gateLog(one.share, found.copy) + one.near.logGain(found.nearHz) + one.far.logGain(found.farHz);
        assertWithin(toDb(found.logGain), toDb(real), found.gapDb + 1e-9);
        assertWithin(found.farHz, Math.abs(found.nearHz + found.copy), 1e-9 * (1 + found.farHz));
      }),
      { seed: 7, numRuns: 150 },
    );
  });

  it('begins a search for what arrives from far away at the copies that reach it', () => {
    const share = 0.37;
    const one: Case = {
      near: flat,
      far: filterResponse(realPole(10)),
      share,
      bands: [{ low: 0, high: 0.3 }],
      within: [{ low: 2e6, high: 3e6 }],
      firstCopy: 0,
    };
    const found = largestOverCopies(questionOf(one));
    assert.ok(found !== null && Math.abs(found.copy) >= 2e6 - 1 && Math.abs(found.copy) < 2e6 + 1000, String(found?.copy));
    assert.ok(found.evaluations < 500, String(found.evaluations));
  });

  it('settles copies that all weigh alike by the first of them, and names what is only approached at infinity', () => {
    const hold = rectangleResponse(1);
    const alike = (far: Response): CopyQuestion => ({
      rateHz: 1,
      bands: [{ low: 0.1, high: 0.4 }],
      within: everywhere,
      signs: 'both',
      firstCopy: 1,
      lastCopy: Infinity,
      gainOf: (_, { axis }) => product([hold, alongCopy(far, axis)]),
      boundFrom: () => ({ logWeight: 0, near: hold, far }),
      limit: { logWeight: 0, near: hold, far },
    });
    const open = largestOverCopies(alike(flat));
    assert.ok(open !== null && open.evaluations < 100, String(open?.evaluations));
    assertWithin(toDb(open.logGain), toDb(hold.logGain(0.1)), provedGapDb);
    // A high-pass lets ever more through: the largest gain is only approached.
    const rising = largestOverCopies(
      alike(
        filterResponse({
          poles: [{ re: -50, im: 0 }],
          zeros: [{ re: 0, im: 0 }],
          gainAt: { frequencyHz: 1e9, gain: 1 },
          turnsHz: [],
        }),
      ),
    );
    assert.equal(rising?.copy, Infinity);
    assertWithin(toDb(rising.logGain), toDb(hold.logGain(0.1)), provedGapDb);
  });

  it('counts edges that meet, and not a band that only begins where copy 0 ends', () => {
    assert.deepEqual(copyPieces(0, 10, { low: 0, high: 3 }, { low: 3, high: 8 }), []);
    assert.equal(copyPieces(0, 10, { low: 0, high: 3 }, { low: 3, high: 3 }).length, 1);
    // 1.2 − 1.1 is a hair below 0.1 in double precision.
    const [touching] = copyPieces(1, 1.1, { low: 0.1, high: 0.3 }, { low: 1.2, high: 1.2 });
    assert.deepEqual(touching, { range: { low: 0.1, high: 0.1 }, axis: { offsetHz: 1.1, direction: 1 }, mirrored: false });
    const both = copyPieces(-1, 1, { low: 0.5, high: 1.5 }, { low: 0.2, high: 0.3 });
    assert.deepEqual(
      both.map((piece) => piece.mirrored),
      [false, true],
    );
  });

  it('finds nothing where no copy reaches what is allowed, and refuses a rate of 0 Hz', () => {
    const nowhere: Case = {
      near: flat,
      far: flat,
      share: 0.5,
      bands: [{ low: 0, high: 0.1 }],
      within: [{ low: 0.3, high: 0.4 }],
      firstCopy: 0,
    };
    assert.equal(largestOverCopies(questionOf(nowhere)), null);
    assert.throws(() => largestOverCopies({ ...questionOf(nowhere), rateHz: 0 }), RangeError);
  });
});
