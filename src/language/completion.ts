/** Completion: what the declaration admits at a position, less what stands there already. */
import {
  CompletionItemKind,
  InsertTextFormat,
  MarkupKind,
  type CompletionItem,
  type CompletionList,
  type Position,
  type Range,
} from 'vscode-languageserver-types';
import { completionsAt, type Completion } from '../spec';
import type { ClientAbilities } from './client-abilities';
import { plainInSnippet, snippetAfter } from './key-snippet';
import type { SpecDocument } from './spec-document';
import { offsetOf, rangeOf } from './text-range';

const itemKinds: Readonly<Record<Completion['kind'], CompletionItemKind>> = {
  key: CompletionItemKind.Property,
  word: CompletionItemKind.EnumMember,
  name: CompletionItemKind.Reference,
};

/** What could be written at a position; nothing in comments. */
export function completion(document: SpecDocument, position: Position, abilities: ClientAbilities): CompletionList {
  const { reading } = document;
  const offers = completionsAt(reading, offsetOf(reading, position));
  const items = offers.map((offer, index): CompletionItem => {
    const item: CompletionItem = {
      label: offer.label,
      kind: itemKinds[offer.kind],
      sortText: sortText(offer, index),
      filterText: offer.newText.trim(),
      ...insertion(offer, rangeOf(reading, offer.span), abilities.snippets),
    };
    if (offer.about !== '') {
      item.documentation = { kind: abilities.markdown ? MarkupKind.Markdown : MarkupKind.PlainText, value: offer.about };
    }
    return item;
  });
  return { isIncomplete: false, items };
}

/** What is written: for a new key, where the editor can, with what must follow it left to fill in. */
function insertion({ key, newText }: Completion, range: Range, snippets: boolean): Partial<CompletionItem> {
  const after = snippets && key !== null && newText.endsWith(': ') ? snippetAfter(key) : null;
  if (after === null) return { textEdit: { range, newText } };
  return { textEdit: { range, newText: plainInSnippet(newText) + after }, insertTextFormat: InsertTextFormat.Snippet };
}

/** What a map cannot do without comes first; otherwise the order of the declaration. */
function sortText({ required }: Completion, index: number): string {
  return `${required ? 0 : 1}${String(index).padStart(3, '0')}`;
}
