/** The extension's entry in a browser's worker host: the server is a worker beside it. */
import * as vscode from 'vscode';
import { LanguageClient } from 'vscode-languageclient/browser';
import { start, type BandkeepApi } from './activation';

/** Called by the editor when a spec is opened or a panel is brought back. */
export function activate(context: vscode.ExtensionContext): BandkeepApi {
  const script = vscode.Uri.joinPath(context.extensionUri, 'dist', 'web', 'server.js').toString(true);
  const startWorker = (): Promise<Worker> => Promise.resolve(new Worker(script, { name: 'Bandkeep language server' }));
  return start(context, (options) => new LanguageClient('bandkeep', 'Bandkeep', startWorker, options));
}
