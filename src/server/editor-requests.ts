/** The standard requests for what an editor shows at a position: hover, completion, outline, quick fixes. */
import {
  CodeActionTriggerKind,
  type CodeAction,
  type CodeActionParams,
  type Connection,
  type CancellationToken,
} from 'vscode-languageserver';
import { codeActions, completion, documentSymbols, flatSymbols, hover, unprovedIn } from '../language';
import { isAboutDocument, isAboutPosition, isAboutRange } from '../protocol/request-guards';
import { check, contentModified, refuseIfCancelled } from './answers';
import type { ServerState } from './server-state';

/** Answers them from the newest version; a document that is not open has nothing to show. */
export function answerEditor(connection: Connection, state: ServerState): void {
  const { specs, proofs } = state;
  connection.onHover(async (params, token) => {
    const { textDocument, position } = check(params, isAboutPosition);
    const document = await specs.judged(textDocument.uri);
    refuseIfCancelled(token);
    proofs.lookAt(textDocument.uri, position);
    return document && hover(document, position, state.profile.abilities);
  });
  connection.onCompletion(async (params, token) => {
    const { textDocument, position } = check(params, isAboutPosition);
    const document = await specs.judged(textDocument.uri);
    refuseIfCancelled(token);
    return document && completion(document, position, state.profile.abilities);
  });
  connection.onDocumentSymbol(async (params, token) => {
    const { textDocument } = check(params, isAboutDocument);
    const document = await specs.judged(textDocument.uri);
    refuseIfCancelled(token);
    if (document === null) return null;
    return state.profile.hierarchicalSymbols ? documentSymbols(document) : flatSymbols(document);
  });
  connection.onCodeAction((params, token) => actionsFor(state, check(params, isAboutRange), token));
}

/**
 * The quick fixes for a range. What has not been proved by now is proved within the request, so that the menu is
 * complete; a client that cancels meanwhile gets what there is by then.
 */
async function actionsFor(state: ServerState, params: CodeActionParams, token: CancellationToken): Promise<CodeAction[] | null> {
  const { specs, proofs, profile } = state;
  const { textDocument, range, context } = params;
  const document = await specs.judged(textDocument.uri);
  if (document === null) return null;
  proofs.lookAt(textDocument.uri, range.start);
  await proofs.prove(document, unprovedIn(document, range), () => token.isCancellationRequested);
  if (!specs.isNewest(document)) throw contentModified();
  return codeActions(
    document,
    { range, only: context.only ?? null, invoked: context.triggerKind === CodeActionTriggerKind.Invoked },
    { abilities: profile.abilities, docsBase: profile.options.docsBase },
  );
}
