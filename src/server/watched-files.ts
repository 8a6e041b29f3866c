/** Asks the client to tell of every file that a spec may lean on. */
import { DidChangeWatchedFilesNotification, type Connection } from 'vscode-languageserver';

/** Other specs, and what tables are usually called; a table with another ending is read when the spec that names it changes. */
const patterns = ['**/*.bandkeep.{yaml,yml}', '**/*.{csv,CSV,tsv,txt,s2p,S2P}'];

/** Registers the patterns; a client that cannot do so is not asked. */
export async function watchFiles(connection: Connection): Promise<void> {
  const watchers = patterns.map((globPattern) => ({ globPattern }));
  await connection.client.register(DidChangeWatchedFilesNotification.type, { watchers });
}
