/** What every family promises of its corner, its stop edge and its turning points; roots and gains are among the values from outside. */
import assert from 'node:assert/strict';
import { designFilter, type CornerAt, type FilterFamily } from '../../../src/signal/families/design-filter';
import { filterResponse, type Filter } from '../../../src/signal/filter';
import { readFilterVectors, type StoredFilter } from '../../reference/filter-vectors';
import { assertClose, assertWithin, filterRelative } from '../../support/tolerance';

const vectors = readFilterVectors();
const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;

const groups: readonly (readonly [FilterFamily, CornerAt, readonly StoredFilter[]])[] = [
  ['inverse-chebyshev', 'stopband', vectors.inverseChebyshev],
  ['elliptic', 'ripple', vectors.elliptic],
  ['bessel', 'half-power', vectors.bessel],
  ['legendre', 'half-power', vectors.legendre],
  ['gaussian', 'half-power', vectors.gaussian],
];

function design(family: FilterFamily, stored: StoredFilter, corners: number, cornerAt: CornerAt): Filter {
  const { order, ripple = null, attenuation = null } = stored;
  return designFilter({
    family,
    order,
    kind: 'lowpass',
    corners,
    cornerAt,
    rippleDb: ripple,
    attenuationDb: attenuation,
    gain: 1,
  });
}

function nameOf(family: FilterFamily, { order, ripple, attenuation }: StoredFilter): string {
  return [
    family,
    `order ${order}`,
    ripple === undefined ? [] : `${ripple} dB`,
    attenuation === undefined ? [] : `${attenuation} dB`,
  ]
    .flat()
    .join(', ');
}

describe('every filter family', () => {
  for (const [family, cornerAt, stored] of groups) {
    it(`${family} is 10·log10(2) dB down at its corner unless the corner names something else`, () => {
      for (const one of stored) {
        const response = filterResponse(design(family, one, 14e3, 'half-power'));
        // Only as steep as the edge is can a double of the frequency tell.
        const steep = (one.stopEdgeLessOne ?? 1) < 1e-3 ? 1e-4 : 1e-8;
        assertWithin(toDb(response.logGain(14e3)), -10 * Math.log10(2), steep, nameOf(family, one));
        if (one.halfPower === undefined) continue;
        const byEdge = design(family, one, 1000, cornerAt).poles;
        design(family, one, 1000 * one.halfPower, 'half-power').poles.forEach((pole, index) => {
          assertWithin(
            Math.hypot(pole.re - byEdge[index]!.re, pole.im - byEdge[index]!.im) / Math.hypot(pole.re, pole.im),
            0,
            filterRelative,
          );
        });
      }
    });
  }

  it('puts the stop edge of an elliptic filter where its attenuation is first reached', () => {
    for (const one of vectors.elliptic) {
      const byRipple = design('elliptic', one, 1000, 'ripple').poles;
      design('elliptic', one, 1000 * one.stopEdge!, 'stopband').poles.forEach((pole, index) => {
        assertWithin(
          Math.hypot(pole.re - byRipple[index]!.re, pole.im - byRipple[index]!.im) / Math.hypot(pole.re, pole.im),
          0,
          filterRelative,
        );
      });
    }
  });

  it('turns exactly where its list says: passband between 0 dB and the ripple, stop band between nulls and the attenuation', () => {
    for (const one of vectors.elliptic.filter(({ stopEdgeLessOne }) => stopEdgeLessOne! > 1e-5)) {
      const filter = design('elliptic', one, 1, 'ripple');
      const response = filterResponse(filter);
      const levels = (filter.turnsHz ?? []).map((turn) => toDb(response.logGain(turn)));
      assert.equal(levels.length, 2 * (one.order - 1));
      levels.forEach((level, index) => {
        const inside = index < one.order - 1;
        const fromEdge = inside ? one.order - 2 - index : index - one.order + 1;
        const expected = fromEdge % 2 === 0 ? (inside ? 0 : -Infinity) : -(inside ? one.ripple! : one.attenuation!);
        assertWithin(level, expected, 1e-7, `${nameOf('elliptic', one)}, turn ${index}`);
      });
    }
    for (const one of vectors.inverseChebyshev) {
      const filter = design('inverse-chebyshev', one, 1, 'stopband');
      const response = filterResponse(filter);
      const levels = (filter.turnsHz ?? []).map((turn) => toDb(response.logGain(turn)));
      assert.equal(levels.length, one.order - 1);
      levels.forEach((level, index) => {
        assertWithin(
          level,
          index % 2 === 0 ? -Infinity : -one.attenuation!,
          1e-8,
          `${nameOf('inverse-chebyshev', one)}, turn ${index}`,
        );
      });
    }
  });

  it('never rises in the families that promise it, whatever the order', () => {
    for (const [family, , stored] of groups.slice(2)) {
      for (const one of stored) {
        const response = filterResponse({ ...design(family, one, 1, 'half-power'), turnsHz: null });
        let before = Infinity;
        for (let i = 0; i <= 400; i += 1) {
          const now = response.logGain(i / 100);
          assert.ok(now <= before + 1e-12, `${nameOf(family, one)} rises at ${i / 100}`);
          before = now;
        }
      }
    }
  });

  it('gives a Bessel filter the delay that its corner names', () => {
    for (const one of vectors.bessel) {
      const byDelay = design('bessel', one, 1000, 'delay').poles;
      design('bessel', one, 1000 * one.unitDelayHalfPower!, 'half-power').poles.forEach((pole, index) => {
        assertClose(pole.re, byDelay[index]!.re, filterRelative);
        assertClose(pole.im, byDelay[index]!.im, filterRelative);
      });
    }
  });
});
