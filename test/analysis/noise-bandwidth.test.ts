/** Noise bandwidths against closed forms. */
import assert from 'node:assert/strict';
import { channelPath, noiseBandwidthHz } from '../../src/analysis';
import { constantResponse } from '../../src/signal/response-algebra';
import { butterworthForm, capture, rate, stage, wanted } from '../support/channel-builder';

describe('the noise bandwidth', () => {
  for (const order of [1, 2, 5]) {
    it(`of a Butterworth low-pass of order ${order} is its closed form`, () => {
      // ∫ df / (1 + (f/fc)^2n) = fc·(π/2n)/sin(π/2n); an integral of every table.
      const angle = Math.PI / (2 * order);
      const { analogue } = channelPath(
        capture({ wanted: [wanted(0, 1000)], rate: rate(64_000), stages: [stage(butterworthForm(order, 14_000))] }),
      );
      const width = noiseBandwidthHz(analogue) ?? NaN;
      assert.ok(Math.abs(width / ((14_000 * angle) / Math.sin(angle)) - 1) < 1e-8, String(width));
    });
  }

  it('does not exist where nothing ends the noise', () => {
    assert.equal(noiseBandwidthHz(constantResponse(0)), null);
  });
});
