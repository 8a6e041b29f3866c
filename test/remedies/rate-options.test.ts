import assert from 'node:assert/strict';
import { rateOptions } from '../../src/remedies/rate-options';
import type { Channel, RateChoices } from '../../src/spec/channel';
import { capture, plusMinus, rate, wanted } from '../support/channel-builder';

const clock = { name: 'board', frequencyHz: 24.576e6, jitterSeconds: 0, multiply: 1, divide: 480 };
const bearing = (rateChoices: RateChoices | null, parts: Partial<Channel> = {}): Channel =>
  capture({ wanted: [wanted(5, 10e3)], rate: rate(51.2e3), rateChoices, ...parts });
const above = (channel: Channel, set = 0): readonly number[] => rateOptions(channel)[set]?.above.map(({ hz }) => hz) ?? [];
const below = (channel: Channel, set = 0): readonly number[] => rateOptions(channel)[set]?.below.map(({ hz }) => hz) ?? [];

describe('the rates to choose from', () => {
  it('are those of a list, without the present one, in order', () => {
    const channel = bearing({ kind: 'list', ratesHz: [96e3, 48e3, 51.2e3, 64e3] });
    assert.deepEqual(above(channel), [64e3, 96e3]);
    assert.deepEqual(below(channel), [48e3]);
  });

  it('leave out those that fold a wanted band', () => {
    const channel = bearing({ kind: 'list', ratesHz: [15e3, 19.9e3, 20e3, 64e3] });
    assert.deepEqual(below(channel), [20e3]);
    assert.deepEqual(below({ ...channel, guardHz: 1e3 }), []);
    assert.deepEqual(below({ ...channel, rate: rate(51.2e3, { tolerance: plusMinus(1e-4) }) }), []);
  });

  it('are steps of a range where it has a step', () => {
    const channel = bearing({ kind: 'range', lowHz: 40e3, highHz: 72e3, stepHz: 8e3 });
    assert.deepEqual(above(channel), [56e3, 64e3, 72e3]);
    assert.deepEqual(below(channel), [40e3, 48e3]);
  });

  it('have three figures and stay inside a range without a step', () => {
    const rates = above(bearing({ kind: 'range', lowHz: 40e3, highHz: 52e3, stepHz: null }));
    assert.deepEqual(rates, [51.3e3, 51.4e3, 51.5e3, 51.6e3, 51.7e3, 51.8e3, 51.9e3, 52e3]);
  });

  it('have three figures where there are no choices', () => {
    assert.ok(above(bearing(null)).every((hz) => Number(hz.toPrecision(3)) === hz));
    assert.ok(above(bearing(null)).includes(64e3));
  });

  it('of a range of divisors are the round ones first and all of them after that', () => {
    const channel = bearing({ kind: 'clock', clock, divides: { from: 120, to: 480 } });
    assert.equal(above(channel)[0], 64e3);
    assert.equal(above(channel, 1)[0], 24.576e6 / 479);
  });

  it('of a list of divisors are exactly these', () => {
    const channel = bearing({ kind: 'clock', clock, divides: [400, 420, 512] });
    assert.deepEqual(above(channel), [24.576e6 / 420, 61.44e3]);
  });

  it('keep a band whole in its zone', () => {
    const echo = capture({ wanted: [wanted(70e6, 75e6)], rate: rate(40e6) });
    // Zone 2 (75 .. 140 MHz), zone 3 (50 .. 70 MHz): rates between the windows fold the band.
    const rates = above(echo);
    assert.ok(rates.includes(60e6) && rates.includes(100e6) && rates.includes(160e6));
    assert.ok(!rates.includes(72e6) && !rates.includes(145e6));
  });
});
