/** Decimated noise against an integration done apart, and exact sums. */
import assert from 'node:assert/strict';
import { decimatedDensity, meanDecimatedDensity } from '../../../src/signal/converter/decimated-noise';
import { shapingWeight } from '../../../src/signal/converter/noise-shaping';
import { assertClose, assertWithin } from '../../support/tolerance';

/** |sin(πRf)/(R·sin(πf))|^{2N}, f as a share of the rate. */
function cicPower(frequency: number, by: number, stages: number): number {
  if (frequency === 0) return 1;
  return (Math.sin(Math.PI * by * frequency) / (by * Math.sin(Math.PI * frequency))) ** (2 * stages);
}

interface Decimator {
  readonly by: number;
  readonly stages: number;
  readonly order: number;
}

function meanDb({ by, stages, order }: Decimator): number {
  const power = (frequency: number): number => cicPower(frequency, by, stages) * shapingWeight(frequency, 1, order);
  const mean = meanDecimatedDensity(power, { lowHz: 0, highHz: 0.25 / by, rateHz: 1, by });
  assert.ok(mean.errorBound <= 1e-9 * mean.value);
  return 10 * Math.log10(mean.value);
}

describe('decimated noise', () => {
  it('through integrators and combs is what an integration done apart found', () => {
    // Computed apart, in double precision, over 0 … a quarter of the output's rate, tolerance 1e−4 dB.
    assertWithin(meanDb({ by: 8, stages: 3, order: 0 }), -0.81904, 1e-4);
    assertWithin(meanDb({ by: 8, stages: 3, order: 2 }), -36.54733, 1e-4);
    assertWithin(meanDb({ by: 32, stages: 3, order: 2 }), -60.62973, 1e-4);
    assertWithin(meanDb({ by: 8, stages: 1, order: 2 }), -7.40669, 1e-4);
  });

  it('keeps all of the power over the whole output', () => {
    // Parseval: a running mean of 8 has 1/8 of the power, which the folds bring back into a density of 1.
    const whole = meanDecimatedDensity((f) => cicPower(f, 8, 1), { lowHz: 0, highHz: 1 / 16, rateHz: 1, by: 8 });
    assertClose(whole.value, 1, 1e-9);
  });

  it('without decimation is the density itself', () => {
    const slope = (frequency: number): number => 3 + frequency;
    assertClose(meanDecimatedDensity(slope, { lowHz: 0.1, highHz: 0.3, rateHz: 1, by: 1 }).value, 3.2, 1e-12);
    assert.deepEqual(meanDecimatedDensity(slope, { lowHz: 0.2, highHz: 0.2, rateHz: 1, by: 1 }), { value: 3.2, errorBound: 0 });
  });

  it('sums each frequency that folds, at its own place', () => {
    // By 3 at rate 1: 0.1 is met by 0.1, 0.1 + 1/3, and 1/3 − 0.1.
    assertClose(
      decimatedDensity((f) => f, 0.1, 1, 3),
      0.1 + (0.1 + 1 / 3) + (1 / 3 - 0.1),
      1e-12,
    );
  });

  it('refuses bands and ratios that do not exist', () => {
    const flat = (): number => 1;
    assert.throws(() => decimatedDensity(flat, 0, 1, 2.5), RangeError);
    assert.throws(() => meanDecimatedDensity(flat, { lowHz: 0, highHz: 0.3, rateHz: 1, by: 2 }), RangeError);
    assert.throws(() => meanDecimatedDensity(flat, { lowHz: 0.2, highHz: 0.1, rateHz: 1, by: 2 }), RangeError);
  });
});

describe('shapingWeight', () => {
  it('is that of a repeated difference', () => {
    // |1 − e^{−jθ}|² = 2 − 2·cos θ.
    for (const frequency of [0, 0.01, 0.2, 0.5, 0.9]) {
      assertWithin(shapingWeight(frequency, 1, 3), (2 - 2 * Math.cos(2 * Math.PI * frequency)) ** 3, 1e-12);
    }
    assert.equal(shapingWeight(0.1, 1, 0), 1);
    assert.throws(() => shapingWeight(0.1, 0, 1), RangeError);
  });

  it('in a band gives what oversampling with shaping is known for', () => {
    // Common practice, 50 digits: one bit (−7.7815 dB of noise against the sine), order 2, 64 times: 85.194 dB by the small-angle formula;
    // the exact integral is up to 0.03 dB higher.
    const mean = meanDecimatedDensity((f) => shapingWeight(f, 1, 2), { lowHz: 0, highHz: 0.5 / 64, rateHz: 1, by: 1 });
    const snr = 7.781512504 - 10 * Math.log10(mean.value / 64);
    assert.ok(snr >= 85.194 && snr <= 85.194 + 0.03, `${snr}`);
  });
});
