/** Reading any text at all ends, never throws, and gives spans that lie in the text; its work grows with the text, not faster. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { applyEdits, exists, placeAt, read, spanOf } from '../../src/spec';
import type { Reading } from '../../src/spec';
import { lagoonHead, lagoonNames, lagoonChannel, lagoonSpec } from '../support/lagoon';
import { legalSpec } from '../support/spec-generator';

/** What must hold for every reading of every text. */
function assertSound(text: string, reading: Reading): void {
  assert.equal(reading.text, text);
  for (const { span, message, cures } of reading.problems) {
    assert.ok(0 <= span.start && span.start <= span.end && span.end <= text.length, `${message} ${JSON.stringify(span)}`);
    assert.ok(message.length > 10);
    for (const { edits } of cures) {
      for (const edit of edits)
        assert.ok(0 <= edit.span.start && edit.span.start <= edit.span.end && edit.span.end <= text.length);
      applyEdits(text, edits);
    }
  }
  for (const { name, channel } of reading.entries) {
    assert.equal(typeof exists(reading, { channel: name, path: ['rate'] }), 'boolean');
    const { start, end } = spanOf(reading, { channel: name, path: [], part: 'key' });
    assert.ok(0 <= start && start <= end && end <= text.length);
    const erring = reading.problems.some((problem) => problem.channel === name && problem.severity === 'error');
    assert.ok(!(erring && channel !== null), 'a channel with an error is not whole');
  }
  for (let offset = 0; offset <= text.length; offset += 1 + Math.floor(text.length / 40)) placeAt(reading, offset);
}

// Whatever means something to YAML, to the scanner or to JavaScript.
const pieces = [
  ...Array.from(' \t\n\r\u00a0\0\uFEFF-:?,[]{}#&*!|>\'"%@`<=~\\'),
  ...[
    '\n  ',
    '\n    ',
    '\r\n',
    ': ',
    '- ',
    ' #',
    '<<: ',
    '---\n',
    '...\n',
    '<<<<<<< a\n',
    '=======\n',
    '>>>>>>> b\n',
    '%YAML 1.2\n',
  ],
  ...[
    'channels:',
    'filters',
    'clocks:\n',
    'direction: capture',
    '__proto__:',
    'constructor:',
    'toString',
    '{}',
    '[]',
    '&a',
    '*a',
    '!!str ',
  ],
  ...['rate: ', '1e999 Hz', '-3,5', '😀', '\ud800', 'like: ', '# bandkeep: accept ', 'x'],
];

const anyText = fc.string({ unit: fc.constantFrom(...pieces), maxLength: 60 });

/** A faultless spec with a few stretches replaced by anything. */
const mutated = fc
  .tuple(
    fc.oneof(legalSpec, fc.constant(lagoonSpec(2))),
    fc.array(fc.tuple(fc.nat(4000), fc.nat(6), fc.string({ unit: fc.constantFrom(...pieces), maxLength: 4 })), {
      minLength: 1,
      maxLength: 6,
    }),
  )
  .map(([text, changes]) =>
    changes.reduce((done, [at, length, piece]) => {
      const start = done.length === 0 ? 0 : at % done.length;
      return done.slice(0, start) + piece + done.slice(start + length);
    }, text),
  );

describe('reading any text', () => {
  it('is sound for a text of pieces that mean something', () => {
    fc.assert(
      fc.property(anyText, (text) => {
        assertSound(text, read(text));
      }),
      { seed: 4, numRuns: 800 },
    );
  });

  it('is sound for a spec with stretches replaced', () => {
    fc.assert(
      fc.property(mutated, (text) => {
        assertSound(text, read(text));
      }),
      { seed: 5, numRuns: 300 },
    );
  });

  it('gives after an edit what it gives afresh', () => {
    const shown = ({ entries, names, problems, acceptances, title }: Reading): unknown =>
      JSON.parse(JSON.stringify({ entries, names, problems, acceptances, title }));
    fc.assert(
      fc.property(mutated, mutated, (first, second) => {
        assert.deepEqual(shown(read(second, read(first, read(lagoonSpec(2))))), shown(read(second)));
      }),
      { seed: 6, numRuns: 100 },
    );
  });

  const huge: Record<string, () => string> = {
    'brackets within brackets': () => `bandkeep: 1\nchannels:\n  a:\n    wanted: ${'['.repeat(100_000)}\n`,
    'braces within braces': () => `channels: ${'{a: '.repeat(900)}\n`,
    'brackets that all close': () => `title: ${'['.repeat(900)}${']'.repeat(900)}\n`,
    'blocks within blocks': () => Array.from({ length: 900 }, (_, depth) => `${' '.repeat(depth)}a:\n`).join(''),
    'lists within lists': () => `title: x\nfilters:\n  a:\n    ${'- '.repeat(5000)}x\n`,
    '20,000 keys': () => Array.from({ length: 20_000 }, (_, index) => `key-${index}: 1\n`).join(''),
    '20,000 keys of one map': () =>
      `filters:\n${Array.from({ length: 20_000 }, (_, index) => `  f${index}: { bandwidth: 1 kHz }\n`).join('')}`,
    '20,000 equal names': () => `clocks:\n${'  a: { frequency: 1 MHz }\n'.repeat(20_000)}`,
    'a bomb of aliases': () =>
      `a: &a x\n${Array.from({ length: 40 }, (_, index) => `b${index + 1}: &b${index + 1} [*b${index}, *b${index}, *b${index}]\n`).join('')}`,
    'a huge line': () => `title: ${'x'.repeat(1_000_000)}\n`,
    'a huge line of slips': () => `title: [${'! a, - 3, x:y, '.repeat(300)}]\n`,
    'a huge line of carriage returns': () => `title: x\n${'\ra'.repeat(20_000)}`,
    'a huge line of tabs': () => `title:\n${'\t'.repeat(100_000)}\n`,
    'spaces only': () => ' '.repeat(1_000_000),
    'no-break spaces only': () => `a:\n${'\u00a0'.repeat(100_000)}`,
    'quotes only': () => '"'.repeat(5_000),
    'dashes only': () => '- '.repeat(20_000),
    'comments that accept': () => '# bandkeep: accept x, y\n'.repeat(20_000),
    'one comment that accepts over and over': () => `# ${'# bandkeep: accept x, y '.repeat(20_000)}`,
    'conflict markers': () => '<<<<<<< a\n=======\n'.repeat(5_000),
    'document markers': () => '---\n...\n'.repeat(5_000),
    'stray lines': () => `channels:\n${'  stray\n'.repeat(20_000)}`,
    'a chain of like': () =>
      `bandkeep: 1\nchannels:\n${Array.from({ length: 1000 }, (_, index) => `  c${index}:\n    like: c${index + 1}\n`).join('')}`,
    'names of every object': () =>
      'bandkeep: 1\nclocks:\n  __proto__: { frequency: 1 MHz }\n  constructor: { __proto__: 1 }\nchannels:\n  __proto__:\n    like: toString\n    rate: { clock: __proto__ }\n    __proto__: 3\n',
  };

  for (const [title, make] of Object.entries(huge)) {
    it(`ends: ${title}`, () => {
      const text = make();
      assertSound(text, read(text));
    });
  }

  it('knows a clock called __proto__', () => {
    const channel = lagoonChannel('constructor').join('\n').replace('clock: board', 'clock: __proto__');
    const { problems, entries } = read(`${lagoonHead.replace('  spare:', '  __proto__:')}${channel}\n`);
    assert.deepEqual(problems, []);
    assert.equal(entries[0]?.channel?.rate.clock?.name, '__proto__');
  });
});

describe('the work of reading', () => {
  it('grows with the number of channels, and an edit costs the same in every file', () => {
    for (const count of [10, 100, 1000]) {
      const text = lagoonSpec(count);
      const first = read(text);
      assert.deepEqual(first.counts, { slices: count + 5, slicesRead: count + 5, channelsResolved: count });
      const name = lagoonNames(count).at(-1) ?? '';
      const after = read(text.replace(`  ${name}:\n`, `  ${name}:\n    guard: 1 Hz\n`), first);
      assert.deepEqual(after.counts, { slices: count + 5, slicesRead: 1, channelsResolved: 1 });
    }
  });

  it('is one slice for a file that is all one section, read once', () => {
    const text = `filters:\n${Array.from({ length: 1000 }, (_, index) => `  f${index}: { bandwidth: 1 kHz }\n`).join('')}`;
    assert.deepEqual(read(text).counts, { slices: 1, slicesRead: 1, channelsResolved: 0 });
  });
});
