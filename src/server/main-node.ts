/** The server's entry on Node: speaks over standard streams (`--stdio`) or to its parent process (`--node-ipc`). */
import { setImmediate } from 'node:timers';
import { createConnection } from 'vscode-languageserver/node';
import { loadFile } from './node/load-file';
import { startServer } from './start-server';

/** Set by the bundler from package.json. */
declare const BANDKEEP_VERSION: string;

const usage = 'Usage: bandkeep language-server --stdio | --node-ipc\n';

if (process.argv.some((argument) => /^--(stdio|node-ipc|socket|pipe)\b/.test(argument))) {
  startServer(createConnection(), {
    version: BANDKEEP_VERSION,
    loadFile,
    now: () => performance.now(),
    yieldControl: () => new Promise((resolve) => setImmediate(resolve)),
  });
} else {
  process.stderr.write(usage);
  process.exitCode = 2;
}
