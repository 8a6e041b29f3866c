/** The rectangle's spectrum against 50-digit arithmetic, published values, and a direct Fourier transform of a held tone. */
import assert from 'node:assert/strict';
import { rectangleResponse } from '../../../src/signal/pulses/rectangle';
import { readVectors } from '../../reference/signal-vectors';
import { assertBoundsEnclose, assertSlopeEncloses } from '../../support/enclosing';
import { assertClose, assertWithin, roundingRelative } from '../../support/tolerance';

const { sinc, sideLobes } = readVectors();
const lossDb = (widthSeconds: number, f: number): number => (-20 / Math.LN10) * rectangleResponse(widthSeconds).logGain(f);

/** (1/T)·|∫ x(t)·e^(−j2πft) dt| of a held tone over one record, integrated numerically: 3-point Gauss on 96 slices of every hold. */
function staircaseLine(samples: readonly number[], heldShare: number, f: number): number {
  const slices = 96;
  const nodes = [-Math.sqrt(0.6), 0, Math.sqrt(0.6)];
  const weights = [5 / 9, 8 / 9, 5 / 9];
  let re = 0;
  let im = 0;
  samples.forEach((sample, n) => {
    for (let slice = 0; slice < slices; slice += 1) {
      nodes.forEach((node, index) => {
        const t = n + (heldShare * (slice + 0.5 + 0.5 * node)) / slices;
        const weight = (weights[index]! * heldShare * sample) / (2 * slices);
        re += weight * Math.cos(2 * Math.PI * f * t);
        im -= weight * Math.sin(2 * Math.PI * f * t);
      });
    }
  });
  return (2 * Math.hypot(re, im)) / samples.length;
}

describe('rectangleResponse', () => {
  it('is |sinc| to rounding, beside 0 Hz and beside its nulls too', () => {
    for (const [x, expected] of sinc)
      assertClose(Math.exp(rectangleResponse(1).logGain(x)), expected, roundingRelative, `at ${x}`);
  });

  // Loss in dB over f/rate of a zero-order hold, mpmath at 50 digits; 3.9224 dB at half the rate is in every textbook.
  for (const [x, db] of [
    [0.1, 0.14335017216188],
    [0.25, 0.91209758396324],
    [0.4, 2.4200707695417],
    [0.45, 3.1148491880882],
    [0.5, 3.9223975406031],
    [0.75, 10.454522678356],
    [1.5, 13.4648226348],
    [2.5, 17.9017976272],
  ] as const) {
    it(`loses ${db.toFixed(4)} dB at ${x} of the rate as a zero-order hold`, () => {
      assertClose(lossDb(1 / 48000, x * 48000), db, 1e-9);
    });
  }

  it('has the droops of the trade: 20 kHz at 44.1 and 48 kHz, 3.4 kHz at 8 kHz, 5.75 MHz at 13.5 MHz', () => {
    assertWithin(lossDb(1 / 44100, 20e3), 3.1678, 1e-4);
    assertWithin(lossDb(1 / 48000, 20e3), 2.6399, 1e-4);
    assertWithin(lossDb(1 / 8000, 3400), 2.7541, 1e-4);
    assertWithin(lossDb(1 / 13.5e6, 5.75e6), 2.767, 1e-4);
  });

  it('has half power at 0.44294647 and a loss of 0.1 and 1 dB at 0.08356379 and 0.2615001 of the rate', () => {
    assertWithin(lossDb(1, 0.44294647), 10 * Math.log10(2), 1e-6);
    assertWithin(lossDb(1, 0.08356379), 0.1, 1e-6);
    assertWithin(lossDb(1, 0.2615001), 1, 1e-5);
  });

  it('has its null at every multiple of 1/width, though neither may be a binary fraction', () => {
    for (const rate of [48e3, 61.44e6, 44.1e3, 0.1]) {
      for (const k of [1, 2, 3, 7, 49, 1000]) assert.equal(rectangleResponse(1 / rate).logGain(k * rate), -Infinity);
    }
  });

  it('has an upper bound over each side lobe that is the lobe’s own peak', () => {
    for (const [lobe, at, peak] of sideLobes) {
      assertClose(Math.exp(rectangleResponse(1).bounds(lobe, lobe + 1).high), peak, 2e-9);
      assertClose(Math.exp(rectangleResponse(1).bounds(lobe + 0.999, Infinity).high), peakAfter(lobe), 2e-9);
      assertClose(Math.exp(rectangleResponse(1).logGain(at)), peak, 1e-12);
    }
  });

  /** The peak of the lobe above, from tan z = z by plain iteration z ← π(n + ½) − atan(1/z). */
  function peakAfter(lobe: number): number {
    let z = Math.PI * (lobe + 1.5);
    for (let i = 0; i < 60; i += 1) z = Math.PI * (lobe + 1.5) - Math.atan(1 / z);
    return 1 / Math.hypot(1, z);
  }

  it('encloses its gain and its slope over any interval', () => {
    assertBoundsEnclose(rectangleResponse(1), 1, 41);
    assertBoundsEnclose(rectangleResponse(3e-9), 1e8, 42);
    assertSlopeEncloses(rectangleResponse(1), 1, 43);
  });

  it('is bounded by its envelope where lobes are too fine to tell apart', () => {
    const { low, high } = rectangleResponse(1).bounds(1e12, 1e15);
    assert.equal(low, -Infinity);
    assertWithin(high, -Math.log(Math.PI * 1e12), 1e-8);
  });

  it('is flat for an instant, and refuses a width below 0 s', () => {
    assert.equal(rectangleResponse(0).logGain(1e12), 0);
    assert.deepEqual(rectangleResponse(0).bounds(0, Infinity), { low: 0, high: 0 });
    for (const width of [-1, NaN, Infinity]) assert.throws(() => rectangleResponse(width), RangeError);
  });

  for (const [name, share] of [
    ['a zero-order hold', 1],
    ['a hold of a quarter of the period', 0.25],
  ] as const) {
    it(`gives the images of ${name} that a numerical Fourier transform of the staircase gives`, () => {
      // A tone of amplitude 1 on bin 9 of 64 samples; its copies stand on k·64 ± 9, each at (width/T)·|sinc(f·width)|.
      const samples = Array.from({ length: 64 }, (_, n) => Math.cos((2 * Math.PI * 9 * n) / 64 + 0.3));
      for (const bin of [9, 64 - 9, 64 + 9, 128 - 9, 128 + 9, 192 - 9, 320 + 9]) {
        const f = bin / 64;
        assertClose(share * Math.exp(rectangleResponse(share).logGain(f)), staircaseLine(samples, share, f), 1e-9, `bin ${bin}`);
      }
    });
  }
});
