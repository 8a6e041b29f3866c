/** The reference cases of capture and generate, computed elsewhere by plain numerics; conventions in test/support/system-case.ts. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import { channelPath, gainDb } from '../../src/analysis/channel-path';
import type { Figures } from '../../src/analysis/figures';
import type { Channel } from '../../src/spec/channel';
import { foldFrequency, rateWindows } from '../../src/signal/folding';
import { inverse } from '../../src/signal/response-algebra';
import { largestOverBands } from '../../src/signal/search';
import { limit, capture, rate, wanted } from '../support/channel-builder';
import { captureCase, generateCase, stageOf, systemCase } from '../support/system-case';
import type { CaseGiven, SystemCase } from '../support/system-case';

const dbPerNeper = 20 / Math.LN10;

function near(actual: number | null | undefined, expected: number, tolerance: number, what: string): void {
  assert.ok(
    actual !== null && actual !== undefined && Math.abs(actual - expected) <= tolerance,
    `${what}: ${String(actual)} should be within ${String(tolerance)} of ${String(expected)}`,
  );
}

interface AdcExpected {
  readonly gain_at_band_edges_dB: readonly [number, number];
  readonly passband_min_dB: number;
  readonly passband_max_dB: number;
  readonly droop_at_upper_edge_dB: number;
  readonly interferers: readonly {
    readonly f_Hz: number;
    readonly alias_Hz: number;
    readonly in_band: boolean;
    readonly level_at_output_dBFS: number | null;
    readonly spectrum_inverted: boolean;
  }[];
  readonly worst_in_band_alias: { readonly source_Hz: number; readonly alias_Hz: number; readonly level_dBFS: number };
  readonly worst_any_tone?: { readonly source_Hz: number; readonly alias_Hz: number; readonly level_dBFS: number };
  readonly noise_in_band_dBFS?: { readonly quantisation: number; readonly jitter: number };
  readonly signal_at_output_dBFS?: number;
}

/** Gains over the band: at both edges, least and most. */
function assertBand(
  channel: Channel,
  expected: Omit<AdcExpected, 'interferers' | 'worst_in_band_alias'>,
  gainTolerance: number,
): void {
  const { total } = channelPath(channel);
  const [band] = channel.wanted;
  assert.ok(band !== undefined);
  const range = [{ low: band.lowHz, high: band.highHz }];
  near(gainDb(total, band.lowHz), expected.gain_at_band_edges_dB[0], gainTolerance, 'gain at the lower edge');
  near(gainDb(total, band.highHz), expected.gain_at_band_edges_dB[1], gainTolerance, 'gain at the upper edge');
  near((largestOverBands(total, range)?.logGain ?? NaN) * dbPerNeper, expected.passband_max_dB, gainTolerance, 'largest gain');
  near(
    (largestOverBands(inverse(total), range)?.logGain ?? NaN) * -dbPerNeper,
    expected.passband_min_dB,
    gainTolerance,
    'least gain',
  );
  near(analyse(channel).droop, expected.droop_at_upper_edge_dB, gainTolerance, 'droop');
}

/** Every tone's own fold and level, and the strongest of those that land in the band. */
function assertInterferers({ given, expected, tolerance }: SystemCase<AdcExpected>): void {
  const channel = captureCase(given);
  const figures = analyse(channel);
  const { total } = channelPath(channel);
  expected.interferers.forEach((one, index) => {
    const landing = foldFrequency(one.f_Hz, given.fs_Hz);
    near(landing.landsHz, one.alias_Hz, tolerance.frequency_relative * one.f_Hz, 'landing');
    assert.equal(landing.inverted, one.spectrum_inverted);
    const alias = figures.aliases[index];
    assert.ok(alias !== undefined);
    assert.equal(alias.frequency, one.in_band ? one.f_Hz : null);
    const level = (given.interferers?.[index]?.level_dBFS ?? NaN) + gainDb(total, one.f_Hz);
    // "null" stands for less than −200 dB, an exact null.
    if (one.level_at_output_dBFS === null) assert.ok(level < -200 && (alias.level ?? 0) < -200);
    else near(level, one.level_at_output_dBFS, tolerance.level_dB, 'level');
    if (one.in_band && one.level_at_output_dBFS !== null)
      near(alias.level, one.level_at_output_dBFS, tolerance.level_dB, 'alias');
  });
}

function assertWorstAlias(figures: Figures, worst: AdcExpected['worst_in_band_alias'], levelTolerance: number): void {
  near(figures.alias?.frequency, worst.source_Hz, 1e-6 * worst.source_Hz, 'source of the worst alias');
  near(figures.alias?.lands, worst.alias_Hz, 1e-6 * worst.source_Hz, 'landing of the worst alias');
  near(figures.alias?.level, worst.level_dBFS, levelTolerance, 'level of the worst alias');
}

/** The case's tones alone, without the tone that may stand anywhere. */
function tonesOnly(given: CaseGiven): Channel {
  const channel = captureCase(given);
  return { ...channel, unwanted: channel.unwanted.filter((source) => source.kind === 'tone') };
}

describe('reference cases', () => {
  describe('X01, a telephone band at 8 kHz', () => {
    const one = systemCase<AdcExpected>('X01');
    it('has the stated gains over the band', () => {
      assertBand(captureCase(one.given), one.expected, one.tolerance.gain_dB);
    });
    it('puts every tone where it belongs', () => {
      assertInterferers(one);
    });
    it('finds the worst alias', () => {
      assertWorstAlias(analyse(tonesOnly(one.given)), one.expected.worst_in_band_alias, one.tolerance.level_dB);
    });
  });

  describe('X02, an audio noise budget without its sampling capacitor', () => {
    const one = systemCase<AdcExpected>('X02');
    it('has the stated gains over the band', () => {
      assertBand(captureCase(one.given), one.expected, one.tolerance.gain_dB);
    });
    it('finds the alias', () => {
      assertInterferers(one);
      assertWorstAlias(analyse(captureCase(one.given)), one.expected.worst_in_band_alias, one.tolerance.level_dB);
    });
    it('gives quantisation and jitter in the band and the level of the signal', () => {
      const figures = analyse(captureCase(one.given));
      near(
        figures.noise.quantisation,
        one.expected.noise_in_band_dBFS?.quantisation ?? NaN,
        one.tolerance.level_dB,
        'quantisation',
      );
      near(figures.noise.jitter, one.expected.noise_in_band_dBFS?.jitter ?? NaN, one.tolerance.level_dB, 'jitter');
      near(figures.testTone.atSampler, one.expected.signal_at_output_dBFS ?? NaN, one.tolerance.level_dB, 'signal');
    });
  });

  describe('X03, an averaging aperture as long as the period', () => {
    const one = systemCase<AdcExpected>('X03');
    it('has the stated gains over the band', () => {
      assertBand(captureCase(one.given), one.expected, one.tolerance.gain_dB);
    });
    it('weighs every tone at its own frequency, not where it lands', () => {
      assertInterferers(one);
      assertWorstAlias(analyse(tonesOnly(one.given)), one.expected.worst_in_band_alias, one.tolerance.level_dB);
    });
    it('finds the worst tone that may stand anywhere', () => {
      const { worst_any_tone: worst } = one.expected;
      assert.ok(worst !== undefined);
      assertWorstAlias(analyse(captureCase(one.given)), worst, one.tolerance.level_dB);
    });
  });

  describe('X04, a zero-order hold and a Butterworth filter', () => {
    interface DacExpected extends Omit<AdcExpected, 'interferers' | 'worst_in_band_alias'> {
      readonly worst_image_dBFS: { readonly image_Hz: number; readonly baseband_Hz: number; readonly level_dBFS: number };
      readonly worst_image_dBc: { readonly image_Hz: number; readonly baseband_Hz: number; readonly level_dBc: number };
      readonly tones: readonly { readonly f_Hz: number; readonly outputs: readonly (readonly [number, number])[] }[];
      readonly quantisation_noise_in_band_dBFS: number;
    }
    const one = systemCase<DacExpected>('X04');
    it('has the stated gains over the band', () => {
      assertBand(generateCase(one.given), one.expected, one.tolerance.gain_dB);
    });
    it('finds the strongest image as a level', () => {
      const { image } = analyse(generateCase(one.given, { limits: [limit('image', -20, { unit: 'dBFS' })] }));
      near(image?.frequency, one.expected.worst_image_dBFS.image_Hz, 0.028, 'frequency');
      near(image?.from, one.expected.worst_image_dBFS.baseband_Hz, 0.02, 'baseband');
      near(image?.level, one.expected.worst_image_dBFS.level_dBFS, one.tolerance.level_dB, 'level');
    });
    it('finds the strongest image against the same tone', () => {
      const { image } = analyse(generateCase(one.given, { limits: [limit('image', -20)] }));
      near(image?.frequency, one.expected.worst_image_dBc.image_Hz, 0.028, 'frequency');
      near(image?.from, one.expected.worst_image_dBc.baseband_Hz, 0.02, 'baseband');
      near(image?.relative, one.expected.worst_image_dBc.level_dBc, one.tolerance.level_dB, 'level against the tone');
    });
    it('gives every output of the two tones', () => {
      const { total } = channelPath(generateCase(one.given));
      for (const tone of one.expected.tones) {
        for (const [frequency, level] of tone.outputs) {
          near(gainDb(total, frequency), level, one.tolerance.level_dB, `${String(tone.f_Hz)} Hz at ${String(frequency)} Hz`);
        }
      }
    });
    it('shapes quantisation noise by hold and filter', () => {
      const { noise } = analyse(generateCase(one.given));
      near(noise.quantisation, one.expected.quantisation_noise_in_band_dBFS, one.tolerance.level_dB, 'quantisation');
    });
  });

  describe('X08, rates for an intermediate frequency of 70 MHz', () => {
    interface RateExpected {
      readonly n_max: number;
      readonly windows_n_lo_hi_Hz: readonly (readonly [number, number, number | null])[];
      readonly allowed_rates_Hz: readonly number[];
      readonly lowest_allowed_listed_rate_Hz: number;
      readonly at_that_rate: {
        readonly alias_of_fl_Hz: number;
        readonly alias_of_fu_Hz: number;
        readonly inverted: boolean;
        readonly nyquist_zone: number;
      };
    }
    const one = systemCase<RateExpected>('X08');
    const [low, high] = one.given.band_Hz;
    const channelAt = (hz: number): Channel => capture({ wanted: [wanted(low, high)], rate: rate(hz) });
    it('gives every window', () => {
      const windows = rateWindows(low, high);
      assert.equal(windows.length, one.expected.n_max);
      one.expected.windows_n_lo_hi_Hz.forEach(([zone, lowHz, highHz], index) => {
        const window = windows[index];
        assert.equal(window?.zone, zone);
        near(window.lowHz, lowHz, 1e-6 * lowHz, 'low end');
        if (highHz === null) assert.equal(window.highHz, Infinity);
        else near(window.highHz, highHz, 1e-6 * highHz, 'high end');
      });
    });
    it('lets the band be whole at exactly the allowed rates', () => {
      const allowed = one.given.rates_Hz?.filter((hz) =>
        analyse(channelAt(hz)).faults.every((fault) => fault.kind !== 'wanted-folds'),
      );
      assert.deepEqual(allowed, one.expected.allowed_rates_Hz);
    });
    it('says where the band appears at the lowest allowed rate', () => {
      const expected = one.expected.at_that_rate;
      const figures = analyse(channelAt(one.expected.lowest_allowed_listed_rate_Hz));
      near(figures.wanted[0]?.appearsLow, expected.alias_of_fl_Hz, 1e-6 * low, 'lower edge');
      near(figures.wanted[0]?.appearsHigh, expected.alias_of_fu_Hz, 1e-6 * low, 'upper edge');
      assert.equal(figures.inverted, expected.inverted);
      assert.equal(figures.zone, expected.nyquist_zone);
      near(figures.rateWindow?.low, 21428571.4286, 22, 'window from');
      near(figures.rateWindow?.high, 21666666.6667, 22, 'window to');
    });
  });

  describe('X09, the order of a Butterworth filter', () => {
    const one = systemCase<{ readonly orders: readonly (readonly [number, number, number, number, boolean])[] }>('X09');
    for (const [order, level, droop, span, ok] of one.expected.orders) {
      it(`judges order ${String(order)}`, () => {
        const stages = [stageOf({ ...one.given.filter, order })];
        const channel = captureCase(one.given, { stages, limits: [limit('alias', -80)] });
        const figures = analyse(channel);
        near(figures.alias?.level, level, one.tolerance.level_dB, 'alias');
        near(figures.droop, droop, one.tolerance.gain_dB, 'droop');
        // Measured from the gain at 0 Hz, which is the largest, the departure is the whole span.
        near(flatnessOf(channel), span, one.tolerance.gain_dB, 'span');
        assert.equal(figures.limits[0]?.passes, ok);
      });
    }
  });

  describe('X10, the rate for a second-order filter', () => {
    const one = systemCase<{ readonly rates: readonly (readonly [number, number, number, boolean])[] }>('X10');
    for (const [hz, level, droop, ok] of one.expected.rates) {
      it(`judges ${String(hz)} Hz`, () => {
        const figures = analyse(captureCase({ ...one.given, fs_Hz: hz }, { limits: [limit('alias', -40)] }));
        near(figures.alias?.level, level, one.tolerance.level_dB, 'alias');
        near(figures.droop, droop, one.tolerance.gain_dB, 'droop');
        assert.equal(figures.limits[0]?.passes, ok);
      });
    }
  });
});

function flatnessOf(channel: Channel): number | null | undefined {
  return analyse({ ...channel, limits: [limit('flatness', 3)] }).limits[0]?.value;
}
