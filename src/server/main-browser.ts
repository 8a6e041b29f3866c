/** The server's entry in a browser: runs in a worker and speaks to the page that made it. */
import { BrowserMessageReader, BrowserMessageWriter, createConnection } from 'vscode-languageserver/browser';
import { startServer } from './start-server';

/** Set by the bundler from package.json. */
declare const BANDKEEP_VERSION: string;

const turns = new MessageChannel();

startServer(createConnection(new BrowserMessageReader(self), new BrowserMessageWriter(self)), {
  version: BANDKEEP_VERSION,
  loadFile: null,
  now: () => performance.now(),
  yieldControl: () =>
    new Promise((resolve) => {
      turns.port1.addEventListener(
        'message',
        () => {
          resolve();
        },
        { once: true },
      );
      turns.port1.start();
      turns.port2.postMessage(null);
    }),
});
