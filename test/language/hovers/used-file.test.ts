/** The hover of a path under `use`, and of what comes from there. */
import assert from 'node:assert/strict';
import { MarkupContent } from 'vscode-languageserver-types';
import { drain } from '../../../src/jobs';
import { hover, openSpec } from '../../../src/language';
import { ableEditor } from '../../support/language-document';

const shared = `bandkeep: 1
filters:
  guard: { family: butterworth, order: 4, corner: 14 kHz }
  spare: { bandwidth: 1 MHz }
masks:
  ear: [{ band: 0 Hz .. 10 kHz, within: ± 1 dB }]
`;
const spec = `bandkeep: 1
use: [shared/parts.bandkeep.yaml]
channels:
  bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz }
    rate: 64 kHz
    filter: guard
    limits: { response: ear }
`;

const hoverOf = (words: string): string => {
  const path = 'shared/parts.bandkeep.yaml';
  const files = { path: 'gate.bandkeep.yaml', content: (asked: string) => (asked === path ? { text: shared } : null) };
  const document = drain(openSpec('file:///gate.bandkeep.yaml', 1, spec, files).judging());
  assert.deepEqual(document.reading.problems, []);
  const before = spec.slice(0, spec.indexOf(words)).split('\n');
  const found = hover(document, { line: before.length - 1, character: before.at(-1)?.length ?? 0 }, ableEditor);
  assert.ok(found && MarkupContent.is(found.contents));
  return found.contents.value;
};

describe('the hover of a used spec', () => {
  it('lists what it offers and who uses it here', () => {
    const text = hoverOf('shared/parts');
    assert.match(text, /^\*\*`shared\/parts\.bandkeep\.yaml` offers 3 names, 2 of them used here\*\*/);
    assert.ok(text.includes('| filter `guard` | used by `bearing` |'), text);
    assert.ok(text.includes('| filter `spare` | not used here |'), text);
    assert.ok(text.includes('| mask `ear` | used by `bearing` |'), text);
  });

  it('answers for a filter from there as for any other', () => {
    assert.match(hoverOf('guard'), /^\*\*`guard`: 28\.7 dB loss at half the rate, 32 kHz\*\*/);
  });

  it('answers for a mask from there, its segments included', () => {
    assert.match(hoverOf('ear }'), /^\*\*`response`, mask `ear`: 0\.7\d dB inside the limit, worst at 10 kHz\*\*/);
  });
});
