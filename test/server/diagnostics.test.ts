/** Diagnostics over the wire: pulled where the client pulls, else sent; never both, and only of the newest version. */
import assert from 'node:assert/strict';
import type { Diagnostic } from 'vscode-languageserver/node';
import { exampleText } from '../support/examples';
import { buildServer, LanguageClient, plainEditor, pullingEditor } from '../support/language-client';
import { passingSpec } from '../support/spec-texts';

const codes = (items: readonly Diagnostic[]): unknown[] => items.map(({ code }) => code);

describe('diagnostics over LSP', () => {
  let server = '';
  let client: LanguageClient;
  before(() => {
    server = buildServer();
  });
  beforeEach(() => {
    client = new LanguageClient(server);
  });
  afterEach(() => client.exit());

  describe('for a client that asks', () => {
    beforeEach(() => client.initialize(pullingEditor, { docsBase: 'file:///docs/findings' }));

    it('mark exactly the values that break the limits of the broken example', async () => {
      const document = await client.open(exampleText('gate-bearing-broken'));
      const items = await client.pull(document);
      const errors = items.filter(({ severity }) => severity === 1);
      assert.deepEqual(codes(errors).sort(), ['alias-over-limit', 'flatness-over-limit']);
      const alias = errors.find(({ code }) => code === 'alias-over-limit');
      assert.ok(alias);
      assert.equal(document.textIn(alias.range), '40 kHz .. 3 MHz');
      assert.equal(alias.source, 'bandkeep');
      assert.deepEqual(alias.codeDescription, { href: 'file:///docs/findings/alias-over-limit.md' });
      const related = alias.relatedInformation?.map(({ location }) => document.textIn(location.range)) ?? [];
      assert.ok(
        related.some((text) => text.includes('-96 dBFS')),
        related.join('\n'),
      );
    });

    it('are empty for a spec that passes', async () => {
      const document = await client.open(passingSpec);
      assert.deepEqual(await client.pull(document), []);
    });

    it('follow an edit, and an edit back', async () => {
      const document = await client.open(passingSpec);
      await document.replace('divide: 384', 'divide: 480');
      assert.deepEqual(codes(await client.pull(document)), ['alias-over-limit']);
      await document.replace('divide: 480', 'divide: 384');
      assert.deepEqual(await client.pull(document), []);
    });

    it('are those of the newest version where edits come faster than questions', async () => {
      const document = await client.open(passingSpec);
      await document.replace('divide: 384', 'divide: 480');
      await document.replace('divide: 480', 'divide: 320');
      await document.replace('bits: 16', 'bits: sixteen');
      const items = await client.pull(document);
      assert.ok(items.length > 0);
      assert.ok(
        items.every(({ range }) => document.textIn(range) === 'sixteen'),
        JSON.stringify(items),
      );
    });

    it('are only named where they have not changed since the last report', async () => {
      const document = await client.open(passingSpec);
      const first = await client.report(document);
      assert.equal(first.kind, 'full');
      const again = await client.report(document, first.resultId);
      assert.deepEqual(again, { kind: 'unchanged', resultId: first.resultId });
      await document.replace('divide: 384', 'divide: 480');
      const changed = await client.report(document, first.resultId);
      assert.equal(changed.kind, 'full');
      assert.notEqual(changed.resultId, first.resultId);
    });

    it('are never sent as well', async () => {
      const document = await client.open(exampleText('gate-bearing-broken'));
      await client.pull(document);
      await document.close();
      await client.report(document);
      assert.deepEqual(client.sentVersions, []);
    });

    it('count characters as UTF-16 does', async () => {
      const document = await client.open(
        passingSpec.replace('name: drive hash', 'name: 𝄞 drive').replace('level: -55', 'level: -5x'),
      );
      const [item] = await client.pull(document);
      assert.ok(item);
      assert.equal(document.textIn(item.range), '-5x dBFS');
    });

    it('stand at the same places with Windows line ends', async () => {
      const document = await client.open(exampleText('gate-bearing-broken').replaceAll('\n', '\r\n'));
      const items = await client.pull(document);
      assert.deepEqual(
        items
          .filter(({ severity }) => severity === 1)
          .map(({ range }) => document.textIn(range))
          .sort(),
        ['0.8 dB', '40 kHz .. 3 MHz'],
      );
    });
  });

  describe('for a client that only takes them', () => {
    beforeEach(() => client.initialize(plainEditor));

    it('are sent with the version they belong to, on opening and after an edit', async () => {
      const document = await client.open(passingSpec);
      assert.deepEqual(await client.sent(document, 1), []);
      await document.replace('divide: 384', 'divide: 480');
      assert.deepEqual(codes(await client.sent(document, 2)), ['alias-over-limit']);
    });

    it('are taken away when the document is closed', async () => {
      const document = await client.open(passingSpec.replace('divide: 384', 'divide: 480'));
      assert.equal((await client.sent(document, 1)).length, 1);
      await document.close();
      assert.deepEqual(await client.sent(document, undefined), []);
    });

    it('bear no link where nobody said where the pages are', async () => {
      const document = await client.open(passingSpec.replace('divide: 384', 'divide: 480'));
      const [item] = await client.sent(document, 1);
      assert.ok(item);
      assert.equal(item.codeDescription, undefined);
    });
  });
});
