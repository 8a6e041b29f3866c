/** What the language client is told, the same in Node and in the browser. */
import * as vscode from 'vscode';
import { RevealOutputChannelOn, type LanguageClientOptions } from 'vscode-languageclient';
import type { ServerOptions } from '../protocol/requests';
import { specSelector } from './specs';

/** Options for a client whose output goes to `output`. */
export function clientOptions(extensionUri: vscode.Uri, output: vscode.LogOutputChannel): LanguageClientOptions {
  const docsBase = vscode.Uri.joinPath(extensionUri, 'docs', 'findings').toString();
  const options: ServerOptions = { docsBase, readsFiles: true };
  return {
    documentSelector: specSelector,
    initializationOptions: options,
    outputChannel: output,
    traceOutputChannel: output,
    revealOutputChannelOn: RevealOutputChannelOn.Never,
    diagnosticPullOptions: { onChange: true, onSave: true, onFocus: false, onTabs: false },
    markdown: { isTrusted: false, supportHtml: false },
  };
}
