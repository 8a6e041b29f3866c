/** Loads a file through the client, where the server itself cannot reach it: in a browser, and in a workspace that is on no disk. */
import type { Connection } from 'vscode-languageserver';
import type { FileContent } from '../language';
import { isReadFileResult } from '../protocol/request-guards';
import { readFileRequest, type ReadFileParams } from '../protocol/requests';
import type { ClientProfile } from './client-profile';
import type { Platform } from './platform';
import type { LoadFile } from './workspace-files';

/** How this server loads files: itself where it can, else through a client that has said that it can. */
export function fileLoader(connection: Connection, profile: ClientProfile, platform: Platform): LoadFile {
  return async (uri, rootUri) => {
    if (platform.loadFile !== null && /^file:/i.test(uri)) return platform.loadFile(uri, rootUri);
    // A spec that has never been saved stands nowhere, so nothing stands beside it.
    const nowhere = !/^[a-z][a-z0-9+.-]*:/i.test(uri) || /^untitled:/i.test(uri);
    return nowhere || !profile.options.readsFiles ? { fault: 'unreadable' } : askClient(connection, { uri });
  };
}

async function askClient(connection: Connection, params: ReadFileParams): Promise<FileContent> {
  try {
    const answer: unknown = await connection.sendRequest(readFileRequest, params);
    return isReadFileResult(answer) ? answer : { fault: 'unreadable' };
  } catch {
    return { fault: 'unreadable' };
  }
}
