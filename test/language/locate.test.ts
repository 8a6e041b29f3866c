/** From places to lines and back. */
import assert from 'node:assert/strict';
import { channelAt, locate, placeNameAt } from '../../src/language';
import { offsetIn, opened } from '../support/language-document';
import { passingSpec } from '../support/spec-texts';

describe('locating', () => {
  it('follows a filter by name to the stage that stands in `filters`', () => {
    const { document, text } = opened(passingSpec);
    const range = locate(document, { channel: 'bearing', path: ['filter', 0, 'corner'] });
    assert.ok(range);
    assert.equal(text.slice(offsetIn(text, range.start), offsetIn(text, range.end)), '14 kHz');
  });

  it('finds nothing for a place that is not written', () => {
    const { document } = opened(passingSpec);
    assert.equal(locate(document, { channel: 'bearing', path: ['jitter'] }), null);
    assert.equal(locate(document, { channel: null, path: ['notes'] }), null);
  });

  it('names the innermost place at the cursor', () => {
    const { document, cursor } = opened(passingSpec.replace('-55 dBFS', '-5¦5 dBFS'));
    assert.deepEqual(placeNameAt(document, cursor), { channel: 'bearing', path: ['unwanted', 0, 'level'] });
  });

  it('names the definition where the cursor is in one', () => {
    const { document, cursor } = opened(passingSpec.replace('order: 4', 'order: ¦4'));
    assert.deepEqual(placeNameAt(document, cursor), { channel: null, path: ['filters', 'guard', 0, 'order'] });
    assert.equal(channelAt(document, cursor), null);
  });

  it('knows the channel between its keys too', () => {
    const { document, cursor } = opened(passingSpec.replace('    limits:\n', '    limits: # ¦ these\n'));
    assert.equal(channelAt(document, cursor), 'bearing');
  });
});
