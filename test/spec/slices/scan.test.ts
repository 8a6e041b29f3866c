/** Slices give the tree of the whole text, and one broken slice leaves the others alone. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { scan } from '../../../src/spec/slices/scan';
import { sliceTree } from '../../../src/spec/slips/slice-tree';
import { vocabulary } from '../../../src/spec/vocabulary';
import { parseSlice } from '../../../src/spec/yaml-tree';
import type { Pair, TreeNode } from '../../../src/spec/tree';
import { legalSpec } from '../../support/spec-generator';

interface Plain {
  readonly key: string;
  readonly at: readonly number[];
  readonly value: unknown;
}

function plainPair(pair: Pair, base: number): Plain {
  return { key: pair.key, at: [base + pair.keyStart, base + pair.keyEnd], value: plain(pair.value, base) };
}

function plain(node: TreeNode | null, base: number): unknown {
  if (node === null) return null;
  const at = [base + node.start, base + node.end];
  if (node.form === 'scalar') return { text: node.text, quoted: node.quoted, at };
  if (node.form === 'list') return { at, items: node.items.map((item) => plain(item, base)) };
  return { at, pairs: node.pairs.map((pair) => plainPair(pair, base)) };
}

function pairsOf(node: TreeNode | null): readonly Pair[] {
  return node?.form === 'map' ? node.pairs : [];
}

/** The tree of the whole text, the channels on their own since their map has no span in slices. */
function whole(text: string): { sections: Plain[]; channels: Plain[] } {
  const { tree, error, oddities } = parseSlice(text);
  assert.equal(error, null, 'the generator makes legal texts only');
  assert.deepEqual(oddities, []);
  const pairs = pairsOf(tree);
  return {
    sections: pairs.filter(({ key }) => key !== 'channels').map((pair) => plainPair(pair, 0)),
    channels: pairs
      .filter(({ key }) => key === 'channels')
      .flatMap(({ value }) => pairsOf(value).map((pair) => plainPair(pair, 0))),
  };
}

function sliced(text: string): { sections: Plain[]; channels: Plain[] } {
  const { slices, faults } = scan(text, vocabulary);
  assert.deepEqual(faults, []);
  const found = { sections: [] as Plain[], channels: [] as Plain[] };
  for (const slice of slices) {
    const { tree, faults: own } = sliceTree(slice.lead, slice.text);
    assert.deepEqual(own, []);
    for (const pair of pairsOf(tree)) {
      if (pair.key === 'channels') found.channels.push(...pairsOf(pair.value).map((child) => plainPair(child, slice.start)));
      else found.sections.push(plainPair(pair, slice.start));
    }
  }
  return found;
}

describe('cutting into slices', () => {
  it('gives the tree of the whole for every legal spec', () => {
    let withChannels = 0;
    fc.assert(
      fc.property(legalSpec, (text) => {
        const expected = whole(text);
        withChannels += expected.channels.length > 1 ? 1 : 0;
        assert.deepEqual(sliced(text), expected);
      }),
      { seed: 3, numRuns: 1000 },
    );
    assert.ok(withChannels > 100, 'the generator makes files of several channels');
  });

  it('cuts before every key in column 0 and before every channel', () => {
    const text = 'bandkeep: 1\nclocks:\n  a: {}\nchannels: # all\n  x:\n    rate: 1\n  "y":\n    rate: 2\nfilters:\n- b\n';
    const { slices } = scan(text, vocabulary);
    assert.deepEqual(
      slices.map(({ kind, text: own }) => [kind, own.split('\n')[0]]),
      [
        ['top', 'bandkeep: 1'],
        ['top', 'clocks:'],
        ['top', 'channels: # all'],
        ['channel', '  x:'],
        ['channel', '  "y":'],
        ['top', 'filters:'],
      ],
    );
    assert.equal(slices.map((slice) => slice.text).join(''), text);
  });

  it('leaves channels in brackets in one slice', () => {
    const { slices, faults } = scan('channels: {\n  a: {},\n  b: {}\n}\n', vocabulary);
    assert.equal(slices.length, 1);
    assert.deepEqual(faults, []);
  });

  it('admits a document marker at the very beginning and one at the very end', () => {
    assert.deepEqual(scan('--- # begins\nbandkeep: 1\n...\n', vocabulary).faults, []);
  });

  it('makes one finding of each other document marker, and reads on', () => {
    const { faults, slices } = scan('bandkeep: 1\n---\ntitle: x\n', vocabulary);
    assert.deepEqual(
      faults.map(({ start, end }) => [start, end]),
      [[12, 15]],
    );
    assert.equal(slices.length, 2);
  });

  it('makes one finding of a whole merge conflict and reads its upper side', () => {
    const text = 'bandkeep: 1\n<<<<<<< mine\ntitle: a\n=======\ntitle: b\n>>>>>>> theirs\nclocks: {}\n';
    const { faults, slices } = scan(text, vocabulary);
    assert.equal(faults.length, 1);
    assert.deepEqual(
      slices.map((slice) => slice.text.trim()),
      ['bandkeep: 1', 'title: a', 'clocks: {}'],
    );
    const [upper, lower] = faults[0]?.cures ?? [];
    const applied = (mends: readonly { start: number; end: number; newText: string }[] = []): string =>
      mends.reduceRight((done, { start, end, newText }) => done.slice(0, start) + newText + done.slice(end), text);
    assert.equal(applied(upper?.mends), 'bandkeep: 1\ntitle: a\nclocks: {}\n');
    assert.equal(applied(lower?.mends), 'bandkeep: 1\ntitle: b\nclocks: {}\n');
  });

  it('keeps the commonest indentation for names where the first one is off', () => {
    const { slices, faults } = scan('channels:\n   a:\n    rate: 1\n  b:\n    rate: 1\n  c:\n    rate: 1\n', vocabulary);
    assert.equal(slices.filter(({ kind }) => kind === 'channel').length, 3);
    assert.equal(faults.length, 1);
    assert.equal(faults[0]?.cures[0]?.mends[0]?.newText, '  ');
  });

  it('keeps the channels that follow a line which has slipped to the left edge', () => {
    const { slices, faults } = scan('channels:\n  a:\n    bits: 1\nrate: 2\n    guard: 1\n  b:\n    bits: 2\n', vocabulary);
    assert.equal(slices.filter(({ kind }) => kind === 'channel').length, 2);
    assert.equal(faults.length, 1);
  });
});
