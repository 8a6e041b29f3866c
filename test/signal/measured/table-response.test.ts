/** Measured tables: straight in dB and phase between points, with bounds that a plain look at every point confirms. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { GainTable } from '../../../src/signal/measured/gain-table';
import { stretchedTable } from '../../../src/signal/measured/gain-table';
import { tableDelay, tableDelayPieces, tablePhase } from '../../../src/signal/measured/table-delay';
import { tableResponse } from '../../../src/signal/measured/table-response';
import { assertBoundsEnclose, assertSlopeEncloses } from '../../support/enclosing';
import { assertClose, assertWithin } from '../../support/tolerance';

const perNeper = 20 / Math.LN10;

const table: GainTable = {
  frequenciesHz: [100, 200, 400, 1000, 5000],
  gainsDb: [0, 1, -3, -3, -40],
  phasesRad: [0, -0.2, -1, -2, -9],
  beyondDbPerDecade: -40,
};
const response = tableResponse(table);
const gainDb = (f: number): number => perNeper * response.logGain(f);

describe('the gain of a measured table', () => {
  it('is that of its points, and straight in dB over frequency between them', () => {
    table.frequenciesHz.forEach((f, index) => {
      assertWithin(gainDb(f), table.gainsDb[index] ?? NaN, 1e-12);
    });
    assertWithin(gainDb(150), 0.5, 1e-12);
    assertWithin(gainDb(300), -1, 1e-12);
    assertWithin(gainDb(2000), -3 - 37 / 4, 1e-12);
  });

  it('holds below, and goes on by its slope beyond', () => {
    assertWithin(gainDb(0), 0, 1e-12);
    assertWithin(gainDb(50e3), -80, 1e-9);
    assert.equal(gainDb(Infinity), -Infinity);
    assert.equal(tableResponse({ ...table, beyondDbPerDecade: 0 }).logGain(Infinity), -40 / perNeper);
    assert.equal(tableResponse({ ...table, beyondDbPerDecade: 3 }).logGain(Infinity), Infinity);
  });

  it('is enclosed by its bounds and slopes, a long noisy table included', () => {
    const noisy: GainTable = {
      frequenciesHz: Array.from({ length: 3000 }, (_, index) => 10 + index * 0.7 + 0.3 * Math.sin(index)),
      gainsDb: Array.from({ length: 3000 }, (_, index) => -0.01 * index + 2 * Math.sin(index * index)),
      phasesRad: null,
      beyondDbPerDecade: -20,
    };
    for (const one of [table, noisy]) {
      assertBoundsEnclose(tableResponse(one), 1000, 71);
      assertSlopeEncloses(tableResponse(one), 1000, 72);
    }
  });

  it('has the very extremes of its points as bounds', () => {
    const ends = fc.tuple(fc.double({ min: 0, max: 6000, noNaN: true }), fc.double({ min: 0, max: 6000, noNaN: true }));
    fc.assert(
      fc.property(ends, ([a, b]) => {
        const [low, high] = [Math.min(a, b), Math.max(a, b)];
        const inside = table.gainsDb.filter((_, index) => {
          const f = table.frequenciesHz[index] ?? NaN;
          return low < f && f < high;
        });
        const plain = [gainDb(low), gainDb(high), ...inside];
        assertWithin(perNeper * response.bounds(low, high).high, Math.max(...plain), 1e-7);
        assertWithin(perNeper * response.bounds(low, high).low, Math.min(...plain), 1e-7);
      }),
      { seed: 73 },
    );
  });

  it('is refused where it is no table', () => {
    assert.throws(() => tableResponse({ ...table, frequenciesHz: [1], gainsDb: [0] }), RangeError);
    assert.throws(() => tableResponse({ ...table, gainsDb: [0, 1] }), RangeError);
    assert.throws(() => tableResponse({ ...table, frequenciesHz: [100, 200, 200, 300, 400] }), RangeError);
  });
});

describe('the timing of a measured table', () => {
  it('has the phase of its points, straight between and straight on outside', () => {
    assertWithin(tablePhase(table, 300) ?? NaN, -0.6, 1e-12);
    assertWithin(tablePhase(table, 50) ?? NaN, 0.1, 1e-12);
    assertWithin(tablePhase(table, 9000) ?? NaN, -16, 1e-12);
  });

  it('delays by the slope of the phase, at a point by the mean of both sides', () => {
    assertClose(tableDelay(table, 150) ?? NaN, 0.2 / (2 * Math.PI * 100), 1e-12);
    assertClose(tableDelay(table, 200) ?? NaN, (0.2 / 100 + 0.8 / 200) / (4 * Math.PI), 1e-12);
    assertClose(tableDelay(table, 0) ?? NaN, 0.2 / (2 * Math.PI * 100), 1e-12);
    assertClose(tableDelay(table, 1e5) ?? NaN, 7 / (2 * Math.PI * 4000), 1e-12);
  });

  it('cuts a band where the delay steps', () => {
    const pieces = tableDelayPieces(table, 150, 2000) ?? [];
    assert.deepEqual(
      pieces.map(({ lowHz, highHz }) => [lowHz, highHz]),
      [
        [150, 200],
        [200, 400],
        [400, 1000],
        [1000, 2000],
      ],
    );
    for (const { lowHz, highHz, seconds } of pieces) assertClose(seconds, tableDelay(table, (lowHz + highHz) / 2) ?? NaN, 1e-12);
    assert.deepEqual(
      tableDelayPieces(table, 6000, 6000)?.map(({ lowHz }) => lowHz),
      [6000],
    );
  });

  it('is not known without a phase', () => {
    const silent = { ...table, phasesRad: null };
    assert.deepEqual([tablePhase(silent, 300), tableDelay(silent, 300), tableDelayPieces(silent, 100, 300)], [null, null, null]);
  });

  it('is that of the same thing, slower, where the axis is stretched', () => {
    const slower = stretchedTable(table, 2);
    assertClose(tableDelay(slower, 300) ?? NaN, (tableDelay(table, 150) ?? NaN) / 2, 1e-12);
    assertWithin(tableResponse(slower).logGain(600), response.logGain(300), 1e-12);
  });
});
