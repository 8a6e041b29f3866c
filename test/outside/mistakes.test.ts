/** Things that are easily mistaken, one test each, its title saying the mistake; values recomputed at 50 digits unless a source stands beside them. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import { foldFrequency, rateWindows } from '../../src/signal/folding';
import { realPole } from '../../src/signal/families/real-pole';
import { polesAndZeros } from '../../src/signal/families/poles-and-zeros';
import { filterResponse, groupDelay, phaseRad, type Filter } from '../../src/signal/filter';
import { noiseBandwidth } from '../../src/signal/noise-bandwidth';
import { jitterNoiseDb, quantisationSnrDb } from '../../src/signal/noise';
import { logGateWeight } from '../../src/signal/pulses/gate';
import { pulseArea } from '../../src/signal/pulses/pulse-area';
import { pulseResponse } from '../../src/signal/pulses/pulse-response';
import type { PulseShape } from '../../src/signal/pulses/pulse-shape';
import { largestOverBands } from '../../src/signal/search';
import {
  anything,
  butterworthForm,
  capture,
  generate,
  limit,
  rate,
  rectangleShare,
  stage,
  wanted,
} from '../support/channel-builder';
import { assertClose, assertWithin, filterRelative, provedGapDb } from '../support/tolerance';
import { filterOf, gainDbOf } from './outside-design';

const toDb = 20 / Math.LN10;
const halfPowerDb = -10 * Math.log10(2);
const zeroOrder: PulseShape = { shape: 'rectangle', widthSeconds: 1 };
const split: PulseShape = { shape: 'split', widthSeconds: 1 };
const lines: PulseShape = { shape: 'linear', periodSeconds: 1 };
/** |P|/T in dB, period 1. */
const holdDb = (shape: PulseShape, f: number): number =>
  20 * Math.log10(pulseArea(shape)) + toDb * pulseResponse(shape).logGain(f);
const chebyshev = (order: number, ripple: number): Filter => filterOf({ family: 'chebyshev', order, ripple });
const finite = (filters: readonly Filter[]): number => {
  const found = noiseBandwidth(filters);
  assert.ok(found.kind === 'finite');
  return found.value;
};

describe('what is easily mistaken', () => {
  it('1: that natural sampling droops inside a copy as flat-top sampling does, and that an aperture acts at the alias', () => {
    // A gate's weight has no frequency in it but the copy's; a hold falls along the copy; an aperture is taken where the tone is.
    const quarter: PulseShape = { shape: 'rectangle', widthSeconds: 0.25 };
    assertWithin(toDb * logGateWeight(quarter, 1, 1), -12.9533, 1e-4);
    assertWithin(holdDb(quarter, 1.05), -13.04904662, 1e-6);
    assertWithin(holdDb(quarter, 1.4), -13.86794049, 1e-6);
    const tone = { unwanted: [anything(0)], rate: rate(1000), wanted: [wanted(0, 72.3)], pulse: rectangleShare(1) };
    const { alias } = analyse(capture(tone));
    assert.ok(alias !== null && alias.frequency !== null && alias.level !== null);
    assertWithin(alias.level, holdDb(zeroOrder, alias.frequency / 1000), provedGapDb);
    assert.ok(alias.level < -20);
  });

  it('2: that a hold of half the width has unit gain at 0 Hz, or a null at the rate', () => {
    const half: PulseShape = { shape: 'rectangle', widthSeconds: 0.5 };
    assertWithin(holdDb(half, 0), 20 * Math.log10(0.5), 1e-12);
    assertWithin(holdDb(half, 1), -9.943, 1e-4);
    assert.equal(holdDb(zeroOrder, 1), -Infinity);
  });

  it('3: that a first-order hold is one thing: the extrapolating one peaks, the interpolating one droops', () => {
    // √(1 + (2πx)²)·sinc²x against sinc²x; only the second is offered.
    const peakDb = (x: number): number => 20 * Math.log10(Math.hypot(1, 2 * Math.PI * x)) + holdDb(lines, x);
    assertWithin(peakDb(0.5), 2.5173, 1e-4);
    assertWithin(peakDb(0.33879), 4.0148, 1e-4);
    assertWithin(holdDb(lines, 0.5), -7.8448, 1e-4);
  });

  it('4: that a zero-order hold is 3 dB down at half the rate', () => {
    assertWithin(holdDb(zeroOrder, 0.5), 20 * Math.log10(2 / Math.PI), 1e-12);
    assertWithin(holdDb(zeroOrder, 0.44294647068945237), halfPowerDb, 1e-12);
  });

  it('5: that a split pulse is strongest at the rate', () => {
    assertWithin(holdDb(split, 0.5), holdDb(split, 1), 1e-12);
    assertWithin(holdDb(split, 1), -3.9224, 1e-4);
    const peak = largestOverBands(pulseResponse(split), [{ low: 0, high: 2 }]);
    assert.ok(peak !== null);
    assertWithin(toDb * peak.logGain, -2.7979, provedGapDb);
    assertWithin(peak.frequencyHz, 0.742, 0.01);
  });

  it('6: that 0 Hz is a filter’s peak: with even Chebyshev and elliptic orders it is a ripple below it', () => {
    const even = chebyshev(4, 0.5);
    assertWithin(gainDbOf(even, 0), -0.5, 1e-12);
    assertWithin(gainDbOf(filterOf({ family: 'elliptic', order: 4, ripple: 1, attenuation: 60 }), 0), -1, 1e-12);
    // Noise bandwidth over the ripple's end, against the peak and against 0 Hz.
    assertWithin(finite([even]), 1.0656, 6e-5);
    assertWithin(finite([even]) / even.gainAt.gain ** 2, 1.1957, 6e-5);
    // From 0 Hz to where a ripple peaks the "droop" is negative.
    const form = { ...butterworthForm(4, 1000), family: 'chebyshev', rippleDb: 0.5, cornerAt: 'ripple' } as const;
    const peakHz = 1000 * Math.max(...(even.turnsHz ?? []));
    assertWithin(
      analyse(capture({ wanted: [wanted(0, peakHz)], rate: rate(1e5), stages: [stage(form)] })).droop ?? NaN,
      -0.5,
      1e-9,
    );
  });

  it('7: that every low-pass has a noise bandwidth, or that the worst alias is the first fold', () => {
    for (const one of [
      { family: 'elliptic', order: 4, ripple: 0.1, attenuation: 40 },
      { family: 'inverse-chebyshev', order: 4, attenuation: 40 },
    ] as const)
      assert.equal(noiseBandwidth([filterOf(one)]).kind, 'endless');
    const form = {
      ...butterworthForm(3, 1000),
      family: 'elliptic',
      rippleDb: 0.1,
      attenuationDb: 40,
      cornerAt: 'ripple',
    } as const;
    // The first fold stands on the null, the later ones do not: the filter's null is at 4.0429 of its ripple's end.
    const channel = capture({ wanted: [wanted(0, 10)], rate: rate(4042.9354), stages: [stage(form)], unwanted: [anything(0)] });
    const { alias } = analyse(channel);
    assert.ok(alias !== null && alias.fold !== null && alias.level !== null && alias.fold > 1);
    assert.ok(alias.level > gainDbOf(filterOf({ family: 'elliptic', order: 3, ripple: 0.1, attenuation: 40 }), 4.0329354));
  });

  it('8: that the corner of an inverse Chebyshev filter is at half power: elsewhere it is often the stop edge', () => {
    const design = { family: 'inverse-chebyshev', order: 4, attenuation: 40 } as const;
    assertWithin(gainDbOf(filterOf(design), 1), -40, 1e-9);
    assertWithin(gainDbOf(filterOf(design), 0.4967151780654908), halfPowerDb, 1e-9);
    assertWithin(gainDbOf(filterOf(design, { cornerAt: 'half-power' }), 1), halfPowerDb, 1e-9);
  });

  it('9: that a Bessel filter has one normalisation, or gets sharper with every order', () => {
    const unitDelay = filterOf({ family: 'bessel', order: 4, norm: 'delay' });
    assertClose(2 * Math.PI * groupDelay(unitDelay, 0), 1, 1e-12);
    assertWithin(gainDbOf(unitDelay, 2.11392), halfPowerDb, 1e-4);
    const loss = (order: number): number => -gainDbOf(filterOf({ family: 'bessel', order }), 2);
    assert.ok(loss(6) > loss(5) && loss(6) > loss(7) && loss(7) > loss(20));
  });

  it('10: that 3 dB is half power', () => {
    // 1.002377 and 1.000594 of the ripple's end for orders 1 and 2 with 3 dB of ripple.
    for (const [order, ratio] of [
      [1, 1.002377],
      [2, 1.000594],
    ] as const) {
      assertWithin(gainDbOf(chebyshev(order, 3), 1), -3, 1e-12);
      assertWithin(gainDbOf(chebyshev(order, 3), ratio), halfPowerDb, 1e-5);
    }
  });

  it('11: that rate windows count from 0, that the least rate is a window, or that touching edges need no mention', () => {
    // Zones count from 1; an integer-positioned band leaves a single rate, at which both edges touch: it is allowed and reported.
    const least = rateWindows(20, 25).at(-1);
    assert.deepEqual(least, { zone: 5, lowHz: 10, highHz: 10, inverted: false });
    assert.equal(rateWindows(10, 14).find(({ lowHz }) => Math.abs(lowHz - 28 / 3) < 1e-12)?.zone, 3);
    const { faults } = analyse(capture({ wanted: [wanted(20, 25)], rate: rate(10) }));
    assert.deepEqual([...new Set(faults.map(({ kind }) => kind))], ['wanted-touches']);
  });

  it('12: that jitter counts at the alias, or that quantisation falls with the signal', () => {
    assertWithin(jitterNoiseDb(70e6, 1e-12), -67.1344, 1e-4);
    const band = { wanted: [wanted(65e6, 75e6)], rate: rate(40e6), bits: 12, jitterSeconds: 1e-12 };
    const at = (levelDb: number) => analyse(capture({ ...band, testTone: { frequencyHz: 70e6, levelDb } })).noise;
    const share = 10 * Math.log10(10e6 / 20e6);
    assertWithin(at(0).jitter ?? NaN, -67.1344 + share, 1e-3);
    assertWithin(at(-20).jitter ?? NaN, -87.1344 + share, 1e-3);
    assertWithin(at(-20).quantisation ?? NaN, -quantisationSnrDb(12) + share, 1e-9);
    assert.equal(at(-20).quantisation, at(0).quantisation);
  });

  it('13: that oversampling gains nothing: jitter and quantisation spread over half the rate', () => {
    const at = (hz: number) =>
      analyse(capture({ wanted: [wanted(0, 20e3)], rate: rate(hz), bits: 16, jitterSeconds: 1e-9 })).noise;
    const gain = 10 * Math.log10(4);
    assertWithin((at(48e3).quantisation ?? NaN) - (at(192e3).quantisation ?? NaN), gain, 1e-9);
    assertWithin((at(48e3).jitter ?? NaN) - (at(192e3).jitter ?? NaN), gain, 1e-9);
  });

  it('15: that two equal resistors and capacitors without a buffer are two buffered ones', () => {
    const poles = [-0.38196601125010515, -2.618033988749895].map((re) => ({ re, im: 0 }));
    const unbuffered = polesAndZeros({ poles, zeros: [], gain: 1, gainAtHz: 0 });
    assertWithin(gainDbOf(unbuffered, 0.3742391543), halfPowerDb, 1e-8);
    assertWithin(2 * gainDbOf(realPole(1), 0.6435942529), halfPowerDb, 1e-8);
  });

  it('16: that what handbooks print is right: the noise bandwidth of a Bessel filter of order 2 is 1.1536, not 1.56', () => {
    // Printed in a reference table after S. Winder, Filter Design (1998).
    assertWithin(finite([filterOf({ family: 'bessel', order: 2 })]), 1.153594, 1e-6);
  });

  it('17: that every program’s elliptic filter is exact: a widely used one is 1e−5 off', () => {
    // Order 5, 0.1 dB, 40 dB: octave-signal 1.4.3 gives −0.1066768 ± j1.0636558.
    const { poles } = filterOf({ family: 'elliptic', order: 5, ripple: 0.1, attenuation: 40 });
    const pole = poles.find(({ im }) => im > 1);
    assert.ok(pole !== undefined);
    assertWithin(pole.re, -0.10667538, 1e-8);
    assertWithin(pole.im, 1.06365373, 1e-8);
    assert.ok(Math.abs(pole.re + 0.1066768) > 1e-6 && Math.abs(pole.im - 1.0636558) > 1e-6);
  });

  it('18: that a zero on the axis delays: the phase steps by π there, and the delay is that of the poles', () => {
    const filter = filterOf({ family: 'elliptic', order: 3, ripple: 0.1, attenuation: 40 });
    const [at = NaN] = filter.zeros.map(({ im }) => im).filter((im) => im > 0);
    const step = 1e-9 * at;
    assertWithin(phaseRad(filter, at + step) - phaseRad(filter, at - step), Math.PI, 1e-6);
    assertClose(groupDelay(filter, at), groupDelay({ ...filter, zeros: [] }, at), filterRelative);
    assert.equal(filterResponse(filter).logGain(at), -Infinity);
  });

  it('19: that the edges of a band-pass are always at half power: they are what the low-pass has at its corner', () => {
    const corners = { low: 900, high: 1100 };
    const inverse = filterOf({ family: 'inverse-chebyshev', order: 3, attenuation: 40 }, { kind: 'bandpass', corners });
    const ripple = filterOf({ family: 'chebyshev', order: 3, ripple: 0.5 }, { kind: 'bandpass', corners });
    const butterworth = filterOf({ family: 'butterworth', order: 3 }, { kind: 'bandpass', corners });
    for (const edge of [900, 1100]) {
      assertWithin(gainDbOf(inverse, edge), -40, 1e-9);
      assertWithin(gainDbOf(ripple, edge), -0.5, 1e-9);
      assertWithin(gainDbOf(butterworth, edge), halfPowerDb, 1e-9);
    }
  });

  it('20: that a DAC needs the filter an ADC needs: the hold helps, unless its pulse is narrow', () => {
    const channel = { wanted: [wanted(0, 20e3)], rate: rate(192e3) };
    const least = (level: (order: number) => number | null | undefined): number =>
      [1, 2, 3, 4, 5, 6, 7, 8].find((order) => (level(order) ?? 0) <= -60) ?? NaN;
    const filter = (order: number) => ({ stages: [stage(butterworthForm(order, 30e3))] });
    const adc = least((order) => analyse(capture({ ...channel, ...filter(order), unwanted: [anything(0)] })).alias?.level);
    const dac = (share: number): number =>
      least((order) => {
        const pulse = rectangleShare(share);
        return analyse(generate({ ...channel, ...filter(order), pulse, limits: [limit('image', -60)] })).image?.relative;
      });
    // 15.17 dB an order at 172 kHz over 30 kHz: 60.7 dB with four; three leave 45.5 dB, and a full hold is 18.6 dB down there.
    assert.deepEqual([adc, dac(1), dac(0.01)], [4, 3, 4]);
    assert.equal(foldFrequency(172e3, 192e3).landsHz, 20e3);
  });
});
