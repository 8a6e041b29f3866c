/** Tests of reading one physical value: units, prefixes, alike spellings, exactness, part codes and slips. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { formatSpecQuantity } from '../../src/units/format-spec';
import type { Kind, Quantity } from '../../src/units/quantity';
import { readQuantity } from '../../src/units/read-quantity';
import { unitTable } from '../../src/units/unit-table';

function quantityOf(text: string, ...kinds: readonly Kind[]): Quantity {
  const reading = readQuantity(text, kinds);
  assert.ok('quantity' in reading, `${text}: ${'fault' in reading ? reading.fault.message : ''}`);
  return reading.quantity;
}

function faultOf(text: string, ...kinds: readonly Kind[]) {
  const reading = readQuantity(text, kinds);
  assert.ok('fault' in reading, `${text} was read`);
  return reading.fault;
}

describe('reading a quantity', () => {
  const exact: readonly [string, Kind, number, string][] = [
    ['24.576 MHz', 'frequency', 24576000, 'Hz'],
    ['0.1 kHz', 'frequency', 100, 'Hz'],
    ['51.2kHz', 'frequency', 51200, 'Hz'],
    ['1.1e3 kHz', 'frequency', 1.1e6, 'Hz'],
    ['48 kS/s', 'sample-rate', 48000, 'S/s'],
    ['2.4 mHz', 'frequency', 0.0024, 'Hz'],
    ['300 ns', 'time', 300e-9, 's'],
    ['200 fs', 'time', 200e-15, 's'],
    ['3 ps', 'time', 3e-12, 's'],
    ['10 fF', 'capacitance', 10e-15, 'F'],
    ['4 %', 'share', 0.04, '%'],
    ['0.3 %', 'ratio', 0.003, '%'],
    ['20 ppm', 'share', 20e-6, 'ppm'],
    ['-3 dBFS', 'level', -3, 'dBFS'],
    ['2.5 V', 'voltage', 2.5, 'V'],
    ['120 mV rms', 'level', 0.12, 'Vrms'],
    ['120 mVrms', 'level', 0.12, 'Vrms'],
    ['4 Vpp', 'voltage', 4, 'Vpp'],
    ['1.2 V pk', 'voltage', 1.2, 'Vpk'],
    ['-10 dBm', 'level', -10, 'dBm'],
    ['4 dBu', 'level', 4, 'dBu'],
    ['-60 dBc', 'relative-level', -60, 'dBc'],
    ['0.8 dB', 'decibel', 0.8, 'dB'],
    ['40 nV/√Hz', 'density', 40e-9, 'V/√Hz'],
    ['-150 dBFS/Hz', 'density', -150, 'dBFS/√Hz'],
    ['-174 dBm/Hz', 'density', -174, 'dBm/Hz'],
    ['0.5 LSB', 'code', 0.5, 'LSB'],
    ['25 °C', 'temperature', 25, '°C'],
    ['90 deg', 'angle', 90, 'deg'],
    ['10 µH', 'inductance', 10e-6, 'H'],
    ['1 MHz', 'frequency', 1e6, 'Hz'],
    ['1 mH', 'inductance', 1e-3, 'H'],
  ];
  for (const [text, kind, value, unit] of exact) {
    it(`reads ${text} as exactly ${value} ${unit}`, () => {
      const quantity = quantityOf(text, kind);
      assert.equal(quantity.value, value);
      assert.equal(quantity.unit, unit);
    });
  }

  const alike: readonly [Kind, readonly string[]][] = [
    ['level', ['-3 dBFS', '\u22123 dBFS', '-3dBFS', '-3\u00a0dBFS', '-3\u2009dBFS', ' -3 \u202fdBFS ']],
    ['time', ['5 µs', '5 μs', '5 us', '5us']],
    ['resistance', ['4.7 kΩ', '4.7 k\u2126', '4.7 kohm', '4.7kΩ', '4k7', '4K7', '4700 ohm', '4.7e3 Ω']],
    ['capacitance', ['2.2 nF', '2n2', '2200 pF', '2.2e-9 F']],
    [
      'frequency',
      ['310 kHz ± 10 %', '310 kHz +/- 10 %', '310 kHz +- 10 %', '310kHz±10%', '310 kHz ± 31 kHz', '310 kHz + 10 % - 10 %'],
    ],
    ['density', ['40 nV/√Hz', '40 nV/rtHz', '40 nV/sqrt(Hz)', '40nV / √Hz']],
    ['density', ['-150 dBFS/√Hz', '-150 dBFS/Hz']],
    ['level', ['1.5 V rms', '1.5 Vrms', '1500 mV rms']],
  ];
  for (const [kind, texts] of alike) {
    it(`reads every spelling of ${texts[0] ?? ''} alike`, () => {
      const first = quantityOf(texts[0] ?? '', kind);
      for (const text of texts) assert.deepEqual(quantityOf(text, kind), first, text);
    });
  }

  it('reads part codes only where a part is asked for', () => {
    assert.deepEqual(quantityOf('R47', 'resistance'), { value: 0.47, unit: 'Ω' });
    assert.deepEqual(quantityOf('10k', 'resistance'), { value: 10000, unit: 'Ω' });
    assert.deepEqual(quantityOf('4R7', 'resistance'), { value: 4.7, unit: 'Ω' });
    assert.deepEqual(quantityOf('100n', 'capacitance'), { value: 100e-9, unit: 'F' });
    assert.deepEqual(quantityOf('4u7', 'inductance'), { value: 4.7e-6, unit: 'H' });
    assert.deepEqual(quantityOf('4k7 ± 1 %', 'resistance').tolerance, { low: -0.01, high: 0.01 });
    assert.equal(faultOf('10k', 'frequency').code, 'wrong-unit');
    assert.equal(faultOf('R47', 'capacitance').code, 'not-a-quantity');
  });

  it('reads uneven tolerances and temperature coefficients', () => {
    assert.deepEqual(quantityOf('10 µF + 80 % - 20 %', 'capacitance').tolerance, { low: -0.2, high: 0.8 });
    assert.deepEqual(quantityOf('10 µF - 20 % + 80 %', 'capacitance').tolerance, { low: -0.2, high: 0.8 });
    assert.deepEqual(quantityOf('4.7 nF ± 5 % ± 30 ppm/°C', 'capacitance').tolerance, {
      low: -0.05,
      high: 0.05,
      perKelvin: 30e-6,
    });
    assert.deepEqual(quantityOf('4.7 nF ± 30 ppm/°C', 'capacitance').tolerance, { low: 0, high: 0, perKelvin: 30e-6 });
    assert.deepEqual(quantityOf('100 MHz ± 20 ppm', 'frequency').tolerance, { low: -20e-6, high: 20e-6 });
    assert.deepEqual(quantityOf('1 kHz ± 1e-3 %', 'frequency').tolerance, { low: -1e-5, high: 1e-5 });
  });

  it('lets a zero stand without a unit, and no other number', () => {
    assert.deepEqual(quantityOf('0', 'frequency'), { value: 0, unit: 'Hz' });
    assert.deepEqual(quantityOf('-0.0', 'time'), { value: 0, unit: 's' });
    const fault = faultOf('51200', 'sample-rate');
    assert.equal(fault.code, 'not-a-quantity');
    assert.equal(fault.suggestions[0], '51200 Hz');
  });

  const slips: readonly [string, Kind, string, string][] = [
    ['20 khz', 'frequency', 'wrong-unit', '20 kHz'],
    ['20 KHZ', 'frequency', 'wrong-unit', '20 kHz'],
    ['20 Khz', 'frequency', 'wrong-unit', '20 kHz'],
    ['3 dbfs', 'level', 'wrong-unit', '3 dBFS'],
    ['3 db', 'decibel', 'wrong-unit', '3 dB'],
    ['48 ksps', 'sample-rate', 'wrong-unit', '48 kS/s'],
    ['3 sec', 'time', 'wrong-unit', '3 s'],
    ['4 Vp-p', 'voltage', 'wrong-unit', '4 V pp'],
    ['-96 dB', 'full-scale-level', 'wrong-unit', '-96 dBFS'],
    ['-96 dB', 'relative-level', 'wrong-unit', '-96 dBc'],
    ['- 96 dBFS', 'level', 'not-a-quantity', '-96 dBFS'],
    ['24,576 MHz', 'frequency', 'not-a-quantity', '24.576 MHz'],
    ['24,576,000 Hz', 'frequency', 'not-a-quantity', '24576000 Hz'],
    ['24 576 Hz', 'frequency', 'not-a-quantity', '24576 Hz'],
    ['5. kHz', 'frequency', 'not-a-quantity', '5 kHz'],
    ['5 Hz - 10 kHz', 'frequency', 'not-a-quantity', '5 Hz .. 10 kHz'],
    ['310 khz ± 10 %', 'frequency', 'wrong-unit', '310 kHz ± 10 %'],
  ];
  for (const [text, kind, code, suggestion] of slips) {
    it(`names the slip in ${text} and offers ${suggestion}`, () => {
      const fault = faultOf(text, kind);
      assert.equal(fault.code, code);
      assert.equal(fault.suggestions[0], suggestion);
    });
  }

  it('offers both meanings of an ambiguous case slip', () => {
    assert.deepEqual(faultOf('24.576 mhz', 'frequency').suggestions, ['24.576 MHz', '24.576 mHz']);
  });

  for (const text of [
    '',
    'abc',
    '5..10 kHz',
    '1e',
    '5 kHz kHz',
    '5 kHz ±',
    '5 kHz + 3 %',
    '5 kHz ± 3 % ± 4 %',
    'fast',
    '5 fHz',
    '5 kdB',
    '5 kHz ± 3',
    'constructor',
    '5 __proto__',
  ]) {
    it(`refuses "${text}"`, () => {
      assert.notEqual(faultOf(text, 'frequency').message, '');
    });
  }

  it('takes a unit of another kind for what it is', () => {
    const fault = faultOf('20 ms', 'frequency');
    assert.equal(fault.code, 'wrong-unit');
    assert.match(fault.message, /`20 ms` is a time, where a frequency \(Hz\) is needed/);
  });

  it('never throws, whatever the text', () => {
    const kinds: readonly Kind[] = ['frequency', 'resistance', 'level'];
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom(...Array.from('0123456789.,+-±eEkMHzRdBFSV%/ \u2212…µ()')) }), (text) => {
        const reading = readQuantity(text, kinds);
        return 'quantity' in reading ? !Number.isNaN(reading.quantity.value) : reading.fault.message !== '';
      }),
      { seed: 7, numRuns: 5000 },
    );
  });

  it('reads what it prints as the same quantity, to the last bit', () => {
    const share = fc.double({ min: 1e-9, max: 0.9, noNaN: true });
    const tolerance = fc.oneof(
      share.map((both) => ({ low: -both, high: both })),
      fc.tuple(share, share).map(([low, high]) => ({ low: -low, high })),
      fc.tuple(share, share, share).map(([low, high, perKelvin]) => ({ low: -low, high, perKelvin })),
    );
    const magnitude = fc.double({ min: 1e-17, max: 1e15, noNaN: true });
    fc.assert(
      fc.property(
        fc.constantFrom(...unitTable),
        magnitude,
        fc.boolean(),
        fc.option(tolerance),
        (entry, size, negative, spread) => {
          const value = negative ? -size : size;
          const quantity: Quantity = { value, unit: entry.unit, ...(spread === null ? {} : { tolerance: spread }) };
          const text = formatSpecQuantity(quantity);
          assert.deepEqual(quantityOf(text, ...entry.kinds), quantity, text);
        },
      ),
      { seed: 11, numRuns: 3000 },
    );
  });
});
