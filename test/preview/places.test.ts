/** Tests of which items the cursor's line lights. */
import assert from 'node:assert/strict';
import { itemsAt } from '../../src/preview/places';
import { sampleItem } from '../drawing/sample-plot';

const at = (id: string, ...path: (string | number)[]): ReturnType<typeof sampleItem> =>
  sampleItem({ id, place: { channel: 'x', path } });
const items = [
  at('path', 'filter'),
  { ...at('stage', 'filter', 1), alsoAt: [{ channel: null, path: ['filters', 'guard', 1] }] },
  at('hash', 'unwanted', 1),
  at('limit', 'limits', 'alias'),
  sampleItem({ id: 'nowhere', place: null }),
];

describe('items at a place', () => {
  it('lights the nearest item around the cursor', () => {
    assert.deepEqual(itemsAt(items, { channel: 'x', path: ['filter', 1, 'corner'] }), ['stage']);
    assert.deepEqual(itemsAt(items, { channel: 'x', path: ['filter', 0, 'corner'] }), ['path']);
    assert.deepEqual(itemsAt(items, { channel: 'x', path: ['unwanted', 1, 'level'] }), ['hash']);
  });

  it('lights what lies below the cursor where nothing lies around it', () => {
    assert.deepEqual(itemsAt(items, { channel: 'x', path: ['limits'] }), ['limit']);
  });

  it('finds a stage by the shared filter that it is defined in', () => {
    assert.deepEqual(itemsAt(items, { channel: null, path: ['filters', 'guard', 1, 'order'] }), ['stage']);
  });

  it('lights nothing for another channel, the channel itself, or no place', () => {
    assert.deepEqual(itemsAt(items, { channel: 'y', path: ['filter'] }), []);
    assert.deepEqual(itemsAt(items, { channel: 'x', path: [] }), []);
    assert.deepEqual(itemsAt(items, null), []);
  });
});
