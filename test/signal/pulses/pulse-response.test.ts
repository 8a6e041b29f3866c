/** Every pulse against quadrature of its waveform at 60 digits, its limits, and its own bounds. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { pulseArea, pulseEnergy } from '../../../src/signal/pulses/pulse-area';
import { pulseFactors, pulseResponse } from '../../../src/signal/pulses/pulse-response';
import type { PulseShape } from '../../../src/signal/pulses/pulse-shape';
import { largestOverBands, largestOverFolds } from '../../../src/signal/search';
import { readHolds, readPulseVectors, vectorShape } from '../../reference/pulse-vectors';
import { assertBoundsEnclose, assertSlopeEncloses } from '../../support/enclosing';
import { assertClose, assertWithin, roundingRelative } from '../../support/tolerance';
import { everyShape, transform, variation, widthOf } from './waveforms';

const { pulses } = readPulseVectors();
const holds = readHolds();
const gain = (shape: PulseShape, f: number): number => Math.exp(pulseResponse(shape).logGain(f));
const db = (gainValue: number): number => 20 * Math.log10(gainValue);

describe('pulseResponse', () => {
  for (const vector of pulses) {
    const name = `${vector.shape}${vector.extra === null ? '' : ` with ${vector.extra} of its width`}`;
    it(`is what the waveform of ${name} transforms to, at 0/0 and beside nulls too`, () => {
      assert.ok(vector.rows.length > 40);
      for (const [x, size] of vector.rows) assertClose(gain(vectorShape(vector), x), size, roundingRelative, `at ${x}`);
    });

    it(`has the area and the energy of ${name}`, () => {
      assertClose(pulseArea(vectorShape(vector)), vector.area, roundingRelative);
      assertClose(pulseEnergy(vectorShape(vector)), vector.energy, roundingRelative);
    });
  }

  it('has the nulls and the peak of a full-width split pulse', () => {
    const split: PulseShape = { shape: 'split', widthSeconds: 1 };
    for (const f of [0, 2, 4, Infinity]) assert.equal(pulseResponse(split).logGain(f), -Infinity);
    assertWithin(db(gain(split, 0.5)), -3.9224, 1e-4);
    assertWithin(db(gain(split, 1)), -3.9224, 1e-4);
    const peak = largestOverBands(pulseResponse(split), [{ low: 0, high: Infinity }]);
    assert.ok(peak !== null);
    assertClose(Math.exp(peak.logGain), holds.spots['bipolar_full_width_peak_value'] ?? NaN, 2e-4);
    assertWithin(peak.frequencyHz, holds.spots['bipolar_full_width_peak_f_over_fs'] ?? NaN, 1e-2);
    assertClose(
      Math.exp(pulseResponse(split).bounds(0, Infinity).high),
      holds.spots['bipolar_full_width_peak_value'] ?? NaN,
      2e-9,
    );
    assertWithin(db(Math.exp(pulseResponse(split).bounds(0, 2).high)), -2.7979, 1e-4);
  });

  it('takes its limits at removable singularities: π/4 of a half sine and of raised-cosine edges, 1/2 of the Hann pulse', () => {
    assertClose(gain({ shape: 'half-sine', widthSeconds: 1 }, 0.5), Math.PI / 4, 1e-15);
    assertClose(gain({ shape: 'raised-cosine', widthSeconds: 1, edgeSeconds: 0.5 }, 1), 0.5, 1e-15);
    // w·sinc(wx)·π/4 at w·x·b = 1/2, for the half-power width w = 0.5 and the roll-off b = 1: x = 1.
    const hann: PulseShape = { shape: 'raised-cosine', widthSeconds: 1, edgeSeconds: 0.5 };
    assertClose(pulseArea(hann) * gain(hann, 1), (0.5 * Math.sin(Math.PI / 2)) / (Math.PI / 2) / (4 / Math.PI), 1e-15);
  });

  it('has exact nulls where stated widths have them, though none may be a binary fraction', () => {
    for (const rate of [48e3, 61.44e6, 44.1e3, 0.1]) {
      const width = 1 / rate;
      const nulls = (shape: PulseShape, multiples: readonly number[]): void => {
        for (const k of multiples) assert.equal(pulseResponse(shape).logGain(k * rate), -Infinity, `${shape.shape} at ${k}`);
      };
      nulls({ shape: 'linear', periodSeconds: width }, [1, 2, 7, 1000]);
      nulls({ shape: 'triangle', widthSeconds: width }, [2, 4, 6, 14]);
      nulls({ shape: 'half-sine', widthSeconds: width }, [1.5, 2.5, 7.5]);
      nulls({ shape: 'split', widthSeconds: width }, [0, 2, 4, 14]);
      nulls({ shape: 'trapezoid', widthSeconds: 1.2 * width, edgeSeconds: 0.2 * width }, [1, 2, 3, 5, 7]);
      nulls({ shape: 'raised-cosine', widthSeconds: 1.25 * width, edgeSeconds: 0.25 * width }, [1, 2, 3, 6, 7]);
    }
  });

  it('becomes a rectangle as edges vanish or the decay grows, and one real pole as it shortens', () => {
    for (const f of [0, 0.3, 0.7, 1.4, 5.5]) {
      const flat = gain({ shape: 'rectangle', widthSeconds: 1 }, f);
      assertClose(gain({ shape: 'trapezoid', widthSeconds: 1, edgeSeconds: 0 }, f), flat, roundingRelative);
      assertClose(gain({ shape: 'raised-cosine', widthSeconds: 1, edgeSeconds: 0 }, f), flat, roundingRelative);
      assertClose(gain({ shape: 'exponential', widthSeconds: 1, decaySeconds: 1e200 }, f), flat, roundingRelative);
      const pole = 1 / Math.hypot(1, 2 * Math.PI * f * 1e-3);
      assertClose(gain({ shape: 'exponential', widthSeconds: 1, decaySeconds: 1e-3 }, f), pole, roundingRelative);
    }
  });

  it('is the numerical Fourier transform of its waveform at random shapes and frequencies', () => {
    fc.assert(
      fc.property(everyShape, fc.double({ min: 0, max: 6, noNaN: true }), (shape, x) => {
        const f = x / widthOf(shape);
        const { re, im } = transform(shape, f);
        assertWithin(gain(shape, f), Math.hypot(re, im) / pulseArea(shape), 1e-9, `${JSON.stringify(shape)} at ${f}`);
      }),
      { seed: 51, numRuns: 150 },
    );
  });

  it('keeps to |P| ≤ V/(2πf) and to a slope of π·width at most, as every pulse must', () => {
    fc.assert(
      fc.property(
        everyShape,
        fc.double({ min: -3, max: 4, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (shape, decade, step) => {
          const width = widthOf(shape);
          const f = 10 ** decade / width;
          const next = f + step / width;
          const envelope = variation(shape) / (2 * Math.PI * f * pulseArea(shape));
          assert.ok(gain(shape, f) <= envelope * (1 + 1e-12));
          assert.ok(Math.abs(gain(shape, next) - gain(shape, f)) <= Math.PI * width * (next - f) * (1 + 1e-9) + 1e-14);
        },
      ),
      { seed: 52, numRuns: 300 },
    );
  });

  const enclosed: readonly PulseShape[] = [
    { shape: 'triangle', widthSeconds: 1 },
    { shape: 'half-sine', widthSeconds: 1 },
    { shape: 'half-sine', widthSeconds: 3e-9 },
    { shape: 'split', widthSeconds: 1 },
    { shape: 'linear', periodSeconds: 0.5 },
    { shape: 'trapezoid', widthSeconds: 1.2, edgeSeconds: 0.2 },
    { shape: 'raised-cosine', widthSeconds: 1, edgeSeconds: 0.5 },
    { shape: 'raised-cosine', widthSeconds: 1.3, edgeSeconds: 0.1 },
    ...[1e-3, 0.05, 0.14, 0.2, 0.5, 3, 1e4, 1e12].map((decaySeconds): PulseShape => ({
      shape: 'exponential',
      widthSeconds: 1,
      decaySeconds,
    })),
  ];
  enclosed.forEach((shape, index) => {
    it(`encloses gain and slope over any interval: ${JSON.stringify(shape)}`, () => {
      assertBoundsEnclose(pulseResponse(shape), 1 / widthOf(shape), 60 + index);
      assertSlopeEncloses(pulseResponse(shape), 1 / widthOf(shape), 160 + index);
    });

    it(`lets a search over every fold prove its answer in few steps: ${JSON.stringify(shape)}`, () => {
      const rate = 1 / widthOf(shape);
      const found = largestOverFolds({
        rateHz: { low: rate, high: rate },
        outer: pulseResponse(shape),
        inner: null,
        bands: [{ low: 0.02 * rate, high: 0.4 * rate }],
        within: null,
        firstFold: 1,
        lastFold: Infinity,
        sides: 'both',
      });
      assert.ok(found !== null && found.gapDb <= 0.001 && found.evaluations < 300, JSON.stringify(found));
      for (let k = 1; k < 6; k += 1) {
        for (let i = 0; i <= 200; i += 1) {
          const x = (0.02 + 0.0019 * i) * rate;
          for (const f of [k * rate - x, k * rate + x]) assert.ok(pulseResponse(shape).logGain(f) <= found.logGain + 1e-9);
        }
      }
    });
  });

  it('refuses lengths that make no pulse', () => {
    const bad: readonly PulseShape[] = [
      { shape: 'triangle', widthSeconds: 0 },
      { shape: 'linear', periodSeconds: NaN },
      { shape: 'half-sine', widthSeconds: Infinity },
      { shape: 'exponential', widthSeconds: 1, decaySeconds: 0 },
      { shape: 'trapezoid', widthSeconds: 1, edgeSeconds: 0.51 },
      { shape: 'raised-cosine', widthSeconds: 1, edgeSeconds: -0.1 },
    ];
    for (const shape of bad) assert.throws(() => pulseFactors(shape), RangeError, JSON.stringify(shape));
  });
});
