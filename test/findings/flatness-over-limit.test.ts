/** A flatness that is broken without limit is said in words. */
import assert from 'node:assert/strict';
import { createJudgeStore, judge } from '../../src/findings';
import { read } from '../../src/spec';

const messages = (trapHz: string): readonly string[] =>
  judge(
    read(`bandkeep: 1
channels:
  lock-gauge:
    direction: capture
    wanted: { band: 1 kHz .. 10 kHz, level: -3 dBFS }
    reference: 2 kHz
    rate: 51.2 kHz
    bits: 16
    filter: { second-order: { frequency: ${trapHz}, q: 3, kind: notch } }
    limits: { flatness: 1 dB }
`),
    createJudgeStore(),
  )
    .findings.filter(({ code }) => code === 'flatness-over-limit')
    .map(({ message }) => message);

describe('a flatness over its limit', () => {
  it('is nothing at all where a null stands in the wanted band', () => {
    assert.deepEqual(messages('6 kHz'), [
      'The gain at 6 kHz is nothing at all, which departs from that at 2 kHz by more than the flatness limit of 1 dB.',
    ]);
  });

  it('is a number beside one', () => {
    assert.match(
      messages('11 kHz')[0] ?? '',
      /^The gain at 10 kHz departs by [\d.]+ dB from that at 2 kHz, [\d.]+ dB over the flatness limit of 1 dB\.$/,
    );
  });
});
