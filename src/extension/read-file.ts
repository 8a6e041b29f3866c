/** Reads a file for the server where it cannot reach it itself: in a browser, and in a workspace that is on no disk. */
import * as vscode from 'vscode';
import { isRecord, isText } from '../protocol/guards';
import { largestFile, type ReadFileResult } from '../protocol/requests';
import { isSpec } from './specs';

/** The file's text, or why there is none; nothing outside the workspace's folders and those of open specs is read. */
export async function readFile(params: unknown): Promise<ReadFileResult> {
  if (!isRecord(params) || !isText(params['uri'])) return { fault: 'unreadable' };
  const uri = vscode.Uri.parse(params['uri'], true);
  if (!isInReach(uri)) return { fault: 'outside' };
  try {
    const { type, size } = await vscode.workspace.fs.stat(uri);
    if ((type & vscode.FileType.Directory) !== 0) return { fault: 'folder' };
    return size > largestFile ? { fault: 'too-large' } : textOf(await vscode.workspace.fs.readFile(uri));
  } catch (error) {
    const missing = error instanceof vscode.FileSystemError && error.code === 'FileNotFound';
    return { fault: missing ? 'missing' : 'unreadable' };
  }
}

function isInReach(uri: vscode.Uri): boolean {
  if (vscode.workspace.getWorkspaceFolder(uri) !== undefined) return true;
  return vscode.workspace.textDocuments.filter(isSpec).some((document) => {
    const folder = vscode.Uri.joinPath(document.uri, '..').with({ query: '', fragment: '' });
    const below = folder.path.endsWith('/') ? folder.path : `${folder.path}/`;
    return uri.scheme === folder.scheme && uri.authority === folder.authority && uri.path.startsWith(below);
  });
}

function textOf(bytes: Uint8Array): ReadFileResult {
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(bytes) };
  } catch {
    return { fault: 'not-text' };
  }
}
