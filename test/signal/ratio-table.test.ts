/** The table gives what the ratios themselves give, to the last digits, and hands back what it cannot. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { ratioTable, tableLogAt } from '../../src/signal/ratio-table';
import { ratioAt, sectionRatio, type SectionRatio } from '../../src/signal/section-ratio';
import { doubleSection, pairSection, singleSection } from '../../src/signal/sections';
import { assertWithin, roundingRelative } from '../support/tolerance';

const sizes = fc.double({ min: -3, max: 3, noNaN: true }).map((decade) => 10 ** decade);
const pairs = fc.tuple(sizes, sizes).map(([re, im]) => pairSection({ re: -re, im }));
const doubles = fc.tuple(sizes, sizes).map(([one, other]) => doubleSection(one, other));
const singles = sizes.map(singleSection);
const ratios: fc.Arbitrary<SectionRatio> = fc.oneof(
  fc.tuple(fc.constantFrom(null), fc.oneof(pairs, doubles, singles)).map(([zero, pole]) => sectionRatio(zero, pole)),
  fc.tuple(singles, fc.oneof(pairs, doubles, singles)).map(([zero, pole]) => sectionRatio(zero, pole)),
  fc.tuple(fc.oneof(pairs, doubles), fc.oneof(pairs, doubles)).map(([zero, pole]) => sectionRatio(zero, pole)),
);

describe('tableLogAt', () => {
  it('is the sum of the logarithms of the ratios', () => {
    fc.assert(
      fc.property(fc.array(ratios, { maxLength: 8 }), sizes, (list, frequency) => {
        const expected = list.reduce((sum, ratio) => sum + Math.log(ratioAt(ratio, frequency)), 0);
        const found = tableLogAt(ratioTable(list), frequency);
        assert.ok(found !== null);
        assertWithin(found, expected, roundingRelative * (1 + Math.abs(expected)));
      }),
      { seed: 91, numRuns: 500 },
    );
  });

  it('hands back what it cannot tell: a null, Infinity, and products beyond the range of a double', () => {
    const notch = ratioTable([sectionRatio(pairSection({ re: 0, im: 3 }), pairSection({ re: -1, im: 3 }))]);
    assert.equal(tableLogAt(notch, 3), null);
    assert.equal(tableLogAt(notch, Infinity), null);
    const steep = ratioTable(Array.from({ length: 20 }, () => sectionRatio(null, pairSection({ re: -1e-6, im: 1e-6 }))));
    assert.equal(tableLogAt(steep, 1e6), null);
  });
});
