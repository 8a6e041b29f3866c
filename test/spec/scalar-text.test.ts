/** Tests of writing texts as scalars. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { scalarText } from '../../src/spec/scalar-text';
import { treeOf } from './tree-of';

function readBack(written: string): string | null {
  const tree = treeOf(`[ ${written} ]`);
  const item = tree?.form === 'list' && tree.items.length === 1 ? (tree.items[0] ?? null) : null;
  return item?.form === 'scalar' ? item.text : null;
}

describe('writing a text as a scalar', () => {
  it('leaves plain names and quantities as they are', () => {
    for (const text of ['pick-up guard', '3', '-96 dBFS', '310 kHz ± 10 %', '.. 5 kHz', 'Gate#3'])
      assert.equal(scalarText(text), text);
  });

  it('quotes what YAML would read as something else', () => {
    for (const text of ['a, b', 'a: b', '# a', '- a', 'a #b', "'", '{a}', '', ' a', '%', '@a', '> a'])
      assert.notEqual(scalarText(text), text);
  });

  it('reads back as the same text, inside brackets too', () => {
    const characters = fc.constantFrom(...Array.from('ab1 -:,#[]{}&*!|>\'"%@`?.~±'));
    fc.assert(
      fc.property(fc.string({ unit: characters, maxLength: 8 }), (text) => readBack(scalarText(text)) === text),
      { seed: 5, numRuns: 2000 },
    );
  });
});
