/** Crosstalk of time slots against the charge that a one-pole link really keeps, and at the end of the clock where the guard is shortest. */
import assert from 'node:assert/strict';
import { analyse } from '../../../src/analysis';
import type { Gate, Slots } from '../../../src/spec/channel';
import { limit, plusMinus, rate, rectangleSeconds, rectangleShare, relay, wanted } from '../../support/channel-builder';
import { assertClose, assertWithin } from '../../support/tolerance';

const parts = { wanted: [wanted(0, 40)], limits: [limit('crosstalk', -45)] };
const open = (share: number): Gate => ({ kind: 'pulse', pulse: rectangleShare(share) });
const slots = (guardSeconds: number): Slots => ({ count: 4, guardSeconds, linkHz: 150e3 });

/** What a link of corner B keeps of a pulse after a time, by a million small steps of its differential equation. */
function kept(linkHz: number, seconds: number): number {
  const steps = 1e6;
  const share = 2 * Math.PI * linkHz * (seconds / steps);
  let value = 1;
  // The midpoint rule: v' = −2πB·v.
  for (let i = 0; i < steps; i += 1) value -= share * (value - 0.5 * share * value);
  return value;
}

describe('crosstalk', () => {
  it('is what a link of one pole keeps of a slot when the next begins', () => {
    const found = analyse(relay({ ...parts, rate: rate(8e3), gate: open(0.12), slots: slots(5e-6) }));
    assertWithin(found.crosstalk ?? NaN, 20 * Math.log10(kept(150e3, 5e-6)), 1e-6);
    assertWithin(found.limits[0]?.value ?? NaN, found.crosstalk ?? NaN, 0);
    assert.equal(found.limits[0]?.passes, false);
    // No time at all leaves all of it.
    assert.equal(analyse(relay({ ...parts, rate: rate(8e3), gate: open(0.25), slots: slots(0) })).crosstalk, 0);
  });

  it('does not exist without slots, and a limit on it is not judged', () => {
    const found = analyse(relay({ ...parts, rate: rate(8e3), gate: open(0.12) }));
    assert.equal(found.crosstalk, null);
    assert.equal(found.limits[0]?.judged, false);
  });

  it('has the shortest rest of a slot at the fastest clock, while a guard that is stated stays', () => {
    const clock = rate(8e3, { tolerance: plusMinus(0.01), clock: 'rotor' });
    // A slot lasts 31.25 µs at 8 kHz; 12 % of the period are 15 µs, so 16.25 µs are left, and 1/1.01 of it at the fast end.
    const share = analyse(relay({ ...parts, rate: clock, gate: open(0.12), slots: slots(16.25e-6) })).limits[0];
    assertClose((share?.value ?? NaN) / (share?.nominal ?? NaN), 1 / 1.01, 1e-12);
    assert.deepEqual(share?.worstAt, { 'rotor, frequency': 0.01 });
    // A pulse of 15 µs does not shrink with its slot.
    const gate: Gate = { kind: 'pulse', pulse: rectangleSeconds(15e-6) };
    const fixed = analyse(relay({ ...parts, rate: clock, gate, slots: slots(16.25e-6) })).limits[0];
    assertClose((fixed?.value ?? NaN) / (fixed?.nominal ?? NaN), (31.25 / 1.01 - 15) / 16.25, 1e-9);
    const stated = analyse(relay({ ...parts, rate: clock, gate: open(0.12), slots: slots(10e-6) })).limits[0];
    assert.equal(stated?.value, stated?.nominal);
    assert.equal(stated?.worstAt, null);
  });
});
