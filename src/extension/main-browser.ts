/** The extension's entry in a browser's worker host: the server is a worker beside it. */
import * as vscode from 'vscode';
import {
  BrowserMessageReader,
  BrowserMessageWriter,
  LanguageClient,
  type MessageTransports,
} from 'vscode-languageclient/browser';
import { start, type BandkeepApi } from './activation';

/** Called by the editor when a spec is opened or a panel is brought back. */
export function activate(context: vscode.ExtensionContext): BandkeepApi {
  const script = vscode.Uri.joinPath(context.extensionUri, 'dist', 'web', 'server.js').toString(true);
  const workers = new WorkerSeat(script);
  context.subscriptions.push(workers);
  return start(context, (options) => new LanguageClient('bandkeep', 'Bandkeep', () => workers.renew(), options));
}

/** Holds the one worker that is the server; a restart puts a new one in its place. */
class WorkerSeat implements vscode.Disposable {
  private worker: Worker | null = null;

  constructor(private readonly script: string) {}

  // The client takes a worker only by its class, which the host has wrapped; so it gets the two ends of the line instead.
  renew(): Promise<MessageTransports> {
    this.dispose();
    this.worker = new Worker(this.script, { name: 'Bandkeep language server' });
    return Promise.resolve({ reader: new BrowserMessageReader(this.worker), writer: new BrowserMessageWriter(this.worker) });
  }

  dispose(): void {
    this.worker?.terminate();
    this.worker = null;
  }
}
