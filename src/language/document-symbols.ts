/** The outline: clocks, filters, sources, masks and channels with what stands in them. */
import { SymbolKind, type DocumentSymbol, type SymbolInformation } from 'vscode-languageserver-types';
import { symbolsOf, type Reading, type SpecSymbol } from '../spec';
import type { SpecDocument } from './spec-document';
import { rangeOf } from './text-range';

/** How the outline draws each kind of entry. */
const symbolKinds: Readonly<Record<SpecSymbol['kind'], SymbolKind>> = {
  section: SymbolKind.Namespace,
  clock: SymbolKind.Event,
  filter: SymbolKind.Interface,
  mask: SymbolKind.Interface,
  channel: SymbolKind.Class,
  stage: SymbolKind.Field,
  source: SymbolKind.Field,
  segment: SymbolKind.Field,
  key: SymbolKind.Property,
};

/** The outline as a tree. */
export function documentSymbols({ reading }: SpecDocument): DocumentSymbol[] {
  return symbolsOf(reading).map((symbol) => treeOf(reading, symbol));
}

/** The same for an editor that knows only flat lists. */
export function flatSymbols({ reading, uri }: SpecDocument): SymbolInformation[] {
  const flatten = (symbol: SpecSymbol, containerName?: string): SymbolInformation[] => [
    {
      name: symbol.name,
      kind: symbolKinds[symbol.kind],
      location: { uri, range: rangeOf(reading, symbol.span) },
      ...(containerName === undefined ? {} : { containerName }),
    },
    ...symbol.children.flatMap((child) => flatten(child, symbol.name)),
  ];
  return symbolsOf(reading).flatMap((symbol) => flatten(symbol));
}

function treeOf(reading: Reading, symbol: SpecSymbol): DocumentSymbol {
  return {
    name: symbol.name === '' ? '(no name)' : symbol.name,
    kind: symbolKinds[symbol.kind],
    range: rangeOf(reading, symbol.span),
    selectionRange: rangeOf(reading, symbol.selection),
    children: symbol.children.map((child) => treeOf(reading, child)),
  };
}
