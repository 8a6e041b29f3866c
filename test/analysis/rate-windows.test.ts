/** The table of allowed rates: one band against exact fractions and published examples, several bands and loose clocks against brute force. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { rateWindowsOf, type RateTable } from '../../src/analysis';
import { windowAround } from '../../src/analysis/rate-windows';
import { keepsWhole } from '../../src/analysis/wanted';
import type { Channel } from '../../src/spec/channel';
import { capture, exact, generate, plusMinus, rate, wanted } from '../support/channel-builder';
import { assertClose, roundingRelative } from '../support/tolerance';

type Row = readonly [zone: number, low: string, high: string | null, orientation: 'upright' | 'inverted'];

/** Exact fractions by Python's fractions module, from 2·high/n ≤ rate ≤ 2·low/(n − 1); how they were made stands in the file. */
const { bands } = JSON.parse(readFileSync(join(import.meta.dirname, '..', 'reference', 'folding.json'), 'utf8')) as {
  readonly bands: readonly {
    readonly fl: string;
    readonly fu: string;
    readonly n_max: number;
    readonly windows_n_lo_hi_orientation: readonly Row[];
  }[];
};

const fraction = (text: string | null): number => {
  if (text === null) return Infinity;
  const [over, under = '1'] = text.split('/');
  return Number(over) / Number(under);
};

const table = (low: number, high: number, parts: Partial<Channel> = {}): RateTable =>
  rateWindowsOf(capture({ wanted: [wanted(low, high)], rate: rate(2 * high), ...parts }));

const bounds = ({ windows }: RateTable): readonly (readonly number[])[] =>
  windows.map(({ low, high, zones }) => [zones[0] ?? NaN, low, high]);

describe('the table of allowed rates of one band', () => {
  it('has fifteen bands to be held against', () => {
    assert.equal(bands.length, 15);
  });

  for (const { fl, fu, n_max, windows_n_lo_hi_orientation: rows } of bands) {
    it(`has all ${n_max} windows of ${fl} .. ${fu}`, () => {
      const { windows, leftOff } = table(Number(fl), Number(fu));
      assert.equal(windows.length, n_max);
      assert.equal(leftOff, 0);
      for (const [zone, low, high, orientation] of rows) {
        const window = windows[n_max - zone];
        assert.ok(window !== undefined);
        assert.deepEqual(window.zones, [zone]);
        assert.equal(zone % 2 === 0, orientation === 'inverted');
        assertClose(window.low, fraction(low), roundingRelative);
        if (high === null) assert.equal(window.high, Infinity);
        else assertClose(window.high, fraction(high), roundingRelative);
      }
    });
  }

  it('has the windows of the textbook example of 20 MHz, 5 MHz wide, and none at twice the width', () => {
    // Widely used in textbooks (from memory, no single source): 22.5 .. 35, 15 .. 17.5 and 11.25 .. 11.667 MHz; 10 MHz folds.
    assert.deepEqual(bounds(table(17.5e6, 22.5e6)), [
      [4, 11.25e6, 35e6 / 3],
      [3, 15e6, 17.5e6],
      [2, 22.5e6, 35e6],
      [1, 45e6, Infinity],
    ]);
    assert.equal(keepsWhole(capture({ wanted: [wanted(17.5e6, 22.5e6)], rate: rate(50e6) }), 10e6), false);
  });

  it('has but one rate for a band whose upper edge is a multiple of its width', () => {
    // R. G. Vaughan, N. L. Scott, D. R. White, "The theory of bandpass sampling", IEEE Trans. Signal Processing 39 (1991) 1973–1984:
    // integer positioning; the least rate is one point, at which any imperfection aliases.
    assert.deepEqual(bounds(table(20, 25))[0], [5, 10, 10]);
    assert.equal(bounds(table(20, 25, { guardHz: 0.01 }))[0]?.[0], 4);
  });

  it('has no window below twice the highest frequency where the band is wider than its lower edge', () => {
    // "Is there a condition for bandpass sampling?", signal-processing question-and-answer page: 10 .. 30 kHz needs more than 60 kHz.
    assert.deepEqual(bounds(table(10e3, 30e3)), [[1, 60e3, Infinity]]);
    assert.deepEqual(bounds(table(10e3, 14e3))[0], [3, 28e3 / 3, 10e3]);
  });

  it('counts 1.0 .. 1.1 as 11 zones, though the quotient is 10.99… in double precision', () => {
    assert.equal(table(1, 1.1).windows.length, 11);
  });

  it('has the windows of the reference case X08, 70 MHz and 10 MHz wide, and tells which of its rates are allowed', () => {
    // test/reference/system-examples.json, X08: computed from the definition, no multiple of half the rate strictly inside.
    const channel = capture({ wanted: [wanted(65e6, 75e6)], rate: rate(150e6) });
    const listed = [20e6, 21.5e6, 22e6, 25e6, 25.5e6, 31e6, 40e6];
    assert.deepEqual(
      listed.filter((hz) => keepsWhole(channel, hz)),
      [21.5e6, 25e6, 25.5e6, 31e6, 40e6],
    );
    assertClose(rateWindowsOf(channel).windows[0]?.low ?? NaN, 21428571.4286, 1e-6);
  });

  it('takes the guard and the clock off both sides', () => {
    const [window] = table(65e6, 75e6, { guardHz: 1e6, rate: rate(52e6, { tolerance: plusMinus(0.001) }) }).windows.filter(
      ({ zones }) => zones[0] === 3,
    );
    assertClose(window?.low ?? NaN, (2 * 76e6) / 3 / 0.999, roundingRelative);
    assertClose(window?.high ?? NaN, 64e6 / 1.001, roundingRelative);
  });

  it('loses the zones that only an exact clock could use', () => {
    // 65 .. 75 MHz has 7 zones; with ± 1 % hi(1 + t)/(hi(1 + t) − lo(1 − t)) = 75.75/11.4 = 6.6.
    const loose = table(65e6, 75e6, { rate: rate(52e6, { tolerance: plusMinus(0.01) }) });
    assert.equal(loose.windows.length, 6);
  });

  it('looks at a bounded number of zones around the present rate, and says how many are left', () => {
    const narrow = capture({ wanted: [wanted(1e9, 1e9 + 1)], rate: rate(3e6) });
    const { windows, leftOff } = rateWindowsOf(narrow, 50);
    assert.equal(windows.length, 50);
    assert.equal(leftOff, 1e9 + 1 - 50);
    assert.ok((windows[0]?.low ?? Infinity) < 3e6 && (windows.at(-1)?.high ?? 0) > 3e6);
  });

  it('is the same in every direction', () => {
    const parts = { wanted: [wanted(65e6, 75e6)], rate: rate(52e6) };
    assert.deepEqual(rateWindowsOf(generate(parts)), rateWindowsOf(capture(parts)));
  });
});

/** Whether a rate folds a band onto itself or two onto each other, from the definition alone, at rates across the clock's tolerance. */
function wholeByForce(channel: Channel, rateHz: number): boolean {
  const { low, high } = channel.rate.tolerance;
  const rates = Array.from({ length: 41 }, (_, index) => rateHz * (1 + low + ((high - low) * index) / 40));
  const edges = channel.wanted.map((band) => [Math.max(0, band.lowHz - channel.guardHz), band.highHz + channel.guardHz] as const);
  const orders = rates.map((fs) => {
    for (const [lo, hi] of edges) for (let k = 1; (k * fs) / 2 < hi; k += 1) if ((k * fs) / 2 > lo) return 'folds';
    const places = edges.map(([lo, hi], index) => {
      const ends = [lo, hi].map((f) => Math.abs(f - fs * Math.round(f / fs)));
      return { index, low: Math.min(...ends), high: Math.max(...ends) };
    });
    places.sort((a, b) => a.low + a.high - b.low - b.high);
    const meet = places.some((place, at) => at > 0 && place.low < (places[at - 1]?.high ?? 0));
    return meet ? 'folds' : places.map(({ index }) => index).join();
  });
  return !orders.includes('folds') && new Set(orders).size === 1;
}

const channels = fc
  .record({
    edges: fc.array(fc.tuple(fc.double({ min: 0, max: 90, noNaN: true }), fc.double({ min: 0.5, max: 8, noNaN: true })), {
      minLength: 1,
      maxLength: 3,
    }),
    guardHz: fc.constantFrom(0, 0.2),
    tolerance: fc.constantFrom(exact, plusMinus(0.002), { low: -0.01, high: 0 }),
  })
  .map(({ edges, guardHz, tolerance }) =>
    capture({
      wanted: edges.map(([low, width]) => wanted(low, low + width)),
      guardHz,
      rate: rate(30, { tolerance }),
    }),
  );

describe('the table of allowed rates of several bands', () => {
  it('allows exactly the rates that brute force allows', () => {
    fc.assert(
      fc.property(
        channels,
        fc.array(fc.double({ min: 2, max: 220, noNaN: true }), { minLength: 30, maxLength: 30 }),
        (channel, rates) => {
          const { windows, leftOff } = rateWindowsOf(channel);
          assert.equal(leftOff, 0);
          const bordering = (hz: number): boolean =>
            windows.some(({ low, high }) => Math.abs(hz / low - 1) < 1e-3 || Math.abs(hz / high - 1) < 1e-3);
          for (const hz of rates.filter((one) => !bordering(one))) {
            const inside = windows.some(({ low, high }) => low < hz && hz < high);
            assert.equal(inside, wholeByForce(channel, hz), `${hz} for ${JSON.stringify(channel.wanted)}`);
            assert.equal(keepsWhole(channel, hz), inside, `${hz} as judged`);
          }
        },
      ),
      { seed: 31, numRuns: 150 },
    );
  });

  it('has windows that really end where they end', () => {
    fc.assert(
      fc.property(channels, (channel) => {
        for (const { low, high } of rateWindowsOf(channel).windows) {
          if (high / low < 1 + 1e-5) continue;
          const middle = high === Infinity ? 2 * low : (low + high) / 2;
          assert.ok(wholeByForce(channel, middle), `${middle}`);
          assert.ok(!wholeByForce(channel, low * (1 - 1e-6)), `below ${low}`);
          assert.ok(high === Infinity || !wholeByForce(channel, high * (1 + 1e-6)), `above ${high}`);
        }
      }),
      { seed: 32, numRuns: 150 },
    );
  });

  it('scales: all frequencies times c give all windows times c', () => {
    fc.assert(
      fc.property(channels, fc.integer({ min: -20, max: 20 }), (channel, exponent) => {
        const c = 2 ** exponent;
        const scaled: Channel = {
          ...channel,
          wanted: channel.wanted.map((band) => wanted(band.lowHz * c, band.highHz * c)),
          guardHz: channel.guardHz * c,
          rate: { ...channel.rate, hz: channel.rate.hz * c },
        };
        assert.deepEqual(
          rateWindowsOf(scaled).windows,
          rateWindowsOf(channel).windows.map(({ low, high, zones }) => ({ low: low * c, high: high * c, zones })),
        );
      }),
      { seed: 33, numRuns: 60 },
    );
  });

  it('names the zone of each band', () => {
    const both = capture({ wanted: [wanted(1e3, 3e3), wanted(14e3, 16e3)], rate: rate(20e3) });
    const around = rateWindowsOf(both).windows.find(({ low, high }) => low <= 20e3 && 20e3 <= high);
    assert.deepEqual(around?.zones, [1, 2]);
    // 14 .. 16 kHz appears from rate − 16 kHz, which must stay above 3 kHz, and whole up to 28 kHz.
    assert.deepEqual(windowAround(both), { low: 19e3, high: 28e3 });
  });

  it('has no rate at all for bands that overlap before they are sampled', () => {
    assert.deepEqual(rateWindowsOf(capture({ wanted: [wanted(1e3, 3e3), wanted(2e3, 4e3)], rate: rate(20e3) })).windows, []);
  });
});
