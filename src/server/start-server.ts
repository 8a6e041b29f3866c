/** The language server, whatever it is connected through and wherever it runs. */
import {
  CodeActionKind,
  PositionEncodingKind,
  TextDocuments,
  TextDocumentSyncKind,
  type CancellationToken,
  type Connection,
  type InitializeResult,
} from 'vscode-languageserver';
import { TextDocument } from 'vscode-languageserver-textdocument';
import {
  countsRequest,
  locateRequest,
  pictureRequest,
  placeAtRequest,
  type CountsParams,
  type LocateParams,
  type PictureParams,
  type PlaceAtParams,
} from '../protocol/requests';
import { plainClient, profileOf, type ClientProfile } from './client-profile';
import type { Platform } from './platform';
import type { Services } from './services';
import { watchFiles } from './watched-files';

/** Registers everything the server answers and starts listening. */
export function startServer(connection: Connection, platform: Platform): void {
  let profile = plainClient;
  let services: Promise<Services> | null = null;
  const load = async (): Promise<Services> => (await import('./services')).createServices(connection, profile, platform);
  // All messages wait for the same promise, so they are handled in the order in which they came.
  const loaded = (): Promise<Services> => (services ??= load());

  connection.onInitialize((params) => {
    profile = profileOf(params);
    if (profile.pullsDiagnostics) {
      connection.languages.diagnostics.on(async (asked, token) => (await loaded()).diagnostic(asked, token));
    }
    return whatWeOffer(profile, platform.version);
  });
  connection.onInitialized(() => {
    void loaded();
    listenForFiles(connection, profile, loaded);
  });
  keepDocuments(connection, loaded);
  answerRequests(connection, loaded);
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
        ? { diagnosticProvider: { identifier: 'bandkeep', interFileDependencies: true, workspaceDiagnostics: false } }
        : {}),
    },
  };
}

function keepDocuments(connection: Connection, loaded: () => Promise<Services>): void {
  const documents = new TextDocuments(TextDocument);
  documents.onDidChangeContent(({ document }) => {
    const { uri, version } = document;
    const text = document.getText();
    void loaded().then((services) => {
      services.changed(uri, version, text);
    });
  });
  documents.onDidClose(({ document }) => {
    void loaded().then((services) => {
      services.closed(document.uri);
    });
  });
  documents.listen(connection);
}

function listenForFiles(connection: Connection, profile: ClientProfile, loaded: () => Promise<Services>): void {
  if (profile.watchesFiles) void watchFiles(connection);
  if (!profile.tellsFolders) return;
  connection.workspace.onDidChangeWorkspaceFolders(() => {
    void Promise.all([loaded(), connection.workspace.getWorkspaceFolders()]).then(([services, folders]) => {
      services.foldersChanged(folders?.map(({ uri }) => uri) ?? []);
    });
  });
}

function answerRequests(connection: Connection, loaded: () => Promise<Services>): void {
  connection.onDidChangeWatchedFiles(({ changes }) => {
    void loaded().then((services) => {
      services.filesChanged(changes.map(({ uri }) => uri));
    });
  });
  connection.onHover(async (params, token) => (await loaded()).hover(params, token));
  connection.onCompletion(async (params, token) => (await loaded()).completion(params, token));
  connection.onDocumentSymbol(async (params, token) => (await loaded()).documentSymbol(params, token));
  connection.onCodeAction(async (params, token) => (await loaded()).codeAction(params, token));
  connection.onRequest(pictureRequest, async (params: PictureParams, token: CancellationToken) =>
    (await loaded()).picture(params, token),
  );
  connection.onRequest(locateRequest, async (params: LocateParams) => (await loaded()).locate(params));
  connection.onRequest(placeAtRequest, async (params: PlaceAtParams) => (await loaded()).placeAt(params));
  connection.onRequest(countsRequest, async (params: CountsParams) => (await loaded()).counts(params));
}
