/** Limits: sense, margin, and what has not been judged because nothing could have broken it. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import type { LimitFigure } from '../../src/analysis';
import type { Channel, Limit } from '../../src/spec/channel';
import { butterworthForm, capture, generate, limit, rate, stage, tone, wanted } from '../support/channel-builder';
import { assertWithin } from '../support/tolerance';

const parts = { wanted: [wanted(0, 10e3, -3)], rate: rate(50e3) };

function judged(channel: Channel, one: Limit): LimitFigure {
  const [found] = analyse({ ...channel, limits: [one] }).limits;
  assert.ok(found !== undefined);
  return found;
}

describe('limits', () => {
  it('that hold at most have a margin below, those that hold at least above', () => {
    const alias = judged(capture({ ...parts, unwanted: [tone(45e3, -50)] }), limit('alias', -40, { ref: 'R-7' }));
    assert.deepEqual([alias.sense, alias.value, alias.margin, alias.passes, alias.ref], ['at-most', -50, 10, true, 'R-7']);
    const headroom = judged(capture(parts), limit('headroom', 6));
    assert.deepEqual([headroom.sense, headroom.passes], ['at-least', false]);
    assertWithin(headroom.margin ?? NaN, -3, 1e-9);
  });

  it('that are met exactly are met', () => {
    assert.equal(judged(capture(parts), limit('headroom', 3)).passes, true);
    assert.equal(judged(capture({ ...parts, unwanted: [tone(45e3, -50)] }), limit('alias', -50)).passes, true);
  });

  it('are judged where sources land nowhere: nothing is as far below as can be', () => {
    const found = judged(capture({ ...parts, unwanted: [tone(30e3)] }), limit('alias', -100));
    assert.deepEqual(
      [found.judged, found.passes, found.value, found.margin, found.where],
      [true, true, -Infinity, Infinity, null],
    );
  });

  it('that nothing can break are not judged and do not count as passed', () => {
    const nothing: readonly (readonly [Channel, Limit])[] = [
      [capture(parts), limit('alias', -60)],
      [capture(parts), limit('snr', 60)],
      [capture(parts), limit('flatness', 1)],
      [capture({ ...parts, unwanted: [tone(45e3)] }), limit('image', -60)],
      [generate(parts), limit('alias', -60)],
      [generate(parts), limit('snr', 60)],
    ];
    for (const [channel, one] of nothing) {
      const { judged: isJudged, passes, value, nominal, margin, gap } = judged(channel, one);
      assert.deepEqual([isJudged, passes, value, nominal, margin, gap], [false, false, null, null, null, null], one.key);
    }
  });

  it('that something can break are judged', () => {
    const something: readonly (readonly [Channel, Limit])[] = [
      [capture({ ...parts, bits: 12 }), limit('snr', 60)],
      [capture({ ...parts, jitterSeconds: 1e-9 }), limit('snr', 60)],
      [capture({ ...parts, unwanted: [tone(45e3, -70)] }), limit('snr', 60, { withUnwanted: true })],
      [capture({ ...parts, stages: [stage(butterworthForm(1, 50e3))] }), limit('flatness', 1)],
      [generate(parts), limit('flatness', 1)],
      [generate(parts), limit('image', -3)],
      [generate(parts), limit('headroom', 1)],
    ];
    for (const [channel, one] of something) assert.equal(judged(channel, one).judged, true, one.key);
  });

  it('say where they are worst', () => {
    const alias = judged(capture({ ...parts, unwanted: [tone(45e3, -50, { name: 'switcher' })] }), limit('alias', -40));
    assert.deepEqual(alias.where, { frequency: 45e3, lands: 5e3, source: 'switcher' });
    const image = judged(generate(parts), limit('image', -3));
    assert.deepEqual(image.where, { frequency: 40e3, lands: 10e3 });
    assert.deepEqual(judged(capture({ ...parts, bits: 12 }), limit('snr', 60)).where, { frequency: 10e3 });
  });

  it('in dBc and in dBFS differ by the wanted level', () => {
    const channel = capture({ ...parts, unwanted: [tone(45e3, -50)] });
    assert.equal(judged(channel, limit('alias', -40, { unit: 'dBc' })).value, -47);
  });
});
