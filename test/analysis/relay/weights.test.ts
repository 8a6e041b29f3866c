/** What a gate, a hold or track and hold weighs each copy by: against published tables, reference cases and the Fourier series written out. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { copyWeights } from '../../../src/analysis/relay/copy-weights';
import { relayWeights, weightResponse } from '../../../src/analysis/relay/weights';
import type { Channel, Gate, Pulse } from '../../../src/spec/channel';
import { rate, rectangleShare, relay, wanted } from '../../support/channel-builder';
import { plainWeight, type PlainSampling } from '../../support/plain-relay';
import { assertClose, assertWithin } from '../../support/tolerance';

const open = (share: number): Gate => ({ kind: 'pulse', pulse: rectangleShare(share) });
const track = (share: number): Gate => ({ kind: 'track', track: { share } });

type Sampling = Pick<Channel, 'pulse' | 'gate'>;
const natural = (share: number): Sampling => ({ pulse: { shape: 'instant' }, gate: open(share) });
const flatTop = (share: number): Sampling => ({ pulse: rectangleShare(share), gate: null });
const tracking = (share: number): Sampling => ({ pulse: { shape: 'instant' }, gate: track(share) });

/** dB of copy k for an input at f ≥ 0. */
function weightDb(sampling: Sampling, rateHz: number, copy: number, inputHz: number): number {
  const output = inputHz + copy * rateHz;
  const weights = relayWeights(sampling, rateHz);
  // Copy k at a negative output is copy −k at the positive one.
  const response = weightResponse(weights.copy(output < 0 ? -copy : copy));
  return (20 / Math.LN10) * response.logGain(Math.abs(output));
}

describe('the weights of copies', () => {
  // Pulse-train Fourier coefficients of a quarter-period pulse, in dB: any Fourier-series text, computed with mpmath.
  it('are those of a pulse train for a gate of a quarter of the period', () => {
    const published = [-12.0412, -12.9533, -15.9636, -22.4957, -Infinity, -26.9327];
    published.forEach((expected, copy) => {
      assertWithin(weightDb(natural(0.25), 100e3, copy, 5e3), expected, 1e-4, `copy ${String(copy)}:`);
      assertWithin(weightDb(natural(0.25), 100e3, -copy, 5e3), expected, 1e-4, `copy ${String(-copy)}:`);
    });
  });

  // Reference cases X06 and X07: average over one period by quadrature of a 5 .. 40 kHz band at 100 kS/s with a 25 % pulse.
  const edges = [5e3, 40e3];
  const cases: readonly (readonly [string, Sampling, readonly (readonly [number, number, number])[]])[] = [
    [
      'natural',
      natural(0.25),
      [
        [0, -12.04119983, -12.04119983],
        [1, -12.95329741, -12.95329741],
        [-1, -12.95329741, -12.95329741],
        [2, -15.96359737, -15.96359737],
        [4, -Infinity, -Infinity],
      ],
    ],
    [
      'flat-top',
      flatTop(0.25),
      [
        [0, -12.0434324, -12.18455],
        [1, -13.04904662, -13.86794049],
        [-1, -12.86262335, -12.36508716],
        [2, -16.18477376, -17.98309578],
        [4, -50.21313277, -33.0124037],
      ],
    ],
  ];
  for (const [name, sampling, copies] of cases) {
    it(`are those of the reference case for ${name} sampling, at both edges of each copy`, () => {
      for (const [copy, ...levels] of copies) {
        edges.forEach((inputHz, edge) => {
          assertWithin(weightDb(sampling, 100e3, copy, inputHz), levels[edge] ?? NaN, 1e-6, `${name} ${String(copy)}:`);
        });
      }
    });
  }

  it('are the Fourier integral of what really leaves, for all three ways to sample', () => {
    const kinds: readonly (readonly [PlainSampling['kind'], (share: number) => Sampling])[] = [
      ['natural', natural],
      ['flat-top', flatTop],
      ['track-and-hold', tracking],
    ];
    fc.assert(
      fc.property(
        fc.constantFrom(...kinds),
        fc.double({ min: 0.05, max: 0.95, noNaN: true }),
        fc.integer({ min: -6, max: 6 }),
        fc.double({ min: 0.02, max: 0.48, noNaN: true }),
        ([kind, make], share, copy, x) => {
          const expected = integrated(kind, share, copy, x);
          const plain = plainWeight({ rateHz: 1, sampling: { kind, share }, inputHz: Infinity, outputHz: Infinity }, copy, x);
          const actual = 10 ** (weightDb(make(share), 1, copy, x) / 20);
          assertWithin(actual, expected, 2e-6, `${kind} ${String(share)} ${String(copy)}:`);
          assertWithin(actual, plain, 1e-9, `${kind} written out:`);
        },
      ),
      { seed: 11, numRuns: 60 },
    );
  });

  it('all come to 1/T as a gate of constant area narrows, and c₀ is the duty (common practice, no source)', () => {
    for (const share of [1e-3, 1e-5, 1e-7]) {
      for (let copy = 0; copy <= 8; copy += 1) {
        // Height 1 has the area `share`·T: over the area each weight is 1/T, T = 1.
        assertWithin(10 ** (weightDb(natural(share), 1, copy, 0.1) / 20) / share, 1, 200 * share * share + 1e-12);
      }
      assertClose(10 ** (weightDb(natural(share), 1, 0, 0.1) / 20), share, 1e-12);
    }
  });

  it('of a gate that never closes are none but the wanted path', () => {
    const weights = relayWeights(natural(1), 1000);
    assert.equal(weights.lastCopy, 0);
    assert.equal(weightDb(natural(1), 1000, 0, 10), 0);
    assert.equal(weightDb(tracking(1), 1000, 3, 10), -Infinity);
  });

  it('are bounded from some copy on by what is handed to the search', () => {
    const shapes: readonly Pulse[] = [
      rectangleShare(0.3),
      { shape: 'triangle', width: { share: 0.4 } },
      { shape: 'exponential', width: { share: 0.5 }, decay: { share: 0.1 } },
      { shape: 'half-sine', width: { share: 0.6 } },
    ];
    const samplings = [
      ...shapes.map((pulse): Sampling => ({ pulse: { shape: 'instant' }, gate: { kind: 'pulse', pulse } })),
      flatTop(0.7),
      tracking(0.35),
    ];
    for (const sampling of samplings) {
      const weights = relayWeights(sampling, 1);
      for (const first of [1, 3, 9]) {
        const bound = weightResponse(weights.boundFrom(first));
        for (let copy = first; copy < first + 30; copy += 1) {
          for (const output of [0, 0.1, 0.45, 2.2]) {
            const both = [copy, -copy].map((k) => weightResponse(weights.copy(k)).logGain(output));
            assert.ok(
              Math.max(...both) <= bound.logGain(output) + 1e-9,
              `${weights.kind} copy ${String(copy)} at ${String(output)}`,
            );
          }
        }
      }
    }
  });
});

describe('|c_k|/c_0 of a channel', () => {
  const parts = { wanted: [wanted(0, 200)], rate: rate(10e3), referenceHz: 100 };

  it('are the pulse train over its mean for a gate, and none without one', () => {
    const weights = copyWeights(relay({ ...parts, gate: open(0.12) }));
    assert.equal(weights?.length, 9);
    weights.forEach((weight, k) => {
      const x = Math.PI * 0.12 * k;
      assertClose(weight, k === 0 ? 1 : Math.abs(Math.sin(x) / x), 1e-12);
    });
    assert.equal(copyWeights(relay(parts)), null);
  });

  it('of a track and hold are the stronger side of each copy of a tone at the reference', () => {
    const plain = {
      rateHz: 10e3,
      sampling: { kind: 'track-and-hold', share: 0.4 },
      inputHz: Infinity,
      outputHz: Infinity,
    } as const;
    const own = plainWeight(plain, 0, 100);
    copyWeights(relay({ ...parts, gate: track(0.4) }))?.forEach((weight, k) => {
      const stronger = Math.max(plainWeight(plain, k, 100), plainWeight(plain, -k, 100));
      assertWithin(weight, k === 0 ? 1 : stronger / own, 1e-9, `k = ${String(k)}:`);
    });
  });
});

/** |∫ over one period of what leaves for an input e^{j2πxt}, times e^{−j2π(x + k)t}|, by the midpoint rule; the rate is 1. */
function integrated(kind: PlainSampling['kind'], share: number, copy: number, x: number): number {
  const pieces =
    kind === 'track-and-hold'
      ? ([
          [0, share, null],
          [share, 1, share],
        ] as const)
      : ([[0, share, kind === 'natural' ? null : 0]] as const);
  let re = 0;
  let im = 0;
  for (const [from, to, held] of pieces) {
    const points = 2000;
    for (let i = 0; i < points; i += 1) {
      const t = from + ((to - from) * (i + 0.5)) / points;
      const phase = 2 * Math.PI * (x * (held ?? t) - (x + copy) * t);
      re += (Math.cos(phase) * (to - from)) / points;
      im += (Math.sin(phase) * (to - from)) / points;
    }
  }
  return Math.hypot(re, im);
}
