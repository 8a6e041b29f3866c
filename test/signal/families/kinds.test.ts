/** High-pass, band-pass and band-stop filters of several families, narrow bands and order 20 among them, against 50-digit arithmetic. */
import assert from 'node:assert/strict';
import { designFilter, type FilterDesign, type FilterKind } from '../../../src/signal/families/design-filter';
import { filterResponse } from '../../../src/signal/filter';
import { largestOverBands } from '../../../src/signal/search';
import { readFilterVectors, type StoredKind } from '../../reference/filter-vectors';
import { assertBoundsEnclose, assertSlopeEncloses } from '../../support/enclosing';
import { assertGainAndDelay, assertRoots } from '../../support/stored-filters';
import { assertWithin, provedGapDb } from '../../support/tolerance';

const { transforms } = readFilterVectors();
const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;

function designOf(stored: StoredKind): FilterDesign {
  const { family, kind, order, low, high, ripple = null, attenuation = null } = stored;
  const cornerAt = family === 'inverse-chebyshev' ? 'stopband' : ripple === null ? 'half-power' : 'ripple';
  const corners = kind === 'highpass' ? low : { low, high };
  return { family, order, kind, corners, cornerAt, rippleDb: ripple, attenuationDb: attenuation, gain: 1 };
}

function nameOf({ kind, family, order, low, high }: StoredKind): string {
  return `${family} ${kind} of order ${order}, ${low} .. ${high} Hz`;
}

describe('the kinds of a family', () => {
  it('are all stored, from one percent wide to four decades and up to order 20', () => {
    assert.equal(transforms.length, 26);
    assert.deepEqual([...new Set(transforms.map(({ kind }) => kind))], ['highpass', 'bandpass', 'bandstop']);
    assert.equal(new Set(transforms.map(({ family }) => family)).size, 7);
  });

  for (const stored of transforms) {
    const filter = designFilter(designOf(stored));
    const centre = Math.sqrt(stored.low * stored.high);

    it(`has the roots, gain and delay of 50-digit arithmetic: ${nameOf(stored)}`, () => {
      assertRoots(filter.poles, stored.poles, 'pole');
      assertRoots(filter.zeros, stored.zeros, 'zero');
      assertGainAndDelay(filter, stored, { grid: stored.grid, edgeHz: 1, perSecond: 1 }, nameOf(stored));
    });

    it(`turns where its list says: ${nameOf(stored)}`, () => {
      assertBoundsEnclose(filterResponse(filter), centre, 41);
      assertSlopeEncloses(filterResponse(filter), centre, 42);
    });

    it(`is enclosed by its sections alone: ${nameOf(stored)}`, () => {
      assertBoundsEnclose(filterResponse({ ...filter, turnsHz: null }), centre, 43);
      assertSlopeEncloses(filterResponse({ ...filter, turnsHz: null }), centre, 44);
    });

    it(`reaches its passband's maximum and no more, proved from its sections: ${nameOf(stored)}`, () => {
      const extreme = largestOverBands(filterResponse({ ...filter, turnsHz: null }), [{ low: 0, high: Infinity }])!;
      assertWithin(toDb(extreme.logGain), 0, provedGapDb);
      assert.ok(extreme.gapDb <= provedGapDb);
    });
  }

  it('put what the corner names on both edges', () => {
    for (const kind of ['bandpass', 'bandstop'] as const satisfies readonly FilterKind[]) {
      const design = {
        family: 'elliptic',
        order: 5,
        kind,
        corners: { low: 900, high: 1150 },
        rippleDb: 0.1,
        attenuationDb: 60,
        gain: 2,
      } as const;
      for (const [cornerAt, lossDb] of [
        ['half-power', 10 * Math.log10(2)],
        ['ripple', 0.1],
        ['stopband', 60],
      ] as const) {
        const response = filterResponse(designFilter({ ...design, cornerAt }));
        for (const edge of [900, 1150]) assertWithin(toDb(response.logGain(edge)), 20 * Math.log10(2) - lossDb, 1e-8);
      }
    }
  });

  it('are refused with the wrong number of corners, a corner of another family, or without the decibels they need', () => {
    const design: FilterDesign = {
      family: 'chebyshev',
      order: 3,
      kind: 'lowpass',
      corners: 1000,
      cornerAt: 'half-power',
      rippleDb: 1,
      attenuationDb: null,
      gain: 1,
    };
    assert.equal(designFilter(design).poles.length, 3);
    for (const wrong of [
      { corners: { low: 1, high: 2 } },
      { kind: 'bandpass' },
      { kind: 'bandpass', corners: { low: 2, high: 2 } },
      { kind: 'bandstop', corners: { low: 0, high: 2 } },
      { kind: 'highpass', corners: 0 },
      { cornerAt: 'stopband' },
      { family: 'butterworth', cornerAt: 'ripple' },
      { family: 'bessel', cornerAt: 'stopband' },
      { rippleDb: null },
      { family: 'elliptic' },
      { family: 'elliptic', attenuationDb: 1 },
      { family: 'elliptic', attenuationDb: 2.5 },
      { family: 'inverse-chebyshev', attenuationDb: 3 },
      { order: 21 },
      { order: 2.5 },
    ] as readonly Partial<FilterDesign>[]) {
      assert.throws(() => designFilter({ ...design, ...wrong }), RangeError, JSON.stringify(wrong));
    }
  });
});
