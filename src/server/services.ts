/** All that needs the layers of the spec itself; loaded behind the answer to `initialize`, so that this comes at once. */
import type { Connection } from 'vscode-languageserver';
import type { LiveSpec } from '../language';
import type { ClientProfile } from './client-profile';
import { clear, diagnosticAnswers, push, type DiagnosticAnswers } from './diagnostic-reports';
import { leaningNotification, type LeaningParams } from '../protocol/requests';
import { fileLoader } from './client-files';
import { editorAnswers, type EditorAnswers } from './editor-requests';
import { createOpenSpecs } from './open-specs';
import { ownAnswers, type OwnAnswers } from './own-requests';
import type { Platform } from './platform';
import { Proofs } from './proofs';
import { WorkspaceFiles } from './workspace-files';

/** What a server does for an open spec. */
export interface Services extends EditorAnswers, OwnAnswers, DiagnosticAnswers {
  /** Takes a document that was opened or has a newer text. */
  changed(uri: string, version: number, text: string): void;
  closed(uri: string): void;
  /** Takes note of files that have changed, come or gone. */
  filesChanged(uris: readonly string[]): void;
  /** Takes the folders that the workspace has now. */
  foldersChanged(folders: readonly string[]): void;
}

/** The services for one client. */
export function createServices(connection: Connection, profile: ClientProfile, platform: Platform): Services {
  const report = (fault: unknown): void => {
    connection.console.error(fault instanceof Error ? (fault.stack ?? fault.message) : String(fault));
  };
  const files = new WorkspaceFiles(fileLoader(connection, profile, platform), profile.folders);
  const specs = createOpenSpecs(platform, files);
  const state = { profile, specs, proofs: new Proofs(specs, platform, report) };
  const refresh = (affected: readonly LiveSpec[]): void => {
    for (const { uri } of affected) {
      specs.refresh(uri);
      if (!profile.pullsDiagnostics) push(connection, state, uri).catch(report);
    }
    if (affected.length > 0 && profile.pullsDiagnostics && profile.refreshesDiagnostics)
      connection.languages.diagnostics.refresh().catch(report);
  };
  const tell = (uris: readonly string[]): void => {
    const params: LeaningParams = { uris };
    connection.sendNotification(leaningNotification, params).catch(report);
  };
  const usersOf = (uris: readonly string[]): readonly LiveSpec[] =>
    specs.all().filter(({ uri, paths }) => files.leansOn(uri, paths, uris));
  return {
    ...editorAnswers(state),
    ...ownAnswers(state),
    ...diagnosticAnswers(state),
    changed(uri, version, text) {
      files.setOpen(uri, text);
      if (!profile.watchesFiles) files.forgetPaths(uri, specs.get(uri)?.paths ?? []);
      specs.change(uri, version, text);
      refresh(usersOf([uri]));
      if (!profile.pullsDiagnostics) push(connection, state, uri).catch(report);
    },
    closed(uri) {
      files.setOpen(uri, null);
      specs.close(uri);
      files.keepOnly(specs.all());
      refresh(usersOf([uri]));
      if (!profile.pullsDiagnostics) clear(connection, uri).catch(report);
    },
    filesChanged(uris) {
      files.forget(uris);
      const affected = usersOf(uris);
      refresh(affected);
      if (affected.length > 0 && profile.options.readsFiles) tell(affected.map(({ uri }) => uri));
    },
    foldersChanged(folders) {
      files.setFolders(folders);
      refresh(specs.all());
    },
  };
}
