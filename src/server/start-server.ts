/** The language server, whatever it is connected through and wherever it runs. */
import {
  CodeActionKind,
  PositionEncodingKind,
  TextDocuments,
  TextDocumentSyncKind,
  type Connection,
  type InitializeResult,
} from 'vscode-languageserver';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { plainClient, profileOf, type ClientProfile } from './client-profile';
import { answerPulls, clear, push } from './diagnostic-reports';
import { answerEditor } from './editor-requests';
import { createOpenSpecs } from './open-specs';
import { answerOwn } from './own-requests';
import type { Platform } from './platform';
import { Proofs } from './proofs';
import type { ServerState } from './server-state';

/** Registers everything the server answers and starts listening. */
export function startServer(connection: Connection, platform: Platform): void {
  const report = (fault: unknown): void => {
    connection.console.error(fault instanceof Error ? (fault.stack ?? fault.message) : String(fault));
  };
  const specs = createOpenSpecs(platform);
  const state: ServerState = { profile: plainClient, specs, proofs: new Proofs(specs, platform, report) };

  connection.onInitialize((params) => {
    state.profile = profileOf(params);
    if (state.profile.pullsDiagnostics) answerPulls(connection, state);
    return whatWeOffer(state.profile, platform.version);
  });
  keepDocuments(connection, state, report);
  answerEditor(connection, state);
  answerOwn(connection, state);
  connection.listen();
}

function whatWeOffer(profile: ClientProfile, version: string): InitializeResult {
  return {
    serverInfo: { name: 'bandkeep', version },
    capabilities: {
      positionEncoding: PositionEncodingKind.UTF16,
      textDocumentSync: { openClose: true, change: TextDocumentSyncKind.Incremental },
      hoverProvider: true,
      completionProvider: { triggerCharacters: [':', ' ', '-'] },
      documentSymbolProvider: true,
      codeActionProvider: { codeActionKinds: [CodeActionKind.QuickFix] },
      ...(profile.pullsDiagnostics
        ? { diagnosticProvider: { identifier: 'bandkeep', interFileDependencies: false, workspaceDiagnostics: false } }
        : {}),
    },
  };
}

/** Follows the client's documents; where it does not ask for diagnostics, each change sends them. */
function keepDocuments(connection: Connection, state: ServerState, report: (fault: unknown) => void): void {
  const documents = new TextDocuments(TextDocument);
  documents.onDidChangeContent(({ document }) => {
    state.specs.change(document.uri, document.version, document.getText());
    if (!state.profile.pullsDiagnostics) push(connection, state, document.uri).catch(report);
  });
  documents.onDidClose(({ document }) => {
    state.specs.close(document.uri);
    if (!state.profile.pullsDiagnostics) clear(connection, document.uri).catch(report);
  });
  documents.listen(connection);
}
