/** Group delay as a response: the closed form of every pole, with bounds that enclose it. */
import assert from 'node:assert/strict';
import { butterworth } from '../../src/signal/families/butterworth';
import { chebyshev } from '../../src/signal/families/chebyshev';
import { elliptic } from '../../src/signal/families/elliptic';
import { polesAndZeros } from '../../src/signal/families/poles-and-zeros';
import { realPole } from '../../src/signal/families/real-pole';
import { secondOrder } from '../../src/signal/families/second-order';
import { groupDelay } from '../../src/signal/filter';
import { delayOffset, groupDelayResponse } from '../../src/signal/group-delay-response';
import { largestOverBands } from '../../src/signal/search';
import { assertBoundsEnclose, assertSlopeEncloses } from '../support/enclosing';
import { assertClose } from '../support/tolerance';

const filters = [butterworth(5, 1000), chebyshev(8, 1200, 1, 'ripple'), realPole(3000)];

describe('groupDelayResponse', () => {
  const delay = groupDelayResponse(filters);

  it('is the sum of the filters’ group delays', () => {
    for (const f of [0, 10, 700, 1190, 5000]) {
      const sum = filters.reduce((total, filter) => total + groupDelay(filter, f), 0);
      assertClose(Math.exp(delay.logGain(f)), sum, 1e-12);
    }
    assert.equal(delay.logGain(Infinity), -Infinity);
  });

  it('encloses its value and its slope', () => {
    assertBoundsEnclose(delay, 1000, 95);
    assertSlopeEncloses(delay, 1000, 96);
  });

  it('has a proved peak near the corner that no plain sample exceeds', () => {
    const peak = largestOverBands(delay, [{ low: 0, high: 2000 }])!;
    let best = 0;
    for (let i = 0; i <= 20_000; i += 1)
      best = Math.max(
        best,
        filters.reduce((sum, filter) => sum + groupDelay(filter, i / 10), 0),
      );
    assert.ok(best <= Math.exp(peak.logGain) * (1 + 1e-12));
    assertClose(Math.exp(peak.logGain), best, 2e-4);
  });

  it('counts zeros right of the axis as poles, leaves out those on it, and takes away those left of it', () => {
    const lead = polesAndZeros({
      poles: [
        { re: -5000, im: 0 },
        { re: -900, im: 2000 },
      ],
      zeros: [
        { re: -100, im: 0 },
        { re: -300, im: 1500 },
      ],
      gain: 1,
      gainAtHz: 0,
    });
    const mixed = [secondOrder('allpass', 1500, 3), elliptic(5, 1000, 0.1, 40, 'ripple'), lead];
    const response = groupDelayResponse(mixed);
    const offset = delayOffset(mixed);
    const humps = [100, 300, 300];
    assertClose(
      offset,
      humps.reduce((sum, width) => sum + 1 / (2 * Math.PI * width), 0),
      1e-12,
    );
    for (const f of [0, 50, 990, 1500, 5000]) {
      const sum = mixed.reduce((total, filter) => total + groupDelay(filter, f), 0);
      assertClose(Math.exp(response.logGain(f)), sum + offset, 1e-12);
    }
    assert.ok(groupDelay(lead, 10) < 0);
    assertBoundsEnclose(response, 1000, 97);
    assertSlopeEncloses(response, 1000, 98);
  });
});
