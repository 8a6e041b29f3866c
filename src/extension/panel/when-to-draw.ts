/** Ties the panel to what happens in the editor: saves, typing, the cursor, another spec coming to the front, a new server. */
import * as vscode from 'vscode';
import type { ServerLink } from '../server-link';
import { panelSettings } from '../settings';
import { isSpec } from '../specs';
import type { PanelHost } from './panel-host';

/** Subscribes the panel to the editor's events. */
export function drawWhenNeeded(panel: PanelHost, link: ServerLink, log: vscode.LogOutputChannel): vscode.Disposable {
  const shows = (document: vscode.TextDocument): boolean => panel.spec?.toString() === document.uri.toString();
  const done = (work: Promise<void>): void => {
    work.catch((error: unknown) => {
      log.error(`The panel could not follow: ${String(error)}`);
    });
  };
  const opened = new Set<string>();
  const front = (editor: vscode.TextEditor | undefined): void => {
    if (editor === undefined || !isSpec(editor.document)) return;
    const { uri } = editor.document;
    if (panel.spec !== null) done(panel.follow(uri));
    // Once for each spec, so that a panel that was closed stays closed.
    else if (panelSettings().openAutomatically && !opened.has(uri.toString())) done(panel.show(uri));
    opened.add(uri.toString());
  };
  front(vscode.window.activeTextEditor);
  return vscode.Disposable.from(
    vscode.window.onDidChangeActiveTextEditor(front),
    vscode.workspace.onDidSaveTextDocument((document) => {
      if (shows(document)) done(panel.redraw());
    }),
    vscode.workspace.onDidChangeTextDocument(({ document }) => {
      if (shows(document) && panelSettings().redraw === 'onType') done(panel.redraw());
    }),
    vscode.window.onDidChangeTextEditorSelection(({ textEditor }) => {
      if (shows(textEditor.document)) done(panel.followCursor());
    }),
    link.onDidChangeFiles((uris) => {
      if (panel.spec !== null && uris.includes(panel.spec.toString())) done(panel.redraw());
    }),
    link.onDidChangeState((state) => {
      if (state === 'ready' && panel.spec !== null) done(panel.redraw());
    }),
  );
}
