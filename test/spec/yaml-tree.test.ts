/** The parser's tree becomes ours: source text, spans that end with the last value, and a list of what the language does without. */
import assert from 'node:assert/strict';
import { parseSlice } from '../../src/spec/yaml-tree';
import { scalars, visits } from '../../src/spec/tree-walk';

describe('a parsed slice', () => {
  it('has scalars as they are written, never as YAML resolves them', () => {
    const text = 'a: [4.10, yes, 0x10, null, ~, 1e400, .inf, 014, 2026-12-01]\n';
    assert.deepEqual(
      scalars(parseSlice(text).tree).map(({ node }) => node.text),
      ['4.10', 'yes', '0x10', 'null', '~', '1e400', '.inf', '014', '2026-12-01'],
    );
  });

  it('undoes quotes, escapes and folding', () => {
    const text = "a: \"b\\tc\"\nd: 'it''s'\ne: >-\n  f\n  g\nh: |\n  i\n   j\n";
    assert.deepEqual(
      scalars(parseSlice(text).tree).map(({ node }) => node.text),
      ['b\tc', "it's", 'f g', 'i\n j\n'],
    );
  });

  it('ends a block with its last value and a bracket with itself', () => {
    const text = 'a:\n  b:\n    - c\n    - { d: e } # f\n\n  g: |\n    h\n\ni: 1\n';
    assert.deepEqual(
      visits(parseSlice(text).tree).map(({ node }) => text.slice(node.start, node.end)),
      [
        text.trimEnd(),
        'b:\n    - c\n    - { d: e } # f\n\n  g: |\n    h',
        '- c\n    - { d: e }',
        'c',
        '{ d: e }',
        'e',
        '|\n    h',
        '1',
      ],
    );
  });

  it('has null where nothing is written, and a text where quotes are empty', () => {
    const { tree } = parseSlice("a:\nb: ''\nc: [ ]\n");
    assert.deepEqual(tree?.form === 'map' && tree.pairs.map(({ key, value }) => [key, value?.form ?? null]), [
      ['a', null],
      ['b', 'scalar'],
      ['c', 'list'],
    ]);
  });

  it('keeps both of two equal keys, and keys that every object has', () => {
    const { tree } = parseSlice('a: 1\na: 2\n__proto__: 3\n');
    assert.deepEqual(tree?.form === 'map' && tree.pairs.map(({ key }) => key), ['a', 'a', '__proto__']);
  });

  it('lists what the language does without, at its place', () => {
    const text = 'a: &x 1\nb: *x\nc: !!str 2\n? d\n: e\n{f: g}: h\n';
    assert.deepEqual(
      parseSlice(text).oddities.map(({ kind, start, end }) => [kind, text.slice(start, end)]),
      [
        ['anchor', '&x'],
        ['alias', '*x'],
        ['tag', '!!str'],
        ['explicit-key', '?'],
        ['odd-key', '{'],
      ],
    );
  });

  it('is refused where it nests too deeply, without a throw', () => {
    for (const text of ['['.repeat(10_000), `a: ${'['.repeat(100)}${']'.repeat(100)}`]) {
      assert.ok(parseSlice(text).oddities.some(({ kind }) => kind === 'too-deep'));
    }
  });
});
