/** Only lines with content count, whatever ends them. */
import assert from 'node:assert/strict';
import { contentLines, lineEndAt } from '../../../src/spec/slices/content-lines';

function lines(text: string): string[] {
  const { start, content } = contentLines(text);
  return content.map((from, index) => `${String(from - (start[index] ?? 0))} ${text.slice(from, lineEndAt(text, from))}`);
}

describe('content lines', () => {
  it('leave out what is blank and what is a comment', () => {
    assert.deepEqual(lines('a\n\n  # b\n  c # d\n   \n#\ne'), ['0 a', '2 c # d', '0 e']);
  });

  it('leave out carriage returns in front of line feeds, and only those', () => {
    assert.deepEqual(lines('a\r\n\r\n  b\r\n'), ['0 a', '2 b']);
    assert.deepEqual(lines('\rb\n'), ['0 \rb']);
  });

  it('count tabs and no-break spaces as indentation', () => {
    assert.deepEqual(lines('\ta\n\u00a0 b\n'), ['1 a', '2 b']);
  });

  it('begin behind a byte order mark', () => {
    assert.deepEqual(lines('\uFEFFa\nb'), ['0 a', '0 b']);
  });

  it('are none in an empty text', () => {
    assert.deepEqual(lines(''), []);
  });
});
