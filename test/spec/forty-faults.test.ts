/** Forty different faults in forty channels are all reported, each at its own place. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { read } from '../../src/spec/read';
import { findingLine, markerLines } from '../support/markers';

const text = readFileSync(new URL('../fixtures/spec/forty-faults.bandkeep.yaml', import.meta.url), 'utf8');

describe('a spec with 40 faults in 40 channels', () => {
  const reading = read(text);

  it('reports all 40, each at its place', () => {
    const found = reading.problems.map(({ code, span }) => findingLine(text, { code, ...span })).sort();
    const expected = markerLines(text);
    assert.equal(expected.length, 40);
    assert.deepEqual(found, expected);
  });

  it('names the channel of each', () => {
    assert.deepEqual(
      reading.problems.map(({ channel }) => channel),
      Array.from({ length: 40 }, (_, index) => `fault-${String(index + 1).padStart(2, '0')}`),
    );
  });

  it('has all 40 channels, of which only the one with a warning is whole', () => {
    assert.equal(reading.entries.length, 40);
    const warned = reading.problems.filter(({ severity }) => severity === 'warning').map(({ channel }) => channel);
    assert.deepEqual(
      reading.entries.filter(({ channel }) => channel !== null).map(({ name }) => name),
      warned,
    );
  });
});
