/** Diagnostics on their way to the client: asked for where it asks, else sent, never both; of the newest version only, with no timer. */
import {
  DocumentDiagnosticReportKind,
  type CancellationToken,
  type Connection,
  type Diagnostic,
  type DocumentDiagnosticParams,
  type DocumentDiagnosticReport,
} from 'vscode-languageserver';
import { diagnostics, type SpecDocument } from '../language';
import { isAboutDocument } from '../protocol/request-guards';
import { check, refuseIfCancelled } from './answers';
import type { ServerState } from './server-state';

/** Answers `textDocument/diagnostic`. */
export interface DiagnosticAnswers {
  /** A report that has not changed since the client's last is only named. */
  diagnostic(params: DocumentDiagnosticParams, token: CancellationToken): Promise<DocumentDiagnosticReport>;
}

/** The answers of one server. */
export function diagnosticAnswers(state: ServerState): DiagnosticAnswers {
  const reports = createReports();
  return {
    async diagnostic(params, token) {
      const { textDocument, previousResultId } = check(params, isAboutDocument);
      const document = await state.specs.judged(textDocument.uri);
      refuseIfCancelled(token);
      if (document === null) return { kind: DocumentDiagnosticReportKind.Full, items: [] };
      state.proofs.wake();
      return reports.reportOf(document, itemsOf(document, state), previousResultId);
    },
  };
}

/** Sends the newest version's diagnostics, unless a newer one has come meanwhile: that one sends its own. */
export async function push(connection: Connection, state: ServerState, uri: string): Promise<void> {
  const version = state.specs.get(uri)?.version;
  const document = await state.specs.judged(uri);
  if (document?.version !== version || document === null) return;
  await connection.sendDiagnostics({ uri, version: document.version, diagnostics: itemsOf(document, state) });
  state.proofs.wake();
}

/** Takes a closed document's diagnostics away; the server owns what it has sent. */
export async function clear(connection: Connection, uri: string): Promise<void> {
  await connection.sendDiagnostics({ uri, diagnostics: [] });
}

function itemsOf(document: SpecDocument, { profile }: ServerState): Diagnostic[] {
  return diagnostics(document, { abilities: profile.abilities, docsBase: profile.options.docsBase });
}

interface Reports {
  reportOf(document: SpecDocument, items: Diagnostic[], previousId: string | undefined): DocumentDiagnosticReport;
}

/** Numbers the reports; the same items for the same document keep their number. */
function createReports(): Reports {
  const last = new Map<string, { readonly id: string; readonly items: string }>();
  let count = 0;
  return {
    reportOf({ uri }, items, previousId) {
      const text = JSON.stringify(items);
      const before = last.get(uri);
      const report = before?.items === text ? before : { id: String((count += 1)), items: text };
      last.set(uri, report);
      return report.id === previousId
        ? { kind: DocumentDiagnosticReportKind.Unchanged, resultId: report.id }
        : { kind: DocumentDiagnosticReportKind.Full, resultId: report.id, items };
    },
  };
}
