/** Corner tolerances as a stretched axis, against a plain scan of corner factors. */
import assert from 'node:assert/strict';
import { butterworth } from '../../src/signal/families/butterworth';
import { chebyshev } from '../../src/signal/families/chebyshev';
import { realPole } from '../../src/signal/families/real-pole';
import { filterResponse } from '../../src/signal/filter';
import type { Response } from '../../src/signal/response';
import { inverse, product } from '../../src/signal/response-algebra';
import { largestOverBands } from '../../src/signal/search';
import { stretched, stretchedRatio, type Sense } from '../../src/signal/stretched';
import { assertBoundsEnclose, assertSlopeEncloses } from '../support/enclosing';
import { assertClose, assertWithin, provedGapDb, roundingDb } from '../support/tolerance';

const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;
const tolerance = { low: 0.94, high: 1.05 };
const senses: readonly Sense[] = ['largest', 'smallest'];

const stages: readonly (readonly [string, Response])[] = [
  ['one real pole', filterResponse(realPole(1000))],
  ['a Butterworth stage', filterResponse(butterworth(6, 1000))],
  ['a Chebyshev stage', filterResponse(chebyshev(7, 1000, 1, 'ripple'))],
  ['a Chebyshev stage whose turning points are not told', filterResponse({ ...chebyshev(4, 1000, 1, 'ripple'), turnsHz: null })],
];

/** The extreme over 20,001 evenly spaced factors: never beyond the true one, and short of it by less than 1e−5 dB here. */
function scan(gainAt: (factor: number) => number, sense: Sense): number {
  let extreme = gainAt(tolerance.low);
  for (let i = 0; i <= 20_000; i += 1) {
    const gain = gainAt(tolerance.low + ((tolerance.high - tolerance.low) * i) / 20_000);
    extreme = sense === 'largest' ? Math.max(extreme, gain) : Math.min(extreme, gain);
  }
  return extreme;
}

const frequencies = [0, 3, 200, 433, 610, 781, 901, 974.9, 1000, 1013, 1100, 1700, 40e3];

describe('stretched', () => {
  for (const [name, stage] of stages) {
    for (const sense of senses) {
      it(`is the ${sense} of ${name} over every corner factor`, () => {
        const worst = stretched(stage, tolerance, sense);
        for (const f of frequencies) {
          const expected = scan((factor) => stage.logGain(f / factor), sense);
          assertWithin(toDb(worst.logGain(f)), toDb(expected), 2e-5, `at ${f}`);
        }
      });

      it(`names the factor that gives the ${sense} of ${name}`, () => {
        const worst = stretched(stage, tolerance, sense);
        for (const f of frequencies) {
          const factor = worst.factorAt(f);
          assert.ok(factor >= tolerance.low * (1 - 1e-12) && factor <= tolerance.high * (1 + 1e-12));
          assertWithin(toDb(stage.logGain(f / factor)), toDb(worst.logGain(f)), 1e-9, `at ${f}`);
        }
      });

      it(`encloses the ${sense} of ${name} and its slope`, () => {
        assertBoundsEnclose(stretched(stage, tolerance, sense), 1000, 51);
        assertSlopeEncloses(stretched(stage, tolerance, sense), 1000, 52);
      });
    }
  }

  it('finds a ripple that is worst between the ends of the tolerance', () => {
    const stage = filterResponse(chebyshev(7, 1000, 1, 'ripple'));
    const factors = { low: 0.97, high: 1.03 };
    // At this frequency the nominal filter turns, so at both ends of the tolerance the gain is above the valley.
    const valley = chebyshev(7, 1000, 1, 'ripple').turnsHz?.at(-2) ?? NaN;
    const worst = stretched(stage, factors, 'smallest');
    assertWithin(toDb(worst.logGain(valley)), -1, 1e-9);
    assertWithin(worst.factorAt(valley), 1, 1e-9);
    assert.ok(toDb(Math.min(stage.logGain(valley / 0.97), stage.logGain(valley / 1.03))) > -0.95);
  });

  it('is the stage itself, moved, where there is only one factor', () => {
    const stage = filterResponse(butterworth(3, 1000));
    const moved = stretched(stage, { low: 1.1, high: 1.1 }, 'largest');
    assertClose(moved.logGain(1500), stage.logGain(1500 / 1.1), 1e-15);
    assert.equal(moved.factorAt(1500), 1.1);
  });

  it('proves the product of stages that vary on their own as the product of their extremes', () => {
    const one = filterResponse(butterworth(4, 1000));
    const other = filterResponse(chebyshev(3, 1500, 0.5, 'ripple'));
    const both = product([stretched(one, tolerance, 'largest'), stretched(other, { low: 0.9, high: 1.1 }, 'largest')]);
    const proved = largestOverBands(both, [{ low: 1200, high: 9000 }])!;
    let best = -Infinity;
    for (let i = 0; i <= 200; i += 1) {
      for (let j = 0; j <= 200; j += 1) {
        const gain = (f: number): number =>
          one.logGain(f / (0.94 + (0.11 * i) / 200)) + other.logGain(f / (0.9 + (0.2 * j) / 200));
        for (const f of [1200, 1250, 1500, 2000]) best = Math.max(best, gain(f));
      }
    }
    assert.ok(best <= proved.logGain + roundingDb);
    assertWithin(toDb(proved.logGain), toDb(best), provedGapDb);
  });

  it('refuses factors that are not above 0', () => {
    const stage = filterResponse(realPole(1));
    assert.throws(() => stretched(stage, { low: 0, high: 1 }, 'largest'), RangeError);
    assert.throws(() => stretchedRatio(stage, 1, { low: 2, high: 1 }, 'largest'), RangeError);
  });
});

describe('stretchedRatio', () => {
  for (const [name, stage] of stages) {
    for (const sense of senses) {
      for (const reference of [0, 300, 940]) {
        it(`is the ${sense} of ${name} against its own gain at ${reference} Hz, with one factor for both`, () => {
          const worst = stretchedRatio(stage, reference, tolerance, sense);
          for (const f of frequencies) {
            const expected = scan((factor) => stage.logGain(f / factor) - stage.logGain(reference / factor), sense);
            assertWithin(toDb(worst.logGain(f)), toDb(expected), 2e-5, `at ${f}`);
            const factor = worst.factorAt(f);
            assertWithin(
              toDb(stage.logGain(f / factor) - stage.logGain(reference / factor)),
              toDb(worst.logGain(f)),
              1e-9,
              `factor at ${f}`,
            );
          }
        });
      }

      it(`encloses the ${sense} ratio of ${name} and its slope`, () => {
        assertBoundsEnclose(stretchedRatio(stage, 300, tolerance, sense), 1000, 53);
        assertSlopeEncloses(stretchedRatio(stage, 300, tolerance, sense), 1000, 54);
      });
    }
  }

  it('is proved over a band to 0.001 dB within 500 evaluations, ripples against ripples', () => {
    const stage = filterResponse(chebyshev(7, 1000, 1, 'ripple'));
    for (const sense of senses) {
      const ratio = stretchedRatio(stage, 300, tolerance, sense);
      const turned = sense === 'largest' ? ratio : inverse(ratio);
      const extreme = largestOverBands(turned, [{ low: 100, high: 960 }])!;
      assert.ok(extreme.gapDb <= provedGapDb, `gap ${extreme.gapDb} dB`);
      assert.ok(extreme.evaluations <= 500, `${extreme.evaluations} evaluations`);
    }
  });
});
