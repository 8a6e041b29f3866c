/** Every slip that YAML makes something else of is named at its place, cured, and read past. */
import assert from 'node:assert/strict';
import { sliceTree } from '../../../src/spec/slips/slice-tree';
import type { TreeNode } from '../../../src/spec/tree';

/** A tree as plain values. */
function plain(node: TreeNode | null): unknown {
  if (node === null) return null;
  if (node.form === 'scalar') return node.text;
  if (node.form === 'list') return node.items.map(plain);
  return Object.fromEntries(node.pairs.map((pair) => [pair.key, plain(pair.value)]));
}

interface Case {
  readonly text: string;
  /** What the fault covers. */
  readonly at: string;
  /** Words of its message. */
  readonly says: RegExp;
  /** The text after the first cure; null where none is offered. */
  readonly cured: string | null;
  /** What is read in spite of the slip. */
  readonly reads: unknown;
}

const cases: Record<string, Case> = {
  'no space behind a colon': {
    text: 'a:\n  rate:51 kHz\n  b: 2\n',
    at: 'rate:51 kHz',
    says: /`rate: 51 kHz`/,
    cured: 'a:\n  rate: 51 kHz\n  b: 2\n',
    reads: { a: { rate: '51 kHz', b: '2' } },
  },
  'no space behind a colon in the last line': {
    text: 'a:\n  b: 2\n  rate:51 kHz\n',
    at: 'rate:51 kHz',
    says: /space behind/,
    cured: 'a:\n  b: 2\n  rate: 51 kHz\n',
    reads: { a: { b: '2', rate: '51 kHz' } },
  },
  'no space behind a colon in brackets': {
    text: 'a: { tone:310 kHz, level: 3 }\n',
    at: 'tone:310 kHz',
    says: /`tone: 310 kHz`/,
    cured: 'a: { tone: 310 kHz, level: 3 }\n',
    reads: { a: { tone: '310 kHz', level: '3' } },
  },
  'no space behind a colon in a list': {
    text: 'a:\n  - tone:310 kHz\n  - b\n',
    at: 'tone:310 kHz',
    says: /space behind/,
    cured: 'a:\n  - tone: 310 kHz\n  - b\n',
    reads: { a: [{ tone: '310 kHz' }, 'b'] },
  },
  'no space behind the colon of a whole slice': {
    text: 'title:Foo\n',
    at: 'title:Foo',
    says: /space behind/,
    cured: 'title: Foo\n',
    reads: { title: 'Foo' },
  },
  'a no-break space behind a colon': {
    text: 'a:\n  rate:\u00a051 kHz\n',
    at: 'rate:\u00a051 kHz',
    says: /space behind/,
    cured: 'a:\n  rate: 51 kHz\n',
    reads: { a: { rate: '51 kHz' } },
  },
  'no space behind a dash': {
    text: 'a:\n  - x\n  -y\n',
    at: '-y',
    says: /dash/,
    cured: 'a:\n  - x\n  - y\n',
    reads: { a: ['x', 'y'] },
  },
  'no space behind a dash before a bracket': {
    text: 'a:\n  - x: 1\n  -{ y: 2 }\n  - z: 1\n',
    at: '-{ y: 2 }',
    says: /dash/,
    cured: 'a:\n  - x: 1\n  - { y: 2 }\n  - z: 1\n',
    reads: { a: [{ x: '1' }, { y: '2' }, { z: '1' }] },
  },
  'no space behind a dash before a key': {
    text: 'a:\n  -bandwidth: 3 kHz\n',
    at: '-bandwidth',
    says: /dash/,
    cured: 'a:\n  - bandwidth: 3 kHz\n',
    reads: { a: [{ bandwidth: '3 kHz' }] },
  },
  'a space behind a minus': {
    text: 'a:\n  level: - 96 dBFS\n  b: 1\n',
    at: '- 96 dBFS',
    says: /`-96 dBFS`/,
    cured: 'a:\n  level: -96 dBFS\n  b: 1\n',
    reads: { a: { level: '-96 dBFS', b: '1' } },
  },
  'a space behind a minus in brackets': {
    text: 'a: { level: - 96 dBFS, b: 1 }\n',
    at: '- 96 dBFS',
    says: /minus/,
    cured: 'a: { level: -96 dBFS, b: 1 }\n',
    reads: { a: { level: '-96 dBFS', b: '1' } },
  },
  'a space behind a minus in a list': {
    text: 'a:\n  - - 96 dB\n  - 3\n',
    at: '- 96 dB',
    says: /minus/,
    cured: 'a:\n  - -96 dB\n  - 3\n',
    reads: { a: ['-96 dB', '3'] },
  },
  'a decimal comma in brackets': {
    text: 'a: { level: -3,5 dBFS, b: 1 }\n',
    at: '-3,5 dBFS',
    says: /`-3\.5 dBFS`/,
    cured: 'a: { level: -3.5 dBFS, b: 1 }\n',
    reads: { a: { level: '-3.5 dBFS', b: '1' } },
  },
  'a decimal comma in a list': {
    text: 'a: [51,2 kHz, 48 kHz]\n',
    at: '51,2 kHz',
    says: /`51\.2 kHz`/,
    cured: 'a: [51.2 kHz, 48 kHz]\n',
    reads: { a: ['51.2 kHz', '48 kHz'] },
  },
  'a comma in a text in brackets': {
    text: 'a: { name: pump, big, tone: 3 }\n',
    at: 'pump, big',
    says: /comma/,
    cured: 'a: { name: "pump, big", tone: 3 }\n',
    reads: { a: { name: 'pump, big', tone: '3' } },
  },
  'a key without a value in brackets': {
    text: 'a: { name: pump, level, tone: 3 }\n',
    at: 'level',
    says: /no value/,
    cured: null,
    reads: { a: { name: 'pump', level: null, tone: '3' } },
  },
  'a colon in a text': {
    text: 'title: Gate 3: foo # x\nb: 1\n',
    at: 'Gate 3: foo',
    says: /quotes/,
    cured: 'title: "Gate 3: foo" # x\nb: 1\n',
    reads: { title: 'Gate 3: foo', b: '1' },
  },
  'a colon in a text in brackets': {
    text: 'a: { n: g: 3, b: 1}\n',
    at: 'g: 3',
    says: /quotes/,
    cured: 'a: { n: "g: 3", b: 1}\n',
    reads: { a: { n: 'g: 3', b: '1' } },
  },
  'a missing comma': {
    text: 'a: {x: 1 level: 2}\n',
    at: 'level',
    says: /comma is missing/,
    cured: 'a: {x: 1, level: 2}\n',
    reads: { a: { x: '1', level: '2' } },
  },
  'a missing colon': {
    text: 'a:\n  b: 1\n  rate 51 kHz\n  c: 2\n',
    at: 'rate 51 kHz',
    says: /colon behind `rate`/,
    cured: 'a:\n  b: 1\n  rate: 51 kHz\n  c: 2\n',
    reads: { a: { b: '1', rate: '51 kHz', c: '2' } },
  },
  'a missing colon above a block': {
    text: 'a:\n  limits\n    x: 1\n  c: 2\n',
    at: 'limits',
    says: /colon/,
    cured: 'a:\n  limits:\n    x: 1\n  c: 2\n',
    reads: { a: { limits: { x: '1' }, c: '2' } },
  },
  'a half-typed key': {
    text: 'a:\n  b: 1\n  rat\n  c: 2\n',
    at: 'rat',
    says: /neither `key: value`/,
    cured: null,
    reads: { a: { b: '1', c: '2' } },
  },
  'an unclosed quote': {
    text: 'a:\n  t: "foo\n  b: 3\n  c: 4\n',
    at: '"foo',
    says: /never closed/,
    cured: 'a:\n  t: "foo"\n  b: 3\n  c: 4\n',
    reads: { a: { t: 'foo', b: '3', c: '4' } },
  },
  'an unclosed quote that a later one seems to close': {
    text: 'a:\n  t: "foo\n  b: "3"\n  c: 4\n',
    at: '"foo',
    says: /never closed/,
    cured: 'a:\n  t: "foo"\n  b: "3"\n  c: 4\n',
    reads: { a: { t: 'foo', b: '3', c: '4' } },
  },
  'an unclosed quote in brackets': {
    text: "a:\n  t: {x: 'foo, y: 3}\n  b: 3\n",
    at: "'foo, y: 3}",
    says: /single quote/,
    cured: "a:\n  t: {x: 'foo', y: 3}\n  b: 3\n",
    reads: { a: { t: { x: 'foo', y: '3' }, b: '3' } },
  },
  'an unclosed bracket': {
    text: 'a:\n  t: [1, 2\n  b: 3\n',
    at: '[',
    says: /never closed/,
    cured: 'a:\n  t: [1, 2]\n  b: 3\n',
    reads: { a: { t: ['1', '2'], b: '3' } },
  },
  'an unclosed brace in front of a comment': {
    text: 'a:\n  t: { x: 1, y: 2 # foo\n  b: 3\n',
    at: '{',
    says: /never closed/,
    cured: 'a:\n  t: { x: 1, y: 2 } # foo\n  b: 3\n',
    reads: { a: { t: { x: '1', y: '2' }, b: '3' } },
  },
  'a bracket that closes nothing': {
    text: 'a: {x: 1}}\nb: 1\n',
    at: '}',
    says: /closes nothing/,
    cured: null,
    reads: { a: { x: '1' }, b: '1' },
  },
  'tabs in the indentation': {
    text: 'a:\n\tc: 2\n\td:\n\t\t- x\n\te: 1\n',
    at: '\t',
    says: /tab/,
    cured: 'a:\n  c: 2\n  d:\n    - x\n  e: 1\n',
    reads: { a: { c: '2', d: ['x'], e: '1' } },
  },
  'no-break spaces in the indentation': {
    text: 'a:\n\u00a0\u00a0b: 1\n  c: 2\n',
    at: '\u00a0\u00a0',
    says: /no-break space/,
    cured: 'a:\n  b: 1\n  c: 2\n',
    reads: { a: { b: '1', c: '2' } },
  },
  'too much indentation': {
    text: 'a:\n  b: 1\n   c: 2\n  d: 3\n',
    at: 'c: 2',
    says: /by 3, its neighbours by 2/,
    cured: 'a:\n  b: 1\n  c: 2\n  d: 3\n',
    reads: { a: { b: '1', c: '2', d: '3' } },
  },
  'too little indentation': {
    text: 'a:\n  b: 1\n c: 2\n  d: 3\n',
    at: 'c: 2',
    says: /by 1, its neighbours by 2/,
    cured: 'a:\n  b: 1\n  c: 2\n  d: 3\n',
    reads: { a: { b: '1', c: '2', d: '3' } },
  },
  'indentation between two levels': {
    text: 'a:\n  b:\n    c: 1\n   e: 1\n  f: 2\n',
    at: 'e: 1',
    says: /by 3, its neighbours by 4/,
    cured: 'a:\n  b:\n    c: 1\n    e: 1\n  f: 2\n',
    reads: { a: { b: { c: '1', e: '1' }, f: '2' } },
  },
  'text that begins with @': {
    text: 'a: {n: @foo, b: 1}\n',
    at: '@foo',
    says: /`@`.*quotes/,
    cured: 'a: {n: "@foo", b: 1}\n',
    reads: { a: { n: '@foo', b: '1' } },
  },
  'text that begins with %': {
    text: 'a: %foo\nb: 1\n',
    at: '%foo',
    says: /`%`/,
    cured: 'a: "%foo"\nb: 1\n',
    reads: { a: '%foo', b: '1' },
  },
  'text that begins with >': {
    text: 'a: > 3 dB # x\nb: 1\n',
    at: '> 3 dB',
    says: /`>`/,
    cured: 'a: "> 3 dB" # x\nb: 1\n',
    reads: { a: '> 3 dB', b: '1' },
  },
  'text that begins with |': {
    text: 'a: | foo\nb: 1\n',
    at: '| foo',
    says: /`\|`/,
    cured: 'a: "| foo"\nb: 1\n',
    reads: { a: '| foo', b: '1' },
  },
  'text that begins with & and a space': {
    text: 'a: & foo\n',
    at: '& foo',
    says: /`&`/,
    cured: 'a: "& foo"\n',
    reads: { a: '& foo' },
  },
  'text that begins with * and a space': {
    text: 'a: * foo\nb: 1\n',
    at: '* foo',
    says: /`\*`/,
    cured: 'a: "* foo"\nb: 1\n',
    reads: { a: '* foo', b: '1' },
  },
  'text that begins with !': {
    text: 'a: ! foo\nb: 1\n',
    at: '! foo',
    says: /`!`/,
    cured: 'a: "! foo"\nb: 1\n',
    reads: { a: 'foo', b: '1' },
  },
  'an alias': {
    text: 'a: *foo\nb: 1\n',
    at: '*foo',
    says: /alias.*`filters`.*`like`/,
    cured: 'a: "*foo"\nb: 1\n',
    reads: { a: null, b: '1' },
  },
  'an anchor': {
    text: 'a: &x 3\nb: 1\n',
    at: '&x',
    says: /anchor.*`like`/,
    cured: 'a:  3\nb: 1\n',
    reads: { a: '3', b: '1' },
  },
  'a merge key': {
    text: 'a:\n  <<: *x\n  b: 1\n',
    at: '<<',
    says: /`like`/,
    cured: null,
    reads: { a: { '<<': null, b: '1' } },
  },
  'a tag': {
    text: 'a: !!str 3\nb: 1\n',
    at: '!!str',
    says: /tag/,
    cured: 'a:  3\nb: 1\n',
    reads: { a: '3', b: '1' },
  },
  'an explicit key': {
    text: 'x:\n  ? a\n  : b\n',
    at: '?',
    says: /explicit key/,
    cured: null,
    reads: { x: { a: 'b' } },
  },
  'an empty key': {
    text: 'x:\n  : b\n  c: 1\n',
    at: ':',
    says: /key is missing/,
    cured: null,
    reads: { x: { c: '1' } },
  },
  'a map as a key': {
    text: 'x:\n  {a: b}: c\n  d: 1\n',
    at: '{',
    says: /cannot be a key/,
    cured: null,
    reads: { x: { d: '1' } },
  },
  'a lone carriage return': {
    text: 'a:\n  b: 1\r  c: 2\n',
    at: '\r',
    says: /carriage return/,
    cured: 'a:\n  b: 1\n  c: 2\n',
    reads: { a: { b: '1', c: '2' } },
  },
  'an escape that means nothing': {
    text: 'a: "\\q"\n',
    at: '\\q',
    says: /single quotes/,
    cured: 'a: "\\\\q"\n',
    reads: { a: '\\q' },
  },
  'a comment without a space in front': {
    text: 'a: "x"#c\nb: 1\n',
    at: '#',
    says: /space in front/,
    cured: 'a: "x" #c\nb: 1\n',
    reads: { a: 'x', b: '1' },
  },
  'text behind a value that has ended': {
    text: 'a: "x" y\nb: 1\n',
    at: 'y',
    says: /has ended/,
    cured: null,
    reads: { a: 'x', b: '1' },
  },
  'a list behind its key': {
    text: 'a: - foo\nb: 1\n',
    at: '- foo',
    says: /line below its key/,
    cured: null,
    reads: { a: null, b: '1' },
  },
};

describe('a slip', () => {
  for (const [title, { text, at, says, cured, reads }] of Object.entries(cases)) {
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
