/** Tests of paths: relative to the spec's folder, and never out of the root. */
import assert from 'node:assert/strict';
import { pathFrom } from '../../../src/spec/files/path-from';

describe('a path of a spec', () => {
  const paths: readonly [string, string, string][] = [
    ['a.bandkeep.yaml', 'data/x.csv', 'data/x.csv'],
    ['specs/a.bandkeep.yaml', 'x.csv', 'specs/x.csv'],
    ['specs/a.bandkeep.yaml', './x.csv', 'specs/x.csv'],
    ['specs/deep/a.bandkeep.yaml', '../../data//x y.csv', 'data/x y.csv'],
  ];
  for (const [file, written, expected] of paths) {
    it(`resolves ${written} in ${file}`, () => {
      assert.deepEqual(pathFrom(file, written), { path: expected });
    });
  }

  const refused: readonly [string, RegExp, string | null][] = [
    ['../x.csv', /leads out of the root/, null],
    ['a/../../x.csv', /leads out of the root/, null],
    ['/tmp/x.csv', /absolute/, null],
    ['C:\\x.csv', /absolute/, null],
    ['~/x.csv', /absolute/, null],
    ['\\\\server\\x.csv', /absolute/, null],
    ['data\\x.csv', /parted by `\/`/, 'data/x.csv'],
    ['https://lagoon.example/x.csv', /an address/, null],
    ['', /empty/, null],
    ['.', /a folder/, null],
  ];
  for (const [written, message, meant] of refused) {
    it(`refuses \`${written}\``, () => {
      const reading = pathFrom('a.bandkeep.yaml', written);
      assert.ok('fault' in reading);
      assert.match(reading.fault, message);
      assert.equal(reading.meant, meant);
    });
  }

  for (const written of ['x.csv', '../x.csv', '../../x.csv']) {
    it(`refuses \`${written}\` beside a spec that lies outside the root itself`, () => {
      const reading = pathFrom('../elsewhere/a.bandkeep.yaml', written);
      assert.match('fault' in reading ? reading.fault : '', /leads out of the root/);
    });
  }
});
