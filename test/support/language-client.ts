/** A real language client on the other end of the server's standard streams. */
import { spawn, type ChildProcessWithoutNullStreams } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { buildSync } from 'esbuild';
import {
  createProtocolConnection,
  StreamMessageReader,
  StreamMessageWriter,
  type ClientCapabilities,
  type CodeAction,
  type CodeActionContext,
  type Diagnostic,
  type DocumentDiagnosticReport,
  type InitializeResult,
  type ProtocolConnection,
  type PublishDiagnosticsParams,
  type Range,
  type TextEdit,
} from 'vscode-languageserver/node';
import { TextDocument } from 'vscode-languageserver-textdocument';

/** Bundles the server from its source, as the build does, and returns the file; call it in a `before` hook. */
export function buildServer(): string {
  const root = join(__dirname, '..', '..');
  const outfile = join(root, 'out', 'test', 'server.js');
  buildSync({
    entryPoints: [join(root, 'src', 'server', 'main-node.ts')],
    outfile,
    bundle: true,
    platform: 'node',
    format: 'cjs',
    target: 'node20',
    define: { BANDKEEP_VERSION: '"0.0.0-test"' },
    logLevel: 'error',
  });
  return outfile;
}

/** What the workbench says of itself, as far as the server looks at it. */
export const pullingEditor: ClientCapabilities = {
  workspace: { workspaceEdit: { documentChanges: true, snippetEditSupport: true } },
  textDocument: {
    diagnostic: { relatedInformation: true },
    hover: { contentFormat: ['markdown', 'plaintext'] },
    completion: { completionItem: { snippetSupport: true } },
    documentSymbol: { hierarchicalDocumentSymbolSupport: true },
    codeAction: { disabledSupport: true },
  },
};

/** An editor that does not ask for diagnostics and knows little else. */
export const plainEditor: ClientCapabilities = {
  textDocument: { publishDiagnostics: { relatedInformation: true, versionSupport: true } },
};

/** A document that the client keeps and tells the server about. */
export class ClientDocument {
  private current: TextDocument;

  constructor(
    private readonly connection: ProtocolConnection,
    readonly uri: string,
    text: string,
  ) {
    this.current = TextDocument.create(uri, 'bandkeep', 1, text);
  }

  get text(): string {
    return this.current.getText();
  }

  get version(): number {
    return this.current.version;
  }

  /** The range of the `occurrence`-th appearance of some words. */
  rangeOf(words: string, occurrence = 1): Range {
    let at = -1;
    for (let count = 0; count < occurrence; count += 1) {
      at = this.text.indexOf(words, at + 1);
      if (at < 0) throw new Error(`The document does not hold “${words}” ${occurrence} times.`);
    }
    return { start: this.current.positionAt(at), end: this.current.positionAt(at + words.length) };
  }

  textIn(range: Range): string {
    return this.current.getText(range);
  }

  /** Replaces words by others and tells the server by one incremental change. */
  async replace(words: string, by: string, occurrence = 1): Promise<void> {
    await this.change([{ range: this.rangeOf(words, occurrence), newText: by }]);
  }

  /** Applies edits, as an editor does: all of them are meant for the text before them. */
  async change(edits: readonly TextEdit[]): Promise<void> {
    const version = this.version + 1;
    const lastFirst = [...edits].sort((a, b) => this.current.offsetAt(b.range.start) - this.current.offsetAt(a.range.start));
    const contentChanges = lastFirst.map(({ range, newText }) => ({ range, text: newText }));
    this.current = TextDocument.update(this.current, contentChanges, version);
    await this.connection.sendNotification('textDocument/didChange', {
      textDocument: { uri: this.uri, version },
      contentChanges,
    });
  }

  /** Applies a quick fix to this document. */
  async apply(action: CodeAction): Promise<void> {
    const change = action.edit?.documentChanges?.[0];
    const edits = change !== undefined && 'edits' in change ? change.edits : (action.edit?.changes?.[this.uri] ?? []);
    await this.change(
      edits.map((edit) =>
        'snippet' in edit ? { range: edit.range, newText: edit.snippet.value.replace(/\$\{1:([^}]*)\}/, '$1') } : edit,
      ),
    );
  }

  async close(): Promise<void> {
    await this.connection.sendNotification('textDocument/didClose', { textDocument: { uri: this.uri } });
  }
}

/** A running server with a client. */
export class LanguageClient {
  readonly connection: ProtocolConnection;
  /** Everything the server wrote to its error stream. */
  errors = '';
  private readonly process: ChildProcessWithoutNullStreams;
  private readonly published: PublishDiagnosticsParams[] = [];
  private waiting: (() => void)[] = [];

  constructor(serverFile: string) {
    this.process = spawn(process.execPath, [serverFile, '--stdio'], { stdio: 'pipe' });
    this.process.stderr.on('data', (chunk: Buffer) => {
      this.errors += chunk.toString('utf8');
    });
    this.connection = createProtocolConnection(
      new StreamMessageReader(this.process.stdout),
      new StreamMessageWriter(this.process.stdin),
    );
    this.connection.onNotification('textDocument/publishDiagnostics', (params: PublishDiagnosticsParams) => {
      this.published.push(params);
      for (const wake of this.waiting.splice(0)) wake();
    });
    this.connection.listen();
  }

  async initialize(
    capabilities: ClientCapabilities,
    initializationOptions: unknown = null,
    workspaceFolders: readonly string[] = [],
  ): Promise<InitializeResult> {
    const folders = workspaceFolders.map((uri) => ({ uri, name: uri }));
    const params = { processId: process.pid, rootUri: null, capabilities, initializationOptions, workspaceFolders: folders };
    const result: InitializeResult = await this.connection.sendRequest('initialize', params);
    await this.connection.sendNotification('initialized', {});
    return result;
  }

  async open(text: string, uri = 'file:///lagoon/gate.bandkeep.yaml'): Promise<ClientDocument> {
    const textDocument = { uri, languageId: 'bandkeep', version: 1, text };
    await this.connection.sendNotification('textDocument/didOpen', { textDocument });
    return new ClientDocument(this.connection, uri, text);
  }

  /** Asks for anything about a document. */
  request<T>(method: string, document: ClientDocument, more: object = {}): Promise<T> {
    return this.connection.sendRequest(method, { textDocument: { uri: document.uri }, ...more });
  }

  /** Asks for the newest diagnostics. */
  async pull(document: ClientDocument): Promise<Diagnostic[]> {
    const report = await this.report(document);
    if (report.kind !== 'full') throw new Error('The report is not a full one.');
    return report.items;
  }

  report(document: ClientDocument, previousResultId?: string): Promise<DocumentDiagnosticReport> {
    return this.request('textDocument/diagnostic', document, previousResultId === undefined ? {} : { previousResultId });
  }

  /** The diagnostics that the server sends for a version, or those that clear a closed document (`undefined`). */
  async sent(document: ClientDocument, version: number | undefined): Promise<Diagnostic[]> {
    for (;;) {
      const found = this.published.find((params) => params.uri === document.uri && params.version === version);
      if (found !== undefined) return found.diagnostics;
      await new Promise<void>((resolve) => this.waiting.push(resolve));
    }
  }

  /** The next diagnostics that the server sends for a document, whatever its version. */
  async nextSent(document: ClientDocument): Promise<Diagnostic[]> {
    const before = this.published.length;
    for (;;) {
      const found = this.published.slice(before).find((params) => params.uri === document.uri);
      if (found !== undefined) return found.diagnostics;
      await new Promise<void>((resolve) => this.waiting.push(resolve));
    }
  }

  /** All versions whose diagnostics were sent so far. */
  get sentVersions(): readonly (number | undefined)[] {
    return this.published.map(({ version }) => version);
  }

  actions(document: ClientDocument, range: Range, context: Partial<CodeActionContext> = {}): Promise<CodeAction[]> {
    return this.request('textDocument/codeAction', document, { range, context: { diagnostics: [], ...context } });
  }

  /** Ends the server in the proper order and gives its exit code. */
  async stop(): Promise<number | null> {
    await this.connection.sendRequest('shutdown');
    return this.exit();
  }

  /** Tells the server to go, whatever it is doing, and gives its exit code. */
  async exit(): Promise<number | null> {
    if (this.process.exitCode !== null) return this.process.exitCode;
    const exited = once(this.process, 'exit') as Promise<[number | null]>;
    await this.connection.sendNotification('exit');
    const [code] = await exited;
    this.connection.dispose();
    return code;
  }
}
