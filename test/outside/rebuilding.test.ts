/** All copies together rebuild what leaves a sampler: the staircase of a hold, the lines from sample to sample, the gate itself; and folds undo unfolds. */
import fc from 'fast-check';
import { foldFrequency, landingFrequencies } from '../../src/signal/folding';
import { gateCoefficient } from '../../src/signal/pulses/gate';
import { pulseArea } from '../../src/signal/pulses/pulse-area';
import { pulsePhase } from '../../src/signal/pulses/pulse-phase';
import { pulseResponse } from '../../src/signal/pulses/pulse-response';
import type { PulseShape } from '../../src/signal/pulses/pulse-shape';
import { everyShape, waveform, widthOf } from '../signal/pulses/waveforms';
import { assertWithin } from '../support/tolerance';

interface Value {
  readonly re: number;
  readonly im: number;
}

const turned = (size: number, rad: number): Value => ({ re: size * Math.cos(rad), im: size * Math.sin(rad) });
const lastCopy = 4000;

/** Σ (1 − |k|/K)·copy(k), the means of the partial sums: they converge beside steps too. */
function meanOfSums(copy: (k: number) => Value): Value {
  let re = 0;
  let im = 0;
  for (let k = -lastCopy; k <= lastCopy; k += 1) {
    const value = copy(k);
    re += (1 - Math.abs(k) / lastCopy) * value.re;
    im += (1 - Math.abs(k) / lastCopy) * value.im;
  }
  return { re, im };
}

/** What a sampled tone e^(j2πft) leaves behind a hold at a moment, copy by copy: P(f + k/T)/T·e^(j2π(f + k/T)t). */
function copiesAt(shape: PulseShape, rateHz: number, f: number, t: number): Value {
  const response = pulseResponse(shape);
  const area = pulseArea(shape) * rateHz;
  return meanOfSums((k) => {
    const output = f + k * rateHz;
    return turned(area * Math.exp(response.logGain(Math.abs(output))), pulsePhase(shape, output) + 2 * Math.PI * output * t);
  });
}

/** The same from the samples: Σ p(t − nT)·e^(j2πfnT). */
function staircaseAt(shape: PulseShape, rateHz: number, f: number, t: number): Value {
  let re = 0;
  let im = 0;
  for (let n = Math.ceil((t - widthOf(shape)) * rateHz); n <= Math.floor(t * rateHz); n += 1) {
    const sample = turned(waveform(shape, t - n / rateHz), (2 * Math.PI * f * n) / rateHz);
    re += sample.re;
    im += sample.im;
  }
  return { re, im };
}

/** A moment in the period that is a tenth of it away from every step: those at the sample, at the pulse's end and at the middle of `split`. */
function farFromSteps(shape: PulseShape, rateHz: number, share: number): boolean {
  const steps = [0, widthOf(shape) * rateHz, 0.5 * widthOf(shape) * rateHz];
  return steps.every((step) => Math.abs(share - step - Math.round(share - step)) > 0.1);
}

describe('the copies of a band-limited signal', () => {
  const shares = fc.integer({ min: 0, max: 1000 }).map((thousandths) => thousandths / 1000);
  // The means are off by V/(π²·K·0.1) beside a step, V ≤ 4.
  const slack = 4 / (Math.PI ** 2 * lastCopy * 0.1);

  it('rebuild the held samples, whatever the pulse, at any moment', () => {
    fc.assert(
      fc.property(everyShape, shares, shares, shares, (shape, fill, tone, moment) => {
        // From a tenth of the period up to two periods.
        const rateHz = (0.1 + 1.9 * fill) / widthOf(shape);
        fc.pre(farFromSteps(shape, rateHz, moment));
        const f = (tone - 0.5) * rateHz;
        const rebuilt = copiesAt(shape, rateHz, f, moment / rateHz);
        const expected = staircaseAt(shape, rateHz, f, moment / rateHz);
        assertWithin(rebuilt.re, expected.re, slack, JSON.stringify(shape));
        assertWithin(rebuilt.im, expected.im, slack, JSON.stringify(shape));
      }),
      { seed: 71, numRuns: 60 },
    );
  });

  it('rebuild a staircase behind a zero-order hold, and lines between the samples, a period late, behind `linear`', () => {
    for (const f of [0, 0.07, -0.31, 0.49]) {
      const sample = (n: number): Value => turned(1, 2 * Math.PI * f * n);
      for (const share of [0.2, 0.5, 0.83]) {
        const step = copiesAt({ shape: 'rectangle', widthSeconds: 1 }, 1, f, 3 + share);
        assertWithin(step.re, sample(3).re, slack);
        assertWithin(step.im, sample(3).im, slack);
        const line = copiesAt({ shape: 'linear', periodSeconds: 1 }, 1, f, 4 + share);
        assertWithin(line.re, (1 - share) * sample(3).re + share * sample(4).re, slack);
        assertWithin(line.im, (1 - share) * sample(3).im + share * sample(4).im, slack);
      }
    }
  });

  it('rebuild the tone itself while a natural gate is open, and nothing while it is shut', () => {
    const shape: PulseShape = { shape: 'rectangle', widthSeconds: 0.4 };
    for (const [share, gate] of [
      [0.15, 1],
      [0.3, 1],
      [0.55, 0],
      [0.85, 0],
    ] as const) {
      const { re, im } = meanOfSums((k) => {
        const c = gateCoefficient(shape, 1, k);
        const carrier = turned(1, 2 * Math.PI * k * share);
        return { re: c.re * carrier.re - c.im * carrier.im, im: c.re * carrier.im + c.im * carrier.re };
      });
      assertWithin(re, gate, slack);
      assertWithin(im, 0, slack);
    }
  });
});

describe('folding and unfolding', () => {
  it('undo each other: a frequency is among those that land where it lands, at its own fold and on its own side', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 2000, noNaN: true }), fc.constantFrom(1, 48e3, 61.44e6, 0.1), (multiple, rateHz) => {
        const f = multiple * rateHz;
        const { landsHz, fold } = foldFrequency(f, rateHz);
        const back = landingFrequencies(landsHz, landsHz, rateHz, fold).map(({ low }) => Math.abs(low - f));
        assertWithin(Math.min(...back), 0, 1e-12 * (f + rateHz));
        for (const { low } of landingFrequencies(landsHz, landsHz, rateHz, 3))
          assertWithin(foldFrequency(Math.abs(low), rateHz).landsHz, landsHz, 1e-12 * (low + rateHz));
      }),
      { seed: 72, numRuns: 200 },
    );
  });
});
