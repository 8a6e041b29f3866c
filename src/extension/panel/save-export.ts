/** Saves what the page exports, wherever the workspace's files are. */
import * as vscode from 'vscode';
import { exportBytes, exportFilters, exportName, type SaveMessage } from './export-file';

/** Asks where, beside the spec unless told otherwise, and writes. */
export async function saveExport(message: SaveMessage, spec: vscode.Uri): Promise<void> {
  const folder = spec.scheme === 'untitled' ? vscode.workspace.workspaceFolders?.[0]?.uri : vscode.Uri.joinPath(spec, '..');
  const proposed = folder === undefined ? {} : { defaultUri: vscode.Uri.joinPath(folder, exportName(message)) };
  const target = await vscode.window.showSaveDialog({ ...proposed, filters: exportFilters[message.format] });
  if (target !== undefined) await vscode.workspace.fs.writeFile(target, exportBytes(message));
}
