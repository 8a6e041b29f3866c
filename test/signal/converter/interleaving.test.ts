/** Copies and lines of interleaved ways against transforms of whole records. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { interleaveCopies, offsetLines, type Way } from '../../../src/signal/converter/interleaving';
import { foldFrequency } from '../../../src/signal/folding';
import { assertClose, assertWithin } from '../../support/tolerance';

interface Case {
  readonly M: number;
  readonly N: number;
  readonly fin_bin: number;
  readonly offset: readonly number[];
  readonly gain_error: readonly number[];
  readonly skew_samples: readonly number[];
  readonly signal_amplitude: number;
  readonly spurs_bin_f_over_fs_dBc: readonly (readonly [bin: number, share: number, level: number])[];
}

const file = join(import.meta.dirname, '../../reference/interleaving.json');
const { cases } = JSON.parse(readFileSync(file, 'utf8')) as { readonly cases: readonly Case[] };

/** Bins as frequencies, so that the rate is the record's length and a sample lasts 1/N. */
function waysOf({ N, offset, gain_error, skew_samples }: Case): readonly Way[] {
  return gain_error.map((gain, index) => ({
    gain,
    skewSeconds: (skew_samples[index] ?? 0) / N,
    offset: offset[index] ?? 0,
  }));
}

const decibels = (ratio: number): number => 20 * Math.log10(ratio);

describe('interleaving', () => {
  it('leaves the copies and lines of a transformed record, each at its place', () => {
    assert.equal(cases.length, 5);
    for (const one of cases) {
      const found = new Map<number, number>();
      interleaveCopies(waysOf(one), one.fin_bin).forEach((share, index) => {
        const bin = foldFrequency(one.fin_bin + ((index + 1) * one.N) / one.M, one.N).landsHz;
        found.set(bin, decibels(share));
      });
      offsetLines(waysOf(one)).forEach((peak, index) => {
        found.set(((index + 1) * one.N) / one.M, decibels(peak / one.signal_amplitude));
      });
      const spurs = one.spurs_bin_f_over_fs_dBc.filter(([bin]) => bin > 0);
      for (const [bin, , level] of spurs) assertWithin(found.get(bin) ?? NaN, level, 1e-6, `M = ${one.M}, bin ${bin}`);
      const audible = [...found.values()].filter((level) => level > -200);
      assert.equal(audible.length, spurs.length);
    }
  });

  it('makes nothing of what all ways share, and nothing from one way', () => {
    const same = { gain: 0.1, skewSeconds: 0.01, offset: 0.2 };
    for (const share of [...interleaveCopies([same, same, same], 3), ...offsetLines([same, same, same])]) {
      assertWithin(share, 0, 1e-15);
    }
    assert.deepEqual(interleaveCopies([same], 3), []);
    assert.deepEqual(offsetLines([same]), []);
  });

  it('of two skewed ways leaves the tangent of half the angle between them', () => {
    // Closed form: 20·log10 tan(2π·0.18323·0.001) is −58.7766 dB at the frequency of bin 1501.
    const ways = [0.001, -0.001].map((skewSeconds) => ({ gain: 0, skewSeconds, offset: 0 }));
    for (const frequency of [1501 / 8192, 20, 120]) {
      assertClose(interleaveCopies(ways, frequency)[0] ?? NaN, Math.tan(2 * Math.PI * frequency * 0.001), 1e-9);
    }
  });
});
