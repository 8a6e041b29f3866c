/** What is wanted above half the rate: generated copies in zones 2 and up, and captured bands that fold, against a reference case and plain counts. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { analyse } from '../../src/analysis';
import { channelPath, gainDb } from '../../src/analysis/channel-path';
import { foldFrequency, rateWindows } from '../../src/signal/folding';
import type { Channel, Pulse } from '../../src/spec/channel';
import { band, capture, generate, limit, plusMinus, rate, rectangleShare, tone, wanted } from '../support/channel-builder';
import { systemCase } from '../support/system-case';
import { assertWithin } from '../support/tolerance';

interface Expected {
  readonly wanted_output_band_edges_Hz: readonly [number, number];
  readonly gain_at_band_edges_dB: readonly [number, number];
  readonly passband_max_dB: number;
  readonly droop_at_upper_edge_dB: number;
  readonly worst_image_dBFS: { readonly image_Hz: number; readonly baseband_Hz: number; readonly level_dBFS: number };
  readonly worst_image_dBc: { readonly image_Hz: number; readonly baseband_Hz: number; readonly level_dBc: number };
}

const split: Pulse = { shape: 'split', width: { share: 1 } };

describe('reference case X05, a split pulse in zone 2', () => {
  // test/reference/system-examples.json: the pulse by quadrature, each copy on 2001 points, by plain numerics.
  const { given, expected, tolerance } = systemCase<Expected>('X05');
  const [fromHigh, toLow] = expected.wanted_output_band_edges_Hz;
  const exciter = (unit: 'dBFS' | 'dBc'): Channel =>
    generate({
      wanted: [wanted(toLow, fromHigh)],
      rate: rate(given.fs_Hz),
      referenceHz: toLow,
      pulse: split,
      limits: [limit('image', 0, { unit })],
    });

  it('stands in zone 2, inverted, where it is wanted', () => {
    const figures = analyse(exciter('dBc'));
    assert.deepEqual([figures.zone, figures.inverted, figures.faults], [2, true, []]);
    assert.deepEqual([figures.wanted[0]?.appearsLow, figures.wanted[0]?.appearsHigh], [300e6, 450e6]);
  });

  it('has the gains of the pulse at the output frequency', () => {
    const { total } = channelPath(exciter('dBc'));
    assertWithin(gainDb(total, fromHigh), expected.gain_at_band_edges_dB[0], tolerance.gain_dB);
    assertWithin(gainDb(total, toLow), expected.gain_at_band_edges_dB[1], tolerance.gain_dB);
    // The case measures droop from the lower edge of the words' band, which leaves at the upper edge: the other way round.
    assertWithin(analyse(exciter('dBc')).droop ?? NaN, -expected.droop_at_upper_edge_dB, tolerance.gain_dB);
  });

  it('finds the strongest image, as a level and against the same tone', () => {
    const level = analyse(exciter('dBFS')).image;
    assertWithin(level?.frequency ?? NaN, expected.worst_image_dBFS.image_Hz, 600);
    assertWithin(level?.level ?? NaN, expected.worst_image_dBFS.level_dBFS, tolerance.level_dB);
    const relative = analyse(exciter('dBc')).image;
    assertWithin(relative?.frequency ?? NaN, expected.worst_image_dBc.image_Hz, 600);
    assertWithin(relative?.from ?? NaN, given.fs_Hz - expected.worst_image_dBc.baseband_Hz, 600);
    assertWithin(relative?.relative ?? NaN, expected.worst_image_dBc.level_dBc, tolerance.level_dB);
  });
});

describe('a band that is generated above half the rate', () => {
  const zones = fc.record({
    zone: fc.integer({ min: 1, max: 6 }),
    low: fc.double({ min: 0.05, max: 0.6, noNaN: true }),
    width: fc.double({ min: 0.1, max: 0.35, noNaN: true }),
    share: fc.constantFrom(1, 0.5, 0.25),
  });

  it('has every other copy for an image, the baseband included, each as strong as plain counting finds it', () => {
    fc.assert(
      fc.property(zones, ({ zone, low, width, share }) => {
        const half = 50e3;
        const lowHz = (zone - 1 + low) * half;
        const highHz = lowHz + width * half;
        const channel = generate({
          wanted: [wanted(lowHz, highHz)],
          rate: rate(2 * half),
          pulse: rectangleShare(share),
          limits: [limit('image', 0, { unit: 'dBFS' })],
        });
        const figures = analyse(channel);
        const strongest = strongestByCounting(lowHz, highHz, 2 * half, share);
        // The counted grid of 2000 points may miss the top by a little, the proof may not.
        const found = figures.image?.level ?? NaN;
        assert.ok(found >= strongest - 1e-6 && found <= strongest + 0.01, `${found} ${strongest}`);
        assert.equal(
          figures.images.some(({ side }) => side === 'baseband'),
          zone > 1,
        );
      }),
      { seed: 51, numRuns: 60 },
    );
  });

  it('droops as the hold does there', () => {
    const figures = analyse(generate({ wanted: [wanted(60e3, 90e3)], rate: rate(100e3), referenceHz: 60e3 }));
    const hold = (f: number): number => Math.sin((Math.PI * f) / 100e3) / ((Math.PI * f) / 100e3);
    assertWithin(figures.droop ?? NaN, 20 * Math.log10(hold(60e3) / hold(90e3)), 1e-9);
  });

  it('must not share its words with another', () => {
    // 10 .. 20 kHz and 100 − (10 .. 20) kHz are made by the same words.
    const both = generate({ wanted: [wanted(10e3, 20e3), wanted(80e3, 90e3)], rate: rate(100e3) });
    assert.deepEqual(analyse(both).faults, [{ kind: 'wanted-folds', index: 1, onto: 0, edgeHz: null }]);
    const apart = generate({ wanted: [wanted(10e3, 20e3), wanted(70e3, 79e3)], rate: rate(100e3) });
    assert.deepEqual(analyse(apart).faults, []);
  });
});

/** The largest |c|·|sinc| over every copy but the wanted one, k up to 12, on a grid. */
function strongestByCounting(lowHz: number, highHz: number, rateHz: number, share: number): number {
  const gain = (f: number): number => {
    const x = (Math.PI * f * share) / rateHz;
    return share * Math.abs(x === 0 ? 1 : Math.sin(x) / x);
  };
  let best = 0;
  for (let point = 0; point <= 2000; point += 1) {
    const f = lowHz + ((highHz - lowHz) * point) / 2000;
    const x = Math.abs(f - rateHz * Math.round(f / rateHz));
    for (let k = 0; k <= 12; k += 1) {
      for (const copy of [k * rateHz + x, Math.abs(k * rateHz - x)]) {
        if (Math.abs(copy - f) > 1e-6) best = Math.max(best, gain(copy));
      }
    }
  }
  return 20 * Math.log10(best);
}

describe('a band that is captured above half the rate', () => {
  const bands = fc.record({
    low: fc.double({ min: 5, max: 60, noNaN: true }),
    width: fc.double({ min: 0.5, max: 6, noNaN: true }),
    pick: fc.double({ min: 0, max: 0.999, noNaN: true }),
    inside: fc.double({ min: 0.05, max: 0.95, noNaN: true }),
  });

  it('keeps its length in every window, upright in odd zones and turned round in even ones', () => {
    fc.assert(
      fc.property(bands, ({ low, width, pick, inside }) => {
        const windows = rateWindows(low, low + width);
        const window = windows[Math.floor(pick * windows.length)];
        assert.ok(window !== undefined);
        const rateHz =
          window.highHz === Infinity ? window.lowHz * (1 + inside) : window.lowHz + inside * (window.highHz - window.lowHz);
        const figures = analyse(capture({ wanted: [wanted(low, low + width)], rate: rate(rateHz) }));
        const [appears] = figures.wanted;
        assert.ok(appears !== undefined);
        assert.deepEqual([figures.zone, figures.inverted], [window.zone, window.zone % 2 === 0]);
        assertWithin(appears.appearsHigh - appears.appearsLow, width, 1e-9 * (low + width));
        const upper = foldFrequency(low + width, rateHz).landsHz;
        assertWithin(upper, figures.inverted === true ? appears.appearsLow : appears.appearsHigh, 1e-9 * (low + width));
      }),
      { seed: 52, numRuns: 200 },
    );
  });

  it('is landed on by its mirror beyond the zone, at the worst end of the clock', () => {
    // In zone 9 a tone f and its mirror (4 + 5)·rate − f land together: that of 4.5 MHz is 4.716 MHz, and 50 ppm of 9 rates move it by
    // 460.8 Hz.
    const echo = (hz: number): Channel =>
      capture({
        wanted: [wanted(4.2e6, 4.5e6)],
        rate: rate(1.024e6, { tolerance: plusMinus(50e-6) }),
        unwanted: [tone(hz)],
        limits: [limit('alias', -60)],
      });
    const mirror = 9 * 1.024e6 - 4.5e6;
    assert.equal(analyse(echo(mirror - 450)).alias?.level, 0);
    assert.equal(analyse(echo(mirror - 475)).alias, null);
  });

  it('lets a source through that stands between the copies of the band', () => {
    const figures = analyse(
      capture({
        wanted: [wanted(4.2e6, 4.5e6)],
        rate: rate(1.024e6),
        unwanted: [band(4.55e6, 4.7e6), band(4.0e6, 4.19e6)],
        limits: [limit('alias', -60)],
      }),
    );
    assert.equal(figures.alias, null);
  });
});
