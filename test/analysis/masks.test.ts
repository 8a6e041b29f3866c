/** Masks of the analogue path and of the whole, flat and sloped, against plain grids and closed forms. */
import assert from 'node:assert/strict';
import { analyse, type LimitFigure, type MaskFigure } from '../../src/analysis';
import type { Channel, MaskLimit, MaskSegment } from '../../src/spec/channel';
import {
  butterworthForm,
  capture,
  chebyshevForm,
  generate,
  plusMinus,
  rate,
  relay,
  stage,
  wanted,
} from '../support/channel-builder';
import { plainHold } from '../support/plain-pulse';
import { assertWithin, provedGapDb } from '../support/tolerance';

const dB = (gain: number): number => 20 * Math.log10(gain);
const grid = (low: number, high: number, count: number): readonly number[] =>
  Array.from({ length: count + 1 }, (_, index) => low + ((high - low) * index) / count);
const largest = (values: readonly number[]): number => values.reduce((a, b) => Math.max(a, b), -Infinity);

function segment(lowHz: number, highHz: number, parts: Partial<MaskSegment>): MaskSegment {
  return { lowHz, highHz, sense: 'within', lower: null, upper: null, along: 'linear', ...parts };
}

const flat = (db: number) => ({ fromDb: db, toDb: db });
const below = (lowHz: number, highHz: number, fromDb: number, toDb = fromDb, along: 'linear' | 'log' = 'linear') =>
  segment(lowHz, highHz, { sense: 'below', upper: { fromDb, toDb }, along });
const above = (lowHz: number, highHz: number, fromDb: number, toDb = fromDb, along: 'linear' | 'log' = 'linear') =>
  segment(lowHz, highHz, { sense: 'above', lower: { fromDb, toDb }, along });

function masked(channel: Channel, key: 'response' | 'through', ...segments: readonly MaskSegment[]) {
  const mask: MaskLimit = { key, mask: null, segments, ref: 'R-3', margin: null };
  const { masks, limits } = analyse({ ...channel, masks: [mask] });
  return { masks, limit: limits[0] ?? assert.fail('no limit'), first: masks[0] ?? assert.fail('no mask') };
}

/** A second-order butterworth low-pass of 10 kHz, by its formula. */
const lowPass = (f: number): number => (1 + (f / 10e3) ** 4) ** -0.5;
const stages = [stage(butterworthForm(2, 10e3), { label: 'filter' })];
const channel = capture({
  wanted: [wanted(0, 5e3)],
  rate: rate(50e3),
  stages,
  pulse: { shape: 'rectangle', width: { share: 1 } },
});

describe('a mask of the analogue path', () => {
  it('holds each segment to its worst point, the pulse left out', () => {
    const { masks, limit } = masked(
      channel,
      'response',
      segment(0, 5e3, { lower: flat(-0.5), upper: flat(0.5) }),
      below(30e3, Infinity, -20),
    );
    assert.deepEqual(
      masks.map(({ segment: index, side, frequency, bound }) => ({
        index,
        side,
        frequency,
        bound: Math.round(bound * 1e9) / 1e9,
      })),
      [
        { index: 0, side: 'lower', frequency: 5e3, bound: -0.5 },
        { index: 1, side: 'upper', frequency: 30e3, bound: -20 },
      ],
    );
    assertWithin(masks[0]?.value ?? NaN, dB(lowPass(5e3)), provedGapDb);
    assertWithin(masks[1]?.value ?? NaN, dB(lowPass(30e3)), provedGapDb);
    assertWithin(masks[1]?.margin ?? NaN, -20 - dB(lowPass(30e3)), provedGapDb);
    assert.deepEqual([limit.limit, limit.ref, limit.sense, limit.unit, limit.judged], ['response', 'R-3', 'inside', 'dB', true]);
    assert.equal(limit.passes, (limit.margin ?? NaN) >= 0);
    assert.equal(limit.margin, Math.min(...masks.map(({ margin }) => margin)));
    assert.deepEqual(limit.where, { frequency: 30e3 });
  });

  it('finds the worst point of a slope between any two points of a grid', () => {
    // Ripples of a chebyshev filter against lines that cut through them.
    const rippled = capture({
      wanted: [wanted(0, 9e3)],
      rate: rate(50e3),
      referenceHz: 0,
      stages: [stage(chebyshevForm(6, 10e3, 1, 'ripple'))],
    });
    const chebyshev = (f: number): number => (1 + (10 ** 0.1 - 1) * Math.cos(6 * Math.acos(f / 10e3)) ** 2) ** -0.5;
    const valley = 10 ** (-1 / 20);
    for (const along of ['linear', 'log'] as const) {
      const line = (f: number): number =>
        along === 'linear' ? 2 - (1.5 * (f - 1e3)) / 8.9e3 : 2 - (1.5 * Math.log(f / 1e3)) / Math.log(9.9);
      const points = grid(1e3, 9.9e3, 200_000).map((f) => ({ f, over: dB(chebyshev(f) / valley) - line(f) }));
      const worst = points.reduce((best, one) => (one.over > best.over ? one : best));
      const { first } = masked(rippled, 'response', below(1e3, 9.9e3, 2, 0.5, along));
      assertWithin(first.margin, -worst.over, provedGapDb);
      assertWithin(first.bound, line(first.frequency), 1e-9);
      assertWithin(first.value - first.bound, -first.margin, 1e-9);
      assert.ok(Math.abs(first.frequency - worst.f) < 60, `${first.frequency} is not near ${worst.f}`);
      const under = masked(rippled, 'response', above(1e3, 9.9e3, 0, -0.3, along)).first;
      const lower = (f: number): number =>
        along === 'linear' ? (-0.3 * (f - 1e3)) / 8.9e3 : (-0.3 * Math.log(f / 1e3)) / Math.log(9.9);
      assertWithin(under.margin, -largest(points.map(({ f }) => lower(f) - dB(chebyshev(f) / valley))), provedGapDb);
    }
  });

  it('is judged at the worst corner at each frequency, with the same parts at the reference', () => {
    const loose = capture({
      wanted: [wanted(1e3, 5e3)],
      rate: rate(50e3),
      referenceHz: 4e3,
      stages: [
        stage(butterworthForm(2, 10e3), { label: 'filter', cornerTolerance: plusMinus(0.1), gainTolerance: plusMinus(0.2) }),
      ],
    });
    const corners = grid(9e3, 11e3, 200);
    const against = (f: number, corner: number): number => dB(((1 + (f / corner) ** 4) / (1 + (4e3 / corner) ** 4)) ** -0.5);
    const { first } = masked(loose, 'response', below(20e3, 80e3, -10, -40, 'log'));
    const line = (f: number): number => -10 - (30 * Math.log(f / 20e3)) / Math.log(4);
    const expected = largest(corners.flatMap((corner) => grid(20e3, 80e3, 2000).map((f) => against(f, corner) - line(f))));
    assertWithin(first.margin, -expected, 0.003);
    assert.deepEqual(first.worstAt, { 'filter, corner': 0.1 });
    const nominal = largest(grid(20e3, 80e3, 2000).map((f) => against(f, 10e3) - line(f)));
    assertWithin(first.nominal - first.bound, nominal, 0.003);
  });

  it('may run to infinity, where what never falls far enough is over it', () => {
    const notched = masked(channel, 'response', below(100e3, Infinity, -30)).first;
    assert.equal(notched.frequency, 100e3);
    const flatPath = masked(capture({ wanted: [wanted(0, 5e3)], rate: rate(50e3) }), 'response', below(100e3, Infinity, -30));
    assertWithin(flatPath.first.margin, -30, 1e-9);
    assert.deepEqual([flatPath.limit.judged, flatPath.limit.passes], [true, false]);
    assert.equal(masked(channel, 'response', above(100e3, Infinity, -200)).first.margin, -Infinity);
  });

  it('from a reference that nothing comes through at is passed without end', () => {
    const averaging = capture({
      wanted: [wanted(40, 60)],
      rate: rate(1000),
      referenceHz: 50,
      pulse: { shape: 'rectangle', width: { seconds: 0.02 } },
    });
    const { masks, limit } = masked(
      averaging,
      'through',
      segment(40, 60, { lower: flat(-1), upper: flat(1) }),
      above(40, 60, -3),
    );
    assert.deepEqual(
      masks.map(({ margin }) => margin),
      [-Infinity, Infinity],
    );
    assert.deepEqual([limit.passes, limit.value], [false, Infinity]);
  });

  it('that a path without a filter keeps to by nature is not judged', () => {
    const bare = capture({ wanted: [wanted(0, 5e3)], rate: rate(50e3) });
    const { limit } = masked(bare, 'response', segment(0, 5e3, { lower: flat(-1), upper: flat(1) }));
    assert.deepEqual([limit.judged, limit.passes, limit.value, limit.margin], [false, false, null, null]);
  });
});

/** The low-pass and a zero-order hold. */
const whole = (f: number): number => lowPass(f) * plainHold({ shape: 'rectangle', width: { share: 1 } }, 50e3, f);

describe('a mask of the whole', () => {
  it('has the aperture in it', () => {
    const { first } = masked(channel, 'through', segment(0, 5e3, { lower: flat(-0.5), upper: flat(0.5) }));
    assertWithin(first.value, dB(whole(5e3)), provedGapDb);
  });

  it('has the hold in it, measured from the reference', () => {
    const player = generate({ wanted: [wanted(0, 20e3)], rate: rate(50e3), stages, referenceHz: 3e3 });
    const points = grid(12e3, 48e3, 100_000);
    const line = (f: number): number => -4 - (50 * (f - 12e3)) / 36e3;
    const { first } = masked(player, 'through', below(12e3, 48e3, -4, -54));
    assertWithin(first.margin, -largest(points.map((f) => dB(whole(f) / whole(3e3)) - line(f))), provedGapDb);
  });

  it('with the clock at its worst where the hold follows it', () => {
    const player = generate({ wanted: [wanted(0, 20e3)], rate: rate(50e3, { tolerance: plusMinus(0.01) }) });
    const { first } = masked(player, 'through', above(0, 20e3, -3));
    const x = 20 / 50 / 0.99;
    assertWithin(first.value, dB(Math.sin(Math.PI * x) / (Math.PI * x)), provedGapDb);
  });
});

describe('a mask of a relay', () => {
  const parts = {
    wanted: [wanted(0, 5e3)],
    rate: rate(50e3),
    inputStages: [stage(butterworthForm(2, 10e3))],
    outputStages: [stage(butterworthForm(2, 10e3))],
  };
  const both = segment(0, 5e3, { lower: flat(-1), upper: flat(1) });

  it('has both filters in it, and a gate that only takes its share counts for nothing', () => {
    const gated = relay({ ...parts, gate: { kind: 'pulse', pulse: { shape: 'rectangle', width: { share: 0.12 } } } });
    for (const key of ['response', 'through'] as const) {
      assertWithin(masked(gated, key, both).first.value, 2 * dB(lowPass(5e3)), provedGapDb, key);
    }
  });

  it('of the whole has the hold in it', () => {
    const held = relay(parts);
    assertWithin(masked(held, 'response', both).first.value, 2 * dB(lowPass(5e3)), provedGapDb);
    assertWithin(masked(held, 'through', both).first.value, dB(lowPass(5e3) * whole(5e3)), provedGapDb);
  });
});

describe('the limit of a mask', () => {
  it('is broken by its worst segment', () => {
    const figures: readonly MaskFigure[] = masked(channel, 'response', below(10e3, 11e3, -1), below(20e3, 21e3, -40)).masks;
    const limit: LimitFigure = masked(channel, 'response', below(10e3, 11e3, -1), below(20e3, 21e3, -40)).limit;
    assert.deepEqual([limit.passes, limit.at, limit.where?.frequency], [false, figures[1]?.bound, 20e3]);
  });
});
