import assert from 'node:assert/strict';
import fc from 'fast-check';
import { exportBytes, exportName } from '../../src/extension/panel/export-file';

describe('an export as a file', () => {
  it('keeps a plain name and gives it the right ending once', () => {
    assert.equal(exportName({ name: 'bearing-x sampling', format: 'svg' }), 'bearing-x sampling.svg');
    assert.equal(exportName({ name: 'bearing-x.svg', format: 'svg' }), 'bearing-x.svg');
  });

  it('has a name even where the page proposes none', () => {
    assert.equal(exportName({ name: '', format: 'csv' }), 'bandkeep.csv');
    assert.equal(exportName({ name: '.csv', format: 'csv' }), 'bandkeep.csv');
  });

  it('can never lead into another folder', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (name) => {
        const safe = exportName({ name, format: 'png' });
        assert.doesNotMatch(safe, /[/\\:]|^\./);
        assert.ok(safe.endsWith('.png'));
      }),
      { seed: 20261, numRuns: 500 },
    );
    assert.equal(exportName({ name: '../../etc/passwd', format: 'csv' }), 'etc-passwd.csv');
  });

  it('decodes pictures and encodes text', () => {
    assert.deepEqual([...exportBytes({ format: 'png', data: 'iVBORw==' })], [0x89, 0x50, 0x4e, 0x47]);
    assert.deepEqual([...exportBytes({ format: 'csv', data: '−1' })], [0xe2, 0x88, 0x92, 0x31]);
  });
});
