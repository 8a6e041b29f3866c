/** Which channel the panel draws, and what it says where it cannot. */
import assert from 'node:assert/strict';
import { drawable } from '../../src/language';
import { opened } from '../support/language-document';
import { manyChannels, passingSpec } from '../support/spec-texts';

describe('the channel to draw', () => {
  it('is the one that is named', () => {
    const { document } = opened(manyChannels(3));
    assert.deepEqual(drawable(document, 'gauge-2', { line: 5, character: 4 }), { kind: 'channel', channel: 'gauge-2' });
  });

  it('is the one at the cursor where none is named', () => {
    const { document, cursor } = opened(manyChannels(3).replace('  gauge-1:', '  gauge-1:¦'));
    assert.deepEqual(drawable(document, null, cursor), { kind: 'channel', channel: 'gauge-1' });
  });

  it('is the first where the cursor is in none', () => {
    const { document, cursor } = opened(`¦${manyChannels(3)}`);
    assert.deepEqual(drawable(document, null, cursor), { kind: 'channel', channel: 'gauge-0' });
    assert.deepEqual(drawable(document, null, null), { kind: 'channel', channel: 'gauge-0' });
  });

  it('is none where it has a fault, and the first fault is named with its line', () => {
    const { document } = opened(passingSpec.replace('bits: 16', 'bits: sixteen').replace('300 ns', '300'));
    const found = drawable(document, 'bearing', null);
    assert.ok(found.kind === 'none');
    assert.match(found.reason, /^`bearing` has 2 faults; the first is on line 20: ./);
  });

  it('is none where what it names has a fault', () => {
    const { document } = opened(passingSpec.replace('order: 4', 'order: four'));
    const found = drawable(document, 'bearing', null);
    assert.ok(found.kind === 'none');
    assert.match(found.reason, /the first is on line 9: ./);
  });

  it('is none where it no longer stands', () => {
    const { document } = opened(passingSpec);
    assert.deepEqual(drawable(document, 'gone', null), {
      kind: 'none',
      channel: 'gone',
      reason: 'This spec no longer has a channel `gone`.',
    });
  });

  it('is none in a spec without channels', () => {
    const found = drawable(opened('bandkeep: 1\n').document, null, null);
    assert.ok(found.kind === 'none');
    assert.match(found.reason, /^This spec has no channel/);
  });
});
