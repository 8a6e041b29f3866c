/** The standard requests for what an editor shows at a position: hover, completion, outline, quick fixes. */
import {
  CodeActionTriggerKind,
  type CancellationToken,
  type CodeAction,
  type CodeActionParams,
  type CompletionList,
  type CompletionParams,
  type DocumentSymbol,
  type DocumentSymbolParams,
  type Hover,
  type HoverParams,
  type SymbolInformation,
} from 'vscode-languageserver';
import { asksForQuickFixes, codeActions, completion, documentSymbols, flatSymbols, hover, unprovedIn } from '../language';
import { isAboutDocument, isAboutPosition, isAboutRange } from '../protocol/request-guards';
import { check, contentModified, refuseIfCancelled } from './answers';
import type { ServerState } from './server-state';

/** Answers from the newest version; a document that is not open has nothing to show. */
export interface EditorAnswers {
  hover(params: HoverParams, token: CancellationToken): Promise<Hover | null>;
  completion(params: CompletionParams, token: CancellationToken): Promise<CompletionList | null>;
  documentSymbol(params: DocumentSymbolParams, token: CancellationToken): Promise<DocumentSymbol[] | SymbolInformation[] | null>;
  /**
   * The quick fixes for a range. What has not been proved by now is proved within the request, so that the menu is
   * complete; a client that cancels meanwhile gets what there is by then.
   */
  codeAction(params: CodeActionParams, token: CancellationToken): Promise<CodeAction[] | null>;
}

/** The answers of one server. */
export function editorAnswers({ specs, proofs, profile }: ServerState): EditorAnswers {
  return {
    async hover(params, token) {
      const { textDocument, position } = check(params, isAboutPosition);
      const document = await specs.judged(textDocument.uri);
      refuseIfCancelled(token);
      proofs.lookAt(textDocument.uri, position);
      return document && hover(document, position, profile.abilities);
    },
    async completion(params, token) {
      const { textDocument, position } = check(params, isAboutPosition);
      const document = await specs.judged(textDocument.uri);
      refuseIfCancelled(token);
      return document && completion(document, position, profile.abilities);
    },
    async documentSymbol(params, token) {
      const { textDocument } = check(params, isAboutDocument);
      const document = await specs.judged(textDocument.uri);
      refuseIfCancelled(token);
      if (document === null) return null;
      return profile.hierarchicalSymbols ? documentSymbols(document) : flatSymbols(document);
    },
    async codeAction(params, token) {
      const { textDocument, range, context } = check(params, isAboutRange);
      const only = context.only ?? null;
      if (!asksForQuickFixes(only)) return [];
      const document = await specs.judged(textDocument.uri);
      if (document === null) return null;
      proofs.lookAt(textDocument.uri, range.start);
      await proofs.prove(document, unprovedIn(document, range), () => token.isCancellationRequested);
      if (!specs.isNewest(document)) throw contentModified();
      const invoked = context.triggerKind === CodeActionTriggerKind.Invoked;
      const options = { abilities: profile.abilities, docsBase: profile.options.docsBase };
      return codeActions(document, { range, only, invoked }, options);
    },
  };
}
