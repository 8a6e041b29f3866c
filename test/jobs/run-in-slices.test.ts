/** The driver of long work, with a clock and a scheduler that the test owns. */
import assert from 'node:assert/strict';
import { drain, runInSlices, sliceMilliseconds } from '../../src/jobs';
import type { SliceHost } from '../../src/jobs';

interface Stage extends SliceHost {
  time: number;
  turns: number;
  over: boolean;
}

/** A host whose clock only moves when the work says so; `onTurn` runs whenever the others get a turn. */
function stage(onTurn: (self: Stage) => void = () => undefined): Stage {
  const self: Stage = {
    time: 0,
    turns: 0,
    over: false,
    now: () => self.time,
    yieldControl: () => {
      self.turns += 1;
      onTurn(self);
      return Promise.resolve();
    },
    cancelled: () => self.over,
  };
  return self;
}

/** Work of `steps` steps of `milliseconds` each, that notes how long each slice became. */
function* work(
  host: Stage,
  steps: number,
  milliseconds: number,
  log: { steps: number; closed: boolean },
): Generator<void, string> {
  try {
    for (let i = 0; i < steps; i += 1) {
      host.time += milliseconds;
      log.steps += 1;
      yield;
    }
    return `${steps} steps`;
  } finally {
    log.closed = true;
  }
}

describe('running in slices', () => {
  it('gives the same result as draining', async () => {
    const host = stage();
    const log = { steps: 0, closed: false };
    const outcome = await runInSlices(work(host, 25, 3, log), host);
    assert.deepEqual(outcome, { kind: 'done', value: drain(work(host, 25, 3, log)) });
  });

  it('never keeps the thread for longer than a slice and one step', async () => {
    let sliceStart = 0;
    const slices: number[] = [];
    const host = stage((self) => {
      slices.push(self.time - sliceStart);
      sliceStart = self.time;
    });
    await runInSlices(work(host, 25, 3, { steps: 0, closed: false }), host);
    assert.ok(slices.length > 1);
    for (const length of slices) assert.ok(length < sliceMilliseconds + 3, `a slice of ${length} ms`);
  });

  it('does not give up the thread for work that fits one slice', async () => {
    const host = stage();
    await runInSlices(work(host, 3, 3, { steps: 0, closed: false }), host);
    assert.equal(host.turns, 0);
  });

  it('gives the others one turn a slice', async () => {
    const host = stage();
    await runInSlices(work(host, 20, 5, { steps: 0, closed: false }), host);
    assert.equal(host.turns, 10);
  });

  it('drops work as soon as nobody wants it, and lets it clean up', async () => {
    const log = { steps: 0, closed: false };
    const host = stage((self) => {
      self.over = self.turns === 2;
    });
    const outcome = await runInSlices(work(host, 1000, 5, log), host);
    assert.deepEqual(outcome, { kind: 'dropped' });
    assert.equal(log.steps, 4);
    assert.ok(log.closed);
  });

  it('does not begin work that is dropped already', async () => {
    const log = { steps: 0, closed: false };
    const host = stage();
    host.over = true;
    assert.deepEqual(await runInSlices(work(host, 3, 1, log), host), { kind: 'dropped' });
    assert.equal(log.steps, 0);
  });

  it('passes on what the work throws', async () => {
    const host = stage();
    await assert.rejects(
      runInSlices(
        // eslint-disable-next-line require-yield -- the point is that it throws first
        (function* (): Generator<void, string> {
          throw new Error('inner fault');
        })(),
        host,
      ),
      /inner fault/,
    );
  });
});

describe('draining', () => {
  it('runs every step and returns the result', () => {
    const host = stage();
    const log = { steps: 0, closed: false };
    assert.equal(drain(work(host, 7, 100, log)), '7 steps');
    assert.equal(log.steps, 7);
  });
});
