/** What happens when the extension wakes up, the same in Node and in the browser: the server starts, the panel and the commands are ready. */
import * as vscode from 'vscode';
import type { BaseLanguageClient, LanguageClientOptions } from 'vscode-languageclient';
import { clientOptions } from './client-options';
import { registerCommands } from './commands';
import { PanelHost, type Drawn } from './panel/panel-host';
import { keptSubject } from './panel/subject';
import { drawWhenNeeded } from './panel/when-to-draw';
import { viewType } from './panel/page';
import { ServerLink } from './server-link';
import { showStatus } from './status';

/** Makes the language client; how its server runs differs between Node and the browser. */
export type MakeClient = (options: LanguageClientOptions) => BaseLanguageClient;

/** What other extensions, and our own tests, can learn. */
export interface BandkeepApi {
  /** Fires when the panel has painted a picture. */
  readonly onDidDraw: vscode.Event<Drawn>;
  /** Fires with the reason when there is no picture of the newest text. */
  readonly onDidGoStale: vscode.Event<string>;
  /** Why the panel's picture is not of the newest text; null where it is. */
  staleReason(): string | null;
}

/** Starts everything and hands it to the context, which ends it. */
export function start(context: vscode.ExtensionContext, makeClient: MakeClient): BandkeepApi {
  const log = vscode.window.createOutputChannel('Bandkeep', { log: true });
  const link = new ServerLink(makeClient(clientOptions(context.extensionUri, log)));
  const panel = new PanelHost(context.extensionUri, link, log);
  context.subscriptions.push(
    log,
    link,
    panel,
    showStatus(link),
    registerCommands(context.extensionUri, { link, panel, log }),
    vscode.window.registerWebviewPanelSerializer(viewType, {
      deserializeWebviewPanel: (view, state: unknown) => panel.revive(view, keptSubject(state)),
    }),
    drawWhenNeeded(panel, link, log),
  );
  link.start().catch((error: unknown) => {
    log.error(`The language server did not start: ${String(error)}`);
  });
  return { onDidDraw: panel.onDidDraw, onDidGoStale: panel.onDidGoStale, staleReason: () => panel.staleReason };
}
