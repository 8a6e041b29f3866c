/** Completion as the editor gets it: what is offered, what it replaces, and how it is written. */
import assert from 'node:assert/strict';
import { CompletionItemKind, InsertTextFormat, type CompletionItem } from 'vscode-languageserver-types';
import { completion } from '../../src/language';
import { ableEditor, offsetIn, opened, plainAbilities } from '../support/language-document';
import { passingSpec } from '../support/spec-texts';

function offered(marked: string, abilities = ableEditor): CompletionItem[] {
  const { document, cursor } = opened(marked);
  return completion(document, cursor, abilities).items;
}

const labels = (marked: string): string[] => offered(marked).map(({ label }) => label);

/** The text after an item has been taken. */
function taken(marked: string, label: string, abilities = ableEditor): string {
  const { text } = opened(marked);
  const edit = offered(marked, abilities).find((item) => item.label === label)?.textEdit;
  assert.ok(edit && 'range' in edit, `${label} is not offered`);
  return text.slice(0, offsetIn(text, edit.range.start)) + edit.newText + text.slice(offsetIn(text, edit.range.end));
}

const inChannel = passingSpec.replace('    bits: 16\n', '    ¦\n');

describe('completion', () => {
  it('offers the keys that do not stand yet, in the direction of the channel', () => {
    const found = labels(inChannel);
    assert.ok(found.includes('bits'));
    assert.ok(found.includes('jitter'));
    assert.ok(!found.includes('rate'), 'it stands already');
    assert.ok(!found.includes('hold'), 'it is for channels that generate');
  });

  it('offers the words of a key', () => {
    assert.deepEqual(labels(passingSpec.replace('direction: capture', 'direction: ¦')), ['capture', 'generate', 'relay']);
  });

  it('offers the names that are defined', () => {
    assert.deepEqual(labels(passingSpec.replace('clock: board', 'clock: ¦').replace('    rate-choices', '    # rate-choices')), [
      'board',
    ]);
  });

  it('puts what cannot be missing first', () => {
    const items = offered(passingSpec.replace('    direction: capture\n', '    ¦\n'));
    const [first] = items.sort((a, b) => ((a.sortText ?? '') < (b.sortText ?? '') ? -1 : 1));
    assert.equal(first?.label, 'direction');
  });

  it('replaces what has been typed of a key', () => {
    assert.equal(taken(passingSpec.replace('    bits: 16\n', '    bi¦\n'), 'bits'), passingSpec.replace('bits: 16', 'bits: '));
  });

  it('writes a key with a choice of its words, where the editor can', () => {
    const marked = passingSpec.replace('    direction: capture\n', '    ¦\n');
    assert.match(taken(marked, 'direction'), /^ {4}direction: \$\{1\|capture,generate,relay\|\}\$0$/m);
    assert.match(taken(marked, 'direction', plainAbilities), /^ {4}direction: $/m);
    const item = offered(marked).find(({ label }) => label === 'direction');
    assert.equal(item?.insertTextFormat, InsertTextFormat.Snippet);
  });

  it('writes a key with the fields it cannot do without', () => {
    const marked = passingSpec.replace(/ {4}wanted:.*\n/, '    ¦\n');
    assert.match(taken(marked, 'wanted'), /^ {4}wanted: \{ band: \$1 \}\$0$/m);
  });

  it('leaves a key open that may be more than one form', () => {
    const relay = passingSpec.replace('direction: capture', 'direction: relay').replace('    aperture: 300 ns\n', '    ¦\n');
    assert.match(taken(relay, 'gate'), /^ {4}gate: $/m);
    assert.match(taken(relay, 'hold'), /^ {4}hold: $/m);
    assert.match(taken(relay, 'slots'), /^ {4}slots: \{ count: \$1, link: \$2 \}\$0$/m);
  });

  it('offers the stages that a source may enter in front of, by name', () => {
    const named = passingSpec.replace('order: 4,', 'order: 4, name: first guard,');
    assert.deepEqual(labels(named.replace('level: -55 dBFS }', 'level: -55 dBFS, enters: ¦ }')), [
      'input',
      'sampler',
      'first guard',
    ]);
    const own = named.replace('filter: guard', 'filter: [{ bandwidth: 1 MHz, name: second }, { bandwidth: 2 MHz }]');
    assert.deepEqual(labels(own.replace('level: -55 dBFS }', 'level: -55 dBFS, enters: ¦ }')), ['input', 'sampler', 'second']);
  });

  it('offers masks and shared sources by name, and the words of pulses', () => {
    const named = passingSpec.replace(
      'channels:',
      'masks:\n  ear: [{ band: 1 Hz .. 2 Hz, below: 0 dB }]\nsources:\n  hum: { tone: 50 Hz, level: 0 dBFS }\n\nchannels:',
    );
    assert.deepEqual(labels(named.replace('alias: -96 dBFS', 'response: ¦')), ['ear']);
    assert.deepEqual(labels(named.replace(/unwanted:\n.*\n/u, 'unwanted: ¦\n')), ['hum', 'anything']);
    assert.ok(labels(named.replace('aperture: 300 ns', 'aperture: { shape: ¦ }')).includes('half-sine'));
  });

  it('says of each what it is and what it means', () => {
    const bits = offered(inChannel).find(({ label }) => label === 'bits');
    assert.equal(bits?.kind, CompletionItemKind.Property);
    assert.match(JSON.stringify(bits.documentation), /word length/);
  });

  it('offers nothing in a comment', () => {
    assert.deepEqual(labels(passingSpec.replace('    bits: 16', '    bits: 16 # ¦')), []);
    assert.deepEqual(labels(`# ¦\n${passingSpec}`), []);
  });

  it('offers the sections of a file at its left edge', () => {
    const found = labels('bandkeep: 1\n¦\n');
    assert.ok(found.includes('channels') && found.includes('clocks'), found.join(' '));
    assert.ok(!found.includes('bandkeep'));
  });
});
