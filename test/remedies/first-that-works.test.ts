import assert from 'node:assert/strict';
import fc from 'fast-check';
import { firstThatWorks, type AttemptAt } from '../../src/remedies/first-that-works';
import type { Trial } from '../../src/remedies/trial';

/** A trial that remembers only which candidate it was. */
function trialOf(index: number): Trial {
  return {
    changes: [{ kind: 'rate', says: String(index), about: null, edits: [] }],
    figures: null,
    remaining: [],
    newErrors: [],
    newWarnings: [],
    passes: true,
    worsened: [],
  };
}

function search(count: number, good: (index: number) => boolean, from = 0): { found: number | null; looks: number } {
  let looks = 0;
  const attemptAt: AttemptAt = function* (index) {
    looks += 1;
    yield;
    return trialOf(index);
  };
  const steps = firstThatWorks(count, attemptAt, (trial) => good(Number(trial.changes[0]?.says)), from);
  let step = steps.next();
  while (step.done !== true) step = steps.next();
  return { found: step.value?.index ?? null, looks };
}

describe('the first candidate that works', () => {
  it('is found exactly where good means good from there on', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2000 }), fc.nat(2000), (count, first) => {
        assert.equal(search(count, (index) => index >= first).found, first < count ? first : null);
      }),
      { seed: 1 },
    );
  });

  it('takes few looks even far up a long row', () => {
    assert.ok(search(2000, (index) => index >= 1990).looks <= 40);
  });

  it('is looked for one by one at first, so that a lone one near the start is not missed', () => {
    assert.equal(search(100, (index) => index === 4).found, 4);
  });

  it('is looked for from a given one on', () => {
    assert.equal(search(100, () => true, 7).found, 7);
    assert.equal(search(3, () => true, 3).found, null);
  });
});
