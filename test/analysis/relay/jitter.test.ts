/** Jitter of a relay against a simulation: every displaced edge integrated in closed form, the spectrum summed over thousands of periods. */
import assert from 'node:assert/strict';
import { analyse } from '../../../src/analysis';
import { jitterPower } from '../../../src/analysis/relay/jitter';
import { relayPath } from '../../../src/analysis/relay/relay-path';
import { constantResponse } from '../../../src/signal/response-algebra';
import type { Channel, Gate, Pulse } from '../../../src/spec/channel';
import { band, limit, rate, rectangleShare, relay, stage, tone, wanted } from '../../support/channel-builder';
import { assertWithin } from '../../support/tolerance';

const sigma = 1e-4;
const toneHz = 0.17;

/** What one period adds to the spectrum at f, with its instants displaced. */
type Period = (start: number, f: number, shake: () => number) => readonly [number, number];

/** ∫ from a to b of cos(2π·tone·t)·e^{−j2πft} dt. */
function trackedPart(a: number, b: number, f: number): readonly [number, number] {
  const line = (u: number): readonly [number, number] => {
    const w = 2 * Math.PI * u;
    if (Math.abs(w) < 1e-9) return [b - a, 0];
    return [(Math.sin(w * b) - Math.sin(w * a)) / w, (Math.cos(w * b) - Math.cos(w * a)) / w];
  };
  const [p, q] = [line(f - toneHz), line(f + toneHz)];
  return [0.5 * (p[0] + q[0]), 0.5 * (p[1] + q[1])];
}

/** A value held from a to b. */
function heldPart(value: number, a: number, b: number, f: number): readonly [number, number] {
  const w = 2 * Math.PI * f;
  return [(value * (Math.sin(w * b) - Math.sin(w * a))) / w, (value * (Math.cos(w * b) - Math.cos(w * a))) / w];
}

const sampleAt = (t: number): number => Math.cos(2 * Math.PI * toneHz * t);
const still = (): number => 0;

/** Noise power over the band 0.02 .. 0.48 from the mean square of the difference that shaking makes, over the tone's power of 1/2. */
function simulated(period: Period): number {
  const random = uniforms(20261201);
  const shake = (): number => sigma * Math.sqrt(12) * (random() - 0.5);
  const [lines, periods] = [24, 6000];
  let sum = 0;
  for (let i = 0; i < lines; i += 1) {
    const f = 0.02 + (0.46 * (i + 0.5)) / lines;
    // Periods are independent, so the powers of their differences add.
    for (let n = 0; n < periods; n += 1) {
      const shaken = period(n, f, shake);
      const plain = period(n, f, still);
      sum += (shaken[0] - plain[0]) ** 2 + (shaken[1] - plain[1]) ** 2;
    }
  }
  // One-sided density 2·⟨|Δ|²⟩ at rate 1, times the width of the band.
  return ((2 * sum) / (lines * periods)) * 0.46 * 2;
}

/** A linear congruential generator (Knuth's MMIX constants, high bits): seeded, so the same numbers every time. */
function uniforms(seed: number): () => number {
  let state = BigInt(seed);
  return () => {
    state = (state * 6364136223846793005n + 1442695040888963407n) & 0xffffffffffffffffn;
    return Number(state >> 11n) / 2 ** 53;
  };
}

function computed(sampling: Pick<Channel, 'pulse' | 'gate'>): number {
  const channel = { ...relay({ wanted: [wanted(0.02, 0.48)], rate: rate(1) }), ...sampling };
  const bands = [{ low: 0.02, high: 0.48 }];
  return jitterPower({ relay: relayPath(channel), channel, output: constantResponse(0), bands, toneHz, sigmaSeconds: sigma });
}

const open = (pulse: Pulse): Pick<Channel, 'pulse' | 'gate'> => ({ pulse: { shape: 'instant' }, gate: { kind: 'pulse', pulse } });
const track = (share: number): Gate => ({ kind: 'track', track: { share } });

/** 24 × 6000 squared differences scatter by about 1 %; 0.15 dB is three times that. */
const scatterDb = 0.15;

describe('jitter of a relay', () => {
  const cases: readonly (readonly [string, Pick<Channel, 'pulse' | 'gate'>, Period])[] = [
    [
      'a gate whose two edges move by themselves',
      open(rectangleShare(0.12)),
      (n, f, shake) => trackedPart(n + shake(), n + 0.12 + shake(), f),
    ],
    [
      'a gate without steps, which moves as a whole',
      open({ shape: 'triangle', width: { share: 0.3 } }),
      (n, f, shake) => triangle(n + shake(), 0.3, f),
    ],
    [
      'a held sample of half the period: taken at the wrong time, and between edges of its own',
      { pulse: rectangleShare(0.5), gate: null },
      (n, f, shake) => heldPart(sampleAt(n + shake()), n + shake(), n + 0.5 + shake(), f),
    ],
    [
      'a track and hold',
      { pulse: { shape: 'instant' }, gate: track(0.4) },
      // The value held is that of the instant at which tracking ends; the step when it begins again is the edge that moves.
      (n, f, shake) => {
        const end = n + 0.4 + shake();
        const next = n + 1 + shake();
        const [a, b, c] = [trackedPart(n, end, f), heldPart(sampleAt(end), end, next, f), trackedPart(next, n + 1, f)];
        return [a[0] + b[0] + c[0], a[1] + b[1] + c[1]];
      },
    ],
  ];
  for (const [name, sampling, period] of cases) {
    it(`is what a simulation finds for ${name}`, () => {
      assertWithin(10 * Math.log10(computed(sampling)), 10 * Math.log10(simulated(period)), scatterDb);
    });
  }

  it('is none where the gate never closes', () => {
    assert.equal(computed(open(rectangleShare(1))), 0);
  });

  it('gives a signal-to-noise ratio over the wanted tone as it leaves, whatever its level', () => {
    const parts = {
      wanted: [wanted(0, 100)],
      rate: rate(10e3),
      gate: { kind: 'pulse' as const, pulse: rectangleShare(0.12) },
      jitterSeconds: 2e-9,
      inputStages: [stage({ kind: 'bandwidth', cornerHz: 1e3 })],
      limits: [limit('snr', 60)],
    };
    const found = analyse(relay(parts));
    // Two edges of variance σ² a period: 4·fs·σ² one-sided over the tone, over 100 Hz, against c₀² = 0.12².
    const expected = -10 * Math.log10((4 * 10e3 * 2e-9 ** 2 * 100) / 0.12 ** 2);
    assertWithin(found.snr ?? NaN, expected, 1e-9);
    assertWithin(found.limits[0]?.value ?? NaN, expected, 1e-9);
    const weak = analyse(relay({ ...parts, wanted: [wanted(0, 100, -30)] }));
    assertWithin(weak.snr ?? NaN, expected, 1e-9);
    assert.equal(found.enob, null);
    assert.equal(found.sinad, null);
    assertWithin(found.testTone.atSampler, -10 * Math.log10(1 + 0.1 ** 2), 1e-9);
  });

  it('counts landings and jitter of unwanted sources only where the limit asks for it', () => {
    const parts = {
      wanted: [wanted(0, 100)],
      rate: rate(10e3),
      gate: { kind: 'pulse' as const, pulse: rectangleShare(0.25) },
      jitterSeconds: 20e-9,
      unwanted: [tone(10.05e3, -40), tone(4e3, -20), band(2e3, 3e3, -30)],
    };
    const alone = analyse(relay({ ...parts, limits: [limit('snr', 30)] })).limits[0]?.value ?? NaN;
    const all = analyse(relay({ ...parts, limits: [limit('snr', 30, { withUnwanted: true })] })).limits[0]?.value ?? NaN;
    const own = (4 * 10e3 * 20e-9 ** 2 * 100) / 0.25 ** 2;
    const sinc = Math.sin(0.25 * Math.PI) / (0.25 * Math.PI);
    const landing = 10 ** (-40 / 10) * sinc ** 2;
    assertWithin(alone, -10 * Math.log10(own), 1e-9);
    assertWithin(all, -10 * Math.log10(own * (1 + 1e-4 + 1e-2 + 1e-3) + landing), 1e-9);
  });
});

/** ∫ of a triangle of base w from `start` times the tone, by its two linear halves on a fine midpoint rule. */
function triangle(start: number, w: number, f: number): readonly [number, number] {
  const points = 48;
  let re = 0;
  let im = 0;
  for (let i = 0; i < points; i += 1) {
    const at = (w * (i + 0.5)) / points;
    const height = 1 - Math.abs((2 * at) / w - 1);
    const t = start + at;
    const value = (height * sampleAt(t) * w) / points;
    re += value * Math.cos(2 * Math.PI * f * t);
    im -= value * Math.sin(2 * Math.PI * f * t);
  }
  return [re, im];
}
