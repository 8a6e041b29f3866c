/** The marker reader reads what fixtures write. */
import assert from 'node:assert/strict';
import { markerLines, readMarkers } from './markers';

describe('markers', () => {
  it('read carets under the line above, with code and words', () => {
    const text = 'rate: 3\n#     ^ wrong-unit give a unit\nbits: 4\n';
    assert.deepEqual(readMarkers(text), [{ code: 'wrong-unit', start: 6, end: 7, line: 0, words: 'give a unit' }]);
  });

  it('start in the column of the hash where a < follows it', () => {
    const text = 'rate: 3\n#<^^ unknown-key\n';
    assert.deepEqual(
      readMarkers(text).map(({ start, end }) => text.slice(start, end)),
      ['rate'],
    );
  });

  it('are one column wide where nothing follows the <', () => {
    const [marker] = readMarkers('\tbits: 3\n#< syntax\n');
    assert.deepEqual([marker?.start, marker?.end], [0, 1]);
  });

  it('may be stacked under one line', () => {
    const text = 'a: b\n#  ^ syntax\n#<^^ missing-key\n';
    assert.deepEqual(markerLines(text), ['   1:0-4 missing-key', '   1:3-4 syntax']);
  });

  it('leave ordinary comments alone', () => {
    assert.deepEqual(readMarkers('# a ^ b\n  # bandkeep: accept x, y\n'), []);
  });
});
