import assert from 'node:assert/strict';
import { bearing, found, messages } from '../support/found';
import { figures, imageFigure, limitFigure, unjudgedFigure } from '../support/figures';
import { generate, limit, rate, wanted } from '../support/channel-builder';

const sounder = generate({ name: 'fish-sounder', wanted: [wanted(100, 8000, -3)], rate: rate(51200) });

describe('image-over-limit', () => {
  const limits = [limitFigure('image', -60, -50, { nominal: -51 })];

  it('names the copy, the wanted frequency it copies and where it leaves', () => {
    const strongest = imageFigure();
    assert.deepEqual(messages('image-over-limit', sounder, figures({ limits, images: [strongest], image: strongest })), [
      'The lower copy at k = 1 of 8 kHz leaves at 43.2 kHz at −50 dBc, 10 dB over the image limit of −60 dBc.',
    ]);
  });

  it('is one finding for each copy and side, all on the limit', () => {
    const images = [imageFigure(), imageFigure({ side: 'upper', margin: -8 }), imageFigure({ copy: 2, margin: 3 })];
    const all = found('image-over-limit', sounder, figures({ limits, images, image: images[0]! }));
    assert.equal(all.length, 2);
    assert.ok(all.every(({ at }) => 'place' in at && at.place.path.join('.') === 'limits.image.at'));
  });

  it('also names a copy beyond those that are listed', () => {
    const far = imageFigure({ copy: 40, margin: -1 });
    const [, beyond] = found('image-over-limit', sounder, figures({ limits, images: [imageFigure()], image: far }));
    assert.match(beyond?.message ?? '', /k = 40/);
  });

  it('keeps quiet while the limit holds', () => {
    const holds = figures({ limits: [limitFigure('image', -60, -61)], images: [imageFigure({ margin: 1 })] });
    assert.deepEqual(found('image-over-limit', sounder, holds), []);
  });
});

describe('flatness-over-limit', () => {
  it('says at which frequency the gain departs, and from where', () => {
    const limits = [
      limitFigure('flatness', 0.8, 1.05, { nominal: 0.71, where: { frequency: 10000 }, worstAt: { 'stage 1, corner': -0.04 } }),
    ];
    assert.deepEqual(messages('flatness-over-limit', bearing(), figures({ limits })), [
      'The gain at 10 kHz departs by 1.05 dB from that at 223.6 Hz, 0.25 dB over the flatness limit of 0.8 dB (worst case, corner −4 %; nominal 0.71, which would pass).',
    ]);
  });

  it('keeps quiet while the limit holds', () => {
    assert.deepEqual(found('flatness-over-limit', bearing(), figures({ limits: [limitFigure('flatness', 0.8, 0.8)] })), []);
  });
});

describe('snr-short', () => {
  it('names the largest part of the noise', () => {
    const limits = [limitFigure('snr', 84, 82.3)];
    const noise = { ...figures().noise, quantisation: -90, jitter: -86.1, total: -84.6 };
    assert.deepEqual(messages('snr-short', bearing(), figures({ limits, noise })), [
      'The signal-to-noise ratio of the tone at 10 kHz is 82.3 dB, 1.7 dB short of the limit of 84 dB; most of the noise is jitter, −86.1 dBFS.',
    ]);
  });

  it('keeps quiet while the limit holds', () => {
    assert.deepEqual(found('snr-short', bearing(), figures({ limits: [limitFigure('snr', 84, 84.1)] })), []);
  });
});

describe('headroom-short and overdriven', () => {
  it('says how much is left below full scale', () => {
    const limits = [limitFigure('headroom', 2, 1.2)];
    assert.deepEqual(messages('headroom-short', bearing(), figures({ limits, headroom: 1.2 })), [
      'All peaks together leave 1.2 dB below full scale, 0.8 dB short of the headroom limit of 2 dB.',
    ]);
  });

  it('says by how much full scale is exceeded', () => {
    const limits = [limitFigure('headroom', 2, -1.2)];
    assert.match(
      messages('headroom-short', bearing(), figures({ limits }))[0] ?? '',
      /^All peaks together exceed full scale by 1\.2 dB, 3\.2 dB short/,
    );
  });

  it('warns of clipping where no limit asks, and only there', () => {
    assert.equal(found('overdriven', bearing(), figures({ headroom: -0.5 })).length, 1);
    assert.equal(
      found('overdriven', bearing(), figures({ headroom: -0.5, limits: [limitFigure('headroom', 0, -0.5)] })).length,
      0,
    );
    assert.equal(found('overdriven', bearing(), figures({ headroom: 0 })).length, 0);
    assert.equal(found('headroom-short', bearing(), figures({ headroom: -0.5 })).length, 0);
  });
});

describe('not-judged', () => {
  it('says what is missing, on the limit', () => {
    const channel = bearing({ unwanted: [] });
    const [alias, snr] = found(
      'not-judged',
      channel,
      figures({ limits: [unjudgedFigure('alias', -96), unjudgedFigure('snr', 84)] }),
    );
    assert.match(alias?.message ?? '', /`alias` has not been judged: nothing unwanted is given/);
    assert.match(snr?.message ?? '', /`snr` has not been judged: the channel has no noise/);
    assert.deepEqual(snr?.at, { place: { channel: 'bearing-x', path: ['limits', 'snr', 'at'] } });
  });

  it('is not said of a limit that was judged', () => {
    assert.deepEqual(found('not-judged', bearing(), figures({ limits: [limitFigure('snr', 84, 90)] })), []);
  });
});

describe('thin-margin', () => {
  const thin = (key: 'alias' | 'image' | 'snr' | 'headroom' | 'flatness', at: number, value: number, margin?: number): number => {
    const limits = margin === undefined ? [] : [limit(key, at, { margin })];
    return found('thin-margin', bearing({ limits }), figures({ limits: [limitFigure(key, at, value)] })).length;
  };

  it('begins below 1 dB for alias, image, snr and headroom', () => {
    assert.deepEqual([thin('alias', -96, -96.9), thin('alias', -96, -97)], [1, 0]);
    assert.deepEqual([thin('image', -60, -60.9), thin('image', -60, -61)], [1, 0]);
    assert.deepEqual([thin('snr', 84, 84.9), thin('snr', 84, 85)], [1, 0]);
    assert.deepEqual([thin('headroom', 1, 1.5), thin('headroom', 1, 2)], [1, 0]);
  });

  it('begins below a tenth of the limit for flatness', () => {
    assert.deepEqual([thin('flatness', 0.8, 0.73), thin('flatness', 0.8, 0.71)], [1, 0]);
  });

  it("gives way to a limit's own margin", () => {
    assert.deepEqual([thin('alias', -96, -98, 3), thin('alias', -96, -99, 3), thin('alias', -96, -96.1, 0)], [1, 0, 0]);
  });

  it('is not said of a limit that is broken', () => {
    assert.equal(thin('alias', -96, -95), 0);
  });

  it('says by how much the limit holds and how much would be enough', () => {
    const where = { frequency: 41200, lands: 10000, source: 'drive hash' };
    const limits = [limitFigure('alias', -96, -96.4, { where, worstAt: { 'stage 1, corner': 0.04 } })];
    assert.deepEqual(messages('thin-margin', bearing(), figures({ limits })), [
      'The limit `alias` of −96 dBFS holds by only 0.4 dB, at −96.4 dBFS (`drive hash` at 41.2 kHz), worst case corner +4 %; less than 1 dB is thin.',
    ]);
  });
});

describe('thin-margin', () => {
  it('of a delay is a time, a tenth of the limit', () => {
    const parts = { unit: 's', where: { frequency: 1000 } } as const;
    const limits = [limitFigure('delay', 30e-6, 28.5e-6, parts)];
    assert.deepEqual(messages('thin-margin', bearing(), figures({ limits })), [
      'The limit `delay` of 30 µs holds by only 1.5 µs, at 28.5 µs (at 1 kHz); less than 3 µs is thin.',
    ]);
    assert.deepEqual(found('thin-margin', bearing(), figures({ limits: [limitFigure('delay', 30e-6, 26e-6, parts)] })), []);
  });

  it('of a mask or of the level is what its long form asks for', () => {
    const inside = { sense: 'inside', margin: 0.3 } as const;
    const limits = [limitFigure('level', -1, -1.3, { ...inside, unit: 'dBFS' }), limitFigure('response', -40, -40.3, inside)];
    const mask = { key: 'response', mask: null, segments: [], ref: null, margin: 0.1 } as const;
    const loose = bearing({ levelLimit: { lowDb: -9, highDb: -1, ref: null, margin: 0.2 }, masks: [mask] });
    assert.deepEqual(found('thin-margin', loose, figures({ limits })), []);
    const strict = bearing({ levelLimit: { lowDb: -9, highDb: -1, ref: null, margin: 0.5 }, masks: [{ ...mask, margin: 1 }] });
    assert.deepEqual(
      found('thin-margin', strict, figures({ limits })).map(({ limit: key }) => key),
      ['level', 'response'],
    );
  });
});

describe('not-judged', () => {
  it('says of a delay and of a mask what is missing', () => {
    const limits = [unjudgedFigure('delay', 1e-6), unjudgedFigure('through', 1)];
    assert.deepEqual(messages('not-judged', bearing({ stages: [] }), figures({ limits })), [
      'The limit `delay` has not been judged: a path without a filter delays nothing. Give it its `filter`.',
      'The limit `through` has not been judged: a path without a filter is flat by nature, and that is inside the mask. Give it its `filter`.',
    ]);
  });
});
