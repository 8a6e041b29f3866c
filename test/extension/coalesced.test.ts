import assert from 'node:assert/strict';
import { coalesced } from '../../src/extension/coalesced';

/** A task whose runs end one by one when the test says so. */
function controlled(): { task: () => Promise<void>; runs: { end: () => void; fail: () => void }[] } {
  const runs: { end: () => void; fail: () => void }[] = [];
  const task = (): Promise<void> =>
    new Promise((resolve, reject) => {
      runs.push({
        end: resolve,
        fail: () => {
          reject(new Error('broken'));
        },
      });
    });
  return { task, runs };
}

describe('coalesced work', () => {
  it('runs at once when nothing is under way', async () => {
    const { task, runs } = controlled();
    const done = coalesced(task)();
    assert.equal(runs.length, 1);
    runs[0]?.end();
    await done;
  });

  it('makes one more run of any number of asks during a run', async () => {
    const { task, runs } = controlled();
    const ask = coalesced(task);
    const first = ask();
    const others = [ask(), ask(), ask()];
    assert.equal(runs.length, 1);
    runs[0]?.end();
    await first;
    assert.equal(runs.length, 2);
    runs[1]?.end();
    await Promise.all(others);
    assert.equal(runs.length, 2);
  });

  it('never answers an ask with a run that began before it', async () => {
    const { task, runs } = controlled();
    const ask = coalesced(task);
    const first = ask();
    let answered = false;
    const second = ask().then(() => {
      answered = true;
    });
    runs[0]?.end();
    await first;
    assert.equal(answered, false);
    runs[1]?.end();
    await second;
    assert.equal(answered, true);
  });

  it('goes on after a failure, which only its own asker hears of', async () => {
    const { task, runs } = controlled();
    const ask = coalesced(task);
    const first = ask();
    const second = ask();
    runs[0]?.fail();
    await assert.rejects(first, /broken/);
    runs[1]?.end();
    await second;
    const third = ask();
    assert.equal(runs.length, 3);
    runs[2]?.end();
    await third;
  });
});
