/** What the client said about itself when it connected. */
import type { InitializeParams } from 'vscode-languageserver';
import type { ClientAbilities } from '../language';
import { docsBaseOf } from '../protocol/request-guards';
import type { ServerOptions } from '../protocol/requests';

/** The client's abilities and wishes; before `initialize` it is taken to have none. */
export interface ClientProfile {
  /** It asks for diagnostics; else they are sent to it. */
  readonly pullsDiagnostics: boolean;
  readonly hierarchicalSymbols: boolean;
  readonly abilities: ClientAbilities;
  readonly options: ServerOptions;
}

/** A client that can do nothing special. */
export const plainClient: ClientProfile = {
  pullsDiagnostics: false,
  hierarchicalSymbols: false,
  abilities: {
    relatedInformation: false,
    snippets: false,
    versionedEdits: false,
    snippetEdits: false,
    disabledActions: false,
    markdown: false,
  },
  options: { docsBase: null },
};

/** Reads the profile from the first request. */
export function profileOf({ capabilities, initializationOptions }: InitializeParams): ClientProfile {
  const { textDocument, workspace } = capabilities;
  return {
    pullsDiagnostics: textDocument?.diagnostic !== undefined,
    hierarchicalSymbols: textDocument?.documentSymbol?.hierarchicalDocumentSymbolSupport === true,
    abilities: {
      relatedInformation:
        textDocument?.publishDiagnostics?.relatedInformation === true || textDocument?.diagnostic?.relatedInformation === true,
      snippets: textDocument?.completion?.completionItem?.snippetSupport === true,
      versionedEdits: workspace?.workspaceEdit?.documentChanges === true,
      snippetEdits: workspace?.workspaceEdit?.documentChanges === true && workspace.workspaceEdit.snippetEditSupport === true,
      disabledActions: textDocument?.codeAction?.disabledSupport === true,
      markdown: textDocument?.hover?.contentFormat?.includes('markdown') === true,
    },
    options: { docsBase: docsBaseOf(initializationOptions) },
  };
}
