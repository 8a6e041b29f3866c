/** The outline, as a tree and as a list. */
import assert from 'node:assert/strict';
import type { DocumentSymbol, Range } from 'vscode-languageserver-types';
import { documentSymbols, flatSymbols } from '../../src/language';
import { offsetIn, opened } from '../support/language-document';
import { passingSpec } from '../support/spec-texts';

/** The tree as indented names. */
const outline = (symbols: readonly DocumentSymbol[], indent = ''): string[] =>
  symbols.flatMap(({ name, children }) => [indent + name, ...outline(children ?? [], `${indent}  `)]);

describe('the outline', () => {
  it('has sections, what is defined in them, and the keys of each', () => {
    const { document } = opened(passingSpec);
    const found = outline(documentSymbols(document));
    for (const line of ['clocks', '  board', 'filters', '  guard', 'channels', '  bearing', '    unwanted', '      drive hash']) {
      assert.ok(found.includes(line), `no “${line}” in:\n${found.join('\n')}`);
    }
  });

  it('lists masks with their segments, shared sources, and both filters of a relay channel', () => {
    const { document } = opened(`bandkeep: 1
sources:
  inverter: { tone: 8.2 kHz, level: -30 dBFS }
masks:
  ear:
    - { band: 0 Hz .. 400 Hz, within: ± 1 dB }
    - { band: 6 kHz .., below: -40 dB }
channels:
  strain:
    direction: relay
    wanted: { band: 0 Hz .. 400 Hz }
    rate: 8 kHz
    gate: 12 %
    input-filter: { bandwidth: 3 kHz }
    output-filter: [{ bandwidth: 2 kHz, name: far side }]
`);
    const found = outline(documentSymbols(document));
    for (const line of [
      '  inverter',
      '  ear',
      '    0 Hz .. 400 Hz',
      '    6 kHz ..',
      '    gate',
      '      3 kHz',
      '      far side',
    ]) {
      assert.ok(found.includes(line), `no “${line}” in:\n${found.join('\n')}`);
    }
  });

  it('selects the name, inside the range of the whole', () => {
    const { document, text } = opened(passingSpec);
    const inside = (inner: Range, outer: Range): boolean =>
      offsetIn(text, inner.start) >= offsetIn(text, outer.start) && offsetIn(text, inner.end) <= offsetIn(text, outer.end);
    const check = ({ name, range, selectionRange, children }: DocumentSymbol): void => {
      assert.ok(inside(selectionRange, range), name);
      for (const child of children ?? []) {
        assert.ok(inside(child.range, range), `${child.name} in ${name}`);
        check(child);
      }
    };
    documentSymbols(document).forEach(check);
  });

  it('holds the same names as a list, each with what holds it', () => {
    const { document } = opened(passingSpec);
    const list = flatSymbols(document);
    assert.deepEqual(
      list.map(({ name }) => name),
      outline(documentSymbols(document)).map((line) => line.trim()),
    );
    assert.equal(list.find(({ name }) => name === 'drive hash')?.containerName, 'unwanted');
  });

  it('is there for a broken spec too, and never has an empty name', () => {
    const { document } = opened(passingSpec.replace('bearing:', '"":').replace('bits: 16', 'bits: "16'));
    const found = outline(documentSymbols(document)).map((line) => line.trim());
    assert.ok(found.includes('clocks'));
    assert.ok(found.every((name) => name !== ''));
  });
});
