import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { isRecord, isText } from '../../src/protocol/guards';
import { read } from '../../src/spec';

const snippets: unknown = JSON.parse(readFileSync(new URL('../../snippets/bandkeep.json', import.meta.url), 'utf8'));

/** A snippet's text as it stands before anything is typed into it: the first choice, the proposed text. */
function expanded(prefix: string): string {
  assert.ok(isRecord(snippets));
  const snippet = Object.values(snippets).find((candidate) => isRecord(candidate) && candidate['prefix'] === prefix);
  assert.ok(isRecord(snippet) && Array.isArray(snippet['body']), prefix);
  const body = snippet['body'].filter(isText).join('\n');
  return body
    .replace(/\$\{\d+\|([^,|]+)[^|]*\|\}/g, '$1')
    .replace(/\$\{\d+:([^}]*)\}/g, '$1')
    .replace(/\$\d+/g, '');
}

describe('the snippets', () => {
  for (const direction of ['capture', 'generate', 'relay']) {
    it(`offer a ${direction} channel that is whole as it stands`, () => {
      const head = expanded('bandkeep').trimEnd();
      const channel = expanded(direction).trimEnd().replace(/^/gm, '  ');
      const { entries, problems } = read(`${head}\n${channel}\n`);
      assert.deepEqual(problems, []);
      assert.equal(entries.length, 1);
      assert.equal(entries[0]?.direction, direction);
      assert.ok(entries[0].channel !== null);
    });
  }

  it('offer a mask and a source with harmonics that a channel can take', () => {
    const mask = expanded('mask').trimEnd().replace(/^/gm, '  ');
    const source = expanded('harmonics').trimEnd().replace(/^/gm, '      ');
    const text = `bandkeep: 1
masks:
${mask}
channels:
  bearing:
    direction: capture
    wanted: { band: 5 Hz .. 1 kHz }
    unwanted:
${source}
    rate: 64 kHz
    limits: { response: guard mask }
`;
    const { entries, problems } = read(text);
    assert.deepEqual(problems, []);
    const channel = entries[0]?.channel;
    assert.equal(channel?.masks[0]?.segments.length, 3);
    assert.deepEqual(channel.unwanted[0]?.kind === 'tone' && channel.unwanted[0].harmonics, {
      to: 25,
      slopeDbPerDecade: -20,
      odd: true,
    });
  });
});
