/** All that needs the layers of the spec itself; loaded behind the answer to `initialize`, so that this comes at once. */
import type { Connection } from 'vscode-languageserver';
import type { ClientProfile } from './client-profile';
import { clear, diagnosticAnswers, push, type DiagnosticAnswers } from './diagnostic-reports';
import { editorAnswers, type EditorAnswers } from './editor-requests';
import { createOpenSpecs } from './open-specs';
import { ownAnswers, type OwnAnswers } from './own-requests';
import type { Platform } from './platform';
import { Proofs } from './proofs';

/** What a server does for an open spec. */
export interface Services extends EditorAnswers, OwnAnswers, DiagnosticAnswers {
  /** Takes a document that was opened or has a newer text. */
  changed(uri: string, version: number, text: string): void;
  closed(uri: string): void;
}

/** The services for one client. */
export function createServices(connection: Connection, profile: ClientProfile, platform: Platform): Services {
  const report = (fault: unknown): void => {
    connection.console.error(fault instanceof Error ? (fault.stack ?? fault.message) : String(fault));
  };
  const specs = createOpenSpecs(platform);
  const state = { profile, specs, proofs: new Proofs(specs, platform, report) };
  return {
    ...editorAnswers(state),
    ...ownAnswers(state),
    ...diagnosticAnswers(state),
    changed(uri, version, text) {
      specs.change(uri, version, text);
      if (!profile.pullsDiagnostics) push(connection, state, uri).catch(report);
    },
    closed(uri) {
      specs.close(uri);
      if (!profile.pullsDiagnostics) clear(connection, uri).catch(report);
    },
  };
}
