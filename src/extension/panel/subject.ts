/** What the panel is about: a spec, and the channel that it shows or is held to. */
import * as vscode from 'vscode';
import { isRecord, isText } from '../../protocol/guards';
import type { Position } from '../../protocol/position';

/** The panel's subject; a new object whenever another spec takes its place. */
export interface Subject {
  readonly spec: vscode.Uri;
  /** The channel that the reader holds; null: the panel follows the cursor. */
  pinned: string | null;
  /** The channel shown last; null before the first picture. */
  shown: string | null;
}

/** The subject of a spec that comes to the front. */
export function subjectOf(spec: vscode.Uri): Subject {
  return { spec, pinned: null, shown: null };
}

/** The subject that a page kept over a reload; null where it kept none, or nonsense. */
export function keptSubject(state: unknown): Subject | null {
  if (!isRecord(state) || !isText(state['uri'])) return null;
  const channel = isText(state['channel']) ? state['channel'] : null;
  return { spec: vscode.Uri.parse(state['uri']), shown: channel, pinned: state['pinned'] === true ? channel : null };
}

/** Where the cursor stands in a spec; null where no visible editor has it. */
export function cursorIn(spec: vscode.Uri): Position | null {
  const uri = spec.toString();
  const active = vscode.window.activeTextEditor;
  const editors = active === undefined ? vscode.window.visibleTextEditors : [active, ...vscode.window.visibleTextEditors];
  const editor = editors.find((candidate) => candidate.document.uri.toString() === uri);
  if (editor === undefined) return null;
  const { line, character } = editor.selection.active;
  return { line, character };
}
