/** One entry in the editor's language status: whether the server runs, with the way to its output or to a new start. */
import * as vscode from 'vscode';
import type { ServerLink, ServerState } from './server-link';
import { specSelector } from './specs';

/** Shows the server's state for as long as the extension runs. */
export function showStatus(link: ServerLink): vscode.Disposable {
  const item = vscode.languages.createLanguageStatusItem('bandkeep.server', specSelector);
  item.name = 'Bandkeep';
  const show = (state: ServerState): void => {
    item.busy = state === 'starting';
    item.text = texts[state];
    item.severity = state === 'stopped' ? vscode.LanguageStatusSeverity.Error : vscode.LanguageStatusSeverity.Information;
    item.command =
      state === 'stopped'
        ? { command: 'bandkeep.restartServer', title: 'Restart Server' }
        : { command: 'bandkeep.showOutput', title: 'Show Output' };
  };
  show(link.state);
  return vscode.Disposable.from(item, link.onDidChangeState(show));
}

const texts: Record<ServerState, string> = {
  starting: 'Bandkeep is starting',
  ready: 'Bandkeep judges as you type',
  stopped: 'Bandkeep has stopped',
};
