/** Folds of hand-worked tones, zones and rate windows; exact rational arithmetic beside each. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { foldFrequency, landingFrequencies, rateWindows, zoneOf } from '../../src/signal/folding';
import { assertClose, assertWithin, roundingRelative } from '../support/tolerance';

// f, rate, where it lands, inverted, zone. Worked by hand as |f − k·rate| in exact fractions: 170 = 3·61.44 − 14.32, and so on.
const tones: readonly (readonly [number, number, number, 'upright' | 'inverted', number])[] = [
  [1, 8, 1, 'upright', 1],
  [4, 8, 4, 'upright', 2],
  [5, 8, 3, 'inverted', 2],
  [7, 8, 1, 'inverted', 2],
  [8, 8, 0, 'upright', 3],
  [9, 8, 1, 'upright', 3],
  [12, 8, 4, 'upright', 4],
  [13, 8, 3, 'inverted', 4],
  [70, 52, 18, 'upright', 3],
  [70, 40, 10, 'inverted', 4],
  [170, 61.44, 14.32, 'inverted', 6],
  [2400, 500, 100, 'inverted', 10],
  [24.1, 44.1, 20, 'inverted', 2],
  [28.1, 48, 19.9, 'inverted', 2],
  [100, 30.72, 7.84, 'upright', 7],
  [433.92, 10, 3.92, 'upright', 87],
  [0.0501, 0.1, 0.0499, 'inverted', 2],
  [10.7, 4.8, 1.1, 'upright', 5],
  [1575.42, 16.368, 4.092, 'upright', 193],
  [1227.6, 5, 2.4, 'inverted', 492],
  [30000.001, 48, 0.001, 'upright', 1251],
];

// low, high, how many windows, then [zone, low, high] of some, from 2·high/n and 2·low/(n − 1) in exact fractions.
const windows: readonly (readonly [number, number, number, readonly (readonly [number, number, number])[]])[] = [
  [
    20,
    25,
    5,
    [
      [5, 10, 10],
      [4, 12.5, 40 / 3],
      [3, 50 / 3, 20],
      [2, 25, 40],
      [1, 50, Infinity],
    ],
  ],
  [
    17.5,
    22.5,
    4,
    [
      [4, 11.25, 35 / 3],
      [3, 15, 17.5],
      [2, 22.5, 35],
      [1, 45, Infinity],
    ],
  ],
  [
    10,
    14,
    3,
    [
      [3, 28 / 3, 10],
      [2, 14, 20],
      [1, 28, Infinity],
    ],
  ],
  [10, 30, 1, [[1, 60, Infinity]]],
  [
    65,
    75,
    7,
    [
      [7, 150 / 7, 65 / 3],
      [6, 25, 26],
      [5, 30, 32.5],
      [4, 37.5, 130 / 3],
    ],
  ],
  [
    140,
    160,
    8,
    [
      [8, 40, 40],
      [7, 320 / 7, 140 / 3],
      [6, 160 / 3, 56],
      [5, 64, 70],
    ],
  ],
  [
    68.75,
    71.25,
    28,
    [
      [28, 142.5 / 28, 137.5 / 27],
      [25, 5.7, 137.5 / 24],
    ],
  ],
  [
    935,
    960,
    38,
    [
      [38, 1920 / 38, 1870 / 37],
      [35, 1920 / 35, 55],
    ],
  ],
  [
    99,
    101,
    50,
    [
      [50, 4.04, 198 / 49],
      [47, 202 / 47, 198 / 46],
    ],
  ],
  [
    24.7,
    25.3,
    42,
    [
      [42, 50.6 / 42, 49.4 / 41],
      [39, 50.6 / 39, 1.3],
    ],
  ],
  [1570.42, 1580.42, 158, [[158, 3160.84 / 158, 3140.84 / 157]]],
  [9.9, 10.1, 50, [[50, 0.404, 19.8 / 49]]],
  [0, 20, 1, [[1, 40, Infinity]]],
  [
    250,
    350,
    3,
    [
      [3, 700 / 3, 250],
      [2, 350, 500],
      [1, 700, Infinity],
    ],
  ],
  [2400, 2483.5, 29, [[29, 4967 / 29, 4800 / 28]]],
];

describe('foldFrequency', () => {
  for (const [f, rate, lands, side, zone] of tones) {
    it(`lands ${f} at ${lands} with a rate of ${rate}, ${side}`, () => {
      const landing = foldFrequency(f, rate);
      assertWithin(landing.landsHz, lands, roundingRelative * f);
      assert.equal(landing.inverted, side === 'inverted');
      assertWithin(Math.abs(f - landing.fold * rate), lands, roundingRelative * f);
      assert.equal(zoneOf(f, rate), zone);
    });
  }

  it('is undone by unfolding: every landing frequency lands where it was asked to', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 0.5, noNaN: true }),
        fc.integer({ min: 0, max: 5000 }),
        fc.constantFrom(1, 48e3, 61.44e6),
        (share, fold, rate) => {
          const x = share * rate;
          for (const { low } of landingFrequencies(x, x, rate, fold).slice(-2)) {
            assertWithin(foldFrequency(Math.abs(low), rate).landsHz, x, 1e-12 * (low + rate));
          }
        },
      ),
      { seed: 20, numRuns: 300 },
    );
  });

  it('scales: a tone and a rate times c land at c times the place', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1e6, noNaN: true }), fc.integer({ min: -20, max: 20 }), (f, exponent) => {
        const c = 2 ** exponent;
        assert.equal(foldFrequency(f * c, 48 * c).landsHz, foldFrequency(f, 48).landsHz * c);
      }),
      { seed: 21, numRuns: 200 },
    );
  });

  it('refuses a rate that is not above 0 Hz and a frequency that is not finite', () => {
    for (const rate of [0, -1, NaN, Infinity]) assert.throws(() => foldFrequency(1, rate), RangeError);
    for (const f of [-1, NaN, Infinity]) assert.throws(() => foldFrequency(f, 1), RangeError);
  });
});

describe('zoneOf', () => {
  it('gives a band that starts on a multiple of half the rate to the zone above, also where decimals do not divide', () => {
    assert.equal(zoneOf(0, 48e3), 1);
    assert.equal(zoneOf(24e3, 48e3), 2);
    // 2·0.15/0.1 is 2.9999999999999996 in double precision.
    assert.equal(zoneOf(0.15, 0.1), 4);
  });
});

describe('rateWindows', () => {
  for (const [low, high, count, some] of windows) {
    it(`finds ${count} windows for ${low} .. ${high}`, () => {
      const found = rateWindows(low, high);
      assert.equal(found.length, count);
      for (const [zone, lowRate, highRate] of some) {
        const window = found[zone - 1]!;
        assert.equal(window.zone, zone);
        assertClose(window.lowHz, lowRate, roundingRelative);
        assertClose(window.highHz, highRate, roundingRelative);
        assert.equal(window.inverted, zone % 2 === 0);
      }
    });
  }

  it('counts 1.1/(1.1 − 1.0) as 11, though it is 10.99… in double precision', () => {
    assert.ok(1.1 / (1.1 - 1.0) < 11);
    assert.equal(rateWindows(1.0, 1.1).length, 11);
  });

  it('keeps the band off every multiple of half the rate inside each window', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 100, noNaN: true }),
        fc.double({ min: 0.5, max: 30, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (low, width, share) => {
          const high = low + width;
          for (const { lowHz, highHz } of rateWindows(low, high)) {
            const rate = highHz === Infinity ? lowHz * (1 + share) : lowHz + share * (highHz - lowHz);
            const first = Math.floor((2 * low * (1 + 1e-9)) / rate);
            assert.ok((first + 1) * (rate / 2) >= high * (1 - 1e-9), `${low} .. ${high} at ${rate}`);
          }
        },
      ),
      { seed: 22, numRuns: 200 },
    );
  });

  it('stops at the number that was asked for', () => {
    assert.equal(rateWindows(1e9, 1e9 + 1, 5).length, 5);
  });

  it('refuses a band without width', () => {
    assert.throws(() => rateWindows(5, 5), RangeError);
  });
});

describe('landingFrequencies', () => {
  it('lists the range itself and both sides of every multiple of the rate', () => {
    assert.deepEqual(landingFrequencies(1, 2, 10, 2), [
      { low: 1, high: 2 },
      { low: 8, high: 9 },
      { low: 11, high: 12 },
      { low: 18, high: 19 },
      { low: 21, high: 22 },
    ]);
  });
});
