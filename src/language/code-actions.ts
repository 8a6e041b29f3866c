/** The changes an editor offers at a finding: proved fixes, cures of a fault of the text, and accepting it. */
import { CodeActionKind, type CodeAction, type Diagnostic, type Range, type WorkspaceEdit } from 'vscode-languageserver-types';
import type { Finding } from '../findings';
import type { Edit } from '../spec';
import { acceptanceEdit, isAcceptable } from './acceptance';
import { diagnosticOf, type DiagnosticOptions } from './diagnostics';
import type { SpecDocument } from './spec-document';
import { textCuresOf } from './text-cures';
import { findingsIn, offsetOf, rangeOf } from './text-range';

/** What was asked for. */
export interface ActionQuestion {
  readonly range: Range;
  /** Only actions of these kinds and their sub-kinds; null: any. */
  readonly only: readonly string[] | null;
  /** Whether the user opened the menu, and so wants to know why there is nothing in it. */
  readonly invoked: boolean;
}

/** All actions for the findings that touch the range: of each finding its fixes, cheapest first, then accepting it. */
export function codeActions(document: SpecDocument, question: ActionQuestion, options: DiagnosticOptions): CodeAction[] {
  if (!asksForQuickFixes(question.only)) return [];
  const { reading, judgement } = document;
  const span = { start: offsetOf(reading, question.range.start), end: offsetOf(reading, question.range.end) };
  const here = findingsIn(reading, judgement.findings, span).filter((finding) => finding.accepted === null);
  const offers = here.map((finding) => ({ finding, diagnostic: diagnosticOf(document, finding, options) }));
  return [
    ...offers.flatMap(({ finding, diagnostic }) => fixesOf(document, finding, diagnostic, options)),
    ...(question.invoked && options.abilities.disabledActions
      ? offers.flatMap(({ finding, diagnostic }) => hindrancesOf(document, finding, diagnostic))
      : []),
    ...offers.flatMap(({ finding, diagnostic }) => acceptancesOf(document, finding, diagnostic, options)),
  ];
}

/** Whether there is anything of ours among the kinds asked for: a kind stands for all its sub-kinds, the empty one for every kind. */
export function asksForQuickFixes(only: readonly string[] | null): boolean {
  return only === null || only.includes('') || only.includes(CodeActionKind.QuickFix);
}

function fixesOf(document: SpecDocument, finding: Finding, diagnostic: Diagnostic, options: DiagnosticOptions): CodeAction[] {
  const proved = document.cureOf(finding)?.fixes ?? [];
  return [
    ...proved.map((fix, index) => ({
      ...action(document, fix.title, fix.edits, diagnostic, options),
      ...(index === 0 ? { isPreferred: true } : {}),
    })),
    ...textCuresOf(document.reading, finding).map((cure) => action(document, cure.title, cure.edits, diagnostic, options)),
  ];
}

/** Why a finding has no fix, as an entry that cannot be chosen. */
function hindrancesOf(document: SpecDocument, finding: Finding, diagnostic: Diagnostic): CodeAction[] {
  const cure = document.cureOf(finding);
  if (cure === null || cure.fixes.length > 0) return [];
  const reason = cure.note ?? 'No single change of rate, order or corner, and no two of them, makes this channel pass.';
  return [
    {
      title: `No simple change cures \`${finding.code}\``,
      kind: CodeActionKind.QuickFix,
      diagnostics: [diagnostic],
      disabled: { reason },
    },
  ];
}

function acceptancesOf(
  document: SpecDocument,
  finding: Finding,
  diagnostic: Diagnostic,
  options: DiagnosticOptions,
): CodeAction[] {
  if (!isAcceptable(finding)) return [];
  const accept = acceptanceEdit(document.reading, finding);
  const title = `Accept this finding (\`${finding.code}\`)`;
  if (!options.abilities.snippetEdits) {
    return [action(document, title, [{ span: accept.span, newText: accept.newText }], diagnostic, options)];
  }
  const range = rangeOf(document.reading, accept.span);
  const edit: WorkspaceEdit = {
    documentChanges: [
      {
        textDocument: { uri: document.uri, version: document.version },
        edits: [{ range, snippet: { kind: 'snippet', value: accept.snippet } }],
      },
    ],
  };
  return [{ title, kind: CodeActionKind.QuickFix, diagnostics: [diagnostic], edit }];
}

function action(
  document: SpecDocument,
  title: string,
  edits: readonly Edit[],
  diagnostic: Diagnostic,
  options: DiagnosticOptions,
): CodeAction {
  const changes = edits.map((edit) => ({ range: rangeOf(document.reading, edit.span), newText: edit.newText }));
  const edit: WorkspaceEdit = options.abilities.versionedEdits
    ? { documentChanges: [{ textDocument: { uri: document.uri, version: document.version }, edits: changes }] }
    : { changes: { [document.uri]: changes } };
  return { title, kind: CodeActionKind.QuickFix, diagnostics: [diagnostic], edit };
}
