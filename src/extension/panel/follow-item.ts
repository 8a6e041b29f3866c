/** Takes the reader from an item of the panel to its line in the spec. */
import * as vscode from 'vscode';
import type { PlaceName } from '../../protocol/position';
import type { ServerLink } from '../server-link';

/** Selects the place in the editor that shows the spec; says so where the place is gone. */
export async function followItem(link: ServerLink, spec: vscode.Uri, place: PlaceName): Promise<void> {
  const document = await vscode.workspace.openTextDocument(spec);
  const range = await link.locate({ uri: spec.toString(), place });
  if (range === null) {
    void vscode.window.setStatusBarMessage('Bandkeep: this no longer stands in the spec.', 5000);
    return;
  }
  const { start, end } = range;
  const selection = new vscode.Range(start.line, start.character, end.line, end.character);
  await vscode.window.showTextDocument(document, { viewColumn: columnOf(spec), selection });
}

/** The column in which the spec is open, in front or behind; else the first. */
function columnOf(spec: vscode.Uri): vscode.ViewColumn {
  const uri = spec.toString();
  const visible = vscode.window.visibleTextEditors.find((editor) => editor.document.uri.toString() === uri);
  if (visible?.viewColumn !== undefined) return visible.viewColumn;
  const group = vscode.window.tabGroups.all.find((candidate) =>
    candidate.tabs.some(({ input }) => input instanceof vscode.TabInputText && input.uri.toString() === uri),
  );
  return group?.viewColumn ?? vscode.ViewColumn.One;
}
