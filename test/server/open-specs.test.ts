/** The open specs: judged in their newest version and no other, whoever asks and whenever. */
import assert from 'node:assert/strict';
import { createOpenSpecs } from '../../src/server/open-specs';
import type { Platform } from '../../src/server/platform';
import { manyChannels, passingSpec } from '../support/spec-texts';

const uri = 'file:///lagoon/many.bandkeep.yaml';

/** A clock that makes every slice one step. */
function slowly(): Platform {
  let time = 0;
  return {
    version: 'test',
    loadFile: null,
    now: () => (time += 100),
    yieldControl: () => new Promise((resolve) => setImmediate(resolve)),
  };
}

describe('open specs', () => {
  it('are judged once for all who ask at the same time', async () => {
    const specs = createOpenSpecs(slowly());
    specs.change(uri, 1, manyChannels(5));
    const [first, second] = await Promise.all([specs.judged(uri), specs.judged(uri)]);
    assert.ok(first);
    assert.equal(first, second);
    assert.equal(specs.get(uri)?.counts?.channelsAnalysed, 5);
  });

  it('answer with the newest version where one comes while an older one is judged', async () => {
    const specs = createOpenSpecs(slowly());
    specs.change(uri, 1, manyChannels(5));
    const asked = specs.judged(uri);
    specs.change(uri, 2, passingSpec);
    const document = await asked;
    assert.equal(document?.version, 2);
    assert.equal(document.reading.text, passingSpec);
  });

  it('keep what a dropped judgement had analysed', async () => {
    const specs = createOpenSpecs(slowly());
    specs.change(uri, 1, manyChannels(5));
    const asked = specs.judged(uri);
    await new Promise((resolve) => setImmediate(resolve));
    specs.change(uri, 2, manyChannels(5).replace('Many gauges', 'Gauges'));
    await asked;
    assert.ok((specs.get(uri)?.counts?.channelsAnalysed ?? 5) < 5);
  });

  it('answer nothing where the spec is not open, or is closed meanwhile', async () => {
    const specs = createOpenSpecs(slowly());
    assert.equal(await specs.judged(uri), null);
    specs.change(uri, 1, manyChannels(5));
    const asked = specs.judged(uri);
    specs.close(uri);
    assert.equal(await asked, null);
    assert.deepEqual(specs.all(), []);
  });

  it('are new ones when they are opened again', async () => {
    const specs = createOpenSpecs(slowly());
    specs.change(uri, 7, passingSpec);
    await specs.judged(uri);
    specs.close(uri);
    specs.change(uri, 1, passingSpec);
    assert.equal((await specs.judged(uri))?.version, 1);
  });
});
