/** Tests of the export as comma-separated text. */
import assert from 'node:assert/strict';
import { plotCsv } from '../../src/preview/csv';
import { samplePlot } from '../drawing/sample-plot';

const lines = plotCsv(samplePlot).split('\r\n');

describe('a plot as CSV', () => {
  it('begins with the table, its units in the header', () => {
    assert.deepEqual(lines.slice(0, 2), ['what,worst at (Hz),level (dBFS)', 'wanted,10000,-3']);
  });

  it('quotes what must be quoted and leaves an empty cell for nothing', () => {
    assert.equal(lines[2], `"'=hash, ""loud""",,-88.25`);
  });

  it('lists every point of every curve', () => {
    assert.equal(lines[4], 'curve,frequency (Hz),level (dBFS),from (Hz)');
    assert.ok(lines.includes('hash,100000,-80,'));
    assert.ok(lines.includes('landing,25600,-70,25600'));
  });
});
