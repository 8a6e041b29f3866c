/** Tests of reading ranges: both ends, open ends, a shared unit, centre and half-width. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { formatSpecRange } from '../../src/units/format-spec';
import type { Kind } from '../../src/units/quantity';
import { readRange } from '../../src/units/read-range';

function endsOf(text: string, ...kinds: readonly Kind[]): readonly [number, number] {
  const reading = readRange(text, kinds);
  assert.ok('range' in reading, `${text}: ${'fault' in reading ? reading.fault.message : ''}`);
  return [reading.range.low.value, reading.range.high.value];
}

function faultOf(text: string, ...kinds: readonly Kind[]) {
  const reading = readRange(text, kinds);
  assert.ok('fault' in reading, `${text} was read`);
  return reading.fault;
}

describe('reading a range', () => {
  const cases: readonly [string, Kind, number, number][] = [
    ['5 Hz .. 10 kHz', 'frequency', 5, 10000],
    ['5 Hz…10 kHz', 'frequency', 5, 10000],
    ['5..10 kHz', 'frequency', 5000, 10000],
    ['40 kHz ..', 'frequency', 40000, Infinity],
    ['.. 40 kHz', 'frequency', -Infinity, 40000],
    ['0 .. 5 kHz', 'frequency', 0, 5000],
    ['-40 .. 85 °C', 'temperature', -40, 85],
    ['70 MHz ± 5 MHz', 'frequency', 65e6, 75e6],
    ['70 ± 5 MHz', 'frequency', 65e6, 75e6],
    ['100 MHz +/- 10 %', 'frequency', 90e6, 110e6],
    ['± 10 V', 'voltage', -10, 10],
    ['0 V .. 5 V', 'voltage', 0, 5],
    ['1e3 .. 2e3 Hz', 'frequency', 1000, 2000],
    ['.5 .. .75 kHz', 'frequency', 500, 750],
  ];
  for (const [text, kind, low, high] of cases) {
    it(`reads ${text}`, () => {
      assert.deepEqual(endsOf(text, kind), [low, high]);
    });
  }

  const slips: readonly [string, string, string][] = [
    ['5 Hz - 10 kHz', 'not-a-quantity', '5 Hz .. 10 kHz'],
    ['5 Hz – 10 kHz', 'not-a-quantity', '5 Hz .. 10 kHz'],
    ['5 Hz ... 10 kHz', 'not-a-quantity', '5 Hz .. 10 kHz'],
    ['5 Hz .. 10 khz', 'wrong-unit', '5 Hz .. 10 kHz'],
    ['5 hz .. 10 kHz', 'wrong-unit', '5 Hz .. 10 kHz'],
    ['5 .. 10', 'not-a-quantity', '5 .. 10 Hz'],
    ['70 MHz ± 5 Mhz', 'wrong-unit', '70 MHz ± 5 MHz'],
  ];
  for (const [text, code, suggestion] of slips) {
    it(`names the slip in ${text} and offers ${suggestion}`, () => {
      const fault = faultOf(text, 'frequency');
      assert.equal(fault.code, code);
      assert.equal(fault.suggestions[0], suggestion);
    });
  }

  it('offers a ratio in decibels either way where a range is needed', () => {
    const { code, suggestions } = faultOf('0.5 dB', 'decibel');
    assert.deepEqual([code, suggestions], ['not-a-quantity', ['± 0.5 dB']]);
    assert.deepEqual(faultOf('-3 dB', 'decibel').suggestions, []);
  });

  for (const text of ['', '..', '5 kHz', '1 Hz .. 2 Hz .. 3 Hz', 'low .. high', '5 kHz .. 3 V', '± ']) {
    it(`refuses "${text}"`, () => {
      assert.notEqual(faultOf(text, 'frequency').message, '');
    });
  }

  it('reads what it prints as the same range, to the last bit', () => {
    const end = fc.double({ min: 1e-9, max: 1e15, noNaN: true });
    fc.assert(
      fc.property(fc.oneof(end, fc.constant(-Infinity)), end, (low, high) => {
        const text = formatSpecRange({ low: { value: low, unit: 'Hz' }, high: { value: high, unit: 'Hz' } });
        assert.deepEqual(endsOf(text, 'frequency'), [low, high], text);
      }),
      { seed: 3, numRuns: 1000 },
    );
  });
});
