/** The editor as the suite uses it: a spec of its own to work on, and waiting for what the extension will do, without clocks. */
import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import type { BandkeepApi } from '../../../src/extension/activation';

/** The extension under test, awake. */
export async function awake(): Promise<BandkeepApi> {
  const extension = vscode.extensions.getExtension<BandkeepApi>('bandkeep.bandkeep');
  assert.ok(extension !== undefined, 'the extension is not installed');
  return extension.activate();
}

/** A fresh copy of an example under a name of its own, in the workspace, shown in the first column. */
export async function openCopy(example: string, name: string): Promise<vscode.TextDocument> {
  const folder = vscode.workspace.workspaceFolders?.[0]?.uri;
  assert.ok(folder !== undefined, 'no folder is open');
  const copy = vscode.Uri.joinPath(folder, `${name}.bandkeep.yaml`);
  await vscode.workspace.fs.copy(vscode.Uri.joinPath(folder, `${example}.bandkeep.yaml`), copy, { overwrite: true });
  const document = await vscode.workspace.openTextDocument(copy);
  await vscode.window.showTextDocument(document, { viewColumn: vscode.ViewColumn.One });
  return document;
}

/** The next value of an event that fits; what is thrown away until then is of no interest. */
export function next<T>(event: vscode.Event<T>, fits: (value: T) => boolean = () => true): Promise<T> {
  return new Promise((resolve) => {
    const listener = event((value) => {
      if (!fits(value)) return;
      listener.dispose();
      resolve(value);
    });
  });
}

/** A spec's diagnostics as soon as they are as wanted. */
export async function diagnosticsOnce(
  { uri }: vscode.TextDocument,
  fits: (codes: readonly string[]) => boolean,
): Promise<readonly vscode.Diagnostic[]> {
  for (;;) {
    const found = vscode.languages.getDiagnostics(uri);
    if (fits(found.map(codeOf))) return found;
    await next(vscode.languages.onDidChangeDiagnostics, ({ uris }) =>
      uris.some((changed) => changed.toString() === uri.toString()),
    );
  }
}

/** A diagnostic's finding code. */
export function codeOf({ code }: vscode.Diagnostic): string {
  return typeof code === 'object' ? String(code.value) : String(code);
}

/** Replaces the first occurrence of a text in a spec, as typing would. */
export async function replace(document: vscode.TextDocument, from: string, to: string): Promise<void> {
  const start = document.getText().indexOf(from);
  assert.ok(start >= 0, `"${from}" is not in the spec`);
  const edit = new vscode.WorkspaceEdit();
  edit.replace(document.uri, new vscode.Range(document.positionAt(start), document.positionAt(start + from.length)), to);
  assert.ok(await vscode.workspace.applyEdit(edit));
}

/** The position of a text in a spec, one character in. */
export function positionOf(document: vscode.TextDocument, text: string): vscode.Position {
  const start = document.getText().indexOf(text);
  assert.ok(start >= 0, `"${text}" is not in the spec`);
  return document.positionAt(start + 1);
}
