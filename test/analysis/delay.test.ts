/** Group delay and its spread, against numerically differentiated phase. */
import assert from 'node:assert/strict';
import { analyse, channelPath, pathPhaseRad } from '../../src/analysis';
import type { LimitFigure } from '../../src/analysis';
import {
  butterworthForm,
  capture,
  chebyshevForm,
  generate,
  limit,
  plusMinus,
  rate,
  rectangleSeconds,
  relay,
  stage,
  wanted,
} from '../support/channel-builder';
import { assertWithin } from '../support/tolerance';
import type { Channel, Pulse } from '../../src/spec/channel';

/** Largest minus smallest of −dφ/dω on a grid over the band, by central differences. */
function spreadOnGrid(channel: Channel, lowHz: number, highHz: number): number {
  const path = channelPath(channel);
  const delays = Array.from({ length: 2001 }, (_, index) => {
    const f = lowHz + ((highHz - lowHz) * index) / 2000;
    const phase = (at: number): number => pathPhaseRad(path, at) ?? NaN;
    return -(phase(f + 0.5) - phase(f - 0.5)) / (2 * Math.PI);
  });
  return Math.max(...delays) - Math.min(...delays);
}

describe('delay', () => {
  const parts = { wanted: [wanted(10, 10e3)], rate: rate(51200) };

  it('spreads over the wanted band as its phase bends', () => {
    for (const form of [butterworthForm(4, 14e3), chebyshevForm(6, 11e3, 1, 'ripple')]) {
      const channel = capture({ ...parts, stages: [stage(form)] });
      assertWithin(analyse(channel).delaySpread ?? NaN, spreadOnGrid(channel, 10, 10e3), 2e-8);
    }
  });

  it('spreads most at the end of a corner', () => {
    const channel = capture({ ...parts, stages: [stage(butterworthForm(4, 14e3), { cornerTolerance: plusMinus(0.04) })] });
    const low = capture({ ...parts, stages: [stage(butterworthForm(4, 0.96 * 14e3))] });
    assertWithin(analyse(channel).delaySpread ?? NaN, analyse(low).delaySpread ?? NaN, 1e-9);
    assert.equal(analyse(channel).delay, analyse(capture({ ...parts, stages: [stage(butterworthForm(4, 14e3))] })).delay);
  });

  it('of a pulse alone is half its width and does not spread', () => {
    const figures = analyse(capture({ ...parts, pulse: rectangleSeconds(3e-6) }));
    assert.deepEqual([figures.delay, figures.delaySpread], [1.5e-6, 0]);
  });

  it('of many stages that vary moves them together', () => {
    const loose = (index: number) => stage(butterworthForm(1, 20e3 + 1e3 * index), { cornerTolerance: plusMinus(0.05) });
    const many = capture({ ...parts, stages: Array.from({ length: 8 }, (_, index) => loose(index)) });
    const still = capture({ ...parts, stages: many.stages.map((one) => stage(one.form)) });
    assert.ok((analyse(many).delaySpread ?? 0) > (analyse(still).delaySpread ?? 0));
  });
});

describe('the delay of a pulse', () => {
  const parts = { wanted: [wanted(0, 10e3)], rate: rate(1e6) };
  const delayOf = (pulse: Pulse, more: Partial<Channel> = {}) => analyse(generate({ ...parts, pulse, ...more })).delay ?? NaN;

  it('is half its length for the symmetric shapes and for split, one period for linear', () => {
    const shapes: readonly Pulse[] = [
      { shape: 'rectangle', width: { share: 0.8 } },
      { shape: 'triangle', width: { share: 0.8 } },
      { shape: 'half-sine', width: { share: 0.8 } },
      { shape: 'raised-cosine', width: { share: 0.8 }, edge: { share: 0.1 } },
      { shape: 'trapezoid', width: { share: 0.8 }, edge: { share: 0.1 } },
      { shape: 'split', width: { share: 0.8 } },
    ];
    for (const pulse of shapes) assertWithin(delayOf(pulse, { referenceHz: 5e3 }), 0.4e-6, 1e-15, pulse.shape);
    assertWithin(delayOf({ shape: 'linear' }), 1e-6, 1e-15);
  });

  it('of an exponential is the slope of its phase', () => {
    // 0.19321634 w at 0 Hz for a decay of 0.2 w (50-digit arithmetic; τ − w/(e^{w/τ} − 1)).
    assertWithin(delayOf({ shape: 'exponential', width: { share: 1 }, decay: { share: 0.2 } }) * 1e6, 0.19321634, 1e-8);
  });

  it('of track and hold is e²·T/2 at 0 Hz', () => {
    // d = 0.1, 0.3, 0.5, 0.9: 0.405, 0.245, 0.125, 0.005 T (closed form).
    for (const [track, periods] of [
      [0.1, 0.405],
      [0.3, 0.245],
      [0.5, 0.125],
      [0.9, 0.005],
    ] as const) {
      const held = relay({ ...parts, gate: { kind: 'track', track: { share: track } } });
      assertWithin((analyse(held).delay ?? NaN) * 1e6, periods, 1e-6);
    }
  });
});

describe('a limit of the delay', () => {
  const judged = (channel: Channel, key: 'delay' | 'delay-spread', at: number): LimitFigure =>
    analyse({ ...channel, limits: [limit(key, at)] }).limits[0] ?? assert.fail('no limit');
  const parts = { wanted: [wanted(100, 10e3)], rate: rate(51200), referenceHz: 1e3 };

  /** −dφ/dω of a stage of one real pole. */
  const poleDelay = (f: number, corner: number): number => 1 / (2 * Math.PI * corner) / (1 + (f / corner) ** 2);

  it('is held to the worst corner of each stage and the slowest clock, in seconds', () => {
    const channel = generate({
      ...parts,
      rate: rate(51200, { tolerance: plusMinus(0.01), clock: 'board' }),
      stages: [
        stage({ kind: 'bandwidth', cornerHz: 20e3 }, { label: 'one', cornerTolerance: plusMinus(0.1) }),
        stage({ kind: 'bandwidth', cornerHz: 30e3 }, { label: 'two' }),
      ],
    });
    const found = judged(channel, 'delay', 20e-6);
    const pulse = 0.5 / 51200;
    assertWithin(found.nominal ?? NaN, poleDelay(1e3, 20e3) + poleDelay(1e3, 30e3) + pulse, 1e-12);
    assertWithin(found.value ?? NaN, poleDelay(1e3, 18e3) + poleDelay(1e3, 30e3) + pulse / 0.99, 1e-12);
    assert.deepEqual([found.unit, found.sense, found.where], ['s', 'at-most', { frequency: 1e3 }]);
    assert.deepEqual(found.worstAt, { 'one, corner': -0.1, 'board, frequency': -0.01 });
  });

  it('may be worst between the ends of a corner', () => {
    // Far above its corner a pole delays by corner/(2πf²), far below by 1/(2π·corner): at 1 kHz most for a corner of 1 kHz.
    const loose = stage({ kind: 'bandwidth', cornerHz: 1.1e3 }, { label: 'pole', cornerTolerance: plusMinus(0.5) });
    const found = judged(capture({ ...parts, stages: [loose] }), 'delay', 1e-3);
    assertWithin(found.value ?? NaN, 1 / (4 * Math.PI * 1e3), 1e-10);
  });

  it('of nanoseconds is broken by nanoseconds', () => {
    const channel = generate({ ...parts, rate: rate(100e6), pulse: rectangleSeconds(10.8e-9) });
    assert.equal(judged(channel, 'delay', 5e-9).passes, false);
    assert.equal(judged(channel, 'delay', 5.4e-9).passes, true);
  });

  it('of its spread is proved to a thousandth of the limit, and says how far', () => {
    const channel = capture({ ...parts, stages: [stage(chebyshevForm(6, 11e3, 1, 'ripple'))] });
    const found = judged(channel, 'delay-spread', 10e-6);
    assert.ok((found.gap ?? NaN) <= 1e-8, `a gap of ${String(found.gap)}`);
    const expected = spreadOnGrid(channel, 100, 10e3);
    assertWithin(found.value ?? NaN, expected, 2e-8);
    assert.equal(found.passes, false);
  });

  it('counts the spread of an exponential pulse, and that of no other', () => {
    const pulse: Pulse = { shape: 'exponential', width: { share: 1 }, decay: { share: 0.2 } };
    const band = { wanted: [wanted(0, 20e3)], rate: rate(51200), referenceHz: 0 };
    const w = 1 / 51200;
    /** −dφ/dω of (1 − e^{−(1/τ + jω)w})/(1 + jωτ), differentiated by central differences of the plain phase. */
    const phase = (f: number): number => {
      const [decay, turn] = [Math.exp(-5), 2 * Math.PI * f * w];
      return Math.atan2(decay * Math.sin(turn), 1 - decay * Math.cos(turn)) - Math.atan(2 * Math.PI * f * 0.2 * w);
    };
    const delays = Array.from({ length: 4001 }, (_, index) => index * 5).map(
      (f) => -(phase(f + 1) - phase(f - 1)) / (4 * Math.PI),
    );
    const found = judged(generate({ ...band, pulse }), 'delay-spread', 1e-6);
    assertWithin(found.value ?? NaN, Math.max(...delays) - Math.min(...delays), 2e-9);
    assert.equal(judged(generate(band), 'delay-spread', 1e-6).value, 0);
  });

  it('without stage or pulse is not judged', () => {
    for (const key of ['delay', 'delay-spread'] as const) assert.equal(judged(capture(parts), key, 1e-6).judged, false);
  });
});
