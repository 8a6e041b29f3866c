/** Pulses as holds, apertures and gates: |P|/T, the values to remember, Fourier coefficients of pulse trains, delays. */
import assert from 'node:assert/strict';
import { gateCoefficient, logGateWeight } from '../../../src/signal/pulses/gate';
import { pulseArea } from '../../../src/signal/pulses/pulse-area';
import { pulseDelay } from '../../../src/signal/pulses/pulse-delay';
import { pulseResponse } from '../../../src/signal/pulses/pulse-response';
import type { PulseShape } from '../../../src/signal/pulses/pulse-shape';
import { trackAndHoldDelay } from '../../../src/signal/pulses/track-and-hold';
import { readHolds, type HoldTable } from '../../reference/pulse-vectors';
import { filterRelative } from '../../support/tolerance';
import type { OutsideGroup } from '../group';

const holds = readHolds();
const rate = 44.1e3;
const rectangle = (widthSeconds: number): PulseShape => ({ shape: 'rectangle', widthSeconds });
const gain = (shape: PulseShape, f: number): number => pulseArea(shape) * Math.exp(pulseResponse(shape).logGain(f));
const levelDb = (shape: PulseShape, f: number): number => 20 * Math.log10(gain(shape, f));

/** A shape of the table, period 1; null for the extrapolating hold, which is no pulse of ours. */
function shapeOf({ shape, duty = 1, duty_each = 0, fwhm = 0, ramp = 0, rolloff = 0 }: HoldTable): PulseShape | null {
  switch (shape) {
    case 'zero_order_hold':
    case 'return_to_zero':
      return rectangle(duty);
    case 'linear_interpolation_hold':
      return { shape: 'linear', periodSeconds: 1 };
    case 'bipolar_plus_then_minus':
      return { shape: 'split', widthSeconds: 2 * duty_each };
    case 'trapezoid':
      return { shape: 'trapezoid', widthSeconds: fwhm + ramp, edgeSeconds: ramp };
    case 'raised_cosine_edges':
      return { shape: 'raised-cosine', widthSeconds: fwhm * (1 + rolloff), edgeSeconds: fwhm * rolloff };
    default:
      return null;
  }
}

/** The hold that extrapolates the last two samples is not offered; its gain is √(1 + (2πx)²)·sinc²x. */
function extrapolating(x: number): number {
  return Math.hypot(1, 2 * Math.PI * x) * gain({ shape: 'linear', periodSeconds: 1 }, x);
}

/** The group of |P|/T. */
export const pulses: OutsideGroup = {
  title: 'Holds and apertures, |P|/T over f/fs',
  source: 'mpmath closed forms, 50 digits, each asserted against quadrature of its waveform',
  define: (tally) => {
    for (const table of holds.shapes) {
      const shape = shapeOf(table);
      const stated = [table.duty, table.duty_each, table.fwhm, table.ramp, table.rolloff].filter((value) => value !== undefined);
      it(`follow the table of ${table.shape} ${stated.join(' ')}`, () => {
        assert.equal(table.table.length, 24);
        for (const [x, expected] of table.table)
          tally.relative(shape === null ? extrapolating(x) : gain(shape, x), expected, filterRelative, `${table.shape} at ${x}`);
      });
    }
  },
};

/** Where the zero-order hold is a given loss down: the name in the file, and the loss in dB. */
const lossSpots = { zoh_half_power_f_over_fs: 10 * Math.log10(2), zoh_minus_0p1_dB_f_over_fs: 0.1, zoh_minus_1_dB_f_over_fs: 1 };

/** The group of single values. */
export const holdValues: OutsideGroup = {
  title: 'Values of holds to remember',
  source: 'common practice, recomputed at 50 digits',
  define: (tally) => {
    const zeroOrder = rectangle(1);
    const split: PulseShape = { shape: 'split', widthSeconds: 1 };
    it('has the losses and points of a zero-order hold', () => {
      for (const [name, loss] of Object.entries(lossSpots))
        tally.decibels(levelDb(zeroOrder, holds.spots[name] ?? NaN), -loss, filterRelative, name);
      tally.decibels(levelDb(zeroOrder, 0.5), -3.9224, 1e-4, 'at half the rate');
      tally.decibels(levelDb(zeroOrder, 1.4303), -13.2615, 1e-3, 'first side lobe');
      tally.relative(gain(zeroOrder, 0.5), 2 / Math.PI, filterRelative, 'at half the rate');
      const lobe = pulseResponse(zeroOrder).bounds(1, 2).high * (20 / Math.LN10);
      tally.decibels(lobe, holds.spots['zoh_first_sidelobe_dB'] ?? NaN, 1e-8, 'first side lobe');
      for (const [f, fs, droop] of [
        [20e3, 44.1e3, 3.1678],
        [20e3, 48e3, 2.6399],
        [3.4e3, 8e3, 2.7541],
        [5.75e6, 13.5e6, 2.767],
        [8e6, 13.5e6, 5.7709],
      ] as const)
        tally.decibels(levelDb(rectangle(1 / fs), f) - levelDb(rectangle(1 / fs), 0), -droop, 1e-4, `${f} Hz at ${fs} Hz`);
    });

    it('has those of other shapes', () => {
      tally.decibels(levelDb(rectangle(0.5), 0.5), -6.9327, 1e-4, 'half width at fs/2');
      tally.decibels(levelDb(rectangle(0.5), 0.5) - levelDb(rectangle(0.5), 0), -0.9121, 1e-4, 'half width at fs/2 against 0 Hz');
      tally.decibels(levelDb(rectangle(0.5), 1), -9.943, 1e-4, 'half width at fs');
      tally.decibels(levelDb({ shape: 'linear', periodSeconds: 1 }, 0.5), -7.8448, 1e-4, 'straight lines at fs/2');
      tally.decibels(20 * Math.log10(extrapolating(0.5)), 2.5173, 1e-4, 'extrapolating at fs/2');
      tally.decibels(20 * Math.log10(extrapolating(0.33879)), 4.0148, 1e-4, 'extrapolating at its maximum');
      for (const x of [0.5, 1]) tally.decibels(levelDb(split, x), -3.9224, 1e-4, `split at ${x}`);
      for (const x of [0, 2]) tally.exact(levelDb(split, x), -Infinity, `split at ${x}`);
      const peak = gain(split, holds.spots['bipolar_full_width_peak_f_over_fs'] ?? NaN);
      tally.relative(peak, holds.spots['bipolar_full_width_peak_value'] ?? NaN, filterRelative, 'split at its maximum');
      const most = Math.exp(pulseResponse(split).bounds(0, 2).high);
      tally.relative(most, holds.spots['bipolar_full_width_peak_value'] ?? NaN, 1e-8, 'the maximum of split');
      // A removable 0/0 of the Hann pulse: w·sinc(wx)·π/4 at w·x·b = 1/2, w = 0.5, b = 1.
      const hann: PulseShape = { shape: 'raised-cosine', widthSeconds: 1, edgeSeconds: 0.5 };
      tally.relative(gain(hann, 1), (0.5 * (2 / Math.PI) * Math.PI) / 4, filterRelative, 'Hann at 0/0');
    });

    it('loses 23.50 dB to an averaging aperture of a period at 1.0723 of the rate, and not 0.07 dB as at the alias', () => {
      tally.decibels(levelDb(zeroOrder, 1.0723), -23.5, 5e-3, 'at the input frequency');
      tally.decibels(levelDb(zeroOrder, 0.0723), -0.07, 5e-3, 'at the alias frequency');
    });
  },
};

/** The group of pulse trains. */
export const trains: OutsideGroup = {
  title: 'Fourier coefficients of pulse trains',
  source: 'c_k = d·sinc(kd)·e^(−jπkd), mpmath, 50 digits',
  define: (tally) => {
    for (const { duty, c } of holds.trains) {
      it(`are those of a duty of ${duty.toFixed(3)}`, () => {
        for (const [k, re, im] of c) {
          const size = Math.hypot(re, im);
          const actual = gateCoefficient(rectangle(duty / rate), rate, k);
          const off = Math.hypot(actual.re - re, actual.im - im);
          tally.relative(size + off, size, filterRelative, `duty ${duty}, k = ${k}`);
        }
      });
    }

    it('lose −12.0412, −12.9533, −15.9636, −22.4957 dB, all, −26.9327 dB at a quarter of the period', () => {
      [-12.0412, -12.9533, -15.9636, -22.4957, -Infinity, -26.9327].forEach((expected, k) => {
        tally.decibels((20 / Math.LN10) * logGateWeight(rectangle(0.25 / rate), rate, k), expected, 1e-4, `k = ${k}`);
      });
    });
  },
};

/** The group of narrow gates. */
export const narrowGates: OutsideGroup = {
  title: 'Narrow gates of constant area',
  source: 'common practice, no source',
  define: (tally) => {
    it('all become 1/T as a gate narrows with its area held at 1, and c_0 is the duty', () => {
      for (const duty of [1e-3, 1e-6]) {
        const shape = rectangle(duty / rate);
        for (const k of [0, 1, 5, 20]) {
          const weight = Math.exp(logGateWeight(shape, rate, k)) / pulseArea(shape);
          // 1 − sinc(x) is (πx)²/6 at most.
          tally.relative(weight, rate, (Math.PI * k * duty) ** 2 / 6 + 1e-12, `k = ${k}, duty ${duty}`);
        }
        tally.relative(Math.exp(logGateWeight(shape, rate, 0)), duty, 1e-12, `c_0 of ${duty}`);
      }
    });
  },
};

/** The group of delays. */
export const delays: OutsideGroup = {
  title: 'Delays of pulses and of track and hold',
  source: 'closed forms e²·T/2 and τ − w/(e^(w/τ) − 1)',
  define: (tally) => {
    it('is 0.405, 0.245, 0.125 and 0.005 of the period at 0 Hz for 0.1, 0.3, 0.5 and 0.9 of it tracked', () => {
      for (const [trackShare, expected] of [
        [0.1, 0.405],
        [0.3, 0.245],
        [0.5, 0.125],
        [0.9, 0.005],
      ] as const)
        tally.absolute(trackAndHoldDelay({ trackShare, periodSeconds: 1 }, 0), expected, 1e-6, `${trackShare} tracked`);
    });

    it('is 0.19321634 of the width at 0 Hz for an exponential that decays in a fifth of it', () => {
      const shape: PulseShape = { shape: 'exponential', widthSeconds: 1, decaySeconds: 0.2 };
      tally.absolute(pulseDelay(shape, 0), 0.19321634, 1e-8, 'exponential');
    });
  },
};
