/** The examples keep their word: those that are meant to pass do, with margins that nobody would call thin, and say why. */
import assert from 'node:assert/strict';
import { createJudgeStore, judge, type Judgement } from '../../src/findings';
import { read } from '../../src/spec';
import { exampleText } from '../support/examples';

const judged = (text: string): Judgement => judge(read(text), createJudgeStore());

describe('the echo receiver', () => {
  const text = exampleText('echo-receiver');
  const judgement = judged(text);
  const figures = judgement.channels[0]?.figures;

  it('passes without a finding', () => {
    assert.deepEqual(
      judgement.findings.map(({ message }) => message),
      [],
    );
    assert.equal(judgement.channels[0]?.passes, true);
  });

  it('judges each of its limits', () => {
    assert.deepEqual(
      figures?.limits.map(({ limit, judged: is }) => [limit, is]),
      ['alias', 'flatness', 'delay-spread', 'snr', 'headroom'].map((limit) => [limit, true]),
    );
  });

  it('comes out in zone 9, not inverted, where its comments say', () => {
    assert.deepEqual([figures?.zone, figures?.inverted], [9, false]);
    const [band] = figures?.wanted ?? [];
    // 4.2 − 4·1.024 and 4.5 − 4·1.024.
    assert.ok(Math.abs((band?.appearsLow ?? 0) - 104e3) < 1e-6 && Math.abs((band?.appearsHigh ?? 0) - 404e3) < 1e-6);
    assert.match(text, /between 104 and 404 kHz/);
  });

  it('has the window of rates that its comments work out', () => {
    // (4.5 MHz + 5 kHz)·2/9 and (4.2 MHz − 5 kHz)·2/8, with the clock's 50 ppm taken off.
    assert.ok(Math.abs((figures?.rateWindow?.low ?? 0) / (9.01e6 / 9 / (1 - 50e-6)) - 1) < 1e-12);
    assert.ok(Math.abs((figures?.rateWindow?.high ?? 0) / (8.39e6 / 8 / (1 + 50e-6)) - 1) < 1e-12);
    assert.match(text, /zone {2}9, not inverted {3}1\.001 to 1\.049 MHz/);
  });

  it('folds at the divisor that it invites to try', () => {
    const folded = judged(text.replace('divide: 20 }', 'divide: 21 }'));
    assert.ok(folded.findings.some(({ code }) => code === 'wanted-folds'));
  });
});
