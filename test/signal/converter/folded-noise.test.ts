/** Folded noise against closed sums over all folds, and plain summation. */
import assert from 'node:assert/strict';
import { foldedNoise, type FoldedNoise } from '../../../src/signal/converter/folded-noise';
import { designFilter } from '../../../src/signal/families/design-filter';
import { realPole } from '../../../src/signal/families/real-pole';
import { secondOrder } from '../../../src/signal/families/second-order';
import { filterResponse, type Filter } from '../../../src/signal/filter';
import type { Response } from '../../../src/signal/response';
import { assertClose } from '../../support/tolerance';

const white: Omit<FoldedNoise, 'filters'> = {
  aperture: null,
  decimation: null,
  flickerHz: 0,
  lowHz: 10,
  highHz: 20,
  rateHz: 100,
};

function finite(noise: FoldedNoise): { readonly value: number; readonly errorBound: number } {
  const found = foldedNoise(noise);
  assert.ok(found.kind === 'finite');
  return found;
}

/** Within its own bound, and the bound small enough to be of use. */
function assertHolds(noise: FoldedNoise, expected: number, useful: number): void {
  const { value, errorBound } = finite(noise);
  assert.ok(Math.abs(value - expected) <= errorBound, `${value} ± ${errorBound} does not hold ${expected}`);
  assert.ok(errorBound <= useful * value, `± ${errorBound} of ${value}`);
}

/** The midpoint rule. */
function midpoint(integrand: (x: number) => number, low: number, high: number, steps: number): number {
  const width = (high - low) / steps;
  let sum = 0;
  for (let step = 0; step < steps; step += 1) sum += integrand(low + (step + 0.5) * width);
  return sum * width;
}

/** Closed form of Σ over all k of 1/(1 + ((f + k·rate)/corner)²), a Lorentzian's Poisson sum; written so that it does not overflow. */
function poleSum(corner: number, rateHz: number): (f: number) => number {
  const x = (2 * Math.PI * corner) / rateHz;
  const turn = (f: number): number => 2 * Math.exp(-x) * Math.cos((2 * Math.PI * f) / rateHz);
  return (f) => ((x / 2) * (1 - Math.exp(-2 * x))) / (1 + Math.exp(-2 * x) - turn(f));
}

/** The sum over all folds of a pole, integrated by the midpoint rule. */
function foldedPole(corner: number, { lowHz, highHz, rateHz }: typeof white): number {
  return midpoint(poleSum(corner, rateHz), lowHz, highHz, 20000);
}

/** Plain summation over folds, each by the midpoint rule. */
function plainSum(power: (frequencyHz: number) => number, { lowHz, highHz, rateHz }: typeof white, folds: number): number {
  let sum = midpoint(power, lowHz, highHz, 4000);
  for (let fold = 1; fold <= folds; fold += 1) {
    const steps = fold < 20 ? 4000 : 16;
    sum += midpoint(power, fold * rateHz + lowHz, fold * rateHz + highHz, steps);
    sum += midpoint(power, fold * rateHz - highHz, fold * rateHz - lowHz, steps);
  }
  return sum;
}

/** A rectangle of width w, as far as this needs one: its gain, and its ceiling as the bound from some frequency on. */
function rectangle(width: number): Response {
  return {
    logGain: (f) => Math.log(Math.abs(f === 0 ? 1 : Math.sin(Math.PI * f * width) / (Math.PI * f * width))),
    bounds: (low) => ({ low: -Infinity, high: Math.log(Math.min(1, 1 / (Math.PI * low * width))) }),
    slope: () => null,
  };
}

const powerOf = (filters: readonly Filter[]): ((f: number) => number) => {
  const responses = filters.map(filterResponse);
  return (f) => Math.exp(2 * responses.reduce((sum, one) => sum + one.logGain(f), 0));
};

describe('foldedNoise', () => {
  it('through one pole is its closed sum over all folds, wherever the pole stands', () => {
    for (const corner of [1, 30, 1000, 1e5, 1e8]) {
      assertHolds({ ...white, filters: [realPole(corner)] }, foldedPole(corner, white), 2e-3);
    }
  });

  it('over the whole output is all that the path lets through', () => {
    // π/2 times the corner, and π/2·f₀/Q of a resonance.
    const whole = { ...white, lowHz: 0, highHz: 50 };
    for (const corner of [1, 1000, 1e7]) assertHolds({ ...whole, filters: [realPole(corner)] }, (Math.PI / 2) * corner, 1e-8);
    const resonance = secondOrder('bandpass', 333, 1e4);
    assertHolds({ ...whole, filters: [resonance] }, ((Math.PI / 2) * 333) / 1e4, 1e-8);
  });

  it('through filters with resonances and nulls is what plain summation finds', () => {
    const elliptic = designFilter({
      family: 'elliptic',
      order: 5,
      kind: 'lowpass',
      corners: 130,
      cornerAt: 'ripple',
      rippleDb: 0.1,
      attenuationDb: 30,
      gain: 2,
    });
    const paths = [[elliptic], [elliptic, realPole(5000)], [secondOrder('bandpass', 215, 3), realPole(60)]];
    for (const filters of paths) {
      const { value, errorBound } = finite({ ...white, filters });
      assert.ok(errorBound <= 1e-3 * value, `± ${errorBound} of ${value}`);
      // What is above fold 20000 is less than a 1e−4th here, and the midpoint rule's error is below that.
      assertClose(value, plainSum(powerOf(filters), white, 20000), 1e-4);
    }
  });

  it('counts flicker by its corner', () => {
    const filters = [realPole(400), realPole(700)];
    const power = powerOf(filters);
    const expected = plainSum((f) => power(f) * (1 + 55 / f), white, 3000);
    const { value, errorBound } = finite({ ...white, flickerHz: 55, filters });
    assertClose(value, expected, 1e-6);
    assert.ok(errorBound <= 1e-5 * value);
    assert.ok(value > 1.05 * finite({ ...white, filters }).value);
  });

  it('through a rectangular aperture alone is 1/2w over the whole output, whether or not its nulls keep step', () => {
    // Parseval: ∫ sinc²(wf) df from 0 Hz is 1/(2w).
    for (const width of [0.01, 0.005, 0.0037]) {
      const aperture = { response: rectangle(width), ceilingHz: 1 / (Math.PI * width) };
      assertHolds({ ...white, lowHz: 0, highHz: 50, aperture, filters: [] }, 1 / (2 * width), 1e-2);
    }
  });

  it('through an aperture behind a filter is what plain summation finds', () => {
    const aperture = { response: rectangle(0.004), ceilingHz: 1 / (Math.PI * 0.004) };
    const power = powerOf([realPole(150)]);
    const expected = plainSum((f) => power(f) * Math.exp(2 * aperture.response.logGain(f)), white, 3000);
    assertHolds({ ...white, aperture, filters: [realPole(150)] }, expected, 1e-6);
  });

  it('behind decimation weighs and folds once more', () => {
    // A running mean of 5 samples that keeps every fifth, so that 20 Hz is the output's rate.
    const mean = (f: number): number => (f === 0 ? 1 : (Math.sin(Math.PI * 0.05 * f) / (5 * Math.sin(Math.PI * 0.01 * f))) ** 2);
    const decimated = { ...white, lowHz: 2, highHz: 9, decimation: { by: 5, power: mean } };
    for (const corner of [7, 60, 3000, 1e6]) {
      const density = poleSum(corner, 100);
      const folded = (f: number): number =>
        [0, 20, 40, 60, 80].reduce((sum, shift) => sum + density(f + shift) * mean(f + shift), 0);
      assertHolds({ ...decimated, filters: [realPole(corner)] }, midpoint(folded, 2, 9, 20000), 2e-2);
    }
  });

  it('is endless where nothing ends it', () => {
    assert.equal(foldedNoise({ ...white, filters: [] }).kind, 'endless');
    assert.equal(foldedNoise({ ...white, filters: [secondOrder('highpass', 10, 1)] }).kind, 'endless');
    assert.equal(foldedNoise({ ...white, flickerHz: 1, lowHz: 0, filters: [realPole(10)] }).kind, 'endless');
    assert.equal(foldedNoise({ ...white, lowHz: 0, filters: [realPole(10)] }).kind, 'finite');
  });

  it('is nothing in a band without width, and refuses one that the rate does not hold', () => {
    assert.equal(finite({ ...white, highHz: 10, filters: [realPole(10)] }).value, 0);
    assert.throws(() => foldedNoise({ ...white, highHz: 60, filters: [realPole(10)] }), RangeError);
    assert.throws(() => foldedNoise({ ...white, lowHz: 30, filters: [realPole(10)] }), RangeError);
    assert.throws(() => foldedNoise({ ...white, flickerHz: -1, filters: [realPole(10)] }), RangeError);
  });
});
