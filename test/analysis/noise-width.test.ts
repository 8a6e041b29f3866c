/** Noise bandwidths of stages against closed forms. */
import assert from 'node:assert/strict';
import { channelPath, noiseWidth, type NoiseWidth } from '../../src/analysis';
import type { StageForm } from '../../src/spec/channel';
import { butterworthForm, capture, family, rate, stage, wanted } from '../support/channel-builder';
import { assertClose } from '../support/tolerance';

function widthOf(...forms: readonly StageForm[]): NoiseWidth {
  const stages = forms.map((form) => stage(form));
  return noiseWidth(channelPath(capture({ wanted: [wanted(0, 1000)], rate: rate(64_000), stages })).stages);
}

function assertWidth(width: NoiseWidth, hz: number): void {
  assertClose(width.kind === 'finite' ? width.hz : NaN, hz, 1e-9);
}

const notch: StageForm = { kind: 'second-order', sectionKind: 'notch', frequencyHz: 1000, q: 2 };

describe('the noise bandwidth of stages', () => {
  for (const order of [1, 2, 5]) {
    it(`is the closed form of a Butterworth low-pass of order ${order}`, () => {
      // ∫ df / (1 + (f/fc)^2n) = fc·(π/2n)/sin(π/2n); an integral of every table.
      const angle = Math.PI / (2 * order);
      assertWidth(widthOf(butterworthForm(order, 14_000)), (14_000 * angle) / Math.sin(angle));
    });
  }

  it('is π/2 times the width of one resonance', () => {
    // ∫ of 1/(1 + Q²·(f/f₀ − f₀/f)²) over f is π/2·f₀/Q; common practice.
    const resonance: StageForm = { kind: 'second-order', sectionKind: 'bandpass', frequencyHz: 5000, q: 20 };
    assertWidth(widthOf(resonance), (Math.PI / 2) * 250);
  });

  it('is that of two poles in series, measured from their largest gain', () => {
    // ∫ df / ((1 + (f/a)²)(1 + (f/b)²)) = π/2·ab/(a + b); partial fractions.
    const poles = [100, 300].map((cornerHz): StageForm => ({ kind: 'bandwidth', cornerHz }));
    assertWidth(widthOf(...poles), (Math.PI / 2) * 75);
  });

  it('has no end where nothing stops the noise', () => {
    for (const form of [notch, family('butterworth', 3, 100, { filterKind: 'highpass' })]) {
      assert.deepEqual(widthOf(form), { kind: 'endless' });
    }
    assert.deepEqual(widthOf(), { kind: 'endless' });
  });

  it('is not known of a measured table', () => {
    const table = { frequenciesHz: [0, 1000], gainsDb: [0, -3], phasesRad: null };
    assert.deepEqual(widthOf({ kind: 'measured', path: 'a.csv', table, below: 'hold', beyond: 'hold' }), { kind: 'unknown' });
  });
});
