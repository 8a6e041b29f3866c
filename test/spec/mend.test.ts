/** A mended text knows the way back. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { blanked, mend, unmended } from '../../src/spec/mend';

describe('a mended text', () => {
  it('leads back across insertions, removals and replacements', () => {
    const mended = mend(unmended('a:1, b- 2, @c'), [
      { start: 2, end: 2, newText: ' ' },
      { start: 7, end: 8, newText: '' },
      { start: 11, end: 13, newText: '"@c"' },
    ]);
    assert.equal(mended.text, 'a: 1, b-2, "@c"');
    const back = (needle: string): number => mended.toSource(mended.text.indexOf(needle));
    assert.deepEqual(
      [back('a'), back('1'), back('b'), back('2'), back('"@'), mended.toSource(mended.text.length)],
      [0, 2, 5, 8, 11, 13],
    );
  });

  it('leads back through several rounds, for every character that was kept', () => {
    const cuts = fc.array(fc.nat(30), { maxLength: 8 });
    fc.assert(
      fc.property(cuts, cuts, (first, second) => {
        const source = 'abcdefghijklmnopqrstuvwxyzABCDE';
        const inserts = (at: readonly number[]) =>
          [...new Set(at)].sort((a, b) => a - b).map((start) => ({ start, end: start, newText: '  ' }));
        const mended = mend(mend(unmended(source), inserts(first)), inserts(second));
        for (const letter of source) assert.equal(source[mended.toSource(mended.text.indexOf(letter))], letter);
      }),
      { seed: 2 },
    );
  });
});

describe('blanking', () => {
  it('keeps every offset and every line end', () => {
    assert.equal(blanked('ab\r\ncd\nef', [{ start: 1, end: 5 }]), 'a \r\n d\nef');
  });
});
