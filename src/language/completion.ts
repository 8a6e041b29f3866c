/** Completion: what the declaration admits at a position, less what stands there already. */
import {
  CompletionItemKind,
  InsertTextFormat,
  type CompletionItem,
  type CompletionList,
  type Position,
} from 'vscode-languageserver-types';
import { completionsAt, type Completion } from '../spec';
import type { ClientAbilities } from './client-abilities';
import type { SpecDocument } from './spec-document';
import { offsetOf, rangeOf } from './text-range';
