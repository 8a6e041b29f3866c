/** Every slip that YAML makes something else of is named at its place, cured, and read past. */
import assert from 'node:assert/strict';
import { sliceTree } from '../../../src/spec/slips/slice-tree';
import type { TreeNode } from '../../../src/spec/tree';
import { slipCases } from './slip-cases';

/** A tree as plain values. */
function plain(node: TreeNode | null): unknown {
  if (node === null) return null;
  if (node.form === 'scalar') return node.text;
  if (node.form === 'list') return node.items.map(plain);
  return Object.fromEntries(node.pairs.map((pair) => [pair.key, plain(pair.value)]));
}

describe('a slip', () => {
  for (const [title, { text, at, says, cured, reads }] of Object.entries(slipCases)) {
    it(`is named and read past: ${title}`, () => {
      const { faults, tree } = sliceTree('', text);
      assert.deepEqual(
        faults.map(({ start, end }) => text.slice(start, end)),
        [at],
      );
      const [fault] = faults;
      assert.ok(fault);
      assert.equal(fault.code, 'syntax');
      assert.match(fault.message, says);
      const mends = fault.cures[0]?.mends.toSorted((a, b) => b.start - a.start);
      const result = mends?.reduce((done, { start, end, newText }) => done.slice(0, start) + newText + done.slice(end), text);
      assert.equal(result ?? null, cured);
      assert.deepEqual(plain(tree), reads);
      if (result !== undefined) assert.deepEqual(sliceTree('', result).faults, [], 'the cure leaves no fault');
    });
  }

  it('is found beside others of its slice', () => {
    const text = 'a:\n  level: - 96 dBFS\n  name: @x\n  -tone\n  rate:3\n  b: { c,5: 1 }\n';
    const { faults } = sliceTree('', text);
    assert.ok(faults.length >= 3, String(faults.length));
  });

  it('is no more than one where a quote swallows what follows', () => {
    const text = "a:\n  t: \"foo\n  b: { x: 1 }\n  c: [ 2 ]\n  d: 'e'\n";
    assert.equal(sliceTree('', text).faults.length, 1);
  });
});

describe('text that is cut short', () => {
  it('is a warning that offers quotes', () => {
    const text = 'title: Gate #3\n';
    const [fault, ...more] = sliceTree('', text).faults;
    assert.deepEqual(more, []);
    assert.equal(fault?.code, 'text-cut-short');
    assert.equal(text.slice(fault.start, fault.end), 'Gate #3');
    assert.deepEqual(fault.cures[0]?.mends, [{ start: 7, end: 14, newText: '"Gate #3"' }]);
  });

  for (const text of ['title: Gate # 3\n', 'title: "Gate" #3\n', 'rate: 5 kHz #x\n', 'level: -3 dB #x\n', 'title: Gate#3\n']) {
    it(`is not seen in ${JSON.stringify(text)}`, () => {
      assert.deepEqual(sliceTree('', text).faults, []);
    });
  }
});

describe('what looks like a slip', () => {
  for (const [title, text] of Object.entries({
    'inside quotes': 'title: "a: b, -c @ *d"\nname: \'tone:3, - 96\'\n',
    'inside a text of several lines': 'notes: |\n  -x\n  tone:3 kHz\n  \tb\n  \u00a0c\n  <<: *d\ntitle: a\n  \u00a0b\n',
    'inside a comment': '# -x tone:3 "\ntitle: a # @ * & {\n',
    'in a text without spaces': 'title: 12:30\nname: a,b\nref: x#y\n',
    'in lists of numbers': 'a: [120,240, 480]\nb: [ 1, 2 ]\n',
    'a dash in front of a word': 'a: -x\nb: [-3 dB]\nc:\n  - -3 dB\n',
  })) {
    it(`is none ${title}`, () => {
      assert.deepEqual(sliceTree('', text).faults, []);
    });
  }
});
