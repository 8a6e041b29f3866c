/** The commands in the palette and in the editor's title bar. */
import * as vscode from 'vscode';
import { openExample } from './examples';
import type { PanelHost } from './panel/panel-host';
import type { ServerLink } from './server-link';
import { isSpec } from './specs';

/** What the commands act on. */
export interface Parts {
  readonly link: ServerLink;
  readonly panel: PanelHost;
  readonly log: vscode.LogOutputChannel;
}

/** Registers all commands of the manifest. */
export function registerCommands(extensionUri: vscode.Uri, { link, panel, log }: Parts): vscode.Disposable {
  const commands: Record<string, (argument: unknown) => unknown> = {
    'bandkeep.showPanel': (argument) => showPanel(panel, argument),
    'bandkeep.openExample': () => openExample(extensionUri),
    'bandkeep.restartServer': () => link.restart(),
    'bandkeep.showOutput': () => {
      log.show();
    },
  };
  return vscode.Disposable.from(...Object.entries(commands).map(([name, run]) => vscode.commands.registerCommand(name, run)));
}

/** From the title bar the argument is the spec's URI; from the palette there is none. */
async function showPanel(panel: PanelHost, argument: unknown): Promise<void> {
  const active = vscode.window.activeTextEditor?.document;
  const open =
    active === undefined || !isSpec(active) ? vscode.window.visibleTextEditors.map(({ document }) => document) : [active];
  const spec = argument instanceof vscode.Uri ? argument : open.find(isSpec)?.uri;
  if (spec !== undefined) await panel.show(spec);
  else void vscode.window.showInformationMessage('Open a *.bandkeep.yaml file first, or run "Bandkeep: Open an Example".');
}
