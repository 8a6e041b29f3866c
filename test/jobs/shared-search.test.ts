/** The whole check of a text: findings that one fix must clear together are searched for once. */
import assert from 'node:assert/strict';
import { checkText } from '../../src/jobs';

const spec = `bandkeep: 1
channels:
  sounder:
    direction: generate
    wanted: { band: 1 kHz .. 2 kHz }
    rate: 20 kHz
    filter: { family: butterworth, order: 2, corner: 4 kHz }
    limits: { image: -60 dBc }
`;

describe('the check of a whole text', () => {
  it('makes one search for all copies that break the same limit', () => {
    const { judgement, cures } = checkText('sounder.bandkeep.yaml', spec);
    const copies = judgement.findings.filter(({ code }) => code === 'image-over-limit');
    assert.ok(copies.length >= 2, 'several copies break the limit');
    const found = new Set(copies.map((finding) => cures.get(finding)));
    assert.equal(found.size, 1);
    assert.ok([...found].every((cure) => cure !== undefined && cure.fixes.length > 0));
  });
});
