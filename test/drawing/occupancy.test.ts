/** Tests of the map of ink. */
import assert from 'node:assert/strict';
import { createOccupancy } from '../../src/drawing/occupancy';

describe('occupancy', () => {
  it('finds ink along a line between its points', () => {
    const occupancy = createOccupancy();
    occupancy.add([
      ['M', 0, 100],
      ['L', 400, 100],
    ]);
    assert.ok(occupancy.under({ left: 190, right: 220, top: 90, bottom: 110 }) >= 6);
    assert.equal(occupancy.under({ left: 190, right: 220, top: 20, bottom: 80 }), 0);
  });

  it('costs little for a line that runs far off the paper', () => {
    const occupancy = createOccupancy();
    occupancy.add([
      ['M', 0, 0],
      ['L', 1e7, 1e7],
    ]);
    assert.ok(occupancy.under({ left: 0, right: 50_000, top: 0, bottom: 50 }) <= 600);
  });
});
