/** Specs that lean on other files, over the wire: read from the disk or through the client, and judged anew when one of them changes. */
import assert from 'node:assert/strict';
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { ClientCapabilities, Diagnostic, RegistrationParams } from 'vscode-languageserver/node';
import { buildServer, LanguageClient, plainEditor, pullingEditor, type ClientDocument } from '../support/language-client';

const loud = 'frequency (kHz),level (dBFS)\n20,-70\n100,-40\n1000,-80\n';
const quiet = loud.replaceAll('-', '-1');

const shared = (order: number) => `bandkeep: 1
filters:
  guard: { family: butterworth, order: ${order}, corner: 14 kHz }
`;

const spec = (table = '../tables/hash.csv') => `bandkeep: 1
use: [shared.bandkeep.yaml]
channels:
  x:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: hash, spectrum: ${table} }
    rate: 51.2 kHz
    filter: guard
    limits: { alias: -96 dBFS, flatness: 1 dB }
`;

const watchingEditor: ClientCapabilities = {
  ...pullingEditor,
  workspace: {
    ...pullingEditor.workspace,
    didChangeWatchedFiles: { dynamicRegistration: true },
    diagnostics: { refreshSupport: true },
  },
};

const codes = (items: readonly Diagnostic[]): unknown[] => items.map(({ code }) => code);

const firstMessage = ([first]: readonly Diagnostic[]): string => (typeof first?.message === 'string' ? first.message : '');

describe('files that an open spec names', () => {
  let server = '';
  let folder = '';
  let client: LanguageClient;
  const path = (...steps: string[]): string => join(folder, 'lagoon', ...steps);
  const uri = (...steps: string[]): string => pathToFileURL(path(...steps)).href;
  const put = (text: string, ...steps: string[]): void => {
    writeFileSync(path(...steps), text);
  };
  const change = (...steps: string[]): Promise<void> =>
    client.connection.sendNotification('workspace/didChangeWatchedFiles', { changes: [{ uri: uri(...steps), type: 2 }] });
  const open = (text = spec()): Promise<ClientDocument> => client.open(text, uri('specs', 'a.bandkeep.yaml'));

  before(() => {
    server = buildServer();
  });
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'lagoon files-'));
    for (const below of ['specs', 'tables']) mkdirSync(path(below), { recursive: true });
    put(loud, 'tables', 'hash.csv');
    put(shared(4), 'specs', 'shared.bandkeep.yaml');
    client = new LanguageClient(server);
  });
  afterEach(async () => {
    await client.exit();
    rmSync(folder, { recursive: true });
  });

  describe('for a client that watches files', () => {
    let refreshed = 0;
    let registered: RegistrationParams | null = null;
    beforeEach(async () => {
      refreshed = 0;
      registered = null;
      client.connection.onRequest('client/registerCapability', (params: RegistrationParams) => {
        registered = params;
      });
      client.connection.onRequest('workspace/diagnostic/refresh', () => {
        refreshed += 1;
      });
      await client.initialize(watchingEditor, null, [uri()]);
    });

    it('are read from the disk, in a folder whose name has a space', async () => {
      assert.deepEqual(codes(await client.pull(await open())), ['alias-over-limit']);
    });

    it('are asked to be watched', async () => {
      await client.pull(await open());
      const [registration] = registered?.registrations ?? [];
      assert.equal(registration?.method, 'workspace/didChangeWatchedFiles');
      const globs = JSON.stringify(registration.registerOptions);
      for (const ending of ['bandkeep.{yaml,yml}', 'csv', 's2p']) assert.ok(globs.includes(ending), globs);
    });

    it('are read anew when a table changes on the disk, and the client is asked to look again', async () => {
      const document = await open();
      await client.pull(document);
      put(quiet, 'tables', 'hash.csv');
      await change('tables', 'hash.csv');
      assert.deepEqual(codes(await client.pull(document)), []);
      assert.equal(refreshed, 1);
    });

    it('are told of to a panel that may show what leans on them', async () => {
      await client.exit();
      client = new LanguageClient(server);
      client.connection.onRequest('client/registerCapability', () => undefined);
      client.connection.onRequest('workspace/diagnostic/refresh', () => undefined);
      const told = new Promise((resolve) => {
        client.connection.onNotification('bandkeep/leaningSpecs', resolve);
      });
      await client.initialize(watchingEditor, { readsFiles: true }, [uri()]);
      const document = await open();
      await client.pull(document);
      await change('tables', 'hash.csv');
      assert.deepEqual(await told, { uris: [document.uri] });
    });

    it('are not read again for a change of a file that nothing leans on', async () => {
      const document = await open();
      await client.pull(document);
      put(quiet, 'tables', 'hash.csv');
      await change('tables', 'other.csv');
      assert.deepEqual(codes(await client.pull(document)), ['alias-over-limit']);
      assert.equal(refreshed, 0);
    });

    it('are found once they come, and missed once they go', async () => {
      rmSync(path('tables', 'hash.csv'));
      const document = await open();
      const [missing] = await client.pull(document);
      assert.equal(missing?.code, 'file-not-read');
      assert.equal(document.textIn(missing.range), '../tables/hash.csv');
      put(quiet, 'tables', 'hash.csv');
      await change('tables', 'hash.csv');
      assert.deepEqual(await client.pull(document), []);
    });

    it('that are open count as they stand in the editor, and as on the disk once they are closed', async () => {
      const document = await open();
      await client.pull(document);
      const used = await client.open(shared(4), uri('specs', 'shared.bandkeep.yaml'));
      await used.replace('order: 4', 'order: 8');
      assert.deepEqual(codes(await client.pull(document)), []);
      await used.close();
      assert.deepEqual(codes(await client.pull(document)), ['alias-over-limit']);
    });

    it('are the same ones in the proof of a fix', async () => {
      const document = await open();
      const [alias] = await client.pull(document);
      assert.ok(alias);
      const [fix] = await client.actions(document, alias.range);
      assert.ok(fix);
      await document.apply(fix);
      assert.deepEqual(codes(await client.pull(document)), []);
    });

    it('are refused outside the workspace, links included', async () => {
      writeFileSync(join(folder, 'secret.csv'), loud);
      symlinkSync(join(folder, 'secret.csv'), path('tables', 'way-out.csv'));
      const document = await open(spec('../tables/way-out.csv'));
      assert.match(firstMessage(await client.pull(document)), /`tables\/way-out\.csv`: it lies outside the root/);
      await document.replace('../tables/way-out.csv', '../../secret.csv');
      assert.match(firstMessage(await client.pull(document)), /leads out of the root/);
    });
  });

  it('are looked up afresh with every edit for a client that watches nothing', async () => {
    await client.initialize(pullingEditor, null, [uri()]);
    const document = await open();
    assert.deepEqual(codes(await client.pull(document)), ['alias-over-limit']);
    put(quiet, 'tables', 'hash.csv');
    await document.replace('flatness: 1 dB', 'flatness: 2 dB');
    assert.deepEqual(codes(await client.pull(document)), []);
  });

  it('bring new diagnostics to a client that does not ask for them', async () => {
    await client.initialize(plainEditor, null, [uri()]);
    const document = await open();
    assert.deepEqual(codes(await client.sent(document, 1)), ['alias-over-limit']);
    const next = client.nextSent(document);
    put(quiet, 'tables', 'hash.csv');
    await change('tables', 'hash.csv');
    assert.deepEqual(codes(await next), []);
  });

  it('lie beside the spec or below it where the client has no folders', async () => {
    await client.initialize(pullingEditor);
    put(loud, 'specs', 'hash.csv');
    const document = await open(spec('hash.csv'));
    assert.deepEqual(codes(await client.pull(document)), ['alias-over-limit']);
    await document.replace('hash.csv', '../tables/hash.csv');
    assert.match(firstMessage(await client.pull(document)), /leads out of the root/);
  });

  it('come through a client that offers it where they are on no disk', async () => {
    const asked: string[] = [];
    client.connection.onRequest('bandkeep/readFile', ({ uri: of }: { uri: string }): object => {
      asked.push(of);
      if (of.endsWith('.csv')) return { text: loud };
      return of.endsWith('/shared.bandkeep.yaml') ? { text: shared(4) } : { fault: 'missing' };
    });
    await client.initialize(pullingEditor, { readsFiles: true }, ['lagoon-vfs://quay/north%20basin']);
    const document = await client.open(spec(), 'lagoon-vfs://quay/north%20basin/specs/a.bandkeep.yaml');
    assert.deepEqual(codes(await client.pull(document)), ['alias-over-limit']);
    assert.deepEqual(asked.sort(), [
      'lagoon-vfs://quay/north%20basin/specs/shared.bandkeep.yaml',
      'lagoon-vfs://quay/north%20basin/tables/hash.csv',
    ]);
  });

  it('do not stand beside a spec that has never been saved', async () => {
    client.connection.onRequest('bandkeep/readFile', () => assert.fail('asked for a file'));
    await client.initialize(pullingEditor, { readsFiles: true }, [uri()]);
    const document = await client.open(spec(), 'untitled:Untitled-1');
    assert.match(firstMessage(await client.pull(document)), /`shared\.bandkeep\.yaml`: it cannot be read/);
  });

  it('cannot be read where neither is possible', async () => {
    await client.initialize(pullingEditor, null, ['lagoon-vfs://quay/']);
    const document = await client.open(spec(), 'lagoon-vfs://quay/specs/a.bandkeep.yaml');
    assert.match(firstMessage(await client.pull(document)), /`specs\/shared\.bandkeep\.yaml`: it cannot be read/);
  });
});
