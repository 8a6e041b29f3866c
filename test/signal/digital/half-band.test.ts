/** Half-band filters against exact minimax vectors. */
import assert from 'node:assert/strict';
import { halfBandByAttenuation, halfBandByPassband } from '../../../src/signal/digital/half-band';
import { firResponse } from '../../../src/signal/digital/fir-response';
import { readDigitalFilters } from '../../reference/digital-filters';
import { assertClose, assertWithin } from '../../support/tolerance';

const { halfBand } = readDigitalFilters();

describe('halfBandByPassband', () => {
  for (const { count, passband, deviation, stopDb, taps } of halfBand) {
    it(`gives the exact design with ${count} taps and a pass band to ${passband} of the rate`, () => {
      const design = halfBandByPassband(count, passband);
      const centre = (count - 1) / 2;
      assertWithin(design.deviation, deviation, 1e-11);
      taps.forEach((tap, index) => {
        assertWithin(design.taps[centre + 2 * index + 1]!, tap, 1e-11);
        assertWithin(design.taps[centre - 2 * index - 1]!, tap, 1e-11);
      });
      assert.equal(design.taps[centre], 0.5);
      design.taps.forEach((tap, index) => {
        if (index !== centre && (index - centre) % 2 === 0) assert.equal(tap, 0);
      });
      const worst = firResponse(design.taps, 1).bounds(0.5 - passband, 0.5).high;
      assertWithin((-20 / Math.LN10) * worst, stopDb, 1e-6);
    });
  }

  it('refuses numbers of taps whose outermost would be nothing, and pass bands beyond a quarter of the rate', () => {
    for (const count of [1, 5, 9, 8, 2.5, NaN]) assert.throws(() => halfBandByPassband(count, 0.2), /3, 7, 11, 15/);
    for (const passband of [0, 0.25, 0.3, -0.1, NaN]) assert.throws(() => halfBandByPassband(11, passband), /below 0\.25/);
  });
});

describe('halfBandByAttenuation', () => {
  for (const { count, passband, deviation } of halfBand) {
    it(`finds the pass band of the exact design with ${count} taps from its attenuation`, () => {
      const design = halfBandByAttenuation(count, -20 * Math.log10(deviation));
      assertClose(design.passband, passband, 1e-9);
    });
  }

  it('refuses attenuations that every half-band filter has or none can have', () => {
    for (const attenuation of [0, 6.02, -20, 300, NaN])
      assert.throws(() => halfBandByAttenuation(11, attenuation), /attenuation/);
  });
});
