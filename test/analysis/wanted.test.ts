/** Zones, folds and windows of wanted bands; expected numbers are hand-worked from 2·high/n ≤ rate ≤ 2·low/(n − 1). */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import { appearance } from '../../src/analysis/wanted';
import type { Channel } from '../../src/spec/channel';
import { capture, generate, plusMinus, rate, wanted } from '../support/channel-builder';

function zone3(hz: number, changes: Partial<Channel> = {}): Channel {
  return capture({ wanted: [wanted(65e6, 75e6)], rate: rate(hz), ...changes });
}

describe('wanted bands', () => {
  it('come out upright in odd zones and inverted in even ones', () => {
    const upright = analyse(zone3(52e6));
    assert.deepEqual([upright.zone, upright.inverted], [3, false]);
    assert.deepEqual([upright.wanted[0]?.appearsLow, upright.wanted[0]?.appearsHigh], [13e6, 23e6]);
    const inverted = analyse(zone3(40e6));
    assert.deepEqual([inverted.zone, inverted.inverted], [4, true]);
    assert.deepEqual([inverted.wanted[0]?.appearsLow, inverted.wanted[0]?.appearsHigh], [5e6, 15e6]);
  });

  it('are protected where they appear, or where the channel says', () => {
    assert.deepEqual(analyse(zone3(52e6)).protected, [{ low: 13e6, high: 23e6 }]);
    assert.deepEqual(analyse(zone3(52e6, { protect: [{ lowHz: 1e6, highHz: 2e6 }] })).protected, [{ low: 1e6, high: 2e6 }]);
  });

  it('fold where a multiple of half the rate lies inside', () => {
    const { faults } = analyse(zone3(45e6));
    assert.deepEqual(faults, [{ kind: 'wanted-folds', index: 0, onto: null, edgeHz: 67.5e6 }]);
  });

  it('fold where only the guard crosses', () => {
    assert.deepEqual(analyse(zone3(51e6)).faults, []);
    const { faults } = analyse(zone3(51e6, { guardHz: 2e6 }));
    assert.deepEqual(faults, [{ kind: 'wanted-folds', index: 0, onto: null, edgeHz: 76.5e6 }]);
  });

  it('fold where only one end of the clock crosses', () => {
    const loose = zone3(50.1e6, { rate: rate(50.1e6, { tolerance: plusMinus(0.003) }) });
    assert.deepEqual(
      analyse(loose).faults.map((fault) => fault.kind),
      ['wanted-folds'],
    );
    assert.deepEqual(analyse(zone3(50.1e6)).faults, []);
  });

  it('touch a multiple of half the rate from either side, but not 0 Hz', () => {
    assert.deepEqual(analyse(zone3(50e6)).faults, [{ kind: 'wanted-touches', index: 0, onto: null, edgeHz: 75e6 }]);
    assert.deepEqual(analyse(zone3(65e6)).faults, [{ kind: 'wanted-touches', index: 0, onto: null, edgeHz: 65e6 }]);
    assert.deepEqual(analyse(capture({ wanted: [wanted(0, 10e3)], rate: rate(48e3) })).faults, []);
  });

  it('do not touch because of rounding alone', () => {
    // 3 · 0.1 is not 0.3 in double precision.
    const faults = analyse(capture({ wanted: [wanted(0.3, 0.35)], rate: rate(0.2) })).faults;
    assert.deepEqual(
      faults.map((fault) => fault.kind),
      ['wanted-touches'],
    );
  });

  it('must not land on each other', () => {
    const both = capture({ wanted: [wanted(1e3, 3e3), wanted(18e3, 19.5e3)], rate: rate(20e3) });
    assert.deepEqual(analyse(both).faults, [{ kind: 'wanted-folds', index: 1, onto: 0, edgeHz: null }]);
    const apart = capture({ wanted: [wanted(1e3, 3e3), wanted(14e3, 16e3)], rate: rate(20e3) });
    assert.deepEqual(analyse(apart).faults, []);
  });

  it('land on each other where their guards do', () => {
    const close = capture({ wanted: [wanted(1e3, 3e3), wanted(16e3, 16.5e3)], rate: rate(20e3), guardHz: 300 });
    assert.deepEqual(
      analyse(close).faults.map((fault) => fault.onto),
      [0],
    );
  });

  it('have a window of rates that keeps them whole where they are', () => {
    assert.deepEqual(analyse(zone3(52e6)).rateWindow, { low: 50e6, high: 65e6 });
    assert.deepEqual(analyse(zone3(52e6, { guardHz: 1e6 })).rateWindow, { low: (2 * 76e6) / 3, high: 64e6 });
    assert.deepEqual(analyse(capture({ wanted: [wanted(5, 10e3)], rate: rate(51200) })).rateWindow, {
      low: 20e3,
      high: Infinity,
    });
  });

  it('have no window in a zone that no rate keeps them whole in', () => {
    assert.equal(analyse(capture({ wanted: [wanted(10, 30)], rate: rate(18) })).rateWindow, null);
  });

  it('stand where they leave in generate, and must not cross a multiple of half the rate there either', () => {
    const second = generate({ wanted: [wanted(60e3, 90e3)], rate: rate(100e3) });
    assert.deepEqual([analyse(second).wanted[0]?.appearsLow, analyse(second).zone], [60e3, 2]);
    assert.deepEqual(
      analyse(generate({ wanted: [wanted(40e3, 60e3)], rate: rate(100e3) })).faults.map((fault) => fault.edgeHz),
      [50e3],
    );
  });

  it('reach the edge they fold at', () => {
    assert.deepEqual(appearance({ lowHz: 4, highHz: 7 }, 10), { low: 3, high: 5 });
    assert.deepEqual(appearance({ lowHz: 8, highHz: 13 }, 10), { low: 0, high: 3 });
    assert.deepEqual(appearance({ lowHz: 4, highHz: 11 }, 10), { low: 0, high: 5 });
  });

  it('share a zone, or have none in common', () => {
    const mixed = capture({ wanted: [wanted(1e3, 3e3), wanted(14e3, 16e3)], rate: rate(20e3) });
    assert.deepEqual([analyse(mixed).zone, analyse(mixed).inverted], [null, null]);
  });
});
