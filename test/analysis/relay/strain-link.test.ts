/** The example of a relay: passes, with the numbers its story tells, each from a closed form. */
import assert from 'node:assert/strict';
import { analyse } from '../../../src/analysis';
import type { Figures } from '../../../src/analysis';
import { createJudgeStore, judge } from '../../../src/findings';
import { read } from '../../../src/spec';
import { exampleText } from '../../support/examples';
import { assertWithin } from '../../support/tolerance';

const reading = read(exampleText('strain-link'));
const dB = (ratio: number): number => 20 * Math.log10(ratio);

/** The loss of one R and one C. */
const pole = (hz: number, cornerHz: number): number => -10 * Math.log10(1 + (hz / cornerHz) ** 2);

function figuresOf(name: string): Figures {
  const channel = reading.entries.find((entry) => entry.name === name)?.channel;
  assert.ok(channel !== undefined && channel !== null);
  return analyse(channel);
}

describe('the strain link', () => {
  it('holds every limit, without a warning or a hint', () => {
    const { findings, channels } = judge(reading, createJudgeStore());
    assert.deepEqual(
      findings.map(({ message }) => message),
      [],
    );
    assert.deepEqual(
      channels.map(({ passes }) => passes),
      [true, true],
    );
  });

  it('loses c₀ to its gate, and its first copy against the wanted path what the story says', () => {
    const { copyWeights, level } = { ...figuresOf('strain-link'), level: dB(0.12) };
    assertWithin(level, -18.4, 0.05);
    assertWithin(dB(copyWeights?.[1] ?? NaN), -0.2, 0.05);
    assertWithin(dB(figuresOf('thrust-link').copyWeights?.[1] ?? NaN), -10.5, 0.05);
  });

  it('has its strongest image, its flatness, its crosstalk and its jitter where the closed forms put them', () => {
    const figures = figuresOf('strain-link');
    const corner = 1 / (2 * Math.PI * 18e3 * 100e-9);
    assertWithin(corner, 88.4, 0.05);
    const weight = Math.sin(Math.PI * 0.12) / (Math.PI * 0.12);
    // The top of the band leaves 20 Hz below the rate.
    const image = dB(weight) + pole(12_480, corner) - pole(20, corner);
    const limit = (key: string) => figures.limits.find((one) => one.limit === key);
    assertWithin(limit('image')?.nominal ?? NaN, image, 1e-3);
    assertWithin(limit('flatness')?.nominal ?? NaN, -2 * pole(20, corner), 1e-3);
    assertWithin(limit('crosstalk')?.value ?? NaN, -dB(Math.E) * 2 * Math.PI * 150e3 * 10e-6, 1e-9);
    const carrier = -34 + 6 + dB(Math.sin(0.24 * Math.PI) / (0.24 * Math.PI)) + pole(25e3, corner);
    assertWithin(limit('alias')?.nominal ?? NaN, carrier, 0.01);
    // Two edges of 20 ns a period over 20 Hz; behind the tone's own filter the noise lies 0.1 dB higher against it.
    const noise = 4 * 12.5e3 * 20e-9 ** 2 * 20;
    assertWithin(figures.snr ?? NaN, -10 * Math.log10(noise / 0.12 ** 2), 0.2);
  });
});
