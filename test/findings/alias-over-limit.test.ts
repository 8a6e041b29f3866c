import assert from 'node:assert/strict';
import { bearing, found, messages } from '../support/found';
import { aliasFigure, figures, limitFigure } from '../support/figures';
import { anything, band, limit } from '../support/channel-builder';

const corner = { 'pick-up guard, stage 2, corner': 0.04 };

describe('alias-over-limit', () => {
  const channel = bearing({ unwanted: [band(40e3, 3e6, -55, 'drive hash')], limits: [limit('alias', -96)] });
  const where = { frequency: 41200, lands: 10000, source: 'drive hash' };
  const broken = figures({
    limits: [limitFigure('alias', -96, -91.2, { nominal: -92.6, where, worstAt: corner })],
    aliases: [aliasFigure({ worstAt: corner })],
  });

  it('says where it comes from, where it lands, by how much, and at which tolerance', () => {
    assert.deepEqual(messages('alias-over-limit', channel, broken), [
      '`drive hash` at 41.2 kHz lands on 10 kHz at −91.2 dBFS, 4.8 dB over the alias limit of −96 dBFS (worst case, corner +4 %; nominal −92.6).',
    ]);
  });

  it('stands on the frequency of the source and points to the limit and the filter', () => {
    const [finding] = found('alias-over-limit', channel, broken);
    assert.deepEqual(finding?.at, { place: { channel: 'bearing-x', path: ['unwanted', 0, 'band'] } });
    assert.deepEqual(
      finding.related.map(({ place }) => place.path),
      [['limits', 'alias', 'at'], ['filter']],
    );
    assert.deepEqual(finding.figures, {
      value: -91.2,
      nominal: -92.6,
      limit: -96,
      margin: -4.8,
      frequency: 41200,
      lands: 10000,
      source: 'drive hash',
    });
  });

  it('says so where the nominal design would pass', () => {
    const thin = figures({
      limits: [limitFigure('alias', -92, -91.2, { nominal: -92.6, where, worstAt: corner })],
      aliases: [aliasFigure({ worstAt: corner, limit: -92, margin: -0.8 })],
    });
    assert.match(messages('alias-over-limit', channel, thin)[0] ?? '', /0\.8 dB over .*nominal −92\.6, which would pass\)/);
  });

  it('is one finding for each source that breaks the limit, and none for a source that does not', () => {
    const two = figures({
      limits: broken.limits,
      aliases: [
        aliasFigure(),
        aliasFigure({ source: 'anything', index: 1, margin: -1, level: -95 }),
        aliasFigure({ margin: 2, level: -98 }),
      ],
    });
    const sources = [band(40e3, 3e6, -55, 'drive hash'), anything(), band(1e6, 2e6)];
    const places = found('alias-over-limit', bearing({ unwanted: sources }), two).map(({ at }) => 'place' in at && at.place.path);
    assert.deepEqual(places, [
      ['unwanted', 0, 'band'],
      ['unwanted', 1],
    ]);
  });

  it('gives levels against the wanted tone where the limit is in dBc', () => {
    const relative = figures({
      limits: [limitFigure('alias', -90, -88.2, { unit: 'dBc', nominal: -89.6, where })],
      aliases: [aliasFigure({ limit: -90, margin: -1.8 })],
    });
    assert.match(
      messages('alias-over-limit', channel, relative)[0] ?? '',
      /at −88\.2 dBc, 1\.8 dB over the alias limit of −90 dBc\.$/,
    );
  });

  it('keeps quiet while the limit holds', () => {
    const holds = figures({ limits: [limitFigure('alias', -96, -96)], aliases: [aliasFigure({ level: -96, margin: 0 })] });
    assert.deepEqual(found('alias-over-limit', channel, holds), []);
  });

  it('shows as many digits as it takes to see that the limit is broken', () => {
    const hair = figures({
      limits: [limitFigure('alias', -96, -95.98, { where })],
      aliases: [aliasFigure({ level: -95.98, margin: -0.02 })],
    });
    assert.match(messages('alias-over-limit', channel, hair)[0] ?? '', /at −95\.98 dBFS, 0\.02 dB over/);
  });

  it('says which harmonic it is', () => {
    const fifth = figures({
      limits: broken.limits,
      aliases: [aliasFigure({ source: 'sump-pump switcher', harmonic: 5, frequency: 1.55e6, lands: 9e3 })],
    });
    assert.match(
      messages('alias-over-limit', channel, fifth)[0] ?? '',
      /^`sump-pump switcher`, harmonic 5 at 1\.55 MHz lands on 9 kHz at /,
    );
  });

  describe('for a limit of the sum', () => {
    const sources = [band(40e3, 3e6, -55, 'drive hash'), anything(), band(1e6, 2e6, 0, 'pump'), band(2e6, 3e6, 0, 'hum')];
    const summed = bearing({ unwanted: sources, limits: [limit('alias', -96, { sum: true, ref: 'R-7' })] });
    const open = { limit: null, margin: null };
    const all = figures({
      limits: [limitFigure('alias', -96, -90.5, { nominal: -92, where, worstAt: corner, ref: 'R-7' })],
      aliases: [
        aliasFigure({ ...open, level: -95, sum: -95 }),
        aliasFigure({ ...open, source: 'anything', index: 1, level: -98, sum: -98 }),
        // Weaker than the others by its strongest tone, but not by all of its tones.
        aliasFigure({ ...open, source: 'pump', index: 2, level: -99, sum: -94, harmonic: 3 }),
        aliasFigure({ ...open, source: 'hum', index: 3, level: null, sum: null }),
      ],
    });

    it('is one finding at the limit, which names the strongest contributors in order', () => {
      const [finding, ...more] = found('alias-over-limit', summed, all);
      assert.equal(
        finding?.message,
        'All that lands in the protected ranges adds up to −90.5 dBFS, 5.5 dB over the limit of −96 dBFS for the sum of all aliases ' +
          '(worst case, corner +4 %; nominal −92); strongest `pump` with −94 dBFS, then `drive hash` with −95 dBFS, then `anything` with −98 dBFS.',
      );
      assert.deepEqual(more, []);
      assert.deepEqual(finding.at, { place: { channel: 'bearing-x', path: ['limits', 'alias', 'sum'] } });
      assert.equal(finding.ref, 'R-7');
      assert.deepEqual(
        finding.related.map(({ place }) => place.path),
        [['unwanted', 2, 'band'], ['unwanted', 0, 'band'], ['unwanted', 1], ['filter']],
      );
    });

    it('counts what is not named', () => {
      const five = figures({ ...all, aliases: [...all.aliases, aliasFigure({ ...open, index: 3, sum: -120, level: -120 })] });
      assert.match(messages('alias-over-limit', summed, five)[0] ?? '', / and 1 more\.$/);
    });

    it('keeps quiet while the sum holds, whatever a single source does', () => {
      const held = figures({ ...all, limits: [limitFigure('alias', -90, -90.5)] });
      assert.deepEqual(found('alias-over-limit', summed, held), []);
    });
  });
});
