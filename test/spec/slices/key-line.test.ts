/** A line that begins with a key is told from every other. */
import assert from 'node:assert/strict';
import { keyLineAt } from '../../../src/spec/slices/key-line';

function keyOf(line: string): unknown {
  const found = keyLineAt(line, 0, line.length);
  return found && [found.key, line.slice(0, found.keyEnd), found.rest];
}

describe('a line begins with a key', () => {
  for (const [line, expected] of [
    ['rate: 48 kHz', ['rate', 'rate', '48 kHz']],
    ['rate:', ['rate', 'rate', '']],
    ['rate:   # later', ['rate', 'rate', '']],
    ['pick-up guard :', ['pick-up guard', 'pick-up guard', '']],
    ['"a: b": c', ['a: b', '"a: b"', 'c']],
    ["'it''s' : d", ["it''s", "'it''s'", 'd']],
    ['a:b: c', ['a:b', 'a:b', 'c']],
    ['-x: 1', ['-x', '-x', '1']],
    ['<<: *x', ['<<', '<<', '*x']],
  ] as const) {
    it(JSON.stringify(line), () => {
      assert.deepEqual(keyOf(line), expected);
    });
  }
});

describe('a line does not begin with a key', () => {
  for (const line of [
    '- a: b',
    '-',
    '? a',
    ': b',
    'text',
    'text # a: b',
    'a:b',
    '{ a: b }',
    '} # a: b',
    '"a: b',
    "'a' b: c",
    '@a: b',
    '# a: b',
    '',
  ]) {
    it(JSON.stringify(line), () => {
      assert.equal(keyOf(line), null);
    });
  }
});
