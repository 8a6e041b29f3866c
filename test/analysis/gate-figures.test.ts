/** A gate's own loss, its copies and its nulls against the closed forms of the pulses. */
import assert from 'node:assert/strict';
import { gateFigures, stretchedGate } from '../../src/analysis/gate-figures';
import { pulseShape } from '../../src/analysis/pulse-shape';
import { shapeNulls } from '../../src/analysis/pulse-nulls';
import type { Pulse } from '../../src/spec/channel';

const close = (actual: number | undefined, expected: number): void => {
  assert.ok(actual !== undefined && Math.abs(actual - expected) < 1e-9, `${actual} for ${expected}`);
};
const db = (ratio: number): number => 20 * Math.log10(Math.abs(ratio));
const sinc = (x: number): number => Math.sin(Math.PI * x) / (Math.PI * x);
const rectangle = (share: number): Pulse => ({ shape: 'rectangle', width: { share } });

describe('the figures of a gate', () => {
  it('are the Fourier coefficients of a rectangle: c₀ = d, |c_k|/c₀ = |sinc(k·d)|', () => {
    const found = gateFigures(rectangle(0.12), 8000, 5);
    close(found?.ownDb, db(0.12));
    assert.equal(found?.copiesDb.length, 5);
    [1, 2, 3, 4, 5].forEach((k) => {
      close(found.copiesDb[k - 1], db(sinc(0.12 * k)));
    });
  });

  it('take the area of a shaped gate: a half sine has c₀ = 2d/π', () => {
    const found = gateFigures({ shape: 'half-sine', width: { seconds: 25e-6 } }, 8000, 1);
    close(found?.share, 0.2);
    close(found?.ownDb, db(0.4 / Math.PI));
    close(found?.copiesDb[0], db(Math.cos(0.2 * Math.PI) / (1 - 0.4 ** 2)));
  });

  it('of a gate that is positive as long as negative have no wanted path to compare with', () => {
    assert.deepEqual(gateFigures({ shape: 'split', width: { share: 0.4 } }, 8000, 3), {
      share: 0.4,
      ownDb: -Infinity,
      copiesDb: [],
    });
  });

  it('at twice the width are those of a gate of twice the width', () => {
    const wide: Pulse = { shape: 'trapezoid', width: { share: 0.3 }, edge: { seconds: 2e-6 } };
    assert.deepEqual(stretchedGate(wide, 2), { shape: 'trapezoid', width: { share: 0.6 }, edge: { seconds: 4e-6 } });
    assert.deepEqual(gateFigures(stretchedGate(rectangle(0.12), 2), 8000, 5), gateFigures(rectangle(0.24), 8000, 5));
  });
});

describe('the nulls of a pulse', () => {
  const nulls = (pulse: Pulse, count: number): readonly number[] => {
    const shape = pulseShape(pulse, 1000);
    assert.ok(shape);
    return shapeNulls(shape, count);
  };

  it('stand where its spectrum says', () => {
    assert.deepEqual(nulls(rectangle(0.5), 3), [2000, 4000, 6000]);
    assert.deepEqual(nulls({ shape: 'linear' }, 2), [1000, 2000]);
    assert.deepEqual(nulls({ shape: 'triangle', width: { share: 0.5 } }, 2), [4000, 8000]);
    assert.deepEqual(nulls({ shape: 'half-sine', width: { share: 1 } }, 2), [1500, 2500]);
    assert.deepEqual(nulls({ shape: 'split', width: { share: 1 } }, 2), [2000, 4000]);
  });

  it('of smoothed edges are those of both factors, in order', () => {
    // Base 5 ms, edges 1 ms: sinc(f·4 ms)·sinc(f·1 ms); every fourth null of the one is one of the other.
    const trapezoid: Pulse = { shape: 'trapezoid', width: { seconds: 5e-3 }, edge: { seconds: 1e-3 } };
    assert.deepEqual(
      nulls(trapezoid, 5).map((hz) => Math.round(hz)),
      [250, 500, 750, 1000, 1250],
    );
  });

  it('are none for a decay', () => {
    assert.deepEqual(nulls({ shape: 'exponential', width: { share: 0.5 }, decay: { share: 0.1 } }, 3), []);
  });
});
