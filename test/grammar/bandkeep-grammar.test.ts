import assert from 'node:assert/strict';
import { readdirSync, readFileSync } from 'node:fs';
import type { IGrammar } from 'vscode-textmate';
import { loadGrammar, scopeOf, tokensOf } from './tokens';

describe('the TextMate grammar', () => {
  let grammar: IGrammar;
  before(async () => {
    grammar = await loadGrammar();
  });

  const scopes = (text: string, ...words: string[]): (string | null)[] => {
    const tokens = tokensOf(grammar, text);
    return words.map((word) => scopeOf(tokens, word));
  };

  it('tells a number from its unit, with and without a space between', () => {
    assert.deepEqual(scopes('rate: 51.2 kHz', '51.2', 'kHz'), ['constant.numeric', 'keyword.other.unit']);
    assert.deepEqual(scopes('aperture: 300ns', '300', 'ns'), ['constant.numeric', 'keyword.other.unit']);
    assert.deepEqual(scopes('noise: 40 nV/√Hz', '40', 'nV/√Hz'), ['constant.numeric', 'keyword.other.unit']);
    assert.deepEqual(scopes('jitter: 2e-12 s', '2e-12', 's'), ['constant.numeric', 'keyword.other.unit']);
  });

  it('takes a typographic minus for a sign', () => {
    assert.deepEqual(scopes('level: −96 dBFS', '−96', 'dBFS'), ['constant.numeric', 'keyword.other.unit']);
  });

  it('marks ranges, open ones and ones without spaces included', () => {
    assert.equal(scopes('band: 40 kHz ..', '..')[0], 'keyword.operator.range');
    assert.deepEqual(scopes('band: 5..10 kHz', '5', '..', '10', 'kHz'), [
      'constant.numeric',
      'keyword.operator.range',
      'constant.numeric',
      'keyword.other.unit',
    ]);
  });

  it('marks a tolerance in each of its spellings', () => {
    for (const sign of ['±', '+/-', '+-']) {
      assert.equal(scopes(`tone: 310 kHz ${sign} 10 %`, sign)[0], 'keyword.operator.tolerance', sign);
    }
  });

  it('reads part values as they are printed on parts', () => {
    assert.equal(scopes('{ rc: { r: 4k7 ± 1 %, c: 2n2 } }', 'k')[0], 'keyword.other.unit');
    assert.equal(scopes('{ rc: { r: R47, c: 100n } }', 'R')[0], 'keyword.other.unit');
  });

  it('gives keys, free names and used names scopes of their own', () => {
    const text = 'channels:\n  bearing-x:\n    filter: pick-up guard\n    like: bearing-y';
    assert.deepEqual(scopes(text, 'channels', 'bearing-x', 'filter', 'pick-up guard', 'bearing-y'), [
      'keyword.other.section',
      'entity.name.type',
      'entity.name.tag',
      'variable.other.name',
      'variable.other.name',
    ]);
  });

  it('knows the words for pulses, kinds of sections and what holds beyond a table', () => {
    for (const word of ['half-sine', 'raised-cosine', 'split', 'trapezoid']) {
      assert.equal(scopes(`gate: { shape: ${word}, width: 12 % }`, word)[0], 'support.constant.property-value', word);
    }
    assert.equal(scopes('kind: notch', 'notch')[0], 'support.constant.property-value');
    assert.equal(scopes('{ measured: x.csv, below: refuse }', 'refuse')[0], 'support.constant.property-value');
  });

  it('gives the name of a mask and of a shared source a scope, but not the words that may stand there', () => {
    assert.equal(scopes('response: video mask', 'video mask')[0], 'variable.other.name');
    assert.equal(scopes('unwanted: pump hum', 'pump hum')[0], 'variable.other.name');
    assert.equal(scopes('unwanted: anything', 'anything')[0], 'support.constant.property-value');
    assert.equal(scopes('{ tone: 50 Hz, enters: sampler }', 'sampler')[0], 'support.constant.property-value');
  });

  it('takes the path of a table as a whole, digits included', () => {
    assert.equal(scopes('- { measured: tables/guard-2.s2p, below: hold }', 'tables/guard-2.s2p')[0], 'string.unquoted.path');
    assert.equal(scopes('spectrum: 50 Hz.csv', '50 Hz.csv')[0], 'string.unquoted.path');
  });

  it('reads the imaginary part of a pole with its sign and unit', () => {
    assert.deepEqual(scopes('poles: [-800 ± 600j Hz]', '-800', '±', '600j', 'Hz'), [
      'constant.numeric',
      'keyword.operator.tolerance',
      'constant.numeric',
      'keyword.other.unit',
    ]);
  });

  it('does not take a key inside a channel for the name of a channel', () => {
    const text = 'channels:\n   ice pulse:\n      limits:\n         alias: −96 dBFS\n   second:\n      bits: 16';
    assert.deepEqual(scopes(text, 'ice pulse', 'limits', 'alias', 'second', 'bits'), [
      'entity.name.type',
      'entity.name.tag',
      'entity.name.tag',
      'entity.name.type',
      'entity.name.tag',
    ]);
  });

  it('leaves a section at the next key in column 0', () => {
    assert.equal(scopes('clocks:\n  board: { frequency: 1 MHz }\ntitle: x', 'title')[0], 'entity.name.tag');
  });

  it('keeps digits and commas inside a text', () => {
    assert.equal(scopes('title: Sluice gate 3, bearings', 'Sluice gate 3, bearings')[0], 'string.unquoted');
    assert.equal(scopes('- { name: 50 Hz mains, tone: 50 Hz }', '50 Hz mains')[0], 'string.unquoted');
  });

  it('knows the words of the language only as whole values', () => {
    assert.equal(scopes('hold: zero-order', 'zero-order')[0], 'support.constant.property-value');
    assert.equal(scopes('name: capture of ice', 'capture of ice')[0], 'string.unquoted');
  });

  it('ends a value at a comment, and starts none at a hash without a space before it', () => {
    assert.equal(scopes('rate: 64 kHz # from the board', 'from the board')[0], 'comment.line.number-sign');
    assert.equal(scopes('title: Gate#3', 'Gate#3')[0], 'string.unquoted');
  });

  it('takes an accepting comment apart', () => {
    const text = '# bandkeep: accept alias-over-limit down to -1.5 dB, agreed in review 7';
    assert.deepEqual(scopes(text, 'accept', 'alias-over-limit', '-1.5', 'dB', 'agreed in review 7'), [
      'keyword.control.acceptance',
      'support.constant.finding-code',
      'constant.numeric',
      'keyword.other.unit',
      'string.unquoted.reason',
    ]);
  });

  it('gives every number of the examples a number scope', () => {
    const folder = new URL('../../examples/', import.meta.url);
    for (const file of readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) =>
      name.endsWith('.bandkeep.yaml'),
    )) {
      const tokens = tokensOf(grammar, readFileSync(new URL(file, folder), 'utf8'));
      const plain = tokens.filter(({ text, scope }) => /^[-−+]?\d/.test(text) && scope === 'string.unquoted');
      assert.deepEqual(plain, [], file);
    }
  });
});
