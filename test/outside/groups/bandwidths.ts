/** Noise bandwidth against peak and 0 Hz, endless ones, half-power points, delay at 0 Hz; cascades, ladders and sections of RC. */
import assert from 'node:assert/strict';
import { realPole } from '../../../src/signal/families/real-pole';
import { polesAndZeros } from '../../../src/signal/families/poles-and-zeros';
import { groupDelay, type Filter } from '../../../src/signal/filter';
import { noiseBandwidth } from '../../../src/signal/noise-bandwidth';
import { readOutsideFilters, type OutsideBandwidth } from '../../reference/outside-filters';
import { filterRelative } from '../../support/tolerance';
import type { OutsideGroup, Tally } from '../group';
import { filterOf, gainDbOf, nameOf } from '../outside-design';

const halfPowerDb = -10 * Math.log10(2);
/** dB; a half-power frequency of 25 digits rounded to a double, on an edge of some hundred dB an octave. */
const halfPowerSlackDb = 1e-9;

function bandwidthOf(filters: readonly Filter[]): number | null {
  const found = noiseBandwidth(filters);
  if (found.kind === 'endless') return null;
  assert.ok(found.errorBound <= filterRelative * found.value);
  return found.value;
}

function tallyBandwidth(tally: Tally, stored: OutsideBandwidth): void {
  const what = nameOf(stored);
  const filter = filterOf(stored);
  const value = bandwidthOf([filter]);
  if (value === null || stored.overPeak === null || stored.overZeroHz === null) {
    tally.exact([value, stored.overZeroHz], [stored.overPeak, null], `${what}, endless`);
  } else {
    tally.relative(value, stored.overPeak, filterRelative, `${what}, against the peak`);
    tally.relative(value / filter.gainAt.gain ** 2, stored.overZeroHz, filterRelative, `${what}, against 0 Hz`);
    tally.relative(value / stored.halfPower, stored.overHalfPower ?? NaN, filterRelative, `${what}, over the half power`);
  }
  tally.decibels(gainDbOf(filter, stored.halfPower), halfPowerDb, halfPowerSlackDb, `${what}, half power`);
  tally.relative(2 * Math.PI * groupDelay(filter, 0), stored.delayAtZero, filterRelative, `${what}, delay at 0 Hz`);
}

/** The group of filters. */
export const bandwidths: OutsideGroup = {
  title: 'Noise bandwidth, half power and delay at 0 Hz',
  source: 'mpmath residues, 80 digits; the Butterworth column is that of a public table',
  define: (tally) => {
    const stored = readOutsideFilters().bandwidths;
    for (const family of new Set(stored.map((one) => one.family))) {
      it(`has every one of ${family}`, () => {
        for (const one of stored) if (one.family === family) tallyBandwidth(tally, one);
      });
    }
  },
};

/** The group of resistors and capacitors. */
export const passive: OutsideGroup = {
  title: 'RC cascades, ladders and section tables',
  source: 'mpmath, 50 digits: Gamma function, eigenvalues of the state matrix',
  define: (tally) => {
    const { cascades, ladders, sections } = readOutsideFilters();
    it('has half power and noise bandwidth of equal buffered sections', () => {
      for (const { count, halfPower, bandwidth } of cascades) {
        const filters = Array.from({ length: count }, () => realPole(1));
        const level = filters.reduce((sum, filter) => sum + gainDbOf(filter, halfPower), 0);
        tally.decibels(level, halfPowerDb, halfPowerSlackDb, `half power of ${count}`);
        tally.relative(bandwidthOf(filters) ?? NaN, bandwidth, filterRelative, `noise bandwidth of ${count}`);
      }
    });

    it('has half power and delay of the poles of equal unbuffered sections, 0.3742 of a corner for two and not 0.6436', () => {
      for (const { poles, halfPower, delayAtZero } of ladders) {
        const filter = polesAndZeros({ poles: poles.map((re) => ({ re, im: 0 })), zeros: [], gain: 1, gainAtHz: 0 });
        tally.decibels(gainDbOf(filter, halfPower), halfPowerDb, halfPowerSlackDb, `half power of ${poles.length}`);
        tally.relative(2 * Math.PI * groupDelay(filter, 0), delayAtZero, filterRelative, `Elmore delay of ${poles.length}`);
      }
    });

    it('has the natural frequency and Q of each section of a family', () => {
      for (const one of sections) {
        const upper = filterOf(one).poles.filter(({ im }) => im >= 0);
        assert.equal(upper.length, one.sections.length);
        for (const [w0, q] of one.sections) {
          const nearest = upper.toSorted((a, b) => Math.abs(Math.hypot(a.re, a.im) - w0) - Math.abs(Math.hypot(b.re, b.im) - w0));
          const same =
            q === null ? nearest : nearest.filter(({ im }) => im > 0).toSorted((a, b) => offOf(a, w0, q) - offOf(b, w0, q));
          const { re, im } = same[0]!;
          tally.relative(Math.hypot(re, im), w0, filterRelative, `${nameOf(one)}, natural frequency`);
          if (q !== null) tally.relative(-Math.hypot(re, im) / (2 * re), q, filterRelative, `${nameOf(one)}, Q`);
        }
      }
    });
  },
};

/** How far a pole is from a section: Butterworth sections share their natural frequency, so Q must tell them apart. */
function offOf({ re, im }: { readonly re: number; readonly im: number }, w0: number, q: number): number {
  const size = Math.hypot(re, im);
  return Math.abs(size / w0 - 1) + Math.abs(-size / (2 * re * q) - 1);
}
