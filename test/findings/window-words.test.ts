/** Windows of rates in words; the bounds are hand-worked from 2·high/n and 2·low/(n − 1). */
import assert from 'node:assert/strict';
import { windowWords, zoneWords } from '../../src/findings';

describe('a window of rates in words', () => {
  it('names its zone and which way round the band comes out', () => {
    assert.equal(windowWords({ low: 37.5e6, high: 130e6 / 3, zones: [4] }), '37.5 MHz to 43.33 MHz (zone 4, inverted)');
    assert.equal(windowWords({ low: 1e6, high: 1.05e6, zones: [9] }), '1 MHz to 1.05 MHz (zone 9, not inverted)');
  });

  it('is rounded inwards, so that what is printed still keeps the band whole', () => {
    // 2·76/3 = 50.6667 and 64.
    assert.equal(windowWords({ low: 152e6 / 3, high: 64e6, zones: [3] }), '50.7 MHz to 64 MHz (zone 3, not inverted)');
    // 202/47 = 4.29787 and 198/46 = 4.30435.
    assert.equal(
      windowWords({ low: 202e6 / 47, high: 198e6 / 46, zones: [47] }),
      '4.29788 MHz to 4.30434 MHz (zone 47, not inverted)',
    );
  });

  it('may have no upper end, or be a single rate', () => {
    assert.equal(windowWords({ low: 20000.5, high: Infinity, zones: [1] }), '20.01 kHz or more (zone 1, not inverted)');
    assert.equal(windowWords({ low: 10e6, high: 10e6, zones: [5] }), '10 MHz alone (zone 5, not inverted)');
  });

  it('counts the zones of several bands', () => {
    assert.equal(zoneWords([1, 2, 2]), 'zones 1, 2 and 2');
    assert.equal(zoneWords([2, 2]), 'zone 2, inverted');
    assert.equal(zoneWords([]), 'no zone');
  });
});
