/** Requests over the wire: hover, completion, outline, quick fixes, our own ones, and those that make no sense. */
import assert from 'node:assert/strict';
import {
  CancellationToken,
  CancellationTokenSource,
  MarkupContent,
  type CodeAction,
  type CompletionList,
  type DocumentSymbol,
  type Hover,
  type SymbolInformation,
} from 'vscode-languageserver/node';
import type { LocateResult, PictureResult, PlaceAtResult } from '../../src/protocol/requests';
import { exampleText } from '../support/examples';
import { buildServer, LanguageClient, plainEditor, pullingEditor, type ClientDocument } from '../support/language-client';
import { manyChannels, passingSpec } from '../support/spec-texts';

describe('requests over LSP', () => {
  let server = '';
  let client: LanguageClient;
  before(() => {
    server = buildServer();
  });
  beforeEach(async () => {
    client = new LanguageClient(server);
    await client.initialize(pullingEditor);
  });
  afterEach(() => client.exit());

  const hoverOn = (document: ClientDocument, words: string): Promise<Hover | null> =>
    client.request('textDocument/hover', document, { position: document.rangeOf(words).start });

  const markupOf = (hover: Hover | null): MarkupContent => {
    assert.ok(hover && MarkupContent.is(hover.contents));
    return hover.contents;
  };

  it('hover a rate', async () => {
    const document = await client.open(passingSpec);
    const { kind, value } = markupOf(await hoverOn(document, '{ clock: board, divide: 384 }'));
    assert.equal(kind, 'markdown');
    assert.match(value, /^\*\*64 kHz: half rate 32 kHz/);
  });

  it('hover the newest text right after an edit', async () => {
    const document = await client.open(passingSpec);
    await document.replace('divide: 384', 'divide: 320');
    const { value } = markupOf(await hoverOn(document, '{ clock: board, divide: 320 }'));
    assert.match(value, /^\*\*76\.8 kHz/);
  });

  it('hover in plain text for an editor that knows no Markdown', async () => {
    const plain = new LanguageClient(server);
    await plain.initialize(plainEditor);
    const document = await plain.open(passingSpec);
    const hover: Hover | null = await plain.request('textDocument/hover', document, {
      position: document.rangeOf('-3 dBFS').start,
    });
    const { kind, value } = markupOf(hover);
    assert.equal(kind, 'plaintext');
    assert.doesNotMatch(value, /\*\*|\|/);
    await plain.exit();
  });

  it('complete keys that are not there yet', async () => {
    const document = await client.open(passingSpec.replace('    bits: 16\n', '    \n'));
    const { end } = document.rangeOf('    filter: guard\n    ');
    const list: CompletionList = await client.request('textDocument/completion', document, { position: end });
    const labels = list.items.map(({ label }) => label);
    assert.ok(labels.includes('bits'), labels.join(' '));
    assert.ok(!labels.includes('rate'), labels.join(' '));
  });

  it('outline channels and definitions as a tree', async () => {
    const document = await client.open(passingSpec);
    const symbols: DocumentSymbol[] = await client.request('textDocument/documentSymbol', document);
    const channels = symbols.find(({ name }) => name === 'channels')?.children ?? [];
    assert.deepEqual(
      channels.map(({ name }) => name),
      ['bearing'],
    );
    const [channel] = channels;
    assert.ok(channel);
    assert.equal(document.textIn(channel.selectionRange), 'bearing');
  });

  it('outline as a flat list for an editor that knows no tree', async () => {
    const plain = new LanguageClient(server);
    await plain.initialize(plainEditor);
    const document = await plain.open(passingSpec);
    const symbols: SymbolInformation[] = await plain.request('textDocument/documentSymbol', document);
    assert.ok(symbols.some(({ name, containerName }) => name === 'bearing' && containerName === 'channels'));
    await plain.exit();
  });

  it('offer fixes that clear the finding when they are applied', async () => {
    const document = await client.open(exampleText('gate-bearing-broken'));
    for (const code of ['alias-over-limit', 'flatness-over-limit']) {
      const finding = (await client.pull(document)).find((item) => item.code === code);
      if (finding === undefined) continue;
      const [fix] = await client.actions(document, finding.range);
      assert.ok(fix?.isPreferred === true, `no fix for ${code}`);
      await document.apply(fix);
      assert.ok(!(await client.pull(document)).some((item) => item.code === code), `${code} is still there after: ${fix.title}`);
    }
    assert.deepEqual(
      (await client.pull(document)).filter(({ severity }) => severity === 1),
      [],
    );
  });

  it('give a fix the same edit after an edit elsewhere has moved its lines', async () => {
    const document = await client.open(exampleText('gate-bearing-broken'));
    const marked = document.rangeOf('40 kHz .. 3 MHz');
    const [before] = await client.actions(document, marked);
    await document.replace('bandkeep: 1\n', '# A comment.\n\nbandkeep: 1\n');
    const [after] = await client.actions(document, document.rangeOf('40 kHz .. 3 MHz'));
    assert.ok(before && after);
    assert.equal(after.title, before.title);
    await document.apply(after);
    assert.ok(!(await client.pull(document)).some(({ code }) => code === 'alias-over-limit'));
  });

  it('accept a finding by a comment', async () => {
    const document = await client.open(exampleText('gate-bearing-broken'));
    const actions = await client.actions(document, document.rangeOf('40 kHz .. 3 MHz'));
    const accept = actions.find(({ title }) => title.startsWith('Accept'));
    assert.ok(accept);
    await document.apply(accept);
    const items = await client.pull(document);
    assert.ok(!items.some(({ code }) => code === 'alias-over-limit' || code === 'stale-acceptance'), JSON.stringify(items));
  });

  it('offer nothing where only other kinds of action are asked for', async () => {
    const document = await client.open(exampleText('gate-bearing-broken'));
    const whole = { start: { line: 0, character: 0 }, end: { line: 999, character: 0 } };
    assert.deepEqual(await client.actions(document, whole, { only: ['source.organizeImports'] }), []);
  });

  it('draw the channel at the cursor', async () => {
    const document = await client.open(exampleText('gate-bearing'));
    const position = document.rangeOf('bearing-y:').end;
    const result = await client.connection.sendRequest<PictureResult>('bandkeep/picture', {
      uri: document.uri,
      channel: null,
      position,
    });
    assert.ok(result.kind === 'picture');
    assert.equal(result.picture.channel, 'bearing-y');
    assert.equal(result.version, document.version);
  });

  it('say why there is no picture', async () => {
    const document = await client.open(passingSpec.replace('bits: 16', 'bits: sixteen'));
    const result = await client.connection.sendRequest<PictureResult>('bandkeep/picture', {
      uri: document.uri,
      channel: 'bearing',
      position: null,
    });
    assert.ok(result.kind === 'none');
    assert.match(result.reason, /^`bearing` has 1 fault; the first is on line \d+: /);
  });

  it('lead from a place to its line and back', async () => {
    const document = await client.open(passingSpec);
    const place = { channel: 'bearing', path: ['limits', 'alias'] };
    const range = await client.connection.sendRequest<LocateResult>('bandkeep/locate', { uri: document.uri, place });
    assert.ok(range);
    assert.equal(document.textIn(range), '-96 dBFS');
    const back = await client.connection.sendRequest<PlaceAtResult>('bandkeep/placeAt', {
      uri: document.uri,
      position: range.start,
    });
    assert.deepEqual(back, place);
  });

  it('lead nowhere from a place that no longer stands', async () => {
    const document = await client.open(passingSpec);
    const place = { channel: 'gone', path: ['limits', 'alias'] };
    assert.equal(await client.connection.sendRequest('bandkeep/locate', { uri: document.uri, place }), null);
  });

  it('are answered with a refusal where their parameters make no sense', async () => {
    const document = await client.open(passingSpec);
    const textDocument = { uri: document.uri };
    const senseless: [string, object][] = [
      ['textDocument/hover', { textDocument }],
      ['textDocument/hover', { textDocument, position: { line: -1, character: 'x' } }],
      ['textDocument/completion', { position: { line: 0, character: 0 } }],
      ['textDocument/codeAction', { textDocument, range: null }],
      ['textDocument/documentSymbol', {}],
      ['textDocument/diagnostic', {}],
      ['bandkeep/picture', { uri: 3 }],
      ['bandkeep/locate', { uri: document.uri, place: { channel: 'bearing' } }],
      ['bandkeep/placeAt', { uri: document.uri }],
      ['bandkeep/counts', {}],
    ];
    for (const [method, params] of senseless) {
      await assert.rejects(client.connection.sendRequest(method, params), { code: -32602 }, method);
    }
    assert.deepEqual(await client.pull(document), []);
  });

  describe('that take long', () => {
    const broken = manyChannels(4).replaceAll('level: -40 dBFS', 'level: 0 dBFS').replaceAll('alias: -80', 'alias: -140');
    const whole = { start: { line: 0, character: 0 }, end: { line: 1000, character: 0 } };
    const ask = (document: ClientDocument, token?: CancellationToken): Promise<CodeAction[]> => {
      const params = { textDocument: { uri: document.uri }, range: whole, context: { diagnostics: [] } };
      return client.connection.sendRequest('textDocument/codeAction', params, token ?? CancellationToken.None);
    };

    it('are answered with what there is when they are cancelled', async () => {
      const document = await client.open(broken);
      const source = new CancellationTokenSource();
      const asked = ask(document, source.token);
      source.cancel();
      const actions = await asked;
      assert.ok(actions.filter(({ title }) => title.startsWith('Accept')).length >= 4);
    });

    it('are answered with a refusal when the text changes meanwhile', async () => {
      const document = await client.open(broken);
      await client.pull(document);
      const asked = assert.rejects(ask(document), { code: -32801 });
      await document.replace('title: Many gauges', 'title: Four gauges');
      await asked;
      assert.ok((await ask(document)).some(({ isPreferred }) => isPreferred === true));
    });
  });

  it('find nothing in a document that is not open', async () => {
    const document = await client.open(passingSpec);
    await document.close();
    assert.deepEqual(await client.pull(document), []);
    assert.equal(await hoverOn(document, 'bits'), null);
    assert.equal(await client.request('textDocument/documentSymbol', document), null);
    const picture = await client.connection.sendRequest<PictureResult>('bandkeep/picture', {
      uri: document.uri,
      channel: null,
      position: null,
    });
    assert.equal(picture.kind, 'none');
  });

  it('survive notifications that make no sense', async () => {
    await client.connection.sendNotification('textDocument/didChange', { textDocument: {}, contentChanges: 'x' });
    await client.connection.sendNotification('textDocument/didOpen', {});
    const document = await client.open(passingSpec);
    assert.deepEqual(await client.pull(document), []);
  });

  it('take positions beyond the text for its end', async () => {
    const document = await client.open(passingSpec);
    const position = { line: 10_000, character: 10_000 };
    assert.equal(await client.request('textDocument/hover', document, { position }), null);
  });
});
