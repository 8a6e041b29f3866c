/** Offsets and positions agree, whatever ends the lines. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { lineIndex } from '../../src/spec/line-index';

describe('the line index', () => {
  it('counts UTF-16 units', () => {
    const text = 'a: 😀b\nc: µ';
    assert.deepEqual(lineIndex(text).positionAt(text.indexOf('b')), { line: 0, character: 5 });
    assert.deepEqual(lineIndex(text).positionAt(text.length), { line: 1, character: 4 });
  });

  it('does not count a byte order mark', () => {
    const index = lineIndex('\uFEFFab\nc');
    assert.deepEqual(index.positionAt(2), { line: 0, character: 1 });
    assert.equal(index.offsetAt({ line: 0, character: 1 }), 2);
    assert.deepEqual(index.positionAt(0), { line: 0, character: 0 });
  });

  it('gives the end of the line for an offset between \\r and \\n', () => {
    assert.deepEqual(lineIndex('ab\r\nc').positionAt(3), { line: 0, character: 2 });
  });

  it('clips positions outside the text', () => {
    const index = lineIndex('ab\nc');
    assert.equal(index.offsetAt({ line: 9, character: 0 }), 4);
    assert.equal(index.offsetAt({ line: 0, character: 99 }), 2);
    assert.equal(index.offsetAt({ line: -1, character: 5 }), 0);
    assert.deepEqual(index.positionAt(99), { line: 1, character: 1 });
  });

  it('agrees with the language server library on any text', () => {
    const text = fc.string({ unit: fc.constantFrom('a', ' ', '\n', '\r\n', '\r', '😀', ':'), maxLength: 40 });
    fc.assert(
      fc.property(text, fc.nat(60), (value, offset) => {
        const document = TextDocument.create('', '', 0, value);
        const position = document.positionAt(offset);
        assert.deepEqual(lineIndex(value).positionAt(offset), position);
        assert.equal(lineIndex(value).offsetAt(position), document.offsetAt(position));
      }),
      { seed: 1 },
    );
  });
});
