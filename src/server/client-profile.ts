/** What the client said about itself when it connected. */
import type { InitializeParams } from 'vscode-languageserver';
import type { ClientAbilities } from '../language';
import { docsBaseOf, readsFilesOf } from '../protocol/request-guards';
import type { ServerOptions } from '../protocol/requests';

/** The client's abilities and wishes; before `initialize` it is taken to have none. */
export interface ClientProfile {
  /** It asks for diagnostics; else they are sent to it. */
  readonly pullsDiagnostics: boolean;
  readonly hierarchicalSymbols: boolean;
  readonly abilities: ClientAbilities;
  readonly options: ServerOptions;
  /** URIs of the workspace's folders. */
  readonly folders: readonly string[];
  /** It tells of changed files when it is asked to. */
  readonly watchesFiles: boolean;
  /** It asks for diagnostics again when it is told that they may have changed. */
  readonly refreshesDiagnostics: boolean;
  /** It tells when the workspace has other folders. */
  readonly tellsFolders: boolean;
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
  options: { docsBase: null, readsFiles: false },
  folders: [],
  watchesFiles: false,
  refreshesDiagnostics: false,
  tellsFolders: false,
};

/** Reads the profile from the first request. */
export function profileOf(params: InitializeParams): ClientProfile {
  const { capabilities } = params;
  const given: unknown = params.initializationOptions;
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
    options: { docsBase: docsBaseOf(given), readsFiles: readsFilesOf(given) },
    folders: foldersOf(params),
    watchesFiles: workspace?.didChangeWatchedFiles?.dynamicRegistration === true,
    refreshesDiagnostics: workspace?.diagnostics?.refreshSupport === true,
    tellsFolders: workspace?.workspaceFolders === true,
  };
}

/** The folders, or the one root of a client that knows no folders. */
function foldersOf(params: InitializeParams): readonly string[] {
  const folders = params.workspaceFolders?.map(({ uri }) => uri) ?? [];
  // What older clients send; the protocol keeps it for them.
  const root = (params as { readonly rootUri?: string | null }).rootUri ?? null;
  return folders.length > 0 || root === null ? folders : [root];
}
