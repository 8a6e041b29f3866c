/** Every pulse shape as aperture and as hold, against plain formulas on a dense grid. */
import assert from 'node:assert/strict';
import { analyse, channelPath, pulseNulls } from '../../src/analysis';
import { pulsePhaseRad } from '../../src/analysis/pulse';
import { wholePulse } from '../../src/analysis/whole-pulse';
import type { Channel, Pulse } from '../../src/spec/channel';
import { band, butterworthForm, capture, generate, limit, plusMinus, rate, stage, wanted } from '../support/channel-builder';
import { plainHold, plainSpectrum } from '../support/plain-pulse';
import { assertClose, assertWithin, provedGapDb } from '../support/tolerance';

const share = (value: number) => ({ share: value });
const seconds = (value: number) => ({ seconds: value });

/** One of each shape, by shares and by times, and those that mix the two. */
const pulses: Readonly<Record<string, Pulse>> = {
  rectangle: { shape: 'rectangle', width: share(0.7) },
  triangle: { shape: 'triangle', width: share(1.4) },
  linear: { shape: 'linear' },
  'half-sine': { shape: 'half-sine', width: seconds(8e-6) },
  'raised cosine': { shape: 'raised-cosine', width: share(1), edge: share(0.25) },
  'raised cosine without a flat part': { shape: 'raised-cosine', width: share(1), edge: share(0.5) },
  trapezoid: { shape: 'trapezoid', width: seconds(9e-6), edge: seconds(2e-6) },
  'trapezoid of a period with edges of 700 ns': { shape: 'trapezoid', width: share(1), edge: seconds(7e-7) },
  'a zero-order hold that slews': { shape: 'trapezoid', width: share(1.2), edge: share(0.2) },
  exponential: { shape: 'exponential', width: share(1), decay: share(0.2) },
  'an exponential of a period with a decay of 3 µs': { shape: 'exponential', width: share(1), decay: seconds(3e-6) },
  split: { shape: 'split', width: share(1) },
};

const rateHz = 100e3;
const dB = (gain: number): number => 20 * Math.log10(gain);
const grid = (low: number, high: number, count: number): readonly number[] =>
  Array.from({ length: count + 1 }, (_, index) => low + ((high - low) * index) / count);
const largest = (values: readonly number[]): number => values.reduce((a, b) => Math.max(a, b), -Infinity);

/** A butterworth low-pass by its formula. */
const low = (order: number, corner: number) => (f: number) => (1 + (f / corner) ** (2 * order)) ** -0.5;
const filter = low(2, 60e3);
const stages = [stage(butterworthForm(2, 60e3))];
const wantedBand = wanted(2e3, 20e3, -3);
const referenceHz = 10e3;

/** What a grid of the density used here may miss of a smooth maximum, beside the proof's own gap. */
const gridDb = 0.003;

describe('a pulse of every shape', () => {
  for (const [name, pulse] of Object.entries(pulses)) {
    it(`as an aperture weighs a source at its input frequency: ${name}`, () => {
      const source = band(75e3, 420e3, -10);
      const channel = capture({ wanted: [wantedBand], rate: rate(rateHz), referenceHz, pulse, stages, unwanted: [source] });
      const inputs = [1, 2, 3, 4].flatMap((fold) => [
        ...grid(Math.max(fold * rateHz - 20e3, 75e3), fold * rateHz - 2e3, 1500),
        ...grid(fold * rateHz + 2e3, Math.min(fold * rateHz + 20e3, 420e3), 1500),
      ]);
      const expected = -10 + largest(inputs.map((f) => dB(plainSpectrum(pulse, rateHz, f) * filter(f))));
      assertWithin(analyse(channel).alias?.level ?? NaN, expected, gridDb);
    });

    it(`as a hold weighs images at the output frequency: ${name}`, () => {
      const channel = generate({ wanted: [wantedBand], rate: rate(rateHz), referenceHz, pulse, stages });
      const out = (f: number): number => plainHold(pulse, rateHz, f) * filter(f);
      const outputs = grid(2e3, 20e3, 1500).flatMap((x) => [1, 2, 3].flatMap((k) => [k * rateHz - x, k * rateHz + x]));
      const byLevel = analyse({ ...channel, limits: [limit('image', -40, { unit: 'dBFS' })] });
      assertWithin(byLevel.image?.level ?? NaN, -3 + largest(outputs.map((f) => dB(out(f)))), gridDb);
      const ratios = grid(2e3, 20e3, 1500).flatMap((x) =>
        [1, 2, 3].flatMap((k) => [k * rateHz - x, k * rateHz + x].map((f) => dB(out(f) / out(x)))),
      );
      const byRatio = analyse({ ...channel, limits: [limit('image', -40)] });
      assertWithin(byRatio.image?.relative ?? NaN, largest(ratios), gridDb);
    });

    it(`makes the wanted band as flat as its spectrum is: ${name}`, () => {
      const channel = generate({
        wanted: [wantedBand],
        rate: rate(rateHz),
        referenceHz,
        pulse,
        stages,
        limits: [limit('flatness', 1)],
      });
      const out = (f: number): number => plainHold(pulse, rateHz, f) * filter(f);
      const departures = grid(2e3, 20e3, 20_000).map((f) => Math.abs(dB(out(f) / out(referenceHz))));
      const figures = analyse(channel);
      assertWithin(figures.limits[0]?.value ?? NaN, largest(departures), provedGapDb);
      assertWithin(figures.droop ?? NaN, dB(out(referenceHz) / out(20e3)), 1e-9);
    });

    it(`passes nothing at its nulls and only there: ${name}`, () => {
      const nulls = pulseNulls(pulse, rateHz, 6);
      for (const hz of nulls) assert.ok(plainSpectrum(pulse, rateHz, hz) < 1e-12, String(hz));
      const top = (nulls.at(-1) ?? 1e6) * (1 - 1e-9);
      const dips = grid(1, top, 20_000).filter(
        (f) => plainSpectrum(pulse, rateHz, f) * f < 1e-3 * plainSpectrum(pulse, rateHz, 1e3) * 1e3,
      );
      const far = dips.filter((f) => f > 100 && nulls.every((hz) => Math.abs(f - hz) > 0.02 * hz));
      assert.deepEqual(far, []);
    });
  }

  it('with nulls on every multiple of the rate comes apart into what stands at F and what stands at x', () => {
    for (const name of ['linear', 'a zero-order hold that slews']) {
      const pulse = pulses[name]!;
      const parts = wholePulse({ direction: 'generate', pulse }, rateHz);
      assert.ok(parts !== null, name);
      for (const [fold, x] of [
        [1, -13e3],
        [3, 21e3],
        [40, 1e3],
      ] as const) {
        const together = parts.envelope.logGain(fold * rateHz + x) + parts.ripple.logGain(Math.abs(x));
        assertClose(Math.exp(together), plainHold(pulse, rateHz, fold * rateHz + x), 1e-9, name);
      }
    }
    for (const name of ['rectangle', 'exponential', 'split', 'half-sine']) {
      assert.equal(wholePulse({ direction: 'generate', pulse: pulses[name]! }, rateHz), null, name);
    }
  });

  it('has a phase that its delay is the slope of', () => {
    for (const pulse of Object.values(pulses)) {
      const path = channelPath(generate({ wanted: [wantedBand], pulse, rate: rate(rateHz) }));
      const [f, step] = [17e3, 1];
      const slope = (pulsePhaseRad(pulse, rateHz, f + step) - pulsePhaseRad(pulse, rateHz, f - step)) / (2 * step);
      const figures = analyse({ ...path.channel, referenceHz: f });
      assertClose(figures.delay ?? NaN, -slope / (2 * Math.PI), 1e-6, pulse.shape);
    }
  });
});

describe('a pulse while the clock deviates', () => {
  const tolerance = plusMinus(0.02);
  const rates = grid(98e3, 102e3, 40);

  /** The largest departure over the band at every rate of a grid. */
  function departure(channel: Channel): number {
    const out = (f: number, at: number): number => plainHold(channel.pulse, at, f);
    return largest(rates.flatMap((at) => grid(2e3, 20e3, 400).map((f) => Math.abs(dB(out(f, at) / out(referenceHz, at))))));
  }

  for (const [name, pulse] of Object.entries(pulses)) {
    it(`is taken at its worst rate, and not far beyond: ${name}`, () => {
      const channel = generate({
        wanted: [wantedBand],
        rate: rate(rateHz, { tolerance }),
        referenceHz,
        pulse,
        limits: [limit('flatness', 1)],
      });
      const value = analyse(channel).limits[0]?.value ?? NaN;
      const expected = departure(channel);
      assert.ok(value >= expected - 1e-9, `${value} is below ${expected}`);
      assert.ok(value <= expected * 1.001 + provedGapDb, `${value} is far above ${expected}`);
    });
  }
});
