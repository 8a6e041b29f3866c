/** Designed low-passes: the demand is met, and with one tap less it is not. */
import assert from 'node:assert/strict';
import { cicResponse } from '../../../src/signal/digital/cic';
import { firResponse } from '../../../src/signal/digital/fir-response';
import { kaiserOrder } from '../../../src/signal/digital/kaiser-order';
import { fewestTaps, lowPassFir, type LowPassDemand } from '../../../src/signal/digital/low-pass-fir';
import { product } from '../../../src/signal/response-algebra';
import { readDigitalFilters } from '../../reference/digital-filters';
import { assertClose, assertWithin } from '../../support/tolerance';

const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;
const demands: readonly LowPassDemand[] = [
  { passband: 0.1, stopband: 0.15, rippleDb: 0.42, attenuationDb: 32 },
  { passband: 0.05, stopband: 0.2, rippleDb: 0.1, attenuationDb: 60 },
  { passband: 0.2, stopband: 0.25, rippleDb: 0.01, attenuationDb: 100 },
  { passband: 0.1, stopband: 0.3, rippleDb: 1, attenuationDb: 10 },
];

describe('fewestTaps', () => {
  for (const demand of demands) {
    const { passband, stopband, rippleDb, attenuationDb } = demand;
    it(`meets ${rippleDb} dB to ${passband} and ${attenuationDb} dB from ${stopband}, and fails with one or two taps less`, () => {
      const { taps, used } = fewestTaps(demand);
      const response = firResponse(taps, 1);
      assert.ok(used <= 1);
      assertWithin(
        taps.reduce((sum, tap) => sum + tap, 0),
        1,
        1e-12,
      );
      const pass = response.bounds(0, passband);
      assert.ok(toDb(pass.high) <= rippleDb && toDb(pass.low) >= -rippleDb, `${toDb(pass.low)} .. ${toDb(pass.high)} dB`);
      assert.ok(toDb(response.bounds(stopband, 0.5).high) <= -attenuationDb);
      for (const fewer of [1, 2]) assert.ok(lowPassFir(taps.length - fewer, demand).used > 1, `${fewer} less`);
    });
  }

  it('is flat together with the droop that it undoes', () => {
    const cic = cicResponse({ stages: 4, delay: 1, by: 16 }, 16);
    // At the rate behind the CIC a share is a frequency of that rate.
    const droop = (share: number): number => Math.exp(cic.logGain(share));
    const demand = { passband: 0.2, stopband: 0.3, rippleDb: 0.02, attenuationDb: 80, droop };
    const { taps } = fewestTaps(demand);
    const both = product([firResponse(taps, 1), cic]);
    for (let i = 0; i <= 400; i += 1) assertWithin(toDb(both.logGain((0.2 * i) / 400)), 0, 0.02, `at ${(0.2 * i) / 400}`);
    assert.ok(toDb(cic.logGain(0.2)) < -2);
    assert.ok(toDb(firResponse(taps, 1).bounds(0.3, 0.5).high) <= -80);
    assert.ok(lowPassFir(taps.length - 1, demand).used > 1);
  });

  it('refuses demands that make no sense or take too many taps', () => {
    const base = { passband: 0.1, stopband: 0.2, rippleDb: 0.1, attenuationDb: 60 };
    for (const wrong of [{ passband: 0.2 }, { passband: 0 }, { stopband: 0.5 }, { stopband: NaN }]) {
      assert.throws(() => fewestTaps({ ...base, ...wrong }), /pass band must end/);
    }
    for (const wrong of [{ rippleDb: 0 }, { attenuationDb: -60 }, { rippleDb: Infinity }]) {
      assert.throws(() => fewestTaps({ ...base, ...wrong }), /above 0 dB/);
    }
    assert.throws(() => fewestTaps({ ...base, stopband: 0.1001 }), /more than 1023 taps/);
  });
});

describe('kaiserOrder', () => {
  for (const { attenuationDb, width, order } of readDigitalFilters().kaiser) {
    it(`is ${order.toFixed(2)} for ${attenuationDb} dB over ${width} of the rate`, () => {
      assertClose(kaiserOrder(attenuationDb, width), order, 1e-12);
    });
  }
});
