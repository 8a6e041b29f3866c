/** Tests of CSV tables: headers, comments, line ends, and faults with their line. */
import assert from 'node:assert/strict';
import { readResponseCsv } from '../../../src/spec/tables/response-csv';
import { readSpectrumCsv } from '../../../src/spec/tables/spectrum-csv';

function responseOf(text: string) {
  const reading = readResponseCsv(text);
  assert.ok('table' in reading, 'fault' in reading ? reading.fault : '');
  assert.ok(reading.table.kind === 'response');
  return reading.table.table;
}

describe('a response in CSV', () => {
  const headers = [
    'frequency (kHz),gain (dB)',
    'Frequency [kHz], Gain [dB]',
    'freq/kHz;mag/dB',
    'f_kHz\tgain_dB',
    '"frequency, kHz","gain, dB"'.replaceAll(', ', ' in '),
    '\uFEFF# probe 3\r\n\r\nfrequency (kHz),gain (dB)',
  ];
  for (const header of headers) {
    it(`reads columns and units from ${JSON.stringify(header)}`, () => {
      const delimiter = header.includes(';') ? ';' : header.includes('\t') ? '\t' : ',';
      const text = `${header}\r\n1${delimiter}0\r\n# between\r\n\r\n2.5${delimiter}-3e0\r\n`;
      assert.deepEqual(responseOf(text), { frequenciesHz: [1000, 2500], gainsDb: [0, -3], phasesRad: null });
    });
  }

  it('takes columns in any order and passes over others', () => {
    const text = 'note,phase (deg),gain (V/V),frequency (Hz)\na,0,1,10\nb,-90,0.1,20\n';
    assert.deepEqual(responseOf(text), { frequenciesHz: [10, 20], gainsDb: [0, -20], phasesRad: [0, -Math.PI / 2] });
  });

  it('unwraps the phase', () => {
    const { phasesRad } = responseOf('frequency (Hz),gain (dB),phase (deg)\n1,0,-170\n2,0,170\n3,0,150\n');
    const degrees = phasesRad?.map((phase) => Math.round((phase * 180) / Math.PI));
    assert.deepEqual(degrees, [-170, -190, -210]);
  });

  const faults: readonly [string, string, RegExp, number | null][] = [
    ['an empty table', '# nothing\n', /empty/, null],
    ['a header without units', 'frequency,gain\n1,2\n', /names no unit.*`frequency \(Hz\)`/, 1],
    ['a unit that is none', 'frequency (Hz),gain (dBFS)\n1,2\n', /`dBFS` is no unit for a gain/, 1],
    ['a header without a gain', 'frequency (Hz),volts (V)\n1,2\n', /no column of gain/, null],
    ['a header without rows', 'frequency (Hz),gain (dB)\n', /no rows/, null],
    ['one row', 'frequency (Hz),gain (dB)\n1,2\n', /one row/, null],
    ['a decimal comma', 'frequency (Hz);gain (dB)\n1;0\n2;-3,5\n', /`-3,5` has a decimal comma/, 3],
    ['decimal commas between commas', 'frequency (Hz),gain (dB)\n1,0\n2,-3,5\n', /decimals take a point/, 3],
    ['a value that is missing', 'frequency (Hz),gain (dB)\n1,\n', /missing/, 2],
    ['a value that is no number', '# a\n\nfrequency (Hz),gain (dB)\n1,low\n', /`low` is not a number/, 4],
    ['frequencies that fall', 'frequency (Hz),gain (dB)\n2,0\n# then\n1,0\n', /must rise/, 4],
    ['a frequency below zero', 'frequency (Hz),gain (dB)\n-2,0\n1,0\n', /no frequency/, 2],
    ['a gain of nothing', 'frequency (Hz),gain (V/V)\n1,1\n2,0\n', /no ratio/, 3],
  ];
  for (const [title, text, message, line] of faults) {
    it(`finds ${title}`, () => {
      const reading = readResponseCsv(text);
      assert.ok('fault' in reading);
      assert.match(reading.fault, message);
      assert.equal(reading.line, line);
    });
  }
});

describe('a spectrum in CSV', () => {
  it('keeps the unit of its levels', () => {
    assert.deepEqual(readSpectrumCsv('frequency (MHz),level (dBm)\n1,-30\n2,-60\n'), {
      table: { kind: 'spectrum', unit: 'dBm', frequenciesHz: [1e6, 2e6], levels: [-30, -60] },
    });
  });

  it('refuses 0 Hz, which has no place over log frequency, and levels of nothing', () => {
    for (const text of ['frequency (Hz),level (V)\n0,1\n1,1\n', 'frequency (Hz),level (V)\n1,0\n2,1\n']) {
      const reading = readSpectrumCsv(text);
      assert.equal('fault' in reading ? reading.line : null, 2);
    }
  });
});
