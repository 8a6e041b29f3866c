/** The extension's entry on the desktop and in a remote host: the server is a process of its own, spoken to over IPC. */
import * as vscode from 'vscode';
import { LanguageClient, TransportKind } from 'vscode-languageclient/node';
import { start, type BandkeepApi } from './activation';

/** Called by the editor when a spec is opened or a panel is brought back. */
export function activate(context: vscode.ExtensionContext): BandkeepApi {
  const module = vscode.Uri.joinPath(context.extensionUri, 'dist', 'server.js').fsPath;
  const server = { module, transport: TransportKind.ipc };
  return start(context, (options) => new LanguageClient('bandkeep', 'Bandkeep', server, options));
}
