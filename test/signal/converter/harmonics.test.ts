/** Levels of harmonics against a polynomial that makes them. */
import assert from 'node:assert/strict';
import { harmonicAtFullScaleDb, harmonicLevelDb } from '../../../src/signal/converter/harmonics';
import { assertWithin } from '../../support/tolerance';

const decibels = (ratio: number): number => 20 * Math.log10(ratio);

describe('harmonics', () => {
  it('of a cubic are those of cos³ = (3·cos + cos 3)/4, at every level', () => {
    // y = x + e·x³: the third stands at e·A³/4. Stated at A = 0.5 against the tone, predicted at A = 0.1.
    const third = (amplitude: number): number => (1e-3 * amplitude ** 3) / 4;
    const atFullScale = harmonicAtFullScaleDb(3, decibels(third(0.5) / 0.5), decibels(0.5));
    assertWithin(atFullScale, decibels(third(1)), 1e-10);
    assertWithin(harmonicLevelDb(3, atFullScale, decibels(0.1)), decibels(third(0.1)), 1e-10);
  });

  it('stand where they were stated', () => {
    for (const order of [2, 5, 9]) {
      assertWithin(harmonicLevelDb(order, harmonicAtFullScaleDb(order, -85, -6), -6), -91, 1e-10);
    }
  });

  it('vanish with the tone', () => {
    assert.equal(harmonicLevelDb(2, -80, -Infinity), -Infinity);
  });
});
