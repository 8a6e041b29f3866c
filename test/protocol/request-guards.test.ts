/** The guards at the server's door let through what fits, and nothing else. */
import assert from 'node:assert/strict';
import {
  docsBaseOf,
  isAboutDocument,
  isAboutPosition,
  isAboutRange,
  isCountsParams,
  isLocateParams,
  isPictureParams,
  isPlaceAtParams,
  isReadFileResult,
  readsFilesOf,
} from '../../src/protocol/request-guards';

const position = { line: 3, character: 0 };
const range = { start: position, end: position };
const textDocument = { uri: 'file:///gate.bandkeep.yaml' };
const { uri } = textDocument;
const place = { channel: 'bearing', path: ['filter', 1, 'corner'] };

const cases: readonly [
  name: string,
  guard: (value: unknown) => boolean,
  fits: readonly unknown[],
  fitsNot: readonly unknown[],
][] = [
  ['a document', isAboutDocument, [{ textDocument }], [{}, null, { textDocument: {} }, { textDocument: { uri: 3 } }]],
  [
    'a position',
    isAboutPosition,
    [{ textDocument, position }],
    [{ textDocument }, { position }, { textDocument, position: { line: -1, character: 0 } }, { textDocument, position: [0, 0] }],
  ],
  [
    'a range',
    isAboutRange,
    [{ textDocument, range }],
    [
      { textDocument, range: position },
      { textDocument, range: { start: position } },
    ],
  ],
  [
    'a picture',
    isPictureParams,
    [
      { uri, channel: null, position: null },
      { uri, channel: 'bearing', position },
    ],
    [{ uri }, { uri, channel: 1, position }, { channel: null, position: null }],
  ],
  [
    'a place',
    isLocateParams,
    [{ uri, place }],
    [{ uri }, { uri, place: { channel: 'x' } }, { uri, place: { channel: 'x', path: [-1] } }],
  ],
  ['what stands somewhere', isPlaceAtParams, [{ uri, position }], [{ uri }, { position }, { uri, position: 7 }]],
  ['counts', isCountsParams, [{ uri }], [{}, 'x', []]],
];

describe('the parameters of a request about', () => {
  for (const [name, guard, fits, fitsNot] of cases) {
    it(`${name} are told from others`, () => {
      for (const value of fits) assert.ok(guard(value), JSON.stringify(value));
      for (const value of fitsNot) assert.ok(!guard(value), JSON.stringify(value));
    });
  }

  it('nothing at all give no folder of pages', () => {
    assert.equal(docsBaseOf({ docsBase: 'file:///docs' }), 'file:///docs');
    for (const value of [undefined, null, {}, { docsBase: 3 }, 'x']) assert.equal(docsBaseOf(value), null);
  });

  it('files are answered with a text or with a fault that we know', () => {
    for (const value of [{ text: '' }, { fault: 'missing' }, { fault: 'not-text' }]) assert.ok(isReadFileResult(value));
    for (const value of [null, 'text', {}, { text: 3 }, { fault: 'broken' }, { fault: null }])
      assert.ok(!isReadFileResult(value));
  });

  it('nothing at all promise no files', () => {
    assert.equal(readsFilesOf({ readsFiles: true }), true);
    for (const value of [undefined, null, {}, { readsFiles: 'yes' }]) assert.equal(readsFilesOf(value), false);
  });
});
