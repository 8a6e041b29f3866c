/** Responses in series, turned over and constant. */
import assert from 'node:assert/strict';
import { butterworth } from '../../src/signal/families/butterworth';
import { filterResponse } from '../../src/signal/filter';
import { rectangleResponse } from '../../src/signal/pulses/rectangle';
import { constantResponse, inverse, product } from '../../src/signal/response-algebra';
import { assertClose } from '../support/tolerance';

const filter = filterResponse(butterworth(4, 1000));
const hold = rectangleResponse(1e-3);

describe('product', () => {
  it('adds logarithms, bounds and slopes', () => {
    const both = product([filter, hold, constantResponse(-1)]);
    assertClose(both.logGain(300), filter.logGain(300) + hold.logGain(300) - 1, 1e-15);
    assertClose(both.bounds(300, 700).high, filter.bounds(300, 700).high + hold.bounds(300, 700).high - 1, 1e-15);
    assertClose(both.slope(300, 700)!.low, filter.slope(300, 700)!.low + hold.slope(300, 700)!.low, 1e-15);
  });

  it('of nothing is a gain of 1, and of one response that response', () => {
    assert.equal(product([]).logGain(1), 0);
    assert.equal(product([filter]), filter);
  });

  it('has no slope across a null, and is silent where a null meets an infinite gain', () => {
    const odd = product([hold, inverse(hold)]);
    assert.equal(odd.slope(900, 1100), null);
    assert.equal(odd.logGain(1000), -Infinity);
    assert.deepEqual(odd.bounds(900, 1100), { low: -Infinity, high: Infinity });
  });
});

describe('inverse', () => {
  it('turns gain, bounds and slope over', () => {
    const turned = inverse(filter);
    assert.equal(turned.logGain(2000), -filter.logGain(2000));
    assert.equal(turned.bounds(1000, 3000).high, -filter.bounds(1000, 3000).low);
    assert.equal(turned.slope(1000, 3000)!.high, -filter.slope(1000, 3000)!.low);
    assert.equal(inverse(hold).slope(900, 1100), null);
  });

  it('keeps the turning points', () => {
    assert.equal(inverse(filter).turnsHz, filter.turnsHz);
    assert.equal(inverse(hold).turnsHz, undefined);
  });
});

describe('constantResponse', () => {
  it('is the same everywhere, infinity included', () => {
    const flat = constantResponse(-0.25);
    assert.equal(flat.logGain(Infinity), -0.25);
    assert.deepEqual(flat.bounds(0, Infinity), { low: -0.25, high: -0.25 });
    assert.deepEqual(flat.slope(0, 1), { low: 0, high: 0 });
  });
});
