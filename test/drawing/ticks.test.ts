/** Tests of axis marks. */
import assert from 'node:assert/strict';
import { frequencyText, frequencyTicks, levelTicks, withoutCollisions } from '../../src/drawing/ticks';

const named = (ticks: readonly { readonly text: string }[]): string[] =>
  ticks.map(({ text }) => text).filter((text) => text !== '');
const nbsp = '\u00a0';

describe('ticks', () => {
  it('names the decades of a logarithmic axis', () => {
    const scale = { low: 5, high: 3.3e6, kind: 'log', from: 0, to: 680 } as const;
    assert.deepEqual(named(frequencyTicks(scale)), ['10', '100', `1${nbsp}k`, `10${nbsp}k`, `100${nbsp}k`, `1${nbsp}M`]);
  });

  it('uses round steps on a linear axis', () => {
    const scale = { low: 0, high: 25_600, kind: 'linear', from: 0, to: 680 } as const;
    assert.deepEqual(named(frequencyTicks(scale)), ['0', `5${nbsp}k`, `10${nbsp}k`, `15${nbsp}k`, `20${nbsp}k`, `25${nbsp}k`]);
  });

  it('marks a narrow stretch of a logarithmic axis in linear steps, so that it is never without marks', () => {
    const scale = { low: 40_000, high: 44_000, kind: 'log', from: 0, to: 680 } as const;
    assert.ok(named(frequencyTicks(scale)).length >= 3);
  });

  it('steps levels by 40 dB where 20 would crowd, with a true minus sign', () => {
    const scale = { low: -140, high: 0, kind: 'linear', from: 186, to: 0 } as const;
    assert.deepEqual(named(levelTicks(scale)), ['−120', '−80', '−40', '0']);
  });

  it('shows as many decimals as the step has', () => {
    const scale = { low: -1.2, high: 0.5, kind: 'linear', from: 230, to: 0 } as const;
    assert.ok(named(levelTicks(scale)).includes('−0.4'));
  });

  it('drops the texts that would touch and keeps their marks', () => {
    const scale = { low: 0, high: 100, kind: 'linear', from: 0, to: 100 } as const;
    const ticks = [0, 10, 20, 90].map((value) => ({ value, text: 'wide' }));
    const kept = withoutCollisions(ticks, scale, () => 30);
    assert.deepEqual(
      kept.map(({ text }) => text),
      ['wide', '', '', 'wide'],
    );
  });

  it('writes frequencies as short as they are exact', () => {
    assert.deepEqual([0, 999, 1500, 2.5e6, 1e9].map(frequencyText), ['0', '999', `1.5${nbsp}k`, `2.5${nbsp}M`, `1${nbsp}G`]);
  });
});
