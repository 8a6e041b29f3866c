/** Which documents are specs of ours. */
import type * as vscode from 'vscode';

/** The language's id. */
export const languageId = 'bandkeep';

// Named one by one, so that the old side of a comparison and other people's virtual documents stay out of the Problems view.
const schemes = ['file', 'untitled', 'vscode-remote', 'vscode-vfs', 'vscode-userdata'];

/** The documents that the language server answers for. */
export const specSelector = schemes.map((scheme) => ({ language: languageId, scheme }));

/** Whether a document is a spec that the server knows. */
export function isSpec(document: vscode.TextDocument): boolean {
  return document.languageId === languageId && schemes.includes(document.uri.scheme);
}
