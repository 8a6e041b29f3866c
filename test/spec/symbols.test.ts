/** Tests of the outline. */
import assert from 'node:assert/strict';
import { read } from '../../src/spec/read';
import { symbolsOf } from '../../src/spec/symbols';
import type { SpecSymbol } from '../../src/spec/symbols';

const text = `bandkeep: 1
clocks:
  board: { frequency: 24.576 MHz }
filters:
  guard:
    - { bandwidth: 400 kHz }
    - { name: steep, family: butterworth, order: 4, corner: 14 kHz }
channels:
  gate-x:
    direction: capture
    unwanted: { name: pump, tone: 310 kHz, level: 0 dBFS }
  gate-y:
    like: gate-x
`;

/** An outline as indented lines. */
function lines(symbols: readonly SpecSymbol[], indent = ''): readonly string[] {
  return symbols.flatMap(({ name, kind, children }) => [`${indent}${kind} ${name}`, ...lines(children, `${indent}  `)]);
}

function* all(symbols: readonly SpecSymbol[]): Generator<SpecSymbol> {
  for (const symbol of symbols) {
    yield symbol;
    yield* all(symbol.children);
  }
}

describe('the outline', () => {
  it('lists sections, names, stages, sources and keys', () => {
    assert.deepEqual(lines(symbolsOf(read(text))), [
      'section bandkeep',
      'section clocks',
      '  clock board',
      '    key frequency',
      'section filters',
      '  filter guard',
      '    stage 400 kHz',
      '    stage steep',
      'section channels',
      '  channel gate-x',
      '    key direction',
      '    key unwanted',
      '      source pump',
      '  channel gate-y',
      '    key like',
    ]);
  });

  it('keeps every child and every selection inside its parent', () => {
    for (const { span, selection, children } of all(symbolsOf(read(text)))) {
      for (const inner of [selection, ...children.map((child) => child.span)]) {
        assert.ok(span.start <= inner.start && inner.end <= span.end);
      }
    }
  });

  it('selects the key that an entry is named after', () => {
    for (const { kind, name, selection } of all(symbolsOf(read(text)))) {
      if (kind !== 'stage' && kind !== 'source') assert.equal(text.slice(selection.start, selection.end), name);
    }
  });

  it('stands for every name beside a fault', () => {
    const broken = text.replace('direction: capture', 'direction: "capture');
    assert.ok(lines(symbolsOf(read(broken))).includes('  channel gate-y'));
  });
});
