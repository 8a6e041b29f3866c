/** Tests of units and prefixes. */
import assert from 'node:assert/strict';
import { prefixPowers } from '../../src/units/prefixes';
import { meantUnits, readUnit } from '../../src/units/read-unit';
import { unitTable } from '../../src/units/unit-table';

describe('units', () => {
  it('have spellings that stand for one unit only, whatever the prefix', () => {
    const seen = new Map<string, string>();
    for (const { unit, spellings, prefixes } of unitTable) {
      const taken = Object.keys(prefixPowers).filter(
        (prefix) => prefix === '' || (prefixes !== 'none' && (prefix !== 'f' || prefixes === 'femto')),
      );
      for (const prefix of taken) {
        for (const spelling of spellings) {
          const tight = (prefix + spelling).replace(/ /g, '');
          assert.equal(seen.get(tight), undefined, tight);
          seen.set(tight, unit);
          assert.equal(readUnit(prefix + spelling)?.unit, unit);
        }
      }
    }
  });

  it('take f only before s and F', () => {
    assert.equal(readUnit('fs')?.power, -15);
    assert.equal(readUnit('fF')?.power, -15);
    for (const text of ['fHz', 'fV', 'fH', 'fΩ']) assert.equal(readUnit(text), null);
  });

  it('take no prefix before decibels, percentages, LSB, degrees', () => {
    for (const text of ['kdB', 'mdBFS', 'k%', 'mLSB', 'm°C', 'kppm']) assert.equal(readUnit(text), null);
  });

  it('are suggested for what is written in other places', () => {
    assert.deepEqual(meantUnits('ksps', ['sample-rate']), ['kS/s']);
    assert.deepEqual(meantUnits('usec', ['time']), ['µs']);
    assert.deepEqual(meantUnits('furlong', ['time']), []);
  });
});
