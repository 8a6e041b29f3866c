/** What an edit costs, as counts of work: one slice is re-read and one channel re-analysed, however long the file is. */
import assert from 'node:assert/strict';
import type { CountsResult } from '../../src/protocol/requests';
import { buildServer, LanguageClient, pullingEditor, type ClientDocument } from '../support/language-client';
import { manyChannels } from '../support/spec-texts';

const channels = 1000;

describe('the work of an edit in a file of a thousand channels', () => {
  let client: LanguageClient;
  let document: ClientDocument;
  const counts = (): Promise<CountsResult> => client.connection.sendRequest('bandkeep/counts', { uri: document.uri });

  before(async () => {
    client = new LanguageClient(buildServer());
    await client.initialize(pullingEditor);
    document = await client.open(manyChannels(channels));
    await client.pull(document);
  });
  after(() => client.exit());

  it('is, on opening, every channel once', async () => {
    const first = await counts();
    assert.equal(first?.channels, channels);
    assert.equal(first.channelsAnalysed, channels);
    assert.equal(first.slicesRead, first.slices);
  });

  it('is one slice and one channel for an edit of one value', async () => {
    await document.replace('alias: -80 dBFS', 'alias: -81 dBFS', 500);
    await client.pull(document);
    const { version, slicesRead, channelsResolved, channelsAnalysed } = (await counts()) ?? {};
    assert.deepEqual(
      { version, slicesRead, channelsResolved, channelsAnalysed },
      { version: 2, slicesRead: 1, channelsResolved: 1, channelsAnalysed: 1 },
    );
  });

  it('is one slice and one channel for an edit that moves all lines below', async () => {
    await document.replace('    bits: 16\n', '    # What the card has.\n    bits: 16\n', 3);
    await client.pull(document);
    const { slicesRead, channelsAnalysed } = (await counts()) ?? {};
    assert.deepEqual({ slicesRead, channelsAnalysed }, { slicesRead: 1, channelsAnalysed: 1 });
  });

  it('is no channel for an edit of the title', async () => {
    await document.replace('title: Many gauges', 'title: A thousand gauges');
    await client.pull(document);
    const { slicesRead, channelsAnalysed } = (await counts()) ?? {};
    assert.deepEqual({ slicesRead, channelsAnalysed }, { slicesRead: 1, channelsAnalysed: 0 });
  });

  it('is one slice and no other channel for a fault that breaks one channel', async () => {
    await document.replace('direction: capture', 'direction: "capture', 700);
    const items = await client.pull(document);
    const { slicesRead, channelsAnalysed } = (await counts()) ?? {};
    assert.deepEqual({ slicesRead, channelsAnalysed }, { slicesRead: 1, channelsAnalysed: 0 });
    assert.ok(items.length > 0);
  });
});
