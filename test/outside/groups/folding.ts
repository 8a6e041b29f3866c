/** Where tones and harmonics land, and the rates that keep a band whole, against exact fractions. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { foldFrequency, rateWindows, zoneOf } from '../../../src/signal/folding';
import { roundingRelative } from '../../support/tolerance';
import type { OutsideGroup } from '../group';

interface Folding {
  readonly tones: readonly {
    readonly f: string;
    readonly fs: string;
    readonly alias_exact: string;
    readonly inverted: boolean;
    readonly zone: number;
  }[];
  readonly bands: readonly {
    readonly fl: string;
    readonly fu: string;
    readonly n_max: number;
    readonly windows_n_lo_hi_orientation: readonly (readonly [number, string, string | null, 'upright' | 'inverted'])[];
    readonly min_rate: string;
  }[];
  readonly harmonics: readonly {
    readonly f: string;
    readonly fs: string;
    readonly harmonic_alias: readonly (readonly [number, string, number])[];
  }[];
}

const file = JSON.parse(readFileSync(join(import.meta.dirname, '../../reference/folding.json'), 'utf8')) as Folding;

/** A fraction or a decimal as a double. */
function valueOf(text: string): number {
  const [numerator, denominator = '1'] = text.split('/');
  return Number(numerator) / Number(denominator);
}

/** The group of tones. */
export const folds: OutsideGroup = {
  title: 'Folds of tones and harmonics',
  source: 'exact fractions',
  define: (tally) => {
    it('land where fractions say, upright or inverted, from their zone', () => {
      for (const { f, fs, alias_exact: alias, inverted, zone } of file.tones) {
        const what = `${f} at ${fs}`;
        const landing = foldFrequency(Number(f), Number(fs));
        // Of the tone: 30000.001 lands at 0.001 with what the tone's own last digit leaves of it.
        tally.absolute(landing.landsHz, valueOf(alias), roundingRelative * Number(f), what);
        tally.exact([landing.inverted, zoneOf(Number(f), Number(fs))], [inverted, zone], what);
      }
    });

    it('take harmonics along', () => {
      for (const { f, fs, harmonic_alias: harmonics } of file.harmonics) {
        for (const [h, exact] of harmonics) {
          const landing = foldFrequency(h * Number(f), Number(fs));
          tally.absolute(landing.landsHz, valueOf(exact), roundingRelative * h * Number(f), `${h} times ${f} at ${fs}`);
        }
      }
    });
  },
};

/** The group of rate windows; among the bands are the worked examples of the literature. */
export const windows: OutsideGroup = {
  title: 'Rates that keep a band whole',
  source: 'exact fractions; R. G. Vaughan, N. L. Scott, D. R. White (1991); 17.5 .. 22.5 from memory of textbooks',
  define: (tally) => {
    for (const { fl, fu, n_max: count, windows_n_lo_hi_orientation: expected, min_rate: least } of file.bands) {
      it(`are ${count} windows for ${fl} .. ${fu}`, () => {
        const found = rateWindows(Number(fl), Number(fu));
        tally.exact(found.length, count, 'number of windows');
        assert.equal(expected.length, count);
        for (const [zone, low, high, orientation] of expected) {
          const window = found[zone - 1]!;
          tally.relative(window.lowHz, valueOf(low), roundingRelative, `zone ${zone}, from`);
          tally.relative(window.highHz, high === null ? Infinity : valueOf(high), roundingRelative, `zone ${zone}, to`);
          tally.exact([window.zone, window.inverted], [zone, orientation === 'inverted'], `zone ${zone}`);
        }
        tally.relative(found.at(-1)?.lowHz ?? NaN, valueOf(least), roundingRelative, 'least rate');
      });
    }

    it('are 11 for 1.0 .. 1.1 and 8 for 0.7 .. 0.8, though hi/(hi − lo) is 10.999… and 7.999… in double precision', () => {
      tally.exact(1.1 / (1.1 - 1.0), 10.999999999999991, 'the quotient as it is');
      tally.exact(rateWindows(1.0, 1.1).length, 11, '1.0 .. 1.1');
      tally.exact(0.8 / (0.8 - 0.7), 7.999999999999994, 'the quotient as it is');
      tally.exact(rateWindows(0.7, 0.8).length, 8, '0.7 .. 0.8');
    });
  },
};
